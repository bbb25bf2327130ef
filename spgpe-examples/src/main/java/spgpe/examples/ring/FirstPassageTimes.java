package spgpe.examples.ring;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import spgpe.run.Accumulator;
import spgpe.run.TrajectoryEnd;
import spgpe.statistics.SurvivalData;

/**
 * First passages of a single number upward through several thresholds, for each trajectory. The run
 * stops at the highest threshold, so that all lower ones are seen.
 */
final class FirstPassageTimes implements Accumulator<FirstPassageTimes> {
  private record Passages(TrajectoryEnd end, List<Double> times) {}

  private final double[] sampleTimes;
  private final List<Double> thresholds;
  private final double[] open;
  private final List<Passages> closed;

  private FirstPassageTimes(
      double[] sampleTimes, List<Double> thresholds, List<Passages> closed) {
    this.sampleTimes = sampleTimes;
    this.thresholds = thresholds;
    this.open = new double[thresholds.size()];
    Arrays.fill(open, Double.POSITIVE_INFINITY);
    this.closed = closed;
  }

  /** Thresholds in rising order; the last one is that at which the run stops. */
  static Accumulator.Factory<FirstPassageTimes> through(List<Double> thresholds) {
    return (times, size) -> new FirstPassageTimes(times, thresholds, new ArrayList<>());
  }

  @Override
  public void add(int sample, double[] values) {
    for (int i = 0; i < open.length; i++) {
      if (values[0] > thresholds.get(i)) {
        open[i] = Math.min(open[i], sampleTimes[sample]);
      }
    }
  }

  @Override
  public void finish(TrajectoryEnd end) {
    List<Double> passages = new ArrayList<>();
    for (double time : open) {
      // a stopped trajectory is beyond the highest threshold, hence beyond all of them
      passages.add(end.isStopped() ? Math.min(time, end.time()) : time);
    }
    closed.add(new Passages(end, passages));
  }

  @Override
  public FirstPassageTimes mergedWith(FirstPassageTimes later) {
    List<Passages> all = new ArrayList<>(closed);
    all.addAll(later.closed);
    return new FirstPassageTimes(sampleTimes, thresholds, all);
  }

  List<Double> thresholds() {
    return thresholds;
  }

  /** How the trajectories would have ended if the run had stopped at that threshold. */
  List<TrajectoryEnd> endsAt(double threshold) {
    int i = thresholds.indexOf(threshold);
    return closed.stream()
        .map(
            p -> {
              double time = p.times().get(i);
              return Double.isFinite(time)
                  ? new TrajectoryEnd(
                      p.end().trajectory(), time, TrajectoryEnd.Reason.STOPPED,
                      "passage of " + threshold)
                  : p.end();
            })
        .toList();
  }

  static SurvivalData survival(List<TrajectoryEnd> ends) {
    double[] times = ends.stream().mapToDouble(TrajectoryEnd::time).toArray();
    boolean[] decayed = new boolean[times.length];
    for (int i = 0; i < decayed.length; i++) {
      decayed[i] = ends.get(i).isStopped();
    }
    return SurvivalData.of(times, decayed);
  }
}
