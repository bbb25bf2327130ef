package spgpe.observables;

import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;
import spgpe.run.InitialState;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/** Synthetic fields with known properties. */
public final class Fields {
  private Fields() {}

  /** A complex function of position for each component. */
  @FunctionalInterface
  public interface Function {
    /** Writes (re, im) of a component at x. */
    void value(int component, double x, double[] value);
  }

  /** A ring whose grid carries all its modes, so that any field can be written. */
  public static CoherentRegion ring(int points, double length) {
    return Projector.allModes().on(PeriodicGrid.of(Axis.of(points, length)));
  }

  /** The metastable pair of the demonstration: nu = 0.1, kappa = 0.225. */
  public static Model pair(int largestMode, double length) {
    CoherentRegion region =
        Projector.modesUpTo(largestMode)
            .on(PeriodicGrid.of(Axis.holdingModes(largestMode, length)));
    return Model.of(
        region,
        Hamiltonian.pair(1, 0)
            .with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.225)),
        Reservoir.of(0.05, 1.1, 0.1));
  }

  /** A pair on a lattice of all modes. */
  public static Model latticePair(int points, double length) {
    return Model.ofAliasing(
        ring(points, length), Hamiltonian.pair(1, 0), Reservoir.of(0.05, 1, 0.1));
  }

  /** A snapshot of a given field. */
  public static Snapshot snapshot(Model model, double time, Function function) {
    Amplitudes state = new Amplitudes(model.region(), model.components(), 1);
    InitialState.fromField((c, x, y, value) -> function.value(c, x, value))
        .prepare(model, RandomStreams.counterBased(1).initialState(0), state);
    return Snapshot.of(model, state, time);
  }

  /** A pair of unit density with the given relative phase. */
  public static Snapshot withRelativePhase(
      Model model, java.util.function.DoubleUnaryOperator phase) {
    return snapshot(
        model, 0,
        (c, x, value) -> {
          double theta = c == 0 ? phase.applyAsDouble(x) : 0;
          value[0] = Math.cos(theta);
          value[1] = Math.sin(theta);
        });
  }

  /** Measures into a new array. */
  public static double[] measure(Observable observable, Snapshot snapshot) {
    double[] result = new double[observable.size(snapshot.model())];
    observable.measure(snapshot, result);
    return result;
  }

  /** Runs something that must be refused and gives the message. */
  public static String refusal(Runnable action) {
    return org.junit.jupiter.api.Assertions.assertThrows(
            IllegalArgumentException.class, action::run)
        .getMessage();
  }
}
