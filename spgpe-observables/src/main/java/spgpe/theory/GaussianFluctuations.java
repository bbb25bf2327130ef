package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * Linear fluctuations of a coupled pair around one of its uniform states: masses, Bogoliubov modes
 * with damping, static variances. All results are limits of zero temperature; at finite temperature
 * compare with {@link PairEquilibrium} instead.
 *
 * <p>Relative channel: {@code A = (k^2 + m^2)/2} for the phase and {@code B = k^2/2 + 2 (g n -+ J)}
 * for the density difference (minus in the false vacuum), frequency {@code sqrt(A B)}; total
 * channel {@code A = k^2/2}, {@code B = k^2/2 + 2 g n}. Immutable.
 */
public final class GaussianFluctuations {
  private final CoupledPair pair;
  private final double density;
  private final double massSquared;
  private final double stiffness;

  private GaussianFluctuations(CoupledPair pair, Vacuum vacuum) {
    this.pair = pair;
    double j = pair.coherentCoupling();
    double kappa = pair.biquadraticCoupling();
    if (vacuum == Vacuum.TRUE) {
      density = pair.trueVacuumDensity();
      Check.argument(
          density > 0,
          "the uniform state needs mu + J > 0: mu=%s, J=%s", pair.mu(), j);
      massSquared = 4 * (j + kappa * density);
      stiffness = 2 * (pair.g() * density + j);
    } else {
      pair.requireMetastable();
      density = pair.falseVacuumDensity();
      massSquared = 4 * (kappa * density - j);
      stiffness = 2 * (pair.g() * density - j);
    }
  }

  /**
   * Linearises around a uniform state.
   *
   * @param pair parameters
   * @param vacuum which state
   * @return the fluctuations
   * @throws IllegalArgumentException if the state does not exist or is not a minimum
   */
  public static GaussianFluctuations of(CoupledPair pair, Vacuum vacuum) {
    return new GaussianFluctuations(Check.notNull(pair, "pair"), Check.notNull(vacuum, "vacuum"));
  }

  /**
   * Density of one component.
   *
   * @return n (1/length)
   */
  public double density() {
    return density;
  }

  /**
   * Static mass of the relative phase.
   *
   * @return m (1/length), {@code m^2 = 4 (J + kappa n_tv)} or {@code 4 (kappa n_fv - J)}
   */
  public double mass() {
    return Math.sqrt(massSquared);
  }

  /**
   * Static phase correlations of this vacuum.
   *
   * @return the Gaussian phase at the pair's temperature
   * @throws IllegalArgumentException if the mass is zero
   */
  public GaussianPhase phase() {
    return new GaussianPhase(mass(), density, pair.temperature());
  }

  /**
   * Bogoliubov frequency of the relative mode.
   *
   * @param waveNumber k (1/length), finite
   * @return {@code sqrt(A B)} (1/time)
   * @throws IllegalArgumentException if k is not finite
   */
  public double relativeFrequency(double waveNumber) {
    return Math.sqrt(phaseStiffness(waveNumber) * densityStiffness(waveNumber));
  }

  /**
   * Bogoliubov frequency of the total (in-phase) mode.
   *
   * @param waveNumber k (1/length), finite
   * @return {@code sqrt(k^2 (k^2/4 + g n))} (1/time)
   * @throws IllegalArgumentException if k is not finite
   */
  public double totalFrequency(double waveNumber) {
    double half = halfSquare(waveNumber);
    return Math.sqrt(half * (half + 2 * pair.g() * density));
  }

  /**
   * Relative mode with damping.
   *
   * @param waveNumber k (1/length), finite
   * @param damping dimensionless gamma, not negative
   * @return decay rate {@code gamma (A + B)/2} and frequency, or two rates if overdamped
   * @throws IllegalArgumentException if a value is out of range
   */
  public DampedMode relativeMode(double waveNumber, double damping) {
    Check.notNegative(damping, "damping");
    return DampedMode.of(phaseStiffness(waveNumber), densityStiffness(waveNumber), damping);
  }

  /**
   * Total mode with damping.
   *
   * @param waveNumber k (1/length), finite
   * @param damping dimensionless gamma, not negative
   * @return decay rate and frequency, or two rates if overdamped
   * @throws IllegalArgumentException if a value is out of range
   */
  public DampedMode totalMode(double waveNumber, double damping) {
    Check.notNegative(damping, "damping");
    double half = halfSquare(waveNumber);
    return DampedMode.of(half, half + 2 * pair.g() * density, damping);
  }

  /**
   * Speed of relative-phase waves at wavelengths between healing length and 1/m.
   *
   * @return {@code sqrt(g n -+ J)} (length/time)
   */
  public double relativePhaseSpeed() {
    return Math.sqrt(0.5 * stiffness);
  }

  /**
   * Speed of sound of the total mode.
   *
   * @return {@code sqrt(g n)} (length/time)
   */
  public double soundSpeed() {
    return Math.sqrt(pair.g() * density);
  }

  /**
   * Static variance of the density difference over the kept modes.
   *
   * @param ring length and cutoff
   * @return {@code <(n_1 - n_2)^2> = (4 n T/L) sum over k of 1/B} (1/length squared)
   */
  public double imbalanceVariance(RingModes ring) {
    Check.notNull(ring, "ring");
    double sum = 0;
    for (int n = -ring.cutoffMode(); n <= ring.cutoffMode(); n++) {
      sum += 1 / densityStiffness(ring.waveNumber(n));
    }
    return 4 * density * pair.temperature() * sum / ring.length();
  }

  /**
   * Curvatures of the energy in orthonormal real coordinates at one wave number.
   *
   * @param waveNumber k (1/length), finite
   * @return total phase {@code k^2}, relative phase {@code k^2 + m^2}, relative density {@code k^2
   *     + 4 (g n -+ J)}, total density {@code k^2 + 4 g n}, in this order (energy)
   * @throws IllegalArgumentException if k is not finite
   */
  public double[] curvatures(double waveNumber) {
    double square = 2 * halfSquare(waveNumber);
    return new double[] {
      square, square + massSquared, square + 2 * stiffness, square + 4 * pair.g() * density
    };
  }

  private double phaseStiffness(double waveNumber) {
    return halfSquare(waveNumber) + 0.5 * massSquared;
  }

  private double densityStiffness(double waveNumber) {
    return halfSquare(waveNumber) + stiffness;
  }

  private static double halfSquare(double waveNumber) {
    return 0.5 * Check.finite(waveNumber, "waveNumber") * waveNumber;
  }
}
