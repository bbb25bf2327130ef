package spgpe.hamiltonian;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.model.EnergyMeter;
import spgpe.model.ForceEvaluator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/**
 * What every term of a Hamiltonian must do. Inherit from {@link LocalTermContract} or {@link
 * SpectralTermContract}, supply the term, and run with JUnit.
 *
 * <p>All comparisons are deterministic: the random fields come from fixed seeds. Tolerances are those
 * of rounding; a finite difference of fourth order is exact for quartic energies up to rounding, and
 * its error is below 1e-10 for sextic ones at the step used.
 */
public abstract class HamiltonianTermContract {
  private static final double[] TIMES = {0, 0.37, 5.3};
  private static final double LENGTH = 11.3;
  private static final int LARGEST_MODE = 5;
  static final double DIFFERENCE = 2e-3;

  /**
   * The term under test.
   *
   * @return the same term at each call
   */
  protected abstract HamiltonianTerm term();

  /**
   * Number of components it is tried with.
   *
   * @return components, at least 1
   */
  protected int components() {
    return 2;
  }

  /**
   * Whether the term is invariant under a common change of the phases, that is, whether its force is
   * a Hermitian matrix (which may depend on the densities) times psi.
   *
   * @return true unless atoms may appear and vanish
   */
  protected boolean conservesAtomNumber() {
    return true;
  }

  static PeriodicGrid grid(int points) {
    return PeriodicGrid.of(Axis.of(points, LENGTH));
  }

  final CoherentRegion region(int points) {
    return Projector.modesUpTo(LARGEST_MODE).on(grid(points));
  }

  private Model model(int points) {
    double[] masses = new double[components()];
    Arrays.fill(masses, 1);
    return Model.of(
        region(points), Hamiltonian.ofMasses(masses).with(term()), Reservoir.none(0));
  }

  static void fill(double[] array, SplittableRandom random) {
    for (int i = 0; i < array.length; i++) {
      array[i] = random.nextDouble(-1, 1);
    }
  }

  private Amplitudes randomState(CoherentRegion region, long seed) {
    Amplitudes state = new Amplitudes(region, components(), 1);
    SplittableRandom random = new SplittableRandom(seed);
    for (int c = 0; c < components(); c++) {
      fill(state.re(c), random);
      fill(state.im(c), random);
    }
    return state;
  }

  @Test
  void itIsSpectralOrLocalAndFitsItsModel() {
    assertTrue(term() instanceof SpectralTerm || term() instanceof LocalTerm);
    term().check(components(), region(64));
  }

  @Test
  void itsDescriptionIsNotBlankAndDoesNotChange() {
    assertFalse(term().description().isBlank());
    assertEquals(term().description(), term().description());
  }

  @Test
  void theForceIsTheGradientOfTheEnergyOnTheKeptModes() {
    Model model = model(64);
    EnergyMeter meter = new EnergyMeter(model);
    ForceEvaluator evaluator = model.evaluator(1);
    Amplitudes state = randomState(model.region(), 1);
    Amplitudes force = new Amplitudes(model.region(), components(), 1);
    for (double time : TIMES) {
      evaluator.force(time, state, force);
      for (int direction = 0; direction < 6; direction++) {
        Amplitudes way = randomState(model.region(), 100 + direction);
        double expected = 0;
        double scale = 0;
        for (int c = 0; c < components(); c++) {
          for (int m = 0; m < model.region().modes(); m++) {
            double re = way.re(c)[m] * force.re(c)[m];
            double im = way.im(c)[m] * force.im(c)[m];
            expected += 2 * (re + im);
            scale += 2 * (Math.abs(re) + Math.abs(im));
          }
        }
        double found = derivative(meter, time, state, way);
        assertEquals(expected, found, 1e-9 * scale, "dE against 2 Re <direction, force>");
      }
    }
  }

  private double derivative(EnergyMeter meter, double time, Amplitudes state, Amplitudes way) {
    double[] e = new double[5];
    for (int k = -2; k <= 2; k++) {
      Amplitudes moved = state.copy();
      for (int c = 0; c < components(); c++) {
        for (int i = 0; i < moved.re(c).length; i++) {
          moved.re(c)[i] += k * DIFFERENCE * way.re(c)[i];
          moved.im(c)[i] += k * DIFFERENCE * way.im(c)[i];
        }
      }
      e[k + 2] = meter.energy(time, moved);
    }
    return (8 * (e[3] - e[1]) - (e[4] - e[0])) / (12 * DIFFERENCE);
  }

  @Test
  void theForceIsHermitianSoThatAtomsAreKept() {
    if (!conservesAtomNumber()) {
      return; // stated by the term's author
    }
    Model model = model(64);
    Amplitudes state = randomState(model.region(), 3);
    Amplitudes force = new Amplitudes(model.region(), components(), 1);
    model.evaluator(1).force(0.37, state, force);
    double rate = 0;
    double scale = 0;
    for (int c = 0; c < components(); c++) {
      for (int m = 0; m < model.region().modes(); m++) {
        double one = state.re(c)[m] * force.im(c)[m];
        double two = state.im(c)[m] * force.re(c)[m];
        rate += one - two;
        scale += Math.abs(one) + Math.abs(two);
      }
    }
    assertEquals(0, rate, 1e-13 * scale, "Im <psi, force> is the rate of change of the number");
  }

  @Test
  void itsProjectedForceAndEnergyDoNotDependOnTheNumberOfPoints() {
    Model coarse = model(64);
    Model fine = model(128);
    Amplitudes state = randomState(coarse.region(), 11);
    Amplitudes same = new Amplitudes(fine.region(), components(), 1);
    for (int c = 0; c < components(); c++) {
      for (int m = 0; m < coarse.region().modes(); m++) {
        int other = fine.region().indexOf(coarse.region().modeNumber(0, m));
        same.re(c)[other] = state.re(c)[m];
        same.im(c)[other] = state.im(c)[m];
      }
    }
    Amplitudes force = new Amplitudes(coarse.region(), components(), 1);
    Amplitudes fineForce = new Amplitudes(fine.region(), components(), 1);
    coarse.evaluator(1).force(0.37, state, force);
    fine.evaluator(1).force(0.37, same, fineForce);
    double scale = 0;
    for (int c = 0; c < components(); c++) {
      for (int m = 0; m < coarse.region().modes(); m++) {
        scale = Math.max(scale, Math.hypot(force.re(c)[m], force.im(c)[m]));
      }
    }
    for (int c = 0; c < components(); c++) {
      for (int m = 0; m < coarse.region().modes(); m++) {
        int other = fine.region().indexOf(coarse.region().modeNumber(0, m));
        assertEquals(force.re(c)[m], fineForce.re(c)[other], 1e-12 * scale, "force");
        assertEquals(force.im(c)[m], fineForce.im(c)[other], 1e-12 * scale, "force");
      }
    }
    double energy = new EnergyMeter(coarse).energy(0.37, state);
    double fineEnergy = new EnergyMeter(fine).energy(0.37, same);
    assertEquals(energy, fineEnergy, 1e-12 * scale * state.region().modes(), "energy");
  }
}
