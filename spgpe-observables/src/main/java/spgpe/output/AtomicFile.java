package spgpe.output;

import java.io.IOException;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.channels.Channels;
import java.nio.channels.ClosedByInterruptException;
import java.nio.channels.FileChannel;
import java.nio.file.AccessDeniedException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import spgpe.internal.check.Check;

/**
 * Temporary file beside the target; {@link #commit()} moves it there, {@link #close()} drops it.
 */
final class AtomicFile implements AutoCloseable {
  private static final int MAX_LEFTOVERS = 10_000;

  private final Path target;
  private final Path temporary;
  private final FileChannel channel;
  private boolean open = true;

  private AtomicFile(Path target, Path temporary, FileChannel channel) {
    this.target = target;
    this.temporary = temporary;
    this.channel = channel;
  }

  static AtomicFile create(Path path) {
    Path target = Check.notNull(path, "path").toAbsolutePath();
    Path folder = target.getParent();
    Path name = target.getFileName();
    if (folder == null || name == null || Files.isDirectory(target)) {
      throw failure(target, new IOException("the path is a folder"));
    }
    for (int i = 0; i < MAX_LEFTOVERS; i++) {
      Path temporary = folder.resolve("." + name + ".part" + i);
      try {
        FileChannel channel =
            FileChannel.open(temporary, StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE);
        return new AtomicFile(target, temporary, channel);
      } catch (FileAlreadyExistsException e) {
        // Another writer's file, or the rest of a killed run: leave it alone and count on.
        continue;
      } catch (IOException e) {
        throw failure(target, e);
      }
    }
    throw failure(
        target, new IOException("remove the left-over files ." + name + ".part* in its folder"));
  }

  /** Stream into the temporary file; closing it does not publish anything. */
  OutputStream stream() {
    return Channels.newOutputStream(channel);
  }

  /** Replaces bytes at the start of the file. */
  void overwriteStart(byte[] bytes) throws IOException {
    ByteBuffer buffer = ByteBuffer.wrap(bytes);
    while (buffer.hasRemaining()) {
      channel.write(buffer, buffer.position());
    }
  }

  void commit() {
    try {
      channel.close();
      try {
        Files.move(temporary, target, StandardCopyOption.ATOMIC_MOVE);
      } catch (AtomicMoveNotSupportedException e) {
        Files.move(temporary, target, StandardCopyOption.REPLACE_EXISTING);
      }
      open = false;
    } catch (IOException e) {
      throw failed(e);
    }
  }

  /** Drops the temporary file and wraps the reason. */
  UncheckedIOException failed(IOException cause) {
    UncheckedIOException failure = failure(target, cause);
    try {
      close();
    } catch (UncheckedIOException e) {
      failure.addSuppressed(e);
    }
    return failure;
  }

  private static UncheckedIOException failure(Path target, IOException cause) {
    return new UncheckedIOException("cannot write " + target + ": " + reason(target, cause), cause);
  }

  private static String reason(Path target, IOException cause) {
    Path folder = target.getParent();
    if (cause instanceof NoSuchFileException && folder != null && Files.notExists(folder)) {
      return "folder " + folder + " does not exist, create it first";
    }
    if (folder != null && Files.exists(folder) && !Files.isDirectory(folder)) {
      return folder + " is not a folder";
    }
    if (cause instanceof AccessDeniedException) {
      return "no permission to write in folder " + folder;
    }
    if (cause instanceof ClosedByInterruptException) {
      return "the thread was interrupted while writing";
    }
    String message = cause.getMessage();
    return message == null ? cause.getClass().getSimpleName() : message;
  }

  @Override
  public void close() {
    if (!open) {
      return;
    }
    open = false;
    try {
      channel.close();
      Files.deleteIfExists(temporary);
    } catch (IOException e) {
      throw new UncheckedIOException(
          "cannot remove temporary file " + temporary + ": " + e.getMessage(), e);
    }
  }
}
