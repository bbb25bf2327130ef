package spgpe.hamiltonian;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.AllocationMeter;
import spgpe.projector.Field;
import spgpe.projector.PointBlock;
import spgpe.projector.PointBlocks;

/**
 * What every {@link LocalTerm} must do, in addition to {@link HamiltonianTermContract}. Random fields
 * come from fixed seeds, so nothing here is left to chance.
 */
public abstract class LocalTermContract extends HamiltonianTermContract {
  @Override
  protected abstract LocalTerm term();

  private LocalTerm local(PeriodicGrid grid) {
    return term().preparedFor(grid);
  }

  private Field randomField(PeriodicGrid grid, int lanes, long seed) {
    Field field = new Field(grid, components(), lanes);
    SplittableRandom random = new SplittableRandom(seed);
    for (int c = 0; c < components(); c++) {
      fill(field.re(c), random);
      fill(field.im(c), random);
    }
    return field;
  }

  private static double largest(Field field) {
    double largest = 0;
    for (int c = 0; c < field.components(); c++) {
      for (int i = 0; i < field.re(c).length; i++) {
        largest = Math.max(largest, Math.hypot(field.re(c)[i], field.im(c)[i]));
      }
    }
    return largest;
  }

  @Test
  void theForceIsTheGradientOfTheEnergyDensityAtEachPoint() {
    PeriodicGrid grid = grid(16);
    LocalTerm local = local(grid);
    Field psi = randomField(grid, 1, 2);
    Field force = new Field(grid, components(), 1);
    local.addForce(0.37, PointBlock.ofAll(psi, force));
    double scale = Math.max(largest(force), 1e-3);
    for (int c = 0; c < components(); c++) {
      for (int p = 0; p < grid.points(); p++) {
        assertEquals(
            2 * force.re(c)[p], slope(local, psi, psi.re(c), p), 1e-8 * scale, "de/d Re psi");
        assertEquals(
            2 * force.im(c)[p], slope(local, psi, psi.im(c), p), 1e-8 * scale, "de/d Im psi");
      }
    }
  }

  private static double slope(LocalTerm local, Field psi, double[] array, int point) {
    double kept = array[point];
    double[] e = new double[5];
    for (int k = -2; k <= 2; k++) {
      array[point] = kept + k * DIFFERENCE;
      double[] density = new double[array.length];
      Field unused = new Field(psi.grid(), psi.components(), 1);
      local.addEnergyDensity(0.37, PointBlock.ofAll(psi, unused), density);
      e[k + 2] = Arrays.stream(density).sum();
    }
    array[point] = kept;
    return (8 * (e[3] - e[1]) - (e[4] - e[0])) / (12 * DIFFERENCE);
  }

  @Test
  void itLeavesPsiAloneAndAddsToTheResult() {
    PeriodicGrid grid = grid(16);
    LocalTerm local = local(grid);
    Field psi = randomField(grid, 2, 4);
    Field untouched = randomField(grid, 2, 4);
    Field force = new Field(grid, components(), 2);
    Field summed = randomField(grid, 2, 5);
    Field before = randomField(grid, 2, 5);
    local.addForce(0.37, PointBlock.ofAll(psi, force));
    local.addForce(0.37, PointBlock.ofAll(psi, summed));
    double[] density = new double[psi.re(0).length];
    double[] summedDensity = new double[density.length];
    Arrays.fill(summedDensity, 0.5);
    Field result = randomField(grid, 2, 6);
    local.addEnergyDensity(0.37, PointBlock.ofAll(psi, result), density);
    local.addEnergyDensity(0.37, PointBlock.ofAll(psi, result), summedDensity);
    double scale = 1 + largest(force);
    for (int c = 0; c < components(); c++) {
      assertArrayEquals(untouched.re(c), psi.re(c), "psi must not change");
      assertArrayEquals(untouched.im(c), psi.im(c), "psi must not change");
      assertArrayEquals(
          randomField(grid, 2, 6).re(c), result.re(c), "the energy must not touch the result");
      for (int i = 0; i < force.re(c).length; i++) {
        assertEquals(before.re(c)[i] + force.re(c)[i], summed.re(c)[i], 1e-14 * scale, "adds");
        assertEquals(before.im(c)[i] + force.im(c)[i], summed.im(c)[i], 1e-14 * scale, "adds");
      }
    }
    double largestDensity = Arrays.stream(density).map(Math::abs).max().orElse(0);
    for (int i = 0; i < density.length; i++) {
      assertEquals(0.5 + density[i], summedDensity[i], 1e-14 * (1 + largestDensity), "adds");
    }
  }

  @Test
  void itWorksOnAnySplitIntoBlocksAndOnEachLaneAlone() {
    PeriodicGrid grid = grid(32);
    LocalTerm local = local(grid);
    SplittableRandom random = new SplittableRandom(7);
    for (int lanes : new int[] {1, 3, 4}) {
      Field psi = randomField(grid, lanes, 8);
      Field whole = new Field(grid, components(), lanes);
      double[] wholeDensity = new double[psi.re(0).length];
      local.addForce(0.37, PointBlock.ofAll(psi, whole));
      local.addEnergyDensity(
          0.37, PointBlock.ofAll(psi, new Field(grid, components(), lanes)), wholeDensity);
      for (int attempt = 0; attempt < 5; attempt++) {
        Field parts = new Field(grid, components(), lanes);
        double[] density = new double[wholeDensity.length];
        for (int begin = 0; begin < grid.points(); ) {
          int end = begin + 1 + random.nextInt(grid.points() - begin);
          PointBlock block = PointBlocks.range(psi, parts, begin, end);
          local.addForce(0.37, block);
          local.addEnergyDensity(0.37, block, density);
          begin = end;
        }
        assertClose(whole, parts);
        assertArrayEquals(
            wholeDensity, density, 1e-14 * (1 + largest(whole)), "energy density of a split");
      }
      assertClose(whole, everyOtherPoint(local, psi));
      for (int lane = 0; lane < lanes; lane++) {
        assertClose(lane(whole, lane), forceOf(local, lane(psi, lane)));
      }
    }
  }

