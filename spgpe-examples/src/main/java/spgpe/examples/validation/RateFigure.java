package spgpe.examples.validation;

import java.nio.file.Path;
import java.util.List;
import org.jfree.chart.axis.LogAxis;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYErrorRenderer;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.data.xy.XYIntervalSeries;
import org.jfree.data.xy.XYIntervalSeriesCollection;
import org.jfree.data.xy.XYSeries;
import org.jfree.data.xy.XYSeriesCollection;
import spgpe.examples.plot.Charts;
import spgpe.statistics.Interval;
import spgpe.theory.CriticalBubble;
import spgpe.theory.DecayRate;
import spgpe.theory.Prediction;

/** Decay rates of simulation and theory against 1/T. */
final class RateFigure {
  private static final double FIRST = 8.5;
  private static final double LAST = 14.5;
  private static final int POINTS = 60;

  private RateFigure() {}

  static void write(Path file, CriticalBubble bubble, List<RateComparison.Row> rows) {
    XYIntervalSeriesCollection data = new XYIntervalSeriesCollection();
    data.addSeries(measured(rows));
    XYErrorRenderer look = new XYErrorRenderer();
    look.setSeriesPaint(0, Charts.colour(1));
    look.setDefaultLinesVisible(false);
    XYSeriesCollection lines = new XYSeriesCollection();
    XYSeries theory = new XYSeries("one-loop rate, same ring and cutoff");
    XYSeries low = new XYSeries("band 0.5 to 1.05 of it");
    XYSeries high = new XYSeries("upper edge");
    for (int i = 0; i <= POINTS; i++) {
      double temperature = bubble.energy() / (FIRST + (LAST - FIRST) * i / POINTS);
      DecayRate rate = DecayRate.of(bubble, temperature, RateComparison.DAMPING);
      Prediction prediction = rate.prediction();
      theory.add(1 / temperature, rate.total());
      if (rate.barrierOverTemperature() >= 9) {
        low.add(1 / temperature, prediction.lowRatio() * rate.total());
        high.add(1 / temperature, prediction.highRatio() * rate.total());
      }
    }
    lines.addSeries(theory);
    lines.addSeries(low);
    lines.addSeries(high);
    XYLineAndShapeRenderer lineLook = new XYLineAndShapeRenderer(true, false);
    lineLook.setDrawSeriesLineAsPath(true); // short segments would each restart the dash
    for (int i = 0; i < 3; i++) {
      lineLook.setSeriesPaint(i, i == 0 ? Charts.colour(0) : java.awt.Color.GRAY);
      lineLook.setSeriesStroke(i, Charts.stroke(i == 0 ? 0 : 1));
    }
    lineLook.setSeriesVisibleInLegend(2, false);
    LogAxis vertical = Charts.decades("decay rate of the ring (scaled units)");
    XYPlot plot = new XYPlot(data, Charts.linear("1/T (scaled units)"), vertical, look);
    plot.setDataset(1, lines);
    plot.setRenderer(1, lineLook);
    Charts.write(
        file,
        List.of(Charts.chart("Decay rate against 1/T: simulation and theory", plot, true)),
        820, 560);
  }

  private static XYIntervalSeries measured(List<RateComparison.Row> rows) {
    XYIntervalSeries series = new XYIntervalSeries("simulation, 95 % intervals");
    for (RateComparison.Row row : rows) {
      if (row.rate().events() > 0) {
        double x = 1 / row.temperature();
        Interval interval = row.interval();
        series.add(x, x, x, row.rate().rate(), interval.lower(), interval.upper());
      }
    }
    return series;
  }
}
