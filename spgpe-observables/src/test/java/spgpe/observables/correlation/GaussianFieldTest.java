package spgpe.observables.correlation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.model.Model;
import spgpe.observables.Estimates;
import spgpe.observables.Fields;
import spgpe.statistics.Estimate;
import spgpe.observables.Samples;
import spgpe.observables.TimeAverage;
import spgpe.observables.density.AtomNumber;
import spgpe.observables.density.NumberFluctuation;
import spgpe.observables.phase.RelativePhase;
import spgpe.observables.spectrum.ModeOccupation;
import spgpe.observables.spectrum.StructureFactor;
import spgpe.reservoir.Reservoir;

/**
 * Estimators on Gaussian fields whose correlations are known exactly. All seeds are fixed. A value
 * passes within 4 standard errors: false-alarm probability 6e-5 for each of the about 60 values,
 * 0.4 % for the class with another seed. The errors printed beside each check are what it can see.
 */
class GaussianFieldTest {
  private static final int SAMPLES = 3000;

  private static void assertWithin4(double expected, double value, double error, double largest) {
    assertTrue(error > 0 && error < largest, "error " + error + " must be below " + largest);
    assertEquals(expected, value, 4 * error);
  }

  /** Ideal gas: L = 40, N = 128 modes, T = 1, mu = -1/2; mode sums derived, see docs/theory.md. */
  @Test
  void idealGas() {
    Model model =
        Model.of(Fields.ring(128, 40), Hamiltonian.ofMasses(1), Reservoir.of(1, -0.5, 0.1));
    SpatialCorrelation first = SpatialCorrelation.firstOrder(0);
    SpatialCorrelation second = SpatialCorrelation.secondOrder(0);
    StructureFactor structure = StructureFactor.ofDensity();
    ModeOccupation occupation = ModeOccupation.ofComponent(0);
    NumberFluctuation number = NumberFluctuation.of(AtomNumber.total(), 37);
    List<TimeAverage> averages =
        Samples.average(
            model, SAMPLES, Samples.complexGaussian(model, k -> 1 / (k * k / 2 + 0.5), 11),
            first, second, structure, occupation, number);

    CorrelationFunction g1 = first.relativeToZero(averages.get(0), model);
    assertEquals(1, g1.value(0));
    assertEquals(0, g1.standardError(0), 1e-12);
    for (int i = 4; i <= 32; i += 4) {
      assertWithin4(modeSum(g1.distance(i)), g1.value(i), g1.standardError(i), 0.005);
    }
    assertEquals(0.0071369, modeSum(5), 5e-8);
    assertEquals(5, g1.distance(16), 1e-12);

    CorrelationFunction g2 = second.relativeToMeans(averages.get(1), model);
    assertWithin4(2, g2.value(0), g2.standardError(0), 0.01);
    for (int i = 2; i <= 12; i += 5) { // Wick: g2 = 1 + |g1|^2
      double g = modeSum(g2.distance(i));
      assertWithin4(1 + g * g, g2.value(i), g2.standardError(i), 0.01);
    }
    CorrelationFunction connected = second.connected(averages.get(1), model);
    double n = modeSum(0) == 1 ? 0.9368793645283287 : Double.NaN;
    assertWithin4(n * n, connected.value(0), connected.standardError(0), 0.02);

    // Wick sums sum_q n_q n_(q+k) / sum_q n_q over the 128 modes, n = 1..5
    double[] wick = {1.06038894, 1.04123087, 1.01079362, 0.97105247, 0.92432605};
    Estimates s = structure.values(averages.get(2));
    for (int k = 1; k <= 5; k++) {
      assertWithin4(wick[k - 1], s.value(k), s.standardError(k), 0.03);
    }
    assertWithin4(1.06693255, s.value(0), s.standardError(0), 0.04);
    assertEquals(2 * Math.PI * 3 / 40, structure.waveNumbers(model)[3], 1e-14);

    for (int m = 0; m < 128; m += 9) {
      double k = model.region().waveNumber(0, m);
      double expected = 1 / (k * k / 2 + 0.5);
      assertWithin4(
          expected, averages.get(3).mean(m), averages.get(3).standardError(m), 0.03 * expected);
    }
    Estimate variance = number.variance(averages.get(4));
    // var N = sum n_q^2 = 1.06693255 <N>
    assertWithin4(1.06693255 * 40 * n, variance.value(), variance.standardError(), 1.5);
    assertWithin4(40 * n, number.mean(averages.get(4)).value(),
        number.mean(averages.get(4)).standardError(), 0.15);
  }

