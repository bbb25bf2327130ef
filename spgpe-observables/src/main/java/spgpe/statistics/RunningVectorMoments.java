package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * Mean and variance of every component of a stream of vectors (a correlation function, a time
 * series per trajectory), updated one vector at a time and mergeable. Adding allocates nothing. The
 * order of merging matters in the last bits, see {@link RunningMoments}.
 *
 * <p>Mutable; confined to one thread.
 *
 * <p>Sources: as {@link RunningMoments}.
 */
public final class RunningVectorMoments {
  private final double[] mean;
  private final double[] squares;
  private long count;

  private RunningVectorMoments(int dimension) {
    mean = new double[dimension];
    squares = new double[dimension];
  }

  /**
   * Makes an empty accumulator.
   *
   * @param dimension number of components, &gt;= 1
   * @return the accumulator
   * @throws IllegalArgumentException if the dimension is below 1
   */
  public static RunningVectorMoments ofDimension(int dimension) {
    return new RunningVectorMoments(Check.inRange(dimension, 1, Integer.MAX_VALUE, "dimension"));
  }

  /**
   * Adds one vector.
   *
   * @param vector finite components, length = dimension; read only
   * @throws IllegalArgumentException if the vector is null, has another length or a component that
   *     is not finite; nothing is added then
   */
  public void add(double[] vector) {
    VectorChecks.vector(vector, mean.length);
    count++;
    for (int i = 0; i < mean.length; i++) {
      double delta = vector[i] - mean[i];
      mean[i] += delta / count;
      squares[i] += delta * (vector[i] - mean[i]);
    }
  }

  /**
   * Takes over everything another accumulator has seen, as if added after this one's vectors. The
   * other accumulator is not changed.
   *
   * @param other accumulator of the same dimension
   * @throws IllegalArgumentException if it is null or has another dimension
   */
  public void merge(RunningVectorMoments other) {
    Check.notNull(other, "other");
    VectorChecks.sameDimension(mean.length, other.mean.length);
    if (other.count == 0) {
      return;
    }
    long total = count + other.count;
    double share = (double) other.count / total;
    for (int i = 0; i < mean.length; i++) {
      double delta = other.mean[i] - mean[i];
      squares[i] += other.squares[i] + delta * delta * share * count;
      mean[i] = count == 0 ? other.mean[i] : mean[i] + delta * share;
    }
    count = total;
  }

  /**
   * Number of vectors seen.
   *
   * @return the count
   */
  public long count() {
    return count;
  }

  /**
   * Number of components.
   *
   * @return the dimension
   */
  public int dimension() {
    return mean.length;
  }

  /**
   * Mean of one component.
   *
   * @param component index, 0 to dimension() - 1
   * @return arithmetic mean
   * @throws IllegalArgumentException if the index is out of range
   * @throws IllegalStateException if no vector was added
   */
  public double mean(int component) {
    Check.inRange(component, 0, mean.length - 1, "component");
    Check.state(count >= 1, "a mean needs at least one vector: count=%s", count);
    return mean[component];
  }

  /**
   * Unbiased variance of one component, with divisor count - 1.
   *
   * @param component index, 0 to dimension() - 1
   * @return sample variance
   * @throws IllegalArgumentException if the index is out of range
   * @throws IllegalStateException if fewer than two vectors were added
   */
  public double variance(int component) {
    Check.inRange(component, 0, mean.length - 1, "component");
    Check.state(count >= 2, "a variance needs at least two vectors: count=%s", count);
    return squares[component] / (count - 1);
  }

  /**
   * Standard error of the mean of one component, for independent vectors.
   *
   * @param component index, 0 to dimension() - 1
   * @return sqrt(variance / count)
   * @throws IllegalArgumentException if the index is out of range
   * @throws IllegalStateException if fewer than two vectors were added
   */
  public double standardError(int component) {
    return Math.sqrt(variance(component) / count);
  }

  /**
   * Means of all components.
   *
   * @return new array, length = dimension
   * @throws IllegalStateException if no vector was added
   */
  public double[] means() {
    Check.state(count >= 1, "a mean needs at least one vector: count=%s", count);
    return mean.clone();
  }

  /**
   * Standard errors of the means of all components, for independent vectors.
   *
   * @return new array, length = dimension
   * @throws IllegalStateException if fewer than two vectors were added
   */
  public double[] standardErrors() {
    double[] errors = new double[mean.length];
    for (int i = 0; i < errors.length; i++) {
      errors[i] = standardError(i);
    }
    return errors;
  }
}
