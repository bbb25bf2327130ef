package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * Maximum-likelihood estimate of a constant decay rate, events per total exposure, with exact
 * chi-square confidence limits. Immutable and thread-safe.
 *
 * <p>Source: B. Epstein and M. Sobel, J. Am. Stat. Assoc. 48, 486 (1953) for failure censoring;
 * time censoring as in W. Nelson, Applied Life Data Analysis (1982) (both from memory).
 *
 * @param events number of events d
 * @param exposure total time at risk, summed over trajectories
 */
public record RateEstimate(long events, double exposure) {
  /**
   * Checks both numbers.
   *
   * @param events number of events d
   * @param exposure total time at risk, summed over trajectories
   * @throws IllegalArgumentException if events is negative or exposure not positive and finite
   */
  public RateEstimate {
    Check.argument(events >= 0, "events must be >= 0: events=%s", events);
    Check.positive(exposure, "exposure");
  }

  /**
   * Estimate from first-passage data, left truncation included.
   *
   * @param data first-passage data
   * @return the estimate
   * @throws IllegalArgumentException if the data is null or has no exposure
   */
  public static RateEstimate of(SurvivalData data) {
    Check.notNull(data, "data");
    return new RateEstimate(data.eventCount(), data.exposure());
  }

  /**
   * The estimated rate d / exposure.
   *
   * @return events per unit time; 0 without events, see {@link #upperBound(double)} then
   */
  public double rate() {
    return events / exposure;
  }

  /**
   * Large-sample standard error sqrt(d) / exposure.
   *
   * @return the standard error of the rate; NaN without events, when there is only an upper bound
   */
  public double standardError() {
    return events == 0 ? Double.NaN : Math.sqrt(events) / exposure;
  }

  /**
   * Two-sided chi-square confidence interval. Without events it is [0, upper limit of the
   * conservative kind] whatever the kind asked for.
   *
   * @param level confidence level, between 0 and 1
   * @param censoring how the observation ended
   * @return interval of the rate
   * @throws IllegalArgumentException if the level is not inside (0, 1) or the kind is null
   */
  public Interval interval(double level, Censoring censoring) {
    Check.notNull(censoring, "censoring");
    double tail = Quantiles.tail(level);
    double twice = 2.0 * events;
    if (events == 0) {
      return new Interval(0, Quantiles.chiSquareExceeded(tail, 2) / (2 * exposure));
    }
    double below = censoring == Censoring.TIME_CENSORED_CENTRAL ? twice + 1 : twice;
    double above =
        switch (censoring) {
          case FAILURE_CENSORED -> twice;
          case TIME_CENSORED_CONSERVATIVE -> twice + 2;
          case TIME_CENSORED_CENTRAL -> twice + 1;
        };
    return new Interval(
        Quantiles.chiSquare(tail, below) / (2 * exposure),
        Quantiles.chiSquareExceeded(tail, above) / (2 * exposure));
  }

  /**
   * One-sided upper limit for time-censored data, chi-square with 2d + 2 degrees of freedom. At
   * level 0.95 and without events this is 2.9957 / exposure.
   *
   * @param level confidence level, between 0 and 1
   * @return the rate is below this value with at least the stated confidence
   * @throws IllegalArgumentException if the level is not inside (0, 1)
   */
  public double upperBound(double level) {
    return Quantiles.chiSquareExceeded(1 - Quantiles.checkLevel(level), 2.0 * events + 2)
        / (2 * exposure);
  }

  /**
   * Rate per unit of system size, for instance per length.
   *
   * @param size length, area or number of systems the rate belongs to, finite and &gt; 0
   * @return the same events over exposure times size
   * @throws IllegalArgumentException if the size is not positive and finite
   */
  public RateEstimate perSize(double size) {
    return new RateEstimate(events, exposure * Check.positive(size, "size"));
  }

  /**
   * Estimate from the events and exposures of two independent runs of one system.
   *
   * @param other estimate of the other run
   * @return the pooled estimate
   * @throws IllegalArgumentException if the other estimate is null
   */
  public RateEstimate pooledWith(RateEstimate other) {
    Check.notNull(other, "other");
    return new RateEstimate(Math.addExact(events, other.events), exposure + other.exposure);
  }
}
