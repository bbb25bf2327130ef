package spgpe.fourier;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.HashSet;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import spgpe.internal.check.AllocationMeter;

/**
 * What every Fourier provider must do: the sums it promises, in place, without threads of its own.
 * Inherit, supply the provider, and run with JUnit. Nothing here is left to chance.
 */
public abstract class FourierProviderContract {
  /**
   * The provider under test.
   *
   * @return the provider
   */
  protected abstract FourierProvider provider();

  /**
   * Sizes to try.
   *
   * @return sizes, each at least 1
   */
  protected int[] sizes() {
    return IntStream.concat(
            IntStream.rangeClosed(1, 64), IntStream.of(100, 128, 243, 1024, 4096, 8192))
        .toArray();
  }

  private static double[] random(int numbers, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    return random.doubles(numbers, -1, 1).toArray();
  }

  /** The plain sum for one frequency: (re, im) of sum over j of x_j exp(sign 2 pi i j k/n). */
  private static double[] plainSum(double[] x, int k, int sign, double[] cos, double[] sin) {
    int n = cos.length;
    double re = 0;
    double im = 0;
    for (int j = 0; j < n; j++) {
      int turn = (int) ((long) j * k % n);
      double c = cos[turn];
      double s = sign * sin[turn];
      re += x[2 * j] * c - x[2 * j + 1] * s;
      im += x[2 * j] * s + x[2 * j + 1] * c;
    }
    return new double[] {re, im};
  }

  @Test
  void itComputesThePlainSumsInBothDirectionsAndTouchesNothingElse() {
    for (int n : sizes()) {
      FourierTransform transform = provider().transform(n);
      assertEquals(n, transform.size(), "size");
      double[] cos = IntStream.range(0, n).mapToDouble(t -> Math.cos(2 * Math.PI * t / n)).toArray();
      double[] sin = IntStream.range(0, n).mapToDouble(t -> Math.sin(2 * Math.PI * t / n)).toArray();
      double[] x = random(2 * n, n);
      int offset = 6;
      double[] guarded = random(2 * n + 11, 99);
      System.arraycopy(x, 0, guarded, offset, 2 * n);
      double[] forward = x.clone();
      transform.forward(forward, 0);
      double[] inverse = guarded.clone();
      transform.inverse(inverse, offset);
      // rounding of the plain sum itself: at most n terms of size 1, error about n eps
      double tolerance = 1e-15 * (n + 10);
      int stride = Math.max(1, n / 97);
      for (int k = 0; k < n; k += stride) {
        double[] plus = plainSum(x, k, 1, cos, sin);
        double[] minus = plainSum(x, k, -1, cos, sin);
        assertEquals(minus[0], forward[2 * k], tolerance, "forward, n=" + n + ", k=" + k);
        assertEquals(minus[1], forward[2 * k + 1], tolerance, "forward, n=" + n + ", k=" + k);
        int at = offset + 2 * k;
        assertEquals(plus[0], inverse[at], tolerance, "inverse, n=" + n + ", k=" + k);
        assertEquals(plus[1], inverse[at + 1], tolerance, "inverse, n=" + n + ", k=" + k);
      }
      for (int i = 0; i < guarded.length; i++) {
        if (i < offset || i >= offset + 2 * n) {
          assertEquals(guarded[i], inverse[i], 0, "outside of the offset, n=" + n + ", i=" + i);
        }
      }
    }
  }

  @Test
  void forwardAndInverseMultiplyByTheSize() {
    for (int n : sizes()) {
      FourierTransform transform = provider().transform(n);
      double[] x = random(2 * n, 7L * n);
      double[] there = x.clone();
      transform.forward(there, 0);
      transform.inverse(there, 0);
      for (int i = 0; i < x.length; i++) {
        assertEquals(x[i], there[i] / n, 1e-14, "n=" + n + ", i=" + i);
      }
    }
  }

  @Test
  void twoTransformsOfOneSizeDoNotDisturbEachOther() {
    FourierTransform one = provider().transform(60);
    FourierTransform two = provider().transform(60);
    double[] x = random(120, 1);
    double[] y = random(120, 2);
    double[] alone = x.clone();
    one.forward(alone, 0);
    two.forward(y, 0);
    double[] again = x.clone();
    one.forward(again, 0);
    for (int i = 0; i < x.length; i++) {
      assertEquals(alone[i], again[i], 0, "a transform must be a function of its input only");
    }
  }

  @Test
  void itRefusesSizesBelowOne() {
    for (int size : new int[] {0, -1, Integer.MIN_VALUE}) {
      String message =
          assertThrows(IllegalArgumentException.class, () -> provider().transform(size))
              .getMessage();
      assertTrue(message.contains("size=" + size), message);
    }
  }

  @Test
  void itHasAName() {
    assertFalse(provider().name().isBlank());
    assertEquals(provider().name(), provider().name());
    assertEquals(provider().rank(), provider().rank());
  }

  /** Alive before the first transform of this class: a pool outlives the test it began in. */
  private static Set<Thread> threadsBefore = Set.of();

  @BeforeAll
  static void rememberThreads() {
    threadsBefore = Set.copyOf(Thread.getAllStackTraces().keySet());
  }

  @Test
  void itStartsNoThreads() {
    for (int n : sizes()) {
      FourierTransform transform = provider().transform(n);
      double[] x = random(2 * n, 3);
      transform.forward(x, 0);
      transform.inverse(x, 0);
    }
    Set<Thread> after = new HashSet<>(Thread.getAllStackTraces().keySet());
    after.removeAll(threadsBefore);
    assertTrue(after.isEmpty(), "threads that were not there before: " + after);
  }

  @Test
  void powersOfTwoAllocateNothing() {
    for (int n : sizes()) {
      if (Integer.bitCount(n) == 1) {
        FourierTransform transform = provider().transform(n);
        double[] x = new double[2 * n];
        double bytes =
            AllocationMeter.bytesPerCall(
                () -> {
                  transform.forward(x, 0);
                  transform.inverse(x, 0);
                });
        assertTrue(bytes < 1, "bytes for each pair of transforms: " + bytes + ", n=" + n);
      }
    }
  }
}
