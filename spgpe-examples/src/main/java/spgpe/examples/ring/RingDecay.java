package spgpe.examples.ring;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Executor;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.FirstPassage;
import spgpe.observables.phase.RelativePhase;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.ProgressListener;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.TimeMoments;
import spgpe.run.TimeSeries;
import spgpe.run.Trajectory;
import spgpe.run.TrajectoryEnd;
import spgpe.units.ScaledRing;
import spgpe.units.Temperature;

/**
 * The simulation behind the command: an ensemble at each temperature, and a space-time record of a
 * typical trajectory of each.
 *
 * @param scenario the experiment
 * @param seed seed of all ensembles
 * @param trajectories trajectories at each temperature
 * @param until end of each run, scaled time
 * @param cutoffModes largest kept mode number, the same at all temperatures
 */
record RingDecay(
    RingScenario scenario, long seed, long trajectories, double until, int cutoffModes) {
  static final double STEP = 0.1;
  static final double THRESHOLD = -0.4;
  private static final double LOOK_INTERVAL = 0.5;
  private static final double AFTERMATH = 100;

  /**
   * Runs one temperature. Temperatures use disjoint trajectory indices, so that their noise is
   * independent.
   */
  DecayAtTemperature run(
      int number, Temperature temperature, Executor executor, ProgressListener listener) {
    ScaledRing ring = scenario.at(temperature);
    Recording<TimeMoments> meanCosine =
        Recording.of(RelativePhase.meanCosine(), Schedule.every(5), TimeMoments::new);
    EnsembleResult result =
        Ensemble.of(scenario.model(ring, cutoffModes))
            .startingFrom(InitialState.uniform(1, -1))
            .integratedBy(integrator())
            .trajectories(number * trajectories, trajectories)
            .seed(seed)
            .until(until)
            .stopWhen(
                FirstPassage.upward(
                    RelativePhase.meanCosine(), THRESHOLD, Schedule.every(LOOK_INTERVAL)))
            .record(meanCosine)
            .progress(listener)
            .runOn(executor);
    return new DecayAtTemperature(
        temperature, ring, result.ends(), until, truncation(ring), result.get(meanCosine));
  }

  private static Integrator integrator() {
    return OuRk4.ofStep(STEP);
  }

  /**
   * Time by which a cold start has relaxed and a bubble has grown to the threshold: ten relaxation
   * times of the relative phase, 2/(gamma (A + B)) with A + B = m^2/2 + 2 (g n - J), and the time in
   * which two walls of a third of the relative-phase speed turn a third of the ring.
   */
  private double truncation(ScaledRing ring) {
    double j = ring.coherent();
    double relaxation = 2 / (scenario.damping() * (2 * (ring.biquadratic() - j) + 2 * (1 - j)));
    double formation = ring.length() / 3 / 2 / (Math.sqrt(1 - j) / 3);
    return 10 * Math.ceil((10 * relaxation + formation) / 10);
  }

  /** Repeats a trajectory of the ensemble, bit for bit, and records cos(relative phase). */
  TimeSeries.Series spaceTime(DecayAtTemperature decay, TrajectoryEnd end) {
    Model model = scenario.model(decay.ring(), cutoffModes);
    Recording<TimeSeries> profile =
        Recording.of(RelativePhase.cosine(), Schedule.every(1), TimeSeries::new);
    double last = Math.min(until, Math.ceil(end.time()) + AFTERMATH);
    return Trajectory.of(model)
        .startingFrom(InitialState.uniform(1, -1))
        .integratedBy(integrator())
        .seed(seed, end.trajectory())
        .until(last)
        .record(profile)
        .run()
        .get(profile)
        .series()
        .get(0);
  }

  /** The cutoff that the hottest ensemble needs. */
  static int cutoffModes(RingScenario scenario, List<Temperature> temperatures) {
    List<Integer> cutoffs = new ArrayList<>();
    for (Temperature temperature : temperatures) {
      cutoffs.add(scenario.at(temperature).cutoffModes());
    }
    return cutoffs.stream().mapToInt(Integer::intValue).max().orElseThrow();
  }
}
