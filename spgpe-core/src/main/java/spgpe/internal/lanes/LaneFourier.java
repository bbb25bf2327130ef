package spgpe.internal.lanes;

/**
 * Transforms between the modes of a line of N points and half of its points, the even or the odd
 * ones, many lanes at a time, for modes of |number| below N/4.
 *
 * <p>The values at the N points are those of the polynomial sum of a_m x<sup>m</sup> at x = exp(2 pi
 * i p/N). On the even points x<sup>N/2</sup> = 1, on the odd ones x<sup>N/2</sup> = -1, so that in
 * either half a negative mode number m may be written as N/2 + m, with the opposite sign in the odd
 * one, and N/2 slots hold all modes. Splitting x<sup>2k</sup> = w<sup>2</sup> into x<sup>k</sup> = w
 * and x<sup>k</sup> = -w leads to the single points (decimation in time with one twiddle factor for
 * each block): slots in natural order, points in bit-reversed order. The way back takes the adjoint
 * steps in reverse.
 *
 * <p>Passes of radix 4, and one of radix 8 if the number of points is not right; parts that fit into
 * the first-level cache are finished one after the other. Immutable; arrays belong to the caller and
 * have the layout of {@link #layout}.
 */
public final class LaneFourier {
  /** Fewest points of the whole line. */
  public static final int FEWEST_POINTS = 32;

  /** Even and odd points. */
  public static final int HALVES = 2;

  /** Doubles of a part that is worked on by whole passes. */
  private static final int PART = 1024;

  /** What the passes on neighbouring rows need to know. */
  record Leaves(Twiddles twiddles, LaneLayout layout) {}

  private final LaneKernels kernels;
  private final LaneLayout layout;
  private final Twiddles twiddles;
  private final Leaves leaves;
  private final int half;
  private final int lanes;
  private final double toPoints;
  private final double toModes;

  /**
   * Makes a plan.
   *
   * @param points number of points N of the line, a power of two, at least 32
   * @param lanes length of a row, a multiple of the width of the kernels
   * @param toPoints factor of the way to the points
   * @param toModes factor of the way to the modes
   * @param kernels how the passes are done
   */
  public LaneFourier(
      int points, int lanes, double toPoints, double toModes, LaneKernels kernels) {
    this.half = points / HALVES;
    this.lanes = lanes;
    this.toPoints = toPoints;
    this.toModes = toModes;
    this.kernels = kernels;
    this.layout = new LaneLayout(half, lanes);
    this.twiddles = new Twiddles(points);
    this.leaves = new Leaves(twiddles, layout);
  }

  /**
   * How slots and points lie in the arrays.
   *
   * @return the layout, of N/2 rows
   */
  public LaneLayout layout() {
    return layout;
  }

  /**
   * Point of a row.
   *
   * @param points number of points N of the line
   * @param parity 0 for the even half, 1 for the odd one
   * @param row row of the arrays of points
   * @return its number on the line
   */
  public static int pointOf(int points, int parity, int row) {
    return parity
        + HALVES * Twiddles.reversed(row, Integer.numberOfTrailingZeros(points / HALVES));
  }

  /**
   * From the slots to one half of the points: f_p = scale * sum over m of a_m exp(2 pi i m p/N).
   *
   * @param parity 0 for the even half, 1 for the odd one
   * @param slotsRe real parts of the modes, zero where there is none
   * @param slotsIm imaginary parts
   * @param re overwritten with the real parts of the points
   * @param im overwritten with the imaginary parts
   */
  public void toPoints(
      int parity, double[] slotsRe, double[] slotsIm, double[] re, double[] im) {
    int quarter = half / 4;
    int length = layout.at(quarter * lanes);
    if (parity == 0) {
      kernels.fromModes(slotsRe, slotsIm, toPoints, re, im, length);
    } else {
      // the second half of the slots holds the negative modes: the opposite sign
      kernels.fromModesTurned(
          slotsRe, slotsIm, toPoints, -toPoints * twiddles.re[1], -toPoints * twiddles.im[1],
          twiddles.re[2], twiddles.im[2], re, im, length);
    }
    if (half * lanes <= PART) {
      pointPasses(re, im, 4 * parity, 4, 0, quarter);
    } else {
      for (int child = 0; child < 4; child++) {
        toPoints(re, im, 4 * parity + child, child * quarter, quarter);
      }
    }
  }

