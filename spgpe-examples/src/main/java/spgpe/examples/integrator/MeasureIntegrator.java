package spgpe.examples.integrator;

import java.io.PrintStream;
import java.util.List;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.bench.ConservationStudy;
import spgpe.integrate.bench.Convergence;
import spgpe.integrate.bench.EquilibriumBias;
import spgpe.integrate.bench.OrderStudy;
import spgpe.integrate.bench.WorkPrecision;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.InitialState;
import spgpe.run.Trajectory;

/** Puts a user's own integrator through the bench, next to two built-in ones. */
public final class MeasureIntegrator {
  private MeasureIntegrator() {}

  /**
   * Prints orders, drifts, equilibrium bias and work at equal bias.
   *
   * @param args not used
   */
  public static void main(String[] args) {
    report(System.out);
  }

  static void report(PrintStream out) {
    Model noisy =
        Model.of(
            Projector.modesUpTo(8).on(PeriodicGrid.of(Axis.holdingModes(8, 16))),
            Hamiltonian.pair(1, 0.2).with(CoherentCoupling.constant(0.1)),
            Reservoir.of(0.1, 1, 0.05));
    Model quiet = noisy.withReservoir(Reservoir.none(1));
    Amplitudes thermal =
        Trajectory.of(noisy).startingFrom(InitialState.uniform(0.95, 0.95))
            .integratedBy(OuRk4.ofStep(0.02)).seed(1, 0).until(40).run().finalState();
    for (Integrator scheme : List.of(new ExplicitMidpoint(0.01), Rk4Ip.ofStep(0.01))) {
      Convergence order = OrderStudy.of(quiet, thermal, 1).deterministic(scheme, 200, 2);
      out.print(order.table());
      out.print(OrderStudy.of(noisy, thermal, 1).strong(scheme, 100, 2, 64, 7).table());
      out.println(ConservationStudy.measure(quiet, scheme, thermal, 100).line());
    }
    EquilibriumBias modes = EquilibriumBias.onRing(16, 8, 1, 0.05);
    out.print(modes.table(new ExplicitMidpoint(1), 0.02, 0.01, 0.005));
    out.print(
        WorkPrecision.compare(
                modes, 1e-3, 0.2,
                List.of(new ExplicitMidpoint(1), Rk4Ip.ofStep(1), OuRk4.ofStep(1)))
            .table());
  }
}
