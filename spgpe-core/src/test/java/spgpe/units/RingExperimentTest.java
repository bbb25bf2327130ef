package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Map;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.statistics.Statistics;
import org.junit.jupiter.api.Test;
import spgpe.units.Verdict.Grade;

class RingExperimentTest {
  /** Invented: two hyperfine states of K-41 in a ring waveguide. */
  private static RingExperiment potassiumRing() {
    return RingExperiment.of(
        Species.K_41,
        Geometry.ring(Length.ofMicrometres(25)),
        Frequency.ofKilohertz(1.5),
        12_000,
        Length.ofBohrRadii(65.42),
        Temperature.ofNanokelvin(30));
  }

  /** Constants CODATA 2022, mass AME2020; worked by hand from the formulas of docs/units.md. */
  @Test
  void potassiumRingByHand() {
    ScaledRing ring = potassiumRing().scaled();
    UniformGas gas = ring.gas();
    assertClose(7.6394373e7, gas.density().perMetreToD(), 1e-7);
    assertClose(6.8815926e-39, gas.coupling().jouleMetreToD(), 1e-7);
    assertClose(793.40384, gas.chemicalPotential().hertz(), 1e-7);
    assertClose(38.077379, gas.chemicalPotential().asTemperature().nanokelvin(), 1e-7);
    assertClose(5.2571495e-31, gas.chemicalPotential().joules(), 1e-7);
    assertClose(5.5768222e-7, ring.units().lengthUnit().metres(), 1e-7);
    assertClose(5.5768222e-7, gas.healingLength().metres(), 1e-7);
    assertClose(2.0059765e-4, ring.units().timeUnit().seconds(), 1e-7);
    assertClose(2.7801035e-3, gas.soundSpeed(), 1e-7);
    assertClose(281.66513, ring.length(), 1e-7);
    assertClose(42.603783, ring.units().atomsPerUnitNorm(), 1e-7);
    assertClose(0.018492944, ring.temperature(), 1e-7);
    assertClose(5.5093919e-4, gas.liebLiniger(), 1e-7);
    Temperature temperature = Temperature.ofNanokelvin(30);
    Length relative = gas.relativeCoherenceLength(temperature);
    assertClose(3.0156487e-5, relative.metres(), 1e-7);
    assertClose(1 / ring.temperature(), ring.units().toScaled(relative), 1e-12);
    assertClose(34.557e-6, gas.degeneracyTemperature().kelvin(), 2e-5);
    assertClose(1.5461094, ring.units().toScaled(ring.bath().cutoff()), 1e-7);
    assertClose(1.7584706, ring.cutoffWavenumber(), 1e-7);
    assertEquals(78, ring.cutoffModes());
    assertEquals(320, ring.gridPoints());
    assertClose(3.8655748e-5, ring.bath().growthPrefactor(), 1e-7);
    assertEquals(1, ring.g(), 1e-14);
    assertEquals(1, ring.mu(), 1e-14);
    assertEquals(0, ring.coherent());
    assertEquals(0, ring.inter());
    assertTrue(ring.pair().isEmpty());
    // noise of one component per point, 2 gamma T dt/dx, for gamma = 1e-3, dt = 0.02, 1024 points
    double rms = Math.sqrt(2e-3 * ring.temperature() * 0.02 / (ring.length() / 1024));
    assertClose(1.6398966e-3, rms, 1e-7);
  }

  @Test
  void anotherTemperatureKeepsTheRest() {
    RingExperiment lab =
        potassiumRing().withCoherentCoupling(Energy.ofHertz(8)).withCutoffOccupation(2);
    RingExperiment warm = lab.withTemperature(Temperature.ofNanokelvin(45));
    assertEquals(Temperature.ofNanokelvin(45), warm.temperature());
    assertEquals(Temperature.ofNanokelvin(30), lab.temperature());
    assertClose(1.5 * lab.scaled().temperature(), warm.scaled().temperature(), 1e-12);
    assertEquals(
        lab.scaled().describe(),
        warm.withTemperature(Temperature.ofNanokelvin(30)).scaled().describe());
    assertTrue(lab.modulation().isEmpty());
    assertThrows(
        IllegalArgumentException.class, () -> lab.withTemperature(Temperature.ofKelvin(1)));
  }

