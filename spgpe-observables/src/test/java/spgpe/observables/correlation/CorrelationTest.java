package spgpe.observables.correlation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import spgpe.model.Model;
import spgpe.observables.Estimates;
import spgpe.observables.Fields;
import spgpe.observables.Samples;
import spgpe.observables.TimeAverage;
import spgpe.observables.density.AtomNumber;
import spgpe.observables.density.Current;
import spgpe.observables.density.Density;
import spgpe.observables.density.Momentum;
import spgpe.observables.spectrum.ModeAmplitude;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

class CorrelationTest {
  @Property(tries = 20, seed = "2026")
  void fourierSumsAgreeWithPlainLoops(@ForAll @IntRange(min = 0, max = 9999) int seed) {
    int points = 8 + seed % 7; // odd and even numbers of points
    Model model = Fields.latticePair(points, 5);
    Random random = new Random(seed);
    double[][] psi = new double[4][points];
    for (double[] part : psi) {
      for (int i = 0; i < points; i++) {
        part[i] = random.nextGaussian();
      }
    }
    Snapshot s =
        Fields.snapshot(
            model, 0,
            (c, x, v) -> {
              int i = (int) Math.rint(x / 5 * points);
              v[0] = psi[2 * c][i];
              v[1] = psi[2 * c + 1][i];
            });
    Observable a = Density.ofComponent(0);
    Observable b = Density.spin(Density.SpinAxis.Y);
    double[] va = Fields.measure(a, s);
    double[] vb = Fields.measure(b, s);
    double[] c = Fields.measure(SpatialCorrelation.between(a, b), s);
    double[] g = Fields.measure(SpatialCorrelation.firstOrder(1), s);
    assertEquals(points / 2 + 3, c.length);
    for (int r = 0; r <= points / 2; r++) {
      double real = 0;
      double complex = 0;
      for (int y = 0; y < points; y++) {
        int ahead = (y + r) % points;
        int behind = (y - r + points) % points;
        real += va[y] * (vb[ahead] + vb[behind]) / 2;
        complex += psi[2][y] * psi[2][ahead] + psi[3][y] * psi[3][ahead];
      }
      assertEquals(real / points, c[r], 1e-11);
      assertEquals(complex / points, g[r], 1e-11);
    }
    double sum = 0;
    for (double value : vb) {
      sum += value;
    }
    assertEquals(sum / points, c[points / 2 + 2], 1e-12);
  }

  @Test
  void currentsOfPlaneWaves() {
    Model model = Fields.pair(8, 12);
    double k = 2 * Math.PI / 12;
    // psi_1 = exp(2ikx) + 0.5 exp(-ikx): j = 2k + 0.25(-k) + 0.5 k cos 3kx ; psi_2 = 2 exp(ikx)
    Snapshot s =
        Fields.snapshot(
            model, 0,
            (c, x, v) -> {
              v[0] = c == 0 ? Math.cos(2 * k * x) + 0.5 * Math.cos(k * x) : 2 * Math.cos(k * x);
              v[1] = c == 0 ? Math.sin(2 * k * x) - 0.5 * Math.sin(k * x) : 2 * Math.sin(k * x);
            });
    double[] j1 = Fields.measure(Current.ofComponent(0, 0), s);
    double[] total = Fields.measure(Current.total(0), s);
    double[] spin = Fields.measure(Current.spin(0), s);
    for (int i = 0; i < j1.length; i++) {
      double x = model.region().grid().coordinate(0, i);
      double expected = k * (1.75 + 0.5 * Math.cos(3 * k * x));
      assertEquals(expected, j1[i], 1e-12);
      assertEquals(expected + 4 * k, total[i], 1e-12);
      assertEquals(expected - 4 * k, spin[i], 1e-12);
    }
    assertEquals(12 * 1.75 * k, Fields.measure(Momentum.ofComponent(0), s)[0], 1e-11);
    assertEquals(12 * 5.75 * k, Fields.measure(Momentum.total(), s)[0], 1e-11);
  }

