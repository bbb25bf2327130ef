package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

class ComparisonTest {

  @Test
  void exactPrediction() {
    Prediction p = Prediction.exact(2, .03);
    Comparison good = new Comparison("density", 2.1, .04, p);
    assertEquals(2, good.sigmas(), 1e-12);
    assertEquals(.05, good.relativeDifference(), 1e-12);
    assertEquals(.05, good.combinedError(), 1e-15);
    assertEquals(Comparison.Verdict.AGREES, good.verdict());
    Comparison bad = new Comparison("density", 1.8, .04, p);
    assertEquals(-4, bad.sigmas(), 1e-12);
    assertEquals(Comparison.Verdict.DIFFERS, bad.verdict());
    assertEquals(Comparison.Verdict.UNDECIDED, new Comparison("d", 2, 1.5, p).verdict());
    assertEquals(
        Comparison.Verdict.AGREES,
        new Comparison("zero", .1, .1, Prediction.exact(0, 0)).verdict());
  }

  @Test
  void bandPrediction() {
    Prediction p = new Prediction(10, 0, .5, 1.05, List.of("checked in 1D only"));
    assertEquals(
        Comparison.Verdict.WITHIN_BAND, new Comparison("rate", 6, .2, p).verdict());
    assertEquals(
        Comparison.Verdict.WITHIN_BAND, new Comparison("rate", 4.5, .2, p).verdict());
    Comparison low = new Comparison("rate", 4, .2, p);
    assertEquals(5, low.sigmasOutsideBand(), 1e-12);
    assertEquals(Comparison.Verdict.DIFFERS, low.verdict());
    assertEquals(Comparison.Verdict.DIFFERS, new Comparison("rate", 12, .2, p).verdict());
    assertEquals(List.of("checked in 1D only"), low.warnings());
    // A negative prediction has its band on the other side.
    Prediction negative = new Prediction(-10, 0, .5, 1, List.of());
    assertEquals(
        Comparison.Verdict.WITHIN_BAND, new Comparison("x", -7, .2, negative).verdict());
  }

  @Test
  void tablePrintsItself() {
    ComparisonTable table =
        ComparisonTable.empty()
            .with("density", 2.1, .04, Prediction.exact(2, .03))
            .with("rate", 4, .2, new Prediction(10, 0, .5, 1.05, List.of("low damping")))
            .with("noisy", 2, 1.5, Prediction.exact(2, 0));
    assertEquals(1, table.differing());
    assertEquals(3, table.rows().size());
    List<String> lines = table.toString().lines().toList();
    assertEquals(6, lines.size());
    assertTrue(lines.get(1).endsWith("agrees"), lines.get(1));
    assertTrue(lines.get(1).contains("+2.00"), lines.get(1));
    assertTrue(lines.get(2).endsWith("DIFFERS [1]"), lines.get(2));
    assertTrue(lines.get(3).endsWith("undecided [2]"), lines.get(3));
    assertEquals("[1] low damping", lines.get(4));
    assertTrue(table.rows().get(0).toString().contains("+2.00 sigma"));
  }

  @Test
  void refusals() {
    Prediction p = Prediction.exact(1, 0);
    assertThrows(
        IllegalArgumentException.class, () -> new Comparison("x", Double.NaN, 1, p));
    assertThrows(IllegalArgumentException.class, () -> new Comparison("x", 1, 0, p));
    assertThrows(IllegalArgumentException.class, () -> Prediction.exact(Double.NaN, 0));
    assertThrows(
        IllegalArgumentException.class, () -> new Prediction(1, 0, 1, .5, List.of()));
  }
}
