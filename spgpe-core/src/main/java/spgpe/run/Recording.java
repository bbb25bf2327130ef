package spgpe.run;

import spgpe.internal.check.Check;

/**
 * What to measure, when, and how to sum it up; also the key under which the result is found.
 * Immutable and thread-safe. Two recordings are the same only if they are the same object.
 *
 * @param <A> kind of accumulator
 */
public final class Recording<A extends Accumulator<A>> {
  private final Observable observable;
  private final Schedule schedule;
  private final Accumulator.Factory<A> factory;

  private Recording(
      Observable observable, Schedule schedule, Accumulator.Factory<A> factory) {
    this.observable = observable;
    this.schedule = schedule;
    this.factory = factory;
  }

  /**
   * Makes a recording.
   *
   * @param observable what to measure
   * @param schedule when
   * @param factory makes the accumulator, for example {@code TimeMoments::new}
   * @param <A> kind of accumulator
   * @return the recording
   */
  public static <A extends Accumulator<A>> Recording<A> of(
      Observable observable, Schedule schedule, Accumulator.Factory<A> factory) {
    Check.notNull(observable, "observable");
    Check.notNull(observable.name(), "name of the observable");
    return new Recording<>(
        observable,
        Check.notNull(schedule, "schedule"),
        Check.notNull(factory, "factory"));
  }

  /**
   * What is measured.
   *
   * @return the observable
   */
  public Observable observable() {
    return observable;
  }

  /**
   * When it is measured.
   *
   * @return the schedule
   */
  public Schedule schedule() {
    return schedule;
  }

  A create(double[] times, int size) {
    return Check.notNull(factory.create(times, size), "accumulator of the factory");
  }

  @Override
  public String toString() {
    return "Recording of " + observable.name() + " " + schedule;
  }
}
