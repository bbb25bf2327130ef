package spgpe.examples.oblate;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import spgpe.examples.scenario.OblateScenario;
import spgpe.observables.bubble.Bubble;
import spgpe.observables.bubble.BubbleEvent;
import spgpe.observables.bubble.BubbleHistory;
import spgpe.observables.bubble.BubbleSettings;
import spgpe.observables.bubble.RadiusTrack;
import spgpe.observables.bubble.WallSpeed;
import spgpe.output.CsvColumn;
import spgpe.output.CsvWriter;
import spgpe.run.TimeSeries;
import spgpe.units.ScaledUnits;

/**
 * Tables of a run in laboratory units.
 *
 * @param scenario the experiment
 * @param outcome what came out
 */
record OblateReport(OblateScenario scenario, OblateRun.Outcome outcome) {
  /** A wall is fitted from this age on, when the bubble has left the barrier, in scaled units. */
  static final double FIT_AGE = 12;

  /**
   * A nucleation with the part of its radius that can be fitted, if it is long enough.
   *
   * @param bubble the bubble
   * @param radius radius before it wraps or an accepted bubble joins it
   * @param growth the same from {@link #FIT_AGE} on
   * @param speed mean speed of the wall, if there are at least ten frames
   */
  record Nucleation(
      Bubble bubble, RadiusTrack radius, RadiusTrack growth, Optional<WallSpeed> speed) {}

  private ScaledUnits units() {
    return scenario.units();
  }

  double milliseconds(double time) {
    return units().time(time).milliseconds();
  }

  double micrometres(double length) {
    return units().length(length).micrometres();
  }

  /** Speed in micrometres per millisecond. */
  double speed(double scaled) {
    return scaled * micrometres(1) / milliseconds(1);
  }

  List<Nucleation> nucleations() {
    List<Nucleation> found = new ArrayList<>();
    for (BubbleHistory history : outcome.histories()) {
      for (Bubble bubble : history.nucleations()) {
        double start = bubble.birthTime();
        double end = Math.nextDown(endOfGrowth(history, bubble));
        RadiusTrack radius = bubble.radius().untilWrapped().between(start, end);
        RadiusTrack growth = radius.between(start + FIT_AGE, end);
        found.add(
            new Nucleation(
                bubble, radius, growth,
                growth.size() >= 10 ? Optional.of(WallSpeed.linear(growth)) : Optional.empty()));
      }
    }
    return found;
  }

  /** The first merger with another accepted bubble, or its end. */
  private static double endOfGrowth(BubbleHistory history, Bubble bubble) {
    return history
        .events(
            e ->
                e.kind() == BubbleEvent.Kind.MERGED && e.other() == bubble.index()
                    && history.bubbles().get(e.bubble()).accepted())
        .stream()
        .mapToDouble(BubbleEvent::time)
        .findFirst()
        .orElse(bubble.endTime());
  }

  String text() {
    BubbleSettings settings = outcome.histories().get(0).settings();
    StringBuilder text = new StringBuilder();
    text.append(
        String.format(
            Locale.ROOT,
            "Detector, %s:%n  smoothing %.2f um, seed level %.2f, grow level %.2f, minimum diameter"
                + " %.2f um%n",
            settings.origin(), micrometres(settings.smoothing()), settings.seedLevel(),
            settings.growLevel(), micrometres(settings.minimumWidth())));
    text.append(
        String.format(
            Locale.ROOT, "Nucleations:%n%-10s %9s %8s %8s %9s %-10s %14s%n", "trajectory",
            "birth/ms", "x/um", "y/um", "end/ms", "fate", "wall/(um/ms)"));
    for (Nucleation n : nucleations()) {
      Bubble b = n.bubble();
      text.append(
          String.format(
              Locale.ROOT, "%-10d %9.1f %8.1f %8.1f %9.1f %-10s %14s%n", b.trajectory(),
              milliseconds(b.birthTime()), micrometres(b.birthSite().x()),
              micrometres(b.birthSite().y()), milliseconds(b.endTime()),
              b.fate().toString().toLowerCase(Locale.ROOT),
              n.speed()
                  .map(s -> String.format(Locale.ROOT, "%.3f", speed(s.speed().value())))
                  .orElse("-")));
    }
    double[] speeds =
        nucleations().stream().flatMap(n -> n.speed().stream())
            .mapToDouble(s -> speed(s.speed().value())).toArray();
    if (speeds.length > 0) {
      text.append(
          String.format(
              Locale.ROOT,
              "Wall speed: %.3f um/ms over %d bubbles, %.3f to %.3f; relative-phase speed in the"
                  + " metastable state, an upper bound: %.3f um/ms%n",
              java.util.Arrays.stream(speeds).average().orElseThrow(), speeds.length,
              java.util.Arrays.stream(speeds).min().orElseThrow(),
              java.util.Arrays.stream(speeds).max().orElseThrow(),
              scenario.pair().relativePhaseSpeed() * 1e3));
    }
    for (TimeSeries.Series series : outcome.defects()) {
      text.append(
          String.format(
              Locale.ROOT,
              "Trajectory %d: at most %.0f vortices of component 0, %.0f of the relative phase,"
                  + " %.0f um of walls%n",
              series.end().trajectory(), largest(series, Defects.COMPONENT),
              largest(series, Defects.RELATIVE), micrometres(largest(series, Defects.WALLS))));
    }
    return text.toString();
  }

  private static double largest(TimeSeries.Series series, int number) {
    return java.util.Arrays.stream(series.values()).mapToDouble(v -> v[number]).max().orElse(0);
  }

  void writeFiles(Path folder) {
    List<CsvColumn> columns =
        List.of(
            CsvColumn.of("trajectory"), CsvColumn.of("time", "ms"), CsvColumn.of("radius", "um"),
            CsvColumn.of("x", "um"), CsvColumn.of("y", "um"), CsvColumn.of("wraps"));
    try (CsvWriter csv = CsvWriter.create(folder.resolve("radii.csv"), columns)) {
      for (Nucleation n : nucleations()) {
        RadiusTrack track = n.bubble().radius();
        for (int i = 0; i < track.size(); i++) {
          csv.row(
              n.bubble().trajectory(), milliseconds(track.time(i)), micrometres(track.radius(i)),
              micrometres(track.extent(i).centre().x()),
              micrometres(track.extent(i).centre().y()), track.extent(i).wraps() ? 1 : 0);
        }
      }
      csv.commit();
    }
    columns =
        List.of(
            CsvColumn.of("trajectory"), CsvColumn.of("time", "ms"),
            CsvColumn.of("vortices_of_component_0"), CsvColumn.of("vortices_of_relative_phase"),
            CsvColumn.of("wall_length", "um"));
    try (CsvWriter csv = CsvWriter.create(folder.resolve("defects.csv"), columns)) {
      for (TimeSeries.Series series : outcome.defects()) {
        for (int s = 0; s < series.times().length; s++) {
          double[] v = series.values()[s];
          csv.row(
              series.end().trajectory(), milliseconds(series.times()[s]), v[Defects.COMPONENT],
              v[Defects.RELATIVE], micrometres(v[Defects.WALLS]));
        }
      }
      csv.commit();
    }
  }
}