  private void toPoints(double[] re, double[] im, int block, int row, int size) {
    if (size * lanes <= PART || size < FEWEST_POINTS) {
      pointPasses(re, im, block, 1, row, size);
      return;
    }
    int quarter = size / 4;
    points4(re, im, block, 1, row, quarter);
    for (int child = 0; child < 4; child++) {
      toPoints(re, im, 4 * block + child, row + child * quarter, quarter);
    }
  }

  /** All passes on neighbouring blocks of the given size. */
  private void pointPasses(double[] re, double[] im, int block, int count, int row, int size) {
    int first = block;
    int blocks = count;
    int rows = size;
    while (rows > 8) {
      points4(re, im, first, blocks, row, rows / 4);
      first *= 4;
      blocks *= 4;
      rows /= 4;
    }
    if (rows == 8) {
      kernels.pointLeaves8(re, im, leaves, first, first + blocks, row);
    } else {
      kernels.pointLeaves(re, im, leaves, first, first + blocks, row);
    }
  }

  private void points4(
      double[] re, double[] im, int first, int blocks, int row, int quarter) {
    int length = layout.at(quarter * lanes);
    for (int b = 0; b < blocks; b++) {
      int w = first + b;
      kernels.points4(
          re, im, twiddles.re[w], twiddles.im[w], twiddles.re[2 * w], twiddles.im[2 * w],
          layout.at((row + 4 * b * quarter) * lanes), length);
    }
  }

  /**
   * From one half of the points to the slots: the even half overwrites them with scale * sum over
   * its points of f_p exp(-2 pi i m p/N), the odd half adds its part.
   *
   * @param parity 0 for the even half, 1 for the odd one
   * @param re real parts of the points; scratch afterwards
   * @param im imaginary parts of the points; scratch afterwards
   * @param slotsRe real parts of the modes
   * @param slotsIm imaginary parts of the modes
   */
  public void toModes(
      int parity, double[] re, double[] im, double[] slotsRe, double[] slotsIm) {
    int quarter = half / 4;
    if (half * lanes <= PART) {
      modePasses(re, im, 4 * parity, 4, 0, quarter);
    } else {
      for (int child = 0; child < 4; child++) {
        toModes(re, im, 4 * parity + child, child * quarter, quarter);
      }
    }
    int length = layout.at(quarter * lanes);
    if (parity == 0) {
      kernels.intoModes(re, im, toModes, slotsRe, slotsIm, length);
    } else {
      kernels.addToModesTurned(
          re, im, toModes, -toModes * twiddles.re[1], -toModes * twiddles.im[1],
          twiddles.re[2], twiddles.im[2], slotsRe, slotsIm, length);
    }
  }

  private void toModes(double[] re, double[] im, int block, int row, int size) {
    if (size * lanes <= PART || size < FEWEST_POINTS) {
      modePasses(re, im, block, 1, row, size);
      return;
    }
    int quarter = size / 4;
    for (int child = 0; child < 4; child++) {
      toModes(re, im, 4 * block + child, row + child * quarter, quarter);
    }
    modes4(re, im, block, 1, row, quarter);
  }

  private void modePasses(double[] re, double[] im, int block, int count, int row, int size) {
    boolean odd = Integer.numberOfTrailingZeros(size) % 2 == 1;
    int rows = odd ? 8 : 4;
    int leafBlocks = count * size / rows;
    int firstLeaf = block * size / rows;
    if (odd) {
      kernels.modeLeaves8(re, im, leaves, firstLeaf, firstLeaf + leafBlocks, row);
    } else {
      kernels.modeLeaves(re, im, leaves, firstLeaf, firstLeaf + leafBlocks, row);
    }
    for (; rows < size; rows *= 4) {
      int each = size / (4 * rows);
      modes4(re, im, block * each, count * each, row, rows);
    }
  }

  private void modes4(
      double[] re, double[] im, int first, int blocks, int row, int quarter) {
    int length = layout.at(quarter * lanes);
    for (int b = 0; b < blocks; b++) {
      int w = first + b;
      kernels.modes4(
          re, im, twiddles.re[w], twiddles.im[w], twiddles.re[2 * w], twiddles.im[2 * w],
          layout.at((row + 4 * b * quarter) * lanes), length);
    }
  }
}
