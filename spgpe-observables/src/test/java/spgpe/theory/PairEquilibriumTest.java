package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Tables derived for this project, see docs/theory-references.md, and computed independently in
 * another language; method of Scalapino, Sears, Ferrell, Phys. Rev. B 6, 3409 (1972).
 */
class PairEquilibriumTest {

  @ParameterizedTest
  @CsvSource({
    "1,1,0,0,.5, .798580680, 0, 1.275462206, .63773110, .72164453, .85312390, .4892403, ,"
        + " 1.70624781",
    "1,1,.1,0,.5, .826559353, .212599728, 1.293685380, .69020927, .73379756, .84177205,"
        + " .4842356, .8443700, 2.25348642",
    "1,1,.1,.15,.25, .922955691, .678667681, .874813909, .85955310, .45160222, 1.14889263,"
        + " .5739436, 1.0955582, 9.63280394",
    "1,1,.05,.10,.1, .990768839, .893752193, .502862258, .98275737, .19385338, 1.41887594,"
        + " .5173848, .8054762, 35.86721485",
    "1,0,.3,0,1, .663129529, .085076981, .865486746, .44385041, .72674601, .32870734, .2785309,"
        + " .3452652, .75386177",
    "1,.9,.1,.225,.1, .93632619, .86231140, .33072011, .87916552, .18302289, .95367916,"
        + " .5179033, .6050483, 33.8087000"
  })
  void infiniteLine(
      double g,
      double mu,
      double coherent,
      double kappa,
      double temperature,
      double density,
      double coherence,
      double sySquared,
      double product,
      double imbalance,
      double lengthSy,
      double lengthSz,
      Double lengthCoherence,
      double lengthField) {
    PairEquilibrium e =
        PairEquilibrium.of(new CoupledPair(g, mu, coherent, kappa, temperature));
    PairAverages a = e.averages();
    assertEquals(density, a.density(), 1e-8);
    assertEquals(coherence, a.coherence(), 1e-8);
    assertEquals(sySquared, a.sySquared(), 2e-8);
    assertEquals(product, a.densityProduct(), 2e-8);
    assertEquals(imbalance, a.imbalanceSquared(), 2e-8);
    assertEquals(lengthSy, e.syCorrelation().decayLength(), 2e-8 * lengthSy);
    assertEquals(lengthSz, e.imbalanceCorrelation().decayLength(), 1e-7);
    assertEquals(lengthField, e.fieldCorrelation().decayLength(), 1e-8 * lengthField);
    if (lengthCoherence != null) {
      assertEquals(lengthCoherence, e.coherenceCorrelation().decayLength(), 1e-7);
    }
    assertTrue(a.truncationError() < 3e-8);
    assertTrue(e.lengthError() < 1e-5, () -> "lengths " + e.lengthError());
    // Zero distance is fixed by the averages.
    assertEquals(a.sySquared(), e.syCorrelation().at(0), 1e-8);
    assertEquals(a.imbalanceSquared(), e.imbalanceCorrelation().at(0), 1e-6);
    assertEquals(a.density(), e.fieldCorrelation().at(0), 1e-6);
  }

  /** Ring trace against rows computed independently (L = 32, 48, 96). */
  @ParameterizedTest
  @CsvSource({
    "1,1,.1,.15,.25, 32, .92518673, .68238358, .87559958",
    "1,1,.05,.10,.1, 48, .99139455, .89445144, .50291321",
    "1,1,.05,.10,.1, 96, .99097547, .89398314, .50287905",
    "1,.9,.1,.225,.1, 48, .93698622, .86302248, .33078962"
  })
  void ring(
      double g,
      double mu,
      double coherent,
      double kappa,
      double temperature,
      double length,
      double density,
      double coherence,
      double sySquared) {
    PairAverages a =
        PairEquilibrium.of(new CoupledPair(g, mu, coherent, kappa, temperature)).onRing(length);
    assertEquals(density, a.density(), 1e-8);
    assertEquals(coherence, a.coherence(), 1e-8);
    assertEquals(sySquared, a.sySquared(), 2e-8);
  }

