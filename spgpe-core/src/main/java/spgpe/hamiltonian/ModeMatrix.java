package spgpe.hamiltonian;

import spgpe.internal.check.Check;
import spgpe.projector.CoherentRegion;

/**
 * A Hermitian matrix h<sub>ij</sub>(k) over the components for each kept mode. Mutable while terms
 * add to it; not thread-safe.
 */
public final class ModeMatrix {
  private static final int MAX_NUMBERS = 1 << 28;

  private final CoherentRegion region;
  private final int components;
  private final double[] re;
  private final double[] im;

  /**
   * Makes matrices of zeros.
   *
   * @param region coherent region
   * @param components number of components, 1 to 255
   * @throws IllegalArgumentException if the number is out of range
   */
  public ModeMatrix(CoherentRegion region, int components) {
    this.region = Check.notNull(region, "region");
    this.components = Check.inRange(components, 1, 255, "components");
    long size = (long) region.modes() * components * components;
    Check.argument(
        size <= MAX_NUMBERS,
        "modes times components squared must not exceed %s: modes=%s, components=%s",
        MAX_NUMBERS, region.modes(), components);
    this.re = new double[(int) size];
    this.im = new double[re.length];
  }

  /**
   * The coherent region.
   *
   * @return the region
   */
  public CoherentRegion region() {
    return region;
  }

  /**
   * Number of components.
   *
   * @return components
   */
  public int components() {
    return components;
  }

  /**
   * Adds a real number to a diagonal element.
   *
   * @param mode mode index
   * @param component component index
   * @param value what to add, finite
   * @throws IllegalArgumentException if the value is not finite or there is no such element
   */
  public void addDiagonal(int mode, int component, double value) {
    Check.finite(value, "diagonal element");
    re[index(mode, component, component)] += value;
  }

  /**
   * Adds a complex number to element (i, j) and its conjugate to element (j, i), i != j.
   *
   * @param mode mode index
   * @param i row
   * @param j column
   * @param real real part, finite
   * @param imaginary imaginary part, finite
   * @throws IllegalArgumentException if i equals j, a value is not finite or there is no such
   *     element
   */
  public void addPair(int mode, int i, int j, double real, double imaginary) {
    Check.argument(i != j, "row and column of a pair must differ: i=%s, j=%s", i, j);
    Check.finite(real, "real part of the off-diagonal element");
    Check.finite(imaginary, "imaginary part of the off-diagonal element");
    re[index(mode, i, j)] += real;
    im[index(mode, i, j)] += imaginary;
    re[index(mode, j, i)] += real;
    im[index(mode, j, i)] -= imaginary;
  }

  /**
   * Real part of an element.
   *
   * @param mode mode index
   * @param i row
   * @param j column
   * @return Re h_ij
   * @throws IllegalArgumentException if there is no such element
   */
  public double re(int mode, int i, int j) {
    return re[index(mode, i, j)];
  }

  /**
   * Imaginary part of an element.
   *
   * @param mode mode index
   * @param i row
   * @param j column
   * @return Im h_ij
   * @throws IllegalArgumentException if there is no such element
   */
  public double im(int mode, int i, int j) {
    return im[index(mode, i, j)];
  }

  /**
   * Whether no mode couples different components.
   *
   * @return true if every off-diagonal element is zero
   */
  public boolean isDiagonal() {
    for (int m = 0; m < region.modes(); m++) {
      for (int i = 0; i < components; i++) {
        for (int j = 0; j < components; j++) {
          if (i != j && (re(m, i, j) != 0 || im(m, i, j) != 0)) {
            return false;
          }
        }
      }
    }
    return true;
  }

  /**
   * An upper bound of |eigenvalue| over all modes (largest absolute row sum).
   *
   * @return bound, exact if the matrices are diagonal
   */
  public double spectralBound() {
    double bound = 0;
    for (int m = 0; m < region.modes(); m++) {
      for (int i = 0; i < components; i++) {
        double sum = 0;
        for (int j = 0; j < components; j++) {
          sum += Math.hypot(re(m, i, j), im(m, i, j));
        }
        bound = Math.max(bound, sum);
      }
    }
    return bound;
  }

  private int index(int mode, int i, int j) {
    Check.inRange(mode, 0, region.modes() - 1, "mode index");
    Check.inRange(i, 0, components - 1, "row");
    Check.inRange(j, 0, components - 1, "column");
    return (mode * components + i) * components + j;
  }
}
