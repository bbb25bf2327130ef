package spgpe.projector;

import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;

/**
 * Values at the points of a grid, for every component and lane: position-space scratch.
 *
 * <p>Layout as in {@link Amplitudes}: separate real and imaginary arrays, index {@code point * lanes
 * + lane}. The arrays handed out are live. Fixed shape, mutable, not thread-safe.
 */
public final class Field extends LaneArrays {
  private final PeriodicGrid grid;

  /**
   * Makes a field of zeros.
   *
   * @param grid the grid
   * @param components number of components, at least 1
   * @param lanes number of lanes, at least 1
   * @throws IllegalArgumentException if a number is out of range
   */
  public Field(PeriodicGrid grid, int components, int lanes) {
    super("points", Check.notNull(grid, "grid").points(), components, lanes);
    this.grid = grid;
  }

  /**
   * The grid.
   *
   * @return the grid
   */
  public PeriodicGrid grid() {
    return grid;
  }

  /**
   * Requires a shape.
   *
   * @param expectedGrid grid it must live on
   * @param components number of components it must have
   * @param expectedLanes number of lanes it must have
   * @throws IllegalArgumentException if the shape differs; the message gives both
   */
  public void requireShape(PeriodicGrid expectedGrid, int components, int expectedLanes) {
    boolean fits =
        (grid == expectedGrid || grid.equals(expectedGrid))
            && re.length == components && lanes == expectedLanes;
    if (!fits) { // written so that the check of a time step allocates nothing
      Check.argument(
          false,
          "shapes must agree: expected %s components, %s lanes on [%s]; found %s components, %s"
              + " lanes on [%s]",
          components, expectedLanes, expectedGrid, re.length, lanes, grid);
    }
  }
}
