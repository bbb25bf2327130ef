package spgpe.integrate;

import spgpe.model.Model;
import spgpe.projector.Amplitudes;

/** The kicks of {@link KickedStepper}; two neighbouring half kicks are drawn as one. Immutable. */
final class HalfKicks {
  private final double[] whole;
  private final boolean noisy;

  HalfKicks(Model model, double dt) {
    this.whole = new double[model.components()];
    boolean any = false;
    for (int c = 0; c < whole.length; c++) {
      whole[c] = Math.sqrt(model.reservoir().noiseStrength(c) * dt / 2);
      any |= whole[c] > 0;
    }
    this.noisy = any;
  }

  boolean isNoisy() {
    return noisy;
  }

  /** Two neighbouring half kicks, or a single one. */
  void kick(boolean half, Amplitudes normals, Amplitudes state) {
    if (noisy) {
      add(half ? Math.sqrt(0.5) : 1, normals, state);
    }
  }

  /** The first of two neighbouring half kicks, given the normals of both together. */
  void halfOfKick(Amplitudes normals, Amplitudes rest, Amplitudes target) {
    if (noisy) {
      // (z + z')/2 has variance 1/2 and covariance 1/2 with z
      add(0.5, normals, target);
      add(0.5, rest, target);
    }
  }

  private void add(double factor, Amplitudes normals, Amplitudes target) {
    for (int c = 0; c < whole.length; c++) {
      add(factor * whole[c], normals.re(c), target.re(c));
      add(factor * whole[c], normals.im(c), target.im(c));
    }
  }

  private static void add(double factor, double[] other, double[] target) {
    for (int e = 0; e < target.length; e++) {
      target[e] += factor * other[e];
    }
  }
}
