package spgpe.model;

/** A term of the Hamiltonian threw an exception while its force or energy was evaluated. */
public final class TermFailedException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /**
   * Makes the exception.
   *
   * @param term description of the term
   * @param time time of the evaluation
   * @param cause what the term threw
   */
  public TermFailedException(String term, double time, RuntimeException cause) {
    super("term failed: term=" + term + ", time=" + time + ", cause=" + cause, cause);
  }
}
