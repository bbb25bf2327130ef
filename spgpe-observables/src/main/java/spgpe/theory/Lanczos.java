package spgpe.theory;

import java.util.ArrayList;
import java.util.List;
import java.util.function.UnaryOperator;
import org.jspecify.annotations.Nullable;

/**
 * Lanczos iteration with full reorthogonalisation for the lowest states of a real symmetric
 * operator, and for the spectral measure seen from a start vector.
 */
final class Lanczos {
  private static final int FIRST_CHECK = 40;
  private static final double CHECK_GROWTH = 1.2;
  private static final double PROBE_TOLERANCE = 1e-3;

  private final List<double[]> basis = new ArrayList<>();
  private final double[] diagonal;
  private final double[] offDiagonal;
  private final double startNorm;
  private SymmetricEigen ritz;
  private double residual;

  /**
   * Iterates until the lowest Ritz value with weight has the wanted residual.
   *
   * @param operator the symmetric operator
   * @param start start vector, not changed
   * @param deflated unit vector kept out of the Krylov space, or null
   * @param wanted number of lowest Ritz pairs that must have converged
   * @param probes number of further pairs that need only a residual of 1e-3
   * @param limit largest number of steps
   * @param tolerance residual norm to reach
   */
  Lanczos(
      UnaryOperator<double[]> operator,
      double[] start,
      double @Nullable [] deflated,
      int wanted,
      int probes,
      int limit,
      double tolerance) {
    int steps = Math.min(limit, start.length);
    diagonal = new double[steps];
    offDiagonal = new double[steps];
    double[] q = start.clone();
    if (deflated != null) {
      VectorMath.add(q, -VectorMath.dot(q, deflated), deflated);
    }
    startNorm = VectorMath.norm(q);
    VectorMath.scale(q, 1 / startNorm);
    basis.add(q);
    ritz = SymmetricEigen.ofTridiagonal(new double[] {0}, new double[0]);
    residual = Double.POSITIVE_INFINITY;
    double nextCheck = FIRST_CHECK;
    for (int j = 0; j < steps; j++) {
      double[] w = operator.apply(basis.get(j));
      diagonal[j] = VectorMath.dot(w, basis.get(j));
      VectorMath.add(w, -diagonal[j], basis.get(j));
      if (j > 0) {
        VectorMath.add(w, -offDiagonal[j - 1], basis.get(j - 1));
      }
      orthogonalise(w, deflated);
      double beta = VectorMath.norm(w);
      offDiagonal[j] = beta;
      boolean exhausted = beta < 1e-12 * Math.abs(diagonal[0]) || j == steps - 1;
      if (exhausted || j + 1 >= nextCheck) {
        nextCheck *= CHECK_GROWTH;
        solve(j + 1, beta, wanted, probes, tolerance);
        if (exhausted || residual < tolerance) {
          break;
        }
      }
      VectorMath.scale(w, 1 / beta);
      basis.add(w);
    }
    if (!(residual < tolerance)) {
      throw new UnconvergedException(
          "the Lanczos iteration did not converge in " + steps + " steps: residual " + residual
              + " > " + tolerance);
    }
  }

  private void orthogonalise(double[] w, double @Nullable [] deflated) {
    for (double[] q : basis) {
      VectorMath.add(w, -VectorMath.dot(w, q), q);
    }
    if (deflated != null) {
      VectorMath.add(w, -VectorMath.dot(w, deflated), deflated);
    }
  }

  private void solve(int count, double beta, int wanted, int probes, double tolerance) {
    double[] d = java.util.Arrays.copyOf(diagonal, count);
    double[] e = java.util.Arrays.copyOf(offDiagonal, count - 1);
    ritz = SymmetricEigen.ofTridiagonal(d, e);
    int all = Math.min(wanted + probes, diagonal.length);
    residual = count < all ? Double.POSITIVE_INFINITY : 0;
    for (int i = 0; i < Math.min(all, count); i++) {
      double weight = i < wanted ? 1 : tolerance / PROBE_TOLERANCE;
      residual = Math.max(residual, weight * Math.abs(beta * ritz.vector(i)[count - 1]));
    }
  }

  double value(int index) {
    return ritz.value(index);
  }

  /** Normalised Ritz vector in the full space. */
  double[] vector(int index) {
    double[] coefficients = ritz.vector(index);
    double[] x = new double[basis.get(0).length];
    for (int j = 0; j < coefficients.length; j++) {
      VectorMath.add(x, coefficients[j], basis.get(j));
    }
    VectorMath.scale(x, 1 / VectorMath.norm(x));
    return x;
  }

  /** Correlation function {@code <start| exp(-(H - reference) x) |start>}. */
  CorrelationFunction spectralMeasure(double reference) {
    double[] weights = new double[ritz.size()];
    double[] rates = new double[ritz.size()];
    for (int i = 0; i < weights.length; i++) {
      double overlap = startNorm * ritz.vector(i)[0];
      weights[i] = overlap * overlap;
      rates[i] = ritz.value(i) - reference;
    }
    return new CorrelationFunction(weights, rates);
  }
}
