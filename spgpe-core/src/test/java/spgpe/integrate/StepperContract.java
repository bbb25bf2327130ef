package spgpe.integrate;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.ModulatedCoupling;
import spgpe.internal.check.AllocationMeter;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/**
 * The part of {@link IntegratorContract} on steppers: what they promise of state, time, looks, lanes
 * and restarts, all exact to the bit.
 */
public abstract class StepperContract {
  static final double TEMPERATURE = 0.2;
  static final double MU = 1;

  /**
   * The scheme under test, with a step that is accurate for energies up to 2; a run of one time unit
   * with it is the coarsest of those that measure the order.
   *
   * @return the same scheme at each call
   */
  protected abstract Integrator scheme();

  /**
   * The Hamiltonian it is tried with, of two components; for schemes that refuse the usual one.
   *
   * @return a Hamiltonian that keeps the atom number
   */
  protected Hamiltonian hamiltonian() {
    return Hamiltonian.pair(1, 0.3)
        .with(CoherentCoupling.constant(0.2))
        .with(BiquadraticCoupling.of(0.4))
        .with(ModulatedCoupling.of(0.1, 3));
  }

  /**
   * Numbers of lanes that must give the same bits.
   *
   * @return lane counts, the first of them 1
   */
  protected int[] laneCounts() {
    return new int[] {1, 3, 4, 8};
  }

  CoherentRegion region() {
    return scheme().facts().latticeOnly()
        ? Projector.allModes().on(PeriodicGrid.of(Axis.of(16, 16)))
        : Projector.modesUpTo(5).on(PeriodicGrid.of(Axis.of(32, 16)));
  }

  Model model(Reservoir reservoir) {
    return Model.ofAliasing(region(), hamiltonian(), reservoir);
  }

  Model model() {
    double gamma = scheme().facts().admitsNoise() ? 0.1 : 0;
    return model(Reservoir.of(TEMPERATURE, MU, gamma));
  }

  static NoiseGenerator noise(Model model, int lanes, long firstTrajectory) {
    NoiseGenerator noise = RandomStreams.counterBased(8).generator(model.region(), 2, lanes);
    for (int lane = 0; lane < lanes; lane++) {
      noise.assign(lane, firstTrajectory + lane);
    }
    return noise;
  }

  private Stepper bind(Model model) {
    return scheme().bind(model, noise(model, 1, 10), 1);
  }

  /** Smooth fields, another one in each lane. */
  static Amplitudes state(Model model, int lanes, int firstLane) {
    Amplitudes a = new Amplitudes(model.region(), 2, lanes);
    for (int c = 0; c < 2; c++) {
      for (int e = 0; e < a.re(c).length; e++) {
        int n = model.region().modeNumber(0, e / lanes);
        int lane = firstLane + e % lanes;
        double size = 3 * Math.exp(-n * n / 2.0);
        a.re(c)[e] = size * Math.cos(n + c + lane);
        a.im(c)[e] = size * Math.sin(3 * n + c + 2 * lane);
      }
    }
    return a;
  }

  static void advance(Stepper stepper, int steps) {
    for (int s = 0; s < steps; s++) {
      stepper.advance();
    }
  }

  private static Amplitudes seen(Stepper stepper, Amplitudes shape) {
    Amplitudes target = shape.copy();
    stepper.observe(target);
    return target;
  }

  static void requireSame(Amplitudes expected, Amplitudes found, String message) {
    for (int c = 0; c < expected.components(); c++) {
      assertArrayEquals(expected.re(c), found.re(c), 0, message);
      assertArrayEquals(expected.im(c), found.im(c), 0, message);
    }
  }

  @Test
  void aStepperMustBeStartedAndKeepsTime() {
    Model model = model();
    Stepper stepper = bind(model);
    Amplitudes state = state(model, 1, 0);
    assertThrows(IllegalStateException.class, stepper::advance);
    assertThrows(IllegalStateException.class, () -> stepper.observe(state));
    assertThrows(IllegalStateException.class, stepper::save);
    stepper.start(state, 7);
    assertEquals(7 * scheme().step(), stepper.time(), 0);
    requireSame(state, seen(stepper, new Amplitudes(model.region(), 2, 1)), "before a step");
    advance(stepper, 3);
    assertEquals(10, stepper.stepNumber());
    assertEquals(10 * scheme().step(), stepper.time(), 0);
  }

  @Test
  void theInitialStateIsCopiedAndAFreshStartForgetsTheRunBefore() {
    Model model = model();
    Stepper stepper = bind(model);
    Amplitudes initial = state(model, 1, 0);
    Amplitudes kept = initial.copy();
    stepper.start(initial, 0);
    advance(stepper, 6);
    requireSame(kept, initial, "input of start");
    Amplitudes first = seen(stepper, kept);
    stepper.start(initial, 0);
    initial.clear();
    advance(stepper, 6);
    requireSame(first, seen(stepper, kept), "second start");
  }

  @Test
  void lookingDoesNotChangeTheRun() {
    Model model = model();
    Amplitudes initial = state(model, 1, 0);
    Stepper unseen = bind(model);
    Stepper watched = bind(model);
    unseen.start(initial, 0);
    watched.start(initial, 0);
    for (int s = 0; s < 12; s++) {
      unseen.advance();
      watched.advance();
      Amplitudes look = seen(watched, initial);
      requireSame(look, seen(watched, initial), "two looks at once");
      look.clear();
      watched.save();
    }
    requireSame(seen(unseen, initial), seen(watched, initial), "with and without looks");
  }

