package spgpe.run;

import java.util.Arrays;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Engine;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/** Some noisy steps of some trajectories, and a number that changes with any bit of their states. */
final class EngineDigest {
  static final int TRAJECTORIES = 32;

  private EngineDigest() {}

  public static void main(String[] arguments) {
    System.out.println("digest " + of(Engine.ofSystemProperty(), 8) + " " + of(Engine.PLAIN, 1));
  }

  static long of(Engine engine, int lanes) {
    return 31L * Arrays.hashCode(states(engine, lanes, OuRk4.ofStep(0.02), 20))
        + Arrays.hashCode(states(engine, lanes, Rk4Ip.ofStep(0.02), 20));
  }

  static Model model(Engine engine) {
    return Model.of(
            Projector.modesUpTo(15).on(PeriodicGrid.of(Axis.of(64, 25))),
            Hamiltonian.pair(1, 0.2).with(CoherentCoupling.constant(0.01))
                .with(BiquadraticCoupling.of(0.02)),
            Reservoir.of(0.05, 1, 0.02))
        .withEngine(engine);
  }

  /** Real parts of component 2 of all trajectories, then imaginary ones of component 1. */
  static double[] states(Engine engine, int lanes, Integrator integrator, int steps) {
    Model model = model(engine);
    int modes = model.region().modes();
    double[] all = new double[2 * TRAJECTORIES * modes];
    for (int first = 0; first < TRAJECTORIES; first += lanes) {
      NoiseGenerator noise = RandomStreams.counterBased(7).generator(model.region(), 2, lanes);
      Amplitudes state = new Amplitudes(model.region(), 2, lanes);
      for (int lane = 0; lane < lanes; lane++) {
        noise.assign(lane, first + lane);
        state.re(0)[model.region().indexOf(0) * lanes + lane] = 5;
        state.re(1)[model.region().indexOf(0) * lanes + lane] = -5;
      }
      Stepper stepper = integrator.bind(model, noise, lanes);
      stepper.start(state, 0);
      for (int i = 0; i < steps; i++) {
        stepper.advance();
      }
      stepper.observe(state);
      for (int lane = 0; lane < lanes; lane++) {
        for (int m = 0; m < modes; m++) {
          int to = (first + lane) * modes + m;
          all[to] = state.re(1)[m * lanes + lane];
          all[TRAJECTORIES * modes + to] = state.im(0)[m * lanes + lane];
        }
      }
    }
    return all;
  }
}
