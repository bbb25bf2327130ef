package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * Mean and variance of a stream of numbers, updated one at a time without cancellation and
 * mergeable. Adding allocates nothing. Merging is deterministic, but not associative in the last
 * bits: merge in a fixed order (for instance by trajectory index) to get the same bits every time.
 *
 * <p>Mutable; confined to one thread.
 *
 * <p>Sources: B. P. Welford, Technometrics 4, 419 (1962); T. F. Chan, G. H. Golub and R. J.
 * LeVeque, Am. Stat. 37, 242 (1983) (both from memory).
 */
public final class RunningMoments {
  private long count;
  private double mean;
  private double squares;

  /** Makes an empty accumulator. */
  public RunningMoments() {}

  /**
   * Adds one number.
   *
   * @param value finite number
   * @throws IllegalArgumentException if the value is not finite; nothing is added then
   */
  public void add(double value) {
    if (!Double.isFinite(value)) {
      Check.finite(value, "value");
    }
    count++;
    double delta = value - mean;
    mean += delta / count;
    squares += delta * (value - mean);
  }

  /**
   * Takes over everything another accumulator has seen, as if added after this one's numbers. The
   * other accumulator is not changed.
   *
   * @param other accumulator to take over
   * @throws IllegalArgumentException if it is null
   */
  public void merge(RunningMoments other) {
    Check.notNull(other, "other");
    if (other.count == 0) {
      return;
    }
    long total = count + other.count;
    double delta = other.mean - mean;
    double share = (double) other.count / total;
    squares += other.squares + delta * delta * share * count;
    mean = count == 0 ? other.mean : mean + delta * share;
    count = total;
  }

  /**
   * Number of values seen.
   *
   * @return the count
   */
  public long count() {
    return count;
  }

  /**
   * Mean of the values.
   *
   * @return arithmetic mean
   * @throws IllegalStateException if no value was added
   */
  public double mean() {
    Check.state(count >= 1, "a mean needs at least one value: count=%s", count);
    return mean;
  }

  /**
   * Unbiased variance of the values, with divisor count - 1.
   *
   * @return sample variance
   * @throws IllegalStateException if fewer than two values were added
   */
  public double variance() {
    Check.state(count >= 2, "a variance needs at least two values: count=%s", count);
    return squares / (count - 1);
  }

  /**
   * Standard error of the mean of independent values, sqrt(variance / count). Values of one
   * trajectory are not independent: add one number per trajectory, or see {@link BatchMeans}.
   *
   * @return the standard error
   * @throws IllegalStateException if fewer than two values were added
   */
  public double standardError() {
    return Math.sqrt(variance() / count);
  }

  /**
   * Mean with its standard error.
   *
   * @return the estimate
   * @throws IllegalStateException if fewer than two values were added
   */
  public Estimate estimate() {
    return new Estimate(mean(), standardError());
  }

  @Override
  public String toString() {
    return count < 2
        ? "RunningMoments: count=" + count
        : "RunningMoments: count=" + count + ", mean=" + mean + ", variance=" + variance();
  }
}
