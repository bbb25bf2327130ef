package spgpe.integrate;

import spgpe.hamiltonian.ModeMatrix;
import spgpe.internal.linear.ComplexMatrix;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;

/**
 * Exact solution of the linear part of the equation of motion with its noise, an Ornstein-Uhlenbeck
 * process for each mode,
 *
 * <pre>da = -A a dt + dW,   A = (i + Gamma) h(k),   &lt;dW dW^+&gt; = 2 Gamma T dt,
 * a(t + tau) = E a(t) + xi,   E = exp(-A tau),
 * C(tau) = &lt;xi xi^+&gt; = integral from 0 to tau of e^(-A s) 2 Gamma T e^(-A^+ s) ds,</pre>
 *
 * <p>for one mode of energy w: C = (T/w)(1 - exp(-2 gamma w tau)) (Uhlenbeck and Ornstein, Phys.
 * Rev. 36, 823 (1930)). For coupled components E and C come from one block exponential (Van Loan,
 * IEEE Trans. Autom. Control 23, 395 (1978)).
 *
 * <p>Two neighbouring half steps of a splitting scheme are taken in one, tau = dt, with noise L z.
 * The state between them, which observers want, is E_half a + xi_half with xi_half drawn given the
 * noise of the whole: xi_half = G z + R z', G = C_half E_half^+ (L^+)^-1, R R^+ = C_half - G G^+.
 *
 * <p>Tables hold the factors for real and imaginary parts of variance 1 each. Immutable.
 */
final class OrnsteinUhlenbeck {
  private final ModeTable half;
  private final ModeTable whole;
  private final ModeTable halfNoise;
  private final ModeTable wholeNoise;
  private final ModeTable halfGivenWhole;
  private final ModeTable halfRest;
  private final boolean noisy;

  OrnsteinUhlenbeck(Model model, double dt, int lanes) {
    ModeMatrix h = model.linearPart();
    int modes = model.region().modes();
    ComplexMatrix[] halves = new ComplexMatrix[modes];
    ComplexMatrix[] wholes = new ComplexMatrix[modes];
    ComplexMatrix[] halfNoises = new ComplexMatrix[modes];
    ComplexMatrix[] wholeNoises = new ComplexMatrix[modes];
    ComplexMatrix[] givens = new ComplexMatrix[modes];
    ComplexMatrix[] rests = new ComplexMatrix[modes];
    boolean diagonal = h.isDiagonal();
    for (int m = 0; m < modes; m++) {
      ComplexMatrix[] step =
          diagonal ? diagonalStep(model, h, m, dt / 2) : coupledStep(model, h, m, dt / 2);
      ComplexMatrix e = step[0];
      ComplexMatrix covariance = step[1];
      ComplexMatrix wholeCovariance =
          e.times(covariance).times(e.adjoint()).plus(covariance, 1);
      halves[m] = e;
      wholes[m] = e.times(e);
      halfNoises[m] = covariance.cholesky();
      wholeNoises[m] = wholeCovariance.cholesky();
      givens[m] = covariance.times(e.adjoint()).dividedByAdjointOf(wholeNoises[m]);
      rests[m] = covariance.plus(givens[m].times(givens[m].adjoint()), -1).cholesky();
    }
    half = ModeTable.of(halves, lanes);
    whole = ModeTable.of(wholes, lanes);
    halfNoise = ModeTable.of(halfNoises, lanes);
    wholeNoise = ModeTable.of(wholeNoises, lanes);
    halfGivenWhole = ModeTable.of(givens, lanes);
    halfRest = ModeTable.of(rests, lanes);
    boolean any = false;
    for (int c = 0; c < model.components(); c++) {
      any |= model.reservoir().noiseStrength(c) > 0;
    }
    noisy = any;
  }

  boolean isNoisy() {
    return noisy;
  }

  /** out = half step of in, with normals z if noisy. */
  void half(Amplitudes in, Amplitudes z, Amplitudes out) {
    half.multiply(in, out);
    if (noisy) {
      halfNoise.multiplyAdd(z, out);
    }
  }

  /** out = whole step of in, with normals z if noisy. */
  void whole(Amplitudes in, Amplitudes z, Amplitudes out) {
    whole.multiply(in, out);
    if (noisy) {
      wholeNoise.multiplyAdd(z, out);
    }
  }

  /** out = the state half way through the whole step that uses z, completed by normals zRest. */
  void halfWayThrough(Amplitudes in, Amplitudes z, Amplitudes zRest, Amplitudes out) {
    half.multiply(in, out);
    if (noisy) {
      halfGivenWhole.multiplyAdd(z, out);
      halfRest.multiplyAdd(zRest, out);
    }
  }

  /**
   * Variance of real and imaginary part (each) of the noise of one mode over a time tau: half of
   * (T/w)(1 - exp(-2 gamma w tau)), valid for every sign of w.
   */
  static double variance(double temperature, double gamma, double energy, double tau) {
    double x = 2 * gamma * energy * tau;
    double ratio = Math.abs(x) < 1e-8 ? 1 - x / 2 : -Math.expm1(-x) / x;
    return gamma * temperature * tau * ratio;
  }

  private static ComplexMatrix[] diagonalStep(Model model, ModeMatrix h, int mode, double tau) {
    int n = model.components();
    ComplexMatrix e = new ComplexMatrix(n);
    ComplexMatrix covariance = new ComplexMatrix(n);
    for (int c = 0; c < n; c++) {
      double gamma = model.reservoir().damping(c);
      double w = h.re(mode, c, c);
      double size = Math.exp(-gamma * w * tau);
      e.set(c, c, size * Math.cos(w * tau), -size * Math.sin(w * tau));
      covariance.set(
          c, c, variance(model.reservoir().temperature(), gamma, w, tau), 0);
    }
    return new ComplexMatrix[] {e, covariance};
  }

  private static ComplexMatrix[] coupledStep(Model model, ModeMatrix h, int mode, double tau) {
    int n = model.components();
    ComplexMatrix blocks = new ComplexMatrix(2 * n);
    for (int i = 0; i < n; i++) {
      double gamma = model.reservoir().damping(i);
      for (int j = 0; j < n; j++) {
        double real = gamma * h.re(mode, i, j) - h.im(mode, i, j);
        double imaginary = h.re(mode, i, j) + gamma * h.im(mode, i, j);
        blocks.set(i, j, -real * tau, -imaginary * tau);
        blocks.set(n + j, n + i, real * tau, -imaginary * tau);
      }
      blocks.set(i, n + i, gamma * model.reservoir().temperature() * tau, 0);
    }
    ComplexMatrix exponential = blocks.exp();
    ComplexMatrix e = new ComplexMatrix(n);
    ComplexMatrix upperRight = new ComplexMatrix(n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        e.set(i, j, exponential.re(i, j), exponential.im(i, j));
        upperRight.set(i, j, exponential.re(i, n + j), exponential.im(i, n + j));
      }
    }
    return new ComplexMatrix[] {e, upperRight.times(e.adjoint())};
  }
}
