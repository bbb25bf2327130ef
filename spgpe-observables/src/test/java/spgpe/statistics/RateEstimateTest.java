package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static spgpe.statistics.Messages.assertRefused;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class RateEstimateTest {
  /**
   * S. M. Ross, Introduction to Probability and Statistics for Engineers and Scientists, example
   * 14.3c: 10 failures in a total of 500; the exact quantile 9.5908 replaces the printed 9.66.
   */
  @Test
  void textbookMeanLife() {
    RateEstimate estimate = new RateEstimate(10, 500);
    assertEquals(50, 1 / estimate.rate(), 1e-12);
    Interval limits = estimate.interval(.95, Censoring.FAILURE_CENSORED);
    assertEquals(29.2658, 1 / limits.upper(), 5.1e-5);
    assertEquals(104.2668, 1 / limits.lower(), 5.1e-5);
  }

  /** -ln 0.05 and -ln 0.025: the chi-square law with two degrees of freedom is exponential. */
  @Test
  void withoutEventsThereIsOnlyAnUpperBound() {
    RateEstimate none = new RateEstimate(0, 200);
    assertEquals(-Math.log(.05) / 200, none.upperBound(.95), 1e-14);
    assertEquals(2.9957 / 200, none.upperBound(.95), 5.1e-5 / 200);
    for (Censoring kind : Censoring.values()) {
      Interval limits = none.interval(.95, kind);
      assertEquals(0, limits.lower());
      assertEquals(3.6889 / 200, limits.upper(), 5.1e-5 / 200);
    }
    assertEquals(0, none.rate());
    assertTrue(Double.isNaN(none.standardError()));
  }

  /**
   * A measured decay of a ring, 10934 events in an exposure of 7060383: 1.549(15)e-3, conservative
   * limits [1.520, 1.578]e-3; the further digits are from SciPy 1.17, chi2.ppf.
   */
  @Test
  void largeNumbersOfEvents() {
    RateEstimate estimate = new RateEstimate(10934, 7060383);
    assertEquals(1.5486411997762727e-3, estimate.rate(), 1e-17);
    assertEquals(1.4810211964047628e-5, estimate.standardError(), 1e-19);
    Interval limits = estimate.interval(.95, Censoring.TIME_CENSORED_CONSERVATIVE);
    assertEquals(1.519748100123651e-3, limits.lower(), 1e-13);
    assertEquals(1.5779455611415816e-3, limits.upper(), 1e-13);
  }

  @Test
  void poolingAndSize() {
    RateEstimate pooled = new RateEstimate(3, 10).pooledWith(new RateEstimate(5, 30));
    assertEquals(new RateEstimate(8, 40), pooled);
    assertEquals(.2 / 48, pooled.perSize(48).rate(), 1e-18);
  }

  /**
   * Coverage of the three 95 percent intervals for 40 trajectories censored at half the mean life.
   * Reference: 4e6 repeats in NumPy, .94453, .96146, .94992, each with standard error .00011. Here
   * 2e5 repeats: standard error .0005, bound 4.5 standard errors, false alarm 2e-5 in all. An
   * interval with one degree of freedom too few or too many on one side moves coverage by .005 or
   * more and is caught for certain.
   */
  @Test
  void coverageOfTheIntervals() {
    int trajectories = 40;
    int repeats = 200_000;
    SplittableRandom random = new SplittableRandom(20260101);
    int[] covered = new int[3];
    Interval[][] unit = new Interval[trajectories + 1][];
    for (int d = 0; d <= trajectories; d++) {
      unit[d] = new Interval[3];
      for (Censoring kind : Censoring.values()) {
        unit[d][kind.ordinal()] = new RateEstimate(d, 1).interval(.95, kind);
      }
    }
    for (int r = 0; r < repeats; r++) {
      int events = 0;
      double exposure = 0;
      for (int i = 0; i < trajectories; i++) {
        double t = Decay.exponential(random);
        events += t <= .5 ? 1 : 0;
        exposure += Math.min(t, .5);
      }
      for (int k = 0; k < 3; k++) {
        covered[k] += unit[events][k].contains(exposure) ? 1 : 0;
      }
    }
    double bound = 4.5 * Math.sqrt(.95 * .05 / repeats);
    assertEquals(.94453, covered[0] / (double) repeats, bound);
    assertEquals(.96146, covered[1] / (double) repeats, bound);
    assertEquals(.94992, covered[2] / (double) repeats, bound);
  }

  /**
   * Delay of 20 between nucleation (rate .01) and threshold, censored at 150: the untruncated
   * estimate tends to (1 - e^-1.3)/(20 + (1 - e^-1.3)/.01) = .007844 (derived: only the time after
   * the delay is at risk), the truncated one to .01. With 4e4 trajectories the relative standard
   * errors are .006; bound 4 standard errors, false alarm 1e-4. A bias of 5 percent is caught for
   * certain (8 standard errors), and the delay's own is 22 percent.
   */
  @Test
  void constantDelayBiasesTheUntruncatedRateOnly() {
    int n = 40_000;
    SplittableRandom random = new SplittableRandom(7);
    double[] times = new double[n];
    boolean[] events = new boolean[n];
    for (int i = 0; i < n; i++) {
      double t = 20 + Decay.exponential(random) / .01;
      times[i] = Math.min(t, 150);
      events[i] = t <= 150;
    }
    SurvivalData data = SurvivalData.of(times, events);
    double dead = -Math.expm1(-1.3);
    assertEquals(.007844, dead / (20 + dead / .01), 5.1e-7);
    RateEstimate raw = RateEstimate.of(data);
    assertEquals(.007844, raw.rate(), 4 * raw.standardError());
    RateEstimate truncated = RateEstimate.of(data.truncatedBefore(25));
    assertEquals(.01, truncated.rate(), 4 * truncated.standardError());
  }

  @Test
  void badInputIsRefusedWithTheReason() {
    assertRefused(() -> new RateEstimate(-1, 1), "events=-1");
    assertRefused(() -> new RateEstimate(1, 0), "exposure=0.0");
    assertRefused(() -> new RateEstimate(1, Double.NaN), "exposure=NaN");
    RateEstimate rate = new RateEstimate(1, 1);
    assertRefused(() -> rate.upperBound(1), "level=1.0");
    assertRefused(() -> rate.interval(Double.NaN, Censoring.FAILURE_CENSORED), "level=NaN");
    assertRefused(() -> rate.perSize(-2), "size=-2.0");
    assertRefused(() -> RateEstimate.of(SurvivalData.complete(0)), "exposure=0.0");
    RateEstimate none = new RateEstimate(0, 1);
    assertRefused(() -> new RateRatio(none, none), "cannot be compared");
  }
}
