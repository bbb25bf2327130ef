package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;

/**
 * Noise in two independent kicks of half a step, one before and one after a deterministic step:
 *
 * <pre>a_jk += sqrt(gamma_j T dt/2) (z + i z')   twice in each step.</pre>
 *
 * <p>Two neighbouring kicks are drawn as one. Independence matters: one normal split into equal
 * halves, or noise held constant over the stages of a step, cools the modes of high energy and has
 * weak order 1 (docs/integrators.md). Immutable and thread-safe.
 */
public final class HalfKicks {
  private final double[] whole;
  private final boolean noisy;

  /**
   * Makes the kicks of a model.
   *
   * @param model the model
   * @param dt time step, finite and positive
   * @throws IllegalArgumentException if the step is out of range
   */
  public HalfKicks(Model model, double dt) {
    Check.positive(dt, "time step");
    this.whole = new double[model.components()];
    boolean any = false;
    for (int c = 0; c < whole.length; c++) {
      whole[c] = Math.sqrt(model.reservoir().noiseStrength(c) * dt / 2);
      any |= whole[c] > 0;
    }
    this.noisy = any;
  }

  /**
   * Whether there is any noise.
   *
   * @return true if any gamma_j T &gt; 0
   */
  public boolean isNoisy() {
    return noisy;
  }

  /**
   * Kicks a state before a deterministic step, see {@link AbstractStepper#step}.
   *
   * @param half whether to take one half kick instead of two neighbouring ones
   * @param normals standard normals
   * @param state changed
   */
  public void kick(boolean half, Amplitudes normals, Amplitudes state) {
    if (noisy) {
      add(half ? Math.sqrt(0.5) : 1, normals, state);
    }
  }

  /**
   * Takes the half of a kick that an observer must see, see {@link AbstractStepper#toSymmetricPoint}.
   *
   * @param normals standard normals of the two neighbouring half kicks together
   * @param rest further standard normals
   * @param target changed
   */
  public void halfOfKick(Amplitudes normals, Amplitudes rest, Amplitudes target) {
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
