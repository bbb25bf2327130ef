package spgpe.run;

import java.util.Arrays;
import spgpe.internal.check.Check;

/** A recording of a run with its step numbers and the sum over the trajectories so far. */
final class Channel<A extends Accumulator<A>> {
  private static final int MAX_SIZE = 1 << 26;

  private final Recording<A> recording;
  private final long[] steps;
  private final double[] times;
  private final int size;
  private final MergeTree<A> tree;

  private Channel(
      Recording<A> recording, long[] steps, double[] times, int size, MergeTree<A> tree) {
    this.recording = recording;
    this.steps = steps;
    this.times = times;
    this.size = size;
    this.tree = tree;
  }

  static <A extends Accumulator<A>> Channel<A> of(
      Recording<A> recording, double dt, long lastStep, int size) {
    Check.argument(
        size >= 1 && size <= MAX_SIZE,
        "size of an observable must lie in 1..%s: observable=\"%s\", size=%s",
        MAX_SIZE, recording.observable().name(), size);
    long[] steps = recording.schedule().steps(dt, lastStep);
    double[] times = new double[steps.length];
    for (int i = 0; i < times.length; i++) {
      times[i] = steps[i] * dt;
    }
    return new Channel<>(recording, steps, times, size, new MergeTree<>());
  }

  Recording<A> recording() {
    return recording;
  }

  long[] steps() {
    return steps;
  }

  double[] times() {
    return times;
  }

  int size() {
    return size;
  }

  A create() {
    return recording.create(times, size);
  }

  A sum() {
    return tree.sum(create());
  }

  Channel<A> mergedWith(Channel<A> other) {
    Check.argument(
        size == other.size && Arrays.equals(times, other.times),
        "results must be of the same scheduled times and sizes: recording=\"%s\", times=%s and %s,"
            + " size=%s and %s",
        recording, times.length, other.times.length, size, other.size);
    return new Channel<>(recording, steps, times, size, tree.mergedWith(other.tree));
  }

  /** The accumulator of one trajectory on this channel. */
  Probe<A> probe() {
    return new Probe<>(this, create());
  }

  /** One trajectory's accumulator together with its place of delivery. */
  record Probe<A extends Accumulator<A>>(Channel<A> channel, A accumulator) {
    /** Delivers to the tree; the caller holds the lock of the run. */
    void deliver(long trajectory) {
      channel.tree.add(trajectory, accumulator);
    }
  }
}
