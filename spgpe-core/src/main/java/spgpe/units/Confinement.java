package spgpe.units;

import spgpe.internal.check.Check;

/**
 * A tight harmonic confinement that leaves a gas one- or two-dimensional, and the coupling this
 * leaves behind. Immutable.
 *
 * <p>Quasi-1D: g1 = 2 hbar w_perp a. Quasi-2D: g2 = sqrt(8 pi) hbar^2 a/(m a_z), in dimensionless
 * form g~ = m g2/hbar^2 = sqrt(8 pi) a/a_z. The oscillator length is always sqrt(hbar/(m w)), the
 * 1/e radius of the density of the ground state. How well this holds is a matter for {@link
 * Validity}.
 */
public final class Confinement {
  /** -zeta(1/2), the constant of the confinement-induced shift. */
  private static final double MINUS_ZETA_HALF = 1.4603545088095868;

  private final Species species;
  private final Frequency frequency;
  private final int dimension;

  private Confinement(Species species, Frequency frequency, int dimension) {
    this.species = Check.notNull(species, "species");
    this.frequency = Check.notNull(frequency, "frequency");
    Check.positive(frequency.hertz(), "trap frequency in Hz");
    this.dimension = dimension;
  }

  /**
   * Isotropic confinement in two directions: a quasi-one-dimensional gas.
   *
   * @param species atom
   * @param transverse trap frequency f_perp = w_perp/(2 pi), greater than zero
   * @return the confinement, dimension 1
   */
  public static Confinement quasi1d(Species species, Frequency transverse) {
    return new Confinement(species, transverse, 1);
  }

  /**
   * Confinement in one direction: a quasi-two-dimensional gas.
   *
   * @param species atom
   * @param axial trap frequency f_z = w_z/(2 pi), greater than zero
   * @return the confinement, dimension 2
   */
  public static Confinement quasi2d(Species species, Frequency axial) {
    return new Confinement(species, axial, 2);
  }

  /**
   * The atom.
   *
   * @return species
   */
  public Species species() {
    return species;
  }

  /**
   * The trap frequency.
   *
   * @return frequency of the tight direction
   */
  public Frequency frequency() {
    return frequency;
  }

  /**
   * The dimension of the remaining motion.
   *
   * @return 1 or 2
   */
  public int dimension() {
    return dimension;
  }

  /**
   * The oscillator length sqrt(hbar/(m w)).
   *
   * @return a_perp or a_z
   */
  public Length oscillatorLength() {
    return new Length(Math.sqrt(Constants.HBAR / (species.massKilograms() * frequency.angular())));
  }

  /**
   * The reduced coupling, without the confinement-induced shift.
   *
   * @param scatteringLength s-wave scattering length a
   * @return 2 hbar w_perp a in J m, or sqrt(8 pi) hbar^2 a/(m a_z) in J m^2
   */
  public Coupling coupling(Length scatteringLength) {
    double a = Check.notNull(scatteringLength, "scatteringLength").metres();
    double hbar = Constants.HBAR;
    return dimension == 1
        ? new Coupling(2 * hbar * frequency.angular() * a, 1)
        : new Coupling(
            dimensionlessCoupling(scatteringLength) * hbar * hbar / species.massKilograms(), 2);
  }

  /**
   * The quasi-1D coupling times {@link #confinementFactor}.
   *
   * @param scatteringLength s-wave scattering length a
   * @return the corrected coupling in J m
   * @throws IllegalArgumentException if the gas is not quasi-1D or a is too close to the resonance
   */
  public Coupling shiftedCoupling(Length scatteringLength) {
    return coupling(scatteringLength).times(confinementFactor(scatteringLength));
  }

  /**
   * The confinement-induced factor 1/(1 - C a/(sqrt(2) a_perp)), C = -zeta(1/2) = 1.4603545, of the
   * quasi-1D coupling. M. Olshanii, Phys. Rev. Lett. 81, 938 (1998) (from memory); the sqrt(2) is
   * there because that paper's length is sqrt(2 hbar/(m w)).
   *
   * @param scatteringLength s-wave scattering length a
   * @return the factor
   * @throws IllegalArgumentException if the gas is not quasi-1D, or C a/(sqrt(2) a_perp) exceeds
   *     one half, where the gas is close to the confinement-induced resonance
   */
  public double confinementFactor(Length scatteringLength) {
    double a = Check.notNull(scatteringLength, "scatteringLength").metres();
    Density.requireDimension(dimension, 1, "confinement with this correction");
    double shift = MINUS_ZETA_HALF * a / (Math.sqrt(2) * oscillatorLength().metres());
    Check.argument(
        Math.abs(shift) <= 0.5,
        "scattering length too large for a quasi-1D coupling: |C a/(sqrt(2) a_perp)| must be"
            + " <= 0.5: value=%s, a=%s a0; lower the trap frequency or the scattering length",
        shift,
        a / Constants.BOHR_RADIUS);
    return 1 / (1 - shift);
  }

  /**
   * The dimensionless quasi-2D coupling g~ = sqrt(8 pi) a/a_z = m g2/hbar^2.
   *
   * @param scatteringLength s-wave scattering length a
   * @return g~
   * @throws IllegalArgumentException if the gas is not quasi-2D
   */
  public double dimensionlessCoupling(Length scatteringLength) {
    double a = Check.notNull(scatteringLength, "scatteringLength").metres();
    Density.requireDimension(dimension, 2, "confinement with a dimensionless coupling");
    return Math.sqrt(8 * Math.PI) * a / oscillatorLength().metres();
  }
}
