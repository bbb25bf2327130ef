package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

/** Reference: SciPy 1.17, stats.norm, chi2, beta and binom. */
class QuantilesTest {
  @Test
  void twoSidedNormal() {
    assertEquals(1.959963984540054, Quantiles.twoSidedNormal(.95), 1e-14);
    assertEquals(.6744897501960817, Quantiles.twoSidedNormal(.5), 1e-15);
    assertEquals(6.1094102, Quantiles.twoSidedNormal(1 - 1e-9), 1e-7);
    assertEquals(1.2533141373155e-12, Quantiles.twoSidedNormal(1e-12), 1e-16);
  }

  @Test
  void chiSquare() {
    assertEquals(9.820691171752555e-4, Quantiles.chiSquare(.025, 1), 1e-16);
    assertEquals(.83121161, Quantiles.chiSquare(.025, 5), 5e-9);
    assertEquals(12.83250199, Quantiles.chiSquare(.975, 5), 5e-9);
  }

  @Test
  void largeCounts() {
    assertEquals(.5922977916140506, Quantiles.beta(.025, 10934, 7307), 1e-12);
    assertEquals(.8854399874739501, Quantiles.binomialTwoSided(10934, 18240, .6), 1e-9);
  }

  @Test
  void chiSquareTailInvertsTheQuantile() {
    for (double freedom : new double[] {1, 2, 7, 2000}) {
      for (double p : new double[] {1e-12, 1e-6, .3, .999}) {
        double x = Quantiles.chiSquareExceeded(p, freedom);
        assertEquals(p, Quantiles.chiSquareUpperTail(x, freedom), 1e-11 * p);
      }
    }
  }
}
