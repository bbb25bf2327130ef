package spgpe.theory;

import spgpe.internal.check.Check;

/** Hessian spectrum of a critical bubble in its symmetry blocks and the unstable mode. */
final class SaddleSpectrum {
  private static final int BISECTIONS = 200;

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
   * F(c) = H_A + c gamma + c^2 (H_B + c gamma)^{-1}}, which grows with c and becomes positive
   * definite at the root. Bisection on that, in the eigenbasis of H_B: safe for every damping, also
   * where the zero mode of H_B gets an entry {@code c/gamma} that is large against all others.
   */
  double growthRate(double damping) {
    double[][] transformed = transformedBlock();
    double low = 0;
    double high = 1e-6;
    while (!isPositive(transformed, high, damping)) {
      low = high;
      high *= 2;
      if (!(high < 1e12)) {
        throw new UnconvergedException("no growth rate was found at damping=" + damping);
      }
    }
    for (int i = 0; i < BISECTIONS && high - low > 1e-14 * high; i++) {
      double middle = 0.5 * (low + high);
      if (isPositive(transformed, middle, damping)) {
        high = middle;
      } else {
        low = middle;
      }
    }
    return 0.25 * (low + high) * (1 + damping * damping);
  }

  /** Whether F(c) has a Cholesky factor. */
  private boolean isPositive(double[][] transformed, double c, double damping) {
    double[][] f = copy(transformed);
    for (int i = 0; i < f.length; i++) {
      f[i][i] += shift(i, c, damping);
      for (int j = 0; j <= i; j++) {
        double sum = f[i][j];
        for (int k = 0; k < j; k++) {
          sum -= f[i][k] * f[j][k];
        }
        if (j < i) {
          f[i][j] = sum / f[j][j];
        } else if (sum > 0) {
          f[i][i] = Math.sqrt(sum);
        } else {
          return false;
        }
      }
    }
    return true;
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

  private double stiffness(int k) {
    return Math.max(0, symmetricBroken.value(k));
  }
}
