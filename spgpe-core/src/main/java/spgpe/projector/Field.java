package spgpe.projector;

import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;

/**
 * Values at the points of a grid, for every component and lane: position-space scratch.
 *
 * <p>Layout as in {@link Amplitudes}: separate real and imaginary arrays, index {@code point * lanes
 * + lane}. The arrays handed out are live. Fixed shape, mutable, not thread-safe.
 */
public final class Field {
  private static final int MAX_NUMBERS = 1 << 28;

  private final PeriodicGrid grid;
  private final int lanes;
  private final double[][] re;
  private final double[][] im;

  /**
   * Makes a field of zeros.
   *
   * @param grid the grid
   * @param components number of components, at least 1
   * @param lanes number of lanes, at least 1
   * @throws IllegalArgumentException if a number is out of range
   */
  public Field(PeriodicGrid grid, int components, int lanes) {
    this.grid = Check.notNull(grid, "grid");
    Check.inRange(components, 1, 255, "components");
    Check.inRange(lanes, 1, 4096, "lanes");
    this.lanes = lanes;
    Check.argument(
        (long) grid.points() * lanes <= MAX_NUMBERS,
        "points times lanes must not exceed %s: points=%s, lanes=%s",
        MAX_NUMBERS, grid.points(), lanes);
    this.re = new double[components][grid.points() * lanes];
    this.im = new double[components][grid.points() * lanes];
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
   * Number of components.
   *
   * @return components
   */
  public int components() {
    return re.length;
  }

  /**
   * Number of lanes.
   *
   * @return lanes
   */
  public int lanes() {
    return lanes;
  }

  /**
   * Live real parts.
   *
   * @param component component index from 0
   * @return array of points x lanes numbers
   * @throws IllegalArgumentException if there is no such component
   */
  public double[] re(int component) {
    Check.inRange(component, 0, re.length - 1, "component index");
    return re[component];
  }

  /**
   * Live imaginary parts.
   *
   * @param component component index from 0
   * @return array of points x lanes numbers
   * @throws IllegalArgumentException if there is no such component
   */
  public double[] im(int component) {
    Check.inRange(component, 0, im.length - 1, "component index");
    return im[component];
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
