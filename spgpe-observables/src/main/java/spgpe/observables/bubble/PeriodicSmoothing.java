package spgpe.observables.bubble;

import spgpe.internal.check.Check;

/** Smoothing of a profile on a ring with a Gaussian. */
final class PeriodicSmoothing {
  /** Beyond this many standard deviations the Gaussian, 1e-8 of its maximum, is cut. */
  private static final double CUT = 6;

  private final int points;
  private final int reach;
  private final double[] weights;
  /** The profile with its ends repeated on both sides. */
  private final double[] wrapped;

  PeriodicSmoothing(int points, double spacing, double smoothing) {
    double[] kernel = kernel(points, spacing, smoothing);
    int far = 0;
    for (int r = 0; r <= points / 2; r++) {
      far = kernel[r] > 0 ? r : far;
    }
    this.points = points;
    this.reach = far;
    this.weights = kernel;
    this.wrapped = new double[points + 2 * far];
  }

  /** Weights by distance around the ring, index 0..points-1, with sum 1. */
  static double[] kernel(int points, double spacing, double smoothing) {
    Check.notNegative(smoothing, "smoothing (length)");
    double[] kernel = new double[points];
    double sum = 0;
    for (int i = 0; i < points; i++) {
      double r = Math.min(i, points - i) * spacing;
      kernel[i] =
          smoothing == 0
              ? (i == 0 ? 1 : 0)
              : r > CUT * smoothing ? 0 : Math.exp(-r * r / (2 * smoothing * smoothing));
      sum += kernel[i];
    }
    for (int i = 0; i < points; i++) {
      kernel[i] /= sum;
    }
    return kernel;
  }

  void apply(double[] profile, double[] result) {
    System.arraycopy(profile, points - reach, wrapped, 0, reach);
    System.arraycopy(profile, 0, wrapped, reach, points);
    System.arraycopy(profile, 0, wrapped, reach + points, reach);
    for (int i = 0; i < points; i++) {
      result[i] = weights[0] * profile[i];
    }
    for (int r = 1; r <= reach; r++) {
      // the point opposite on the ring is reached from both sides
      double weight = 2 * r == points ? weights[r] / 2 : weights[r];
      add(weight, reach - r, reach + r, result);
    }
  }

  private void add(double weight, int behind, int ahead, double[] result) {
    for (int i = 0; i < points; i++) {
      result[i] += weight * (wrapped[i + behind] + wrapped[i + ahead]);
    }
  }
}
