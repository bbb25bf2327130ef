package spgpe.integrate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.hamiltonian.ExactFlow;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.LocalTerm;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Field;
import spgpe.projector.ModeTransform;
import spgpe.projector.PointBlock;
import spgpe.reservoir.Reservoir;

/** Orders and drifts at gamma = 0 from a thermal state, t = 2. */
class DeterministicOrderTest {
  private static final double TIME = 2;
  private static final Model PROJECTED = ThermalPair.model(Reservoir.none(1));
  private static final Amplitudes THERMAL = ThermalPair.thermalState(PROJECTED, 5);
  private static final Amplitudes REFERENCE =
      ThermalPair.advance(PROJECTED, Rk4Ip.ofStep(TIME / 2560), THERMAL, 2560);

  private static double[] errors(
      Model model, Integrator scheme, Amplitudes initial, Amplitudes reference) {
    double[] errors = new double[3];
    for (int i = 0; i < errors.length; i++) {
      int steps = 100 << i;
      errors[i] =
          ThermalPair.distance(
              ThermalPair.advance(model, scheme.withStep(TIME / steps), initial, steps),
              reference);
    }
    return errors;
  }

  private static void requireOrder(double expected, double[] errors) {
    double order = Math.log(errors[1] / errors[2]) / Math.log(2);
    assertEquals(expected, order, 0.1, java.util.Arrays.toString(errors));
  }

  @Test
  void rk4InTheInteractionPictureIsOfOrderFour() {
    double[] errors = errors(PROJECTED, Rk4Ip.ofStep(1), THERMAL, REFERENCE);
    requireOrder(4, errors);
    assertEquals(4, Rk4Ip.ofStep(1).facts().deterministicOrder());
    assertTrue(errors[2] < 1e-7);
  }

  @Test
  void defaultIsOfOrderTwo() {
    requireOrder(2, errors(PROJECTED, OuRk4.ofStep(1), THERMAL, REFERENCE));
    assertEquals(2, OuRk4.ofStep(1).facts().deterministicOrder());
  }

  @Test
  void midpointAndHeunAreOfOrderTwo() {
    requireOrder(2, errors(PROJECTED, OuMidpoint.ofStep(1), THERMAL, REFERENCE));
    requireOrder(2, errors(PROJECTED, HeunIp.ofStep(1), THERMAL, REFERENCE));
  }

  @Test
  void latticeSchemesHaveTheirOrders() {
    Model model = ThermalPair.lattice(ThermalPair.hamiltonian(0.2, 0.2), Reservoir.none(1));
    Amplitudes initial = ThermalPair.thermalState(model, 6);
    Amplitudes reference =
        ThermalPair.advance(model, Rk4Ip.ofStep(TIME / 2560), initial, 2560);
    requireOrder(2, errors(model, LatticeStrang.ofStep(1), initial, reference));
    requireOrder(4, errors(model, LatticeComposition.yoshida(1), initial, reference));
  }

  @Test
  void blanesMoanIsOfOrderFourWhereTheLocalFlowIsExact() {
    for (Hamiltonian h :
        new Hamiltonian[] {ThermalPair.hamiltonian(0, 0.2), ThermalPair.hamiltonian(0.2, 1)}) {
      Model model = ThermalPair.lattice(h, Reservoir.none(1));
      Amplitudes initial = ThermalPair.thermalState(model, 6);
      Amplitudes reference =
          ThermalPair.advance(model, LatticeComposition.blanesMoan(TIME / 1600), initial, 1600);
      double[] errors = new double[2];
      for (int i = 0; i < 2; i++) {
        int steps = 50 << i;
        errors[i] =
            ThermalPair.distance(
                ThermalPair.advance(
                    model, LatticeComposition.blanesMoan(TIME / steps), initial, steps),
                reference);
      }
      assertEquals(
          4, Math.log(errors[0] / errors[1]) / Math.log(2), 0.1,
          java.util.Arrays.toString(errors));
      Amplitudes independent =
          ThermalPair.advance(model, Rk4Ip.ofStep(TIME / 2560), initial, 2560);
      assertTrue(ThermalPair.distance(reference, independent) < 1e-9);
    }
  }

  /**
   * The forbidden scheme, built from parts: project after the exact local flow. P exp(-iV dt)
   * differs from the projected flow by (dt^2/2) P V (1-P) V psi in each step, so the order is one
   * and the norm leaks in proportion to dt.
   */
  @Test
  void projectionAfterAnExactLocalFlowIsOfOrderOne() {
    double[] errors = new double[3];
    double[] losses = new double[3];
    for (int i = 0; i < 3; i++) {
      int steps = 200 << i;
      Amplitudes end = strangWithProjection(PROJECTED, THERMAL, TIME / steps, steps);
      errors[i] = ThermalPair.distance(end, REFERENCE);
      losses[i] = 1 - ThermalPair.atoms(end) / ThermalPair.atoms(THERMAL);
    }
    requireOrder(1, errors);
    assertTrue(losses[2] > 0);
    assertEquals(2, losses[1] / losses[2], 0.05);
  }

