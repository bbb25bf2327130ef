package spgpe.statistics;

import java.util.Arrays;
import spgpe.internal.check.Check;

/**
 * First-passage times of an ensemble: for every trajectory the time at which observation ended, a
 * flag that says whether it ended with the event (the decay) or by censoring, and the time from
 * which it was observed.
 *
 * <p>Left truncation at t0 removes the transient of a cold start: trajectories that ended at or
 * before t0 are dropped, the others enter observation at t0, so that their exposure is min(T, tEnd)
 * - t0. A constant delay between nucleation and threshold then no longer biases the rate, provided
 * t0 exceeds delay plus relaxation time.
 *
 * <p>All times are measured from the start of the trajectory, in one unit of the caller's choice. A
 * trajectory with entry time 0 counts as at risk at time 0. Immutable and thread-safe.
 */
public final class SurvivalData {
  private final double[] entry;
  private final double[] end;
  private final boolean[] event;

  private SurvivalData(double[] entry, double[] end, boolean[] event) {
    this.entry = entry;
    this.end = end;
    this.event = event;
  }

  /**
   * Data with right censoring, observed from time 0.
   *
   * @param durations end of observation per trajectory, finite and &gt;= 0; copied
   * @param events true where the trajectory ended with the event, false where it was censored;
   *     copied
   * @return the data, in the order given
   * @throws IllegalArgumentException if an array is null or empty, the lengths differ, or a
   *     duration is negative or not finite
   */
  public static SurvivalData of(double[] durations, boolean[] events) {
    Check.notNull(durations, "durations");
    Check.notNull(events, "events");
    Check.argument(durations.length > 0, "at least one trajectory is needed: durations.length=0");
    Check.argument(
        durations.length == events.length,
        "durations and events must have the same length: durations.length=%s, events.length=%s",
        durations.length,
        events.length);
    for (int i = 0; i < durations.length; i++) {
      double duration = durations[i];
      Check.argument(
          duration >= 0 && duration < Double.POSITIVE_INFINITY,
          "every duration must be finite and >= 0: durations[%s]=%s",
          i,
          duration);
    }
    return new SurvivalData(new double[durations.length], durations.clone(), events.clone());
  }

  /**
   * Data without censoring, observed from time 0: every trajectory ended with the event.
   *
   * @param durations event time per trajectory, finite and &gt;= 0; copied
   * @return the data, in the order given
   * @throws IllegalArgumentException if the array is null or empty or a duration is negative or not
   *     finite
   */
  public static SurvivalData complete(double... durations) {
    Check.notNull(durations, "durations");
    boolean[] events = new boolean[durations.length];
    Arrays.fill(events, true);
    return of(durations, events);
  }

  /**
   * The same trajectories with individual entry times (delayed entry).
   *
   * @param entryTimes time from which each trajectory was observed; 0, or positive and before the
   *     end of that trajectory; copied
   * @return data with these entry times instead of the present ones
   * @throws IllegalArgumentException if the array is null, has another length than this data, or an
   *     entry time is negative, not finite, or not before the trajectory's end
   */
  public SurvivalData withEntryTimes(double[] entryTimes) {
    Check.notNull(entryTimes, "entryTimes");
    Check.argument(
        entryTimes.length == end.length,
        "one entry time per trajectory is needed: entryTimes.length=%s, trajectories=%s",
        entryTimes.length,
        end.length);
    for (int i = 0; i < end.length; i++) {
      Check.argument(
          entryTimes[i] == 0 || entryTimes[i] > 0 && entryTimes[i] < end[i],
          "an entry time must be 0 or lie before the end of its trajectory; leave a trajectory out"
              + " that ended before it was observed: entryTimes[%s]=%s, end=%s",
          i,
          entryTimes[i],
          end[i]);
    }
    return new SurvivalData(entryTimes.clone(), end, event);
  }

