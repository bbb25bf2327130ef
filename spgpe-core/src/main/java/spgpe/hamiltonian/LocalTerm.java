package spgpe.hamiltonian;

import spgpe.grid.PeriodicGrid;
import spgpe.projector.PointBlock;

/**
 * A term that works point by point: energy density e(psi(r), r, t) and force
 * f<sub>j</sub> = de/dpsi<sub>j</sub><sup>*</sup>.
 *
 * <p>Both methods are flat loops over the elements of a block and must not change psi. They may be
 * called by several threads at once.
 */
public interface LocalTerm extends HamiltonianTerm {
  /**
   * Degree of the force as a polynomial in psi and psi<sup>*</sup>; decides whether it aliases.
   *
   * @return odd positive number: 1 for a potential, 3 for a quartic energy, 5 for a sextic one
   */
  int forceDegree();

  /**
   * Whether the term depends explicitly on time.
   *
   * @return true if force and energy use the time
   */
  default boolean dependsOnTime() {
    return false;
  }

  /**
   * The term prepared for a grid, for example with a table of a potential.
   *
   * @param grid grid of the model
   * @return a term with the same force and energy; this one if there is nothing to prepare
   */
  default LocalTerm preparedFor(PeriodicGrid grid) {
    return this;
  }

  /**
   * Adds the force f<sub>j</sub> to the result arrays of the block.
   *
   * @param time time
   * @param block points at hand
   */
  void addForce(double time, PointBlock block);

  /**
   * Adds the energy density e.
   *
   * @param time time
   * @param block points at hand; its result arrays are not to be touched
   * @param density array with the same element indices as the block's arrays
   */
  void addEnergyDensity(double time, PointBlock block, double[] density);
}
