package spgpe.units;

import spgpe.internal.check.Check;

/**
 * An absolute temperature.
 *
 * @param kelvin value in K, finite and not negative
 */
public record Temperature(double kelvin) {
  /**
   * Checks the value.
   *
   * @param kelvin value in K, finite and not negative
   * @throws IllegalArgumentException if the value is negative or not finite
   */
  public Temperature {
    Check.notNegative(kelvin, "temperature in K");
  }

  /**
   * A temperature in kelvin.
   *
   * @param kelvin value in K
   * @return the temperature
   */
  public static Temperature ofKelvin(double kelvin) {
    return new Temperature(kelvin);
  }

  /**
   * A temperature in nanokelvin.
   *
   * @param nanokelvin value in nK
   * @return the temperature
   */
  public static Temperature ofNanokelvin(double nanokelvin) {
    return new Temperature(nanokelvin * 1e-9);
  }

  /**
   * The value in nanokelvin.
   *
   * @return value in nK
   */
  public double nanokelvin() {
    return kelvin * 1e9;
  }

  /**
   * The thermal energy kB T.
   *
   * @return kB T
   */
  public Energy energy() {
    return new Energy(kelvin * Constants.BOLTZMANN);
  }

  double positiveJoules() {
    return Check.positive(kelvin, "temperature in K") * Constants.BOLTZMANN;
  }
}
