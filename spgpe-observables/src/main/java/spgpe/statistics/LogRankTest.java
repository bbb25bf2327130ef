package spgpe.statistics;

import java.util.stream.DoubleStream;
import spgpe.internal.check.Check;

/**
 * Log-rank test of equal hazards in two ensembles: observed events of the first against those
 * expected if both had one hazard, with the hypergeometric variance at every event time. Immutable
 * and thread-safe.
 *
 * <p>Source: N. Mantel, Cancer Chemother. Rep. 50, 163 (1966) (from memory).
 *
 * @param observed events seen in the first ensemble
 * @param expected events expected there under equal hazards
 * @param variance variance of observed - expected
 * @param chiSquare (observed - expected)&#178; / variance, one degree of freedom
 * @param pValue probability of a larger chi-square under equal hazards
 */
public record LogRankTest(
    double observed, double expected, double variance, double chiSquare, double pValue) {

  /**
   * Compares two ensembles.
   *
   * @param first first ensemble
   * @param second second ensemble
   * @return the test
   * @throws IllegalArgumentException if an argument is null, or there is no event time at which
   *     both ensembles are at risk, so that nothing can be compared
   */
  public static LogRankTest of(SurvivalData first, SurvivalData second) {
    RiskTable a = new RiskTable(Check.notNull(first, "first"));
    RiskTable b = new RiskTable(Check.notNull(second, "second"));
    double[] times =
        DoubleStream.concat(
                DoubleStream.of(a.distinctEventTimes()), DoubleStream.of(b.distinctEventTimes()))
            .sorted()
            .distinct()
            .toArray();
    double observed = 0;
    double expected = 0;
    double variance = 0;
    for (double time : times) {
      double n1 = a.atRisk(time);
      double n = n1 + b.atRisk(time);
      double d = a.events(time) + b.events(time);
      observed += a.events(time);
      expected += d * n1 / n;
      if (n > 1) {
        variance += d * (n1 / n) * (1 - n1 / n) * (n - d) / (n - 1);
      }
    }
    Check.argument(
        variance > 0,
        "the ensembles cannot be compared: no event falls in a time when both are at risk"
            + " (events: first=%s, second=%s)",
        first.eventCount(),
        second.eventCount());
    double chiSquare = (observed - expected) * (observed - expected) / variance;
    return new LogRankTest(
        observed, expected, variance, chiSquare, Quantiles.chiSquareUpperTail(chiSquare, 1));
  }
}
