package spgpe.theory;

import java.util.function.DoubleUnaryOperator;

/**
 * Propagator over one period of {@code x' = d x + up(t) y, y' = down(t) x - d y} with periodic
 * coefficients: Magnus expansion of order six on three Gauss points (Blanes, Casas, Oteo, Ros,
 * Phys. Rep. 470, 151 (2009); from memory), steps doubled until the trace stands.
 */
final class Monodromy {
  private static final double TOLERANCE = 2e-12;
  private static final int LARGEST_STEPS = 1 << 16;
  private static final double NODE = Math.sqrt(15) / 10;

  private final double trace;
  private final double period;

  private Monodromy(double trace, double period) {
    this.trace = trace;
    this.period = period;
  }

  static Monodromy of(
      double diagonal, DoubleUnaryOperator up, DoubleUnaryOperator down, double period) {
    double previous = Double.NaN;
    for (int steps = 32; steps <= LARGEST_STEPS; steps *= 2) {
      double trace = trace(diagonal, up, down, period, steps);
      if (Math.abs(trace - previous) <= TOLERANCE * Math.max(2, Math.abs(trace))) {
        return new Monodromy(trace, period);
      }
      previous = trace;
    }
    throw new UnconvergedException(
        "the propagator over one period did not converge with " + LARGEST_STEPS
            + " steps; the modulation is too slow or too strong for the mode's frequency");
  }

  private static double trace(
      double diagonal,
      DoubleUnaryOperator up,
      DoubleUnaryOperator down,
      double period,
      int steps) {
    double h = period / steps;
    double[] m = {1, 0, 0, 1};
    for (int i = 0; i < steps; i++) {
      double middle = (i + 0.5) * h;
      double[] generator =
          magnus(
              diagonal,
              up.applyAsDouble(middle - NODE * h),
              up.applyAsDouble(middle),
              up.applyAsDouble(middle + NODE * h),
              down.applyAsDouble(middle - NODE * h),
              down.applyAsDouble(middle),
              down.applyAsDouble(middle + NODE * h),
              h);
      m = multiply(exponential(generator), m);
    }
    return m[0] + m[3];
  }

  /** Generator as (d, u, l) of the traceless matrix [[d, u], [l, -d]]. */
  private static double[] magnus(
      double d, double u1, double u2, double u3, double l1, double l2,
      double l3, double h) {
    double root = Math.sqrt(15) / 3;
    double[] a1 = {h * d, h * u2, h * l2};
    double[] a2 = {0, root * h * (u3 - u1), root * h * (l3 - l1)};
    double[] a3 = {0, 10 * h / 3 * (u3 - 2 * u2 + u1), 10 * h / 3 * (l3 - 2 * l2 + l1)};
    double[] c1 = commutator(a1, a2);
    double[] c2 = commutator(a1, combine(2, a3, 1, c1));
    VectorMath.scale(c2, -1.0 / 60);
    double[] left = combine(1, combine(-20, a1, -1, a3), 1, c1);
    double[] bracket = commutator(left, combine(1, a2, 1, c2));
    return combine(1, combine(1, a1, 1.0 / 12, a3), 1.0 / 240, bracket);
  }

  private static double[] combine(double p, double[] a, double q, double[] b) {
    return new double[] {p * a[0] + q * b[0], p * a[1] + q * b[1], p * a[2] + q * b[2]};
  }

  private static double[] commutator(double[] a, double[] b) {
    return new double[] {
      a[1] * b[2] - b[1] * a[2],
      2 * (a[0] * b[1] - b[0] * a[1]),
      2 * (a[2] * b[0] - b[2] * a[0])
    };
  }

  private static double[] exponential(double[] a) {
    double square = a[0] * a[0] + a[1] * a[2];
    double root = Math.sqrt(Math.abs(square));
    double c;
    double s;
    if (root < 1e-6) {
      c = 1 + square / 2;
      s = 1 + square / 6;
    } else if (square > 0) {
      c = Math.cosh(root);
      s = Math.sinh(root) / root;
    } else {
      c = Math.cos(root);
      s = Math.sin(root) / root;
    }
    return new double[] {c + s * a[0], s * a[1], s * a[2], c - s * a[0]};
  }

  private static double[] multiply(double[] a, double[] b) {
    return new double[] {
      a[0] * b[0] + a[1] * b[2],
      a[0] * b[1] + a[1] * b[3],
      a[2] * b[0] + a[3] * b[2],
      a[2] * b[1] + a[3] * b[3]
    };
  }

  double trace() {
    return trace;
  }

  FloquetExponent exponent() {
    double half = 0.5 * trace;
    if (Math.abs(half) > 1) {
      // ln(|half| + sqrt(half^2 - 1)) without overflow of the square.
      double size = Math.abs(half);
      double growth = Math.log(size) + Math.log1p(Math.sqrt((1 - 1 / size) * (1 + 1 / size)));
      return new FloquetExponent(growth / period, half < 0 ? Math.PI / period : 0);
    }
    return new FloquetExponent(0, Math.acos(half) / period);
  }
}
