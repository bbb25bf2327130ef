package spgpe.statistics;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import spgpe.internal.check.Check;

/**
 * Sensitivity of the decay rate to the truncation time t0: where the transient of a cold start has
 * died out, rate and goodness of fit no longer depend on t0 (the plateau). Immutable and
 * thread-safe.
 */
public final class TruncationScan {
  private final List<Row> rows;

  /**
   * One truncation time.
   *
   * @param truncationTime t0
   * @param trajectories trajectories still at risk after t0
   * @param rate rate estimate from t0 on
   * @param exponentiality test of a constant rate from t0 on; empty without events
   * @param driftPValue exact test that the rate between this t0 and the next equals the rate after
   *     the next; empty in the last row and where neither part has an event
   */
  public record Row(
      double truncationTime,
      int trajectories,
      RateEstimate rate,
      Optional<CoxOakesTest> exponentiality,
      OptionalDouble driftPValue) {
    private boolean passes(double significance) {
      return exponentiality.map(test -> test.pValue() >= significance).orElse(false)
          && driftPValue.orElse(1) >= significance;
    }
  }

  private TruncationScan(List<Row> rows) {
    this.rows = rows;
  }

  /**
   * Makes the table.
   *
   * @param data first-passage data, untruncated
   * @param truncationTimes times t0, strictly increasing, finite and &gt;= 0, the last one before
   *     the end of the data
   * @return the table, one row per time
   * @throws IllegalArgumentException if an argument is null, there is no time, the times do not
   *     increase, or no trajectory is left at one of them
   */
  public static TruncationScan of(SurvivalData data, double... truncationTimes) {
    Check.notNull(data, "data");
    Check.notNull(truncationTimes, "truncationTimes");
    Check.argument(truncationTimes.length > 0, "at least one truncation time is needed: length=0");
    RateEstimate[] rates = new RateEstimate[truncationTimes.length];
    SurvivalData[] truncated = new SurvivalData[truncationTimes.length];
    for (int i = 0; i < truncationTimes.length; i++) {
      Check.argument(
          i == 0 || truncationTimes[i] > truncationTimes[i - 1],
          "truncation times must increase: truncationTimes[%s]=%s",
          i,
          truncationTimes[i]);
      truncated[i] = data.truncatedBefore(truncationTimes[i]);
      rates[i] = RateEstimate.of(truncated[i]);
    }
    List<Row> rows = new ArrayList<>(truncationTimes.length);
    for (int i = 0; i < truncationTimes.length; i++) {
      rows.add(
          new Row(
              truncationTimes[i],
              truncated[i].size(),
              rates[i],
              rates[i].events() == 0
                  ? Optional.empty()
                  : Optional.of(CoxOakesTest.of(truncated[i])),
              i + 1 < rates.length ? drift(rates[i], rates[i + 1]) : OptionalDouble.empty()));
    }
    return new TruncationScan(List.copyOf(rows));
  }

  // Truncated samples are nested, so the part between two times is what the later one lacks.
  private static OptionalDouble drift(RateEstimate all, RateEstimate later) {
    double exposure = all.exposure() - later.exposure();
    if (all.events() == 0 || !(exposure > 0)) {
      return OptionalDouble.empty();
    }
    RateEstimate early = new RateEstimate(all.events() - later.events(), exposure);
    return OptionalDouble.of(new RateRatio(early, later).pValue());
  }

  /**
   * The table.
   *
   * @return unmodifiable list in the order of the truncation times
   */
  public List<Row> rows() {
    return rows;
  }

  /**
   * First row of the plateau: from it on every row passes both the test of a constant rate and the
   * comparison with the next row.
   *
   * @param significance p-value below which a test fails, between 0 and 1, for example 0.05
   * @return the earliest such row; empty if even the last one fails or has no event
   * @throws IllegalArgumentException if the significance is not inside (0, 1)
   */
  public Optional<Row> plateauStart(double significance) {
    Check.argument(
        significance > 0 && significance < 1,
        "significance must lie inside (0, 1): significance=%s",
        significance);
    Optional<Row> start = Optional.empty();
    for (int i = rows.size() - 1; i >= 0 && rows.get(i).passes(significance); i--) {
      start = Optional.of(rows.get(i));
    }
    return start;
  }
}
