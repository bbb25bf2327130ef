package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/**
 * Equilibrium of the ideal gas: n_k = T/(eps_k - mu), |a_k|^2 exponential (Blakie et al., Adv.
 * Phys. 57, 363 (2008)). Samples are at least 5 slowest amplitude times apart, 64 x 250 = 16000 of
 * them, so practically independent.
 */
class IdealGasTest {
  private static final int LANES = 64;
  private static final int SAMPLES = 250;
  private static final double T = 2;
  private static final double MU = -0.5;

  private static Model model(double... gammas) {
    return Model.of(
        Projector.modesUpTo(3).on(PeriodicGrid.of(Axis.holdingModes(3, 2 * Math.PI))),
        Hamiltonian.ofMasses(1),
        Reservoir.of(T, MU, 0).withDampings(gammas));
  }

  /** |a|^2 of each mode (first index) in samples. */
  private static double[][] occupations(
      Model model, Integrator scheme, RandomStreams streams, int stride) {
    NoiseGenerator noise = streams.generator(model.region(), 1, LANES);
    for (int lane = 0; lane < LANES; lane++) {
      noise.assign(lane, lane);
    }
    Stepper stepper = scheme.bind(model, noise, LANES);
    Amplitudes state = new Amplitudes(model.region(), 1, LANES);
    stepper.start(state, 0);
    int modes = model.region().modes();
    double[][] samples = new double[modes][LANES * SAMPLES];
    for (int s = 0; s < SAMPLES; s++) {
      for (int i = 0; i < stride; i++) {
        stepper.advance();
      }
      stepper.observe(state);
      for (int m = 0; m < modes; m++) {
        for (int lane = 0; lane < LANES; lane++) {
          double re = state.re(0)[m * LANES + lane];
          double im = state.im(0)[m * LANES + lane];
          samples[m][s * LANES + lane] = re * re + im * im;
        }
      }
    }
    return samples;
  }

  /**
   * Mean, second moment and Kolmogorov-Smirnov statistic against the exponential law for each of 7
   * modes. False alarm: 4.5 sigma for the moments (7e-6 each), 2.3 for KS (5e-5 each), 4e-4 in all.
   * Power: standard error of the mean 0.8 %, so a temperature off by 4 % is seen.
   */
  private static void requireThermal(double[][] samples, Model model, double[] factor) {
    double n = LANES * SAMPLES;
    for (int m = 0; m < samples.length; m++) {
      double expected = T / (model.region().kSquared(m) / 2 - MU) * factor[m];
      double mean = Arrays.stream(samples[m]).average().orElseThrow();
      double square = Arrays.stream(samples[m]).map(x -> x * x).average().orElseThrow();
      assertEquals(1, mean / expected, 4.5 / Math.sqrt(n), "mode " + m);
      // standard deviation of x^2 of the exponential law: sqrt(24 - 4)
      assertEquals(
          2, square / (expected * expected), 4.5 * Math.sqrt(20 / n), "mode " + m);
      Arrays.sort(samples[m]);
      double largest = 0;
      for (int i = 0; i < n; i++) {
        double law = 1 - Math.exp(-samples[m][i] / expected);
        largest = Math.max(largest, Math.max(law - i / n, (i + 1) / n - law));
      }
      assertTrue(largest * Math.sqrt(n) < 2.3, "KS=" + largest * Math.sqrt(n) + ", mode " + m);
    }
  }

  private static double[] ones(int n) {
    double[] ones = new double[n];
    Arrays.fill(ones, 1);
    return ones;
  }

  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void defaultSchemeIsExactAtAnyStep(boolean counterBased) {
    Model model = model(2);
    RandomStreams streams =
        counterBased ? RandomStreams.counterBased(21) : RandomStreams.commonsRng(21);
    double[][] samples = occupations(model, OuRk4.ofStep(2), streams, 5);
    requireThermal(samples, model, ones(samples.length));
  }

  /** Half kicks give the occupations x coth x T/(eps - mu), x = gamma (eps - mu) dt. */
  @Test
  void halfKicksHaveTheirKnownBias() {
    Model model = model(1);
    double dt = 0.25;
    double[] factor = ones(model.region().modes());
    for (int m = 0; m < factor.length; m++) {
      double x = (model.region().kSquared(m) / 2 - MU) * dt;
      factor[m] = x / Math.tanh(x); // up to 1.42
    }
    requireThermal(
        occupations(model, Rk4Ip.ofStep(dt), RandomStreams.counterBased(22), 40), model, factor);
  }