  private static double modeSum(double x) {
    double sum = 0;
    double all = 0;
    for (int n = -64; n < 64; n++) {
      double k = 2 * Math.PI * n / 40;
      double occupation = 1 / (k * k / 2 + 0.5);
      sum += occupation * Math.cos(k * x);
      all += occupation;
    }
    return sum / all;
  }

  /** Gaussian relative phase, m = 0.7, n0 = 1, T = 0.1, L = 40, N = 128; sums derived. */
  @Test
  void gaussianRelativePhase() {
    Model model = Fields.latticePair(128, 40);
    SpatialCorrelation deviation = SpatialCorrelation.phaseDeviation(Math.PI);
    SpatialCorrelation difference = SpatialCorrelation.phaseDifference();
    SpatialCorrelation cosine = SpatialCorrelation.cosine();
    SpatialCorrelation coherence = SpatialCorrelation.coherence();
    List<TimeAverage> averages =
        Samples.average(
            model, 1500,
            Samples.gaussianPhase(model, k -> 0.1 / (0.5 * (k * k + 0.49)), Math.PI, 12),
            deviation, difference, cosine, RelativePhase.meanCosine(), coherence);
    CorrelationFunction c = deviation.raw(averages.get(0), model);
    assertWithin4(0.13653452, c.value(0), c.standardError(0), 0.001);
    // the mode sum is the ring formula (2T/n0) cosh(m(L/2-x))/(2m sinh(mL/2)) up to the cutoff
    for (int i = 8; i <= 40; i += 8) {
      double x = c.distance(i);
      double ring = 0.2 * Math.cosh(0.7 * (20 - x)) / (1.4 * Math.sinh(14));
      assertWithin4(ring, c.value(i), c.standardError(i), 0.001);
    }
    CorrelationFunction d = difference.raw(averages.get(1), model);
    assertEquals(1, d.value(0), 1e-12);
    assertWithin4(0.87614313, d.value(16), d.standardError(16), 0.002);
    CorrelationFunction cc = cosine.raw(averages.get(2), model);
    assertWithin4(0.87238430, cc.value(16), cc.standardError(16), 0.002);
    assertWithin4(
        -0.93401082, averages.get(3).mean(0), averages.get(3).standardError(0), 0.001);
    CorrelationFunction x = coherence.raw(averages.get(4), model);
    assertEquals(d.value(16), x.value(16), 1e-9); // |psi| = 1: X is the phase factor

    // 1/m = 1.428571; the fit sees a wrong length (for example 1/(2m)) at once. Below x = 1 the
    // cutoff shows.
    CorrelationLength fit =
        CorrelationLength.hyperbolicCosine(c, 1.2, 6, CorrelationLength.Weighting.COVARIANCE);
    assertWithin4(1 / 0.7, fit.length().value(), fit.length().standardError(), 0.04);
    // chi-square of 14 degrees of freedom beyond 36.1 has probability 1e-3
    assertEquals(14, fit.degreesOfFreedom());
    CorrelationLength robust = CorrelationLength.hyperbolicCosine(c, 1.2, 6);
    assertWithin4(1 / 0.7, robust.length().value(), robust.length().standardError(), 0.06);
    assertTrue(robust.length().standardError() >= fit.length().standardError());
    assertTrue(fit.chiSquare() < 36.1 && fit.chiSquare() > 2, "chi2 " + fit.chiSquare());
  }
}
