package spgpe.projector;

/** An operation that works point by point on a block of positions. */
@FunctionalInterface
public interface LocalOperation {
  /**
   * Adds f(psi) to the result arrays of the block; must not change psi.
   *
   * @param block the points at hand; valid only during the call
   */
  void addTo(PointBlock block);
}
