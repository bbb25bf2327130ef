package spgpe.examples.validation;

import java.awt.Color;
import java.awt.Polygon;
import java.awt.Shape;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Rectangle2D;
import java.nio.file.Path;
import java.util.List;
import org.jfree.chart.axis.LogAxis;
import org.jfree.chart.axis.NumberTickUnit;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.data.xy.XYSeries;
import org.jfree.data.xy.XYSeriesCollection;
import spgpe.examples.plot.Charts;
import spgpe.integrate.Integrator;
import spgpe.integrate.bench.EquilibriumBias;

/** Equilibrium bias against work: one curve for each scheme, one point for each step. */
final class WorkPrecisionFigure {
  private static final double LONGEST_STEP = 0.16;
  private static final double RATIO = 1.25;
  private static final int STEPS = 16;
  private static final double LEAST_PERCENT = 1e-3;
  private static final double MOST_PERCENT = 100;

  /** For the lines and for the outline of the marks; they need not differ, the marks do. */
  private static final Color[] COLOURS = {
    Charts.colour(0), Charts.colour(3), Charts.colour(1), Charts.colour(2), Color.BLACK
  };

  private WorkPrecisionFigure() {}

  static void write(Path file, EquilibriumBias modes, List<Integrator> schemes, String title) {
    XYSeriesCollection data = new XYSeriesCollection();
    XYLineAndShapeRenderer look = new XYLineAndShapeRenderer(true, true);
    look.setDrawSeriesLineAsPath(true); // short segments would each restart the dash
    look.setUseFillPaint(true);
    for (int i = 0; i < schemes.size(); i++) {
      data.addSeries(curve(modes, schemes.get(i)));
      look.setSeriesPaint(i, COLOURS[i % COLOURS.length]);
      look.setSeriesFillPaint(i, i % 2 == 0 ? COLOURS[i % COLOURS.length] : Color.WHITE);
      look.setSeriesStroke(i, Charts.stroke(i));
      look.setSeriesShape(i, mark(i));
    }
    LogAxis work = Charts.decades("force evaluations per unit time (scaled units)");
    work.setRange(5, 2000);
    LogAxis bias = Charts.decades("largest |occupation bias| of a mode (percent)");
    bias.setRange(LEAST_PERCENT, MOST_PERCENT);
    for (LogAxis axis : List.of(work, bias)) {
      axis.setTickUnit(new NumberTickUnit(1));
    }
    XYPlot plot = new XYPlot(data, work, bias, look);
    plot.addRangeMarker(new ValueMarker(0.1, Color.GRAY, Charts.stroke(0)));
    Charts.write(file, List.of(Charts.chart(title, plot, true)), 820, 560);
  }

  private static XYSeries curve(EquilibriumBias modes, Integrator scheme) {
    XYSeries curve = new XYSeries(scheme.getClass().getSimpleName());
    double step = LONGEST_STEP;
    for (int s = 0; s < STEPS; s++, step /= RATIO) {
      double percent = 100 * Math.abs(modes.worst(scheme.withStep(step)).bias());
      if (percent >= LEAST_PERCENT && percent <= MOST_PERCENT) {
        curve.add(scheme.facts().forceEvaluationsPerStep() / step, percent);
      }
    }
    return curve;
  }

  private static Shape mark(int index) {
    return switch (index % 5) {
      case 0 -> new Ellipse2D.Double(-4.5, -4.5, 9, 9);
      case 1 -> new Rectangle2D.Double(-4, -4, 8, 8);
      case 2 -> new Polygon(new int[] {-5, 5, 0}, new int[] {4, 4, -5}, 3);
      case 3 -> new Polygon(new int[] {-5, 0, 5, 0}, new int[] {0, 5, 0, -5}, 4);
      default -> new Polygon(new int[] {-5, 5, 0}, new int[] {-4, -4, 5}, 3);
    };
  }
}
