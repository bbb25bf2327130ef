package spgpe.theory;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import spgpe.internal.check.Check;

/**
 * Comparisons that print themselves as a text table.
 *
 * @param rows the comparisons, in the order of printing
 */
public record ComparisonTable(List<Comparison> rows) {
  private static final String LINE = "%-32s %13s %10s %13s %10s %8s %9s  %s%n";

  /**
   * Copies the rows.
   *
   * @param rows the comparisons, in the order of printing
   */
  public ComparisonTable {
    rows = List.copyOf(Check.notNull(rows, "rows"));
  }

  /**
   * A table without rows.
   *
   * @return the empty table
   */
  public static ComparisonTable empty() {
    return new ComparisonTable(List.of());
  }

  /**
   * Adds a row.
   *
   * @param row the comparison
   * @return a changed copy
   */
  public ComparisonTable with(Comparison row) {
    List<Comparison> all = new ArrayList<>(rows);
    all.add(Check.notNull(row, "row"));
    return new ComparisonTable(all);
  }

  /**
   * Adds a row.
   *
   * @param name what was measured, with its unit
   * @param measured measured value
   * @param standardError its standard error, greater than zero
   * @param prediction the theory
   * @return a changed copy
   * @throws IllegalArgumentException if a number is not finite or the error not positive
   */
  public ComparisonTable with(
      String name, double measured, double standardError, Prediction prediction) {
    return with(new Comparison(name, measured, standardError, prediction));
  }

  /**
   * Number of rows that differ from theory.
   *
   * @return the count of {@link Comparison.Verdict#DIFFERS}
   */
  public int differing() {
    int count = 0;
    for (Comparison row : rows) {
      if (row.verdict() == Comparison.Verdict.DIFFERS) {
        count++;
      }
    }
    return count;
  }

  /**
   * The table as text: a header, a line for each row, and the warnings below.
   *
   * @return several lines, each ended by a line separator
   */
  @Override
  public String toString() {
    StringBuilder text = new StringBuilder();
    text.append(
        String.format(
            Locale.ROOT,
            LINE,
            "quantity", "measured", "+-", "theory", "+-", "sigma", "rel %", "verdict"));
    List<String> notes = new ArrayList<>();
    for (Comparison row : rows) {
      StringBuilder verdict = new StringBuilder(label(row));
      for (String warning : row.warnings()) {
        notes.add(warning);
        verdict.append(" [").append(notes.size()).append(']');
      }
      text.append(
          String.format(
              Locale.ROOT,
              LINE,
              row.name(),
              number("%.6g", row.measured()),
              number("%.2g", row.standardError()),
              number("%.6g", row.prediction().value()),
              number("%.2g", row.prediction().error()),
              number("%+.2f", row.sigmas()),
              number("%+.3g", 100 * row.relativeDifference()),
              verdict));
    }
    for (int i = 0; i < notes.size(); i++) {
      text.append(String.format(Locale.ROOT, "[%d] %s%n", i + 1, notes.get(i)));
    }
    return text.toString();
  }

  private static String number(String format, double value) {
    return String.format(Locale.ROOT, format, value);
  }

  private static String label(Comparison row) {
    Prediction p = row.prediction();
    return switch (row.verdict()) {
      case AGREES -> "agrees";
      case WITHIN_BAND ->
          String.format(Locale.ROOT, "in band %.3g to %.3g", p.lowRatio(), p.highRatio());
      case DIFFERS -> "DIFFERS";
      case UNDECIDED -> "undecided";
    };
  }
}
