package spgpe.run;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import spgpe.internal.check.Check;

/**
 * Result of an ensemble: how each trajectory ended and what was recorded, summed in the order of the
 * trajectory indices. Thread-safe as long as the accumulators are only read.
 */
public final class EnsembleResult {
  private final long requested;
  private final TreeMap<Long, TrajectoryEnd> ends;
  private final List<Channel<?>> channels;

  EnsembleResult(long requested, TreeMap<Long, TrajectoryEnd> ends, List<Channel<?>> channels) {
    this.requested = requested;
    this.ends = ends;
    this.channels = channels;
  }

  /**
   * How the trajectories ended, by increasing index.
   *
   * @return unmodifiable list
   */
  public List<TrajectoryEnd> ends() {
    return Collections.unmodifiableList(new ArrayList<>(ends.values()));
  }

  /**
   * Whether every requested trajectory has ended; false after a cancellation or failure.
   *
   * @return true if nothing is missing
   */
  public boolean isComplete() {
    return ends.size() == requested;
  }

  /**
   * What a recording has summed up.
   *
   * @param recording one of the ensemble's recordings
   * @param <A> kind of accumulator
   * @return the accumulator; an empty one if no trajectory has ended
   * @throws IllegalArgumentException if the ensemble had no such recording
   */
  public <A extends Accumulator<A>> A get(Recording<A> recording) {
    return channelOf(recording).sum();
  }

  /**
   * Times at which a recording was due.
   *
   * @param recording one of the ensemble's recordings
   * @return new array of times
   * @throws IllegalArgumentException if the ensemble had no such recording
   */
  public double[] times(Recording<?> recording) {
    for (Channel<?> channel : channels) {
      if (channel.recording() == recording) {
        return channel.times().clone();
      }
    }
    throw noSuch(recording);
  }

  /**
   * Joins the results of two parts of one ensemble that were run apart, with the same recordings.
   *
   * @param other result of other trajectory indices of the same plan
   * @return joined result, the same bits as if run together
   * @throws IllegalArgumentException if a trajectory is in both, or if the recordings or their times
   *     differ
   */
  public EnsembleResult mergedWith(EnsembleResult other) {
    Check.notNull(other, "other");
    Check.argument(
        channels.size() == other.channels.size(),
        "results must have the same recordings: here=%s, other=%s",
        channels.size(), other.channels.size());
    TreeMap<Long, TrajectoryEnd> allEnds = new TreeMap<>(ends);
    for (Map.Entry<Long, TrajectoryEnd> entry : other.ends.entrySet()) {
      TrajectoryEnd twice = allEnds.put(entry.getKey(), entry.getValue());
      Check.argument(
          twice == null, "a trajectory must not be in both results: trajectory=%s", entry.getKey());
    }
    List<Channel<?>> joined = new ArrayList<>();
    for (Channel<?> channel : channels) {
      joined.add(joined(channel, other));
    }
    return new EnsembleResult(requested + other.requested, allEnds, joined);
  }

  private static <A extends Accumulator<A>> Channel<A> joined(
      Channel<A> channel, EnsembleResult other) {
    return channel.mergedWith(other.channelOf(channel.recording()));
  }

  @SuppressWarnings("unchecked") // a channel's type is that of its recording
  private <A extends Accumulator<A>> Channel<A> channelOf(Recording<A> recording) {
    for (Channel<?> channel : channels) {
      if (channel.recording() == recording) {
        return (Channel<A>) channel;
      }
    }
    throw noSuch(recording);
  }

  private static IllegalArgumentException noSuch(Recording<?> recording) {
    return new IllegalArgumentException("the ensemble had no such recording: " + recording);
  }
}
