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
import spgpe.projector.CoherentRegion;
import spgpe.projector.Engine;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/** Some noisy steps of some trajectories, and a number that changes with any bit of their states. */
final class EngineDigest {
  static final int TRAJECTORIES = 32;
  static final int PLANES = 4;

  private EngineDigest() {}

  public static void main(String[] arguments) {
    System.out.println("digest " + of(Engine.ofSystemProperty(), 8) + " " + of(Engine.PLAIN, 1));
    System.out.println("plane " + ofPlane(Engine.ofSystemProperty(), 1));
  }

  static long of(Engine engine, int lanes) {
    return of(model(engine), lanes, TRAJECTORIES);
  }

  /** The same for {@link #PLANES} trajectories on a plane. */
  static long ofPlane(Engine engine, int lanes) {
    return of(plane(engine), lanes, PLANES);
  }

  private static long of(Model model, int lanes, int trajectories) {
    return 31L * Arrays.hashCode(states(model, lanes, trajectories, OuRk4.ofStep(0.02), 20))
        + Arrays.hashCode(states(model, lanes, trajectories, Rk4Ip.ofStep(0.02), 20));
  }

  static Model model(Engine engine) {
    return model(Projector.modesUpTo(15).on(PeriodicGrid.of(Axis.of(64, 25))), engine);
  }

  /** Unequal axes, an ellipse of mode numbers. */
  static Model plane(Engine engine) {
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(32, 14), Axis.of(64, 25));
    return model(Projector.belowWaveNumber(3.3).on(grid), engine);
  }

  private static Model model(CoherentRegion region, Engine engine) {
    return Model.of(
            region,
            Hamiltonian.pair(1, 0.2).with(CoherentCoupling.constant(0.01))
                .with(BiquadraticCoupling.of(0.02)),
            Reservoir.of(0.05, 1, 0.02))
        .withEngine(engine);
  }

  /** Real parts of component 2 of all trajectories, then imaginary ones of component 1. */
  static double[] states(
      Model model, int lanes, int trajectories, Integrator integrator, int steps) {
    int modes = model.region().modes();
    double[] all = new double[2 * trajectories * modes];
    for (int first = 0; first < trajectories; first += lanes) {
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
          all[trajectories * modes + to] = state.im(0)[m * lanes + lane];
        }
      }
    }
    return all;
  }
}
