package spgpe.examples.docs;

import java.util.concurrent.Executor;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.TimeAverage;
import spgpe.observables.density.PairMoment;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.statistics.RateEstimate;
import spgpe.theory.Comparison;
import spgpe.theory.ComparisonTable;
import spgpe.theory.CoupledPair;
import spgpe.theory.DecayRate;
import spgpe.theory.PairAverages;
import spgpe.theory.PairEquilibrium;
import spgpe.theory.Prediction;
import spgpe.theory.RingModes;

/** The code of docs/right-run.md. */
final class RightRun {
  private RightRun() {}

  // snippet-begin right-run-model
  static Model model(CoupledPair pair, RingModes ring, double damping) {
    return Model.of(
        Projector.modesUpTo(ring.cutoffMode())
            .on(PeriodicGrid.of(Axis.holdingModes(ring.cutoffMode(), ring.length()))),
        Hamiltonian.pair(pair.g(), 0)
            .with(CoherentCoupling.constant(pair.coherentCoupling()))
            .with(BiquadraticCoupling.of(pair.biquadraticCoupling())),
        Reservoir.of(pair.temperature(), pair.mu(), damping));
  }
  // snippet-end

  static ComparisonTable equilibrium(Executor executor) {
    // snippet-begin right-run-simulation
    CoupledPair pair = new CoupledPair(1, 0.9, 0.1, 0.225, 0.1); // g, mu, J, kappa, T
    RingModes ring = new RingModes(24, 16); // length, n_max
    double root = Math.sqrt(pair.trueVacuumDensity());
    Recording<TimeAverage> moments =
        Recording.of(PairMoment.all(), Schedule.every(1), TimeAverage.from(50));
    TimeAverage measured =
        Ensemble.of(model(pair, ring, 1)) // damping 1: equilibrium does not depend on it
            .startingFrom(InitialState.uniform(root, root))
            .integratedBy(OuRk4.ofStep(0.05)).trajectories(16).seed(2026).until(150)
            .record(moments).runOn(executor).get(moments);
    // snippet-end
    // snippet-begin right-run-comparison
    PairAverages exact = PairEquilibrium.withCutoff(pair, ring);
    ComparisonTable table = ComparisonTable.empty()
        .with(row("n", measured, PairMoment.DENSITY_1, exact.density(), exact))
        .with(row("Re psi_1^* psi_2", measured, PairMoment.COHERENCE, exact.coherence(), exact))
        .with(row("S_y^2", measured, PairMoment.SPIN_Y_SQUARED, exact.sySquared(), exact));
    System.out.print(table);
    // snippet-end
    return table;
  }

  // snippet-begin right-run-row
  static Comparison row(
      String name, TimeAverage average, PairMoment moment, double value, PairAverages exact) {
    int i = moment.ordinal();
    Prediction prediction = Prediction.exact(value, exact.truncationError() * Math.abs(value));
    return new Comparison(name, average.mean(i), average.standardError(i), prediction);
  }
  // snippet-end

  static Comparison decay() {
    // snippet-begin right-run-decay
    CoupledPair pair = new CoupledPair(1, 1.1, 0.1, 0.225, 0.05157356);
    Prediction theory = DecayRate.of(pair, new RingModes(48, 24), 0.1).prediction(); // damping
    RateEstimate rate = new RateEstimate(545, 351_000); // events and exposure of a run
    Comparison decay = new Comparison("rate", rate.rate(), rate.standardError(), theory);
    // snippet-end
    return decay;
  }
}
