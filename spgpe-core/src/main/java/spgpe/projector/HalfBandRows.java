package spgpe.projector;

import spgpe.internal.lanes.LaneFourier;
import spgpe.internal.lanes.RowFourier;

/** The half-band transform on an array for each point: many lanes in plain Java. */
final class HalfBandRows extends HalfBandTransform {
  /** Fewest lanes for which short loops over the lanes are faster than scalar code. */
  static final int FEWEST_LANES = 16;

  private final RowFourier fourier;
  private final int[] slots;
  private final int[][] points;
  private final double[][][] slotsRe;
  private final double[][][] slotsIm;
  private final double[][][] sumRe;
  private final double[][][] sumIm;
  private final double[][][] psiRe;
  private final double[][][] psiIm;
  private final double[][][] resultRe;
  private final double[][][] resultIm;
  private final PointBlock[][] blocks;

  HalfBandRows(CoherentRegion region, int components, int lanes) {
    super(region, components, lanes);
    int size = region.grid().points();
    int half = size / LaneFourier.HALVES;
    double root = Math.sqrt(region.grid().volume());
    this.fourier = new RowFourier(size, 1 / root, root / size);
    this.slots = new int[region.modes()];
    for (int m = 0; m < slots.length; m++) {
      slots[m] = Math.floorMod(region.modeNumber(0, m), half);
    }
    this.slotsRe = new double[components][half][lanes];
    this.slotsIm = new double[components][half][lanes];
    this.sumRe = new double[components][half][lanes];
    this.sumIm = new double[components][half][lanes];
    this.psiRe = new double[components][half][lanes];
    this.psiIm = new double[components][half][lanes];
    this.resultRe = new double[components][half][lanes];
    this.resultIm = new double[components][half][lanes];
    this.points = new int[LaneFourier.HALVES][half];
    this.blocks = new PointBlock[LaneFourier.HALVES][half];
    for (int h = 0; h < LaneFourier.HALVES; h++) {
      for (int row = 0; row < half; row++) {
        points[h][row] = LaneFourier.pointOf(size, h, row);
        blocks[h][row] =
            new PointBlock(
                region.grid(), lanes, row(psiRe, row), row(psiIm, row), row(resultRe, row),
                row(resultIm, row), 0, lanes, new int[] {points[h][row]});
      }
    }
  }

  /** One row of each component. */
  private static double[][] row(double[][][] arrays, int row) {
    double[][] rows = new double[arrays.length][];
    for (int c = 0; c < rows.length; c++) {
      rows[c] = arrays[c][row];
    }
    return rows;
  }

  @Override
  void spread(int c, double[] re, double[] im) {
    for (int m = 0; m < slots.length; m++) {
      System.arraycopy(re, m * lanes, slotsRe[c][slots[m]], 0, lanes);
      System.arraycopy(im, m * lanes, slotsIm[c][slots[m]], 0, lanes);
    }
  }

  @Override
  void collect(int c, double[] re, double[] im) {
    for (int m = 0; m < slots.length; m++) {
      System.arraycopy(sumRe[c][slots[m]], 0, re, m * lanes, lanes);
      System.arraycopy(sumIm[c][slots[m]], 0, im, m * lanes, lanes);
    }
  }

  @Override
  void toPoints(int half, int c) {
    fourier.toPoints(half, slotsRe[c], slotsIm[c], psiRe[c], psiIm[c]);
  }

  @Override
  void toModes(int half, int c) {
    fourier.toModes(half, resultRe[c], resultIm[c], sumRe[c], sumIm[c]);
  }

  @Override
  PointBlock[] blocks(int half) {
    return blocks[half];
  }

  @Override
  void copyOut(int half, int c, double[] re, double[] im) {
    for (int row = 0; row < points[half].length; row++) {
      System.arraycopy(psiRe[c][row], 0, re, points[half][row] * lanes, lanes);
      System.arraycopy(psiIm[c][row], 0, im, points[half][row] * lanes, lanes);
    }
  }

  @Override
  void copyIn(int half, int c, double[] re, double[] im) {
    for (int row = 0; row < points[half].length; row++) {
      System.arraycopy(re, points[half][row] * lanes, resultRe[c][row], 0, lanes);
      System.arraycopy(im, points[half][row] * lanes, resultIm[c][row], 0, lanes);
    }
  }
}
