package spgpe.grid;

import spgpe.internal.check.Check;

/**
 * One periodic axis: N equally spaced points x_i = i L/N, i = 0..N-1, on a ring of length L.
 *
 * <p>Lengths are in scaled units. Immutable and thread-safe.
 *
 * @param points number of points N, 2 to 2<sup>20</sup>
 * @param length ring length L, finite and positive
 */
public record Axis(int points, double length) {
  private static final int MAX_POINTS = 1 << 20;

  /**
   * Checks the values.
   *
   * @param points number of points N
   * @param length ring length L
   * @throws IllegalArgumentException if a value is out of range
   */
  public Axis {
    Check.inRange(points, 2, MAX_POINTS, "points");
    Check.positive(length, "length");
    double largest = Math.PI * points / length;
    Check.argument(
        length / points > 0
            && points * length < Double.POSITIVE_INFINITY
            && largest * largest < Double.POSITIVE_INFINITY,
        "spacing length/points, points*length and the square of the largest wave number must be"
            + " representable: length=%s, points=%s", length, points);
  }

  /**
   * Makes an axis.
   *
   * @param points number of points, 2 to 2<sup>20</sup>
   * @param length ring length, finite and positive
   * @return the axis
   * @throws IllegalArgumentException if a value is out of range
   */
  public static Axis of(int points, double length) {
    return new Axis(points, length);
  }

  /**
   * Makes the axis with the fewest points, among powers of two, on which a cubic force of modes
   * |n| &le; largestMode does not alias: N &ge; 4 largestMode + 1.
   *
   * @param largestMode largest kept mode number, at least 1
   * @param length ring length, finite and positive
   * @return the axis
   * @throws IllegalArgumentException if a value is out of range
   */
  public static Axis holdingModes(int largestMode, double length) {
    Check.inRange(largestMode, 1, MAX_POINTS / 8, "largestMode");
    int needed = 4 * largestMode + 1;
    return of(Integer.highestOneBit(needed - 1) << 1, length);
  }

  /**
   * Distance between neighbouring points.
   *
   * @return L/N
   */
  public double spacing() {
    return length / points;
  }

  /**
   * Position of a point.
   *
   * @param i point index, 0 to N-1
   * @return i L/N
   */
  public double position(int i) {
    return i * length / points;
  }

  /**
   * Wave number of a mode.
   *
   * @param n mode number, any sign
   * @return 2 pi n / L
   */
  public double waveNumber(int n) {
    return 2 * Math.PI * n / length;
  }

  /**
   * Smallest mode number the points can represent.
   *
   * @return -floor(N/2)
   */
  public int lowestMode() {
    return -(points / 2);
  }

  /**
   * Largest mode number the points can represent.
   *
   * @return ceil(N/2) - 1
   */
  public int highestMode() {
    return (points - 1) / 2;
  }
}
