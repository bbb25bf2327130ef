package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;

class ScaledUnitsTest {
  private static final Species ATOM = Species.K_41;

  @Property(tries = 200)
  void everyQuantityRoundTrips(
      @ForAll @DoubleRange(min = 1, max = 1e5) double hertz,
      @ForAll @DoubleRange(min = 0.01, max = 1e4) double density,
      @ForAll @IntRange(min = 1, max = 3) int dimension,
      @ForAll @DoubleRange(min = 0, max = 1e4) double value) {
    Energy unit = Energy.ofHertz(hertz);
    Density n0 = new Density(density * Math.pow(1e6, dimension), dimension);
    for (ScaledUnits units :
        List.of(
            ScaledUnits.dividingByDensity(ATOM, unit, n0),
            ScaledUnits.keepingAtomNumbers(ATOM, unit, dimension))) {
      double tolerance = 1e-15 * value;
      assertEquals(value, units.toScaled(units.length(value)), tolerance);
      assertEquals(value, units.toScaledWavenumber(units.wavenumberPerMetre(value)), tolerance);
      assertEquals(value, units.toScaled(units.time(value)), tolerance);
      assertEquals(value, units.toScaledAngular(units.frequency(value)), tolerance);
      assertEquals(value, units.toScaled(units.energy(value)), tolerance);
      assertEquals(value, units.toScaledFieldEnergy(units.fieldEnergy(value)), tolerance);
      assertEquals(value, units.toScaled(units.temperature(value)), tolerance);
      assertEquals(value, units.toScaled(units.density(value)), tolerance);
      assertEquals(value, units.toScaled(units.coupling(value)), tolerance);
      assertEquals(value, units.toScaled(units.rate(value)), tolerance);
      assertEquals(value, units.toScaled(units.ratePerVolume(value)), tolerance);
      assertEquals(value, units.toScaledNorm(units.atoms(value)), tolerance);
    }
  }

  @Test
  void theTwoScalingsDifferByTheAtomsInAUnitVolume() {
    Density n0 = Density.perMicrometre(76);
    Energy unit = Energy.ofHertz(800);
    ScaledUnits byDensity = ScaledUnits.dividingByDensity(ATOM, unit, n0);
    ScaledUnits byNumber = ScaledUnits.keepingAtomNumbers(ATOM, unit, 1);
    double atoms = n0.perMetreToD() * byNumber.lengthUnit().metres();
    Temperature temperature = Temperature.ofNanokelvin(30);
    Coupling g = new Coupling(7e-39, 1);
    assertEquals(1, byDensity.toScaled(n0), 1e-15);
    assertEquals(atoms, byNumber.toScaled(n0), 1e-12);
    assertEquals(atoms, byDensity.atomsPerUnitNorm(), 1e-12);
    assertEquals(1, byNumber.atomsPerUnitNorm());
    assertEquals(atoms, byNumber.toScaled(temperature) / byDensity.toScaled(temperature), 1e-12);
    assertEquals(atoms, byDensity.toScaled(g) / byNumber.toScaled(g), 1e-12);
    assertEquals(g.times(n0).joules() / unit.joules(), byDensity.toScaled(g), 1e-14);
    assertEquals(
        temperature.energy().joules() / unit.joules(), byNumber.toScaled(temperature), 1e-14);
    assertEquals(byNumber.toScaled(unit), byDensity.toScaled(unit));
    assertEquals(byNumber.timeUnit(), byDensity.timeUnit());
  }

  @Test
  void unitsSatisfyTheirDefinitions() {
    Energy unit = Energy.ofHertz(800);
    ScaledUnits units = ScaledUnits.keepingAtomNumbers(ATOM, unit, 2);
    double x0 = units.lengthUnit().metres();
    double hbar = Constants.HBAR;
    assertEquals(1, hbar * hbar / (ATOM.massKilograms() * x0 * x0) / unit.joules(), 1e-14);
    assertEquals(1, units.timeUnit().seconds() * unit.joules() / hbar, 1e-14);
    assertEquals(unit, units.energyUnit());
    assertEquals(2, units.dimension());
    // a rate of one event per unit area and time, over one unit area, is one per unit time
    EventRate perArea = units.ratePerVolume(1);
    assertEquals(2, perArea.dimension());
    assertEquals(1, perArea.perSecondPerMetreToD() * x0 * x0 * units.timeUnit().seconds(), 1e-14);
  }

