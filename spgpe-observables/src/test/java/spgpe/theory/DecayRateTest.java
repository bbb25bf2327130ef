package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Rates of Langer's formula, computed independently in another language (derivation in
 * docs/theory-references.md), and brute-force simulations beside them.
 */
class DecayRateTest {
  private static CriticalBubble bubble(double coherent, double length, int modes) {
    CoupledPair pair = CoupledPair.fromFalseVacuum(1, 1, coherent, 1.5, .05);
    return CriticalBubble.of(pair, new RingModes(length, modes));
  }

  @ParameterizedTest
  @CsvSource({
    ".1, 48, 24, .1, 8, 1.57866e-2, 6e-6", ".1, 48, 24, .1, 10, 2.38865e-3, 3e-6",
    ".1, 48, 24, .1, 12, 3.54124e-4, 3e-6", ".1, 48, 24, .1, 14, 5.17654e-5, 3e-6",
    ".1, 48, 24, .1, 18, 1.07506e-6, 6e-6", ".1, 48, 24, .1, 22, 2.17686e-8, 3e-6",
    ".1, 48, 24, .02, 10, 2.54262e-3, 3e-6", ".1, 48, 24, .5, 8, 1.316e-2, 4e-4",
    ".1, 48, 24, .5, 10, 1.992e-3, 3e-4", ".1, 96, 48, .1, 10, 4.776e-3, 2e-4",
    ".1, 48, 48, .1, 10, 3.230e-3, 2e-4", ".02, 96, 32, .1, 8, 4.489e-3, 2e-4"
  })
  void langer(
      double coherent,
      double length,
      int modes,
      double damping,
      double barrier,
      double rate,
      double tolerance) {
    CriticalBubble b = bubble(coherent, length, modes);
    DecayRate r = DecayRate.of(b, b.energy() / barrier, damping);
    assertEquals(rate, r.total(), tolerance * rate);
    assertEquals(r.total(), r.density() * length, 1e-14 * rate);
    assertEquals(barrier, r.barrierOverTemperature(), 1e-12);
    assertEquals(r.density(), r.prefactor() * Math.exp(-barrier), 1e-14 * rate);
  }

  /**
   * Brute-force rates of the same model (first passage of the mean cosine, 95 % intervals): 10934
   * events at E_b/T = 10, 240 at 14; rare-event sampling at 18; gamma = .02 falls out of the band.
   */
  @Test
  void simulationsLieInTheStatedBand() {
    CriticalBubble b = bubble(.1, 48, 24);
    Comparison ten = compare(b, 10, .1, 1.549e-3, .015e-3);
    Comparison fourteen = compare(b, 14, .1, 4.03e-5, .26e-5);
    Comparison eighteen = compare(b, 18, .1, 9.7e-7, .5e-7);
    assertEquals(Comparison.Verdict.WITHIN_BAND, ten.verdict());
    assertEquals(Comparison.Verdict.WITHIN_BAND, fourteen.verdict());
    assertEquals(Comparison.Verdict.WITHIN_BAND, eighteen.verdict());
    assertEquals(.6484, 1 + ten.relativeDifference(), 2e-4);
    assertTrue(ten.warnings().isEmpty());
    Comparison slow = compare(b, 10, .02, 1.059e-3, .029e-3);
    assertEquals(.416, 1 + slow.relativeDifference(), 1e-3);
    assertEquals(1, slow.warnings().size());
    assertEquals(Comparison.Verdict.WITHIN_BAND, slow.verdict());
    // A code whose noise is too strong by 30 % in temperature would be caught.
    double hot = DecayRate.of(b, 1.3 * b.energy() / 10, .1).total() * .65;
    assertEquals(Comparison.Verdict.DIFFERS, compare(b, 10, .1, hot, .02 * hot).verdict());
  }

  private static Comparison compare(
      CriticalBubble b, double barrier, double damping, double rate, double error) {
    return new Comparison(
        "decay rate",
        rate,
        error,
        DecayRate.of(b, b.energy() / barrier, damping).prediction());
  }

  @Test
  void warningsOutsideTheCheckedRange() {
    CriticalBubble b = bubble(.1, 48, 24);
    assertEquals(1, DecayRate.of(b, b.energy() / 7, .1).prediction().warnings().size());
    assertEquals(1, DecayRate.of(b, b.energy() / 25, .1).prediction().warnings().size());
    assertEquals(2, DecayRate.of(b, b.energy() / 3, .01).prediction().warnings().size());
    assertEquals(0, DecayRate.of(b, b.energy() / 12, .1).prediction().warnings().size());
  }

