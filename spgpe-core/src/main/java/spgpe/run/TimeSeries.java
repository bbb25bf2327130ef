package spgpe.run;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import spgpe.internal.check.Check;

/**
 * Keeps every sample of every trajectory: a space-time recorder if the observable is a profile. Use
 * it for a few trajectories; memory grows with all samples.
 */
public final class TimeSeries implements Accumulator<TimeSeries> {
  /**
   * The samples of one trajectory.
   *
   * @param end how it ended
   * @param times times of its samples
   * @param values values[s] are the numbers measured at times[s]
   */
  @SuppressWarnings("ArrayRecordComponent") // plain data, compared by nobody
  public record Series(TrajectoryEnd end, double[] times, double[][] values) {
    /**
     * Checks the values.
     *
     * @param end how the trajectory ended
     * @param times times of its samples
     * @param values numbers measured at each time
     * @throws IllegalArgumentException if something is null
     */
    public Series {
      Check.notNull(end, "end");
      Check.notNull(times, "times");
      Check.notNull(values, "values");
    }
  }

  private final double[] times;
  private final int size;
  private final List<double[]> open = new ArrayList<>();
  private final List<Double> openTimes = new ArrayList<>();
  private final List<Series> closed;

  /**
   * Makes an empty recorder.
   *
   * @param times scheduled times
   * @param size numbers in each sample, at least 1
   * @throws IllegalArgumentException if the size is not positive
   */
  public TimeSeries(double[] times, int size) {
    this(Check.notNull(times, "times"), size, new ArrayList<>());
    Check.argument(size >= 1, "numbers in each sample must be >= 1: size=%s", size);
  }

  private TimeSeries(double[] times, int size, List<Series> closed) {
    this.times = times;
    this.size = size;
    this.closed = closed;
  }

  @Override
  public void add(int sample, double[] values) {
    Check.notNull(values, "values");
    Check.inRange(sample, 0, times.length - 1, "sample");
    Check.argument(
        values.length == size,
        "a sample must have as many numbers as announced: size=%s, numbers=%s", size, values.length);
    open.add(values.clone());
    openTimes.add(times[sample]);
  }

  @Override
  public void finish(TrajectoryEnd end) {
    Check.notNull(end, "end");
    double[] at = openTimes.stream().mapToDouble(Double::doubleValue).toArray();
    closed.add(new Series(end, at, open.toArray(new double[0][])));
    open.clear();
    openTimes.clear();
  }

  @Override
  public TimeSeries mergedWith(TimeSeries later) {
    Check.notNull(later, "later");
    Check.argument(
        size == later.size && Arrays.equals(times, later.times),
        "accumulators must be of the same times and size: size=%s, other size=%s",
        size, later.size);
    List<Series> all = new ArrayList<>(closed);
    all.addAll(later.closed);
    return new TimeSeries(times, size, all);
  }

  /**
   * The trajectories in the order of their indices.
   *
   * @return unmodifiable list
   */
  public List<Series> series() {
    return Collections.unmodifiableList(closed);
  }
}
