package spgpe.internal.check;

import java.util.Locale;
import org.jspecify.annotations.Nullable;

/**
 * Argument checks whose messages state the rule, then {@code name=value}. Every comparison is
 * written so that NaN fails it. The checks of single numbers allocate nothing when they hold, so
 * that time steps may use them; {@link #argument} boxes its values in any case.
 */
public final class Check {
  private Check() {}

  /**
   * Throws unless the condition holds.
   *
   * @param condition what must be true
   * @param format message in {@link String#format} syntax
   * @param arguments values for the message
   * @throws IllegalArgumentException if the condition is false
   */
  public static void argument(boolean condition, String format, @Nullable Object... arguments) {
    if (!condition) {
      throw new IllegalArgumentException(String.format(Locale.ROOT, format, arguments));
    }
  }

  /**
   * Throws unless the condition holds; for calls made in the wrong order.
   *
   * @param condition what must be true
   * @param format message in {@link String#format} syntax
   * @param arguments values for the message
   * @throws IllegalStateException if the condition is false
   */
  public static void state(boolean condition, String format, @Nullable Object... arguments) {
    if (!condition) {
      throw new IllegalStateException(String.format(Locale.ROOT, format, arguments));
    }
  }

  /**
   * Throws unless the condition holds, without making an array for values: for time steps.
   *
   * @param condition what must be true
   * @param message message
   * @throws IllegalStateException if the condition is false
   */
  public static void state(boolean condition, String message) {
    if (!condition) {
      throw new IllegalStateException(message);
    }
  }

  /**
   * Refuses null with the parameter's name.
   *
   * @param value value to test
   * @param name parameter name
   * @param <T> type of the value
   * @return the value
   * @throws IllegalArgumentException if the value is null
   */
  public static <T> T notNull(@Nullable T value, String name) {
    if (value == null) {
      throw new IllegalArgumentException(name + " must not be null");
    }
    return value;
  }

  /**
   * Requires a finite number.
   *
   * @param value value to test
   * @param name parameter name, with its unit where it has one
   * @return the value
   */
  public static double finite(double value, String name) {
    if (!Double.isFinite(value)) {
      argument(false, "%s must be finite: %s=%s", name, name, value);
    }
    return value;
  }

  /**
   * Requires a finite number greater than zero.
   *
   * @param value value to test
   * @param name parameter name, with its unit where it has one
   * @return the value
   */
  public static double positive(double value, String name) {
    if (!(value > 0 && value < Double.POSITIVE_INFINITY)) {
      argument(false, "%s must be finite and > 0: %s=%s", name, name, value);
    }
    return value;
  }

  /**
   * Requires a finite number not below zero.
   *
   * @param value value to test
   * @param name parameter name, with its unit where it has one
   * @return the value
   */
  public static double notNegative(double value, String name) {
    if (!(value >= 0 && value < Double.POSITIVE_INFINITY)) {
      argument(false, "%s must be finite and >= 0: %s=%s", name, name, value);
    }
    return value;
  }

  /**
   * Requires a whole number in a closed range.
   *
   * @param value value to test
   * @param low smallest admissible value
   * @param high largest admissible value
   * @param name parameter name
   * @return the value
   */
  public static int inRange(int value, int low, int high, String name) {
    if (value < low || value > high) {
      argument(false, "%s must lie in %s..%s: %s=%s", name, low, high, name, value);
    }
    return value;
  }
}
