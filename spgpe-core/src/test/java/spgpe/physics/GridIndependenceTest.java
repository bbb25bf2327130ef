package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.ModulatedCoupling;
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

/** The kept modes are the state: with enough points their number changes nothing. */
class GridIndependenceTest {
  private static final int CUTOFF = 10;

  private static Model model(int points, Reservoir reservoir) {
    return Model.ofAliasing(
        Projector.modesUpTo(CUTOFF).on(PeriodicGrid.of(Axis.of(points, 12))),
        Hamiltonian.pair(1, 0.3)
            .with(CoherentCoupling.constant(0.2))
            .with(BiquadraticCoupling.of(0.4))
            .with(ModulatedCoupling.of(0.1, 3)),
        reservoir);
  }

  private static Amplitudes start(Model model) {
    Amplitudes a = new Amplitudes(model.region(), 2, 1);
    for (int c = 0; c < 2; c++) {
      for (int m = 0; m < model.region().modes(); m++) {
        int n = model.region().modeNumber(0, m);
        a.re(c)[m] = Math.cos(1.3 * n + c) / (1 + 0.3 * Math.abs(n));
        a.im(c)[m] = Math.sin(0.7 * n * n - c) / (1 + 0.3 * Math.abs(n));
      }
    }
    return a;
  }

  private static Amplitudes run(Model model, Integrator scheme, int steps) {
    NoiseGenerator noise = RandomStreams.counterBased(51).generator(model.region(), 2, 1);
    noise.assign(0, 4);
    Stepper stepper = scheme.bind(model, noise, 1);
    stepper.start(start(model), 0);
    for (int s = 0; s < steps; s++) {
      stepper.advance();
    }
    Amplitudes end = start(model);
    stepper.observe(end);
    return end;
  }

  /** Largest difference of equal modes over the largest amplitude. */
  private static double difference(Amplitudes a, Amplitudes b) {
    double difference = 0;
    double size = 0;
    for (int m = 0; m < a.region().modes(); m++) {
      int other = b.region().indexOf(a.region().modeNumber(0, m));
      for (int c = 0; c < 2; c++) {
        difference =
            Math.max(
                difference,
                Math.hypot(a.re(c)[m] - b.re(c)[other], a.im(c)[m] - b.im(c)[other]));
        size = Math.max(size, Math.hypot(a.re(c)[m], a.im(c)[m]));
      }
    }
    return difference / size;
  }

  /** Same noise, same modes, 41 (the least), 64, 100 and 128 points; noise on and off. */
  @ParameterizedTest
  @CsvSource({"64", "100", "128"})
  void trajectoriesDoNotDependOnTheNumberOfPoints(int points) {
    for (double gamma : new double[] {0, 0.05}) {
      Reservoir reservoir = Reservoir.of(0.3, 1, gamma);
      for (Integrator scheme : new Integrator[] {OuRk4.ofStep(0.01), Rk4Ip.ofStep(0.01)}) {
        Amplitudes least = run(model(41, reservoir), scheme, 100);
        Amplitudes more = run(model(points, reservoir), scheme, 100);
        double difference = difference(least, more);
        assertTrue(difference < 1e-12, scheme + ": " + difference);
      }
    }
  }

  /**
   * The threshold N = 4 n_c + 1 for a cubic force is sharp (derived, docs/theory.md): with one
   * point less the force is wrong, and momentum leaks while the norm does not.
   */
  @Test
  void onePointLessAliases() {
    Model enough = model(41, Reservoir.none(1));
    Model tooFew = model(40, Reservoir.none(1));
    Amplitudes exact = new Amplitudes(enough.region(), 2, 1);
    Amplitudes same = new Amplitudes(enough.region(), 2, 1);
    Amplitudes aliased = new Amplitudes(tooFew.region(), 2, 1);
    Model many = model(128, Reservoir.none(1));
    Amplitudes reference = new Amplitudes(many.region(), 2, 1);
    enough.evaluator(1).localForce(0, start(enough), exact);
    many.evaluator(1).localForce(0, start(many), reference);
    tooFew.evaluator(1).localForce(0, start(tooFew), aliased);
    same.set(exact);
    assertTrue(difference(exact, reference) < 1e-14);
    assertTrue(difference(aliased, reference) > 1e-5);

    double[] leak = new double[2];
    double[] loss = new double[2];
    for (int i = 0; i < 2; i++) {
      Model model = i == 0 ? enough : tooFew;
      Amplitudes end = run(model, Rk4Ip.ofStep(0.002), 500);
      leak[i] = Math.abs(momentum(end) - momentum(start(model)));
      loss[i] =
          Math.abs(
              end.atomNumber(0, 0) + end.atomNumber(1, 0) - start(model).atomNumber(0, 0)
                  - start(model).atomNumber(1, 0));
    }
    assertTrue(leak[0] < 1e-10, "leak=" + leak[0]);
    assertTrue(leak[1] > 1e-6, "leak=" + leak[1]);
    assertEquals(0, loss[0], 1e-9);
    assertEquals(0, loss[1], 1e-9);
  }

  private static double momentum(Amplitudes a) {
    double sum = 0;
    for (int c = 0; c < 2; c++) {
      for (int m = 0; m < a.region().modes(); m++) {
        sum +=
            a.region().waveNumber(0, m)
                * (a.re(c)[m] * a.re(c)[m] + a.im(c)[m] * a.im(c)[m]);
      }
    }
    return sum;
  }
}
