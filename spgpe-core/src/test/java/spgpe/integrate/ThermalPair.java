package spgpe.integrate;

import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.model.EnergyMeter;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;
import spgpe.run.InitialState;
import spgpe.run.Trajectory;

/** A coupled pair on a ring and a thermal state of it: the problem of the tables. */
final class ThermalPair {
  static final double LENGTH = 32;
  static final int CUTOFF = 31;

  private ThermalPair() {}

  static Hamiltonian hamiltonian(double kappa, double inter) {
    Hamiltonian pair = Hamiltonian.pair(1, inter).with(CoherentCoupling.constant(0.1));
    return kappa == 0 ? pair : pair.with(BiquadraticCoupling.of(kappa));
  }

  static CoherentRegion projected() {
    return Projector.modesUpTo(CUTOFF).on(PeriodicGrid.of(Axis.of(128, LENGTH)));
  }

  static Model model(Reservoir reservoir) {
    return Model.of(projected(), hamiltonian(0.2, 0.2), reservoir);
  }

  static Model lattice(Hamiltonian hamiltonian, Reservoir reservoir) {
    return Model.ofAliasing(
        Projector.allModes().on(PeriodicGrid.of(Axis.of(64, LENGTH))), hamiltonian, reservoir);
  }

  /** A field thermalised at T = 0.1, mu = 1 with strong damping. */
  static Amplitudes thermalState(Model model, long seed) {
    return Trajectory.of(model.withReservoir(Reservoir.of(0.1, 1, 0.5)))
        .startingFrom(InitialState.uniform(0.95, 0.95))
        .integratedBy(
            model.region().modes() == model.region().grid().points()
                ? LatticeStrang.ofStep(0.02)
                : OuRk4.ofStep(0.02))
        .seed(seed, 0)
        .until(20)
        .run()
        .finalState();
  }

  static Amplitudes advance(Model model, Integrator integrator, Amplitudes initial, long steps) {
    NoiseGenerator noise =
        RandomStreams.counterBased(1)
            .generator(model.region(), model.components(), initial.lanes());
    for (int lane = 0; lane < initial.lanes(); lane++) {
      noise.assign(lane, lane);
    }
    Stepper stepper = integrator.bind(model, noise, initial.lanes());
    stepper.start(initial, 0);
    for (long s = 0; s < steps; s++) {
      stepper.advance();
    }
    Amplitudes result = initial.copy();
    stepper.observe(result);
    return result;
  }

  /** Relative L2 distance. */
  static double distance(Amplitudes a, Amplitudes b) {
    double difference = 0;
    double size = 0;
    for (int c = 0; c < a.components(); c++) {
      for (int e = 0; e < a.re(c).length; e++) {
        difference += Math.pow(a.re(c)[e] - b.re(c)[e], 2) + Math.pow(a.im(c)[e] - b.im(c)[e], 2);
        size += Math.pow(b.re(c)[e], 2) + Math.pow(b.im(c)[e], 2);
      }
    }
    return Math.sqrt(difference / size);
  }

  static double atoms(Amplitudes a) {
    double sum = 0;
    for (int c = 0; c < a.components(); c++) {
      sum += a.atomNumber(c, 0);
    }
    return sum;
  }

  static double momentum(Amplitudes a) {
    double sum = 0;
    for (int c = 0; c < a.components(); c++) {
      for (int m = 0; m < a.region().modes(); m++) {
        sum +=
            a.region().waveNumber(0, m)
                * (a.re(c)[m] * a.re(c)[m] + a.im(c)[m] * a.im(c)[m]);
      }
    }
    return sum;
  }

  static double grandCanonical(Model model, Amplitudes a) {
    return new EnergyMeter(model).grandCanonical(0, a);
  }
}
