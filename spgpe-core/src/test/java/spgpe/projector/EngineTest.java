package spgpe.projector;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;
import spgpe.fourier.FourierProviders;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.AllocationMeter;

/** The engines against the Fourier provider, and against each other bit for bit. */
class EngineTest {
  private static final int COMPONENTS = 2;

  private static CoherentRegion line(int points, int largest) {
    return Projector.modesUpTo(largest).on(PeriodicGrid.of(Axis.of(points, 0.7 * points)));
  }

  /** A cubic force with couplings and a part that knows where it is. */
  private static void force(PointBlock block) {
    for (int c = 0; c < COMPONENTS; c++) {
      double[] re = block.psiRe(c);
      double[] im = block.psiIm(c);
      double[] other = block.psiRe(1 - c);
      for (int i = block.begin(); i < block.end(); i++) {
        double density = re[i] * re[i] + im[i] * im[i] + 0.3 * other[i] * other[i];
        double where = Math.cos(0.1 * block.pointOf(i));
        block.resultRe(c)[i] += (density + where) * re[i];
        block.resultIm(c)[i] += (density + where) * im[i] + 0.1 * other[i];
      }
    }
  }

  private static Amplitudes state(CoherentRegion region, int lanes, int firstLane) {
    Amplitudes state = new Amplitudes(region, COMPONENTS, lanes);
    for (int lane = 0; lane < lanes; lane++) {
      SplittableRandom random = new SplittableRandom(firstLane + lane);
      for (int c = 0; c < COMPONENTS; c++) {
        for (int m = 0; m < region.modes(); m++) {
          state.re(c)[m * lanes + lane] = random.nextDouble(-1, 1);
          state.im(c)[m * lanes + lane] = random.nextDouble(-1, 1);
        }
      }
    }
    return state;
  }

  private static Amplitudes result(CoherentRegion region, int lanes, Engine engine) {
    ModeTransform transform =
        region.transform(COMPONENTS, lanes, FourierProviders.preferred(), engine);
    Amplitudes result = new Amplitudes(region, COMPONENTS, lanes);
    transform.applyLocal(state(region, lanes, 0), EngineTest::force, result);
    transform.applyLocal(state(region, lanes, 0), EngineTest::force, result);
    return result;
  }

