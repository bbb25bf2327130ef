package spgpe.units;

import spgpe.internal.check.Check;

/**
 * A number density of atoms in one, two or three dimensions; the dimension travels with the value.
 *
 * @param perMetreToD value in m^-d, finite and not negative
 * @param dimension d, 1 to 3
 */
public record Density(double perMetreToD, int dimension) {
  /**
   * Checks the parts.
   *
   * @param perMetreToD value in m^-d, finite and not negative
   * @param dimension d, 1 to 3
   * @throws IllegalArgumentException if the value is negative or not finite, or d is not 1 to 3
   */
  public Density {
    Check.notNegative(perMetreToD, "density in m^-d");
    Check.inRange(dimension, 1, 3, "dimension");
  }

  /**
   * A density per length.
   *
   * @param perMetre value in 1/m
   * @return the density, d = 1
   */
  public static Density perMetre(double perMetre) {
    return new Density(perMetre, 1);
  }

  /**
   * A density per length.
   *
   * @param perMicrometre value in 1/um
   * @return the density, d = 1
   */
  public static Density perMicrometre(double perMicrometre) {
    return new Density(perMicrometre * 1e6, 1);
  }

  /**
   * A density per area.
   *
   * @param perSquareMicrometre value in 1/um^2
   * @return the density, d = 2
   */
  public static Density perSquareMicrometre(double perSquareMicrometre) {
    return new Density(perSquareMicrometre * 1e12, 2);
  }

  double positive(int expectedDimension) {
    requireDimension(dimension, expectedDimension, "density");
    return Check.positive(perMetreToD, "density in m^-d");
  }

  static void requireDimension(int actual, int expected, String name) {
    Check.argument(
        actual == expected,
        "%s must belong to dimension %s: dimension=%s (do not mix 1D, 2D and 3D quantities)",
        name,
        expected,
        actual);
  }
}
