package spgpe.model;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ContactInteraction;
import spgpe.hamiltonian.Detuning;
import spgpe.hamiltonian.ExternalPotential;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.ModulatedCoupling;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/** Energies and forces of plane waves, term by term, against closed forms. */
class EnergyTest {
  private static final double LENGTH = 12;
  private static final CoherentRegion REGION =
      Projector.modesUpTo(6).on(PeriodicGrid.of(Axis.of(32, LENGTH)));
  private static final double N1 = 0.8;
  private static final double N2 = 0.5;
  private static final double PHASE = 0.7;

  private static Model model() {
    return Model.of(
        REGION,
        Hamiltonian.ofMasses(1, 0.5)
            .with(ContactInteraction.ofMatrix(new double[][] {{1, 0.3}, {0.3, 0.9}}))
            .with(CoherentCoupling.constant(0.2))
            .with(BiquadraticCoupling.of(0.4))
            .with(Detuning.ofPair(0.6))
            .with(ModulatedCoupling.of(0.1, 2).withPhase(0.3))
            .with(ExternalPotential.onLine("dip", x -> Math.cos(2 * Math.PI * x / LENGTH)))
            .with(
                ExternalPotential.onLine("shelf", x -> 0.25).forComponent(1)),
        Reservoir.none(0).withChemicalPotentials(1.1, 0.9));
  }

  /** psi_1 = sqrt(n1) exp(i k x), psi_2 = sqrt(n2) exp(i k x + i phase), same k. */
  private static Amplitudes planeWaves(int mode) {
    Amplitudes state = new Amplitudes(REGION, 2, 1);
    int m = REGION.indexOf(mode);
    state.re(0)[m] = Math.sqrt(N1 * LENGTH);
    state.re(1)[m] = Math.sqrt(N2 * LENGTH) * Math.cos(PHASE);
    state.im(1)[m] = Math.sqrt(N2 * LENGTH) * Math.sin(PHASE);
    return state;
  }

  @Test
  void everyTermOfAPlaneWaveHasItsClosedForm() {
    EnergyMeter meter = new EnergyMeter(model());
    double k = 2 * Math.PI * 2 / LENGTH;
    double time = 0.9;
    double pair = 2 * Math.sqrt(N1 * N2) * Math.cos(PHASE) * LENGTH;
    double sine = Math.sqrt(N1 * N2) * Math.sin(PHASE);
    double[] expected = {
      LENGTH * (N1 * k * k / 2 + N2 * k * k), // kinetic, masses 1 and 1/2
      -0.2 * pair, // coherent coupling
      LENGTH * 0.3 * (N1 - N2), // detuning
      LENGTH * (0.5 * N1 * N1 + 0.3 * N1 * N2 + 0.45 * N2 * N2), // contact
      LENGTH * 0.4 * sine * sine, // biquadratic
      -0.1 * Math.cos(2 * time + 0.3) * pair, // modulated
      0, // the dip averages out
      0.25 * N2 * LENGTH // shelf under component 1
    };
    double[] found = meter.byTerm(time, planeWaves(2));
    assertArrayEquals(expected, found, 1e-12);
    assertEquals(8, meter.names().size());
    assertTrue(meter.names().get(0).startsWith("Kinetic"));
    assertTrue(meter.names().get(3).startsWith("ContactInteraction"));
    double energy = 0;
    for (double e : expected) {
      energy += e;
    }
    assertEquals(energy, meter.energy(time, planeWaves(2)), 1e-11);
    assertEquals(
        energy - LENGTH * (1.1 * N1 + 0.9 * N2), meter.grandCanonical(time, planeWaves(2)), 1e-11);
  }

  @Test
  void thePotentialMixesNeighbouringModes() {
    Model model =
        Model.of(
            REGION,
            Hamiltonian.ofMasses(1)
                .with(ExternalPotential.onLine("dip", x -> Math.cos(2 * Math.PI * x / LENGTH))),
            Reservoir.none(0));
    Amplitudes state = new Amplitudes(REGION, 1, 1);
    state.re(0)[REGION.indexOf(2)] = 1;
    state.re(0)[REGION.indexOf(3)] = 1;
    // <k|cos|k'> = 1/2 for neighbours, twice (both orders)
    assertEquals(1, new EnergyMeter(model).byTerm(0, state)[1], 1e-13);
  }

