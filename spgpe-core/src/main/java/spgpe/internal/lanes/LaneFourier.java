package spgpe.internal.lanes;

/**
 * Transforms between some modes of a line of points and these points, many lanes at a time. Points
 * stand in natural order in the layout of {@link #layout}, modes in any order the caller likes.
 *
 * <p>One set of factors of the modes is one "shift": the same plan serves several lines of points
 * that differ by a translation. Immutable; the arrays belong to the caller.
 *
 * <p>Passes of radix 4, and one of radix 2 if the number of points is not a power of four, the one
 * next to the modes fused with the factors. Parts that fit into the first-level cache are finished
 * one after the other.
 */
public final class LaneFourier {
  /** Fewest points. */
  public static final int FEWEST_POINTS = 16;

  /** Doubles of a part that is worked on by whole passes. */
  private static final int PART = 1024;

  private final LaneKernels kernels;
  private final LaneLayout layout;
  private final Twiddles twiddles;
  private final ModeEdge[] inverseEdges;
  private final ModeEdge[] forwardEdges;
  private final int points;
  private final int lanes;
  private final boolean odd;

  /**
   * Makes a plan.
   *
   * @param points number of points n, a power of two, at least 16
   * @param lanes length of a row, a multiple of the width of the kernels
   * @param modeNumbers mode numbers of the modes in the order of the caller's arrays, different
   *     modulo n
   * @param shifts translations of the points in units of their distance, one for each line
   * @param inverseScale factor of the way to the points
   * @param forwardScale factor of the way to the modes
   * @param kernels how the passes are done
   */
  public LaneFourier(
      int points, int lanes, int[] modeNumbers, double[] shifts, double inverseScale,
      double forwardScale, LaneKernels kernels) {
    this.points = points;
    this.lanes = lanes;
    this.kernels = kernels;
    this.layout = new LaneLayout(points, lanes);
    this.twiddles = new Twiddles(points);
    int bits = Integer.numberOfTrailingZeros(points);
    this.odd = bits % 2 == 1;
    int[] modeOfRow = new int[points];
    java.util.Arrays.fill(modeOfRow, -1);
    for (int m = 0; m < modeNumbers.length; m++) {
      modeOfRow[Twiddles.reversed(Math.floorMod(modeNumbers[m], points), bits)] = m;
    }
    this.inverseEdges = new ModeEdge[shifts.length];
    this.forwardEdges = new ModeEdge[shifts.length];
    for (int s = 0; s < shifts.length; s++) {
      inverseEdges[s] = edge(modeOfRow, modeNumbers, shifts[s], inverseScale, 1);
      forwardEdges[s] = edge(modeOfRow, modeNumbers, shifts[s], forwardScale, -1);
    }
  }

  private ModeEdge edge(
      int[] modeOfRow, int[] modeNumbers, double shift, double scale, int sign) {
    double[] re = new double[points];
    double[] im = new double[points];
    for (int row = 0; row < points; row++) {
      if (modeOfRow[row] >= 0) {
        double angle = sign * 2 * Math.PI * modeNumbers[modeOfRow[row]] * shift / points;
        re[row] = scale * Math.cos(angle);
        im[row] = scale * Math.sin(angle);
      }
    }
    return new ModeEdge(layout, twiddles, modeOfRow, re, im);
  }

  /**
   * Where the points lie.
   *
   * @return the layout of the arrays of points
   */
  public LaneLayout layout() {
    return layout;
  }

  /**
   * From modes to points: f_j = scale * sum over m of a_m exp(2 pi i m (j + shift)/n).
   *
   * @param shift number of the translation
   * @param modesRe real parts of the modes
   * @param modesIm imaginary parts of the modes
   * @param re overwritten with the real parts of the points
   * @param im overwritten with the imaginary parts of the points
   */
  public void inverse(int shift, double[] modesRe, double[] modesIm, double[] re, double[] im) {
    inverse(inverseEdges[shift], modesRe, modesIm, re, im, 0, points);
  }

