package spgpe.theory;

/** Dense vector arithmetic. */
final class VectorMath {
  private VectorMath() {}

  static double dot(double[] a, double[] b) {
    // Four partial sums: a single one is bound by the latency of the addition.
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int i = 0;
    for (; i < a.length - 3; i += 4) {
      s0 += a[i] * b[i];
      s1 += a[i + 1] * b[i + 1];
      s2 += a[i + 2] * b[i + 2];
      s3 += a[i + 3] * b[i + 3];
    }
    for (; i < a.length; i++) {
      s0 += a[i] * b[i];
    }
    return (s0 + s1) + (s2 + s3);
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