  @Test
  void twoSteppersOfARecipeDoNotDisturbEachOther() {
    Model model = model();
    Stepper one = bind(model);
    Stepper two = bind(model);
    one.start(state(model, 1, 0), 0);
    two.start(state(model, 1, 5), 3);
    for (int s = 0; s < 6; s++) {
      one.advance();
      two.advance();
    }
    Amplitudes found = seen(one, state(model, 1, 0));
    Stepper alone = bind(model);
    alone.start(state(model, 1, 0), 0);
    advance(alone, 6);
    requireSame(seen(alone, found), found, "interleaved");
  }

  @Test
  void aRestoredStepperGoesOnBitForBit() {
    Model model = model();
    Stepper whole = bind(model);
    Amplitudes initial = state(model, 1, 0);
    whole.start(initial, 0);
    assertTrue(whole.save().isAtSymmetricPoint());
    advance(whole, 7);
    StepperState saved = whole.save();
    advance(whole, 5);
    Stepper second = bind(model);
    second.restore(
        StepperState.of(
            saved.inner(), saved.stepNumber(), saved.isAtSymmetricPoint(), saved.refinement()));
    assertEquals(7, second.stepNumber());
    advance(second, 5);
    requireSame(seen(whole, initial), seen(second, initial), "restored");
    assertEquals(whole.time(), second.time(), 0);
  }

  @Test
  void lanesDoNotDependOnEachOther() {
    Model model = model();
    for (int lanes : laneCounts()) {
      Amplitudes all = state(model, lanes, 0);
      Stepper together = scheme().bind(model, noise(model, lanes, 10), lanes);
      together.start(all, 0);
      advance(together, 10);
      Amplitudes found = seen(together, all);
      for (int lane = 0; lane < lanes; lane++) {
        Amplitudes one = state(model, 1, lane);
        Stepper alone = scheme().bind(model, noise(model, 1, 10 + lane), 1);
        alone.start(one, 0);
        advance(alone, 10);
        Amplitudes ofLane = one.copy();
        found.copyLane(lane, ofLane);
        requireSame(seen(alone, one), ofLane, "lane " + lane + " of " + lanes);
      }
    }
  }

  @Test
  void aStepAndALookAllocateNothing() {
    Model model = model();
    Stepper stepper = bind(model);
    Amplitudes target = state(model, 1, 0);
    stepper.start(target, 0);
    double step = AllocationMeter.bytesPerCall(stepper::advance);
    double look = AllocationMeter.bytesPerCall(() -> stepper.observe(target));
    assertTrue(step < 1, "bytes for each step: " + step);
    assertTrue(look < 1, "bytes for each look: " + look);
  }

  @Test
  void noNoiseIsDrawnWithoutTemperatureOrDamping() {
    double gamma = scheme().facts().admitsNoise() ? 0.1 : 0;
    for (Reservoir quiet : new Reservoir[] {Reservoir.of(0, MU, gamma), Reservoir.of(1, MU, 0)}) {
      Model model = model(quiet);
      AtomicInteger draws = new AtomicInteger();
      NoiseGenerator counting =
          new NoiseGenerator() {
            @Override
            public void assign(int lane, long trajectory) {}

            @Override
            public void fill(long step, int use, Amplitudes normals) {
              draws.incrementAndGet();
            }
          };
      Stepper stepper = scheme().bind(model, counting, 1);
      Amplitudes state = state(model, 1, 0);
      stepper.start(state, 0);
      advance(stepper, 3);
      stepper.observe(state);
      assertEquals(0, draws.get(), quiet.toString());
    }
  }

  private static void requireRefusal(Runnable call, String what) {
    RuntimeException refused = assertThrows(RuntimeException.class, call::run, what);
    assertTrue(
        refused instanceof IllegalArgumentException || refused instanceof NullPointerException,
        what + ": " + refused);
    String message = String.valueOf(refused.getMessage());
    // "Cannot ..." and null are what the virtual machine says when nobody has checked
    assertFalse(message.startsWith("Cannot ") || message.equals("null"), what + ": " + message);
  }

  @Test
  void nullAndMisfitsAreRefusedWithAMessage() {
    Model model = model();
    requireRefusal(() -> scheme().largestStableStep(null), "limit for no model");
    requireRefusal(() -> scheme().bind(null, noise(model, 1, 0), 1), "no model");
    requireRefusal(() -> scheme().bind(model, null, 1), "no noise");
    requireRefusal(() -> scheme().bind(model, noise(model, 1, 0), 0), "no lanes");
    Stepper stepper = bind(model);
    Amplitudes tooMany = new Amplitudes(model.region(), 3, 1);
    requireRefusal(() -> stepper.start(null, 0), "no state");
    requireRefusal(() -> stepper.start(tooMany, 0), "three components");
    requireRefusal(() -> stepper.start(state(model, 1, 0), -1), "step -1");
    requireRefusal(() -> stepper.restore(null), "nothing saved");
    stepper.start(state(model, 1, 0), 0);
    requireRefusal(() -> stepper.observe(null), "no target");
    requireRefusal(() -> stepper.observe(tooMany), "target of three components");
  }
}
