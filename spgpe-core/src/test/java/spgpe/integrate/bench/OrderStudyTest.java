package spgpe.integrate.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.Detuning;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.HeunIp;
import spgpe.integrate.Integrator;
import spgpe.integrate.LatticeStrang;
import spgpe.integrate.OneKick;
import spgpe.integrate.OuMidpoint;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.Reservoir;

/** Strong and weak orders on one nonlinear mode, psi = a, with gamma = 0.3. */
class OrderStudyTest {
  private static final double GAMMA = 0.3;
  private static final double MU = 1.5;
  private static final double OFFSET = 0.5;

  private static Model model(double temperature, boolean lattice) {
    Projector rule =
        lattice
            ? Projector.allModes()
            : Projector.keeping("only k = 0", (nx, ny) -> nx == 0 ? 1 : 0);
    return Model.ofAliasing(
        rule.on(PeriodicGrid.of(Axis.of(2, 1))),
        Hamiltonian.single(1).with(Detuning.ofOffsets(OFFSET)),
        Reservoir.of(temperature, MU, GAMMA));
  }

  private static OrderStudy study(double temperature) {
    Model model = model(temperature, false);
    Amplitudes initial = new Amplitudes(model.region(), 1, 1);
    initial.re(0)[0] = 0.4;
    return OrderStudy.of(model, initial, 2);
  }

  static List<Integrator> schemes() {
    return List.of(OuRk4.ofStep(1), Rk4Ip.ofStep(1), HeunIp.ofStep(1), OuMidpoint.ofStep(1));
  }

  /**
   * Additive noise: strong order 1. Standard error of the order below 0.04 with 2000 paths; limit
   * 0.15 (false alarm 2e-4). Half an order lost or gained is seen.
   */
  @ParameterizedTest
  @MethodSource("schemes")
  void strongOrderIsOne(Integrator scheme) {
    Convergence found = study(0.5).strong(scheme, 10, 3, 2000, 61);
    assertTrue(found.orderError() < 0.04, found.table());
    assertEquals(scheme.facts().strongOrder(), found.order(), 0.15, found.table());
  }

  /**
   * Sampled weak order of the scheme with the largest weak error; order 1.7(2), its own value at
   * this step being 1.8. Limits are three standard errors.
   */
  @Test
  void sampledWeakOrder() {
    Convergence found =
        study(0.5).weak(HeunIp.ofStep(1), 8, 2, 20000, 62, a -> a.atomNumber(0, 0));
    assertTrue(found.orderError() < 0.25, found.table());
    assertEquals(1.8, found.order(), 3 * found.orderError(), found.table());
  }

  /** Numbers of a Gauss-Hermite rule in place of normals: averages without sampling. */
  private static final class QuadratureNoise implements NoiseGenerator {
    /** Zeros and weights of He_5, Abramowitz and Stegun, table 25.10 (times sqrt 2). */
    static final double[] NODES = {
      -2.8569700138728056, -1.3556261799742659, 0, 1.3556261799742659, 2.8569700138728056
    };

    static final double[] WEIGHTS = {
      0.011257411327720691, 0.2220759220056126, 0.5333333333333333, 0.2220759220056126,
      0.011257411327720691
    };

    static final int LANES = 625;
    private int first;

    /** Weight of a lane for the chosen numbers of the first draw. */
    double weight(int lane) {
      double weight = WEIGHTS[first / 5] * WEIGHTS[first % 5];
      for (int rest = lane, i = 0; i < 4; i++, rest /= 5) {
        weight *= WEIGHTS[rest % 5];
      }
      return weight;
    }

    void choose(int firstDraw) {
      first = firstDraw;
    }

    @Override
    public void assign(int lane, long trajectory) {}

    @Override
    public void fill(long step, int use, Amplitudes normals) {
      normals.clear();
      int mode = normals.region().indexOf(0);
      for (int lane = 0; lane < LANES; lane++) {
        int i = mode * LANES + lane;
        if (step == 0) {
          normals.re(0)[i] = NODES[first / 5];
          normals.im(0)[i] = NODES[first % 5];
        } else {
          int pair = use == 0 ? lane % 25 : lane / 25;
          normals.re(0)[i] = NODES[pair % 5];
          normals.im(0)[i] = NODES[pair / 5];
        }
      }
    }
  }

