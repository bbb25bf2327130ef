package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;

class ReductionsTest {
  private static final Confinement TUBE =
      Confinement.quasi1d(Species.K_41, Frequency.ofKilohertz(1.5));
  private static final Confinement LAYER =
      Confinement.quasi2d(Species.RB_87, Frequency.ofKilohertz(3));

  @Test
  void confinementInducedFactor() {
    // a = 65.42 a0, a_perp = 0.40559101 um, C = -zeta(1/2) (Olshanii 1998)
    Length a = Length.ofBohrRadii(65.42);
    assertEquals(1.0088922, TUBE.confinementFactor(a), 5e-8);
    assertEquals(
        TUBE.coupling(a).jouleMetreToD() * TUBE.confinementFactor(a),
        TUBE.shiftedCoupling(a).jouleMetreToD());
    IllegalArgumentException error =
        assertThrows(
            IllegalArgumentException.class, () -> TUBE.confinementFactor(Length.ofBohrRadii(5000)));
    assertTrue(error.getMessage().contains("a=5000"), error.getMessage());
    assertThrows(IllegalArgumentException.class, () -> LAYER.confinementFactor(a));
  }

  @Test
  void tubeCouplingIsTheBulkCouplingOverTheArea() {
    Length a = Length.ofBohrRadii(65.42);
    double area = 2 * Math.PI * Math.pow(TUBE.oscillatorLength().metres(), 2);
    double expected = Coupling.bulk(Species.K_41, a).jouleMetreToD() / area;
    assertEquals(1, TUBE.coupling(a).jouleMetreToD() / expected, 1e-14);
  }

  @Test
  void layerOfRubidiumAndItsTransition() {
    // Prokof'ev, Ruebenacker, Svistunov, PRL 87, 270402 (2001) with 380 and 13.2
    Length a = Length.ofBohrRadii(100.4);
    assertEquals(0.13527721, LAYER.dimensionlessCoupling(a), 5e-9);
    UniformGas gas =
        UniformGas.of(Species.RB_87, LAYER.coupling(a), Density.perSquareMicrometre(50));
    assertEquals(0.13527721, gas.dimensionlessCoupling(), 5e-9);
    assertEquals(7.9406005, gas.criticalPhaseSpaceDensity(), 5e-8);
    assertEquals(0.19724295, gas.criticalChemicalPotential(), 5e-9);
    assertEquals(220.82631, gas.bktTemperature().nanokelvin(), 5e-6);
    assertEquals(
        gas.criticalPhaseSpaceDensity(), gas.phaseSpaceDensity(gas.bktTemperature()), 1e-12);
    assertThrows(IllegalArgumentException.class, () -> TUBE.dimensionlessCoupling(a));
    assertThrows(IllegalArgumentException.class, gas::liebLiniger);
    assertThrows(
        IllegalArgumentException.class, () -> gas.coherenceLength(Temperature.ofNanokelvin(10)));
  }

  @Test
  void transitionFormulasRefuseStrongCoupling() {
    UniformGas gas =
        UniformGas.of(
            Species.RB_87,
            LAYER.coupling(Length.ofBohrRadii(1000)),
            Density.perSquareMicrometre(50));
    assertThrows(IllegalArgumentException.class, gas::bktTemperature);
  }

  @Test
  void bogoliubovEnergyAtTheHealingLength() {
    UniformGas gas = potassium();
    double k = 1 / gas.healingLength().metres();
    // sqrt(1/2 (1/2 + 2)) = sqrt(1.25), Bogoliubov
    assertEquals(
        1.118033988749895, gas.bogoliubov(k).joules() / gas.chemicalPotential().joules(), 1e-15);
    assertEquals(0, gas.bogoliubov(0).joules());
    double slow = 1e-6 * k;
    assertEquals(
        1, gas.bogoliubov(slow).joules() / (Constants.HBAR * gas.soundSpeed() * slow), 1e-12);
  }

  @Test
  void bothHealingLengthConventions() {
    UniformGas gas = potassium();
    assertEquals(
        Math.sqrt(2),
        gas.healingLength().metres() / gas.healingLengthWithFactorTwo().metres(),
        1e-15);
    double perDensity = gas.density().perMetreToD() * gas.healingLength().metres();
    assertEquals(1, gas.liebLiniger() * perDensity * perDensity, 1e-14);
  }

  @Test
  void uniformShapes() {
    Coupling g = new Coupling(7e-39, 1);
    Cloud ring = Geometry.ring(Length.ofMicrometres(25)).fill(Species.K_41, g, 12_000);
    assertEquals(7.6394373e7, ring.peakDensity().perMetreToD(), 5);
    assertEquals(157.0796, ring.size().micrometres(), 5e-5);
    Cloud box = new Geometry.Box(ring.size()).fill(Species.K_41, g, 12_000);
    assertEquals(ring, box);
    Cloud layer =
        new Geometry.Rectangle(Length.ofMicrometres(20), Length.ofMicrometres(10))
            .fill(Species.K_41, new Coupling(1e-45, 2), 1000);
    assertEquals(5e12, layer.peakDensity().perMetreToD(), 1);
    assertThrows(
        IllegalArgumentException.class,
        () -> new Geometry.Box(Length.ofMicrometres(1)).fill(Species.K_41, g.times(-1), 10));
    assertThrows(IllegalArgumentException.class, () -> Geometry.ring(Length.ofMetres(0)));
  }

  /** The Thomas-Fermi profile, summed numerically, must hold the atoms that were put in. */
  @Property(tries = 50)
  void harmonicTrapHoldsItsAtoms(
      @ForAll @DoubleRange(min = 1, max = 1000) double hertz,
      @ForAll @DoubleRange(min = 1, max = 1e6) double atoms) {
    for (int dimension = 1; dimension <= 2; dimension++) {
      Coupling g = new Coupling(dimension == 1 ? 7e-39 : 1e-45, dimension);
      Cloud cloud = new Geometry.Harmonic(Frequency.ofHertz(hertz)).fill(Species.K_41, g, atoms);
      double radius = cloud.size().metres();
      double peak = cloud.peakDensity().perMetreToD();
      int steps = 2000;
      double sum = 0;
      for (int i = 0; i < steps; i++) {
        double r = (i + 0.5) / steps;
        double shell = dimension == 1 ? 2 * radius : 2 * Math.PI * r * radius * radius;
        sum += peak * (1 - r * r) * shell / steps;
      }
      assertEquals(1, sum / atoms, 1e-6);
      double w = 2 * Math.PI * hertz;
      double edge = 0.5 * Species.K_41.massKilograms() * w * w * radius * radius;
      assertEquals(1, edge / cloud.chemicalPotential().joules(), 1e-12);
      assertEquals(1, g.times(cloud.peakDensity()).joules() / edge, 1e-12);
    }
  }

  private static UniformGas potassium() {
    return UniformGas.of(
        Species.K_41, TUBE.coupling(Length.ofBohrRadii(65.42)), Density.perMicrometre(76));
  }
}
