package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * Gaussian theory of the relative phase around a vacuum: every mode carries T, {@code <|phi_k|^2> =
 * T/[(n/2)(k^2 + m^2)]}.
 *
 * <p>This is the limit T to zero. Interactions of the fluctuations change it in proportion to T; in
 * the false vacuum at {@code J = .1 g n}, {@code lambda^2 = 2.25} the variance is larger by 8
 * percent at E_b/T = 28 and by 22 percent at E_b/T = 14.
 *
 * @param mass m, the inverse of the correlation length (1/length), greater than zero
 * @param density density n of one component (1/length), greater than zero
 * @param temperature T (energy), greater than zero
 */
public record GaussianPhase(double mass, double density, double temperature) {

  /**
   * Checks the values.
   *
   * @param mass m, the inverse of the correlation length (1/length), greater than zero
   * @param density density n of one component (1/length), greater than zero
   * @param temperature T (energy), greater than zero
   * @throws IllegalArgumentException if a value is not finite and positive
   */
  public GaussianPhase {
    Check.positive(mass, "mass");
    Check.positive(density, "density");
    Check.positive(temperature, "temperature");
  }

  /**
   * Correlation on the infinite line.
   *
   * @param distance x (length), finite
   * @return {@code <phi(x) phi(0)> = T/(n m) exp(-m |x|)}
   * @throws IllegalArgumentException if the distance is not finite
   */
  public double onLine(double distance) {
    double x = Math.abs(Check.finite(distance, "distance"));
    return temperature / (density * mass) * Math.exp(-mass * x);
  }

  /**
   * Correlation on a ring without cutoff.
   *
   * @param distance x (length), finite; taken modulo the circumference
   * @param length circumference L (length), greater than zero
   * @return {@code (T/(n m)) cosh(m (L/2 - x))/sinh(m L/2)}
   * @throws IllegalArgumentException if a value is out of range
   */
  public double onRing(double distance, double length) {
    Check.finite(distance, "distance");
    Check.positive(length, "length");
    double x = Math.abs(Math.IEEEremainder(distance, length));
    // cosh/sinh written with decaying exponentials only.
    double shape =
        (Math.exp(-mass * x) + Math.exp(-mass * (length - x))) / -Math.expm1(-mass * length);
    return temperature / (density * mass) * shape;
  }

  /**
   * Correlation on a ring over the kept modes.
   *
   * @param distance x (length), finite
   * @param ring length and cutoff
   * @return {@code (2T/(n L)) sum over |n| <= cutoff of cos(k x)/(k^2 + m^2)}
   * @throws IllegalArgumentException if the distance is not finite
   */
  public double onRing(double distance, RingModes ring) {
    Check.finite(distance, "distance");
    Check.notNull(ring, "ring");
    double sum = 0;
    for (int n = ring.cutoffMode(); n >= 1; n--) {
      double k = ring.waveNumber(n);
      sum += 2 * Math.cos(k * distance) / (k * k + mass * mass);
    }
    sum += 1 / (mass * mass);
    return 2 * temperature / (density * ring.length()) * sum;
  }

  /**
   * Variance on the infinite line with a cutoff.
   *
   * @param cutoff largest wave number (1/length), greater than zero; infinity is allowed
   * @return {@code (2T/(pi n m)) arctan(k_c/m)}
   * @throws IllegalArgumentException if the cutoff is not positive
   */
  public double variance(double cutoff) {
    Check.argument(cutoff > 0, "cutoff must be > 0: cutoff=%s", cutoff);
    return 2 * temperature / (Math.PI * density * mass) * Math.atan(cutoff / mass);
  }

  /**
   * Mean cosine of a Gaussian phase around zero.
   *
   * @param variance {@code <phi^2>}, not negative
   * @return {@code exp(-variance/2)}; around pi the sign is reversed
   * @throws IllegalArgumentException if the variance is negative or not finite
   */
  public static double meanCosine(double variance) {
    return Math.exp(-0.5 * Check.notNegative(variance, "variance"));
  }

  /**
   * Cosine correlation of a Gaussian phase around zero (around pi it is the same).
   *
   * @param variance {@code <phi^2>}, not negative
   * @param correlation {@code <phi(x) phi(0)>}
   * @return {@code <cos phi(x) cos phi(0)> = exp(-variance) cosh(correlation)}
   * @throws IllegalArgumentException if a value is not finite or the variance negative
   */
  public static double cosineProduct(double variance, double correlation) {
    Check.notNegative(variance, "variance");
    return Math.exp(-variance) * Math.cosh(Check.finite(correlation, "correlation"));
  }
}
