package spgpe.observables.correlation;

import spgpe.internal.check.Check;
import spgpe.observables.Estimates;

/**
 * A correlation as a function of distance (or time), with the covariance of its values across
 * trajectories. Immutable and thread-safe.
 */
public final class CorrelationFunction {
  private final double[] distances;
  private final Estimates estimates;
  private final double period;
  private final double resolution;

  CorrelationFunction(
      double[] distances, Estimates estimates, double period, double resolution) {
    this.distances = distances;
    this.estimates = estimates;
    this.period = period;
    this.resolution = resolution;
  }

  /**
   * Makes a correlation function from other sources, for example to fit it.
   *
   * @param distances distances, increasing
   * @param estimates one value for each distance
   * @param period length of the ring; infinite if there is none
   * @return the correlation function
   * @throws IllegalArgumentException if lengths differ or the distances do not increase
   */
  public static CorrelationFunction of(double[] distances, Estimates estimates, double period) {
    Check.notNull(distances, "distances");
    Check.notNull(estimates, "estimates");
    Check.argument(
        distances.length == estimates.size(),
        "there must be one value for each distance: distances=%s, values=%s",
        distances.length, estimates.size());
    for (int i = 0; i < distances.length; i++) {
      Check.argument(
          Double.isFinite(distances[i]) && (i == 0 || distances[i] > distances[i - 1]),
          "distances must be finite and increase: distances[%s]=%s", i, distances[i]);
    }
    Check.argument(period > 0, "period (length of the ring) must be > 0: period=%s", period);
    return new CorrelationFunction(distances.clone(), estimates, period, 0);
  }

  /**
   * Number of distances.
   *
   * @return count
   */
  public int size() {
    return distances.length;
  }

  /**
   * A distance.
   *
   * @param i index
   * @return distance
   */
  public double distance(int i) {
    return distances[i];
  }

  /**
   * Value at a distance.
   *
   * @param i index
   * @return estimate
   */
  public double value(int i) {
    return estimates.value(i);
  }

  /**
   * Standard error of a value.
   *
   * @param i index
   * @return standard error
   */
  public double standardError(int i) {
    return estimates.standardError(i);
  }

  /**
   * The values with their covariance.
   *
   * @return estimates in the order of the distances
   */
  public Estimates estimates() {
    return estimates;
  }

  /**
   * Length of the ring.
   *
   * @return period; infinite if there is none, as on a plane
   */
  public double period() {
    return period;
  }

  /**
   * Distance over which a field of the kept modes can change, L/(2 n_max + 1). Points of a finer
   * grid are interpolations of each other: their covariance is nearly singular, and fits leave them
   * out.
   *
   * @return resolution; 0 if every distance counts
   */
  public double resolution() {
    return resolution;
  }
}
