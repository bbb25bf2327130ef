package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;

/** Values derived, see docs/theory-references.md. */
class GaussianFluctuationsTest {
  private static final CoupledPair PAIR = new CoupledPair(1, 1.1, .1, .225, .05);

  @Test
  void curvaturesAndFrequenciesOfTheFalseVacuum() {
    GaussianFluctuations f = GaussianFluctuations.of(PAIR, Vacuum.FALSE);
    assertEquals(1, f.density(), 1e-15);
    assertArrayEquals(new double[] {0, .5, 3.6, 4}, f.curvatures(0), 1e-14);
    double k = 2 * Math.PI / 48;
    assertEquals(
        Math.sqrt((.9 + k * k / 4) * (k * k + .5)), f.relativeFrequency(k), 1e-14);
    assertEquals(Math.sqrt(k * k * (1 + k * k / 4)), f.totalFrequency(k), 1e-14);
    assertEquals(Math.sqrt(.9), f.relativePhaseSpeed(), 1e-15);
    assertEquals(1, f.soundSpeed(), 1e-15);
    // Height of the barrier J n (lambda - 1/lambda)^2, and the density-relaxed gap 4 mu J/g.
    assertEquals(.0694444, PhaseBubble.of(PAIR).barrierHeight(), 5e-8);
    assertEquals(.44, PAIR.pressureDifference(), 1e-15);
  }

  @Test
  void trueVacuum() {
    GaussianFluctuations f = GaussianFluctuations.of(PAIR, Vacuum.TRUE);
    assertEquals(1.2, f.density(), 1e-15);
    assertEquals(4 * (.1 + .225 * 1.2), f.mass() * f.mass(), 1e-14);
    assertEquals(Math.sqrt(1.3), f.relativePhaseSpeed(), 1e-15);
  }

  /** L = 40, m = .7, n = 1, T = .05; L = 40 doubles the value at x = L/2. */
  @Test
  void ringCorrelator() {
    GaussianPhase phase = new GaussianPhase(.7, 1, .05);
    assertEquals(.0714285714, phase.onRing(0, 40), 1e-10);
    assertEquals(.03547038, phase.onRing(1, 40), 6e-9);
    assertEquals(.00215695596, phase.onRing(5, 40), 6e-12);
    assertEquals(1.18789817e-7, phase.onRing(20, 40), 6e-16);
    assertEquals(5.9395e-8, phase.onLine(20), 5e-13);
    assertEquals(phase.onRing(5, 40), phase.onRing(-35, 40), 1e-16);
    RingModes ring = new RingModes(40, 31);
    assertEquals(.06503841, phase.onRing(0, ring), 6e-9);
    assertEquals(.06503789, phase.variance(ring.effectiveCutoff()), 6e-9);
    assertEquals(phase.onRing(1, 40), phase.onRing(1, new RingModes(40, 20000)), 1e-9);
    assertEquals(phase.onLine(0), phase.variance(Double.POSITIVE_INFINITY), 1e-15);
    assertEquals(Math.exp(-.05), GaussianPhase.meanCosine(.1), 1e-15);
    assertEquals(Math.exp(-.1) * Math.cosh(.05), GaussianPhase.cosineProduct(.1, .05), 1e-15);
  }

  /** Trace and determinant of [[-gamma B, A], [-B, -gamma A]] fix both eigenvalues. */
  @Property(tries = 60)
  void dampedMode(
      @ForAll @DoubleRange(min = 0, max = 3) double k,
      @ForAll @DoubleRange(min = 0, max = 5) double damping) {
    GaussianFluctuations f = GaussianFluctuations.of(PAIR, Vacuum.FALSE);
    DampedMode mode = f.relativeMode(k, damping);
    double a = k * k / 2 + .25;
    double b = k * k / 2 + 1.8;
    assertEquals(damping * (a + b), mode.slowRate() + mode.fastRate(), 1e-9);
    double product =
        mode.slowRate() * mode.fastRate() + mode.frequency() * mode.frequency();
    assertEquals((1 + damping * damping) * a * b, product, 1e-8 * product);
    assertTrue(mode.slowRate() >= 0);
  }

  /** Equipartition of the density difference: low temperature limit of the exact result. */
  @Test
  void imbalanceVarianceIsTheColdLimit() {
    CoupledPair cold = new CoupledPair(1, 1, .05, .1, .01);
    double exact = PairEquilibrium.of(cold).averages().imbalanceSquared();
    double gauss =
        GaussianFluctuations.of(cold, Vacuum.TRUE)
            .imbalanceVariance(new RingModes(200, 40000));
    assertEquals(exact, gauss, .02 * exact);
  }

  @Test
  void refusals() {
    CoupledPair unstable = new CoupledPair(1, 1.1, .1, .09, .05);
    assertThrows(
        IllegalArgumentException.class, () -> GaussianFluctuations.of(unstable, Vacuum.FALSE));
    assertThrows(
        IllegalArgumentException.class,
        () -> GaussianFluctuations.of(new CoupledPair(1, -1, .1, .1, .1), Vacuum.TRUE));
    GaussianFluctuations f = GaussianFluctuations.of(PAIR, Vacuum.FALSE);
    assertThrows(IllegalArgumentException.class, () -> f.relativeFrequency(Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> f.relativeMode(0, Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> new GaussianPhase(0, 1, 1));
  }
}
