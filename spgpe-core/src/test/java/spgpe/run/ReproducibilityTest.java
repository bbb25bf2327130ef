package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.RandomStreams;

/** The same plan and seed give the same bits, however the work is done. */
class ReproducibilityTest {
  private static final int TRAJECTORIES = 13;

  private enum Setup {
    SPLIT_COUNTER(OuRk4.ofStep(0.1), RandomStreams.counterBased(11)),
    SPLIT_COMMONS(OuRk4.ofStep(0.1), RandomStreams.commonsRng(11)),
    PICTURE_COUNTER(Rk4Ip.ofStep(0.1), RandomStreams.counterBased(11)),
    PICTURE_COMMONS(Rk4Ip.ofStep(0.1), RandomStreams.commonsRng(11));

    final Integrator integrator;
    final RandomStreams streams;

    Setup(Integrator integrator, RandomStreams streams) {
      this.integrator = integrator;
      this.streams = streams;
    }
  }

  private static final Observable PROFILE =
      new Observable() {
        @Override
        public String name() {
          return "real parts";
        }

        @Override
        public int size(spgpe.model.Model model) {
          return 2 * model.region().grid().points();
        }

        @Override
        public void measure(Snapshot snapshot, double[] result) {
          int points = result.length / 2;
          System.arraycopy(snapshot.field().re(0), 0, result, 0, points);
          System.arraycopy(snapshot.field().im(1), 0, result, points, points);
        }
      };

  private static final Recording<TimeMoments> MOMENTS =
      Recording.of(PROFILE, Schedule.every(0.5), TimeMoments::new);
  private static final Recording<TimeSeries> SERIES =
      Recording.of(SmallPlans.density(), Schedule.every(0.3), TimeSeries::new);

  /** Stops about half of the trajectories at different times. */
  private static final StopRule RULE =
      StopRule.when(
          "dense", Schedule.every(0.2).startingAt(0.4),
          s -> Math.hypot(s.field().re(0)[3], s.field().im(0)[3]) > 1.1);

  private static Ensemble plan(Setup setup) {
    return SmallPlans.plan(SmallPlans.pair(), TRAJECTORIES)
        .integratedBy(setup.integrator)
        .noise(setup.streams)
        .until(3)
        .stopWhen(RULE)
        .record(MOMENTS)
        .record(SERIES);
  }

  /** Everything in a result, as values whose equality compares bits. */
  private static List<Object> contents(EnsembleResult result) {
    List<Object> all = new ArrayList<>(result.ends());
    TimeMoments moments = result.get(MOMENTS);
    for (int s = 0; s < moments.times().length; s++) {
      all.add(moments.count(s));
      for (int i = 0; i < 32; i++) {
        all.add(moments.mean(s, i));
        all.add(moments.variance(s, i));
      }
    }
    for (TimeSeries.Series series : result.get(SERIES).series()) {
      all.add(series.end());
      Arrays.stream(series.times()).forEach(all::add);
      Arrays.stream(series.values()).forEach(v -> all.add(v[0]));
    }
    return all;
  }

  @Test
  void anyNumberOfThreadsAndLanesGivesTheSameBits() {
    for (Setup setup : Setup.values()) {
      EnsembleResult reference = plan(setup).run();
      long stopped = reference.ends().stream().filter(TrajectoryEnd::isStopped).count();
      assertEquals(true, stopped > 2 && stopped < TRAJECTORIES, "early stops: " + stopped);
      List<Object> expected = contents(reference);
      for (int threads : new int[] {1, 2, 7}) {
        ExecutorService executor = Executors.newFixedThreadPool(threads);
        try {
          for (int lanes : new int[] {1, 4, 8}) {
            List<Object> found = contents(plan(setup).lanes(lanes).runOn(executor));
            assertEquals(expected, found, setup + ", threads " + threads + ", lanes " + lanes);
          }
        } finally {
          executor.shutdown();
        }
      }
    }
  }

  /** Long enough for several windows: 60 trajectories change lanes and neighbours many times. */
  @Test
  void refilledLanesGiveTheSameBits() {
    for (Setup setup : Setup.values()) {
      Ensemble plan =
          plan(setup)
              .trajectories(60)
              .until(60)
              .stopWhen(
                  StopRule.when(
                      "rare", Schedule.every(0.2).startingAt(0.4),
                      s -> Math.hypot(s.field().re(0)[5], s.field().im(0)[5]) > 1.35));
      EnsembleResult reference = plan.run();
      long windows = reference.ends().stream().map(e -> (int) (e.time() / 6.4)).distinct().count();
      assertEquals(true, windows >= 4, "trajectories end in " + windows + " windows");
      List<Object> expected = contents(reference);
      for (int lanes : new int[] {2, 8}) {
        assertEquals(expected, contents(plan.lanes(lanes).run()), setup + ", lanes " + lanes);
      }
      ExecutorService executor = Executors.newFixedThreadPool(3);
      try {
        assertEquals(expected, contents(plan.lanes(4).runOn(executor)), setup + ", three threads");
      } finally {
        executor.shutdown();
      }
    }
  }

