package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * Exact comparison of two independent rates: given the total number of events, the number in the
 * first run is binomial. Immutable and thread-safe.
 *
 * <p>Source: J. Przyborowski and H. Wilenski, Biometrika 31, 313 (1940); interval of C. J. Clopper
 * and E. S. Pearson, Biometrika 26, 404 (1934) (both from memory).
 *
 * @param numerator first rate
 * @param denominator second rate
 */
public record RateRatio(RateEstimate numerator, RateEstimate denominator) {
  /**
   * Checks that there is something to compare.
   *
   * @param numerator first rate
   * @param denominator second rate
   * @throws IllegalArgumentException if an argument is null or neither run has an event
   */
  public RateRatio {
    Check.notNull(numerator, "numerator");
    Check.notNull(denominator, "denominator");
    Check.argument(
        numerator.events() + denominator.events() > 0,
        "two rates without any event cannot be compared: numerator.events=0,"
            + " denominator.events=0");
  }

  /**
   * Ratio of the two estimates.
   *
   * @return numerator over denominator; infinite if the denominator has no event
   */
  public double ratio() {
    return numerator.rate() / denominator.rate();
  }

  /**
   * Exact two-sided confidence interval of the ratio of the true rates.
   *
   * @param level confidence level, between 0 and 1
   * @return the interval; the upper end is infinite if the denominator has no event
   * @throws IllegalArgumentException if the level is not inside (0, 1)
   */
  public Interval interval(double level) {
    double tail = Quantiles.tail(level);
    long k = numerator.events();
    long rest = denominator.events();
    double lower = k == 0 ? 0 : Quantiles.beta(tail, k, rest + 1.0);
    double above = rest == 0 ? 0 : Quantiles.beta(tail, rest, k + 1.0);
    double scale = denominator.exposure() / numerator.exposure();
    return new Interval(scale * lower / (1 - lower), scale * (1 - above) / above);
  }

  /**
   * Two-sided exact test of equal rates.
   *
   * @return p-value, twice the smaller binomial tail and at most 1
   */
  public double pValue() {
    long k = numerator.events();
    double share = numerator.exposure() / (numerator.exposure() + denominator.exposure());
    return Quantiles.binomialTwoSided(k, k + denominator.events(), share);
  }
}
