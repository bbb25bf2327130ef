package spgpe.projector;

import java.util.Arrays;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;

/**
 * A block of positions handed to a {@link LocalOperation}: psi and the result arrays.
 *
 * <p>Work on the elements {@code begin() <= i < end()} of the arrays. A loop that treats all
 * elements alike need not know about points and lanes; an operation that depends on the position
 * finds the grid point of element i with {@link #pointOf}. Live arrays; valid during the call only.
 */
public final class PointBlock {
  private final PeriodicGrid grid;
  private final int lanes;
  private final double[][] psiRe;
  private final double[][] psiIm;
  private final double[][] resultRe;
  private final double[][] resultIm;
  private final int begin;
  private final int end;

  /** Grid point of each group of lanes. */
  private final int[] points;

  PointBlock(Field psi, Field result, int begin, int end, int firstPoint, int pointStride) {
    this.grid = psi.grid();
    this.lanes = psi.lanes();
    int components = psi.components();
    this.psiRe = new double[components][];
    this.psiIm = new double[components][];
    this.resultRe = new double[components][];
    this.resultIm = new double[components][];
    for (int c = 0; c < components; c++) {
      psiRe[c] = psi.re(c);
      psiIm[c] = psi.im(c);
      resultRe[c] = result.re(c);
      resultIm[c] = result.im(c);
    }
    this.begin = begin;
    this.end = end;
    this.points = new int[(end - begin) / lanes];
    for (int p = 0; p < points.length; p++) {
      points[p] = firstPoint + p * pointStride;
    }
  }

  /** Any points: those of the given numbers, from index begin on. */
  PointBlock(
      PeriodicGrid grid, int lanes, double[][] psiRe, double[][] psiIm, double[][] resultRe,
      double[][] resultIm, int begin, int end, int[] points) {
    this.grid = grid;
    this.lanes = lanes;
    this.psiRe = psiRe;
    this.psiIm = psiIm;
    this.resultRe = resultRe;
    this.resultIm = resultIm;
    this.begin = begin;
    this.end = end;
    this.points = points;
  }

  /**
   * A block of all points of a field, for use outside a {@link ModeTransform}, such as the gradient
   * test of a user's own term.
   *
   * @param psi the field
   * @param result what the operation adds to
   * @return the block
   * @throws IllegalArgumentException if the shapes differ
   */
  public static PointBlock ofAll(Field psi, Field result) {
    Check.notNull(psi, "psi");
    Check.notNull(result, "result");
    result.requireShape(psi.grid(), psi.components(), psi.lanes());
    return new PointBlock(psi, result, 0, psi.grid().points() * psi.lanes(), 0, 1);
  }

  /**
   * The grid the points belong to.
   *
   * @return the grid
   */
  public PeriodicGrid grid() {
    return grid;
  }

  /**
   * Number of components.
   *
   * @return components
   */
  public int components() {
    return psiRe.length;
  }

  /**
   * First element of the block.
   *
   * @return array index
   */
  public int begin() {
    return begin;
  }

  /**
   * One past the last element of the block.
   *
   * @return array index
   */
  public int end() {
    return end;
  }

  /**
   * Real parts of psi; read only.
   *
   * @param component component index
   * @return live array
   */
  public double[] psiRe(int component) {
    return psiRe[component];
  }

  /**
   * Imaginary parts of psi; read only.
   *
   * @param component component index
   * @return live array
   */
  public double[] psiIm(int component) {
    return psiIm[component];
  }

  /**
   * Real parts of the result; add to them.
   *
   * @param component component index
   * @return live array
   */
  public double[] resultRe(int component) {
    return resultRe[component];
  }

  /**
   * Imaginary parts of the result; add to them.
   *
   * @param component component index
   * @return live array
   */
  public double[] resultIm(int component) {
    return resultIm[component];
  }

  void clearResult() {
    for (int c = 0; c < resultRe.length; c++) {
      Arrays.fill(resultRe[c], begin, end, 0);
      Arrays.fill(resultIm[c], begin, end, 0);
    }
  }

  /**
   * Grid point of an element.
   *
   * @param element array index within the block
   * @return point index of the grid
   */
  public int pointOf(int element) {
    return points[(element - begin) / lanes];
  }
}
