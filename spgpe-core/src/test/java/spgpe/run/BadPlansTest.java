package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.model.Model;

/** Plans that are not complete, or contradict themselves, are refused before anything runs. */
class BadPlansTest {
  private static void assertRefused(Runnable call, String... expected) {
    assertMessage(assertThrows(IllegalArgumentException.class, call::run), expected);
  }

  private static void assertIncomplete(Ensemble plan, String missing) {
    assertMessage(assertThrows(IllegalStateException.class, plan::run), "not complete", missing);
  }

  private static void assertMessage(RuntimeException e, String... expected) {
    for (String part : expected) {
      assertTrue(e.getMessage().contains(part), e.getMessage());
    }
  }

  @Test
  void missingPiecesAreNamed() {
    Ensemble plan = Ensemble.of(SmallPlans.pair());
    assertIncomplete(plan, "integratedBy(");
    plan = plan.integratedBy(OuRk4.ofStep(0.1));
    assertIncomplete(plan, "until(");
    plan = plan.until(1);
    assertIncomplete(plan, "startingFrom(");
    plan = plan.startingFrom(InitialState.empty());
    assertIncomplete(plan, "seed(");
    plan = plan.seed(1);
    assertIncomplete(plan, "trajectories(");
    plan = plan.trajectories(1);
    assertTrue(plan.run().isComplete());
  }

  @Test
  void countsOfTrajectoriesOutOfRangeAreRefused() {
    Ensemble plan = SmallPlans.plan(SmallPlans.pair(), 1);
    for (long bad : new long[] {0, -1, Long.MIN_VALUE}) {
      assertRefused(() -> plan.trajectories(bad), "trajectories=" + bad);
      assertRefused(() -> plan.trajectories(3, bad), "trajectories=" + bad);
    }
    assertRefused(() -> plan.trajectories((1L << 32) + 1), "2^32-1");
    assertRefused(() -> plan.trajectories(-1, 1), "first=-1");
    assertRefused(() -> plan.trajectories(1L << 32, 1), "first=4294967296");
    assertRefused(() -> plan.trajectories(Long.MAX_VALUE, Long.MAX_VALUE), "first=");
    assertRefused(() -> plan.trajectories(1L << 32).run(), "2^31-1 blocks", "lanes=1");
    assertEquals(1, plan.trajectories((1L << 32) - 1, 1).run().ends().size());
  }

  @Test
  void lanesOutOfRangeAreRefused() {
    Ensemble plan = SmallPlans.plan(SmallPlans.pair(), 1);
    for (int bad : new int[] {0, -1, 65, Integer.MAX_VALUE, Integer.MIN_VALUE}) {
      assertRefused(() -> plan.lanes(bad), "lanes=" + bad, "1..64");
    }
  }

