package spgpe.internal.linear;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class LinearTest {
  private static ComplexMatrix random(int n, double size, SplittableRandom random) {
    ComplexMatrix matrix = new ComplexMatrix(n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        matrix.set(i, j, size * random.nextDouble(-1, 1), size * random.nextDouble(-1, 1));
      }
    }
    return matrix;
  }

  private static void assertClose(ComplexMatrix expected, ComplexMatrix found, double tolerance) {
    for (int i = 0; i < expected.size(); i++) {
      for (int j = 0; j < expected.size(); j++) {
        assertEquals(expected.re(i, j), found.re(i, j), tolerance);
        assertEquals(expected.im(i, j), found.im(i, j), tolerance);
      }
    }
  }

  @Test
  void theExponentialOfARotationIsARotation() {
    for (double angle : new double[] {1e-9, 0.1, 1, 3, 30}) {
      ComplexMatrix generator = new ComplexMatrix(2);
      generator.set(0, 1, -angle, 0);
      generator.set(1, 0, angle, 0);
      ComplexMatrix expected = new ComplexMatrix(2);
      expected.set(0, 0, Math.cos(angle), 0);
      expected.set(0, 1, -Math.sin(angle), 0);
      expected.set(1, 0, Math.sin(angle), 0);
      expected.set(1, 1, Math.cos(angle), 0);
      assertClose(expected, generator.exp(), 1e-14 * (1 + angle));
    }
  }

  @Test
  void theExponentialOfAScalarIsTheComplexExponential() {
    ComplexMatrix one = new ComplexMatrix(1);
    one.set(0, 0, -1.3, 2.1);
    ComplexMatrix found = one.exp();
    assertEquals(Math.exp(-1.3) * Math.cos(2.1), found.re(0, 0), 1e-15);
    assertEquals(Math.exp(-1.3) * Math.sin(2.1), found.im(0, 0), 1e-15);
  }

  @Test
  void exponentialsOfAMatrixAndItsNegativeAreInverse() {
    SplittableRandom random = new SplittableRandom(1);
    for (double size : new double[] {0.01, 0.3, 2}) {
      ComplexMatrix a = random(4, size, random);
      ComplexMatrix minus = new ComplexMatrix(4).plus(a, -1);
      assertClose(ComplexMatrix.identity(4), a.exp().times(minus.exp()), 1e-11);
    }
  }

  @Test
  void choleskyAndDivisionUndoTheProduct() {
    SplittableRandom random = new SplittableRandom(2);
    for (int n = 1; n <= 5; n++) {
      ComplexMatrix a = random(n, 1, random);
      ComplexMatrix hermitian = a.times(a.adjoint()).plus(ComplexMatrix.identity(n), 0.1);
      ComplexMatrix lower = hermitian.cholesky();
      assertClose(hermitian, lower.times(lower.adjoint()), 1e-14 * n * n);
      ComplexMatrix x = random(n, 1, random);
      assertClose(x, x.times(lower.adjoint()).dividedByAdjointOf(lower), 1e-12);
      for (int i = 0; i < n; i++) {
        for (int j = i + 1; j < n; j++) {
          assertEquals(0, lower.re(i, j), 0);
        }
      }
    }
  }

  @Test
  void aSingularMatrixHasColumnsOfZeros() {
    ComplexMatrix singular = new ComplexMatrix(2);
    singular.set(1, 1, 4, 0);
    ComplexMatrix lower = singular.cholesky();
    assertEquals(0, lower.re(0, 0), 0);
    assertEquals(2, lower.re(1, 1), 0);
    assertEquals(0, singular.dividedByAdjointOf(lower).re(1, 0), 0);
    assertEquals(2, singular.dividedByAdjointOf(lower).re(1, 1), 0);
  }

  @Test
  void eigenvaluesOfATwoByTwoMatrixAreThoseOfTheFormula() {
    SymmetricEigen eigen = SymmetricEigen.of(new double[][] {{2, 1}, {1, 3}});
    double low = Math.min(eigen.value(0), eigen.value(1));
    double high = Math.max(eigen.value(0), eigen.value(1));
    assertEquals((5 - Math.sqrt(5)) / 2, low, 1e-15);
    assertEquals((5 + Math.sqrt(5)) / 2, high, 1e-15);
  }

  @Test
  void eigenvectorsAreOrthonormalAndRebuildTheMatrix() {
    SplittableRandom random = new SplittableRandom(3);
    for (int n = 1; n <= 8; n++) {
      double[][] matrix = new double[n][n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j <= i; j++) {
          matrix[i][j] = random.nextDouble(-1, 1);
          matrix[j][i] = matrix[i][j];
        }
      }
      SymmetricEigen eigen = SymmetricEigen.of(matrix);
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          double rebuilt = 0;
          double product = 0;
          for (int k = 0; k < n; k++) {
            rebuilt += eigen.value(k) * eigen.vector(k, i) * eigen.vector(k, j);
            product += eigen.vector(i, k) * eigen.vector(j, k);
          }
          assertEquals(matrix[i][j], rebuilt, 1e-14 * n);
          assertEquals(i == j ? 1 : 0, product, 1e-14 * n);
        }
      }
    }
  }
}