  /**
   * Left truncation: drops every trajectory that ended at or before t0 and counts the exposure of
   * the others from t0 on (or from their own entry time, if that is later).
   *
   * @param truncationTime t0, finite and &gt;= 0
   * @return the truncated data; this object if t0 is 0
   * @throws IllegalArgumentException if t0 is negative or not finite, or no trajectory is left
   */
  public SurvivalData truncatedBefore(double truncationTime) {
    Check.notNegative(truncationTime, "truncationTime");
    if (truncationTime == 0) {
      return this;
    }
    int kept = 0;
    double last = 0;
    for (double t : end) {
      kept += t > truncationTime ? 1 : 0;
      last = Math.max(last, t);
    }
    Check.argument(
        kept > 0,
        "no trajectory is left after truncation, choose an earlier time: truncationTime=%s, last"
            + " trajectory ended at %s",
        truncationTime,
        last);
    double[] newEntry = new double[kept];
    double[] newEnd = new double[kept];
    boolean[] newEvent = new boolean[kept];
    int k = 0;
    for (int i = 0; i < end.length; i++) {
      if (end[i] > truncationTime) {
        newEntry[k] = Math.max(entry[i], truncationTime);
        newEnd[k] = end[i];
        newEvent[k] = event[i];
        k++;
      }
    }
    return new SurvivalData(newEntry, newEnd, newEvent);
  }

  /**
   * Right censoring of all trajectories at one time: what would have been known had the run ended
   * there. Trajectories that had not entered yet are dropped.
   *
   * @param endTime last time looked at, finite and &gt; 0; an event exactly then still counts
   * @return the censored data
   * @throws IllegalArgumentException if the time is not positive and finite, or no trajectory had
   *     entered before it
   */
  public SurvivalData censoredAfter(double endTime) {
    Check.positive(endTime, "endTime");
    int kept = 0;
    for (double t : entry) {
      kept += t < endTime ? 1 : 0;
    }
    Check.argument(kept > 0, "no trajectory had entered before the end time: endTime=%s", endTime);
    double[] newEntry = new double[kept];
    double[] newEnd = new double[kept];
    boolean[] newEvent = new boolean[kept];
    int k = 0;
    for (int i = 0; i < end.length; i++) {
      if (entry[i] < endTime) {
        newEntry[k] = entry[i];
        newEnd[k] = Math.min(end[i], endTime);
        newEvent[k] = event[i] && end[i] <= endTime;
        k++;
      }
    }
    return new SurvivalData(newEntry, newEnd, newEvent);
  }

  /**
   * The trajectories of this data followed by those of another ensemble.
   *
   * @param other data appended at the end
   * @return the joint data
   * @throws IllegalArgumentException if the other data is null
   */
  public SurvivalData followedBy(SurvivalData other) {
    Check.notNull(other, "other");
    int n = end.length;
    int total = n + other.end.length;
    double[] newEntry = Arrays.copyOf(entry, total);
    double[] newEnd = Arrays.copyOf(end, total);
    boolean[] newEvent = Arrays.copyOf(event, total);
    System.arraycopy(other.entry, 0, newEntry, n, other.end.length);
    System.arraycopy(other.end, 0, newEnd, n, other.end.length);
    System.arraycopy(other.event, 0, newEvent, n, other.end.length);
    return new SurvivalData(newEntry, newEnd, newEvent);
  }

  /**
   * Number of trajectories.
   *
   * @return the number, at least 1
   */
  public int size() {
    return end.length;
  }

  /**
   * Number of trajectories that ended with the event.
   *
   * @return the number of events
   */
  public int eventCount() {
    int count = 0;
    for (boolean e : event) {
      count += e ? 1 : 0;
    }
    return count;
  }

  /**
   * Total time at risk, the sum of (end - entry) over the trajectories.
   *
   * @return total exposure, unit of the times
   */
  public double exposure() {
    double sum = 0;
    for (int i = 0; i < end.length; i++) {
      sum += end[i] - entry[i];
    }
    return sum;
  }

  /**
   * Time from which a trajectory was observed.
   *
   * @param index trajectory, 0 to size() - 1
   * @return entry time
   * @throws IllegalArgumentException if the index is out of range
   */
  public double entryTime(int index) {
    return entry[checkIndex(index)];
  }

  /**
   * Time at which the observation of a trajectory ended.
   *
   * @param index trajectory, 0 to size() - 1
   * @return event or censoring time, measured from the start of the trajectory
   * @throws IllegalArgumentException if the index is out of range
   */
  public double endTime(int index) {
    return end[checkIndex(index)];
  }

  /**
   * Says how a trajectory ended.
   *
   * @param index trajectory, 0 to size() - 1
   * @return true for an event, false for censoring
   * @throws IllegalArgumentException if the index is out of range
   */
  public boolean isEvent(int index) {
    return event[checkIndex(index)];
  }

  private int checkIndex(int index) {
    return Check.inRange(index, 0, end.length - 1, "index");
  }

  @Override
  public String toString() {
    return "SurvivalData: "
        + size()
        + " trajectories, "
        + eventCount()
        + " events, exposure "
        + exposure();
  }
}
