package spgpe.reservoir;

class CommonsRngStreamsTest extends NoiseGeneratorContract {
  @Override
  protected RandomStreams streams(long seed) {
    return RandomStreams.commonsRng(seed);
  }

  @Override
  protected boolean isKeyedByModeNumber() {
    return false;
  }

  @Override
  protected boolean allocatesNothing() {
    return false;
  }
}
