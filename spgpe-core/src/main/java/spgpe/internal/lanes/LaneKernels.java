package spgpe.internal.lanes;

/**
 * Passes of a Fourier transform over many lanes: rows of doubles, one row for each element, real
 * and
 * imaginary parts apart.
 *
 * <p>Every implementation performs the same additions and multiplications on each lane, so that all
 * give the same bits. With w = exp(-i theta) a forward pass of radix 2 takes two rows (a, b) to (a
 * +
 * w b, a - w b), the inverse pass (a, b) to (a + b, w<sup>*</sup> (a - b)); radix 4 is two of these
 * passes in one, with twiddle factors w, then v for the first and -i v for the second pair. No
 * fused
 * multiply-add: it would round differently, and a processor without it is very slow at it.
 * Implementations are stateless and thread-safe.
 */
public interface LaneKernels {
  /**
   * Number of doubles worked on at a time: row lengths must be multiples of it.
   *
   * @return width, a power of two
   */
  int width();

  /**
   * Forward pass of radix 4 without twiddle factors on four rows that begin at 0.
   *
   * @param re real parts
   * @param im imaginary parts
   * @param length length of a row
   */
  void forwardTop(double[] re, double[] im, int length);

  /**
   * Forward pass of radix 4 on four rows.
   *
   * @param re real parts
   * @param im imaginary parts
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param vr real part of v
   * @param vi imaginary part of v
   * @param begin begin of the first row
   * @param length length of a row
   */
  void forward4(
      double[] re, double[] im, double wr, double wi, double vr, double vi, int begin, int length);

  /**
   * Forward pass of radix 2 on two rows.
   *
   * @param re real parts
   * @param im imaginary parts
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param begin begin of the first row
   * @param length length of a row
   */
  void forward2(double[] re, double[] im, double wr, double wi, int begin, int length);

  /**
   * Inverse pass of radix 4 without twiddle factors on four rows that begin at 0.
   *
   * @param re real parts
   * @param im imaginary parts
   * @param length length of a row
   */
  void inverseTop(double[] re, double[] im, int length);

  /**
   * Inverse pass of radix 4 on four rows.
   *
   * @param re real parts
   * @param im imaginary parts
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param vr real part of v
   * @param vi imaginary part of v
   * @param begin begin of the first row
   * @param length length of a row
   */
  void inverse4(
      double[] re, double[] im, double wr, double wi, double vr, double vi, int begin, int length);

  /**
   * Inverse pass of radix 2 on two rows.
   *
   * @param re real parts
   * @param im imaginary parts
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param begin begin of the first row
   * @param length length of a row
   */
  void inverse2(double[] re, double[] im, double wr, double wi, int begin, int length);

  /**
   * First inverse pass, of radix 4 on neighbouring rows: reads the modes, multiplies each by its
   * factor and writes the rows.
   *
   * @param edge places and factors of the modes
   * @param modesRe real parts of the modes
   * @param modesIm imaginary parts of the modes
   * @param re real parts, written
   * @param im imaginary parts, written
   * @param firstBlock first block of four rows
   * @param lastBlock one past the last block
   */
  void inverseEdge(
      ModeEdge edge, double[] modesRe, double[] modesIm, double[] re, double[] im, int firstBlock,
      int lastBlock);

  /**
   * Last forward pass, of radix 4 on neighbouring rows: multiplies each row by the factor of its
   * mode
   * and adds it to the modes.
   *
   * @param edge places and factors of the modes
   * @param re real parts, read
   * @param im imaginary parts, read
   * @param modesRe real parts of the modes, added to
   * @param modesIm imaginary parts of the modes, added to
   * @param firstBlock first block of four rows
   * @param lastBlock one past the last block
   */
  void forwardEdge(
      ModeEdge edge, double[] re, double[] im, double[] modesRe, double[] modesIm, int firstBlock,
      int lastBlock);
}
