package spgpe.projector;

import java.util.Arrays;
import spgpe.internal.check.Check;
import spgpe.internal.lanes.LaneFourier;
import spgpe.internal.lanes.LaneKernels;
import spgpe.internal.lanes.LaneLayout;

/**
 * Transform of a line whose kept modes fill at most half of the axis: each half of the points, the
 * even and the odd ones, is worked on completely before the other, and the full spectrum, most of it
 * zero, is never made.
 */
final class HalfBandLine implements ModeTransform {
  private final CoherentRegion region;
  private final int components;
  private final int lanes;
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
    this.region = region;
    this.components = components;
    this.lanes = lanes;
    int size = region.grid().points();
    double root = Math.sqrt(region.grid().volume());
    this.fourier = new LaneFourier(size, lanes, 1 / root, root / size, kernels);
    this.layout = fourier.layout();
    int[] places = new int[region.modes()];
    for (int m = 0; m < places.length; m++) {
      places[m] = layout.at(fourier.slotOf(region.modeNumber(0, m)) * lanes);
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
    int chunk = layout.chunkPoints();
    this.blocks = new PointBlock[LaneFourier.HALVES][layout.points() / chunk];
    for (int h = 0; h < LaneFourier.HALVES; h++) {
      for (int row = 0; row < layout.points(); row++) {
        points[h][row] = fourier.pointOf(h, row);
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
  public void toPosition(Amplitudes amplitudes, Field field) {
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    Check.notNull(field, "field").requireShape(region.grid(), components, lanes);
    for (int c = 0; c < components; c++) {
      runs.spread(amplitudes.re(c), slotsRe[c]);
      runs.spread(amplitudes.im(c), slotsIm[c]);
      for (int h = 0; h < LaneFourier.HALVES; h++) {
        fourier.toPoints(h, slotsRe[c], slotsIm[c], psiRe[c], psiIm[c]);
        for (int row = 0; row < layout.points(); row++) {
          int from = layout.at(row * lanes);
          System.arraycopy(psiRe[c], from, field.re(c), points[h][row] * lanes, lanes);
          System.arraycopy(psiIm[c], from, field.im(c), points[h][row] * lanes, lanes);
        }
      }
    }
  }

  @Override
  public void toModes(Field field, Amplitudes amplitudes) {
    Check.notNull(field, "field").requireShape(region.grid(), components, lanes);
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    for (int c = 0; c < components; c++) {
      for (int h = 0; h < LaneFourier.HALVES; h++) {
        for (int row = 0; row < layout.points(); row++) {
          int to = layout.at(row * lanes);
          System.arraycopy(field.re(c), points[h][row] * lanes, resultRe[c], to, lanes);
          System.arraycopy(field.im(c), points[h][row] * lanes, resultIm[c], to, lanes);
        }
        fourier.toModes(h, resultRe[c], resultIm[c], sumRe[c], sumIm[c]);
      }
      runs.collect(sumRe[c], amplitudes.re(c));
      runs.collect(sumIm[c], amplitudes.im(c));
    }
  }

  @Override
  public void applyLocal(Amplitudes amplitudes, LocalOperation operation, Amplitudes result) {
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    Check.notNull(operation, "operation");
    Check.notNull(result, "result").requireShape(region, components, lanes);
    for (int c = 0; c < components; c++) {
      runs.spread(amplitudes.re(c), slotsRe[c]);
      runs.spread(amplitudes.im(c), slotsIm[c]);
    }
    for (int h = 0; h < LaneFourier.HALVES; h++) {
      for (int c = 0; c < components; c++) {
        fourier.toPoints(h, slotsRe[c], slotsIm[c], psiRe[c], psiIm[c]);
        Arrays.fill(resultRe[c], 0);
        Arrays.fill(resultIm[c], 0);
      }
      for (PointBlock block : blocks[h]) {
        operation.addTo(block);
      }
      for (int c = 0; c < components; c++) {
        fourier.toModes(h, resultRe[c], resultIm[c], sumRe[c], sumIm[c]);
      }
    }
    for (int c = 0; c < components; c++) {
      runs.collect(sumRe[c], result.re(c));
      runs.collect(sumIm[c], result.im(c));
    }
  }
}
