package spgpe.planning;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.Scale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;

/** Plans for a wanted lifetime. */
class PlanSearchTest {
  private static final ShotPlan PLAN = Rings.referencePlan();

  private static double lifetime(ShotPlan plan) {
    return plan.statistics().orElseThrow().meanLifetime().seconds();
  }

  private static double scaledSeconds(double t0) {
    return PLAN.ring().units().time(t0).seconds();
  }

  @Property(tries = 30)
  void temperatureIsTheInverseOfTheLifetime(
      @ForAll @DoubleRange(min = 2, max = 14) @Scale(4) double logLifetime) {
    TimeSpan wanted = TimeSpan.ofSeconds(scaledSeconds(Math.pow(10, logLifetime)));
    ShotPlan found = PLAN.forLifetimeByTemperature(wanted);
    assertEquals(wanted.seconds(), lifetime(found), 1e-9 * wanted.seconds());
    assertEquals(24, found.settings().cutoffModes());
    // a plan made afresh at that temperature agrees
    ShotPlan fresh =
        ShotPlan.of(
                Rings.reference().withTemperature(found.experiment().temperature()), 0.1,
                PLAN.shot())
            .withCutoffModes(24);
    assertEquals(wanted.seconds(), lifetime(fresh), 1e-9 * wanted.seconds());
  }

  @Test
  void theOwnLifetimeGivesTheOwnTemperature() {
    ShotPlan found = PLAN.forLifetimeByTemperature(TimeSpan.ofSeconds(lifetime(PLAN)));
    assertEquals(
        PLAN.experiment().temperature().kelvin(), found.experiment().temperature().kelvin(),
        1e-10 * found.experiment().temperature().kelvin());
  }

  @ParameterizedTest
  @ValueSource(doubles = {1.7, 2.5, 3.5})
  void couplingIsTheInverseOfTheLifetime(double logLifetime) {
    TimeSpan wanted = TimeSpan.ofSeconds(scaledSeconds(Math.pow(10, logLifetime)));
    ShotPlan found = PLAN.forLifetimeByCoupling(wanted);
    assertEquals(wanted.seconds(), lifetime(found), 1e-7 * wanted.seconds());
    assertEquals(2.25, found.ring().pair().orElseThrow().lambdaSquared(), 1e-9);
    assertEquals(
        PLAN.experiment().temperature(), found.experiment().temperature(), "same temperature");
  }

  @Test
  void theOwnLifetimeGivesTheOwnCoupling() {
    ShotPlan found = PLAN.forLifetimeByCoupling(TimeSpan.ofSeconds(lifetime(PLAN)));
    assertEquals(0.1, found.ring().coherent(), 1e-7);
  }

  @Property(tries = 25)
  void colderAndStrongerCoupledLivesLonger(
      @ForAll @DoubleRange(min = 0.02, max = 0.11) @Scale(4) double temperature,
      @ForAll @DoubleRange(min = 0.03, max = 0.3) @Scale(4) double coherent) {
    ShotPlan cold = plan(coherent, temperature);
    ShotPlan hot = plan(coherent, 1.05 * temperature);
    ShotPlan strong = plan(1.05 * coherent, temperature);
    assertTrue(hot.rate().isEmpty() || lifetime(cold) > lifetime(hot));
    assertTrue(cold.rate().isEmpty() || lifetime(strong) > lifetime(cold));
  }

  private static ShotPlan plan(double coherent, double temperature) {
    return ShotPlan.of(Rings.scaled(48, coherent, 2.25, temperature), 0.1, PLAN.shot())
        .withCutoffModes(16);
  }

  @Test
  void unreachableLifetimesAreRefusedWithTheRange() {
    IllegalArgumentException fast =
        assertThrows(
            IllegalArgumentException.class,
            () -> PLAN.forLifetimeByTemperature(TimeSpan.ofSeconds(1e-6)));
    assertTrue(fast.getMessage().contains("range"), fast.getMessage());
    assertTrue(fast.getMessage().contains("nK"), fast.getMessage());
    IllegalArgumentException slow =
        assertThrows(
            IllegalArgumentException.class,
            () -> PLAN.forLifetimeByCoupling(TimeSpan.ofSeconds(1e12)));
    assertTrue(slow.getMessage().contains("Hz"), slow.getMessage());
    ShotPlan uncoupled =
        ShotPlan.of(Rings.scaled(48, 0, 0, 0.05), 0.1, PLAN.shot()).withCutoffModes(24);
    TimeSpan second = TimeSpan.ofSeconds(1);
    assertTrue(
        assertThrows(
                IllegalArgumentException.class, () -> uncoupled.forLifetimeByTemperature(second))
            .getMessage().contains("metastable"));
    assertTrue(
        assertThrows(
                IllegalArgumentException.class, () -> uncoupled.forLifetimeByCoupling(second))
            .getMessage().contains("lambda^2"));
  }

  @Test
  void tooHotForThisCouplingIsMendedByTheSearch() {
    ShotPlan hot =
        ShotPlan.of(
                Rings.reference()
                    .withTemperature(
                        Temperature.ofKelvin(4 * Rings.reference().temperature().kelvin())),
                0.1, PLAN.shot())
            .withCutoffModes(24);
    assertTrue(hot.rate().isEmpty());
    assertEquals(1, lifetime(hot.forLifetimeByTemperature(TimeSpan.ofSeconds(1))), 1e-9);
  }
}
