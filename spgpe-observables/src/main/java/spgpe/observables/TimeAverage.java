package spgpe.observables;

import spgpe.statistics.Estimate;
import java.util.function.ToDoubleFunction;
import java.util.function.UnaryOperator;
import spgpe.internal.check.Check;
import spgpe.internal.measure.ClusterMoments;
import spgpe.internal.measure.SampleWindow;
import spgpe.run.Accumulator;
import spgpe.run.TrajectoryEnd;

/**
 * Average over a window of time and over trajectories, with the covariance of the averages across
 * trajectories: samples of one trajectory are correlated, trajectories are not.
 *
 * <p>Every sample has the same weight. With n_i samples of mean x_i from trajectory i: m = sum n_i
 * x_i / sum n_i and, to first order (ratio estimator), Cov m = N/(N-1) sum n_i<sup>2</sup> (x_i -
 * m)(x_i - m)<sup>T</sup> / (sum n_i)<sup>2</sup>. Trajectories without a sample in the window do
 * not count. Covariances are kept for samples of at most {@value #COVARIANCE_LIMIT} numbers.
 *
 * <p>{@link #beforeDecay} is the average over a metastable state: it judges a sample only when the
 * run has gone on for a margin of time beyond it, and drops the samples of the last margin before
 * the end of each trajectory, where the decay may have begun.
 */
public final class TimeAverage implements Accumulator<TimeAverage> {
  /** Largest number of values for which the covariance is kept. */
  public static final int COVARIANCE_LIMIT = 1200;

  private final double[] times;
  private final int size;
  private final double start;
  private final double margin;
  private final ClusterMoments closed;
  private final SampleWindow window;
  private double[] mean;
  private double[] squares;
  private long count;
  private ClusterMoments trajectory = ClusterMoments.empty(0, false);

  private TimeAverage(
      double[] times, int size, double start, double margin, ClusterMoments closed) {
    this.times = times;
    this.size = size;
    this.start = start;
    this.margin = margin;
    this.closed = closed;
    this.window = new SampleWindow(times, start, margin);
    this.mean = new double[0];
    this.squares = new double[0];
  }

  /**
   * Makes an empty accumulator of all samples.
   *
   * @param times scheduled times
   * @param size numbers in each sample
   */
  public TimeAverage(double[] times, int size) {
    this(times, size, 0, 0, ClusterMoments.empty(size, size <= COVARIANCE_LIMIT));
  }

  /**
   * An average from a time on, when the start is forgotten.
   *
   * @param start first time that counts, finite and not negative
   * @return factory for a recording
   * @throws IllegalArgumentException if the time is out of range
   */
  public static Accumulator.Factory<TimeAverage> from(double start) {
    return beforeDecay(start, 0);
  }

  /**
   * An average over a metastable state. A sample at time t of a trajectory that ended at T counts
   * if t &ge; start and T - t &gt; margin, however the trajectory ended. (At the end of the run a
   * decay may be under way as well.)
   *
   * @param start first time that counts, finite and not negative
   * @param margin time before the end that does not count, finite and not negative; 0 takes all
   * @return factory for a recording
   * @throws IllegalArgumentException if a time is out of range
   */
  public static Accumulator.Factory<TimeAverage> beforeDecay(double start, double margin) {
    Check.notNegative(start, "start (time)");
    Check.notNegative(margin, "margin (time)");
    return (times, size) ->
        new TimeAverage(
            times, size, start, margin,
            ClusterMoments.empty(size, size <= COVARIANCE_LIMIT));
  }

  @Override
  public void add(int sample, double[] values) {
    window.add(sample, values, this::take);
  }

  @Override
  public void finish(TrajectoryEnd end) {
    window.finish(end.time(), this::take);
    if (count > 0) {
      trajectory = ClusterMoments.ofCluster(count, mean, squares, closed.keepsCovariance());
    }
    mean = new double[0];
    squares = new double[0];
    count = 0;
  }

  private void take(int sample, double[] values) {
    if (count == 0) {
      mean = new double[size];
      squares = new double[size];
    }
    count++;
    double share = 1.0 / count;
    for (int i = 0; i < size; i++) {
      double delta = values[i] - mean[i];
      mean[i] += delta * share;
      squares[i] += delta * (values[i] - mean[i]);
    }
  }

