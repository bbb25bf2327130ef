package spgpe.run;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeMap;
import java.util.concurrent.ConcurrentLinkedQueue;
import java.util.concurrent.Executor;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicReference;
import org.jspecify.annotations.Nullable;
import spgpe.internal.check.Check;
import spgpe.projector.Amplitudes;

/** One execution of an ensemble plan. */
final class EnsembleRun {
  private final Ensemble plan;
  private final long lastStep;
  private final List<Channel<?>> channels = new ArrayList<>();
  private final ConcurrentLinkedQueue<BlockRunner> idle = new ConcurrentLinkedQueue<>();
  private final AtomicBoolean stop = new AtomicBoolean();
  private final AtomicReference<@Nullable Failure> failure = new AtomicReference<>();
  private final TreeMap<Long, TrajectoryEnd> ends = new TreeMap<>();
  private final Object lock = new Object();
  private final TaskCount tasks = new TaskCount();
  private volatile @Nullable Thread caller;
  private long stopped;
  private long diverged;
  private @Nullable Amplitudes lastState;

  private record Failure(String where, Throwable cause) {}

  EnsembleRun(Ensemble plan) {
    this.plan = plan;
    double dt = plan.integrator().step();
    this.lastStep = Schedule.wholeSteps(plan.until(), dt, "end time");
    for (Recording<?> recording : plan.recordings()) {
      channels.add(
          Channel.of(recording, dt, lastStep, recording.observable().size(plan.model())));
    }
    plan.initialState();
    plan.streams();
    plan.count();
  }

  EnsembleResult execute(Executor executor) {
    caller = Thread.currentThread();
    for (Channel<?> channel : channels) {
      channel.probe();
    }
    idle.add(newRunner()); // contradictions show here, in the caller's thread
    long blocks = (plan.count() + lanes() - 1) / lanes();
    Check.argument(
        blocks <= Integer.MAX_VALUE,
        "a run must not have more than 2^31-1 blocks of trajectories: trajectories=%s, lanes=%s; use"
            + " more lanes or run parts and merge them", plan.count(), plan.lanes());
    TrajectoryPool pool =
        new TrajectoryPool(
            plan.first(), plan.count(), lanes(), lastStep, !plan.stopRules().isEmpty());
    for (long block = 0; block < blocks && !stop.get(); block++) {
      tasks.submitted();
      try {
        executor.execute(
            () -> {
              if (tasks.begin()) {
                try {
                  work(pool);
                } finally {
                  tasks.end();
                }
              }
            });
      } catch (RuntimeException | Error e) {
        fail("the executor refused a task", e);
        tasks.refused();
      }
    }
    if (tasks.await(() -> stop.set(true), stop::get)) {
      Thread.currentThread().interrupt();
    }
    Failure failed = failure.get();
    if (failed != null) {
      throw new RunFailedException(
          failed.where() + ": " + failed.cause().getMessage(), failed.cause(), result());
    }
    return result();
  }

  private BlockRunner newRunner() {
    return new BlockRunner(
        plan.model(), plan.initialState(), plan.integrator(), plan.streams(), channels,
        plan.stopRules(), lastStep, lanes());
  }

  private int lanes() {
    return (int) Math.min(plan.lanes(), plan.count());
  }

  private boolean isStopped() {
    if (!stop.get()
        && (plan.cancelled().getAsBoolean()
            || (Thread.currentThread() == caller && caller.isInterrupted()))) {
      stop.set(true);
    }
    return stop.get();
  }

  /**
   * Begins one block and goes on with what waits. A task that finds the pool empty is not needed any
   * more: what others work on comes back to them.
   */
  private void work(TrajectoryPool pool) {
    BlockRunner runner = null;
    boolean mayBegin = true;
    try {
      while (!stop.get()) {
        TrajectoryPool.Block block = pool.take(mayBegin);
        mayBegin &= block.firstStep() > 0;
        if (block.trajectories().isEmpty()) {
          break;
        }
        if (runner == null) {
          runner = idle.poll();
        }
        if (runner == null) {
          runner = newRunner();
        }
        pool.putBack(runner.run(block, this::isStopped, new Collector()), block.endStep());
      }
      if (runner != null) {
        idle.add(runner);
      }
    } catch (RuntimeException | Error e) {
      fail(runner == null ? "making a workspace failed" : runner.position(), e);
    }
  }

  private void fail(String where, Throwable cause) {
    failure.compareAndSet(null, new Failure(where, cause));
    stop.set(true);
  }

  private EnsembleResult result() {
    synchronized (lock) {
      return new EnsembleResult(plan.count(), new TreeMap<>(ends), List.copyOf(channels));
    }
  }

  /** The last state handed in; the final state of a run of one trajectory. */
  @Nullable Amplitudes lastState() {
    synchronized (lock) {
      return lastState;
    }
  }

  private final class Collector implements BlockRunner.Sink {
    @Override
    public void ended(TrajectoryEnd end, List<Channel.Probe<?>> probes, Amplitudes state) {
      for (Channel.Probe<?> probe : probes) {
        probe.accumulator().finish(end);
      }
      synchronized (lock) {
        ends.put(end.trajectory(), end);
        stopped += end.isStopped() ? 1 : 0;
        if (plan.count() == 1) {
          lastState = state.copy();
        }
        deliver(end, probes);
      }
    }

    @Override
    public void diverged(DivergedException found, List<Channel.Probe<?>> probes) {
      if (!plan.keepsGoing()) {
        throw found;
      }
      TrajectoryEnd end =
          new TrajectoryEnd(
              found.trajectory(), found.time(), TrajectoryEnd.Reason.DIVERGED,
              DivergedException.describe(
                  found.trajectory(), found.time(), found.component(), found.lastGoodTime()));
      for (Channel.Probe<?> probe : probes) {
        probe.accumulator().finish(end);
      }
      synchronized (lock) {
        ends.put(end.trajectory(), end);
        diverged++;
        deliver(end, probes);
      }
    }

    private void deliver(TrajectoryEnd end, List<Channel.Probe<?>> probes) {
      for (Channel.Probe<?> probe : probes) {
        probe.deliver(end.trajectory());
      }
      plan.listener().progressed(new Progress(ends.size(), plan.count(), stopped, diverged));
    }
  }
}
