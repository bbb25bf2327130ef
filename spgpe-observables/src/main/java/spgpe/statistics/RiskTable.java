package spgpe.statistics;

import java.util.Arrays;

/**
 * Distinct event times with the number at risk just before and the number of events. A censoring
 * time equal to an event time counts as later, an entry time equal to it as not yet entered.
 */
final class RiskTable {
  private final double[] sortedEntry;
  private final double[] sortedEnd;
  private final double[] sortedEvents;

  RiskTable(SurvivalData data) {
    int n = data.size();
    sortedEntry = new double[n];
    sortedEnd = new double[n];
    double[] events = new double[n];
    int d = 0;
    for (int i = 0; i < n; i++) {
      // Entry 0 means "observed from the very start", so an event at time 0 has it at risk.
      sortedEntry[i] = data.entryTime(i) == 0 ? Double.NEGATIVE_INFINITY : data.entryTime(i);
      sortedEnd[i] = data.endTime(i);
      if (data.isEvent(i)) {
        events[d++] = data.endTime(i);
      }
    }
    sortedEvents = Arrays.copyOf(events, d);
    Arrays.sort(sortedEntry);
    Arrays.sort(sortedEnd);
    Arrays.sort(sortedEvents);
  }

  double[] distinctEventTimes() {
    return Arrays.stream(sortedEvents).distinct().toArray();
  }

  int atRisk(double time) {
    return countBelow(sortedEntry, time) - countBelow(sortedEnd, time);
  }

  int events(double time) {
    return countBelow(sortedEvents, Math.nextUp(time)) - countBelow(sortedEvents, time);
  }

  double lastTime() {
    return sortedEnd[sortedEnd.length - 1];
  }

  private static int countBelow(double[] sorted, double time) {
    int low = 0;
    int high = sorted.length;
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (sorted[middle] < time) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return low;
  }
}
