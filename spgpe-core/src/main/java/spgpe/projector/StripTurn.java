package spgpe.projector;

import spgpe.internal.lanes.LaneLayout;

/**
 * Turns strips of neighbouring rows of a plane, by row and column, to arrays by slot of x and row of
 * the strip, and back. The first columns are the first slots, the others the last ones. Immutable.
 */
final class StripTurn {
  /** Rows of a strip: a multiple of the width of every kernel. */
  static final int ROWS = 8;

  private final LaneLayout rows;
  private final LaneLayout slots;
  private final int right;

  /** For the given number of columns at the first slots. */
  StripTurn(LaneLayout rows, LaneLayout slots, int right) {
    this.rows = rows;
    this.slots = slots;
    this.right = right;
  }

  /** The number of columns to store if so many are needed. */
  static int padded(int columns) {
    return (columns + ROWS - 1) / ROWS * ROWS;
  }

  void take(double[] from, int strip, double[] to) {
    take(from, strip, to, 0, right, 0);
    take(from, strip, to, right, rows.lanes(), slots.points() - rows.lanes());
  }

  private void take(double[] from, int strip, double[] to, int begin, int end, int shift) {
    int first = strip * ROWS;
    int width = rows.lanes();
    int r0 = rows.at(first * width);
    int r1 = rows.at((first + 1) * width);
    int r2 = rows.at((first + 2) * width);
    int r3 = rows.at((first + 3) * width);
    int r4 = rows.at((first + 4) * width);
    int r5 = rows.at((first + 5) * width);
    int r6 = rows.at((first + 6) * width);
    int r7 = rows.at((first + 7) * width);
    for (int x = begin; x < end; x++) {
      int i = slots.at((x + shift) * ROWS);
      to[i] = from[r0 + x];
      to[i + 1] = from[r1 + x];
      to[i + 2] = from[r2 + x];
      to[i + 3] = from[r3 + x];
      to[i + 4] = from[r4 + x];
      to[i + 5] = from[r5 + x];
      to[i + 6] = from[r6 + x];
      to[i + 7] = from[r7 + x];
    }
  }

  void put(double[] from, double[] to, int strip) {
    put(from, to, strip, 0, right, 0);
    put(from, to, strip, right, rows.lanes(), slots.points() - rows.lanes());
  }

  private void put(double[] from, double[] to, int strip, int begin, int end, int shift) {
    int first = strip * ROWS;
    int width = rows.lanes();
    int r0 = rows.at(first * width);
    int r1 = rows.at((first + 1) * width);
    int r2 = rows.at((first + 2) * width);
    int r3 = rows.at((first + 3) * width);
    int r4 = rows.at((first + 4) * width);
    int r5 = rows.at((first + 5) * width);
    int r6 = rows.at((first + 6) * width);
    int r7 = rows.at((first + 7) * width);
    for (int x = begin; x < end; x++) {
      int i = slots.at((x + shift) * ROWS);
      to[r0 + x] = from[i];
      to[r1 + x] = from[i + 1];
      to[r2 + x] = from[i + 2];
      to[r3 + x] = from[i + 3];
      to[r4 + x] = from[i + 4];
      to[r5 + x] = from[i + 5];
      to[r6 + x] = from[i + 6];
      to[r7 + x] = from[i + 7];
    }
  }
}
