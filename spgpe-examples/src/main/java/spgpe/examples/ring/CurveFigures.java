package spgpe.examples.ring;

import java.awt.Color;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.jfree.chart.JFreeChart;
import org.jfree.chart.axis.LogAxis;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.DeviationRenderer;
import org.jfree.chart.renderer.xy.XYErrorRenderer;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.data.xy.XYIntervalSeries;
import org.jfree.data.xy.XYIntervalSeriesCollection;
import org.jfree.data.xy.XYSeries;
import org.jfree.data.xy.XYSeriesCollection;
import spgpe.examples.plot.Charts;
import spgpe.statistics.ArrheniusFit;
import spgpe.statistics.Interval;
import spgpe.statistics.KaplanMeier;
import spgpe.statistics.RateEstimate;

/** Survival curves, and the rate against 1/T. */
final class CurveFigures {
  private static final double LOWEST_SURVIVAL = 0.005;
  private static final int CURVE_POINTS = 60;

  private CurveFigures() {}

  static void survival(Path file, List<DecayAtTemperature> points) {
    XYIntervalSeriesCollection curves = new XYIntervalSeriesCollection();
    XYSeriesCollection fits = new XYSeriesCollection();
    DeviationRenderer curveLook = new DeviationRenderer(true, false);
    XYLineAndShapeRenderer fitLook = new XYLineAndShapeRenderer(true, false);
    fitLook.setDrawSeriesLineAsPath(true); // short segments would each restart the dash
    for (int i = 0; i < points.size(); i++) {
      DecayAtTemperature point = points.get(i);
      String label = String.format(Locale.ROOT, "%.1f nK", point.temperature().kelvin() * 1e9);
      curves.addSeries(curve(point, label));
      fits.addSeries(fit(point, label + ", exponential fit"));
      curveLook.setSeriesPaint(i, Charts.colour(i));
      curveLook.setSeriesFillPaint(i, Charts.colour(i));
      curveLook.setSeriesStroke(i, Charts.stroke(0));
      fitLook.setSeriesPaint(i, Charts.colour(i));
      fitLook.setSeriesStroke(i, Charts.stroke(1));
    }
    curveLook.setAlpha(0.2f);
    LogAxis vertical = Charts.decades("fraction not decayed");
    XYPlot plot = new XYPlot(curves, Charts.linear("time (ms)"), vertical, curveLook);
    plot.setDataset(1, fits);
    plot.setRenderer(1, fitLook);
    vertical.setRange(LOWEST_SURVIVAL, 1.1);
    write(file, "Survival of relative phase π (Kaplan-Meier, 95 % band)", plot);
  }

  private static XYIntervalSeries curve(DecayAtTemperature point, String label) {
    XYIntervalSeries series = new XYIntervalSeries(label);
    KaplanMeier curve = point.survival();
    double before = 1;
    series.add(0, 0, 0, 1, 1, 1);
    for (KaplanMeier.Step step : curve.steps()) {
      double t = milliseconds(point, step.time());
      if (step.survival() < LOWEST_SURVIVAL) {
        break;
      }
      Interval band = curve.intervalAt(step.time(), DecayAtTemperature.LEVEL);
      double low = Math.max(LOWEST_SURVIVAL, band.lower());
      series.add(t, t, t, before, Math.min(before, low), Math.max(before, band.upper()));
      series.add(t, t, t, step.survival(), low, band.upper());
      before = step.survival();
    }
    return series;
  }

  private static XYSeries fit(DecayAtTemperature point, String label) {
    XYSeries series = new XYSeries(label);
    if (point.rate().isEmpty() || point.rate().get().events() == 0) {
      return series;
    }
    RateEstimate rate = point.rate().get();
    double start = point.truncation();
    double atStart = point.survival().survivalAt(start);
    double end =
        Math.min(
            point.until(), start + Math.log(atStart / LOWEST_SURVIVAL) / rate.rate());
    for (int i = 0; i <= CURVE_POINTS; i++) {
      double t = start + (end - start) * i / CURVE_POINTS;
      series.add(
          milliseconds(point, t), atStart * Math.exp(-rate.rate() * (t - start)));
    }
    return series;
  }

