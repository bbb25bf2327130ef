package spgpe.examples.validation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import spgpe.theory.Comparison;
import spgpe.theory.ComparisonTable;
import spgpe.theory.CoupledPair;
import spgpe.theory.PairEquilibrium;
import spgpe.theory.RingModes;

/**
 * A small version of {@link EquilibriumComparison}, seed fixed before the first run of this test: a
 * cold set, where the neglected order of the cutoff correction is 3e-4.
 *
 * <p>Bounds of 3.9 combined standard errors on four numbers: false-alarm probability 4e-4 in all.
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
  void fittedLengthOfTheExactCurveIsItsDecayLength() {
    double asymptotic =
        PairEquilibrium.of(EquilibriumComparison.shifted(SET)).syCorrelation().decayLength();
    double fitted =
        EquilibriumComparison.table(outcome, false).rows().get(3).prediction().value();
    // the first excited states of the sum still count at the smallest distance
    assertEquals(asymptotic, fitted, 0.02 * asymptotic);
  }
}
