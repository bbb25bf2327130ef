package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Sine-Gordon rows: the characteristic values agree with Abramowitz and Stegun, table 20.1 (from
 * memory; see MathieuTest); the averages are derived, see docs/theory-references.md.
 */
class PhaseEquilibriumTest {

  @ParameterizedTest
  @CsvSource({
    ".25, -.0310393955, 3.9947930786, 4.0258290846, .1233270245, .50287336, .9935833211,"
        + " .9859821731",
    "1, -.4551386041, 3.9170247730, 4.3713009827, .4179990382, .53608218, .9148788952,"
        + " .8287682728",
    "2, -1.5139568851, 3.6722327065, 5.1726651334, .6123370339, .58989815, .7712791693,"
        + " .5982093782",
    "5, -5.8000460209, 2.0994604455, 7.4491097395, .7734833382, .68398149, .5063607476,"
        + " .3019060288",
    "10, -13.9369799567, -2.3821582360, 7.7173698498, .8414990270, .75231514, .3461758300,"
        + " .1847203927",
    "25, -40.2567795466, -21.3148606222, -3.5221647272, .8999261512, .82837406, .2111718467,"
        + " .1088891232",
    "40, -67.6061522370, -43.3522748850, -20.2079408280, .9209079498, .85983293, .1649220841,"
        + " .0843913701"
  })
  void sineGordon(
      double q,
      double a0,
      double b2,
      double a2,
      double cosine,
      double cosineSquared,
      double sineLength,
      double cosineLength) {
    double n = 1.7;
    double temperature = 0.4;
    double coherent = q * temperature * temperature / (4 * n * n);
    PhaseEquilibrium e = PhaseEquilibrium.of(n, coherent, 0, temperature);
    assertEquals(a0, Mathieu.evenValue(0, q), 1.1e-10);
    assertEquals(b2, Mathieu.oddValue(2, q), 1.1e-10);
    assertEquals(a2, Mathieu.evenValue(2, q), 1.1e-10);
    assertEquals(a0, e.freeEnergyPerLength() * 4 * n / (temperature * temperature), 1e-9);
    assertEquals(cosine, e.meanCosine(), 1e-10);
    assertEquals(cosineSquared, e.meanCosineSquared(), 1e-8);
    assertEquals(sineLength, e.sineCorrelation().decayLength() * temperature / n, 1e-10);
    assertEquals(cosineLength, e.cosineCorrelation().decayLength() * temperature / n, 1e-10);
    assertEquals(1 - e.meanCosineSquared(), e.sineCorrelation().at(0), 1e-10);
    assertEquals(
        e.meanCosineSquared() - cosine * cosine, e.cosineCorrelation().at(0), 1e-9);
  }

  /**
   * With the biquadratic term: phase-only against the exact four-dimensional transfer operator
   * (g = mu = 1), both computed independently; derived, see docs/theory-references.md. The exact
   * columns of the first row are ours: {@link #truncatedBasis} explains why.
   */
  @ParameterizedTest
  @CsvSource({
    ".05, .1, .01, 1.0445039363, .9915660507, 1.281289323, .99391469, 1.2818408, 1.270001",
    ".05, .1, .05, 1.02168490, .95521983, 1.33274440, .96876249, 1.3335871, 1.270001",
    ".05, .1, .10, .99076884, .90207943, 1.41887594, .93518085, 1.4111979, 1.270001",
    ".01, .02, .02, .99932366, .96505817, 3.00383244, .97064226, 3.0108566, 2.877177",
    ".01, .02, .10, .95157450, .76570829, 3.94022469, .82477610, 3.9183256, 2.877177"
  })
  void biquadratic(
      double coherent,
      double kappa,
      double temperature,
      double density,
      double coherence,
      double exactLength,
      double cosine,
      double length,
      double inverseMass) {
    CoupledPair pair = new CoupledPair(1, 1, coherent, kappa, temperature);
    PhaseEquilibrium phase = PhaseEquilibrium.of(pair);
    assertEquals(cosine, phase.meanCosine(), 1e-8);
    assertEquals(length, phase.sineCorrelation().decayLength(), 1e-7);
    assertEquals(
        inverseMass, 1 / GaussianFluctuations.of(pair, Vacuum.TRUE).mass(), 1e-6);
    PairEquilibrium exact = PairEquilibrium.of(pair);
    assertEquals(density, exact.averages().density(), 1e-8);
    assertEquals(coherence, exact.averages().relativeCoherence(), 1e-8);
    assertEquals(exactLength, exact.syCorrelation().decayLength(), 1e-8);
  }

  /**
   * The independent row at T = .01 (n = 1.04450385, J/n = .99156582, length 1.28125153) is that of
   * a basis cut at angular momentum 24; the converged values differ from it by 8e-8 to 4e-5.
   */
  @Test
  void truncatedBasis() {
    double unit = Math.cbrt(.01);
    PairSolver cut = new PairSolver(1 / (unit * unit), .05 / (unit * unit), .1, 8, 24, 1);
    PairSolver.State ground = cut.ground(0);
    PairAverages a = cut.averages(0, ground.vector);
    assertEquals(1.04450385, a.density() * unit * unit, 6e-9);
    assertEquals(.99156582, a.relativeCoherence(), 6e-9);
    double length =
        cut.correlation(PairSolver.Channel.IMAGINARY_COHERENCE, ground).decayLength() / unit;
    assertEquals(1.28125153, length, 6e-9);
  }

  @Test
  void refusals() {
    assertThrows(IllegalArgumentException.class, () -> PhaseEquilibrium.of(1, 0, .1, .1));
    assertThrows(IllegalArgumentException.class, () -> PhaseEquilibrium.of(1, .1, .1, 1e-9));
    assertThrows(
        IllegalArgumentException.class, () -> PhaseEquilibrium.of(1, .1, Double.NaN, .1));
    assertTrue(PhaseEquilibrium.of(1, .1, .1, .01).truncationError() < 1e-11);
  }
}
