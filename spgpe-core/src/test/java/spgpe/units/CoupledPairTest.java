package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Unless said otherwise: basis derived, see docs/theory.md. */
class CoupledPairTest {
  private static final Species ATOM = Species.K_41;
  private static final Density N = Density.perMicrometre(80);
  private static final Energy UNIT = Energy.ofHertz(800);

  /** Units in which n = 1 and g n = 1 for g~ = 1. */
  private static final ScaledUnits UNITS = ScaledUnits.dividingByDensity(ATOM, UNIT, N);

  private static CoupledPair pair(double nu, double kappa) {
    return pair(nu, kappa, 1, 0);
  }

  private static CoupledPair pair(double nu, double kappa, double g, double inter) {
    return CoupledPair.of(
        ATOM, UNITS.coupling(g), UNITS.coupling(inter), N, UNITS.energy(nu), UNITS.coupling(kappa));
  }

  @Test
  void metastableStateAtNuOneTenth() {
    CoupledPair pair = pair(0.1, 0.225);
    assertEquals(2.25, pair.lambdaSquared(), 1e-13);
    assertTrue(pair.isMetastable());
    double mass = 1 / UNITS.toScaled(pair.relativePhaseLength().orElseThrow());
    assertEquals(0.5, mass * mass, 1e-13);
    // J n (lambda - 1/lambda)^2 = 0.1 (1.5 - 1/1.5)^2 per x0, in units e0 n0 x0
    double barrier = pair.barrierHeight() * UNITS.lengthUnit().metres();
    assertEquals(0.0694444444444, UNITS.toScaledFieldEnergy(new Energy(barrier)), 1e-12);
    double speed = UNITS.timeUnit().seconds() / UNITS.lengthUnit().metres();
    assertEquals(Math.sqrt(0.9), pair.relativePhaseSpeed() * speed, 1e-13);
    assertEquals(Math.sqrt(0.45), UNITS.toScaled(pair.relativePhaseGap().orElseThrow()), 1e-13);
    assertEquals(1.1, UNITS.toScaled(pair.chemicalPotential()), 1e-13);
    assertEquals(1.2, UNITS.toScaled(pair.stableDensity()), 1e-13);
    assertEquals(1 / Math.sqrt(0.4), UNITS.toScaled(pair.josephsonLength()), 1e-13);
  }

  /** Closed form, equal to quadrature of the phase-only barrier integral. */
  @ParameterizedTest
  @CsvSource({
    "1.05, 0.0809114890",
    "1.1, 0.2200548075",
    "1.2, 0.5787581532",
    "1.3, 0.9951636656",
    "1.5, 1.9056728880",
    "2, 4.2942874364",
    "3, 8.9633789336",
    "5, 17.7619726066"
  })
  void bubbleFactor(double lambda, double expected) {
    assertEquals(expected, CoupledPair.bubbleFactor(lambda), 6e-11);
  }

  @ParameterizedTest
  @CsvSource({"0.01, 2.25, 0.19056729", "0.1, 2.25, 0.60262668", "0.1, 4, 1.35797292"})
  void bubbleEnergy(double nu, double lambdaSquared, double expected) {
    Energy energy = pair(nu, lambdaSquared * nu).bubbleEnergy().orElseThrow();
    assertEquals(expected, UNITS.toScaledFieldEnergy(energy), 6e-9);
  }

  @Test
  void bubbleFactorNearItsThresholdKeepsItsDigits() {
    assertEquals(0, CoupledPair.bubbleFactor(1));
    // (8/3) a^3 to leading order, relative correction 3 a^2/10 with a^2 = 2 (lambda - 1)
    double lambda = 1 + 1e-8;
    double a = Math.sqrt(2 * (lambda - 1));
    assertEquals(1, CoupledPair.bubbleFactor(lambda) / (8.0 / 3 * a * a * a), 1e-7);
    // the series and the closed form meet at arccosh(lambda) = 0.2
    double below = CoupledPair.bubbleFactor(Math.cosh(0.2 - 1e-9));
    double above = CoupledPair.bubbleFactor(Math.cosh(0.2 + 1e-9));
    assertEquals(1, above / below, 4e-8);
    double sinh = Math.sinh(0.19);
    assertEquals(
        1,
        CoupledPair.bubbleFactor(Math.cosh(0.19)) / (4 * (sinh - 0.19 / Math.cosh(0.19))),
        1e-12);
    assertThrows(IllegalArgumentException.class, () -> CoupledPair.bubbleFactor(0.999));
    assertThrows(IllegalArgumentException.class, () -> CoupledPair.bubbleFactor(Double.NaN));
  }

