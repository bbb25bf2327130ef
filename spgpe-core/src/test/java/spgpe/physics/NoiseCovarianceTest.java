package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;

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
import spgpe.internal.linear.ComplexMatrix;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/**
 * Covariance of the noise of one step, from an empty field, by 64 lanes x 400 steps x 11 modes =
 * 281600 complex numbers for each component. Every estimate is compared at 4.5 standard errors
 * (false alarm 7e-6 each, 2e-4 for the class). The relative standard error of a variance is 0.19 %:
 * a wrong factor of 2 or sqrt(2), a missing dx or dt, or noise held over the step (2 % here) is
 * seen.
 */
class NoiseCovarianceTest {
  private static final int LANES = 64;
  private static final int STEPS = 400;
  private static final double SIGMAS = 4.5;
  private static final double DT = 0.1;
  private static final double T = 0.7;

  private static CoherentRegion region() {
    return Projector.modesUpTo(5).on(PeriodicGrid.of(Axis.holdingModes(5, 9)));
  }

  /** Sums over samples for the modes: |x1|^2, |x2|^2, x1 x2^*, x1 x1, x1(k) x1(k+1)^*, scaled. */
  private static final class Sums {
    double first;
    double second;
    double crossRe;
    double crossIm;
    double pseudoRe;
    double pseudoIm;
    double neighbourRe;
    int count;
  }

  private interface Expected {
    /** Variance <|x_c|^2> of a mode. */
    double variance(int component, int mode);
  }

  private static Sums sample(Model model, Integrator scheme, RandomStreams streams, Expected e) {
    NoiseGenerator noise = streams.generator(model.region(), 2, LANES);
    for (int lane = 0; lane < LANES; lane++) {
      noise.assign(lane, lane);
    }
    Stepper stepper = scheme.bind(model, noise, LANES);
    Amplitudes empty = new Amplitudes(model.region(), 2, LANES);
    Amplitudes x = empty.copy();
    Sums sums = new Sums();
    int modes = model.region().modes();
    for (int s = 0; s < STEPS; s++) {
      stepper.start(empty, 3L * s);
      stepper.advance();
      stepper.observe(x);
      for (int m = 0; m < modes; m++) {
        double v1 = e.variance(0, m);
        double v2 = e.variance(1, m);
        int next = (m + 1) % modes;
        double scale = Math.sqrt(v1 * v2);
        double scaleNext = Math.sqrt(v1 * e.variance(0, next));
        for (int lane = 0; lane < LANES; lane++) {
          int i = m * LANES + lane;
          int j = next * LANES + lane;
          double a = x.re(0)[i];
          double b = x.im(0)[i];
          double c = x.re(1)[i];
          double d = x.im(1)[i];
          sums.first += (a * a + b * b) / v1;
          sums.second += (c * c + d * d) / v2;
          sums.crossRe += (a * c + b * d) / scale;
          sums.crossIm += (b * c - a * d) / scale;
          sums.pseudoRe += (a * a - b * b) / v1;
          sums.pseudoIm += 2 * a * b / v1;
          sums.neighbourRe += (a * x.re(0)[j] + b * x.im(0)[j]) / scaleNext;
          sums.count++;
        }
      }
    }
    return sums;
  }

  private static void check(Sums sums, double crossRe, double crossIm) {
    double n = sums.count;
    double error = SIGMAS / Math.sqrt(n); // |x|^2/v has standard deviation 1
    double half = SIGMAS / Math.sqrt(2 * n); // Re(x y^*) of independent x, y: 1/sqrt(2)
    assertEquals(1, sums.first / n, error);
    assertEquals(1, sums.second / n, error);
    assertEquals(crossRe, sums.crossRe / n, error);
    assertEquals(crossIm, sums.crossIm / n, error);
    assertEquals(0, sums.pseudoRe / n, error);
    assertEquals(0, sums.pseudoIm / n, error);
    assertEquals(0, sums.neighbourRe / n, half);
  }

  private static double frequency(Model model, int component, int mode) {
    return model.linearPart().re(mode, component, component);
  }

  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void ornsteinUhlenbeckSchemes(boolean counterBased) {
    Model model =
        Model.of(
            region(), Hamiltonian.ofMasses(1, 1.5),
            Reservoir.of(T, -0.4, 0).withDampings(0.05, 0.4));
    Expected exact =
        (c, m) -> {
          double w = frequency(model, c, m);
          double gamma = model.reservoir().damping(c);
          return T / w * (1 - Math.exp(-2 * gamma * w * DT));
        };
    RandomStreams streams =
        counterBased ? RandomStreams.counterBased(11) : RandomStreams.commonsRng(11);
    check(sample(model, OuRk4.ofStep(DT), streams, exact), 0, 0);
  }

