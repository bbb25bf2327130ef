package spgpe.run;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

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
  public record Series(TrajectoryEnd end, double[] times, double[][] values) {}

  private final double[] times;
  private final List<double[]> open = new ArrayList<>();
  private final List<Double> openTimes = new ArrayList<>();
  private final List<Series> closed;

  /**
   * Makes an empty recorder.
   *
   * @param times scheduled times
   * @param size numbers in each sample
   */
  public TimeSeries(double[] times, int size) {
    this(times, new ArrayList<>());
  }

  private TimeSeries(double[] times, List<Series> closed) {
    this.times = times;
    this.closed = closed;
  }

  @Override
  public void add(int sample, double[] values) {
    open.add(values.clone());
    openTimes.add(times[sample]);
  }

  @Override
  public void finish(TrajectoryEnd end) {
    double[] at = openTimes.stream().mapToDouble(Double::doubleValue).toArray();
    closed.add(new Series(end, at, open.toArray(new double[0][])));
    open.clear();
    openTimes.clear();
  }

  @Override
  public TimeSeries mergedWith(TimeSeries later) {
    List<Series> all = new ArrayList<>(closed);
    all.addAll(later.closed);
    return new TimeSeries(times, all);
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
