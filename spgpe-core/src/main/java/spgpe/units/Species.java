package spgpe.units;

import spgpe.internal.check.Check;

/**
 * A bosonic atom: a name and a mass. Scattering lengths are not part of it: they depend on the
 * hyperfine states and on the magnetic field and are always given by the user.
 *
 * <p>The masses of the constants are neutral-atom masses of the 2020 atomic mass evaluation
 * (AME2020): W. J. Huang et al., Chin. Phys. C 45, 030002 (2021) and M. Wang et al., Chin. Phys. C
 * 45, 030003 (2021), as given in isotope tables derived from it.
 *
 * @param name name for messages, for example "K-41"
 * @param massKilograms mass of one atom in kg, greater than zero
 */
public record Species(String name, double massKilograms) {
  /** Lithium-7, 7.01600343426 u (AME2020). */
  public static final Species LI_7 = ofAtomicMass("Li-7", 7.01600343426);

  /** Sodium-23, 22.98976928195 u (AME2020). */
  public static final Species NA_23 = ofAtomicMass("Na-23", 22.98976928195);

  /** Potassium-39, 38.96370648482 u (AME2020). */
  public static final Species K_39 = ofAtomicMass("K-39", 38.96370648482);

  /** Potassium-41, 40.96182525611 u (AME2020). */
  public static final Species K_41 = ofAtomicMass("K-41", 40.96182525611);

  /** Rubidium-85, 84.91178973604 u (AME2020). */
  public static final Species RB_85 = ofAtomicMass("Rb-85", 84.91178973604);

  /** Rubidium-87, 86.909180529 u (AME2020). */
  public static final Species RB_87 = ofAtomicMass("Rb-87", 86.909180529);

  /** Caesium-133, 132.905451958 u (AME2020). */
  public static final Species CS_133 = ofAtomicMass("Cs-133", 132.905451958);

  /**
   * Checks the parts.
   *
   * @param name name for messages, for example "K-41"
   * @param massKilograms mass of one atom in kg, greater than zero
   * @throws IllegalArgumentException if the name is null or the mass is not a positive number
   */
  public Species {
    Check.notNull(name, "name");
    Check.positive(massKilograms, "mass in kg");
  }

  /**
   * An atom given by its mass in atomic mass constants.
   *
   * @param name name for messages
   * @param atomicMass mass in u, between 1 and 300
   * @return the species
   * @throws IllegalArgumentException if the mass lies outside 1..300 u
   */
  public static Species ofAtomicMass(String name, double atomicMass) {
    Check.argument(
        atomicMass >= 1 && atomicMass <= 300,
        "mass of an atom must lie in 1..300 u: atomicMass=%s u (give it in u, not in kg)",
        atomicMass);
    return new Species(name, atomicMass * Constants.ATOMIC_MASS);
  }

  /**
   * Thermal de Broglie wavelength sqrt(2 pi hbar^2/(m kB T)).
   *
   * @param temperature temperature, greater than zero
   * @return the wavelength
   * @throws IllegalArgumentException if the temperature is zero
   */
  public Length thermalWavelength(Temperature temperature) {
    double energy = Check.notNull(temperature, "temperature").positiveJoules();
    return new Length(Constants.HBAR * Math.sqrt(2 * Math.PI / (massKilograms * energy)));
  }
}
