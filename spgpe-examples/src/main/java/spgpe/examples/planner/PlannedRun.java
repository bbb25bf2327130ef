package spgpe.examples.planner;

import java.util.Optional;
import spgpe.examples.scenario.RingScenario;
import spgpe.planning.ShotPlan;
import spgpe.planning.StepTiming;
import spgpe.units.TimeSpan;

/**
 * A plan with what was asked of it.
 *
 * @param scenario the experiment as it was given
 * @param plan the plan
 * @param search what was varied to reach which lifetime, if anything was
 * @param relativeError wanted relative error of the rate
 * @param trajectories trajectories of the simulation
 * @param threads threads of the simulation
 * @param timing speed of this machine, if it was asked for
 */
record PlannedRun(
    RingScenario scenario,
    ShotPlan plan,
    Optional<String> search,
    double relativeError,
    long trajectories,
    int threads,
    Optional<StepTiming> timing) {
  static final String CAUTION =
      "Planning figures are model estimates; they do not replace the laboratory's own safety rules"
          + " for lasers, magnets and high voltage.";

  Optional<TimeSpan> computingTime() {
    return timing.map(speed -> plan.computingTime(speed, trajectories, plan.shot(), threads));
  }
}
