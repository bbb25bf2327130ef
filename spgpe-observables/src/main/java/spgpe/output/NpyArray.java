package spgpe.output;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Locale;
import spgpe.internal.check.Check;

/**
 * Numbers with a shape, ready to be written: a view of the caller's arrays in C order (last index
 * fastest), of one to three dimensions. Types: 64-bit floating point ({@code <f8}), complex pairs
 * of them ({@code <c16}) taken from separate real and imaginary arrays, and 64-bit integers ({@code
 * <i8}).
 *
 * <p>The numbers are not copied: they must stay unchanged until the array has been written. The
 * view itself has no state and is as thread-safe as the arrays under it.
 */
public final class NpyArray {
  private static final int ALIGNMENT = 64;
  private static final int PREFIX = 10;
  private static final int MAX_RANK = 3;

  private final String type;
  private final int[] shape;
  private final int words;
  private final int length;
  private final Words source;

  private interface Words {
    void put(ByteBuffer buffer, int index);
  }

  private NpyArray(String type, int words, int length, int[] shape, Words source) {
    this.type = type;
    this.words = words;
    this.length = length;
    this.shape = shape;
    this.source = source;
  }

  /**
   * View of real numbers.
   *
   * @param values the numbers in C order
   * @param shape sizes of one to three dimensions; none means one dimension of values.length
   * @return the view
   * @throws IllegalArgumentException if an argument is null, the shape has more than three
   *     dimensions or a negative size, or its product is not values.length
   */
  public static NpyArray ofReal(double[] values, int... shape) {
    Check.notNull(values, "values");
    int[] checked = checkShape(shape, values.length);
    return new NpyArray("<f8", 1, values.length, checked, (b, i) -> b.putDouble(values[i]));
  }

  /**
   * View of complex numbers.
   *
   * @param re real parts in C order
   * @param im imaginary parts, same length
   * @param shape sizes of one to three dimensions; none means one dimension of re.length
   * @return the view
   * @throws IllegalArgumentException if an argument is null, the arrays differ in length, the shape
   *     has more than three dimensions or a negative size, or its product is not re.length
   */
  public static NpyArray ofComplex(double[] re, double[] im, int... shape) {
    Check.notNull(re, "re");
    Check.notNull(im, "im");
    Check.argument(
        re.length == im.length,
        "re and im must have the same length: re.length=%s, im.length=%s",
        re.length,
        im.length);
    int[] checked = checkShape(shape, re.length);
    return new NpyArray(
        "<c16", 2, re.length, checked, (b, i) -> b.putDouble(re[i]).putDouble(im[i]));
  }

  /**
   * View of whole numbers.
   *
   * @param values the numbers in C order
   * @param shape sizes of one to three dimensions; none means one dimension of values.length
   * @return the view
   * @throws IllegalArgumentException if an argument is null, the shape has more than three
   *     dimensions or a negative size, or its product is not values.length
   */
  public static NpyArray ofIntegers(long[] values, int... shape) {
    Check.notNull(values, "values");
    int[] checked = checkShape(shape, values.length);
    return new NpyArray("<i8", 1, values.length, checked, (b, i) -> b.putLong(values[i]));
  }

  private static int[] checkShape(int[] shape, int length) {
    Check.notNull(shape, "shape");
    if (shape.length == 0) {
      return new int[] {length};
    }
    Check.argument(
        shape.length <= MAX_RANK,
        "an array has one to three dimensions: shape=%s",
        Arrays.toString(shape));
    long product = 1;
    for (int size : shape) {
      Check.argument(size >= 0, "sizes of an array must be >= 0: shape=%s", Arrays.toString(shape));
      // Beyond the range of int the product can no longer match, so it need not grow further.
      product = Math.min(product * size, Integer.MAX_VALUE + 1L);
    }
    Check.argument(
        product == length,
        "the product of the sizes must be the number of values: shape=%s, values=%s",
        Arrays.toString(shape),
        length);
    return shape.clone();
  }

  String type() {
    return type;
  }

  int[] shape() {
    return shape;
  }

  int length() {
    return length;
  }

  int bytesPerValue() {
    return words * Double.BYTES;
  }

  /** Puts as many values as fit, beginning with the given one; returns the next to put. */
  int putValues(ByteBuffer buffer, int first) {
    int end = Math.min(length, first + buffer.remaining() / bytesPerValue());
    for (int i = first; i < end; i++) {
      source.put(buffer, i);
    }
    return end;
  }

  byte[] header() {
    return header(type, Arrays.stream(shape).asLongStream().toArray(), 0);
  }

  /** Version 1.0 header, padded to a multiple of 64 bytes and to at least the given length. */
  static byte[] header(String type, long[] shape, int minimum) {
    StringBuilder sizes = new StringBuilder();
    for (int i = 0; i < shape.length; i++) {
      // A comma after the only size makes the text a tuple.
      sizes.append(i == 0 ? "" : ", ").append(shape[i]).append(shape.length == 1 ? "," : "");
    }
    String dictionary =
        String.format(
            Locale.ROOT, "{'descr': '%s', 'fortran_order': False, 'shape': (%s), }", type, sizes);
    int wanted = Math.max(minimum, PREFIX + dictionary.length() + 1);
    int total = (wanted + ALIGNMENT - 1) / ALIGNMENT * ALIGNMENT;
    ByteBuffer buffer = ByteBuffer.allocate(total).order(ByteOrder.LITTLE_ENDIAN);
    buffer.put((byte) 0x93).put("NUMPY".getBytes(StandardCharsets.US_ASCII));
    buffer.put((byte) 1).put((byte) 0).putShort((short) (total - PREFIX));
    buffer.put(dictionary.getBytes(StandardCharsets.US_ASCII));
    while (buffer.remaining() > 1) {
      buffer.put((byte) ' ');
    }
    buffer.put((byte) '\n');
    return buffer.array();
  }

  @Override
  public String toString() {
    return "NpyArray: type=" + type + ", shape=" + Arrays.toString(shape);
  }
}
