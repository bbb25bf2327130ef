package spgpe.theory;

/**
 * Lowest eigenstates of {@code h = -Laplacian/2 + s^4/2 - alpha s^2} in two dimensions for angular
 * momenta {@code 0..largestMomentum} and the radial matrix elements between them.
 *
 * <p>Basis: two-dimensional oscillator of frequency w, in which {@code psi = s exp(i theta) =
 * (a_+^dagger + a_-)/sqrt(w)}; with this phase choice all elements of {@code psi} are positive.
 */
final class RadialStates {
  final int states;
  final int largestMomentum;
  /** energy[m][k]. */
  final double[][] energy;
  /** s^2 and s^4 within one angular momentum, [m][k'*states+k]. */
  final double[][] square;
  final double[][] fourth;
  /** s from m to m+1 and s^2 from m to m+2, [m][k'*states+k]. */
  final double[][] raiseOne;
  final double[][] raiseTwo;

  private RadialStates(double alpha, int states, int momenta, int basis, double frequency) {
    this.states = states;
    this.largestMomentum = momenta;
    int computed = momenta + 1;
    energy = new double[computed][states];
    double[][][] vectors = new double[computed][states][];
    square = new double[computed][];
    fourth = new double[computed][];
    for (int m = 0; m < computed; m++) {
      double[][] r2 = squareMatrix(m, basis, basis, frequency);
      double[][] r4 = fourthMatrix(m, basis, frequency);
      double[][] h = new double[basis][basis];
      for (int i = 0; i < basis; i++) {
        for (int j = 0; j < basis; j++) {
          h[i][j] = 0.5 * r4[i][j] - (alpha + 0.5 * frequency * frequency) * r2[i][j];
        }
        h[i][i] += frequency * (2 * i + m + 1);
      }
      SymmetricEigen eigen = SymmetricEigen.of(h);
      for (int k = 0; k < states; k++) {
        energy[m][k] = eigen.value(k);
        vectors[m][k] = eigen.vector(k);
      }
      square[m] = between(vectors[m], r2, vectors[m]);
      fourth[m] = between(vectors[m], r4, vectors[m]);
    }
    raiseOne = new double[momenta][];
    for (int m = 0; m < momenta; m++) {
      raiseOne[m] = between(vectors[m + 1], raiseMatrix(m, basis, basis, frequency), vectors[m]);
    }
    raiseTwo = new double[Math.max(0, momenta - 1)][];
    for (int m = 0; m < momenta - 1; m++) {
      double[][] first = raiseMatrix(m, basis, basis + 2, frequency);
      double[][] second = raiseMatrix(m + 1, basis + 2, basis, frequency);
      raiseTwo[m] = between(vectors[m + 2], product(second, first), vectors[m]);
    }
  }

  /** Solves with a basis size and frequency chosen from alpha; {@code extra} enlarges the basis. */
  static RadialStates of(double alpha, int states, int momenta, int extra) {
    double frequency = defaultFrequency(alpha) * (1 + 0.004 * extra);
    int basis = 36 + 2 * states + (int) (1.5 * Math.abs(alpha)) + momenta / 2 + extra;
    return new RadialStates(alpha, states, momenta, basis, frequency);
  }

  private static double defaultFrequency(double alpha) {
    return alpha < 0 ? 2 + Math.sqrt(-2 * alpha) : 2 + 0.15 * Math.min(alpha, 10);
  }

  private static double[][] squareMatrix(int m, int rows, int columns, double frequency) {
    double[][] r = new double[rows][columns];
    for (int i = 0; i < rows; i++) {
      for (int j = Math.max(0, i - 1); j <= Math.min(columns - 1, i + 1); j++) {
        int low = Math.min(i, j);
        r[i][j] =
            (i == j ? 2 * i + m + 1 : Math.sqrt((low + 1.0) * (low + m + 1.0))) / frequency;
      }
    }
    return r;
  }

  private static double[][] fourthMatrix(int m, int basis, double frequency) {
    // One row more on the inner index keeps the last diagonal element exact.
    return product(
        squareMatrix(m, basis, basis + 1, frequency), squareMatrix(m, basis + 1, basis, frequency));
  }

  /** Rows: momentum m+1; columns: momentum m. */
  private static double[][] raiseMatrix(int m, int columns, int rows, double frequency) {
    double[][] r = new double[rows][columns];
    double scale = 1 / Math.sqrt(frequency);
    for (int j = 0; j < columns; j++) {
      if (j < rows) {
        r[j][j] = Math.sqrt(j + m + 1.0) * scale;
      }
      if (j > 0 && j - 1 < rows) {
        r[j - 1][j] = Math.sqrt(j) * scale;
      }
    }
    return r;
  }

  private static double[][] product(double[][] a, double[][] b) {
    double[][] c = new double[a.length][b[0].length];
    for (int i = 0; i < a.length; i++) {
      for (int k = 0; k < b.length; k++) {
        double factor = a[i][k];
        if (factor != 0) {
          for (int j = 0; j < c[i].length; j++) {
            c[i][j] += factor * b[k][j];
          }
        }
      }
    }
    return c;
  }

  private static double[] between(double[][] left, double[][] matrix, double[][] right) {
    int n = left.length;
    double[] result = new double[n * n];
    for (int k = 0; k < n; k++) {
      double[] image = new double[matrix.length];
      for (int i = 0; i < image.length; i++) {
        image[i] = VectorMath.dot(matrix[i], right[k]);
      }
      for (int l = 0; l < n; l++) {
        result[l * n + k] = VectorMath.dot(left[l], image);
      }
    }
    return result;
  }
}
