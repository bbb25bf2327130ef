package spgpe.observables.correlation;

import spgpe.internal.check.Check;
import spgpe.observables.Estimates;
import spgpe.observables.TimeAverage;
import spgpe.run.Accumulator;
import spgpe.run.TrajectoryEnd;

/**
 * Correlation in time of each number of an observable with itself, averaged over time origins and
 * trajectories:
 *
 * <pre>real:     C(tau) = &lt;A(t) A(t + tau)&gt;
 * complex:  C(tau) = &lt;A^*(t) A(t + tau)&gt;,  A = A_0 + i A_1 from pairs of numbers.</pre>
 *
 * <p>Samples must come at equal distances. Only origins for which every lag has a sample are used,
 * so that all lags have the same statistics. Observe with {@code ModeAmplitude} for the correlation
 * of a mode, which for an ideal gas is exp[-(i + gamma)(eps - mu) tau].
 */
public final class TemporalCorrelation implements Accumulator<TemporalCorrelation> {
  private static final double SPACING_TOLERANCE = 1e-6;

  private final double[] times;
  private final int size;
  private final int lags;
  private final double start;
  private final boolean complex;
  private final TimeAverage products;
  private final double[][] recent;
  private final double[] row;
  private long seen;

  private TemporalCorrelation(
      double[] times, int size, int lags, double start, boolean complex, TimeAverage products,
      boolean open) {
    this.times = times;
    this.size = size;
    this.lags = lags;
    this.start = start;
    this.complex = complex;
    this.products = products;
    this.recent = open ? new double[lags + 1][size] : new double[0][];
    this.row = open ? new double[rowLength(size, lags)] : new double[0];
  }

  /**
   * Correlation of real numbers.
   *
   * @param lags number of lags beyond 0, in samples, at least 1
   * @param start first time that counts, finite and not negative
   * @return factory for a recording
   * @throws IllegalArgumentException if a value is out of range; when used, if the scheduled times
   *     are not equally spaced
   */
  public static Accumulator.Factory<TemporalCorrelation> real(int lags, double start) {
    return factory(lags, start, 0, false);
  }

  /**
   * Correlation of complex numbers given as pairs (re, im).
   *
   * @param lags number of lags beyond 0, in samples, at least 1
   * @param start first time that counts, finite and not negative
   * @return factory for a recording
   * @throws IllegalArgumentException if a value is out of range; when used, if the scheduled times
   *     are not equally spaced or the observable has an odd number of numbers
   */
  public static Accumulator.Factory<TemporalCorrelation> complex(int lags, double start) {
    return factory(lags, start, 0, true);
  }

  /**
   * Correlation of real numbers in a metastable state: without the last margin of time before the
   * end of each trajectory, see {@link TimeAverage#beforeDecay}.
   *
   * @param lags number of lags beyond 0, in samples, at least 1
   * @param start first time that counts, finite and not negative
   * @param margin time before the end that does not count, finite and not negative
   * @return factory for a recording
   * @throws IllegalArgumentException if a value is out of range; when used, if the scheduled times
   *     are not equally spaced
   */
  public static Accumulator.Factory<TemporalCorrelation> realBeforeDecay(
      int lags, double start, double margin) {
    return factory(lags, start, margin, false);
  }

  private static Accumulator.Factory<TemporalCorrelation> factory(
      int lags, double start, double margin, boolean complex) {
    Check.inRange(lags, 1, 1 << 20, "lags (samples)");
    Check.notNegative(start, "start (time)");
    Accumulator.Factory<TimeAverage> average = TimeAverage.beforeDecay(0, margin);
    return (times, size) -> {
      Check.argument(
          !complex || size % 2 == 0,
          "complex numbers must come in pairs: numbers=%s", size);
      requireEqualSpacing(times);
      return new TemporalCorrelation(
          times, size, lags, start, complex, average.create(times, rowLength(size, lags)), true);
    };
  }