  @Test
  void notMetastableGivesNoBubble() {
    CoupledPair weak = pair(0.1, 0.05);
    assertFalse(weak.isMetastable());
    assertEquals(0, weak.barrierHeight());
    assertTrue(weak.bubbleEnergy().isEmpty());
    assertTrue(weak.relativePhaseGap().isEmpty());
    assertTrue(weak.relativePhaseLength().isEmpty());
    CoupledPair separating = pair(0.1, 0.225, 1, 0.95);
    assertFalse(separating.isMetastable());
    assertEquals(0, separating.relativePhaseSpeed());
    assertTrue(separating.bubbleEnergy().isEmpty());
  }

  @Test
  void rabiSplittingIsTwiceTheCoupling() {
    assertEquals(5, CoupledPair.coherentFromSplitting(Frequency.ofHertz(10)).hertz(), 1e-13);
  }

  @Test
  void refusesInadmissiblePairs() {
    assertThrows(IllegalArgumentException.class, () -> pair(0, 0.2));
    assertThrows(IllegalArgumentException.class, () -> pair(0.1, -0.2));
    IllegalArgumentException collapse =
        assertThrows(IllegalArgumentException.class, () -> pair(0.1, 0.2, 1, -1.5));
    assertTrue(collapse.getMessage().contains("collapses"), collapse.getMessage());
    CoupledPair plane =
        CoupledPair.of(
            ATOM,
            new Coupling(1e-45, 2),
            new Coupling(0, 2),
            Density.perSquareMicrometre(100),
            Energy.ofHertz(10),
            new Coupling(1e-45, 2));
    assertThrows(IllegalArgumentException.class, plane::bubbleEnergy);
    assertTrue(plane.barrierHeight() > 0);
  }

  @Property(tries = 200)
  void barrierGapAndBubbleRiseWithLambda(
      @ForAll @DoubleRange(min = 0.01, max = 0.2) double nu,
      @ForAll @DoubleRange(min = 1.01, max = 20) double lambdaSquared) {
    CoupledPair low = pair(nu, nu * lambdaSquared);
    CoupledPair high = pair(nu, nu * lambdaSquared * 1.05);
    assertTrue(high.barrierHeight() > low.barrierHeight());
    assertTrue(
        high.bubbleEnergy().orElseThrow().joules() > low.bubbleEnergy().orElseThrow().joules());
    assertTrue(
        high.relativePhaseGap().orElseThrow().joules()
            > low.relativePhaseGap().orElseThrow().joules());
    assertTrue(
        high.relativePhaseLength().orElseThrow().metres()
            < low.relativePhaseLength().orElseThrow().metres());
    assertEquals(
        lambdaSquared,
        CoupledPair.of(
                ATOM,
                UNITS.coupling(1),
                UNITS.coupling(0),
                N,
                UNITS.energy(nu),
                CoupledPair.biquadraticFor(lambdaSquared, UNITS.energy(nu), N))
            .lambdaSquared(),
        1e-13 * lambdaSquared);
  }

  /** The barrier must be that of the local potential -2 J n cos(phi) + kappa n^2 sin^2(phi). */
  @Property(tries = 100)
  void barrierIsTheMaximumOfTheLocalPotential(
      @ForAll @DoubleRange(min = 0.01, max = 0.2) double nu,
      @ForAll @DoubleRange(min = 1.05, max = 9) double lambdaSquared) {
    double top = Double.NEGATIVE_INFINITY;
    for (int i = 0; i <= 20_000; i++) {
      double phi = Math.PI * i / 20_000;
      double sine = Math.sin(phi);
      double local = -2 * nu * Math.cos(phi) + lambdaSquared * nu * sine * sine;
      top = Math.max(top, local - 2 * nu);
    }
    double barrier = pair(nu, nu * lambdaSquared).barrierHeight() * UNITS.lengthUnit().metres();
    assertEquals(top, UNITS.toScaledFieldEnergy(new Energy(barrier)), 1e-7 * nu);
  }
}
