package spgpe.benchmarks;

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
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/** The coupled pair that the benchmarks advance: the same numbers as the program in C. */
final class Problem {
  static final double STEP = 0.02;
  private static final double SPACING = 0.4;

  private Problem() {}

  static Model model(int points) {
    CoherentRegion region =
        Projector.modesUpTo(points / 4 - 1)
            .on(PeriodicGrid.of(Axis.of(points, points * SPACING)));
    return model(region);
  }

  /** A square with a disc of half the largest wave number of an axis, its rim left out. */
  static Model plane(int points) {
    Axis axis = Axis.of(points, points * SPACING);
    double cutoff = Math.PI / SPACING / 2;
    return model(
        Projector.belowWaveNumber(cutoff * (1 - 1e-12)).on(PeriodicGrid.of(axis, axis)));
  }

  private static Model model(CoherentRegion region) {
    return Model.of(
        region,
        Hamiltonian.pair(1, 0).with(CoherentCoupling.constant(0.005))
            .with(BiquadraticCoupling.of(0.01)),
        Reservoir.of(0.02, 1, 0.01));
  }

  static Integrator integrator(String name) {
    return switch (name) {
      case "OuRk4" -> OuRk4.ofStep(STEP);
      case "Rk4Ip" -> Rk4Ip.ofStep(STEP);
      default -> throw new IllegalArgumentException("unknown integrator: " + name);
    };
  }

  static Stepper startedStepper(Model model, Integrator integrator, int lanes) {
    NoiseGenerator noise =
        RandomStreams.counterBased(1).generator(model.region(), model.components(), lanes);
    Amplitudes state = new Amplitudes(model.region(), model.components(), lanes);
    int zero = model.region().indexOf(0);
    double root = Math.sqrt(model.region().grid().volume());
    for (int lane = 0; lane < lanes; lane++) {
      noise.assign(lane, lane);
      state.re(0)[zero * lanes + lane] = root;
      state.re(1)[zero * lanes + lane] = -root;
    }
    Stepper stepper = integrator.bind(model, noise, lanes);
    stepper.start(state, 0);
    return stepper;
  }
}
