package spgpe.projector;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;

class CoherentRegionTest {
  private static PeriodicGrid line(int points, double length) {
    return PeriodicGrid.of(Axis.of(points, length));
  }

  @Nested
  class ByModeNumber extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.modesUpTo(10).on(line(41, 7));
    }
  }

  @Nested
  class ByWaveNumber extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.belowWaveNumber(3.3).on(line(128, 24));
    }
  }

  @Nested
  class ByEnergy extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.belowEnergy(8, 0.5).on(line(50, 30));
    }
  }

  @Nested
  class AllModes extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.allModes().on(line(16, 3));
    }
  }

  @Nested
  class WithHolesAndOneSided extends ProjectorContract {
    @Override
    protected CoherentRegion region() {
      return Projector.keeping("some", (nx, ny) -> nx == -3 || nx == 0 || nx == 7 ? 1 : 0)
          .on(line(45, 5));
    }
  }

  @Test
  void cutoffsKeepTheModesTheyName() {
    // k = 2 pi n / 20 <= 2: n <= 6.366
    CoherentRegion byWave = Projector.belowWaveNumber(2).on(line(64, 20));
    assertEquals(13, byWave.modes());
    assertEquals(6, byWave.largestMode(0));
    // k^2/(2 m) <= 2 with m = 1: the same cutoff
    assertEquals(byWave, Projector.belowEnergy(2, 1).on(line(64, 20)));
    assertEquals(byWave, Projector.modesUpTo(6).on(line(64, 20)));
    assertNotEquals(byWave, Projector.modesUpTo(6).on(line(64, 21)));
    assertEquals(64, Projector.allModes().on(line(64, 20)).modes());
    int m = byWave.indexOf(-6);
    assertEquals(-6, byWave.modeNumber(0, m));
    assertEquals(-6 * 2 * Math.PI / 20, byWave.waveNumber(0, m), 1e-15);
    assertEquals(Math.pow(6 * 2 * Math.PI / 20, 2), byWave.kSquared(m), 1e-14);
    assertEquals(-1, byWave.indexOf(7));
  }

  @Test
  void aDiscIsKeptInTwoDimensions() {
    PeriodicGrid plane = PeriodicGrid.of(Axis.of(20, 2 * Math.PI), Axis.of(24, 2 * Math.PI));
    CoherentRegion disc = Projector.belowWaveNumber(5).on(plane);
    int expected = 0;
    for (int nx = -5; nx <= 5; nx++) {
      for (int ny = -5; ny <= 5; ny++) {
        boolean inside = nx * nx + ny * ny <= 25;
        expected += inside ? 1 : 0;
        assertEquals(inside, disc.indexOf(nx, ny) >= 0, nx + ", " + ny);
      }
    }
    assertEquals(expected, disc.modes());
  }

  @Test
  void cutoffsBeyondTheGridAreRefused() {
    String message =
        assertThrows(
                IllegalArgumentException.class, () -> Projector.modesUpTo(8).on(line(16, 3)))
            .getMessage();
    assertTrue(message.contains("n=8") && message.contains("16 points"), message);
    assertThrows(
        IllegalArgumentException.class, () -> Projector.belowWaveNumber(100).on(line(16, 3)));
    assertThrows(
        IllegalArgumentException.class, () -> Projector.belowEnergy(1e6, 1).on(line(16, 3)));
    assertEquals(15, Projector.modesUpTo(7).on(line(16, 3)).modes());
  }

  @Test
  void aRegionWithoutModesIsRefused() {
    String message =
        assertThrows(
                IllegalArgumentException.class,
                () -> Projector.keeping("none", (nx, ny) -> 0).on(line(16, 3)))
            .getMessage();
    assertTrue(message.contains("at least one mode") && message.contains("none"), message);
  }

  @Test
  void indicesThatDoNotExistAreRefused() {
    CoherentRegion region = Projector.modesUpTo(3).on(line(16, 3));
    assertThrows(IllegalArgumentException.class, () -> region.modeNumber(1, 0));
    assertThrows(IllegalArgumentException.class, () -> region.modeNumber(0, 7));
    assertThrows(IllegalArgumentException.class, () -> region.kSquared(-1));
    assertThrows(IllegalArgumentException.class, () -> region.largestMode(1));
    assertThrows(IllegalArgumentException.class, () -> region.aliasing(3).pointsNeeded(1));
    for (int degree : new int[] {-1, 0, 2, 4, 101}) {
      String message =
          assertThrows(IllegalArgumentException.class, () -> region.aliasing(degree)).getMessage();
      assertTrue(message.contains("forceDegree=" + degree), message);
    }
  }
}
