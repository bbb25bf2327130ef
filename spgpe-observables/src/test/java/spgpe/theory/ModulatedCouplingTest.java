package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values derived and computed independently, see docs/theory-references.md. */
class ModulatedCouplingTest {
  private static final ModulatedCoupling SLOW = new ModulatedCoupling(1, 1, .05, .2371708, 10);

  /** kappa = .10632787 and lambda^2 = 2.126557 from the Bessel form; 2 g delta^2 is 6 % more. */
  @Test
  void averagedPotential() {
    assertEquals(.10632787, SLOW.biquadraticCoupling(), 6e-9);
    assertEquals(2.126557, SLOW.lambdaSquared(), 6e-7);
    assertEquals(1 - .10632787, SLOW.imbalanceCoupling(), 6e-9);
    assertEquals(.43599200, SLOW.averagedMode(0).frequency(), 6e-9);
    ModulatedCoupling weak = SLOW.withDepth(1e-3);
    assertEquals(2e-6, weak.biquadraticCoupling(), 1e-11);
    assertTrue(weak.averagedMode(0).slowRate() < 0);
    // Without the change of the S_z term and with 2 g delta^2 the frequency is 12 % too high.
    double naive = DampedMode.of(-.1 + 4 * .2371708 * .2371708, -.1 + 2, 0).frequency();
    assertEquals(.48734, naive, 6e-6);
  }

  @ParameterizedTest
  @CsvSource({
    "5, .44402873", "10, .43794728", "20, .43647761", "50, .43606956", "100, .43601139",
    "200, .43599685"
  })
  void slowFrequency(double omega, double frequency) {
    FloquetExponent e = SLOW.withFrequency(omega).floquet(0, 0);
    assertEquals(0, e.growth(), 0);
    assertEquals(frequency, e.frequency(), 6e-9);
  }

  @ParameterizedTest
  @CsvSource({
    ".02, 10, 4.19902, 4.1990, .039967, .039968, 4.1605, 4.2375, 5e-5",
    ".05, 10, 4.19902, 4.1975, .099494, .099501, 4.1000, 4.2950, 5e-5",
    ".05, 40, 19.12498, 19.1250, .099500, .099501, 19.026, 19.224, 6e-4",
    ".1, 40, 19.12498, 19.1228, .196022, .196027, 18.928, 19.318, 1.1e-3",
    ".2372, 40, 19.12498, 19.1170, .422954, .422982, 18.697, 19.537, 1.1e-3",
    ".2372, 100, 49.11, 49.106, .422976, .422982, 48.686, 49.530, 3e-3"
  })
  void firstBand(
      double depth,
      double omega,
      double resonance,
      double fastest,
      double growth,
      double bessel,
      double low,
      double high,
      double tolerance) {
    ModulatedCoupling m = new ModulatedCoupling(1, 1, .05, depth, omega);
    InstabilityBand band = m.firstBand(0).orElseThrow();
    assertEquals(resonance, kinetic(m.resonantWaveNumber()), omega > 50 ? 1e-3 : 6e-6);
    assertEquals(fastest, kinetic(band.fastestWaveNumber()), Math.max(3e-4, tolerance));
    assertEquals(growth, band.growthRate(), 6e-7);
    assertEquals(bessel, m.resonantGrowthRate(), 6e-7);
    assertEquals(low, kinetic(band.lowWaveNumber()), Math.max(6e-4, tolerance));
    assertEquals(high, kinetic(band.highWaveNumber()), Math.max(6e-4, tolerance));
    double cutoff = kinetic(m.cutoffForStability());
    assertEquals(m.resonantGrowthRate(), kinetic(m.resonantWaveNumber()) - cutoff, 1e-10);
  }

  private static double kinetic(double k) {
    return k * k / 2;
  }