  /** Products for every lag, then the numbers themselves. */
  private static int rowLength(int size, int lags) {
    return Math.multiplyExact(size, lags + 2);
  }

  private static void requireEqualSpacing(double[] times) {
    for (int i = 2; i < times.length; i++) {
      double expected = times[1] - times[0];
      double found = times[i] - times[i - 1];
      Check.argument(
          Math.abs(found - expected) <= SPACING_TOLERANCE * expected,
          "a correlation in time needs equally spaced samples: spacing=%s, times[%s]-times[%s]=%s;"
              + " use Schedule.every", expected, i, i - 1, found);
    }
  }

  @Override
  public void add(int sample, double[] values) {
    if (times[sample] < start * (1 - SPACING_TOLERANCE)) {
      return;
    }
    System.arraycopy(values, 0, recent[(int) (seen % (lags + 1))], 0, size);
    seen++;
    if (seen <= lags) {
      return;
    }
    double[] origin = recent[(int) (seen % (lags + 1))];
    for (int lag = 0; lag <= lags; lag++) {
      double[] later = recent[(int) ((seen + lag) % (lags + 1))];
      for (int i = 0; i < size; i++) {
        row[lag * size + i] = complex ? product(origin, later, i) : origin[i] * later[i];
      }
    }
    System.arraycopy(origin, 0, row, (lags + 1) * size, size);
    products.add(sample, row);
  }

  private static double product(double[] a, double[] b, int i) {
    return i % 2 == 0
        ? a[i] * b[i] + a[i + 1] * b[i + 1]
        : a[i - 1] * b[i] - a[i] * b[i - 1];
  }

  @Override
  public void finish(TrajectoryEnd end) {
    products.finish(end);
  }

  @Override
  public TemporalCorrelation mergedWith(TemporalCorrelation later) {
    Check.argument(
        size == later.size && lags == later.lags && start == later.start
            && complex == later.complex,
        "correlations must be of the same size, lags and start: size=%s, other size=%s, lags=%s,"
            + " other lags=%s", size, later.size, lags, later.lags);
    return new TemporalCorrelation(
        times, size, lags, start, complex, products.mergedWith(later.products), false);
  }

  /**
   * Trajectories that contributed.
   *
   * @return count
   */
  public long trajectories() {
    return products.trajectories();
  }

  /**
   * C(tau) of a number (complex: its real part for an even index, its imaginary part for an odd
   * one).
   *
   * @param i index of the number
   * @return correlation as a function of tau, with errors
   * @throws IllegalStateException with fewer than two trajectories
   */
  public CorrelationFunction raw(int i) {
    Check.inRange(i, 0, size - 1, "index of the number");
    return function(
        products.derivedVector(
            v -> {
              double[] c = new double[lags + 1];
              for (int lag = 0; lag <= lags; lag++) {
                c[lag] = v[lag * size + i];
              }
              return c;
            }));
  }

  /**
   * C(tau) - &lt;A&gt;<sup>2</sup> of a real number.
   *
   * @param i index of the number
   * @return correlation as a function of tau, with errors
   * @throws IllegalStateException with fewer than two trajectories, or for complex numbers
   */
  public CorrelationFunction connected(int i) {
    Check.inRange(i, 0, size - 1, "index of the number");
    Check.state(!complex, "the connected correlation is for real numbers: use raw");
    return function(
        products.derivedVector(
            v -> {
              double mean = v[(lags + 1) * size + i];
              double[] c = new double[lags + 1];
              for (int lag = 0; lag <= lags; lag++) {
                c[lag] = v[lag * size + i] - mean * mean;
              }
              return c;
            }));
  }

  private CorrelationFunction function(Estimates estimates) {
    double spacing = times.length < 2 ? 1 : times[1] - times[0];
    double[] tau = new double[lags + 1];
    for (int lag = 0; lag <= lags; lag++) {
      tau[lag] = lag * spacing;
    }
    return new CorrelationFunction(tau, estimates, Double.POSITIVE_INFINITY, 0);
  }
}
