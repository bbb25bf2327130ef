package spgpe.planning;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.function.LongSupplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import spgpe.theory.CriticalBubble;
import spgpe.theory.DecayRate;
import spgpe.theory.RingModes;
import spgpe.units.Energy;
import spgpe.units.Frequency;
import spgpe.units.Length;
import spgpe.units.Modulation;
import spgpe.units.RingExperiment;
import spgpe.units.ScaledRing;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;
import spgpe.units.Verdict;

/** The plan of a ring against rates computed independently, and its refusals. */
class ShotPlanTest {
  private static final TimeSpan SHOT = TimeSpan.ofMilliseconds(500);

  /** Basis of the rates: another language, see DecayRateTest; derived, docs/theory-references.md. */
  @ParameterizedTest
  @CsvSource({"8, 1.57866e-2", "10, 2.38865e-3", "12, 3.54124e-4"})
  void laboratoryRingGivesTheReferenceRate(double barrier, double rate) {
    RingExperiment lab = Rings.scaled(48, 0.1, 2.25, 0.5157356 / barrier);
    ShotPlan plan = ShotPlan.of(lab, 0.1, SHOT).withCutoffModes(24);
    ScaledRing ring = plan.ring();
    assertEquals(48, ring.length(), 1e-6);
    assertEquals(0.225, ring.biquadratic(), 1e-9);
    assertEquals(1.1, ring.mu(), 1e-9);
    ExpectedRate expected = plan.rate().orElseThrow();
    assertEquals(ExpectedRate.Basis.FULL_SADDLE, expected.basis());
    assertEquals(rate, ring.units().toScaled(expected.rate()), 1e-5 * rate);
    assertEquals(barrier, expected.barrierOverTemperature(), 1e-5);
    // closed form n sqrt(J) B1(1.5), B1 = 1.905672888
    assertEquals(
        Math.sqrt(0.1) * 1.905672888 / ring.temperature(),
        expected.closedBarrierOverTemperature(), 1e-6);
    double second = 1 / ring.units().time(1).seconds();
    assertEquals(
        1 / (rate * second), plan.statistics().orElseThrow().meanLifetime().seconds(), 1e-5 / rate);
  }

  @Test
  void bandAndRemarksAreThoseOfTheRate() {
    ExpectedRate ten = Rings.referencePlan().rate().orElseThrow();
    assertEquals(0.5, ten.lowRatio());
    assertEquals(1.05, ten.highRatio());
    assertEquals(List.of(), ten.remarks());
    ShotPlan hot =
        ShotPlan.of(Rings.scaled(48, 0.1, 2.25, 0.5157356 / 7), 0.02, SHOT).withCutoffModes(24);
    assertEquals(2, hot.rate().orElseThrow().remarks().size());
  }

  /** At kinetic damping the one-loop rate is a little above that at gamma = .02, 2.54262e-3. */
  @Test
  void kineticDampingHasARate() {
    ShotPlan plan = ShotPlan.of(Rings.reference(), 2e-5, SHOT).withCutoffModes(24);
    ExpectedRate expected = plan.rate().orElseThrow();
    double scaled = plan.ring().units().toScaled(expected.rate());
    assertTrue(scaled > 2.543e-3 && scaled < 2.63e-3, "rate " + scaled);
    assertEquals(0.05, expected.lowRatio());
    assertTrue(expected.remarks().get(0).contains("damping"), expected.remarks().get(0));
  }

  @Test
  void settingsFollowTheRules() {
    ShotPlan plan = Rings.referencePlan();
    RunSettings settings = plan.settings();
    assertEquals(24, settings.cutoffModes());
    assertTrue(settings.gridPoints() >= 4 * 24 + 1);
    // eps_max = k_c^2/2 + J with k_c = 2 pi 24/48
    double largest = Math.PI * Math.PI / 2 + 0.1;
    assertEquals(Math.PI / (largest + 2.2), settings.largestStableStep(), 1e-6);
    assertTrue(settings.step() * largest <= 0.9);
    assertEquals(0.5 / 3, settings.step(), 1e-12);
    // 10 * 2/(0.1 (0.25 + 1.8)) + 48/(2 sqrt(0.9)) * 1/3 * 3 = 97.6 + 25.3
    assertEquals(130, settings.truncation());
    assertEquals(24 * 3 / Math.sqrt(0.9), settings.conversion(), 1e-6);
    assertEquals(plan.settings().step(), settings.integrator().step());
    assertEquals(2, plan.model().components());
    assertEquals(plan.ring().cutoffModes(), ShotPlan.of(Rings.reference(), 0.1, SHOT)
        .settings().cutoffModes());
  }

  @Test
  void longRingUsesAShorterOneOfTheSameCutoff() {
    // 420 modes on L = 840 have the cutoff of 24.5 modes on L = 49
    ShotPlan plan =
        ShotPlan.of(Rings.scaled(840, 0.1, 2.25, 0.05157356), 0.1, SHOT).withCutoffModes(420);
    ExpectedRate expected = plan.rate().orElseThrow();
    assertEquals(ExpectedRate.Basis.FULL_SADDLE, expected.basis());
    assertTrue(expected.remarks().get(0).contains("shorter ring"), expected.remarks().get(0));
    assertEquals(
        2.38865e-3 / 48 * 840, plan.ring().units().toScaled(expected.rate()), 1e-3);
  }

