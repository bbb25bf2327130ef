package spgpe.run;

import java.util.function.Predicate;
import spgpe.internal.check.Check;

/**
 * Ends a trajectory before the end of the run. Called by several threads at once for different
 * trajectories: keep no state.
 */
public interface StopRule {
  /**
   * Name given as the reason of the end.
   *
   * @return a few words
   */
  String name();

  /**
   * When the rule is looked at.
   *
   * @return the schedule
   */
  Schedule schedule();

  /**
   * Decides.
   *
   * @param snapshot one trajectory at one time
   * @return true to end it now
   */
  boolean shouldStop(Snapshot snapshot);

  /**
   * A rule from a condition.
   *
   * @param name name given as the reason of the end
   * @param schedule when the rule is looked at
   * @param condition true to end the trajectory
   * @return the rule
   */
  static StopRule when(String name, Schedule schedule, Predicate<Snapshot> condition) {
    Check.notNull(name, "name");
    Check.notNull(schedule, "schedule");
    Check.notNull(condition, "condition");
    return new StopRule() {
      @Override
      public String name() {
        return name;
      }

      @Override
      public Schedule schedule() {
        return schedule;
      }

      @Override
      public boolean shouldStop(Snapshot snapshot) {
        return condition.test(snapshot);
      }
    };
  }
}
