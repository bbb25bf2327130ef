package spgpe.projector;

import java.util.Arrays;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;
import spgpe.internal.lanes.LaneFourier;
import spgpe.internal.lanes.LaneKernels;
import spgpe.internal.lanes.LaneLayout;

/**
 * Transform of a plane whose kept modes fill at most half of each axis, one lane after the other.
 *
 * <p>The columns (values of k along x) that can hold a kept mode are the lanes of a half-band
 * transform over y. Each half of its rows is worked on in strips of neighbouring rows, which are the
 * lanes of a transform over x: a strip goes to its even points, through the local operation and
 * back, then to its odd points, and stays in the first-level cache. The full spectrum and the full
 * field are never made.
 */
final class HalfBandPlane implements ModeTransform {
  private static final int STRIP = StripTurn.ROWS;

  /** Arrays of all components. */
  private record Parts(double[][] re, double[][] im) {
    static Parts of(LaneLayout layout, int components, int number) {
      Parts parts = new Parts(new double[components][], new double[components][]);
      for (int c = 0; c < components; c++) {
        parts.re[c] = layout.newArray(number + 4 * c);
        parts.im[c] = layout.newArray(number + 4 * c + 1);
      }
      return parts;
    }
  }

  private final CoherentRegion region;
  private final int components;
  private final int lanes;
  private final LaneFourier overX;
  private final LaneFourier overY;
  private final SlotRuns runs;
  private final StripTurn turn;
  private final int strips;

  /** Kept modes by slot of y and column. */
  private final Parts slots;

  private final Parts sums;

  /** Rows of one half by column: first what becomes psi, then what became of the result. */
  private final Parts columns;

  private final Parts stripSlots;
  private final Parts stripSums;
  private final Parts psi;
  private final Parts result;

  /** Blocks of a strip by half of y, strip and half of x. */
  private final PointBlock[][][][] blocks;

  HalfBandPlane(CoherentRegion region, int components, int lanes, LaneKernels kernels) {
    this.region = region;
    this.components = components;
    this.lanes = lanes;
    PeriodicGrid grid = region.grid();
    int pointsX = grid.axis(0).points();
    int pointsY = grid.axis(1).points();
    double root = Math.sqrt(grid.volume());
    this.overX = new LaneFourier(pointsX, STRIP, 1, 1, kernels);
    int slotsX = overX.layout().points();
    int right = StripTurn.padded(region.largestMode(0) + 1);
    int width = right + StripTurn.padded(region.largestMode(0));
    this.overY = new LaneFourier(pointsY, width, 1 / root, root / grid.points(), kernels);
    LaneLayout layout = overY.layout();
    this.turn = new StripTurn(layout, overX.layout(), right);
    this.strips = layout.points() / STRIP;
    int[] places = new int[region.modes()];
    for (int m = 0; m < places.length; m++) {
      int nx = region.modeNumber(0, m);
      int slot = Math.floorMod(region.modeNumber(1, m), layout.points());
      places[m] = layout.at(slot * width) + Math.floorMod(nx, nx < 0 ? width : slotsX);
    }
    this.runs = SlotRuns.of(places, 1);
    this.slots = Parts.of(layout, components, 0);
    this.sums = Parts.of(layout, components, 2);
    this.columns = Parts.of(layout, components, 2);
    this.stripSlots = Parts.of(overX.layout(), components, 0);
    this.stripSums = Parts.of(overX.layout(), components, 2);
    this.psi = Parts.of(overX.layout(), components, 0);
    this.result = Parts.of(overX.layout(), components, 2);
    this.blocks = new PointBlock[LaneFourier.HALVES][strips][LaneFourier.HALVES][];
    for (int halfY = 0; halfY < LaneFourier.HALVES; halfY++) {
      for (int strip = 0; strip < strips; strip++) {
        for (int halfX = 0; halfX < LaneFourier.HALVES; halfX++) {
          blocks[halfY][strip][halfX] = blocks(halfY, strip, halfX);
        }
      }
    }
  }

  private PointBlock[] blocks(int halfY, int strip, int halfX) {
    int pointsX = region.grid().axis(0).points();
    int pointsY = region.grid().axis(1).points();
    int chunk = overX.layout().chunkPoints();
    PointBlock[] all = new PointBlock[overX.layout().points() / chunk];
    for (int b = 0; b < all.length; b++) {
      int[] points = new int[chunk * STRIP];
      for (int i = 0; i < points.length; i++) {
        int x = LaneFourier.pointOf(pointsX, halfX, b * chunk + i / STRIP);
        int y = LaneFourier.pointOf(pointsY, halfY, strip * STRIP + i % STRIP);
        points[i] = y * pointsX + x;
      }
      int begin = overX.layout().at(b * chunk * STRIP);
      all[b] =
          new PointBlock(
              region.grid(), 1, psi.re, psi.im, result.re, result.im, begin,
              begin + points.length, points);
    }
    return all;
  }

  private void spread(Amplitudes amplitudes, int c, int lane) {
    runs.spread(amplitudes.re(c), lanes, lane, slots.re[c]);
    runs.spread(amplitudes.im(c), lanes, lane, slots.im[c]);
  }

