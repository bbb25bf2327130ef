package spgpe.examples.docs;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;
import spgpe.theory.Comparison;
import spgpe.theory.ComparisonTable;

/** Runs the code of docs/right-run.md and holds its statements to the results. */
class RightRunTest {
  /**
   * Fixed seed; three rows with bounds of three combined errors: false-alarm probability at most
   * 0.8 %. Power: as {@code EquilibriumComparisonTest}, with a tenth of the samples.
   */
  @Test
  void theTutorialAgreesWithTheory() {
    ComparisonTable table = RightRun.equilibrium(Runnable::run);
    assertEquals(3, table.rows().size());
    assertEquals(0, table.differing(), table.toString());
  }

  @Test
  void theDecayRateOfTheTutorialLiesInTheBand() {
    Comparison decay = RightRun.decay();
    assertEquals(0.65, decay.measured() / decay.prediction().value(), 0.005);
    assertEquals(Comparison.Verdict.WITHIN_BAND, decay.verdict());
  }
}
