package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Connected points of a frame, and whether they close on themselves around an axis. */
final class Region {
  /** On a ring in the order along it. */
  final int[] points;

  final boolean wrapsX;
  final boolean wrapsY;

  Region(int[] points, boolean wrapsX, boolean wrapsY) {
    this.points = points;
    this.wrapsX = wrapsX;
    this.wrapsY = wrapsY;
  }

  int size() {
    return points.length;
  }

  /** The points above a level. */
  Region above(double[] frame, double level) {
    int count = 0;
    int[] kept = new int[points.length];
    for (int p : points) {
      if (frame[p] > level) {
        kept[count++] = p;
      }
    }
    return new Region(Arrays.copyOf(kept, count), wrapsX, wrapsY);
  }

  int highestPoint(double[] frame) {
    int highest = points[0];
    for (int p : points) {
      highest = frame[p] > frame[highest] ? p : highest;
    }
    return highest;
  }

  /** All maximal runs of a ring above a level, in the order of their first points. */
  static List<Region> onRing(double[] frame, double level) {
    int n = frame.length;
    List<Region> regions = new ArrayList<>();
    int gap = 0;
    while (gap < n && frame[gap] > level) {
      gap++;
    }
    if (gap == n) {
      regions.add(run(0, n, n));
      return regions;
    }
    int i = gap + 1;
    while (i < gap + n) {
      if (!(frame[i % n] > level)) {
        i++;
        continue;
      }
      int start = i;
      while (i < gap + n && frame[i % n] > level) {
        i++;
      }
      regions.add(run(start, i - start, n));
    }
    return regions;
  }

  private static Region run(int start, int length, int points) {
    int[] run = new int[length];
    for (int i = 0; i < length; i++) {
      run[i] = (start + i) % points;
    }
    return new Region(run, length == points, false);
  }
}
