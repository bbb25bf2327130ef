package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.Size;

class StatisticsPropertiesTest {
  @Provide
  Arbitrary<SurvivalData> ensembles() {
    // Few distinct times, so that ties of all kinds occur.
    return Arbitraries.integers()
        .between(1, 60)
        .list()
        .ofMinSize(1)
        .ofMaxSize(30)
        .map(
            codes -> {
              double[] end = new double[codes.size()];
              double[] entry = new double[codes.size()];
              boolean[] event = new boolean[codes.size()];
              for (int i = 0; i < end.length; i++) {
                int code = codes.get(i);
                end[i] = 1 + code % 10;
                entry[i] = code % 3 == 0 ? .5 * end[i] : 0;
                event[i] = code % 4 != 0;
              }
              return SurvivalData.of(end, event).withEntryTimes(entry);
            });
  }

  @Property(tries = 300, seed = "2026")
  void survivalFallsAndItsBandHoldsIt(
      @ForAll("ensembles") SurvivalData data, @ForAll @DoubleRange(min = .5, max = .99) double p) {
    KaplanMeier curve = KaplanMeier.of(data);
    double last = 1;
    int events = 0;
    for (KaplanMeier.Step step : curve.steps()) {
      assertTrue(step.survival() <= last && step.survival() >= 0);
      assertTrue(step.events() >= 1 && step.events() <= step.atRisk());
      Interval band = curve.intervalAt(step.time(), p);
      assertTrue(band.contains(step.survival()) && band.lower() >= 0 && band.upper() <= 1);
      last = step.survival();
      events += step.events();
    }
    assertEquals(data.eventCount(), events);
  }

  /** Product of (1 - x) never exceeds exp(-sum x). */
  @Property(tries = 200, seed = "2026")
  void productLimitLiesBelowTheExponentialOfTheHazard(@ForAll("ensembles") SurvivalData data) {
    KaplanMeier curve = KaplanMeier.of(data);
    NelsonAalen hazard = NelsonAalen.of(data);
    for (int i = 0; i < curve.steps().size(); i++) {
      double h = hazard.steps().get(i).cumulativeHazard();
      assertTrue(curve.steps().get(i).survival() <= Math.exp(-h) + 1e-15);
    }
  }

  @Property(tries = 200, seed = "2026")
  void truncationWindowsAddUp(
      @ForAll("ensembles") SurvivalData data, @ForAll @IntRange(min = 1, max = 10) int cut) {
    double last = KaplanMeier.of(data).lastTime();
    double time = Math.min(cut, last - .25);
    SurvivalData late = data.truncatedBefore(time);
    int events = late.eventCount();
    double exposure = late.exposure();
    boolean someEarly = false;
    for (int i = 0; i < data.size(); i++) {
      someEarly |= data.entryTime(i) < time;
    }
    if (someEarly) {
      events += data.censoredAfter(time).eventCount();
      exposure += data.censoredAfter(time).exposure();
    }
    assertEquals(data.eventCount(), events);
    assertEquals(data.exposure(), exposure, 1e-12 * data.exposure());
  }

  @Property(tries = 200, seed = "2026")
  void intervalsAreNestedAndHoldTheRate(
      @ForAll @IntRange(min = 1, max = 5000) int events,
      @ForAll @DoubleRange(min = .01, max = 1e6) double exposure,
      @ForAll @DoubleRange(min = .5, max = .98) double level) {
    RateEstimate estimate = new RateEstimate(events, exposure);
    Interval exact = estimate.interval(level, Censoring.FAILURE_CENSORED);
    Interval wide = estimate.interval(level, Censoring.TIME_CENSORED_CONSERVATIVE);
    Interval central = estimate.interval(level, Censoring.TIME_CENSORED_CENTRAL);
    assertTrue(exact.contains(estimate.rate()));
    assertTrue(wide.lower() <= central.lower() && central.upper() <= wide.upper());
    assertTrue(exact.upper() < central.upper() && exact.lower() < central.lower());
    assertTrue(estimate.upperBound(level) < wide.upper());
  }

  @Property(tries = 300, seed = "2026")
  void mergedMomentsEqualSequentialOnes(
      @ForAll @Size(min = 2, max = 60) List<@DoubleRange(min = -1e3, max = 1e3) Double> values,
      @ForAll @IntRange(min = 0, max = 60) int split) {
    int cut = Math.min(split, values.size());
    RunningMoments all = new RunningMoments();
    RunningMoments left = new RunningMoments();
    RunningMoments right = new RunningMoments();
    RunningCovariance allPairs = RunningCovariance.ofDimension(2);
    RunningCovariance leftPairs = RunningCovariance.ofDimension(2);
    RunningCovariance rightPairs = RunningCovariance.ofDimension(2);
    RunningVectorMoments allVectors = RunningVectorMoments.ofDimension(2);
    RunningVectorMoments leftVectors = RunningVectorMoments.ofDimension(2);
    RunningVectorMoments rightVectors = RunningVectorMoments.ofDimension(2);
    for (int i = 0; i < values.size(); i++) {
      double x = values.get(i);
      double[] pair = {x, x * x};
      all.add(x);
      allPairs.add(pair);
      allVectors.add(pair);
      (i < cut ? left : right).add(x);
      (i < cut ? leftPairs : rightPairs).add(pair);
      (i < cut ? leftVectors : rightVectors).add(pair);
    }
    left.merge(right);
    leftPairs.merge(rightPairs);
    leftVectors.merge(rightVectors);
    assertEquals(all.count(), left.count());
    assertEquals(all.mean(), left.mean(), 1e-12 * 1e3);
    assertEquals(all.variance(), left.variance(), 1e-12 * 1e6);
    assertEquals(all.variance(), allPairs.covariance(0, 0), 1e-12 * 1e6);
    for (int i = 0; i < 2; i++) {
      double scale = i == 0 ? 1e3 : 1e6;
      assertEquals(allVectors.mean(i), leftVectors.mean(i), 1e-12 * scale);
      assertEquals(allVectors.variance(i), leftVectors.variance(i), 1e-12 * scale * scale);
      assertEquals(allVectors.variance(i), allPairs.covariance(i, i), 1e-12 * scale * scale);
      for (int j = 0; j <= i; j++) {
        double product = scale * (j == 0 ? 1e3 : 1e6);
        assertEquals(allPairs.covariance(i, j), leftPairs.covariance(i, j), 1e-12 * product);
      }
    }
  }

  @Property(tries = 100, seed = "2026")
  void ratioIntervalInvertsWithTheRatio(
      @ForAll @IntRange(min = 1, max = 300) int first,
      @ForAll @IntRange(min = 1, max = 300) int second,
      @ForAll @DoubleRange(min = .1, max = 10) double exposure) {
    RateRatio ratio = new RateRatio(new RateEstimate(first, 1), new RateEstimate(second, exposure));
    RateRatio inverse = new RateRatio(ratio.denominator(), ratio.numerator());
    Interval limits = ratio.interval(.9);
    assertTrue(limits.contains(ratio.ratio()));
    assertEquals(1, limits.lower() * inverse.interval(.9).upper(), 1e-9);
    assertEquals(ratio.pValue(), inverse.pValue(), 1e-9);
  }
}
