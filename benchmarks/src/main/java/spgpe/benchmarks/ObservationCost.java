package spgpe.benchmarks;

import java.lang.management.ManagementFactory;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.SpatialMean;
import spgpe.observables.TimeAverage;
import spgpe.observables.bubble.BubbleDetector;
import spgpe.observables.bubble.BubbleSettings;
import spgpe.observables.bubble.MetastableFluctuations;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.observables.density.AtomNumber;
import spgpe.observables.density.Current;
import spgpe.observables.density.Density;
import spgpe.observables.density.Energy;
import spgpe.observables.density.Momentum;
import spgpe.observables.density.PairMoment;
import spgpe.observables.phase.ComponentPhase;
import spgpe.observables.phase.RelativePhase;
import spgpe.observables.spectrum.ModeOccupation;
import spgpe.observables.spectrum.StructureFactor;
import spgpe.observables.standard.StandardObservables;
import spgpe.observables.thermometry.DynamicalTemperature;
import spgpe.observables.thermometry.Equipartition;
import spgpe.observables.topology.Kinks;
import spgpe.observables.topology.PhaseSlips;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.InitialState;
import spgpe.run.Observable;
import spgpe.run.Recording;
import spgpe.run.Schedule;

/**
 * What observing costs: the CPU time of ensembles that are looked at against that of the same
 * ensembles without, in alternating runs on one thread. Prints for each group of observables
 *
 * <ul>
 *   <li>the median of the ratios of neighbouring runs with its quartiles, and the ratio of the
 *       fastest runs, which a busy machine disturbs least, when all is observed every 5 time units;
 *   <li>the cost of one look in time steps of the scheme, from runs that are looked at in every
 *       step.
 * </ul>
 */
public final class ObservationCost {
  private static final double STEP = 0.1;

  private ObservationCost() {}

  private static List<Observable> everyday() {
    return List.of(
        PairMoment.all(), Density.ofComponent(0), Density.ofComponent(1), Density.total(),
        Density.spin(Density.SpinAxis.X), Density.spin(Density.SpinAxis.Y),
        Density.spin(Density.SpinAxis.Z), AtomNumber.total(), Energy.byTerm(),
        Energy.grandCanonical(), Momentum.total(), Current.total(0), RelativePhase.meanCosine(),
        RelativePhase.cosine(), RelativePhase.wrappedAbout(Math.PI), RelativePhase.winding(),
        SpatialMean.ofSquare(RelativePhase.sine()), SpatialCorrelation.firstOrder(0),
        SpatialCorrelation.secondOrder(0), SpatialCorrelation.phaseDeviation(Math.PI),
        SpatialCorrelation.coherence(), MetastableFluctuations.observable(),
        ModeOccupation.ofComponent(0), ModeOccupation.inPhase(), ModeOccupation.outOfPhase(),
        StructureFactor.ofDensity(), StructureFactor.ofSpin(Density.SpinAxis.Z),
        Equipartition.overall(), Kinks.count());
  }

  private static List<Observable> thermometers() {
    return List.of(
        Equipartition.inBands(0, 1, 2, 3.2), DynamicalTemperature.inverse(),
        DynamicalTemperature.inverseAtFixedNumber());
  }

  /** A pair on a ring of spacing 0.48, its largest mode just below a quarter of the points. */
  private static Ensemble plain(int points, long trajectories, double until) {
    Model model =
        Model.of(
            Projector.modesUpTo(points / 4 - 1)
                .on(PeriodicGrid.of(Axis.of(points, length(points)))),
            Hamiltonian.pair(1, 0).with(CoherentCoupling.constant(0.1))
                .with(BiquadraticCoupling.of(0.225)),
            Reservoir.of(0.0516, 1.1, 0.1));
    return Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
        .integratedBy(OuRk4.ofStep(STEP)).trajectories(trajectories).seed(1).until(until);
  }

  private static double length(int points) {
    return 0.48 * points;
  }

