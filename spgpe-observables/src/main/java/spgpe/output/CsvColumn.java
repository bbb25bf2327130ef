package spgpe.output;

import spgpe.internal.check.Check;

/**
 * A column of a table. Immutable and thread-safe.
 *
 * @param name short name for the header row; no comma, quote, line break or leading #
 * @param unit unit as text, for instance {@code hbar/mu}; {@code 1} for a pure number
 */
public record CsvColumn(String name, String unit) {
  /**
   * Checks both texts.
   *
   * @param name short name for the header row; no comma, quote, line break or leading #
   * @param unit unit as text, for instance {@code hbar/mu}; {@code 1} for a pure number
   * @throws IllegalArgumentException if one of them is null, blank, or holds a character that would
   *     need quoting
   */
  public CsvColumn {
    Check.notNull(name, "name");
    Check.notNull(unit, "unit");
    checkText(name, "column name");
    checkText(unit, "column unit");
    Check.argument(!name.startsWith("#"), "a column name must not start with #: name=%s", name);
  }

  /**
   * Makes a column with a unit.
   *
   * @param name short name
   * @param unit unit as text
   * @return the column
   * @throws IllegalArgumentException as the constructor
   */
  public static CsvColumn of(String name, String unit) {
    return new CsvColumn(name, unit);
  }

  /**
   * Makes a column of pure numbers or texts.
   *
   * @param name short name
   * @return the column, with unit 1
   * @throws IllegalArgumentException as the constructor
   */
  public static CsvColumn of(String name) {
    return new CsvColumn(name, "1");
  }

  private static void checkText(String text, String what) {
    Check.argument(
        !text.isBlank() && text.chars().noneMatch(c -> c == ',' || c == '"' || c < ' '),
        "%s must not be blank or hold a comma, a double quote or a line break: %s='%s'",
        what,
        what,
        text);
  }
}
