package spgpe.internal.linear;

/** Eigenvalues and eigenvectors of a small real symmetric matrix by cyclic Jacobi rotations. */
public final class SymmetricEigen {
  private static final int MAX_SWEEPS = 60;

  private final double[] values;
  private final double[][] vectors;

  private SymmetricEigen(double[] values, double[][] vectors) {
    this.values = values;
    this.vectors = vectors;
  }

  /**
   * Diagonalises.
   *
   * @param matrix symmetric matrix; not changed
   * @return eigenvalues (unordered) and eigenvectors
   */
  public static SymmetricEigen of(double[][] matrix) {
    int n = matrix.length;
    double[][] a = new double[n][];
    double[][] v = new double[n][n];
    for (int i = 0; i < n; i++) {
      a[i] = matrix[i].clone();
      v[i][i] = 1;
    }
    for (int sweep = 0; sweep < MAX_SWEEPS && offDiagonal(a) > 0; sweep++) {
      for (int p = 0; p < n; p++) {
        for (int q = p + 1; q < n; q++) {
          rotate(a, v, p, q);
        }
      }
    }
    double[] values = new double[n];
    for (int i = 0; i < n; i++) {
      values[i] = a[i][i];
    }
    return new SymmetricEigen(values, v);
  }

  private static double offDiagonal(double[][] a) {
    double off = 0;
    double all = 0;
    for (int i = 0; i < a.length; i++) {
      for (int j = 0; j < a.length; j++) {
        all += a[i][j] * a[i][j];
        off += i == j ? 0 : a[i][j] * a[i][j];
      }
    }
    return off > 1e-30 * all ? off : 0;
  }

  private static void rotate(double[][] a, double[][] v, int p, int q) {
    if (a[p][q] == 0) {
      return;
    }
    double theta = (a[q][q] - a[p][p]) / (2 * a[p][q]);
    double t = Math.signum(theta) / (Math.abs(theta) + Math.hypot(1, theta));
    if (theta == 0) {
      t = 1;
    }
    double c = 1 / Math.hypot(1, t);
    double s = t * c;
    for (int k = 0; k < a.length; k++) {
      double kp = a[k][p];
      double kq = a[k][q];
      a[k][p] = c * kp - s * kq;
      a[k][q] = s * kp + c * kq;
    }
    for (int k = 0; k < a.length; k++) {
      double pk = a[p][k];
      double qk = a[q][k];
      a[p][k] = c * pk - s * qk;
      a[q][k] = s * pk + c * qk;
      double vp = v[k][p];
      double vq = v[k][q];
      v[k][p] = c * vp - s * vq;
      v[k][q] = s * vp + c * vq;
    }
  }

  /**
   * An eigenvalue.
   *
   * @param i index
   * @return eigenvalue
   */
  public double value(int i) {
    return values[i];
  }

  /**
   * An entry of an eigenvector.
   *
   * @param i index of the eigenvector
   * @param row row
   * @return entry
   */
  public double vector(int i, int row) {
    return vectors[row][i];
  }
}
