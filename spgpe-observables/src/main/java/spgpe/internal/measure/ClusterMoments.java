package spgpe.internal.measure;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Mean of a vector over samples that come in independent clusters (trajectories) of different
 * sizes, with the covariance of that mean across the clusters.
 *
 * <p>With n_i samples of mean x_i in cluster i: m = sum n_i x_i / sum n_i, and (ratio estimator,
 * linearised) Cov m = N/(N-1) sum n_i^2 (x_i - m)(x_i - m)^T / (sum n_i)^2. The sums are kept
 * centred on the current mean and shifted when two sets are merged, so nothing large cancels.
 * Matrices are made late: sets of few clusters keep the means of their clusters instead. Immutable.
 */
public final class ClusterMoments {
  /** Sets of at most this many clusters keep the means of the clusters in place of a matrix. */
  private static final int FEW = 16;

  /** A cluster of a small set. */
  @SuppressWarnings("ArrayRecordComponent") // compared by nobody
  private record Cluster(double weight, double[] mean) {}

  private final long clusters;
  private final double weight;
  private final double weightSquares;
  private final double[] mean;
  private final double[] first;
  private final double[] diagonal;
  private final double[] sampleSquares;
  /** The clusters of a small set; empty for a large one or if no covariance is kept. */
  private final List<Cluster> few;

  /** Lower triangle by rows; null for a small set or if it is not kept. */
  private final double @Nullable [] triangle;

  private final boolean keepsCovariance;

  private ClusterMoments(
      long clusters, double weight, double weightSquares, double[] mean, double[] first,
      double[] diagonal, double[] sampleSquares, List<Cluster> few,
      double @Nullable [] triangle, boolean keepsCovariance) {
    this.clusters = clusters;
    this.weight = weight;
    this.weightSquares = weightSquares;
    this.mean = mean;
    this.first = first;
    this.diagonal = diagonal;
    this.sampleSquares = sampleSquares;
    this.few = few;
    this.triangle = triangle;
    this.keepsCovariance = keepsCovariance;
  }

  /**
   * No clusters.
   *
   * @param size length of the vector
   * @param keepsCovariance whether off-diagonal elements are kept
   * @return empty sums
   */
  public static ClusterMoments empty(int size, boolean keepsCovariance) {
    return new ClusterMoments(
        0, 0, 0, new double[size], new double[size], new double[size], new double[size],
        List.of(), null, keepsCovariance);
  }

  /**
   * One cluster.
   *
   * @param samples number of its samples, at least 1
   * @param mean their mean
   * @param squares sum of their squared deviations from it
   * @param keepsCovariance whether off-diagonal elements are kept
   * @return sums that own the arrays
   */
  public static ClusterMoments ofCluster(
      long samples, double[] mean, double[] squares, boolean keepsCovariance) {
    return new ClusterMoments(
        1, samples, (double) samples * samples, mean, new double[mean.length],
        new double[mean.length], squares,
        keepsCovariance ? List.of(new Cluster(samples, mean)) : List.of(), null, keepsCovariance);
  }

  /**
   * The union of two disjoint sets of clusters.
   *
   * @param other other set
   * @return new sums
   */
  public ClusterMoments mergedWith(ClusterMoments other) {
    if (other.clusters == 0) {
      return this;
    }
    if (clusters == 0) {
      return other;
    }
    int size = mean.length;
    double total = weight + other.weight;
    double[] m = new double[size];
    double[] shift = new double[size];
    double[] otherShift = new double[size];
    double[] squares = new double[size];
    for (int i = 0; i < size; i++) {
      double difference = other.mean[i] - mean[i];
      m[i] = mean[i] + difference * (other.weight / total);
      shift[i] = m[i] - mean[i];
      otherShift[i] = m[i] - other.mean[i];
      squares[i] =
          sampleSquares[i] + other.sampleSquares[i]
              + difference * difference * (weight * (other.weight / total));
    }
    double[] f = new double[size];
    double[] d = new double[size];
    addShifted(this, shift, f, d);
    addShifted(other, otherShift, f, d);
    List<Cluster> together = new ArrayList<>();
    double @Nullable [] t = null;
    if (keepsCovariance && clusters + other.clusters <= FEW) {
      together.addAll(few);
      together.addAll(other.few);
    } else if (keepsCovariance) {
      t = new double[size * (size + 1) / 2];
      addMatrix(this, m, shift, t);
      addMatrix(other, m, otherShift, t);
    }
    return new ClusterMoments(
        clusters + other.clusters, total, weightSquares + other.weightSquares, m, f, d, squares,
        together, t, keepsCovariance);
  }

