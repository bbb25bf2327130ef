package spgpe.examples.ring;

import java.util.List;
import java.util.Optional;
import spgpe.planning.ExpectedRate;
import spgpe.planning.ShotPlan;
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
 * @param plan the plan it followed
 * @param ends how the trajectories ended: at the reported threshold or at the end of the run
 * @param passages first passages of all thresholds
 * @param until end time of the run
 * @param meanCosine mean of cos(relative phase) over the ring, against time, of the trajectories
 *     that have not passed the highest threshold
 */
record DecayAtTemperature(
    ShotPlan plan, List<TrajectoryEnd> ends, FirstPassageTimes passages, double until,
    TimeMoments meanCosine) {
  static final double LEVEL = 0.95;

  Temperature temperature() {
    return plan.experiment().temperature();
  }

  ScaledRing ring() {
    return plan.ring();
  }

  /** Times before this are left out of the rate. */
  double truncation() {
    return plan.settings().truncation();
  }

  /** First-passage times, censored at the end of the run. */
  SurvivalData firstPassages() {
    return FirstPassageTimes.survival(ends);
  }

  long decays() {
    return ends.stream().filter(TrajectoryEnd::isStopped).count();
  }

  long earlyDecays() {
    return ends.stream().filter(end -> end.isStopped() && end.time() <= truncation()).count();
  }

  /** Rate per unit of scaled time of the whole ring; empty if no trajectory outlived the cut. */
  Optional<RateEstimate> rate() {
    return ends.stream().anyMatch(end -> end.time() > truncation())
        ? Optional.of(RateEstimate.of(firstPassages().truncatedBefore(truncation())))
        : Optional.empty();
  }

  /** The rate, if it rests on a decay at least. */
  Optional<RateEstimate> countedRate() {
    return rate().filter(rate -> rate.events() > 0);
  }

  /** Interval of the rate per unit of scaled time. */
  static Interval interval(RateEstimate rate) {
    return rate.interval(LEVEL, Censoring.TIME_CENSORED_CONSERVATIVE);
  }

  KaplanMeier survival() {
    return KaplanMeier.of(firstPassages());
  }

  /** The rate through a threshold, for several truncation times about the chosen one. */
  Optional<TruncationScan> truncationScan(double threshold) {
    List<TrajectoryEnd> passed = passages.endsAt(threshold);
    double cut = truncation();
    double[] times = {0.6 * cut, 0.8 * cut, cut, 1.25 * cut, 1.5 * cut};
    double longest = passed.stream().mapToDouble(TrajectoryEnd::time).max().orElse(0);
    return longest > times[times.length - 1]
        ? Optional.of(TruncationScan.of(FirstPassageTimes.survival(passed), times))
        : Optional.empty();
  }

  /** Barrier over temperature from the closed form at fixed density. */
  double closedBarrierOverTemperature() {
    return ring().pair().flatMap(pair -> pair.bubbleEnergy()).map(
        energy -> energy.asTemperature().kelvin() / temperature().kelvin()).orElse(Double.NaN);
  }

  /** Barrier over temperature of the full saddle, NaN if the plan expects no rate. */
  double barrierOverTemperature() {
    return plan.rate().map(ExpectedRate::barrierOverTemperature).orElse(Double.NaN);
  }

  /** Expected rate of the ring in scaled time, NaN if the plan expects none. */
  double expectedRate() {
    return plan.rate().map(rate -> ring().units().toScaled(rate.rate())).orElse(Double.NaN);
  }

  /** Trajectory with the median decay time among those that decayed, if any did. */
  Optional<TrajectoryEnd> typicalDecay() {
    List<TrajectoryEnd> late =
        ends.stream().filter(TrajectoryEnd::isStopped)
            .sorted((a, b) -> Double.compare(a.time(), b.time())).toList();
    return late.isEmpty() ? Optional.empty() : Optional.of(late.get(late.size() / 2));
  }
}