  private void collect(int c, int lane, Amplitudes amplitudes) {
    runs.collect(sums.re[c], amplitudes.re(c), lanes, lane);
    runs.collect(sums.im[c], amplitudes.im(c), lanes, lane);
  }

  private void rowsFromSlots(int half, int c) {
    overY.toPoints(half, slots.re[c], slots.im[c], columns.re[c], columns.im[c]);
  }

  private void rowsToSums(int half, int c) {
    overY.toModes(half, columns.re[c], columns.im[c], sums.re[c], sums.im[c]);
  }

  private void takeStrip(int strip, int c) {
    turn.take(columns.re[c], strip, stripSlots.re[c]);
    turn.take(columns.im[c], strip, stripSlots.im[c]);
  }

  private void putStrip(int strip, int c) {
    turn.put(stripSums.re[c], columns.re[c], strip);
    turn.put(stripSums.im[c], columns.im[c], strip);
  }

  private void stripToPoints(int half, int c) {
    overX.toPoints(half, stripSlots.re[c], stripSlots.im[c], psi.re[c], psi.im[c]);
  }

  private void stripToModes(int half, int c) {
    overX.toModes(half, result.re[c], result.im[c], stripSums.re[c], stripSums.im[c]);
  }

  @Override
  public void toPosition(Amplitudes amplitudes, Field field) {
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    Check.notNull(field, "field").requireShape(region.grid(), components, lanes);
    for (int c = 0; c < components; c++) {
      for (int lane = 0; lane < lanes; lane++) {
        spread(amplitudes, c, lane);
        for (int halfY = 0; halfY < LaneFourier.HALVES; halfY++) {
          rowsFromSlots(halfY, c);
          for (int strip = 0; strip < strips; strip++) {
            takeStrip(strip, c);
            for (int halfX = 0; halfX < LaneFourier.HALVES; halfX++) {
              stripToPoints(halfX, c);
              for (PointBlock block : blocks[halfY][strip][halfX]) {
                copyOut(block, c, field, lane);
              }
            }
          }
        }
      }
    }
  }

  private void copyOut(PointBlock block, int c, Field field, int lane) {
    for (int i = block.begin(); i < block.end(); i++) {
      int to = block.pointOf(i) * lanes + lane;
      field.re(c)[to] = psi.re[c][i];
      field.im(c)[to] = psi.im[c][i];
    }
  }

  @Override
  public void toModes(Field field, Amplitudes amplitudes) {
    Check.notNull(field, "field").requireShape(region.grid(), components, lanes);
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    for (int c = 0; c < components; c++) {
      for (int lane = 0; lane < lanes; lane++) {
        for (int halfY = 0; halfY < LaneFourier.HALVES; halfY++) {
          for (int strip = 0; strip < strips; strip++) {
            for (int halfX = 0; halfX < LaneFourier.HALVES; halfX++) {
              for (PointBlock block : blocks[halfY][strip][halfX]) {
                copyIn(field, lane, block, c);
              }
              stripToModes(halfX, c);
            }
            putStrip(strip, c);
          }
          rowsToSums(halfY, c);
        }
        collect(c, lane, amplitudes);
      }
    }
  }

  private void copyIn(Field field, int lane, PointBlock block, int c) {
    for (int i = block.begin(); i < block.end(); i++) {
      int from = block.pointOf(i) * lanes + lane;
      result.re[c][i] = field.re(c)[from];
      result.im[c][i] = field.im(c)[from];
    }
  }

  @Override
  public void applyLocal(Amplitudes amplitudes, LocalOperation operation, Amplitudes target) {
    Check.notNull(amplitudes, "amplitudes").requireShape(region, components, lanes);
    Check.notNull(operation, "operation");
    Check.notNull(target, "result").requireShape(region, components, lanes);
    for (int lane = 0; lane < lanes; lane++) {
      for (int c = 0; c < components; c++) {
        spread(amplitudes, c, lane);
      }
      for (int halfY = 0; halfY < LaneFourier.HALVES; halfY++) {
        for (int c = 0; c < components; c++) {
          rowsFromSlots(halfY, c);
        }
        for (int strip = 0; strip < strips; strip++) {
          applyToStrip(operation, halfY, strip);
        }
        for (int c = 0; c < components; c++) {
          rowsToSums(halfY, c);
        }
      }
      for (int c = 0; c < components; c++) {
        collect(c, lane, target);
      }
    }
  }

  private void applyToStrip(LocalOperation operation, int halfY, int strip) {
    for (int c = 0; c < components; c++) {
      takeStrip(strip, c);
    }
    for (int halfX = 0; halfX < LaneFourier.HALVES; halfX++) {
      for (int c = 0; c < components; c++) {
        stripToPoints(halfX, c);
        Arrays.fill(result.re[c], 0);
        Arrays.fill(result.im[c], 0);
      }
      for (PointBlock block : blocks[halfY][strip][halfX]) {
        operation.addTo(block);
      }
      for (int c = 0; c < components; c++) {
        stripToModes(halfX, c);
      }
    }
    for (int c = 0; c < components; c++) {
      putStrip(strip, c);
    }
  }
}