  /** What is recorded in a run. */
  private record Group(String name, List<Observable> observables, boolean trackers) {
    Ensemble recordedBy(Ensemble plan, int points, double interval) {
      Schedule schedule = Schedule.every(interval).startingAt(interval);
      Ensemble result = plan;
      for (Observable observable : observables) {
        result = result.record(Recording.of(observable, schedule, TimeAverage::new));
      }
      if (trackers) {
        BubbleSettings settings =
            BubbleSettings.atLevel(0).withSmoothing(1.5).withHysteresis(0, -0.75);
        result =
            result
                .record(
                    Recording.of(
                        RelativePhase.cosine(), schedule,
                        BubbleDetector.of(settings).census(length(points))))
                .record(Recording.of(ComponentPhase.winding(0), schedule, PhaseSlips::new));
      }
      return result;
    }
  }

  private static List<Group> groups(boolean single) {
    List<Observable> everything = new ArrayList<>(everyday());
    everything.addAll(thermometers());
    List<Group> groups = new ArrayList<>();
    groups.add(new Group("nothing but the look", List.of(Observable.scalar("0", s -> 0)), false));
    groups.add(new Group("the default list", StandardObservables.ofPair(), false));
    groups.add(new Group("29 observables, bubbles, slips", everyday(), true));
    groups.add(new Group("the same and three thermometers", everything, true));
    if (single) {
      groups.add(new Group("bubble census and phase slips", List.of(), true));
      for (Observable observable : everything) {
        groups.add(new Group(observable.name(), List.of(observable), false));
      }
    }
    return groups;
  }

  private static double seconds(Ensemble plan) {
    long begin = ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
    plan.runOn(Runnable::run);
    return (ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() - begin) * 1e-9;
  }

  /** Quartiles of the ratios, then the ratio of the fastest runs. */
  private static double[] compare(Ensemble plain, Ensemble observed, int pairs) {
    double[] ratios = new double[pairs];
    double fastest = Double.POSITIVE_INFINITY;
    double fastestObserved = Double.POSITIVE_INFINITY;
    for (int i = -5; i < pairs; i++) { // five pairs to warm up
      double without = seconds(plain);
      double with = seconds(observed);
      if (i >= 0) {
        ratios[i] = with / without;
        fastest = Math.min(fastest, without);
        fastestObserved = Math.min(fastestObserved, with);
      }
    }
    Arrays.sort(ratios);
    return new double[] {
      ratios[pairs / 4], ratios[pairs / 2], ratios[pairs - 1 - pairs / 4],
      fastestObserved / fastest
    };
  }

  /**
   * Runs the comparison.
   *
   * @param arguments grid points (default 256), pairs of runs (default 25), trajectories (default
   *     8), end time (default 200); anything as a fifth to time each observable alone
   */
  public static void main(String[] arguments) {
    int points = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 256;
    int pairs = arguments.length > 1 ? Integer.parseInt(arguments[1]) : 25;
    long trajectories = arguments.length > 2 ? Long.parseLong(arguments[2]) : 8;
    double until = arguments.length > 3 ? Double.parseDouble(arguments[3]) : 200;
    Ensemble plain = plain(points, trajectories, until);
    Ensemble brief = plain(points, trajectories, 5);
    for (Group group : groups(arguments.length > 4)) {
      // first the runs with many looks: they warm the code of the observables up
      double[] always = compare(brief, group.recordedBy(brief, points, STEP), pairs);
      System.out.printf(
          Locale.ROOT, "%-46s a look costs %.2f [%.2f, %.2f] steps, fastest %.2f%n",
          group.name(), always[1] - 1, always[0] - 1, always[2] - 1, always[3] - 1);
      if (arguments.length <= 4) {
        double[] often = compare(plain, group.recordedBy(plain, points, 5), pairs);
        System.out.printf(
            Locale.ROOT, "%-46s every 5: median ratio %.3f [%.3f, %.3f], of the fastest %.3f%n",
            group.name(), often[1], often[0], often[2], often[3]);
      }
    }
  }
}
