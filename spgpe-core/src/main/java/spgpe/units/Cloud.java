package spgpe.units;

import spgpe.internal.check.Check;

/**
 * What a geometry makes of a number of atoms at zero temperature.
 *
 * @param chemicalPotential mu = g times peak density
 * @param peakDensity density, at the centre where it is not uniform
 * @param size circumference of a ring, (first) side of a box, Thomas-Fermi radius of a harmonic
 *     trap
 */
public record Cloud(Energy chemicalPotential, Density peakDensity, Length size) {
  /**
   * Checks the parts.
   *
   * @param chemicalPotential mu = g times peak density
   * @param peakDensity density, at the centre where it is not uniform
   * @param size circumference of a ring, (first) side of a box, Thomas-Fermi radius of a harmonic
   *     trap
   * @throws IllegalArgumentException if a part is null
   */
  public Cloud {
    Check.notNull(chemicalPotential, "chemicalPotential");
    Check.notNull(peakDensity, "peakDensity");
    Check.notNull(size, "size");
  }
}
