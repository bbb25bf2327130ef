package spgpe.examples.ring;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import spgpe.examples.scenario.RingScenario;
import spgpe.planning.RunSettings;
import spgpe.planning.ShotPlan;
import spgpe.statistics.ArrheniusFit;
import spgpe.statistics.Interval;
import spgpe.statistics.RateEstimate;
import spgpe.statistics.TruncationScan;
import spgpe.units.ScaledRing;
import spgpe.units.ScaledUnits;
import spgpe.units.Verdict;

/** The printed report. */
final class Report {
  private Report() {}

  static String setUp(RingScenario scenario, List<ShotPlan> plans) {
    ShotPlan hottest = plans.get(plans.size() - 1);
    ScaledRing ring = hottest.ring();
    ScaledUnits units = ring.units();
    RunSettings settings = hottest.settings();
    StringBuilder text = new StringBuilder("Invented experiment\n").append(scenario.describe());
    text.append("\nScaled parameters (energies in g n, lengths in x0, times in t0)\n");
    line(text, "x0 = %.4f um, t0 = %.4f ms, g n/h = %.1f Hz",
        units.lengthUnit().micrometres(), units.timeUnit().milliseconds(),
        units.energyUnit().hertz());
    line(text, "L = %.2f, J = %.4f, kappa = %.4f, mu = %.4f",
        ring.length(), ring.coherent(), ring.biquadratic(), ring.mu());
    text.append("\nPlan of the simulation, from the highest temperature\n");
    line(text, "kept modes |n| <= %d, %d grid points, step dt = %.4f t0 (stable below %.3f t0)",
        settings.cutoffModes(), settings.gridPoints(), settings.step(),
        settings.largestStableStep());
    line(text, "truncation time %.0f t0 (%.1f ms): relaxation of the cold start and growth of the"
        + " first bubble", settings.truncation(),
        units.time(settings.truncation()).milliseconds());
    StringBuilder lifetimes = new StringBuilder("expected mean lifetimes:");
    for (ShotPlan plan : plans) {
      lifetimes.append(number("  %.1f nK ", plan.experiment().temperature().nanokelvin()));
      lifetimes.append(
          plan.statistics().map(s -> number("%.4g ms", s.meanLifetime().milliseconds()))
              .orElse("none"));
    }
    line(text, "%s", lifetimes);
    text.append("\nHow good the reduction is, at the highest temperature\n");
    int fine = 0;
    for (Verdict verdict : hottest.verdicts()) {
      if (verdict.grade() == Verdict.Grade.FINE) {
        fine++;
      } else {
        line(text, "%s", verdict);
      }
    }
    line(text, "FINE     %d more checks", fine);
    text.append("\nChosen for speed\n");
    line(text, "damping gamma = %.3g; kinetic theory of the thermal cloud gives %.1g, hence the two"
        + " damping verdicts OUTSIDE: the", hottest.damping(), ring.bath().growthRate());
    line(text, "simulated bath is thousands of times faster than the real cloud. Rates at such small"
        + " damping are lower,");
    line(text, "because the field thermalises slowly; read the rates below as those of a well"
        + " thermalised gas.");
    return text.toString();
  }

  static String table(List<DecayAtTemperature> points) {
    StringBuilder text = new StringBuilder();
    text.append("\nDecay of relative phase pi: first passage of the mean cosine through ")
        .append(RingDecay.THRESHOLD).append("\n\n");
    line(text, "%6s %12s  %16s %7s  %-27s %-27s",
        "T/nK", "T/(g n x0 n)", "decayed/censored", "early", "rate per second [95 %]",
        "rate per second and metre");
    for (DecayAtTemperature point : points) {
      line(text, "%6.1f %12.5f  %9d/%-6d %7d  %-27s %-27s",
          point.temperature().nanokelvin(), point.ring().temperature(), point.decays(),
          point.ends().size() - point.decays(), point.earlyDecays(),
          point.rate().map(r -> perSecond(point, r, 1)).orElse("-"),
          point.rate().map(r -> perSecond(point, r, circumference(point))).orElse("-"));
    }
    text.append('\n');
    line(text, "early: decayed before the truncation time, left out of the rate.");
    text.append("\nTheory and simulation\n\n");
    line(text, "%6s %19s  %-28s %-27s %s", "T/nK", "E_b/T saddle closed",
        "mean lifetime/ms, predicted", "simulated [95 %]", "rate simulated/predicted");
    for (DecayAtTemperature point : points) {
      line(text, "%6.1f %12s %6.2f  %-28s %-27s %s",
          point.temperature().nanokelvin(),
          point.plan().rate().map(r -> number("%.2f", r.barrierOverTemperature())).orElse("-"),
          point.closedBarrierOverTemperature(), predicted(point),
          point.countedRate().map(r -> lifetime(point, r)).orElse("-"),
          ratio(point));
    }
    text.append('\n');
    line(text, "E_b: the critical bubble of the full two-component field (saddle), and its closed"
        + " form at fixed density, which is too high.");
    line(text, "predicted: one-loop rate of the full saddle with the cutoff of this run; in brackets"
        + " where a simulation is expected.");
    points.get(0).plan().rate().ifPresent(
        rate -> rate.remarks().forEach(remark -> line(text, "remark: %s", remark)));
    return text.append(slope(points)).append(plateau(points)).toString();
  }

