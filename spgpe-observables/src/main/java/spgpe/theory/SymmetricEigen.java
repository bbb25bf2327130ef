package spgpe.theory;

import org.apache.commons.math3.exception.MaxCountExceededException;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;

/** Eigenvalues in ascending order and matching orthonormal vectors of a real symmetric matrix. */
final class SymmetricEigen {
  private final double[] values;
  private final double[][] vectors;

  private SymmetricEigen(EigenDecomposition decomposition) {
    double[] descending = decomposition.getRealEigenvalues();
    int n = descending.length;
    Integer[] order = new Integer[n];
    for (int i = 0; i < n; i++) {
      order[i] = i;
    }
    java.util.Arrays.sort(order, (a, b) -> Double.compare(descending[a], descending[b]));
    values = new double[n];
    vectors = new double[n][];
    for (int i = 0; i < n; i++) {
      values[i] = descending[order[i]];
      vectors[i] = decomposition.getEigenvector(order[i]).toArray();
    }
  }

  static SymmetricEigen of(double[][] matrix) {
    int n = matrix.length;
    double[][] copy = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        copy[i][j] = 0.5 * (matrix[i][j] + matrix[j][i]);
      }
    }
    try {
      return new SymmetricEigen(new EigenDecomposition(new Array2DRowRealMatrix(copy, false)));
    } catch (MaxCountExceededException e) {
      throw failed(n, e);
    }
  }

  static SymmetricEigen ofTridiagonal(double[] diagonal, double[] offDiagonal) {
    try {
      return new SymmetricEigen(new EigenDecomposition(diagonal, offDiagonal));
    } catch (MaxCountExceededException e) {
      throw failed(diagonal.length, e);
    }
  }

  private static UnconvergedException failed(int n, RuntimeException cause) {
    UnconvergedException thrown =
        new UnconvergedException(
            "the eigenvalue iteration of a symmetric " + n + "x" + n + " matrix did not converge;"
                + " the parameters are probably too extreme for this solver");
    thrown.initCause(cause);
    return thrown;
  }

  int size() {
    return values.length;
  }

  double value(int index) {
    return values[index];
  }

  /** Live array of one vector; callers do not write to it. */
  double[] vector(int index) {
    return vectors[index];
  }
}
