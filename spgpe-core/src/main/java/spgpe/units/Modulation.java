package spgpe.units;

import spgpe.internal.check.Check;

/**
 * A modulated coherent coupling J(t) = J + delta hbar w cos(w t) between two equal components, and
 * the couplings that remain after averaging over the fast drive. Immutable.
 *
 * <p>Rotating by exp(i sigma_x delta sin w t) removes the drive exactly; averaging what it does to
 * ((g - g12)/4) (n1 - n2)^2 leaves
 *
 * <pre>
 * kappa = ((g - g12)/2) [1 - J0(4 delta)]     biquadratic coupling, energy kappa (Im psi1* psi2)^2
 * g     -&gt; g - kappa/2,   g12 -&gt; g12 + kappa/2
 * </pre>
 *
 * <p>For small depth kappa = 2 (g - g12) delta^2. The idea is that of O. Fialko, B. Opanchuk, A. I.
 * Sidorov, P. D. Drummond, J. Brand, EPL 110, 56001 (2015) and J. Phys. B 50, 024003 (2017); the
 * formulas are re-derived for this project, see docs/theory.md.
 *
 * @param depth dimensionless depth delta: the drive amplitude over hbar w; 0 to 1000
 * @param frequency drive frequency f = w/(2 pi), greater than zero
 */
public record Modulation(double depth, Frequency frequency) {
  private static final double BESSEL_MINIMUM = 3.8317059702075123;

  /**
   * Checks the parts.
   *
   * @param depth dimensionless depth delta: the drive amplitude over hbar w; 0 to 1000
   * @param frequency drive frequency f = w/(2 pi), greater than zero
   * @throws IllegalArgumentException if the depth lies outside 0..1000 or the frequency is zero
   */
  public Modulation {
    Check.argument(
        depth >= 0 && depth <= 1000,
        "modulation depth delta must lie in 0..1000: depth=%s (it is the drive amplitude divided"
            + " by hbar w)",
        depth);
    Check.notNull(frequency, "frequency");
    Check.positive(frequency.hertz(), "drive frequency in Hz");
  }

  /**
   * The modulation that leaves a wanted biquadratic coupling: the smallest depth that does.
   *
   * @param kappa wanted kappa, at least zero
   * @param intra coupling g within a component
   * @param inter coupling g12 between the components, less than g
   * @param frequency drive frequency
   * @return the modulation, with 4 delta at most 3.83
   * @throws IllegalArgumentException if kappa lies outside 0..0.701 (g - g12), the range that
   *     modulation can reach, or the dimensions differ
   */
  public static Modulation forBiquadratic(
      Coupling kappa, Coupling intra, Coupling inter, Frequency frequency) {
    double unit = halfDifference(intra, inter);
    Density.requireDimension(Check.notNull(kappa, "kappa").dimension(), intra.dimension(), "kappa");
    Check.positive(unit, "(g - g12)/2 in J m^d");
    double wanted = kappa.jouleMetreToD() / unit;
    double low = 0;
    double high = BESSEL_MINIMUM;
    Check.argument(
        wanted >= 0 && wanted <= SpecialFunctions.oneMinusBesselJ0(high),
        "modulation reaches kappa/(g - g12) in 0..0.701 only: kappa/(g - g12)=%s",
        wanted / 2);
    // 200 halvings exhaust the doubles between the ends, also near zero
    for (int i = 0; i < 200; i++) {
      double middle = 0.5 * (low + high);
      if (SpecialFunctions.oneMinusBesselJ0(middle) < wanted) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return new Modulation(wanted == 0 ? 0 : high / 4, frequency);
  }

  /**
   * The amplitude of the drive, delta hbar w.
   *
   * @return amplitude of J(t)
   */
  public Energy amplitude() {
    return new Energy(depth * frequency.quantum().joules());
  }

  /**
   * The averaged biquadratic coupling.
   *
   * @param intra coupling g within a component
   * @param inter coupling g12 between the components
   * @return ((g - g12)/2) [1 - J0(4 delta)]
   * @throws IllegalArgumentException if the dimensions differ
   */
  public Coupling biquadratic(Coupling intra, Coupling inter) {
    return new Coupling(
        halfDifference(intra, inter) * SpecialFunctions.oneMinusBesselJ0(4 * depth),
        intra.dimension());
  }

  /**
   * The small-depth limit of {@link #biquadratic}; about 6 percent too large at delta = 0.24.
   *
   * @param intra coupling g within a component
   * @param inter coupling g12 between the components
   * @return 2 (g - g12) delta^2
   * @throws IllegalArgumentException if the dimensions differ
   */
  public Coupling biquadraticAtSmallDepth(Coupling intra, Coupling inter) {
    return new Coupling(4 * halfDifference(intra, inter) * depth * depth, intra.dimension());
  }

  /**
   * The averaged coupling within a component.
   *
   * @param intra coupling g within a component
   * @param inter coupling g12 between the components
   * @return g - kappa/2
   * @throws IllegalArgumentException if the dimensions differ
   */
  public Coupling averagedIntra(Coupling intra, Coupling inter) {
    double kappa = biquadratic(intra, inter).jouleMetreToD();
    return new Coupling(intra.jouleMetreToD() - kappa / 2, intra.dimension());
  }

  /**
   * The averaged coupling between the components.
   *
   * @param intra coupling g within a component
   * @param inter coupling g12 between the components
   * @return g12 + kappa/2
   * @throws IllegalArgumentException if the dimensions differ
   */
  public Coupling averagedInter(Coupling intra, Coupling inter) {
    double kappa = biquadratic(intra, inter).jouleMetreToD();
    return new Coupling(inter.jouleMetreToD() + kappa / 2, intra.dimension());
  }

  /**
   * The kinetic energy hbar^2 k^2/(2 m) of the modes the drive shakes most, where hbar w is twice a
   * Bogoliubov energy: sqrt((hbar w/2)^2 + s^2) - s + 2 J with s = (g - g12) n. Unless the cutoff
   * removes them or damping holds them, they grow exponentially at {@link #resonanceGrowth}.
   *
   * @param stiffness s = (g - g12) n with n per component, at least zero
   * @param coherent constant part J of the coupling
   * @return kinetic energy of the first unstable band
   * @throws IllegalArgumentException if the stiffness is negative
   */
  public Energy resonanceEnergy(Energy stiffness, Energy coherent) {
    double s = Check.notNegative(Check.notNull(stiffness, "stiffness").joules(), "stiffness in J");
    double half = frequency.quantum().joules() / 2;
    // hypot(half, s) - s without cancellation
    return new Energy(
        half * half / (Math.hypot(half, s) + s) + 2 * Check.notNull(coherent, "coherent").joules());
  }

  /**
   * The growth rate of the first unstable band as an energy, (g - g12) n J1(4 delta); also half the
   * width of the band in kinetic energy.
   *
   * @param stiffness (g - g12) n with n per component
   * @return hbar times the amplitude growth rate
   */
  public Energy resonanceGrowth(Energy stiffness) {
    return new Energy(
        Math.abs(
            Check.notNull(stiffness, "stiffness").joules() * SpecialFunctions.besselJ1(4 * depth)));
  }

  private static double halfDifference(Coupling intra, Coupling inter) {
    Density.requireDimension(
        Check.notNull(inter, "inter").dimension(),
        Check.notNull(intra, "intra").dimension(),
        "inter-component coupling");
    return 0.5 * (intra.jouleMetreToD() - inter.jouleMetreToD());
  }
}
