package spgpe.internal.lanes;

/**
 * The transforms of {@link LaneFourier} on arrays of their own for each row, by passes of radix 2 in
 * short loops: the just-in-time compiler turns such loops, and no longer ones or ones over several
 * parts of one array, into vector code. The same additions and multiplications, so the same bits.
 * Immutable; arrays belong to the caller.
 */
public final class RowFourier {
  private final Twiddles twiddles;
  private final int half;
  private final double toPoints;
  private final double toModes;

  /**
   * Makes a plan.
   *
   * @param points number of points N of the line, a power of two, at least 32
   * @param toPoints factor of the way to the points
   * @param toModes factor of the way to the modes
   */
  public RowFourier(int points, double toPoints, double toModes) {
    this.twiddles = new Twiddles(points);
    this.half = points / LaneFourier.HALVES;
    this.toPoints = toPoints;
    this.toModes = toModes;
  }

  /**
   * From the slots to one half of the points, like {@link LaneFourier#toPoints}.
   *
   * @param parity 0 for the even half, 1 for the odd one
   * @param slotsRe real parts of the modes, N/2 rows
   * @param slotsIm imaginary parts
   * @param re overwritten with the real parts of the points
   * @param im overwritten with the imaginary parts
   */
  public void toPoints(
      int parity, double[][] slotsRe, double[][] slotsIm, double[][] re, double[][] im) {
    int distance = half / 2;
    for (int r = 0; r < distance; r++) {
      int q = r + distance;
      if (parity == 0) {
        Rows.first(
            slotsRe[r], slotsIm[r], slotsRe[q], slotsIm[q], toPoints, re[r], im[r], re[q], im[q]);
      } else {
        Rows.firstTurned(
            slotsRe[r], slotsIm[r], slotsRe[q], slotsIm[q], toPoints, -toPoints * twiddles.re[1],
            -toPoints * twiddles.im[1], re[r], im[r], re[q], im[q]);
      }
    }
    int block = LaneFourier.HALVES * parity;
    for (int blocks = 2; distance > 1; blocks *= 2, block *= 2) {
      distance /= 2;
      for (int b = 0; b < blocks; b++) {
        int w = block + b;
        for (int r = 2 * b * distance, q = r + distance, end = q; r < end; r++, q++) {
          if (w == 0 && blocks == 2) {
            Rows.sumAndDifference(re[r], im[r], re[q], im[q]);
          } else if (w == 1 && blocks == 2) {
            Rows.quarterTurnToPoints(re[r], im[r], re[q], im[q]);
          } else {
            Rows.toPoints(re[r], im[r], re[q], im[q], twiddles.re[w], twiddles.im[w]);
          }
        }
      }
    }
  }

  /**
   * From one half of the points to the slots, like {@link LaneFourier#toModes}.
   *
   * @param parity 0 for the even half, 1 for the odd one
   * @param re real parts of the points; scratch afterwards
   * @param im imaginary parts of the points; scratch afterwards
   * @param slotsRe real parts of the modes
   * @param slotsIm imaginary parts of the modes
   */
  public void toModes(
      int parity, double[][] re, double[][] im, double[][] slotsRe, double[][] slotsIm) {
    int distance = 1;
    for (int blocks = half / 2; blocks > 1; blocks /= 2, distance *= 2) {
      for (int b = 0; b < blocks; b++) {
        int w = blocks * parity + b;
        for (int r = 2 * b * distance, q = r + distance, end = q; r < end; r++, q++) {
          if (w == 0 && blocks == 2) {
            Rows.sumAndDifference(re[r], im[r], re[q], im[q]);
          } else if (w == 1 && blocks == 2) {
            Rows.quarterTurnToModes(re[r], im[r], re[q], im[q]);
          } else {
            Rows.toModes(re[r], im[r], re[q], im[q], twiddles.re[w], twiddles.im[w]);
          }
        }
      }
    }
    for (int r = 0; r < distance; r++) {
      int q = r + distance;
      if (parity == 0) {
        Rows.last(
            re[r], im[r], re[q], im[q], toModes, slotsRe[r], slotsIm[r], slotsRe[q], slotsIm[q]);
      } else {
        Rows.addLastSum(re[r], re[q], toModes, slotsRe[r]);
        Rows.addLastSum(im[r], im[q], toModes, slotsIm[r]);
        Rows.addLastDifference(
            re[r], im[r], re[q], im[q], -toModes * twiddles.re[1], -toModes * twiddles.im[1],
            slotsRe[q], slotsIm[q]);
      }
    }
  }
}
