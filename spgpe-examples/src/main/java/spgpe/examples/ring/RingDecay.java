package spgpe.examples.ring;

import java.util.List;
import java.util.concurrent.Executor;
import spgpe.observables.FirstPassage;
import spgpe.observables.phase.RelativePhase;
import spgpe.planning.ShotPlan;
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

/**
 * The simulation behind the command: an ensemble for each plan, and a space-time record of a
 * typical trajectory of each.
 *
 * @param seed seed of all ensembles
 * @param trajectories trajectories of each plan
 * @param until end of each run, scaled time
 */
record RingDecay(long seed, long trajectories, double until) {
  /** Threshold of the reported decay times. */
  static final double THRESHOLD = -0.4;

  /** The rate must not depend on the threshold; the run goes on to the highest. */
  static final List<Double> THRESHOLDS = List.of(-0.7, THRESHOLD, 0.0, 0.4);

  /** A whole number of planned steps, which are whole fractions of 0.5. */
  private static final double LOOK_INTERVAL = 0.5;

  private static final double AFTERMATH = 100;

  /**
   * Runs one plan. Plans use disjoint trajectory indices, so that their noise is independent.
   */
  DecayAtTemperature run(
      int number, ShotPlan plan, Executor executor, ProgressListener listener) {
    Recording<TimeMoments> meanCosine =
        Recording.of(RelativePhase.meanCosine(), Schedule.every(5), TimeMoments::new);
    Recording<FirstPassageTimes> passages =
        Recording.of(
            RelativePhase.meanCosine(), Schedule.every(LOOK_INTERVAL),
            FirstPassageTimes.through(THRESHOLDS));
    EnsembleResult result =
        Ensemble.of(plan.model())
            .startingFrom(InitialState.uniform(1, -1))
            .integratedBy(plan.settings().integrator())
            .trajectories(number * trajectories, trajectories)
            .seed(seed)
            .until(until)
            .stopWhen(
                FirstPassage.upward(
                    RelativePhase.meanCosine(), THRESHOLDS.get(THRESHOLDS.size() - 1),
                    Schedule.every(LOOK_INTERVAL)))
            .record(meanCosine)
            .record(passages)
            .progress(listener)
            .runOn(executor);
    return new DecayAtTemperature(
        plan, result.get(passages).endsAt(THRESHOLD), result.get(passages), until,
        result.get(meanCosine));
  }

  /** Repeats a trajectory of the ensemble, bit for bit, and records cos(relative phase). */
  TimeSeries.Series spaceTime(DecayAtTemperature decay, TrajectoryEnd end) {
    Recording<TimeSeries> profile =
        Recording.of(RelativePhase.cosine(), Schedule.every(1), TimeSeries::new);
    double last = Math.min(until, Math.ceil(end.time()) + AFTERMATH);
    return Trajectory.of(decay.plan().model())
        .startingFrom(InitialState.uniform(1, -1))
        .integratedBy(decay.plan().settings().integrator())
        .seed(seed, end.trajectory())
        .until(last)
        .record(profile)
        .run()
        .get(profile)
        .series()
        .get(0);
  }
}
