package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ThermalBathTest {
  private static Species species(String name) {
    return switch (name) {
      case "Rb-87" -> Species.RB_87;
      case "Na-23" -> Species.NA_23;
      case "K-39" -> Species.K_39;
      default -> Species.K_41;
    };
  }

  /**
   * Basis: collision integral (derived, see docs/theory.md), constants CODATA 2022, masses AME2020.
   * A zero factor stands for the cutoff mu + kB T ln 2, otherwise the cutoff is factor times mu.
   * The scattering lengths only define the inputs.
   */
  @ParameterizedTest
  @CsvSource({
    "Rb-87, 100.4, 100, 20, 0, 6.4391052e-4, 0.51455647, 3.3132833e-4",
    "Rb-87, 100.4, 50, 10, 0, 3.2195526e-4, 0.51455647, 1.6566416e-4",
    "Na-23, 54.54, 200, 60, 0, 1.0052806e-4, 0.51096465, 5.1366287e-5",
    "K-39, 100, 80, 25, 0, 2.2910929e-4, 0.51054585, 1.1697079e-4",
    "K-41, 65.42, 50, 20, 0, 6.4426246e-5, 0.50778485, 3.2714671e-5",
    "K-41, 65.42, 20, 12, 0, 2.5770498e-5, 0.50245343, 1.2948475e-5",
    "Rb-87, 100.4, 100, 30, 3, 6.4391052e-4, 0.68455550, 4.4079249e-4",
    "K-41, 65.42, 50, 20, 3, 6.4426246e-5, 0.37154536, 2.3937273e-5"
  })
  void growthRateMatchesKineticTheory(
      String name,
      double a,
      double nanokelvin,
      double mu,
      double factor,
      double prefactor,
      double sum,
      double gamma) {
    Temperature temperature = Temperature.ofNanokelvin(nanokelvin);
    Energy potential = Temperature.ofNanokelvin(mu).energy();
    Energy cutoff =
        factor == 0
            ? ThermalBath.cutoffEnergy(potential, temperature, 1)
            : new Energy(factor * potential.joules());
    ThermalBath bath =
        ThermalBath.of(species(name), Length.ofBohrRadii(a), temperature, potential, cutoff);
    assertEquals(1, bath.growthPrefactor() / prefactor, 1e-7);
    assertEquals(1, bath.collisionSum() / sum, 1e-7);
    assertEquals(1, bath.growthRate() / gamma, 1e-7);
  }

  @Test
  void energyDampingOfPotassiumInATube() {
    // basis: golden rule and quadrature of the reduced kernel (derived, see docs/theory.md)
    ThermalBath bath = potassium();
    Confinement tube = Confinement.quasi1d(Species.K_41, Frequency.ofKilohertz(1.5));
    assertEquals(1, bath.scatteringAmplitude() / 6.0241143e-16, 1e-7);
    assertEquals(1, bath.energyDampingKernel(tube, 0) / 2.9626814e-10, 1e-7);
    assertEquals(1, bath.energyDampingKernel(tube, 1e6) / 2.2035580e-10, 1e-7);
    assertEquals(bath.energyDampingKernel(tube, 1e6), bath.energyDampingKernel(tube, -1e6));
  }

  @Test
  void energyDampingOfRubidiumInALayer() {
    Temperature temperature = Temperature.ofNanokelvin(100);
    Energy mu = Temperature.ofNanokelvin(20).energy();
    ThermalBath bath =
        ThermalBath.of(
            Species.RB_87,
            Length.ofBohrRadii(100.4),
            temperature,
            mu,
            ThermalBath.cutoffEnergy(mu, temperature, 1));
    Confinement layer = Confinement.quasi2d(Species.RB_87, Frequency.ofKilohertz(3));
    assertEquals(1, bath.scatteringAmplitude() / 1.4188600e-15, 1e-7);
    assertEquals(1, layer.oscillatorLength().metres() / 1.9689294e-7, 1e-7);
    assertEquals(1, bath.energyDampingKernel(layer, 1e6) / 1.0836662e-15, 1e-7);
    assertThrows(IllegalArgumentException.class, () -> bath.energyDampingKernel(layer, 0));
  }

  @Test
  void kernelShapesMatchTheirIntegrals() {
    // k = 0.5, width 1, M = 1; basis: quadrature over the transverse ground state
    double line = SpecialFunctions.scaledErfc(0.5 / Math.sqrt(2)) / Math.sqrt(8 * Math.PI);
    double plane = SpecialFunctions.scaledBesselK0(0.0625) / (2 * Math.PI);
    assertEquals(0.139477735194647, line, 1e-14);
    assertEquals(0.490015341632831, plane, 1e-14);
  }

  @Test
  void kernelsApproachThreeDimensionsAtShortWavelength() {
    // for k a much larger than 1 the 1D kernel becomes M/(2 pi a^2 |k|), the bulk one over the area
    ThermalBath bath = potassium();
    Confinement tube = Confinement.quasi1d(Species.K_41, Frequency.ofKilohertz(1.5));
    double a = tube.oscillatorLength().metres();
    double k = 1e4 / a;
    double expected = bath.scatteringAmplitude() / (2 * Math.PI * a * a * k);
    assertEquals(1, bath.energyDampingKernel(tube, k) / expected, 2e-8);
  }

  @Test
  void occupationAtTheCutoffIsTheOneAskedFor() {
    Temperature temperature = Temperature.ofNanokelvin(30);
    Energy mu = Energy.ofHertz(800);
    Energy cutoff = ThermalBath.cutoffEnergy(mu, temperature, 2.5);
    double reduced = (cutoff.joules() - mu.joules()) / temperature.energy().joules();
    assertEquals(2.5, 1 / Math.expm1(reduced), 1e-12);
  }

  @Test
  void relaxationAndDampingVerdicts() {
    ThermalBath bath = potassium();
    double expected =
        Constants.HBAR / (2 * bath.growthRate() * Temperature.ofNanokelvin(20).energy().joules());
    assertEquals(expected, bath.relaxationTime(bath.growthRate()).seconds(), 1e-12 * expected);
    var unlike = bath.dampingVerdicts(0.01, TimeSpan.ofMilliseconds(500));
    assertEquals(Verdict.Grade.OUTSIDE, unlike.get(0).grade());
    assertEquals(0.01 / bath.growthRate(), unlike.get(0).value(), 1e-9);
    assertEquals(Verdict.Grade.OUTSIDE, unlike.get(1).grade());
    assertEquals(expected / 0.5, unlike.get(1).value(), 1e-12 * expected);
    var alike = bath.dampingVerdicts(2 * bath.growthRate(), TimeSpan.ofSeconds(60));
    assertEquals(Verdict.Grade.FINE, Verdict.worst(alike));
    assertEquals(Verdict.Grade.FINE, bath.cutoffVerdict().grade());
    assertEquals(Verdict.Grade.MARGINAL, potassiumAtLowCutoff().cutoffVerdict().grade());
  }

  @Test
  void refusesACutoffAtOrBelowMu() {
    Temperature temperature = Temperature.ofNanokelvin(50);
    Energy mu = Temperature.ofNanokelvin(20).energy();
    for (double factor : new double[] {0.5, 1}) {
      Energy cutoff = new Energy(factor * mu.joules());
      IllegalArgumentException error =
          assertThrows(
              IllegalArgumentException.class,
              () -> ThermalBath.of(Species.K_41, Length.ofBohrRadii(65), temperature, mu, cutoff));
      assertTrue(error.getMessage().contains("raise the cutoff"), error.getMessage());
    }
    assertThrows(
        IllegalArgumentException.class,
        () -> ThermalBath.cutoffEnergy(mu, Temperature.ofKelvin(0), 1));
    assertThrows(
        IllegalArgumentException.class,
        () -> ThermalBath.cutoffEnergy(mu, temperature, Double.NaN));
  }

  /**
   * The cloud above a higher cutoff is thinner; a hotter one of the same occupation scatters more.
   */
  @Property(tries = 200)
  void growthRateFallsWithTheCutoffAndRisesWithTemperature(
      @ForAll @DoubleRange(min = 1, max = 500) double nanokelvin,
      @ForAll @DoubleRange(min = -3, max = 3) double reducedMu,
      @ForAll @DoubleRange(min = 0.3, max = 30) double occupation) {
    Temperature cold = Temperature.ofNanokelvin(nanokelvin);
    Energy mu = new Energy(Math.abs(reducedMu) * cold.energy().joules());
    Energy low = ThermalBath.cutoffEnergy(mu, cold, occupation);
    Energy high = ThermalBath.cutoffEnergy(mu, cold, occupation / 1.5);
    assertTrue(high.joules() > low.joules());
    double gammaLow = bath(cold, mu, low).growthRate();
    assertTrue(gammaLow > 0 && Double.isFinite(gammaLow));
    assertTrue(bath(cold, mu, high).growthRate() < gammaLow);
    assertTrue(
        bath(cold, mu, high).scatteringAmplitude() < bath(cold, mu, low).scatteringAmplitude());
    Temperature hot = Temperature.ofNanokelvin(1.2 * nanokelvin);
    assertTrue(bath(hot, mu, low).growthRate() > gammaLow);
  }

  @Property(tries = 200)
  void everyAdmissibleBathGivesFiniteNumbers(
      @ForAll @DoubleRange(min = 0.01, max = 1e4) double nanokelvin,
      @ForAll @DoubleRange(min = -1e4, max = 1e4) double mu,
      @ForAll @DoubleRange(min = 0.11, max = 1e5) double gap,
      @ForAll @DoubleRange(min = 1, max = 1e9) double k) {
    Temperature temperature = Temperature.ofNanokelvin(nanokelvin);
    double muJoules = mu * 1e-9 * Constants.BOLTZMANN;
    Energy cutoff = new Energy(Math.max(muJoules, 0) + gap * 1e-3 * temperature.energy().joules());
    ThermalBath bath = bath(temperature, new Energy(muJoules), cutoff);
    for (double value :
        new double[] {
          bath.growthRate(),
          bath.scatteringAmplitude(),
          bath.energyDampingKernel(Confinement.quasi1d(Species.K_41, Frequency.ofHertz(900)), k),
          bath.energyDampingKernel(Confinement.quasi2d(Species.K_41, Frequency.ofHertz(900)), k)
        }) {
      assertTrue(value >= 0 && Double.isFinite(value), () -> bath + " gave " + value);
    }
  }

  private static ThermalBath bath(Temperature temperature, Energy mu, Energy cutoff) {
    return ThermalBath.of(Species.K_41, Length.ofBohrRadii(65.42), temperature, mu, cutoff);
  }

  private static ThermalBath potassium() {
    Temperature temperature = Temperature.ofNanokelvin(50);
    Energy mu = Temperature.ofNanokelvin(20).energy();
    return bath(temperature, mu, ThermalBath.cutoffEnergy(mu, temperature, 1));
  }

  private static ThermalBath potassiumAtLowCutoff() {
    Energy mu = Temperature.ofNanokelvin(20).energy();
    return bath(Temperature.ofNanokelvin(50), mu, new Energy(1.5 * mu.joules()));
  }
}
