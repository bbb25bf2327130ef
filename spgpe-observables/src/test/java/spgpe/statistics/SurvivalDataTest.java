package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static spgpe.statistics.Messages.assertRefused;

import org.junit.jupiter.api.Test;

class SurvivalDataTest {
  private final SurvivalData data =
      SurvivalData.of(new double[] {4, 10, 12, 30}, new boolean[] {true, true, false, false});

  @Test
  void truncationDropsEarlyTrajectoriesAndTheirTransient() {
    SurvivalData truncated = data.truncatedBefore(10);
    assertEquals(2, truncated.size());
    assertEquals(0, truncated.eventCount());
    assertEquals(2 + 20, truncated.exposure());
    assertEquals(10, truncated.entryTime(0));
    assertEquals(12, truncated.endTime(0));
    assertSame(data, data.truncatedBefore(0));
    assertEquals(
        15, truncated.truncatedBefore(15).exposure(), "a later entry replaces the earlier");
  }

  @Test
  void censoringTurnsLaterEventsIntoCensoredOnes() {
    SurvivalData censored = data.censoredAfter(10);
    assertEquals(2, censored.eventCount(), "an event at the end time counts");
    assertEquals(34, censored.exposure());
    SurvivalData earlier = data.censoredAfter(9.5);
    assertEquals(1, earlier.eventCount());
    assertFalse(earlier.isEvent(1));
    assertTrue(earlier.isEvent(0));
    assertEquals(2, data.truncatedBefore(10).censoredAfter(11).exposure());
  }

  @Test
  void inputArraysAreCopied() {
    double[] times = {1, 2};
    boolean[] events = {true, true};
    SurvivalData copy = SurvivalData.of(times, events);
    times[0] = 7;
    events[1] = false;
    assertEquals(3, copy.exposure());
    assertEquals(2, copy.eventCount());
  }

  /** By hand: at risk 3, 3 and 1, for the fourth trajectory enters at 3, after the first event. */
  @Test
  void delayedEntryLeavesTheRiskSetUntilEntry() {
    SurvivalData delayed =
        SurvivalData.of(new double[] {3, 5, 4, 6}, new boolean[] {true, false, true, true})
            .withEntryTimes(new double[] {0, 0, 2, 3});
    KaplanMeier curve = KaplanMeier.of(delayed);
    assertEquals(2.0 / 3, curve.survivalAt(3), 1e-15);
    assertEquals(4.0 / 9, curve.survivalAt(5), 1e-15);
    assertEquals(0, curve.survivalAt(6));
    assertEquals(0, curve.survivalAt(100), "known to be zero for ever");
    assertEquals(new Interval(0, curve.intervalAt(4, .9).upper()), curve.intervalAt(6, .9));
    assertTrue(Double.isNaN(curve.standardErrorAt(6)), "Greenwood is undefined at S = 0");
    assertEquals(3 + 5 + 2 + 3, delayed.exposure());
  }

  @Test
  void badInputIsRefusedWithTheReason() {
    boolean[] one = {true};
    assertRefused(() -> SurvivalData.of(new double[0], new boolean[0]), "at least one trajectory");
    assertRefused(() -> SurvivalData.of(new double[] {1, 2}, one), "durations.length=2");
    assertRefused(() -> SurvivalData.of(new double[] {Double.NaN}, one), "durations[0]=NaN");
    assertRefused(() -> SurvivalData.of(new double[] {-1}, one), "durations[0]=-1.0");
    assertRefused(() -> data.truncatedBefore(Double.NaN), "truncationTime=NaN");
    assertRefused(() -> data.truncatedBefore(30), "no trajectory is left", "truncationTime=30.0");
    assertRefused(() -> data.censoredAfter(0), "endTime=0.0");
    assertRefused(() -> data.truncatedBefore(5).censoredAfter(5), "entered", "endTime=5.0");
    assertRefused(() -> data.withEntryTimes(new double[] {0, 0, 12, 0}), "entryTimes[2]=12.0");
    assertRefused(() -> data.withEntryTimes(new double[1]), "entryTimes.length=1");
    assertRefused(() -> data.endTime(4), "index=4");
    assertRefused(() -> KaplanMeier.of(data).survivalAt(31), "after the last", "time=31.0");
    assertRefused(() -> KaplanMeier.of(data).survivalAt(Double.NaN), "time=NaN");
    assertRefused(() -> KaplanMeier.of(data).quantile(1), "fraction=1.0");
    assertRefused(() -> KaplanMeier.of(data).intervalAt(5, 1), "level=1.0");
    assertRefused(() -> NelsonAalen.of(data).cumulativeHazardAt(31), "time=31.0");
    assertRefused(
        () -> CoxOakesTest.of(SurvivalData.complete(0, 1)), "moment it entered", "trajectory=0");
    assertRefused(
        () -> CoxOakesTest.of(SurvivalData.of(new double[] {1}, new boolean[1])), "events=0");
    assertRefused(
        () -> LogRankTest.of(SurvivalData.complete(1), SurvivalData.complete(2).truncatedBefore(1)),
        "cannot be compared");
  }
}
