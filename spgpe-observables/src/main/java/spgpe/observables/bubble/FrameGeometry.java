package spgpe.observables.bubble;

import java.util.List;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;

/** What differs between frames of a ring and of a plane. Owns scratch memory: one thread. */
abstract class FrameGeometry {
  final PeriodicGrid grid;
  private final FrameSmoothing smoothing;

  private FrameGeometry(PeriodicGrid grid, double smoothing) {
    this.grid = grid;
    this.smoothing = new FrameSmoothing(grid, smoothing);
  }

  static FrameGeometry of(PeriodicGrid grid, double smoothing) {
    return grid.dimension() == 1 ? new Ring(grid, smoothing) : new Plane(grid, smoothing);
  }

  /** Connected regions above a level; the seams are no borders. */
  abstract List<Region> regionsAbove(double[] frame, double level);

  /** Radius of a region of that many points. */
  abstract double radius(int points);

  /** A coordinate of a region for which there is no circular mean. */
  abstract double substitute(int axis, Region region, double[] frame);

  /** Reads radius and walls of a bubble at a level. */
  abstract void read(OpenBubble bubble, double time, Region region, double[] frame, double level);

  void smooth(double[] frame, double[] result) {
    smoothing.apply(frame, result);
  }

  /** Circular mean on each axis of the points above a level, or of all if there are none. */
  Site mean(Region region, double[] frame, double level) {
    if (!(frame[region.highestPoint(frame)] > level)) {
      return mean(region, frame, Double.NEGATIVE_INFINITY);
    }
    return new Site(
        mean(0, region, frame, level),
        grid.dimension() == 1 ? 0 : mean(1, region, frame, level));
  }

  private double mean(int axisIndex, Region region, double[] frame, double level) {
    Axis axis = grid.axis(axisIndex);
    int pointsX = grid.axis(0).points();
    double x = 0;
    double y = 0;
    double step = 2 * Math.PI / axis.points();
    int count = 0;
    for (int p : region.points) {
      if (frame[p] > level) {
        int i = axisIndex == 0 ? p % pointsX : p / pointsX;
        x += Math.cos(i * step);
        y += Math.sin(i * step);
        count++;
      }
    }
    if (Math.hypot(x, y) < 1e-9 * count) {
      return substitute(axisIndex, region, frame);
    }
    return inside(Math.atan2(y, x) / (2 * Math.PI) * axis.length(), axis.length());
  }

  Extent extent(Region region, double[] frame) {
    return new Extent(
        region.size() * grid.cellVolume(), radius(region.size()),
        mean(region, frame, Double.NEGATIVE_INFINITY), region.wrapsX, region.wrapsY);
  }

  static double inside(double position, double length) {
    double inside = position - length * Math.floor(position / length);
    return inside < length ? inside : 0;
  }

  private static final class Ring extends FrameGeometry {
    private final int points;
    private final double length;
    private final double spacing;

    Ring(PeriodicGrid grid, double smoothing) {
      super(grid, smoothing);
      this.points = grid.points();
      this.length = grid.axis(0).length();
      this.spacing = length / points;
    }

    @Override
    List<Region> regionsAbove(double[] frame, double level) {
      return Region.onRing(frame, level);
    }

    @Override
    double radius(int count) {
      return count * spacing / 2;
    }

    @Override
    double substitute(int axis, Region region, double[] frame) {
      return inside(
          (region.points[0] + (region.size() - 1) / 2.0) * length / points, length);
    }

    /** The outermost crossings of the level, interpolated. */
    @Override
    void read(OpenBubble bubble, double time, Region region, double[] frame, double level) {
      if (region.size() == points) {
        return;
      }
      int first = 0;
      while (first < region.size() && !(frame[region.points[first]] > level)) {
        first++;
      }
      if (first == region.size()) {
        return;
      }
      int last = region.size() - 1;
      while (!(frame[region.points[last]] > level)) {
        last--;
      }
      double start = region.points[0];
      double left = start + first - fraction(frame, region.points[first], -1, level);
      double right = start + last + fraction(frame, region.points[last], 1, level);
      bubble.addWalls(time, left * spacing, right * spacing);
      double width = (right - left) * spacing;
      Site middle = new Site(inside((left + right) / 2 * spacing, length), 0);
      bubble.addExtent(time, new Extent(width, width / 2, middle, false, false));
    }

    /** Part of a spacing from a point above the level to where its neighbour's side crosses it. */
    private double fraction(double[] frame, int inside, int direction, double level) {
      double above = frame[inside];
      double below = frame[Math.floorMod(inside + direction, points)];
      return (above - level) / (above - below);
    }
  }

  private static final class Plane extends FrameGeometry {
    private final PlaneRegions regions;

    Plane(PeriodicGrid grid, double smoothing) {
      super(grid, smoothing);
      this.regions = new PlaneRegions(grid.axis(0).points(), grid.axis(1).points());
    }

    @Override
    List<Region> regionsAbove(double[] frame, double level) {
      return regions.above(frame, level);
    }

    @Override
    double radius(int count) {
      return Math.sqrt(count * grid.cellVolume() / Math.PI);
    }

    @Override
    double substitute(int axis, Region region, double[] frame) {
      return grid.coordinate(axis, region.highestPoint(frame));
    }

    @Override
    void read(OpenBubble bubble, double time, Region region, double[] frame, double level) {
      Region inner = region.above(frame, level);
      if (inner.size() > 0) {
        bubble.addExtent(time, extent(inner, frame));
      }
    }
  }
}
