package spgpe.statistics;

import org.apache.commons.math3.distribution.BetaDistribution;
import org.apache.commons.math3.distribution.ChiSquaredDistribution;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.apache.commons.math3.special.Beta;
import org.apache.commons.math3.special.Erf;
import org.apache.commons.math3.special.Gamma;
import spgpe.internal.check.Check;

/** Distribution functions; the only place of this package that touches the mathematics library. */
final class Quantiles {
  private static final double SOLVER_ACCURACY = 1e-12;
  private static final int NEWTON_STEPS = 3;

  // Beyond this the complement of a level has too few digits left.
  private static final double MAX_LEVEL = 1 - 1e-12;

  private Quantiles() {}

  static double checkLevel(double level) {
    Check.argument(
        level > 0 && level <= MAX_LEVEL,
        "level must lie inside (0, 1), at most %s: level=%s",
        MAX_LEVEL,
        level);
    return level;
  }

  /** Half of what a two-sided interval leaves out. */
  static double tail(double level) {
    return 0.5 * (1 - checkLevel(level));
  }

  static double twoSidedNormal(double level) {
    double tail = tail(level);
    double x = -new NormalDistribution(null, 0, 1).inverseCumulativeProbability(tail);
    // Newton steps on the tail lift the library's inverse error function to rounding accuracy.
    for (int i = 0; i < NEWTON_STEPS; i++) {
      double density = Math.exp(-0.5 * x * x) / Math.sqrt(2 * Math.PI);
      x += (0.5 * Erf.erfc(x / Math.sqrt(2)) - tail) / density;
    }
    return x;
  }

  static double chiSquare(double probability, double degreesOfFreedom) {
    ChiSquaredDistribution law =
        new ChiSquaredDistribution(null, degreesOfFreedom, SOLVER_ACCURACY);
    double x = law.inverseCumulativeProbability(probability);
    // The solver's accuracy is absolute; Newton steps make tiny quantiles relatively accurate.
    for (int i = 0; i < NEWTON_STEPS && x > 0; i++) {
      double next = x - (law.cumulativeProbability(x) - probability) / law.density(x);
      x = next > 0 ? next : 0.5 * x;
    }
    return x;
  }

  /** Value exceeded with the given probability; accurate for small ones, unlike 1 - tail. */
  static double chiSquareExceeded(double tail, double degreesOfFreedom) {
    ChiSquaredDistribution law =
        new ChiSquaredDistribution(null, degreesOfFreedom, SOLVER_ACCURACY);
    double x = law.inverseCumulativeProbability(1 - tail);
    for (int i = 0; i < NEWTON_STEPS; i++) {
      x += (chiSquareUpperTail(x, degreesOfFreedom) - tail) / law.density(x);
    }
    return x;
  }

  static double chiSquareUpperTail(double value, double degreesOfFreedom) {
    return Gamma.regularizedGammaQ(0.5 * degreesOfFreedom, 0.5 * value);
  }

  static double beta(double probability, double a, double b) {
    BetaDistribution law = new BetaDistribution(null, a, b, SOLVER_ACCURACY);
    double x = law.inverseCumulativeProbability(probability);
    for (int i = 0; i < NEWTON_STEPS && x > 0 && x < 1; i++) {
      double next = x - (law.cumulativeProbability(x) - probability) / law.density(x);
      x = next > 0 && next < 1 ? next : x;
    }
    return x;
  }

  /** Probability of at most k successes in n trials. */
  static double binomialAtMost(long k, long n, double success) {
    return k >= n ? 1 : Beta.regularizedBeta(1 - success, n - k, k + 1.0);
  }

  /** Two-sided exact binomial p-value: twice the smaller tail, at most 1. */
  static double binomialTwoSided(long k, long n, double success) {
    double below = binomialAtMost(k, n, success);
    double above = k == 0 ? 1 : Beta.regularizedBeta(success, k, n - k + 1.0);
    return Math.min(1, 2 * Math.min(below, above));
  }
}
