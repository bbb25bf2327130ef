package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

/** Values computed independently in another language; derivation in docs/theory-references.md. */
class PlanarBubbleTest {
  private static final CoupledPair PAIR = new CoupledPair(1, 1.1, .1, .225, .25);

  private static PlanarBubble solved(
      double side, int modes, double energy, double gradient) {
    PlanarBubble b = PlanarBubble.of(PAIR, side, modes);
    assertEquals(energy, b.energy(), 6e-7);
    assertEquals(gradient, b.gradientEnergy(), 6e-6);
    assertEquals(3, b.zeroModes());
    assertTrue(b.zeroModeError() < 1e-9, () -> "zero modes " + b.zeroModeError());
    double phaseOnly = RadialBubble.of(1.5).energy(1);
    assertEquals(.8651, b.energy() / phaseOnly, 6e-5);
    return b;
  }

  @Test
  void largerSquare() {
    solved(36, 16, 4.934260, 4.93367);
  }

  @Test
  void spectrum() {
    PlanarBubble b = solved(28, 12, 4.934354, 4.93262);
    assertEquals(1.0433, b.centralDensity(), 6e-5);
    assertEquals(.6261, b.centralPhase(), 6e-5);
    assertEquals(-.264802, b.negativeEigenvalue(), 6e-7);
    assertEquals(.3141028, b.growthRate(.2), 6e-8);
    assertEquals(.99612, Math.sqrt(b.atomRatio()), 6e-6);
    assertEquals(8.08843, b.logDeterminantFactor(), 6e-6);
    PlanarBubble finer = solved(28, 14, 4.934197, 4.93399);
    assertEquals(9.38739, finer.logDeterminantFactor(), 6e-6);
    // Rate per area from the printed pieces: two mirror saddles, two translations.
    double temperature = b.energy() / 18;
    double rate =
        2 * .3141028 / (2 * Math.PI) * 4.93262 * .99612 / (2 * Math.PI * temperature)
            * Math.exp(8.08843 - 18);
    DecayRate langer = DecayRate.of(b, temperature, .2);
    assertEquals(rate, langer.density(), 3e-5 * rate);
    assertEquals(28 * 28 * langer.density(), langer.total(), 1e-12);
    assertTrue(langer.prediction().warnings().get(0).contains("two dimensions"));
  }

  @Test
  void refusals() {
    assertThrows(IllegalArgumentException.class, () -> PlanarBubble.of(PAIR, 5, 12));
    assertThrows(IllegalArgumentException.class, () -> PlanarBubble.of(PAIR, Double.NaN, 12));
    assertThrows(IllegalArgumentException.class, () -> PlanarBubble.of(PAIR, 28, 40));
    CoupledPair stable = new CoupledPair(1, 1.1, .1, .05, .1);
    assertThrows(IllegalArgumentException.class, () -> PlanarBubble.of(stable, 28, 12));
  }

  /** The interpolated profile of the shooting solution solves the static equation. */
  @Test
  void radialProfile() {
    RadialBubble b = RadialBubble.of(1.5);
    assertEquals(b.centralPhase(), b.phase(0), 1e-6);
    assertEquals(.5 * (Math.PI + b.centralPhase()), b.phase(b.halfRadius()), 1e-7);
    assertEquals(Math.PI, b.phase(100), 0);
    double h = 1e-2;
    for (double r = .5; r < 6; r += .37) {
      double phi = b.phase(r);
      double curvature = (b.phase(r + h) - 2 * phi + b.phase(r - h)) / (h * h);
      double slope = (b.phase(r + h) - b.phase(r - h)) / (2 * h);
      double force = Math.sin(phi) * (1 + 2.25 * Math.cos(phi));
      assertEquals(force, curvature + slope / r, 2e-3);
    }
    assertThrows(IllegalArgumentException.class, () -> b.phase(-1));
  }
}
