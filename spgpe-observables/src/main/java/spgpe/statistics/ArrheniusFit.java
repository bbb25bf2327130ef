package spgpe.statistics;

import java.util.List;
import java.util.OptionalDouble;
import spgpe.internal.check.Check;

/**
 * Fit of the Arrhenius law, ln(rate) = ln A - B/T, to rates measured at several temperatures T,
 * with the prefactor A free or fixed (for instance to a theory's).
 *
 * <p>{@link #ofRates(List) ofRates} is a weighted least-squares fit of ln(rate), weight
 * (rate/standardError)&#178;; its deviance is chi-square. {@link #ofCounts(List) ofCounts}
 * maximises the likelihood of the event counts, for which d events in exposure E have weight d ln(A
 * e^(-B/T)) - E A e^(-B/T); temperatures without any event take part. Its deviance is 2 sum [d
 * ln(d/m) - d + m] with m the fitted number of events.
 *
 * <p>A barrier that itself depends on T, or a prefactor with a power of T, bends the line; then B
 * is a local slope. Immutable and thread-safe.
 */
public final class ArrheniusFit {
  private final ArrheniusObjective objective;
  private final double barrier;
  private final double logPrefactor;
  private final double[] covariance;

  /**
   * A rate with a standard error, from any method.
   *
   * @param temperature temperature, finite and &gt; 0
   * @param rate rate, finite and &gt; 0
   * @param standardError its standard error, finite and &gt; 0
   */
  public record MeasuredRate(double temperature, double rate, double standardError) {
    /**
     * Checks the three numbers.
     *
     * @param temperature temperature, finite and &gt; 0
     * @param rate rate, finite and &gt; 0
     * @param standardError its standard error, finite and &gt; 0
     * @throws IllegalArgumentException if one of them is not positive and finite
     */
    public MeasuredRate {
      Check.positive(temperature, "temperature");
      Check.positive(rate, "rate");
      Check.positive(standardError, "standardError");
    }
  }

  /**
   * A rate known from counted events.
   *
   * @param temperature temperature, finite and &gt; 0
   * @param rate events and exposure at this temperature; no event is admissible
   */
  public record CountedRate(double temperature, RateEstimate rate) {
    /**
     * Checks both.
     *
     * @param temperature temperature, finite and &gt; 0
     * @param rate events and exposure at this temperature; no event is admissible
     * @throws IllegalArgumentException if the temperature is not positive and finite or the rate is
     *     null
     */
    public CountedRate {
      Check.positive(temperature, "temperature");
      Check.notNull(rate, "rate");
    }
  }

  private ArrheniusFit(ArrheniusObjective objective) {
    this.objective = objective;
    this.barrier = objective.bestBarrier();
    this.logPrefactor = objective.logPrefactor(barrier);
    this.covariance = objective.covariance(barrier);
  }

  /**
   * Least-squares fit of A and B.
   *
   * @param rates rates at two or more different temperatures
   * @return the fit
   * @throws IllegalArgumentException if the list or an entry is null, or there are fewer than two
   *     different temperatures
   */
  public static ArrheniusFit ofRates(List<MeasuredRate> rates) {
    return new ArrheniusFit(ArrheniusObjective.leastSquares(rates, OptionalDouble.empty()));
  }

  /**
   * Least-squares fit of B with given A.
   *
   * @param rates rates at one or more temperatures
   * @param prefactor A, finite and &gt; 0, unit of the rates
   * @return the fit
   * @throws IllegalArgumentException if the list or an entry is null, the list is empty, or the
   *     prefactor is not positive and finite
   */
  public static ArrheniusFit ofRates(List<MeasuredRate> rates, double prefactor) {
    return new ArrheniusFit(ArrheniusObjective.leastSquares(rates, logOf(prefactor)));
  }

  /**
   * Maximum-likelihood fit of A and B.
   *
   * @param rates counts at two or more temperatures
   * @return the fit
   * @throws IllegalArgumentException if the list or an entry is null, or there are fewer than two
   *     different temperatures with events
   */
  public static ArrheniusFit ofCounts(List<CountedRate> rates) {
    return new ArrheniusFit(ArrheniusObjective.likelihood(rates, OptionalDouble.empty()));
  }

