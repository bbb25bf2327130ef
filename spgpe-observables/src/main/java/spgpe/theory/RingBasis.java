package spgpe.theory;

/** Orthonormal cosine (class 0) and sine (class 1) modes on a ring; grid on the half ring. */
final class RingBasis implements ModeBasis {
  static final int EVEN = 0;
  static final int ODD = 1;

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

  @Override
  public int classes() {
    return 2;
  }

  @Override
  public int degeneracy(int symmetry) {
    return 1;
  }

  @Override
  public int count(int symmetry) {
    return symmetry == EVEN ? cutoff + 1 : cutoff;
  }

  @Override
  public double squaredWaveNumber(int symmetry, int mode) {
    double k = waveNumber(mode + symmetry);
    return k * k;
  }

  @Override
  public double volume() {
    return length;
  }

  @Override
  public RingBasis stretched(double factor) {
    return new RingBasis(length * factor, cutoff);
  }

  @Override
  public int points() {
    return points / 2 + 1;
  }

  @Override
  public double radius(int point) {
    return length * point / points;
  }

  private double waveNumber(int mode) {
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

  @Override
  public double[] values(double[] coefficients) {
    double[] f = new double[points()];
    for (int n = 0; n <= cutoff; n++) {
      double c = coefficients[n] * norm(n);
      for (int p = 0; p < f.length; p++) {
        f[p] += c * cosine(n, p);
      }
    }
    return f;
  }

  /** Value at any position of an even function given by cosine coefficients. */
  double valueAt(double[] coefficients, double x) {
    double sum = 0;
    for (int n = 0; n <= cutoff; n++) {
      sum += coefficients[n] * norm(n) * Math.cos(waveNumber(n) * x);
    }
    return sum;
  }

  @Override
  public double[] coefficients(double[] values) {
    double[] c = new double[cutoff + 1];
    for (int n = 0; n <= cutoff; n++) {
      for (int p = 0; p < values.length; p++) {
        c[n] += weight(p) * cosine(n, p) * values[p];
      }
      c[n] *= norm(n);
    }
    return c;
  }

  @Override
  public double integral(double[] values) {
    double sum = 0;
    for (int p = 0; p < values.length; p++) {
      sum += weight(p) * values[p];
    }
    return sum;
  }

  @Override
  public void addMultiplication(
      double[][] matrix, int row, int column, double[] function, int symmetry) {
    double[] moments = new double[2 * cutoff + 1];
    for (int m = 0; m < moments.length; m++) {
      for (int p = 0; p < function.length; p++) {
        moments[m] += weight(p) * cosine(m, p) * function[p];
      }
    }
    int sign = symmetry == EVEN ? 1 : -1;
    for (int i = symmetry; i <= cutoff; i++) {
      for (int j = symmetry; j <= cutoff; j++) {
        double scale = 0.5 * norm(i) * norm(j);
        matrix[row + i - symmetry][column + j - symmetry] +=
            scale * (moments[Math.abs(i - j)] + sign * moments[i + j]);
      }
    }
  }
}
