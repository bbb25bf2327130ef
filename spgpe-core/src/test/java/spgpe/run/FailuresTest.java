package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.hamiltonian.LocalTerm;
import spgpe.model.TermFailedException;
import spgpe.projector.Amplitudes;
import spgpe.projector.PointBlock;

/** What happens when something the user supplied throws, or a trajectory diverges. */
class FailuresTest {
  private static final RuntimeException BOOM = new IllegalStateException("boom");

  /** Throws, or writes NaN into a component, after a time. */
  private record BadTerm(double from, int nanComponent) implements LocalTerm {
    @Override
    public String description() {
      return "BadTerm(from=" + from + ")";
    }

    @Override
    public int forceDegree() {
      return 1;
    }

    @Override
    public boolean dependsOnTime() {
      return true;
    }

    @Override
    public void addForce(double time, PointBlock block) {
      if (time < from) {
        return;
      }
      if (nanComponent < 0) {
        throw BOOM;
      }
      block.resultRe(nanComponent)[block.begin()] = Double.NaN;
    }

    @Override
    public void addEnergyDensity(double time, PointBlock block, double[] density) {
      if (time >= from) {
        throw BOOM;
      }
    }
  }

  private static RunFailedException failure(Ensemble plan, String... expected) {
    RunFailedException failure = assertThrows(RunFailedException.class, plan::run);
    for (String part : expected) {
      assertTrue(failure.getMessage().contains(part), failure.getMessage());
    }
    return failure;
  }

  @Test
  void aTermThatThrowsIsNamedWithTheTime() {
    RunFailedException failure =
        failure(
            SmallPlans.plan(SmallPlans.with(new BadTerm(1, -1)), 2),
            "BadTerm(from=1.0)", "boom", "trajectories 0");
    TermFailedException term = assertInstanceOf(TermFailedException.class, failure.getCause());
    assertSame(BOOM, term.getCause());
    assertTrue(term.getMessage().contains("time=1.0"), term.getMessage());
    assertFalse(failure.finished().isComplete());
    assertEquals(0, failure.finished().ends().size());
  }

  @Test
  void aTermThatThrowsInTheEnergyIsNamedToo() {
    Recording<TimeMoments> energy =
        Recording.of(
            Observable.scalar("energy", Snapshot::grandCanonicalEnergy), Schedule.every(0.5),
            TimeMoments::new);
    RunFailedException failure =
        failure(
            SmallPlans.plan(SmallPlans.with(new BadTerm(0, -1)), 1).record(energy),
            "BadTerm", "observable \"energy\"");
    assertInstanceOf(TermFailedException.class, failure.getCause());
  }

  @Test
  void aTermThatGivesNaNIsReportedAsDivergenceWithTheLastGoodState() {
    Ensemble plan =
        SmallPlans.plan(SmallPlans.with(new BadTerm(1, 1)), 3)
            .trajectories(7, 3)
            .stopWhen(StopRule.when("never", Schedule.every(0.1), s -> false));
    RunFailedException failure =
        failure(plan, "trajectory=7", "component=1", "still good at time=0.9");
    DivergedException diverged = assertInstanceOf(DivergedException.class, failure.getCause());
    assertEquals(7, diverged.trajectory());
    assertEquals(1, diverged.component());
    // the last stage of the step from 0.9 to 1.0 is evaluated at 1.0
    assertEquals(1.0, diverged.time(), 1e-12);
    assertEquals(0.9, diverged.lastGoodTime(), 1e-12);
    Amplitudes good = diverged.lastGoodState();
    for (int c = 0; c < 2; c++) {
      assertTrue(Double.isFinite(good.atomNumber(c, 0)) && good.atomNumber(c, 0) > 0);
    }
  }

  @Test
  void theLastGoodStateIsTheStateOfARunThatEndsThere() {
    DivergedException diverged =
        assertThrows(
            DivergedException.class,
            () ->
                Trajectory.of(SmallPlans.with(new BadTerm(1, 1)))
                    .startingFrom(InitialState.uniform(1, -1))
                    .integratedBy(spgpe.integrate.OuRk4.ofStep(0.1))
                    .seed(1, 4)
                    .until(2)
                    .stopWhen(StopRule.when("never", Schedule.every(0.3), s -> false))
                    .run());
    assertEquals(0.9, diverged.lastGoodTime(), 1e-12);
    Amplitudes expected =
        Trajectory.of(SmallPlans.with(new BadTerm(1, 1)))
            .startingFrom(InitialState.uniform(1, -1))
            .integratedBy(spgpe.integrate.OuRk4.ofStep(0.1))
            .seed(1, 4)
            .until(0.9)
            .run()
            .finalState();
    for (int c = 0; c < 2; c++) {
      for (int m = 0; m < expected.region().modes(); m++) {
        assertEquals(expected.re(c)[m], diverged.lastGoodState().re(c)[m], 0);
        assertEquals(expected.im(c)[m], diverged.lastGoodState().im(c)[m], 0);
      }
    }
  }

