package spgpe.statistics;

import java.util.function.DoubleUnaryOperator;
import spgpe.internal.check.Check;

/** Root of a monotone function: doubling steps until the sign changes, then halving. */
final class Bisection {
  private static final int MAX_DOUBLINGS = 2000;

  private Bisection() {}

  static double root(DoubleUnaryOperator function, double start, double firstStep) {
    boolean positive = function.applyAsDouble(start) > 0;
    double inside = start;
    double step = firstStep;
    double outside = start + step;
    for (int i = 0; function.applyAsDouble(outside) > 0 == positive; i++) {
      Check.state(
          i < MAX_DOUBLINGS && Double.isFinite(outside), "no sign change found from %s on", start);
      inside = outside;
      step *= 2;
      outside = inside + step;
    }
    while (true) {
      double middle = inside + 0.5 * (outside - inside);
      if (middle == inside || middle == outside) {
        return middle;
      }
      if (function.applyAsDouble(middle) > 0 == positive) {
        inside = middle;
      } else {
        outside = middle;
      }
    }
  }
}
