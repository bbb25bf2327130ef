package spgpe.units;

import spgpe.internal.check.Check;

/**
 * An energy. It may be negative, because chemical potentials can be.
 *
 * @param joules value in J, finite
 */
public record Energy(double joules) {
  /**
   * Checks the value.
   *
   * @param joules value in J, finite
   * @throws IllegalArgumentException if the value is not finite
   */
  public Energy {
    Check.finite(joules, "energy in J");
  }

  /**
   * An energy in joules.
   *
   * @param joules value in J
   * @return the energy
   */
  public static Energy ofJoules(double joules) {
    return new Energy(joules);
  }

  /**
   * An energy given as E/h, with Planck's constant h and not hbar.
   *
   * @param hertz E/h in Hz; may be negative
   * @return the energy
   */
  public static Energy ofHertz(double hertz) {
    return new Energy(hertz * Constants.PLANCK);
  }

  /**
   * The energy as a frequency E/h.
   *
   * @return E/h in Hz
   */
  public double hertz() {
    return joules / Constants.PLANCK;
  }

  /**
   * The temperature E/kB, asked for by name because an energy is no temperature.
   *
   * @return E/kB
   * @throws IllegalArgumentException if the energy is negative
   */
  public Temperature asTemperature() {
    return new Temperature(joules / Constants.BOLTZMANN);
  }

  double positiveJoules(String name) {
    return Check.positive(joules, name + " in J");
  }
}
