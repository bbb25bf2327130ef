package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.projector.Amplitudes;

/**
 * Everything a {@link Stepper} carries from step to step: with it, the same scheme, model and
 * random streams, a run goes on bit for bit as if it had not been interrupted. Noise needs no state
 * of its own, for it is a function of the step number. Immutable and thread-safe.
 */
public final class StepperState {
  private final Amplitudes inner;
  private final long stepNumber;
  private final boolean atSymmetricPoint;
  private final int refinement;

  private StepperState(
      Amplitudes inner, long stepNumber, boolean atSymmetricPoint, int refinement) {
    this.inner = inner;
    this.stepNumber = stepNumber;
    this.atSymmetricPoint = atSymmetricPoint;
    this.refinement = refinement;
  }

  /**
   * Puts a saved state together again.
   *
   * @param inner amplitudes as {@link #inner} gave them, all lanes; copied
   * @param stepNumber number of the next step, at least 0
   * @param atSymmetricPoint whether the amplitudes belong to the symmetric point of the scheme
   * @param refinement what an adaptive scheme remembers, 0 to 62; 0 for others
   * @return the state
   * @throws IllegalArgumentException if a number is out of range
   */
  public static StepperState of(
      Amplitudes inner, long stepNumber, boolean atSymmetricPoint, int refinement) {
    Check.notNull(inner, "amplitudes");
    Check.argument(stepNumber >= 0, "step number must be >= 0: stepNumber=%s", stepNumber);
    Check.inRange(refinement, 0, 62, "refinement");
    return new StepperState(inner.copy(), stepNumber, atSymmetricPoint, refinement);
  }

  /**
   * The amplitudes inside the stepper; not those at the symmetric point, see {@link
   * Stepper#observe}.
   *
   * @return a copy, all lanes
   */
  public Amplitudes inner() {
    return inner.copy();
  }

  /**
   * Number of the next step.
   *
   * @return steps since time 0
   */
  public long stepNumber() {
    return stepNumber;
  }

  /**
   * Whether the amplitudes belong to the symmetric point of the scheme.
   *
   * @return true before the first step
   */
  public boolean isAtSymmetricPoint() {
    return atSymmetricPoint;
  }

  /**
   * What an adaptive scheme remembers of its last step.
   *
   * @return halvings of the step; 0 for schemes of fixed step
   */
  public int refinement() {
    return refinement;
  }
}
