package spgpe.examples.validation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

/**
 * Superfluid transition on a small square, L = 16: fixed seed. Nelson and Kosterlitz, Phys. Rev.
 * Lett. 39, 1201 (1977): eta = 1/4 at the transition.
 */
class SuperfluidTransitionTest {
  private static SuperfluidTransition.Point run(double distance) {
    return SuperfluidTransition.run(
        new SuperfluidTransition.Case(distance, 3, 16), 200, 8, 5, Runnable::run);
  }

  /**
   * At mu_c eta = 1/4 within 4 errors (false alarm 6e-5, finite-size corrections of a few percent
   * beside it); the error of about 0.02 sees a factor 2 in temperature or coupling, which doubles
   * or halves eta. Below eta exceeds 1/4 by far and the exponential fits better, above it is the
   * other way round: differences of more than ten errors.
   */
  @Test
  void algebraicAboveAndExponentialBelow() {
    SuperfluidTransition.Point critical = run(0);
    double error = critical.fit().exponent().standardError();
    assertTrue(error < 0.03, "error " + error);
    assertEquals(0.25, critical.fit().exponent().value(), 4 * error);
    SuperfluidTransition.Point below = run(-0.5);
    SuperfluidTransition.Point above = run(0.5);
    assertTrue(below.fit().exponent().value() > 0.8);
    assertTrue(above.fit().exponent().value() < 0.15);
    assertTrue(below.fit().exponentialMisfit() < below.fit().algebraicMisfit());
    assertTrue(above.fit().algebraicMisfit() < above.fit().exponentialMisfit());
    double size = below.density().value() / SuperfluidTransition.criticalDensity(3);
    assertTrue(size > 0.4 && size < 0.65, "n/n_c=" + size);
  }

  /** ln(380/0.1) and the like do not enter: only e_c + D, D = ln(380/13.2)/pi (derived). */
  @Test
  void criticalValuesWithACutoff() {
    assertEquals(
        Math.log(380 * (4.5 + Math.log(380 / 13.2) / Math.PI)) / (2 * Math.PI),
        SuperfluidTransition.criticalDensity(3), 1e-12);
    // 2 n - mu = D whatever the cutoff
    for (double cutoff : new double[] {3, 6, 20}) {
      assertEquals(
          Math.log(380 / 13.2) / Math.PI,
          2 * SuperfluidTransition.criticalDensity(cutoff)
              - SuperfluidTransition.criticalChemicalPotential(cutoff),
          1e-12);
    }
  }
}
