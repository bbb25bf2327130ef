package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.SchemeFacts;
import spgpe.integrate.Stepper;
import spgpe.integrate.StepperState;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

class TrajectoryPoolTest {
  private static final long LAST = 6400;

  private static TrajectoryPool pool(int count, int lanes) {
    return new TrajectoryPool(10, count, lanes, LAST, true);
  }

  private static List<Long> indices(TrajectoryPool.Block block) {
    return block.trajectories().stream().map(OpenTrajectory::index).toList();
  }

  @Test
  void blocksThatLostALaneWaitForOthers() {
    TrajectoryPool pool = pool(9, 4);
    TrajectoryPool.Block first = pool.take(true);
    assertEquals(List.of(10L, 11L, 12L, 13L), indices(first));
    assertEquals(100, first.endStep());
    pool.putBack(first.trajectories().subList(0, 3), 100);
    assertTrue(pool.take(false).trajectories().isEmpty(), "three wait, others are still to begin");
    TrajectoryPool.Block second = pool.take(true);
    assertEquals(List.of(14L, 15L, 16L, 17L), indices(second));
    pool.putBack(second.trajectories(), 100);
    TrajectoryPool.Block full = pool.take(true);
    assertEquals(List.of(10L, 11L, 12L, 14L), indices(full), "a full block goes first");
    assertEquals(200, full.endStep());
    assertEquals(List.of(18L), indices(pool.take(true)));
    assertEquals(List.of(15L, 16L, 17L), indices(pool.take(false)), "nothing is left to begin");
    assertTrue(pool.take(true).trajectories().isEmpty());
  }

  @Test
  void blocksStayTogetherWhereNothingStopsThem() {
    TrajectoryPool pool = new TrajectoryPool(0, 8, 4, LAST, false);
    assertTrue(pool.take(true).endStep() > LAST);
  }

  /**
   * Every trajectory passes every window up to its own end once, and, with lives spread evenly, few
   * lanes idle: apart from the last, partly filled blocks there is at most one for each window.
   */
  @Property(tries = 50)
  void everyTrajectoryRunsItsLifeOnce(
      @ForAll @IntRange(min = 1, max = 300) int count,
      @ForAll @IntRange(min = 1, max = 9) int lanes,
      @ForAll java.util.Random random) {
    TrajectoryPool pool = pool(count, lanes);
    int[] life = random.ints(count, 1, 65).toArray();
    int[] windows = new int[count];
    int blocks = 0;
    while (true) {
      TrajectoryPool.Block block = pool.take(true);
      if (block.trajectories().isEmpty()) {
        break;
      }
      blocks++;
      List<OpenTrajectory> open = new ArrayList<>();
      for (OpenTrajectory one : block.trajectories()) {
        int i = (int) one.index() - 10;
        assertEquals(
            lanes == 1 ? 0 : windows[i] * 100L, block.firstStep(), "goes on where it stopped");
        windows[i] = lanes == 1 ? life[i] : windows[i] + 1;
        if (windows[i] < life[i]) {
          open.add(one);
        }
      }
      pool.putBack(open, block.endStep());
    }
    int work = 0;
    for (int i = 0; i < count; i++) {
      assertEquals(life[i], windows[i]);
      work += life[i];
    }
    if (lanes > 1) {
      assertTrue(blocks <= work / lanes + 65, blocks + " blocks for " + work + " pieces");
    }
  }

  /** Half of 256 trajectories stop at once; without refilling 8 lanes would need the full length. */
  @Test
  void stoppedLanesAreRefilled() {
    AtomicLong steps = new AtomicLong();
    Ensemble plan =
        SmallPlans.plan(SmallPlans.pair(), 256)
            .integratedBy(new Counting(OuRk4.ofStep(0.1), steps))
            .until(320)
            .lanes(8)
            .stopWhen(
                StopRule.when("odd", Schedule.every(1), s -> s.trajectory() % 2 == 1));
    EnsembleResult result = plan.run();
    assertEquals(128, result.ends().stream().filter(TrajectoryEnd::isStopped).count());
    long needed = 128 / 8 * 3200;
    assertTrue(steps.get() >= needed, steps + " steps");
    assertTrue(steps.get() < 1.1 * needed, steps + " steps of 8 lanes, at least " + needed);
  }

  /** Counts the steps of all steppers of a scheme. */
  private record Counting(Integrator scheme, AtomicLong steps) implements Integrator {
    @Override
    public Integrator withStep(double step) {
      return new Counting(scheme.withStep(step), steps);
    }

    @Override
    public double step() {
      return scheme.step();
    }

    @Override
    public SchemeFacts facts() {
      return scheme.facts();
    }

    @Override
    public double largestStableStep(Model model) {
      return scheme.largestStableStep(model);
    }

    @Override
    public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
      Stepper inner = scheme.bind(model, noise, lanes);
      return new Stepper() {
        @Override
        public void start(Amplitudes state, long firstStep) {
          inner.start(state, firstStep);
        }

        @Override
        public void advance() {
          steps.incrementAndGet();
          inner.advance();
        }

        @Override
        public void observe(Amplitudes target) {
          inner.observe(target);
        }

        @Override
        public long stepNumber() {
          return inner.stepNumber();
        }

        @Override
        public double time() {
          return inner.time();
        }

        @Override
        public StepperState save() {
          return inner.save();
        }

        @Override
        public void restore(StepperState saved) {
          inner.restore(saved);
        }
      };
    }
  }
}
