package spgpe.hamiltonian;

import java.util.function.DoubleBinaryOperator;
import java.util.function.DoubleUnaryOperator;
import org.jspecify.annotations.Nullable;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;
import spgpe.projector.CoherentRegion;
import spgpe.projector.PointBlock;

/**
 * A static external potential: K = integral of V(r) |psi_j|<sup>2</sup>, for one component or for
 * all, sampled at the grid points.
 *
 * <p>The potential should repeat with the grid and vary slowly on the spacing: harmonics of V beyond
 * N - 2 n_c fold back. Immutable; thread-safe if the function is.
 */
public final class ExternalPotential implements ExactFlow {
  private static final int ALL = -1;

  private final DoubleBinaryOperator potential;
  private final String name;
  private final int component;
  private final double @Nullable [] table;

  private ExternalPotential(
      DoubleBinaryOperator potential, String name, int component, double @Nullable [] table) {
    this.potential = potential;
    this.name = name;
    this.component = component;
    this.table = table;
  }

  /**
   * Potential on a line, for all components.
   *
   * @param name how it shows itself in descriptions
   * @param potential V(x), finite at every grid point
   * @return the term
   */
  public static ExternalPotential onLine(String name, DoubleUnaryOperator potential) {
    Check.notNull(potential, "potential");
    return onPlane(name, (x, y) -> potential.applyAsDouble(x));
  }

  /**
   * Potential on a plane, for all components.
   *
   * @param name how it shows itself in descriptions
   * @param potential V(x, y), finite at every grid point
   * @return the term
   */
  public static ExternalPotential onPlane(String name, DoubleBinaryOperator potential) {
    Check.notNull(name, "name");
    Check.notNull(potential, "potential");
    return new ExternalPotential(potential, name, ALL, null);
  }

  /**
   * The same potential for a single component.
   *
   * @param index component index from 0
   * @return changed copy
   * @throws IllegalArgumentException if the index is negative
   */
  public ExternalPotential forComponent(int index) {
    Check.argument(index >= 0, "component index must be >= 0: index=%s", index);
    return new ExternalPotential(potential, name, index, table);
  }

  @Override
  public void check(int components, CoherentRegion region) {
    Check.argument(
        component < components,
        "component of the potential must exist: component=%s, components=%s",
        component, components);
  }

  @Override
  public LocalTerm preparedFor(PeriodicGrid grid) {
    double[] values = new double[grid.points()];
    for (int p = 0; p < values.length; p++) {
      double x = grid.coordinate(0, p);
      double y = grid.dimension() == 1 ? 0 : grid.coordinate(1, p);
      values[p] = potential.applyAsDouble(x, y);
      Check.argument(
          Double.isFinite(values[p]),
          "potential \"%s\" must be finite at every grid point: V=%s at x=%s, y=%s",
          name, values[p], x, y);
    }
    return new ExternalPotential(potential, name, component, values);
  }

  @Override
  public int forceDegree() {
    return 1;
  }

  @Override
  public void addForce(double time, PointBlock block) {
    double[] values = table(block);
    for (int c = firstComponent(); c < lastComponent(block); c++) {
      double[] re = block.psiRe(c);
      double[] im = block.psiIm(c);
      double[] forceRe = block.resultRe(c);
      double[] forceIm = block.resultIm(c);
      for (int i = block.begin(), end = block.end(); i < end; i++) {
        double v = values[block.pointOf(i)];
        forceRe[i] += v * re[i];
        forceIm[i] += v * im[i];
      }
    }
  }

  @Override
  public Kind flowKind() {
    return component == ALL ? Kind.COMMON_PHASE : Kind.COMPONENT_PHASE;
  }

  /** Turns by -V duration. */
  @Override
  public void flow(double time, double duration, PointBlock block) {
    double[] values = table(block);
    for (int c = firstComponent(); c < lastComponent(block); c++) {
      for (int i = block.begin(), end = block.end(); i < end; i++) {
        PhaseTurn.turn(
            block.psiRe(c), block.psiIm(c), i, -duration * values[block.pointOf(i)]);
      }
    }
  }

  @Override
  public void addEnergyDensity(double time, PointBlock block, double[] density) {
    double[] values = table(block);
    for (int c = firstComponent(); c < lastComponent(block); c++) {
      double[] re = block.psiRe(c);
      double[] im = block.psiIm(c);
      for (int i = block.begin(), end = block.end(); i < end; i++) {
        density[i] += values[block.pointOf(i)] * (re[i] * re[i] + im[i] * im[i]);
      }
    }
  }

  private double[] table(PointBlock block) {
    double[] values = table;
    if (values == null || values.length != block.grid().points()) { // allocates nothing in a step
      throw new IllegalStateException(
          "potential \"" + name + "\" must be prepared for the grid it is used on");
    }
    return values;
  }

  private int firstComponent() {
    return component == ALL ? 0 : component;
  }

  private int lastComponent(PointBlock block) {
    return component == ALL ? block.components() : component + 1;
  }

  @Override
  public String description() {
    return "ExternalPotential(" + name + (component == ALL ? "" : ", component " + component) + ")";
  }
}
