package spgpe.internal.random;

/**
 * Makes complex normals from counters: Philox4x32-10, then {@link BoxMuller}. Every implementation
 * gives the same bits. Stateless and thread-safe.
 */
public interface NormalKernels {
  /** Largest number of pairs of one call, and size of the scratch arrays. */
  int BLOCK = 128;

  /**
   * Makes the pairs first to first + count - 1. Words 0 and 2 of their counters stand at these
   * indices of the given arrays; words 1 and 3 are common.
   *
   * @param count number of pairs, at most {@link #BLOCK}
   * @param first first index
   * @param words0 first words
   * @param word1 second word
   * @param words2 third words
   * @param word3 fourth word
   * @param key0 low word of the key
   * @param key1 high word of the key
   * @param scratch work arrays
   * @param outRe first normals are written here, at these indices
   * @param outIm second normals
   */
  void fill(
      int count, int first, long[] words0, long word1, long[] words2, long word3, int key0,
      int key1, BoxMuller.Scratch scratch, double[] outRe, double[] outIm);
}
