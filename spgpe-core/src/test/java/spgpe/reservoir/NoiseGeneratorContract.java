package spgpe.reservoir;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.apache.commons.rng.UniformRandomProvider;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.AllocationMeter;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;

/**
 * What every source of noise must do. Inherit, supply the streams, and run with JUnit.
 *
 * <p>The statistical tests use fixed seeds, so a given implementation passes or fails always; the
 * false-alarm probability stated with each is that of a correct implementation meeting an unlucky
 * seed. Trajectories, uses, components and modes are chosen next to each other and at the ends of
 * their ranges, where keys that overlap would show.
 */
public abstract class NoiseGeneratorContract {
  private static final long SEED = 20260101;
  private static final int STEPS = 4000;
  private static final long[] TRAJECTORIES = {0, 1, (1L << 32) - 1};
  private static final int[] USES = {0, 1, NoiseGenerator.LARGEST_USE};
  private static final int COMPONENTS = 2;
  private static final int LARGEST_MODE = 2;

  /**
   * The streams under test.
   *
   * @param seed seed
   * @return streams of that seed
   */
  protected abstract RandomStreams streams(long seed);

  /**
   * Whether the number for a mode depends on its mode numbers only, so that regions of different
   * cutoff see the same noise on the modes they share.
   *
   * @return true if so; otherwise only grids with the same kept modes see the same noise
   */
  protected boolean isKeyedByModeNumber() {
    return true;
  }

  /**
   * Whether filling allocates nothing.
   *
   * @return true unless the source makes objects at each step
   */
  protected boolean allocatesNothing() {
    return true;
  }

  private static CoherentRegion region(int largestMode, int points) {
    return Projector.modesUpTo(largestMode).on(PeriodicGrid.of(Axis.of(points, 9)));
  }

  private Amplitudes normals(
      RandomStreams streams, CoherentRegion region, int components, long step, int use,
      long... trajectories) {
    NoiseGenerator generator = streams.generator(region, components, trajectories.length);
    for (int lane = 0; lane < trajectories.length; lane++) {
      generator.assign(lane, trajectories[lane]);
    }
    Amplitudes normals = new Amplitudes(region, components, trajectories.length);
    generator.fill(step, use, normals);
    return normals;
  }

  private static void assertSame(Amplitudes expected, Amplitudes found) {
    for (int c = 0; c < expected.components(); c++) {
      assertArrayEquals(expected.re(c), found.re(c));
      assertArrayEquals(expected.im(c), found.im(c));
    }
  }

  /** Rows: one for each (trajectory, use, component, mode, quadrature); columns: steps. */
  private double[][] samples(RandomStreams streams, long firstStep, int steps) {
    CoherentRegion region = region(LARGEST_MODE, 16);
    NoiseGenerator generator = streams.generator(region, COMPONENTS, TRAJECTORIES.length);
    for (int lane = 0; lane < TRAJECTORIES.length; lane++) {
      generator.assign(lane, TRAJECTORIES[lane]);
    }
    Amplitudes normals = new Amplitudes(region, COMPONENTS, TRAJECTORIES.length);
    int numbers = region.modes() * TRAJECTORIES.length;
    double[][] rows = new double[USES.length * COMPONENTS * numbers * 2][steps];
    for (int s = 0; s < steps; s++) {
      int row = 0;
      for (int use : USES) {
        generator.fill(firstStep + s, use, normals);
        for (int c = 0; c < COMPONENTS; c++) {
          for (int i = 0; i < numbers; i++) {
            rows[row++][s] = normals.re(c)[i];
            rows[row++][s] = normals.im(c)[i];
          }
        }
      }
    }
    return rows;
  }

  private static double mean(double[] row, int power) {
    double sum = 0;
    for (double x : row) {
      sum += Math.pow(x, power);
    }
    return sum / row.length;
  }

  /**
   * 720 000 numbers. Mean, variance, third and fourth moment of all of them within 5 standard
   * deviations (false alarm 2.3e-6 in all); of each of 180 rows, mean and variance within 5.5 (false
   * alarm 1.4e-5). Catches a variance wrong by 1 % with certainty, such as 1/2 for 1.
   */
  @Test
  void eachQuadratureIsAStandardNormal() {
    double[][] rows = samples(streams(SEED), 0, STEPS);
    double[] sums = new double[5];
    for (double[] row : rows) {
      for (int power = 1; power <= 4; power++) {
        sums[power] += mean(row, power) / rows.length;
      }
      assertEquals(0, mean(row, 1), 5.5 / Math.sqrt(STEPS), "mean of a row");
      assertEquals(1, mean(row, 2), 5.5 * Math.sqrt(2.0 / STEPS), "variance of a row");
    }
    double root = Math.sqrt((double) rows.length * STEPS);
    assertEquals(0, sums[1], 5 / root, "mean");
    assertEquals(1, sums[2], 5 * Math.sqrt(2) / root, "variance");
    assertEquals(0, sums[3], 5 * Math.sqrt(15) / root, "third moment");
    assertEquals(3, sums[4], 5 * Math.sqrt(96) / root, "fourth moment");
  }

