package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.RejectedExecutionException;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicReference;
import org.junit.jupiter.api.Test;

/** Executors that refuse or drop tasks, cancellation, interruption, and threads. */
class ExecutorsTest {
  private static RunFailedException failure(Ensemble plan, java.util.concurrent.Executor executor) {
    return assertThrows(RunFailedException.class, () -> plan.runOn(executor));
  }

  @Test
  void anExecutorThatRefusesFailsTheRun() {
    ExecutorService closed = Executors.newSingleThreadExecutor();
    closed.shutdown();
    RunFailedException failure = failure(SmallPlans.plan(SmallPlans.pair(), 3), closed);
    assertInstanceOf(RejectedExecutionException.class, failure.getCause());
    assertTrue(failure.getMessage().contains("refused"), failure.getMessage());
    assertFalse(failure.finished().isComplete());
  }

  @Test
  void anExecutorThatRefusesLaterKeepsWhatWasDone() {
    AtomicInteger calls = new AtomicInteger();
    RunFailedException failure =
        failure(
            SmallPlans.plan(SmallPlans.pair(), 5),
            task -> {
              if (calls.incrementAndGet() > 2) {
                throw new RejectedExecutionException("full");
              }
              task.run();
            });
    assertEquals(2, failure.finished().ends().size());
    assertEquals(3, calls.get(), "no further task after a refusal");
  }

  @Test
  void anExecutorThatThrowsAnythingElseFailsTheRunToo() {
    NullPointerException broken = new NullPointerException("broken executor");
    RunFailedException failure =
        failure(
            SmallPlans.plan(SmallPlans.pair(), 2),
            task -> {
              throw broken;
            });
    assertSame(broken, failure.getCause());
  }

  @Test
  void anInterruptFreesTheCallerOfAnExecutorThatDropsTasks() {
    List<Runnable> dropped = new ArrayList<>();
    Thread.currentThread().interrupt();
    EnsembleResult result = SmallPlans.plan(SmallPlans.pair(), 3).runOn(dropped::add);
    assertTrue(Thread.interrupted(), "the interrupt is kept");
    assertEquals(0, result.ends().size());
    assertFalse(result.isComplete());
    dropped.forEach(Runnable::run); // too late: they must do nothing
    assertEquals(0, result.ends().size());
  }

  @Test
  void aConditionCancelsARun() {
    AtomicInteger ended = new AtomicInteger();
    EnsembleResult result =
        SmallPlans.plan(SmallPlans.pair(), 50)
            .progress(p -> ended.set((int) p.ended()))
            .cancelWhen(() -> ended.get() >= 4)
            .run();
    assertEquals(4, result.ends().size());
    assertFalse(result.isComplete());
    for (int i = 0; i < 4; i++) {
      assertEquals(i, result.ends().get(i).trajectory());
      assertEquals(TrajectoryEnd.Reason.END_OF_RUN, result.ends().get(i).reason());
    }
  }

  @Test
  void aCancelledTrajectorySaysSo() {
    Ensemble plan = SmallPlans.plan(SmallPlans.pair(), 1).cancelWhen(() -> true);
    Recording<TimeMoments> recording =
        Recording.of(SmallPlans.density(), Schedule.every(1), TimeMoments::new);
    EnsembleResult result = plan.record(recording).run();
    assertEquals(0, result.ends().size());
    assertEquals(0, result.get(recording).count(0));
    assertTrue(Double.isNaN(result.get(recording).mean(0, 0)));
  }

  @Test
  void aCancelConditionThatThrowsFailsTheRun() {
    IllegalStateException boom = new IllegalStateException("boom");
    RunFailedException failure =
        failure(
            SmallPlans.plan(SmallPlans.pair(), 1)
                .cancelWhen(
                    () -> {
                      throw boom;
                    }),
            Runnable::run);
    assertSame(boom, failure.getCause());
  }

  @Test
  void anInterruptOfTheWaitingThreadCancelsTheRun() {
    AtomicReference<Thread> caller = new AtomicReference<>(Thread.currentThread());
    Recording<TimeMoments> recording =
        Recording.of(
            Observable.scalar(
                "interrupting",
                s -> {
                  if (s.trajectory() == 2) {
                    caller.get().interrupt();
                  }
                  return 0;
                }),
            Schedule.at(0), TimeMoments::new);
    ExecutorService executor = Executors.newSingleThreadExecutor();
    try {
      EnsembleResult result =
          SmallPlans.plan(SmallPlans.pair(), 200_000).record(recording).runOn(executor);
      assertTrue(Thread.interrupted(), "the interrupt is kept");
      assertFalse(result.isComplete());
      assertTrue(result.ends().size() >= 2);
    } finally {
      executor.shutdownNow();
    }
  }

  @Test
  void anInterruptOfARunInTheCallingThreadCancelsItToo() {
    Recording<TimeMoments> recording =
        Recording.of(
            Observable.scalar(
                "interrupting",
                s -> {
                  if (s.trajectory() == 2) {
                    Thread.currentThread().interrupt();
                  }
                  return 0;
                }),
            Schedule.at(0), TimeMoments::new);
    EnsembleResult result = SmallPlans.plan(SmallPlans.pair(), 50).record(recording).run();
    assertTrue(Thread.interrupted(), "the interrupt is kept");
    assertEquals(2, result.ends().size());
  }

  @Test
  void aTrajectoryInterruptedBeforeItsEndThrows() {
    Thread.currentThread().interrupt();
    IllegalStateException cancelled =
        assertThrows(
            IllegalStateException.class,
            () ->
                Trajectory.of(SmallPlans.pair())
                    .startingFrom(InitialState.empty())
                    .integratedBy(spgpe.integrate.OuRk4.ofStep(0.1))
                    .seed(1, 0)
                    .until(1)
                    .run());
    assertTrue(Thread.interrupted(), "the interrupt is kept");
    assertTrue(cancelled.getMessage().contains("cancelled"), cancelled.getMessage());
  }

  @Test
  void theLibraryStartsNoThreads() {
    Set<Thread> before = new HashSet<>(Thread.getAllStackTraces().keySet());
    Set<Thread> seen = new HashSet<>();
    Recording<TimeMoments> recording =
        Recording.of(
            Observable.scalar(
                "thread",
                s -> {
                  seen.add(Thread.currentThread());
                  return 0;
                }),
            Schedule.every(1), TimeMoments::new);
    SmallPlans.plan(SmallPlans.pair(), 4).record(recording).run();
    assertEquals(Set.of(Thread.currentThread()), seen);
    Set<Thread> after = new HashSet<>(Thread.getAllStackTraces().keySet());
    after.removeAll(before);
    assertTrue(after.isEmpty(), "threads that were not there before: " + after);
  }

  @Test
  void progressIsToldOneCallAtATimeAndCountsUp() {
    List<Progress> heard = new ArrayList<>(); // unguarded on purpose: calls must not overlap
    ExecutorService executor = Executors.newFixedThreadPool(4);
    try {
      SmallPlans.plan(SmallPlans.pair(), 40)
          .stopWhen(StopRule.when("odd", Schedule.every(0.5), s -> s.trajectory() % 2 == 1))
          .progress(heard::add)
          .runOn(executor);
    } finally {
      executor.shutdown();
    }
    assertEquals(40, heard.size());
    for (int i = 0; i < 40; i++) {
      assertEquals(i + 1, heard.get(i).ended());
      assertEquals(40, heard.get(i).total());
    }
    assertEquals(20, heard.get(39).stopped());
    assertEquals(0, heard.get(39).diverged());
  }
}
