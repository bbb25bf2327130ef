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
    return new Recording<>(
        Check.notNull(observable, "observable"),
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
    return factory.create(times, size);
  }

  @Override
  public String toString() {
    return "Recording of " + observable.name() + " " + schedule;
  }
}