  static void rates(Path file, List<DecayAtTemperature> points) {
    XYIntervalSeries measured = new XYIntervalSeries("simulation, 95 % intervals");
    for (DecayAtTemperature point : points) {
      Optional<RateEstimate> found = point.countedRate();
      if (found.isPresent()) {
        Interval interval = DecayAtTemperature.interval(found.get());
        double x = inverse(point);
        measured.add(
            x, x, x, perSecond(point, found.get().rate()), perSecond(point, interval.lower()),
            perSecond(point, interval.upper()));
      }
    }
    XYIntervalSeriesCollection data = new XYIntervalSeriesCollection();
    data.addSeries(measured);
    XYErrorRenderer look = new XYErrorRenderer();
    look.setSeriesPaint(0, Charts.colour(0));
    look.setDefaultLinesVisible(false);
    LogAxis vertical = Charts.decades("decay rate of the ring (1/s)");
    XYPlot plot = new XYPlot(data, Charts.linear("1/T (1/µK)"), vertical, look);
    XYSeriesCollection lines = new XYSeriesCollection();
    Report.fit(points).ifPresent(fit -> addLines(lines, points, fit));
    XYLineAndShapeRenderer lineLook = new XYLineAndShapeRenderer(true, false);
    for (int i = 0; i < lines.getSeriesCount(); i++) {
      lineLook.setSeriesPaint(i, i == 0 ? Charts.colour(0) : i == 1 ? Charts.colour(1) : Color.GRAY);
      lineLook.setSeriesStroke(i, Charts.stroke(Math.min(i, 1)));
    }
    plot.setDataset(1, lines);
    plot.setRenderer(1, lineLook);
    if (measured.getItemCount() > 0) {
      vertical.setRange( // whole decades, so that at least two are labelled
          Math.pow(10, Math.floor(Math.log10(lowest(measured)))),
          Math.pow(10, Math.ceil(Math.log10(highest(measured)))));
    }
    write(file, "Decay rate against 1/T", plot);
  }

  private static double lowest(XYIntervalSeries series) {
    double lowest = Double.POSITIVE_INFINITY;
    for (int i = 0; i < series.getItemCount(); i++) {
      lowest = Math.min(lowest, series.getYLowValue(i));
    }
    return lowest;
  }

  private static double highest(XYIntervalSeries series) {
    double highest = 0;
    for (int i = 0; i < series.getItemCount(); i++) {
      highest = Math.max(highest, series.getYHighValue(i));
    }
    return highest;
  }

  /** The fitted line, the expected rates, and the slope of the closed form through the middle. */
  private static void addLines(
      XYSeriesCollection lines, List<DecayAtTemperature> points, ArrheniusFit fit) {
    XYSeries fitted = new XYSeries("fit of ln(rate) = ln A - B/T");
    XYSeries expected = new XYSeries("theory, full saddle");
    XYSeries closed = new XYSeries("slope of the closed-form barrier");
    DecayAtTemperature middle = points.get(points.size() / 2);
    double barrier = middle.closedBarrierOverTemperature() * middle.ring().temperature();
    double anchor = fit.logRateAt(middle.ring().temperature()).value();
    for (DecayAtTemperature point : points) {
      double t = point.ring().temperature();
      fitted.add(inverse(point), perSecond(point, Math.exp(fit.logRateAt(t).value())));
      if (!Double.isNaN(point.expectedRate())) {
        expected.add(inverse(point), perSecond(point, point.expectedRate()));
      }
      double change = -barrier * (1 / t - 1 / middle.ring().temperature());
      closed.add(inverse(point), perSecond(point, Math.exp(anchor + change)));
    }
    lines.addSeries(fitted);
    lines.addSeries(expected);
    lines.addSeries(closed);
  }

  private static void write(Path file, String title, XYPlot plot) {
    JFreeChart chart = Charts.chart(title, plot, true);
    Charts.write(file, List.of(chart), 820, 560);
  }

  private static double inverse(DecayAtTemperature point) {
    return 1e-6 / point.temperature().kelvin();
  }

  private static double perSecond(DecayAtTemperature point, double scaledRate) {
    return scaledRate / point.ring().units().time(1).seconds();
  }

  private static double milliseconds(DecayAtTemperature point, double time) {
    return point.ring().units().time(time).milliseconds();
  }
}
