package spgpe.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * The trajectories of a run that no thread is working on: those not yet begun and those that wait
 * at the end of a window of time steps.
 *
 * <p>Trajectories stop early at different times, and a lane whose trajectory has stopped does
 * nothing. So blocks are put together anew at the end of each window. A full block that has come
 * farthest goes first, then one that begins; blocks with idle lanes go only when nothing else is
 * left, and then the farthest back first, so that they pick up those that wait further on. At most
 * lanes - 1 trajectories for each window wait at once. Thread-safe.
 */
final class TrajectoryPool {
  /** Windows in a run: a stopped lane idles for half a window on average. */
  private static final long WINDOWS = 64;

  private static final long SHORTEST_WINDOW = 64;

  private final long end;
  private final int lanes;
  private final long window;
  private final TreeMap<Long, List<OpenTrajectory>> waiting = new TreeMap<>();
  private long next;

  /**
   * Trajectories that work in lockstep, and the window in which they do.
   *
   * @param trajectories at most one for each lane
   * @param firstStep step at which all of them are
   * @param endStep step at which those still open go back to the pool, or the last step
   */
  record Block(List<OpenTrajectory> trajectories, long firstStep, long endStep) {}

  /**
   * Makes the pool of a run.
   *
   * @param first index of the first trajectory
   * @param count how many
   * @param lanes lanes of a block
   * @param lastStep last step of the run
   * @param mayStop whether trajectories can end before; if not, a block stays together
   */
  TrajectoryPool(long first, long count, int lanes, long lastStep, boolean mayStop) {
    this.next = first;
    this.end = first + count;
    this.lanes = lanes;
    this.window =
        mayStop && lanes > 1
            ? Math.max(SHORTEST_WINDOW, (lastStep + WINDOWS - 1) / WINDOWS)
            : Long.MAX_VALUE;
  }

  /**
   * The next block to work on; without trajectories if there is nothing to do.
   *
   * @param mayBegin whether it may be a block that begins; if not and some are left to begin, those
   *     that wait are left for the one who begins them
   */
  synchronized Block take(boolean mayBegin) {
    for (Map.Entry<Long, List<OpenTrajectory>> at : waiting.descendingMap().entrySet()) {
      if (at.getValue().size() >= lanes) {
        return waitingBlock(at.getKey(), at.getValue());
      }
    }
    if (next < end && mayBegin) {
      List<OpenTrajectory> fresh = new ArrayList<>();
      while (fresh.size() < lanes && next < end) {
        fresh.add(new OpenTrajectory(next++));
      }
      return block(fresh, 0);
    }
    Map.Entry<Long, List<OpenTrajectory>> farthestBack = waiting.firstEntry();
    return next < end || farthestBack == null
        ? block(List.of(), 0)
        : waitingBlock(farthestBack.getKey(), farthestBack.getValue());
  }

  /** Takes back what is open at the end of a block's window. */
  synchronized void putBack(List<OpenTrajectory> open, long step) {
    if (!open.isEmpty()) {
      waiting.computeIfAbsent(step, s -> new ArrayList<>()).addAll(open);
    }
  }

  private Block waitingBlock(long step, List<OpenTrajectory> all) {
    List<OpenTrajectory> chosen = all.subList(0, Math.min(lanes, all.size()));
    Block block = block(List.copyOf(chosen), step);
    chosen.clear();
    if (all.isEmpty()) {
      waiting.remove(step);
    }
    return block;
  }

  private Block block(List<OpenTrajectory> trajectories, long step) {
    return new Block(
        trajectories, step, window == Long.MAX_VALUE ? window : step + window);
  }
}
