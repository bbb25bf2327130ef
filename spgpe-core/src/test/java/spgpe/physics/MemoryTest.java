package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.reflect.Array;
import java.lang.reflect.Field;
import java.lang.reflect.Modifier;
import java.util.ArrayDeque;
import java.util.Collections;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.Set;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Engine;
import spgpe.projector.Projector;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/**
 * What a stepper holds on a plane of 256 x 256 points, counted in doubles on the objects reachable
 * from it. The figures of docs/two-dimensions.md are from here.
 */
class MemoryTest {
  private static final int MODES_UP_TO = 63;

  private static Model model() {
    return Model.of(
            Projector.modesUpTo(MODES_UP_TO)
                .on(PeriodicGrid.of(Axis.of(256, 100), Axis.of(256, 100))),
            Hamiltonian.pair(1, 0.2).with(CoherentCoupling.constant(0.1)),
            Reservoir.of(0.1, 1, 0.1))
        .withEngine(Engine.PLAIN);
  }

  /** Doubles in arrays reachable from an object, and how many states are among it. */
  private static long[] reachable(Object root, Set<Object> seen) throws IllegalAccessException {
    Deque<Object> open = new ArrayDeque<>();
    open.push(root);
    long doubles = 0;
    long states = 0;
    while (!open.isEmpty()) {
      Object o = open.pop();
      if (!seen.add(o)) {
        continue;
      }
      Class<?> type = o.getClass();
      states += o instanceof Amplitudes ? 1 : 0;
      if (o instanceof double[] numbers) {
        doubles += numbers.length;
      } else if (type.isArray() && !type.getComponentType().isPrimitive()) {
        for (int i = 0; i < Array.getLength(o); i++) {
          pushIfPresent(Array.get(o, i), open);
        }
      } else if (type.getName().startsWith("spgpe.") && !(o instanceof Enum<?>)) {
        for (Class<?> t = type; t != null && t != Object.class; t = t.getSuperclass()) {
          for (Field field : t.getDeclaredFields()) {
            if (!Modifier.isStatic(field.getModifiers()) && !field.getType().isPrimitive()) {
              field.setAccessible(true);
              pushIfPresent(field.get(o), open);
            }
          }
        }
      }
    }
    return new long[] {doubles, states};
  }

  private static void pushIfPresent(Object value, Deque<Object> open) {
    if (value != null) {
      open.push(value);
    }
  }

  private static long[] heldBy(Integrator scheme, int lanes) throws IllegalAccessException {
    Model model = model();
    Set<Object> seen = Collections.newSetFromMap(new IdentityHashMap<>());
    reachable(model, seen); // shared by all threads: not counted
    Stepper stepper =
        scheme.bind(
            model, RandomStreams.counterBased(1).generator(model.region(), 2, lanes), lanes);
    return reachable(stepper, seen);
  }

  private static void assertHeld(Integrator scheme, int states, double largest, double shared)
      throws IllegalAccessException {
    long kept = 2L * 2 * (2 * MODES_UP_TO + 1) * (2 * MODES_UP_TO + 1);
    long[] one = heldBy(scheme, 1);
    long[] two = heldBy(scheme, 2);
    assertEquals(states, one[1], "states of " + scheme);
    double perTrajectory = (two[0] - one[0]) / (double) kept;
    double perThread = (2 * one[0] - two[0]) / (double) kept;
    String found = scheme + ": " + perTrajectory + " and " + perThread;
    assertTrue(perTrajectory <= largest && perTrajectory > states, found);
    assertTrue(perThread <= shared, found);
  }

  /**
   * In units of the kept modes themselves (0.52 MB here). Each lane of the default has 6 states
   * (state, two sets of normals, start of the step, stage, force) and 9 of tables of the linear flow
   * and its noise, repeated for each lane. The lanes of a thread share 3.5 more: half-transformed
   * rows, the points of a strip, masses and such. A trajectory that waits for a lane holds two
   * states. The test sees any further state or table.
   */
  @Test
  void whatAStepperHolds() throws IllegalAccessException {
    assertHeld(OuRk4.ofStep(0.01), 6, 15.1, 3.6);
    assertHeld(Rk4Ip.ofStep(0.01), 7, 9.1, 3.6);
  }
}
