package spgpe.internal.check;

import com.sun.management.ThreadMXBean;
import java.lang.management.ManagementFactory;

/** Measures what a piece of code allocates on the heap once it is warm. */
public final class AllocationMeter {
  private static final int WARM_UP = 300;
  private static final int CALLS = 200;

  private AllocationMeter() {}

  /**
   * Runs an action until it is warm, then counts.
   *
   * @param action what to measure
   * @return bytes for each call; below 1 if calls allocate nothing, at least 16 if each makes an
   *     object
   */
  public static double bytesPerCall(Runnable action) {
    ThreadMXBean threads = (ThreadMXBean) ManagementFactory.getThreadMXBean();
    long self = Thread.currentThread().getId();
    for (int i = 0; i < WARM_UP; i++) {
      action.run();
    }
    threads.getThreadAllocatedBytes(self);
    long before = threads.getThreadAllocatedBytes(self);
    for (int i = 0; i < CALLS; i++) {
      action.run();
    }
    return (threads.getThreadAllocatedBytes(self) - before) / (double) CALLS;
  }
}
