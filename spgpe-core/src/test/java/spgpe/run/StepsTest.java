package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.apache.commons.math3.distribution.ChiSquaredDistribution;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ExternalPotential;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.ModulatedCoupling;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.internal.check.AllocationMeter;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/** Steps of both schemes: what they allocate, what the grid does to them, and their noise. */
class StepsTest {
  private static final Integrator[] SCHEMES = {OuRk4.ofStep(0.05), Rk4Ip.ofStep(0.05)};

  private static Model model(int points) {
    return Model.of(
        Projector.modesUpTo(12).on(PeriodicGrid.of(Axis.of(points, 20))),
        Hamiltonian.pair(1, 0.3)
            .with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.2))
            .with(ModulatedCoupling.of(0.05, 2))
            .with(ExternalPotential.onLine("ripple", x -> 0.1 * Math.cos(Math.PI * x / 10))),
        Reservoir.of(0.1, 1, 0.1).withDampings(0.1, 0.05));
  }

  private static Stepper stepper(Integrator scheme, Model model, RandomStreams streams, int lanes) {
    NoiseGenerator noise = streams.generator(model.region(), model.components(), lanes);
    for (int lane = 0; lane < lanes; lane++) {
      noise.assign(lane, lane);
    }
    return scheme.bind(model, noise, lanes);
  }

  private static Amplitudes uniform(Model model, int lanes) {
    Amplitudes state = new Amplitudes(model.region(), model.components(), lanes);
    int zero = model.region().indexOf(0);
    for (int c = 0; c < model.components(); c++) {
      for (int lane = 0; lane < lanes; lane++) {
        state.re(c)[zero * lanes + lane] = Math.sqrt(model.region().grid().volume());
      }
    }
    return state;
  }

  @Test
  void aStepAndALookAllocateNothing() {
    Model model = model(64);
    for (Integrator scheme : SCHEMES) {
      for (int lanes : new int[] {1, 4, 16}) {
        Stepper stepper = stepper(scheme, model, RandomStreams.counterBased(1), lanes);
        Amplitudes target = uniform(model, lanes);
        stepper.start(target, 0);
        double step = AllocationMeter.bytesPerCall(stepper::advance);
        double look = AllocationMeter.bytesPerCall(() -> stepper.observe(target));
        assertTrue(step < 1, scheme + ": bytes for each step: " + step + ", lanes " + lanes);
        assertTrue(look < 1, scheme + ": bytes for each look: " + look + ", lanes " + lanes);
      }
    }
  }

  /** Above the aliasing threshold of 49 points the number of points is of no consequence. */
  @Test
  void aHundredNoisySteps() {
    for (Integrator scheme : SCHEMES) {
      for (RandomStreams streams :
          new RandomStreams[] {RandomStreams.counterBased(5), RandomStreams.commonsRng(5)}) {
        Amplitudes coarse = after100Steps(scheme, model(64), streams);
        Amplitudes fine = after100Steps(scheme, model(128), streams);
        double scale = Math.sqrt(coarse.atomNumber(0, 0) + coarse.atomNumber(1, 0));
        for (int c = 0; c < 2; c++) {
          for (int m = 0; m < coarse.region().modes(); m++) {
            int other = fine.region().indexOf(coarse.region().modeNumber(0, m));
            assertEquals(coarse.re(c)[m], fine.re(c)[other], 1e-12 * scale, scheme.toString());
            assertEquals(coarse.im(c)[m], fine.im(c)[other], 1e-12 * scale, scheme.toString());
          }
        }
      }
    }
  }

  private static Amplitudes after100Steps(Integrator scheme, Model model, RandomStreams streams) {
    Stepper stepper = stepper(scheme, model, streams, 1);
    stepper.start(uniform(model, 1), 0);
    for (int s = 0; s < 100; s++) {
      stepper.advance();
    }
    Amplitudes result = new Amplitudes(model.region(), 2, 1);
    stepper.observe(result);
    return result;
  }

  /**
   * Atoms so heavy that nothing else happens (energies below 1e-8): after one step from nothing each
   * quadrature of each kept mode has variance gamma_j T dt. One million numbers; chi-square test of
   * the trace and of each component at 1e-3 each (false alarm 8e-3 for an unlucky seed); mean of z^2,
   * a complex number, within 4.5 standard deviations (false alarm 5e-5). Catches a variance wrong by
   * 0.6 %, such as noise not halved, or Re and Im of different size.
   */
  @Test
  void theNoiseOfOneStepHasItsStrength() {
    double temperature = 0.7;
    double[] gamma = {0.1, 0.03};
    double dt = 0.05;
    Model model =
        Model.of(
            Projector.modesUpTo(12).on(PeriodicGrid.of(Axis.of(64, 20))),
            Hamiltonian.ofMasses(1e9, 1e9),
            Reservoir.of(temperature, 0, 0).withDampings(gamma));
    int lanes = 50;
    int rounds = 200;
    for (Integrator scheme : SCHEMES) {
      double[] squares = new double[2];
      double differences = 0;
      double products = 0;
      NoiseGenerator noise =
          RandomStreams.counterBased(20260103).generator(model.region(), 2, lanes);
      for (int lane = 0; lane < lanes; lane++) {
        noise.assign(lane, lane);
      }
      Stepper stepper = scheme.bind(model, noise, lanes);
      Amplitudes nothing = new Amplitudes(model.region(), 2, lanes);
      Amplitudes kick = new Amplitudes(model.region(), 2, lanes);
      for (int round = 0; round < rounds; round++) {
        stepper.start(nothing, 2L * round);
        stepper.advance();
        stepper.observe(kick);
        for (int c = 0; c < 2; c++) {
          double sigma = Math.sqrt(gamma[c] * temperature * dt);
          for (int i = 0; i < kick.re(c).length; i++) {
            double x = kick.re(c)[i] / sigma;
            double y = kick.im(c)[i] / sigma;
            squares[c] += x * x + y * y;
            differences += x * x - y * y;
            products += x * y;
          }
        }
      }
      int each = 2 * 25 * lanes * rounds;
      for (int c = 0; c < 2; c++) {
        assertChiSquare(squares[c], each);
      }
      assertChiSquare(squares[0] + squares[1], 2 * each);
      assertEquals(0, differences, 4.5 * Math.sqrt(4.0 * each));
      assertEquals(0, products, 4.5 * Math.sqrt(each));
    }
  }

  private static void assertChiSquare(double sum, int degrees) {
    double p = new ChiSquaredDistribution(null, degrees).cumulativeProbability(sum);
    assertTrue(p > 5e-4 && p < 1 - 5e-4, "chi-square " + sum + " of " + degrees + ", p " + p);
  }
}
