package spgpe.internal.check;

import com.sun.management.ThreadMXBean;
import java.lang.management.ManagementFactory;

/** Measures what a piece of code allocates on the heap once it is warm. */
public final class AllocationMeter {
  private static final int WARM_UP = 300;
  private static final int CALLS = 200;
  private static final int FEWEST_GROUPS = 5;

  /** Vector instructions are objects until their methods are compiled, which takes its time. */
  private static final int MOST_GROUPS = 2000;

  private AllocationMeter() {}

  /**
   * Runs an action until it is warm, then counts over several groups of calls, more of them as long
   * as every group allocated, and gives the group with the fewest bytes. What a call allocates is in
   * every group; what the virtual machine books on this thread now and then (a deoptimised frame, the
   * end of an allocation buffer) is not.
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
    long fewest = Long.MAX_VALUE;
    for (int g = 0; g < FEWEST_GROUPS || (fewest >= CALLS && g < MOST_GROUPS); g++) {
      long before = threads.getThreadAllocatedBytes(self);
      for (int i = 0; i < CALLS; i++) {
        action.run();
      }
      fewest = Math.min(fewest, threads.getThreadAllocatedBytes(self) - before);
    }
    return fewest / (double) CALLS;
  }
}
