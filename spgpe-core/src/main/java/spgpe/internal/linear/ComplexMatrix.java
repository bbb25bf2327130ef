package spgpe.internal.linear;

/** A small dense square complex matrix; operations return new matrices. */
public final class ComplexMatrix {
  private static final double PIVOT_TOLERANCE = 1e-13;

  private final int n;
  private final double[] re;
  private final double[] im;

  /**
   * Makes a matrix of zeros.
   *
   * @param n number of rows and columns
   */
  public ComplexMatrix(int n) {
    this.n = n;
    this.re = new double[n * n];
    this.im = new double[n * n];
  }

  /**
   * Unit matrix.
   *
   * @param n number of rows and columns
   * @return the matrix
   */
  public static ComplexMatrix identity(int n) {
    ComplexMatrix unit = new ComplexMatrix(n);
    for (int i = 0; i < n; i++) {
      unit.re[i * n + i] = 1;
    }
    return unit;
  }

  /**
   * Number of rows.
   *
   * @return n
   */
  public int size() {
    return n;
  }

  /**
   * Sets an element.
   *
   * @param i row
   * @param j column
   * @param real real part
   * @param imaginary imaginary part
   */
  public void set(int i, int j, double real, double imaginary) {
    re[i * n + j] = real;
    im[i * n + j] = imaginary;
  }

  /**
   * Real part of an element.
   *
   * @param i row
   * @param j column
   * @return real part
   */
  public double re(int i, int j) {
    return re[i * n + j];
  }

  /**
   * Imaginary part of an element.
   *
   * @param i row
   * @param j column
   * @return imaginary part
   */
  public double im(int i, int j) {
    return im[i * n + j];
  }

  /**
   * this + factor other.
   *
   * @param other matrix of the same size
   * @param factor real factor
   * @return sum
   */
  public ComplexMatrix plus(ComplexMatrix other, double factor) {
    ComplexMatrix sum = new ComplexMatrix(n);
    for (int i = 0; i < re.length; i++) {
      sum.re[i] = re[i] + factor * other.re[i];
      sum.im[i] = im[i] + factor * other.im[i];
    }
    return sum;
  }

  /**
   * Product this times other.
   *
   * @param other matrix of the same size
   * @return product
   */
  public ComplexMatrix times(ComplexMatrix other) {
    ComplexMatrix product = new ComplexMatrix(n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double real = 0;
        double imaginary = 0;
        for (int k = 0; k < n; k++) {
          int a = i * n + k;
          int b = k * n + j;
          real += re[a] * other.re[b] - im[a] * other.im[b];
          imaginary += re[a] * other.im[b] + im[a] * other.re[b];
        }
        product.set(i, j, real, imaginary);
      }
    }
    return product;
  }

  /**
   * Conjugate transpose.
   *
   * @return the adjoint
   */
  public ComplexMatrix adjoint() {
    ComplexMatrix adjoint = new ComplexMatrix(n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        adjoint.set(j, i, re(i, j), -im(i, j));
      }
    }
    return adjoint;
  }

  /**
   * Matrix exponential, by scaling, a Taylor series and squaring.
   *
   * @return exp(this)
   */
  public ComplexMatrix exp() {
    double norm = 0;
    for (int i = 0; i < re.length; i++) {
      norm += Math.abs(re[i]) + Math.abs(im[i]);
    }
    int squarings = norm > 0.25 ? 2 + Math.max(0, Math.getExponent(norm) + 1) : 0;
    ComplexMatrix scaled = new ComplexMatrix(n).plus(this, Math.scalb(1.0, -squarings));
    ComplexMatrix sum = identity(n);
    ComplexMatrix power = identity(n);
    for (int k = 1; k <= 16; k++) {
      power = new ComplexMatrix(n).plus(power.times(scaled), 1.0 / k);
      sum = sum.plus(power, 1);
    }
    for (int s = 0; s < squarings; s++) {
      sum = sum.times(sum);
    }
    return sum;
  }

  /**
   * Lower triangular L with L L<sup>+</sup> = this, for a Hermitian matrix without negative
   * eigenvalues. A pivot that is zero to rounding gives a column of zeros.
   *
   * @return L
   */
  public ComplexMatrix cholesky() {
    ComplexMatrix lower = new ComplexMatrix(n);
    for (int j = 0; j < n; j++) {
      double pivot = re(j, j);
      for (int k = 0; k < j; k++) {
        pivot -= lower.re(j, k) * lower.re(j, k) + lower.im(j, k) * lower.im(j, k);
      }
      if (!(pivot > PIVOT_TOLERANCE * re(j, j))) {
        continue;
      }
      double root = Math.sqrt(pivot);
      lower.set(j, j, root, 0);
      for (int i = j + 1; i < n; i++) {
        double real = re(i, j);
        double imaginary = im(i, j);
        for (int k = 0; k < j; k++) {
          real -= lower.re(i, k) * lower.re(j, k) + lower.im(i, k) * lower.im(j, k);
          imaginary -= lower.im(i, k) * lower.re(j, k) - lower.re(i, k) * lower.im(j, k);
        }
        lower.set(i, j, real / root, imaginary / root);
      }
    }
    return lower;
  }

  /**
   * Solves X L<sup>+</sup> = this for lower triangular L; columns that belong to a zero pivot of L
   * are set to zero.
   *
   * @param lower L
   * @return X
   */
  public ComplexMatrix dividedByAdjointOf(ComplexMatrix lower) {
    ComplexMatrix x = new ComplexMatrix(n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double pivot = lower.re(j, j);
        if (pivot == 0) {
          continue;
        }
        double real = re(i, j);
        double imaginary = im(i, j);
        for (int k = 0; k < j; k++) {
          real -= x.re(i, k) * lower.re(j, k) + x.im(i, k) * lower.im(j, k);
          imaginary -= x.im(i, k) * lower.re(j, k) - x.re(i, k) * lower.im(j, k);
        }
        x.set(i, j, real / pivot, imaginary / pivot);
      }
    }
    return x;
  }
}