  private Field forceOf(LocalTerm local, Field psi) {
    Field force = new Field(psi.grid(), components(), psi.lanes());
    local.addForce(0.37, PointBlock.ofAll(psi, force));
    return force;
  }

  private Field lane(Field field, int lane) {
    Field one = new Field(field.grid(), components(), 1);
    for (int c = 0; c < components(); c++) {
      for (int p = 0; p < field.grid().points(); p++) {
        one.re(c)[p] = field.re(c)[p * field.lanes() + lane];
        one.im(c)[p] = field.im(c)[p * field.lanes() + lane];
      }
    }
    return one;
  }

  private Field everyOtherPoint(LocalTerm local, Field psi) {
    Field sorted = reordered(psi, true);
    Field force = new Field(psi.grid(), components(), psi.lanes());
    local.addForce(0.37, PointBlocks.everyOther(sorted, force, true));
    local.addForce(0.37, PointBlocks.everyOther(sorted, force, false));
    return reordered(force, false);
  }

  private Field reordered(Field field, boolean evenFirst) {
    Field other = new Field(field.grid(), components(), field.lanes());
    int points = field.grid().points();
    for (int c = 0; c < components(); c++) {
      for (int p = 0; p < points; p++) {
        int sorted = p / 2 + (p % 2) * points / 2;
        for (int l = 0; l < field.lanes(); l++) {
          int to = (evenFirst ? sorted : p) * field.lanes() + l;
          int from = (evenFirst ? p : sorted) * field.lanes() + l;
          other.re(c)[to] = field.re(c)[from];
          other.im(c)[to] = field.im(c)[from];
        }
      }
    }
    return other;
  }

  private static void assertClose(Field expected, Field found) {
    double tolerance = 1e-14 * (1 + largest(expected));
    for (int c = 0; c < expected.components(); c++) {
      assertArrayEquals(expected.re(c), found.re(c), tolerance, "force, real part");
      assertArrayEquals(expected.im(c), found.im(c), tolerance, "force, imaginary part");
    }
  }

  @Test
  void itsForceIsAPolynomialOfTheDegreeItStates() {
    PeriodicGrid grid = grid(16);
    LocalTerm local = local(grid);
    int degree = local.forceDegree();
    assertTrue(degree >= 1 && degree % 2 == 1, "the degree must be odd: " + degree);
    Field psi = randomField(grid, 1, 9);
    int order = degree + 1;
    double scale = 0;
    double[][] sums = new double[components()][grid.points()];
    double binomial = 1;
    for (int s = 0; s <= order; s++) {
      Field scaled = new Field(grid, components(), 1);
      for (int c = 0; c < components(); c++) {
        for (int p = 0; p < grid.points(); p++) {
          scaled.re(c)[p] = s * psi.re(c)[p];
          scaled.im(c)[p] = s * psi.im(c)[p];
        }
      }
      Field force = forceOf(local, scaled);
      scale = Math.max(scale, binomial * largest(force));
      for (int c = 0; c < components(); c++) {
        for (int p = 0; p < grid.points(); p++) {
          sums[c][p] += (s % 2 == 0 ? 1 : -1) * binomial * force.re(c)[p];
        }
      }
      binomial = binomial * (order - s) / (s + 1);
    }
    for (double[] sum : sums) {
      for (double difference : sum) {
        assertEquals(0, difference, 1e-12 * scale, "difference of order " + order);
      }
    }
  }

  @Test
  void itDependsOnTimeOnlyIfItSaysSo() {
    PeriodicGrid grid = grid(16);
    LocalTerm local = local(grid);
    assertEquals(term().dependsOnTime(), local.dependsOnTime());
    Field psi = randomField(grid, 1, 10);
    Field early = new Field(grid, components(), 1);
    Field late = new Field(grid, components(), 1);
    local.addForce(0, PointBlock.ofAll(psi, early));
    local.addForce(5.3, PointBlock.ofAll(psi, late));
    boolean same = true;
    for (int c = 0; c < components(); c++) {
      same &= Arrays.equals(early.re(c), late.re(c)) && Arrays.equals(early.im(c), late.im(c));
    }
    assertEquals(local.dependsOnTime(), !same, "force at t = 0 and 5.3 against dependsOnTime()");
  }

  @Test
  void onceWarmItAllocatesNothing() {
    PeriodicGrid grid = grid(16);
    LocalTerm local = local(grid);
    Field force = new Field(grid, components(), 4);
    PointBlock block = PointBlock.ofAll(randomField(grid, 4, 12), force);
    double[] density = new double[force.re(0).length];
    assertAll(
        () -> assertTrue(AllocationMeter.bytesPerCall(() -> local.addForce(0.37, block)) < 1),
        () ->
            assertTrue(
                AllocationMeter.bytesPerCall(() -> local.addEnergyDensity(0.37, block, density))
                    < 1));
  }
}
