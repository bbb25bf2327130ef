package spgpe.projector;

import java.util.Arrays;
import spgpe.fourier.FourierProvider;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;
import spgpe.internal.lanes.LaneFourier;

/**
 * The coherent region: the list of kept plane waves
 *
 * <pre>psi_j(r) = V^(-1/2) sum over kept k of a_jk exp(i k r)</pre>
 *
 * <p>so that |a_jk|<sup>2</sup> is the occupation of a mode and their sum the atom number. The order
 * of the modes is fixed for a region but not promised to be any particular one: ask {@link
 * #modeNumber} and {@link #indexOf}. Immutable and thread-safe.
 */
public final class CoherentRegion {
  interface ModeTest {
    boolean keeps(int nx, int ny);
  }

  private final PeriodicGrid grid;
  private final String rule;
  private final int[] nx;
  private final int[] ny;
  private final double[] kSquared;
  private final int[] indexOfGridMode;

  private CoherentRegion(PeriodicGrid grid, String rule, int[] nx, int[] ny) {
    this.grid = grid;
    this.rule = rule;
    this.nx = nx;
    this.ny = ny;
    this.kSquared = new double[nx.length];
    this.indexOfGridMode = new int[grid.points()];
    Arrays.fill(indexOfGridMode, -1);
    for (int m = 0; m < nx.length; m++) {
      double kx = grid.axis(0).waveNumber(nx[m]);
      double ky = grid.dimension() == 1 ? 0 : grid.axis(1).waveNumber(ny[m]);
      kSquared[m] = kx * kx + ky * ky;
      indexOfGridMode[gridIndex(m)] = m;
    }
  }

  static CoherentRegion collect(PeriodicGrid grid, String rule, ModeTest test) {
    int pointsX = grid.axis(0).points();
    int pointsY = grid.dimension() == 1 ? 1 : grid.axis(1).points();
    int[] nx = new int[grid.points()];
    int[] ny = new int[grid.points()];
    int count = 0;
    for (int j = 0; j < pointsY; j++) {
      int modeY = 2 * j < pointsY ? j : j - pointsY;
      for (int i = 0; i < pointsX; i++) {
        int modeX = 2 * i < pointsX ? i : i - pointsX;
        if (test.keeps(modeX, modeY)) {
          nx[count] = modeX;
          ny[count] = modeY;
          count++;
        }
      }
    }
    Check.argument(
        count > 0, "the projector must keep at least one mode: rule=\"%s\", grid=%s", rule, grid);
    return new CoherentRegion(grid, rule, Arrays.copyOf(nx, count), Arrays.copyOf(ny, count));
  }

  /**
   * The grid of positions.
   *
   * @return the grid
   */
  public PeriodicGrid grid() {
    return grid;
  }

  /**
   * Number of kept modes.
   *
   * @return M
   */
  public int modes() {
    return nx.length;
  }

  /**
   * Mode number along an axis: k = 2 pi n / L.
   *
   * @param axis 0 for x, 1 for y
   * @param mode index of the kept mode, 0 to M-1
   * @return n
   * @throws IllegalArgumentException if there is no such axis or mode
   */
  public int modeNumber(int axis, int mode) {
    Check.inRange(axis, 0, grid.dimension() - 1, "axis index");
    Check.inRange(mode, 0, nx.length - 1, "mode index");
    return axis == 0 ? nx[mode] : ny[mode];
  }

  /**
   * Wave number along an axis.
   *
   * @param axis 0 for x, 1 for y
   * @param mode index of the kept mode
   * @return k along that axis
   * @throws IllegalArgumentException if there is no such axis or mode
   */
  public double waveNumber(int axis, int mode) {
    return grid.axis(axis).waveNumber(modeNumber(axis, mode));
  }

  /**
   * Squared wave number.
   *
   * @param mode index of the kept mode
   * @return |k|<sup>2</sup>
   * @throws IllegalArgumentException if there is no such mode
   */
  public double kSquared(int mode) {
    Check.inRange(mode, 0, nx.length - 1, "mode index");
    return kSquared[mode];
  }

  /**
   * Index of a mode on a line.
   *
   * @param modeX mode number along x
   * @return its index, or -1 if it is not kept
   */
  public int indexOf(int modeX) {
    return indexOf(modeX, 0);
  }

  /**
   * Index of a mode.
   *
   * @param modeX mode number along x
   * @param modeY mode number along y, 0 on a line
   * @return its index, or -1 if it is not kept
   */
  public int indexOf(int modeX, int modeY) {
    int pointsX = grid.axis(0).points();
    int pointsY = grid.dimension() == 1 ? 1 : grid.axis(1).points();
    boolean representable =
        2L * modeX >= -pointsX && 2L * modeX < pointsX
            && 2L * modeY >= -pointsY && 2L * modeY < pointsY;
    return representable
        ? indexOfGridMode[
            Math.floorMod(modeY, pointsY) * pointsX + Math.floorMod(modeX, pointsX)]
        : -1;
  }