  /**
   * Scaling covariance: the physics written in scaled numbers (hbar = m = 1) and brought back must
   * not depend on the units chosen. A wrong power of any unit, or a mixed-up scaling, breaks this.
   */
  @Property(tries = 200)
  void labResultsDoNotDependOnTheUnits(
      @ForAll @DoubleRange(min = 1, max = 1e5) double hertzOne,
      @ForAll @DoubleRange(min = 1, max = 1e5) double hertzOther,
      @ForAll @DoubleRange(min = 1, max = 1000) double reference,
      @ForAll @DoubleRange(min = 0.1, max = 100) double jHertz,
      @ForAll @DoubleRange(min = 1.05, max = 4) double lambda) {
    Density n = Density.perMicrometre(76);
    Energy j = Energy.ofHertz(jHertz);
    Coupling g = new Coupling(7e-39, 1);
    Coupling kappa = CoupledPair.biquadraticFor(lambda * lambda, j, n);
    CoupledPair pair = CoupledPair.of(ATOM, g, g.times(0), n, j, kappa);
    Temperature temperature = Temperature.ofNanokelvin(30);
    for (ScaledUnits units :
        List.of(
            ScaledUnits.keepingAtomNumbers(ATOM, Energy.ofHertz(hertzOne), 1),
            ScaledUnits.dividingByDensity(
                ATOM, Energy.ofHertz(hertzOther), Density.perMicrometre(reference)))) {
      double nu = units.toScaled(j);
      double density = units.toScaled(n);
      double mass = 2 * Math.sqrt(nu * (units.toScaled(kappa) * density / nu - 1));
      double bubble = density * Math.sqrt(nu) * CoupledPair.bubbleFactor(lambda);
      assertClose(pair.bubbleEnergy().orElseThrow().joules(), units.fieldEnergy(bubble).joules());
      assertClose(
          pair.relativePhaseLength().orElseThrow().metres(), units.length(1 / mass).metres());
      double exponent = bubble / units.toScaled(temperature);
      assertClose(
          pair.bubbleEnergy().orElseThrow().joules() / temperature.energy().joules(), exponent);
      double meanField = units.toScaled(g) * density;
      assertClose(
          UniformGas.of(ATOM, g, n).chemicalPotential().joules(), units.energy(meanField).joules());
      assertClose(
          UniformGas.of(ATOM, g, n).coherenceLength(temperature).metres(),
          units.length(2 * density / units.toScaled(temperature)).metres());
      double frequency = Math.sqrt(meanField - nu) * mass;
      assertClose(
          pair.stiffness().joules() > 0
              ? pair.relativePhaseGap().orElseThrow().joules() / Constants.HBAR
              : Double.NaN,
          units.frequency(frequency).angular());
    }
  }

  private static void assertClose(double expected, double actual) {
    assertEquals(1, actual / expected, 1e-11);
  }

  @Test
  void refusesOtherDimensionsAndEmptyUnits() {
    ScaledUnits line = ScaledUnits.keepingAtomNumbers(ATOM, Energy.ofHertz(800), 1);
    IllegalArgumentException error =
        assertThrows(
            IllegalArgumentException.class, () -> line.toScaled(Density.perSquareMicrometre(1)));
    assertTrue(error.getMessage().contains("dimension"), error.getMessage());
    assertThrows(IllegalArgumentException.class, () -> line.toScaled(new Coupling(1, 2)));
    assertThrows(
        IllegalArgumentException.class,
        () -> ScaledUnits.keepingAtomNumbers(ATOM, Energy.ofHertz(0), 1));
    assertThrows(
        IllegalArgumentException.class,
        () -> ScaledUnits.keepingAtomNumbers(ATOM, Energy.ofHertz(1), 4));
    assertThrows(
        IllegalArgumentException.class,
        () -> ScaledUnits.dividingByDensity(ATOM, Energy.ofHertz(1), Density.perMetre(0)));
    assertThrows(IllegalArgumentException.class, () -> line.length(Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> line.temperature(-1));
  }
}
