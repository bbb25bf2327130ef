package spgpe.observables.bubble;

import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;
import spgpe.run.Accumulator;
import spgpe.run.TimeSeries;

/**
 * Finds and follows bubbles of the stable state on a ring, in frames of an order parameter such as
 * the profile of cos phi. Bubbles are counted by births in single frames, not as connected pieces
 * of space-time, in which bubbles that merge later would be one.
 *
 * <p>Frames should follow each other so closely that a bubble overlaps itself: interval times speed
 * below the width. Immutable and thread-safe.
 */
public final class BubbleDetector {
  private final BubbleSettings settings;

  private BubbleDetector(BubbleSettings settings) {
    this.settings = settings;
  }

  /**
   * A detector.
   *
   * @param settings settings, derived from the metastable state or given
   * @return the detector
   */
  public static BubbleDetector of(BubbleSettings settings) {
    return new BubbleDetector(Check.notNull(settings, "settings"));
  }

  /**
   * The settings.
   *
   * @return settings
   */
  public BubbleSettings settings() {
    return settings;
  }

  /**
   * Looks through frames.
   *
   * @param times times of the frames, increasing
   * @param frames frames[s] is the order parameter at all points at times[s], finite
   * @param length length of the ring
   * @return what was found
   * @throws IllegalArgumentException if the frames are not as many as the times, differ in length,
   *     hold a number that is not finite, or the times do not increase
   */
  public BubbleHistory find(double[] times, double[][] frames, double length) {
    Check.notNull(times, "times");
    Check.notNull(frames, "frames");
    return track(times, frames, length, 0, times.length == 0 ? 0 : times[times.length - 1]);
  }

  /**
   * Looks through a recorded trajectory.
   *
   * @param series a series of profiles of the order parameter
   * @param length length of the ring
   * @return what was found
   * @throws IllegalArgumentException if the series is empty or not of finite profiles
   */
  public BubbleHistory find(TimeSeries.Series series, double length) {
    Check.notNull(series, "series");
    return track(
        series.times(), series.values(), length, series.end().trajectory(), series.end().time());
  }

  /**
   * Looks through a recorded trajectory of a model, and refuses what is not a ring.
   *
   * @param series a series of profiles of the order parameter, one number for each point
   * @param ring grid of the model
   * @return what was found
   * @throws IllegalArgumentException if the grid is two-dimensional or has another number of points
   *     than the profiles, or if the series is empty or not of finite profiles
   */
  public BubbleHistory find(TimeSeries.Series series, PeriodicGrid ring) {
    Check.notNull(series, "series");
    double length = lengthOf(ring);
    for (double[] frame : series.values()) {
      requireProfile(ring, frame.length);
    }
    return find(series, length);
  }

  private BubbleHistory track(
      double[] times, double[][] frames, double length, long trajectory, double endTime) {
    Check.positive(length, "length (of the ring)");
    Check.argument(
        times.length == frames.length && times.length > 0,
        "there must be a frame for each time, and at least one: times=%s, frames=%s",
        times.length, frames.length);
    Check.notNull(frames[0], "frames[0]");
    BubbleTracker tracker = new BubbleTracker(settings, frames[0].length, length);
    for (int s = 0; s < times.length; s++) {
      Check.argument(
          Double.isFinite(times[s]) && (s == 0 || times[s] > times[s - 1]),
          "times must be finite and increase: times[%s]=%s", s, times[s]);
      Check.notNull(frames[s], "frames[" + s + "]");
      Check.argument(
          frames[s].length == frames[0].length,
          "frames must be as long: frames[0]=%s points, frames[%s]=%s points",
          frames[0].length, s, frames[s].length);
      requireFinite(times[s], frames[s]);
      tracker.add(times[s], frames[s]);
    }
    return tracker.finish(trajectory, endTime);
  }

  /**
   * Looks while the ensemble of a model runs, and refuses what is not a ring. Record a profile of
   * the order parameter.
   *
   * @param ring grid of the model
   * @return factory for a recording; throws IllegalArgumentException if what is recorded has
   *     another number of values than the ring has points
   * @throws IllegalArgumentException if the grid is two-dimensional
   */
  public Accumulator.Factory<BubbleCensus> census(PeriodicGrid ring) {
    double length = lengthOf(ring);
    return (times, size) -> {
      requireProfile(ring, size);
      return new BubbleCensus(times, new BubbleTracker(settings, size, length));
    };
  }

  /**
   * Looks while the ensemble runs, without keeping frames. Record a profile of the order parameter
   * on a ring; from a length alone a plane cannot be told, see {@link #census(PeriodicGrid)}.
   *
   * @param length length of the ring
   * @return factory for a recording
   * @throws IllegalArgumentException if the length is not positive
   */
  public Accumulator.Factory<BubbleCensus> census(double length) {
    Check.positive(length, "length (of the ring)");
    return (times, size) ->
        new BubbleCensus(times, new BubbleTracker(settings, size, length));
  }

  private static double lengthOf(PeriodicGrid ring) {
    Check.notNull(ring, "ring");
    Check.argument(
        ring.dimension() == 1,
        "bubbles are followed on a line (ring) only, not on a plane: grid=%s", ring);
    return ring.axis(0).length();
  }

  private static void requireProfile(PeriodicGrid ring, int numbers) {
    Check.argument(
        numbers == ring.points(),
        "the detector needs a profile, one number for each point: numbers=%s, points=%s",
        numbers, ring.points());
  }

  static void requireFinite(double time, double[] frame) {
    for (int i = 0; i < frame.length; i++) {
      Check.argument(
          Double.isFinite(frame[i]),
          "the order parameter must be finite: time=%s, point=%s, value=%s", time, i, frame[i]);
    }
  }
}
