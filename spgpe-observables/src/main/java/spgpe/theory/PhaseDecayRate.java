package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * One-loop decay rate of the relative phase alone under overdamped dynamics, without cutoff.
 *
 * <p>In lengths of {@code 1/(2 sqrt(J))} and the time of {@code dphi/dt = phi'' - U'(phi) +
 * sqrt(2/b) xi}, {@code b = n sqrt(J)/T}: {@code Gamma/L = 2 (|e_-|/2 pi) (b B_1/2 pi)^(1/2) (32
 * s^5/B_1)^(1/2) exp(-b B_1)} with {@code s^2 = lambda^2 - 1} and the negative eigenvalue {@code
 * e_-}. Source: Langer, Ann. Phys. 54, 258 (1969); determinant derived, see {@code
 * docs/theory-references.md}. Lattice simulations over the same formula on the lattice gave .58,
 * .71, .81 at {@code b B_1} = 7, 9, 11. Immutable.
 *
 * @param perLength Gamma/L in the units above
 * @param barrierOverTemperature {@code b B_1 = E_b/T}
 * @param negativeEigenvalue {@code e_-} in the units above
 */
public record PhaseDecayRate(
    double perLength, double barrierOverTemperature, double negativeEigenvalue) {

  /**
   * Rate of a phase-only bubble.
   *
   * @param bubble the bubble
   * @param temperature T (energy), greater than zero
   * @return the rate
   * @throws IllegalArgumentException if the temperature is not finite and positive
   * @throws UnconvergedException if the negative eigenvalue does not converge
   */
  public static PhaseDecayRate of(PhaseBubble bubble, double temperature) {
    double barrier =
        Check.notNull(bubble, "bubble").energy() / Check.positive(temperature, "temperature");
    double eigenvalue = bubble.negativeEigenvalue();
    double rate =
        Math.abs(eigenvalue) / Math.PI
            * Math.sqrt(barrier / (2 * Math.PI * -bubble.determinantRatio()))
            * Math.exp(-barrier);
    return new PhaseDecayRate(rate, barrier, eigenvalue);
  }
}