  @ParameterizedTest
  @CsvSource({
    ".05, 10, .01, 4.1975, .048497, .04851", ".05, 10, .02, 4.1975, -.002434, -.0024",
    ".05, 10, .03, 4.1975, -.053351, -.0533", ".2372, 40, .02, 19.1170, .022772, .0228"
  })
  void damping(
      double depth, double omega, double gamma, double kinetic, double growth, double formula) {
    ModulatedCoupling m = new ModulatedCoupling(1, 1, .05, depth, omega);
    // The growth is at its maximum over K, so the last digit of K does not matter.
    double exact = largest(m, kinetic, gamma);
    assertEquals(growth, exact, 2e-6);
    double leading =
        m.resonantGrowthRate() - gamma * (kinetic(m.resonantWaveNumber()) + 1 - .1);
    assertEquals(formula, leading, 6e-5);
    assertEquals(growth > 0, m.firstBand(gamma).isPresent());
    assertEquals(growth > 0, gamma < m.dampingForStability());
  }

  private static double largest(ModulatedCoupling m, double kinetic, double gamma) {
    double best = Double.NEGATIVE_INFINITY;
    for (int i = -40; i <= 40; i++) {
      best = Math.max(best, m.floquet(Math.sqrt(2 * (kinetic + i * 5e-4)), gamma).growth());
    }
    return best;
  }

  /** The Mathieu limit needs g n far above all else; agreement improves as 1/(g n). */
  @Test
  void mathieuLimit() {
    double previous = Double.POSITIVE_INFINITY;
    for (double g : new double[] {30, 120, 480}) {
      // a = 1, q = .5 held fixed while g grows: omega^2 = 8 g K, delta = omega/(16 g).
      double kinetic = 1;
      double omega = Math.sqrt(8 * g * kinetic);
      ModulatedCoupling m = new ModulatedCoupling(g, 1, .05, omega / (16 * g), omega);
      double k = Math.sqrt(2 * (kinetic + .1));
      double mathieu = m.mathieuLimit(k).growth();
      assertEquals(.24314576 * omega / 2, mathieu, 1e-7 * omega);
      double error = Math.abs(m.floquet(k, 0).growth() / mathieu - 1);
      assertTrue(error < 0.5 * previous, "error " + error);
      previous = error;
    }
    assertTrue(previous < 5e-3, "error " + previous);
  }

  @Test
  void mapsAndRing() {
    ModulatedCoupling m = new ModulatedCoupling(1, 1, .05, .05, 10);
    double[] k = {0, 1, Math.sqrt(2 * 4.1975)};
    double[][] overFrequency = m.growthOverFrequency(k, new double[] {10, 20}, 0);
    assertEquals(2, overFrequency.length);
    assertEquals(.099494, overFrequency[0][2], 1e-6);
    assertEquals(0, overFrequency[1][2], 0);
    double[][] overDepth = m.growthOverDepth(k, new double[] {0, .02, .05}, 0);
    assertEquals(0, overDepth[0][2], 1e-7);
    assertTrue(overDepth[1][2] > .03 && overDepth[1][2] < .04);
    // Depth zero: phase pi at J > 0 is unstable at k = 0 with the rate sqrt(2 J (2 g n - 2 J)).
    assertEquals(Math.sqrt(.1 * 1.9), overDepth[0][0], 1e-9);
    // lambda^2 > 1 needs the depth of SLOW; its ring is stable with the band cut off, else not.
    ModulatedCoupling deep = SLOW.withFrequency(40);
    assertTrue(deep.largestGrowth(new RingModes(60, 40), 0) <= 1e-12);
    assertTrue(deep.largestGrowth(new RingModes(60, 80), 0) > .1);
    assertTrue(deep.largestGrowth(new RingModes(60, 80), .03) < 0);
    assertTrue(2 * Math.PI * 40 / 60 < deep.cutoffForStability());
  }

  @Test
  void refusals() {
    assertThrows(
        IllegalArgumentException.class, () -> new ModulatedCoupling(1, 1, .05, Double.NaN, 10));
    assertThrows(
        IllegalArgumentException.class, () -> new ModulatedCoupling(1, 1, 0, .1, 10));
    assertThrows(IllegalArgumentException.class, () -> SLOW.floquet(Double.NaN, 0));
    assertThrows(IllegalArgumentException.class, () -> SLOW.floquet(1, -1));
    assertThrows(
        UnconvergedException.class, () -> SLOW.withFrequency(1e-6).floquet(30, 0));
  }
}
