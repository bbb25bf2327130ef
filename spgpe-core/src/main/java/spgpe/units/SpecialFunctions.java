package spgpe.units;

/**
 * The few special functions the reductions need, each by a method that keeps close to full relative
 * precision on the range stated with it. Arguments are checked by the callers.
 */
final class SpecialFunctions {
  private static final double SQRT_PI = Math.sqrt(Math.PI);

  private SpecialFunctions() {}

  /**
   * exp(x^2) erfc(x) for x >= 0. Below 1.5 the series of exp(x^2) erf(x), all of whose terms are
   * positive (Abramowitz and Stegun 7.1.6); above it the continued fraction (7.1.14).
   */
  static double scaledErfc(double x) {
    if (x < 1.5) {
      double term = 2 * x / SQRT_PI;
      double sum = term;
      for (int n = 1; term > 1e-18 * sum; n++) {
        term *= 2 * x * x / (2 * n + 1);
        sum += term;
      }
      return Math.exp(x * x) - sum;
    }
    double tail = x;
    for (int n = 150; n >= 1; n--) {
      tail = x + 0.5 * n / tail;
    }
    return 1 / (SQRT_PI * tail);
  }

  /**
   * exp(x) K0(x) for x > 0 as the integral of exp(-x (cosh t - 1)) over t > 0 (Abramowitz and
   * Stegun 9.6.24). The trapezoidal rule converges exponentially here; the step follows the width
   * of the integrand.
   */
  static double scaledBesselK0(double x) {
    double step = Math.min(0.2, 0.7 / Math.sqrt(x));
    double sum = 0.5;
    double term = 1;
    for (int n = 1; term > 1e-18; n++) {
      double half = Math.sinh(0.5 * n * step);
      term = Math.exp(-2 * x * half * half);
      sum += term;
    }
    return step * sum;
  }

  /**
   * 1 - J0(x) without cancellation at small x: the mean of 2 sin^2((x/2) sin t) over t. Equally
   * spaced points leave an error of order J of twice their number, which vanishes to rounding.
   */
  static double oneMinusBesselJ0(double x) {
    int points = points(x);
    double sum = 0;
    for (int k = 0; k < points; k++) {
      double sine = Math.sin(0.5 * x * Math.sin(Math.PI * (k + 0.5) / points));
      sum += sine * sine;
    }
    return 2 * sum / points;
  }

  /** J1(x) as the mean of sin(t) sin(x sin t). */
  static double besselJ1(double x) {
    int points = points(x);
    double sum = 0;
    for (int k = 0; k < points; k++) {
      double sine = Math.sin(Math.PI * (k + 0.5) / points);
      sum += sine * Math.sin(x * sine);
    }
    return sum / points;
  }

  private static int points(double x) {
    return 30 + (int) Math.ceil(Math.abs(x));
  }

  /**
   * The Lerch transcendent Phi(z,1,j) = sum over n >= 0 of z^n/(n+j) at j = 1..count (element j-1)
   * for 0 <= z < 1, by the backward recursion Phi(j) = 1/j + z Phi(j+1). All terms are positive, so
   * nothing cancels; Phi(j) misses a relative z^(count-j), which the count must make negligible.
   */
  static double[] lerch(double z, int count) {
    double[] phi = new double[count];
    double next = 0;
    for (int j = count; j >= 1; j--) {
      next = 1.0 / j + z * next;
      phi[j - 1] = next;
    }
    return phi;
  }

  /**
   * The collision sum I(b,c) = sum over j >= 1 of exp(b (j+1) - 2 c j) Phi(exp(b-c),1,j)^2 with b =
   * mu/kB T and c = eps_cut/kB T. Needs c > 0 and c - b >= 1e-4.
   */
  static double collisionSum(double b, double c) {
    double gap = c - b;
    // beyond the last term both z^j and the weight below are under 1e-19
    double[] phi = lerch(Math.exp(-gap), Math.max(40, (int) Math.ceil(45 / gap)));
    double sum = 0;
    for (int j = phi.length; j >= 1; j--) {
      sum += Math.exp(b * (1.0 - j) - 2 * gap * j) * phi[j - 1] * phi[j - 1];
    }
    return sum;
  }
}
