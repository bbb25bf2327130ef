package spgpe.internal.random;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.SplittableRandom;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.simple.RandomSource;
import org.junit.jupiter.api.Test;

class PhiloxTest {
  private static int[] encrypt(int c0, int c1, int c2, int c3, int key0, int key1) {
    long[][] words = {
      {Integer.toUnsignedLong(c0)}, {Integer.toUnsignedLong(c1)},
      {Integer.toUnsignedLong(c2)}, {Integer.toUnsignedLong(c3)}
    };
    Philox.encrypt(1, words[0], words[1], words[2], words[3], key0, key1);
    int[] result = new int[4];
    for (int w = 0; w < 4; w++) {
      assertEquals(0, words[w][0] >>> 32, "results are 32-bit words");
      result[w] = (int) words[w][0];
    }
    return result;
  }

  private static void assertWords(String expected, int[] found) {
    StringBuilder text = new StringBuilder();
    for (int word : found) {
      text.append(String.format("%08x ", word));
    }
    assertEquals(expected, text.toString().trim());
  }

  /** Known answers of Salmon, Moraes, Dror and Shaw, Proc. SC11 (2011), philox 4x32, 10 rounds. */
  @Test
  void knownAnswers() {
    assertWords("6627e8d5 e169c58d bc57ac4c 9b00dbd8", encrypt(0, 0, 0, 0, 0, 0));
    assertWords("408f276d 41c83b0e a20bc7c6 6d5451fd", encrypt(-1, -1, -1, -1, -1, -1));
    assertWords(
        "d16cfe09 94fdcceb 5001e420 24126ea1",
        encrypt(0x243f6a88, 0x85a308d3, 0x13198a2e, 0x03707344, 0xa4093822, 0x299f31d0));
  }

  /** Apache Commons RNG increments the counter before it makes its first block. */
  @Test
  void agreesWithApacheCommonsRng() {
    SplittableRandom random = new SplittableRandom(3);
    for (int attempt = 0; attempt < 200; attempt++) {
      int key0 = random.nextInt();
      int key1 = random.nextInt();
      int[] counter = {random.nextInt(), random.nextInt(), random.nextInt(), random.nextInt()};
      UniformRandomProvider other =
          RandomSource.PHILOX_4X32.create(
              new int[] {key0, key1, counter[0], counter[1], counter[2], counter[3]});
      for (int block = 1; block <= 3; block++) {
        int c0 = counter[0] + block;
        if (Integer.compareUnsigned(c0, counter[0]) < 0) {
          break; // a carry into the next word is the other generator's affair
        }
        for (int word : encrypt(c0, counter[1], counter[2], counter[3], key0, key1)) {
          assertEquals(word, other.nextInt());
        }
      }
    }
  }

  @Test
  void manyCountersAtOnceAreTheSameAsOneByOne() {
    int count = 100;
    long[][] words = new long[4][count];
    SplittableRandom random = new SplittableRandom(4);
    int[][] counters = new int[count][4];
    for (int e = 0; e < count; e++) {
      for (int w = 0; w < 4; w++) {
        counters[e][w] = random.nextInt();
        words[w][e] = Integer.toUnsignedLong(counters[e][w]);
      }
    }
    Philox.encrypt(count, words[0], words[1], words[2], words[3], 11, -12);
    for (int e = 0; e < count; e++) {
      int[] c = counters[e];
      int[] alone = encrypt(c[0], c[1], c[2], c[3], 11, -12);
      for (int w = 0; w < 4; w++) {
        assertEquals(alone[w], (int) words[w][e]);
      }
    }
  }
}
