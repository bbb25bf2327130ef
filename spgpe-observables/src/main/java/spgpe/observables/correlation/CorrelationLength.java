package spgpe.observables.correlation;

import spgpe.internal.check.Check;
import spgpe.internal.measure.CurveFit;
import spgpe.observables.Estimates;
import spgpe.statistics.Estimate;

/**
 * Correlation length from a fit of C(r) = A f(r) over a range of distances:
 *
 * <pre>
 *   exponential:        f(r) = exp(-r/xi)
 *   hyperbolic cosine:  f(r) = cosh((L/2 - r)/xi) / cosh(L/(2 xi)),  on a ring of length L.
 * </pre>
 *
 * <p>Neighbouring distances are strongly correlated. Either {@link Weighting}, ERRORS (the default)
 * or COVARIANCE, gives errors that take the covariance across trajectories into account.
 *
 * <p>A true correlation length is the decay at large r: choose the range where a second fit from a
 * larger distance agrees. A sharp cutoff of momenta leaves ringing in C(r) that no such curve
 * describes; ERRORS averages over it. Immutable and thread-safe.
 *
 * @param length xi with its error
 * @param amplitude A with its error
 * @param chiSquare weighted sum of squares; distributed as chi-square only for COVARIANCE
 * @param degreesOfFreedom points less two
 * @param points number of fitted points
 */
