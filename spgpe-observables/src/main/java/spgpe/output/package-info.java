/**
 * Files: comma-separated tables ({@link spgpe.output.CsvWriter}), NumPy arrays ({@link
 * spgpe.output.NpyWriter}, {@link spgpe.output.NpzWriter}) and pictures of fields ({@link
 * spgpe.output.FieldImage}).
 *
 * <p>Every writer writes to a temporary file in the folder of the target (name {@code
 * .target.partN}) and moves it over the target at the end. A target is therefore either absent, old
 * and whole, or new and whole. File errors are {@link java.io.UncheckedIOException}s that name path
 * and reason.
 */
@NullMarked
package spgpe.output;

import org.jspecify.annotations.NullMarked;
