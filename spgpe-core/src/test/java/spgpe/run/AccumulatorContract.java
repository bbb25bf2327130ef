package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/**
 * What every accumulator must do, so that ensembles give the same bits for any number of threads and
 * any split. Inherit, supply factory and contents, and run with JUnit. Nothing is left to chance.
 *
 * @param <A> the accumulator
 */
public abstract class AccumulatorContract<A extends Accumulator<A>> {
  /**
   * Makes the accumulator under test.
   *
   * @return the factory
   */
  protected abstract Accumulator.Factory<A> factory();

  /**
   * All that the accumulator holds, in a form with {@code equals}: numbers as {@link Double}, which
   * compares bits.
   *
   * @param accumulator an accumulator
   * @return its contents
   */
  protected abstract List<?> contents(A accumulator);

  /**
   * Numbers in each sample.
   *
   * @return size, at least 1
   */
  protected int size() {
    return 2;
  }

  /**
   * The scheduled times.
   *
   * @return new array, rising
   */
  protected double[] times() {
    return new double[] {0, 0.5, 1.5, 2};
  }

  /**
   * Turns a drawn number into one that the accumulator takes.
   *
   * @param drawn any number up to 1e4 in size
   * @return number of a sample
   */
  protected double number(double drawn) {
    return drawn;
  }

  private A empty() {
    return factory().create(times(), size());
  }

  private A ofTrajectory(long trajectory) {
    A accumulator = empty();
    double[] times = times();
    SplittableRandom random = new SplittableRandom(1000 + trajectory);
    boolean stopped = random.nextInt(3) == 0;
    int samples = stopped ? random.nextInt(times.length + 1) : times.length;
    double[] values = new double[size()];
    for (int s = 0; s < samples; s++) {
      for (int i = 0; i < values.length; i++) {
        values[i] = number(random.nextDouble(-1, 1) * Math.pow(10, random.nextInt(-3, 4)));
      }
      accumulator.add(s, values);
      Arrays.fill(values, 1e9); // the array is reused: an accumulator must have copied it
    }
    accumulator.finish(
        new TrajectoryEnd(
            trajectory, times[times.length - 1],
            stopped ? TrajectoryEnd.Reason.STOPPED : TrajectoryEnd.Reason.END_OF_RUN, ""));
    return accumulator;
  }

  private MergeTree<A> tree(List<Long> trajectories) {
    MergeTree<A> tree = new MergeTree<>();
    for (long trajectory : trajectories) {
      tree.add(trajectory, ofTrajectory(trajectory));
    }
    return tree;
  }

  private List<?> sum(MergeTree<A> tree) {
    return contents(tree.sum(empty()));
  }

  private static void shuffle(List<Long> list, SplittableRandom random) {
    for (int i = list.size() - 1; i > 0; i--) {
      int j = random.nextInt(i + 1);
      list.set(i, list.set(j, list.get(i)));
    }
  }

  @Test
  void anySplitMergedInAnyOrderGivesTheSameBits() {
    SplittableRandom random = new SplittableRandom(42);
    for (int count : new int[] {1, 2, 3, 8, 13, 37}) {
      for (long first : new long[] {0, 5, 1000}) {
        List<Long> all = new ArrayList<>();
        for (long t = first; t < first + count; t++) {
          all.add(t);
        }
        List<?> expected = sum(tree(all));
        for (int attempt = 0; attempt < 10; attempt++) {
          shuffle(all, random);
          int parts = 1 + random.nextInt(Math.min(5, count));
          MergeTree<A> joined = new MergeTree<>();
          for (int part = 0; part < parts; part++) {
            List<Long> share =
                all.subList(part * count / parts, (part + 1) * count / parts);
            joined = part % 2 == 0 ? joined.mergedWith(tree(share)) : tree(share).mergedWith(joined);
          }
          assertEquals(expected, sum(joined), count + " trajectories from " + first);
        }
      }
    }
  }

  @Test
  void mergingChangesNeitherPart() {
    A one = ofTrajectory(1);
    A two = ofTrajectory(2);
    List<?> beforeOne = List.copyOf(contents(one));
    List<?> beforeTwo = List.copyOf(contents(two));
    A merged = one.mergedWith(two);
    assertEquals(beforeOne, contents(one));
    assertEquals(beforeTwo, contents(two));
    assertNotEquals(beforeOne, contents(merged));
    A further = merged.mergedWith(ofTrajectory(3));
    assertEquals(contents(one.mergedWith(two)), contents(merged));
    assertNotEquals(contents(merged), contents(further));
  }

  @Test
  void mergingWithNothingChangesNothing() {
    A empty = empty();
    for (long trajectory = 0; trajectory < 20; trajectory++) {
      A one = ofTrajectory(trajectory);
      assertEquals(contents(one), contents(one.mergedWith(empty)));
      assertEquals(contents(one), contents(empty.mergedWith(one)));
    }
  }

  @Test
  void theSameSamplesGiveTheSameContents() {
    assertEquals(contents(ofTrajectory(7)), contents(ofTrajectory(7)));
  }
}
