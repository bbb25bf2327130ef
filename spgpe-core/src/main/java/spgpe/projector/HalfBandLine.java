package spgpe.projector;

import java.util.Arrays;
import spgpe.internal.check.Check;
import spgpe.internal.lanes.LaneFourier;
import spgpe.internal.lanes.LaneKernels;
import spgpe.internal.lanes.LaneLayout;

/**
 * Transform of a line whose kept modes fill at most half of the axis. The values at the even points
 * and those at the odd points are then two transforms of half the length of the same modes, the
 * second with each mode turned by exp(2 pi i n/N); each half is worked on completely before the next,
 * and the full spectrum, most of it zero, is never made.
 */
final class HalfBandLine implements ModeTransform {
  private static final int HALVES = 2;

  private final CoherentRegion region;
  private final int components;
  private final int lanes;
  private final LaneFourier fourier;
  private final LaneLayout layout;
  private final double[][] psiRe;
  private final double[][] psiIm;
  private final double[][] resultRe;
  private final double[][] resultIm;
  private final PointBlock[][] blocks;

  HalfBandLine(CoherentRegion region, int components, int lanes, LaneKernels kernels) {
    this.region = region;
    this.components = components;
    this.lanes = lanes;
    int half = region.grid().points() / HALVES;
    int[] numbers = new int[region.modes()];
    for (int m = 0; m < numbers.length; m++) {
      numbers[m] = region.modeNumber(0, m);
    }
    double root = Math.sqrt(region.grid().volume());
    this.fourier =
        new LaneFourier(
            half, lanes, numbers, new double[] {0, 0.5}, 1 / root,
            root / region.grid().points(), kernels);
    this.layout = fourier.layout();
    this.psiRe = new double[components][];
    this.psiIm = new double[components][];
    this.resultRe = new double[components][];
    this.resultIm = new double[components][];
    for (int c = 0; c < components; c++) {
      psiRe[c] = layout.newArray(4 * c);
      psiIm[c] = layout.newArray(4 * c + 1);
      resultRe[c] = layout.newArray(4 * c + 2);
      resultIm[c] = layout.newArray(4 * c + 3);
    }
    int chunk = layout.chunkPoints();
    this.blocks = new PointBlock[HALVES][half / chunk];
    for (int h = 0; h < HALVES; h++) {
      for (int b = 0; b < blocks[h].length; b++) {
        int begin = layout.at(b * chunk * lanes);
        blocks[h][b] =
            new PointBlock(
                region.grid(), lanes, psiRe, psiIm, resultRe, resultIm, begin,
                begin + chunk * lanes, h + HALVES * b * chunk, HALVES);
      }
    }
  }

  @Override
  public void toPosition(Amplitudes amplitudes, Field field) {
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    Check.notNull(field, "field").requireShape(region.grid(), components, lanes);
    for (int h = 0; h < HALVES; h++) {
      for (int c = 0; c < components; c++) {
        fourier.inverse(h, amplitudes.re(c), amplitudes.im(c), psiRe[c], psiIm[c]);
        for (int j = 0; j < layout.points(); j++) {
          int from = layout.at(j * lanes);
          int to = (HALVES * j + h) * lanes;
          System.arraycopy(psiRe[c], from, field.re(c), to, lanes);
          System.arraycopy(psiIm[c], from, field.im(c), to, lanes);
        }
      }
    }
  }

  @Override
  public void toModes(Field field, Amplitudes amplitudes) {
    Check.notNull(field, "field").requireShape(region.grid(), components, lanes);
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    amplitudes.clear();
    for (int h = 0; h < HALVES; h++) {
      for (int c = 0; c < components; c++) {
        for (int j = 0; j < layout.points(); j++) {
          int to = layout.at(j * lanes);
          int from = (HALVES * j + h) * lanes;
          System.arraycopy(field.re(c), from, resultRe[c], to, lanes);
          System.arraycopy(field.im(c), from, resultIm[c], to, lanes);
        }
        fourier.forward(h, resultRe[c], resultIm[c], amplitudes.re(c), amplitudes.im(c));
      }
    }
  }

  @Override
  public void applyLocal(Amplitudes amplitudes, LocalOperation operation, Amplitudes result) {
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    Check.notNull(operation, "operation");
    Check.notNull(result, "result").requireShape(region, components, lanes);
    result.clear();
    for (int h = 0; h < HALVES; h++) {
      for (int c = 0; c < components; c++) {
        fourier.inverse(h, amplitudes.re(c), amplitudes.im(c), psiRe[c], psiIm[c]);
        Arrays.fill(resultRe[c], 0);
        Arrays.fill(resultIm[c], 0);
      }
      for (PointBlock block : blocks[h]) {
        operation.addTo(block);
      }
      for (int c = 0; c < components; c++) {
        fourier.forward(h, resultRe[c], resultIm[c], result.re(c), result.im(c));
      }
    }
  }
}
