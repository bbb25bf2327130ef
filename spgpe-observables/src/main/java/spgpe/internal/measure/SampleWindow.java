package spgpe.internal.measure;

import java.util.ArrayDeque;
import java.util.Deque;

/**
 * Passes on the samples of a trajectory that lie in a window of time: not before the start, and
 * more than a margin before the end of the trajectory. Samples wait until the margin is over.
 */
public final class SampleWindow {
  /** Receives the samples that count, in time order. */
  @FunctionalInterface
  public interface Sink {
    /**
     * Takes a sample.
     *
     * @param sample index of the scheduled time
     * @param values the numbers; reused, copy what is kept
     */
    void take(int sample, double[] values);
  }

  private static final double TIME_TOLERANCE = 1e-9;

  @SuppressWarnings("ArrayRecordComponent") // compared by nobody
  private record Waiting(int sample, double[] values) {}

  private final double[] times;
  private final double start;
  private final double margin;
  private final Deque<Waiting> waiting = new ArrayDeque<>();
  private final Deque<double[]> spare = new ArrayDeque<>();

  /**
   * Makes a window.
   *
   * @param times scheduled times
   * @param start first time that counts
   * @param margin time before the end that does not count; 0 takes everything
   */
  public SampleWindow(double[] times, double start, double margin) {
    this.times = times;
    this.start = start;
    this.margin = margin;
  }

  /**
   * Takes a sample and passes on those that are old enough.
   *
   * @param sample index of the scheduled time
   * @param values the numbers; copied if they must wait
   * @param sink receiver
   */
  public void add(int sample, double[] values, Sink sink) {
    if (times[sample] < start - TIME_TOLERANCE * Math.max(1, start)) {
      return;
    }
    if (margin == 0) {
      sink.take(sample, values);
      return;
    }
    release(times[sample], sink);
    double[] copy = spare.isEmpty() ? new double[values.length] : spare.pop();
    System.arraycopy(values, 0, copy, 0, values.length);
    waiting.addLast(new Waiting(sample, copy));
  }

  /**
   * Passes on what is left of the window and drops the rest.
   *
   * @param end time at which the trajectory ended
   * @param sink receiver
   */
  public void finish(double end, Sink sink) {
    release(end, sink);
    waiting.clear();
    spare.clear();
  }

  private void release(double time, Sink sink) {
    while (!waiting.isEmpty()) {
      Waiting oldest = waiting.getFirst();
      double age = time - times[oldest.sample()];
      if (age <= margin + TIME_TOLERANCE * Math.max(1, time)) {
        return;
      }
      waiting.removeFirst();
      sink.take(oldest.sample(), oldest.values());
      spare.push(oldest.values());
    }
  }
}
