package spgpe.grid;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class GridTest {
  private static void assertRefused(String expected, Runnable call) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    assertTrue(message.contains(expected), message);
  }

  @Test
  void anAxisKnowsItsPointsAndWaveNumbers() {
    Axis axis = Axis.of(8, 4);
    assertEquals(0.5, axis.spacing(), 0);
    assertEquals(1.5, axis.position(3), 0);
    assertEquals(3 * Math.PI / 2, axis.waveNumber(3), 1e-15);
    assertEquals(-4, axis.lowestMode());
    assertEquals(3, axis.highestMode());
    Axis odd = Axis.of(9, 4);
    assertEquals(-4, odd.lowestMode());
    assertEquals(4, odd.highestMode());
    assertEquals(axis, new Axis(8, 4));
  }

  @Test
  void holdingModesTakesTheFirstPowerOfTwoWithFourTimesTheModesPlusOne() {
    for (int largest = 1; largest <= 300; largest++) {
      int points = Axis.holdingModes(largest, 1).points();
      assertEquals(1, Integer.bitCount(points));
      assertTrue(points >= 4 * largest + 1 && points / 2 < 4 * largest + 1, "modes " + largest);
    }
    assertEquals(1 << 20, Axis.holdingModes(1 << 17, 1).points());
    assertRefused("largestMode=0", () -> Axis.holdingModes(0, 1));
    assertRefused("largestMode=131073", () -> Axis.holdingModes((1 << 17) + 1, 1));
  }

  @Test
  void aPlaneCountsAlongXFirst() {
    PeriodicGrid plane = PeriodicGrid.of(Axis.of(4, 2), Axis.of(3, 9));
    assertEquals(2, plane.dimension());
    assertEquals(12, plane.points());
    assertEquals(18, plane.volume(), 0);
    assertEquals(1.5, plane.cellVolume(), 0);
    assertEquals(1.5, plane.coordinate(0, 7), 0);
    assertEquals(3, plane.coordinate(1, 7), 0);
    assertEquals(plane, PeriodicGrid.of(Axis.of(4, 2), Axis.of(3, 9)));
    assertEquals(plane.hashCode(), PeriodicGrid.of(Axis.of(4, 2), Axis.of(3, 9)).hashCode());
    assertNotEquals(plane, PeriodicGrid.of(Axis.of(3, 9), Axis.of(4, 2)));
    assertTrue(plane.toString().contains("4 points over length 2.0 x 3 points"), plane.toString());
  }

  @Test
  void badAxesAreRefusedByNameAndValue() {
    for (double length :
        new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY}) {
      assertRefused("length=" + length, () -> Axis.of(8, length));
    }
    for (int points : new int[] {1, 0, -8, (1 << 20) + 1, Integer.MAX_VALUE}) {
      assertRefused("points=" + points, () -> Axis.of(points, 1));
    }
    assertRefused("representable", () -> Axis.of(8, Double.MIN_VALUE));
    assertRefused("representable", () -> Axis.of(8, 1e308));
    assertRefused("representable", () -> Axis.of(8, 1e-160));
  }

  @Test
  void badGridsAndIndicesAreRefused() {
    Axis large = Axis.of(1 << 20, 1);
    assertRefused("points=1099511627776", () -> PeriodicGrid.of(large, large));
    assertRefused(
        "volume", () -> PeriodicGrid.of(Axis.of(8, 1e200), Axis.of(8, 1e200)));
    PeriodicGrid line = PeriodicGrid.of(Axis.of(8, 1));
    assertRefused("axis index=1", () -> line.axis(1));
    assertRefused("axis index=-1", () -> line.coordinate(-1, 0));
    assertRefused("point index=8", () -> line.coordinate(0, 8));
    assertRefused("point index=-1", () -> line.coordinate(0, -1));
  }
}
