package spgpe.observables.bubble;

/**
 * How far a bubble extends in one frame. Immutable and thread-safe.
 *
 * @param size its length on a ring, its area on a plane: the points it covers times the length or
 *     area of one
 * @param radius half of its length on a ring, sqrt(area/pi) on a plane
 * @param centre circular mean of its points on each axis; along an axis around which it wraps,
 *     where no such mean may exist, the coordinate of its highest point
 * @param wrapsX whether it closes on itself around x: a band. A disc across the seam does not
 * @param wrapsY whether it closes on itself around y
 */
public record Extent(double size, double radius, Site centre, boolean wrapsX, boolean wrapsY) {
  /**
   * Whether it is closed on itself around an axis, so that its radius is no distance any more.
   *
   * @return true if it wraps around x or y
   */
  public boolean wraps() {
    return wrapsX || wrapsY;
  }
}
