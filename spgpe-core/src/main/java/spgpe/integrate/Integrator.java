package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.reservoir.NoiseGenerator;

/**
 * A numerical scheme with its settings: an immutable recipe that makes {@link Stepper}s.
 *
 * <p>Implementations are immutable and thread-safe. For an own scheme see {@link KickedStepper}.
 */
public interface Integrator {
  /**
   * Time step.
   *
   * @return dt
   */
  double step();

  /**
   * The same scheme with another step.
   *
   * @param newStep time step, finite and positive
   * @return changed copy
   * @throws IllegalArgumentException if the step is out of range
   */
  Integrator withStep(double newStep);

  /**
   * Orders, cost and demands.
   *
   * @return the facts
   */
  SchemeFacts facts();

  /**
   * Largest step at which the scheme is stable for a model.
   *
   * @param model the model
   * @return upper bound of dt; infinite if there is none
   */
  double largestStableStep(Model model);

  /**
   * Refuses a step that is not below {@link #largestStableStep}; for {@link #bind}.
   *
   * @param model the model
   * @throws IllegalArgumentException if the step is too long; the message gives step and limit
   */
  default void requireStableStep(Model model) {
    double limit = largestStableStep(Check.notNull(model, "model"));
    Check.argument(
        step() < limit,
        "time step must stay below the largest stable one for this model: step=%s, limit=%s; use a"
            + " smaller step or a lower cutoff", step(), limit);
  }

  /**
   * Makes a stepper with its own scratch memory, for one thread.
   *
   * @param model the model
   * @param noise generator of the same region, components and lanes; every lane assigned before the
   *     first step
   * @param lanes realisations advanced together
   * @return the stepper
   * @throws IllegalArgumentException if the step is not below {@link #largestStableStep}, or if the
   *     scheme does not fit the model; the message says why
   */
  Stepper bind(Model model, NoiseGenerator noise, int lanes);
}
