package spgpe.hamiltonian;

import spgpe.internal.check.Check;
import spgpe.projector.CoherentRegion;

/**
 * Constant coherent coupling between two components: K = -J integral of (psi_i<sup>*</sup> psi_j +
 * c.c.), a matrix element -J for every mode. Positive J favours relative phase 0. For a coupling
 * that changes in time see {@link ModulatedCoupling}. Immutable and thread-safe.
 */
public final class CoherentCoupling implements SpectralTerm {
  private final int first;
  private final int second;
  private final double strength;

  private CoherentCoupling(int first, int second, double strength) {
    this.first = first;
    this.second = second;
    this.strength = strength;
  }

  /**
   * Coupling between components 0 and 1.
   *
   * @param strength J, finite
   * @return the term
   * @throws IllegalArgumentException if J is not finite
   */
  public static CoherentCoupling constant(double strength) {
    return new CoherentCoupling(0, 1, Check.finite(strength, "coherent coupling J"));
  }

  /**
   * The same coupling between two other components.
   *
   * @param i component index from 0
   * @param j another component index
   * @return changed copy
   * @throws IllegalArgumentException if the indices are negative or equal
   */
  public CoherentCoupling between(int i, int j) {
    Check.argument(
        i >= 0 && j >= 0 && i != j,
        "coupled components must be two different indices from 0: i=%s, j=%s", i, j);
    return new CoherentCoupling(i, j, strength);
  }

  @Override
  public void check(int components, CoherentRegion region) {
    Check.argument(
        Math.max(first, second) < components,
        "coupled components must exist: i=%s, j=%s, components=%s", first, second, components);
  }

  @Override
  public void addTo(ModeMatrix matrix) {
    for (int m = 0; m < matrix.region().modes(); m++) {
      matrix.addPair(m, first, second, -strength, 0);
    }
  }

  @Override
  public String description() {
    return "CoherentCoupling(J=" + strength + ", components " + first + "-" + second + ")";
  }
}