  @Test
  void fitFindsExactCurves() {
    double[] x = new double[20];
    double[] ring = new double[20];
    double[] exponential = new double[20];
    double[][] covariance = new double[20][20];
    for (int i = 0; i < 20; i++) {
      x[i] = 0.5 * i;
      ring[i] = 3 * Math.cosh((10 - x[i]) / 2.5) / Math.cosh(10 / 2.5);
      exponential[i] = 3 * Math.exp(-x[i] / 2.5);
      for (int j = 0; j < 20; j++) {
        covariance[i][j] = 1e-6 * Math.exp(-Math.abs(i - j) / 4.0);
      }
    }
    CorrelationFunction onRing =
        CorrelationFunction.of(x, Estimates.of(ring, covariance, 1000), 20);
    CorrelationLength fit = CorrelationLength.hyperbolicCosine(onRing, 0, 10);
    assertEquals(2.5, fit.length().value(), 1e-7);
    assertEquals(3, fit.amplitude().value(), 1e-7);
    assertEquals(0, fit.chiSquare(), 1e-8);
    assertEquals(20, fit.points());
    CorrelationLength plain =
        CorrelationLength.hyperbolicCosine(
            onRing, 0, 10, CorrelationLength.Weighting.COVARIANCE);
    assertEquals(2.5, plain.length().value(), 1e-7);
    CorrelationFunction onLine =
        CorrelationFunction.of(
            x, Estimates.of(exponential, covariance, 1000), Double.POSITIVE_INFINITY);
    assertEquals(2.5, CorrelationLength.exponential(onLine, 1, 9).length().value(), 1e-7);
    String period =
        Fields.refusal(() -> CorrelationLength.hyperbolicCosine(onLine, 0, 10));
    assertTrue(period.contains("needs a ring"), period);
    assertTrue(
        Fields.refusal(() -> CorrelationLength.exponential(onLine, 1, 1.6))
            .contains("distances=2"));
    CorrelationFunction poor =
        CorrelationFunction.of(x, Estimates.of(ring, covariance, 22), 20);
    assertTrue(
        Fields.refusal(
                () ->
                    CorrelationLength.hyperbolicCosine(
                        poor, 0, 10, CorrelationLength.Weighting.COVARIANCE))
            .contains("trajectories=22"));
  }

  @Test
  void errorOfTheFitIsRight() {
    // 400 synthetic data sets with correlated errors; the scatter of the length must agree with the
    // error quoted. Ratio of variances has relative standard deviation sqrt(2/399) = 0.07: 4 sigma
    // are 0.28, false-alarm probability 6e-5; it sees an error wrong by a quarter.
    double[] x = new double[8];
    double[] exact = new double[8];
    double[][] root = new double[8][8];
    double[][] covariance = new double[8][8];
    for (int i = 0; i < 8; i++) {
      x[i] = 0.4 * i;
      exact[i] = 2 * Math.exp(-x[i]);
      for (int j = 0; j <= i; j++) {
        root[i][j] = 0.01 / (1 + 2 * (i - j));
      }
    }
    for (int i = 0; i < 8; i++) {
      for (int j = 0; j < 8; j++) {
        for (int m = 0; m < 8; m++) {
          covariance[i][j] += root[i][m] * root[j][m];
        }
      }
    }
    Random random = new Random(3);
    for (CorrelationLength.Weighting weighting : CorrelationLength.Weighting.values()) {
      double sum = 0;
      double quoted = 0;
      double chi = 0;
      for (int run = 0; run < 400; run++) {
        double[] y = exact.clone();
        for (int m = 0; m < 8; m++) {
          double z = random.nextGaussian();
          for (int i = 0; i < 8; i++) {
            y[i] += root[i][m] * z;
          }
        }
        CorrelationLength fit =
            CorrelationLength.exponential(
                CorrelationFunction.of(
                    x, Estimates.of(y, covariance, 1_000_000), Double.POSITIVE_INFINITY),
                0, 3, weighting);
        sum += Math.pow(fit.length().value() - 1, 2) / 400;
        quoted += Math.pow(fit.length().standardError(), 2) / 400;
        chi += fit.chiSquare() / 400;
      }
      assertEquals(1, sum / quoted, 0.28, weighting.name());
      if (weighting == CorrelationLength.Weighting.COVARIANCE) {
        assertEquals(6, chi, 4 * Math.sqrt(12.0 / 400)); // mean of chi-square with 6 degrees
      }
    }
  }

