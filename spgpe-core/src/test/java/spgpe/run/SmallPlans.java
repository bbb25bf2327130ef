package spgpe.run;

import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.HamiltonianTerm;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/** Small models and plans that run in milliseconds. */
final class SmallPlans {
  static final double DT = 0.1;

  private SmallPlans() {}

  static CoherentRegion region() {
    return Projector.modesUpTo(3).on(PeriodicGrid.of(Axis.of(16, 6)));
  }

  static Model pair() {
    return pair(16);
  }

  static Model pair(int points) {
    return Model.of(
        Projector.modesUpTo(3).on(PeriodicGrid.of(Axis.of(points, 6))),
        Hamiltonian.pair(1, 0.2).with(CoherentCoupling.constant(0.1)),
        Reservoir.of(0.1, 1, 0.05));
  }

  static Model with(HamiltonianTerm term) {
    return Model.of(
        region(), Hamiltonian.pair(1, 0.2).with(term), Reservoir.of(0.1, 1, 0.05));
  }

  static Ensemble plan(Model model, long trajectories) {
    return Ensemble.of(model)
        .startingFrom(InitialState.uniform(1, -1))
        .integratedBy(OuRk4.ofStep(DT))
        .trajectories(trajectories)
        .seed(1)
        .until(2);
  }

  /** Density of the first component at the first point. */
  static Observable density() {
    return Observable.scalar(
        "density", s -> Math.pow(s.field().re(0)[0], 2) + Math.pow(s.field().im(0)[0], 2));
  }
}
