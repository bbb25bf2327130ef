package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class ScheduleTest {
  private static void assertRefused(Runnable call, String... expected) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    for (String part : expected) {
      assertTrue(message.contains(part), message);
    }
  }

  @Test
  void aRegularScheduleRunsToTheEnd() {
    assertArrayEquals(new long[] {0, 4, 8}, Schedule.every(0.4).steps(0.1, 10));
    assertArrayEquals(new long[] {0, 4, 8}, Schedule.every(0.4).steps(0.1, 8));
    assertArrayEquals(
        new long[] {6, 10}, Schedule.every(0.4).startingAt(0.6).steps(0.1, 10));
    assertArrayEquals(new long[0], Schedule.every(0.4).startingAt(2).steps(0.1, 10));
    assertEquals("every 0.4 from 0.6", Schedule.every(0.4).startingAt(0.6).toString());
  }

  @Test
  void aListStopsAtTheEnd() {
    assertArrayEquals(
        new long[] {0, 3, 10}, Schedule.at(0, 0.3, 1, 1.1).steps(0.1, 10));
    assertEquals("at [0.0, 0.3]", Schedule.at(0, 0.3).toString());
  }

  @Test
  void timesThatAreNotWholeStepsAreRefusedWithBothNumbers() {
    assertRefused(
        () -> Schedule.every(0.25).steps(0.1, 10), "whole number", "time=0.25", "time step=0.1");
    assertRefused(() -> Schedule.every(0.04).steps(0.1, 10), "time=0.04");
    assertRefused(() -> Schedule.every(0.2).startingAt(0.05).steps(0.1, 10), "start", "time=0.05");
    assertRefused(() -> Schedule.at(0.1, 0.15).steps(0.1, 10), "scheduled time", "time=0.15");
    assertRefused(() -> Schedule.wholeSteps(1e300, 1e-3, "end time"), "2^47", "time=1.0E300");
    assertRefused(() -> Schedule.wholeSteps(1e300, 1e-300, "end time"), "2^47");
  }

  @Test
  void listedTimesOnOneStepAreRefusedBecauseOneWouldBeLost() {
    assertRefused(
        () -> Schedule.at(0.5, 0.50000001, 0.7).steps(0.1, 10), "different time steps",
        "time=0.50000001");
  }

  @Test
  void badTimesAreRefused() {
    for (double bad :
        new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY}) {
      assertRefused(() -> Schedule.every(bad), "interval (time)", "=" + bad);
    }
    for (double bad : new double[] {-1, Double.NaN, Double.POSITIVE_INFINITY}) {
      assertRefused(() -> Schedule.at(bad), "scheduled time=" + bad);
      assertRefused(() -> Schedule.every(1).startingAt(bad), "start (time)=" + bad);
    }
    assertRefused(() -> Schedule.at(), "at least one");
    assertRefused(() -> Schedule.at(1, 1), "increase", "times[1]=1.0");
    assertRefused(() -> Schedule.at(2, 1), "increase", "times[0]=2.0");
    assertThrows(IllegalStateException.class, () -> Schedule.at(1).startingAt(2));
    assertRefused(() -> Schedule.every(1e-3).steps(1e-3, 1L << 40), "50000000", "count=");
  }
}
