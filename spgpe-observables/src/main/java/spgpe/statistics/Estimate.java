package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * A measured value with its standard error. Immutable and thread-safe.
 *
 * @param value estimate
 * @param standardError standard deviation of the estimate, same unit as the value; NaN if it could
 *     not be estimated, for example from a single trajectory
 */
public record Estimate(double value, double standardError) {
  /**
   * Checks both numbers.
   *
   * @param value estimate
   * @param standardError standard deviation of the estimate, or NaN
   * @throws IllegalArgumentException if the value is not finite or the error is negative or
   *     infinite
   */
  public Estimate {
    Check.finite(value, "value");
    Check.argument(
        Double.isNaN(standardError)
            || (standardError >= 0 && standardError < Double.POSITIVE_INFINITY),
        "standardError must be finite and >= 0, or NaN if unknown: standardError=%s",
        standardError);
  }

  /**
   * Two-sided normal confidence interval value &#177; z standardError.
   *
   * @param level confidence level, between 0 and 1, for example 0.95
   * @return the interval
   * @throws IllegalArgumentException if the level is not inside (0, 1)
   * @throws IllegalStateException if the standard error is not known
   */
  public Interval interval(double level) {
    Check.state(
        !Double.isNaN(standardError),
        "an interval needs a standard error: standardError=NaN; average more trajectories");
    double half = Quantiles.twoSidedNormal(level) * standardError;
    return new Interval(value - half, value + half);
  }

  /**
   * Distance of the estimate from a reference value in standard errors.
   *
   * @param reference value to compare with
   * @return (value - reference) / standardError; infinite or NaN if the standard error is zero
   * @throws IllegalArgumentException if the reference is not finite
   */
  public double deviationFrom(double reference) {
    return (value - Check.finite(reference, "reference")) / standardError;
  }
}
