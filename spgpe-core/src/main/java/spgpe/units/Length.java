package spgpe.units;

import spgpe.internal.check.Check;

/**
 * A length. It may be negative, because scattering lengths can be; whoever needs a positive one
 * says so.
 *
 * @param metres value in m, finite
 */
public record Length(double metres) {
  /**
   * Checks the value.
   *
   * @param metres value in m, finite
   * @throws IllegalArgumentException if the value is not finite
   */
  public Length {
    Check.finite(metres, "length in m");
  }

  /**
   * A length in metres.
   *
   * @param metres value in m
   * @return the length
   */
  public static Length ofMetres(double metres) {
    return new Length(metres);
  }

  /**
   * A length in micrometres.
   *
   * @param micrometres value in um
   * @return the length
   */
  public static Length ofMicrometres(double micrometres) {
    return new Length(micrometres * 1e-6);
  }

  /**
   * A length in Bohr radii, the customary unit of scattering lengths.
   *
   * @param bohrRadii value in a0
   * @return the length
   */
  public static Length ofBohrRadii(double bohrRadii) {
    return new Length(bohrRadii * Constants.BOHR_RADIUS);
  }

  /**
   * The value in micrometres.
   *
   * @return value in um
   */
  public double micrometres() {
    return metres * 1e6;
  }

  /**
   * The value in Bohr radii.
   *
   * @return value in a0
   */
  public double bohrRadii() {
    return metres / Constants.BOHR_RADIUS;
  }

  double positiveMetres(String name) {
    return Check.positive(metres, name + " in m");
  }
}
