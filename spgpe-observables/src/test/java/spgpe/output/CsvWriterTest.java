package spgpe.output;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CsvWriterTest {
  private static final List<CsvColumn> COLUMNS =
      List.of(CsvColumn.of("t", "hbar/mu"), CsvColumn.of("n", "1/xi"), CsvColumn.of("mean_cos"));

  @TempDir private Path folder;

  @Test
  void layout() throws IOException {
    Path path = folder.resolve("decay.csv");
    try (CsvWriter csv =
        CsvWriter.create(path, COLUMNS, List.of("two states of K-41 in a ring", "seed 2026"))) {
      csv.row(0, .5, -1);
      csv.cell(1L).cell("a \"b\", c").cell(Double.NaN).endRow();
      csv.commit();
    }
    assertEquals(
        """
        # two states of K-41 in a ring
        # seed 2026
        # columns: t [hbar/mu], n [1/xi], mean_cos [1]
        t,n,mean_cos
        0.0,0.5,-1.0
        1,"a ""b"", c",NaN
        """,
        Files.readString(path));
  }

  @Test
  void numbersReadBackToTheSameBits() throws IOException {
    Path path = folder.resolve("numbers.csv");
    double[][] rows = new double[300][3];
    try (CsvWriter csv = CsvWriter.create(path, COLUMNS)) {
      for (int i = 0; i < rows.length; i++) {
        rows[i] = new double[] {Math.exp(2 * i - 300), -Math.sqrt(i), Double.longBitsToDouble(i)};
        csv.row(rows[i]);
      }
      csv.commit();
    }
    List<String> lines = Files.readAllLines(path);
    assertEquals(2 + rows.length, lines.size());
    for (int i = 0; i < rows.length; i++) {
      String[] cells = lines.get(2 + i).split(",");
      for (int j = 0; j < 3; j++) {
        assertEquals(
            Double.doubleToRawLongBits(rows[i][j]),
            Double.doubleToRawLongBits(Double.parseDouble(cells[j])));
      }
    }
  }

  @Test
  void rowsMustBeComplete() {
    try (CsvWriter csv = CsvWriter.create(folder.resolve("a.csv"), COLUMNS)) {
      Failures.assertRefused(() -> csv.row(1, 2), "values.length=2", "columns=3");
      csv.cell(1.0).cell(2.0);
      assertThrows(IllegalStateException.class, csv::endRow);
      assertThrows(IllegalStateException.class, csv::commit);
      assertThrows(IllegalStateException.class, () -> csv.row(1, 2, 3));
      csv.cell(3.0);
      assertThrows(IllegalStateException.class, () -> csv.cell(4.0));
      csv.endRow();
      csv.commit();
      assertThrows(IllegalStateException.class, () -> csv.row(1, 2, 3));
      assertThrows(IllegalStateException.class, csv::commit);
    }
  }

  @Test
  void badInputIsRefusedWithTheReason() {
    Path path = folder.resolve("a.csv");
    Failures.assertRefused(() -> CsvWriter.create(path, List.of()), "columns=0");
    Failures.assertRefused(
        () -> CsvWriter.create(path, List.of(CsvColumn.of("t"), CsvColumn.of("t", "s"))),
        "named t");
    Failures.assertRefused(() -> CsvWriter.create(path, COLUMNS, List.of("a\nb")), "single line");
    Failures.assertRefused(() -> CsvColumn.of(" "), "column name");
    Failures.assertRefused(() -> CsvColumn.of("a,b"), "'a,b'");
    Failures.assertRefused(() -> CsvColumn.of("#a"), "name=#a");
    Failures.assertRefused(() -> CsvColumn.of("a", "\n"), "column unit");
    assertEquals(0, folder.toFile().list().length);
  }
}
