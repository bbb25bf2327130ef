package spgpe.output;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.file.Path;
import java.time.LocalDateTime;
import java.util.HashSet;
import java.util.Set;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import spgpe.internal.check.Check;

/**
 * Writes several named arrays to one NumPy {@code .npz} file (a zip archive of {@code .npy} files,
 * deflated). Equal content gives equal bytes: entries carry a fixed date.
 *
 * <p>The file appears at its place, whole, when {@link #commit()} returns. Closing without commit,
 * as after an exception, leaves nothing behind:
 *
 * <pre>{@code
 * try (NpzWriter npz = NpzWriter.create(path)) {
 *   npz.add("x", NpyArray.ofReal(x));
 *   npz.add("psi", NpyArray.ofComplex(re, im, 2, x.length));
 *   npz.commit();
 * }
 * }</pre>
 *
 * <p>Mutable; confined to one thread.
 */
public final class NpzWriter implements AutoCloseable {
  private static final LocalDateTime ENTRY_DATE = LocalDateTime.of(1980, 1, 1, 0, 0);

  private final AtomicFile file;
  private final ZipOutputStream zip;
  private final ByteBuffer buffer = NpyWriter.newBuffer();
  private final Set<String> names = new HashSet<>();
  private boolean writable = true;

  private NpzWriter(AtomicFile file) {
    this.file = file;
    this.zip = new ZipOutputStream(file.stream());
  }

  /**
   * Starts an archive.
   *
   * @param path target file; replaced if it exists
   * @return the writer
   * @throws IllegalArgumentException if the path is null
   * @throws UncheckedIOException if the folder cannot be written to
   */
  public static NpzWriter create(Path path) {
    return new NpzWriter(AtomicFile.create(path));
  }

  /**
   * Adds an array. The numbers are written before the method returns.
   *
   * @param name key in the loaded archive: letters, digits and underscores, not used before
   * @param array the numbers
   * @throws IllegalArgumentException if an argument is null, or the name is used already or holds
   *     other characters
   * @throws IllegalStateException if the writer was committed or closed
   * @throws UncheckedIOException if writing fails; the temporary file is removed then
   */
  public void add(String name, NpyArray array) {
    Check.state(writable, "the archive was committed or closed already");
    Check.notNull(name, "name");
    Check.notNull(array, "array");
    Check.argument(
        name.matches("[A-Za-z0-9_]+"),
        "an array name consists of letters, digits and underscores: name='%s'",
        name);
    Check.argument(names.add(name), "an array of this name was added already: name=%s", name);
    try {
      ZipEntry entry = new ZipEntry(name + ".npy");
      entry.setTimeLocal(ENTRY_DATE);
      zip.putNextEntry(entry);
      NpyWriter.writeTo(zip, array, buffer);
      zip.closeEntry();
    } catch (IOException e) {
      writable = false;
      throw file.failed(e);
    }
  }

  /**
   * Finishes the archive and moves it to its place. Nothing can be added afterwards.
   *
   * @throws IllegalStateException if no array was added, or the writer was committed or closed
   * @throws UncheckedIOException if writing or moving fails; the temporary file is removed then
   */
  public void commit() {
    Check.state(writable, "the archive was committed or closed already");
    Check.state(!names.isEmpty(), "add at least one array first: arrays=0");
    writable = false;
    try {
      zip.close();
    } catch (IOException e) {
      throw file.failed(e);
    }
    file.commit();
  }

  /** Drops the archive unless it was committed. Does nothing when called again. */
  @Override
  public void close() {
    writable = false;
    file.close();
  }
}
