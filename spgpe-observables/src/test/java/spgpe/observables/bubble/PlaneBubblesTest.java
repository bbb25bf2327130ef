package spgpe.observables.bubble;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.LongRange;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.observables.Fields;

/** Bubbles on a plane: synthetic fields of 128 x 128 points, spacing 0.5, and random fields. */
class PlaneBubblesTest {
  private static final int N = 128;
  private static final double SIDE = 64;
  private static final PeriodicGrid GRID = PeriodicGrid.of(Axis.of(N, SIDE), Axis.of(N, SIDE));
  private static final BubbleDetector PLAIN = BubbleDetector.of(BubbleSettings.atLevel(0));

  @FunctionalInterface
  private interface Shape {
    boolean inside(double x, double y);
  }

  /** +1 inside, -1 outside. */
  private static double[] frame(Shape shape) {
    double[] frame = new double[N * N];
    for (int p = 0; p < frame.length; p++) {
      frame[p] = shape.inside(GRID.coordinate(0, p), GRID.coordinate(1, p)) ? 1 : -1;
    }
    return frame;
  }

  private static double distance(double x, double y, double cx, double cy) {
    return Math.hypot(Math.IEEEremainder(x - cx, SIDE), Math.IEEEremainder(y - cy, SIDE));
  }

  /**
   * Discs of radius 6 about (1, 1), across both seams, 4 about (32, 32) and 3 about (50, 20): areas
   * 109.25, 48.25 and 27.25, which are numbers of grid points in a disc and need no derivation.
   */
  @Test
  void areasRadiiAndCentresOfDiscs() {
    List<Extent> found =
        PLAIN.inFrame(
            frame(
                (x, y) ->
                    distance(x, y, 1, 1) < 6 || distance(x, y, 32, 32) < 4
                        || distance(x, y, 50, 20) < 3),
            GRID);
    assertEquals(3, found.size());
    double[][] expected = { // area, radius, centre
      {109.25, 5.8971, 1, 1}, {27.25, 2.9452, 50, 20}, {48.25, 3.9190, 32, 32}
    };
    for (int i = 0; i < 3; i++) {
      Extent e = found.get(i);
      assertEquals(expected[i][0], e.size());
      assertEquals(expected[i][1], e.radius(), 5e-5);
      assertEquals(expected[i][2], e.centre().x(), 1e-9);
      assertEquals(expected[i][3], e.centre().y(), 1e-9);
      assertFalse(e.wraps());
    }
  }

  /** Straight and diagonal bands are one component and wrap where they close on themselves. */
  @Test
  void bandsWrap() {
    assertWraps(true, false, (x, y) -> distance(0, y, 0, 3) <= 5);
    assertWraps(false, true, (x, y) -> distance(x, 0, 60, 0) <= 5);
    assertWraps(true, true, (x, y) -> Math.abs(Math.IEEEremainder(x - y, SIDE)) <= 4);
    assertWraps(true, true, (x, y) -> Math.abs(Math.IEEEremainder(x + 2 * y, SIDE)) <= 4);
    assertWraps(true, true, (x, y) -> true);
    assertWraps(
        true, true, (x, y) -> distance(x, 0, 10, 0) <= 2 || distance(0, y, 0, 40) <= 2); // a cross
    // nearly a band: a gap of one point; a ring around nothing; a bent strip over the seam
    assertWraps(false, false, (x, y) -> distance(0, y, 0, 3) <= 5 && x != 20);
    assertWraps(
        false, false, (x, y) -> Math.abs(distance(x, y, 2, 63) - 20) <= 2);
  }

  private static void assertWraps(boolean x, boolean y, Shape shape) {
    List<Extent> found = PLAIN.inFrame(frame(shape), GRID);
    assertEquals(1, found.size());
    assertEquals(x, found.get(0).wrapsX(), "around x");
    assertEquals(y, found.get(0).wrapsY(), "around y");
  }

  private static final int FRAMES = 41;

  private static double[] times() {
    double[] times = new double[FRAMES];
    for (int s = 0; s < FRAMES; s++) {
      times[s] = s;
    }
    return times;
  }

  /** A growing disc, r = sqrt(9 + 0.49 (t - t0)^2), and a second one with another start. */
  private static double[][] growth(double x1, double t1, double x2, double t2) {
    double[][] frames = new double[FRAMES][];
    for (int s = 0; s < FRAMES; s++) {
      double t = s;
      frames[s] =
          frame(
              (x, y) ->
                  t >= t1 && distance(x, y, x1, 62) < radius(t - t1)
                      || t >= t2 && distance(x, y, x2, 30) < radius(t - t2));
    }
    return frames;
  }