  private ClusterMoments sums() {
    return trajectory.clusters() == 0 ? closed : closed.mergedWith(trajectory);
  }

  @Override
  public TimeAverage mergedWith(TimeAverage later) {
    Check.argument(
        size == later.size && start == later.start && margin == later.margin,
        "averages must be of the same size and window: size=%s, other size=%s, start=%s, other"
            + " start=%s, margin=%s, other margin=%s",
        size, later.size, start, later.start, margin, later.margin);
    return new TimeAverage(times, size, start, margin, sums().mergedWith(later.sums()));
  }

  /**
   * How many numbers a sample has.
   *
   * @return size of the observable
   */
  public int size() {
    return size;
  }

  /**
   * Trajectories that contributed.
   *
   * @return count
   */
  public long trajectories() {
    return sums().clusters();
  }

  /**
   * Samples that contributed.
   *
   * @return count
   */
  public long samples() {
    return sums().samples();
  }

  /**
   * Average of a number.
   *
   * @param i index of the number
   * @return mean; NaN without samples
   */
  public double mean(int i) {
    return sums().mean(Check.inRange(i, 0, size - 1, "index of the number"));
  }

  /**
   * Averages of all numbers, for example of a profile.
   *
   * @return new array; NaN without samples
   */
  public double[] means() {
    ClusterMoments sums = sums();
    double[] means = new double[size];
    for (int i = 0; i < size; i++) {
      means[i] = sums.mean(i);
    }
    return means;
  }

  /**
   * Standard error of the average across trajectories.
   *
   * @param i index of the number
   * @return standard error; NaN with fewer than two trajectories
   */
  public double standardError(int i) {
    return Math.sqrt(sums().covariance(Check.inRange(i, 0, size - 1, "index of the number"), i));
  }

  /**
   * Average with its error.
   *
   * @param i index of the number
   * @return estimate
   */
  public Estimate estimate(int i) {
    return new Estimate(mean(i), standardError(i));
  }

  /**
   * Variance of single samples about the average, pooled over time and trajectories: the size of
   * the fluctuations, not of the error.
   *
   * @param i index of the number
   * @return variance (divisor n-1); NaN with fewer than two samples
   */
  public double sampleVariance(int i) {
    return sums().sampleVariance(Check.inRange(i, 0, size - 1, "index of the number"));
  }

  /**
   * All averages with their covariance.
   *
   * @return the estimates
   * @throws IllegalStateException with fewer than two trajectories, or if the samples are too long
   *     for a covariance
   */
  public Estimates estimates() {
    return derivedVector(values -> values);
  }

  /**
   * A function of the averages, for example a ratio, with its error by linear propagation of the
   * covariance.
   *
   * @param function function of all averages; must not change its argument
   * @return estimate
   * @throws IllegalStateException with fewer than two trajectories, or if the samples are too long
   *     for a covariance
   */
  public Estimate derived(ToDoubleFunction<double[]> function) {
    Check.notNull(function, "function");
    UnaryOperator<double[]> vector = v -> new double[] {function.applyAsDouble(v)};
    return derivedVector(vector).get(0);
  }

  /**
   * Several functions of the averages with their covariance by linear propagation. Derivatives are
   * central differences over a thousandth of each standard error. Valid if the functions are nearly
   * linear over the errors.
   *
   * @param function function of all averages; returns a new array, must not change its argument
   * @return estimates
   * @throws IllegalStateException with fewer than two trajectories, or if the samples are too long
   *     for a covariance
   */
  public Estimates derivedVector(UnaryOperator<double[]> function) {
    Check.notNull(function, "function");
    ClusterMoments sums = sums();
    Check.state(
        sums.clusters() >= 2,
        "errors need at least two trajectories with samples in the window: trajectories=%s,"
            + " start=%s, margin=%s", sums.clusters(), start, margin);
    Check.state(
        sums.keepsCovariance(),
        "the covariance is kept for at most %s numbers: numbers=%s; observe fewer",
        COVARIANCE_LIMIT, size);
    return Propagation.through(sums, function);
  }

  @Override
  public String toString() {
    return "TimeAverage of " + size + " numbers from t=" + start
        + (margin > 0 ? ", without the last " + margin + " before the end" : "")
        + ": " + samples() + " samples of " + trajectories() + " trajectories";
  }
}
