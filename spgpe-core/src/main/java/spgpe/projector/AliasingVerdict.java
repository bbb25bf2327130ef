package spgpe.projector;

import java.util.Arrays;
import spgpe.internal.check.Check;

/**
 * Whether a polynomial force stays free of aliasing on a coherent region.
 *
 * <p>Modes n of one axis between lowest and highest, force of degree p: products reach ((p+1)/2)
 * highest - ((p-1)/2) lowest, and fold back by N. Their images miss the region if and only if
 *
 * <pre>N &gt;= (p+1)/2 (highest - lowest) + 1,     for a symmetric region N &gt;= (p+1) n_c + 1.</pre>
 *
 * <p>Derived in docs/theory.md. Aliasing changes neither the norm nor the energy sum over the grid;
 * it breaks momentum conservation. Immutable and thread-safe.
 */
public final class AliasingVerdict {
  private final int forceDegree;
  private final int[] needed;
  private final int[] present;

  AliasingVerdict(int forceDegree, int[] needed, int[] present) {
    this.forceDegree = forceDegree;
    this.needed = needed;
    this.present = present;
  }

  /**
   * The degree asked about.
   *
   * @return degree of the force in psi and psi<sup>*</sup>
   */
  public int forceDegree() {
    return forceDegree;
  }

  /**
   * Whether no axis aliases.
   *
   * @return true if every axis has enough points
   */
  public boolean isFree() {
    for (int axis = 0; axis < needed.length; axis++) {
      if (present[axis] < needed[axis]) {
        return false;
      }
    }
    return true;
  }

  /**
   * Points needed on an axis.
   *
   * @param axis 0 for x, 1 for y
   * @return the smallest number of points without aliasing
   * @throws IllegalArgumentException if there is no such axis
   */
  public int pointsNeeded(int axis) {
    Check.inRange(axis, 0, needed.length - 1, "axis index");
    return needed[axis];
  }

  @Override
  public String toString() {
    return "force of degree " + forceDegree + (isFree() ? " does not alias" : " aliases")
        + ": points needed=" + Arrays.toString(needed) + ", present=" + Arrays.toString(present);
  }
}
