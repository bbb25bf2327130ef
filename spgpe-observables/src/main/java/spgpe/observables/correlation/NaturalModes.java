package spgpe.observables.correlation;

import java.util.Arrays;
import java.util.Comparator;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import spgpe.internal.check.Check;

/**
 * Eigenvectors and eigenvalues of the one-body matrix. The largest eigenvalue is the number of
 * condensed atoms, its eigenvector the condensate mode (Penrose and Onsager, Phys. Rev. 104, 576
 * (1956)). Few samples exaggerate it: S samples of a matrix without condensate give a largest
 * eigenvalue well above the mean occupation until S exceeds the number of modes several times.
 * Immutable and thread-safe.
 */
public final class NaturalModes {
  private final double[] occupations;
  private final double[][] re;
  private final double[][] im;

  private NaturalModes(double[] occupations, double[][] re, double[][] im) {
    this.occupations = occupations;
    this.re = re;
    this.im = im;
  }

  /**
   * A Hermitian matrix A + iB is the real symmetric [[A, -B], [B, A]], in which every eigenvalue
   * occurs twice: with (u, v) and with (-v, u).
   */
  static NaturalModes of(OneBodyMatrix matrix) {
    int n = matrix.modes();
    double[][] real = new double[2 * n][2 * n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        real[i][j] = matrix.re(i, j);
        real[i + n][j + n] = real[i][j];
        real[i + n][j] = matrix.im(i, j);
        real[i][j + n] = -real[i + n][j];
      }
    }
    EigenDecomposition eigen = new EigenDecomposition(new Array2DRowRealMatrix(real, false));
    double[] values = eigen.getRealEigenvalues();
    Integer[] order = new Integer[2 * n];
    Arrays.setAll(order, i -> i);
    Arrays.sort(order, Comparator.comparingDouble(i -> -values[i]));
    double[] occupations = new double[n];
    double[][] re = new double[n][];
    double[][] im = new double[n][];
    int found = 0;
    for (int e : order) {
      double[] vector = eigen.getEigenvector(e).toArray();
      if (found < n && addIndependent(vector, n, found, re, im)) {
        occupations[found++] = values[e];
      }
    }
    Check.state(found == n, "the eigenvectors of the one-body matrix are not complete: %s", found);
    return new NaturalModes(occupations, re, im);
  }

  /** Keeps a vector if something is left of it beside those kept: its twin i*vector is dropped. */
  private static boolean addIndependent(
      double[] vector, int n, int found, double[][] re, double[][] im) {
    double[] x = Arrays.copyOf(vector, n);
    double[] y = Arrays.copyOfRange(vector, n, 2 * n);
    for (int m = 0; m < found; m++) {
      double cos = 0;
      double sin = 0;
      for (int i = 0; i < n; i++) {
        cos += re[m][i] * x[i] + im[m][i] * y[i];
        sin += re[m][i] * y[i] - im[m][i] * x[i];
      }
      for (int i = 0; i < n; i++) {
        x[i] -= re[m][i] * cos - im[m][i] * sin;
        y[i] -= re[m][i] * sin + im[m][i] * cos;
      }
    }
    int largest = 0;
    double norm = 0;
    for (int i = 0; i < n; i++) {
      norm += x[i] * x[i] + y[i] * y[i];
      if (Math.hypot(x[i], y[i]) > 1.000001 * Math.hypot(x[largest], y[largest])) {
        largest = i;
      }
    }
    // of two orthogonal real vectors spanning {z, iz} the second has nothing left but rounding; in
    // a degenerate subspace anything may be left
    if (norm < 1e-6) {
      return false;
    }
    double size = Math.hypot(x[largest], y[largest]) * Math.sqrt(norm);
    double cos = x[largest] / size;
    double sin = y[largest] / size;
    re[found] = new double[n];
    im[found] = new double[n];
    for (int i = 0; i < n; i++) {
      re[found][i] = x[i] * cos + y[i] * sin;
      im[found][i] = y[i] * cos - x[i] * sin;
    }
    return true;
  }

  /**
   * Number of modes.
   *
   * @return n
   */
  public int size() {
    return occupations.length;
  }

  /**
   * Occupation of a natural mode.
   *
   * @param i index, 0 for the condensate
   * @return eigenvalue
   */
  public double occupation(int i) {
    return occupations[i];
  }

  /**
   * Condensate fraction: largest eigenvalue over their sum.
   *
   * @return fraction in (0, 1]
   */
  public double condensateFraction() {
    double sum = 0;
    for (double occupation : occupations) {
      sum += occupation;
    }
    return occupations[0] / sum;
  }

  /**
   * Real parts of a natural mode, normalised to sum |phi_i|<sup>2</sup> = 1, its largest amplitude
   * real and positive.
   *
   * @param i index, 0 for the condensate
   * @return new array in the order of the recorded amplitudes
   */
  public double[] re(int i) {
    return re[i].clone();
  }

  /**
   * Imaginary parts of a natural mode.
   *
   * @param i index, 0 for the condensate
   * @return new array in the order of the recorded amplitudes
   */
  public double[] im(int i) {
    return im[i].clone();
  }
}
