package spgpe.statistics;

import java.util.ArrayList;
import java.util.List;
import spgpe.internal.check.Check;

/**
 * Estimate of the cumulative hazard, H(t) = sum over event times t_i &lt;= t of d_i/n_i, with
 * variance sum d_i/n_i&#178;. A constant decay rate shows as a straight line. Immutable and
 * thread-safe.
 *
 * <p>Source: O. Aalen, Ann. Stat. 6, 701 (1978) (from memory).
 */
public final class NelsonAalen {
  private final List<Step> steps;
  private final double lastTime;

  /**
   * One step of the curve.
   *
   * @param time event time
   * @param atRisk trajectories at risk just before it
   * @param events events at this time
   * @param cumulativeHazard H just after the step
   * @param standardError its standard error
   */
  public record Step(
      double time, int atRisk, int events, double cumulativeHazard, double standardError) {}

  private NelsonAalen(List<Step> steps, double lastTime) {
    this.steps = steps;
    this.lastTime = lastTime;
  }

  /**
   * Estimates the curve.
   *
   * @param data first-passage data
   * @return the estimate; without steps if there was no event
   * @throws IllegalArgumentException if the data is null
   */
  public static NelsonAalen of(SurvivalData data) {
    RiskTable table = new RiskTable(Check.notNull(data, "data"));
    List<Step> steps = new ArrayList<>();
    double hazard = 0;
    double variance = 0;
    for (double time : table.distinctEventTimes()) {
      double n = table.atRisk(time);
      int d = table.events(time);
      hazard += d / n;
      variance += d / (n * n);
      steps.add(new Step(time, (int) n, d, hazard, Math.sqrt(variance)));
    }
    return new NelsonAalen(List.copyOf(steps), table.lastTime());
  }

  /**
   * The steps in the order of time.
   *
   * @return unmodifiable list, one entry per distinct event time
   */
  public List<Step> steps() {
    return steps;
  }

  /**
   * Cumulative hazard at a time.
   *
   * @param time time, between 0 and the last observation
   * @return H(time), continuous from the right; 0 before the first event
   * @throws IllegalArgumentException if the time is negative, NaN or after the last observation
   */
  public double cumulativeHazardAt(double time) {
    Check.argument(
        time >= 0 && time <= lastTime,
        "time must lie between 0 and the last observation: time=%s, lastTime=%s",
        time,
        lastTime);
    double hazard = 0;
    for (Step step : steps) {
      if (step.time() > time) {
        break;
      }
      hazard = step.cumulativeHazard();
    }
    return hazard;
  }
}