  /**
   * All 16 110 correlations among 180 rows, of the numbers and of their squares, and all 32 400 with
   * the next step: each estimate has standard deviation 1/sqrt(4000); the limit is 6.3 of them (false
   * alarm 64 620 x 3e-10 = 2e-5). Catches every correlation above 0.16, in particular a number used
   * twice.
   */
  @Test
  void trajectoriesUsesComponentsModesAndStepsAreIndependent() {
    double[][] rows = samples(streams(SEED), 0, STEPS + 1);
    double[][] now = new double[rows.length][];
    double[][] next = new double[rows.length][];
    double[][] squares = new double[rows.length][];
    for (int r = 0; r < rows.length; r++) {
      now[r] = Arrays.copyOf(rows[r], STEPS);
      next[r] = Arrays.copyOfRange(rows[r], 1, STEPS + 1);
      squares[r] = Arrays.stream(now[r]).map(x -> (x * x - 1) / Math.sqrt(2)).toArray();
    }
    double limit = 6.3 / Math.sqrt(STEPS);
    for (int r = 0; r < rows.length; r++) {
      for (int q = 0; q < rows.length; q++) {
        if (q < r) {
          assertEquals(0, correlation(now[r], now[q]), limit, "rows " + r + ", " + q);
          assertEquals(0, correlation(squares[r], squares[q]), limit, "squares " + r + ", " + q);
        }
        assertEquals(0, correlation(now[r], next[q]), limit, "next step " + r + ", " + q);
      }
    }
  }

  private static double correlation(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum / a.length;
  }

  /**
   * Seed s with trajectory t must not be seed t with trajectory s, and neighbouring seeds and distant
   * steps must differ: 360 correlations for each pair, limit 5.5 standard deviations (false alarm
   * 5e-5 in all).
   */
  @Test
  void seedsAndDistantStepsAreIndependent() {
    double[][] one = samples(streams(1), 0, STEPS);
    double[][][] others = {
      samples(streams(0), 0, STEPS),
      samples(streams(2), 0, STEPS),
      samples(streams(1L << 32), 0, STEPS),
      samples(streams(1), 1L << 32, STEPS)
    };
    double limit = 5.5 / Math.sqrt(STEPS);
    for (double[][] other : others) {
      for (int r = 0; r < one.length; r++) {
        assertEquals(0, correlation(one[r], other[r]), limit, "row " + r);
        int swapped = (r / 2 + 1) * 2 % one.length; // the next trajectory of the other seed
        assertEquals(0, correlation(one[r], other[swapped]), limit, "row " + r);
      }
    }
  }

  @Test
  void theSameQuestionHasTheSameAnswerInAnyOrder() {
    CoherentRegion region = region(LARGEST_MODE, 16);
    NoiseGenerator generator = streams(SEED).generator(region, COMPONENTS, 1);
    generator.assign(0, 5);
    Amplitudes found = new Amplitudes(region, COMPONENTS, 1);
    for (long step : new long[] {7, 3, 1L << 40, 7, 0, 3}) {
      for (int use : new int[] {2, 0, 2}) {
        generator.fill(step, use, found);
        assertSame(normals(streams(SEED), region, COMPONENTS, step, use, 5), found);
      }
    }
  }

  @Test
  void aTrajectoryDoesNotDependOnItsLane() {
    CoherentRegion region = region(LARGEST_MODE, 16);
    Amplitudes four = normals(streams(SEED), region, COMPONENTS, 11, 1, 8, 9, 5, 2);
    Amplitudes lane = new Amplitudes(region, COMPONENTS, 1);
    four.copyLane(2, lane);
    assertSame(normals(streams(SEED), region, COMPONENTS, 11, 1, 5), lane);
    four.copyLane(3, lane);
    assertSame(normals(streams(SEED), region, COMPONENTS, 11, 1, 2), lane);
  }

