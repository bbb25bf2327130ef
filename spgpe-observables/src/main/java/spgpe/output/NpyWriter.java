package spgpe.output;

import java.io.IOException;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Path;
import java.util.Arrays;
import org.jspecify.annotations.Nullable;
import spgpe.internal.check.Check;

/**
 * Writes one array to a NumPy {@code .npy} file (format version 1.0, little endian, C order),
 * either at once by {@link #write(Path, NpyArray)}, or slab by slab along the first dimension when
 * their number is not known beforehand, as in a space-time map recorded during a run.
 *
 * <p>The file appears at its place, whole, when {@link #commit()} returns. Closing without commit,
 * as after an exception, leaves nothing behind:
 *
 * <pre>{@code
 * try (NpyWriter map = NpyWriter.create(path)) {
 *   for (double[] density : rows) {
 *     map.append(NpyArray.ofReal(density));
 *   }
 *   map.commit();
 * }
 * }</pre>
 *
 * <p>Mutable; confined to one thread. Format: numpy.lib.format documentation.
 */
public final class NpyWriter implements AutoCloseable {
  private static final int HEADER_LENGTH = 128;

  private final AtomicFile file;
  private final OutputStream stream;
  private final ByteBuffer buffer = newBuffer();
  private @Nullable NpyArray firstSlab;
  private long slabs;
  private boolean writable = true;

  private NpyWriter(AtomicFile file) {
    this.file = file;
    this.stream = file.stream();
  }

  /**
   * Writes a whole array.
   *
   * @param path target file; replaced if it exists
   * @param array the numbers
   * @throws IllegalArgumentException if an argument is null
   * @throws UncheckedIOException if the file cannot be written; no part of it stays
   */
  public static void write(Path path, NpyArray array) {
    Check.notNull(array, "array");
    try (AtomicFile file = AtomicFile.create(path)) {
      try {
        writeTo(file.stream(), array, newBuffer());
      } catch (IOException e) {
        throw file.failed(e);
      }
      file.commit();
    }
  }

  /**
   * Starts an array that grows along its first dimension.
   *
   * @param path target file; replaced if it exists
   * @return the writer
   * @throws IllegalArgumentException if the path is null
   * @throws UncheckedIOException if the folder cannot be written to
   */
  public static NpyWriter create(Path path) {
    return new NpyWriter(AtomicFile.create(path));
  }

  /**
   * Appends one slab: a row of a 2D array, a plane of a 3D array. The numbers are written before
   * the method returns, so the caller may change them then.
   *
   * @param slab one- or two-dimensional numbers, of the same type and shape in every call
   * @throws IllegalArgumentException if the slab is null, three-dimensional, or differs in type or
   *     shape from the first one
   * @throws IllegalStateException if the writer was committed or closed
   * @throws UncheckedIOException if writing fails; the temporary file is removed then
   */
  public void append(NpyArray slab) {
    Check.state(writable, "the array was committed or closed already");
    Check.notNull(slab, "slab");
    Check.argument(
        slab.shape().length <= 2,
        "a slab has one or two dimensions, so that the array has at most three: %s",
        slab);
    NpyArray first = firstSlab;
    Check.argument(
        first == null
            || first.type().equals(slab.type()) && Arrays.equals(first.shape(), slab.shape()),
        "all slabs must have one type and shape: first slab: %s, this slab: %s",
        first,
        slab);
    try {
      if (first == null) {
        firstSlab = slab;
        stream.write(header(slab, 0));
      }
      writeValues(stream, slab, buffer);
    } catch (IOException e) {
      writable = false;
      throw file.failed(e);
    }
    slabs++;
  }

  /**
   * Finishes the array and moves it to its place. Nothing can be appended afterwards.
   *
   * @throws IllegalStateException if no slab was appended, or the writer was committed or closed
   * @throws UncheckedIOException if writing or moving fails; the temporary file is removed then
   */
  public void commit() {
    Check.state(writable, "the array was committed or closed already");
    NpyArray first = firstSlab;
    Check.state(first != null, "append at least one slab first: slabs=0");
    writable = false;
    try {
      file.overwriteStart(header(Check.notNull(first, "first slab"), slabs));
    } catch (IOException e) {
      throw file.failed(e);
    }
    file.commit();
  }

  private static byte[] header(NpyArray slab, long slabs) {
    long[] shape = new long[slab.shape().length + 1];
    shape[0] = slabs;
    for (int i = 1; i < shape.length; i++) {
      shape[i] = slab.shape()[i - 1];
    }
    return NpyArray.header(slab.type(), shape, HEADER_LENGTH);
  }

  /** Drops the array unless it was committed. Does nothing when called again. */
  @Override
  public void close() {
    writable = false;
    file.close();
  }

  static ByteBuffer newBuffer() {
    return ByteBuffer.allocate(1 << 16).order(ByteOrder.LITTLE_ENDIAN);
  }

  static void writeTo(OutputStream out, NpyArray array, ByteBuffer buffer) throws IOException {
    out.write(array.header());
    writeValues(out, array, buffer);
  }

  private static void writeValues(OutputStream out, NpyArray array, ByteBuffer buffer)
      throws IOException {
    int next = 0;
    while (next < array.length()) {
      buffer.clear();
      next = array.putValues(buffer, next);
      out.write(buffer.array(), 0, buffer.position());
    }
  }
}
