package spgpe.units;

import java.util.List;
import java.util.Locale;
import spgpe.internal.check.Check;

/**
 * One answer to "does the model apply here?": a named number held against two limits.
 *
 * @param name what is measured, for example "mu/(hbar w_perp)"
 * @param grade the outcome
 * @param value the number; may be infinite, never NaN
 * @param limit the value up to (or from) which the outcome is {@link Grade#FINE}
 * @param outsideLimit the value beyond which the outcome is {@link Grade#OUTSIDE}
 * @param reason why it matters, and where the limits come from
 */
public record Verdict(
    String name, Grade grade, double value, double limit, double outsideLimit, String reason) {
  /** Outcome of a verdict, in rising order of worry. */
  public enum Grade {
    /** The assumption holds. */
    FINE,
    /** The assumption holds badly: expect corrections of the size of the number. */
    MARGINAL,
    /** The assumption fails: the model does not describe this experiment. */
    OUTSIDE
  }

  /** Marks limits that are rules of thumb. */
  static final String RULE_OF_THUMB = "; limits: common practice, no source";

  /**
   * Checks the parts.
   *
   * @param name what is measured, for example "mu/(hbar w_perp)"
   * @param grade the outcome
   * @param value the number; may be infinite, never NaN
   * @param limit the value up to (or from) which the outcome is {@link Grade#FINE}
   * @param outsideLimit the value beyond which the outcome is {@link Grade#OUTSIDE}
   * @param reason why it matters, and where the limits come from
   * @throws IllegalArgumentException if a part is null or the value is NaN
   */
  public Verdict {
    Check.notNull(name, "name");
    Check.notNull(grade, "grade");
    Check.notNull(reason, "reason");
    Check.argument(!Double.isNaN(value), "%s must be a number: value=%s", name, value);
  }

  /**
   * Judges a number that should be small.
   *
   * @param name what is measured
   * @param value the number
   * @param limit fine up to and including this
   * @param outsideLimit outside above this
   * @param reason why it matters
   * @return the verdict
   */
  public static Verdict atMost(
      String name, double value, double limit, double outsideLimit, String reason) {
    Grade grade =
        value <= limit ? Grade.FINE : value <= outsideLimit ? Grade.MARGINAL : Grade.OUTSIDE;
    return new Verdict(name, grade, value, limit, outsideLimit, reason);
  }

  /**
   * Judges a number that should be large.
   *
   * @param name what is measured
   * @param value the number
   * @param limit fine from this on
   * @param outsideLimit outside at this and below
   * @param reason why it matters
   * @return the verdict
   */
  public static Verdict atLeast(
      String name, double value, double limit, double outsideLimit, String reason) {
    Grade grade =
        value >= limit ? Grade.FINE : value > outsideLimit ? Grade.MARGINAL : Grade.OUTSIDE;
    return new Verdict(name, grade, value, limit, outsideLimit, reason);
  }

  /**
   * The worst grade of a list.
   *
   * @param verdicts verdicts
   * @return the worst grade, {@link Grade#FINE} for an empty list
   */
  public static Grade worst(List<Verdict> verdicts) {
    return Check.notNull(verdicts, "verdicts").stream()
        .map(Verdict::grade)
        .reduce(Grade.FINE, Verdict::worse);
  }

  private static Grade worse(Grade one, Grade other) {
    return one.compareTo(other) >= 0 ? one : other;
  }

  /**
   * One readable line.
   *
   * @return grade, name, value, limits and reason
   */
  @Override
  public String toString() {
    return String.format(
        Locale.ROOT,
        "%-8s %s = %.4g (fine: %.3g, outside: %.3g) %s",
        grade,
        name,
        value,
        limit,
        outsideLimit,
        reason);
  }
}
