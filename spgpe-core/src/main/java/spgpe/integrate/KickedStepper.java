package spgpe.integrate;

import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * A stepper whose noise comes in two independent kicks of half a step, before and after a
 * deterministic step: the shortest way to an own scheme.
 *
 * <pre>a_jk += sqrt(gamma_j T dt/2) (z + i z'),   deterministic step,   the same kick again</pre>
 *
 * <p>The halves must be independent: one normal split in two, or noise held over the stages of a
 * step, cools the modes of high energy and has weak order 1 (docs/integrators.md). A subclass gives
 * {@link #deterministicStep}. Owns scratch memory: one thread at a time.
 */
public abstract class KickedStepper extends AbstractStepper {
  private final HalfKicks kicks;
  private final StageSum stage;

  /**
   * Makes a stepper without state.
   *
   * @param model the model
   * @param noise generator of normals
   * @param lanes number of lanes
   * @param dt time step, finite and positive
   * @throws IllegalArgumentException if a value is out of range
   */
  protected KickedStepper(Model model, NoiseGenerator noise, int lanes, double dt) {
    super(model, noise, lanes, dt);
    this.kicks = new HalfKicks(model, dt);
    this.stage = new StageSum(model);
  }

  /**
   * Advances {@link #state} by dt without noise.
   *
   * @param time time at the begin of the step
   */
  protected abstract void deterministicStep(double time);

  /**
   * target = base - (i + gamma_j) h force: an Euler step, the piece that Runge-Kutta schemes are
   * made of.
   *
   * @param base where to step from
   * @param h time step
   * @param force dK/da<sup>*</sup>, or a part of it
   * @param target overwritten; may be base
   */
  protected final void addIncrement(
      Amplitudes base, double h, Amplitudes force, Amplitudes target) {
    stage.add(base, h, force, target);
  }

  @Override
  protected final boolean isNoisy() {
    return kicks.isNoisy();
  }

  @Override
  protected final void step(boolean fromSymmetricPoint, Amplitudes normals, double time) {
    kicks.kick(fromSymmetricPoint, normals, state);
    deterministicStep(time);
  }

  @Override
  protected final void toSymmetricPoint(
      Amplitudes normals, Amplitudes rest, Amplitudes target) {
    target.set(state);
    kicks.halfOfKick(normals, rest, target);
  }
}
