package spgpe.output;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;

/** Reads what the writers wrote, straight from the description of the format, version 1.0. */
record NpyReader(String type, int[] shape, ByteBuffer data) {
  private static final Pattern HEADER =
      Pattern.compile(
          "\\{'descr': '(<f8|<c16|<i8)', 'fortran_order': False, 'shape': \\(([0-9, ]*)\\), \\}"
              + " *\n");

  static NpyReader read(Path path) throws IOException {
    return parse(Files.readAllBytes(path));
  }

  static Map<String, NpyReader> readArchive(Path path) throws IOException {
    Map<String, NpyReader> arrays = new LinkedHashMap<>();
    try (InputStream in = Files.newInputStream(path);
        ZipInputStream zip = new ZipInputStream(in)) {
      for (ZipEntry e = zip.getNextEntry(); e != null; e = zip.getNextEntry()) {
        arrays.put(e.getName(), parse(zip.readAllBytes()));
      }
    }
    return arrays;
  }

  private static NpyReader parse(byte[] bytes) {
    ByteBuffer buffer = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
    byte[] magic = new byte[8];
    buffer.get(magic);
    assertArrayEquals(new byte[] {(byte) 0x93, 'N', 'U', 'M', 'P', 'Y', 1, 0}, magic);
    byte[] text = new byte[Short.toUnsignedInt(buffer.getShort())];
    buffer.get(text);
    assertEquals(0, buffer.position() % 64, "data must be aligned");
    String header = new String(text, StandardCharsets.US_ASCII);
    Matcher matcher = HEADER.matcher(header);
    assertTrue(matcher.matches(), header);
    String sizes = matcher.group(2);
    int[] shape = Arrays.stream(sizes.split(", *")).mapToInt(Integer::parseInt).toArray();
    assertEquals(shape.length == 1, sizes.endsWith(","), "a tuple of one needs its comma");
    return new NpyReader(matcher.group(1), shape, buffer.slice().order(ByteOrder.LITTLE_ENDIAN));
  }

  double[] doubles() {
    double[] values = new double[data.remaining() / 8];
    data.duplicate().order(ByteOrder.LITTLE_ENDIAN).asDoubleBuffer().get(values);
    return values;
  }

  long[] longs() {
    long[] values = new long[data.remaining() / 8];
    data.duplicate().order(ByteOrder.LITTLE_ENDIAN).asLongBuffer().get(values);
    return values;
  }
}