  /** C(t) = exp[-(i + gamma)(eps - mu) t]; standard error 0.8 %, limit 4.5 of them. */
  @Test
  void correlationFunctionInTime() {
    double gamma = 0.2;
    double t = 0.8;
    Model model = model(gamma);
    NoiseGenerator noise = RandomStreams.counterBased(23).generator(model.region(), 1, LANES);
    int modes = model.region().modes();
    double[] re = new double[modes];
    double[] im = new double[modes];
    int count = 0;
    for (int lane = 0; lane < LANES; lane++) {
      noise.assign(lane, lane);
    }
    Stepper stepper = OuRk4.ofStep(t).bind(model, noise, LANES);
    Amplitudes before = new Amplitudes(model.region(), 1, LANES);
    Amplitudes after = before.copy();
    stepper.start(before, 0);
    for (int s = 0; s < SAMPLES; s++) {
      for (int i = 0; i < 25; i++) {
        stepper.advance();
      }
      stepper.observe(before);
      stepper.advance();
      stepper.observe(after);
      for (int m = 0; m < modes; m++) {
        double n = T / (model.region().kSquared(m) / 2 - MU);
        for (int i = m * LANES; i < (m + 1) * LANES; i++) {
          re[m] += (before.re(0)[i] * after.re(0)[i] + before.im(0)[i] * after.im(0)[i]) / n;
          im[m] += (before.re(0)[i] * after.im(0)[i] - before.im(0)[i] * after.re(0)[i]) / n;
        }
      }
      count += LANES;
    }
    for (int m = 0; m < modes; m++) {
      double w = model.region().kSquared(m) / 2 - MU;
      double tolerance = 4.5 / Math.sqrt(count);
      double size = Math.exp(-gamma * w * t);
      assertEquals(size * Math.cos(w * t), re[m] / count, tolerance);
      assertEquals(-size * Math.sin(w * t), im[m] / count, tolerance);
    }
  }

  /**
   * Two coupled ideal components: covariance T h^-1 whatever the dampings, here 0.3 and 3. Standard
   * errors 0.8 %; 4.5 of them (false alarm 2e-5). Detailed balance lost by mixing up the dampings
   * would shift the populations by tens of percent.
   */
  @Test
  void coupledComponentsForgetTheirDampings() {
    double coupling = 0.6;
    double mu = -1;
    Model model =
        Model.of(
            Projector.keeping("only k = 0", (nx, ny) -> nx == 0 ? 1 : 0)
                .on(PeriodicGrid.of(Axis.of(4, 1))),
            Hamiltonian.ofMasses(1, 1).with(CoherentCoupling.constant(coupling)),
            Reservoir.of(T, mu, 0).withDampings(0.3, 3));
    NoiseGenerator noise = RandomStreams.counterBased(24).generator(model.region(), 2, LANES);
    for (int lane = 0; lane < LANES; lane++) {
      noise.assign(lane, lane);
    }
    Stepper stepper = OuRk4.ofStep(3).bind(model, noise, LANES);
    Amplitudes a = new Amplitudes(model.region(), 2, LANES);
    stepper.start(a, 0);
    double first = 0;
    double second = 0;
    double cross = 0;
    double crossIm = 0;
    for (int s = 0; s < SAMPLES; s++) {
      for (int i = 0; i < 8; i++) {
        stepper.advance();
      }
      stepper.observe(a);
      for (int lane = 0; lane < LANES; lane++) {
        double x = a.re(0)[lane];
        double y = a.im(0)[lane];
        double u = a.re(1)[lane];
        double v = a.im(1)[lane];
        first += x * x + y * y;
        second += u * u + v * v;
        cross += x * u + y * v;
        crossIm += x * v - y * u;
      }
    }
    double n = LANES * SAMPLES;
    double determinant = mu * mu - coupling * coupling;
    double diagonal = -mu * T / determinant;
    double error = 4.5 * diagonal / Math.sqrt(n);
    assertEquals(diagonal, first / n, error);
    assertEquals(diagonal, second / n, error);
    assertEquals(coupling * T / determinant, cross / n, error);
    assertEquals(0, crossIm / n, error);
  }
}
