package spgpe.projector;

import java.util.function.IntBinaryOperator;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;

/**
 * A rule that says which plane waves belong to the coherent region. Immutable and thread-safe.
 *
 * <p>The projector P of the equation of motion keeps exactly these modes; see {@link
 * CoherentRegion}.
 */
public final class Projector {
  private interface Rule {
    /** Whether the mode with these numbers is kept; ny is 0 on a line. */
    boolean keeps(PeriodicGrid grid, int nx, int ny);
  }

  private final Rule rule;
  private final String description;
  private final boolean mayReachGridEdge;

  private Projector(Rule rule, String description, boolean mayReachGridEdge) {
    this.rule = rule;
    this.description = description;
    this.mayReachGridEdge = mayReachGridEdge;
  }

  /**
   * Keeps modes with |k| &le; cutoff (a disc of wave numbers in two dimensions).
   *
   * @param cutoff largest kept wave number, finite and positive
   * @return the rule
   * @throws IllegalArgumentException if the cutoff is out of range
   */
  public static Projector belowWaveNumber(double cutoff) {
    Check.positive(cutoff, "cutoff wave number");
    double square = cutoff * cutoff;
    Check.argument(
        square > 0 && square < Double.POSITIVE_INFINITY,
        "square of the cutoff wave number must be representable: cutoff=%s", cutoff);
    return new Projector(
        (grid, nx, ny) -> kSquared(grid, nx, ny) <= square, "|k| <= " + cutoff, false);
  }

  /**
   * Keeps modes whose kinetic energy k<sup>2</sup>/(2m) does not exceed the cutoff.
   *
   * @param cutoff largest kept kinetic energy, finite and positive
   * @param mass mass in scaled units, finite and positive
   * @return the rule
   * @throws IllegalArgumentException if a value is out of range
   */
  public static Projector belowEnergy(double cutoff, double mass) {
    Check.positive(cutoff, "cutoff energy");
    Check.positive(mass, "mass");
    double square = 2 * mass * cutoff;
    Check.argument(
        square > 0 && square < Double.POSITIVE_INFINITY,
        "2 mass cutoff must be representable: cutoff=%s, mass=%s", cutoff, mass);
    return new Projector(
        (grid, nx, ny) -> kSquared(grid, nx, ny) <= square,
        "k^2/(2m) <= " + cutoff + " with m=" + mass, false);
  }

  /**
   * Keeps modes with |n| &le; largest on every axis (a square of mode numbers in two dimensions).
   *
   * @param largest largest kept mode number, at least 1
   * @return the rule
   * @throws IllegalArgumentException if the number is not positive
   */
  public static Projector modesUpTo(int largest) {
    Check.inRange(largest, 1, 32767, "largest mode number");
    return new Projector(
        (grid, nx, ny) -> Math.abs(nx) <= largest && Math.abs(ny) <= largest,
        "|n| <= " + largest, false);
  }

  /**
   * Keeps modes with |n_x| &le; largestX and |n_y| &le; largestY: a rectangle. For a disc or, on a
   * grid of unequal lengths, an ellipse of mode numbers take {@link #belowWaveNumber}.
   *
   * @param largestX largest kept mode number along x, at least 1
   * @param largestY largest kept mode number along y, at least 1
   * @return the rule, for two-dimensional grids
   * @throws IllegalArgumentException if a number is not positive; from {@link #on} if the grid is a
   *     line
   */
  public static Projector modesUpTo(int largestX, int largestY) {
    Check.inRange(largestX, 1, 32767, "largest mode number along x");
    Check.inRange(largestY, 1, 32767, "largest mode number along y");
    return new Projector(
        (grid, nx, ny) -> {
          Check.argument(
              grid.dimension() == 2,
              "two largest mode numbers need a two-dimensional grid: largestX=%s, largestY=%s,"
                  + " grid=%s; on a line use modesUpTo(largest)", largestX, largestY, grid);
          return Math.abs(nx) <= largestX && Math.abs(ny) <= largestY;
        },
        "|nx| <= " + largestX + ", |ny| <= " + largestY, false);
  }

  /**
   * Keeps every mode the points can represent: no projection, the plain lattice. Nonlinear forces
   * alias on it.
   *
   * @return the rule
   */
  public static Projector allModes() {
    return new Projector((grid, nx, ny) -> true, "all modes", true);
  }

  /**
   * Keeps the modes that a user's function accepts.
   *
   * @param description how the rule names itself in descriptions
   * @param accepts gets the mode numbers (nx, ny), ny = 0 on a line; non-zero keeps the mode
   * @return the rule
   */
  public static Projector keeping(String description, IntBinaryOperator accepts) {
    Check.notNull(description, "description");
    Check.notNull(accepts, "accepts");
    return new Projector(
        (grid, nx, ny) -> accepts.applyAsInt(nx, ny) != 0, description, true);
  }

  /**
   * Applies the rule to a grid.
   *
   * @param grid the grid
   * @return the coherent region
   * @throws IllegalArgumentException if no mode is kept, or if the cutoff lies beyond the modes that
   *     the grid can represent
   */
  public CoherentRegion on(PeriodicGrid grid) {
    Check.notNull(grid, "grid");
    if (!mayReachGridEdge) {
      for (int a = 0; a < grid.dimension(); a++) {
        Axis axis = grid.axis(a);
        int beyond = axis.highestMode() + 1;
        boolean reachesEdge =
            a == 0 ? rule.keeps(grid, beyond, 0) : rule.keeps(grid, 0, beyond);
        Check.argument(
            !reachesEdge,
            "cutoff must lie within the modes of the grid: rule \"%s\" keeps n=%s, but %s points"
                + " over length %s represent only |n| <= %s; use more points or a lower cutoff",
            description, beyond, axis.points(), axis.length(), axis.highestMode());
      }
    }
    return CoherentRegion.collect(grid, description, (nx, ny) -> rule.keeps(grid, nx, ny));
  }

  private static double kSquared(PeriodicGrid grid, int nx, int ny) {
    double kx = grid.axis(0).waveNumber(nx);
    double ky = grid.dimension() == 1 ? 0 : grid.axis(1).waveNumber(ny);
    return kx * kx + ky * ky;
  }

  @Override
  public String toString() {
    return "Projector " + description;
  }
}
