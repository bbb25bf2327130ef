package spgpe.examples.ring;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
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

  static String setUp(RingScenario scenario, ScaledRing hottest, int cutoffModes) {
    ScaledUnits units = hottest.units();
    StringBuilder text = new StringBuilder("Invented experiment\n").append(RingScenario.describe());
    text.append("\nScaled parameters (energies in g n, lengths in x0, times in t0)\n");
    line(text, "x0 = %.4f um, t0 = %.4f ms, g n/h = %.1f Hz",
        units.lengthUnit().micrometres(), units.timeUnit().milliseconds(),
        units.energyUnit().hertz());
    line(text, "L = %.2f, J = %.4f, kappa = %.4f, mu = %.4f, kept modes |n| <= %d",
        hottest.length(), hottest.coherent(), hottest.biquadratic(), hottest.mu(), cutoffModes);
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
    line(text, "damping gamma = %.3g; kinetic theory of the thermal cloud gives %.1g. Rates at such"
        + " small damping are lower,", scenario.damping(), hottest.bath().growthRate());
    line(text, "because the field thermalises slowly; read the rates below as those of a well"
        + " thermalised gas.");
    line(text, "step dt = %.2g in units of t0, where the occupation bias is below 0.1 %%", RingDecay.STEP);
    return text.toString();
  }

  static String table(List<DecayAtTemperature> points) {
    StringBuilder text = new StringBuilder();
    text.append("\nDecay of relative phase pi: first passage of the mean cosine through ")
        .append(RingDecay.THRESHOLD).append("\n\n");
    line(text, "%6s %9s %6s  %16s %7s  %-27s %-27s",
        "T/nK", "T/(g n x0 n)", "E_b/T", "decayed/censored", "early", "rate per second [95 %]",
        "rate per second and metre");
    for (DecayAtTemperature point : points) {
      line(text, "%6.1f %12.5f %6.2f  %10d/%-6d %6d  %-27s %-27s",
          point.temperature().kelvin() * 1e9, point.ring().temperature(),
          point.barrierOverTemperature(), point.decays(), point.ends().size() - point.decays(),
          point.earlyDecays(), point.rate().map(r -> perSecond(point, r, 1)).orElse("-"),
          point.rate().map(r -> perSecond(point, r, circumference(point))).orElse("-"));
    }
    text.append('\n');
    line(text, "E_b: closed form of the critical bubble at fixed density. The density responds and"
        + " lowers the barrier (here by about a tenth).");
    line(text, "early: decayed before the truncation time %.0f t0 (%.1f ms), left out of the rate (relaxation of the"
        + " cold start and growth of the first bubble).",
        points.get(0).truncation(),
        points.get(0).ring().units().time(points.get(0).truncation()).milliseconds());
    return text.append(slope(points)).append(plateau(points)).toString();
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
      point.rate().filter(rate -> rate.events() > 0).ifPresent(
          rate -> rates.add(
              new ArrheniusFit.CountedRate(point.ring().temperature(), rate)));
    }
    return rates.size() < 2 ? Optional.empty() : Optional.of(ArrheniusFit.ofCounts(rates));
  }

  private static String slope(List<DecayAtTemperature> points) {
    DecayAtTemperature first = points.get(0);
    double closed = first.barrierOverTemperature() * first.ring().temperature();
    return fit(points)
        .map(
            fit -> {
              Interval interval = fit.barrierInterval(DecayAtTemperature.LEVEL);
              return String.format(
                  Locale.ROOT,
                  "%n  slope of ln(rate) against 1/T: B = %.3f [%.3f, %.3f] scaled; closed form E_b"
                      + " = %.3f, ratio %.2f%n",
                  fit.barrier().value(), interval.lower(), interval.upper(), closed,
                  fit.barrier().value() / closed);
            })
        .orElse("\n  slope of ln(rate) against 1/T: needs decays at two temperatures or more\n");
  }

  private static String plateau(List<DecayAtTemperature> points) {
    StringBuilder text =
        new StringBuilder("\nSensitivity of the rate (per scaled time) to the truncation time\n");
    for (DecayAtTemperature point : points) {
      Optional<TruncationScan> scan = point.truncationScan();
      StringBuilder row = new StringBuilder();
      scan.ifPresent(
          table -> table.rows().forEach(
              r -> row.append(
                  String.format(
                      Locale.ROOT, "  %.0f: %.3e(%.0e)",
                      r.truncationTime(), r.rate().rate(), r.rate().standardError()))));
      line(text, "%5.1f nK%s", point.temperature().kelvin() * 1e9,
          scan.isPresent() ? row : "  no trajectory outlived the largest truncation time");
    }
    return text.toString();
  }

  private static void line(StringBuilder text, String format, Object... values) {
    text.append("  ").append(String.format(Locale.ROOT, format, values)).append('\n');
  }
}
