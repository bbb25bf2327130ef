package spgpe.observables;

/**
 * A measured number. Immutable and thread-safe.
 *
 * @param value estimate
 * @param standardError one standard deviation of the estimate; NaN if it could not be estimated
 */
public record Measured(double value, double standardError) {
  /**
   * Distance from an expected value in standard errors.
   *
   * @param expected value expected
   * @return (value - expected)/standardError
   */
  public double deviationFrom(double expected) {
    return (value - expected) / standardError;
  }

  @Override
  public String toString() {
    return value + " +- " + standardError;
  }
}
