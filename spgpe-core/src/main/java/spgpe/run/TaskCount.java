package spgpe.run;

import java.util.function.BooleanSupplier;

/**
 * Counts the tasks handed to an executor, so that the caller can wait for all of them, or, once the
 * run is stopped, for those that have begun. A task that begins after the wait is over does nothing:
 * executors may drop or delay what they had accepted.
 */
final class TaskCount {
  private long pending;
  private long running;
  private boolean closed;

  synchronized void submitted() {
    pending++;
  }

  synchronized void refused() {
    pending--;
    notifyAll();
  }

  /** Whether the task may run. */
  synchronized boolean begin() {
    if (closed) {
      return false;
    }
    running++;
    return true;
  }

  synchronized void end() {
    running--;
    pending--;
    notifyAll();
  }

  /**
   * Waits.
   *
   * @param onInterrupt called when the waiting thread is interrupted
   * @param stopped whether tasks that have not begun need not be waited for
   * @return whether the waiting thread was interrupted
   */
  synchronized boolean await(Runnable onInterrupt, BooleanSupplier stopped) {
    boolean interrupted = false;
    while (running > 0 || (pending > 0 && !stopped.getAsBoolean())) {
      try {
        wait();
      } catch (InterruptedException e) {
        interrupted = true;
        onInterrupt.run();
      }
    }
    closed = true;
    return interrupted;
  }
}
