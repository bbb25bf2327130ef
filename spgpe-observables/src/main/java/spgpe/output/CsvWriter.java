package spgpe.output;

import java.io.BufferedWriter;
import java.io.IOException;
import java.io.OutputStreamWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import spgpe.internal.check.Check;

/**
 * Streams a table into a comma-separated file. Layout: comment lines that start with {@code # },
 * the last of them listing every column with its unit; one row with the column names; then the
 * data. Numbers are written so that reading them back gives the same bits ({@link
 * Double#toString(double)}); lines end with a single line feed; the encoding is UTF-8.
 *
 * <p>The file appears at its place, whole, when {@link #commit()} returns. Closing without commit,
 * as after an exception, leaves nothing behind:
 *
 * <pre>{@code
 * List<CsvColumn> columns = List.of(CsvColumn.of("t", "hbar/mu"), CsvColumn.of("n", "1/xi"));
 * try (CsvWriter csv = CsvWriter.create(path, columns)) {
 *   csv.row(0.0, 0.97);
 *   csv.commit();
 * }
 * }</pre>
 *
 * <p>Mutable; confined to one thread.
 */
public final class CsvWriter implements AutoCloseable {
  private final AtomicFile file;
  private final BufferedWriter writer;
  private final int columns;
  private int cells;
  private boolean writable = true;

  private CsvWriter(AtomicFile file, int columns) {
    this.file = file;
    this.writer = new BufferedWriter(new OutputStreamWriter(file.stream(), StandardCharsets.UTF_8));
    this.columns = columns;
  }

  /**
   * Starts a table without further comments.
   *
   * @param path target file; replaced if it exists
   * @param columns the columns, at least one, with different names
   * @return the writer
   * @throws IllegalArgumentException as {@link #create(Path, List, List)}
   * @throws UncheckedIOException if the folder cannot be written to
   */
  public static CsvWriter create(Path path, List<CsvColumn> columns) {
    return create(path, columns, List.of());
  }

  /**
   * Starts a table.
   *
   * @param path target file; replaced if it exists
   * @param columns the columns, at least one, with different names
   * @param comments lines put at the top, for instance parameters and seed; no line breaks inside
   * @return the writer
   * @throws IllegalArgumentException if an argument or entry is null, there is no column, two
   *     columns share a name, or a comment holds a line break
   * @throws UncheckedIOException if the folder cannot be written to
   */
  public static CsvWriter create(Path path, List<CsvColumn> columns, List<String> comments) {
    Check.notNull(path, "path");
    Check.notNull(columns, "columns");
    Check.notNull(comments, "comments");
    Check.argument(!columns.isEmpty(), "a table needs at least one column: columns=0");
    StringBuilder head = new StringBuilder();
    for (String comment : comments) {
      Check.notNull(comment, "comment");
      Check.argument(
          comment.indexOf('\n') < 0 && comment.indexOf('\r') < 0,
          "a comment must be a single line: comment='%s'",
          comment);
      head.append("# ").append(comment).append('\n');
    }
    StringBuilder units = new StringBuilder("# columns: ");
    StringBuilder names = new StringBuilder();
    for (int i = 0; i < columns.size(); i++) {
      CsvColumn column = Check.notNull(columns.get(i), "columns[" + i + "]");
      for (int j = 0; j < i; j++) {
        Check.argument(
            !columns.get(j).name().equals(column.name()),
            "column names must differ: columns %s and %s are both named %s",
            j,
            i,
            column.name());
      }
      units.append(i == 0 ? "" : ", ").append(column.name());
      units.append(" [").append(column.unit()).append(']');
      names.append(i == 0 ? "" : ",").append(column.name());
    }
    head.append(units).append('\n').append(names).append('\n');
    CsvWriter csv = new CsvWriter(AtomicFile.create(path), columns.size());
    csv.write(head.toString());
    return csv;
  }

  /**
   * Writes a whole row of numbers.
   *
   * @param values one number per column; NaN and infinities are written as NaN and Infinity
   * @throws IllegalArgumentException if the array is null or has another length than the header
   * @throws IllegalStateException if a row is half written or the writer is closed
   * @throws UncheckedIOException if writing fails; the temporary file is removed then
   */
  public void row(double... values) {
    Check.notNull(values, "values");
    Check.argument(
        values.length == columns,
        "a row needs one value per column: values.length=%s, columns=%s",
        values.length,
        columns);
    Check.state(cells == 0, "finish the row that was begun first: cells written=%s", cells);
    for (double value : values) {
      cell(value);
    }
    endRow();
  }

  /**
   * Writes the next cell of a row as a number.
   *
   * @param value number
   * @return this writer
   * @throws IllegalStateException if the row is full or the writer is closed
   * @throws UncheckedIOException if writing fails; the temporary file is removed then
   */
  public CsvWriter cell(double value) {
    return text(Double.toString(value));
  }

  /**
   * Writes the next cell of a row as a whole number.
   *
   * @param value number
   * @return this writer
   * @throws IllegalStateException if the row is full or the writer is closed
   * @throws UncheckedIOException if writing fails; the temporary file is removed then
   */
  public CsvWriter cell(long value) {
    return text(Long.toString(value));
  }

  /**
   * Writes the next cell of a row as text, quoted where needed.
   *
   * @param value text; line breaks are kept inside quotes
   * @return this writer
   * @throws IllegalArgumentException if the text is null
   * @throws IllegalStateException if the row is full or the writer is closed
   * @throws UncheckedIOException if writing fails; the temporary file is removed then
   */
  public CsvWriter cell(String value) {
    Check.notNull(value, "value");
    boolean plain =
        value.chars().noneMatch(c -> c == ',' || c == '"' || c == '\n' || c == '\r' || c == '#');
    return text(plain ? value : '"' + value.replace("\"", "\"\"") + '"');
  }

  /**
   * Ends a row written cell by cell.
   *
   * @throws IllegalStateException if cells are missing or the writer is closed
   * @throws UncheckedIOException if writing fails; the temporary file is removed then
   */
  public void endRow() {
    Check.state(cells == columns, "the row is not complete: cells=%s, columns=%s", cells, columns);
    write("\n");
    cells = 0;
  }

  private CsvWriter text(String text) {
    Check.state(cells < columns, "the row is full, end it first: columns=%s", columns);
    if (cells > 0) {
      write(",");
    }
    write(text);
    cells++;
    return this;
  }

  private void write(String text) {
    Check.state(writable, "the table was committed or closed already");
    try {
      writer.write(text);
    } catch (IOException e) {
      throw failed(e);
    }
  }

  private UncheckedIOException failed(IOException cause) {
    writable = false;
    return file.failed(cause);
  }

  /**
   * Finishes the table and moves it to its place. Nothing can be written afterwards.
   *
   * @throws IllegalStateException if a row is half written or the writer is closed
   * @throws UncheckedIOException if writing or moving fails; the temporary file is removed then
   */
  public void commit() {
    Check.state(writable, "the table was committed or closed already");
    Check.state(cells == 0, "the last row is not complete: cells=%s, columns=%s", cells, columns);
    try {
      writer.flush();
    } catch (IOException e) {
      throw failed(e);
    }
    writable = false;
    file.commit();
  }

  /** Drops the table unless it was committed. Does nothing when called again. */
  @Override
  public void close() {
    writable = false;
    file.close();
  }
}
