package spgpe.units;

import spgpe.internal.check.Check;

/**
 * A span of laboratory time.
 *
 * @param seconds value in s, finite and not negative
 */
public record TimeSpan(double seconds) {
  /**
   * Checks the value.
   *
   * @param seconds value in s, finite and not negative
   * @throws IllegalArgumentException if the value is negative or not finite
   */
  public TimeSpan {
    Check.notNegative(seconds, "time in s");
  }

  /**
   * A time in seconds.
   *
   * @param seconds value in s
   * @return the time
   */
  public static TimeSpan ofSeconds(double seconds) {
    return new TimeSpan(seconds);
  }

  /**
   * A time in milliseconds.
   *
   * @param milliseconds value in ms
   * @return the time
   */
  public static TimeSpan ofMilliseconds(double milliseconds) {
    return new TimeSpan(milliseconds * 1e-3);
  }

  /**
   * The value in milliseconds.
   *
   * @return value in ms
   */
  public double milliseconds() {
    return seconds * 1e3;
  }
}
