package spgpe.projector;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierProviders;
import spgpe.fourier.FourierTransform;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.AllocationMeter;

class PlaneTransformTest {
  private static final FourierProvider PROVIDER = FourierProviders.preferred();

  private static PeriodicGrid plane(int pointsX, double lengthX, int pointsY, double lengthY) {
    return PeriodicGrid.of(Axis.of(pointsX, lengthX), Axis.of(pointsY, lengthY));
  }

  @Nested
  class Disc extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.belowWaveNumber(3).on(plane(16, 7, 20, 10));
    }
  }

  @Nested
  class Rectangle extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.modesUpTo(2, 5).on(plane(9, 3, 21, 11));
    }
  }

  @Nested
  class AllModes extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.allModes().on(plane(16, 3, 8, 5));
    }
  }

  @Nested
  class OddSizes extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.belowEnergy(2, 1).on(plane(15, 8, 13, 9));
    }
  }

  @Nested
  class WithHolesAndOneSided extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.keeping(
              "some",
              (nx, ny) -> (nx == -3 && ny == 1) || (nx == 2 && ny >= 0) || (ny == -4 && nx > 4)
                  ? 1 : 0)
          .on(plane(16, 5, 12, 6));
    }
  }

  @Nested
  class OneRow extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.keeping("ny = 0", (nx, ny) -> ny == 0 && Math.abs(nx) < 4 ? 1 : 0)
          .on(plane(16, 5, 2, 6));
    }
  }

  @Nested
  class HalfBandEllipse extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.belowWaveNumber(3).on(plane(64, 30, 32, 14));
    }

    @Override
    protected Engine engine() {
      return Engine.VECTOR;
    }
  }

  @Nested
  class HalfBandRectangle extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.modesUpTo(7, 15).on(plane(32, 3, 64, 11));
    }

    @Override
    protected Engine engine() {
      return Engine.PLAIN;
    }
  }

  @Test
  void bothWaysArePlainSums() {
    CoherentRegion small = Projector.belowWaveNumber(3.1).on(plane(12, 6, 10, 4));
    assertPlainSums(small, small.transform(1, 1, PROVIDER));
    CoherentRegion halfBand = Projector.belowWaveNumber(3.1).on(plane(32, 12, 64, 20));
    for (Engine engine : Engine.values()) {
      assertPlainSums(halfBand, halfBand.transform(1, 1, PROVIDER, engine));
    }
  }

  private static void assertPlainSums(CoherentRegion region, ModeTransform transform) {
    PeriodicGrid grid = region.grid();
    SplittableRandom random = new SplittableRandom(11);
    Amplitudes state = new Amplitudes(region, 1, 1);
    Field given = new Field(grid, 1, 1);
    for (int m = 0; m < region.modes(); m++) {
      state.re(0)[m] = random.nextDouble(-1, 1);
      state.im(0)[m] = random.nextDouble(-1, 1);
    }
    for (int p = 0; p < grid.points(); p++) {
      given.re(0)[p] = random.nextDouble(-1, 1);
      given.im(0)[p] = random.nextDouble(-1, 1);
    }
    Field field = new Field(grid, 1, 1);
    Amplitudes modes = new Amplitudes(region, 1, 1);
    transform.toPosition(state, field);
    transform.toModes(given, modes);
    double[] modesRe = new double[region.modes()];
    double[] modesIm = new double[region.modes()];
    double root = Math.sqrt(grid.volume());
    for (int p = 0; p < grid.points(); p++) {
      double re = 0;
      double im = 0;
      for (int m = 0; m < region.modes(); m++) {
        double turn =
            region.waveNumber(0, m) * grid.coordinate(0, p)
                + region.waveNumber(1, m) * grid.coordinate(1, p);
        double cos = Math.cos(turn);
        double sin = Math.sin(turn);
        re += (state.re(0)[m] * cos - state.im(0)[m] * sin) / root;
        im += (state.re(0)[m] * sin + state.im(0)[m] * cos) / root;
        double weight = root / grid.points();
        modesRe[m] += weight * (given.re(0)[p] * cos + given.im(0)[p] * sin);
        modesIm[m] += weight * (given.im(0)[p] * cos - given.re(0)[p] * sin);
      }
      assertEquals(re, field.re(0)[p], 1e-13);
      assertEquals(im, field.im(0)[p], 1e-13);
    }
    for (int m = 0; m < region.modes(); m++) {
      assertEquals(modesRe[m], modes.re(0)[m], 1e-13);
      assertEquals(modesIm[m], modes.im(0)[m], 1e-13);
    }
  }

  /** Counts what it is asked for. */
  private static final class Counting implements FourierProvider {
    private int calls;

    @Override
    public String name() {
      return "counting";
    }

    @Override
    public int rank() {
      return -1;
    }

    @Override
    public FourierTransform transform(int size) {
      FourierTransform plan = PROVIDER.transform(size);
      return new FourierTransform() {
        @Override
        public int size() {
          return size;
        }

        @Override
        public void forward(double[] data, int offset) {
          calls++;
          plan.forward(data, offset);
        }

        @Override
        public void inverse(double[] data, int offset) {
          calls++;
          plan.inverse(data, offset);
        }
      };
    }
  }

  @Test
  void columnsWithoutAKeptModeAreSkipped() {
    CoherentRegion region = Projector.modesUpTo(3, 2).on(plane(16, 4, 8, 3));
    Counting counting = new Counting();
    ModeTransform transform = region.transform(1, 1, counting);
    Field field = new Field(region.grid(), 1, 1);
    Amplitudes state = new Amplitudes(region, 1, 1);
    transform.toPosition(state, field);
    assertEquals(7 + 8, counting.calls, "seven columns and eight rows");
    transform.toModes(field, state);
    assertEquals(2 * (7 + 8), counting.calls);
  }

  @Test
  void powersOfTwoAllocateNothing() {
    CoherentRegion region = Projector.belowWaveNumber(3).on(plane(32, 10, 16, 6));
    ModeTransform transform = region.transform(2, 3, PROVIDER);
    Field field = new Field(region.grid(), 2, 3);
    Amplitudes state = new Amplitudes(region, 2, 3);
    double bytes =
        AllocationMeter.bytesPerCall(
            () -> {
              transform.toPosition(state, field);
              transform.toModes(field, state);
            });
    assertTrue(bytes < 1, "bytes: " + bytes);
  }

  @Test
  void aRectangleHasACutoffForEachAxis() {
    PeriodicGrid grid = plane(13, 4, 9, 4);
    CoherentRegion region = Projector.modesUpTo(3, 2).on(grid);
    assertEquals(7 * 5, region.modes());
    assertEquals(3, region.largestMode(0));
    assertEquals(2, region.largestMode(1));
    assertTrue(region.indexOf(-3, 2) >= 0);
    assertEquals(-1, region.indexOf(2, 3));
    AliasingVerdict verdict = region.aliasing(3);
    assertEquals(13, verdict.pointsNeeded(0));
    assertEquals(9, verdict.pointsNeeded(1));
    assertTrue(verdict.isFree());
    assertFalse(Projector.modesUpTo(3, 2).on(plane(12, 4, 9, 4)).aliasing(3).isFree());
    assertFalse(Projector.modesUpTo(3, 2).on(plane(13, 4, 8, 4)).aliasing(3).isFree());
  }

  /** k = 2 pi n/L <= 2: n <= 6.4 on L = 20 and n <= 3.2 on L = 10. */
  @Test
  void aDiscOfWaveNumbersIsAnEllipseOfModeNumbers() {
    CoherentRegion region = Projector.belowWaveNumber(2).on(plane(32, 20, 16, 10));
    assertEquals(6, region.largestMode(0));
    assertEquals(3, region.largestMode(1));
    for (int nx = -7; nx <= 7; nx++) {
      for (int ny = -7; ny <= 7; ny++) {
        boolean inside = nx * nx + 4 * ny * ny <= 400 / (Math.PI * Math.PI);
        assertEquals(inside, region.indexOf(nx, ny) >= 0, nx + ", " + ny);
      }
    }
  }

  @Test
  void cutoffsThatDoNotFitTheGridAreRefused() {
    Projector rule = Projector.modesUpTo(3, 5);
    assertRefused("two-dimensional grid", () -> rule.on(PeriodicGrid.of(Axis.of(64, 1))));
    assertRefused("n=5", () -> rule.on(plane(64, 1, 10, 1)));
    assertRefused("along x", () -> Projector.modesUpTo(0, 5));
    assertRefused("along y", () -> Projector.modesUpTo(5, 32768));
  }

  @Test
  void aProviderWithTheWrongSizeIsRefused() {
    FourierProvider wrong =
        new FourierProvider() {
          @Override
          public String name() {
            return "wrong";
          }

          @Override
          public int rank() {
            return -1;
          }

          @Override
          public FourierTransform transform(int size) {
            return PROVIDER.transform(size == 8 ? 7 : size);
          }
        };
    CoherentRegion region = Projector.modesUpTo(2).on(plane(16, 1, 8, 1));
    assertRefused("size=7, points=8", () -> region.transform(1, 1, wrong));
    assertRefused("lanes", () -> region.transform(1, 0, PROVIDER));
  }

  private static void assertRefused(String part, org.junit.jupiter.api.function.Executable call) {
    String message = assertThrows(IllegalArgumentException.class, call).getMessage();
    assertTrue(message.contains(part), message);
  }
}
