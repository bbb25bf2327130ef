package spgpe.theory;

import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.SingularMatrixException;

/**
 * Symmetric two-component configuration {@code psi_1 = u + i v}, {@code psi_2 = u - i v} in a box,
 * projected on the kept modes: energy, force, Newton iteration and Hessian blocks.
 *
 * <p>Energy density {@code u'^2 + v'^2 + g rho^2 - 2 mu rho - 2 J (u^2 - v^2) + 4 kappa u^2 v^2},
 * {@code rho = u^2 + v^2}. Fluctuations split by parity and by the symmetry {@code psi_1 <->
 * psi_2^*}: class A keeps it ({@code delta u, delta v}), class B breaks it ({@code psi_1 += p + i
 * q, psi_2 += -p + i q}). Blocks are in orthonormal real coordinates.
 */
final class SaddleFields {
  private static final int NEWTON_LIMIT = 60;

  final ModeBasis basis;
  private final CoupledPair pair;
  /** Coefficients of u, then of v, in the symmetric class. */
  private final double[] state;
  private final double[] u;
  private final double[] v;

  SaddleFields(CoupledPair pair, ModeBasis basis, double[] state) {
    this.pair = pair;
    this.basis = basis;
    this.state = state;
    int n = basis.count(0);
    u = basis.values(java.util.Arrays.copyOfRange(state, 0, n));
    v = basis.values(java.util.Arrays.copyOfRange(state, n, 2 * n));
  }

  /** Fields with a given phase profile and either uniform or local density. */
  static SaddleFields guess(
      CoupledPair pair, ModeBasis basis, DoubleUnaryOperator profile, boolean localDensity) {
    double[] a = new double[basis.points()];
    double[] b = new double[a.length];
    for (int i = 0; i < a.length; i++) {
      double phi = profile.applyAsDouble(basis.radius(i));
      double s = Math.sin(phi);
      double density =
          localDensity
              ? (pair.mu() + pair.coherentCoupling() * Math.cos(phi))
                  / (pair.g() + pair.biquadraticCoupling() * s * s)
              : pair.falseVacuumDensity();
      a[i] = Math.sqrt(density) * Math.cos(0.5 * phi);
      b[i] = Math.sqrt(density) * Math.sin(0.5 * phi);
    }
    return new SaddleFields(
        pair, basis, join(basis.coefficients(a), basis.coefficients(b)));
  }

  private static double[] join(double[] a, double[] b) {
    double[] c = java.util.Arrays.copyOf(a, a.length + b.length);
    System.arraycopy(b, 0, c, a.length, b.length);
    return c;
  }

  /** The same coefficients under other parameters and length, scaled to keep the values. */
  SaddleFields movedTo(CoupledPair other, ModeBasis target) {
    double[] moved = state.clone();
    VectorMath.scale(moved, Math.sqrt(target.volume() / basis.volume()));
    return new SaddleFields(other, target, moved);
  }

  /** Newton iteration with step halving; the result's force is below 1e-11 or this throws. */
  SaddleFields newton() {
    SaddleFields current = this;
    double[] force = current.force();
    double size = VectorMath.norm(force);
    double scale = pair.g() * Math.pow(Math.max(1e-300, pair.falseVacuumDensity()), 1.5)
        * Math.sqrt(basis.volume());
    for (int i = 0; i < NEWTON_LIMIT && size > 1e-12 * scale; i++) {
      double[] step = solve(current.block(true, 0), force);
      double fraction = 1;
      SaddleFields next = null;
      while (fraction > 1e-3) {
        double[] trial = current.state.clone();
        VectorMath.add(trial, -fraction, step);
        next = new SaddleFields(pair, basis, trial);
        double[] nextForce = next.force();
        double nextSize = VectorMath.norm(nextForce);
        if (nextSize < size) {
          force = nextForce;
          size = nextSize;
          break;
        }
        next = null;
        fraction *= 0.5;
      }
      if (next == null) {
        break;
      }
      current = next;
    }
    if (!(size <= 1e-10 * scale)) {
      throw new UnconvergedException(
          "the Newton iteration for the critical bubble did not converge: force " + size
              + " for " + pair + " in a box of volume " + basis.volume());
    }
    return current;
  }

  static double[] solve(double[][] matrix, double[] right) {
    try {
      return new LUDecomposition(new Array2DRowRealMatrix(matrix, false), 0)
          .getSolver()
          .solve(new ArrayRealVector(right, false))
          .toArray();
    } catch (SingularMatrixException e) {
      UnconvergedException thrown =
          new UnconvergedException("a linear system of the critical bubble is singular");
      thrown.initCause(e);
      throw thrown;
    }
  }

