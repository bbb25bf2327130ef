package spgpe.examples.validation;

import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.HeunIp;
import spgpe.integrate.Integrator;
import spgpe.integrate.LatticeComposition;
import spgpe.integrate.LatticeStrang;
import spgpe.integrate.OuMidpoint;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.bench.ConservationStudy;
import spgpe.integrate.bench.Convergence;
import spgpe.integrate.bench.EquilibriumBias;
import spgpe.integrate.bench.OrderStudy;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.TimeSeries;
import spgpe.run.Trajectory;

/**
 * Orders and equilibrium bias of the integrators, as the tables of docs/validation.md.
 *
 * <p>Without arguments the orders and the exact tables of the linearised mode (a minute). With the
 * arguments "ensemble TRAJECTORIES TIME [SCHEME ...]" the runs of the whole interacting field too,
 * of all schemes or of those named. With the arguments "figure FILE" only the bias against the work,
 * at gamma = 1e-3, as a PNG file.
 */
public final class IntegratorTables {
  private static final double LENGTH = 32;
  private static final int CUTOFF = 31;
  private static final double LONGEST = 0.15;

  private IntegratorTables() {}

  /**
   * Prints the tables or draws the figure.
   *
   * @param args nothing, or "ensemble", number of trajectories, time of each, names of schemes, or
   *     "figure", file
   */
  public static void main(String[] args) {
    if (args.length == 2 && args[0].equals("figure")) {
      WorkPrecisionFigure.write(
          Path.of(args[1]), EquilibriumBias.onRing(LENGTH, CUTOFF, 1, 1e-3), schemes(),
          "Equilibrium bias against work, gamma = 0.001, gn = 1, eps up to 18.5");
      return;
    }
    printOrderTable();
    printLinearTables();
    if (args.length >= 3 && args[0].equals("ensemble")) {
      printEnsembleTable(
          Integer.parseInt(args[1]), Double.parseDouble(args[2]),
          List.of(args).subList(3, args.length));
    }
  }

  private static List<Integrator> schemes() {
    return List.of(
        OuRk4.ofStep(1), OuMidpoint.ofStep(1), Rk4Ip.ofStep(1), HeunIp.ofStep(1),
        LatticeStrang.ofStep(1));
  }

  private static void printOrderTable() {
    System.out.println("Order and drifts without noise from a thermal state, t = 2, dt = 0.01");
    System.out.println("| scheme | order | error | dN/N | dP | dK/K | evaluations per step |");
    System.out.println("|---|---|---|---|---|---|---|");
    for (Integrator scheme :
        List.of(
            Rk4Ip.ofStep(0.01), OuRk4.ofStep(0.01), OuMidpoint.ofStep(0.01), HeunIp.ofStep(0.01),
            LatticeStrang.ofStep(0.01), LatticeComposition.yoshida(0.01))) {
      Model quiet = model(scheme, 0).withReservoir(Reservoir.none(1));
      Amplitudes thermal =
          Trajectory.of(model(scheme, 0.5)).startingFrom(InitialState.uniform(0.95, 0.95))
              .integratedBy(
                  scheme.facts().latticeOnly() ? LatticeStrang.ofStep(0.02) : OuRk4.ofStep(0.02))
              .seed(5, 0).until(20).run().finalState();
      Convergence order = OrderStudy.of(quiet, thermal, 2).deterministic(scheme, 200, 2);
      ConservationStudy.Drift drift = ConservationStudy.measure(quiet, scheme, thermal, 200);
      System.out.printf(
          Locale.ROOT, "| %s | %.2f | %.1e | %.0e | %.0e | %.0e | %d |%n",
          scheme.getClass().getSimpleName(), order.order(), order.rows().get(0).difference(),
          drift.atoms(), drift.momentum(), drift.energy(),
          scheme.facts().forceEvaluationsPerStep());
    }
    System.out.println();
  }

