package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.internal.check.AllocationMeter;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/**
 * What every observable must do: change nothing, remember nothing, and give the same numbers
 * whatever else is observed. Inherit, supply the observables, and run with JUnit.
 *
 * <p>Tried on a pair of unit density with relative phase near pi, on a ring of length 8 with the
 * modes up to 5 and small, smooth fluctuations. Deterministic.
 */
public abstract class ObservableContract {
  private static final int POINTS = 64;
  private static final int STATES = 3;

  /**
   * The observables under test, for a model of two components on a line.
   *
   * @return observables, the same at each call
   */
  protected abstract List<Observable> observables();

  /**
   * Whether a measurement may make objects.
   *
   * @param observable one of the observables
   * @return false if it must not
   */
  protected boolean mayAllocate(Observable observable) {
    return false;
  }

  /**
   * Whether the numbers do not depend on the number of points. The usual answer is yes if their
   * count does not, for quantities that are integrals.
   *
   * @param observable one of the observables
   * @return true if they do not
   */
  protected boolean isGridIndependent(Observable observable) {
    return observable.size(model(POINTS)) == observable.size(model(2 * POINTS));
  }

  private static Model model(int points) {
    return Model.of(
        Projector.modesUpTo(5).on(PeriodicGrid.of(Axis.of(points, 8))),
        Hamiltonian.pair(1, 0.1)
            .with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.225)),
        Reservoir.of(0.05, 1.1, 0.1));
  }

  private static Amplitudes state(Model model, int number) {
    Amplitudes a = new Amplitudes(model.region(), 2, 1);
    double root = Math.sqrt(model.region().grid().volume());
    for (int c = 0; c < 2; c++) {
      for (int m = 0; m < model.region().modes(); m++) {
        int n = model.region().modeNumber(0, m);
        double size = 0.1 * Math.exp(-Math.abs(n));
        a.re(c)[m] = (n == 0 ? (c == 0 ? root : -root) : 0) + size * Math.cos(n + c + number);
        a.im(c)[m] = size * Math.sin(2 * n + c + 3 * number);
      }
    }
    return a;
  }

  private static double[] measure(Observable observable, Snapshot snapshot) {
    double[] result = new double[observable.size(snapshot.model())];
    Arrays.fill(result, Double.NaN); // all must be overwritten
    observable.measure(snapshot, result);
    return result;
  }

  @Test
  void namesAndSizesAreFixed() {
    for (Observable observable : observables()) {
      assertFalse(observable.name().isBlank());
      assertEquals(observable.name(), observable.name());
      int size = observable.size(model(POINTS));
      assertTrue(size >= 1, observable.name());
      assertEquals(size, observable.size(model(POINTS)), observable.name());
    }
  }

  @Test
  void measuringChangesNothingAndHasNoMemory() {
    Model small = model(POINTS);
    Model large = model(96);
    for (Observable observable : observables()) {
      Snapshot snapshot = new Snapshot(small);
      double[][] expected = new double[STATES][];
      for (int round = 0; round < 2; round++) {
        for (int n = 0; n < STATES; n++) {
          Amplitudes a = state(small, n);
          Amplitudes before = a.copy();
          snapshot.show(a, 1.5, 15, n);
          double[] found = measure(observable, snapshot);
          for (double value : found) {
            assertTrue(Double.isFinite(value), observable.name());
          }
          for (int c = 0; c < 2; c++) {
            assertArrayEquals(before.re(c), a.re(c), 0, observable.name());
            assertArrayEquals(before.im(c), a.im(c), 0, observable.name());
          }
          if (round == 0) {
            expected[n] = found;
          }
          assertArrayEquals(expected[n], found, 0, observable.name());
          assertArrayEquals(expected[n], measure(observable, snapshot), 0, observable.name());
          measure(observable, Snapshot.of(large, state(large, n), 0)); // of another model
        }
      }
    }
  }

  /** Observables share what they compute: the order must not show. */
  @Test
  void whatElseIsObservedDoesNotMatter() {
    Model model = model(POINTS);
    List<Observable> backwards = new ArrayList<>(observables());
    Collections.reverse(backwards);
    for (int n = 0; n < STATES; n++) {
      Amplitudes a = state(model, n);
      Snapshot one = Snapshot.of(model, a, 1.5);
      Snapshot two = Snapshot.of(model, a, 1.5);
      List<double[]> numbers = new ArrayList<>();
      for (Observable observable : backwards) {
        numbers.add(0, measure(observable, two));
      }
      for (int i = 0; i < numbers.size(); i++) {
        Observable observable = observables().get(i);
        assertArrayEquals(
            measure(observable, Snapshot.of(model, a, 1.5)), measure(observable, one), 0,
            observable.name());
        assertArrayEquals(numbers.get(i), measure(observable, one), 0, observable.name());
      }
    }
  }

  @Test
  void lanesDoNotMatter() {
    List<Observable> all = observables();
    List<List<TimeSeries.Series>> expected = runWith(1, all);
    List<List<TimeSeries.Series>> found = runWith(3, all);
    for (int i = 0; i < all.size(); i++) {
      for (int t = 0; t < STATES; t++) {
        assertArrayEquals(
            expected.get(i).get(t).values(), found.get(i).get(t).values(), all.get(i).name());
      }
    }
  }

  private static List<List<TimeSeries.Series>> runWith(int lanes, List<Observable> observables) {
    List<Recording<TimeSeries>> recordings = new ArrayList<>();
    Ensemble plan =
        Ensemble.of(model(POINTS)).startingFrom((model, random, a) -> a.set(state(model, 1)))
            .integratedBy(OuRk4.ofStep(0.05)).trajectories(STATES).seed(4).until(0.5)
            .lanes(lanes);
    for (Observable observable : observables) {
      recordings.add(Recording.of(observable, Schedule.every(0.25), TimeSeries::new));
      plan = plan.record(recordings.get(recordings.size() - 1));
    }
    EnsembleResult result = plan.run();
    return recordings.stream().map(r -> result.get(r).series()).toList();
  }

  @Test
  void aMeasurementAllocatesNothingUnlessStated() {
    Model model = model(POINTS);
    Snapshot snapshot = new Snapshot(model);
    Amplitudes a = state(model, 0);
    for (Observable observable : observables()) {
      if (!mayAllocate(observable)) {
        double[] result = new double[observable.size(model)];
        double bytes =
            AllocationMeter.bytesPerCall(
                () -> {
                  snapshot.show(a, 1.5, 15, 0);
                  observable.measure(snapshot, result);
                });
        assertTrue(bytes < 1, observable.name() + ": bytes for each measurement: " + bytes);
      }
    }
  }

  @Test
  void theNumberOfPointsDoesNotMatterUnlessStated() {
    Model coarse = model(POINTS);
    Model fine = model(2 * POINTS);
    for (Observable observable : observables()) {
      if (isGridIndependent(observable)) {
        double[] expected = measure(observable, Snapshot.of(fine, state(fine, 1), 1.5));
        double[] found = measure(observable, Snapshot.of(coarse, state(coarse, 1), 1.5));
        for (int i = 0; i < found.length; i++) {
          assertEquals(
              expected[i], found[i], 1e-9 * (1 + Math.abs(expected[i])), observable.name());
        }
      }
    }
  }
}
