package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * Exact classical equilibrium of the relative phase alone on the infinite line, densities frozen:
 * {@code H = integral of (n/4) phi'^2 - 2 J n cos phi + kappa n^2 sin^2 phi}.
 *
 * <p>Without kappa this is the sine-Gordon chain and the transfer operator is Mathieu's equation
 * with {@code z = phi/2}, {@code q = 4 J n^2/T^2}, {@code a = 4 n E/T}: Scalapino, Sears, Ferrell,
 * Phys. Rev. B 6, 3409 (1972). With kappa it is solved in the same Fourier basis. Immutable.
 *
 * <p>Limit of validity: frozen densities. Against the exact two-component problem the correlation
 * length of sin phi is right within .6 percent for J up to .05 g n when n is the zero-temperature
 * density {@code (mu + J)/g}; the mean cosine is too high by about .3 T.
 */
public final class PhaseEquilibrium {
  private static final double TOLERANCE = 1e-11;
  private static final int LARGEST_BASIS = 512;

  private final double meanCosine;
  private final double meanCosineSquared;
  private final double freeEnergyPerLength;
  private final CorrelationFunction sine;
  private final CorrelationFunction cosine;
  private final double truncationError;

  private PhaseEquilibrium(
      double density, double coherent, double biquadratic, double temperature) {
    double ratio = density / temperature;
    double q = 4 * coherent * ratio * ratio;
    double p = 4 * biquadratic * density * ratio * ratio;
    Check.argument(
        q + p < 1e8,
        "the temperature is too low for the transfer operator: 4 n^2 (J + kappa n)/T^2=%s must be"
            + " < 1e8 (temperature=%s); use GaussianFluctuations",
        q + p, temperature);
    Solution previous = null;
    Solution current = null;
    double change = Double.POSITIVE_INFINITY;
    for (int size = 24; size <= LARGEST_BASIS && !(change <= TOLERANCE); size = size * 3 / 2) {
      previous = current;
      current = new Solution(q, p, size);
      if (previous != null) {
        change = current.difference(previous);
      }
    }
    if (current == null || !(change <= TOLERANCE)) {
      throw new UnconvergedException(
          "the Fourier basis is not converged: change " + change + " > " + TOLERANCE
              + " with the largest basis at 4 J n^2/T^2=" + q + ", 4 kappa n^3/T^2=" + p
              + "; raise the temperature");
    }
    truncationError = change;
    double rate = temperature / (4 * density);
    meanCosine = current.cosine;
    meanCosineSquared = current.cosineSquared;
    freeEnergyPerLength = temperature * rate * current.ground;
    sine = current.sineCorrelation.scaled(1, rate);
    cosine = current.cosineCorrelation.scaled(1, rate);
  }

  /**
   * Solves for the equilibrium.
   *
   * @param density density n of one component (1/length), greater than zero
   * @param coherentCoupling J (energy), greater than zero
   * @param biquadraticCoupling kappa (energy times length), not negative
   * @param temperature T (energy), greater than zero
   * @return the equilibrium
   * @throws IllegalArgumentException if a value is out of range or the temperature is too low
   * @throws UnconvergedException if the basis does not converge
   */
  public static PhaseEquilibrium of(
      double density, double coherentCoupling, double biquadraticCoupling, double temperature) {
    return new PhaseEquilibrium(
        Check.positive(density, "density"),
        Check.positive(coherentCoupling, "coherentCoupling"),
        Check.notNegative(biquadraticCoupling, "biquadraticCoupling"),
        Check.positive(temperature, "temperature"));
  }

  /**
   * Phase-only approximation of a coupled pair at its zero-temperature true-vacuum density.
   *
   * @param pair parameters with J greater than zero
   * @return the equilibrium at density {@code (mu + J)/g}
   * @throws IllegalArgumentException if that density or J is not positive
   * @throws UnconvergedException if the basis does not converge
   */
  public static PhaseEquilibrium of(CoupledPair pair) {
    Check.notNull(pair, "pair");
    return of(
        pair.trueVacuumDensity(),
        pair.coherentCoupling(),
        pair.biquadraticCoupling(),
        pair.temperature());
  }

  /**
   * Mean cosine of the relative phase.
   *
   * @return {@code <cos phi>}
   */
  public double meanCosine() {
    return meanCosine;
  }

  /**
   * Mean squared cosine of the relative phase.
   *
   * @return {@code <cos^2 phi>}
   */
  public double meanCosineSquared() {
    return meanCosineSquared;
  }

  /**
   * Free energy per length of the relative phase.
   *
   * @return T times the ground-state energy (energy/length)
   */
  public double freeEnergyPerLength() {
    return freeEnergyPerLength;
  }

  /**
   * Correlation of the sine.
   *
   * @return {@code <sin phi(x) sin phi(0)>}
   */
  public CorrelationFunction sineCorrelation() {
    return sine;
  }

  /**
   * Connected correlation of the cosine.
   *
   * @return {@code <cos phi(x) cos phi(0)> - <cos phi>^2}
   */
  public CorrelationFunction cosineCorrelation() {
    return cosine;
  }

  /**
   * Largest relative change at the last basis refinement.
   *
   * @return the estimate of the relative truncation error
   */
  public double truncationError() {
    return truncationError;
  }

  /** Spectrum of {@code -4 d^2/dphi^2 - 2 q cos phi + p sin^2 phi}, even and odd modes. */
  private static final class Solution {
    final double ground;
    final double cosine;
    final double cosineSquared;
    final CorrelationFunction sineCorrelation;
    final CorrelationFunction cosineCorrelation;

    Solution(double q, double p, int size) {
      SymmetricEigen even = SymmetricEigen.of(matrix(q, p, size, true));
      SymmetricEigen odd = SymmetricEigen.of(matrix(q, p, size, false));
      double[] g = even.vector(0);
      ground = even.value(0);
      double[] cos = VectorMath.times(cosineMatrix(size, true), g);
      cosine = VectorMath.dot(g, cos);
      cosineSquared = VectorMath.dot(cos, cos);
      cosineCorrelation = measure(even, cos, 1);
      sineCorrelation = measure(odd, sineTimes(g), 0);
    }

    private CorrelationFunction measure(SymmetricEigen spectrum, double[] image, int first) {
      double[] weights = new double[spectrum.size() - first];
      double[] rates = new double[weights.length];
      for (int i = 0; i < weights.length; i++) {
        double overlap = VectorMath.dot(spectrum.vector(i + first), image);
        weights[i] = overlap * overlap;
        rates[i] = spectrum.value(i + first) - ground;
      }
      return new CorrelationFunction(weights, rates);
    }

    double difference(Solution other) {
      double worst = Math.abs(cosine - other.cosine);
      worst = Math.max(worst, Math.abs(cosineSquared - other.cosineSquared));
      worst = Math.max(worst, relative(sineCorrelation, other.sineCorrelation));
      return Math.max(worst, relative(cosineCorrelation, other.cosineCorrelation));
    }

    private static double relative(CorrelationFunction a, CorrelationFunction b) {
      return Math.abs(a.slowestRate() / b.slowestRate() - 1);
    }

    /** Even basis 1, sqrt2 cos(p phi); odd basis sqrt2 sin(p phi) with p from 1. */
    private static double[][] matrix(double q, double p, int size, boolean even) {
      double[][] cos = cosineMatrix(size + 1, even);
      double[][] h = new double[size][size];
      for (int i = 0; i < size; i++) {
        double order = even ? i : i + 1;
        for (int j = Math.max(0, i - 2); j < Math.min(size, i + 3); j++) {
          // sin^2 = 1 - cos^2; one spare mode keeps the square exact.
          h[i][j] = -2 * q * cos[i][j] - p * VectorMath.dot(cos[i], cos[j]);
        }
        h[i][i] += 4 * order * order + p;
      }
      return h;
    }

    private static double[][] cosineMatrix(int size, boolean even) {
      double[][] cos = new double[size][size];
      for (int i = 0; i + 1 < size; i++) {
        double element = even && i == 0 ? Math.sqrt(0.5) : 0.5;
        cos[i][i + 1] = element;
        cos[i + 1][i] = element;
      }
      return cos;
    }

    /** sin(phi) times an even vector, as an odd vector. */
    private static double[] sineTimes(double[] even) {
      int size = even.length;
      double[] odd = new double[size];
      for (int i = 0; i < size; i++) {
        double lower = i == 0 ? Math.sqrt(2) * even[0] : even[i];
        odd[i] = 0.5 * (lower - (i + 2 < size ? even[i + 2] : 0));
      }
      return odd;
    }
  }
}