  /** Where both can be had, the fallbacks stay inside their own bands. */
  @ParameterizedTest
  @CsvSource({"1.3, .05", "1.3, .2", "2.25, .01", "2.25, .1", "2.25, .3", "4, .02", "4, .15"})
  void fallbackBandsCoverTheFullRate(double lambdaSquared, double coherent) {
    double length = Math.max(48, 20 / (2 * Math.sqrt(coherent * (lambdaSquared - 1))));
    RingExperiment lab = Rings.scaled(length, coherent, lambdaSquared, 0.01);
    int modes = (int) (length / 2);
    ShotPlan full =
        ShotPlan.of(lab, 0.1, SHOT).withCutoffModes(modes);
    double barrier = full.theory().barrier();
    RingExperiment at =
        lab.withTemperature(full.ring().units().temperature(barrier / 10));
    double rate = rate(ShotPlan.of(at, 0.1, SHOT).withCutoffModes(modes));
    // a scattering length between the components of 1e-9 of the one within them
    ShotPlan barrierOnly =
        ShotPlan.of(at.withInterComponent(Length.ofBohrRadii(65e-9)), 0.1, SHOT)
            .withCutoffModes(modes);
    assertInBand(rate, barrierOnly, ExpectedRate.Basis.SADDLE_BARRIER);
    // three modes are too few for the saddle, and the closed form does not know the modes
    ShotPlan closed = ShotPlan.of(at, 0.1, SHOT).withCutoffModes(3);
    assertInBand(rate, closed, ExpectedRate.Basis.CLOSED_FORM);
  }

  private static double rate(ShotPlan plan) {
    return plan.rate().orElseThrow().rate().perSecondPerMetreToD();
  }

  private static void assertInBand(double full, ShotPlan plan, ExpectedRate.Basis basis) {
    ExpectedRate expected = plan.rate().orElseThrow();
    assertEquals(basis, expected.basis());
    double ratio = full / expected.rate().perSecondPerMetreToD();
    assertTrue(
        ratio >= expected.lowRatio() && ratio <= expected.highRatio(),
        ratio + " outside " + expected);
    assertFalse(expected.remarks().isEmpty());
  }

  /** Both components have one density at the saddle, so g12 acts as part of g. */
  @Test
  void interComponentCouplingEntersTheBarrierExactly() {
    RingExperiment lab = Rings.scaled(48, 0.1, 2.25, 0.04).withInterComponent(
        Length.ofBohrRadii(6.5));
    ShotPlan plan = ShotPlan.of(lab, 0.1, SHOT).withCutoffModes(24);
    double energy =
        CriticalBubble.of(
                new spgpe.theory.CoupledPair(1.1, 1.2, 0.1, 0.225, 1), new RingModes(48, 24))
            .energy();
    assertEquals(
        energy / 0.04, plan.rate().orElseThrow().barrierOverTemperature(), 1e-5 * energy / 0.04);
    assertTrue(plan.rate().orElseThrow().remarks().get(0).contains("g12=0.1"));
  }

  @Test
  void modulationIsPlannedThroughItsAverage() {
    RingExperiment lab =
        RingExperiment.of(
                spgpe.units.Species.K_41,
                spgpe.units.Geometry.ring(Length.ofMicrometres(10)),
                Frequency.ofKilohertz(1.5), 2500, Length.ofBohrRadii(65),
                Temperature.ofNanokelvin(20))
            .withCoherentCoupling(Energy.ofHertz(40))
            .withModulation(new Modulation(0.34, Frequency.ofKilohertz(30)));
    ShotPlan plan = ShotPlan.of(lab, 0.1, SHOT);
    assertEquals(
        ExpectedRate.Basis.SADDLE_BARRIER, plan.rate().orElseThrow().basis());
    IllegalArgumentException thrown =
        assertThrows(IllegalArgumentException.class, () -> plan.forLifetimeByCoupling(SHOT));
    assertTrue(thrown.getMessage().contains("modulation"), thrown.getMessage());
    assertEquals(
        0.3,
        plan.forLifetimeByTemperature(TimeSpan.ofSeconds(0.3)).statistics().orElseThrow()
            .meanLifetime().seconds(),
        1e-9);
  }

