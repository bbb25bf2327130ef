package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static spgpe.statistics.Messages.assertRefused;

import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class RateScanTest {
  /**
   * Size and power of the Cox-Oakes test for 100 trajectories at nominal .05. An independent
   * simulation gave size .051, power .91 against a Weibull law of shape 1.3 and .985 against a
   * delay of .2 mean lives. Here 4000 repeats: standard errors .0035, .0045, .0019; bounds of about
   * 4 of them plus the reference's rounding, false alarm 2e-4. A wrong term in U or I shifts size
   * or power by .1 and more.
   */
  @Test
  void sizeAndPowerOfTheExponentialityTest() {
    SplittableRandom random = new SplittableRandom(11);
    int repeats = 4000;
    int[] rejected = new int[3];
    double[][] times = new double[3][100];
    for (int r = 0; r < repeats; r++) {
      for (int i = 0; i < 100; i++) {
        times[0][i] = Decay.exponential(random);
        times[1][i] = Math.pow(Decay.exponential(random), 1 / 1.3);
        times[2][i] = .2 + Decay.exponential(random);
      }
      for (int k = 0; k < 3; k++) {
        rejected[k] += CoxOakesTest.of(SurvivalData.complete(times[k])).pValue() < .05 ? 1 : 0;
      }
    }
    assertEquals(.051, rejected[0] / (double) repeats, .015);
    assertEquals(.91, rejected[1] / (double) repeats, .02);
    assertEquals(.985, rejected[2] / (double) repeats, .009);
  }

  /**
   * Rate .01 after a delay of 30 for every trajectory: t0 = 0 and 15 must fail, 40, 60 and 80 pass.
   * With 3000 trajectories the drift and shape tests at .001 find the delay for certain; a false
   * alarm in the plateau rows has probability below .005 (the seed is fixed).
   */
  @Test
  void plateauStartsAfterTheDelay() {
    SplittableRandom random = new SplittableRandom(5);
    double[] times = new double[3000];
    for (int i = 0; i < times.length; i++) {
      times[i] = 30 + Decay.exponential(random) / .01;
    }
    TruncationScan scan = TruncationScan.of(SurvivalData.complete(times), 0, 15, 40, 60, 80);
    TruncationScan.Row start = scan.plateauStart(.001).orElseThrow();
    assertEquals(40, start.truncationTime());
    assertEquals(.01, start.rate().rate(), 4 * start.rate().standardError());
    assertEquals(5, scan.rows().size());
    assertTrue(scan.rows().get(0).exponentiality().orElseThrow().pValue() < 1e-6);
    assertTrue(scan.rows().get(4).driftPValue().isEmpty());
  }

  /**
   * By hand: between 0 and 10 six events in 1 + 2 + 3 + 4 + 5 + 6 + 2 * 10 = 41, afterwards one
   * event in 5 + 90. The exact p-value is then the upper binomial tail, doubled.
   */
  @Test
  void driftComparesTheWindowWithWhatFollows() {
    SurvivalData data =
        SurvivalData.of(
            new double[] {1, 2, 3, 4, 5, 6, 15, 100},
            new boolean[] {true, true, true, true, true, true, true, false});
    TruncationScan scan = TruncationScan.of(data, 0, 10);
    double early = 41.0 / 136;
    double tail = Math.pow(early, 7) + 7 * Math.pow(early, 6) * (1 - early);
    assertEquals(2 * tail, scan.rows().get(0).driftPValue().orElseThrow(), 1e-14);
    assertEquals(new RateEstimate(1, 95), scan.rows().get(1).rate());
    assertEquals(2, scan.rows().get(1).trajectories());
  }

  @Test
  void rowsWithoutEventsMakeNoPlateau() {
    SurvivalData data = SurvivalData.of(new double[] {2, 50}, new boolean[] {true, false});
    TruncationScan scan = TruncationScan.of(data, 0, 10);
    assertTrue(scan.rows().get(1).exponentiality().isEmpty());
    assertTrue(scan.plateauStart(.05).isEmpty());
  }

  /**
   * Estimate rates 1.55e-3 (94 events, length 48) and 3.10e-3 (87 events, length 96) have equal
   * densities. Unequal: 100 and 150 events in equal exposure; reference NumPy and SciPy 1.17.
   */
  @Test
  void extensivity() {
    ExtensivityTest equal =
        ExtensivityTest.of(
            List.of(
                new ExtensivityTest.SizedRate(48, new RateEstimate(94, 94 / 1.55e-3)),
                new ExtensivityTest.SizedRate(96, new RateEstimate(87, 87 / 3.10e-3))));
    assertEquals(3.2292e-5, equal.pooled().rate(), 1e-9);
    assertEquals(0, equal.chiSquare(), 1e-10);
    assertEquals(1, equal.pValue(), 1e-5);
    ExtensivityTest unequal =
        ExtensivityTest.of(
            List.of(
                new ExtensivityTest.SizedRate(48, new RateEstimate(100, 50_000)),
                new ExtensivityTest.SizedRate(96, new RateEstimate(150, 50_000))));
    assertEquals(1, unequal.degreesOfFreedom());
    assertEquals(4.856156661443031, unequal.chiSquare(), 1e-10);
    assertEquals(.02754763720889678, unequal.pValue(), 1e-12);
  }

  @Test
  void badInputIsRefusedWithTheReason() {
    SurvivalData data = SurvivalData.complete(1, 2, 3);
    assertRefused(() -> TruncationScan.of(data), "at least one truncation time");
    assertRefused(() -> TruncationScan.of(data, 1, 1), "must increase", "truncationTimes[1]=1.0");
    assertRefused(() -> TruncationScan.of(data, 1, 3), "no trajectory is left");
    assertRefused(() -> TruncationScan.of(data, Double.NaN), "truncationTime=NaN");
    assertRefused(() -> TruncationScan.of(data, 0).plateauStart(0), "significance=0.0");
    assertRefused(() -> ExtensivityTest.of(List.of()), "at least two", "systems=0");
    RateEstimate none = new RateEstimate(0, 1);
    ExtensivityTest.SizedRate empty = new ExtensivityTest.SizedRate(1, none);
    assertRefused(() -> ExtensivityTest.of(List.of(empty, empty)), "without any event");
    assertRefused(() -> new ExtensivityTest.SizedRate(0, none), "size=0.0");
  }
}
