package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values derived, see docs/theory-references.md, checked there by quadrature and spectra. */
class PhaseBubbleTest {

  @ParameterizedTest
  @CsvSource({
    "1.05, .0809114890, .083289, 1.3736", "1.1, .2200548075, .232729, 1.5329",
    "1.2, .5787581532, .642834, 1.8818", "1.3, .9951636656, 1.154197, 2.2600",
    "1.5, 1.9056728880, 2.377210, 3.0704", "2, 4.2942874364, 6.0909, 5.2274",
    "3, 8.9633789336, , 9.6110", "5, 17.7619726066, , 18.1579"
  })
  void energyAndLimits(double lambda, double energy, Double smallBarrier, double thinWall) {
    PhaseBubble b = PhaseBubble.of(1, 1, lambda);
    assertEquals(energy, b.reducedEnergy(), 6e-11);
    assertEquals(thinWall, b.thinWallLimit(), 6e-5);
    if (smallBarrier != null) {
      assertEquals(smallBarrier, b.smallBarrierLimit(), 6e-5 * smallBarrier);
    }
    PhaseBubble scaled = PhaseBubble.of(.8, .03, lambda);
    assertEquals(.8 * Math.sqrt(.03) * energy, scaled.energy(), 1e-10);
  }

  /** The series used close to lambda = 1 joins the closed form. */
  @Test
  void smallBarrierBranch() {
    double below = PhaseBubble.of(1, 1, 1.00099999999).reducedEnergy();
    double above = PhaseBubble.of(1, 1, 1.00100000001).reducedEnergy();
    assertEquals(below, above, 1e-7 * above);
    PhaseBubble tiny = PhaseBubble.of(1, 1, 1 + 1e-8);
    assertEquals(1, tiny.reducedEnergy() / tiny.smallBarrierLimit(), 1e-7);
  }

  /** Energy of the profile by quadrature, and the turning point tan(y/2) = sqrt(lambda^2 - 1). */
  @Property(tries = 30)
  void profileCarriesTheEnergy(
      @ForAll @DoubleRange(min = 1.03, max = 6) double lambda,
      @ForAll @DoubleRange(min = .01, max = .3) double coherent) {
    PhaseBubble b = PhaseBubble.of(1.3, coherent, lambda);
    double y0 = Math.PI - b.phase(0);
    assertEquals(Math.sqrt(lambda * lambda - 1), Math.tan(y0 / 2), 1e-9 * lambda);
    double h = .02 / b.mass();
    double sum = 0;
    for (int i = -2000; i <= 2000; i++) {
      double x = i * h;
      double slope = (b.phase(x + 1e-4 * h) - b.phase(x - 1e-4 * h)) / (2e-4 * h);
      double phi = b.phase(x);
      double c = Math.cos(phi / 2);
      double s = Math.sin(phi);
      double u = -2 * c * c + lambda * lambda / 2 * s * s;
      sum += h * (1.3 / 4 * slope * slope + 2 * coherent * 1.3 * u);
    }
    assertEquals(b.energy(), sum, 1e-6 * b.energy());
  }

  /** Spectral determinants extrapolated in the cutoff gave -.1408323, -.0340893, -.00860886. */
  @Test
  void determinant() {
    assertEquals(-.1408366, PhaseBubble.of(1, 1, 1.2).determinantRatio(), 6e-8);
    assertEquals(-.0340897, PhaseBubble.of(1, 1, 1.5).determinantRatio(), 6e-8);
    assertEquals(-.00860871, PhaseBubble.of(1, 1, 2).determinantRatio(), 6e-9);
  }

  @ParameterizedTest
  @CsvSource({
    "1.1, -.51364311", "1.2, -.89180392", "1.5, -1.55429064", "2, -1.96547448", "3, -2.11964544"
  })
  void negativeEigenvalue(double lambda, double eigenvalue) {
    assertEquals(eigenvalue, PhaseBubble.of(1, 1, lambda).negativeEigenvalue(), 1e-8);
  }

  /**
   * The digits of a shooting code with its own tolerance; half radius in 1/(2 sqrt J), there read
   * off an output grid, here confirmed by {@link #radialCentre}.
   */
  @ParameterizedTest
  @CsvSource({
    "1.1, 2.31209, 2.31209, 1.33851, 2.4530", "1.2, 4.58639, 4.58638, 1.81885, 1.9618",
    "1.3, 6.84701, 6.84701, 2.14301, 1.8031", "1.5, 11.40727, 11.40727, 2.56608, 1.7488",
    "1.75, 17.34990, 17.34989, 2.86610, 1.8546", "2.0, 23.74961, 23.74960, 3.02231, 2.0405"
  })
  void radial(double lambda, double energy, double gradient, double centre, double half) {
    RadialBubble b = RadialBubble.of(lambda);
    assertEquals(energy, b.reducedEnergy(), 2e-5);
    assertEquals(gradient, b.gradientEnergy(), 2e-5);
    assertEquals(centre, Math.PI - b.centralPhase(), 1e-5);
    assertEquals(half, b.halfRadius(), 2.5e-4);
    assertEquals(1, b.gradientEnergy() / b.reducedEnergy(), 1e-6);
    assertEquals(.5 * 1.3 * b.reducedEnergy(), b.energy(1.3), 1e-12);
  }

  /** A second shooting code (other integrator of order eight, other language) to more digits. */
  @Test
  void radialCentre() {
    assertEquals(1.3385061257, Math.PI - RadialBubble.of(1.1).centralPhase(), 1e-8);
    assertEquals(2.4528069317, RadialBubble.of(1.1).halfRadius(), 1e-7);
    assertEquals(2.5660776007, Math.PI - RadialBubble.of(1.5).centralPhase(), 1e-8);
    assertEquals(1.7486423454, RadialBubble.of(1.5).halfRadius(), 1e-7);
  }

  @Test
  void refusals() {
    assertThrows(IllegalArgumentException.class, () -> PhaseBubble.of(1, 1, 1));
    assertThrows(IllegalArgumentException.class, () -> PhaseBubble.of(1, 1, Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> PhaseBubble.of(1, Double.NaN, 2));
    assertThrows(IllegalArgumentException.class, () -> RadialBubble.of(.9));
    assertThrows(IllegalArgumentException.class, () -> RadialBubble.of(Double.NaN));
    CoupledPair stable = new CoupledPair(1, 1.1, .1, .05, .1);
    IllegalArgumentException e =
        assertThrows(IllegalArgumentException.class, () -> PhaseBubble.of(stable));
    assertTrue(String.valueOf(e.getMessage()).contains("no metastable state"));
  }
}
