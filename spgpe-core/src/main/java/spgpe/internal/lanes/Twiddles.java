package spgpe.internal.lanes;

/**
 * Twiddle factors in the order of the blocks of a pass: block b of any pass has w = exp(2 pi i
 * r/(2B)) with r the bit reversal of b among the B blocks, whatever B is. Immutable.
 */
final class Twiddles {
  final double[] re;
  final double[] im;

  /** For transforms of the given number of points, a power of two, at least 4. */
  Twiddles(int points) {
    int bits = Integer.numberOfTrailingZeros(points) - 1;
    re = new double[points / 2];
    im = new double[points / 2];
    for (int b = 0; b < re.length; b += 2) {
      double angle = 2 * Math.PI * reversed(b, bits) / points;
      re[b] = Math.cos(angle);
      im[b] = Math.sin(angle);
      // exactly i times its neighbour: passes of radix 4 rely on it
      re[b + 1] = -im[b];
      im[b + 1] = re[b];
    }
  }

  /** The number whose lowest bits are those of the given one in reverse. */
  static int reversed(int number, int bits) {
    return bits == 0 ? 0 : Integer.reverse(number) >>> (32 - bits);
  }
}
