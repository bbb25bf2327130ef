package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.List;
import spgpe.internal.check.Check;

/**
 * Size of a bubble against time, read at the wall level: half the distance of its walls on a ring,
 * sqrt(area/pi) on a plane. Frames in which the bubble does not reach the wall level are missing,
 * and on a ring those in which it fills the ring. Immutable and thread-safe.
 */
public final class RadiusTrack {
  private final double[] times;
  private final List<Extent> extents;

  private RadiusTrack(double[] times, List<Extent> extents) {
    this.times = times;
    this.extents = extents;
  }

  /**
   * Makes a track.
   *
   * @param times times, increasing
   * @param extents the bubble at each time
   * @return copy of the data
   * @throws IllegalArgumentException if the lengths differ, a time or radius is not finite or the
   *     times do not increase
   */
  public static RadiusTrack of(double[] times, List<Extent> extents) {
    Check.notNull(times, "times");
    Check.notNull(extents, "extents");
    Check.argument(
        times.length == extents.size(),
        "times and extents must be as many: times=%s, extents=%s", times.length, extents.size());
    for (int i = 0; i < times.length; i++) {
      Check.finite(times[i], "time");
      Check.argument(
          i == 0 || times[i] > times[i - 1], "times must increase: times[%s]=%s", i, times[i]);
      Check.notNegative(Check.notNull(extents.get(i), "extent").radius(), "radius");
    }
    return new RadiusTrack(times.clone(), List.copyOf(extents));
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
   * Radius.
   *
   * @param i index
   * @return half the distance of the walls on a ring, sqrt(area/pi) on a plane
   */
  public double radius(int i) {
    return extents.get(i).radius();
  }

  /**
   * Size, radius and centre.
   *
   * @param i index
   * @return the bubble at that time
   */
  public Extent extent(int i) {
    return extents.get(i);
  }

  /**
   * The part of the track in a window of time, for example from birth to the first merger.
   *
   * @param from first time
   * @param to last time
   * @return the part
   */
  public RadiusTrack between(double from, double to) {
    List<Extent> kept = new ArrayList<>();
    double[] at = new double[times.length];
    for (int i = 0; i < times.length; i++) {
      if (times[i] >= from && times[i] <= to) {
        at[kept.size()] = times[i];
        kept.add(extents.get(i));
      }
    }
    return new RadiusTrack(java.util.Arrays.copyOf(at, kept.size()), List.copyOf(kept));
  }

  /**
   * The part of the track before the bubble first wraps around an axis: beyond it the radius is no
   * distance between centre and wall.
   *
   * @return the part
   */
  public RadiusTrack untilWrapped() {
    int end = 0;
    while (end < times.length && !extents.get(end).wraps()) {
      end++;
    }
    return new RadiusTrack(java.util.Arrays.copyOf(times, end), extents.subList(0, end));
  }
}
