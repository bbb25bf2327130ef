package spgpe.reservoir;

import org.apache.commons.rng.UniformRandomProvider;
import spgpe.internal.check.Check;
import spgpe.internal.random.BoxMuller;
import spgpe.internal.random.Philox;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;

/**
 * Philox4x32-10 with key = seed and counter
 *
 * <pre>word 0: mode numbers (16 bits each)      word 1: step, low 32 bits
 * word 2: trajectory                       word 3: use (8), component (8), step, high 16 bits</pre>
 *
 * <p>so that no two numbers share a block. One block makes one complex normal.
 */
final class CounterBasedStreams implements RandomStreams {
  private static final long LOW_WORD = 0xffffffffL;

  private final long seed;

  CounterBasedStreams(long seed) {
    this.seed = seed;
  }

  @Override
  public NoiseGenerator generator(CoherentRegion region, int components, int lanes) {
    CommonsRngStreams.checkShape(region, components, lanes);
    return new Generator(seed, region, components, lanes);
  }

  @Override
  public UniformRandomProvider initialState(long trajectory) {
    return CommonsRngStreams.provider(seed, trajectory, 0, CommonsRngStreams.INITIAL_STATE);
  }

  @Override
  public long seed() {
    return seed;
  }

  @Override
  public String toString() {
    return "RandomStreams: counter-based Philox4x32-10, seed=" + seed;
  }

  private static final class Generator implements NoiseGenerator {
    private final CoherentRegion region;
    private final int components;
    private final int key0;
    private final int key1;
    private final long[] trajectories;
    private final long[] modeWords;
    private final BoxMuller.Scratch scratch;

    Generator(long seed, CoherentRegion region, int components, int lanes) {
      this.region = region;
      this.components = components;
      this.key0 = (int) seed;
      this.key1 = (int) (seed >>> 32);
      this.trajectories = new long[lanes];
      java.util.Arrays.fill(trajectories, -1);
      this.modeWords = new long[region.modes()];
      for (int m = 0; m < modeWords.length; m++) {
        int nx = region.modeNumber(0, m);
        int ny = region.grid().dimension() == 1 ? 0 : region.modeNumber(1, m);
        Check.argument(
            Math.abs(nx) <= 32767 && Math.abs(ny) <= 32767,
            "mode numbers must not exceed 32767 for the counter-based streams: nx=%s, ny=%s",
            nx, ny);
        modeWords[m] = ((long) (ny & 0xffff) << 16) | (nx & 0xffff);
      }
      this.scratch = new BoxMuller.Scratch(region.modes());
    }

    @Override
    public void assign(int lane, long trajectory) {
      Check.inRange(lane, 0, trajectories.length - 1, "lane");
      CommonsRngStreams.checkTrajectory(trajectory);
      trajectories[lane] = trajectory;
    }

    @Override
    public void fill(long step, int use, Amplitudes normals) {
      CommonsRngStreams.checkStep(step);
      Check.inRange(use, 0, LARGEST_USE, "use");
      Check.notNull(normals, "normals").requireShape(region, components, trajectories.length);
      for (int lane = 0; lane < trajectories.length; lane++) {
        CommonsRngStreams.checkAssigned(lane, trajectories[lane]);
        for (int c = 0; c < components; c++) {
          long word3 = ((long) use << 24) | ((long) c << 16) | (step >>> 32);
          for (int m = 0; m < modeWords.length; m++) {
            scratch.c0[m] = modeWords[m];
            scratch.c1[m] = step & LOW_WORD;
            scratch.c2[m] = trajectories[lane];
            scratch.c3[m] = word3;
          }
          Philox.encrypt(
              modeWords.length, scratch.c0, scratch.c1, scratch.c2, scratch.c3, key0, key1);
          BoxMuller.normals(
              modeWords.length, scratch, normals.re(c), normals.im(c), lane, trajectories.length);
        }
      }
    }
  }
}