  @Test
  void potassiumRingIsMarginallyOneDimensional() {
    Map<String, Verdict> verdicts = ValidityTest.byName(potassiumRing().scaled().verdicts());
    assertEquals(0.529, verdicts.get("mu/(hbar w_perp)").value(), 5e-4);
    assertEquals(Grade.MARGINAL, verdicts.get("mu/(hbar w_perp)").grade());
    assertEquals(0.417, verdicts.get("kB T/(hbar w_perp)").value(), 5e-4);
    assertEquals(Grade.MARGINAL, verdicts.get("kB T/(hbar w_perp)").grade());
    assertEquals(0.26447, verdicts.get("n a").value(), 5e-6);
    assertEquals(Grade.MARGINAL, verdicts.get("n a").grade());
    assertEquals(Grade.FINE, verdicts.get("a/a_perp").grade());
    assertEquals(Grade.FINE, verdicts.get("Lieb-Liniger gamma_LL").grade());
    assertEquals(Grade.FINE, verdicts.get("T/T_d").grade());
    assertEquals(Grade.MARGINAL, verdicts.get("eps_cut/mu").grade());
  }

  @Test
  void metastableRing() {
    RingExperiment lab = potassiumRing().withCoherentCoupling(Energy.ofHertz(7.9340384));
    Coupling kappa = CoupledPair.biquadraticFor(2.25, Energy.ofHertz(7.9340384), lab.density());
    ScaledRing ring = lab.withBiquadratic(kappa).scaled();
    assertClose(0.01, ring.coherent(), 1e-7);
    assertClose(0.0225, ring.biquadratic(), 1e-7);
    assertEquals(1 + ring.coherent(), ring.mu(), 1e-14);
    CoupledPair pair = ring.pair().orElseThrow();
    double exponent =
        ring.units().toScaledFieldEnergy(pair.bubbleEnergy().orElseThrow()) / ring.temperature();
    // sqrt(0.01) B1(1.5) over T
    assertClose(0.1905672888 / 0.018492944, exponent, 2e-7);
    Map<String, Verdict> verdicts = ValidityTest.byName(ring.verdicts());
    assertClose(exponent, verdicts.get("E_b/(kB T)").value(), 1e-12);
    assertEquals(Grade.FINE, verdicts.get("E_b/(kB T)").grade());
    assertEquals(Grade.FINE, verdicts.get("lambda^2 = kappa n/J").grade());
    assertEquals(Grade.FINE, verdicts.get("L m_fv").grade());
    // m_fv = 2 sqrt(J (lambda^2 - 1)) = sqrt(0.05)
    double mass = Math.sqrt(0.05);
    assertClose(281.66513 * mass, verdicts.get("L m_fv").value(), 2e-7);
    assertClose(ring.cutoffWavenumber() / mass, verdicts.get("k_cut/m_fv").value(), 2e-7);
    assertClose(0.018492944 / mass, verdicts.get("phase variance kB T/(n m_fv)").value(), 2e-7);
    assertClose(0.01, verdicts.get("J/(g n)").value(), 1e-7);
    assertClose(0.99, verdicts.get("((g - g12) n - J)/(g n)").value(), 1e-7);
    // gap sqrt(0.99) m_fv in units of g n, against kB T = 0.78786936 g n
    double half = Math.sqrt(0.99) * mass / 0.78786936 / 2;
    assertClose(
        half / Math.tanh(half) - 1,
        verdicts.get("quantum excess of relative-phase mode").value(),
        1e-6);
    assertTrue(ring.describe().contains("modes=" + ring.cutoffModes()));
  }

