package spgpe.theory;

/**
 * A reference solver could not reach its accuracy within its largest basis, grid or iteration
 * count; no number is returned in that case. The message says what was tried and what to change.
 */
public final class UnconvergedException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /**
   * Creates the exception.
   *
   * @param message what did not converge, with parameter values and advice
   */
  public UnconvergedException(String message) {
    super(message);
  }
}
