package spgpe.theory;

/**
 * Orthonormal cosine and sine modes on a ring and Galerkin matrices of even multiplication
 * operators; products of four modes are integrated exactly.
 */
final class RingBasis {
  final double length;
  final int cutoff;
  private final int points;
  /** cos(2 pi j/points) for every j, so that all cosines are table look-ups. */
  private final double[] table;

  RingBasis(double length, int cutoff) {
    this.length = length;
    this.cutoff = cutoff;
    points = 4 * cutoff + 2;
    table = new double[points];
    for (int j = 0; j < points; j++) {
      table[j] = Math.cos(2 * Math.PI * j / points);
    }
  }

  /** Grid points of the half ring, x = 0 .. L/2. */
  int halfPoints() {
    return points / 2 + 1;
  }

  double position(int point) {
    return length * point / points;
  }

  double waveNumber(int mode) {
    return 2 * Math.PI * mode / length;
  }

  private double cosine(int mode, int point) {
    return table[(int) ((long) mode * point % points)];
  }

  private double weight(int point) {
    return (point == 0 || point == points / 2 ? 1 : 2) * length / points;
  }

  private double norm(int mode) {
    return mode == 0 ? 1 / Math.sqrt(length) : Math.sqrt(2 / length);
  }

  /** Values on the half grid of an even function given by cosine coefficients. */
  double[] values(double[] coefficients) {
    double[] f = new double[halfPoints()];
    for (int n = 0; n <= cutoff; n++) {
      double c = coefficients[n] * norm(n);
      for (int p = 0; p < f.length; p++) {
        f[p] += c * cosine(n, p);
      }
    }
    return f;
  }

  /** Cosine coefficients of an even function on the half grid. */
  double[] coefficients(double[] values) {
    double[] c = new double[cutoff + 1];
    for (int n = 0; n <= cutoff; n++) {
      for (int p = 0; p < values.length; p++) {
        c[n] += weight(p) * cosine(n, p) * values[p];
      }
      c[n] *= norm(n);
    }
    return c;
  }

  double integral(double[] values) {
    double sum = 0;
    for (int p = 0; p < values.length; p++) {
      sum += weight(p) * values[p];
    }
    return sum;
  }

  /** Adds the matrix of multiplication by an even function to a block; even or odd modes. */
  void addMultiplication(
      double[][] matrix, int row, int column, double[] function, boolean even) {
    double[] moments = new double[2 * cutoff + 1];
    for (int m = 0; m < moments.length; m++) {
      for (int p = 0; p < function.length; p++) {
        moments[m] += weight(p) * cosine(m, p) * function[p];
      }
    }
    int first = even ? 0 : 1;
    int sign = even ? 1 : -1;
    for (int i = first; i <= cutoff; i++) {
      for (int j = first; j <= cutoff; j++) {
        double scale = 0.5 * norm(i) * norm(j);
        matrix[row + i - first][column + j - first] +=
            scale * (moments[Math.abs(i - j)] + sign * moments[i + j]);
      }
    }
  }

  /** Adds k^2 to the diagonal of a block. */
  void addKinetic(double[][] matrix, int start, boolean even) {
    int first = even ? 0 : 1;
    for (int i = first; i <= cutoff; i++) {
      double k = waveNumber(i);
      matrix[start + i - first][start + i - first] += k * k;
    }
  }

  int count(boolean even) {
    return even ? cutoff + 1 : cutoff;
  }
}
