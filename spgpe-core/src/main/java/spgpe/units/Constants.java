package spgpe.units;

/**
 * CODATA 2022 values of the constants used here, in SI units.
 *
 * <p>Source: P. J. Mohr, D. B. Newell, B. N. Taylor, E. Tiesinga, CODATA recommended values of the
 * fundamental physical constants: 2022. Planck's and Boltzmann's constants are exact by definition
 * of the SI (2019).
 */
public final class Constants {
  /** Planck's constant h in J s, exact. */
  public static final double PLANCK = 6.62607015e-34;

  /** Reduced Planck constant h/(2 pi) in J s. */
  public static final double HBAR = PLANCK / (2 * Math.PI);

  /** Boltzmann's constant in J/K, exact. */
  public static final double BOLTZMANN = 1.380649e-23;

  /** Atomic mass constant u in kg; standard uncertainty 0.00000000052e-27 kg. */
  public static final double ATOMIC_MASS = 1.66053906892e-27;

  /** Bohr radius in m; standard uncertainty 0.00000000082e-11 m. */
  public static final double BOHR_RADIUS = 5.29177210544e-11;

  private Constants() {}
}
