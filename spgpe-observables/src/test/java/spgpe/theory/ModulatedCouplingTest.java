package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values derived and computed independently, see docs/theory-references.md. */
class ModulatedCouplingTest {
  private static final ModulatedCoupling SLOW = 
      new ModulatedCoupling(1, 1, .05, Math.sqrt(.05625), 10);

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
    double naive = DampedMode.of(-.1 + 4 * .05625, -.1 + 2, 0).frequency();
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
    // The averaged potential is off by .445/omega^2 relative.
    double excess = e.frequency() / SLOW.averagedMode(0).frequency() - 1;
    assertEquals(.445, excess * omega * omega, .445 * 2 / (omega * omega) + .002);
  }

  /**
   * The independent numbers come from a scan: the growth is slightly low and the edges are the last
   * unstable grid points, up to a grid step inside the band.
   */
  @ParameterizedTest
  @CsvSource({
    ".02, 10, 4.19902, 4.1990, .039967, .039968, 4.1605, 4.2375, 1e-3",
    ".05, 10, 4.19902, 4.1975, .099494, .099501, 4.1000, 4.2950, 1e-3",
    ".05, 40, 19.12498, 19.1250, .099500, .099501, 19.026, 19.224, 1e-3",
    ".1, 40, 19.12498, 19.1228, .196022, .196027, 18.928, 19.318, 2e-3",
    ".2372, 40, 19.12498, 19.1170, .422954, .422982, 18.697, 19.537, 3.5e-3",
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
      double gridStep) {
    ModulatedCoupling m = new ModulatedCoupling(1, 1, .05, depth, omega);
    InstabilityBand band = m.firstBand(0).orElseThrow();
    assertEquals(resonance, kinetic(m.resonantWaveNumber()), omega > 50 ? 1e-3 : 6e-6);
    assertEquals(fastest, kinetic(band.fastestWaveNumber()), gridStep);
    assertEquals(growth + 1e-6, band.growthRate(), 1.5e-6);
    assertEquals(bessel, m.resonantGrowthRate(), 6e-7);
    assertEquals(low - .5 * gridStep, kinetic(band.lowWaveNumber()), .55 * gridStep);
    assertEquals(high + .5 * gridStep, kinetic(band.highWaveNumber()), .55 * gridStep);
    double cutoff = kinetic(m.cutoffForStability());
    assertEquals(m.resonantGrowthRate(), kinetic(m.resonantWaveNumber()) - cutoff, 1e-10);
  }

  /** Trace = -2 solved with an adaptive integrator of order eight in another language. */
  @ParameterizedTest
  @CsvSource({
    ".02, 10, 4.159596929, 4.237983852, 4.1987844, .0399675304",
    ".1, 40, 18.927726294, 19.319316471, 19.1235192, .1960231729",
    ".2372, 40, 18.694952526, 19.540146564, 19.1175425, .4229545110"
  })
  void exactEdges(
      double depth, double omega, double low, double high, double fastest, double growth) {
    InstabilityBand band =
        new ModulatedCoupling(1, 1, .05, depth, omega).firstBand(0).orElseThrow();
    assertEquals(low, kinetic(band.lowWaveNumber()), 1e-8);
    assertEquals(high, kinetic(band.highWaveNumber()), 1e-8);
    assertEquals(fastest, kinetic(band.fastestWaveNumber()), 1e-5);
    assertEquals(growth, band.growthRate(), 1e-9);
  }

  private static double kinetic(double k) {
    return k * k / 2;
  }

  /**
   * Largest growth with damping, K = k^2/2 of the maximum and growth from an adaptive integrator in
   * another language; a coarser scan gave the next column, the formula of leading order the last.
   */
  @ParameterizedTest
  @CsvSource({
    ".05, 10, .01, 4.196609149, .0485276075, .048497, .04851",
    ".05, 10, .02, 4.195680847, -.0024193556, -.002434, -.00248",
    ".05, 10, .03, 4.194771968, -.0533479585, -.053351, -.05347",
    ".2372, 40, .02, 19.109104722, .0227725485, .022772, .02248"
  })
  void damping(
      double depth,
      double omega,
      double gamma,
      double kinetic,
      double growth,
      double scanned,
      double formula) {
    ModulatedCoupling m = new ModulatedCoupling(1, 1, .05, depth, omega);
    double exact = m.floquet(Math.sqrt(2 * kinetic), gamma).growth();
    assertEquals(growth, exact, 1e-9);
    assertEquals(scanned, exact, 3.2e-5);
    double leading =
        m.resonantGrowthRate() - gamma * (kinetic(m.resonantWaveNumber()) + 1 - .1);
    assertEquals(formula, leading, 6e-6);
    assertEquals(growth > 0, m.firstBand(gamma).isPresent());
    assertEquals(growth > 0, gamma < m.dampingForStability());
    m.firstBand(gamma).ifPresent(band -> assertEquals(growth, band.growthRate(), 1e-9));
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
