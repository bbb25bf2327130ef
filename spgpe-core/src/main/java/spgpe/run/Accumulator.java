package spgpe.run;

/**
 * Sums up the samples of one trajectory, then of many.
 *
 * <p>The runner makes one accumulator for each trajectory, adds its samples in time order, tells it
 * how the trajectory ended, and merges neighbouring accumulators in a tree that depends on the
 * trajectory indices only. Results are therefore the same bits for every number of threads and lanes
 * and every split of the indices.
 *
 * @param <A> the implementing class
 */
public interface Accumulator<A extends Accumulator<A>> {
  /**
   * Adds a sample.
   *
   * @param sample index of the scheduled time, from 0
   * @param values what the observable measured; the array is reused, copy what is kept
   */
  void add(int sample, double[] values);

  /**
   * Called once when the trajectory has ended, before any merge.
   *
   * @param end when and why it ended
   */
  default void finish(TrajectoryEnd end) {}

  /**
   * The sum of this and of trajectories with higher indices. Neither is changed.
   *
   * @param later accumulator of the neighbouring higher indices
   * @return new accumulator
   */
  A mergedWith(A later);

  /**
   * Makes the accumulator of one trajectory.
   *
   * @param <A> kind of accumulator
   */
  @FunctionalInterface
  interface Factory<A extends Accumulator<A>> {
    /**
     * Makes an empty accumulator.
     *
     * @param times all scheduled times of the run; not to be changed
     * @param size numbers in each sample
     * @return the accumulator
     */
    A create(double[] times, int size);
  }
}
