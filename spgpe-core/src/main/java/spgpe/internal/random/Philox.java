package spgpe.internal.random;

/**
 * Philox4x32-10, the counter-based generator of Salmon, Moraes, Dror and Shaw, "Parallel random
 * numbers: as easy as 1, 2, 3", Proc. SC11 (2011), for many counters that differ in their first word
 * only.
 *
 * <p>Written as short loops over separate arrays, one for each round, which the just-in-time
 * compiler turns into vector code.
 */
public final class Philox {
  private static final long LOW_WORD = 0xffffffffL;
  private static final long MULTIPLIER_0 = 0xD2511F53L;
  private static final long MULTIPLIER_1 = 0xCD9E8D57L;
  private static final int KEY_STEP_0 = 0x9E3779B9;
  private static final int KEY_STEP_1 = 0xBB67AE85;
  private static final int ROUNDS = 10;

  private Philox() {}

  /**
   * Encrypts counters in place: word i of counter e stands in the low half of {@code ci[e]}.
   *
   * @param count number of counters
   * @param c0 first words
   * @param c1 second words
   * @param c2 third words
   * @param c3 fourth words
   * @param key0 low word of the key
   * @param key1 high word of the key
   */
  public static void encrypt(
      int count, long[] c0, long[] c1, long[] c2, long[] c3, int key0, int key1) {
    int k0 = key0;
    int k1 = key1;
    for (int r = 0; r < ROUNDS; r++) {
      round(count, c0, c1, c2, c3, k0 & LOW_WORD, k1 & LOW_WORD);
      k0 += KEY_STEP_0;
      k1 += KEY_STEP_1;
    }
  }

  private static void round(
      int count, long[] c0, long[] c1, long[] c2, long[] c3, long key0, long key1) {
    for (int i = 0; i < count; i++) {
      long product0 = MULTIPLIER_0 * c0[i];
      long product1 = MULTIPLIER_1 * c2[i];
      c0[i] = (product1 >>> 32) ^ c1[i] ^ key0;
      c1[i] = product1 & LOW_WORD;
      c2[i] = (product0 >>> 32) ^ c3[i] ^ key1;
      c3[i] = product0 & LOW_WORD;
    }
  }
}