  private static double radius(double age) {
    return Math.sqrt(9 + 0.49 * age * age);
  }

  /**
   * Wall speed of r = sqrt(9 + 0.49 t^2) from the radius of equal area, t = 15..29: 0.688 (the
   * secant of the exact radius is 0.6857), and limiting speed 0.7.
   */
  @Test
  void wallSpeedFromTheArea() {
    Bubble bubble = PLAIN.find(times(), growth(2, 0, 2, 99), GRID).bubbles().get(0);
    RadiusTrack track = bubble.radius().between(15, 29);
    assertEquals(15, track.size());
    assertEquals(0.688, WallSpeed.linear(track).speed().value(), 1e-3);
    assertEquals(0.7, WallSpeed.hyperbola(track).speed().value(), 0.02);
    assertEquals(0.7, WallSpeed.hyperbola(track, 0).speed().value(), 2e-3);
    assertEquals(0, bubble.walls().size());
    for (int i = 0; i < track.size(); i++) {
      assertEquals(radius(track.time(i)), track.radius(i), 0.1);
      assertEquals(2, track.extent(i).centre().x(), 1e-9);
      assertEquals(62, track.extent(i).centre().y(), 1e-9);
    }
  }

  /** Born at t = 4 and 9; the discs meet when r1 + r2 = sqrt(20^2 + 32^2), by t = 34 in frames. */
  @Test
  void birthsAndMerger() {
    BubbleHistory h = PLAIN.find(times(), growth(2, 4, 22, 9), GRID);
    assertEquals(2, h.nucleations().size());
    assertEquals(4, h.bubbles().get(0).birthTime());
    assertEquals(9, h.bubbles().get(1).birthTime());
    assertEquals(2, h.bubbles().get(0).birthSite().x(), 1e-9);
    assertEquals(62, h.bubbles().get(0).birthSite().y(), 1e-9);
    assertEquals(30, h.bubbles().get(1).birthSite().y(), 1e-9);
    List<BubbleEvent> mergers = h.events(e -> e.kind() == BubbleEvent.Kind.MERGED);
    assertEquals(1, mergers.size());
    double contact = 4;
    while (radius(contact - 4) + radius(contact - 9) < Math.hypot(20, 32)) {
      contact += 0.01;
    }
    assertEquals(contact, mergers.get(0).time(), 1.01); // between two frames
    assertEquals(0, mergers.get(0).other());
    assertEquals(1, mergers.get(0).bubble());
  }

  /** A disc grows until it wraps; the radius is cut there. It ends by filling the plane. */
  @Test
  void wrappingAndFilling() {
    double[] times = times();
    double[][] frames = new double[FRAMES][];
    for (int s = 0; s < FRAMES; s++) {
      double r = 10 + s;
      frames[s] = frame((x, y) -> distance(x, y, 20, 20) <= Math.min(r, 60));
    }
    frames[FRAMES - 1] = frame((x, y) -> true);
    BubbleHistory h = PLAIN.find(times, frames, GRID);
    assertEquals(1, h.bubbles().size());
    Bubble b = h.bubbles().get(0);
    RadiusTrack track = b.radius().untilWrapped();
    assertEquals(22, track.size()); // r = 10..31; at 32 the disc meets itself across the seam
    assertEquals(BubbleEvent.Kind.FILLED, b.fate());
    assertEquals(2 * SIDE / Math.sqrt(Math.PI), b.largestWidth(), 1e-9);
    assertTrue(b.radius().extent(30).wrapsX() && b.radius().extent(30).wrapsY());
  }

  /**
   * Smoothing and hysteresis reject noise: independent noise of deviation 0.7 on a disc of radius 6
   * in 40 fixed frames. A smoothed point outside has deviation 0.7/sqrt(4 pi 9) = 0.066 (smoothing
   * of 3 spacings), so that grow and seed level -0.4 and 0 lie 9 and 15 deviations above -1: no
   * false region at all is expected (probability below 1e-15 for the test); without smoothing there
   * are hundreds.
   */
  @Test
  void smoothingRejectsNoise() {
    Random random = new Random(5);
    BubbleSettings settings =
        BubbleSettings.atLevel(0).withHysteresis(0, -0.4).withSmoothing(1.5);
    for (int i = 0; i < 40; i++) {
      double[] frame = frame((x, y) -> distance(x, y, 63, 10) <= 6);
      for (int p = 0; p < frame.length; p++) {
        frame[p] += 0.7 * random.nextGaussian();
      }
      assertTrue(PLAIN.inFrame(frame, GRID).size() > 100);
      List<Extent> found = BubbleDetector.of(settings).inFrame(frame, GRID);
      assertEquals(1, found.size());
      assertEquals(0, distance(found.get(0).centre().x(), found.get(0).centre().y(), 63, 10), 0.3);
    }
  }

