package spgpe.integrate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ContactInteraction;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/** Conservation laws over generated models. */
class SchemePropertiesTest {
  private static Hamiltonian hamiltonian(
      int components, double g, double inter, double coupling, double kappa) {
    double[] masses = new double[components];
    double[][] matrix = new double[components][components];
    for (int i = 0; i < components; i++) {
      masses[i] = 1 + 0.3 * i;
      for (int j = 0; j < components; j++) {
        matrix[i][j] = i == j ? g : inter;
      }
    }
    Hamiltonian h = Hamiltonian.ofMasses(masses).with(ContactInteraction.ofMatrix(matrix));
    if (components > 1) {
      h = h.with(CoherentCoupling.constant(coupling).between(0, components - 1));
    }
    return components == 2 ? h.with(BiquadraticCoupling.of(kappa)) : h;
  }

  private static Amplitudes state(Model model, long seed) {
    Random random = new Random(seed);
    Amplitudes a = new Amplitudes(model.region(), model.components(), 1);
    for (int c = 0; c < model.components(); c++) {
      for (int m = 0; m < model.region().modes(); m++) {
        double width = 1 / (1 + model.region().kSquared(m));
        a.re(c)[m] = width * random.nextGaussian();
        a.im(c)[m] = width * random.nextGaussian();
      }
    }
    return a;
  }

  /**
   * gamma = 0: atom number and momentum to 1e-10, K to O(dt^2); the lattice conserves the number
   * alone, for aliasing breaks momentum.
   */
  @Property(tries = 25, seed = "71")
  void conservation(
      @ForAll @IntRange(min = 1, max = 3) int components,
      @ForAll @DoubleRange(min = 0.2, max = 2) double g,
      @ForAll @DoubleRange(min = -0.5, max = 0.5) double inter,
      @ForAll @DoubleRange(min = -0.5, max = 0.5) double coupling,
      @ForAll @DoubleRange(min = 0, max = 0.5) double kappa,
      @ForAll @IntRange(min = 0, max = 1000) int seed) {
    Hamiltonian h = hamiltonian(components, g, inter, coupling, kappa);
    Model projected =
        Model.of(
            Projector.modesUpTo(4).on(PeriodicGrid.of(Axis.of(17, 6))), h, Reservoir.none(1));
    Model lattice =
        Model.ofAliasing(
            Projector.allModes().on(PeriodicGrid.of(Axis.of(10, 6))), h, Reservoir.none(1));
    Amplitudes initial = state(projected, seed);
    double atoms = ThermalPair.atoms(initial);
    double momentum = ThermalPair.momentum(initial);
    double[] energyErrors = new double[2];
    for (int i = 0; i < 2; i++) {
      Amplitudes end =
          ThermalPair.advance(
              projected, OuMidpoint.ofStep(0.01 / (1 << i)).withTolerance(1e-14), initial,
              200 << i);
      assertEquals(atoms, ThermalPair.atoms(end), 1e-11 * atoms);
      assertEquals(momentum, ThermalPair.momentum(end), 1e-10 * atoms);
      energyErrors[i] =
          Math.abs(
              ThermalPair.grandCanonical(projected, end)
                  - ThermalPair.grandCanonical(projected, initial));
    }
    double scale = atoms * atoms;
    assertTrue(energyErrors[0] < 1e-2 * scale, "energy error=" + energyErrors[0]);
    assertTrue(
        energyErrors[1] < energyErrors[0] / 3 + 1e-9 * scale,
        energyErrors[0] + " then " + energyErrors[1]);
    Amplitudes onLattice = state(lattice, seed);
    for (Integrator scheme :
        new Integrator[] {LatticeStrang.ofStep(0.01), LatticeComposition.yoshida(0.01)}) {
      assertEquals(
          ThermalPair.atoms(onLattice),
          ThermalPair.atoms(ThermalPair.advance(lattice, scheme, onLattice, 200)),
          1e-12 * ThermalPair.atoms(onLattice));
    }
  }

  /** T = 0, gamma > 0: K never increases. */
  @Property(tries = 25, seed = "72")
  void energyFallsAtZeroTemperature(
      @ForAll @IntRange(min = 1, max = 3) int components,
      @ForAll @DoubleRange(min = 0.2, max = 2) double g,
      @ForAll @DoubleRange(min = -0.1, max = 0.1) double inter,
      @ForAll @DoubleRange(min = -0.5, max = 0.5) double coupling,
      @ForAll @DoubleRange(min = 0.05, max = 1) double gamma,
      @ForAll @IntRange(min = 0, max = 1000) int seed) {
    double[] gammas = new double[components];
    for (int c = 0; c < components; c++) {
      gammas[c] = gamma / (1 + c);
    }
    Model model =
        Model.of(
            Projector.modesUpTo(4).on(PeriodicGrid.of(Axis.of(17, 6))),
            hamiltonian(components, g, inter, coupling, 0.2),
            Reservoir.of(0, 1, 0).withDampings(gammas));
    Amplitudes state = state(model, seed);
    Stepper stepper =
        Rk4Ip.ofStep(0.005)
            .bind(model, RandomStreams.counterBased(1).generator(model.region(), components, 1), 1);
    stepper.start(state, 0);
    double before = ThermalPair.grandCanonical(model, state);
    for (int s = 0; s < 200; s++) {
      stepper.advance();
      stepper.observe(state);
      double after = ThermalPair.grandCanonical(model, state);
      assertTrue(
          after <= before + 1e-12 * Math.abs(before), "step " + s + ": " + before + ", " + after);
      before = after;
    }
  }
}
