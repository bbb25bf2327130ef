package spgpe.observables.bubble;

import java.util.List;
import java.util.function.Predicate;
import spgpe.internal.check.Check;

/**
 * The bubbles of one trajectory and what happened to them. Immutable and thread-safe.
 *
 * @param trajectory index of the trajectory
 * @param endTime time at which it ended
 * @param settings settings of the detector, derived or given
 * @param frames number of frames looked at
 * @param bubbles all bubbles in the order of birth, accepted or not
 * @param events all events in the order of time
 */
public record BubbleHistory(
    long trajectory,
    double endTime,
    BubbleSettings settings,
    int frames,
    List<Bubble> bubbles,
    List<BubbleEvent> events) {
  /**
   * Takes copies of the lists.
   *
   * @param trajectory index of the trajectory
   * @param endTime time at which it ended
   * @param settings settings of the detector, derived or given
   * @param frames number of frames looked at
   * @param bubbles all bubbles in the order of birth, accepted or not
   * @param events all events in the order of time
   */
  public BubbleHistory {
    bubbles = List.copyOf(Check.notNull(bubbles, "bubbles"));
    events = List.copyOf(Check.notNull(events, "events"));
  }

  /**
   * The accepted bubbles born out of the metastable state.
   *
   * @return unmodifiable list in the order of birth
   */
  public List<Bubble> nucleations() {
    return bubbles.stream().filter(Bubble::isNucleation).toList();
  }

  /**
   * Events that fulfil a condition, for example {@code e -> e.kind() == Kind.MERGED}.
   *
   * @param condition condition on an event
   * @return unmodifiable list in the order of time
   */
  public List<BubbleEvent> events(Predicate<BubbleEvent> condition) {
    Check.notNull(condition, "condition");
    return events.stream().filter(condition).toList();
  }

  /**
   * Births in each frame: new bubbles that did not split off another one.
   *
   * @param times times of the frames
   * @return number of births at each of the times
   */
  public int[] birthsAt(double[] times) {
    Check.notNull(times, "times");
    int[] births = new int[times.length];
    for (Bubble bubble : bubbles) {
      int frame = java.util.Arrays.binarySearch(times, bubble.birthTime());
      if (frame >= 0 && bubble.origin() == BubbleEvent.Kind.NUCLEATED) {
        births[frame]++;
      }
    }
    return births;
  }
}
