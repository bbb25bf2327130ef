package spgpe.integrate;

import spgpe.model.Model;
import spgpe.projector.Amplitudes;

/**
 * Sums of Runge-Kutta stages. With a force F the increment of a stage is
 *
 * <pre>k = -(i + gamma_j) dt F:
 * Re k = dt (Im F - gamma_j Re F),   Im k = -dt (Re F + gamma_j Im F).</pre>
 */
final class StageSum {
  private final double[] gamma;

  StageSum(Model model) {
    this.gamma = new double[model.components()];
    for (int c = 0; c < gamma.length; c++) {
      gamma[c] = model.reservoir().damping(c);
    }
  }

  /** target = base + k, with dt = h. */
  void add(Amplitudes base, double h, Amplitudes force, Amplitudes target) {
    for (int c = 0; c < gamma.length; c++) {
      add(
          gamma[c], h, base.re(c), base.im(c), force.re(c), force.im(c), target.re(c),
          target.im(c));
    }
  }

  /** target = k, with dt = h. */
  void increment(double h, Amplitudes force, Amplitudes target) {
    for (int c = 0; c < gamma.length; c++) {
      increment(gamma[c], h, force.re(c), force.im(c), target.re(c), target.im(c));
    }
  }

  private static void add(
      double gamma, double h, double[] baseRe, double[] baseIm, double[] forceRe, double[] forceIm,
      double[] targetRe, double[] targetIm) {
    for (int e = 0; e < targetRe.length; e++) {
      double re = forceRe[e];
      double im = forceIm[e];
      targetRe[e] = baseRe[e] + h * (im - gamma * re);
      targetIm[e] = baseIm[e] - h * (re + gamma * im);
    }
  }

  private static void increment(
      double gamma, double h, double[] forceRe, double[] forceIm, double[] targetRe,
      double[] targetIm) {
    for (int e = 0; e < targetRe.length; e++) {
      double re = forceRe[e];
      double im = forceIm[e];
      targetRe[e] = h * (im - gamma * re);
      targetIm[e] = -h * (re + gamma * im);
    }
  }
}