  @Test
  void notMetastableRingSaysSo() {
    RingExperiment lab = potassiumRing().withCoherentCoupling(Energy.ofHertz(8));
    Coupling kappa = CoupledPair.biquadraticFor(0.9, Energy.ofHertz(8), lab.density());
    Map<String, Verdict> verdicts =
        ValidityTest.byName(lab.withBiquadratic(kappa).scaled().verdicts());
    assertEquals(Grade.OUTSIDE, verdicts.get("lambda^2 = kappa n/J").grade());
    assertFalse(verdicts.containsKey("E_b/(kB T)"));
    Map<String, Verdict> separating =
        ValidityTest.byName(lab.withInterComponent(Length.ofBohrRadii(70)).scaled().verdicts());
    assertEquals(Grade.OUTSIDE, separating.get("((g - g12) n - J)/(g n)").grade());
  }

  @Test
  void modulatedRing() {
    Modulation drive = new Modulation(0.11, Frequency.ofKilohertz(8));
    ScaledRing ring =
        potassiumRing()
            .withCoherentCoupling(Energy.ofHertz(8))
            .withInterComponent(Length.ofBohrRadii(10))
            .withModulation(drive)
            .scaled();
    double bare = 10 / 65.42;
    assertEquals(ring.biquadratic() / 2, 1 - ring.g(), 1e-13);
    assertEquals(ring.biquadratic() / 2, ring.inter() - bare, 1e-13);
    assertEquals(1 + bare + ring.coherent(), ring.mu(), 1e-13);
    assertEquals(
        ring.mu(), ring.units().toScaled(ring.pair().orElseThrow().chemicalPotential()), 1e-13);
    Map<String, Verdict> verdicts = ValidityTest.byName(ring.verdicts());
    assertEquals(Grade.FINE, verdicts.get("hbar w_drive/(g n)").grade());
    assertClose(8000 / 793.40384, verdicts.get("hbar w_drive/(g n)").value(), 1e-7);
    assertClose(8 / 1.5, verdicts.get("f_drive/f_perp").value(), 1e-12);
    assertEquals(Grade.OUTSIDE, verdicts.get("f_drive/f_perp").grade());
    assertEquals(Grade.FINE, verdicts.get("eps_cut/first unstable band").grade());
  }

  @Test
  void slowDriveHeatsKeptModesUnlessDamped() {
    RingExperiment lab =
        potassiumRing()
            .withCoherentCoupling(Energy.ofHertz(8))
            .withModulation(new Modulation(0.02, Frequency.ofKilohertz(2)));
    Verdict bare = ValidityTest.byName(lab.scaled().verdicts()).get("eps_cut/first unstable band");
    assertEquals(Grade.OUTSIDE, bare.grade());
    Verdict damped =
        ValidityTest.byName(lab.withRun(0.2, TimeSpan.ofSeconds(1)).scaled().verdicts())
            .get("eps_cut/first unstable band");
    assertEquals(Grade.MARGINAL, damped.grade());
    // own formula of the threshold: growth over the mean curvature, for the bare gas without g12
    UniformGas gas = lab.scaled().gas();
    double s = gas.chemicalPotential().hertz();
    double growth = s * 0.04 * (1 - 0.04 * 0.04 / 2);
    double needed = growth / Math.hypot(1000, s);
    Verdict held =
        ValidityTest.byName(lab.scaled().verdicts())
            .get("gamma against drive heating/gamma kinetic");
    assertEquals(Grade.MARGINAL, held.grade());
    assertClose(needed / lab.scaled().bath().growthRate(), held.value(), 1e-3);
  }

  @Test
  void unrealisticDampingIsNoticed() {
    ScaledRing ring = potassiumRing().withRun(0.05, TimeSpan.ofMilliseconds(500)).scaled();
    Map<String, Verdict> verdicts = ValidityTest.byName(ring.verdicts());
    assertEquals(Grade.OUTSIDE, verdicts.get("gamma used/gamma kinetic").grade());
    assertEquals(Grade.OUTSIDE, verdicts.get("relaxation time/run time").grade());
  }

