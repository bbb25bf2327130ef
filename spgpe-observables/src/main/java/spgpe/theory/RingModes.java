package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * Modes kept on a ring: wave numbers {@code k_n = 2 pi n/L} with {@code |n| <= cutoffMode}.
 *
 * @param length circumference L (length), greater than zero
 * @param cutoffMode largest kept mode number, 1 to 100000
 */
public record RingModes(double length, int cutoffMode) {

  /**
   * Checks the values.
   *
   * @param length circumference L (length), greater than zero
   * @param cutoffMode largest kept mode number, 1 to 100000
   * @throws IllegalArgumentException if a value is out of range
   */
  public RingModes {
    Check.positive(length, "length");
    Check.inRange(cutoffMode, 1, 100_000, "cutoffMode");
  }

  /**
   * Wave number of one mode.
   *
   * @param mode mode number
   * @return {@code 2 pi mode/L} (1/length)
   */
  public double waveNumber(int mode) {
    return 2 * Math.PI * mode / length;
  }

  /**
   * Cutoff to use in continuum formulas: half way between the last kept and the first missing mode.
   *
   * @return {@code 2 pi (cutoffMode + 1/2)/L} (1/length)
   */
  public double effectiveCutoff() {
    return 2 * Math.PI * (cutoffMode + 0.5) / length;
  }

  /**
   * Number of kept modes per component.
   *
   * @return {@code 2 cutoffMode + 1}
   */
  public int count() {
    return 2 * cutoffMode + 1;
  }
}
