package spgpe.integrate;

import spgpe.projector.Amplitudes;

/**
 * Advances a state in time. Owns its state and scratch memory: one thread at a time.
 *
 * <p>Splitting schemes have a point in each step at which the state follows the equilibrium law
 * best (the symmetric point, after half of the noise). {@link #start} takes the state at that point
 * and {@link #observe} gives it there; what is carried from step to step inside need not be the
 * same. Observing changes nothing, so a trajectory does not depend on when it was looked at.
 */
public interface Stepper {
  /**
   * Takes over a state; time becomes firstStep times dt.
   *
   * @param state state at the symmetric point; copied
   * @param firstStep number of the first step, at least 0
   * @throws IllegalArgumentException if the shape does not fit
   */
  void start(Amplitudes state, long firstStep);

  /**
   * Advances by one step. Allocates nothing.
   *
   * @throws IllegalStateException if not started
   */
  void advance();

  /**
   * Writes the state at the symmetric point.
   *
   * @param target overwritten
   * @throws IllegalStateException if not started
   * @throws IllegalArgumentException if the shape does not fit
   */
  void observe(Amplitudes target);

  /**
   * Number of the next step.
   *
   * @return steps since time 0
   */
  long stepNumber();

  /**
   * Current time.
   *
   * @return stepNumber times dt
   */
  double time();

  /**
   * Saves what the stepper carries from step to step.
   *
   * @return the state, independent of this stepper
   * @throws IllegalStateException if not started
   */
  StepperState save();

  /**
   * Goes on from a saved state, exactly: nothing tells the run from one without interruption.
   *
   * @param saved state saved by a stepper of the same scheme, model and lanes
   * @throws IllegalArgumentException if the shape does not fit
   */
  void restore(StepperState saved);
}
