package spgpe.examples.planner;

import java.util.Locale;
import spgpe.planning.ExpectedRate;
import spgpe.planning.RunSettings;
import spgpe.planning.ShotPlan;
import spgpe.planning.ShotStatistics;
import spgpe.units.ScaledRing;
import spgpe.units.ScaledUnits;
import spgpe.units.Verdict;

/** The plan as a page of text. */
final class PlannerText {
  private final StringBuilder text = new StringBuilder();
  private final PlannedRun run;
  private final ShotPlan plan;
  private final ScaledUnits units;

  private PlannerText(PlannedRun run) {
    this.run = run;
    this.plan = run.plan();
    this.units = plan.ring().units();
  }

  static String of(PlannedRun run) {
    PlannerText page = new PlannerText(run);
    page.text.append("Shot plan\n");
    page.line("%s", PlannedRun.CAUTION);
    page.experiment();
    page.rate();
    page.plan.statistics().ifPresent(page::shots);
    page.simulation();
    page.verdicts();
    return page.text.toString();
  }

  private void experiment() {
    ScaledRing ring = plan.ring();
    text.append("\nExperiment (invented)\n").append(run.scenario().describe());
    run.search().ifPresent(search -> line("%s", search));
    line("temperature %.4g nK, coherent coupling J/h = %.4g Hz, shot %.4g ms",
        plan.experiment().temperature().nanokelvin(), units.energy(ring.coherent()).hertz(),
        plan.shot().milliseconds());
    line("scaled: L = %.2f, J = %.4f, kappa = %.4f, mu = %.4f, T = %.5f (x0 = %.4f um, t0 = %.4f ms)",
        ring.length(), ring.coherent(), ring.biquadratic(), ring.mu(), ring.temperature(),
        units.lengthUnit().micrometres(), units.timeUnit().milliseconds());
  }

  private void rate() {
    text.append("\nExpected decay of relative phase pi\n");
    plan.refusal().ifPresent(
        refusal -> {
          line("no rate: %s", refusal.reason());
          line("%s", refusal.message());
        });
    plan.rate().ifPresent(this::rate);
  }

  private void rate(ExpectedRate rate) {
    double perSecond = rate.rate().perSecondPerMetreToD();
    line("rate of the ring %.4g per second, mean lifetime %.4g ms", perSecond, 1e3 / perSecond);
    line("basis %s: E_b/T = %.2f (closed form at fixed density: %.2f)",
        rate.basis(), rate.barrierOverTemperature(), rate.closedBarrierOverTemperature());
    line("a simulation is expected at %.2f to %.3g times this rate, lifetime %.4g to %.4g ms",
        rate.lowRatio(), rate.highRatio(), 1e3 / perSecond / rate.highRatio(),
        1e3 / perSecond / rate.lowRatio());
    rate.remarks().forEach(remark -> line("remark: %s", remark));
  }

  private void shots(ShotStatistics statistics) {
    text.append("\nShots in the laboratory\n");
    line("%.4g %% of the shots decay before they end; %.3g bubbles form in a shot on average",
        100 * statistics.decayedFraction(), statistics.bubblesPerShot());
    line("for the rate to %.3g %%: %d decays, that is %s shots if the moment of decay is seen,",
        100 * run.relativeError(), ShotStatistics.eventsFor(run.relativeError()),
        count(statistics.shotsFor(run.relativeError())));
    line("or %s shots if each is imaged once, at its end",
        count(statistics.shotsForEndImages(run.relativeError())));
  }

  private static String count(double number) {
    return String.format(Locale.ROOT, number < 1e9 ? "%.0f" : "%.3g", number);
  }

  private void simulation() {
    RunSettings settings = plan.settings();
    text.append("\nSimulation\n");
    line("kept modes |n| <= %d (suggested at this temperature: %d), %d grid points",
        settings.cutoffModes(), plan.ring().cutoffModes(), settings.gridPoints());
    line("step dt = %.4f t0 (stable below %.3f t0), truncation time %.0f t0 = %.4g ms",
        settings.step(), settings.largestStableStep(), settings.truncation(),
        units.time(settings.truncation()).milliseconds());
    line("damping gamma = %.3g; kinetic theory of the thermal cloud gives %.1g",
        plan.damping(), plan.ring().bath().growthRate());
    if (plan.verdicts().stream().anyMatch(
        v -> v.name().startsWith("gamma used") && v.grade() == Verdict.Grade.OUTSIDE)) {
      line("so far above the kinetic value the simulated bath is faster than the real cloud: the"
          + " damping verdicts are");
      line("OUTSIDE, and rates are those of a well thermalised gas; expect the real one to decay more slowly");
    }
    if (run.computingTime().isPresent()) {
      line("%d trajectories on %d threads: about %.3g s (%.3g us for each trajectory and step here)",
          run.trajectories(), run.threads(), run.computingTime().get().seconds(),
          1e6 * run.timing().orElseThrow().secondsPerStep());
    } else {
      line("computing time: ask with --calibrate");
    }
  }

  private void verdicts() {
    text.append("\nVerdicts\n");
    int fine = 0;
    for (Verdict verdict : plan.verdicts()) {
      if (verdict.grade() == Verdict.Grade.FINE) {
        fine++;
      } else {
        line("%s", verdict);
      }
    }
    line("FINE     %d more checks", fine);
  }

  private void line(String format, Object... values) {
    text.append("  ").append(String.format(Locale.ROOT, format, values)).append('\n');
  }
}
