package spgpe.examples.ring;

import java.util.List;
import java.util.Optional;
import spgpe.run.TimeMoments;
import spgpe.run.TrajectoryEnd;
import spgpe.statistics.Censoring;
import spgpe.statistics.Interval;
import spgpe.statistics.KaplanMeier;
import spgpe.statistics.RateEstimate;
import spgpe.statistics.SurvivalData;
import spgpe.statistics.TruncationScan;
import spgpe.units.ScaledRing;
import spgpe.units.Temperature;

/**
 * Outcome of the ensemble at one temperature. Times are scaled.
 *
 * @param temperature laboratory temperature
 * @param ring the experiment at that temperature
 * @param ends how the trajectories ended
 * @param until end time of the run
 * @param truncation times before this are left out of the rate
 * @param meanCosine mean of cos(relative phase) over the ring, against time
 */
record DecayAtTemperature(
    Temperature temperature,
    ScaledRing ring,
    List<TrajectoryEnd> ends,
    double until,
    double truncation,
    TimeMoments meanCosine) {
  static final double LEVEL = 0.95;

  /** First-passage times, censored at the end of the run. */
  SurvivalData firstPassages() {
    double[] times = ends.stream().mapToDouble(TrajectoryEnd::time).toArray();
    boolean[] decayed = new boolean[times.length];
    for (int i = 0; i < decayed.length; i++) {
      decayed[i] = ends.get(i).isStopped();
    }
    return SurvivalData.of(times, decayed);
  }

  long decays() {
    return ends.stream().filter(TrajectoryEnd::isStopped).count();
  }

  long earlyDecays() {
    return ends.stream().filter(end -> end.isStopped() && end.time() <= truncation).count();
  }

  /** Rate per unit of scaled time of the whole ring; empty if no trajectory outlived the cut. */
  Optional<RateEstimate> rate() {
    return ends.stream().anyMatch(end -> end.time() > truncation)
        ? Optional.of(RateEstimate.of(firstPassages().truncatedBefore(truncation)))
        : Optional.empty();
  }

  /** Interval of the rate per unit of scaled time. */
  static Interval interval(RateEstimate rate) {
    return rate.interval(LEVEL, Censoring.TIME_CENSORED_CONSERVATIVE);
  }

  KaplanMeier survival() {
    return KaplanMeier.of(firstPassages());
  }

  /** The rate for several truncation times about the chosen one. */
  Optional<TruncationScan> truncationScan() {
    double[] times = {0.6 * truncation, 0.8 * truncation, truncation, 1.25 * truncation,
        1.5 * truncation};
    double longest = ends.stream().mapToDouble(TrajectoryEnd::time).max().orElse(0);
    return longest > times[times.length - 1]
        ? Optional.of(TruncationScan.of(firstPassages(), times))
        : Optional.empty();
  }

  /** Barrier over temperature from the closed form at fixed density. */
  double barrierOverTemperature() {
    return ring.pair().flatMap(pair -> pair.bubbleEnergy()).map(
        energy -> energy.asTemperature().kelvin() / temperature.kelvin()).orElse(Double.NaN);
  }

  /** Index of the trajectory with the median decay time among those that decayed, if any did. */
  Optional<TrajectoryEnd> typicalDecay() {
    List<TrajectoryEnd> late =
        ends.stream().filter(TrajectoryEnd::isStopped)
            .sorted((a, b) -> Double.compare(a.time(), b.time())).toList();
    return late.isEmpty() ? Optional.empty() : Optional.of(late.get(late.size() / 2));
  }
}
