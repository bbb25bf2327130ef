package spgpe.units;

import spgpe.internal.check.Check;

/**
 * A rate of events, in total (d = 0) or per length^d, such as bubbles per second and metre.
 *
 * @param perSecondPerMetreToD value in s^-1 m^-d, finite and not negative
 * @param dimension d, 0 to 3; 0 means a plain rate
 */
public record EventRate(double perSecondPerMetreToD, int dimension) {
  /**
   * Checks the parts.
   *
   * @param perSecondPerMetreToD value in s^-1 m^-d, finite and not negative
   * @param dimension d, 0 to 3; 0 means a plain rate
   * @throws IllegalArgumentException if the value is negative or not finite, or d is not 0 to 3
   */
  public EventRate {
    Check.notNegative(perSecondPerMetreToD, "rate in s^-1 m^-d");
    Check.inRange(dimension, 0, 3, "dimension");
  }

  /**
   * A plain rate.
   *
   * @param perSecond value in 1/s
   * @return the rate, d = 0
   */
  public static EventRate perSecond(double perSecond) {
    return new EventRate(perSecond, 0);
  }

  /**
   * The plain rate of a ring or line of the given length.
   *
   * @param length length, greater than zero
   * @return rate per length times length
   * @throws IllegalArgumentException if this is no rate per length
   */
  public EventRate over(Length length) {
    Density.requireDimension(dimension, 1, "rate per length");
    return new EventRate(
        perSecondPerMetreToD * Check.notNull(length, "length").positiveMetres("length"), 0);
  }
}
