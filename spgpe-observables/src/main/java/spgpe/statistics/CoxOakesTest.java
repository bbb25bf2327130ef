package spgpe.statistics;

import spgpe.internal.check.Check;

/**
 * Cox-Oakes score test of a constant rate against a hazard that rises or falls like a power of
 * time. With t the time at risk of each trajectory (its end minus its entry), d the number of
 * events and &#948; = 1 for an event:
 *
 * <pre>
 * U = d + sum &#948; ln t - d sum(t ln t)/sum t
 * I = d + d [ sum(t ln&#178;t)/sum t - (sum(t ln t)/sum t)&#178; ]
 * </pre>
 *
 * and U&#178;/I is chi-square with one degree of freedom. U &gt; 0 means a rising hazard: a delay
 * or a cold start that has not thermalised yet. Immutable and thread-safe.
 *
 * <p>Source: D. R. Cox and D. Oakes, Analysis of Survival Data (1984) (from memory).
 *
 * @param score U
 * @param information I
 * @param chiSquare U&#178;/I
 * @param pValue probability of a larger chi-square for an exponential law
 */
public record CoxOakesTest(double score, double information, double chiSquare, double pValue) {

  /**
   * Tests an ensemble.
   *
   * @param data first-passage data; with left truncation the clock starts at the entry time
   * @return the test
   * @throws IllegalArgumentException if the data is null, has no event, or holds a trajectory that
   *     ended at the very moment it entered
   */
  public static CoxOakesTest of(SurvivalData data) {
    Check.notNull(data, "data");
    int events = data.eventCount();
    Check.argument(
        events > 0, "a goodness-of-fit test needs at least one event: events=%s", events);
    // Only ratios of times matter; scaling by the mean keeps the sums well conditioned.
    double scale = data.exposure() / data.size();
    double sum = 0;
    double sumLog = 0;
    double sumLogSquare = 0;
    double sumLogOfEvents = 0;
    for (int i = 0; i < data.size(); i++) {
      double t = (data.endTime(i) - data.entryTime(i)) / scale;
      Check.argument(
          t > 0,
          "a trajectory ended at the moment it entered; truncate the data at a later time:"
              + " trajectory=%s, end=%s",
          i,
          data.endTime(i));
      double log = Math.log(t);
      sum += t;
      sumLog += t * log;
      sumLogSquare += t * log * log;
      if (data.isEvent(i)) {
        sumLogOfEvents += log;
      }
    }
    double meanLog = sumLog / sum;
    double score = events + sumLogOfEvents - events * meanLog;
    double information = events * (1 + sumLogSquare / sum - meanLog * meanLog);
    double chiSquare = score * score / information;
    return new CoxOakesTest(
        score, information, chiSquare, Quantiles.chiSquareUpperTail(chiSquare, 1));
  }
}