  private static Amplitudes strangWithProjection(
      Model model, Amplitudes initial, double dt, int steps) {
    ModeTable half = LinearFlow.over(dt / 2, model, 1);
    ModeTransform transform =
        model.region().transform(model.components(), 1, model.fourierProvider());
    Field psi = new Field(model.region().grid(), model.components(), 1);
    PointBlock block = PointBlock.ofAll(psi, new Field(psi.grid(), model.components(), 1));
    Amplitudes state = initial.copy();
    Amplitudes other = initial.copy();
    for (int s = 0; s < steps; s++) {
      half.multiply(state, other);
      transform.toPosition(other, psi);
      for (LocalTerm term : model.localTerms()) {
        ((ExactFlow) term).flow(0, dt / 2, block);
      }
      for (int t = model.localTerms().size() - 1; t >= 0; t--) {
        ((ExactFlow) model.localTerms().get(t)).flow(0, dt / 2, block);
      }
      transform.toModes(psi, other);
      half.multiply(other, state);
    }
    double mu = model.reservoir().chemicalPotential(0);
    for (int c = 0; c < state.components(); c++) {
      double cos = Math.cos(mu * dt * steps);
      double sin = Math.sin(mu * dt * steps);
      for (int e = 0; e < state.re(c).length; e++) {
        double re = state.re(c)[e];
        state.re(c)[e] = cos * re - sin * state.im(c)[e];
        state.im(c)[e] = cos * state.im(c)[e] + sin * re;
      }
    }
    return state;
  }

  /**
   * At dt = 0.05 the default conserves atoms and momentum, RK4IP leaks both; the energy of the
   * default oscillates by O(dt^2), that of RK4IP drifts.
   */
  @Test
  void driftsOfAtomNumberAndMomentum() {
    int steps = 40;
    Amplitudes split =
        ThermalPair.advance(PROJECTED, OuRk4.ofStep(TIME / steps), THERMAL, steps);
    Amplitudes lawson =
        ThermalPair.advance(PROJECTED, Rk4Ip.ofStep(TIME / steps), THERMAL, steps);
    Amplitudes midpoint =
        ThermalPair.advance(PROJECTED, OuMidpoint.ofStep(TIME / steps), THERMAL, steps);
    double atoms = ThermalPair.atoms(THERMAL);
    double momentum = ThermalPair.momentum(THERMAL);
    double energy = ThermalPair.grandCanonical(PROJECTED, THERMAL);
    assertTrue(Math.abs(ThermalPair.atoms(split) / atoms - 1) < 5e-9);
    assertTrue(Math.abs(ThermalPair.momentum(split) - momentum) < 5e-8);
    assertTrue(
        Math.abs(ThermalPair.grandCanonical(PROJECTED, split) / energy - 1) < 1e-3);
    assertTrue(Math.abs(ThermalPair.atoms(midpoint) / atoms - 1) < 1e-11);
    assertTrue(Math.abs(ThermalPair.momentum(midpoint) - momentum) < 1e-10);
    double leak = Math.abs(ThermalPair.atoms(lawson) / atoms - 1);
    assertTrue(leak > 1e-7 && leak < 1e-5, "leak=" + leak);
    assertTrue(Math.abs(ThermalPair.momentum(lawson) - momentum) < 1e-3);
    assertTrue(
        ThermalPair.distance(lawson, REFERENCE) < ThermalPair.distance(split, REFERENCE) / 10);
  }

  /** The energy error of the default is bounded: it does not grow from t = 20 to t = 200. */
  @Test
  void energyOfTheDefaultOscillatesWithoutDrift() {
    double energy = ThermalPair.grandCanonical(PROJECTED, THERMAL);
    Amplitudes state = THERMAL;
    double early = 0;
    double late = 0;
    for (int i = 0; i < 40; i++) {
      state = ThermalPair.advance(PROJECTED, OuRk4.ofStep(0.05), state, 100);
      double error = Math.abs(ThermalPair.grandCanonical(PROJECTED, state) / energy - 1);
      if (i < 4) {
        early = Math.max(early, error);
      } else {
        late = Math.max(late, error);
      }
    }
    assertTrue(late < 3 * early && late < 1e-3, "early=" + early + ", late=" + late);
    assertEquals(1, ThermalPair.atoms(state) / ThermalPair.atoms(THERMAL), 1e-7);
  }
}
