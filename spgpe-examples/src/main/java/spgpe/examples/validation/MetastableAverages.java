package spgpe.examples.validation;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import spgpe.model.Model;
import spgpe.run.Accumulator;
import spgpe.run.Observable;
import spgpe.run.Snapshot;
import spgpe.run.TrajectoryEnd;
import spgpe.statistics.Estimate;
import spgpe.statistics.Jackknife;

/**
 * Averages over snapshots in the metastable state: a snapshot counts if the trajectory goes on for
 * another {@value #MARGIN} time units at least. Errors over trajectories (jackknife of a ratio).
 */
final class MetastableAverages implements Accumulator<MetastableAverages> {
  private static final double MARGIN = 50;

  /** Grid points between the two phases of each correlation. */
  private static final int[] DISTANCES = {2, 4, 8, 12};

  static final List<String> NAMES =
      List.of(
          "density per component", "<cos phi>", "<dphi^2>", "<dphi dphi'> x=0.96",
          "<dphi dphi'> x=1.92", "<dphi dphi'> x=3.84", "<dphi dphi'> x=5.76");

  private final double[] times;
  private final List<double[]> samples = new ArrayList<>();
  private final List<Double> sampleTimes = new ArrayList<>();
  private final List<double[]> sums;

  MetastableAverages(double[] times, int size) {
    this(times, new ArrayList<>());
  }

  private MetastableAverages(double[] times, List<double[]> sums) {
    this.times = times;
    this.sums = sums;
  }

  /** What is measured in each snapshot; dphi = arg(-psi_1 psi_2^*). */
  static Observable observable() {
    return new Observable() {
      @Override
      public String name() {
        return "metastable averages";
      }

      @Override
      public int size(Model model) {
        return NAMES.size();
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        double length = snapshot.model().region().grid().volume();
        double[] phase = relativePhase(snapshot);
        int n = phase.length;
        Arrays.fill(result, 0);
        result[0] =
            (snapshot.amplitudes().atomNumber(0, 0) + snapshot.amplitudes().atomNumber(1, 0))
                / (2 * length);
        for (int i = 0; i < n; i++) {
          result[1] -= Math.cos(phase[i]) / n;
          result[2] += phase[i] * phase[i] / n;
          for (int d = 0; d < DISTANCES.length; d++) {
            result[3 + d] += phase[i] * phase[(i + DISTANCES[d]) % n] / n;
          }
        }
      }
    };
  }

  private static double[] relativePhase(Snapshot snapshot) {
    double[] re1 = snapshot.field().re(0);
    double[] im1 = snapshot.field().im(0);
    double[] re2 = snapshot.field().re(1);
    double[] im2 = snapshot.field().im(1);
    double[] phase = new double[re1.length];
    for (int i = 0; i < phase.length; i++) {
      double re = re1[i] * re2[i] + im1[i] * im2[i];
      double im = im1[i] * re2[i] - re1[i] * im2[i];
      phase[i] = Math.atan2(-im, -re);
    }
    return phase;
  }

  @Override
  public void add(int sample, double[] values) {
    samples.add(values.clone());
    sampleTimes.add(times[sample]);
  }

  @Override
  public void finish(TrajectoryEnd end) {
    double[] sum = new double[NAMES.size() + 1];
    for (int s = 0; s < samples.size(); s++) {
      if (sampleTimes.get(s) + MARGIN <= end.time()) {
        for (int i = 0; i < NAMES.size(); i++) {
          sum[i] += samples.get(s)[i];
        }
        sum[NAMES.size()]++;
      }
    }
    if (sum[NAMES.size()] > 0) {
      sums.add(sum);
    }
    samples.clear();
    sampleTimes.clear();
  }

  @Override
  public MetastableAverages mergedWith(MetastableAverages later) {
    List<double[]> all = new ArrayList<>(sums);
    all.addAll(later.sums);
    return new MetastableAverages(times, all);
  }

  /** Average of the quantity with that place in {@link #NAMES}. */
  Estimate average(int quantity) {
    double[] numerator = sums.stream().mapToDouble(sum -> sum[quantity]).toArray();
    double[] count = sums.stream().mapToDouble(sum -> sum[NAMES.size()]).toArray();
    return Jackknife.ratio(numerator, count).estimate();
  }

  long snapshots() {
    return Math.round(sums.stream().mapToDouble(sum -> sum[NAMES.size()]).sum());
  }
}
