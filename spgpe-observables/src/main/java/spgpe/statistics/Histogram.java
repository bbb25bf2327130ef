package spgpe.statistics;

import java.util.Arrays;
import spgpe.internal.check.Check;

/**
 * Counts of numbers in equal bins [low, high), with what fell outside counted apart. Mergeable
 * exactly, in any order. Adding allocates nothing. Mutable; confined to one thread.
 */
public final class Histogram {
  private final double low;
  private final double high;
  private final double binsPerUnit;
  private final long[] counts;
  private long below;
  private long above;

  private Histogram(double low, double high, int bins) {
    this.low = low;
    this.high = high;
    this.binsPerUnit = bins / (high - low);
    this.counts = new long[bins];
  }

  /**
   * Makes an empty histogram.
   *
   * @param low lower edge of the first bin, finite
   * @param high upper edge of the last bin, finite and above low; itself outside
   * @param bins number of equal bins, &gt;= 1
   * @return the histogram
   * @throws IllegalArgumentException if an edge is not finite, high is not above low, or there is
   *     no bin
   */
  public static Histogram of(double low, double high, int bins) {
    Check.finite(low, "low");
    Check.finite(high, "high");
    Check.argument(
        high > low && Double.isFinite(high - low),
        "high must be above low: low=%s, high=%s",
        low,
        high);
    return new Histogram(low, high, Check.inRange(bins, 1, Integer.MAX_VALUE, "bins"));
  }

  /**
   * Counts one number.
   *
   * @param value finite number
   * @throws IllegalArgumentException if the value is not finite; nothing is counted then
   */
  public void add(double value) {
    if (!Double.isFinite(value)) {
      Check.finite(value, "value");
    }
    if (value < low) {
      below++;
    } else if (value >= high) {
      above++;
    } else {
      // A value just under high can round up to the number of bins.
      counts[Math.min((int) ((value - low) * binsPerUnit), counts.length - 1)]++;
    }
  }

  /**
   * Adds the counts of another histogram, which is not changed.
   *
   * @param other histogram with the same bins
   * @throws IllegalArgumentException if it is null or has other bins
   */
  public void merge(Histogram other) {
    Check.notNull(other, "other");
    Check.argument(
        low == other.low && high == other.high && counts.length == other.counts.length,
        "only histograms with the same bins can be merged: this has %s, the other %s",
        describe(),
        other.describe());
    for (int i = 0; i < counts.length; i++) {
      counts[i] += other.counts[i];
    }
    below += other.below;
    above += other.above;
  }

  /**
   * Number of bins.
   *
   * @return the number
   */
  public int bins() {
    return counts.length;
  }

  /**
   * Width of every bin.
   *
   * @return (high - low) / bins
   */
  public double binWidth() {
    return (high - low) / counts.length;
  }

  /**
   * Centre of a bin.
   *
   * @param bin index, 0 to bins() - 1
   * @return its centre
   * @throws IllegalArgumentException if the index is out of range
   */
  public double binCentre(int bin) {
    return low + (checkBin(bin) + 0.5) * binWidth();
  }

  /**
   * Count in a bin.
   *
   * @param bin index, 0 to bins() - 1
   * @return the count
   * @throws IllegalArgumentException if the index is out of range
   */
  public long binCount(int bin) {
    return counts[checkBin(bin)];
  }

  /**
   * Count below the first bin.
   *
   * @return values smaller than low
   */
  public long below() {
    return below;
  }

  /**
   * Count above the last bin.
   *
   * @return values not smaller than high
   */
  public long above() {
    return above;
  }

  /**
   * Count of all values, those outside the bins included.
   *
   * @return the total
   */
  public long total() {
    return below + above + Arrays.stream(counts).sum();
  }

  /**
   * Probability density in a bin with its binomial standard error, which holds for independent
   * values only. Values outside the bins count in the norm.
   *
   * @param bin index, 0 to bins() - 1
   * @return p / binWidth with error sqrt(p (1 - p) / total) / binWidth, p = count / total
   * @throws IllegalArgumentException if the index is out of range
   * @throws IllegalStateException if no value was added
   */
  public Estimate density(int bin) {
    checkBin(bin);
    long total = total();
    Check.state(total > 0, "a density needs at least one value: total=%s", total);
    double p = (double) counts[bin] / total;
    return new Estimate(p / binWidth(), Math.sqrt(p * (1 - p) / total) / binWidth());
  }

  private int checkBin(int bin) {
    return Check.inRange(bin, 0, counts.length - 1, "bin");
  }

  private String describe() {
    return counts.length + " bins in [" + low + ", " + high + ")";
  }

  @Override
  public String toString() {
    return "Histogram: " + describe() + ", " + total() + " values";
  }
}
