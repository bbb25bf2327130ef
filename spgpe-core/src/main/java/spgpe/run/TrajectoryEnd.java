package spgpe.run;

import spgpe.internal.check.Check;

/**
 * How a trajectory ended. Immutable and thread-safe.
 *
 * @param trajectory index of the trajectory
 * @param time time at which it ended (for a diverged one: when that was found)
 * @param reason why
 * @param detail name of the stop rule, or what diverged; empty at the end of the run
 */
public record TrajectoryEnd(long trajectory, double time, Reason reason, String detail) {
  /**
   * Checks the values.
   *
   * @param trajectory index of the trajectory
   * @param time time at which it ended
   * @param reason why
   * @param detail name of the stop rule, or what diverged
   * @throws IllegalArgumentException if a number is negative or not finite, or something is null
   */
  public TrajectoryEnd {
    Check.argument(trajectory >= 0, "trajectory index must be >= 0: trajectory=%s", trajectory);
    Check.notNegative(time, "time");
    Check.notNull(reason, "reason");
    Check.notNull(detail, "detail");
  }

  /** Why a trajectory ended. */
  public enum Reason {
    /** The end time was reached. */
    END_OF_RUN,
    /** A stop rule applied. */
    STOPPED,
    /** An amplitude became NaN or infinite. */
    DIVERGED
  }

  /**
   * Whether a stop rule applied.
   *
   * @return true for {@link Reason#STOPPED}
   */
  public boolean isStopped() {
    return reason == Reason.STOPPED;
  }
}
