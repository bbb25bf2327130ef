package spgpe.examples.planner;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import spgpe.planning.ExpectedRate;
import spgpe.planning.RunSettings;
import spgpe.planning.ShotPlan;
import spgpe.planning.ShotStatistics;
import spgpe.units.ScaledRing;
import spgpe.units.ScaledUnits;
import spgpe.units.Verdict;

/** The plan as JSON; the key ends with the unit where there is one. */
final class PlannerJson {
  private PlannerJson() {}

  static String of(PlannedRun run) {
    ShotPlan plan = run.plan();
    Map<String, Object> all = new LinkedHashMap<>();
    all.put("caution", PlannedRun.CAUTION);
    run.search().ifPresent(search -> all.put("search", search));
    all.put("experiment", experiment(run));
    all.put("scaled", scaled(plan.ring()));
    plan.rate().ifPresent(rate -> all.put("rate", rate(rate)));
    plan.refusal().ifPresent(
        refusal ->
            all.put(
                "refusal",
                Map.of("reason", refusal.reason().name(), "message", refusal.message())));
    plan.statistics().ifPresent(s -> all.put("shots", shots(s, run.relativeError())));
    all.put("simulation", simulation(run));
    List<Object> verdicts = new ArrayList<>();
    plan.verdicts().forEach(verdict -> verdicts.add(verdict(verdict)));
    all.put("verdicts", verdicts);
    return Json.write(all);
  }

  private static Map<String, Object> experiment(PlannedRun run) {
    ShotPlan plan = run.plan();
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("species", plan.ring().gas().species().name());
    map.put("atoms_per_component", run.scenario().atoms());
    map.put("radius_um", run.scenario().radius().micrometres());
    map.put("temperature_nk", plan.experiment().temperature().nanokelvin());
    map.put("coherent_coupling_hz", plan.ring().units().energy(plan.ring().coherent()).hertz());
    map.put("lambda_squared", run.scenario().lambdaSquared());
    map.put("inter_scattering_length_a0", run.scenario().inter().bohrRadii());
    map.put("shot_ms", plan.shot().milliseconds());
    return map;
  }

  private static Map<String, Object> scaled(ScaledRing ring) {
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("length", ring.length());
    map.put("g", ring.g());
    map.put("g12", ring.inter());
    map.put("coherent", ring.coherent());
    map.put("biquadratic", ring.biquadratic());
    map.put("mu", ring.mu());
    map.put("temperature", ring.temperature());
    map.put("length_unit_um", ring.units().lengthUnit().micrometres());
    map.put("time_unit_ms", ring.units().timeUnit().milliseconds());
    return map;
  }

  private static Map<String, Object> rate(ExpectedRate rate) {
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("basis", rate.basis().name());
    map.put("per_second", rate.rate().perSecondPerMetreToD());
    map.put("barrier_over_temperature", rate.barrierOverTemperature());
    map.put("closed_barrier_over_temperature", rate.closedBarrierOverTemperature());
    map.put("simulation_over_theory_low", rate.lowRatio());
    map.put("simulation_over_theory_high", rate.highRatio());
    map.put("remarks", rate.remarks());
    return map;
  }

  private static Map<String, Object> shots(ShotStatistics statistics, double error) {
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("mean_lifetime_ms", statistics.meanLifetime().milliseconds());
    map.put("decayed_fraction", statistics.decayedFraction());
    map.put("bubbles_per_shot", statistics.bubblesPerShot());
    map.put("relative_error", error);
    map.put("decays_needed", ShotStatistics.eventsFor(error));
    map.put("shots_needed", statistics.shotsFor(error));
    map.put("shots_needed_with_end_images", statistics.shotsForEndImages(error));
    return map;
  }

  private static Map<String, Object> simulation(PlannedRun run) {
    RunSettings settings = run.plan().settings();
    ScaledUnits units = run.plan().ring().units();
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("damping", run.plan().damping());
    map.put("kinetic_damping", run.plan().ring().bath().growthRate());
    map.put("cutoff_modes", settings.cutoffModes());
    map.put("suggested_cutoff_modes", run.plan().ring().cutoffModes());
    map.put("grid_points", settings.gridPoints());
    map.put("step", settings.step());
    map.put("largest_stable_step", settings.largestStableStep());
    map.put("truncation", settings.truncation());
    map.put("truncation_ms", units.time(settings.truncation()).milliseconds());
    map.put("trajectories", run.trajectories());
    map.put("threads", run.threads());
    run.timing().ifPresent(
        timing -> map.put("us_per_trajectory_and_step", 1e6 * timing.secondsPerStep()));
    run.computingTime().ifPresent(time -> map.put("computing_time_s", time.seconds()));
    return map;
  }

  private static Map<String, Object> verdict(Verdict verdict) {
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("name", verdict.name());
    map.put("grade", verdict.grade().name());
    map.put("value", verdict.value());
    map.put("limit", verdict.limit());
    map.put("outside_limit", verdict.outsideLimit());
    map.put("reason", verdict.reason());
    return map;
  }
}
