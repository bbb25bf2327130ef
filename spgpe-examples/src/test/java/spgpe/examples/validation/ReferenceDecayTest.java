package spgpe.examples.validation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.statistics.Estimate;
import spgpe.statistics.RateEstimate;

/**
 * A small version of {@link ReferenceDecay}, seed fixed before the first run of this test.
 *
 * <p>Bounds of 3.9 standard errors on each of twelve numbers: false-alarm probability 1.2e-3 in
 * all, and another 8e-4 (exact binomial) for the seven points of the survival curve.
 * Power: the rate has a relative error of about 0.1 with 100 trajectories, so that a rate wrong by
 * a factor 1.7 is found with probability 0.97; a temperature or noise strength wrong by 5 % changes
 * the rate by a factor 1.6 and &lt;dphi^2&gt; (relative error 0.006) by 6 %, which is found with
 * certainty.
 */
class ReferenceDecayTest {
  private static final double BOUND = 3.9;

  @Test
  void rateAndAveragesOfTheReferenceSet() {
    ReferenceDecay.Outcome outcome =
        ReferenceDecay.measure(100, 20260101, Runnable::run, progress -> {});
    RateEstimate rate = outcome.rate();
    assertTrue(rate.events() > 60, "events: " + rate.events());
    // the error from the reference rate, so that a low count does not shrink its own error
    double error = ReferenceDecay.REFERENCE_RATE.value() / Math.sqrt(rate.events());
    assertEquals(
        ReferenceDecay.REFERENCE_RATE.value(), rate.rate(), BOUND * error, "decay rate");
    for (int i = 0; i < MetastableAverages.NAMES.size(); i++) {
      Estimate measured = outcome.averages().get(i);
      double sigmas =
          ReferenceDecay.sigmas(measured, ReferenceDecay.REFERENCE_AVERAGES.get(i));
      assertTrue(
          Math.abs(sigmas) < BOUND,
          MetastableAverages.NAMES.get(i) + ": " + measured + ", " + sigmas + " sigma");
    }
    for (int i = 3; i < 10; i++) { // t = 200 to 1200: not too few decays, nor survivors
      Estimate reference = ReferenceDecay.REFERENCE_SURVIVAL.get(i);
      double sigma =
          Math.hypot(reference.standardError(), outcome.binomialError(reference.value()));
      assertEquals(
          reference.value(), outcome.survival().get(i).value(), BOUND * sigma,
          "survival at t=" + ReferenceDecay.SURVIVAL_TIMES[i]);
    }
  }
}
