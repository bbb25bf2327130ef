package spgpe.benchmarks;

import java.lang.management.ManagementFactory;
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
 * What observing costs: the CPU time of ensembles with all observables every 5 time units against
 * the same ensembles without, in alternating runs on one thread; prints the median of the ratios of
 * neighbouring runs with its quartiles, and the ratio of the fastest runs, which a busy machine
 * disturbs least.
 */
public final class ObservationCost {
  private static final double LENGTH = 48;
  private static final Schedule SCHEDULE = Schedule.every(5).startingAt(5);

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

  /** What an average over the metastable state needs. */
  private static List<Observable> metastable() {
    return List.of(
        PairMoment.all(), RelativePhase.meanCosine(), SpatialMean.ofSquare(RelativePhase.sine()),
        SpatialCorrelation.phaseDeviation(Math.PI), MetastableFluctuations.observable());
  }

  private static List<Observable> thermometers() {
    return List.of(
        Equipartition.inBands(0, 1, 2, 3.2), DynamicalTemperature.inverse(),
        DynamicalTemperature.inverseAtFixedNumber());
  }

  private static Ensemble plain(long trajectories, double until) {
    Model model =
        Model.of(
            Projector.modesUpTo(24).on(PeriodicGrid.of(Axis.of(100, LENGTH))),
            Hamiltonian.pair(1, 0).with(CoherentCoupling.constant(0.1))
                .with(BiquadraticCoupling.of(0.225)),
            Reservoir.of(0.0516, 1.1, 0.1));
    return Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
        .integratedBy(OuRk4.ofStep(0.1)).trajectories(trajectories).seed(1).until(until);
  }

  private static Ensemble recording(Ensemble plan, List<Observable> observables) {
    Ensemble result = plan;
    for (Observable observable : observables) {
      result = result.record(Recording.of(observable, SCHEDULE, TimeAverage::new));
    }
    return result;
  }

  private static Ensemble withTrackers(Ensemble plan) {
    BubbleSettings settings =
        BubbleSettings.atLevel(0).withSmoothing(1.5).withHysteresis(0, -0.75);
    return plan
        .record(
            Recording.of(
                RelativePhase.cosine(), SCHEDULE, BubbleDetector.of(settings).census(LENGTH)))
        .record(Recording.of(ComponentPhase.winding(0), SCHEDULE, PhaseSlips::new));
  }

  private static double seconds(Ensemble plan) {
    long begin = ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
    plan.runOn(Runnable::run);
    return (ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() - begin) * 1e-9;
  }

  private static void compare(String name, Ensemble plain, Ensemble observed, int pairs) {
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
    System.out.printf(
        Locale.ROOT, "%-34s median ratio %.3f [%.3f, %.3f], of the fastest %.3f (%.3f s)%n", name,
        ratios[pairs / 2], ratios[pairs / 4], ratios[pairs - 1 - pairs / 4],
        fastestObserved / fastest, fastest);
  }

  /**
   * Runs the comparison.
   *
   * @param arguments pairs of runs (default 41), trajectories (default 8), end time (default 100),
   *     anything as a fourth to time each observable alone
   */
  public static void main(String[] arguments) {
    int pairs = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 41;
    long trajectories = arguments.length > 1 ? Long.parseLong(arguments[1]) : 8;
    double until = arguments.length > 2 ? Double.parseDouble(arguments[2]) : 100;
    Ensemble plain = plain(trajectories, until);
    Ensemble all = withTrackers(recording(plain, everyday()));
    compare("nothing", plain, plain(trajectories, until), pairs);
    compare("averages of the metastable state", plain, recording(plain, metastable()), pairs);
    compare("all but dynamical temperatures", plain, all, pairs);
    compare("all", plain, recording(all, thermometers()), pairs);
    if (arguments.length > 3) {
      for (List<Observable> group : List.of(everyday(), thermometers())) {
        for (Observable observable : group) {
          compare(observable.name(), plain, recording(plain, List.of(observable)), pairs);
        }
      }
    }
  }
}