  /** Gaps of the angular-momentum sectors M = 1, 2, 3, per length. */
  @ParameterizedTest
  @CsvSource({
    ".1, .15, .25, .10381193, .36367009, .75243674", ".05, .10, .1, .02788061, .11115124, .24875974"
  })
  void sectorGaps(
      double coherent, double kappa, double temperature, double one, double two, double three) {
    double unit = Math.cbrt(temperature);
    double energy = unit * unit;
    PairSolver solver = new PairSolver(1 / energy, coherent / energy, kappa, 10, 16, 3);
    double ground = solver.ground(0).energy;
    assertEquals(one, unit * (solver.ground(1).energy - ground), 1e-8);
    assertEquals(two, unit * (solver.ground(2).energy - ground), 1e-8);
    assertEquals(three, unit * (solver.ground(3).energy - ground), 1e-8);
  }

  @Test
  void longRingEqualsLine() {
    PairEquilibrium e = PairEquilibrium.of(new CoupledPair(1, 1, .1, 0, .5));
    assertEquals(e.averages().density(), e.onRing(40).density(), 5e-8);
    assertEquals(e.averages().coherence(), e.onRing(40).coherence(), 5e-8);
  }

  /**
   * Leading cutoff law against predictions and an exact sampler (Metropolised hybrid Monte Carlo in
   * mode space), both computed independently; the sampled columns carry their standard error. The
   * independent S_y prediction takes n at mu (same order); it is rebuilt here from our
   * numbers. The law leaves an error of higher order, bounded by the allowance, which is largest at
   * the lowest cutoff; without the correction J would be off by .2 to .003 here.
   */
  @ParameterizedTest
  @CsvSource({
    ".1, 0, .5, 40, 16, .92212, .39852, 1.5441, .89991, .00014, 1.40926, .00045, .03",
    ".1, 0, .5, 40, 32, .86743, .29339, 1.3906, .86382, .00021, 1.36347, .00072, .004",
    ".1, 0, .5, 40, 64, .84515, .25005, 1.3346, .84484, .00020, 1.32862, .00070, .0003",
    ".1, .15, .25, 32, 24, .97224, .77790, .82030, .96940, .00050, .81243, .00098, .003",
    ".1, .15, .25, 32, 48, .94923, .73131, .84848, .94882, .00016, .84653, .00031, .0005"
  })
  void cutoff(
      double coherent,
      double kappa,
      double temperature,
      double length,
      int modes,
      double density,
      double coherence,
      double sySquared,
      double sampledDensity,
      double sampledDensityError,
      double sampledSy,
      double sampledSyError,
      double allowance) {
    CoupledPair pair = new CoupledPair(1, 1, coherent, kappa, temperature);
    RingModes ring = new RingModes(length, modes);
    PairAverages a = PairEquilibrium.withCutoff(pair, ring);
    assertEquals(density, a.density(), 6e-6);
    assertEquals(coherence, a.coherence(), 1e-5);
    double missing = 2 * temperature / (Math.PI * ring.effectiveCutoff());
    double bare = PairEquilibrium.of(pair).onRing(length).density();
    assertEquals(
        sySquared, a.sySquared() + 4 * missing * (a.density() + missing - bare), 6e-5);
    assertEquals(sampledDensity, a.density(), allowance + 4 * sampledDensityError);
    assertEquals(sampledSy, a.sySquared(), allowance + 4 * sampledSyError);
    assertTrue(a.truncationError() > 0);
  }