  /**
   * Largest |n| kept along an axis.
   *
   * @param axis 0 for x, 1 for y
   * @return the cutoff mode number
   * @throws IllegalArgumentException if there is no such axis
   */
  public int largestMode(int axis) {
    Check.inRange(axis, 0, grid.dimension() - 1, "axis index");
    int largest = 0;
    for (int m = 0; m < modes(); m++) {
      largest = Math.max(largest, Math.abs(modeNumber(axis, m)));
    }
    return largest;
  }

  /**
   * Whether a force that is a polynomial of the given degree in psi and psi<sup>*</sup> is free of
   * aliasing here.
   *
   * @param forceDegree degree, odd and positive: 1 linear, 3 cubic, 5 quintic
   * @return the verdict, with the number of points needed on each axis
   * @throws IllegalArgumentException if the degree is not odd and positive
   */
  public AliasingVerdict aliasing(int forceDegree) {
    Check.argument(
        forceDegree >= 1 && forceDegree % 2 == 1 && forceDegree < 100,
        "degree of the force must be odd, 1..99: forceDegree=%s", forceDegree);
    int[] needed = new int[grid.dimension()];
    int[] present = new int[grid.dimension()];
    for (int axis = 0; axis < needed.length; axis++) {
      int low = Integer.MAX_VALUE;
      int high = Integer.MIN_VALUE;
      for (int m = 0; m < modes(); m++) {
        low = Math.min(low, modeNumber(axis, m));
        high = Math.max(high, modeNumber(axis, m));
      }
      needed[axis] = (forceDegree + 1) / 2 * (high - low) + 1;
      present[axis] = grid.axis(axis).points();
    }
    return new AliasingVerdict(forceDegree, needed, present);
  }

  /**
   * Makes a transform between modes and positions, with its own scratch memory, for one thread.
   *
   * @param components number of components, at least 1
   * @param lanes realisations advanced together, at least 1
   * @param provider Fourier back end
   * @return the transform
   * @throws IllegalArgumentException if a number is not positive, or if the back end cannot
   *     transform the points of an axis
   */
  public ModeTransform transform(int components, int lanes, FourierProvider provider) {
    Check.notNull(provider, "provider");
    return grid.dimension() == 1
        ? new LineTransform(this, components, lanes, provider)
        : new PlaneTransform(this, components, lanes, provider);
  }

  /**
   * Makes a transform like {@link #transform(int, int, FourierProvider)} by a given engine.
   *
   * @param components number of components, at least 1
   * @param lanes realisations advanced together, at least 1
   * @param provider Fourier back end, for regions the engine does not serve
   * @param engine what does the transforms
   * @return the transform
   * @throws IllegalArgumentException if a number is not positive, or if the back end cannot
   *     transform the points of an axis
   * @throws IllegalStateException if the engine does not run here
   */
  public ModeTransform transform(
      int components, int lanes, FourierProvider provider, Engine engine) {
    Check.notNull(provider, "provider");
    Check.notNull(engine, "engine");
    Check.inRange(components, 1, 255, "components");
    Check.inRange(lanes, 1, 4096, "lanes");
    return isServedBy(engine)
        ? engine.transform(this, components, lanes)
        : transform(components, lanes, provider);
  }

  /**
   * Number of lanes at which an engine works fastest here.
   *
   * @param engine what does the transforms
   * @param atMost largest number of interest, at least 1
   * @return lanes; 1 if more are not faster
   * @throws IllegalArgumentException if the number is not positive
   */
  public int bestLanes(Engine engine, long atMost) {
    Check.notNull(engine, "engine");
    Check.argument(atMost >= 1, "largest number of lanes must be >= 1: atMost=%s", atMost);
    return isServedBy(engine) && grid.dimension() == 1
        ? engine.bestLanes(grid.points(), atMost)
        : 1;
  }

  /** Whether it is an engine of this library and the region one that it can do. */
  private boolean isServedBy(Engine engine) {
    boolean served = engine != Engine.PROVIDER;
    for (int axis = 0; axis < grid.dimension(); axis++) {
      int points = grid.axis(axis).points();
      served &=
          Integer.bitCount(points) == 1
              && points >= LaneFourier.FEWEST_POINTS
              && 4 * largestMode(axis) < points;
    }
    return served;
  }

  int gridIndex(int mode) {
    int pointsX = grid.axis(0).points();
    int x = Math.floorMod(nx[mode], pointsX);
    return grid.dimension() == 1
        ? x
        : Math.floorMod(ny[mode], grid.axis(1).points()) * pointsX + x;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof CoherentRegion that
        && grid.equals(that.grid) && Arrays.equals(nx, that.nx) && Arrays.equals(ny, that.ny);
  }

  @Override
  public int hashCode() {
    return grid.hashCode() * 31 + modes();
  }

  @Override
  public String toString() {
    return "CoherentRegion: " + modes() + " modes (" + rule + ") of " + grid;
  }
}
