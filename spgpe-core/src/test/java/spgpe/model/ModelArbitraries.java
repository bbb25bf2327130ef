package spgpe.model;

import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.Combinators;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ContactInteraction;
import spgpe.hamiltonian.Detuning;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/** jqwik arbitraries of grids, regions, recipes of models, and states. */
public final class ModelArbitraries {
  private ModelArbitraries() {}

  /**
   * Lines of 2 to 96 points.
   *
   * @return grids
   */
  public static Arbitrary<PeriodicGrid> grids() {
    return Combinators.combine(
            Arbitraries.integers().between(2, 96), Arbitraries.doubles().between(0.5, 200))
        .as((points, length) -> PeriodicGrid.of(Axis.of(points, length)));
  }

  /**
   * Symmetric regions, with and without aliasing, up to the lattice without projection.
   *
   * @return regions
   */
  public static Arbitrary<CoherentRegion> regions() {
    return Combinators.combine(grids(), Arbitraries.integers().between(1, 48))
        .as(
            (grid, largest) ->
                largest <= grid.axis(0).highestMode()
                    ? Projector.modesUpTo(largest).on(grid)
                    : Projector.allModes().on(grid));
  }

  /**
   * Recipes of models of one to three components of unequal masses, with every kind of coupling that
   * the number of components allows and more points than the cubic force needs.
   *
   * @return recipes
   */
  public static Arbitrary<Recipe> recipes() {
    return Combinators.combine(
            Arbitraries.integers().between(1, 3),
            Arbitraries.integers().between(1, 9),
            Arbitraries.integers().between(0, 24),
            Arbitraries.doubles().between(4, 40),
            Arbitraries.doubles().between(-1, 1).list().ofSize(16),
            Arbitraries.integers().between(0, 7))
        .as(
            (components, largestMode, spare, length, values, switches) ->
                new Recipe(
                    components, largestMode, 4 * largestMode + 1 + spare, length, values,
                    (switches & 1) != 0, (switches & 2) != 0, (switches & 4) != 0));
  }

  /**
   * A state whose densities are of order one.
   *
   * @param model model it is for
   * @param seed seed of its amplitudes
   * @return state with one lane
   */
  public static Amplitudes state(Model model, long seed) {
    Amplitudes state = new Amplitudes(model.region(), model.components(), 1);
    SplittableRandom random = new SplittableRandom(seed);
    double size = Math.sqrt(model.region().grid().volume() / model.region().modes());
    for (int c = 0; c < model.components(); c++) {
      for (int n = -model.region().largestMode(0); n <= model.region().largestMode(0); n++) {
        int m = model.region().indexOf(n);
        double re = size * random.nextDouble(-1, 1);
        double im = size * random.nextDouble(-1, 1);
        if (m >= 0) {
          state.re(c)[m] = re;
          state.im(c)[m] = im;
        }
      }
    }
    return state;
  }

  /**
   * A recipe from which related models are made.
   *
   * @param components 1 to 3
   * @param largestMode cutoff mode number
   * @param points number of points
   * @param length length of the ring
   * @param values sixteen numbers in [-1, 1] from which all couplings follow
   * @param coupled whether there is coherent coupling
   * @param local whether there are local terms
   * @param damped whether the damping is not zero
   */
  public record Recipe(
      int components, int largestMode, int points, double length, List<Double> values,
      boolean coupled, boolean local, boolean damped) {
    /**
     * The model.
     *
     * @param temperature temperature
     * @return the model
     */
    public Model model(double temperature) {
      return model(temperature, points, identity());
    }

    /**
     * The model on another number of points.
     *
     * @param temperature temperature
     * @param otherPoints number of points
     * @return the model
     */
    public Model model(double temperature, int otherPoints) {
      return model(temperature, otherPoints, identity());
    }

    /**
     * The model with its components in another order.
     *
     * @param temperature temperature
     * @param order order[new index] = old index
     * @return the model
     */
    public Model reordered(double temperature, int[] order) {
      return model(temperature, points, order);
    }

    private int[] identity() {
      int[] order = new int[components];
      Arrays.setAll(order, i -> i);
      return order;
    }

    private Model model(double temperature, int numberOfPoints, int[] order) {
      int n = components;
      double[] masses = new double[n];
      double[] offsets = new double[n];
      double[] mu = new double[n];
      double[] gamma = new double[n];
      double[][] g = new double[n][n];
      for (int i = 0; i < n; i++) {
        int old = order[i];
        masses[i] = 1 + 0.6 * values.get(old);
        offsets[i] = 0.3 * values.get(3 + old);
        mu[i] = 1 + 0.3 * values.get(6 + old);
        gamma[i] = damped ? 0.1 + 0.09 * values.get(9 + old) : 0;
        for (int j = 0; j < n; j++) {
          int low = Math.min(old, order[j]);
          int high = Math.max(old, order[j]);
          g[i][j] = low == high ? 1 : 0.5 * values.get(12 + low + high - 1);
        }
      }
      Hamiltonian h = Hamiltonian.ofMasses(masses).with(Detuning.ofOffsets(offsets));
      for (int i = 0; coupled && i < n; i++) {
        for (int j = 0; j < i; j++) {
          double strength = 0.2 * values.get(order[i] + order[j] + 4);
          h = h.with(CoherentCoupling.constant(strength).between(i, j));
        }
      }
      if (local) {
        h = h.with(ContactInteraction.ofMatrix(g));
        h = n == 2 ? h.with(BiquadraticCoupling.of(0.3 * values.get(15))) : h;
      }
      PeriodicGrid grid = PeriodicGrid.of(Axis.of(numberOfPoints, length));
      return Model.of(
          Projector.modesUpTo(largestMode).on(grid), h,
          Reservoir.of(temperature, 0, 0).withChemicalPotentials(mu).withDampings(gamma));
    }

    /**
     * A step well inside of the stability limit.
     *
     * @param model a model of this recipe
     * @return time step
     */
    public double step(Model model) {
      double mean = 0;
      for (int c = 0; c < model.components(); c++) {
        mean = Math.max(mean, model.reservoir().chemicalPotential(c));
      }
      return Math.min(0.05, 0.5 / (model.linearPart().spectralBound() + 2 * mean));
    }
  }
}
