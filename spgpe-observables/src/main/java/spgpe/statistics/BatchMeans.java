package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * Error of the time average of one correlated series from the scatter of the means of consecutive
 * batches. The error is right if a batch is much longer than the integrated autocorrelation time
 * ({@link AutocorrelationTime}), and too small otherwise. Stateless and thread-safe.
 */
public final class BatchMeans {
  private BatchMeans() {}

  /**
   * Mean of the series and its error. If the length is no multiple of the number of batches, the
   * surplus at the start is left out.
   *
   * @param series equally spaced values in the order of time; read only
   * @param batches number of batches, from 2 to the length of the series
   * @return mean of the values used and its standard error
   * @throws IllegalArgumentException if the series is null, the number of batches is out of range,
   *     or a value is not finite
   */
  public static Estimate of(double[] series, int batches) {
    Check.notNull(series, "series");
    Check.argument(
        series.length >= 2, "a series of at least two values is needed: length=%s", series.length);
    Check.inRange(batches, 2, series.length, "batches");
    int size = series.length / batches;
    int at = series.length - size * batches;
    RunningMoments means = new RunningMoments();
    for (int b = 0; b < batches; b++) {
      double sum = 0;
      for (int i = 0; i < size; i++) {
        sum += Check.finite(series[at], "series value");
        at++;
      }
      means.add(sum / size);
    }
    return means.estimate();
  }
}
