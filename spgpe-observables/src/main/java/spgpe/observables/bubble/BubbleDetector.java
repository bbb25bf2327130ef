package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.List;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;
import spgpe.run.Accumulator;
import spgpe.run.TimeSeries;

/**
 * Finds and follows bubbles of the stable state on a ring or a plane, in frames of an order
 * parameter such as the profile of cos phi. A bubble is a connected region (on a plane by the four
 * neighbours of a point) above the grow level; the seams are no borders. Bubbles are counted by
 * births in single frames, not as connected pieces of space-time, in which bubbles that merge later
 * would be one.
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
    return track(times, frames, ring(frames, length), 0, lastOf(times));
  }

  /**
   * Looks through frames.
   *
   * @param times times of the frames, increasing
   * @param frames frames[s] is the order parameter at all points at times[s], finite
   * @param grid a ring or a plane
   * @return what was found
   * @throws IllegalArgumentException if the frames are not as many as the times, do not have a
   *     number for each point of the grid, hold a number that is not finite, or the times do not
   *     increase
   */
  public BubbleHistory find(double[] times, double[][] frames, PeriodicGrid grid) {
    Check.notNull(times, "times");
    Check.notNull(frames, "frames");
    return track(times, frames, Check.notNull(grid, "grid"), 0, lastOf(times));
  }

  /**
   * The bubbles of a single frame: regions above the grow level that exceed the seed level
   * somewhere, whatever their width.
   *
   * @param frame the order parameter at all points, finite
   * @param grid a ring or a plane
   * @return the extent of each at the grow level, in the order of their first points
   * @throws IllegalArgumentException if there is not one finite number for each point
   */
  public List<Extent> inFrame(double[] frame, PeriodicGrid grid) {
    Check.notNull(grid, "grid");
    requireProfile(grid, Check.notNull(frame, "frame").length);
    requireFinite(0, frame);
    FrameGeometry geometry = FrameGeometry.of(grid, settings.smoothing());
    double[] smooth = new double[frame.length];
    geometry.smooth(frame, smooth);
    List<Extent> found = new ArrayList<>();
    for (Region region : geometry.regionsAbove(smooth, settings.growLevel())) {
      if (smooth[region.highestPoint(smooth)] > settings.seedLevel()) {
        found.add(geometry.extent(region, smooth));
      }
    }
    return found;
  }

  private static double lastOf(double[] times) {
    return times.length == 0 ? 0 : times[times.length - 1];
  }

  private static PeriodicGrid ring(double[][] frames, double length) {
    Check.argument(frames.length > 0, "there must be at least one frame: frames=0");
    return ring(Check.notNull(frames[0], "frames[0]").length, length);
  }

  private static PeriodicGrid ring(int points, double length) {
    return PeriodicGrid.of(Axis.of(points, Check.positive(length, "length (of the ring)")));
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
        series.times(), series.values(), ring(series.values(), length),
        series.end().trajectory(), series.end().time());
  }

  /**
   * Looks through a recorded trajectory of a model.
   *
   * @param series a series of profiles of the order parameter, one number for each point
   * @param grid grid of the model, a ring or a plane
   * @return what was found
   * @throws IllegalArgumentException if the grid has another number of points than the profiles, or
   *     if the series is empty or not of finite profiles
   */
  public BubbleHistory find(TimeSeries.Series series, PeriodicGrid grid) {
    Check.notNull(series, "series");
    return track(
        series.times(), series.values(), Check.notNull(grid, "grid"),
        series.end().trajectory(), series.end().time());
  }

  private BubbleHistory track(
      double[] times, double[][] frames, PeriodicGrid grid, long trajectory, double endTime) {
    Check.argument(
        times.length == frames.length && times.length > 0,
        "there must be a frame for each time, and at least one: times=%s, frames=%s",
        times.length, frames.length);
    requireProfile(grid, Check.notNull(frames[0], "frames[0]").length);
    BubbleTracker tracker = new BubbleTracker(settings, grid);
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
   * Looks while the ensemble of a model runs. Record a profile of the order parameter.
   *
   * @param grid grid of the model, a ring or a plane
   * @return factory for a recording; throws IllegalArgumentException if what is recorded has
   *     another number of values than the grid has points
   */
  public Accumulator.Factory<BubbleCensus> census(PeriodicGrid grid) {
    Check.notNull(grid, "grid");
    return (times, size) -> {
      requireProfile(grid, size);
      return new BubbleCensus(times, new BubbleTracker(settings, grid));
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
        new BubbleCensus(times, new BubbleTracker(settings, ring(size, length)));
  }

  private static void requireProfile(PeriodicGrid grid, int numbers) {
    Check.argument(
        numbers == grid.points(),
        "the detector needs a profile, one number for each point: numbers=%s, points=%s",
        numbers, grid.points());
  }

  static void requireFinite(double time, double[] frame) {
    for (int i = 0; i < frame.length; i++) {
      Check.argument(
          Double.isFinite(frame[i]),
          "the order parameter must be finite: time=%s, point=%s, value=%s", time, i, frame[i]);
    }
  }
}
