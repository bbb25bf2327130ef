package spgpe.hamiltonian;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.projector.Field;
import spgpe.projector.PointBlock;

/** Exact flows against small Runge-Kutta steps on the force of the same term. */
class ExactFlowTest {
  private static final PeriodicGrid GRID = PeriodicGrid.of(Axis.of(8, 5));
  private static final int LANES = 2;
  private static final double TIME = 0.3;
  private static final double DURATION = 0.4;

  private static List<ExactFlow> terms() {
    return List.of(
        ContactInteraction.ofPair(0.8, 0.8),
        ContactInteraction.ofMatrix(new double[][] {{0.9, 0.3}, {0.3, 1.4}}),
        BiquadraticCoupling.of(0.7),
        ModulatedCoupling.of(0.5, 2).withPhase(0.3),
        (ExactFlow) ExternalPotential.onLine("wave", Math::cos).preparedFor(GRID),
        (ExactFlow)
            ExternalPotential.onLine("wave", Math::sin).forComponent(1).preparedFor(GRID));
  }

  private static Field field() {
    Field psi = new Field(GRID, 2, LANES);
    for (int c = 0; c < 2; c++) {
      for (int i = 0; i < psi.re(c).length; i++) {
        psi.re(c)[i] = Math.cos(1.3 * i + c);
        psi.im(c)[i] = Math.sin(0.7 * i * i - c);
      }
    }
    return psi;
  }

  private static Field copy(Field from) {
    Field to = new Field(GRID, 2, LANES);
    for (int c = 0; c < 2; c++) {
      System.arraycopy(from.re(c), 0, to.re(c), 0, to.re(c).length);
      System.arraycopy(from.im(c), 0, to.im(c), 0, to.im(c).length);
    }
    return to;
  }

  private static Field flow(ExactFlow term, double duration, Field from) {
    Field psi = copy(from);
    term.flow(TIME, duration, PointBlock.ofAll(psi, new Field(GRID, 2, LANES)));
    return psi;
  }

  /** base - i h force(at). */
  private static Field euler(ExactFlow term, Field base, Field at, double h) {
    Field force = new Field(GRID, 2, LANES);
    term.addForce(TIME, PointBlock.ofAll(at, force));
    Field result = copy(base);
    for (int c = 0; c < 2; c++) {
      for (int i = 0; i < force.re(c).length; i++) {
        result.re(c)[i] += h * force.im(c)[i];
        result.im(c)[i] -= h * force.re(c)[i];
      }
    }
    return result;
  }

  private static Field rungeKutta(ExactFlow term, Field from, int steps) {
    double h = DURATION / steps;
    Field y = from;
    for (int s = 0; s < steps; s++) {
      Field second = euler(term, y, y, h / 2);
      Field third = euler(term, y, second, h / 2);
      Field fourth = euler(term, y, third, h);
      Field next = euler(term, y, y, h / 6);
      next = euler(term, next, second, h / 3);
      next = euler(term, next, third, h / 3);
      y = euler(term, next, fourth, h / 6);
    }
    return y;
  }

  private static void requireEqual(Field expected, Field found, double tolerance, String message) {
    for (int c = 0; c < 2; c++) {
      assertArrayEquals(expected.re(c), found.re(c), tolerance, message);
      assertArrayEquals(expected.im(c), found.im(c), tolerance, message);
    }
  }

  private static double difference(Field a, Field b) {
    double largest = 0;
    for (int c = 0; c < 2; c++) {
      for (int i = 0; i < a.re(c).length; i++) {
        largest = Math.max(largest, Math.abs(a.re(c)[i] - b.re(c)[i]));
        largest = Math.max(largest, Math.abs(a.im(c)[i] - b.im(c)[i]));
      }
    }
    return largest;
  }

  @Test
  void flowsSolveTheirEquations() {
    for (ExactFlow term : terms()) {
      requireEqual(
          rungeKutta(term, field(), 200), flow(term, DURATION, field()), 1e-9,
          term.description());
    }
  }

  @Test
  void flowsAreReversibleAndConserveTheTotalDensity() {
    for (ExactFlow term : terms()) {
      Field there = flow(term, DURATION, field());
      requireEqual(field(), flow(term, -DURATION, there), 1e-14, term.description());
      Field psi = field();
      for (int i = 0; i < psi.re(0).length; i++) {
        assertEquals(density(psi, 0, i) + density(psi, 1, i),
            density(there, 0, i) + density(there, 1, i), 1e-13, term.description());
        if (term.flowKind() != ExactFlow.Kind.MIXING) {
          assertEquals(density(psi, 0, i), density(there, 0, i), 1e-13, term.description());
        }
      }
    }
  }

  private static double density(Field psi, int c, int i) {
    return psi.re(c)[i] * psi.re(c)[i] + psi.im(c)[i] * psi.im(c)[i];
  }

  /** The kinds promise exactly which pairs of flows commute. */
  @Test
  void commutationIsAsTheKindsSay() {
    for (ExactFlow first : terms()) {
      for (ExactFlow second : terms()) {
        if (first.description().equals(second.description())) {
          continue;
        }
        double difference =
            difference(
                flow(second, DURATION, flow(first, DURATION, field())),
                flow(first, DURATION, flow(second, DURATION, field())));
        String pair = first.description() + " and " + second.description();
        if (first.flowKind().commutesWith(second.flowKind())) {
          assertEquals(0, difference, 1e-13, pair);
        } else {
          assertTrue(difference > 1e-4, pair);
        }
        assertEquals(
            first.flowKind().commutesWith(second.flowKind()),
            second.flowKind().commutesWith(first.flowKind()));
      }
    }
  }
}
