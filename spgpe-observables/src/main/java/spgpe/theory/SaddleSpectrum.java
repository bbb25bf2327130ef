package spgpe.theory;

import spgpe.internal.check.Check;

/** Hessian spectrum of a critical bubble in its symmetry blocks and the unstable mode. */
final class SaddleSpectrum {
  private static final int ITERATIONS = 60;

  private final SaddleFields fields;
  private final double zeroTolerance;
  private final SymmetricEigen symmetricBroken;
  private int negativeCount;
  private int zeroCount;
  private double negative;
  private double zeroError;
  private double logSum;

  SaddleSpectrum(CoupledPair pair, SaddleFields fields) {
    this.fields = fields;
    double[] vacuum = GaussianFluctuations.of(pair, Vacuum.FALSE).curvatures(0);
    zeroTolerance = 1e-7 * vacuum[3];
    ModeBasis basis = fields.basis;
    SymmetricEigen broken = null;
    for (int symmetry = 0; symmetry < basis.classes(); symmetry++) {
      int copies = basis.degeneracy(symmetry);
      collect(SymmetricEigen.of(fields.block(true, symmetry)), copies);
      SymmetricEigen eigen = SymmetricEigen.of(fields.block(false, symmetry));
      collect(eigen, copies);
      broken = broken == null ? eigen : broken;
      collectVacuum(vacuum, symmetry);
    }
    symmetricBroken = Check.notNull(broken, "spectrum");
  }

  private void collectVacuum(double[] vacuum, int symmetry) {
    ModeBasis basis = fields.basis;
    for (int i = 0; i < basis.count(symmetry); i++) {
      for (double curvature : vacuum) {
        double value = basis.squaredWaveNumber(symmetry, i) + curvature;
        if (value > 0) {
          logSum += basis.degeneracy(symmetry) * Math.log(value);
        }
      }
    }
  }

  private void collect(SymmetricEigen eigen, int copies) {
    for (int i = 0; i < eigen.size(); i++) {
      double value = eigen.value(i);
      if (Math.abs(value) < zeroTolerance) {
        zeroCount += copies;
        zeroError = Math.max(zeroError, Math.abs(value));
        continue;
      }
      if (value < 0) {
        negativeCount += copies;
        negative = Math.min(negative, value);
      }
      logSum -= copies * Math.log(Math.abs(value));
    }
  }

  int negativeModes() {
    return negativeCount;
  }

  int zeroModes() {
    return zeroCount;
  }

  double negative() {
    return negative;
  }

  double zeroError() {
    return zeroError;
  }

  double logDeterminantFactor() {
    return 0.5 * logSum;
  }

  /**
   * With {@code c = 2 lambda/(1 + gamma^2)} the unstable mode (a, b) obeys {@code (H_A + c gamma) a
   * + c b = 0}, {@code (H_B + c gamma) b = c a}, hence {@code F(c) a = 0} with the symmetric {@code
   * F(c) = H_A + c gamma + c^2 (H_B + c gamma)^{-1}}, which grows with c. Solved by Rayleigh
   * iteration in the eigenbasis of H_B.
   */
  double growthRate(double damping) {
    double[][] transformed = transformedBlock();
    int n = transformed.length;
    SymmetricEigen start = SymmetricEigen.of(transformed);
    double[] a = start.vector(0).clone();
    double c = rayleigh(transformed, a, damping);
    for (int i = 0; i < ITERATIONS; i++) {
      double[][] f = copy(transformed);
      double[] right = new double[n];
      for (int k = 0; k < n; k++) {
        f[k][k] += shift(k, c, damping);
        right[k] = slope(k, c, damping) * a[k];
      }
      double[] next = SaddleFields.solve(f, right);
      VectorMath.scale(next, 1 / VectorMath.norm(next));
      a = next;
      double improved = rayleigh(transformed, a, damping);
      boolean done = Math.abs(improved - c) <= 1e-13 * improved;
      c = improved;
      if (done) {
        return 0.5 * c * (1 + damping * damping);
      }
    }
    throw new UnconvergedException(
        "the iteration for the growth rate did not converge at damping=" + damping);
  }

  private double[][] transformedBlock() {
    double[][] h = fields.block(true, 0);
    int n = h.length;
    double[][] half = new double[n][];
    for (int k = 0; k < n; k++) {
      half[k] = VectorMath.times(h, symmetricBroken.vector(k));
    }
    double[][] t = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < n; k++) {
        t[i][k] = VectorMath.dot(symmetricBroken.vector(i), half[k]);
      }
    }
    return t;
  }

  private static double[][] copy(double[][] matrix) {
    double[][] c = new double[matrix.length][];
    for (int i = 0; i < c.length; i++) {
      c[i] = matrix[i].clone();
    }
    return c;
  }

  private double shift(int k, double c, double damping) {
    return c * damping + c * c / (stiffness(k) + c * damping);
  }

  private double slope(int k, double c, double damping) {
    double h = stiffness(k);
    double d = h + c * damping;
    return damping + c * (2 * h + c * damping) / (d * d);
  }

  private double stiffness(int k) {
    return Math.max(0, symmetricBroken.value(k));
  }

  /** Root c of a^T F(c) a = 0 by bisection and Newton steps; the left side grows with c. */
  private double rayleigh(double[][] transformed, double[] a, double damping) {
    double base = VectorMath.dot(a, VectorMath.times(transformed, a));
    double low = 0;
    double high = 1e-6;
    while (quotient(base, a, high, damping) < 0) {
      low = high;
      high *= 2;
    }
    for (int i = 0; i < 200 && high - low > 1e-16 * high; i++) {
      double middle = 0.5 * (low + high);
      if (quotient(base, a, middle, damping) < 0) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return 0.5 * (low + high);
  }

  private double quotient(double base, double[] a, double c, double damping) {
    double sum = base;
    for (int k = 0; k < a.length; k++) {
      sum += a[k] * a[k] * shift(k, c, damping);
    }
    return sum;
  }
}