  private static String predicted(DecayAtTemperature point) {
    return point.plan().rate()
        .map(
            rate -> {
              double milliseconds = 1e3 / rate.rate().perSecondPerMetreToD();
              return number("%.4g", milliseconds) + " ["
                  + number("%.4g", milliseconds / rate.highRatio()) + ", "
                  + number("%.4g", milliseconds / rate.lowRatio()) + "]";
            })
        .or(() -> point.plan().refusal().map(refusal -> refusal.reason().toString()))
        .orElse("-");
  }

  private static String lifetime(DecayAtTemperature point, RateEstimate rate) {
    double unit = point.ring().units().time(1).milliseconds();
    Interval interval = DecayAtTemperature.interval(rate);
    return String.format(
        Locale.ROOT, "%.4g [%.4g, %.4g]",
        unit / rate.rate(), unit / interval.upper(), unit / interval.lower());
  }

  private static String ratio(DecayAtTemperature point) {
    double expected = point.expectedRate();
    return point.countedRate().filter(rate -> !Double.isNaN(expected))
        .map(
            rate -> {
              Interval interval = DecayAtTemperature.interval(rate);
              return String.format(
                  Locale.ROOT, "%.2f [%.2f, %.2f]",
                  rate.rate() / expected, interval.lower() / expected,
                  interval.upper() / expected);
            })
        .orElse("-");
  }

  private static String number(String format, double value) {
    return String.format(Locale.ROOT, format, value);
  }

  private static double circumference(DecayAtTemperature point) {
    return point.ring().units().length(point.ring().length()).metres();
  }

  private static String perSecond(DecayAtTemperature point, RateEstimate rate, double divisor) {
    double factor = 1 / point.ring().units().time(1).seconds() / divisor;
    Interval interval = DecayAtTemperature.interval(rate);
    return String.format(
        Locale.ROOT, "%.4g [%.4g, %.4g]",
        rate.rate() * factor, interval.lower() * factor, interval.upper() * factor);
  }

  /** Fit of ln(rate) = ln A - B/T, if at least two temperatures have decays. */
  static Optional<ArrheniusFit> fit(List<DecayAtTemperature> points) {
    List<ArrheniusFit.CountedRate> rates = new ArrayList<>();
    for (DecayAtTemperature point : points) {
      point.countedRate().ifPresent(
          rate -> rates.add(
              new ArrheniusFit.CountedRate(point.ring().temperature(), rate)));
    }
    return rates.size() < 2 ? Optional.empty() : Optional.of(ArrheniusFit.ofCounts(rates));
  }

  private static String slope(List<DecayAtTemperature> points) {
    DecayAtTemperature first = points.get(0);
    double t = first.ring().temperature();
    double closed = first.closedBarrierOverTemperature() * t;
    double saddle = first.barrierOverTemperature() * t;
    return fit(points)
        .map(
            fit -> {
              double slope = fit.barrier().value();
              Interval interval = fit.barrierInterval(DecayAtTemperature.LEVEL);
              String against =
                  Double.isNaN(saddle)
                      ? ""
                      : String.format(
                          Locale.ROOT, "; full saddle E_b = %.3f, ratio %.2f [%.2f, %.2f]", saddle,
                          slope / saddle, interval.lower() / saddle, interval.upper() / saddle);
              return String.format(
                  Locale.ROOT,
                  "%n  slope of ln(rate) against 1/T: B = %.3f [%.3f, %.3f] scaled%s; closed form"
                      + " E_b = %.3f, ratio %.2f%n",
                  slope, interval.lower(), interval.upper(), against, closed, slope / closed);
            })
        .orElse("\n  slope of ln(rate) against 1/T: needs decays at two temperatures or more\n");
  }

  private static String plateau(List<DecayAtTemperature> points) {
    StringBuilder text =
        new StringBuilder(
            "\nSensitivity of the rate (per scaled time) to threshold and truncation time\n");
    for (DecayAtTemperature point : points) {
      for (double threshold : point.passages().thresholds()) {
        Optional<TruncationScan> scan = point.truncationScan(threshold);
        StringBuilder row = new StringBuilder();
        scan.ifPresent(
            table -> table.rows().forEach(
                r -> row.append(
                    String.format(
                        Locale.ROOT, "  %.0f: %.3e(%.0e)",
                        r.truncationTime(), r.rate().rate(), r.rate().standardError()))));
        line(text, "%5.1f nK %+4.1f%s", point.temperature().nanokelvin(), threshold,
            scan.isPresent() ? row : "  no trajectory outlived the largest truncation time");
      }
    }
    line(text, "A high threshold is passed later (the bubble must fill more of the ring) and needs"
        + " a longer truncation time.");
    return text.toString();
  }

  private static void line(StringBuilder text, String format, Object... values) {
    text.append("  ").append(String.format(Locale.ROOT, format, values)).append('\n');
  }
}
