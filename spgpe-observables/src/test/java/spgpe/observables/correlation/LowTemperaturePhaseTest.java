package spgpe.observables.correlation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.TimeAverage;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.theory.GaussianPhase;
import spgpe.theory.RingModes;

/**
 * The relative phase of the metastable state at low temperature, T = 0.0184 (barrier 28 T): nu =
 * 0.1, kappa = 0.225, mu = 1.1, L = 48, |n| &lt;= 24, gamma = 0.5, dt = 0.1.
 */
class LowTemperaturePhaseTest {
  private static final double TEMPERATURE = 0.0184;

  /** Grid points between the two phases: distances 0, 0.98, 1.96, 2.94. */
  private static final int[] STEPS = {0, 2, 4, 6};

  /** From a program of our own in another language, 96 trajectories. */
  private static final double[] MEASURED = {0.02428, 0.01485, 0.00731, 0.00391};

  private static final double[] ERROR = {5e-5, 5e-5, 4e-5, 4e-5};

  /** The Gaussian sum over the same modes, computed apart. */
  private static final double[] GAUSSIAN = {0.02243, 0.01342, 0.00637, 0.00333};

  /**
   * Within 4 combined standard errors of the other program at four distances, and above the
   * Gaussian theory (the limit of T to 0) by as many. False-alarm probability 2.5e-4 in all for the
   * first, below 1e-6 for the second. Power: the combined errors are bounded to 0.6 to 3.5 percent
   * of the correlation, so that a temperature wrong by 4 percent is found with probability 0.99,
   * and the Gaussian value itself, 8 to 15 percent low, with certainty.
   */
  @Test
  void exceedsTheGaussianCorrelationByTheKnownAmount() {
    Model model =
        Model.of(
            Projector.modesUpTo(24).on(PeriodicGrid.of(Axis.of(98, 48))),
            Hamiltonian.pair(1, 0).with(CoherentCoupling.constant(0.1))
                .with(BiquadraticCoupling.of(0.225)),
            Reservoir.of(TEMPERATURE, 1.1, 0.5));
    SpatialCorrelation observable = SpatialCorrelation.phaseDeviation(Math.PI);
    Recording<TimeAverage> phase =
        Recording.of(
            observable, Schedule.every(4).startingAt(40), TimeAverage.beforeDecay(40, 50));
    TimeAverage average =
        Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
            .integratedBy(OuRk4.ofStep(0.1)).trajectories(64).seed(81).until(290)
            .record(phase).run().get(phase);
    CorrelationFunction c = observable.raw(average, model);
    double mass = Math.sqrt(4 * (0.225 - 0.1));
    GaussianPhase gaussian = new GaussianPhase(mass, 1, TEMPERATURE);
    for (int i = 0; i < STEPS.length; i++) {
      int r = STEPS[i];
      double low = gaussian.onRing(c.distance(r), new RingModes(48, 24));
      assertEquals(GAUSSIAN[i], low, 6e-6, "Gaussian value at " + c.distance(r));
      double error = Math.hypot(c.standardError(r), ERROR[i]);
      assertTrue(
          error < (0.006 + 0.01 * c.distance(r)) * MEASURED[i],
          "error " + error + " at " + c.distance(r));
      assertEquals(MEASURED[i], c.value(r), 4 * error, "at distance " + c.distance(r));
      assertTrue(c.value(r) - low > 4 * c.standardError(r), "above " + low + ": " + c.value(r));
    }
  }
}
