package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Table of the radial transfer operator: project's own derivation, see docs/theory-references.md,
 * computed independently with another basis and language. Method: Scalapino, Sears, Ferrell, Phys.
 * Rev. B 6, 3409 (1972); Castin et al., J. Mod. Opt. 47, 2671 (2000) (both from memory).
 */
class SingleComponentEquilibriumTest {

  @ParameterizedTest
  @CsvSource({
    "-4, 2.9430969091, .3281434387, 1.9685175902, .3282250984, .1590423960, .500124",
    "-2, 2.2040447774, .4216748029, 1.9396982366, .4220634849, .1986852156, .500461",
    "-1, 1.7436303802, .5058372203, 1.9070940697, .5069611546, .2308263706, .501111",
    "0, 1.1724145364, .6514777739, 1.8415805858, .6558671384, .2783595372, .503369",
    "0.5, .8187439764, .7705243060, 1.7845686983, .7805799713, .3100909988, .506525",
    "1, .3925315000, .9461095533, 1.7016282488, .9718132850, .3467047432, .513584",
    "2, -.8373390851, 1.5921340079, 1.4546838774, 1.7976599416, .4050047901, .564544",
    "3, -2.9313846596, 2.6315787504, 1.2378054416, 3.7215078929, .3622886926, .707087",
    "4, -6.1085474468, 3.7142397910, 1.1407216722, 6.2038796122, .2866842554, .835148",
    "5, -10.3462789183, 4.7570459556, 1.0966276556, 8.5056380060, .2432343426, .894004",
    "6, -15.6173695502, 5.7834342105, 1.0719856107, 10.6799432366, .2166626270, .923322",
    "8, -29.2204438545, 7.8167002056, 1.0457774272, 14.8903687346, .1833250700, .952472",
    "10, -46.8763317807, 9.8378468227, 1.0324144276, 19.0212310756, .1621632120, .966738"
  })
  void radialProblem(
      double alpha,
      double energy,
      double square,
      double g2,
      double coherence,
      double densityLength,
      double ratio) {
    double g = 0.7;
    double temperature = 0.3;
    double unit = Math.cbrt(g * temperature);
    SingleComponentEquilibrium e =
        SingleComponentEquilibrium.of(g, alpha * unit * unit, temperature);
    double a2 = Math.cbrt(temperature * temperature / g);
    assertEquals(energy, e.freeEnergyPerLength() / (temperature * unit), 1e-9);
    assertEquals(square, e.density() / a2, 1e-9 * square);
    assertEquals(g2, e.secondOrderCoherence(), 1e-9 * g2);
    double length = e.fieldCorrelation().decayLength();
    assertEquals(coherence, length * unit, 1e-9 * coherence);
    assertEquals(
        densityLength, e.densityCorrelation().decayLength() * unit, 1e-8 * densityLength);
    assertEquals(ratio, length * temperature / (2 * e.density()), 1e-6);
    assertTrue(e.truncationError() < 1e-9, () -> "truncation " + e.truncationError());
    assertEquals(alpha, e.alpha(), 1e-12);
  }

  /** Zero distance of both correlations is fixed by the averages: completeness of the basis. */
  @Test
  void sumRules() {
    SingleComponentEquilibrium e = SingleComponentEquilibrium.of(1, 1, 0.5);
    double n = e.density();
    assertEquals(n, e.fieldCorrelation().at(0), 1e-8 * n);
    assertEquals((e.secondOrderCoherence() - 1) * n * n, e.densityCorrelation().at(0), 1e-8);
  }

  /** Phase diffusion in the quasi-condensate: coherence length tends to 2 n/T from below. */
  @Test
  void quasiCondensateLimit() {
    SingleComponentEquilibrium e = SingleComponentEquilibrium.of(1, 1, 0.005);
    double ratio = e.fieldCorrelation().decayLength() * 0.005 / (2 * e.density());
    assertTrue(ratio > 0.99 && ratio < 1, () -> "ratio " + ratio);
  }

  @Test
  void refusals() {
    assertThrows(
        IllegalArgumentException.class, () -> SingleComponentEquilibrium.of(Double.NaN, 1, 1));
    assertThrows(
        IllegalArgumentException.class,
        () -> SingleComponentEquilibrium.of(1, Double.POSITIVE_INFINITY, 1));
    assertThrows(IllegalArgumentException.class, () -> SingleComponentEquilibrium.of(1, 1, 0));
    assertThrows(IllegalArgumentException.class, () -> SingleComponentEquilibrium.of(1, 1, 1e-5));
  }
}