  private static void addShifted(ClusterMoments part, double[] shift, double[] f, double[] d) {
    double w2 = part.weightSquares;
    for (int i = 0; i < shift.length; i++) {
      f[i] += part.first[i] - w2 * shift[i];
      d[i] += part.diagonal[i] + shift[i] * (w2 * shift[i] - 2 * part.first[i]);
    }
  }

  /** t += sum of n_i^2 (x_i - m)(x_i - m)^T over the clusters of a part, m = its mean + shift. */
  private static void addMatrix(ClusterMoments part, double[] m, double[] shift, double[] t) {
    if (part.triangle == null) {
      addClusters(part.few, m, t);
      return;
    }
    double w2 = part.weightSquares;
    int row = 0;
    for (int i = 0; i < shift.length; i++) {
      addRow(t, row, i + 1, w2 * shift[i] - part.first[i], shift);
      addRow(t, row, i + 1, -shift[i], part.first);
      row += i + 1;
    }
    for (int e = 0; e < t.length; e++) {
      t[e] += part.triangle[e];
    }
  }

  /** Row by row, so that a row stays in the cache for all clusters. */
  private static void addClusters(List<Cluster> clusters, double[] m, double[] t) {
    double[][] away = new double[clusters.size()][m.length];
    for (int l = 0; l < away.length; l++) {
      double[] mean = clusters.get(l).mean();
      for (int i = 0; i < m.length; i++) {
        away[l][i] = clusters.get(l).weight() * (mean[i] - m[i]);
      }
    }
    int row = 0;
    for (int i = 0; i < m.length; i++) {
      for (double[] x : away) {
        addRow(t, row, i + 1, x[i], x);
      }
      row += i + 1;
    }
  }

  /** target += a x, from a place on. */
  private static void addRow(double[] target, int from, int length, double a, double[] x) {
    for (int j = 0; j < length; j++) {
      target[from + j] += a * x[j];
    }
  }

  /**
   * Number of clusters.
   *
   * @return N
   */
  public long clusters() {
    return clusters;
  }

  /**
   * Number of samples.
   *
   * @return sum of the sizes
   */
  public long samples() {
    return (long) weight;
  }

  /**
   * Length of the vector.
   *
   * @return number of entries
   */
  public int size() {
    return mean.length;
  }

  /**
   * Whether {@link #covariance} works off the diagonal.
   *
   * @return true if it does
   */
  public boolean keepsCovariance() {
    return keepsCovariance;
  }

  /**
   * An entry of the mean.
   *
   * @param i index
   * @return mean; NaN without samples
   */
  public double mean(int i) {
    return clusters == 0 ? Double.NaN : mean[i];
  }

  /**
   * Variance of single samples about the mean.
   *
   * @param i index
   * @return variance (divisor n-1); NaN with fewer than two samples
   */
  public double sampleVariance(int i) {
    return weight < 2 ? Double.NaN : sampleSquares[i] / (weight - 1);
  }

  /**
   * Covariance of the means.
   *
   * @param i index
   * @param j index
   * @return covariance; NaN with fewer than two clusters
   */
  public double covariance(int i, int j) {
    if (clusters < 2) {
      return Double.NaN;
    }
    double sum = 0;
    if (i == j) {
      sum = Math.max(diagonal[i], 0);
    } else if (triangle != null) {
      int row = Math.max(i, j);
      sum = triangle[row * (row + 1) / 2 + Math.min(i, j)];
    } else {
      for (Cluster cluster : few) {
        double x = cluster.weight() * (cluster.mean()[i] - mean[i]);
        sum += x * (cluster.weight() * (cluster.mean()[j] - mean[j]));
      }
    }
    return sum / weight / weight * ((double) clusters / (clusters - 1));
  }
}
