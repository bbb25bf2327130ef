package spgpe.examples.validation;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

/**
 * Growth under the explicit modulation against Floquet theory. No noise: the runs are
 * deterministic, and the bound of 3 % of the undamped rate is a hundred times the error of the time
 * step (docs/comparison.md). Power: a depth of the modulation wrong by 3.1 %, a frequency wrong by
 * 1 % (growth 13 % lower, half way to the edge of the band) or a damping wrong by 2.1 % is found.
 */
class ModulatedGrowthTest {
  private static final double BOUND = 0.03 * ModulatedGrowth.THEORY.resonantGrowthRate();

  @Test
  void growsAtThePredictedRateWithoutDamping() {
    double predicted = ModulatedGrowth.predicted(0);
    assertEquals(0.0994, predicted, 2e-4, "prediction near g n BesselJ_1(4 delta)");
    assertEquals(predicted, ModulatedGrowth.run(0, 100).growth(), BOUND);
  }

  @Test
  void isStableAboveThePredictedDampingAndUnstableBelow() {
    double threshold = ModulatedGrowth.THEORY.dampingForStability();
    ModulatedGrowth.Curve above = ModulatedGrowth.run(1.5 * threshold, 100);
    ModulatedGrowth.Curve below = ModulatedGrowth.run(0.5 * threshold, 100);
    assertEquals(ModulatedGrowth.predicted(1.5 * threshold), above.growth(), BOUND);
    assertEquals(ModulatedGrowth.predicted(0.5 * threshold), below.growth(), BOUND);
    assertTrue(above.growth() < -BOUND, "growth above the threshold: " + above.growth());
    assertTrue(below.growth() > BOUND, "growth below the threshold: " + below.growth());
  }
}
