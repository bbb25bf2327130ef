package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * Characteristic values and exponents of Mathieu's equation {@code y'' + (a - 2 q cos 2z) y = 0}.
 *
 * <p>Notation of Abramowitz and Stegun, chapter 20, and of the NIST Digital Library of Mathematical
 * Functions, chapter 28: {@code a_n} belongs to even and {@code b_n} to odd solutions; even n has
 * period pi and odd n period 2 pi. Stateless.
 */
public final class Mathieu {
  private static final double LARGEST_Q = 1e6;

  private Mathieu() {}

  /**
   * Characteristic value of the even solution {@code ce_n}.
   *
   * @param order n, 0 to 200
   * @param q parameter q, {@code |q| <= 1e6}
   * @return {@code a_n(q)}, absolute error near {@code 1e-13 (1 + |q|)}
   * @throws IllegalArgumentException if a value is out of range
   */
  public static double evenValue(int order, double q) {
    Check.inRange(order, 0, 200, "order");
    checkQ(q);
    return order % 2 == 0
        ? value(order / 2, q, 0, Math.sqrt(2), 0)
        : value(order / 2, q, 1, 1, q);
  }

  /**
   * Characteristic value of the odd solution {@code se_n}.
   *
   * @param order n, 1 to 200
   * @param q parameter q, {@code |q| <= 1e6}
   * @return {@code b_n(q)}, absolute error near {@code 1e-13 (1 + |q|)}
   * @throws IllegalArgumentException if a value is out of range
   */
  public static double oddValue(int order, double q) {
    Check.inRange(order, 1, 200, "order");
    checkQ(q);
    return order % 2 == 0
        ? value(order / 2 - 1, q, 2, 1, 0)
        : value(order / 2, q, 1, 1, -q);
  }

  /**
   * Floquet exponent per unit z of the general solution.
   *
   * @param a parameter a, finite, {@code |a| <= 1e6}
   * @param q parameter q, {@code |q| <= 1e6}
   * @return growth rate (zero in a stable region) and principal value of the characteristic
   *     exponent in 0 to 1, i.e. {@code cos(pi nu) = trace/2} of the monodromy over pi
   * @throws IllegalArgumentException if a value is out of range
   */
  public static FloquetExponent exponent(double a, double q) {
    Check.argument(Math.abs(a) <= LARGEST_Q, "|a| must be <= 1e6: a=%s", a);
    checkQ(q);
    // (y, y'): y' = 1 * y', (y')' = -(a - 2 q cos 2z) y.
    return Monodromy.of(0, z -> 1, z -> -(a - 2 * q * Math.cos(2 * z)), Math.PI).exponent();
  }

  private static void checkQ(double q) {
    Check.argument(Math.abs(q) <= LARGEST_Q, "|q| must be <= 1e6: q=%s", q);
  }

  /** Diagonal (2k+shift)^2 with a first-element correction, off-diagonal q. */
  private static double value(int index, double q, int shift, double firstFactor, double first) {
    int size = 24 + 2 * index + (int) (3 * Math.sqrt(Math.abs(q)));
    double[] diagonal = new double[size];
    double[] offDiagonal = new double[size - 1];
    for (int k = 0; k < size; k++) {
      double p = 2.0 * k + shift;
      diagonal[k] = p * p;
      if (k < size - 1) {
        offDiagonal[k] = q;
      }
    }
    diagonal[0] += first;
    offDiagonal[0] *= firstFactor;
    return SymmetricEigen.ofTridiagonal(diagonal, offDiagonal).value(index);
  }
}