  @Test
  void aRunMayGoOnAfterDivergence() {
    Recording<TimeMoments> density =
        Recording.of(SmallPlans.density(), Schedule.every(0.5), TimeMoments::new);
    EnsembleResult result =
        SmallPlans.plan(SmallPlans.with(new BadTerm(1, 0)), 5)
            .record(density)
            .keepGoingAfterDivergence()
            .run();
    assertTrue(result.isComplete());
    for (TrajectoryEnd end : result.ends()) {
      assertEquals(TrajectoryEnd.Reason.DIVERGED, end.reason());
      assertTrue(end.detail().contains("component=0"), end.detail());
      assertFalse(end.isStopped());
    }
    assertEquals(5, result.get(density).count(1)); // t = 0.5, before the divergence
    assertEquals(0, result.get(density).count(2)); // t = 1
  }

  @Test
  void anObservableThatThrowsIsNamed() {
    Observable bad =
        Observable.scalar(
            "weather",
            s -> {
              if (s.time() > 0.45) {
                throw BOOM;
              }
              return 1;
            });
    Ensemble plan =
        SmallPlans.plan(SmallPlans.pair(), 2)
            .record(Recording.of(bad, Schedule.every(0.5), TimeMoments::new));
    assertSame(BOOM, failure(plan, "observable \"weather\"", "time=0.5", "boom").getCause());
  }

  @Test
  void anObservableThatIsNotFiniteFailsTheRunWithItsOrigin() {
    for (double bad :
        new double[] {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY}) {
      Observable observable = Observable.scalar("ratio", s -> s.time() > 0.45 ? bad : 1);
      Ensemble plan =
          SmallPlans.plan(SmallPlans.pair(), 2)
              .record(Recording.of(observable, Schedule.every(0.5), TimeMoments::new));
      assertInstanceOf(
          IllegalArgumentException.class,
          failure(
                  plan, "must be finite", "observable=\"ratio\"", "value=" + bad, "trajectory=0",
                  "time=0.5")
              .getCause());
    }
  }

  @Test
  void aStopRuleThatThrowsIsNamed() {
    Ensemble plan =
        SmallPlans.plan(SmallPlans.pair(), 1)
            .stopWhen(
                StopRule.when(
                    "gate", Schedule.every(0.2),
                    s -> {
                      throw BOOM;
                    }));
    assertSame(BOOM, failure(plan, "stop rule \"gate\"", "boom").getCause());
  }

  @Test
  void anInitialStateThatThrowsIsNamed() {
    Ensemble plan =
        SmallPlans.plan(SmallPlans.pair(), 1)
            .startingFrom(
                (model, random, target) -> {
                  throw BOOM;
                });
    assertSame(BOOM, failure(plan, "initial state", "boom", "trajectories 0").getCause());
  }

  @Test
  void anInitialStateThatIsNotFiniteIsRefused() {
    for (double bad : new double[] {Double.NaN, Double.POSITIVE_INFINITY, 1e200}) {
      Ensemble plan =
          SmallPlans.plan(SmallPlans.pair(), 1)
              .startingFrom((model, random, target) -> target.im(1)[2] = bad);
      assertInstanceOf(
          IllegalArgumentException.class,
          failure(plan, "initial state must be finite", "trajectory=0", "component=1").getCause());
      Ensemble field =
          SmallPlans.plan(SmallPlans.pair(), 1)
              .startingFrom(InitialState.fromField((c, x, y, value) -> value[1] = bad));
      failure(field, "must be finite", "component=0");
    }
  }

  @Test
  void anInitialStateForAnotherModelIsRefused() {
    failure(
        SmallPlans.plan(SmallPlans.pair(), 1).startingFrom(InitialState.uniform(1)),
        "values=1", "components=2");
    Amplitudes other = new Amplitudes(SmallPlans.pair(32).region(), 2, 1);
    failure(
        SmallPlans.plan(SmallPlans.pair(), 1).startingFrom(InitialState.of(other)),
        "shapes must agree");
  }

  @Test
  void aListenerThatThrowsFailsTheRunAndKeepsWhatWasDone() {
    Ensemble plan =
        SmallPlans.plan(SmallPlans.pair(), 3)
            .progress(
                progress -> {
                  if (progress.ended() == 2) {
                    throw BOOM;
                  }
                });
    RunFailedException failure = failure(plan, "boom");
    assertEquals(2, failure.finished().ends().size());
  }

  @Test
  void anErrorIsReportedLikeAnException() {
    Error error = new AssertionError("broken");
    Observable bad =
        Observable.scalar(
            "bad",
            s -> {
              throw error;
            });
    Ensemble plan =
        SmallPlans.plan(SmallPlans.pair(), 1)
            .record(Recording.of(bad, Schedule.every(0.5), TimeMoments::new));
    assertSame(error, failure(plan, "broken").getCause());
  }

  @Test
  void trajectoriesFinishedBeforeAFailureAreKept() {
    Observable bad =
        Observable.scalar(
            "bad",
            s -> {
              if (s.trajectory() == 3) {
                throw BOOM;
              }
              return s.trajectory();
            });
    Recording<TimeMoments> recording = Recording.of(bad, Schedule.every(1), TimeMoments::new);
    EnsembleResult finished =
        failure(SmallPlans.plan(SmallPlans.pair(), 6).record(recording)).finished();
    assertEquals(3, finished.ends().size());
    assertEquals(1, finished.get(recording).mean(0, 0), 0); // (0 + 1 + 2)/3
  }
}
