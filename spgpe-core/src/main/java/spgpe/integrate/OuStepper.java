package spgpe.integrate;

import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * A stepper whose linear part is an exact Ornstein-Uhlenbeck half step before and after a nonlinear
 * step; the schemes differ in the nonlinear one.
 */
abstract class OuStepper extends AbstractStepper {
  private final OrnsteinUhlenbeck linear;
  private final boolean nonlinear;
  private final Amplitudes start;

  OuStepper(Model model, NoiseGenerator noise, int lanes, double dt) {
    super(model, noise, lanes, dt);
    this.linear = new OrnsteinUhlenbeck(model, dt, lanes);
    this.nonlinear = !model.localTerms().isEmpty();
    this.start = new Amplitudes(model.region(), model.components(), lanes);
  }

  /** Writes to {@link #state} what the nonlinear part makes of {@code start} within dt. */
  abstract void nonlinearStep(Amplitudes start, double time);

  @Override
  protected final boolean isNoisy() {
    return linear.isNoisy();
  }

  @Override
  protected final void step(boolean fromSymmetricPoint, Amplitudes normals, double time) {
    if (fromSymmetricPoint) {
      linear.half(state, normals, start);
    } else {
      linear.whole(state, normals, start);
    }
    if (nonlinear) {
      nonlinearStep(start, time);
    } else {
      state.set(start);
    }
  }

  @Override
  protected final void toSymmetricPoint(
      Amplitudes normals, Amplitudes rest, Amplitudes target) {
    linear.halfWayThrough(state, normals, rest, target);
  }
}
