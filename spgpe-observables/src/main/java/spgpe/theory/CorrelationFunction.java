package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * Stationary correlation function on the infinite line as a sum of decaying exponentials, {@code
 * C(x) = sum_n w_n exp(-r_n |x|)}. Immutable.
 */
public final class CorrelationFunction {
  private final double[] weights;
  private final double[] rates;

  CorrelationFunction(double[] weights, double[] rates) {
    this.weights = weights.clone();
    this.rates = rates.clone();
  }

  /**
   * Value at a distance.
   *
   * @param distance distance x (length), finite; the sign does not matter
   * @return C(x) in the unit of the squared observable
   * @throws IllegalArgumentException if the distance is not finite
   */
  public double at(double distance) {
    double x = Math.abs(Check.finite(distance, "distance"));
    double sum = 0;
    for (int i = 0; i < weights.length; i++) {
      sum += weights[i] * Math.exp(-rates[i] * x);
    }
    return sum;
  }

  /**
   * Asymptotic decay length, the inverse of the smallest rate that carries weight.
   *
   * @return the correlation length (length)
   */
  public double decayLength() {
    return 1 / slowestRate();
  }

  double slowestRate() {
    double slowest = Double.POSITIVE_INFINITY;
    double total = 0;
    for (double w : weights) {
      total += w;
    }
    for (int i = 0; i < rates.length; i++) {
      // Rounding lets neighbouring symmetry classes leak in with weights near 1e-30.
      if (weights[i] > 1e-13 * total) {
        slowest = Math.min(slowest, rates[i]);
      }
    }
    return slowest;
  }

  CorrelationFunction scaled(double weightFactor, double rateFactor) {
    double[] w = weights.clone();
    double[] r = rates.clone();
    VectorMath.scale(w, weightFactor);
    VectorMath.scale(r, rateFactor);
    return new CorrelationFunction(w, r);
  }
}