  /** Hellmann-Feynman: derivatives of the free energy are the averages. */
  @Test
  void freeEnergyDerivatives() {
    CoupledPair p = new CoupledPair(1, 1, .1, .15, .25);
    PairAverages a = PairEquilibrium.of(p).averages();
    double h = 1e-3;
    double dMu = slope(p.withMu(1 + h), p.withMu(1 - h), h);
    double dJ = slope(p.withCoherentCoupling(.1 + h), p.withCoherentCoupling(.1 - h), h);
    double dKappa =
        slope(p.withBiquadraticCoupling(.15 + h), p.withBiquadraticCoupling(.15 - h), h);
    assertEquals(-2 * a.density(), dMu, 2e-6);
    assertEquals(-2 * a.coherence(), dJ, 2e-5);
    assertEquals(0.25 * a.sySquared(), dKappa, 2e-6);
  }

  private static double slope(CoupledPair up, CoupledPair down, double h) {
    return (PairEquilibrium.of(up).freeEnergyPerLength()
            - PairEquilibrium.of(down).freeEnergyPerLength())
        / (2 * h);
  }

  /** Uncoupled pair: every single-component quantity is that of the radial problem. */
  @Test
  void uncoupledPairIsTwoSingleComponents() {
    PairEquilibrium e = PairEquilibrium.of(new CoupledPair(1, .8, 0, 0, .3));
    SingleComponentEquilibrium s = SingleComponentEquilibrium.of(1, .8, .3);
    assertEquals(s.density(), e.averages().density(), 1e-8);
    assertEquals(s.secondOrderCoherence(), e.averages().secondOrderCoherence(), 1e-8);
    assertEquals(2 * s.freeEnergyPerLength(), e.freeEnergyPerLength(), 1e-9);
    assertEquals(s.fieldCorrelation().at(1.3), e.fieldCorrelation().at(1.3), 1e-7);
    assertEquals(
        s.fieldCorrelation().decayLength(), e.fieldCorrelation().decayLength(), 1e-7);
  }

  /** Ring trace of an uncoupled pair against the trace of the radial problem, many states. */
  @Test
  void uncoupledRing() {
    double length = 12;
    double unit = Math.cbrt(.3);
    RadialStates radial = RadialStates.of(.8 / (unit * unit), 8, 14, 0);
    double weight = 0;
    double square = 0;
    for (int m = 0; m <= 14; m++) {
      for (int k = 0; k < 8; k++) {
        double gap = radial.energy[m][k] - radial.energy[0][0];
        double w = (m == 0 ? 1 : 2) * Math.exp(-gap * length * unit);
        weight += w;
        square += w * radial.square[m][k * 8 + k];
      }
    }
    double amplitudeSquared = unit * unit;
    PairEquilibrium e = PairEquilibrium.of(new CoupledPair(1, .8, 0, 0, .3));
    double line = e.averages().density();
    assertEquals(amplitudeSquared * square / weight, e.onRing(length).density(), 2e-8);
    assertTrue(Math.abs(e.onRing(length).density() - line) > 1e-3);
  }

  @Test
  void refusals() {
    assertThrows(
        IllegalArgumentException.class, () -> new CoupledPair(1, Double.NaN, .1, .1, .1));
    assertThrows(
        IllegalArgumentException.class,
        () -> new CoupledPair(1, 1, .1, .1, Double.POSITIVE_INFINITY));
    assertThrows(IllegalArgumentException.class, () -> new CoupledPair(1, 1, -.1, .1, .1));
    CoupledPair cold = new CoupledPair(1, 1, .1, .1, 1e-3);
    assertThrows(IllegalArgumentException.class, () -> PairEquilibrium.of(cold));
    CoupledPair locked = new CoupledPair(1, 1, 200, 0, .01);
    assertThrows(IllegalArgumentException.class, () -> PairEquilibrium.of(locked));
    // S_y frozen by a huge kappa: needs more radial states than the largest basis has.
    CoupledPair stiff = new CoupledPair(1, 1, .1, 300, .1);
    assertThrows(UnconvergedException.class, () -> PairEquilibrium.of(stiff));
    PairEquilibrium e = PairEquilibrium.of(new CoupledPair(1, 1, .05, .1, .1));
    assertThrows(UnconvergedException.class, () -> e.onRing(0.5));
    assertThrows(IllegalArgumentException.class, () -> e.onRing(Double.NaN));
  }
}