  @Test
  void timeCorrelationOfARotatingDecayingMode() {
    // AR(1) process z' = r z + noise with r = 0.9 exp(0.5i): C(l) = r^l, variance 1
    double[] times = new double[400];
    for (int i = 0; i < times.length; i++) {
      times[i] = 0.25 * i;
    }
    double reR = 0.9 * Math.cos(0.5);
    double imR = 0.9 * Math.sin(0.5);
    Random random = new Random(4);
    List<TemporalCorrelation> parts = new ArrayList<>();
    double step = Math.sqrt((1 - 0.81) / 2);
    for (int t = 0; t < 300; t++) {
      TemporalCorrelation c = TemporalCorrelation.complex(6, 0).create(times, 2);
      double re = random.nextGaussian() * Math.sqrt(0.5);
      double im = random.nextGaussian() * Math.sqrt(0.5);
      for (int i = 0; i < times.length; i++) {
        c.add(i, new double[] {re, im});
        double next = reR * re - imR * im + step * random.nextGaussian();
        im = reR * im + imR * re + step * random.nextGaussian();
        re = next;
      }
      c.finish(Samples.ended(100));
      parts.add(c);
    }
    TemporalCorrelation all = Samples.merged(parts);
    CorrelationFunction real = all.raw(0);
    CorrelationFunction imaginary = all.raw(1);
    assertEquals(0.5, real.distance(2), 1e-14);
    for (int lag = 0; lag <= 6; lag++) { // 14 checks at 4 sigma: false alarm 9e-4; errors 0.01
      double size = Math.pow(0.9, lag);
      assertTrue(real.standardError(lag) < 0.015);
      assertEquals(size * Math.cos(0.5 * lag), real.value(lag), 4 * real.standardError(lag));
      if (lag > 0) {
        assertEquals(
            size * Math.sin(0.5 * lag), imaginary.value(lag), 4 * imaginary.standardError(lag));
      }
    }
  }

  @Test
  void timeCorrelationCountsAndConnects() {
    double[] times = {0, 1, 2, 3, 4, 5};
    List<TemporalCorrelation> parts = new ArrayList<>();
    for (int t = 0; t < 2; t++) {
      TemporalCorrelation c = TemporalCorrelation.real(2, 1).create(times, 1);
      for (int i = 0; i < 6; i++) {
        c.add(i, new double[] {i + 10.0 * t});
      }
      c.finish(Samples.ended(5));
      parts.add(c);
    }
    TemporalCorrelation both = Samples.merged(parts);
    // origins 1, 2, 3 (lag 2 must fit) and 11, 12, 13
    double lag2 = (1 * 3 + 2 * 4 + 3 * 5 + 11 * 13 + 12 * 14 + 13 * 15) / 6.0;
    assertEquals(lag2, both.raw(0).value(2), 1e-12);
    assertEquals(lag2 - 49, both.connected(0).value(2), 1e-12);
    assertTrue(
        Fields.refusal(() -> TemporalCorrelation.real(2, 0).create(new double[] {0, 1, 3}, 1))
            .contains("equally spaced"));
    assertTrue(
        Fields.refusal(() -> TemporalCorrelation.complex(2, 0).create(times, 3)).contains("pairs"));
  }

