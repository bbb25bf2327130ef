package spgpe.units;

import spgpe.internal.check.Check;

/**
 * An ordinary frequency f (cycles per second). The angular frequency w = 2 pi f has its own factory
 * and accessor, so that the factor 2 pi is never guessed.
 *
 * @param hertz ordinary frequency f in Hz, finite and not negative
 */
public record Frequency(double hertz) {
  /**
   * Checks the value.
   *
   * @param hertz ordinary frequency f in Hz, finite and not negative
   * @throws IllegalArgumentException if the value is negative or not finite
   */
  public Frequency {
    Check.notNegative(hertz, "frequency in Hz");
  }

  /**
   * An ordinary frequency in hertz: a trap of "2 pi x 1.5 kHz" is {@code ofHertz(1500)}.
   *
   * @param hertz f in Hz
   * @return the frequency
   */
  public static Frequency ofHertz(double hertz) {
    return new Frequency(hertz);
  }

  /**
   * An ordinary frequency in kilohertz.
   *
   * @param kilohertz f in kHz
   * @return the frequency
   */
  public static Frequency ofKilohertz(double kilohertz) {
    return new Frequency(kilohertz * 1e3);
  }

  /**
   * A frequency given by its angular value.
   *
   * @param radiansPerSecond w = 2 pi f in rad/s
   * @return the frequency
   */
  public static Frequency ofAngular(double radiansPerSecond) {
    return new Frequency(radiansPerSecond / (2 * Math.PI));
  }

  /**
   * The angular frequency.
   *
   * @return w = 2 pi f in rad/s
   */
  public double angular() {
    return 2 * Math.PI * hertz;
  }

  /**
   * The energy of one quantum, h f = hbar w.
   *
   * @return the energy
   */
  public Energy quantum() {
    return Energy.ofHertz(hertz);
  }
}
