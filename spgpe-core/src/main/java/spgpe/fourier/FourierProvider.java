package spgpe.fourier;

/**
 * Makes Fourier transforms. Providers are found with {@link java.util.ServiceLoader}; see {@link
 * FourierProviders}. Implementations are stateless and thread-safe.
 */
public interface FourierProvider {
  /**
   * Name by which a user asks for this provider.
   *
   * @return a short lower-case word
   */
  String name();

  /**
   * Rank among the providers when the user names none: the highest wins, equal ranks are settled
   * by alphabetical order of the names.
   *
   * @return rank; the built-in provider has 0
   */
  int rank();

  /**
   * Makes a transform for one thread.
   *
   * @param size number of complex points, at least 1
   * @return the transform
   * @throws IllegalArgumentException if the provider cannot do this size
   */
  FourierTransform transform(int size);
}
