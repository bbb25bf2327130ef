package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Rows of the full two-component saddle (g = 1, false-vacuum density 1), computed independently in
 * another language; derivation in docs/theory-references.md.
 */
class CriticalBubbleTest {

  @ParameterizedTest
  @CsvSource({
    ".01, 2.25, 160, 96, .18725978, .19056729, .98264, .98877, 1.4644, -.061857, .225602,"
        + " .168049, .072954, .060907",
    ".05, 2.25, 64, 64, .39228542, .42612141, .92060, .94429, 1.4836, -.300909, .483012, .431045,"
        + " .296565, .279144",
    ".1, 2.25, 48, 48, .51573531, .60262668, .85581, .89423, 1.5064, -.578048, .617384, .579999,"
        + " .483565, .500836",
    ".1, 4.0, 48, 48, 1.06891662, 1.35797292, .78714, .82948, 1.0825, -.774384, .576055, .562876,"
        + " .545293, .618481",
    ".2, 2.25, 40, 48, .64345795, .85224282, .75502, .81429, 1.5493, -1.067835, .693134, .682869,"
        + " .693476, .817565"
  })
  void fullSaddle(
      double coherent,
      double lambdaSquared,
      double length,
      int modes,
      double energy,
      double phaseOnly,
      double ratio,
      double density,
      double phase,
      double negative,
      double growth1,
      double growth2,
      double growth3,
      double growth4) {
    CoupledPair pair =
        CoupledPair.fromFalseVacuum(1, 1, coherent, Math.sqrt(lambdaSquared), .05);
    CriticalBubble b = CriticalBubble.of(pair, new RingModes(length, modes));
    assertEquals(energy, b.energy(), 6e-9);
    assertEquals(phaseOnly, PhaseBubble.of(pair).energy(), 6e-9);
    assertEquals(ratio, b.energy() / PhaseBubble.of(pair).energy(), 6e-6);
    assertEquals(1, b.negativeModes());
    assertEquals(2, b.zeroModes());
    assertTrue(b.zeroModeError() < 1e-9, () -> "zero modes " + b.zeroModeError());
    assertEquals(density, b.density(0), 6e-6);
    assertEquals(phase, b.phase(0), 6e-5);
    assertEquals(negative, b.negativeEigenvalue(), 6e-7);
    assertEquals(growth1, b.growthRate(.02), 6e-7);
    assertEquals(growth2, b.growthRate(.1), 6e-7);
    assertEquals(growth3, b.growthRate(.5), 6e-7);
    assertEquals(growth4, b.growthRate(1), 6e-7);
    assertEquals(1, b.gradientSquared() / b.energy(), 2e-6);
    assertEquals(Math.PI, Math.abs(b.phase(length / 2)), 1e-3);
    assertEquals(1, b.density(length / 2), 1e-3);
  }

  /** The cutoff used for the rate runs. */
  @Test
  void lowerCutoff() {
    CoupledPair pair = new CoupledPair(1, 1.1, .1, .225, .05);
    CriticalBubble b = CriticalBubble.of(pair, new RingModes(48, 24));
    assertEquals(.51573560, b.energy(), 6e-9);
    assertEquals(.99, Math.sqrt(b.atomRatio()), .01);
    assertTrue(b.spectralTail() < 1e-2 && b.spectralTail() > 1e-8);
  }

  /** Weak coupling: density response vanishes and the closed form is approached. */
  @Test
  void weakCouplingLimit() {
    CoupledPair pair = CoupledPair.fromFalseVacuum(1, 1, .001, 1.5, .05);
    double ratio =
        CriticalBubble.of(pair, new RingModes(500, 96)).energy()
            / PhaseBubble.of(pair).energy();
    assertEquals(1, ratio, .0025);
    assertTrue(ratio < 1);
  }

  /** Units: psi -> c psi, x -> x/d scales the energy; another g, density and length at once. */
  @Test
  void scaling() {
    double density = 2.5;
    double g = .3;
    double energyUnit = g * density;
    double lengthUnit = 1 / Math.sqrt(energyUnit);
    CoupledPair pair = CoupledPair.fromFalseVacuum(g, density, .1 * energyUnit, 1.5, .05);
    CriticalBubble b = CriticalBubble.of(pair, new RingModes(48 * lengthUnit, 48));
    assertEquals(.51573531 * density * lengthUnit * energyUnit, b.energy(), 1e-8);
    assertEquals(.579999 * energyUnit, b.growthRate(.1), 1e-6);
    assertEquals(-.578048 * energyUnit, b.negativeEigenvalue(), 1e-6);
  }

  /**
   * At kappa = g the spin part of the interaction is isotropic in (S_y, S_z); above it the bubble
   * of the relative phase has a second negative mode, in the class of density differences.
   */
  @Test
  void phaseBubbleIsNoSaddleAboveIsotropy() {
    for (double kappa : new double[] {.95, 1.05}) {
      CoupledPair pair = new CoupledPair(1, 1.3, .3, kappa, .05);
      RingBasis basis = new RingBasis(24, 40);
      SaddleFields fields = SaddleSearch.from(pair, basis, p -> PhaseBubble.of(p)::phase);
      SaddleSpectrum spectrum = new SaddleSpectrum(pair, fields);
      assertEquals(kappa < 1 ? 1 : 2, spectrum.negativeModes(), "kappa=" + kappa);
      double lowest = SymmetricEigen.of(fields.block(false, 0)).value(0);
      assertEquals(kappa < 1, lowest > -1e-9, "lowest " + lowest);
      if (kappa > 1) {
        assertThrows(
            IllegalArgumentException.class,
            () -> CriticalBubble.of(pair, new RingModes(24, 40)));
      }
    }
  }

  @Test
  void refusals() {
    RingModes ring = new RingModes(48, 24);
    CoupledPair stable = new CoupledPair(1, 1.1, .1, .09, .05);
    IllegalArgumentException e =
        assertThrows(IllegalArgumentException.class, () -> CriticalBubble.of(stable, ring));
    assertTrue(String.valueOf(e.getMessage()).contains("no metastable state"));
    CoupledPair pair = new CoupledPair(1, 1.1, .1, .225, .05);
    assertThrows(
        IllegalArgumentException.class, () -> CriticalBubble.of(pair, new RingModes(6, 24)));
    CriticalBubble b = CriticalBubble.of(pair, ring);
    assertThrows(IllegalArgumentException.class, () -> b.growthRate(0));
    assertThrows(IllegalArgumentException.class, () -> b.growthRate(Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> b.phase(Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> new RingModes(Double.NaN, 3));
  }
}
