package spgpe.examples.oblate;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jfree.chart.JFreeChart;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.data.xy.XYSeries;
import org.jfree.data.xy.XYSeriesCollection;
import spgpe.examples.plot.Charts;
import spgpe.observables.bubble.Bubble;
import spgpe.observables.bubble.RadiusTrack;
import spgpe.output.FieldImage;
import spgpe.run.TimeSeries;
import spgpe.statistics.Estimate;

/** Figures of a run in laboratory units. */
final class OblateFigures {
  /** Ages of the shown bubble in the panels, scaled time. */
  private static final double[] AGES = {2, 18, 34, 50};

  private static final int LARGEST_NUMBER_OF_CURVES = 4;

  private final OblateReport report;
  private final List<OblateReport.Nucleation> nucleations;

  OblateFigures(OblateReport report) {
    this.report = report;
    this.nucleations = report.nucleations();
  }

  /** Whether there is a bubble to show. */
  boolean isEmpty() {
    return nucleations.isEmpty();
  }

  /** The nucleation whose radius could be followed longest. */
  private Bubble shown() {
    return nucleations.stream()
        .max((a, b) -> Integer.compare(a.growth().size(), b.growth().size()))
        .orElseThrow()
        .bubble();
  }

  private static TimeSeries.Series of(List<TimeSeries.Series> all, Bubble bubble) {
    return all.stream()
        .filter(s -> s.end().trajectory() == bubble.trajectory())
        .findFirst()
        .orElseThrow();
  }

  /** cos(relative phase) of the shown trajectory at several ages of its bubble. */
  void panels(Path file) {
    Bubble bubble = shown();
    TimeSeries.Series series = of(report.outcome().cosines(), bubble);
    double side = report.scenario().side().micrometres();
    int points = (int) Math.rint(Math.sqrt(series.values()[0].length));
    List<JFreeChart> panels = new ArrayList<>();
    for (double age : AGES) {
      int frame = 0;
      while (frame + 1 < series.times().length
          && series.times()[frame] < bubble.birthTime() + age) {
        frame++;
      }
      panels.add(
          Charts.map(
              String.format(
                  Locale.ROOT, "t = %.1f ms", report.milliseconds(series.times()[frame])),
              FieldImage.of(series.values()[frame], points, points).withRange(-1, 1)
                  .withFirstRowAtBottom(),
              new Charts.Axis("x (µm)", 0, side), new Charts.Axis("y (µm)", 0, side),
              new Charts.Axis("cos(relative phase)", -1, 1)));
    }
    Charts.write(file, panels, 340, 420);
  }

  /** Radius against age with the fitted lines. */
  void radii(Path file) {
    XYSeriesCollection data = new XYSeriesCollection();
    XYLineAndShapeRenderer look = new XYLineAndShapeRenderer();
    look.setDrawSeriesLineAsPath(true); // short segments would each restart the dash
    int curve = 0;
    for (OblateReport.Nucleation n : nucleations) {
      if (n.speed().isEmpty() || curve == LARGEST_NUMBER_OF_CURVES) {
        continue;
      }
      Bubble bubble = n.bubble();
      Estimate speed = n.speed().get().speed();
      XYSeries measured =
          new XYSeries(
              String.format(
                  Locale.ROOT, "trajectory %d, bubble %d", bubble.trajectory(), bubble.index()));
      RadiusTrack track = n.radius();
      for (int i = 0; i < track.size(); i++) {
        measured.add(
            report.milliseconds(track.time(i) - bubble.birthTime()),
            report.micrometres(track.radius(i)));
      }
      XYSeries line =
          new XYSeries(
              String.format(
                  Locale.ROOT, "fit to %d, %d: %.2f µm/ms", bubble.trajectory(), bubble.index(),
                  report.speed(speed.value())));
      double meanTime = 0;
      double meanRadius = 0;
      int count = n.growth().size();
      for (int i = 0; i < count; i++) {
        meanTime += n.growth().time(i) / count;
        meanRadius += n.growth().radius(i) / count;
      }
      for (int i : new int[] {0, count - 1}) {
        double t = n.growth().time(i);
        line.add(
            report.milliseconds(t - bubble.birthTime()),
            report.micrometres(meanRadius + speed.value() * (t - meanTime)));
      }
      data.addSeries(measured);
      data.addSeries(line);
      for (int j = 0; j < 2; j++) {
        look.setSeriesPaint(2 * curve + j, Charts.colour(curve));
        look.setSeriesStroke(2 * curve + j, Charts.stroke(j));
        look.setSeriesLinesVisible(2 * curve + j, j == 1);
        look.setSeriesShapesVisible(2 * curve + j, j == 0);
      }
      curve++;
    }
    XYPlot plot =
        new XYPlot(
            data, Charts.linear("time since birth (ms)"),
            Charts.linear("radius of equal area (µm)"), look);
    Charts.write(
        file, List.of(Charts.chart("Growth of the bubbles, lines fitted", plot, true)), 820, 560);
  }

  /** Vortices and walls of the shown trajectory. */
  void defects(Path file) {
    TimeSeries.Series series = of(report.outcome().defects(), shown());
    XYPlot vortices =
        lines(
            series, "number of vortices, both signs", 1, List.of("relative phase", "component 0"),
            new int[] {Defects.RELATIVE, Defects.COMPONENT});
    XYPlot walls =
        lines(
            series, "length of cos(relative phase) = 0 (µm)", report.micrometres(1),
            List.of("walls"), new int[] {Defects.WALLS});
    String title =
        String.format(Locale.ROOT, "trajectory %d", series.end().trajectory());
    Charts.write(
        file,
        List.of(
            Charts.chart("Vortices, " + title, vortices, true),
            Charts.chart("Domain walls, " + title, walls, false)),
        560, 440);
  }

  private XYPlot lines(
      TimeSeries.Series series, String label, double unit, List<String> names, int[] numbers) {
    XYSeriesCollection data = new XYSeriesCollection();
    XYLineAndShapeRenderer look = new XYLineAndShapeRenderer(true, false);
    look.setDrawSeriesLineAsPath(true);
    for (int i = 0; i < numbers.length; i++) {
      XYSeries curve = new XYSeries(names.get(i));
      for (int s = 0; s < series.times().length; s++) {
        curve.add(
            report.milliseconds(series.times()[s]), unit * series.values()[s][numbers[i]]);
      }
      data.addSeries(curve);
      look.setSeriesPaint(i, Charts.colour(i));
      look.setSeriesStroke(i, Charts.stroke(i));
    }
    return new XYPlot(data, Charts.linear("time (ms)"), Charts.linear(label), look);
  }
}
