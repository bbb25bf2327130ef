package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * Closed interval of the real line, as returned for a confidence level. Either end may be infinite.
 * Immutable and thread-safe.
 *
 * @param lower lower end
 * @param upper upper end, not below the lower one
 */
public record Interval(double lower, double upper) {
  /**
   * Checks the order of the ends.
   *
   * @param lower lower end
   * @param upper upper end, not below the lower one
   * @throws IllegalArgumentException if lower is above upper or one of them is NaN
   */
  public Interval {
    Check.argument(lower <= upper, "lower must be <= upper: lower=%s, upper=%s", lower, upper);
  }

  /**
   * Says whether a value lies between the ends, ends included.
   *
   * @param value value to test; NaN is contained in no interval
   * @return true if lower &lt;= value &lt;= upper
   */
  public boolean contains(double value) {
    return value >= lower && value <= upper;
  }

  /**
   * Length of the interval.
   *
   * @return upper minus lower
   */
  public double width() {
    return upper - lower;
  }
}
