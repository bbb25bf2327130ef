package spgpe.integrate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class SchemeConstantsTest {
  /** (T/w)(1 - exp(-2 gamma w dt)), Uhlenbeck and Ornstein, Phys. Rev. 36, 823 (1930). */
  @Test
  void ornsteinUhlenbeckIncrement() {
    assertEquals(
        0.006896042172, 2 * OrnsteinUhlenbeck.variance(0.7, 0.05, 3, 0.1), 1e-12);
    // w = 0 and w < 0 are legitimate
    assertEquals(2 * 0.05 * 0.7 * 0.1, 2 * OrnsteinUhlenbeck.variance(0.7, 0.05, 0, 0.1), 1e-15);
    assertEquals(
        0.7 / -3 * (1 - Math.exp(2 * 0.05 * 3 * 0.1)),
        2 * OrnsteinUhlenbeck.variance(0.7, 0.05, -3, 0.1), 1e-14);
    // no jump where the series takes over
    assertEquals(
        OrnsteinUhlenbeck.variance(1, 0.5, 0.99e-8, 1),
        OrnsteinUhlenbeck.variance(1, 0.5, 1.01e-8, 1), 1e-10);
  }

  /**
   * Order conditions of the embedded pair (Butcher): sum b = 1, sum b c = 1/2, sum b c^2 = 1/3, sum
   * b A c = 1/6, sum b A c^2 = 1/12 for order four, for the classical stages and a fifth one at the
   * end of the step.
   */
  @Test
  void embeddedPairFulfilsItsOrderConditions() {
    double[] c = {0, 0.5, 0.5, 1, 1};
    double[][] a = {
      {0, 0, 0, 0, 0},
      {0.5, 0, 0, 0, 0},
      {0, 0.5, 0, 0, 0},
      {0, 0, 1, 0, 0},
      {1.0 / 6, 1.0 / 3, 1.0 / 3, 1.0 / 6, 0}
    };
    for (double[] weights : new double[][] {LawsonRk4.FOURTH_ORDER, LawsonRk4.THIRD_ORDER}) {
      double[] sums = new double[5];
      for (int i = 0; i < weights.length; i++) {
        sums[0] += weights[i];
        sums[1] += weights[i] * c[i];
        sums[2] += weights[i] * c[i] * c[i];
        for (int j = 0; j < i; j++) {
          sums[3] += weights[i] * a[i][j] * c[j];
          sums[4] += weights[i] * a[i][j] * c[j] * c[j];
        }
      }
      assertEquals(1, sums[0], 1e-15);
      assertEquals(1.0 / 2, sums[1], 1e-15);
      assertEquals(1.0 / 3, sums[2], 1e-15);
      assertEquals(1.0 / 6, sums[3], 1e-15);
      if (weights.length == 4) {
        assertEquals(1.0 / 12, sums[4], 1e-15);
      } else {
        assertTrue(Math.abs(sums[4] - 1.0 / 12) > 1e-3); // third order only, or it could not tell
      }
    }
  }
}
