package spgpe.theory;

import java.util.List;
import spgpe.internal.check.Check;

/**
 * A theoretical value to compare a measurement with.
 *
 * @param value predicted value
 * @param error one-sigma uncertainty of the prediction, zero if exact for the purpose
 * @param lowRatio smallest ratio measurement/value that the theory's approximations allow; one for
 *     an exact theory
 * @param highRatio largest such ratio, not below {@code lowRatio}
 * @param warnings where the theory is used outside its checked range; empty if nowhere
 */
public record Prediction(
    double value, double error, double lowRatio, double highRatio, List<String> warnings) {

  /**
   * Checks the values.
   *
   * @param value predicted value
   * @param error one-sigma uncertainty of the prediction, zero if exact for the purpose
   * @param lowRatio smallest ratio measurement/value that the theory's approximations allow; one
   *     for an exact theory
   * @param highRatio largest such ratio, not below {@code lowRatio}
   * @param warnings where the theory is used outside its checked range; empty if nowhere
   * @throws IllegalArgumentException if a number is not finite, the error negative or the band
   *     empty
   */
  public Prediction {
    Check.finite(value, "value");
    Check.notNegative(error, "error");
    Check.finite(lowRatio, "lowRatio");
    Check.argument(
        highRatio >= lowRatio && Double.isFinite(highRatio),
        "the ratio band must not be empty: lowRatio=%s, highRatio=%s", lowRatio, highRatio);
    warnings = List.copyOf(Check.notNull(warnings, "warnings"));
  }

  /**
   * A prediction of an exact theory with a numerical or statistical error.
   *
   * @param value predicted value
   * @param error one-sigma uncertainty, not negative
   * @return the prediction
   * @throws IllegalArgumentException if a number is not finite or the error negative
   */
  public static Prediction exact(double value, double error) {
    return new Prediction(value, error, 1, 1, List.of());
  }

  /**
   * Adds a remark on the regime.
   *
   * @param warning the remark
   * @return a changed copy
   */
  public Prediction withWarning(String warning) {
    List<String> all = new java.util.ArrayList<>(warnings);
    all.add(Check.notNull(warning, "warning"));
    return new Prediction(value, error, lowRatio, highRatio, all);
  }
}
