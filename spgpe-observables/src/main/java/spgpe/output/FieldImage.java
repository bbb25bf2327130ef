package spgpe.output;

import java.awt.image.BufferedImage;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import javax.imageio.ImageIO;
import javax.imageio.stream.ImageOutputStream;
import javax.imageio.stream.MemoryCacheImageOutputStream;
import spgpe.internal.check.Check;

/**
 * Picture of a real field on a rectangle of points, one cell of pixels per point: a 2D density, or
 * a space-time map with one row per time. Drawn without axes and without a display (works
 * headless).
 *
 * <p>By default the range runs from the smallest to the largest number, the colours are {@link
 * ColourMap#sequential()}, a cell is one pixel, and the first row is at the top; {@code with...}
 * methods give changed copies. Numbers outside the range take the end colours, NaN the colour of
 * missing values. A field of one constant number is drawn in the lowest colour.
 *
 * <p>Immutable and thread-safe.
 */
public final class FieldImage {
  private static final int MAX_PIXELS = 1 << 28;

  private final double[] values;
  private final int rows;
  private final int columns;
  private final Look look;

  private record Look(
      double low, double high, ColourMap colours, int cell, boolean firstRowAtBottom) {}

  private FieldImage(double[] values, int rows, int columns, Look look) {
    this.values = values;
    this.rows = rows;
    this.columns = columns;
    this.look = look;
  }

  /**
   * Picture of a field.
   *
   * @param values rows times columns numbers, row after row; copied
   * @param rows number of rows, &gt;= 1
   * @param columns number of columns, &gt;= 1
   * @return the picture with the default look
   * @throws IllegalArgumentException if the array is null, a size is below 1, the sizes do not fit
   *     the array, there are more than 2^28 points, or no number is finite
   */
  public static FieldImage of(double[] values, int rows, int columns) {
    Check.notNull(values, "values");
    Check.inRange(rows, 1, MAX_PIXELS, "rows");
    Check.inRange(columns, 1, MAX_PIXELS, "columns");
    Check.argument(
        (long) rows * columns == values.length,
        "rows times columns must be the number of values: rows=%s, columns=%s, values.length=%s",
        rows,
        columns,
        values.length);
    checkPixels(rows, columns, 1);
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (double value : values) {
      if (Double.isFinite(value)) {
        low = Math.min(low, value);
        high = Math.max(high, value);
      }
    }
    Check.argument(
        low <= high, "the field holds no finite number: values.length=%s", values.length);
    return new FieldImage(
        values.clone(), rows, columns, new Look(low, high, ColourMap.sequential(), 1, false));
  }

  private static void checkPixels(int rows, int columns, int cell) {
    Check.argument(
        (double) rows * cell * columns * cell <= MAX_PIXELS,
        "the picture would have more than %s pixels: rows=%s, columns=%s, cell=%s",
        MAX_PIXELS,
        rows,
        columns,
        cell);
  }

  /**
   * The same picture with a given range of numbers, so that several pictures can be compared.
   *
   * @param low number drawn in the lowest colour, finite
   * @param high number drawn in the highest colour, finite and above low
   * @return changed copy
   * @throws IllegalArgumentException if a limit is not finite or high is not above low
   */
  public FieldImage withRange(double low, double high) {
    Check.finite(low, "low");
    Check.finite(high, "high");
    Check.argument(high > low, "high must be above low: low=%s, high=%s", low, high);
    return with(new Look(low, high, look.colours, look.cell, look.firstRowAtBottom));
  }

  /**
   * The same picture in other colours.
   *
   * @param colours colour map
   * @return changed copy
   * @throws IllegalArgumentException if the map is null
   */
  public FieldImage withColours(ColourMap colours) {
    Check.notNull(colours, "colours");
    return with(new Look(look.low, look.high, colours, look.cell, look.firstRowAtBottom));
  }

  /**
   * The same picture with larger cells.
   *
   * @param pixels edge of the square drawn for one point, &gt;= 1
   * @return changed copy
   * @throws IllegalArgumentException if the edge is below 1 or the picture would have more than
   *     2^28 pixels
   */
  public FieldImage withCell(int pixels) {
    Check.inRange(pixels, 1, MAX_PIXELS, "pixels");
    checkPixels(rows, columns, pixels);
    return with(new Look(look.low, look.high, look.colours, pixels, look.firstRowAtBottom));
  }

  /**
   * The same picture with the first row at the bottom, so that time runs upwards.
   *
   * @return changed copy
   */
  public FieldImage withFirstRowAtBottom() {
    return with(new Look(look.low, look.high, look.colours, look.cell, true));
  }

  private FieldImage with(Look changed) {
    return new FieldImage(values, rows, columns, changed);
  }

  /**
   * Smallest number of the colour range.
   *
   * @return number drawn in the lowest colour
   */
  public double low() {
    return look.low;
  }

  /**
   * Largest number of the colour range.
   *
   * @return number drawn in the highest colour
   */
  public double high() {
    return look.high;
  }

  /**
   * Draws the picture.
   *
   * @return new image, columns times cell wide and rows times cell high, type RGB
   */
  public BufferedImage toImage() {
    int cell = look.cell;
    int width = columns * cell;
    BufferedImage image = new BufferedImage(width, rows * cell, BufferedImage.TYPE_INT_RGB);
    int[] line = new int[width];
    // Halves keep the difference finite for numbers of any size.
    double span = look.high / 2 - look.low / 2;
    for (int row = 0; row < rows; row++) {
      for (int column = 0; column < columns; column++) {
        double above = values[row * columns + column] / 2 - look.low / 2;
        double fraction = span > 0 ? above / span : above * 0;
        int colour = look.colours.colour(fraction);
        for (int k = 0; k < cell; k++) {
          line[column * cell + k] = colour;
        }
      }
      int place = look.firstRowAtBottom ? rows - 1 - row : row;
      for (int k = 0; k < cell; k++) {
        image.setRGB(0, place * cell + k, width, 1, line, 0, width);
      }
    }
    return image;
  }

  /**
   * Draws the picture into a PNG file.
   *
   * @param path target file; replaced if it exists
   * @throws IllegalArgumentException if the path is null
   * @throws UncheckedIOException if the file cannot be written; no part of it stays
   */
  public void writePng(Path path) {
    Check.notNull(path, "path");
    BufferedImage image = toImage();
    try (AtomicFile file = AtomicFile.create(path)) {
      // An explicit memory cache: the default would put a cache file somewhere else.
      try (ImageOutputStream out = new MemoryCacheImageOutputStream(file.stream())) {
        if (!ImageIO.write(image, "png", out)) {
          throw new IOException("this Java runtime has no PNG writer");
        }
      } catch (IOException e) {
        throw file.failed(e);
      }
      file.commit();
    }
  }
}
