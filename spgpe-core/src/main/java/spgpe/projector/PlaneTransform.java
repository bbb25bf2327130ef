package spgpe.projector;

import java.util.Arrays;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierTransform;

/**
 * Transform of a two-dimensional region by one-dimensional ones.
 *
 * <p>Only columns (values of k along x) that hold a kept mode are stored and transformed over y:
 * a region that is half as wide as the grid saves half of that work. Each column is contiguous, so
 * that it is transformed in place; rows are read across the columns into a line of their own.
 */
final class PlaneTransform extends LaneTransform {
  /**
   * Doubles between columns: a distance of a power of two would map the same row of all columns to
   * few places of the cache.
   */
  private static final int GAP = 8;

  private final FourierTransform overX;
  private final FourierTransform overY;
  private final int pointsX;
  private final int pointsY;

  /** Place in the line of each stored column. */
  private final int[] columnPlaces;

  /** Place in the columns of each kept mode. */
  private final int[] places;

  private final int stride;
  private final double[] columns;
  private final double[] line;

  PlaneTransform(CoherentRegion region, int components, int lanes, FourierProvider provider) {
    super(region, components, lanes);
    this.pointsX = region.grid().axis(0).points();
    this.pointsY = region.grid().axis(1).points();
    this.overX = plan(provider, pointsX);
    this.overY = pointsX == pointsY ? overX : plan(provider, pointsY);
    this.stride = 2 * pointsY + GAP;
    int[] columnOf = new int[pointsX];
    for (int m = 0; m < region.modes(); m++) {
      columnOf[region.gridIndex(m) % pointsX] = 1;
    }
    int count = Arrays.stream(columnOf).sum();
    this.columnPlaces = new int[count];
    for (int x = 0, column = 0; x < pointsX; x++) {
      if (columnOf[x] == 1) {
        columnOf[x] = column;
        columnPlaces[column] = 2 * x;
        column++;
      }
    }
    this.places = new int[region.modes()];
    for (int m = 0; m < places.length; m++) {
      int index = region.gridIndex(m);
      places[m] = columnOf[index % pointsX] * stride + 2 * (index / pointsX);
    }
    this.columns = new double[count * stride];
    this.line = new double[2 * pointsX];
  }

  @Override
  void inverse(
      double[] modesRe, double[] modesIm, double[] pointsRe, double[] pointsIm, int lane) {
    scatter(modesRe, modesIm, lane, places, columns);
    for (int column = 0; column < columnPlaces.length; column++) {
      overY.inverse(columns, column * stride);
    }
    for (int y = 0; y < pointsY; y++) {
      Arrays.fill(line, 0);
      for (int column = 0, from = 2 * y; column < columnPlaces.length; column++, from += stride) {
        line[columnPlaces[column]] = columns[from];
        line[columnPlaces[column] + 1] = columns[from + 1];
      }
      overX.inverse(line, 0);
      unpack(line, pointsRe, pointsIm, y * pointsX * lanes + lane);
    }
  }

  @Override
  void forward(
      double[] pointsRe, double[] pointsIm, double[] modesRe, double[] modesIm, int lane) {
    for (int y = 0; y < pointsY; y++) {
      pack(pointsRe, pointsIm, y * pointsX * lanes + lane, line);
      overX.forward(line, 0);
      for (int column = 0, to = 2 * y; column < columnPlaces.length; column++, to += stride) {
        columns[to] = line[columnPlaces[column]];
        columns[to + 1] = line[columnPlaces[column] + 1];
      }
    }
    for (int column = 0; column < columnPlaces.length; column++) {
      overY.forward(columns, column * stride);
    }
    gather(columns, places, modesRe, modesIm, lane);
  }
}
