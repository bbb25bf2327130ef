package spgpe.projector;

import java.util.Arrays;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierTransform;
import spgpe.internal.check.Check;

/** What the transforms of lines and planes share: one component and lane after the other. */
abstract class LaneTransform implements ModeTransform {
  /** Realisations advanced together: the distance of neighbouring points or modes of a lane. */
  final int lanes;

  /** Factor of the unscaled inverse transform. */
  final double toPositionScale;

  /** Factor of the forward transform. */
  final double toModesScale;

  private final CoherentRegion region;
  private final int components;
  private final Field psi;
  private final Field result;
  private final PointBlock block;

  LaneTransform(CoherentRegion region, int components, int lanes) {
    this.region = region;
    this.components = components;
    this.lanes = lanes;
    this.toPositionScale = 1 / Math.sqrt(region.grid().volume());
    this.toModesScale = Math.sqrt(region.grid().volume()) / region.grid().points();
    this.psi = new Field(region.grid(), components, lanes);
    this.result = new Field(region.grid(), components, lanes);
    this.block = PointBlock.ofAll(psi, result);
  }

  /** From the kept modes (first two arrays) to positions, for one lane of one component. */
  abstract void inverse(
      double[] modesRe, double[] modesIm, double[] pointsRe, double[] pointsIm, int lane);

  /** From positions (first two arrays) to the kept modes, for one lane of one component. */
  abstract void forward(
      double[] pointsRe, double[] pointsIm, double[] modesRe, double[] modesIm, int lane);

  static FourierTransform plan(FourierProvider provider, int points) {
    FourierTransform plan =
        Check.notNull(provider.transform(points), "transform of the provider");
    Check.argument(
        plan.size() == points,
        "transform of provider \"%s\" has the wrong size: size=%s, points=%s",
        provider.name(), plan.size(), points);
    return plan;
  }

  @Override
  public final void toPosition(Amplitudes amplitudes, Field field) {
    Check.notNull(amplitudes, "amplitudes");
    Check.notNull(field, "field");
    amplitudes.requireShape(region, components, lanes);
    field.requireShape(region.grid(), components, lanes);
    for (int c = 0; c < components; c++) {
      for (int lane = 0; lane < lanes; lane++) {
        inverse(amplitudes.re(c), amplitudes.im(c), field.re(c), field.im(c), lane);
      }
    }
  }

  @Override
  public final void toModes(Field field, Amplitudes amplitudes) {
    Check.notNull(field, "field");
    Check.notNull(amplitudes, "amplitudes");
    amplitudes.requireShape(region, components, lanes);
    field.requireShape(region.grid(), components, lanes);
    for (int c = 0; c < components; c++) {
      for (int lane = 0; lane < lanes; lane++) {
        forward(field.re(c), field.im(c), amplitudes.re(c), amplitudes.im(c), lane);
      }
    }
  }

  @Override
  public final void applyLocal(
      Amplitudes amplitudes, LocalOperation operation, Amplitudes target) {
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

  /** Kept modes into their places of a buffer that is zero elsewhere. */
  final void scatter(double[] re, double[] im, int lane, int[] places, double[] buffer) {
    Arrays.fill(buffer, 0);
    for (int m = 0, i = lane; m < places.length; m++, i += lanes) {
      buffer[places[m]] = toPositionScale * re[i];
      buffer[places[m] + 1] = toPositionScale * im[i];
    }
  }

  final void gather(double[] buffer, int[] places, double[] re, double[] im, int lane) {
    for (int m = 0, i = lane; m < places.length; m++, i += lanes) {
      re[i] = toModesScale * buffer[places[m]];
      im[i] = toModesScale * buffer[places[m] + 1];
    }
  }

  /** Interleaved points of a line to one lane of a field, from an index on. */
  final void unpack(double[] line, double[] re, double[] im, int first) {
    for (int p = 0, i = first; p < line.length; p += 2, i += lanes) {
      re[i] = line[p];
      im[i] = line[p + 1];
    }
  }

  final void pack(double[] re, double[] im, int first, double[] line) {
    for (int p = 0, i = first; p < line.length; p += 2, i += lanes) {
      line[p] = re[i];
      line[p + 1] = im[i];
    }
  }
}
