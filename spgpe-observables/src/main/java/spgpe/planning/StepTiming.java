package spgpe.planning;

import java.util.function.LongSupplier;
import spgpe.internal.check.Check;
import spgpe.run.Ensemble;
import spgpe.run.InitialState;

/**
 * Speed of this machine for one plan: seconds for one step of one trajectory on one thread.
 *
 * <p>Nothing is timed unless {@link #measure} is called.
 *
 * @param secondsPerStep seconds per trajectory and step, greater than zero
 */
public record StepTiming(double secondsPerStep) {
  private static final int STEPS = 500;
  private static final int TRAJECTORIES = 4;
  private static final long ENOUGH_NANOSECONDS = 3_000_000_000L;
  private static final int MOST_REPEATS = 2000;

  /**
   * Checks the value.
   *
   * @param secondsPerStep seconds per trajectory and step, greater than zero
   * @throws IllegalArgumentException if the value is not finite and positive
   */
  public StepTiming {
    Check.positive(secondsPerStep, "secondsPerStep");
  }

  /**
   * Runs 4 short trajectories of the plan in the calling thread again and again for three seconds,
   * in which the virtual machine warms up, and takes the fastest. Other load on the machine makes the
   * result too long.
   *
   * @param plan the plan
   * @return the timing
   */
  public static StepTiming measure(ShotPlan plan) {
    return measure(plan, System::nanoTime);
  }

  static StepTiming measure(ShotPlan plan, LongSupplier nanoseconds) {
    Check.notNull(plan, "plan");
    double until = STEPS * plan.settings().step();
    Ensemble ensemble =
        Ensemble.of(plan.model())
            .startingFrom(InitialState.uniform(1, -1))
            .integratedBy(plan.settings().integrator())
            .trajectories(TRAJECTORIES)
            .seed(1)
            .until(until);
    long best = Long.MAX_VALUE;
    long spent = 0;
    for (int i = 0; i < MOST_REPEATS && spent < ENOUGH_NANOSECONDS; i++) {
      long begin = nanoseconds.getAsLong();
      ensemble.run();
      long taken = nanoseconds.getAsLong() - begin;
      best = Math.min(best, taken);
      spent += taken;
    }
    return new StepTiming(1e-9 * best / STEPS / TRAJECTORIES);
  }
}
