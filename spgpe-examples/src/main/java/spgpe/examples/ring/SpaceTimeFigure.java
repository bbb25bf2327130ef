package spgpe.examples.ring;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jfree.chart.JFreeChart;
import spgpe.examples.plot.Charts;
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
    String title =
        String.format(
            Locale.ROOT, "T = %.1f nK, trajectory %d", point.temperature().kelvin() * 1e9,
            series.end().trajectory());
    panels.add(
        Charts.map(
            title,
            FieldImage.of(flat, rows.length, columns).withRange(-1, 1).withFirstRowAtBottom(),
            new Charts.Axis("position along the ring (µm)", 0, length),
            new Charts.Axis("time (ms)", begin, end),
            new Charts.Axis("cos(relative phase)", -1, 1)));
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
