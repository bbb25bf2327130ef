package spgpe.examples.ring;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import spgpe.examples.scenario.RingScenario;
import spgpe.planning.ShotPlan;
import spgpe.run.TrajectoryEnd;
import spgpe.statistics.RateEstimate;
import spgpe.statistics.SurvivalData;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;

/** The decay rate does not depend on how the decay is told: threshold and truncation time. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS) // one run for both tests
class PlateauTest {
  /** Trajectories 0 to 149 of seed 2026 at 31 nK; the planned truncation time is 150. */
  private final DecayAtTemperature decay = run();

  private static DecayAtTemperature run() {
    ShotPlan plan =
        ShotPlan.of(
            RingScenario.invented().at(Temperature.ofNanokelvin(31)), 0.1,
            TimeSpan.ofMilliseconds(400));
    return new RingDecay(2026, 150, 900).run(0, plan, Runnable::run, progress -> {});
  }

  private static double rate(List<TrajectoryEnd> ends, double truncation, int without) {
    double[] times = new double[ends.size() - (without < 0 ? 0 : 1)];
    boolean[] decayed = new boolean[times.length];
    for (int i = 0, j = 0; i < ends.size(); i++) {
      if (i != without) {
        times[j] = ends.get(i).time();
        decayed[j++] = ends.get(i).isStopped();
      }
    }
    return RateEstimate.of(SurvivalData.of(times, decayed).truncatedBefore(truncation)).rate();
  }

  /**
   * Rates through -0.7, 0 and +0.4, with truncation times 150 and 225, against that through -0.4
   * with 150: within 10 percent plus 3 errors of the ratio (jackknife over trajectories; the rates
   * share most of their decays). False-alarm probability below 0.003 for each of 7 ratios, less
   * with the margin of 10 percent. Power: the errors of the ratios are bounded to 0.1, so that
   * thresholds whose rates differ by a factor 1.6 are found with probability 0.97; so would be
   * passages of one threshold credited to another trajectory or time.
   */
  @Test
  void rateDoesNotDependOnThresholdOrTruncation() {
    double cut = decay.truncation();
    List<TrajectoryEnd> base = decay.passages().endsAt(-0.4);
    assertEquals(decay.ends(), base);
    double reference = rate(base, cut, -1);
    for (double threshold : RingDecay.THRESHOLDS) {
      List<TrajectoryEnd> ends = decay.passages().endsAt(threshold);
      for (double truncation : new double[] {cut, 1.5 * cut}) {
        double ratio = rate(ends, truncation, -1) / reference;
        int n = ends.size();
        double sum = 0;
        for (int i = 0; i < n; i++) {
          double change = rate(ends, truncation, i) / rate(base, cut, i) - ratio;
          sum += change * change;
        }
        double error = Math.sqrt(sum * (n - 1) / n);
        String what = "ratio at " + threshold + ", " + truncation + ": " + ratio + " +- " + error;
        assertTrue(error < 0.1, what);
        assertEquals(1, ratio, 0.1 + 3 * error, what);
      }
    }
  }

  /** Later thresholds are passed later, and the trajectories are those of a run stopped there. */
  @Test
  void passagesAreOrdered() {
    for (int i = 1; i < RingDecay.THRESHOLDS.size(); i++) {
      List<TrajectoryEnd> low = decay.passages().endsAt(RingDecay.THRESHOLDS.get(i - 1));
      List<TrajectoryEnd> high = decay.passages().endsAt(RingDecay.THRESHOLDS.get(i));
      for (int t = 0; t < low.size(); t++) {
        assertEquals(t, low.get(t).trajectory());
        assertTrue(low.get(t).time() <= high.get(t).time(), low.get(t) + ", " + high.get(t));
        assertTrue(low.get(t).isStopped() || !high.get(t).isStopped());
      }
    }
    assertTrue(decay.decays() > 60, "decays " + decay.decays());
  }
}
