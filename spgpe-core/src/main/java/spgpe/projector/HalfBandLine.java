package spgpe.projector;

import java.util.Arrays;
import spgpe.internal.lanes.LaneFourier;
import spgpe.internal.lanes.LaneKernels;
import spgpe.internal.lanes.LaneLayout;

/** The half-band transform on one array for all points, by {@link LaneKernels}. */
final class HalfBandLine extends HalfBandTransform {
  /** Most doubles of a block of points: psi and result of a pair fit into the nearest cache. */
  private static final int BLOCK = 256;

  private final LaneFourier fourier;
  private final LaneLayout layout;
  private final SlotRuns runs;
  private final double[][] slotsRe;
  private final double[][] slotsIm;
  private final double[][] sumRe;
  private final double[][] sumIm;
  private final double[][] psiRe;
  private final double[][] psiIm;
  private final double[][] resultRe;
  private final double[][] resultIm;
  private final int[][] points;
  private final PointBlock[][] blocks;

  HalfBandLine(CoherentRegion region, int components, int lanes, LaneKernels kernels) {
    super(region, components, lanes);
    int size = region.grid().points();
    double root = Math.sqrt(region.grid().volume());
    this.fourier = new LaneFourier(size, lanes, 1 / root, root / size, kernels);
    this.layout = fourier.layout();
    int[] places = new int[region.modes()];
    for (int m = 0; m < places.length; m++) {
      places[m] = layout.at(Math.floorMod(region.modeNumber(0, m), layout.points()) * lanes);
    }
    this.runs = SlotRuns.of(places, lanes);
    this.slotsRe = new double[components][];
    this.slotsIm = new double[components][];
    this.sumRe = new double[components][];
    this.sumIm = new double[components][];
    this.psiRe = new double[components][];
    this.psiIm = new double[components][];
    this.resultRe = new double[components][];
    this.resultIm = new double[components][];
    for (int c = 0; c < components; c++) {
      psiRe[c] = layout.newArray(4 * c);
      psiIm[c] = layout.newArray(4 * c + 1);
      resultRe[c] = layout.newArray(4 * c + 2);
      resultIm[c] = layout.newArray(4 * c + 3);
      slotsRe[c] = layout.newArray(4 * c);
      slotsIm[c] = layout.newArray(4 * c + 1);
      sumRe[c] = layout.newArray(4 * c + 2);
      sumIm[c] = layout.newArray(4 * c + 3);
    }
    this.points = new int[LaneFourier.HALVES][layout.points()];
    int chunk =
        Math.min(layout.chunkPoints(), Integer.highestOneBit(Math.max(1, BLOCK / lanes)));
    this.blocks = new PointBlock[LaneFourier.HALVES][layout.points() / chunk];
    for (int h = 0; h < LaneFourier.HALVES; h++) {
      for (int row = 0; row < layout.points(); row++) {
        points[h][row] = LaneFourier.pointOf(size, h, row);
      }
      for (int b = 0; b < blocks[h].length; b++) {
        int begin = layout.at(b * chunk * lanes);
        blocks[h][b] =
            new PointBlock(
                region.grid(), lanes, psiRe, psiIm, resultRe, resultIm, begin,
                begin + chunk * lanes, Arrays.copyOfRange(points[h], b * chunk, (b + 1) * chunk));
      }
    }
  }

  @Override
  void spread(int c, double[] re, double[] im) {
    runs.spread(re, slotsRe[c]);
    runs.spread(im, slotsIm[c]);
  }

  @Override
  void collect(int c, double[] re, double[] im) {
    runs.collect(sumRe[c], re);
    runs.collect(sumIm[c], im);
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
    for (int row = 0; row < layout.points(); row++) {
      int from = layout.at(row * lanes);
      System.arraycopy(psiRe[c], from, re, points[half][row] * lanes, lanes);
      System.arraycopy(psiIm[c], from, im, points[half][row] * lanes, lanes);
    }
  }

  @Override
  void copyIn(int half, int c, double[] re, double[] im) {
    for (int row = 0; row < layout.points(); row++) {
      int to = layout.at(row * lanes);
      System.arraycopy(re, points[half][row] * lanes, resultRe[c], to, lanes);
      System.arraycopy(im, points[half][row] * lanes, resultIm[c], to, lanes);
    }
  }
}