  @Test
  void aFinerGridSeesTheSameNoise() {
    compareModes(region(4, 17), region(4, 34));
    compareModes(region(4, 17), region(4, 100));
  }

  @Test
  void aLargerRegionSeesTheSameNoiseOnTheModesBothKeep() {
    boolean same = true;
    try {
      compareModes(region(4, 64), region(9, 64));
    } catch (AssertionError e) {
      same = false;
    }
    assertEquals(isKeyedByModeNumber(), same, "keyed by mode number, as stated");
  }

  private void compareModes(CoherentRegion small, CoherentRegion large) {
    Amplitudes one = normals(streams(SEED), small, COMPONENTS, 11, 1, 5);
    Amplitudes other = normals(streams(SEED), large, COMPONENTS, 11, 1, 5);
    for (int c = 0; c < COMPONENTS; c++) {
      for (int m = 0; m < small.modes(); m++) {
        int same = large.indexOf(small.modeNumber(0, m));
        assertEquals(one.re(c)[m], other.re(c)[same], 0);
        assertEquals(one.im(c)[m], other.im(c)[same], 0);
      }
    }
  }

  @Test
  void theInitialStateHasAStreamOfItsOwn() {
    double[] one = uniforms(streams(SEED).initialState(3));
    assertArrayEquals(one, uniforms(streams(SEED).initialState(3)));
    assertFalse(Arrays.equals(one, uniforms(streams(SEED).initialState(4))));
    assertFalse(Arrays.equals(one, uniforms(streams(SEED + 1).initialState(3))));
    for (double u : one) {
      assertTrue(u >= 0 && u < 1);
    }
  }

  private static double[] uniforms(UniformRandomProvider random) {
    return random.doubles(20).toArray();
  }

  @Test
  void theSeedIsKept() {
    assertEquals(-7, streams(-7).seed());
    assertTrue(streams(-7).toString().contains("-7"), streams(-7).toString());
  }

  @Test
  void laneWithoutTrajectoryIsRefused() {
    CoherentRegion region = region(2, 16);
    NoiseGenerator generator = streams(1).generator(region, 1, 2);
    generator.assign(0, 0);
    String message =
        assertThrows(
                IllegalStateException.class,
                () -> generator.fill(0, 0, new Amplitudes(region, 1, 2)))
            .getMessage();
    assertTrue(message.contains("lane=1"), message);
  }

  @Test
  void numbersOutOfRangeAreRefusedByName() {
    CoherentRegion region = region(2, 16);
    NoiseGenerator generator = streams(1).generator(region, 1, 1);
    generator.assign(0, 0);
    Amplitudes normals = new Amplitudes(region, 1, 1);
    assertRefused("lane=1", () -> generator.assign(1, 0));
    assertRefused("lane=-1", () -> generator.assign(-1, 0));
    assertRefused("trajectory=-1", () -> generator.assign(0, -1));
    assertRefused("trajectory=4294967296", () -> generator.assign(0, 1L << 32));
    assertRefused("step=-1", () -> generator.fill(-1, 0, normals));
    assertRefused("step=281474976710656", () -> generator.fill(1L << 48, 0, normals));
    assertRefused("use=-1", () -> generator.fill(0, -1, normals));
    assertRefused("use=256", () -> generator.fill(0, 256, normals));
    assertRefused("shapes must agree", () -> generator.fill(0, 0, new Amplitudes(region, 2, 1)));
    assertRefused("components=0", () -> streams(1).generator(region, 0, 1));
    assertRefused("components=256", () -> streams(1).generator(region, 256, 1));
    assertRefused("lanes=0", () -> streams(1).generator(region, 1, 0));
    assertRefused("lanes=-5", () -> streams(1).generator(region, 1, -5));
    assertRefused("lanes=2147483647", () -> streams(1).generator(region, 1, Integer.MAX_VALUE));
    assertRefused("trajectory=-1", () -> streams(1).initialState(-1));
  }

  private static void assertRefused(String expected, Runnable call) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    assertTrue(message.contains(expected), message);
  }

  @Test
  void fillingAllocatesAsStated() {
    CoherentRegion region = region(20, 128);
    NoiseGenerator generator = streams(1).generator(region, COMPONENTS, 4);
    for (int lane = 0; lane < 4; lane++) {
      generator.assign(lane, lane);
    }
    Amplitudes normals = new Amplitudes(region, COMPONENTS, 4);
    double bytes = AllocationMeter.bytesPerCall(() -> generator.fill(3, 0, normals));
    assertEquals(allocatesNothing(), bytes < 1, "bytes for each call: " + bytes);
  }
}
