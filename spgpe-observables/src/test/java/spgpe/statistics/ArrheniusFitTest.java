package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static spgpe.statistics.Messages.assertRefused;

import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import spgpe.statistics.ArrheniusFit.CountedRate;
import spgpe.statistics.ArrheniusFit.MeasuredRate;

class ArrheniusFitTest {
  private static final List<MeasuredRate> MEASURED =
      List.of(
          new MeasuredRate(.06447, 7.45e-3, 7.45e-3 / Math.sqrt(118)),
          new MeasuredRate(.05157, 1.55e-3, 1.55e-3 / Math.sqrt(94)),
          new MeasuredRate(.04298, 2.81e-4, 2.81e-4 / Math.sqrt(55)));

  private static final List<CountedRate> COUNTED =
      List.of(
          new CountedRate(1 / 8.0, new RateEstimate(118, 15_000)),
          new CountedRate(1 / 10.0, new RateEstimate(94, 60_000)),
          new CountedRate(1 / 12.0, new RateEstimate(0, 20_000)));

  /** Reference: NumPy, normal equations with weights (rate/error)^2. */
  @Test
  void leastSquares() {
    ArrheniusFit fit = ArrheniusFit.ofRates(MEASURED);
    assertEquals(.4200873, fit.barrier().value(), 5.1e-8);
    assertEquals(1.63355219, fit.logPrefactor().value(), 5.1e-9);
    assertEquals(Math.sqrt(.00042047), fit.barrier().standardError(), 1e-6);
    assertEquals(Math.sqrt(.1472581), fit.logPrefactor().standardError(), 1e-7);
    assertEquals(.00776808, fit.covariance(), 5.1e-9);
    assertEquals(.28154847902272506, fit.deviance(), 1e-9);
    assertEquals(1, fit.degreesOfFreedom());
    Interval profile = fit.barrierInterval(.95);
    Interval wald = fit.barrier().interval(.95);
    assertEquals(wald.lower(), profile.lower(), 1e-9, "quadratic deviance: profile is Wald");
    assertEquals(wald.upper(), profile.upper(), 1e-9, "quadratic deviance: profile is Wald");
  }

  @Test
  void leastSquaresWithGivenPrefactor() {
    ArrheniusFit fit = ArrheniusFit.ofRates(MEASURED, 3);
    assertEquals(.39186843254472803, fit.barrier().value(), 1e-12);
    assertEquals(.003270191654107458, fit.barrier().standardError(), 1e-13);
    assertEquals(new Estimate(Math.log(3), 0), fit.logPrefactor());
    assertEquals(2, fit.degreesOfFreedom());
  }

  /** Reference: mpmath, 30 digits, roots of score and of the profiled Poisson deviance. */
  @Test
  void likelihoodUsesTemperaturesWithoutEvents() {
    ArrheniusFit fit = ArrheniusFit.ofCounts(COUNTED);
    assertEquals(.88106865097147129, fit.barrier().value(), 1e-13);
    assertEquals(2.24351891887960883, fit.logPrefactor().value(), 1e-12);
    assertEquals(10.9107822499046849, fit.deviance(), 1e-11);
    assertEquals(9.560614483776253e-4, fit.pValue().orElseThrow(), 1e-11);
    assertEquals(.00403393, Math.pow(fit.barrier().standardError(), 2), 5.1e-9);
    assertEquals(.32329671, Math.pow(fit.logPrefactor().standardError(), 2), 5.1e-8);
    assertEquals(.03584867, fit.covariance(), 5.1e-9);
    Interval profile = fit.barrierInterval(.95);
    assertEquals(.7582907720513085, profile.lower(), 1e-8);
    assertEquals(1.00753017468457868, profile.upper(), 1e-12);
  }

  @Test
  void likelihoodWithGivenPrefactor() {
    ArrheniusFit fit = ArrheniusFit.ofCounts(COUNTED, .5);
    assertEquals(.5627814798858374, fit.barrier().value(), 1e-12);
    assertEquals(38.135449416135835, fit.deviance(), 1e-8);
  }

  @Test
  void exactLawIsRecovered() {
    double[] temperatures = {.03, .04, .07};
    List<MeasuredRate> measured =
        Arrays.stream(temperatures)
            .mapToObj(t -> new MeasuredRate(t, 2 * Math.exp(-.5 / t), 1e-3 * Math.exp(-.5 / t)))
            .toList();
    List<CountedRate> counted =
        Arrays.stream(temperatures)
            .mapToObj(t -> new CountedRate(t, new RateEstimate(80, 40 * Math.exp(.5 / t))))
            .toList();
    for (ArrheniusFit fit :
        List.of(ArrheniusFit.ofRates(measured), ArrheniusFit.ofCounts(counted))) {
      assertEquals(.5, fit.barrier().value(), 1e-12);
      assertEquals(Math.log(2), fit.logPrefactor().value(), 1e-10);
      assertEquals(0, fit.deviance(), 1e-12);
      assertEquals(Math.log(2) - 10, fit.logRateAt(.05).value(), 1e-10);
    }
  }

  @Test
  void twoPointsAreMatchedExactlyAndCarryTheirOwnErrors() {
    ArrheniusFit fit = ArrheniusFit.ofRates(MEASURED.subList(0, 2));
    assertEquals(OptionalDouble.empty(), fit.pValue());
    for (MeasuredRate point : MEASURED.subList(0, 2)) {
      Estimate log = fit.logRateAt(point.temperature());
      assertEquals(Math.log(point.rate()), log.value(), 1e-10);
      assertEquals(point.standardError() / point.rate(), log.standardError(), 1e-8);
    }
    assertTrue(fit.logRateAt(.03).standardError() > fit.logRateAt(.05157).standardError());
  }

  @Test
  void badInputIsRefusedWithTheReason() {
    assertRefused(() -> ArrheniusFit.ofRates(MEASURED.subList(0, 1)), "2 different temperatures");
    assertRefused(() -> ArrheniusFit.ofRates(List.of(), 1), "1 different temperatures");
    assertRefused(() -> ArrheniusFit.ofCounts(COUNTED.subList(1, 3)), "events", "temperatures=1");
    assertRefused(() -> ArrheniusFit.ofCounts(COUNTED.subList(2, 3), 1), "temperatures=0");
    assertRefused(() -> ArrheniusFit.ofRates(MEASURED, -1), "prefactor=-1.0");
    assertRefused(() -> new MeasuredRate(0, 1, 1), "temperature=0.0");
    assertRefused(() -> new MeasuredRate(1, 1, Double.NaN), "standardError=NaN");
    assertRefused(() -> new CountedRate(-1, new RateEstimate(1, 1)), "temperature=-1.0");
    assertRefused(() -> ArrheniusFit.ofRates(MEASURED).logRateAt(0), "temperature=0.0");
    assertRefused(() -> ArrheniusFit.ofRates(MEASURED).barrierInterval(0), "level=0.0");
  }
}
