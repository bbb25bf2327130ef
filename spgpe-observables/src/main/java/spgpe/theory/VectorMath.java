package spgpe.theory;

/** Dense vector arithmetic. */
final class VectorMath {
  private VectorMath() {}

  static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  static double norm(double[] a) {
    return Math.sqrt(dot(a, a));
  }

  /** y += factor x. */
  static void add(double[] y, double factor, double[] x) {
    for (int i = 0; i < y.length; i++) {
      y[i] += factor * x[i];
    }
  }

  static void scale(double[] y, double factor) {
    for (int i = 0; i < y.length; i++) {
      y[i] *= factor;
    }
  }

  /** Product of a row-major dense matrix with a vector. */
  static double[] times(double[][] matrix, double[] x) {
    double[] y = new double[matrix.length];
    for (int i = 0; i < y.length; i++) {
      y[i] = dot(matrix[i], x);
    }
    return y;
  }
}
