package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ContactInteraction;
import spgpe.hamiltonian.Detuning;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.InitialState;
import spgpe.run.Observable;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.TimeSeries;
import spgpe.run.Trajectory;

/** Solutions known in closed form, at gamma = 0. */
class ClosedFormTest {
  private static Model model(int cutoff, double length, Hamiltonian hamiltonian, double mu) {
    return Model.of(
        Projector.modesUpTo(cutoff).on(PeriodicGrid.of(Axis.holdingModes(cutoff, length))),
        hamiltonian, Reservoir.none(mu));
  }

  private static double distance(Amplitudes a, Amplitudes b) {
    double difference = 0;
    double size = 0;
    for (int c = 0; c < a.components(); c++) {
      for (int m = 0; m < a.region().modes(); m++) {
        difference += Math.pow(a.re(c)[m] - b.re(c)[m], 2) + Math.pow(a.im(c)[m] - b.im(c)[m], 2);
        size += Math.pow(b.re(c)[m], 2) + Math.pow(b.im(c)[m], 2);
      }
    }
    return Math.sqrt(difference / size);
  }

  private static void requireSolution(
      Model model, InitialState.FieldFunction at0, InitialState.FieldFunction atEnd, double time) {
    Amplitudes expected = new Amplitudes(model.region(), model.components(), 1);
    Trajectory plan = Trajectory.of(model).startingFrom(InitialState.fromField(at0)).seed(1, 0);
    InitialState.fromField(atEnd)
        .prepare(
            model, spgpe.reservoir.RandomStreams.counterBased(1).initialState(0), expected);
    Amplitudes fourth =
        plan.integratedBy(Rk4Ip.ofStep(time / 2000)).until(time).run().finalState();
    double error = distance(fourth, expected);
    assertTrue(error < 1e-7, "RK4IP error=" + error);
    double[] second = new double[2];
    for (int i = 0; i < 2; i++) {
      second[i] =
          distance(
              plan.integratedBy(OuRk4.ofStep(time / (1000 << i))).until(time).run().finalState(),
              expected);
    }
    assertTrue(second[1] < 1e-3, "OuRk4 error=" + second[1]);
    assertEquals(4, second[0] / second[1], 0.2);
  }

  /**
   * Two grey solitons running towards each other, psi = i v + B tanh(B (x - v t)), B^2 = 1 - v^2,
   * at g = n = 1 (Tsuzuki, J. Low Temp. Phys. 4, 441 (1971)). Each moves in the other's uniform
   * background: the product is exact up to exp(-2 B distance).
   */
  @Test
  void darkSolitons() {
    double v = 0.3;
    double b = Math.sqrt(1 - v * v);
    double length = 60;
    double time = 4;
    Model model = model(140, length, Hamiltonian.single(1), 1);
    requireSolution(model, greyPair(v, b, length, 0), greyPair(v, b, length, time), time);
  }

  private static InitialState.FieldFunction greyPair(
      double v, double b, double length, double t) {
    return (c, x, y, psi) -> {
      double first = b * Math.tanh(b * (x - length / 4 - v * t));
      double second = b * Math.tanh(b * (x - 3 * length / 4 + v * t));
      // (i v + first)(-i v + second)
      psi[0] = first * second + v * v;
      psi[1] = v * (second - first);
    };
  }

  /**
   * Vector bright soliton of equal attractive couplings, psi_j = c_j A sech(A (x - v t)) exp(i v x
   * + i (A^2 - v^2) t/2), sum of |c_j|^2 = 1 (Manakov, Sov. Phys. JETP 38, 248 (1974)).
   */
  @Test
  void manakovVectorSoliton() {
    double length = 60;
    double v = 2 * Math.PI * 5 / length;
    double time = 4;
    Model model =
        model(200, length, Hamiltonian.ofMasses(1, 1).with(ContactInteraction.ofPair(-1, -1)), 0);
    requireSolution(model, vectorSoliton(v, length, 0), vectorSoliton(v, length, time), time);
  }

  private static InitialState.FieldFunction vectorSoliton(double v, double length, double t) {
    return (c, x, y, psi) -> {
      double share = c == 0 ? 0.6 : 0.8;
      double size = share / Math.cosh(x - length / 2 - v * t);
      double angle = v * x + (1 - v * v) * t / 2 + 0.4 * c;
      psi[0] = size * Math.cos(angle);
      psi[1] = size * Math.sin(angle);
    };
  }

