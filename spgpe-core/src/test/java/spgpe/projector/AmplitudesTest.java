package spgpe.projector;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;

class AmplitudesTest {
  private static final CoherentRegion REGION =
      Projector.modesUpTo(2).on(PeriodicGrid.of(Axis.of(16, 3)));

  private static void assertRefused(String expected, Runnable call) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    assertTrue(message.contains(expected), message);
  }

  private static Amplitudes counted(int lanes) {
    Amplitudes state = new Amplitudes(REGION, 2, lanes);
    for (int c = 0; c < 2; c++) {
      Arrays.setAll(state.re(c), i -> i + 1.0);
      Arrays.setAll(state.im(c), i -> -i);
    }
    return state;
  }

  @Test
  void lanesAreInterleaved() {
    Amplitudes many = counted(3);
    Amplitudes one = new Amplitudes(REGION, 2, 1);
    many.copyLane(1, one);
    assertArrayEquals(new double[] {2, 5, 8, 11, 14}, one.re(0));
    assertArrayEquals(new double[] {-1, -4, -7, -10, -13}, one.im(1));
    assertEquals(4 + 25 + 64 + 121 + 196 + 1 + 16 + 49 + 100 + 169, many.atomNumber(1, 1), 0);
    assertEquals(many.atomNumber(1, 1), one.atomNumber(1, 0), 0);
    Amplitudes back = new Amplitudes(REGION, 2, 3);
    for (int lane = 0; lane < 3; lane++) {
      many.copyLane(lane, one);
      back.setLane(lane, one);
    }
    assertArrayEquals(many.re(0), back.re(0));
    assertArrayEquals(many.im(1), back.im(1));
  }

  @Test
  void aCopyIsIndependent() {
    Amplitudes state = counted(1);
    Amplitudes copy = state.copy();
    state.clear();
    assertEquals(0, state.atomNumber(0, 0), 0);
    assertEquals(5, copy.re(0)[4], 0);
  }

  @Test
  void shapesAndIndicesThatDoNotExistAreRefused() {
    assertRefused("components=0", () -> new Amplitudes(REGION, 0, 1));
    assertRefused("components=256", () -> new Amplitudes(REGION, 256, 1));
    assertRefused("lanes=0", () -> new Amplitudes(REGION, 1, 0));
    assertRefused("lanes=4097", () -> new Amplitudes(REGION, 1, 4097));
    assertRefused("lanes=0", () -> new Field(REGION.grid(), 1, 0));
    Amplitudes state = counted(2);
    assertRefused("component index=2", () -> state.re(2));
    assertRefused("component index=-1", () -> state.im(-1));
    assertRefused("lane=2", () -> state.atomNumber(0, 2));
    assertRefused("component index=2", () -> state.atomNumber(2, 0));
    assertRefused("lane=2", () -> state.copyLane(2, new Amplitudes(REGION, 2, 1)));
    assertRefused("shapes must agree", () -> state.copyLane(0, new Amplitudes(REGION, 2, 2)));
    assertRefused("shapes must agree", () -> state.setLane(0, new Amplitudes(REGION, 1, 1)));
    assertRefused("shapes must agree", () -> state.set(new Amplitudes(REGION, 2, 1)));
    CoherentRegion other = Projector.modesUpTo(2).on(PeriodicGrid.of(Axis.of(16, 3.1)));
    assertRefused("3.1", () -> state.set(new Amplitudes(other, 2, 2)));
    Field field = new Field(REGION.grid(), 1, 1);
    assertRefused("component index=1", () -> field.re(1));
    assertRefused(
        "shapes must agree", () -> PointBlock.ofAll(field, new Field(REGION.grid(), 2, 1)));
  }

  @Test
  void statesTooLargeForAnArrayAreRefused() {
    PeriodicGrid large = PeriodicGrid.of(Axis.of(1 << 20, 1));
    assertRefused("lanes=4096", () -> new Field(large, 1, 4096));
    CoherentRegion all = Projector.allModes().on(large);
    assertRefused("lanes=4096", () -> new Amplitudes(all, 1, 4096));
  }
}
