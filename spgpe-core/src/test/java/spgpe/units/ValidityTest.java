package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import spgpe.units.Verdict.Grade;

class ValidityTest {
  @Test
  void gradesFollowTheLimits() {
    assertEquals(Grade.FINE, Verdict.atMost("x", 1, 1, 2, "r").grade());
    assertEquals(Grade.MARGINAL, Verdict.atMost("x", 2, 1, 2, "r").grade());
    assertEquals(Grade.OUTSIDE, Verdict.atMost("x", 2.001, 1, 2, "r").grade());
    assertEquals(Grade.FINE, Verdict.atLeast("x", 2, 2, 1, "r").grade());
    assertEquals(Grade.MARGINAL, Verdict.atLeast("x", 1.5, 2, 1, "r").grade());
    assertEquals(Grade.OUTSIDE, Verdict.atLeast("x", 1, 2, 1, "r").grade());
    assertThrows(IllegalArgumentException.class, () -> Verdict.atMost("x", Double.NaN, 1, 2, "r"));
    assertEquals(Grade.FINE, Verdict.worst(List.of()));
    assertEquals(
        Grade.OUTSIDE,
        Verdict.worst(
            List.of(Verdict.atMost("x", 3, 1, 2, "r"), Verdict.atMost("y", 1, 1, 2, "r"))));
    String line = Verdict.atMost("n a", 0.264, 0.1, 0.5, "swells").toString();
    assertTrue(
        line.startsWith("MARGINAL n a = 0.2640")
            && line.contains("0.500")
            && line.endsWith("swells"),
        line);
  }

  @Test
  void wignerExcessAtHalf() {
    // coth formula; E/kB T = 0.5
    Temperature temperature = Temperature.ofNanokelvin(30);
    Energy energy = new Energy(0.5 * temperature.energy().joules());
    assertEquals(0.0207470412684, Validity.wignerExcess(energy, temperature), 1e-13);
    assertEquals(Grade.FINE, Validity.classicalMode("mode", energy, temperature).grade());
    assertThrows(
        IllegalArgumentException.class,
        () -> Validity.wignerExcess(energy, Temperature.ofKelvin(0)));
  }

  @Property(tries = 200)
  void wignerExcessRisesAndHasItsLimits(@ForAll @DoubleRange(min = 0.01, max = 50) double ratio) {
    Temperature temperature = Temperature.ofNanokelvin(30);
    double joules = temperature.energy().joules();
    double excess = Validity.wignerExcess(new Energy(ratio * joules), temperature);
    double more = Validity.wignerExcess(new Energy(1.01 * ratio * joules), temperature);
    assertTrue(more > excess);
    assertTrue(excess <= ratio * ratio / 12 && excess >= ratio / 2 - 1);
  }

  @Test
  void wignerExcessIsSmoothWhereTheMethodChanges() {
    Temperature temperature = Temperature.ofNanokelvin(30);
    double joules = temperature.energy().joules();
    double below = Validity.wignerExcess(new Energy(0.04 * (1 - 1e-9) * joules), temperature);
    double above = Validity.wignerExcess(new Energy(0.04 * (1 + 1e-9) * joules), temperature);
    assertEquals(4e-9, above / below - 1, 2e-11);
  }

  @Test
  void layerOfRubidiumBelowAndAboveTheTransition() {
    Confinement layer = Confinement.quasi2d(Species.RB_87, Frequency.ofKilohertz(3));
    Length a = Length.ofBohrRadii(100.4);
    UniformGas gas =
        UniformGas.of(Species.RB_87, layer.coupling(a), Density.perSquareMicrometre(50));
    Map<String, Verdict> cold =
        byName(Validity.quasi2d(layer, gas, a, Temperature.ofNanokelvin(30)));
    assertEquals(Grade.FINE, cold.get("n lambda^2/BKT value").grade());
    assertEquals(220.82631 / 30, cold.get("n lambda^2/BKT value").value(), 1e-6);
    assertEquals(Grade.FINE, cold.get("m g/hbar^2").grade());
    Map<String, Verdict> hot =
        byName(Validity.quasi2d(layer, gas, a, Temperature.ofNanokelvin(300)));
    assertEquals(Grade.OUTSIDE, hot.get("n lambda^2/BKT value").grade());
    assertEquals(Grade.OUTSIDE, hot.get("kB T/(hbar w_z)").grade());
    Length strong = Length.ofBohrRadii(1000);
    UniformGas dense =
        UniformGas.of(Species.RB_87, layer.coupling(strong), Density.perSquareMicrometre(50));
    Map<String, Verdict> beyond =
        byName(Validity.quasi2d(layer, dense, strong, Temperature.ofNanokelvin(30)));
    assertEquals(Grade.OUTSIDE, beyond.get("m g/hbar^2").grade());
    assertEquals(4, beyond.size());
    assertThrows(
        IllegalArgumentException.class,
        () -> Validity.quasi1d(layer, gas, a, Temperature.ofNanokelvin(30)));
  }

  @Test
  void thomasFermi() {
    assertEquals(
        Grade.FINE, Validity.thomasFermi(Energy.ofHertz(800), Frequency.ofHertz(5)).grade());
    assertEquals(
        Grade.OUTSIDE, Validity.thomasFermi(Energy.ofHertz(4), Frequency.ofHertz(5)).grade());
  }

  static Map<String, Verdict> byName(List<Verdict> verdicts) {
    return verdicts.stream().collect(Collectors.toMap(Verdict::name, verdict -> verdict));
  }
}