  /**
   * From points to modes: a_m += scale * sum over j of f_j exp(-2 pi i m (j + shift)/n).
   *
   * @param shift number of the translation
   * @param re real parts of the points; scratch afterwards
   * @param im imaginary parts of the points; scratch afterwards
   * @param modesRe added to
   * @param modesIm added to
   */
  public void forward(int shift, double[] re, double[] im, double[] modesRe, double[] modesIm) {
    forward(forwardEdges[shift], re, im, modesRe, modesIm, 0, points);
  }

  private boolean isPart(int size) {
    return size * lanes <= PART || size <= FEWEST_POINTS * 2;
  }

  private void inverse(
      ModeEdge edge, double[] modesRe, double[] modesIm, double[] re, double[] im, int block,
      int size) {
    if (isPart(size)) {
      kernels.inverseEdge(
          edge, modesRe, modesIm, re, im, block * (size / 4), (block + 1) * (size / 4));
      int done = 4;
      if (odd) {
        inverse2(re, im, block * (size / 8), (block + 1) * (size / 8));
        done = 8;
      }
      for (; done < size; done *= 4) {
        int each = size / (4 * done);
        inverse4(re, im, block * each, (block + 1) * each, done);
      }
    } else {
      for (int child = 4 * block; child < 4 * block + 4; child++) {
        inverse(edge, modesRe, modesIm, re, im, child, size / 4);
      }
      inverse4(re, im, block, block + 1, size / 4);
    }
  }

  private void forward(
      ModeEdge edge, double[] re, double[] im, double[] modesRe, double[] modesIm, int block,
      int size) {
    if (isPart(size)) {
      int rest = size;
      for (; rest > 8; rest /= 4) {
        int each = size / rest;
        forward4(re, im, block * each, (block + 1) * each, rest / 4);
      }
      if (odd) {
        forward2(re, im, block * (size / 8), (block + 1) * (size / 8));
      }
      kernels.forwardEdge(
          edge, re, im, modesRe, modesIm, block * (size / 4), (block + 1) * (size / 4));
    } else {
      forward4(re, im, block, block + 1, size / 4);
      for (int child = 4 * block; child < 4 * block + 4; child++) {
        forward(edge, re, im, modesRe, modesIm, child, size / 4);
      }
    }
  }

  private void inverse4(double[] re, double[] im, int first, int last, int quarter) {
    int length = layout.at(quarter * lanes);
    if (4 * quarter == points) {
      kernels.inverseTop(re, im, length);
      return;
    }
    for (int b = first; b < last; b++) {
      kernels.inverse4(
          re, im, twiddles.re[b], twiddles.im[b], twiddles.re[2 * b], twiddles.im[2 * b],
          layout.at(4 * b * quarter * lanes), length);
    }
  }

  private void inverse2(double[] re, double[] im, int first, int last) {
    int length = layout.at(4 * lanes);
    for (int b = first; b < last; b++) {
      kernels.inverse2(
          re, im, twiddles.re[b], twiddles.im[b], layout.at(8 * b * lanes), length);
    }
  }

  private void forward4(double[] re, double[] im, int first, int last, int quarter) {
    int length = layout.at(quarter * lanes);
    if (4 * quarter == points) {
      kernels.forwardTop(re, im, length);
      return;
    }
    for (int b = first; b < last; b++) {
      kernels.forward4(
          re, im, twiddles.re[b], twiddles.im[b], twiddles.re[2 * b], twiddles.im[2 * b],
          layout.at(4 * b * quarter * lanes), length);
    }
  }

  private void forward2(double[] re, double[] im, int first, int last) {
    int length = layout.at(4 * lanes);
    for (int b = first; b < last; b++) {
      kernels.forward2(
          re, im, twiddles.re[b], twiddles.im[b], layout.at(8 * b * lanes), length);
    }
  }
}
