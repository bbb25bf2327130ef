package spgpe.observables.bubble;

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
   * Looks while the ensemble runs, without keeping frames. Record a profile of the order parameter.
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

  static void requireFinite(double time, double[] frame) {
    for (int i = 0; i < frame.length; i++) {
      Check.argument(
          Double.isFinite(frame[i]),
          "the order parameter must be finite: time=%s, point=%s, value=%s", time, i, frame[i]);
    }
  }
}
