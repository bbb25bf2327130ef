package spgpe.units;

import spgpe.internal.check.Check;

/**
 * A contact coupling g, energy times length^d, in one, two or three dimensions. The biquadratic
 * coupling kappa has the same unit and uses this type too.
 *
 * @param jouleMetreToD value in J m^d, finite; may be negative
 * @param dimension d, 1 to 3
 */
public record Coupling(double jouleMetreToD, int dimension) {
  /**
   * Checks the parts.
   *
   * @param jouleMetreToD value in J m^d, finite; may be negative
   * @param dimension d, 1 to 3
   * @throws IllegalArgumentException if the value is not finite or d is not 1 to 3
   */
  public Coupling {
    Check.finite(jouleMetreToD, "coupling in J m^d");
    Check.inRange(dimension, 1, 3, "dimension");
  }

  /**
   * The three-dimensional coupling 4 pi hbar^2 a/m.
   *
   * @param species atom
   * @param scatteringLength s-wave scattering length a
   * @return the coupling, d = 3
   */
  public static Coupling bulk(Species species, Length scatteringLength) {
    Check.notNull(species, "species");
    Check.notNull(scatteringLength, "scatteringLength");
    double hbar = Constants.HBAR;
    return new Coupling(
        4 * Math.PI * hbar * hbar * scatteringLength.metres() / species.massKilograms(), 3);
  }

  /**
   * The mean-field energy g n.
   *
   * @param density density of the same dimension
   * @return g n
   * @throws IllegalArgumentException if the dimensions differ
   */
  public Energy times(Density density) {
    Density.requireDimension(Check.notNull(density, "density").dimension(), dimension, "density");
    return new Energy(jouleMetreToD * density.perMetreToD());
  }

  /**
   * This coupling multiplied by a number.
   *
   * @param factor number
   * @return factor times g
   */
  public Coupling times(double factor) {
    return new Coupling(jouleMetreToD * factor, dimension);
  }
}