  @Test
  void fromPair() {
    CoupledPair pair = new CoupledPair(1, 1.1, .1, .225, .05157356);
    DecayRate r = DecayRate.of(pair, new RingModes(48, 24), .1);
    assertEquals(2.38865e-3, r.total(), 1e-5 * 2.38865e-3);
    assertEquals(.579999, r.growthRate(), 1e-5);
  }

  /**
   * The growth rate tends linearly to that of the undamped dynamics; .579999 at gamma = .1 and
   * .617384 at .02 point to .627 at 0, with a curvature of about .5, so that the straight line through
   * 0 and 1e-3 is off by .5 * 1e-4 * 9e-4 = 4.5e-8 at 1e-4. Kinetic theory gives gamma of 1e-5.
   */
  @Test
  void growthRateAtSmallDamping() {
    CriticalBubble b = bubble(.1, 48, 24);
    double none = b.growthRate(1e-8);
    assertEquals(.627, none, .002);
    double slope = (b.growthRate(1e-3) - none) / 1e-3;
    for (double damping : new double[] {1e-6, 1e-5, 1e-4}) {
      assertEquals(none + slope * damping, b.growthRate(damping), 6e-8);
    }
  }

  /**
   * Overdamped phase: the closed form against the same formula evaluated from Fourier spectra at
   * two cutoffs, whose error falls as 1/cutoff and is extrapolated away.
   */
  @ParameterizedTest
  @CsvSource({"1.2, 9", "1.5, 9", "2, 12"})
  void overdampedPhase(double lambda, double barrier) {
    PhaseBubble bubble = PhaseBubble.of(1, .01, lambda);
    PhaseDecayRate rate = PhaseDecayRate.of(bubble, bubble.energy() / barrier);
    assertEquals(barrier, rate.barrierOverTemperature(), 1e-12);
    assertEquals(bubble.negativeEigenvalue(), rate.negativeEigenvalue(), 0);
    double coarse = spectralRate(lambda, barrier, 96);
    double fine = spectralRate(lambda, barrier, 192);
    // Linear in 1/(cutoff + 1/2).
    double extrapolated = (192.5 * fine - 96.5 * coarse) / 96;
    assertEquals(extrapolated, rate.perLength(), 2e-3 * extrapolated);
  }

  private static double spectralRate(double lambda, double barrier, int cutoff) {
    double s = Math.sqrt(lambda * lambda - 1);
    RingBasis basis = new RingBasis(28 / s, cutoff);
    double[] curvature = new double[basis.points()];
    double[] slopeSquared = new double[curvature.length];
    for (int p = 0; p < curvature.length; p++) {
      double x = s * basis.radius(p);
      double f = s / Math.cosh(x);
      double y = 2 * Math.atan(f);
      curvature[p] = -Math.cos(y) + lambda * lambda * Math.cos(2 * y);
      double slope = 2 / (1 + f * f) * -s * f * Math.tanh(x);
      slopeSquared[p] = slope * slope;
    }
    double logDeterminant = 0;
    double negative = 0;
    for (int symmetry = 0; symmetry < 2; symmetry++) {
      int n = basis.count(symmetry);
      double[][] h = new double[n][n];
      basis.addMultiplication(h, 0, 0, curvature, symmetry);
      basis.addKinetic(h, 0, symmetry);
      SymmetricEigen eigen = SymmetricEigen.of(h);
      for (int i = 0; i < n; i++) {
        logDeterminant += Math.log(basis.squaredWaveNumber(symmetry, i) + s * s);
        if (symmetry == RingBasis.ODD && i == 0) {
          continue;
        }
        negative = Math.min(negative, eigen.value(i));
        logDeterminant -= Math.log(Math.abs(eigen.value(i)));
      }
    }
    double b1 = PhaseBubble.of(1, 1, lambda).reducedEnergy();
    double b = barrier / b1;
    double translation = Math.sqrt(b * basis.integral(slopeSquared) / (2 * Math.PI));
    return 2 * Math.abs(negative) / (2 * Math.PI) * translation
        * Math.exp(0.5 * logDeterminant - barrier);
  }

  @Test
  void refusals() {
    CriticalBubble b = bubble(.1, 48, 24);
    assertThrows(IllegalArgumentException.class, () -> DecayRate.of(b, Double.NaN, .1));
    assertThrows(IllegalArgumentException.class, () -> DecayRate.of(b, .05, 0));
    assertThrows(
        IllegalArgumentException.class,
        () ->
            DecayRate.of(
                new CoupledPair(1, 1.1, .1, .05, .05), new RingModes(48, 24), .1));
    assertThrows(
        IllegalArgumentException.class,
        () -> PhaseDecayRate.of(PhaseBubble.of(1, .1, 1.5), Double.NaN));
  }
}