  @Test
  void copiesDoNotChangeTheOriginal() {
    RingExperiment lab = potassiumRing();
    lab.withCoherentCoupling(Energy.ofHertz(8));
    assertEquals(0, lab.scaled().coherent());
    RingExperiment shifted = lab.withConfinementShift();
    assertClose(
        1.0088922,
        shifted.scaled().gas().coupling().jouleMetreToD()
            / lab.scaled().gas().coupling().jouleMetreToD(),
        5e-8);
    assertTrue(lab.withCutoffOccupation(3).scaled().cutoffModes() < lab.scaled().cutoffModes());
  }

  @Test
  void wrongUnitsAreCaught() {
    IllegalArgumentException error =
        assertThrows(
            IllegalArgumentException.class,
            () ->
                RingExperiment.of(
                    Species.K_41,
                    Geometry.ring(Length.ofMicrometres(25)),
                    Frequency.ofKilohertz(1.5),
                    12_000,
                    Length.ofBohrRadii(65.42),
                    Temperature.ofKelvin(30)));
    assertTrue(error.getMessage().contains("temperature in K"), error.getMessage());
    assertThrows(
        IllegalArgumentException.class,
        () -> potassiumRing().withCoherentCoupling(Energy.ofJoules(8)));
    assertThrows(
        IllegalArgumentException.class,
        () -> potassiumRing().withCoherentCoupling(Energy.ofHertz(-8)));
    assertThrows(
        IllegalArgumentException.class,
        () -> potassiumRing().withBiquadratic(new Coupling(1e-39, 2)));
    assertThrows(IllegalArgumentException.class, () -> potassiumRing().withCutoffOccupation(0));
    RingExperiment driven =
        potassiumRing().withModulation(new Modulation(0.1, Frequency.ofKilohertz(10)));
    assertThrows(
        IllegalArgumentException.class, () -> driven.withBiquadratic(new Coupling(1e-40, 1)));
    assertThrows(
        IllegalArgumentException.class,
        () ->
            potassiumRing()
                .withBiquadratic(new Coupling(1e-40, 1))
                .withModulation(new Modulation(0.1, Frequency.ofKilohertz(10))));
    IllegalArgumentException collapse =
        assertThrows(
            IllegalArgumentException.class,
            () -> potassiumRing().withInterComponent(Length.ofBohrRadii(-80)).scaled());
    assertTrue(collapse.getMessage().contains("collapses"), collapse.getMessage());
  }

  @Property(tries = 300)
  void everyPlausibleRingGivesFiniteNumbersAndVerdicts(
      @ForAll @DoubleRange(min = 3, max = 300) double radius,
      @ForAll @DoubleRange(min = 100, max = 1e5) double transverse,
      @ForAll @DoubleRange(min = 100, max = 1e6) double atoms,
      @ForAll @DoubleRange(min = 1, max = 150) double a,
      @ForAll @DoubleRange(min = 1, max = 1000) double nanokelvin,
      @ForAll @DoubleRange(min = 0.01, max = 1000) double j,
      @ForAll @DoubleRange(min = 0, max = 1) double depth,
      @ForAll @DoubleRange(min = -0.9, max = 1.5) double inter) {
    ScaledRing ring =
        RingExperiment.of(
                Species.K_39,
                Geometry.ring(Length.ofMicrometres(radius)),
                Frequency.ofHertz(transverse),
                atoms,
                Length.ofBohrRadii(a),
                Temperature.ofNanokelvin(nanokelvin))
            .withCoherentCoupling(Energy.ofHertz(j))
            .withInterComponent(Length.ofBohrRadii(Math.min(inter, 0.99) * a))
            .withModulation(new Modulation(depth, Frequency.ofKilohertz(10)))
            .withRun(0.01, TimeSpan.ofSeconds(1))
            .scaled();
    assertAllFinite(ring);
    assertClose(1 + Math.min(inter, 0.99) + ring.coherent(), ring.mu(), 1e-13);
    assertTrue(ring.gridPoints() >= 4 * ring.cutoffModes() + 1);
  }

