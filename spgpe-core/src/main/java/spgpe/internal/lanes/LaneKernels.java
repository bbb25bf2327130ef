package spgpe.internal.lanes;

/**
 * Passes of a Fourier transform over many lanes: rows of doubles, one row for each element, real and
 * imaginary parts apart.
 *
 * <p>Every implementation performs the same additions and multiplications on each lane, so that all
 * give the same bits. A pass of radix 2 with the twiddle factor w takes two rows (a, b) to (a + w b,
 * a - w b) on the way to points, and to (a + b, w<sup>*</sup> (a - b)) on the way to modes. Radix 4
 * is two such passes in one: w, then v for the first and i v for the second pair of rows. No fused
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
   * To points, radix 4, w = v = 1, from the modes to four rows that begin at 0; length is a quarter of
   * the array.
   *
   * @param modesRe real parts of the modes
   * @param modesIm imaginary parts of the modes
   * @param scale factor of the result
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param length length of a row
   */
  void fromModes(
      double[] modesRe, double[] modesIm, double scale, double[] re, double[] im, int length);

  /**
   * The same with twiddle factors; the factor scale is in w already.
   *
   * @param modesRe real parts of the modes
   * @param modesIm imaginary parts of the modes
   * @param scale factor of the result
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param vr real part of v
   * @param vi imaginary part of v
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param length length of a row
   */
  void fromModesTurned(
      double[] modesRe, double[] modesIm, double scale, double wr, double wi, double vr, double vi,
      double[] re, double[] im, int length);

  /**
   * To points, radix 4, in place.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param vr real part of v
   * @param vi imaginary part of v
   * @param begin begin of the first row
   * @param length length of a row
   */
  void points4(
      double[] re, double[] im, double wr, double wi, double vr, double vi, int begin, int length);

  /**
   * To points, radix 2, in place.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param begin begin of the first row
   * @param length length of a row
   */
  void points2(double[] re, double[] im, double wr, double wi, int begin, int length);

  /**
   * To points, radix 4, in place on blocks of four neighbouring rows.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param leaves twiddle factors and layout
   * @param firstBlock number of the first block of four rows
   * @param lastBlock one past the last block
   * @param firstRow first row
   */
  void pointLeaves(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow);

  /**
   * To modes, radix 4, in place on blocks of four neighbouring rows.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param leaves twiddle factors and layout
   * @param firstBlock number of the first block of four rows
   * @param lastBlock one past the last block
   * @param firstRow first row
   */
  void modeLeaves(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow);

  /**
   * To points, radix 8, in place on blocks of eight neighbouring rows: radix 2, then 4.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param leaves twiddle factors and layout
   * @param firstBlock number of the first block of eight rows
   * @param lastBlock one past the last block
   * @param firstRow first row
   */
  default void pointLeaves8(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow) {
    Twiddles twiddles = leaves.twiddles();
    LaneLayout layout = leaves.layout();
    int length = layout.at(4 * layout.lanes());
    for (int block = firstBlock, row = firstRow; block < lastBlock; block++, row += 8) {
      points2(
          re, im, twiddles.re[block], twiddles.im[block], layout.at(row * layout.lanes()), length);
    }
    pointLeaves(re, im, leaves, 2 * firstBlock, 2 * lastBlock, firstRow);
  }

  /**
   * To modes, radix 8, in place on blocks of eight neighbouring rows: radix 4, then 2.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param leaves twiddle factors and layout
   * @param firstBlock number of the first block of eight rows
   * @param lastBlock one past the last block
   * @param firstRow first row
   */
  default void modeLeaves8(
      double[] re, double[] im, LaneFourier.Leaves leaves, int firstBlock, int lastBlock,
      int firstRow) {
    modeLeaves(re, im, leaves, 2 * firstBlock, 2 * lastBlock, firstRow);
    Twiddles twiddles = leaves.twiddles();
    LaneLayout layout = leaves.layout();
    int length = layout.at(4 * layout.lanes());
    for (int block = firstBlock, row = firstRow; block < lastBlock; block++, row += 8) {
      modes2(
          re, im, twiddles.re[block], twiddles.im[block], layout.at(row * layout.lanes()), length);
    }
  }

  /**
   * To modes, radix 2, in place.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param begin begin of the first row
   * @param length length of a row
   */
  void modes2(double[] re, double[] im, double wr, double wi, int begin, int length);

  /**
   * To modes, radix 4, in place.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param vr real part of v
   * @param vi imaginary part of v
   * @param begin begin of the first row
   * @param length length of a row
   */
  void modes4(
      double[] re, double[] im, double wr, double wi, double vr, double vi, int begin, int length);

  /**
   * To modes, radix 4, w = v = 1, from four rows that begin at 0; the modes are overwritten.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param scale factor of the result
   * @param modesRe real parts of the modes
   * @param modesIm imaginary parts of the modes
   * @param length length of a row
   */
  void intoModes(
      double[] re, double[] im, double scale, double[] modesRe, double[] modesIm, int length);

  /**
   * The same with twiddle factors, added to the modes; the factor scale is in w already.
   *
   * @param re real parts of the rows
   * @param im imaginary parts of the rows
   * @param scale factor of the result
   * @param wr real part of w
   * @param wi imaginary part of w
   * @param vr real part of v
   * @param vi imaginary part of v
   * @param modesRe real parts of the modes
   * @param modesIm imaginary parts of the modes
   * @param length length of a row
   */
  void addToModesTurned(
      double[] re, double[] im, double scale, double wr, double wi, double vr, double vi,
      double[] modesRe, double[] modesIm, int length);
}
