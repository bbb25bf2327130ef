package spgpe.reservoir;

import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;
import spgpe.internal.check.Check;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;

/**
 * A Philox4x64 generator of Apache Commons RNG for each (trajectory, step, use): key = (seed,
 * trajectory), counter starts at (0, 0, step, use).
 */
final class CommonsRngStreams implements RandomStreams {
  /** Kept apart from the uses of the noise, which end at 255. */
  static final int INITIAL_STATE = 256;

  private final long seed;

  CommonsRngStreams(long seed) {
    this.seed = seed;
  }

  static UniformRandomProvider provider(long seed, long trajectory, long step, int use) {
    checkTrajectory(trajectory);
    checkStep(step);
    return RandomSource.PHILOX_4X64.create(new long[] {seed, trajectory, 0, 0, step, use});
  }

  static void checkTrajectory(long trajectory) {
    Check.argument(
        trajectory >= 0 && trajectory < 1L << 32,
        "trajectory index must lie in 0..2^32-1: trajectory=%s", trajectory);
  }

  static void checkStep(long step) {
    if (step < 0 || step >= 1L << 48) { // allocates nothing in a time step
      Check.argument(false, "step number must lie in 0..2^48-1: step=%s", step);
    }
  }

  static void checkAssigned(int lane, long trajectory) {
    if (trajectory < 0) { // allocates nothing in a time step
      Check.state(false, "lane has no trajectory assigned: lane=%s", lane);
    }
  }

  static void checkShape(CoherentRegion region, int components, int lanes) {
    Check.notNull(region, "region");
    Check.inRange(components, 1, 255, "components");
    Check.inRange(lanes, 1, 4096, "lanes");
  }

  @Override
  public NoiseGenerator generator(CoherentRegion region, int components, int lanes) {
    checkShape(region, components, lanes);
    long[] trajectories = new long[lanes];
    java.util.Arrays.fill(trajectories, -1);
    return new NoiseGenerator() {
      @Override
      public void assign(int lane, long trajectory) {
        Check.inRange(lane, 0, lanes - 1, "lane");
        checkTrajectory(trajectory);
        trajectories[lane] = trajectory;
      }

      @Override
      public void fill(long step, int use, Amplitudes normals) {
        Check.inRange(use, 0, LARGEST_USE, "use");
        Check.notNull(normals, "normals").requireShape(region, components, lanes);
        for (int lane = 0; lane < lanes; lane++) {
          checkAssigned(lane, trajectories[lane]);
          ZigguratSampler.NormalizedGaussian gaussian =
              ZigguratSampler.NormalizedGaussian.of(
                  provider(seed, trajectories[lane], step, use));
          for (int c = 0; c < components; c++) {
            double[] re = normals.re(c);
            double[] im = normals.im(c);
            for (int i = lane; i < re.length; i += lanes) {
              re[i] = gaussian.sample();
              im[i] = gaussian.sample();
            }
          }
        }
      }
    };
  }

  @Override
  public UniformRandomProvider initialState(long trajectory) {
    return provider(seed, trajectory, 0, INITIAL_STATE);
  }

  @Override
  public long seed() {
    return seed;
  }

  @Override
  public String toString() {
    return "RandomStreams: Apache Commons RNG Philox4x64, seed=" + seed;
  }
}
