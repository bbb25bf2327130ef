package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.List;
import spgpe.internal.check.Check;

/**
 * Positions of the two walls of a bubble in time, on the unrolled ring: left &lt; right, and
 * positions leave [0, L) when a wall crosses the seam. Frames in which the bubble does not reach
 * the wall level are missing. Immutable and thread-safe.
 */
public final class WallTrack {
  private final double[] times;
  private final double[] left;
  private final double[] right;

  private WallTrack(double[] times, double[] left, double[] right) {
    this.times = times;
    this.left = left;
    this.right = right;
  }

  /**
   * Makes a track from given positions.
   *
   * @param times times, increasing
   * @param left positions of the left wall
   * @param right positions of the right wall
   * @return copy of the data
   * @throws IllegalArgumentException if the lengths differ, a number is not finite or the times do
   *     not increase
   */
  public static WallTrack of(double[] times, double[] left, double[] right) {
    Check.notNull(times, "times");
    Check.notNull(left, "left");
    Check.notNull(right, "right");
    Check.argument(
        times.length == left.length && times.length == right.length,
        "times and positions must be as many: times=%s, left=%s, right=%s",
        times.length, left.length, right.length);
    for (int i = 0; i < times.length; i++) {
      Check.finite(times[i], "time");
      Check.finite(left[i], "left wall");
      Check.finite(right[i], "right wall");
      Check.argument(
          i == 0 || times[i] > times[i - 1], "times must increase: times[%s]=%s", i, times[i]);
    }
    return new WallTrack(times.clone(), left.clone(), right.clone());
  }

  /**
   * Number of frames.
   *
   * @return count
   */
  public int size() {
    return times.length;
  }

  /**
   * A time.
   *
   * @param i index
   * @return time
   */
  public double time(int i) {
    return times[i];
  }

  /**
   * Position of the left wall.
   *
   * @param i index
   * @return position on the unrolled ring
   */
  public double left(int i) {
    return left[i];
  }

  /**
   * Position of the right wall.
   *
   * @param i index
   * @return position on the unrolled ring
   */
  public double right(int i) {
    return right[i];
  }

  /**
   * Half the distance of the walls against time.
   *
   * @return radii; the positions of the centres are on the unrolled ring
   */
  public RadiusTrack radii() {
    List<Extent> extents = new ArrayList<>();
    for (int i = 0; i < times.length; i++) {
      double width = right[i] - left[i];
      Site middle = new Site((left[i] + right[i]) / 2, 0);
      extents.add(new Extent(width, width / 2, middle, false, false));
    }
    return RadiusTrack.of(times, extents);
  }

  /**
   * The part of the track in a window of time, for example from birth to the first merger.
   *
   * @param from first time
   * @param to last time
   * @return the part
   */
  public WallTrack between(double from, double to) {
    int first = 0;
    while (first < times.length && times[first] < from) {
      first++;
    }
    int end = first;
    while (end < times.length && times[end] <= to) {
      end++;
    }
    return new WallTrack(
        java.util.Arrays.copyOfRange(times, first, end),
        java.util.Arrays.copyOfRange(left, first, end),
        java.util.Arrays.copyOfRange(right, first, end));
  }
}