  @Test
  void theForceOfAUniformCondensateIsItsChemicalPotentialMismatch() {
    Model model =
        Model.of(
            REGION,
            Hamiltonian.pair(1, 0.2).with(CoherentCoupling.constant(0.1)),
            Reservoir.none(1));
    Amplitudes state = new Amplitudes(REGION, 2, 1);
    int zero = REGION.indexOf(0);
    double root = Math.sqrt(N1 * LENGTH);
    state.re(0)[zero] = root;
    state.re(1)[zero] = -root;
    Amplitudes force = new Amplitudes(REGION, 2, 1);
    model.evaluator(1).force(0, state, force);
    double expected = (1.2 * N1 - 1 + 0.1) * root; // phase pi: +J
    assertEquals(expected, force.re(0)[zero], 1e-13);
    assertEquals(-expected, force.re(1)[zero], 1e-13);
    assertEquals(0, force.im(0)[zero], 1e-13);
    assertTrue(model.chemicalPotentialActsLocally());
  }

  @Test
  void withoutLocalTermsTheChemicalPotentialIsInTheLinearPart() {
    Model ideal = Model.of(REGION, Hamiltonian.ofMasses(2), Reservoir.of(1, -0.5, 0.1));
    int m = REGION.indexOf(3);
    assertEquals(REGION.kSquared(m) / 4 + 0.5, ideal.linearPart().re(m, 0, 0), 1e-15);
    Amplitudes state = new Amplitudes(REGION, 1, 1);
    state.im(0)[m] = 2;
    Amplitudes force = new Amplitudes(REGION, 1, 1);
    ideal.evaluator(1).force(0, state, force);
    assertEquals(REGION.kSquared(m) / 2 + 1, force.im(0)[m], 1e-14);
    ideal.evaluator(1).localForce(0, state, force);
    assertEquals(0, force.im(0)[m], 0);
  }

  @Test
  void twoLanesAreTwoIndependentStates() {
    Model model = model();
    Amplitudes one = ModelArbitraries.state(model, 1);
    Amplitudes two = ModelArbitraries.state(model, 2);
    Amplitudes both = new Amplitudes(REGION, 2, 2);
    both.setLane(0, one);
    both.setLane(1, two);
    Amplitudes force = new Amplitudes(REGION, 2, 2);
    model.evaluator(2).force(0.4, both, force);
    Amplitudes expected = new Amplitudes(REGION, 2, 1);
    Amplitudes found = new Amplitudes(REGION, 2, 1);
    for (int lane = 0; lane < 2; lane++) {
      model.evaluator(1).force(0.4, lane == 0 ? one : two, expected);
      force.copyLane(lane, found);
      assertArrayEquals(expected.re(0), found.re(0));
      assertArrayEquals(expected.im(1), found.im(1));
    }
  }

  @Test
  void statesOfAnotherShapeAndTimesThatAreNotFiniteAreRefused() {
    EnergyMeter meter = new EnergyMeter(model());
    Amplitudes single = new Amplitudes(REGION, 1, 1);
    assertRefused("shapes must agree", () -> meter.energy(0, single));
    assertRefused("time=NaN", () -> meter.energy(Double.NaN, planeWaves(0)));
    ForceEvaluator evaluator = model().evaluator(1);
    assertRefused("time=Infinity", () ->
        evaluator.force(Double.POSITIVE_INFINITY, planeWaves(0), planeWaves(0)));
    assertRefused("shapes must agree", () -> evaluator.force(0, single, planeWaves(0)));
    assertRefused("shapes must agree", () -> evaluator.force(0, planeWaves(0), single));
  }

  private static void assertRefused(String expected, Runnable call) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    assertTrue(message.contains(expected), message);
  }
}
