package spgpe.examples.ring;

import java.awt.Color;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jfree.chart.JFreeChart;
import org.jfree.chart.annotations.XYDataImageAnnotation;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.LookupPaintScale;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.chart.title.PaintScaleLegend;
import org.jfree.chart.ui.RectangleEdge;
import org.jfree.data.xy.XYSeriesCollection;
import spgpe.examples.plot.Charts;
import spgpe.output.ColourMap;
import spgpe.output.FieldImage;
import spgpe.run.TimeSeries;

/** Space-time maps of cos(relative phase), one panel for each temperature. */
final class SpaceTimeFigure {
  private static final int WIDTH = 430;
  private static final int HEIGHT = 620;

  private final List<JFreeChart> panels = new ArrayList<>();

  void add(DecayAtTemperature point, TimeSeries.Series series) {
    double[][] rows = series.values();
    int columns = rows[0].length;
    double[] flat = new double[rows.length * columns];
    for (int t = 0; t < rows.length; t++) {
      System.arraycopy(rows[t], 0, flat, t * columns, columns);
    }
    double length = point.ring().units().length(point.ring().length()).micrometres();
    double begin = milliseconds(point, series.times()[0]);
    double end = milliseconds(point, series.times()[rows.length - 1]);
    XYPlot plot =
        new XYPlot(
            new XYSeriesCollection(), Charts.linear("position along the ring (µm)"),
            Charts.linear("time (ms)"), new XYLineAndShapeRenderer());
    plot.getDomainAxis().setRange(0, length);
    plot.getRangeAxis().setRange(begin, end);
    plot.addAnnotation(
        new XYDataImageAnnotation(
            FieldImage.of(flat, rows.length, columns).withRange(-1, 1).withFirstRowAtBottom()
                .toImage(),
            0, begin, length, end - begin));
    String title =
        String.format(
            Locale.ROOT, "T = %.1f nK, trajectory %d", point.temperature().kelvin() * 1e9,
            series.end().trajectory());
    JFreeChart chart = Charts.chart(title, plot, false);
    chart.addSubtitle(colourBar());
    panels.add(chart);
  }

  private static PaintScaleLegend colourBar() {
    ColourMap map = ColourMap.sequential();
    LookupPaintScale scale = new LookupPaintScale(-1, 1, Color.GRAY);
    for (int i = 0; i < 256; i++) {
      scale.add(-1 + i / 128.0, new Color(map.colour((i + 0.5) / 256)));
    }
    NumberAxis axis = Charts.linear("cos(relative phase)");
    PaintScaleLegend legend = new PaintScaleLegend(scale, axis);
    legend.setPosition(RectangleEdge.BOTTOM);
    legend.setSubdivisionCount(256);
    legend.setStripWidth(14);
    legend.setPadding(4, 60, 4, 20);
    return legend;
  }

  private static double milliseconds(DecayAtTemperature point, double time) {
    return point.ring().units().time(time).milliseconds();
  }

  boolean isEmpty() {
    return panels.isEmpty();
  }

  void write(Path file) {
    Charts.write(file, panels, WIDTH, HEIGHT);
  }
}
