package spgpe.run;

/** Hears of a run's progress. */
@FunctionalInterface
public interface ProgressListener {
  /**
   * Called after each trajectory, by the thread that ran it, one call at a time.
   *
   * @param progress state of the run
   */
  void progressed(Progress progress);
}
