package spgpe.observables;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.density.Density;
import spgpe.observables.phase.RelativePhase;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Observable;
import spgpe.run.Schedule;
import spgpe.run.Snapshot;
import spgpe.run.TrajectoryEnd;

class FirstPassageTest {
  private final Model model = Fields.pair(8, 12);

  private Snapshot at(double time) {
    return Fields.snapshot(model, time, (c, x, v) -> v[0] = 1);
  }

  @Test
  void strictComparisonInBothDirections() {
    Observable time = Observable.scalar("time", Snapshot::time);
    Schedule schedule = Schedule.every(0.5);
    assertFalse(FirstPassage.upward(time, 2, schedule).shouldStop(at(2)));
    assertTrue(FirstPassage.upward(time, 2, schedule).shouldStop(at(2.5)));
    assertFalse(FirstPassage.downward(time, 2, schedule).shouldStop(at(2)));
    assertTrue(FirstPassage.downward(time, 2, schedule).shouldStop(at(1.5)));
    assertEquals("time > 2.0", FirstPassage.upward(time, 2, schedule).name());
  }

  @Test
  void endsTrajectoriesAtTheFirstObservedCrossing() {
    // phi = 0 is the stable state: the mean cosine starts at 1 and is beyond -0.4 at the first look
    FirstPassage rule =
        FirstPassage.upward(
            RelativePhase.meanCosine(), -0.4, Schedule.every(0.5).startingAt(1));
    EnsembleResult result =
        Ensemble.of(model).startingFrom(InitialState.uniform(1, 1)).integratedBy(OuRk4.ofStep(0.1))
            .trajectories(3).seed(5).until(4).stopWhen(rule).lanes(2).runOn(Runnable::run);
    for (TrajectoryEnd end : result.ends()) {
      assertTrue(end.isStopped());
      assertEquals(1.0, end.time(), 1e-12);
      assertEquals("mean cosine of the relative phase > -0.4", end.detail());
    }
    EnsembleResult metastable =
        Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
            .integratedBy(OuRk4.ofStep(0.1)).trajectories(2).seed(5).until(4).stopWhen(rule)
            .runOn(Runnable::run);
    for (TrajectoryEnd end : metastable.ends()) {
      assertFalse(end.isStopped());
    }
  }

  @Test
  void misuseIsNamed() {
    Schedule s = Schedule.every(1);
    assertTrue(
        Fields.refusal(() -> FirstPassage.upward(RelativePhase.meanCosine(), Double.NaN, s))
            .contains("threshold=NaN"));
    FirstPassage profile = FirstPassage.upward(Density.total(), 1, s);
    assertTrue(Fields.refusal(() -> profile.shouldStop(at(0))).contains("numbers=64"));
    FirstPassage nan =
        FirstPassage.upward(Observable.scalar("broken", x -> Double.NaN), 1, s);
    String message =
        assertThrows(IllegalStateException.class, () -> nan.shouldStop(at(0))).getMessage();
    assertTrue(message.contains("\"broken\""), message);
  }
}