  /**
   * Maximum-likelihood fit of B with given A.
   *
   * @param rates counts at one or more temperatures
   * @param prefactor A, finite and &gt; 0, unit of the rates
   * @return the fit
   * @throws IllegalArgumentException if the list or an entry is null, there is no event at all, or
   *     the prefactor is not positive and finite
   */
  public static ArrheniusFit ofCounts(List<CountedRate> rates, double prefactor) {
    return new ArrheniusFit(ArrheniusObjective.likelihood(rates, logOf(prefactor)));
  }

  private static OptionalDouble logOf(double prefactor) {
    return OptionalDouble.of(Math.log(Check.positive(prefactor, "prefactor")));
  }

  /**
   * Barrier B with its standard error from the covariance matrix.
   *
   * @return B in the unit of the temperatures
   */
  public Estimate barrier() {
    return new Estimate(barrier, Math.sqrt(covariance[2]));
  }

  /**
   * Logarithm of the prefactor with its standard error.
   *
   * @return ln A, A in the unit of the rates; the error is 0 if A was given
   */
  public Estimate logPrefactor() {
    return new Estimate(logPrefactor, Math.sqrt(covariance[0]));
  }

  /**
   * Covariance of ln A and B.
   *
   * @return the covariance; 0 if A was given
   */
  public double covariance() {
    return covariance[1];
  }

  /**
   * Profile interval of B: all values at which the deviance, minimised over a free A, exceeds its
   * minimum by no more than the chi-square quantile with one degree of freedom. For {@code ofRates}
   * it is symmetric, for {@code ofCounts} in general not.
   *
   * @param level confidence level, between 0 and 1
   * @return the interval
   * @throws IllegalArgumentException if the level is not inside (0, 1)
   */
  public Interval barrierInterval(double level) {
    double z = Quantiles.twoSidedNormal(level);
    double limit = objective.deviance(barrier) + z * z;
    double step = Math.sqrt(covariance[2]);
    return new Interval(
        Bisection.root(b -> objective.deviance(b) - limit, barrier, -step),
        Bisection.root(b -> objective.deviance(b) - limit, barrier, step));
  }

  /**
   * Deviance at the best fit, see the class comment.
   *
   * @return the deviance, &gt;= 0
   */
  public double deviance() {
    return Math.max(0, objective.deviance(barrier));
  }

  /**
   * Number of temperatures minus number of fitted parameters.
   *
   * @return degrees of freedom, &gt;= 0
   */
  public int degreesOfFreedom() {
    return objective.degreesOfFreedom();
  }

  /**
   * Goodness of fit: probability of a larger deviance if the law holds, from the chi-square law
   * (for counts a good approximation from about five events per temperature on).
   *
   * @return p-value; empty without degrees of freedom
   */
  public OptionalDouble pValue() {
    return degreesOfFreedom() == 0
        ? OptionalDouble.empty()
        : OptionalDouble.of(Quantiles.chiSquareUpperTail(deviance(), degreesOfFreedom()));
  }

  /**
   * Logarithm of the fitted rate at a temperature, inside or outside the range of the data, with
   * its standard error.
   *
   * @param temperature temperature, finite and &gt; 0
   * @return ln A - B/T
   * @throws IllegalArgumentException if the temperature is not positive and finite
   */
  public Estimate logRateAt(double temperature) {
    double beta = 1 / Check.positive(temperature, "temperature");
    double variance = covariance[0] - 2 * beta * covariance[1] + beta * beta * covariance[2];
    return new Estimate(logPrefactor - beta * barrier, Math.sqrt(Math.max(0, variance)));
  }

  @Override
  public String toString() {
    return "ArrheniusFit: barrier="
        + barrier()
        + ", logPrefactor="
        + logPrefactor()
        + ", deviance="
        + deviance()
        + " with "
        + degreesOfFreedom()
        + " degrees of freedom";
  }
}