public record CorrelationLength(
    Estimate length, Estimate amplitude, double chiSquare, int degreesOfFreedom, int points) {
  /** How the points of a fit are weighted. */
  public enum Weighting {
    /**
     * Each point by its own error. Robust against small structure that the curve does not describe;
     * the errors of the result are propagated with the whole covariance.
     */
    ERRORS,
    /**
     * By the inverse covariance (generalised least squares), scaled by (N-p-2)/(N-1) for N
     * trajectories and p points, because the inverse of an estimated covariance is too large
     * (Hartlap, Simon, Schneider, Astron. Astrophys. 464, 399 (2007), from memory). Smallest errors
     * and a meaningful chi-square if the curve is exact, nonsense if it is not: directions in which
     * the points hardly fluctuate then decide. Only points about a resolution of the kept modes
     * apart are used.
     */
    COVARIANCE
  }

  private static final double APART = 0.75;

  /**
   * Fits an exponential, weighted by errors.
   *
   * @param correlation the correlation
   * @param from smallest distance used
   * @param to largest distance used
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than three points in the range, or no
   *     minimum
   */
  public static CorrelationLength exponential(
      CorrelationFunction correlation, double from, double to) {
    return exponential(correlation, from, to, Weighting.ERRORS);
  }

  /**
   * Fits an exponential.
   *
   * @param correlation the correlation
   * @param from smallest distance used
   * @param to largest distance used
   * @param weighting how the points are weighted
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than three points in the range, too few
   *     trajectories for their covariance, or no minimum
   */
  public static CorrelationLength exponential(
      CorrelationFunction correlation, double from, double to, Weighting weighting) {
    return fit(correlation, from, to, CorrelationLength::exponentialCurve, weighting);
  }

  /**
   * Fits a hyperbolic cosine, weighted by errors.
   *
   * @param correlation the correlation on a ring
   * @param from smallest distance used
   * @param to largest distance used
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than three points in the range, no ring, or
   *     no minimum
   */
  public static CorrelationLength hyperbolicCosine(
      CorrelationFunction correlation, double from, double to) {
    return hyperbolicCosine(correlation, from, to, Weighting.ERRORS);
  }

  /**
   * Fits a hyperbolic cosine.
   *
   * @param correlation the correlation on a ring
   * @param from smallest distance used
   * @param to largest distance used
   * @param weighting how the points are weighted
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than three points in the range, too few
   *     trajectories for their covariance, no ring, or no minimum
   */
  public static CorrelationLength hyperbolicCosine(
      CorrelationFunction correlation, double from, double to, Weighting weighting) {
    return fit(correlation, from, to, ringCurve(correlation), weighting);
  }

  private static CurveFit.Curve ringCurve(CorrelationFunction correlation) {
    double period = Check.notNull(correlation, "correlation").period();
    Check.argument(
        Double.isFinite(period), "a hyperbolic cosine needs a ring: period=%s", period);
    return (x, p, gradient) -> ringCurve(x, p, gradient, period);
  }

  private static double exponentialCurve(double x, double[] p, double[] gradient) {
    double f = Math.exp(-x * p[1]);
    gradient[0] = f;
    gradient[1] = -p[0] * x * f;
    return p[0] * f;
  }

  /** p[1] = 1/xi; written with decaying exponentials only. */
  private static double ringCurve(double x, double[] p, double[] gradient, double period) {
    double q = Math.abs(p[1]);
    double near = Math.exp(-x * q);
    double far = Math.exp(-(period - x) * q);
    double whole = Math.exp(-period * q);
    double f = (near + far) / (1 + whole);
    double slope =
        (-x * near - (period - x) * far) / (1 + whole) + f * period * whole / (1 + whole);
    gradient[0] = f;
    gradient[1] = p[0] * slope * Math.signum(p[1]);
    return p[0] * f;
  }

  private static CorrelationLength fit(
      CorrelationFunction c, double from, double to, CurveFit.Curve curve,
      Weighting weighting) {
    Check.notNull(c, "correlation");
    Check.notNull(weighting, "weighting");
    boolean generalised = weighting == Weighting.COVARIANCE;
    Check.argument(to > from, "the range must have from < to: from=%s, to=%s", from, to);
    int[] chosen = chosen(c, from, to, generalised ? c.resolution() : 0);
    int n = chosen.length;
    Check.argument(
        n >= 3,
        "the range must hold at least three distances%s: from=%s, to=%s, distances=%s",
        generalised ? " a resolution of " + c.resolution() + " apart" : "", from, to, n);
    Estimates e = c.estimates();
    double scale = 1;
    if (generalised) {
      Check.argument(
          e.trajectories() > n + 2,
          "the covariance of p points needs more than p + 2 trajectories: points=%s,"
              + " trajectories=%s; narrow the range or weight by errors", n, e.trajectories());
      scale = (e.trajectories() - n - 2.0) / (e.trajectories() - 1.0);
    }
    double[] x = new double[n];
    double[] y = new double[n];
    double[][] cov = new double[n][n];
    for (int i = 0; i < n; i++) {
      x[i] = c.distance(chosen[i]);
      y[i] = e.value(chosen[i]);
      for (int j = 0; j < n; j++) {
        cov[i][j] = e.covariance(chosen[i], chosen[j]);
      }
    }
    CurveFit.Result r =
        generalised
            ? CurveFit.fit(x, y, cov, scale, guess(x, y), curve)
            : CurveFit.fitWithVariances(x, y, cov, guess(x, y), curve);
    double q = Math.abs(r.parameters()[1]);
    Check.argument(
        q > 0, "the correlation does not decay over the range: from=%s, to=%s", from, to);
    return new CorrelationLength(
        new Estimate(1 / q, r.error(1) / (q * q)),
        new Estimate(r.parameters()[0], r.error(0)),
        r.chiSquare(), r.degreesOfFreedom(), n);
  }

  /** Distances in the range, at least about a resolution apart. */
  private static int[] chosen(
      CorrelationFunction c, double from, double to, double resolution) {
    int[] all = new int[c.size()];
    int n = 0;
    for (int i = 0; i < c.size() && c.distance(i) <= to; i++) {
      boolean apart =
          n == 0 || c.distance(i) - c.distance(all[n - 1]) >= APART * resolution;
      if (c.distance(i) >= from && apart) {
        all[n++] = i;
      }
    }
    return java.util.Arrays.copyOf(all, n);
  }

  private static double[] guess(double[] x, double[] y) {
    int last = x.length - 1;
    while (last > 0 && !(y[last] / y[0] > 0.02)) {
      last--;
    }
    double q =
        last == 0 || y[last] >= y[0]
            ? 1 / (x[x.length - 1] - x[0])
            : Math.log(y[0] / y[last]) / (x[last] - x[0]);
    return new double[] {y[0] * Math.exp(q * x[0]), q};
  }
}
