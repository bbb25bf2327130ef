package spgpe.run;

import java.util.Arrays;
import spgpe.internal.check.Check;

/**
 * Mean, variance and standard error across trajectories, for each scheduled time and each number of
 * the observable. A trajectory that was stopped early contributes up to its end.
 *
 * <p>Sums are merged by the pairwise formula of Chan, Golub and LeVeque, Am. Stat. 37, 242 (1983).
 */
public final class TimeMoments implements Accumulator<TimeMoments> {
  private static final int MAX_NUMBERS = 1 << 28;

  private final double[] times;
  private final int size;
  private final long[] counts;
  private final double[] means;
  private final double[] squares;

  /**
   * Makes an empty accumulator.
   *
   * @param times scheduled times
   * @param size numbers in each sample, at least 1
   * @throws IllegalArgumentException if the size is not positive or there are too many numbers
   */
  public TimeMoments(double[] times, int size) {
    this(times, size, new long[Check.notNull(times, "times").length], zeros(times, size),
        zeros(times, size));
  }

  private static double[] zeros(double[] times, int size) {
    Check.argument(size >= 1, "numbers in each sample must be >= 1: size=%s", size);
    long numbers = (long) times.length * size;
    Check.argument(
        numbers <= MAX_NUMBERS,
        "scheduled times x numbers in each sample must not exceed %s: times=%s, size=%s",
        MAX_NUMBERS, times.length, size);
    return new double[(int) numbers];
  }

  private TimeMoments(
      double[] times, int size, long[] counts, double[] means, double[] squares) {
    this.times = times;
    this.size = size;
    this.counts = counts;
    this.means = means;
    this.squares = squares;
  }

  @Override
  public void add(int sample, double[] values) {
    Check.notNull(values, "values");
    Check.inRange(sample, 0, counts.length - 1, "sample");
    if (values.length != size) {
      Check.argument(
          false, "a sample must have as many numbers as announced: size=%s, numbers=%s",
          size, values.length);
    }
    long n = ++counts[sample];
    for (int i = 0; i < size; i++) {
      int e = sample * size + i;
      double delta = values[i] - means[e];
      means[e] += delta / n;
      squares[e] += delta * (values[i] - means[e]);
    }
  }

  @Override
  public TimeMoments mergedWith(TimeMoments later) {
    Check.notNull(later, "later");
    Check.argument(
        size == later.size && Arrays.equals(times, later.times),
        "accumulators must be of the same times and size: size=%s, other size=%s",
        size, later.size);
    long[] n = counts.clone();
    double[] mean = means.clone();
    double[] square = squares.clone();
    for (int s = 0; s < times.length; s++) {
      long other = later.counts[s];
      if (other == 0) {
        continue;
      }
      long total = n[s] + other;
      if (n[s] == 0) { // exactly the other's numbers, not those numbers times n and divided by n
        System.arraycopy(later.means, s * size, mean, s * size, size);
        System.arraycopy(later.squares, s * size, square, s * size, size);
        n[s] = total;
        continue;
      }
      for (int e = s * size; e < (s + 1) * size; e++) {
        double delta = later.means[e] - mean[e];
        mean[e] += delta * other / total;
        square[e] += later.squares[e] + delta * delta * ((double) n[s] * other / total);
      }
      n[s] = total;
    }
    return new TimeMoments(times, size, n, mean, square);
  }

  /**
   * Scheduled times.
   *
   * @return new array
   */
  public double[] times() {
    return times.clone();
  }

  /**
   * Trajectories that contributed.
   *
   * @param sample index of the time
   * @return count
   * @throws IllegalArgumentException if there is no such sample or number
   */
  public long count(int sample) {
    Check.inRange(sample, 0, counts.length - 1, "sample");
    return counts[sample];
  }

  /**
   * Mean across trajectories.
   *
   * @param sample index of the time
   * @param i index of the number
   * @return mean; NaN without trajectories
   * @throws IllegalArgumentException if there is no such sample or number
   */
  public double mean(int sample, int i) {
    checkIndices(sample, i);
    return counts[sample] == 0 ? Double.NaN : means[sample * size + i];
  }

  /**
   * Variance across trajectories (divisor n-1).
   *
   * @param sample index of the time
   * @param i index of the number
   * @return variance; NaN with fewer than two trajectories
   * @throws IllegalArgumentException if there is no such sample or number
   */
  public double variance(int sample, int i) {
    checkIndices(sample, i);
    return counts[sample] < 2 ? Double.NaN : squares[sample * size + i] / (counts[sample] - 1);
  }

  /**
   * Standard error of the mean across independent trajectories.
   *
   * @param sample index of the time
   * @param i index of the number
   * @return standard error; NaN with fewer than two trajectories
   * @throws IllegalArgumentException if there is no such sample or number
   */
  public double standardError(int sample, int i) {
    return Math.sqrt(variance(sample, i) / counts[sample]);
  }

  private void checkIndices(int sample, int i) {
    Check.inRange(sample, 0, counts.length - 1, "sample");
    Check.inRange(i, 0, size - 1, "index of the number");
  }
}
