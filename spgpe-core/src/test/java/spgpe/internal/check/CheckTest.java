package spgpe.internal.check;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;

class CheckTest {
  private static void assertMessage(String expected, Runnable call) {
    assertEquals(
        expected, assertThrows(IllegalArgumentException.class, call::run).getMessage());
  }

  @Test
  void messagesGiveTheRuleAndTheValue() {
    assertMessage("x must be finite: x=NaN", () -> Check.finite(Double.NaN, "x"));
    assertMessage(
        "x must be finite and > 0: x=0.0", () -> Check.positive(0, "x"));
    assertMessage(
        "x must be finite and >= 0: x=-1.0", () -> Check.notNegative(-1, "x"));
    assertMessage("n must lie in 1..3: n=4", () -> Check.inRange(4, 1, 3, "n"));
    assertMessage("x must not be null", () -> Check.notNull(null, "x"));
    assertMessage("because a=1, b=two", () -> Check.argument(false, "because a=%s, b=%s", 1, "two"));
    assertEquals(
        "not now",
        assertThrows(IllegalStateException.class, () -> Check.state(false, "not now"))
            .getMessage());
  }

  @Test
  void everyComparisonRefusesNaNAndInfinity() {
    for (double bad :
        new double[] {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY}) {
      assertThrows(IllegalArgumentException.class, () -> Check.finite(bad, "x"));
      assertThrows(IllegalArgumentException.class, () -> Check.positive(bad, "x"));
      assertThrows(IllegalArgumentException.class, () -> Check.notNegative(bad, "x"));
    }
  }

  @Test
  void goodValuesComeBack() {
    assertEquals(-2, Check.finite(-2, "x"), 0);
    assertEquals(Double.MIN_VALUE, Check.positive(Double.MIN_VALUE, "x"), 0);
    assertEquals(0, Check.notNegative(0, "x"), 0);
    assertEquals(3, Check.inRange(3, 1, 3, "n"));
    assertEquals("y", Check.notNull("y", "x"));
    Check.argument(true, "never");
    Check.state(true, "never");
    Check.state(true, "never %s", 1);
  }
}
