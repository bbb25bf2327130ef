package spgpe.observables.bubble;

/**
 * One bubble. Immutable and thread-safe.
 *
 * @param trajectory index of the trajectory
 * @param index index of the bubble in its history, in the order of birth
 * @param origin how it came: PRESENT_AT_START, NUCLEATED or SPLIT
 * @param birthTime time of the first frame that shows it
 * @param birthSite circular mean of its points above the seed level in that frame, on
 *     each axis
 * @param endTime time of the first frame without it, or of the last frame if it is still there
 * @param fate how it ended: MERGED or COLLAPSED, or FILLED, or its origin if it is still there
 * @param mergedInto index of the bubble into which it merged; -1 if it did not
 * @param largestWidth largest width at the grow level, a length; on a plane the diameter 2
 *     sqrt(area/pi)
 * @param accepted whether it reached the minimum width and duration of the settings
 * @param walls positions of its walls on a ring; empty on a plane
 * @param radius its radius against time
 */
public record Bubble(
    long trajectory,
    int index,
    BubbleEvent.Kind origin,
    double birthTime,
    Site birthSite,
    double endTime,
    BubbleEvent.Kind fate,
    int mergedInto,
    double largestWidth,
    boolean accepted,
    WallTrack walls,
    RadiusTrack radius) {
  /**
   * How long it was there as a bubble of its own.
   *
   * @return end less birth
   */
  public double duration() {
    return endTime - birthTime;
  }

  /**
   * Whether it was born out of the metastable state and accepted: what counts as a nucleation.
   *
   * @return true if so
   */
  public boolean isNucleation() {
    return accepted && origin == BubbleEvent.Kind.NUCLEATED;
  }
}
