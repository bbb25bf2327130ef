package spgpe.internal.random;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.apache.commons.math3.stat.inference.KolmogorovSmirnovTest;
import org.junit.jupiter.api.Test;

class BoxMullerTest {
  private static final long BITS = (1L << 52) - 1;

  /** Puts 52 bits for the radius and 52 for the angle where a counter block has them. */
  private static void put(BoxMuller.Scratch s, int e, long radiusBits, long angleBits) {
    s.c0[e] = radiusBits >>> 20;
    s.c1[e] = (radiusBits & 0xfffff) << 12;
    s.c2[e] = angleBits >>> 20;
    s.c3[e] = (angleBits & 0xfffff) << 12;
  }

  /** The pair by the platform's logarithm, cosine and sine of an angle reduced exactly. */
  private static double[] expected(long radiusBits, long angleBits) {
    double r = Math.sqrt(-2 * Math.log((radiusBits + 0.5) * 0x1p-52));
    double v = angleBits * 0x1p-52;
    double quarters = Math.rint(4 * v);
    double rest = 2 * Math.PI * (v - quarters / 4);
    double cos = Math.cos(rest);
    double sin = Math.sin(rest);
    return switch ((int) quarters & 3) {
      case 0 -> new double[] {r * cos, r * sin};
      case 1 -> new double[] {-r * sin, r * cos};
      case 2 -> new double[] {-r * cos, -r * sin};
      default -> new double[] {r * sin, -r * cos};
    };
  }

  private static void assertPairs(long[] radiusBits, long[] angleBits) {
    int n = radiusBits.length;
    BoxMuller.Scratch scratch = new BoxMuller.Scratch(n);
    for (int e = 0; e < n; e++) {
      put(scratch, e, radiusBits[e], angleBits[e]);
    }
    double[] re = new double[n];
    double[] im = new double[n];
    BoxMuller.normals(n, scratch, re, im, 0, 1);
    for (int e = 0; e < n; e++) {
      double[] pair = expected(radiusBits[e], angleBits[e]);
      String bits = "bits " + Long.toHexString(radiusBits[e]) + " " + Long.toHexString(angleBits[e]);
      assertEquals(pair[0], re[e], 1e-14, bits);
      assertEquals(pair[1], im[e], 1e-14, bits);
    }
  }

  @Test
  void agreesWithLogarithmCosineAndSineForManyBits() {
    SplittableRandom random = new SplittableRandom(1);
    int n = 200_000;
    assertPairs(
        random.longs(n).map(x -> x & BITS).toArray(), random.longs(n).map(x -> x & BITS).toArray());
  }

  /** Smallest and largest u, powers of two and the seams of the logarithm and of the angle. */
  @Test
  void agreesAtTheExtremesAndAtEverySeam() {
    long[] seams = new long[64 * 5 + 12];
    int count = 0;
    for (int shift = 0; shift < 52; shift++) {
      for (long d = -1; d <= 1; d++) {
        seams[count++] = ((1L << shift) + d) & BITS;
      }
    }
    for (int eighth = 0; eighth < 8; eighth++) {
      for (long d = -1; d <= 1; d++) {
        seams[count++] = ((long) eighth << 49) + d & BITS;
      }
    }
    long root = (long) (Math.sqrt(0.5) * 0x1p52);
    for (long d = -3; d <= 3; d++) {
      seams[count++] = root + d;
    }
    seams[count++] = BITS;
    seams[count++] = 0;
    long[] radius = new long[count * count];
    long[] angle = new long[count * count];
    for (int i = 0; i < count; i++) {
      for (int j = 0; j < count; j++) {
        radius[i * count + j] = seams[i];
        angle[i * count + j] = seams[j];
      }
    }
    assertPairs(radius, angle);
  }

  @Test
  void theLargestNormalIsFiniteAndTheSmallestRadiusPositive() {
    BoxMuller.Scratch scratch = new BoxMuller.Scratch(2);
    put(scratch, 0, 0, 0);
    put(scratch, 1, BITS, 0);
    double[] re = new double[2];
    double[] im = new double[2];
    BoxMuller.normals(2, scratch, re, im, 0, 1);
    assertEquals(Math.sqrt(2 * 53 * Math.log(2)), re[0], 1e-14); // 8.57: u = 2^-53
    assertEquals(Math.pow(2, -26), re[1], 1e-16); // u = 1 - 2^-53
  }

  @Test
  void writesOnlyEveryStrideThPlace() {
    BoxMuller.Scratch scratch = new BoxMuller.Scratch(3);
    for (int e = 0; e < 3; e++) {
      put(scratch, e, 12345L << 30, 777L << 20);
    }
    double[] re = new double[10];
    double[] im = new double[10];
    BoxMuller.normals(3, scratch, re, im, 2, 3);
    for (int i = 0; i < 10; i++) {
      boolean written = i == 2 || i == 5 || i == 8;
      assertEquals(written, re[i] != 0);
      assertEquals(written, im[i] != 0);
    }
  }

  /**
   * One million numbers from Philox: moments 1 to 6 within 5 standard deviations (false alarm 3.4e-6
   * in all); Kolmogorov and Smirnov's test at 1e-5. Catches a variance wrong by 0.8 % and a
   * distribution function wrong by 0.0025 anywhere.
   */
  @Test
  void aMillionNumbersAreNormal() {
    int n = 500_000;
    BoxMuller.Scratch scratch = new BoxMuller.Scratch(n);
    for (int e = 0; e < n; e++) {
      scratch.c0[e] = e;
    }
    Philox.encrypt(n, scratch.c0, scratch.c1, scratch.c2, scratch.c3, 2026, 0);
    double[] z = new double[2 * n];
    double[] second = new double[n];
    BoxMuller.normals(n, scratch, z, second, 0, 1);
    System.arraycopy(second, 0, z, n, n);
    double[] moments = new double[7];
    for (double x : z) {
      double power = 1;
      for (int p = 1; p <= 6; p++) {
        power *= x;
        moments[p] += power / z.length;
      }
    }
    double[] normal = {1, 0, 1, 0, 3, 0, 15, 0, 105, 0, 945, 0, 10395};
    for (int p = 1; p <= 6; p++) {
      double sigma = Math.sqrt((normal[2 * p] - normal[p] * normal[p]) / z.length);
      assertEquals(normal[p], moments[p], 5 * sigma, "moment " + p);
    }
    double p =
        new KolmogorovSmirnovTest().kolmogorovSmirnovTest(new NormalDistribution(null, 0, 1), z);
    assertTrue(p > 1e-5, "Kolmogorov-Smirnov p-value " + p);
  }
}
