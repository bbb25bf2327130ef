package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * Integrated autocorrelation time of a stationary series, tau = 1/2 + sum over lags 1..M of the
 * normalised autocorrelation, with the self-consistent window: M is the smallest lag with M &gt;= c
 * tau(M). Uncorrelated values have tau = 1/2; the mean of n values is as good as that of n/(2 tau)
 * independent ones.
 *
 * <p>tau is in units of the sampling interval. The series should be much longer than tau (a hundred
 * times or more), else tau comes out too small. Immutable and thread-safe.
 *
 * <p>Source: N. Madras and A. D. Sokal, J. Stat. Phys. 50, 109 (1988) (from memory).
 *
 * @param tau integrated autocorrelation time in sampling intervals
 * @param window lag M at which the sum was cut
 * @param count length n of the series
 * @param mean mean of the series
 * @param variance lag-zero autocovariance of the series, with divisor n
 */
public record AutocorrelationTime(double tau, int window, int count, double mean, double variance) {
  private static final double DEFAULT_WINDOW_FACTOR = 5;

  /**
   * Estimates tau with window factor c = 5.
   *
   * @param series equally spaced values in the order of time; read only
   * @return the estimate
   * @throws IllegalArgumentException as {@link #of(double[], double)}
   */
  public static AutocorrelationTime of(double[] series) {
    return of(series, DEFAULT_WINDOW_FACTOR);
  }

  /**
   * Estimates tau.
   *
   * @param series equally spaced values in the order of time, at least four; read only
   * @param windowFactor c, finite and &gt; 0; 4 to 10 is usual
   * @return the estimate
   * @throws IllegalArgumentException if the series is null, too short, constant or has a value that
   *     is not finite, if the factor is not positive and finite, if the window does not close
   *     within half of the series, or if the values are so anticorrelated that the sum is not
   *     positive
   */
  public static AutocorrelationTime of(double[] series, double windowFactor) {
    Check.notNull(series, "series");
    Check.positive(windowFactor, "windowFactor");
    int n = series.length;
    Check.argument(n >= 4, "a series of at least four values is needed: length=%s", n);
    RunningMoments moments = new RunningMoments();
    for (double x : series) {
      moments.add(x);
    }
    double mean = moments.mean();
    double variance = covariance(series, mean, 0);
    Check.argument(
        variance > 0,
        "a constant series has no autocorrelation time: all values equal %s",
        series[0]);
    double tau = 0.5;
    for (int lag = 1; lag <= n / 2; lag++) {
      tau += covariance(series, mean, lag) / variance;
      if (lag >= windowFactor * tau) {
        Check.argument(
            tau > 0,
            "the series is too anticorrelated for the window rule, use batch means: tau=%s",
            tau);
        return new AutocorrelationTime(tau, lag, n, mean, variance);
      }
    }
    throw new IllegalArgumentException(
        "the series is too short, its correlations do not decay within half of it: length="
            + n
            + ", tau so far="
            + tau);
  }

  private static double covariance(double[] series, double mean, int lag) {
    double sum = 0;
    int pairs = series.length - lag;
    for (int i = 0; i < pairs; i++) {
      sum += (series[i] - mean) * (series[i + lag] - mean);
    }
    return sum / pairs;
  }

  /**
   * Large-sample standard error of tau, tau sqrt(2 (2M + 1)/n).
   *
   * @return the standard error in sampling intervals
   */
  public double tauStandardError() {
    return tau * Math.sqrt(2 * (2.0 * window + 1) / count);
  }

  /**
   * Number of independent values that would give the mean the same error.
   *
   * @return n/(2 tau)
   */
  public double effectiveSampleSize() {
    return count / (2 * tau);
  }

  /**
   * Mean of the series with its error, correlations included.
   *
   * @return mean with standard error sqrt(2 tau variance / n)
   */
  public Estimate meanEstimate() {
    return new Estimate(mean, Math.sqrt(2 * tau * variance / count));
  }
}
