package spgpe.run;

import spgpe.integrate.Integrator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;

/**
 * A plan of a single trajectory: trajectory {@code index} of the ensemble with the same model, scheme
 * and seed, with its final state. Every method returns a changed copy; plans are immutable and
 * thread-safe.
 */
public final class Trajectory {
  private final Ensemble plan;

  private Trajectory(Ensemble plan) {
    this.plan = plan;
  }

  /**
   * Begins a plan of trajectory 0.
   *
   * @param model the model
   * @return the plan
   */
  public static Trajectory of(Model model) {
    return new Trajectory(Ensemble.of(model).trajectories(1));
  }

  /**
   * Sets the initial state.
   *
   * @param state initial state
   * @return changed copy
   */
  public Trajectory startingFrom(InitialState state) {
    return new Trajectory(plan.startingFrom(state));
  }

  /**
   * Sets the scheme.
   *
   * @param integrator scheme with its step
   * @return changed copy
   */
  public Trajectory integratedBy(Integrator integrator) {
    return new Trajectory(plan.integratedBy(integrator));
  }

  /**
   * Sets the random streams.
   *
   * @param seed seed of the ensemble
   * @param index index of the trajectory in the ensemble, at least 0
   * @return changed copy
   * @throws IllegalArgumentException if the index is out of range
   */
  public Trajectory seed(long seed, long index) {
    return new Trajectory(plan.seed(seed).trajectories(index, 1));
  }

  /**
   * Sets the end of the run; it starts at time 0.
   *
   * @param time end time, finite and positive; a whole number of steps
   * @return changed copy
   * @throws IllegalArgumentException if the time is out of range
   */
  public Trajectory until(double time) {
    return new Trajectory(plan.until(time));
  }

  /**
   * Adds a rule that ends the trajectory early.
   *
   * @param rule stop rule
   * @return changed copy
   */
  public Trajectory stopWhen(StopRule rule) {
    return new Trajectory(plan.stopWhen(rule));
  }

  /**
   * Adds a recording.
   *
   * @param recording what to record; the key to its result
   * @return changed copy
   * @throws IllegalArgumentException if the plan already has it
   */
  public Trajectory record(Recording<?> recording) {
    return new Trajectory(plan.record(recording));
  }

  /**
   * Runs in the calling thread.
   *
   * @return the result
   * @throws IllegalStateException if the plan is not complete
   * @throws IllegalArgumentException if the plan contradicts itself
   * @throws DivergedException if an amplitude became NaN or infinite
   * @throws RunFailedException if something supplied by the user threw
   */
  public Result run() {
    EnsembleRun run = new EnsembleRun(plan);
    EnsembleResult result;
    try {
      result = run.execute(Runnable::run);
    } catch (RunFailedException e) {
      if (e.getCause() instanceof DivergedException diverged) {
        throw diverged;
      }
      throw e;
    }
    Amplitudes state = run.lastState();
    if (state == null) {
      throw new IllegalStateException("the trajectory was cancelled before its end");
    }
    return new Result(result, state);
  }

  /** Result of a single trajectory. */
  public static final class Result {
    private final EnsembleResult result;
    private final Amplitudes finalState;

    Result(EnsembleResult result, Amplitudes finalState) {
      this.result = result;
      this.finalState = finalState;
    }

    /**
     * How the trajectory ended.
     *
     * @return its end
     */
    public TrajectoryEnd end() {
      return result.ends().get(0);
    }

    /**
     * The state at the end.
     *
     * @return copy of the state, one lane
     */
    public Amplitudes finalState() {
      return finalState.copy();
    }

    /**
     * What a recording has kept.
     *
     * @param recording one of the plan's recordings
     * @param <A> kind of accumulator
     * @return the accumulator
     * @throws IllegalArgumentException if the plan had no such recording
     */
    public <A extends Accumulator<A>> A get(Recording<A> recording) {
      return result.get(recording);
    }
  }
}
