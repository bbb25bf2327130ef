package spgpe.examples.ring;

import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import spgpe.output.CsvColumn;
import spgpe.output.CsvWriter;
import spgpe.output.NpyArray;
import spgpe.output.NpzWriter;
import spgpe.run.TimeSeries;
import spgpe.run.TrajectoryEnd;
import spgpe.statistics.Interval;
import spgpe.statistics.KaplanMeier;
import spgpe.statistics.RateEstimate;

/** The raw curves as CSV and NPZ. */
final class ResultFiles {
  private ResultFiles() {}

  static void rates(Path folder, List<DecayAtTemperature> points) {
    List<CsvColumn> columns =
        List.of(
            CsvColumn.of("temperature", "nK"), CsvColumn.of("temperature_scaled", "g n n x0"),
            CsvColumn.of("barrier_over_temperature"),
            CsvColumn.of("closed_barrier_over_temperature"), CsvColumn.of("expected_rate", "1/s"),
            CsvColumn.of("decays"), CsvColumn.of("exposure", "t0"), CsvColumn.of("rate", "1/s"),
            CsvColumn.of("rate_low", "1/s"), CsvColumn.of("rate_high", "1/s"));
    try (CsvWriter csv = CsvWriter.create(folder.resolve("rates.csv"), columns)) {
      for (DecayAtTemperature point : points) {
        if (point.rate().isPresent()) {
          RateEstimate rate = point.rate().get();
          Interval interval = DecayAtTemperature.interval(rate);
          double perSecond = 1 / point.ring().units().time(1).seconds();
          csv.row(
              point.temperature().nanokelvin(), point.ring().temperature(),
              point.barrierOverTemperature(), point.closedBarrierOverTemperature(),
              point.expectedRate() * perSecond, rate.events(), rate.exposure(),
              rate.rate() * perSecond, interval.lower() * perSecond,
              interval.upper() * perSecond);
        }
      }
      csv.commit();
    }
  }

  static void survival(Path folder, DecayAtTemperature point) {
    List<CsvColumn> columns =
        List.of(
            CsvColumn.of("time", "ms"), CsvColumn.of("at_risk"), CsvColumn.of("survival"),
            CsvColumn.of("low"), CsvColumn.of("high"));
    String name = "survival-" + label(point) + ".csv";
    try (CsvWriter csv = CsvWriter.create(folder.resolve(name), columns)) {
      KaplanMeier curve = point.survival();
      for (KaplanMeier.Step step : curve.steps()) {
        Interval band = curve.intervalAt(step.time(), DecayAtTemperature.LEVEL);
        csv.row(
            point.ring().units().time(step.time()).milliseconds(), step.atRisk(),
            step.survival(), band.lower(), band.upper());
      }
      csv.commit();
    }
  }

  static void curves(Path folder, List<DecayAtTemperature> points) {
    try (NpzWriter npz = NpzWriter.create(folder.resolve("curves.npz"))) {
      for (DecayAtTemperature point : points) {
        String label = label(point);
        double[] time = point.meanCosine().times();
        double[] mean = new double[time.length];
        double[] error = new double[time.length];
        for (int i = 0; i < time.length; i++) {
          mean[i] = point.meanCosine().mean(i, 0);
          error[i] = point.meanCosine().standardError(i, 0);
        }
        npz.add(label + "_time", NpyArray.ofReal(time, time.length));
        npz.add(label + "_mean_cosine", NpyArray.ofReal(mean, time.length));
        npz.add(label + "_mean_cosine_error", NpyArray.ofReal(error, time.length));
        double[] ends = point.ends().stream().mapToDouble(TrajectoryEnd::time).toArray();
        long[] decayed =
            point.ends().stream().mapToLong(end -> end.isStopped() ? 1 : 0).toArray();
        npz.add(label + "_end_time", NpyArray.ofReal(ends, ends.length));
        npz.add(label + "_decayed", NpyArray.ofIntegers(decayed, decayed.length));
      }
      npz.commit();
    }
  }

  static void spaceTime(Path folder, DecayAtTemperature point, TimeSeries.Series series) {
    int points = series.values()[0].length;
    double[] flat = new double[series.values().length * points];
    for (int t = 0; t < series.values().length; t++) {
      System.arraycopy(series.values()[t], 0, flat, t * points, points);
    }
    Path file = folder.resolve("space-time-" + label(point) + ".npz");
    try (NpzWriter npz = NpzWriter.create(file)) {
      npz.add("time", NpyArray.ofReal(series.times(), series.times().length));
      npz.add("cos_relative_phase", NpyArray.ofReal(flat, series.values().length, points));
      npz.commit();
    }
  }

  static String label(DecayAtTemperature point) {
    return String.format(Locale.ROOT, "%.1fnK", point.temperature().nanokelvin())
        .replace('.', 'p');
  }
}
