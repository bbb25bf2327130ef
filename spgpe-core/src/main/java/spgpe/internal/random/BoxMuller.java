package spgpe.internal.random;

/**
 * Pairs of standard normal numbers from uniform bits (Box and Muller, Ann. Math. Stat. 29, 610
 * (1958)): r = sqrt(-2 ln u), (r cos 2 pi v, r sin 2 pi v).
 *
 * <p>Uses only +, -, *, / and sqrt, each rounded as IEEE 754 demands, so that the numbers are the
 * same on every machine. ln by the series of 2 artanh((m-1)/(m+1)) for a mantissa m in [sqrt(1/2),
 * sqrt 2); sine and cosine by their Taylor series on [-pi/4, pi/4]. Absolute errors below 1e-15.
 */
public final class BoxMuller {
  static final double LN2_HIGH = 0x1.62e42fefa3800p-1;
  static final double LN2_LOW = 0x1.ef35793c76730p-45;
  static final long FRACTION = 0xfffffffffffffL;
  static final long ONE = 0x3ff0000000000000L;
  /** Fraction bits of sqrt(2): mantissas above it are halved. */
  static final long SQRT2_FRACTION = 0x6a09e667f3bcdL;

  static final double S3 = -1.0 / 6;
  static final double S5 = 1.0 / 120;
  static final double S7 = -1.0 / 5040;
  static final double S9 = 1.0 / 362880;
  static final double S11 = -1.0 / 39916800;
  static final double S13 = 1.0 / 6227020800.0;
  static final double S15 = -1.0 / 1307674368000.0;
  static final double S17 = 1.0 / 355687428096000.0;

  static final double C2 = -1.0 / 2;
  static final double C4 = 1.0 / 24;
  static final double C6 = -1.0 / 720;
  static final double C8 = 1.0 / 40320;
  static final double C10 = -1.0 / 3628800;
  static final double C12 = 1.0 / 479001600;
  static final double C14 = -1.0 / 87178291200.0;
  static final double C16 = 1.0 / 20922789888000.0;

  private static final double[] QUARTER_COS = {1, 0, -1, 0};
  private static final double[] QUARTER_SIN = {0, 1, 0, -1};

  private BoxMuller() {}

  /**
   * Makes a pair of normals from each counter block; the arrays of a {@link Scratch} hold the bits.
   *
   * @param count number of pairs
   * @param s bits on entry; scratch afterwards
   * @param outRe first normals
   * @param outIm second normals
   * @param offset first index written
   * @param stride distance of the indices written
   */
  public static void normals(
      int count, Scratch s, double[] outRe, double[] outIm, int offset, int stride) {
    reduce(count, s);
    radius(count, s.mantissa, s.exponent, s.radius);
    angle(count, s.angle, s.sine, s.cosine);
    for (int e = 0, i = offset; e < count; e++, i += stride) {
      double qc = s.quarterCos[e];
      double qs = s.quarterSin[e];
      outRe[i] = s.radius[e] * (s.cosine[e] * qc - s.sine[e] * qs);
      outIm[i] = s.radius[e] * (s.sine[e] * qc + s.cosine[e] * qs);
    }
  }

  /** Splits the bits: u = (52 bits + 1/2) 2^-52 as 2^e m, and 2 pi v as quarter turns and rest. */
  private static void reduce(int count, Scratch s) {
    for (int e = 0; e < count; e++) {
      long radiusBits = (s.c0[e] << 20) | (s.c1[e] >>> 12);
      double u = (radiusBits + 0.5) * 0x1p-52;
      long bits = Double.doubleToRawLongBits(u);
      long fraction = bits & FRACTION;
      int exponent = (int) (bits >>> 52) - 1023;
      long halve = fraction > SQRT2_FRACTION ? 1 : 0;
      s.mantissa[e] = Double.longBitsToDouble(fraction | (ONE - (halve << 52)));
      s.exponent[e] = exponent + halve;
      long angleBits = (s.c2[e] << 20) | (s.c3[e] >>> 12);
      long centred = angleBits + (1L << 49);
      int quarter = (int) (centred >>> 50) & 3;
      long rest = (centred & ((1L << 50) - 1)) - (1L << 49);
      s.quarterCos[e] = QUARTER_COS[quarter];
      s.quarterSin[e] = QUARTER_SIN[quarter];
      s.angle[e] = rest * (2 * Math.PI * 0x1p-52);
    }
  }

  private static void radius(int count, double[] mantissa, double[] exponent, double[] out) {
    for (int e = 0; e < count; e++) {
      double m = mantissa[e];
      double t = (m - 1) / (m + 1);
      double q = t * t;
      double series =
          1 + q * (1.0 / 3 + q * (1.0 / 5 + q * (1.0 / 7 + q * (1.0 / 9 + q * (1.0 / 11
              + q * (1.0 / 13 + q * (1.0 / 15 + q * (1.0 / 17 + q * (1.0 / 19 + q * (1.0 / 21))))))))));
      double log = exponent[e] * LN2_HIGH + (exponent[e] * LN2_LOW + 2 * t * series);
      out[e] = Math.sqrt(-2 * log);
    }
  }

  private static void angle(int count, double[] angle, double[] sine, double[] cosine) {
    for (int e = 0; e < count; e++) {
      double x = angle[e];
      double q = x * x;
      sine[e] =
          x * (1 + q * (S3 + q * (S5 + q * (S7 + q * (S9 + q * (S11 + q * (S13 + q * (S15
              + q * S17))))))));
      cosine[e] =
          1 + q * (C2 + q * (C4 + q * (C6 + q * (C8 + q * (C10 + q * (C12 + q * (C14
              + q * C16)))))));
    }
  }

  /** Work arrays for a number of pairs. */
  public static final class Scratch {
    /** First words of the counter blocks. */
    public final long[] c0;

    /** Second words. */
    public final long[] c1;

    /** Third words. */
    public final long[] c2;

    /** Fourth words. */
    public final long[] c3;

    final double[] mantissa;
    final double[] exponent;
    final double[] radius;
    final double[] angle;
    final double[] sine;
    final double[] cosine;
    final double[] quarterCos;
    final double[] quarterSin;

    /**
     * Makes the arrays.
     *
     * @param count number of pairs
     */
    public Scratch(int count) {
      c0 = new long[count];
      c1 = new long[count];
      c2 = new long[count];
      c3 = new long[count];
      mantissa = new double[count];
      exponent = new double[count];
      radius = new double[count];
      angle = new double[count];
      sine = new double[count];
      cosine = new double[count];
      quarterCos = new double[count];
      quarterSin = new double[count];
    }
  }
}