  private static double[][] series(
      Model model, InitialState start, Integrator scheme, Observable observable, double interval,
      double until) {
    Recording<TimeSeries> recording =
        Recording.of(observable, Schedule.every(interval), TimeSeries::new);
    return Trajectory.of(model).startingFrom(start).integratedBy(scheme).seed(1, 0).until(until)
        .record(recording).run().get(recording).series().get(0).values();
  }

  /**
   * Detuned Rabi oscillation: all atoms in component 1 at t = 0, N_2/N = (4 J^2/W^2) sin^2(W t/2),
   * W^2 = 4 J^2 + delta^2 (Rabi, Phys. Rev. 51, 652 (1937)); equal couplings leave it unchanged.
   */
  @ParameterizedTest
  @ValueSource(doubles = {0, 0.7})
  void rabiOscillation(double delta) {
    double j = 0.4;
    Hamiltonian h =
        Hamiltonian.pair(1.3, 1.3)
            .with(CoherentCoupling.constant(j))
            .with(Detuning.ofPair(delta));
    Model model = model(3, 10, h, 0.5);
    double[][] found =
        series(
            model, InitialState.uniform(1, 0), OuRk4.ofStep(0.01),
            Observable.scalar("N_2", s -> s.amplitudes().atomNumber(1, 0)), 0.5, 10);
    double w = Math.sqrt(4 * j * j + delta * delta);
    for (int i = 0; i < found.length; i++) {
      double expected = 10 * Math.pow(2 * j / w * Math.sin(w * 0.5 * i / 2), 2);
      // both flows are exact and commute but for rounding and the RK4 error of the phase
      assertEquals(expected, found[i][0], 1e-8);
    }
  }

  /**
   * Small oscillations from the times of zero crossing of a signal that starts at its maximum or
   * zero: mean distance of crossings is half a period.
   */
  private static double frequency(double[][] signal, double interval) {
    double first = Double.NaN;
    double last = Double.NaN;
    int crossings = 0;
    for (int i = 1; i < signal.length; i++) {
      double before = signal[i - 1][0];
      double after = signal[i][0];
      if ((before < 0) != (after < 0)) {
        double t = interval * (i - 1 + before / (before - after));
        if (crossings == 0) {
          first = t;
        }
        last = t;
        crossings++;
      }
    }
    return Math.PI * (crossings - 1) / (last - first);
  }

  /**
   * Josephson plasma frequency of a uniform pair about phase 0: w^2 = (2J + 2 kappa n)(2J + 2 (g -
   * g_12) n) (for kappa = 0 Whitlock and Bouchoule, Phys. Rev. A 68, 053609 (2003), from memory;
   * the biquadratic part is derived in docs/validation.md).
   */
  @ParameterizedTest
  @ValueSource(doubles = {0, 0.15})
  void josephsonPlasmaFrequency(double kappa) {
    double j = 0.1;
    double g = 1;
    double inter = 0.3;
    double n = 1.2;
    Hamiltonian h =
        Hamiltonian.pair(g, inter)
            .with(CoherentCoupling.constant(j))
            .with(BiquadraticCoupling.of(kappa));
    Model model = model(3, 5, h, (g + inter) * n - j);
    double theta = 1e-4;
    InitialState start =
        InitialState.uniform(new double[] {n, n}, new double[] {theta, -theta});
    double[][] difference =
        series(
            model, start, Rk4Ip.ofStep(0.01),
            Observable.scalar(
                "N_1 - N_2",
                s -> s.amplitudes().atomNumber(0, 0) - s.amplitudes().atomNumber(1, 0)),
            0.05, 100);
    difference[0][0] = difference[1][0]; // starts at exactly zero
    double expected =
        Math.sqrt((2 * j + 2 * kappa * n) * (2 * j + 2 * (g - inter) * n));
    assertEquals(1, frequency(difference, 0.05) / expected, 1e-5);
  }

  /**
   * Bogoliubov dispersion E = sqrt(eps (eps + 2 g n)) (Bogoliubov, J. Phys. USSR 11, 23 (1947)).
   */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 5, 9})
  void bogoliubovDispersion(int n) {
    double length = 20;
    Model model = model(10, length, Hamiltonian.single(1), 1);
    double k = 2 * Math.PI * n / length;
    InitialState start =
        InitialState.fromField((c, x, y, psi) -> psi[0] = 1 + 1e-5 * Math.cos(k * x));
    int plus = model.region().indexOf(n);
    double[][] signal =
        series(
            model, start, Rk4Ip.ofStep(0.01),
            Observable.scalar("Re a_k", s -> s.amplitudes().re(0)[plus]), 0.02, 100);
    double eps = k * k / 2;
    assertEquals(1, frequency(signal, 0.02) / Math.sqrt(eps * (eps + 2)), 1e-5);
  }
}
