package spgpe.observables;

import spgpe.statistics.Estimate;
import spgpe.internal.check.Check;

/** Several measured numbers with their covariance. Immutable and thread-safe. */
public final class Estimates {
  private final double[] values;
  private final double[][] covariance;
  private final long trajectories;

  private Estimates(double[] values, double[][] covariance, long trajectories) {
    this.values = values;
    this.covariance = covariance;
    this.trajectories = trajectories;
  }

  /**
   * Makes estimates.
   *
   * @param values the numbers
   * @param covariance their symmetric covariance matrix
   * @param trajectories number of independent trajectories from which the covariance was estimated
   * @return copy of the data
   * @throws IllegalArgumentException if the matrix is not square of the right size, or its diagonal
   *     is negative or not finite
   */
  public static Estimates of(double[] values, double[][] covariance, long trajectories) {
    Check.notNull(values, "values");
    Check.notNull(covariance, "covariance");
    Check.argument(
        covariance.length == values.length,
        "the covariance must have a row for each value: rows=%s, values=%s",
        covariance.length, values.length);
    double[][] copy = new double[values.length][];
    for (int i = 0; i < values.length; i++) {
      Check.notNull(covariance[i], "row of the covariance");
      Check.finite(values[i], "value");
      Check.argument(
          covariance[i].length == values.length,
          "the covariance must be square: row=%s, length=%s, rows=%s",
          i, covariance[i].length, values.length);
      Check.notNegative(covariance[i][i], "variance (diagonal of the covariance)");
      copy[i] = covariance[i].clone();
    }
    return new Estimates(values.clone(), copy, trajectories);
  }

  /**
   * How many numbers there are.
   *
   * @return count
   */
  public int size() {
    return values.length;
  }

  /**
   * Number of independent trajectories behind the covariance.
   *
   * @return count
   */
  public long trajectories() {
    return trajectories;
  }

  /**
   * A value.
   *
   * @param i index
   * @return estimate
   */
  public double value(int i) {
    return values[i];
  }

  /**
   * A standard error.
   *
   * @param i index
   * @return one standard deviation of the estimate
   */
  public double standardError(int i) {
    return Math.sqrt(covariance[i][i]);
  }

  /**
   * A value with its error.
   *
   * @param i index
   * @return estimate
   */
  public Estimate get(int i) {
    return new Estimate(values[i], standardError(i));
  }

  /**
   * Covariance of two estimates.
   *
   * @param i index
   * @param j index
   * @return covariance
   */
  public double covariance(int i, int j) {
    return covariance[i][j];
  }
}
