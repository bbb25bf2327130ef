package spgpe.grid;

import spgpe.internal.check.Check;

/**
 * A periodic grid in one or two dimensions.
 *
 * <p>Point index: {@code ix} in 1D, {@code iy * Nx + ix} in 2D (x runs fastest). Immutable and
 * thread-safe; equal if the axes are equal.
 */
public final class PeriodicGrid {
  private final Axis[] axes;
  private final int points;
  private final double volume;

  private PeriodicGrid(Axis... axes) {
    this.axes = axes;
    long count = 1;
    double product = 1;
    for (Axis axis : axes) {
      count *= axis.points();
      product *= axis.length();
    }
    Check.argument(
        count <= 1 << 24, "grid must have at most 2^24 points: points=%s", count);
    Check.argument(
        product / count > 0 && product < Double.POSITIVE_INFINITY,
        "volume of the grid and of one cell must be representable: volume=%s, points=%s",
        product, count);
    this.points = (int) count;
    this.volume = product;
  }

  /**
   * Makes a line (ring).
   *
   * @param x the axis
   * @return a one-dimensional grid
   */
  public static PeriodicGrid of(Axis x) {
    return new PeriodicGrid(Check.notNull(x, "x"));
  }

  /**
   * Makes a plane (torus).
   *
   * @param x first axis; its index runs fastest
   * @param y second axis
   * @return a two-dimensional grid
   */
  public static PeriodicGrid of(Axis x, Axis y) {
    return new PeriodicGrid(Check.notNull(x, "x"), Check.notNull(y, "y"));
  }

  /**
   * Number of axes.
   *
   * @return 1 or 2
   */
  public int dimension() {
    return axes.length;
  }

  /**
   * One axis.
   *
   * @param index 0 for x, 1 for y
   * @return the axis
   * @throws IllegalArgumentException if there is no such axis
   */
  public Axis axis(int index) {
    Check.inRange(index, 0, axes.length - 1, "axis index");
    return axes[index];
  }

  /**
   * Number of points.
   *
   * @return product of the axes' points
   */
  public int points() {
    return points;
  }

  /**
   * Length (1D) or area (2D).
   *
   * @return product of the axes' lengths
   */
  public double volume() {
    return volume;
  }

  /**
   * Length or area that belongs to one point.
   *
   * @return volume / points
   */
  public double cellVolume() {
    return volume / points;
  }

  /**
   * Coordinate of a point.
   *
   * @param axisIndex 0 for x, 1 for y
   * @param point point index
   * @return position along that axis
   * @throws IllegalArgumentException if there is no such axis or point
   */
  public double coordinate(int axisIndex, int point) {
    Check.inRange(point, 0, points - 1, "point index");
    int nx = axes[0].points();
    return axis(axisIndex).position(axisIndex == 0 ? point % nx : point / nx);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof PeriodicGrid that && java.util.Arrays.equals(axes, that.axes);
  }

  @Override
  public int hashCode() {
    return java.util.Arrays.hashCode(axes);
  }

  @Override
  public String toString() {
    StringBuilder text = new StringBuilder("PeriodicGrid ").append(axes.length).append("D:");
    for (int i = 0; i < axes.length; i++) {
      text.append(i == 0 ? " " : " x ")
          .append(axes[i].points()).append(" points over length ").append(axes[i].length());
    }
    return text.toString();
  }
}
