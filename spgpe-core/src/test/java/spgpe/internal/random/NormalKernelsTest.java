package spgpe.internal.random;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import spgpe.internal.vector.VectorModule;

/** The kernels with vector instructions make the bits of the plain ones. */
class NormalKernelsTest {
  @Test
  void vectorAndPlainKernelsGiveTheSameBits() {
    NormalKernels vector =
        VectorModule.find("spgpe.internal.random.VectorNormals", NormalKernels.class).orElseThrow();
    NormalKernels plain = new PlainNormals();
    SplittableRandom random = new SplittableRandom(1);
    int length = NormalKernels.BLOCK + 5;
    for (int trial = 0; trial < 2000; trial++) {
      int count = 1 + random.nextInt(NormalKernels.BLOCK);
      int first = random.nextInt(length - count + 1);
      long[] words0 = random.longs(length, 0, 1L << 32).toArray();
      long[] words2 = random.longs(length, 0, 1L << 32).toArray();
      long word1 = random.nextLong(1L << 32);
      long word3 = random.nextLong(1L << 32);
      int key0 = random.nextInt();
      int key1 = random.nextInt();
      double[][] found = new double[4][length];
      BoxMuller.Scratch scratch = new BoxMuller.Scratch(NormalKernels.BLOCK);
      vector.fill(
          count, first, words0, word1, words2, word3, key0, key1, scratch, found[0], found[1]);
      plain.fill(
          count, first, words0, word1, words2, word3, key0, key1, scratch, found[2], found[3]);
      assertArrayEquals(found[2], found[0]);
      assertArrayEquals(found[3], found[1]);
    }
  }
}