  @Test
  void smoothingIsTheNormalisedSum() {
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(9, 4.5), Axis.of(12, 4));
    Random random = new Random(3);
    double[] frame = new double[grid.points()];
    for (int p = 0; p < frame.length; p++) {
      frame[p] = random.nextGaussian();
    }
    for (double sigma : new double[] {0, 0.4, 1.1}) {
      double[] result = new double[frame.length];
      new FrameSmoothing(grid, sigma).apply(frame, result);
      for (int p = 0; p < frame.length; p++) {
        double sum = 0;
        double weight = 0;
        for (int q = 0; q < frame.length; q++) {
          double dx = Math.IEEEremainder(grid.coordinate(0, p) - grid.coordinate(0, q), 4.5);
          double dy = Math.IEEEremainder(grid.coordinate(1, p) - grid.coordinate(1, q), 4);
          double w =
              sigma == 0
                  ? (p == q ? 1 : 0)
                  : Math.exp(-(dx * dx + dy * dy) / (2 * sigma * sigma));
          sum += w * frame[q];
          weight += w;
        }
        assertEquals(sum / weight, result[p], 1e-7);
      }
    }
  }

  /** Components by flood fill from the definition, on the plane unrolled where they wrap. */
  private static List<List<Integer>> floodFill(boolean[] inside, int nx, int ny) {
    int[] label = new int[inside.length];
    List<List<Integer>> components = new ArrayList<>();
    for (int start = 0; start < inside.length; start++) {
      if (!inside[start] || label[start] != 0) {
        continue;
      }
      List<Integer> members = new ArrayList<>();
      components.add(members);
      label[start] = components.size();
      members.add(start);
      for (int i = 0; i < members.size(); i++) {
        int x = members.get(i) % nx;
        int y = members.get(i) / nx;
        int[] neighbours = {
          y * nx + (x + 1) % nx, y * nx + (x + nx - 1) % nx, (y + 1) % ny * nx + x,
          (y + ny - 1) % ny * nx + x
        };
        for (int q : neighbours) {
          if (inside[q] && label[q] == 0) {
            label[q] = components.size();
            members.add(q);
          }
        }
      }
      members.sort(null);
    }
    return components;
  }

  /**
   * Whether a component wraps around an axis, from the definition: on a plane unrolled to five
   * periods on each axis the image of its first point can be reached in another period.
   */
  private static boolean[] wraps(List<Integer> component, int nx, int ny) {
    int periods = 9;
    int wide = periods * nx;
    int high = periods * ny;
    boolean[] inside = new boolean[wide * high];
    for (int p : component) {
      for (int i = 0; i < periods; i++) {
        for (int j = 0; j < periods; j++) {
          inside[(p / nx + j * ny) * wide + p % nx + i * nx] = true;
        }
      }
    }
    int first = component.get(0);
    int x0 = first % nx + periods / 2 * nx;
    int y0 = first / nx + periods / 2 * ny;
    boolean[] seen = new boolean[inside.length];
    List<Integer> queue = new ArrayList<>(List.of(y0 * wide + x0));
    seen[queue.get(0)] = true;
    boolean[] result = new boolean[2];
    for (int i = 0; i < queue.size(); i++) {
      int x = queue.get(i) % wide;
      int y = queue.get(i) / wide;
      if ((x - x0) % nx == 0 && (y - y0) % ny == 0) {
        result[0] |= x != x0;
        result[1] |= y != y0;
      }
      int[][] steps = {{1, 0}, {-1, 0}, {0, 1}, {0, -1}};
      for (int[] s : steps) {
        int u = x + s[0];
        int v = y + s[1];
        if (u >= 0 && u < wide && v >= 0 && v < high && inside[v * wide + u]
            && !seen[v * wide + u]) {
          seen[v * wide + u] = true;
          queue.add(v * wide + u);
        }
      }
    }
    return result;
  }

  /** White noise near the percolation threshold and smooth noise, on small planes of any shape. */
  @Property(tries = 500, seed = "2026")
  void componentsAreThoseOfAFloodFill(
      @ForAll @IntRange(min = 2, max = 17) int nx,
      @ForAll @IntRange(min = 2, max = 13) int ny,
      @ForAll @DoubleRange(min = 0.2, max = 0.9) double filling,
      @ForAll @IntRange(min = 0, max = 1) int smooth,
      @ForAll @LongRange(min = 0, max = 1_000_000) long seed) {
    Random random = new Random(seed);
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(nx, nx), Axis.of(ny, ny));
    double[] raw = new double[nx * ny];
    for (int p = 0; p < raw.length; p++) {
      raw[p] = random.nextDouble();
    }
    double[] frame = new double[raw.length];
    new FrameSmoothing(grid, 0.8 * smooth).apply(raw, frame);
    double[] sorted = frame.clone();
    java.util.Arrays.sort(sorted);
    double level = sorted[(int) ((1 - filling) * sorted.length)];
    boolean[] inside = new boolean[raw.length];
    for (int p = 0; p < raw.length; p++) {
      inside[p] = frame[p] > level;
    }
    List<List<Integer>> expected = floodFill(inside, nx, ny);
    PlaneRegions regions = new PlaneRegions(nx, ny);
    regions.above(raw, 0.5); // another frame before: nothing must remain of it
    List<Region> found = regions.above(frame, level);
    assertEquals(expected.size(), found.size());
    for (int r = 0; r < expected.size(); r++) { // both in the order of their first points
      List<Integer> points =
          java.util.Arrays.stream(found.get(r).points).boxed().toList();
      assertEquals(expected.get(r), points);
      boolean[] wraps = wraps(expected.get(r), nx, ny);
      assertEquals(wraps[0], found.get(r).wrapsX, "around x");
      assertEquals(wraps[1], found.get(r).wrapsY, "around y");
    }
  }

  /** A ring as a plane that is constant along y gives the same events at the same sites. */
  @Test
  void aPlaneConstantAlongAnAxisIsARing() {
    Random random = new Random(8);
    double[][] ring = new double[200][24];
    double[][] plane = new double[200][24 * 3];
    double[] times = new double[200];
    double a = 0;
    double b = 0;
    for (int s = 0; s < 200; s++) {
      times[s] = s;
      a = 0.8 * a + 0.6 * random.nextGaussian();
      b = 0.8 * b + 0.6 * random.nextGaussian();
      for (int p = 0; p < plane[s].length; p++) {
        double angle = 2 * Math.PI * (p % 24) / 24;
        plane[s][p] = a * Math.cos(2 * angle) + b * Math.sin(3 * angle);
        ring[s][p % 24] = plane[s][p];
      }
    }
    BubbleSettings settings =
        BubbleSettings.atLevel(0.5).withHysteresis(0.8, 0.2).withSmoothing(0.7);
    BubbleDetector detector = BubbleDetector.of(settings);
    BubbleHistory expected = detector.find(times, ring, 24);
    BubbleHistory found =
        detector.find(times, plane, PeriodicGrid.of(Axis.of(24, 24), Axis.of(3, 2)));
    assertTrue(expected.events().size() > 30);
    // bubbles born in one frame are numbered in another order: compare as sorted lists
    assertEquals(text(expected), text(found));
  }

  private static List<String> text(BubbleHistory history) {
    return history.events().stream()
        .map(
            e ->
                e.time() + " " + e.kind() + " "
                    // a collapse names the birth, and which of two equally old goes on is arbitrary
                    + (e.kind() == BubbleEvent.Kind.COLLAPSED
                        ? 0
                        : Math.round(1e6 * e.site().x())))
        .sorted().toList();
  }

  @Test
  void badFramesAreRefused() {
    String few = Fields.refusal(() -> PLAIN.inFrame(new double[5], GRID));
    assertTrue(few.contains("numbers=5, points=16384"), few);
    double[] hole = new double[N * N];
    hole[7] = Double.NaN;
    String nan = Fields.refusal(() -> PLAIN.inFrame(hole, GRID));
    assertTrue(nan.contains("point=7, value=NaN"), nan);
    String time =
        Fields.refusal(
            () -> PLAIN.find(new double[] {1, 1}, new double[2][N * N], GRID));
    assertTrue(time.contains("increase"), time);
  }
}
