package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * Estimators on the data of {@link LeukaemiaTrial}. Survival .857, .807, .753, .690, .627, .538,
 * .448 and log-rank 16.79 are the values of the textbooks (from memory); the further digits,
 * standard errors and limits were computed for this project with an independent script from the
 * formulas in the class comments.
 */
class LeukaemiaTrialTest {
  /** Time, at risk, S, Greenwood standard error, lower and upper log-log limit at 95 percent. */
  private static final double[][] TABLE = {
    {6, 21, .857143, .076360, .6197, .9516},
    {7, 17, .806723, .086935, .5631, .9228},
    {10, 15, .752941, .096350, .5032, .8894},
    {13, 12, .690196, .106815, .4316, .8491},
    {16, 11, .627451, .114054, .3675, .8049},
    {22, 7, .537815, .128234, .2678, .7468},
    {23, 6, .448179, .134591, .1881, .6801}
  };

  @Test
  void dataAgreesWithItsPublishedDescription() {
    SurvivalData all = LeukaemiaTrial.treated().followedBy(LeukaemiaTrial.placebo());
    assertEquals(42, all.size());
    assertEquals(12.88, all.exposure() / 42, .005);
    assertEquals(.7143, all.eventCount() / 42.0, 5e-5);
  }

  @Test
  void kaplanMeierTable() {
    KaplanMeier curve = KaplanMeier.of(LeukaemiaTrial.treated());
    List<KaplanMeier.Step> steps = curve.steps();
    assertEquals(TABLE.length, steps.size());
    for (int i = 0; i < TABLE.length; i++) {
      KaplanMeier.Step step = steps.get(i);
      Interval limits = curve.intervalAt(TABLE[i][0], .95);
      assertEquals(TABLE[i][0], step.time());
      assertEquals(TABLE[i][1], step.atRisk());
      assertEquals(TABLE[i][2], step.survival(), 5.1e-7);
      assertEquals(TABLE[i][3], step.standardError(), 5.1e-7);
      assertEquals(TABLE[i][4], limits.lower(), 5.1e-5);
      assertEquals(TABLE[i][5], limits.upper(), 5.1e-5);
    }
  }

  @Test
  void medians() {
    assertEquals(OptionalDouble.of(23), KaplanMeier.of(LeukaemiaTrial.treated()).quantile(.5));
    assertEquals(OptionalDouble.of(8), KaplanMeier.of(LeukaemiaTrial.placebo()).quantile(.5));
    assertEquals(OptionalDouble.empty(), KaplanMeier.of(LeukaemiaTrial.treated()).quantile(.9));
  }

  @Test
  void nelsonAalen() {
    NelsonAalen hazard = NelsonAalen.of(LeukaemiaTrial.treated());
    assertEquals(.752114, hazard.cumulativeHazardAt(23), 5.1e-7);
    assertEquals(.752114, hazard.cumulativeHazardAt(35), 5.1e-7);
    assertEquals(3.0 / 21, hazard.cumulativeHazardAt(6.5), 1e-15);
    assertEquals(0, hazard.cumulativeHazardAt(5.9));
    assertEquals(Math.sqrt(3) / 21, hazard.steps().get(0).standardError(), 1e-15);
  }

  @Test
  void logRank() {
    LogRankTest test = LogRankTest.of(LeukaemiaTrial.treated(), LeukaemiaTrial.placebo());
    assertEquals(9, test.observed());
    assertEquals(19.250501, test.expected(), 5.1e-7);
    assertEquals(6.256961, test.variance(), 5.1e-7);
    assertEquals(16.792941, test.chiSquare(), 5.1e-7);
    assertEquals(4.169e-5, test.pValue(), 5.1e-9);
    LogRankTest swapped = LogRankTest.of(LeukaemiaTrial.placebo(), LeukaemiaTrial.treated());
    assertEquals(test.chiSquare(), swapped.chiSquare(), 1e-12);
  }

  @Test
  void exponentialRates() {
    RateEstimate treated = RateEstimate.of(LeukaemiaTrial.treated());
    assertEquals(9, treated.events());
    assertEquals(359, treated.exposure());
    assertEquals(.0250696, treated.rate(), 5.1e-8);
    Interval exact = treated.interval(.95, Censoring.FAILURE_CENSORED);
    assertEquals(.0114634, exact.lower(), 5.1e-8);
    assertEquals(.0439086, exact.upper(), 5.1e-8);
    Interval conservative = treated.interval(.95, Censoring.TIME_CENSORED_CONSERVATIVE);
    assertEquals(exact.lower(), conservative.lower());
    assertEquals(.0475900, conservative.upper(), 5.1e-8);
    RateEstimate placebo = RateEstimate.of(LeukaemiaTrial.placebo());
    assertEquals(.1153846, placebo.rate(), 5.1e-8);
    Interval limits = placebo.interval(.95, Censoring.FAILURE_CENSORED);
    assertEquals(.0714249, limits.lower(), 5.1e-8);
    assertEquals(.1697164, limits.upper(), 5.1e-8);
  }

  @Test
  void coxOakes() {
    assertEquals(.87525, CoxOakesTest.of(LeukaemiaTrial.treated()).chiSquare(), 5.1e-6);
    assertEquals(2.41053, CoxOakesTest.of(LeukaemiaTrial.placebo()).chiSquare(), 5.1e-6);
  }

  /** Reference: SciPy 1.17, beta.ppf and binom of the conditional binomial law. */
  @Test
  void ratioOfTheRates() {
    RateRatio ratio =
        new RateRatio(
            RateEstimate.of(LeukaemiaTrial.treated()), RateEstimate.of(LeukaemiaTrial.placebo()));
    assertEquals(.21727019498607242, ratio.ratio(), 1e-15);
    assertEquals(.0876071673032654, ratio.interval(.95).lower(), 1e-12);
    assertEquals(.4948598383203304, ratio.interval(.95).upper(), 1e-12);
    assertEquals(1.035044641233037e-4, ratio.pValue(), 1e-15);
  }
}