  /** Half the derivative of the energy by the coefficients of u and v. */
  private double[] force() {
    double g = pair.g();
    double kappa = pair.biquadraticCoupling();
    double j = pair.coherentCoupling();
    double[] fu = new double[u.length];
    double[] fv = new double[u.length];
    for (int i = 0; i < u.length; i++) {
      double u2 = u[i] * u[i];
      double v2 = v[i] * v[i];
      double common = 2 * g * (u2 + v2) - 2 * pair.mu();
      fu[i] = (common - 2 * j + 4 * kappa * v2) * u[i];
      fv[i] = (common + 2 * j + 4 * kappa * u2) * v[i];
    }
    double[] f = join(basis.coefficients(fu), basis.coefficients(fv));
    int n = basis.count(0);
    for (int i = 0; i < n; i++) {
      double square = basis.squaredWaveNumber(0, i);
      f[i] += square * state[i];
      f[n + i] += square * state[n + i];
    }
    return f;
  }

  /** Energy above the uniform false vacuum of the same ring. */
  double energy() {
    double g = pair.g();
    double n0 = pair.falseVacuumDensity();
    double[] e = new double[u.length];
    for (int i = 0; i < e.length; i++) {
      double u2 = u[i] * u[i];
      double v2 = v[i] * v[i];
      double d = u2 + v2 - n0;
      // g rho^2 - 2 mu rho + 2 J rho - (its value at n0) = g d^2 with mu = g n0 + J.
      e[i] = g * d * d - 4 * pair.coherentCoupling() * u2
          + 4 * pair.biquadraticCoupling() * u2 * v2;
    }
    return basis.integral(e) + 0.5 * gradientSquared();
  }

  /** Integral of sum_j |psi_j'|^2. */
  double gradientSquared() {
    double sum = 0;
    int n = basis.count(0);
    for (int i = 0; i < n; i++) {
      double weight = state[i] * state[i] + state[n + i] * state[n + i];
      sum += 2 * basis.squaredWaveNumber(0, i) * weight;
    }
    return sum;
  }

  /** Integral of sum_j |psi_j|^2. */
  double atoms() {
    return 2 * VectorMath.dot(state, state);
  }

  /** Largest coefficient near the cutoff relative to the largest bubble coefficient. */
  double spectralTail() {
    int n = basis.count(0);
    double top = 0;
    for (int i = 0; i < n; i++) {
      top = Math.max(top, basis.squaredWaveNumber(0, i));
    }
    double largest = 0;
    double tail = 0;
    for (int i = 0; i < n; i++) {
      double square = basis.squaredWaveNumber(0, i);
      double c = Math.hypot(state[i], square == 0 ? 0 : state[n + i]);
      largest = Math.max(largest, c);
      if (square > 0.9 * top) {
        tail = Math.max(tail, c);
      }
    }
    return tail / largest;
  }

  double density(int point) {
    return u[point] * u[point] + v[point] * v[point];
  }

  double phase(int point) {
    return 2 * Math.atan2(v[point], u[point]);
  }

  double[] coefficientsOfU() {
    return java.util.Arrays.copyOf(state, state.length / 2);
  }

  double[] coefficientsOfV() {
    return java.util.Arrays.copyOfRange(state, state.length / 2, state.length);
  }

  /**
   * Hessian block. Class A has rows (u, v); class B has rows (q, -p), so that multiplication of
   * both fields by i maps the A coordinates one to one on the B coordinates.
   */
  double[][] block(boolean keepsSymmetry, int symmetry) {
    double g = pair.g();
    double kappa = pair.biquadraticCoupling();
    double j = pair.coherentCoupling();
    double mu = pair.mu();
    int points = u.length;
    double[] first = new double[points];
    double[] second = new double[points];
    double[] cross = new double[points];
    for (int i = 0; i < points; i++) {
      double u2 = u[i] * u[i];
      double v2 = v[i] * v[i];
      double common = 2 * g * (u2 + v2) - 2 * mu;
      double product = 4 * u[i] * v[i];
      if (keepsSymmetry) {
        first[i] = common + 4 * g * u2 - 2 * j + 4 * kappa * v2;
        second[i] = common + 4 * g * v2 + 2 * j + 4 * kappa * u2;
        cross[i] = (g + 2 * kappa) * product;
      } else {
        first[i] = common + 4 * g * v2 - 2 * j;
        second[i] = common + 4 * g * u2 + 2 * j;
        cross[i] = -(g - kappa) * product;
      }
    }
    int n = basis.count(symmetry);
    double[][] h = new double[2 * n][2 * n];
    basis.addMultiplication(h, 0, 0, first, symmetry);
    basis.addMultiplication(h, n, n, second, symmetry);
    basis.addMultiplication(h, 0, n, cross, symmetry);
    basis.addMultiplication(h, n, 0, cross, symmetry);
    basis.addKinetic(h, 0, symmetry);
    basis.addKinetic(h, n, symmetry);
    return h;
  }
}