  @Test
  void halfKicks() {
    Model model =
        Model.of(
            region(), Hamiltonian.ofMasses(1, 1.5),
            Reservoir.of(T, -0.4, 0).withDampings(0.05, 0.4));
    Expected exact =
        (c, m) -> {
          double gamma = model.reservoir().damping(c);
          double kept = Math.exp(-2 * gamma * frequency(model, c, m) * DT);
          return gamma * T * DT * (1 + kept);
        };
    check(sample(model, Rk4Ip.ofStep(DT), RandomStreams.counterBased(12), exact), 0, 0);
  }

  /**
   * Coherent coupling with unequal dampings correlates the components: covariance by Simpson's rule
   * from its definition, integral of e^(-A s) 2 Gamma T e^(-A^+ s) ds with A = (i + Gamma) h.
   */
  @Test
  void coupledComponentsWithUnequalDampings() {
    double dt = 1;
    Model model =
        Model.of(
            Projector.keeping("only k = 0", (nx, ny) -> nx == 0 ? 1 : 0)
                .on(PeriodicGrid.of(Axis.of(4, 1))),
            Hamiltonian.ofMasses(1, 1).with(CoherentCoupling.constant(0.8)),
            Reservoir.of(T, -1.5, 0).withDampings(0.05, 0.4));
    ComplexMatrix a = new ComplexMatrix(2);
    ComplexMatrix diffusion = new ComplexMatrix(2);
    for (int i = 0; i < 2; i++) {
      double gamma = model.reservoir().damping(i);
      diffusion.set(i, i, 2 * gamma * T, 0);
      for (int j = 0; j < 2; j++) {
        double h = i == j ? 1.5 : -0.8;
        a.set(i, j, gamma * h, h);
      }
    }
    ComplexMatrix covariance = new ComplexMatrix(2);
    int intervals = 200;
    for (int n = 0; n <= intervals; n++) {
      ComplexMatrix e = new ComplexMatrix(2).plus(a, -dt * n / intervals).exp();
      double weight = n == 0 || n == intervals ? 1 : n % 2 == 1 ? 4 : 2;
      covariance =
          covariance.plus(
              e.times(diffusion).times(e.adjoint()), weight * dt / intervals / 3);
    }
    ComplexMatrix c = covariance;
    double scale = Math.sqrt(c.re(0, 0) * c.re(1, 1));
    check(
        sampleOneMode(model, OuRk4.ofStep(dt), (component, m) -> c.re(component, component)),
        c.re(0, 1) / scale, c.im(0, 1) / scale);
  }

  private static Sums sampleOneMode(Model model, Integrator scheme, Expected e) {
    NoiseGenerator noise =
        RandomStreams.counterBased(13).generator(model.region(), 2, LANES);
    Sums sums = new Sums();
    for (int block = 0; block < 8; block++) {
      for (int lane = 0; lane < LANES; lane++) {
        noise.assign(lane, (long) block * LANES + lane);
      }
      Stepper stepper = scheme.bind(model, noise, LANES);
      Amplitudes empty = new Amplitudes(model.region(), 2, LANES);
      Amplitudes x = empty.copy();
      double v1 = e.variance(0, 0);
      double v2 = e.variance(1, 0);
      double scale = Math.sqrt(v1 * v2);
      for (int s = 0; s < STEPS; s++) {
        stepper.start(empty, 3L * s);
        stepper.advance();
        stepper.observe(x);
        for (int i = 0; i < LANES; i++) {
          double a = x.re(0)[i];
          double b = x.im(0)[i];
          double c = x.re(1)[i];
          double d = x.im(1)[i];
          sums.first += (a * a + b * b) / v1;
          sums.second += (c * c + d * d) / v2;
          sums.crossRe += (a * c + b * d) / scale;
          sums.crossIm += (b * c - a * d) / scale;
          sums.pseudoRe += (a * a - b * b) / v1;
          sums.pseudoIm += 2 * a * b / v1;
          sums.count++;
        }
      }
    }
    return sums;
  }
}
