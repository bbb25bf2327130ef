package spgpe.run;

import spgpe.projector.Amplitudes;

/**
 * An amplitude of a trajectory became NaN or infinite. Says when and where, and keeps the last state
 * that was good.
 */
public final class DivergedException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** Index of the trajectory. */
  private final long trajectory;

  /** When it was found. */
  private final double time;

  /** First component that was not finite. */
  private final int component;

  /** Time of the last good state. */
  private final double lastGoodTime;

  private final transient Amplitudes lastGoodState;

  DivergedException(
      long trajectory, double time, int component, double lastGoodTime, Amplitudes lastGoodState) {
    super(describe(trajectory, time, component, lastGoodTime)
        + "; look for a step too large, a term that returns NaN, or an unbounded energy");
    this.trajectory = trajectory;
    this.time = time;
    this.component = component;
    this.lastGoodTime = lastGoodTime;
    this.lastGoodState = lastGoodState;
  }

  static String describe(long trajectory, double time, int component, double lastGoodTime) {
    return "amplitudes not finite: trajectory=" + trajectory + ", component=" + component
        + ", found at time=" + time + ", still good at time=" + lastGoodTime;
  }

  /**
   * Index of the trajectory.
   *
   * @return index from 0
   */
  public long trajectory() {
    return trajectory;
  }

  /**
   * When it was found.
   *
   * @return time
   */
  public double time() {
    return time;
  }

  /**
   * First component with a number that is not finite.
   *
   * @return component index
   */
  public int component() {
    return component;
  }

  /**
   * Time of the last state that was good.
   *
   * @return time
   */
  public double lastGoodTime() {
    return lastGoodTime;
  }

  /**
   * The last state that was good.
   *
   * @return state with one lane
   */
  public Amplitudes lastGoodState() {
    return lastGoodState;
  }
}
