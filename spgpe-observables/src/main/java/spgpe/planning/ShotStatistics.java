package spgpe.planning;

import org.apache.commons.math3.special.Erf;
import spgpe.internal.check.Check;
import spgpe.units.EventRate;
import spgpe.units.TimeSpan;

/**
 * What follows from a constant decay rate Gamma and the length tau of a shot. Immutable.
 *
 * <p>With x = Gamma tau a shot decays with probability p = 1 - exp(-x). N shots whose decay times are
 * seen give Gamma with relative standard error 1/sqrt(N p); N shots of which only the end is looked
 * at give it with sqrt(p/(N (1 - p)))/x (large-sample values of the maximum-likelihood estimates).
 *
 * <p>Bubbles: nucleation at Gamma/L per length and time on the unconverted part of the ring, two
 * walls each of constant speed v (Kolmogorov's law of covering, exact on a ring). A bubble alone
 * needs t_c = L/(2 v) to convert the ring.
 */
public final class ShotStatistics {
  private final double rate;
  private final double shot;
  private final double conversion;

  private ShotStatistics(double rate, double shot, double conversion) {
    this.rate = rate;
    this.shot = shot;
    this.conversion = conversion;
  }

  /**
   * Statistics of a shot.
   *
   * @param rate decay rate of the whole ring, greater than zero
   * @param shot length of a shot, greater than zero: the time before atom loss ends it
   * @param conversion time t_c in which one bubble converts the ring, at least zero
   * @return the statistics
   * @throws IllegalArgumentException if a value is out of range or the rate is one per length
   */
  public static ShotStatistics of(EventRate rate, TimeSpan shot, TimeSpan conversion) {
    Check.inRange(Check.notNull(rate, "rate").dimension(), 0, 0, "dimension of the rate");
    return new ShotStatistics(
        Check.positive(rate.perSecondPerMetreToD(), "rate in 1/s"),
        Check.positive(Check.notNull(shot, "shot").seconds(), "shot in s"),
        Check.notNegative(Check.notNull(conversion, "conversion").seconds(), "conversion in s"));
  }

  /**
   * The mean lifetime of the metastable state.
   *
   * @return 1/Gamma
   */
  public TimeSpan meanLifetime() {
    return TimeSpan.ofSeconds(1 / rate);
  }

  /**
   * The fraction of shots that decay before they end.
   *
   * @return 1 - exp(-Gamma tau)
   */
  public double decayedFraction() {
    return -Math.expm1(-rate * shot);
  }

  /**
   * Decays to be seen for a given relative error of the rate.
   *
   * @param relativeError relative standard error, 1e-4 to 1
   * @return 1/error^2, rounded up
   * @throws IllegalArgumentException if the error is out of range
   */
  public static long eventsFor(double relativeError) {
    Check.argument(
        relativeError >= 1e-4 && relativeError <= 1,
        "relative error must lie in 1e-4..1: relativeError=%s",
        relativeError);
    return (long) Math.ceil(1 / (relativeError * relativeError) * (1 - 1e-12));
  }

  /**
   * Shots needed if the moment of each decay is seen.
   *
   * @param relativeError relative standard error of the rate, 1e-4 to 1
   * @return events needed over the decayed fraction, a whole number; may exceed a long
   * @throws IllegalArgumentException if the error is out of range
   */
  public double shotsFor(double relativeError) {
    return Math.ceil(eventsFor(relativeError) / decayedFraction());
  }

  /**
   * Shots needed if each is looked at once, at its end, as by an image that destroys the cloud.
   *
   * @param relativeError relative standard error of the rate, 1e-4 to 1
   * @return p/((1 - p) x^2 error^2), a whole number; infinite if practically every shot decays, a
   *     shot is then too long to tell a rate from its end
   * @throws IllegalArgumentException if the error is out of range
   */
  public double shotsForEndImages(double relativeError) {
    double x = rate * shot;
    return Math.ceil(eventsFor(relativeError) * (Math.expm1(x) / x / x));
  }

  /**
   * The mean number of bubbles in a shot, also those that form while the first one grows.
   *
   * @return Gamma times the integral over the shot of the unconverted fraction
   */
  public double bubblesPerShot() {
    double early = Math.min(shot, conversion);
    double bubbles = 0;
    if (early > 0) {
      // unconverted fraction exp(-s^2) with s = t sqrt(Gamma v/L), v/L = 1/(2 t_c)
      double scale = Math.sqrt(rate / (2 * conversion));
      bubbles = rate * Math.sqrt(Math.PI) / (2 * scale) * Erf.erf(early * scale);
    }
    if (shot > conversion) {
      bubbles +=
          Math.exp(-rate * conversion / 2) * -Math.expm1(-rate * (shot - conversion));
    }
    return bubbles;
  }

  /**
   * The time in which one bubble converts the ring.
   *
   * @return t_c
   */
  public TimeSpan conversionTime() {
    return TimeSpan.ofSeconds(conversion);
  }
}
