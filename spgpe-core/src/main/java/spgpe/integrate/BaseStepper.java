package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.ForceEvaluator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/** Clock, state and noise of the built-in steppers. */
abstract class BaseStepper implements Stepper {
  final ForceEvaluator forces;
  final double dt;
  final Amplitudes state;
  final Amplitudes force;
  private final NoiseGenerator noise;
  private final Amplitudes normals;
  private final Amplitudes rest;
  private long step;
  private boolean started;
  private boolean atSymmetricPoint;

  BaseStepper(Model model, NoiseGenerator noise, int lanes, double dt) {
    this.forces = model.evaluator(lanes);
    this.noise = Check.notNull(noise, "noise");
    this.dt = dt;
    this.state = new Amplitudes(model.region(), model.components(), lanes);
    this.force = new Amplitudes(model.region(), model.components(), lanes);
    this.normals = new Amplitudes(model.region(), model.components(), lanes);
    this.rest = new Amplitudes(model.region(), model.components(), lanes);
  }

  @Override
  public final void start(Amplitudes initial, long firstStep) {
    Check.argument(firstStep >= 0, "first step must be >= 0: firstStep=%s", firstStep);
    state.set(initial);
    step = firstStep;
    started = true;
    atSymmetricPoint = true;
  }

  @Override
  public final void advance() {
    Check.state(started, "start(state, firstStep) must be called before advance()");
    if (isNoisy()) {
      noise.fill(step, atSymmetricPoint ? NoiseUse.START : NoiseUse.WHOLE, normals);
    }
    step(atSymmetricPoint, normals, step * dt);
    atSymmetricPoint = false;
    step++;
  }

  @Override
  public final void observe(Amplitudes target) {
    Check.state(started, "start(state, firstStep) must be called before observe(target)");
    if (atSymmetricPoint) {
      target.set(state);
      return;
    }
    if (isNoisy()) {
      noise.fill(step, NoiseUse.WHOLE, normals);
      noise.fill(step, NoiseUse.REST_OF_HALF, rest);
    }
    toSymmetricPoint(normals, rest, target);
  }

  @Override
  public final long stepNumber() {
    return step;
  }

  @Override
  public final double time() {
    return step * dt;
  }

  abstract boolean isNoisy();

  /** Advances {@link #state}; half of the noise only if it is at the symmetric point. */
  abstract void step(boolean fromSymmetricPoint, Amplitudes normals, double time);

  /** Writes the symmetric-point state, half way through the noise that the next step will use. */
  abstract void toSymmetricPoint(Amplitudes normals, Amplitudes rest, Amplitudes target);
}
