package spgpe.output;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class NpyWriterTest {
  private static final double[] SPECIAL = {
    0.1, -0.0, Double.MIN_VALUE, Double.MAX_VALUE, Double.NaN, Double.NEGATIVE_INFINITY
  };

  @TempDir private Path folder;

  @Test
  void realNumbersKeepEveryBit() throws IOException {
    Path path = folder.resolve("a.npy");
    NpyWriter.write(path, NpyArray.ofReal(SPECIAL));
    NpyReader read = NpyReader.read(path);
    assertEquals("<f8", read.type());
    assertArrayEquals(new int[] {6}, read.shape());
    assertArrayEquals(SPECIAL, read.doubles());
    NpyWriter.write(path, NpyArray.ofReal(SPECIAL, 1, 2, 3));
    assertArrayEquals(new int[] {1, 2, 3}, NpyReader.read(path).shape());
    assertEquals(1, fileCount());
  }

  @Test
  void complexNumbersAreInterleaved() throws IOException {
    Path path = folder.resolve("psi.npy");
    NpyWriter.write(
        path, NpyArray.ofComplex(new double[] {1, 2, 3, 4}, new double[] {5, 6, 7, 8}, 2, 2));
    NpyReader read = NpyReader.read(path);
    assertEquals("<c16", read.type());
    assertArrayEquals(new int[] {2, 2}, read.shape());
    assertArrayEquals(new double[] {1, 5, 2, 6, 3, 7, 4, 8}, read.doubles());
  }

  @Test
  void integersAndEmptyArrays() throws IOException {
    Path path = folder.resolve("n.npy");
    long[] values = {Long.MIN_VALUE, -1, 0, Long.MAX_VALUE};
    NpyWriter.write(path, NpyArray.ofIntegers(values));
    assertEquals("<i8", NpyReader.read(path).type());
    assertArrayEquals(values, NpyReader.read(path).longs());
    NpyWriter.write(path, NpyArray.ofReal(new double[0], 0, 5));
    assertArrayEquals(new int[] {0, 5}, NpyReader.read(path).shape());
    assertEquals(0, NpyReader.read(path).doubles().length);
  }

  /** More than one transfer buffer, whose size is no multiple of the array. */
  @Test
  void longArraysArriveWhole() throws IOException {
    double[] re = new double[10_007];
    double[] im = new double[10_007];
    for (int i = 0; i < re.length; i++) {
      re[i] = i;
      im[i] = -i;
    }
    Path path = folder.resolve("long.npy");
    NpyWriter.write(path, NpyArray.ofComplex(re, im));
    double[] read = NpyReader.read(path).doubles();
    assertEquals(2 * re.length, read.length);
    for (int i = 0; i < re.length; i++) {
      assertEquals(i, read[2 * i]);
      assertEquals(-i, read[2 * i + 1]);
    }
  }

  @Test
  void growingArrayCountsItsSlabs() throws IOException {
    Path path = folder.resolve("map.npy");
    double[] row = new double[3];
    try (NpyWriter map = NpyWriter.create(path)) {
      for (int t = 0; t < 200; t++) {
        row[0] = t;
        row[2] = -t;
        map.append(NpyArray.ofReal(row));
      }
      map.commit();
    }
    NpyReader read = NpyReader.read(path);
    assertArrayEquals(new int[] {200, 3}, read.shape());
    double[] values = read.doubles();
    assertEquals(600, values.length);
    for (int t = 0; t < 200; t++) {
      assertEquals(t, values[3 * t]);
      assertEquals(-t, values[3 * t + 2]);
    }
    try (NpyWriter planes = NpyWriter.create(path)) {
      planes.append(NpyArray.ofIntegers(new long[4], 2, 2));
      planes.commit();
    }
    assertArrayEquals(new int[] {1, 2, 2}, NpyReader.read(path).shape());
  }

  @Test
  void slabsMustMatchTheFirst() {
    try (NpyWriter map = NpyWriter.create(folder.resolve("map.npy"))) {
      assertThrows(IllegalStateException.class, map::commit);
      map.append(NpyArray.ofReal(new double[4]));
      Failures.assertRefused(
          () -> map.append(NpyArray.ofReal(new double[5])), "shape=[4]", "shape=[5]");
      Failures.assertRefused(() -> map.append(NpyArray.ofIntegers(new long[4])), "<f8", "<i8");
      Failures.assertRefused(() -> map.append(NpyArray.ofReal(new double[4], 1, 2, 2)), "slab");
    }
  }

  @Test
  void archiveHoldsEveryArrayAndIsReproducible() throws IOException {
    Path first = folder.resolve("first.npz");
    Path second = folder.resolve("second.npz");
    for (Path path : List.of(first, second)) {
      try (NpzWriter npz = NpzWriter.create(path)) {
        npz.add("x", NpyArray.ofReal(SPECIAL, 2, 3));
        npz.add("psi_1", NpyArray.ofComplex(new double[] {1}, new double[] {2}));
        npz.add("events", NpyArray.ofIntegers(new long[] {7}));
        npz.commit();
      }
    }
    Map<String, NpyReader> arrays = NpyReader.readArchive(first);
    assertEquals(List.of("x.npy", "psi_1.npy", "events.npy"), List.copyOf(arrays.keySet()));
    assertArrayEquals(SPECIAL, arrays.get("x.npy").doubles());
    assertArrayEquals(new int[] {2, 3}, arrays.get("x.npy").shape());
    assertArrayEquals(new double[] {1, 2}, arrays.get("psi_1.npy").doubles());
    assertArrayEquals(new long[] {7}, arrays.get("events.npy").longs());
    assertArrayEquals(Files.readAllBytes(first), Files.readAllBytes(second));
    assertEquals(2, fileCount());
  }

  @Test
  void badInputIsRefusedWithTheReason() {
    double[] four = new double[4];
    Failures.assertRefused(() -> NpyArray.ofReal(four, 2, 3), "shape=[2, 3]", "values=4");
    Failures.assertRefused(() -> NpyArray.ofReal(four, -2, -2), "shape=[-2, -2]");
    Failures.assertRefused(() -> NpyArray.ofReal(four, 1, 1, 2, 2), "one to three dimensions");
    Failures.assertRefused(
        () -> NpyArray.ofReal(four, 65536, 65536, 65536), "shape=[65536, 65536, 65536]");
    Failures.assertRefused(() -> NpyArray.ofComplex(four, new double[3]), "im.length=3");
    try (NpzWriter npz = NpzWriter.create(folder.resolve("a.npz"))) {
      assertThrows(IllegalStateException.class, npz::commit);
      npz.add("x", NpyArray.ofReal(four));
      Failures.assertRefused(() -> npz.add("x", NpyArray.ofReal(four)), "name=x");
      Failures.assertRefused(() -> npz.add("a/b", NpyArray.ofReal(four)), "name='a/b'");
      npz.commit();
      assertThrows(IllegalStateException.class, () -> npz.add("y", NpyArray.ofReal(four)));
      assertThrows(IllegalStateException.class, npz::commit);
    }
    assertTrue(Files.exists(folder.resolve("a.npz")));
  }

  private int fileCount() {
    return folder.toFile().list().length;
  }
}