  @ParameterizedTest
  @CsvSource({
    "48, 0, 0, 0.05, NOT_METASTABLE", "48, 0.1, 0.9, 0.05, NOT_METASTABLE",
    "48, 0.1, 1, 0.05, NOT_METASTABLE", "48, 0.3, 4, 0.05, NOT_COVERED", "48, 0.001, 450, 0.05, NOT_COVERED",
    "12, 0.01, 2.25, 0.01, RING_TOO_SHORT", "48, 0.1, 2.25, 0.2, BARRIER_TOO_LOW",
    "48, 0.1, 2.25, 0.001, BARRIER_TOO_HIGH"
  })
  void refusalsNameTheirReason(
      double length, double coherent, double lambdaSquared, double t, NoRate.Reason reason) {
    RingExperiment lab = Rings.scaled(length, coherent, lambdaSquared, t);
    ShotPlan plan = ShotPlan.of(lab, 0.1, SHOT).withCutoffModes(24);
    assertTrue(plan.rate().isEmpty());
    assertTrue(plan.statistics().isEmpty());
    NoRate refusal = plan.refusal().orElseThrow();
    assertEquals(reason, refusal.reason(), refusal.message());
    assertTrue(refusal.message().contains("="), refusal.message());
    assertTrue(plan.settings().step() > 0);
    assertFalse(plan.verdicts().isEmpty());
  }

  @Test
  void anotherTemperatureKeepsModesAndTheory() {
    ShotPlan plan = Rings.referencePlan();
    Temperature warm = Temperature.ofKelvin(1.2 * plan.experiment().temperature().kelvin());
    ShotPlan moved = plan.withTemperature(warm);
    ShotPlan fresh =
        ShotPlan.of(Rings.reference().withTemperature(warm), 0.1, SHOT).withCutoffModes(24);
    assertEquals(24, moved.settings().cutoffModes());
    assertEquals(rate(fresh), rate(moved), 1e-12 * rate(fresh));
    assertEquals(fresh.verdicts(), moved.verdicts());
    assertEquals(
        fresh.ring().temperature(), moved.model().reservoir().temperature(), 1e-15);
    assertTrue(plan.withTemperature(Temperature.ofKelvin(1e-6)).rate().isEmpty());
  }

  @Test
  void wrongValuesAreRefused() {
    RingExperiment lab = Rings.reference();
    for (double gamma : new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY}) {
      assertThrows(IllegalArgumentException.class, () -> ShotPlan.of(lab, gamma, SHOT));
    }
    assertThrows(
        IllegalArgumentException.class, () -> ShotPlan.of(lab, 0.1, TimeSpan.ofSeconds(0)));
    ShotPlan plan = Rings.referencePlan();
    assertThrows(IllegalArgumentException.class, () -> plan.withCutoffModes(0));
    assertThrows(
        IllegalArgumentException.class,
        () -> plan.forLifetimeByTemperature(TimeSpan.ofSeconds(-1)));
    assertThrows(IllegalArgumentException.class, () -> new StepTiming(Double.NaN));
  }

  @Test
  void verdictsJudgeThePlan() {
    List<Verdict> verdicts = Rings.referencePlan().verdicts();
    for (String name :
        List.of(
            "modes kept/modes suggested", "E_b/(kB T) of the rate",
            "truncation time/mean lifetime", "shot/mean lifetime", "gamma used/gamma kinetic")) {
      assertEquals(1, verdicts.stream().filter(v -> v.name().equals(name)).count(), name);
    }
    // 130 t0 against 1/2.38865e-3 t0
    assertEquals(
        130 * 2.38865e-3,
        verdicts.stream().filter(v -> v.name().startsWith("truncation")).findFirst().orElseThrow()
            .value(),
        1e-4);
  }

  /**
   * A clock on which the runs take 2, 1.9, 1.8 ... s: the second one fills the three seconds, and its
   * 500 steps of 4 trajectories count.
   */
  @Test
  void timingFollowsTheGivenClock() {
    LongSupplier clock =
        new LongSupplier() {
          private long now;
          private long stride = 2_000_000_000L;
          private boolean begun;

          @Override
          public long getAsLong() {
            if (begun) {
              now += stride;
              stride -= 100_000_000L;
            }
            begun = !begun;
            return now;
          }
        };
    assertEquals(
        1.9 / 2000, StepTiming.measure(Rings.referencePlan(), clock).secondsPerStep(), 1e-15);
  }

  @Test
  void computingTimeCountsSteps() {
    ShotPlan plan = Rings.referencePlan();
    TimeSpan until = plan.ring().units().time(3000);
    double lifetime = 1 / DecayRate.of(
        CriticalBubble.of(
            new spgpe.theory.CoupledPair(1, 1.1, .1, .225, .05157356), new RingModes(48, 24)),
        .05157356, .1).total();
    double mean = lifetime * (1 - Math.exp(-3000 / lifetime));
    assertEquals(
        1e-6 * 1000 * mean / plan.settings().step() / 2,
        plan.computingTime(new StepTiming(1e-6), 1000, until, 2).seconds(), 1e-4);
    // nothing decays: every trajectory runs to the end
    ShotPlan still =
        ShotPlan.of(Rings.scaled(48, 0, 0, 0.05), 0.1, SHOT).withCutoffModes(24);
    double steps = still.ring().units().toScaled(SHOT) / still.settings().step();
    assertEquals(
        1e-6 * 10 * steps, still.computingTime(new StepTiming(1e-6), 10, SHOT, 1).seconds(),
        1e-9);
    assertThrows(
        IllegalArgumentException.class,
        () -> plan.computingTime(new StepTiming(1e-6), 0, until, 2));
  }
}
