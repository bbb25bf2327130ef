package spgpe.output;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class AtomicFileTest {
  private static final List<CsvColumn> COLUMNS = List.of(CsvColumn.of("t"));
  private static final NpyArray ARRAY = NpyArray.ofReal(new double[] {1, 2});

  @TempDir private Path folder;

  @Test
  void exceptionInTheMiddleLeavesNothingBehind() {
    assertThrows(
        ArithmeticException.class,
        () -> {
          try (CsvWriter csv = CsvWriter.create(folder.resolve("a.csv"), COLUMNS);
              NpyWriter npy = NpyWriter.create(folder.resolve("a.npy"));
              NpzWriter npz = NpzWriter.create(folder.resolve("a.npz"))) {
            csv.row(1);
            npy.append(ARRAY);
            npz.add("x", ARRAY);
            assertEquals(List.of(".a.csv.part0", ".a.npy.part0", ".a.npz.part0"), files());
            throw new ArithmeticException("run diverged");
          }
        });
    assertEquals(List.of(), files());
  }

  @Test
  void oldFileStaysWholeUntilCommit() throws IOException {
    Path path = folder.resolve("a.csv");
    Files.writeString(path, "old");
    try (CsvWriter csv = CsvWriter.create(path, COLUMNS)) {
      csv.row(1);
    }
    assertEquals("old", Files.readString(path));
    try (CsvWriter csv = CsvWriter.create(path, COLUMNS)) {
      csv.row(1);
      assertEquals("old", Files.readString(path));
      csv.commit();
    }
    assertTrue(Files.readString(path).endsWith("t\n1.0\n"));
    assertEquals(List.of("a.csv"), files());
  }

  @Test
  void leftOversOfAKilledRunAreNotTouched() throws IOException {
    Files.writeString(folder.resolve(".a.npy.part0"), "left over");
    NpyWriter.write(folder.resolve("a.npy"), ARRAY);
    assertEquals(List.of(".a.npy.part0", "a.npy"), files());
    assertEquals("left over", Files.readString(folder.resolve(".a.npy.part0")));
  }

  @Test
  void missingFolderIsNamed() {
    Path path = folder.resolve("absent").resolve("a");
    String reason = folder.resolve("absent") + " does not exist";
    Failures.assertUnwritable(() -> CsvWriter.create(path, COLUMNS), path.toString(), reason);
    Failures.assertUnwritable(() -> NpyWriter.write(path, ARRAY), path.toString(), reason);
    Failures.assertUnwritable(() -> NpzWriter.create(path), path.toString(), reason);
    FieldImage image = FieldImage.of(new double[] {1}, 1, 1);
    Failures.assertUnwritable(() -> image.writePng(path), path.toString(), reason);
  }

  @Test
  void fileInPlaceOfTheFolderIsNamed() throws IOException {
    Path file = Files.writeString(folder.resolve("file"), "");
    Path path = file.resolve("a.npy");
    Failures.assertUnwritable(
        () -> NpyWriter.write(path, ARRAY), path.toString(), file + " is not a folder");
  }

  @Test
  void folderAsTargetIsRefused() throws IOException {
    Path path = Files.createDirectory(folder.resolve("empty"));
    Failures.assertUnwritable(
        () -> NpyWriter.write(path, ARRAY), path.toString(), "the path is a folder");
    assertTrue(Files.isDirectory(path));
  }

  /** An interrupt closes the channel, which stands for any failure of the file system. */
  @Test
  void failureWhileWritingRemovesTheTemporaryFile() {
    Path path = folder.resolve("a.npy");
    try (NpyWriter npy = NpyWriter.create(path)) {
      npy.append(ARRAY);
      Thread.currentThread().interrupt();
      Failures.assertUnwritable(() -> npy.append(ARRAY), path.toString(), "interrupted");
      assertTrue(Thread.interrupted(), "the interrupt stays visible to the caller");
      assertEquals(List.of(), files());
      assertThrows(IllegalStateException.class, () -> npy.append(ARRAY));
      assertThrows(IllegalStateException.class, npy::commit);
    }
    CsvWriter csv = CsvWriter.create(folder.resolve("a.csv"), COLUMNS);
    Thread.currentThread().interrupt();
    Failures.assertUnwritable(csv::commit, "a.csv", "interrupted");
    assertTrue(Thread.interrupted());
    csv.close();
    assertEquals(List.of(), files());
  }

  private List<String> files() {
    String[] names = folder.toFile().list();
    return Arrays.stream(names).sorted().toList();
  }
}