  @Test
  void naturalModesOfAPartlyCondensedField() {
    // a_i = sqrt(N0) exp(i theta) phi_i + thermal; theta random: a condensate without mean field
    int modes = 6;
    double[] phi = {0.6, 0, 0.64, 0, 0.48, 0};
    Random random = new Random(5);
    List<OneBodyMatrix> parts = new ArrayList<>();
    int samples = 4000;
    for (int s = 0; s < samples; s++) {
      OneBodyMatrix one = new OneBodyMatrix(new double[] {0}, 2 * modes);
      double theta = 2 * Math.PI * random.nextDouble();
      double[] a = new double[2 * modes];
      for (int i = 0; i < modes; i++) {
        double turned = theta + 0.3 * i; // the mode is complex
        a[2 * i] = 10 * phi[i] * Math.cos(turned) + random.nextGaussian() * Math.sqrt(0.5);
        a[2 * i + 1] = 10 * phi[i] * Math.sin(turned) + random.nextGaussian() * Math.sqrt(0.5);
      }
      one.add(0, a);
      one.finish(Samples.ended(0));
      parts.add(one);
    }
    OneBodyMatrix matrix = Samples.merged(parts);
    NaturalModes natural = matrix.naturalModes();
    // exact: 101, then five times 1. Error of the largest about sqrt(2*100+1)/sqrt(4000) = 0.22
    assertEquals(101, natural.occupation(0), 0.9);
    assertEquals(101.0 / 106, natural.condensateFraction(), 0.002);
    double overlapRe = 0;
    double overlapIm = 0;
    for (int i = 0; i < modes; i++) {
      overlapRe +=
          phi[i] * (Math.cos(0.3 * i) * natural.re(0)[i] + Math.sin(0.3 * i) * natural.im(0)[i]);
      overlapIm +=
          phi[i] * (Math.cos(0.3 * i) * natural.im(0)[i] - Math.sin(0.3 * i) * natural.re(0)[i]);
    }
    assertEquals(1, Math.hypot(overlapRe, overlapIm), 2e-5);
    for (int i = 1; i < modes; i++) {
      assertEquals(1, natural.occupation(i), 0.12);
    }
    // eigenvector equation M v = n v for every natural mode, and orthonormality
    for (int e = 0; e < modes; e++) {
      for (int i = 0; i < modes; i++) {
        double re = 0;
        double im = 0;
        for (int j = 0; j < modes; j++) {
          re += matrix.re(i, j) * natural.re(e)[j] - matrix.im(i, j) * natural.im(e)[j];
          im += matrix.re(i, j) * natural.im(e)[j] + matrix.im(i, j) * natural.re(e)[j];
        }
        assertEquals(natural.occupation(e) * natural.re(e)[i], re, 1e-9);
        assertEquals(natural.occupation(e) * natural.im(e)[i], im, 1e-9);
      }
    }
  }

  @Test
  void naturalModesOfFewerSamplesThanModes() {
    OneBodyMatrix one = new OneBodyMatrix(new double[] {0}, 40);
    double[] a = new double[40];
    a[6] = 3;
    a[9] = 4;
    one.add(0, a);
    one.finish(Samples.ended(0));
    NaturalModes natural = one.naturalModes();
    assertEquals(25, natural.occupation(0), 1e-12);
    assertEquals(1, natural.condensateFraction(), 1e-12);
    assertEquals(0.8, Math.hypot(natural.re(0)[4], natural.im(0)[4]), 1e-12);
  }

  @Test
  void misuseIsNamed() {
    Model model = Fields.latticePair(16, 5);
    SpatialCorrelation first = SpatialCorrelation.firstOrder(0);
    TimeAverage wrong = new TimeAverage(new double[] {0}, 3);
    assertTrue(Fields.refusal(() -> first.raw(wrong, model)).contains("numbers of the average=3"));
    assertTrue(Fields.refusal(() -> first.connected(wrong, model)).contains("no means"));
    assertTrue(
        Fields.refusal(() -> SpatialCorrelation.of(AtomNumber.total()).size(model))
            .contains("numbers=1, points=16"));
    assertTrue(
        Fields.refusal(() -> ModeAmplitude.of(0, 40).size(model)).contains("nx=40"));
    assertTrue(
        Fields.refusal(() -> new OneBodyMatrix(new double[] {0}, 3)).contains("numbers=3"));
    OneBodyMatrix empty = new OneBodyMatrix(new double[] {0}, 4);
    assertThrows(IllegalStateException.class, empty::naturalModes);
  }
}
