package spgpe.observables;

import spgpe.internal.check.Check;
import spgpe.run.Observable;
import spgpe.run.Schedule;
import spgpe.run.Snapshot;
import spgpe.run.StopRule;

/**
 * Ends a trajectory when an observable of a single number is seen beyond a threshold for the first
 * time. The end time of the trajectory is then its first-passage time, to the resolution of the
 * schedule: a crossing that comes back between two looks is not seen.
 *
 * <p>The comparison is strict: a value equal to the threshold does not stop. A trajectory that
 * starts beyond the threshold ends at its first look. Immutable and thread-safe.
 */
public final class FirstPassage implements StopRule {
  private final Observable observable;
  private final double threshold;
  private final boolean upward;
  private final Schedule schedule;

  private FirstPassage(
      Observable observable, double threshold, boolean upward, Schedule schedule) {
    this.observable = Check.notNull(observable, "observable");
    this.threshold = Check.finite(threshold, "threshold");
    this.upward = upward;
    this.schedule = Check.notNull(schedule, "schedule");
  }

  /**
   * Stops when the value exceeds the threshold.
   *
   * @param observable observable of a single number
   * @param threshold threshold, finite, unit of the observable
   * @param schedule when it is looked at
   * @return the rule
   * @throws IllegalArgumentException if the threshold is not finite
   */
  public static FirstPassage upward(Observable observable, double threshold, Schedule schedule) {
    return new FirstPassage(observable, threshold, true, schedule);
  }

  /**
   * Stops when the value falls below the threshold.
   *
   * @param observable observable of a single number
   * @param threshold threshold, finite, unit of the observable
   * @param schedule when it is looked at
   * @return the rule
   * @throws IllegalArgumentException if the threshold is not finite
   */
  public static FirstPassage downward(Observable observable, double threshold, Schedule schedule) {
    return new FirstPassage(observable, threshold, false, schedule);
  }

  /**
   * What is looked at.
   *
   * @return the observable
   */
  public Observable observable() {
    return observable;
  }

  /**
   * The threshold.
   *
   * @return threshold, unit of the observable
   */
  public double threshold() {
    return threshold;
  }

  @Override
  public String name() {
    return observable.name() + (upward ? " > " : " < ") + threshold;
  }

  @Override
  public Schedule schedule() {
    return schedule;
  }

  /**
   * Decides.
   *
   * @throws IllegalArgumentException if the observable measures more than one number, or does not
   *     fit the model
   * @throws IllegalStateException if it measures NaN, which is on neither side of the threshold
   */
  @Override
  public boolean shouldStop(Snapshot snapshot) {
    double[] value =
        snapshot.scratch(
            this, double[].class,
            model -> {
              int size = observable.size(model);
              Check.argument(
                  size == 1,
                  "a first passage needs an observable of a single number: observable=\"%s\","
                      + " numbers=%s", observable.name(), size);
              return new double[1];
            });
    observable.measure(snapshot, value);
    Check.state(
        !Double.isNaN(value[0]),
        "the observable of a first passage must not be NaN: observable=\"%s\", time=%s",
        observable.name(), snapshot.time());
    return upward ? value[0] > threshold : value[0] < threshold;
  }

  @Override
  public String toString() {
    return "FirstPassage " + name() + " looked at " + schedule;
  }
}
