package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.ForceEvaluator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * Clock, state and noise of a stepper, for the built-in schemes and for a user's own.
 *
 * <p>A scheme is written as a loop of "noise, deterministic step, noise" in which the noise after
 * one step and before the next is drawn in one piece. A subclass gives {@link #step}, which takes
 * that piece and then the deterministic step, and {@link #toSymmetricPoint}, which applies the half
 * of the next piece that an observer must see. Schemes without noise need only the deterministic
 * step. Owns scratch memory: one thread at a time.
 */
public abstract class AbstractStepper implements Stepper {
  /** Evaluates the forces of the model. */
  protected final ForceEvaluator forces;

  /** Time step. */
  protected final double dt;

  /** The state, to be advanced by {@link #step}. */
  protected final Amplitudes state;

  private final NoiseGenerator noise;
  private final Amplitudes normals;
  private final Amplitudes rest;
  private long step;
  private boolean started;
  private boolean atSymmetricPoint;

  /** Whether {@link #normals} are already those of the next step, drawn for a look. */
  private boolean isDrawn;

  /**
   * Makes a stepper without state.
   *
   * @param model the model
   * @param noise generator of normals
   * @param lanes number of lanes
   * @param dt time step, finite and positive
   * @throws IllegalArgumentException if a value is out of range
   */
  protected AbstractStepper(Model model, NoiseGenerator noise, int lanes, double dt) {
    this.forces = Check.notNull(model, "model").evaluator(lanes);
    this.noise = Check.notNull(noise, "noise");
    this.dt = Check.positive(dt, "time step");
    this.state = new Amplitudes(model.region(), model.components(), lanes);
    this.normals = new Amplitudes(model.region(), model.components(), lanes);
    this.rest = new Amplitudes(model.region(), model.components(), lanes);
  }

  @Override
  public final void start(Amplitudes initial, long firstStep) {
    Check.argument(firstStep >= 0, "first step must be >= 0: firstStep=%s", firstStep);
    state.set(Check.notNull(initial, "state"));
    step = firstStep;
    started = true;
    atSymmetricPoint = true;
    isDrawn = false;
    setRefinement(0);
  }

  @Override
  public final void advance() {
    if (!started) { // allocates nothing in a step
      throw new IllegalStateException("start(state, firstStep) must be called before advance()");
    }
    if (isNoisy() && !isDrawn) {
      noise.fill(step, atSymmetricPoint ? NoiseUse.START : NoiseUse.WHOLE, normals);
    }
    step(atSymmetricPoint, normals, step * dt);
    atSymmetricPoint = false;
    isDrawn = false;
    step++;
  }

  @Override
  public final void observe(Amplitudes target) {
    if (!started) {
      throw new IllegalStateException("start(state, firstStep) must be called before observe");
    }
    Check.notNull(target, "target");
    if (atSymmetricPoint) {
      target.set(state);
      return;
    }
    if (isNoisy()) {
      if (!isDrawn) {
        noise.fill(step, NoiseUse.WHOLE, normals);
        isDrawn = true;
      }
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

  @Override
  public final StepperState save() {
    Check.state(started, "start(state, firstStep) must be called before save()");
    return StepperState.of(state, step, atSymmetricPoint, refinement());
  }

  @Override
  public final void restore(StepperState saved) {
    Check.notNull(saved, "saved state");
    start(saved.inner(), saved.stepNumber());
    atSymmetricPoint = saved.isAtSymmetricPoint();
    setRefinement(saved.refinement());
  }

  /**
   * Whether the model has noise; if not, no normals are drawn.
   *
   * @return true if any gamma_j T &gt; 0
   */
  protected abstract boolean isNoisy();

  /**
   * Takes the noise before the step and then the deterministic step, changing {@link #state}.
   *
   * @param fromSymmetricPoint true if only half of the noise is to be taken, because the other half
   *     is already in the state
   * @param normals standard normals of this noise (real and imaginary parts of variance 1); read
   *     only
   * @param time time at the begin of the step
   */
  protected abstract void step(boolean fromSymmetricPoint, Amplitudes normals, double time);

  /**
   * Writes the state half way through the noise that the next step will take.
   *
   * @param normals the normals that the next step will get; read only
   * @param rest further normals, to draw the half given the whole
   * @param target overwritten; {@link #state} must not change
   */
  protected abstract void toSymmetricPoint(
      Amplitudes normals, Amplitudes rest, Amplitudes target);

  /** What an adaptive scheme remembers from step to step. */
  int refinement() {
    return 0;
  }

  void setRefinement(int refinement) {}
}
