package spgpe.run;

import java.util.Arrays;
import spgpe.internal.check.Check;

/**
 * Times at which something is done: regular or listed. Every time must be a whole number of time
 * steps, so that nothing is interpolated. Immutable and thread-safe.
 */
public final class Schedule {
  private static final double STEP_TOLERANCE = 1e-6;
  private static final int MAX_TIMES = 50_000_000;

  private final double first;
  private final double interval;
  private final double[] listed;

  private Schedule(double first, double interval, double[] listed) {
    this.first = first;
    this.interval = interval;
    this.listed = listed;
  }

  /**
   * At times 0, interval, 2 interval, and so on to the end of the run.
   *
   * @param interval distance in time, finite and positive
   * @return the schedule
   * @throws IllegalArgumentException if the interval is out of range
   */
  public static Schedule every(double interval) {
    return new Schedule(0, Check.positive(interval, "interval (time)"), new double[0]);
  }

  /**
   * At listed times; those beyond the end of the run do not occur.
   *
   * @param times strictly increasing, finite, not negative
   * @return the schedule
   * @throws IllegalArgumentException if the times are out of range or order, or none is given
   */
  public static Schedule at(double... times) {
    Check.notNull(times, "times");
    Check.argument(times.length > 0, "at least one time must be given");
    for (int i = 0; i < times.length; i++) {
      Check.notNegative(times[i], "scheduled time");
      Check.argument(
          i == 0 || times[i] > times[i - 1],
          "scheduled times must increase: times[%s]=%s, times[%s]=%s",
          i - 1, times[Math.max(0, i - 1)], i, times[i]);
    }
    return new Schedule(0, 0, times.clone());
  }

  /**
   * The same regular schedule beginning later.
   *
   * @param start first time, finite and not negative
   * @return changed copy
   * @throws IllegalArgumentException if the start is out of range
   * @throws IllegalStateException if the schedule is a list of times
   */
  public Schedule startingAt(double start) {
    Check.state(listed.length == 0, "a list of times has its own start");
    return new Schedule(Check.notNegative(start, "start (time)"), interval, listed);
  }

  /** Step numbers up to and including the last step. */
  long[] steps(double dt, long lastStep) {
    if (listed.length > 0) {
      long[] steps = new long[listed.length];
      int count = 0;
      for (double time : listed) {
        long step = wholeSteps(time, dt, "scheduled time");
        Check.argument(
            count == 0 || step > steps[count - 1],
            "scheduled times must be different time steps: time=%s, time step=%s", time, dt);
        if (step <= lastStep) {
          steps[count++] = step;
        }
      }
      return Arrays.copyOf(steps, count);
    }
    long start = first == 0 ? 0 : wholeSteps(first, dt, "start of the schedule");
    long stride = wholeSteps(interval, dt, "interval of the schedule");
    long count = start > lastStep ? 0 : (lastStep - start) / stride + 1;
    Check.argument(
        count <= MAX_TIMES,
        "a schedule must not hold more than %s times: count=%s; use a longer interval",
        MAX_TIMES, count);
    long[] steps = new long[(int) count];
    for (int i = 0; i < steps.length; i++) {
      steps[i] = start + i * stride;
    }
    return steps;
  }

  static long wholeSteps(double time, double dt, String name) {
    double ratio = time / dt;
    double steps = Math.rint(ratio);
    Check.argument(
        steps < 1L << 47, "%s must not exceed 2^47 steps: time=%s, time step=%s", name, time, dt);
    Check.argument(
        Math.abs(ratio - steps) <= STEP_TOLERANCE && (steps >= 1 || time == 0),
        "%s must be a whole number of time steps: time=%s, time step=%s", name, time, dt);
    return (long) steps;
  }

  @Override
  public String toString() {
    return listed.length > 0
        ? "at " + Arrays.toString(listed)
        : "every " + interval + (first == 0 ? "" : " from " + first);
  }
}
