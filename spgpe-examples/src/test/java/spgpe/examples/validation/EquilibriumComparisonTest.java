package spgpe.examples.validation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import spgpe.observables.correlation.CorrelationFunction;
import spgpe.theory.Comparison;
import spgpe.theory.ComparisonTable;
import spgpe.theory.CoupledPair;
import spgpe.theory.PairEquilibrium;
import spgpe.theory.RingModes;

/**
 * A small version of {@link EquilibriumComparison}, seed fixed before the first run of this test: a
 * cold set, where the neglected order of the cutoff correction is 3e-4.
 *
 * <p>Bounds of 3.9 combined standard errors on eight numbers: false-alarm probability 8e-4 in all.
 * Power: shown by the second test, in which the same data are held against a temperature 5 % off.
 */
class EquilibriumComparisonTest {
  private static final double BOUND = 3.9;
  private static final EquilibriumComparison.Setting SET =
      new EquilibriumComparison.Setting(
          "small", new CoupledPair(1, 0.9, 0.1, 0.225, 0.1), new RingModes(24, 16), 72, 1.5, 4);
  private static EquilibriumComparison.Outcome outcome;

  @BeforeAll
  static void simulate() {
    outcome =
        EquilibriumComparison.measure(
            SET, new EquilibriumComparison.Effort(0.05, 32, 300, 20260102), Runnable::run);
  }

  @Test
  void agreesWithTheTransferOperator() {
    ComparisonTable table = EquilibriumComparison.table(outcome, true);
    assertEquals(4, table.rows().size());
    for (Comparison row : table.rows()) {
      assertTrue(Math.abs(row.sigmas()) < BOUND, table.toString());
    }
  }

  @Test
  void wouldFindATemperatureFivePercentOff() {
    EquilibriumComparison.Setting warmer =
        new EquilibriumComparison.Setting(
            "warmer", SET.pair().withTemperature(0.105), SET.ring(), SET.points(),
            SET.fitFrom(), SET.fitTo());
    EquilibriumComparison.Outcome same =
        new EquilibriumComparison.Outcome(
            warmer, outcome.density(), outcome.coherence(), outcome.sySquared(), outcome.sy());
    ComparisonTable table = EquilibriumComparison.table(same, true);
    Comparison sySquared = table.rows().get(2);
    assertTrue(sySquared.sigmas() < -2 * BOUND, table.toString());
  }

  @Test
  void measuredCorrelationFollowsTheExactCurveWithTheRingingOfTheCutoff() {
    CorrelationFunction exact = EquilibriumComparison.exactCurve(outcome);
    double moment = PairEquilibrium.withCutoff(SET.pair(), SET.ring()).sySquared();
    // line against ring of length 24, and the cutoff of the ring against its continuum form
    assertEquals(moment, exact.value(0), 3e-3 * moment);
    for (int i : new int[] {3, 6, 9, 12}) { // distances 1 to 4
      assertEquals(
          exact.value(i), outcome.sy().value(i), BOUND * outcome.sy().standardError(i),
          "distance " + exact.distance(i));
    }
  }

  @Test
  void missingModesAddUpToTheDirectSum() {
    double direct = 0;
    for (int n = SET.ring().cutoffMode() + 1; n < 200_000; n++) {
      double k = 2 * Math.PI * n / SET.ring().length();
      direct +=
          4 * SET.pair().temperature() / (k * k * SET.ring().length()) * Math.cos(k * 1.25);
    }
    assertEquals(direct, EquilibriumComparison.missing(SET, 1.25), 1e-8);
  }
}