  /**
   * Error of &lt;n&gt;, n = |a|^2, after one step from n0, against its Taylor series in dt. With L
   * the generator of the process and w = offset - mu: L n = -2 gamma (w n + n^2) + 2 gamma T, L n^2
   * = 2 n L n + 4 gamma T n, and &lt;n&gt; = n0 + dt L n + (dt^2/2) L L n + O(dt^3).
   */
  private static double weakErrorOfOneStep(Integrator scheme, double dt) {
    double temperature = 0.5;
    double amplitude = 0.9;
    Model model = model(temperature, scheme.facts().latticeOnly());
    QuadratureNoise noise = new QuadratureNoise();
    Stepper stepper = scheme.withStep(dt).bind(model, noise, QuadratureNoise.LANES);
    Amplitudes state = new Amplitudes(model.region(), 1, QuadratureNoise.LANES);
    int mode = model.region().indexOf(0) * QuadratureNoise.LANES;
    double mean = 0;
    for (int first = 0; first < 25; first++) {
      noise.choose(first);
      state.clear();
      for (int lane = 0; lane < QuadratureNoise.LANES; lane++) {
        state.re(0)[mode + lane] = amplitude;
      }
      stepper.start(state, 0);
      stepper.advance();
      stepper.observe(state);
      for (int lane = 0; lane < QuadratureNoise.LANES; lane++) {
        double re = state.re(0)[mode + lane];
        double im = state.im(0)[mode + lane];
        mean += noise.weight(lane) * (re * re + im * im);
      }
    }
    double n = amplitude * amplitude;
    double w = OFFSET - MU;
    double first = -2 * GAMMA * (w * n + n * n) + 2 * GAMMA * temperature;
    double square = 2 * n * first + 4 * GAMMA * temperature * n;
    double second = -2 * GAMMA * (w * first + square);
    return Math.abs(mean - (n + dt * first + dt * dt / 2 * second));
  }

  private static double localWeakOrder(Integrator scheme) {
    return Math.log(weakErrorOfOneStep(scheme, 0.04) / weakErrorOfOneStep(scheme, 0.02))
        / Math.log(2);
  }

  /** Weak order two means an error of order three in one step; no sampling. */
  @Test
  void weakOrderIsTwo() {
    for (Integrator scheme : schemes()) {
      assertEquals(
          scheme.facts().weakOrder(), localWeakOrder(scheme) - 1, 0.2, scheme.toString());
    }
    assertEquals(2, localWeakOrder(LatticeStrang.ofStep(1)) - 1, 0.2);
  }

  /** The test above would see it: all of the noise at the begin of the step has weak order one. */
  @Test
  void oneKickPerStepHasWeakOrderOne() {
    assertEquals(1, localWeakOrder(new OneKick(1)) - 1, 0.2);
    // and occupations low by gamma eps dt, derived in docs/integrators.md
    double gamma = 0.01;
    double energy = 10;
    double dt = 0.1;
    double bias =
        LinearisedMode.of(energy, 0, gamma).equilibrium(new OneKick(dt)).occupation() - 1;
    assertEquals(-gamma * energy * dt, bias, 2e-4);
  }

  @Test
  void badArgumentsAreRefused() {
    OrderStudy noisy = study(0.5);
    OrderStudy quiet = study(0);
    OuRk4 scheme = OuRk4.ofStep(1);
    assertThrows(IllegalArgumentException.class, () -> noisy.deterministic(scheme, 10, 2));
    assertThrows(IllegalArgumentException.class, () -> quiet.strong(scheme, 10, 2, 100, 1));
    assertThrows(IllegalArgumentException.class, () -> noisy.strong(scheme, 0, 2, 100, 1));
    assertThrows(IllegalArgumentException.class, () -> noisy.strong(scheme, 10, 1, 100, 1));
    assertThrows(IllegalArgumentException.class, () -> noisy.strong(scheme, 10, 2, 1, 1));
  }
}
