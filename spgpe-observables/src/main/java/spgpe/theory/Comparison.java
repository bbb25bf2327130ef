package spgpe.theory;

import java.util.List;
import java.util.Locale;
import spgpe.internal.check.Check;

/**
 * A measured value set against its prediction.
 *
 * @param name what was measured, with its unit
 * @param measured measured value
 * @param standardError its standard error, greater than zero
 * @param prediction the theory
 */
public record Comparison(
    String name, double measured, double standardError, Prediction prediction) {
  private static final double LIMIT = 3;

  /** Outcome of a comparison. */
  public enum Verdict {
    /** Within three combined standard errors of an exact prediction. */
    AGREES,
    /** Within the band of ratios that an approximate prediction allows, plus three errors. */
    WITHIN_BAND,
    /** Further away than that. */
    DIFFERS,
    /** The combined error exceeds half of the predicted value: the comparison decides nothing. */
    UNDECIDED
  }

  /**
   * Checks the values.
   *
   * @param name what was measured, with its unit
   * @param measured measured value
   * @param standardError its standard error, greater than zero
   * @param prediction the theory
   * @throws IllegalArgumentException if a number is not finite or the error not positive
   */
  public Comparison {
    Check.notNull(name, "name");
    Check.finite(measured, "measured");
    Check.positive(standardError, "standardError");
    Check.notNull(prediction, "prediction");
  }

  /**
   * Combined error of measurement and prediction.
   *
   * @return the root of the sum of squares
   */
  public double combinedError() {
    return Math.hypot(standardError, prediction.error());
  }

  /**
   * Difference in combined standard errors.
   *
   * @return {@code (measured - predicted)/combined error}
   */
  public double sigmas() {
    return (measured - prediction.value()) / combinedError();
  }

  /**
   * Relative difference.
   *
   * @return {@code measured/predicted - 1}; infinite or NaN if the predicted value is zero
   */
  public double relativeDifference() {
    return measured / prediction.value() - 1;
  }

  /**
   * Distance from the allowed band in combined standard errors.
   *
   * @return zero inside the band, else the distance to its nearer edge
   */
  public double sigmasOutsideBand() {
    double a = prediction.lowRatio() * prediction.value();
    double b = prediction.highRatio() * prediction.value();
    double low = Math.min(a, b);
    double high = Math.max(a, b);
    double outside = Math.max(0, Math.max(low - measured, measured - high));
    return outside / combinedError();
  }

  /**
   * Outcome. For an exact prediction and Gaussian errors a correct simulation is called different
   * once in 370 comparisons.
   *
   * @return the verdict
   */
  public Verdict verdict() {
    if (sigmasOutsideBand() > LIMIT) {
      return Verdict.DIFFERS;
    }
    if (prediction.value() != 0 && combinedError() > 0.5 * Math.abs(prediction.value())) {
      return Verdict.UNDECIDED;
    }
    return prediction.highRatio() > prediction.lowRatio() ? Verdict.WITHIN_BAND : Verdict.AGREES;
  }

  /**
   * Remarks on the regime.
   *
   * @return the warnings of the prediction, plus one if the combined error decides nothing
   */
  public List<String> warnings() {
    if (verdict() != Verdict.UNDECIDED) {
      return prediction.warnings();
    }
    return prediction
        .withWarning(
            "the combined error exceeds half of the predicted value: more statistics needed")
        .warnings();
  }

  /**
   * One line for a log.
   *
   * @return name, values, difference and verdict
   */
  @Override
  public String toString() {
    return String.format(
        Locale.ROOT,
        "%s: measured %.6g +- %.2g, predicted %.6g +- %.2g, %+.2f sigma, %+.3g %%: %s",
        name,
        measured,
        standardError,
        prediction.value(),
        prediction.error(),
        sigmas(),
        100 * relativeDifference(),
        verdict());
  }
}