  @ParameterizedTest
  @ValueSource(ints = {32, 64, 128, 256, 512, 1024, 2048})
  void theEnginesAgreeWithTheProvider(int points) {
    for (int largest : new int[] {1, points / 4 - 1, points / 5}) {
      CoherentRegion region = line(points, largest);
      for (int lanes : new int[] {1, 3, 4, 8, 64}) {
        Amplitudes expected = result(region, lanes, Engine.PROVIDER);
        double size = Math.sqrt(expected.atomNumber(0, 0) / region.modes());
        for (Engine engine : new Engine[] {Engine.PLAIN, Engine.VECTOR}) {
          Amplitudes found = result(region, lanes, engine);
          for (int c = 0; c < COMPONENTS; c++) {
            assertArrayEquals(expected.re(c), found.re(c), 1e-14 * 10 * size);
            assertArrayEquals(expected.im(c), found.im(c), 1e-14 * 10 * size);
          }
        }
      }
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {32, 64, 256, 512, 1024})
  void everyEngineAndNumberOfLanesGivesTheSameBits(int points) {
    CoherentRegion region = line(points, points / 4 - 1);
    Amplitudes[] single = new Amplitudes[64];
    for (int lane = 0; lane < single.length; lane++) {
      single[lane] = new Amplitudes(region, COMPONENTS, 1);
      region
          .transform(COMPONENTS, 1, FourierProviders.preferred(), Engine.PLAIN)
          .applyLocal(state(region, 1, lane), EngineTest::force, single[lane]);
    }
    for (Engine engine : new Engine[] {Engine.PLAIN, Engine.VECTOR}) {
      for (int lanes : new int[] {1, 2, 3, 4, 5, 8, 12, 16, 32, 64}) {
        Amplitudes found = result(region, lanes, engine);
        Amplitudes one = new Amplitudes(region, COMPONENTS, 1);
        for (int lane = 0; lane < lanes; lane++) {
          found.copyLane(lane, one);
          for (int c = 0; c < COMPONENTS; c++) {
            assertArrayEquals(single[lane].re(c), one.re(c));
            assertArrayEquals(single[lane].im(c), one.im(c));
          }
        }
      }
    }
  }

  @Test
  void theWayThereAndBackAgreesWithTheProvider() {
    CoherentRegion region = line(128, 31);
    for (Engine engine : Engine.values()) {
      ModeTransform transform =
          region.transform(COMPONENTS, 4, FourierProviders.preferred(), engine);
      Field field = new Field(region.grid(), COMPONENTS, 4);
      transform.toPosition(state(region, 4, 0), field);
      Field expected = new Field(region.grid(), COMPONENTS, 4);
      region
          .transform(COMPONENTS, 4, FourierProviders.preferred())
          .toPosition(state(region, 4, 0), expected);
      assertArrayEquals(expected.re(1), field.re(1), 1e-14);
      Amplitudes back = new Amplitudes(region, COMPONENTS, 4);
      transform.toModes(field, back);
      assertArrayEquals(state(region, 4, 0).re(0), back.re(0), 1e-14);
      assertEquals(0, back.im(1)[0] - state(region, 4, 0).im(1)[0], 1e-14);
    }
  }

  /** Unequal axes, discs that are ellipses of mode numbers, rectangles, holes. */
  private static List<CoherentRegion> planes() {
    PeriodicGrid square = plane(32, 20, 32, 20);
    PeriodicGrid flat = plane(64, 20, 32, 30);
    PeriodicGrid tall = plane(32, 20, 128, 30);
    return List.of(
        Projector.modesUpTo(7).on(square),
        Projector.modesUpTo(1, 2).on(square),
        Projector.keeping("ny = -3", (nx, ny) -> ny == -3 && Math.abs(nx) < 6 ? 1 : 0).on(square),
        Projector.modesUpTo(15, 7).on(flat),
        Projector.modesUpTo(3, 7).on(flat),
        Projector.belowWaveNumber(1.5).on(flat),
        Projector.modesUpTo(7, 31).on(tall),
        Projector.belowWaveNumber(2).on(tall),
        Projector.modesUpTo(9, 63).on(plane(64, 9, 256, 8)),
        Projector.modesUpTo(63, 5).on(plane(512, 9, 32, 8)));
  }

  private static PeriodicGrid plane(int pointsX, double lengthX, int pointsY, double lengthY) {
    return PeriodicGrid.of(Axis.of(pointsX, lengthX), Axis.of(pointsY, lengthY));
  }

  @ParameterizedTest
  @MethodSource("planes")
  void onPlanesTheEnginesAgreeWithTheProviderAndGiveTheSameBits(CoherentRegion region) {
    Amplitudes one = new Amplitudes(region, COMPONENTS, 1);
    Amplitudes single = result(region, 1, Engine.PLAIN);
    for (int lanes : new int[] {1, 2, 3, 4}) {
      Amplitudes expected = result(region, lanes, Engine.PROVIDER);
      double size = Math.sqrt(expected.atomNumber(0, 0) / region.modes());
      Amplitudes plain = result(region, lanes, Engine.PLAIN);
      for (Engine engine : new Engine[] {Engine.PLAIN, Engine.VECTOR, Engine.AUTOMATIC}) {
        Amplitudes found = result(region, lanes, engine);
        found.copyLane(0, one);
        for (int c = 0; c < COMPONENTS; c++) {
          assertArrayEquals(expected.re(c), found.re(c), 1e-14 * 20 * size);
          assertArrayEquals(expected.im(c), found.im(c), 1e-14 * 20 * size);
          assertArrayEquals(plain.re(c), found.re(c));
          assertArrayEquals(plain.im(c), found.im(c));
          assertArrayEquals(single.re(c), one.re(c));
          assertArrayEquals(single.im(c), one.im(c));
        }
      }
    }
  }

  /** Each lane holds the field of its own state, also the last one. */
  @ParameterizedTest
  @MethodSource("planes")
  void theWayOverAPlaneAndBackAgreesWithTheProvider(CoherentRegion region) {
    Field expected = new Field(region.grid(), COMPONENTS, 3);
    region
        .transform(COMPONENTS, 3, FourierProviders.preferred())
        .toPosition(state(region, 3, 0), expected);
    double size = Math.sqrt(region.modes() / region.grid().volume());
    for (Engine engine : Engine.values()) {
      ModeTransform transform =
          region.transform(COMPONENTS, 3, FourierProviders.preferred(), engine);
      Field field = new Field(region.grid(), COMPONENTS, 3);
      transform.toPosition(state(region, 3, 0), field);
      Amplitudes back = new Amplitudes(region, COMPONENTS, 3);
      transform.toModes(field, back);
      for (int c = 0; c < COMPONENTS; c++) {
        assertArrayEquals(expected.re(c), field.re(c), 1e-14 * size);
        assertArrayEquals(expected.im(c), field.im(c), 1e-14 * size);
        assertArrayEquals(state(region, 3, 0).re(c), back.re(c), 1e-14);
        assertArrayEquals(state(region, 3, 0).im(c), back.im(c), 1e-14);
      }
    }
  }

  @ParameterizedTest
  @MethodSource("planes")
  void everyPointOfAPlaneIsHandedOutOnceWithItsNumber(CoherentRegion region) {
    for (Engine engine : new Engine[] {Engine.PLAIN, Engine.VECTOR}) {
      ModeTransform transform =
          region.transform(COMPONENTS, 1, FourierProviders.preferred(), engine);
      Field field = new Field(region.grid(), COMPONENTS, 1);
      transform.toPosition(state(region, 1, 5), field);
      int[] seen = new int[region.grid().points()];
      transform.applyLocal(
          state(region, 1, 5),
          block -> {
            for (int i = block.begin(); i < block.end(); i++) {
              int point = block.pointOf(i);
              seen[point]++;
              for (int c = 0; c < COMPONENTS; c++) {
                assertEquals(field.re(c)[point], block.psiRe(c)[i], 0);
                assertEquals(field.im(c)[point], block.psiIm(c)[i], 0);
                assertEquals(0, block.resultRe(c)[i], 0);
                assertEquals(0, block.resultIm(c)[i], 0);
              }
            }
          },
          new Amplitudes(region, COMPONENTS, 1));
      for (int count : seen) {
        assertEquals(1, count);
      }
    }
  }

  @Test
  void planesThatFillMoreThanHalfOfAnAxisAreLeftToTheProvider() {
    assertInstanceOf(HalfBandPlane.class, transform(plane(32, 9, 64, 9), 7, 15));
    assertInstanceOf(PlaneTransform.class, transform(plane(32, 9, 64, 9), 8, 15));
    assertInstanceOf(PlaneTransform.class, transform(plane(32, 9, 64, 9), 7, 16));
    assertInstanceOf(PlaneTransform.class, transform(plane(16, 9, 64, 9), 3, 15));
    assertInstanceOf(PlaneTransform.class, transform(plane(32, 9, 60, 9), 3, 3));
    assertEquals(1, Projector.modesUpTo(7).on(plane(32, 9, 64, 9)).bestLanes(Engine.PLAIN, 99));
  }

  private static ModeTransform transform(PeriodicGrid grid, int largestX, int largestY) {
    return Projector.modesUpTo(largestX, largestY)
        .on(grid)
        .transform(COMPONENTS, 1, FourierProviders.preferred(), Engine.AUTOMATIC);
  }

  @Test
  void planesAllocateNothing() {
    CoherentRegion region = Projector.modesUpTo(7, 15).on(plane(32, 10, 64, 6));
    for (Engine engine : new Engine[] {Engine.PLAIN, Engine.VECTOR}) {
      for (int lanes : new int[] {1, 2}) {
        ModeTransform transform =
            region.transform(COMPONENTS, lanes, FourierProviders.preferred(), engine);
        Field field = new Field(region.grid(), COMPONENTS, lanes);
        Amplitudes state = state(region, lanes, 0);
        Amplitudes found = new Amplitudes(region, COMPONENTS, lanes);
        double bytes =
            AllocationMeter.bytesPerCall(
                () -> {
                  transform.applyLocal(state, EngineTest::force, found);
                  transform.toPosition(state, field);
                  transform.toModes(field, found);
                });
        assertTrue(bytes < 1, engine + ", bytes: " + bytes);
      }
    }
  }
}
