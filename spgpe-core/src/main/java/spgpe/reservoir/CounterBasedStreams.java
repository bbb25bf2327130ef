package spgpe.reservoir;

import org.apache.commons.rng.UniformRandomProvider;
import spgpe.internal.check.Check;
import spgpe.internal.random.BoxMuller;
import spgpe.internal.random.NormalKernels;
import spgpe.internal.random.PlainNormals;
import spgpe.internal.vector.VectorModule;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Engine;

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

    /** First and third word of the counter of each mode and lane. */
    private final long[] modeWords;

    private final long[] trajectoryWords;
    private final NormalKernels kernels;
    private final BoxMuller.Scratch scratch;

    Generator(long seed, CoherentRegion region, int components, int lanes) {
      this.region = region;
      this.components = components;
      this.key0 = (int) seed;
      this.key1 = (int) (seed >>> 32);
      this.trajectories = new long[lanes];
      java.util.Arrays.fill(trajectories, -1);
      this.modeWords = new long[region.modes() * lanes];
      this.trajectoryWords = new long[modeWords.length];
      for (int m = 0; m < region.modes(); m++) {
        int nx = region.modeNumber(0, m);
        int ny = region.grid().dimension() == 1 ? 0 : region.modeNumber(1, m);
        Check.argument(
            Math.abs(nx) <= 32767 && Math.abs(ny) <= 32767,
            "mode numbers must not exceed 32767 for the counter-based streams: nx=%s, ny=%s",
            nx, ny);
        java.util.Arrays.fill(
            modeWords, m * lanes, (m + 1) * lanes, ((long) (ny & 0xffff) << 16) | (nx & 0xffff));
      }
      this.kernels = kernels();
      this.scratch = new BoxMuller.Scratch(NormalKernels.BLOCK);
    }

    @Override
    public void assign(int lane, long trajectory) {
      Check.inRange(lane, 0, trajectories.length - 1, "lane");
      CommonsRngStreams.checkTrajectory(trajectory);
      trajectories[lane] = trajectory;
      for (int e = lane; e < trajectoryWords.length; e += trajectories.length) {
        trajectoryWords[e] = trajectory;
      }
    }

    @Override
    public void fill(long step, int use, Amplitudes normals) {
      CommonsRngStreams.checkStep(step);
      Check.inRange(use, 0, LARGEST_USE, "use");
      Check.notNull(normals, "normals").requireShape(region, components, trajectories.length);
      for (int lane = 0; lane < trajectories.length; lane++) {
        CommonsRngStreams.checkAssigned(lane, trajectories[lane]);
      }
      for (int c = 0; c < components; c++) {
        long word3 = ((long) use << 24) | ((long) c << 16) | (step >>> 32);
        for (int first = 0; first < modeWords.length; first += NormalKernels.BLOCK) {
          int count = Math.min(NormalKernels.BLOCK, modeWords.length - first);
          kernels.fill(
              count, first, modeWords, step & LOW_WORD, trajectoryWords, word3, key0, key1,
              scratch, normals.re(c), normals.im(c));
        }
      }
    }

    /** With vector instructions if they are there; the bits are the same either way. */
    private static NormalKernels kernels() {
      return switch (Engine.ofSystemProperty()) {
        case AUTOMATIC, VECTOR ->
            VectorModule.find("spgpe.internal.random.VectorNormals", NormalKernels.class)
                .orElseGet(PlainNormals::new);
        case PLAIN, PROVIDER -> new PlainNormals();
      };
    }
  }
}
