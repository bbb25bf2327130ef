package spgpe.examples.validation;

import java.nio.file.Path;
import java.text.DecimalFormat;
import java.text.DecimalFormatSymbols;
import java.util.List;
import java.util.Locale;
import org.jfree.chart.axis.LogAxis;
import org.jfree.chart.axis.NumberTickUnit;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.data.xy.XYSeries;
import org.jfree.data.xy.XYSeriesCollection;
import spgpe.examples.plot.Charts;

/** Occupation of the modulated mode against time with the predicted slopes. */
final class GrowthFigure {
  /** The predicted line is drawn through the simulation at this time. */
  private static final double ANCHOR = 40;

  private GrowthFigure() {}

  static void write(Path file, List<ModulatedGrowth.Curve> curves) {
    XYSeriesCollection data = new XYSeriesCollection();
    XYLineAndShapeRenderer look = new XYLineAndShapeRenderer(true, false);
    look.setDrawSeriesLineAsPath(true); // short segments would each restart the dash
    for (int i = 0; i < curves.size(); i++) {
      ModulatedGrowth.Curve curve = curves.get(i);
      String name = String.format(Locale.ROOT, "gamma = %.4f", curve.damping());
      data.addSeries(simulated(curve, name));
      data.addSeries(predicted(curve, name + ", Floquet"));
      for (int j = 0; j < 2; j++) {
        look.setSeriesPaint(2 * i + j, Charts.colour(i));
        look.setSeriesStroke(2 * i + j, Charts.stroke(j));
      }
    }
    LogAxis vertical = Charts.decades("atoms in the modes k and -k");
    vertical.setTickUnit(new NumberTickUnit(3));
    vertical.setNumberFormatOverride(
        new DecimalFormat("0E0", DecimalFormatSymbols.getInstance(Locale.ROOT)));
    vertical.setRange(1e-19, 10);
    XYPlot plot = new XYPlot(data, Charts.linear("time (scaled units)"), vertical, look);
    Charts.write(
        file,
        List.of(Charts.chart("Fastest mode under the modulated coupling", plot, true)), 820, 600);
  }

  private static XYSeries simulated(ModulatedGrowth.Curve curve, String name) {
    XYSeries series = new XYSeries(name);
    for (int i = 0; i < curve.times().length; i++) {
      series.add(curve.times()[i], curve.occupations()[i]);
    }
    return series;
  }

  private static XYSeries predicted(ModulatedGrowth.Curve curve, String name) {
    XYSeries series = new XYSeries(name);
    double[] t = curve.times();
    int anchor = 0;
    while (t[anchor] < ANCHOR) {
      anchor++;
    }
    double growth = ModulatedGrowth.predicted(curve.damping());
    for (double time : t) {
      series.add(
          time, curve.occupations()[anchor] * Math.exp(2 * growth * (time - t[anchor])));
    }
    return series;
  }
}
