package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * Mean and full covariance matrix of a stream of vectors, mergeable. Needs dimension (dimension +
 * 1)/2 numbers of memory; where only variances are wanted {@link RunningVectorMoments} is cheaper.
 * Adding allocates nothing. The order of merging matters in the last bits, see {@link
 * RunningMoments}.
 *
 * <p>Mutable; confined to one thread.
 *
 * <p>Sources: as {@link RunningMoments}.
 */
public final class RunningCovariance {
  private static final int MAX_DIMENSION = 30_000;

  private final double[] mean;
  private final double[] delta;
  // Row i of the lower triangle starts at i (i + 1)/2.
  private final double[] products;
  private long count;

  private RunningCovariance(int dimension) {
    mean = new double[dimension];
    delta = new double[dimension];
    products = new double[dimension * (dimension + 1) / 2];
  }

  /**
   * Makes an empty accumulator.
   *
   * @param dimension number of components, 1 to 30000
   * @return the accumulator
   * @throws IllegalArgumentException if the dimension is out of range
   */
  public static RunningCovariance ofDimension(int dimension) {
    return new RunningCovariance(Check.inRange(dimension, 1, MAX_DIMENSION, "dimension"));
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
      delta[i] = vector[i] - mean[i];
      mean[i] += delta[i] / count;
    }
    int at = 0;
    for (int i = 0; i < mean.length; i++) {
      double rest = vector[i] - mean[i];
      for (int j = 0; j <= i; j++) {
        products[at++] += delta[j] * rest;
      }
    }
  }

  /**
   * Takes over everything another accumulator has seen, as if added after this one's vectors. The
   * other accumulator is not changed.
   *
   * @param other accumulator of the same dimension
   * @throws IllegalArgumentException if it is null or has another dimension
   */
  public void merge(RunningCovariance other) {
    Check.notNull(other, "other");
    VectorChecks.sameDimension(mean.length, other.mean.length);
    if (other.count == 0) {
      return;
    }
    long total = count + other.count;
    double share = (double) other.count / total;
    for (int i = 0; i < mean.length; i++) {
      delta[i] = other.mean[i] - mean[i];
      mean[i] = count == 0 ? other.mean[i] : mean[i] + delta[i] * share;
    }
    int at = 0;
    for (int i = 0; i < mean.length; i++) {
      for (int j = 0; j <= i; j++) {
        products[at] += other.products[at] + delta[i] * delta[j] * share * count;
        at++;
      }
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
   * Unbiased covariance of two components, with divisor count - 1.
   *
   * @param first index, 0 to dimension() - 1
   * @param second index, 0 to dimension() - 1
   * @return sample covariance; the variance if both are equal
   * @throws IllegalArgumentException if an index is out of range
   * @throws IllegalStateException if fewer than two vectors were added
   */
  public double covariance(int first, int second) {
    Check.inRange(first, 0, mean.length - 1, "first");
    Check.inRange(second, 0, mean.length - 1, "second");
    Check.state(count >= 2, "a covariance needs at least two vectors: count=%s", count);
    int row = Math.max(first, second);
    return products[row * (row + 1) / 2 + Math.min(first, second)] / (count - 1);
  }

  /**
   * Covariance of the means of two components, for independent vectors.
   *
   * @param first index, 0 to dimension() - 1
   * @param second index, 0 to dimension() - 1
   * @return covariance / count
   * @throws IllegalArgumentException if an index is out of range
   * @throws IllegalStateException if fewer than two vectors were added
   */
  public double covarianceOfMeans(int first, int second) {
    return covariance(first, second) / count;
  }
}