  @Test
  void badTimesAreRefused() {
    Ensemble plan = SmallPlans.plan(SmallPlans.pair(), 1);
    for (double bad : new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY}) {
      assertRefused(() -> plan.until(bad), "end time=" + bad);
      assertRefused(() -> OuRk4.ofStep(bad), "time step=" + bad);
      assertRefused(() -> Rk4Ip.ofStep(bad), "time step=" + bad);
    }
    assertRefused(
        () -> plan.until(1.05).run(), "end time", "whole number", "time=1.05", "time step=0.1");
    assertRefused(() -> plan.until(1e300).run(), "2^47");
  }

  @Test
  void schedulesThatAreNotWholeStepsAreRefused() {
    Ensemble plan = SmallPlans.plan(SmallPlans.pair(), 1);
    Recording<TimeMoments> recording =
        Recording.of(SmallPlans.density(), Schedule.every(0.25), TimeMoments::new);
    assertRefused(() -> plan.record(recording).run(), "interval of the schedule", "time=0.25");
    StopRule rule = StopRule.when("never", Schedule.at(0.33), s -> false);
    assertRefused(() -> plan.stopWhen(rule).run(), "scheduled time", "time=0.33");
  }

  @Test
  void aStepBeyondTheStabilityLimitIsRefusedWithTheLimit() {
    Model model = SmallPlans.pair();
    double limit = OuRk4.ofStep(1).largestStableStep(model);
    // eps_max + J = k^2/2 + 0.1, k = pi; plus 2 mu
    assertEquals(Math.PI / (Math.PI * Math.PI / 2 + 0.1 + 2), limit, 1e-12);
    assertEquals(limit, Rk4Ip.ofStep(1).largestStableStep(model), 0);
    Ensemble plan = SmallPlans.plan(model, 1).until(limit * 4);
    assertRefused(
        () -> plan.integratedBy(OuRk4.ofStep(limit)).run(), "step=" + limit, "limit=" + limit);
    assertRefused(() -> plan.integratedBy(Rk4Ip.ofStep(2 * limit)).run(), "limit=" + limit);
  }

  @Test
  void recordingsMustBeDifferentAndKnown() {
    Ensemble plan = SmallPlans.plan(SmallPlans.pair(), 1);
    Recording<TimeMoments> one =
        Recording.of(SmallPlans.density(), Schedule.every(1), TimeMoments::new);
    Recording<TimeMoments> other =
        Recording.of(SmallPlans.density(), Schedule.every(1), TimeMoments::new);
    assertRefused(() -> plan.record(one).record(one), "already has", "density");
    EnsembleResult result = plan.record(one).run();
    assertRefused(() -> result.get(other), "no such recording", "density");
    assertRefused(() -> result.times(other), "no such recording");
    assertEquals(3, result.times(one).length);
  }

  private record Sized(int size) implements Observable {
    @Override
    public String name() {
      return "sized";
    }

    @Override
    public int size(Model model) {
      return size;
    }

    @Override
    public void measure(Snapshot snapshot, double[] result) {
      result[0] = 1;
    }
  }

  @Test
  void observablesOfImpossibleSizesAreRefused() {
    Ensemble plan = SmallPlans.plan(SmallPlans.pair(), 1);
    for (int bad : new int[] {0, -1, Integer.MIN_VALUE, Integer.MAX_VALUE}) {
      Recording<TimeMoments> recording =
          Recording.of(new Sized(bad), Schedule.every(1), TimeMoments::new);
      assertRefused(() -> plan.record(recording).run(), "\"sized\"", "size=" + bad);
    }
    Recording<TimeMoments> many =
        Recording.of(new Sized(1 << 20), Schedule.every(0.1), TimeMoments::new);
    assertRefused(() -> plan.until(1000).record(many).run(), "times=10001", "size=1048576");
  }

  @Test
  void aFactoryOfNothingIsRefused() {
    Recording<TimeMoments> recording =
        Recording.of(SmallPlans.density(), Schedule.every(1), BadPlansTest::nothing);
    assertRefused(
        () -> SmallPlans.plan(SmallPlans.pair(), 1).record(recording).run(),
        "accumulator of the factory must not be null");
  }

  @SuppressWarnings("NullAway") // what a careless user may write
  private static TimeMoments nothing(double[] times, int size) {
    return null;
  }

  @Test
  void resultsThatDoNotBelongTogetherAreNotMerged() {
    Recording<TimeMoments> density =
        Recording.of(SmallPlans.density(), Schedule.every(1), TimeMoments::new);
    Ensemble plan = SmallPlans.plan(SmallPlans.pair(), 2).record(density);
    EnsembleResult result = plan.run();
    assertRefused(() -> result.mergedWith(result), "both results", "trajectory=0");
    EnsembleResult without = SmallPlans.plan(SmallPlans.pair(), 2).trajectories(2, 2).run();
    assertRefused(() -> result.mergedWith(without), "same recordings", "here=1", "other=0");
    EnsembleResult longer = plan.trajectories(2, 2).until(4).run();
    assertRefused(() -> result.mergedWith(longer), "same scheduled times", "times=3 and 5");
    Recording<TimeMoments> twin =
        Recording.of(SmallPlans.density(), Schedule.every(1), TimeMoments::new);
    EnsembleResult other =
        SmallPlans.plan(SmallPlans.pair(), 2).trajectories(2, 2).record(twin).run();
    assertRefused(() -> result.mergedWith(other), "no such recording");
    assertEquals(4, result.mergedWith(plan.trajectories(2, 2).run()).ends().size());
  }

  @Test
  void plansAreValuesThatDescribeThemselves() {
    Ensemble plan = SmallPlans.plan(SmallPlans.pair(), 5);
    Ensemble changed = plan.trajectories(10).until(7).lanes(4);
    assertEquals(5, plan.run().ends().size());
    for (String part : List.of("0..9", "7.0", "seed=1", "OuRk4", "temperature=0.1")) {
      assertTrue(changed.toString().contains(part), changed.toString());
    }
  }
}
