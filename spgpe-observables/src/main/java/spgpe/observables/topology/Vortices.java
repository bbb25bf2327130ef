package spgpe.observables.topology;

import java.util.ArrayList;
import java.util.List;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.observables.phase.ComponentPhase;
import spgpe.observables.phase.PhaseUnwrapping;
import spgpe.observables.phase.RelativePhase;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Vortices of a phase on a plane: plaquettes, the squares between four neighbouring points, around
 * which the phase winds. The winding is the sum of the four phase steps, each by the shorter way,
 * so that it is -1, 0 or 1. Each step belongs to two plaquettes with opposite signs: the charges of
 * a periodic plane add up to zero exactly.
 *
 * <p>In a field at finite temperature many vortices are pairs as close as the grid spacing that
 * come and go; their number grows with the momentum cutoff. Count those of a coarser field, or look
 * at what survives between frames, before calling them free vortices. For a vortex of the relative
 * phase, phi = arg(psi_1 psi_2<sup>*</sup>), the components wind against each other or one of them
 * alone.
 */
public final class Vortices {
  private Vortices() {}

  /**
   * Finds the vortices of a phase.
   *
   * @param phases phases at the points of a plane, wrapped or not, radians, finite
   * @param grid a plane
   * @return vortices in the order of the points at the lower left of their plaquettes
   * @throws IllegalArgumentException if there is not one finite phase for each point or the grid is
   *     no plane
   */
  public static List<Vortex> find(double[] phases, PeriodicGrid grid) {
    int[] charges = charges(phases, grid);
    Axis x = grid.axis(0);
    Axis y = grid.axis(1);
    List<Vortex> vortices = new ArrayList<>();
    for (int p = 0; p < charges.length; p++) {
      if (charges[p] != 0) {
        vortices.add(
            new Vortex(
                (p % x.points() + 0.5) * x.spacing(), (p / x.points() + 0.5) * y.spacing(),
                charges[p]));
      }
    }
    return vortices;
  }

  /**
   * Charges of all plaquettes.
   *
   * @param phases phases at the points of a plane, wrapped or not, radians, finite
   * @param grid a plane
   * @return the charge of the plaquette whose lower left point has that index; their sum is zero
   * @throws IllegalArgumentException if there is not one finite phase for each point or the grid is
   *     no plane
   */
  public static int[] charges(double[] phases, PeriodicGrid grid) {
    Check.notNull(phases, "phases");
    requirePlane(Check.notNull(grid, "grid"), "vortices");
    Check.argument(
        phases.length == grid.points(),
        "there must be one phase for each point: phases=%s, points=%s",
        phases.length, grid.points());
    for (int i = 0; i < phases.length; i++) {
      Check.argument(
          Double.isFinite(phases[i]),
          "phases (radians) must be finite: phases[%s]=%s", i, phases[i]);
    }
    int[] charges = new int[phases.length];
    fill(phases, grid, charges);
    return charges;
  }

  private static void fill(double[] phases, PeriodicGrid grid, int[] charges) {
    int nx = grid.axis(0).points();
    int ny = grid.axis(1).points();
    for (int y = 0; y < ny; y++) {
      int row = y * nx;
      int above = y + 1 < ny ? row + nx : 0;
      for (int x = 0; x < nx; x++) {
        int right = x + 1 < nx ? x + 1 : 0;
        // every step is taken in the direction of its axis: (-pi, pi] is not symmetric
        double turn =
            PhaseUnwrapping.step(phases[row + x], phases[row + right])
                + PhaseUnwrapping.step(phases[row + right], phases[above + right])
                - PhaseUnwrapping.step(phases[above + x], phases[above + right])
                - PhaseUnwrapping.step(phases[row + x], phases[above + x]);
        charges[row + x] = (int) Math.rint(turn / (2 * Math.PI));
      }
    }
  }

  /**
   * Numbers of vortices of a component.
   *
   * @param component component index from 0
   * @return observable with two numbers: vortices of charge +1 and of charge -1
   * @throws IllegalArgumentException if the index is negative; when used, if the grid is no plane
   */
  public static Observable countOfComponent(int component) {
    return count(
        "numbers of vortices of component " + component, ComponentPhase.wrapped(component));
  }

  /**
   * Numbers of vortices of the relative phase.
   *
   * @return observable with two numbers: vortices of charge +1 and of charge -1; when used, refuses
   *     grids that are no planes
   */
  public static Observable countOfRelativePhase() {
    return count("numbers of vortices of the relative phase", RelativePhase.wrapped());
  }

  /**
   * Charges of a component plaquette by plaquette.
   *
   * @param component component index from 0
   * @return observable with one number for each point: the charge of the plaquette to its upper
   *     right
   * @throws IllegalArgumentException if the index is negative; when used, if the grid is no plane
   */
  public static Observable chargesOfComponent(int component) {
    return map("vortex charges of component " + component, ComponentPhase.wrapped(component));
  }

  /**
   * Charges of the relative phase plaquette by plaquette.
   *
   * @return observable with one number for each point: the charge of the plaquette to its upper
   *     right; when used, refuses grids that are no planes
   */
  public static Observable chargesOfRelativePhase() {
    return map("vortex charges of the relative phase", RelativePhase.wrapped());
  }

  @SuppressWarnings("ArrayRecordComponent") // compared by nobody
  private record Scratch(double[] phases, int[] charges) {
    static Scratch of(Model model) {
      int points = model.region().grid().points();
      return new Scratch(new double[points], new int[points]);
    }
  }

  private static int[] measure(Object owner, Observable phase, Snapshot snapshot) {
    Scratch s = snapshot.scratch(owner, Scratch.class, Scratch::of);
    phase.measure(snapshot, s.phases());
    fill(s.phases(), snapshot.model().region().grid(), s.charges());
    return s.charges();
  }

  private static Observable count(String name, Observable phase) {
    return new Observable() {
      @Override
      public String name() {
        return name;
      }

      @Override
      public int size(Model model) {
        phase.size(model);
        requirePlane(model.region().grid(), name);
        return 2;
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        result[0] = 0;
        result[1] = 0;
        for (int charge : Vortices.measure(this, phase, snapshot)) {
          result[0] += charge > 0 ? 1 : 0;
          result[1] += charge < 0 ? 1 : 0;
        }
      }

      @Override
      public String toString() {
        return name;
      }
    };
  }

  private static Observable map(String name, Observable phase) {
    return new Observable() {
      @Override
      public String name() {
        return name;
      }

      @Override
      public int size(Model model) {
        requirePlane(model.region().grid(), name);
        return phase.size(model);
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        int[] charges = Vortices.measure(this, phase, snapshot);
        for (int p = 0; p < charges.length; p++) {
          result[p] = charges[p];
        }
      }

      @Override
      public String toString() {
        return name;
      }
    };
  }

  static void requirePlane(PeriodicGrid grid, String what) {
    Check.argument(
        grid.dimension() == 2, "%s need a plane, not a line (ring): grid=%s", what, grid);
  }
}
