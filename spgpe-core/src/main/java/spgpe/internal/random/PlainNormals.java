package spgpe.internal.random;

import java.util.Arrays;

/** {@link NormalKernels} in plain Java. */
public final class PlainNormals implements NormalKernels {
  /** Makes the kernels. */
  public PlainNormals() {}

  @Override
  public void fill(
      int count, int first, long[] words0, long word1, long[] words2, long word3, int key0,
      int key1, BoxMuller.Scratch scratch, double[] outRe, double[] outIm) {
    encrypt(count, first, words0, word1, words2, word3, key0, key1, scratch);
    BoxMuller.normals(count, scratch, outRe, outIm, first, 1);
  }

  static void encrypt(
      int count, int first, long[] words0, long word1, long[] words2, long word3, int key0,
      int key1, BoxMuller.Scratch scratch) {
    System.arraycopy(words0, first, scratch.c0, 0, count);
    Arrays.fill(scratch.c1, 0, count, word1);
    System.arraycopy(words2, first, scratch.c2, 0, count);
    Arrays.fill(scratch.c3, 0, count, word3);
    Philox.encrypt(count, scratch.c0, scratch.c1, scratch.c2, scratch.c3, key0, key1);
  }
}