  /** The whole admissible box: a result without NaN, or a message that names the culprit. */
  @Property(tries = 500)
  void wildRingsGiveNumbersOrAClearMessage(
      @ForAll @DoubleRange(min = -7, max = 0) double logLength,
      @ForAll @DoubleRange(min = 0, max = 7) double logFrequency,
      @ForAll @DoubleRange(min = 0, max = 10) double logAtoms,
      @ForAll @DoubleRange(min = -5, max = 5) double logA,
      @ForAll @DoubleRange(min = -12, max = -3) double logT,
      @ForAll @DoubleRange(min = -3, max = 6) double logJ,
      @ForAll @DoubleRange(min = -3, max = 7) double logKappa,
      @ForAll @DoubleRange(min = -2, max = 2) double inter) {
    Length a = Length.ofBohrRadii(Math.pow(10, logA) * 0.999999);
    Length length = Length.ofMetres(Math.pow(10, logLength) * 0.999999 + 1e-9);
    double atoms = Math.pow(10, logAtoms) * 0.999 + 0.001;
    double density = atoms / length.metres();
    try {
      ScaledRing ring =
          RingExperiment.of(
                  Species.CS_133,
                  new Geometry.Ring(length),
                  Frequency.ofHertz(Math.pow(10, logFrequency)),
                  atoms,
                  a,
                  Temperature.ofKelvin(Math.pow(10, logT)))
              .withCoherentCoupling(Energy.ofHertz(Math.pow(10, logJ)))
              .withInterComponent(new Length(inter * a.metres() * 0.5))
              .withBiquadratic(
                  new Coupling(
                      Energy.ofHertz(Math.pow(10, logKappa) * 0.999).joules() / density, 1))
              .scaled();
      assertAllFinite(ring);
      Statistics.collect("accepted");
    } catch (IllegalArgumentException refused) {
      String message = String.valueOf(refused.getMessage());
      assertTrue(message.contains("=") && !message.contains("NaN"), message);
      Statistics.collect("refused");
    }
  }

  @Property(tries = 100)
  void cutoffRisesWithTemperatureAndFallsWithOccupation(
      @ForAll @DoubleRange(min = 5, max = 200) double nanokelvin,
      @ForAll @DoubleRange(min = 0.5, max = 5) double occupation) {
    RingExperiment cold = atTemperature(nanokelvin).withCutoffOccupation(occupation);
    RingExperiment hot = atTemperature(1.1 * nanokelvin).withCutoffOccupation(occupation);
    RingExperiment fuller = atTemperature(nanokelvin).withCutoffOccupation(1.1 * occupation);
    double reference = cold.scaled().cutoffWavenumber();
    assertTrue(hot.scaled().cutoffWavenumber() > reference);
    assertTrue(fuller.scaled().cutoffWavenumber() < reference);
  }

  private static RingExperiment atTemperature(double nanokelvin) {
    return RingExperiment.of(
        Species.K_41,
        Geometry.ring(Length.ofMicrometres(25)),
        Frequency.ofKilohertz(1.5),
        12_000,
        Length.ofBohrRadii(65.42),
        Temperature.ofNanokelvin(nanokelvin));
  }

  private static void assertAllFinite(ScaledRing ring) {
    double[] numbers = {
      ring.length(),
      ring.g(),
      ring.inter(),
      ring.coherent(),
      ring.biquadratic(),
      ring.mu(),
      ring.temperature(),
      ring.cutoffWavenumber(),
      ring.bath().growthRate(),
      ring.bath().scatteringAmplitude()
    };
    for (double number : numbers) {
      assertTrue(Double.isFinite(number), ring::describe);
    }
    ring.pair()
        .ifPresent(
            pair -> {
              assertTrue(pair.barrierHeight() >= 0);
              assertEquals(pair.isMetastable(), pair.bubbleEnergy().isPresent());
            });
    for (Verdict verdict : ring.verdicts()) {
      assertFalse(Double.isNaN(verdict.value()), verdict::toString);
    }
  }

  private static void assertClose(double expected, double actual, double relative) {
    assertEquals(1, actual / expected, relative);
  }
}
