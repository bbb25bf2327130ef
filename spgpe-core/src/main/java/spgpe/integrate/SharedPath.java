package spgpe.integrate;

import org.apache.commons.rng.UniformRandomProvider;
import spgpe.internal.check.Check;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;

/**
 * Random streams whose Brownian path is the same for different steps: the normals of a long step
 * are sums of those of the short steps inside it. Streams with the same base and ratios 1, 2, 4
 * serve runs at dt, 2 dt, 4 dt. For measuring strong and weak orders with paired paths; slower than
 * the base by about twice the ratio. Immutable and thread-safe.
 */
public final class SharedPath implements RandomStreams {
  private final RandomStreams base;
  private final int ratio;

  private SharedPath(RandomStreams base, int ratio) {
    this.base = base;
    this.ratio = ratio;
  }

  /**
   * Makes the streams.
   *
   * @param base where the normals of the shortest step come from
   * @param ratio number of shortest steps in one step of the run, 1 to 1048576
   * @return the streams
   * @throws IllegalArgumentException if the ratio is out of range
   */
  public static SharedPath of(RandomStreams base, int ratio) {
    return new SharedPath(
        Check.notNull(base, "random streams"), Check.inRange(ratio, 1, 1 << 20, "ratio of steps"));
  }

  @Override
  public NoiseGenerator generator(CoherentRegion region, int components, int lanes) {
    return new Generator(
        base.generator(region, components, lanes), ratio,
        new Amplitudes(region, components, lanes));
  }

  @Override
  public UniformRandomProvider initialState(long trajectory) {
    return base.initialState(trajectory);
  }

  @Override
  public long seed() {
    return base.seed();
  }

  @Override
  public String toString() {
    return "SharedPath: " + ratio + " shortest steps in one, of " + base;
  }

  /** The path is cut into halves of the shortest step; half n is the base's fill(n, 0). */
  private static final class Generator implements NoiseGenerator {
    private final NoiseGenerator base;
    private final int ratio;
    private final Amplitudes half;

    Generator(NoiseGenerator base, int ratio, Amplitudes half) {
      this.base = base;
      this.ratio = ratio;
      this.half = half;
    }

    @Override
    public void assign(int lane, long trajectory) {
      base.assign(lane, trajectory);
    }

    @Override
    public void fill(long step, int use, Amplitudes normals) {
      Check.argument(
          step >= 0 && step < (1L << 46) / ratio,
          "step number must lie in 0..2^46/ratio: step=%s, ratio=%s", step, ratio);
      normals.clear();
      long middle = 2 * step * ratio;
      if (use == NoiseUse.START) {
        add(middle, 1 / Math.sqrt(ratio), normals);
      } else if (use == NoiseUse.WHOLE) {
        add(middle - ratio, 1 / Math.sqrt(2.0 * ratio), normals);
        add(middle, 1 / Math.sqrt(2.0 * ratio), normals);
      } else if (use == NoiseUse.REST_OF_HALF) {
        // orthogonal to the whole: (first half - second half)/sqrt(2)
        add(middle - ratio, 1 / Math.sqrt(2.0 * ratio), normals);
        add(middle, -1 / Math.sqrt(2.0 * ratio), normals);
      } else {
        throw new IllegalArgumentException(
            "shared paths know the uses of AbstractStepper only: use=" + use);
      }
    }

    private void add(long firstHalf, double factor, Amplitudes normals) {
      Check.argument(
          firstHalf >= 0, "the first step of a run must start it: half step=%s", firstHalf);
      for (long n = firstHalf; n < firstHalf + ratio; n++) {
        base.fill(n, 0, half);
        for (int c = 0; c < normals.components(); c++) {
          add(factor, half.re(c), normals.re(c));
          add(factor, half.im(c), normals.im(c));
        }
      }
    }

    private static void add(double factor, double[] from, double[] to) {
      for (int e = 0; e < to.length; e++) {
        to[e] += factor * from[e];
      }
    }
  }
}
