package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * Exact classical-field equilibrium of one component on the infinite line, {@code K = integral of
 * |psi'|^2/2 + (g/2)|psi|^4 - mu |psi|^2}.
 *
 * <p>The weight {@code exp(-K/T)} along x is the imaginary-time path integral of a particle in two
 * dimensions; with {@code psi = a s}, {@code a^2 = (T^2/g)^(1/3)} and energies in units of {@code
 * (g T)^(1/3)} its Hamiltonian is {@code -Laplacian/2 + s^4/2 - alpha s^2} with the only parameter
 * {@code alpha = mu/(g T)^(2/3)}. Method: Scalapino, Sears, Ferrell, Phys. Rev. B 6, 3409 (1972);
 * Castin et al., J. Mod. Opt. 47, 2671 (2000). Immutable.
 */
public final class SingleComponentEquilibrium {
  private static final double TOLERANCE = 1e-9;
  private static final int CORRELATION_STATES = 12;

  private final double alpha;
  private final double density;
  private final double secondOrderCoherence;
  private final double freeEnergyPerLength;
  private final CorrelationFunction field;
  private final CorrelationFunction densityCorrelation;
  private final double truncationError;

  private SingleComponentEquilibrium(double g, double mu, double temperature) {
    double unit = Math.cbrt(g * temperature);
    double amplitudeSquared = Math.cbrt(temperature * temperature / g);
    alpha = mu / (unit * unit);
    Check.argument(
        Math.abs(alpha) <= 100,
        "|alpha| with alpha=mu/(g T)^(2/3) must be <= 100: alpha=%s (mu=%s, g=%s, temperature=%s);"
            + " beyond it use the ideal-gas or the zero-temperature limit",
        alpha, mu, g, temperature);
    RadialStates coarse = RadialStates.of(alpha, CORRELATION_STATES, 1, 0);
    RadialStates fine = RadialStates.of(alpha, CORRELATION_STATES, 1, 24);
    truncationError = difference(coarse, fine);
    if (!(truncationError <= TOLERANCE)) {
      throw new UnconvergedException(
          "the radial basis is not converged: relative change " + truncationError
              + " > " + TOLERANCE + " at alpha=" + alpha + "; use |alpha| <= 60");
    }
    double square = fine.square[0][0];
    density = amplitudeSquared * square;
    secondOrderCoherence = fine.fourth[0][0] / (square * square);
    freeEnergyPerLength = temperature * unit * fine.energy[0][0];
    field = correlation(fine, 1).scaled(amplitudeSquared, unit);
    densityCorrelation = correlation(fine, 0).scaled(amplitudeSquared * amplitudeSquared, unit);
  }

  /**
   * Solves for the equilibrium.
   *
   * @param g contact coupling (energy times length), greater than zero
   * @param mu chemical potential (energy)
   * @param temperature temperature (energy), greater than zero
   * @return the equilibrium
   * @throws IllegalArgumentException if a value is not finite, out of range, or {@code |alpha| >
   *     100}
   * @throws UnconvergedException if the basis does not converge
   */
  public static SingleComponentEquilibrium of(double g, double mu, double temperature) {
    return new SingleComponentEquilibrium(
        Check.positive(g, "g"),
        Check.finite(mu, "mu"),
        Check.positive(temperature, "temperature"));
  }

  private static double difference(RadialStates a, RadialStates b) {
    double square = b.square[0][0];
    double worst = Math.abs(a.square[0][0] / square - 1);
    worst = Math.max(worst, Math.abs(a.fourth[0][0] / b.fourth[0][0] - 1));
    double gapA = a.energy[1][0] - a.energy[0][0];
    double gapB = b.energy[1][0] - b.energy[0][0];
    worst = Math.max(worst, Math.abs(gapA / gapB - 1));
    double breathA = a.energy[0][1] - a.energy[0][0];
    double breathB = b.energy[0][1] - b.energy[0][0];
    return Math.max(worst, Math.abs(breathA / breathB - 1));
  }

  private static CorrelationFunction correlation(RadialStates states, int momentum) {
    int count = states.states;
    int first = momentum == 0 ? 1 : 0;
    double[] weights = new double[count - first];
    double[] rates = new double[count - first];
    double[] elements = momentum == 0 ? states.square[0] : states.raiseOne[0];
    for (int k = first; k < count; k++) {
      double element = elements[k * count];
      weights[k - first] = element * element;
      rates[k - first] = states.energy[momentum][k] - states.energy[0][0];
    }
    return new CorrelationFunction(weights, rates);
  }

  /**
   * The dimensionless parameter.
   *
   * @return {@code mu/(g T)^(2/3)}
   */
  public double alpha() {
    return alpha;
  }

  /**
   * Mean density.
   *
   * @return {@code <|psi|^2>} (1/length)
   */
  public double density() {
    return density;
  }

  /**
   * Zero-distance density correlation.
   *
   * @return {@code g2(0) = <|psi|^4>/<|psi|^2>^2}
   */
  public double secondOrderCoherence() {
    return secondOrderCoherence;
  }

  /**
   * Grand potential per length relative to that of the free field, {@code -T ln Z/L}.
   *
   * @return T times the ground-state energy of the transfer operator (energy/length)
   */
  public double freeEnergyPerLength() {
    return freeEnergyPerLength;
  }

  /**
   * First-order correlation, not normalised.
   *
   * @return {@code <psi^*(x) psi(0)>} (1/length); its decay length is the coherence length
   */
  public CorrelationFunction fieldCorrelation() {
    return field;
  }

  /**
   * Connected density correlation.
   *
   * @return {@code <n(x) n(0)> - <n>^2} (1/length squared)
   */
  public CorrelationFunction densityCorrelation() {
    return densityCorrelation;
  }

  /**
   * Largest relative change of the averages and lengths between two bases of different size and
   * oscillator frequency.
   *
   * @return the estimate of the relative truncation error
   */
  public double truncationError() {
    return truncationError;
  }
}
