package spgpe.projector;

import java.util.Arrays;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierTransform;
import spgpe.internal.check.Check;

/** Transform of a one-dimensional region, one component and lane at a time. */
final class LineTransform implements ModeTransform {
  private final CoherentRegion region;
  private final int components;
  private final int lanes;
  private final FourierTransform fourier;
  private final int[] gridIndex;
  private final double[] buffer;
  private final double toPositionScale;
  private final double toModesScale;
  private final Field psi;
  private final Field result;
  private final PointBlock block;

  LineTransform(CoherentRegion region, int components, int lanes, FourierProvider provider) {
    int points = region.grid().points();
    this.region = region;
    this.components = components;
    this.lanes = lanes;
    this.fourier = Check.notNull(provider.transform(points), "transform of the provider");
    Check.argument(
        fourier.size() == points,
        "transform of provider \"%s\" has the wrong size: size=%s, points=%s",
        provider.name(), fourier.size(), points);
    this.gridIndex = new int[region.modes()];
    for (int m = 0; m < gridIndex.length; m++) {
      gridIndex[m] = 2 * region.gridIndex(m);
    }
    this.buffer = new double[2 * points];
    this.toPositionScale = 1 / Math.sqrt(region.grid().volume());
    this.toModesScale = Math.sqrt(region.grid().volume()) / points;
    this.psi = new Field(region.grid(), components, lanes);
    this.result = new Field(region.grid(), components, lanes);
    this.block = PointBlock.ofAll(psi, result);
  }

  @Override
  public void toPosition(Amplitudes amplitudes, Field field) {
    Check.notNull(amplitudes, "amplitudes");
    Check.notNull(field, "field");
    amplitudes.requireShape(region, components, lanes);
    field.requireShape(region.grid(), components, lanes);
    for (int c = 0; c < components; c++) {
      for (int lane = 0; lane < lanes; lane++) {
        scatter(amplitudes.re(c), amplitudes.im(c), lane);
        fourier.inverse(buffer, 0);
        unpack(field.re(c), field.im(c), lane);
      }
    }
  }

  @Override
  public void toModes(Field field, Amplitudes amplitudes) {
    Check.notNull(field, "field");
    Check.notNull(amplitudes, "amplitudes");
    amplitudes.requireShape(region, components, lanes);
    field.requireShape(region.grid(), components, lanes);
    for (int c = 0; c < components; c++) {
      for (int lane = 0; lane < lanes; lane++) {
        pack(field.re(c), field.im(c), lane);
        fourier.forward(buffer, 0);
        gather(amplitudes.re(c), amplitudes.im(c), lane);
      }
    }
  }

  @Override
  public void applyLocal(Amplitudes amplitudes, LocalOperation operation, Amplitudes target) {
    Check.notNull(operation, "operation");
    Check.notNull(target, "result");
    toPosition(amplitudes, psi);
    for (int c = 0; c < components; c++) {
      Arrays.fill(result.re(c), 0);
      Arrays.fill(result.im(c), 0);
    }
    operation.addTo(block);
    toModes(result, target);
  }

  private void scatter(double[] re, double[] im, int lane) {
    Arrays.fill(buffer, 0);
    for (int m = 0, i = lane; m < gridIndex.length; m++, i += lanes) {
      buffer[gridIndex[m]] = toPositionScale * re[i];
      buffer[gridIndex[m] + 1] = toPositionScale * im[i];
    }
  }

  private void gather(double[] re, double[] im, int lane) {
    for (int m = 0, i = lane; m < gridIndex.length; m++, i += lanes) {
      re[i] = toModesScale * buffer[gridIndex[m]];
      im[i] = toModesScale * buffer[gridIndex[m] + 1];
    }
  }

  private void unpack(double[] re, double[] im, int lane) {
    for (int p = 0, i = lane; p < buffer.length; p += 2, i += lanes) {
      re[i] = buffer[p];
      im[i] = buffer[p + 1];
    }
  }

  private void pack(double[] re, double[] im, int lane) {
    for (int p = 0, i = lane; p < buffer.length; p += 2, i += lanes) {
      buffer[p] = re[i];
      buffer[p + 1] = im[i];
    }
  }
}
