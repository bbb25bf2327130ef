package spgpe.projector;

import spgpe.internal.check.Check;

/** Blocks such as a transform may hand to a local term, for contract tests. */
public final class PointBlocks {
  private PointBlocks() {}

  /**
   * A block of neighbouring points of a field.
   *
   * @param psi the field
   * @param result what the operation adds to
   * @param firstPoint first point of the block
   * @param endPoint one past its last point
   * @return the block
   */
  public static PointBlock range(Field psi, Field result, int firstPoint, int endPoint) {
    Check.inRange(endPoint, firstPoint, psi.grid().points(), "endPoint");
    int lanes = psi.lanes();
    return new PointBlock(psi, result, firstPoint * lanes, endPoint * lanes, firstPoint, 1);
  }

  /**
   * A block of every other point. The fields hold the even points in their first half and the odd
   * points in their second half.
   *
   * @param psi reordered field on a grid with an even number of points
   * @param result reordered result
   * @param odd which half
   * @return the block
   */
  public static PointBlock everyOther(Field psi, Field result, boolean odd) {
    int half = psi.grid().points() / 2 * psi.lanes();
    int begin = odd ? half : 0;
    return new PointBlock(psi, result, begin, begin + half, odd ? 1 : 0, 2);
  }
}
