package spgpe.run;

/**
 * An ensemble failed: a trajectory diverged, or a term, observable, stop rule or initial state threw.
 * The cause says what happened; what was finished before is kept.
 */
public final class RunFailedException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final transient EnsembleResult finished;

  RunFailedException(String message, Throwable cause, EnsembleResult finished) {
    super(message, cause);
    this.finished = finished;
  }

  /**
   * The trajectories that had ended well.
   *
   * @return incomplete result
   */
  public EnsembleResult finished() {
    return finished;
  }
}
