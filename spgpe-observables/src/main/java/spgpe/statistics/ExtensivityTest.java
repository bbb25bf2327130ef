package spgpe.statistics;

import java.util.List;
import spgpe.internal.check.Check;

/**
 * Check that a decay rate is proportional to the system size: likelihood-ratio test of one common
 * rate per size, chi-square = 2 sum d_i ln(d_i / m_i) with m_i the events expected from the pooled
 * rate per size. A rate that fails is often truncated too early, for the relaxation of a larger
 * system takes longer. Immutable and thread-safe.
 *
 * @param pooled common rate per unit size
 * @param chiSquare likelihood-ratio statistic
 * @param degreesOfFreedom number of systems minus one
 * @param pValue probability of a larger chi-square if the rate is extensive
 */
public record ExtensivityTest(
    RateEstimate pooled, double chiSquare, int degreesOfFreedom, double pValue) {

  /**
   * The rate of a whole system and its size.
   *
   * @param size length, area or volume, finite and &gt; 0
   * @param rate decay rate of the whole system
   */
  public record SizedRate(double size, RateEstimate rate) {
    /**
     * Checks both.
     *
     * @param size length, area or volume, finite and &gt; 0
     * @param rate decay rate of the whole system
     * @throws IllegalArgumentException if the size is not positive and finite or the rate is null
     */
    public SizedRate {
      Check.positive(size, "size");
      Check.notNull(rate, "rate");
    }

    /**
     * Rate per unit size.
     *
     * @return rate estimate with exposure times size
     */
    public RateEstimate density() {
      return rate.perSize(size);
    }
  }

  /**
   * Tests systems of different size.
   *
   * @param systems at least two independent systems, at least one of them with an event
   * @return the test
   * @throws IllegalArgumentException if the list is null, has fewer than two entries, a null entry,
   *     or no event at all
   */
  public static ExtensivityTest of(List<SizedRate> systems) {
    Check.notNull(systems, "systems");
    Check.argument(
        systems.size() >= 2, "at least two system sizes are needed: systems=%s", systems.size());
    RateEstimate pooled = Check.notNull(systems.get(0), "systems[0]").density();
    for (int i = 1; i < systems.size(); i++) {
      pooled = pooled.pooledWith(Check.notNull(systems.get(i), "systems[" + i + "]").density());
    }
    Check.argument(pooled.events() > 0, "systems without any event cannot be compared");
    double sum = 0;
    for (SizedRate system : systems) {
      RateEstimate density = system.density();
      if (density.events() > 0) {
        sum += density.events() * Math.log(density.rate() / pooled.rate());
      }
    }
    double chiSquare = Math.max(0, 2 * sum);
    int freedom = systems.size() - 1;
    return new ExtensivityTest(
        pooled, chiSquare, freedom, Quantiles.chiSquareUpperTail(chiSquare, freedom));
  }
}
