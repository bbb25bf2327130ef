package spgpe.observables.bubble;

/**
 * Something that happened to a bubble. Immutable and thread-safe.
 *
 * @param trajectory index of the trajectory
 * @param time time of the first frame that shows it
 * @param kind what happened
 * @param bubble index of the bubble in its history
 * @param other the other bubble: that into which it merged or from which it split; -1 otherwise
 * @param site position
 */
public record BubbleEvent(
    long trajectory, double time, Kind kind, int bubble, int other, Site site) {
  /** What can happen. */
  public enum Kind {
    /** There in the first frame: it was born before. */
    PRESENT_AT_START,
    /** Born out of the metastable state. */
    NUCLEATED,
    /** Broken off another bubble. */
    SPLIT,
    /** Joined with an older bubble, under whose index it goes on. */
    MERGED,
    /** Vanished. */
    COLLAPSED,
    /** Covers the whole ring or plane at the grow level. */
    FILLED
  }
}
