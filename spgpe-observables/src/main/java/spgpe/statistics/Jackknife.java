package spgpe.statistics;

import java.util.function.ToDoubleFunction;
import spgpe.internal.check.Check;

/**
 * Delete-one jackknife: error and bias of a quantity made from averages over independent
 * trajectories. With f the value from all n trajectories and f_i the value without trajectory i:
 *
 * <pre>
 * biasCorrected  = n f - (n - 1) mean(f_i)
 * standardError&#178; = (n - 1)/n sum (f_i - mean(f_i))&#178;
 * </pre>
 *
 * <p>All methods are stateless and thread-safe.
 *
 * <p>Sources: M. H. Quenouille, Biometrika 43, 353 (1956); J. W. Tukey, Ann. Math. Stat. 29, 614
 * (1958) (both from memory).
 */
public final class Jackknife {
  private Jackknife() {}

  /**
   * Result of a jackknife.
   *
   * @param value the quantity from all trajectories
   * @param biasCorrected the same with the leading bias removed
   * @param standardError standard error of either
   */
  public record Result(double value, double biasCorrected, double standardError) {
    /**
     * Value and error without the bias correction.
     *
     * @return the estimate
     */
    public Estimate estimate() {
      return new Estimate(value, standardError);
    }
  }

  /**
   * Ratio of two averages, for instance &lt;n&#178;&gt; over &lt;n&gt; from one pair of numbers per
   * trajectory.
   *
   * @param numerator one number per trajectory
   * @param denominator one number per trajectory, same length
   * @return sum(numerator) / sum(denominator) with its error
   * @throws IllegalArgumentException if an array is null, the lengths differ, there are fewer than
   *     two trajectories, or a ratio is not finite
   */
  public static Result ratio(double[] numerator, double[] denominator) {
    Check.notNull(numerator, "numerator");
    Check.notNull(denominator, "denominator");
    Check.argument(
        numerator.length == denominator.length,
        "numerator and denominator must have the same length: numerator.length=%s,"
            + " denominator.length=%s",
        numerator.length,
        denominator.length);
    double[][] samples = new double[numerator.length][];
    for (int i = 0; i < samples.length; i++) {
      samples[i] = new double[] {numerator[i], denominator[i]};
    }
    return ofMeans(samples, means -> means[0] / means[1]);
  }

  /**
   * Any function of averages.
   *
   * @param samples samples[i] is the vector of numbers of trajectory i, all of one length; read
   *     only
   * @param function computes the quantity from the vector of averages; the array it gets is valid
   *     during the call only
   * @return the quantity with its error
   * @throws IllegalArgumentException if an argument or a row is null, rows differ in length, there
   *     are fewer than two rows, a number is not finite, or the function returns a value that is
   *     not finite
   */
  public static Result ofMeans(double[][] samples, ToDoubleFunction<double[]> function) {
    Check.notNull(samples, "samples");
    Check.notNull(function, "function");
    int n = samples.length;
    Check.argument(n >= 2, "a jackknife needs at least two trajectories: samples.length=%s", n);
    RunningVectorMoments all = null;
    for (double[] sample : samples) {
      Check.notNull(sample, "samples[i]");
      all = all == null ? RunningVectorMoments.ofDimension(sample.length) : all;
      all.add(sample);
    }
    double[] means = Check.notNull(all, "samples").means();
    double[] without = new double[means.length];
    double[] omitted = new double[n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < without.length; j++) {
        without[j] = means[j] + (means[j] - samples[i][j]) / (n - 1);
      }
      omitted[i] = function.applyAsDouble(without);
    }
    return ofLeaveOneOut(function.applyAsDouble(means), omitted);
  }

  /**
   * A quantity that the caller computed from all trajectories and again without each of them.
   *
   * @param value the quantity from all trajectories
   * @param omitted omitted[i] is the quantity without trajectory i; read only
   * @return the quantity with its error
   * @throws IllegalArgumentException if the array is null, has fewer than two entries, or a number
   *     is not finite
   */
  public static Result ofLeaveOneOut(double value, double[] omitted) {
    Check.notNull(omitted, "omitted");
    int n = omitted.length;
    Check.argument(n >= 2, "a jackknife needs at least two trajectories: omitted.length=%s", n);
    Check.finite(value, "value");
    RunningMoments moments = new RunningMoments();
    for (int i = 0; i < n; i++) {
      Check.argument(
          Double.isFinite(omitted[i]),
          "the quantity must be finite without each single trajectory: omitted[%s]=%s",
          i,
          omitted[i]);
      moments.add(omitted[i]);
    }
    double corrected = value + (n - 1) * (value - moments.mean());
    // (n-1)/n times the sum of squares = (n-1)^2/n times the sample variance.
    return new Result(value, corrected, (n - 1) * moments.standardError());
  }
}
