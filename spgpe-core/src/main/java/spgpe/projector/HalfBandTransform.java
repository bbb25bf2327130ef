package spgpe.projector;

import spgpe.internal.check.Check;
import spgpe.internal.lanes.LaneFourier;

/**
 * Transform of a line whose kept modes fill at most half of the axis: each half of the points, the
 * even and the odd ones, is worked on completely before the other, and the full spectrum, most of it
 * zero, is never made. Subclasses hold the arrays.
 */
abstract class HalfBandTransform implements ModeTransform {
  /** Components, each with its own arrays. */
  final int components;

  /** Length of a row. */
  final int lanes;

  private final CoherentRegion region;

  HalfBandTransform(CoherentRegion region, int components, int lanes) {
    this.region = region;
    this.components = components;
    this.lanes = lanes;
  }

  /** Kept modes to the slots that the transforms read. */
  abstract void spread(int component, double[] re, double[] im);

  /** Slots that the transforms wrote to the kept modes. */
  abstract void collect(int component, double[] re, double[] im);

  /** From the slots to psi on one half of the points. */
  abstract void toPoints(int half, int component);

  /** From the result on one half of the points to the slots; the even half comes first. */
  abstract void toModes(int half, int component);

  /** Blocks of one half of the points. */
  abstract PointBlock[] blocks(int half);

  /** Copies psi on one half of the points to a field. */
  abstract void copyOut(int half, int component, double[] re, double[] im);

  /** Copies a field to the result on one half of the points. */
  abstract void copyIn(int half, int component, double[] re, double[] im);

  @Override
  public final void toPosition(Amplitudes amplitudes, Field field) {
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    Check.notNull(field, "field").requireShape(region.grid(), components, lanes);
    for (int c = 0; c < components; c++) {
      spread(c, amplitudes.re(c), amplitudes.im(c));
      for (int h = 0; h < LaneFourier.HALVES; h++) {
        toPoints(h, c);
        copyOut(h, c, field.re(c), field.im(c));
      }
    }
  }

  @Override
  public final void toModes(Field field, Amplitudes amplitudes) {
    Check.notNull(field, "field").requireShape(region.grid(), components, lanes);
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    for (int c = 0; c < components; c++) {
      for (int h = 0; h < LaneFourier.HALVES; h++) {
        copyIn(h, c, field.re(c), field.im(c));
        toModes(h, c);
      }
      collect(c, amplitudes.re(c), amplitudes.im(c));
    }
  }

  @Override
  public final void applyLocal(
      Amplitudes amplitudes, LocalOperation operation, Amplitudes result) {
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    Check.notNull(operation, "operation");
    Check.notNull(result, "result").requireShape(region, components, lanes);
    for (int c = 0; c < components; c++) {
      spread(c, amplitudes.re(c), amplitudes.im(c));
    }
    for (int h = 0; h < LaneFourier.HALVES; h++) {
      for (int c = 0; c < components; c++) {
        toPoints(h, c);
      }
      for (PointBlock block : blocks(h)) {
        block.clearResult(); // block by block: it stays in the nearest cache
        operation.addTo(block);
      }
      for (int c = 0; c < components; c++) {
        toModes(h, c);
      }
    }
    for (int c = 0; c < components; c++) {
      collect(c, result.re(c), result.im(c));
    }
  }
}