  private static void printLinearTables() {
    System.out.println(
        "Worst occupation bias in percent at dt = 0.1 / 0.05 / 0.025 (gn = 1, eps <= 18.5), and"
            + " force evaluations per unit time for 1 % and 0.1 %");
    System.out.println("| scheme | gamma | dt=0.1 | 0.05 | 0.025 | evals for 1 % | for 0.1 % |");
    System.out.println("|---|---|---|---|---|---|---|");
    for (Integrator scheme : schemes()) {
      for (double gamma : new double[] {0.1, 0.01, 1e-3, 1e-4}) {
        EquilibriumBias modes = EquilibriumBias.onRing(LENGTH, CUTOFF, 1, gamma);
        int cost = scheme.facts().forceEvaluationsPerStep();
        System.out.printf(
            Locale.ROOT, "| %s | %.0e | %+.4f | %+.4f | %+.4f | %.0f | %.0f |%n",
            scheme.getClass().getSimpleName(), gamma,
            percent(modes, scheme, 0.1), percent(modes, scheme, 0.05),
            percent(modes, scheme, 0.025),
            cost / modes.largestStep(scheme, 0.01, LONGEST),
            cost / modes.largestStep(scheme, 0.001, LONGEST));
      }
    }
  }

  private static double percent(EquilibriumBias modes, Integrator scheme, double step) {
    return 100 * modes.worst(scheme.withStep(step)).bias();
  }

  private static void printEnsembleTable(
      int trajectories, double time, List<String> only) {
    System.out.println();
    System.out.println(
        "Interacting pair: <N>, <K> and equipartition ratios, one sigma in brackets");
    System.out.println("| scheme | gamma | dt | N | K | middle modes | upper modes |");
    System.out.println("|---|---|---|---|---|---|---|");
    for (double gamma : new double[] {0.1, 0.01, 1e-3}) {
      for (double step : new double[] {0.1, 0.05}) {
        for (Integrator scheme :
            List.of(
                OuRk4.ofStep(step), OuMidpoint.ofStep(step), Rk4Ip.ofStep(step),
                HeunIp.ofStep(step), LatticeStrang.ofStep(step))) {
          if (only.isEmpty() || only.contains(scheme.getClass().getSimpleName())) {
            printRow(scheme, gamma, trajectories, time);
          }
        }
      }
    }
  }

  private static Model model(Integrator scheme, double gamma) {
    Hamiltonian h =
        Hamiltonian.pair(1, 0.2)
            .with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.2));
    Reservoir reservoir = Reservoir.of(0.1, 1, gamma);
    return scheme.facts().latticeOnly()
        ? Model.ofAliasing(
            Projector.allModes().on(PeriodicGrid.of(Axis.of(64, LENGTH))), h, reservoir)
        : Model.of(
            Projector.modesUpTo(CUTOFF).on(PeriodicGrid.of(Axis.of(128, LENGTH))), h, reservoir);
  }

  private static void printRow(
      Integrator scheme, double gamma, int trajectories, double time) {
    Model model = model(scheme, gamma);
    Recording<TimeSeries> recording =
        Recording.of(
            new EquipartitionMeter(model), Schedule.every(1).startingAt(time / 4), TimeSeries::new);
    List<TimeSeries.Series> all =
        Ensemble.of(model).startingFrom(equilibrium(scheme)).integratedBy(scheme)
            .trajectories(trajectories).seed(2026).until(time).record(recording).lanes(8)
            .run().get(recording).series();
    StringBuilder row = new StringBuilder();
    row.append(
        String.format(
            Locale.ROOT, "| %s | %.0e | %s |", scheme.getClass().getSimpleName(), gamma,
            scheme.step()));
    for (int i = 0; i < 4; i++) {
      double sum = 0;
      double squares = 0;
      for (TimeSeries.Series series : all) {
        double mean = 0;
        for (double[] values : series.values()) {
          mean += values[i] / series.values().length;
        }
        sum += mean;
        squares += mean * mean;
      }
      double mean = sum / trajectories;
      double error =
          Math.sqrt((squares / trajectories - mean * mean) / (trajectories - 1));
      String cell = i < 2 ? " %.3f(%.3f) |" : " %.4f(%.4f) |";
      row.append(String.format(Locale.ROOT, cell, mean, error));
    }
    System.out.println(row);
  }

  /** Each trajectory starts from equilibrium, made with strong damping and short steps. */
  private static InitialState equilibrium(Integrator scheme) {
    return (model, random, target) ->
        target.set(
            Trajectory.of(model.withReservoir(model.reservoir().withDampings(0.5)))
                .startingFrom(InitialState.uniform(0.95, 0.95))
                .integratedBy(scheme.withStep(0.025))
                .seed(random.nextLong(), 0)
                .until(25)
                .run()
                .finalState());
  }
}
