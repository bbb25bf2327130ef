package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static spgpe.statistics.Messages.assertRefused;
import static spgpe.statistics.Messages.assertTooEarly;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ErrorBarsTest {
  /** By hand: R = 15/14; leave-one-out ratios 14/12, 13/11, 11/11, 7/8. */
  @Test
  void jackknifeOfARatio() {
    Jackknife.Result ratio = Jackknife.ratio(new double[] {1, 2, 4, 8}, new double[] {2, 3, 3, 6});
    assertEquals(1.0714286, ratio.value(), 5.1e-8);
    assertEquals(1.1181006, ratio.biasCorrected(), 5.1e-8);
    assertEquals(.2190450, ratio.standardError(), 5.1e-8);
  }

  @Test
  void jackknifeOfAMeanIsTheStandardErrorWithoutBias() {
    double[][] samples = {{1}, {4}, {-2}, {7}, {3}};
    RunningMoments moments = new RunningMoments();
    for (double[] sample : samples) {
      moments.add(sample[0]);
    }
    Jackknife.Result mean = Jackknife.ofMeans(samples, m -> m[0]);
    assertEquals(moments.mean(), mean.value(), 1e-15);
    assertEquals(moments.mean(), mean.biasCorrected(), 1e-14);
    assertEquals(moments.standardError(), mean.standardError(), 1e-14);
    assertEquals(new Estimate(mean.value(), mean.standardError()), mean.estimate());
  }

  /** By hand: batch means 1.5, 3.5, 5.5, 7.5 have variance 20/3, so the error is sqrt(5/3). */
  @Test
  void batchMeans() {
    Estimate mean = BatchMeans.of(new double[] {1, 2, 3, 4, 5, 6, 7, 8}, 4);
    assertEquals(4.5, mean.value(), 1e-15);
    assertEquals(1.2909944, mean.standardError(), 5.1e-8);
    Estimate surplus = BatchMeans.of(new double[] {100, 1, 2, 3, 4, 5, 6, 7, 8}, 4);
    assertEquals(mean, surplus, "the surplus at the start is left out");
  }

  /**
   * AR(1) series, exact tau = (1 + rho)/(2 (1 - rho)) and error of the mean sqrt(2 tau variance/n).
   * tau: bound 4 of its own standard errors plus 1 percent for the cut tail, false alarm 1e-4 each;
   * errors of the mean: 400 batches scatter by 3.5 percent, bound 15 percent. A convention that
   * differs by a factor of 2 in tau, or batch errors that ignore the correlation, are caught for
   * certain.
   */
  @ParameterizedTest
  @CsvSource({".5, 1.5", ".9, 9.5", ".98, 49.5"})
  void autocorrelationTimeOfAnAutoregressiveSeries(double rho, double exact) {
    int n = 400_000;
    SplittableRandom random = new SplittableRandom(31);
    double[] series = new double[n];
    double x = Decay.normal(random);
    for (int i = 0; i < n; i++) {
      x = rho * x + Math.sqrt(1 - rho * rho) * Decay.normal(random);
      series[i] = 3 + x;
    }
    AutocorrelationTime time = AutocorrelationTime.of(series);
    assertEquals(exact, time.tau(), 4 * time.tauStandardError() + .01 * exact);
    double exactError = Math.sqrt(2 * exact / n);
    assertEquals(exactError, time.meanEstimate().standardError(), .15 * exactError);
    assertEquals(exactError, BatchMeans.of(series, 400).standardError(), .15 * exactError);
    assertEquals(n / (2 * time.tau()), time.effectiveSampleSize(), 1e-9 * n);
    assertEquals(0, time.meanEstimate().deviationFrom(3), 4.5);
  }

  @Test
  void estimateGivesIntervalAndDeviation() {
    Estimate estimate = new Estimate(2, .5);
    assertEquals(2 - .5 * 1.959963984540054, estimate.interval(.95).lower(), 1e-14);
    assertEquals(-4, estimate.deviationFrom(4), 1e-15);
    assertEquals(.5 * 2 * 1.959963984540054, estimate.interval(.95).width(), 1e-14);
  }

  @Test
  void histogramCountsEdgesAndOutliers() {
    Histogram histogram = Histogram.of(-1, 1, 4);
    for (double x : new double[] {-1, -.51, -.5, 0, .999, Math.nextDown(1.0), 1, -1.001, 5}) {
      histogram.add(x);
    }
    assertEquals(2, histogram.binCount(0));
    assertEquals(1, histogram.binCount(1));
    assertEquals(1, histogram.binCount(2));
    assertEquals(2, histogram.binCount(3));
    assertEquals(1, histogram.below());
    assertEquals(2, histogram.above());
    assertEquals(9, histogram.total());
    assertEquals(-.75, histogram.binCentre(0));
    assertEquals(2.0 / 9 / .5, histogram.density(0).value(), 1e-15);
    assertEquals(Math.sqrt(2.0 / 9 * 7 / 9 / 9) / .5, histogram.density(0).standardError(), 1e-15);
    Histogram other = Histogram.of(-1, 1, 4);
    other.add(.1);
    histogram.merge(other);
    assertEquals(2, histogram.binCount(2));
    assertEquals(10, histogram.total());
  }

  @Test
  void badInputIsRefusedWithTheReason() {
    double[] two = {1, 2};
    assertRefused(() -> Jackknife.ratio(two, new double[1]), "numerator.length=2");
    assertRefused(() -> Jackknife.ratio(new double[1], new double[1]), "two trajectories");
    assertRefused(() -> Jackknife.ratio(two, new double[] {0, 1}), "omitted[1]=Infinity");
    assertRefused(() -> Jackknife.ofMeans(new double[][] {{1}, {1, 2}}, m -> 0), "dimension=1");
    assertRefused(() -> Jackknife.ofLeaveOneOut(Double.NaN, two), "value=NaN");
    assertRefused(() -> BatchMeans.of(two, 3), "batches=3");
    assertRefused(() -> BatchMeans.of(new double[] {1, Double.NaN}, 2), "NaN");
    assertRefused(() -> AutocorrelationTime.of(new double[3]), "length=3");
    assertRefused(() -> AutocorrelationTime.of(new double[9]), "constant");
    assertRefused(() -> AutocorrelationTime.of(new double[] {1, 2, 3, 4, 5, 6}), "too short");
    assertRefused(
        () -> AutocorrelationTime.of(new double[] {1, -1, 1, -1, 1, -1}), "anticorrelated");
    assertRefused(() -> AutocorrelationTime.of(new double[9], 0), "windowFactor=0.0");
    assertRefused(() -> Histogram.of(1, 1, 3), "low=1.0");
    assertRefused(() -> Histogram.of(0, Double.NaN, 3), "high=NaN");
    assertRefused(() -> Histogram.of(0, 1, 0), "bins=0");
    Histogram histogram = Histogram.of(0, 1, 2);
    assertRefused(() -> histogram.add(Double.NaN), "value=NaN");
    assertRefused(() -> histogram.merge(Histogram.of(0, 2, 2)), "2 bins in [0.0, 2.0)");
    assertRefused(() -> histogram.binCount(2), "bin=2");
    assertTooEarly(() -> histogram.density(0), "total=0");
    assertRefused(() -> new Estimate(1, -1), "standardError=-1.0");
    assertRefused(() -> new Interval(2, 1), "lower=2.0");
    assertRefused(() -> new Interval(Double.NaN, 1), "lower=NaN");
  }
}
