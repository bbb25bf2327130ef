package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.jspecify.annotations.Nullable;
import spgpe.run.Accumulator;
import spgpe.run.TrajectoryEnd;

/**
 * The bubbles of many trajectories, found while they run. Made by {@link BubbleDetector#census}.
 * Keeps bubbles and walls, not frames.
 */
public final class BubbleCensus implements Accumulator<BubbleCensus> {
  private final double[] times;
  private final @Nullable BubbleTracker tracker;
  private final List<BubbleHistory> histories;

  BubbleCensus(double[] times, BubbleTracker tracker) {
    this(times, tracker, new ArrayList<>());
  }

  private BubbleCensus(
      double[] times, @Nullable BubbleTracker tracker, List<BubbleHistory> histories) {
    this.times = times;
    this.tracker = tracker;
    this.histories = histories;
  }

  @Override
  public void add(int sample, double[] values) {
    if (tracker == null) {
      throw new IllegalStateException("a merged census takes no more samples");
    }
    BubbleDetector.requireFinite(times[sample], values);
    tracker.add(times[sample], values);
  }

  @Override
  public void finish(TrajectoryEnd end) {
    if (tracker != null) {
      histories.add(tracker.finish(end.trajectory(), end.time()));
    }
  }

  @Override
  public BubbleCensus mergedWith(BubbleCensus later) {
    List<BubbleHistory> all = new ArrayList<>(histories);
    all.addAll(later.histories);
    return new BubbleCensus(times, null, all);
  }

  /**
   * One history for each trajectory, in the order of their indices.
   *
   * @return unmodifiable list
   */
  public List<BubbleHistory> histories() {
    return Collections.unmodifiableList(histories);
  }

  /**
   * All nucleations: accepted bubbles born out of the metastable state.
   *
   * @return unmodifiable list in the order of trajectories, then of birth
   */
  public List<Bubble> nucleations() {
    return histories.stream().flatMap(h -> h.nucleations().stream()).toList();
  }
}
