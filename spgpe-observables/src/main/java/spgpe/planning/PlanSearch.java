package spgpe.planning;

import java.util.Locale;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.jspecify.annotations.Nullable;
import spgpe.internal.check.Check;
import spgpe.theory.PhaseBubble;
import spgpe.units.CoupledPair;
import spgpe.units.Density;
import spgpe.units.Energy;
import spgpe.units.RingExperiment;
import spgpe.units.ScaledRing;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;

/** Inverse plans: which temperature or coupling gives a mean lifetime. */
final class PlanSearch {
  private static final double COLDEST = 1e-12;
  private static final double HOTTEST = 1e-3;
  private static final double WEAKEST_HERTZ = 1e-3;
  private static final int SCAN = 12;
  private static final int EVALUATIONS = 60;

  private PlanSearch() {}

  static ShotPlan byTemperature(ShotPlan plan, TimeSpan lifetime) {
    RateTheory theory = plan.theory();
    if (theory == null) {
      throw unreachable(plan);
    }
    ScaledRing ring = plan.ring();
    // a hair inside, so that the plan at the end of the range is not refused by rounding
    double hottest =
        Math.min(
            ring.units().toScaled(Temperature.ofKelvin(HOTTEST)),
            theory.barrier() / RateTheory.LOWEST_BARRIER)
            * (1 - 1e-9);
    double coldest =
        Math.max(
            ring.units().toScaled(Temperature.ofKelvin(COLDEST)),
            theory.barrier() / RateTheory.HIGHEST_BARRIER)
            * (1 + 1e-9);
    double target = -Math.log(ring.units().toScaled(lifetime));
    double slowest = theory.logRate(coldest);
    double fastest = theory.logRate(hottest);
    Check.argument(
        target >= slowest && target <= fastest,
        "no temperature gives this mean lifetime: meanLifetime=%.4g s, range %.4g s at %.4g nK"
            + " (E_b/T=%.3g) to %.4g s at %.4g nK (E_b/T=%.3g)",
        lifetime.seconds(),
        ring.units().time(Math.exp(-fastest)).seconds(),
        ring.units().temperature(hottest).nanokelvin(),
        theory.barrier() / hottest,
        ring.units().time(Math.exp(-slowest)).seconds(),
        ring.units().temperature(coldest).nanokelvin(),
        theory.barrier() / coldest);
    double low = coldest;
    double high = hottest;
    while (true) {
      double middle = Math.sqrt(low * high);
      if (!(middle > low && middle < high)) {
        break;
      }
      if (theory.logRate(middle) < target) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return plan.with(
        plan.experiment().withTemperature(ring.units().temperature(low)), theory);
  }

  static ShotPlan byCoupling(ShotPlan plan, TimeSpan lifetime) {
    ScaledRing ring = plan.ring();
    Check.argument(
        plan.experiment().modulation().isEmpty(),
        "the coherent coupling cannot be varied at fixed lambda^2 under a modulation, whose depth"
            + " sets kappa: %s; plan with a biquadratic coupling",
        plan.experiment().modulation());
    double lambdaSquared =
        ring.coherent() > 0 ? ring.biquadratic() / ring.coherent() : 0;
    Check.argument(
        lambdaSquared > 1,
        "lambda^2 = kappa n/J must be > 1, else no coherent coupling makes the state metastable:"
            + " lambda^2=%s",
        lambdaSquared);
    double target = Math.log(ring.units().toScaled(lifetime));
    Bracket bracket = bracket(plan, lambdaSquared, target);
    Check.argument(
        bracket.lowest <= target && bracket.highest >= target,
        "no coherent coupling gives this mean lifetime at lambda^2=%.4g: meanLifetime=%.4g s,"
            + " searched range %s",
        lambdaSquared,
        lifetime.seconds(),
        bracket.describe(ring));
    double root =
        bracket.low == bracket.high
            ? bracket.low
            : new BrentSolver(1e-13, 1e-13, 1e-12)
                .solve(
                    EVALUATIONS,
                    log -> required(plan, lambdaSquared, log) - target,
                    bracket.low,
                    bracket.high);
    return plan.with(recipe(plan, lambdaSquared, root), null);
  }

  /** Ends of a piece of the scanned range on which ln(lifetime) rises with ln(J). */
  private static final class Bracket {
    double low = Double.NaN;
    double high = Double.NaN;
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;

    /** Range of the whole scan, for the message. */
    double firstCoupling = Double.NaN;

    double lastCoupling = Double.NaN;

    String describe(ScaledRing ring) {
      return Double.isNaN(firstCoupling)
          ? "is empty: no coupling has a rate"
          : String.format(
              Locale.ROOT,
              "%.4g s to %.4g s for J/h = %.4g to %.4g Hz",
              ring.units().time(Math.exp(lowest)).seconds(),
              ring.units().time(Math.exp(highest)).seconds(),
              ring.units().energy(Math.exp(firstCoupling)).hertz(),
              ring.units().energy(Math.exp(lastCoupling)).hertz());
    }
  }

  private static Bracket bracket(ShotPlan plan, double lambdaSquared, double target) {
    ScaledRing ring = plan.ring();
    double relative = ring.g() - ring.inter();
    double closed = PhaseBubble.of(1, 1, Math.sqrt(lambdaSquared)).energy();
    double first =
        Math.max(
            Math.max(
                ring.units().toScaled(Energy.ofHertz(WEAKEST_HERTZ)),
                Math.pow(RateTheory.LOWEST_BARRIER * ring.temperature() / closed, 2)),
            ring.coherent() * Math.pow(RateTheory.shortestLength(ring) / ring.length(), 2))
            * (1 + 1e-9);
    double last = 0.97 * Math.min(relative / lambdaSquared, relative);
    Bracket bracket = new Bracket();
    double previous = Double.NaN;
    double previousLog = Double.NaN;
    for (int i = 0; i <= SCAN && last > first; i++) {
      double log = Math.log(first) + (Math.log(last) - Math.log(first)) * i / SCAN;
      Double value = logLifetime(plan, lambdaSquared, log);
      if (value == null) {
        continue;
      }
      if (Double.isNaN(previous)) {
        bracket.firstCoupling = log;
        bracket.low = log;
        bracket.high = log;
      } else if (value <= previous) {
        // past the turning point of the lifetime: the rising branch ends here
        break;
      } else if (previous <= target && value >= target) {
        bracket.low = previousLog;
        bracket.high = log;
      }
      bracket.lastCoupling = log;
      bracket.lowest = Math.min(bracket.lowest, value);
      bracket.highest = Math.max(bracket.highest, value);
      previous = value;
      previousLog = log;
    }
    return bracket;
  }

  private static double required(ShotPlan plan, double lambdaSquared, double logCoupling) {
    Double value = logLifetime(plan, lambdaSquared, logCoupling);
    if (value == null) {
      throw new IllegalArgumentException(
          "the search met a coupling without a rate: J/h="
              + plan.ring().units().energy(Math.exp(logCoupling)).hertz()
              + " Hz; ask for another mean lifetime");
    }
    return value;
  }

  private static @Nullable Double logLifetime(
      ShotPlan plan, double lambdaSquared, double logCoupling) {
    ScaledRing ring = recipe(plan, lambdaSquared, logCoupling).scaled();
    if (RateTheory.obstacle(ring).isPresent()) {
      return null;
    }
    RateTheory theory =
        RateTheory.of(ring, plan.settings().cutoffModes(), plan.damping());
    return theory.obstacleAt(ring.temperature()).isPresent()
        ? null
        : -theory.logRate(ring.temperature());
  }

  private static RingExperiment recipe(
      ShotPlan plan, double lambdaSquared, double logCoupling) {
    Energy coherent = plan.ring().units().energy(Math.exp(logCoupling));
    Density density = plan.ring().gas().density();
    return plan.experiment()
        .withCoherentCoupling(coherent)
        .withBiquadratic(CoupledPair.biquadraticFor(lambdaSquared, coherent, density));
  }

  private static IllegalArgumentException unreachable(ShotPlan plan) {
    return new IllegalArgumentException(
        "no temperature gives a mean lifetime: "
            + plan.refusal().map(NoRate::message).orElse("there is no rate theory"));
  }
}