  private static final List<Object> REFERENCE =
      List.copyOf(contents(plan(Setup.SPLIT_COUNTER).run()));

  @Property(tries = 25)
  void anySplitMergedInAnyOrderGivesTheSameBits(
      @ForAll("cuts") List<Integer> cuts,
      @ForAll @IntRange(min = 1, max = 9) int lanes,
      @ForAll java.util.Random order) {
    List<Integer> edges = new ArrayList<>(cuts);
    edges.add(0);
    edges.add(TRAJECTORIES);
    edges.sort(null);
    List<EnsembleResult> parts = new ArrayList<>();
    for (int i = 1; i < edges.size(); i++) {
      int first = edges.get(i - 1);
      int count = edges.get(i) - first;
      parts.add(plan(Setup.SPLIT_COUNTER).lanes(lanes).trajectories(first, count).run());
    }
    while (parts.size() > 1) {
      EnsembleResult one = parts.remove(order.nextInt(parts.size()));
      EnsembleResult two = parts.remove(order.nextInt(parts.size()));
      parts.add(one.mergedWith(two));
    }
    assertEquals(REFERENCE, contents(parts.get(0)));
  }

  @Provide
  Arbitrary<List<Integer>> cuts() {
    return Arbitraries.integers()
        .between(1, TRAJECTORIES - 1)
        .list()
        .uniqueElements()
        .ofMaxSize(6);
  }

  @Test
  void anotherSeedGivesOtherNumbers() {
    assertNotEquals(
        REFERENCE, contents(plan(Setup.SPLIT_COUNTER).seed(12).run()));
  }

  private static Trajectory trajectory(Setup setup, long index) {
    return Trajectory.of(SmallPlans.pair())
        .startingFrom(InitialState.uniform(1, -1))
        .integratedBy(setup.integrator)
        .seed(11, index)
        .until(4);
  }

  private static void assertSame(Amplitudes expected, Amplitudes found) {
    for (int c = 0; c < expected.components(); c++) {
      for (int i = 0; i < expected.re(c).length; i++) {
        assertEquals(expected.re(c)[i], found.re(c)[i], 0);
        assertEquals(expected.im(c)[i], found.im(c)[i], 0);
      }
    }
  }

  @Test
  void lookingMoreOftenChangesNothing() {
    for (Setup setup : List.of(Setup.SPLIT_COUNTER, Setup.PICTURE_COUNTER)) {
      Amplitudes expected = trajectory(setup, 3).run().finalState();
      for (double interval : new double[] {0.1, 0.3, 1, 4}) {
        Recording<TimeMoments> often =
            Recording.of(SmallPlans.density(), Schedule.every(interval), TimeMoments::new);
        Recording<TimeMoments> energy =
            Recording.of(
                Observable.scalar("energy", Snapshot::grandCanonicalEnergy),
                Schedule.at(0.7, 2.2), TimeMoments::new);
        Amplitudes found =
            trajectory(setup, 3)
                .record(often)
                .record(energy)
                .stopWhen(StopRule.when("never", Schedule.every(0.2), s -> false))
                .run()
                .finalState();
        assertSame(expected, found);
      }
    }
  }

  @Test
  void aTrajectoryAloneIsThatOfTheEnsemble() {
    Recording<TimeSeries> alone =
        Recording.of(SmallPlans.density(), Schedule.every(0.3), TimeSeries::new);
    TimeSeries all = plan(Setup.SPLIT_COUNTER).run().get(SERIES);
    for (int index : new int[] {0, 5, 12}) {
      TimeSeries.Series expected = all.series().get(index);
      TimeSeries.Series found =
          trajectory(Setup.SPLIT_COUNTER, index)
              .until(3)
              .stopWhen(RULE)
              .record(alone)
              .run()
              .get(alone)
              .series()
              .get(0);
      assertEquals(expected.end(), found.end());
      for (int s = 0; s < expected.values().length; s++) {
        assertEquals(expected.values()[s][0], found.values()[s][0], 0);
      }
    }
  }
}
