package spgpe.fourier;

/**
 * Complex Fourier transform of a fixed length n, in place on interleaved (re, im) numbers.
 *
 * <p>Forward: X_k = sum over j of x_j exp(-2 pi i j k/n). Inverse: the same with the opposite
 * sign. Neither is scaled, so forward and inverse multiply by n.
 *
 * <p>An instance may hold scratch memory: it belongs to one thread at a time. It starts no
 * threads.
 */
public interface FourierTransform {
  /**
   * Length of the transform.
   *
   * @return n, complex numbers
   */
  int size();

  /**
   * Forward transform in place.
   *
   * @param data interleaved complex numbers
   * @param offset index of the first real part; 2n doubles from here are overwritten
   */
  void forward(double[] data, int offset);

  /**
   * Unscaled inverse transform in place.
   *
   * @param data interleaved complex numbers
   * @param offset index of the first real part; 2n doubles from here are overwritten
   */
  void inverse(double[] data, int offset);
}
