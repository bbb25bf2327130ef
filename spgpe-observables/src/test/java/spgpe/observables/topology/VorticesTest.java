package spgpe.observables.topology;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.constraints.LongRange;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.model.Model;
import spgpe.observables.Fields;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;
import spgpe.run.InitialState;
import spgpe.run.Snapshot;

class VorticesTest {
  private static final int N = 24;
  private static final PeriodicGrid GRID = PeriodicGrid.of(Axis.of(N, 12), Axis.of(20, 10));

  /**
   * Phase of a vortex pair on a torus of sides a and b. A vortex at the origin with all its images
   * along x has the phase arg sin(pi (x + i y)/a); rows at y + n b are added for |n| up to 12 (the
   * rows of a pair converge like exp(-2 pi n b/a)), and the linear term -2 pi dx y/(a b) makes the phase
   * periodic along y (derived: a pair displaced by dx lets the phase step by 2 pi dx/a over one
   * period in y).
   */
  private static double pairPhase(double x, double y, double[] plus, double[] minus, double a,
      double b) {
    double phase = 0;
    for (int n = -12; n <= 12; n++) {
      phase += rowPhase(x - plus[0], y - plus[1] + n * b, a);
      phase -= rowPhase(x - minus[0], y - minus[1] + n * b, a);
    }
    return phase - 2 * Math.PI * (plus[0] - minus[0]) / a * (y / b);
  }

  /** arg sin(pi (x + i y)/a). */
  private static double rowPhase(double x, double y, double a) {
    double u = Math.PI * x / a;
    double v = Math.PI * y / a;
    return Math.atan2(Math.cos(u) * Math.tanh(v), Math.sin(u));
  }

  private static double[] phases(double[] plus, double[] minus) {
    double[] phases = new double[GRID.points()];
    for (int p = 0; p < phases.length; p++) {
      phases[p] = pairPhase(GRID.coordinate(0, p), GRID.coordinate(1, p), plus, minus, 12, 10);
    }
    return phases;
  }

  /**
   * The planted phase itself: it must be periodic, or a seam of false vortices would be planted.
   */
  @Test
  void thePlantedPhaseIsPeriodic() {
    double[] plus = {3.1, 2.2};
    double[] minus = {7.7, 6.4};
    for (double s = 0.05; s < 10; s += 0.37) {
      double alongX =
          pairPhase(12 + 0.3, s, plus, minus, 12, 10) - pairPhase(0.3, s, plus, minus, 12, 10);
      double alongY =
          pairPhase(s, 10 + 0.3, plus, minus, 12, 10) - pairPhase(s, 0.3, plus, minus, 12, 10);
      assertEquals(0, Math.IEEEremainder(alongX, 2 * Math.PI), 1e-9);
      assertEquals(0, Math.IEEEremainder(alongY, 2 * Math.PI), 1e-9);
    }
  }

  /**
   * A pair anywhere, at every separation above three spacings: exactly these two are found, in
   * their plaquettes or, if they lie within a tenth of a spacing of a side, in the next one.
   */
  @Property(tries = 400, seed = "2026")
  void aPlantedPairIsFound(
      @ForAll @LongRange(min = 0, max = 1_000_000) long seed) {
    Random random = new Random(seed);
    double h = 0.5;
    double[] plus = {12 * random.nextDouble(), 10 * random.nextDouble()};
    double[] minus;
    do {
      minus = new double[] {12 * random.nextDouble(), 10 * random.nextDouble()};
    } while (apart(plus, minus) <= 3 * h);
    List<Vortex> found = Vortices.find(phases(plus, minus), GRID);
    assertEquals(2, found.size(), found + " for a pair at " + apart(plus, minus) / h);
    for (Vortex v : found) {
      double[] expected = v.charge() > 0 ? plus : minus;
      assertTrue(
          Math.abs(Math.IEEEremainder(v.x() - expected[0], 12)) <= 0.6 * h
              && Math.abs(Math.IEEEremainder(v.y() - expected[1], 10)) <= 0.6 * h,
          v + " is not at " + Arrays.toString(expected));
    }
    assertEquals(0, found.get(0).charge() + found.get(1).charge());
  }

  private static double apart(double[] a, double[] b) {
    return Math.hypot(Math.IEEEremainder(a[0] - b[0], 12), Math.IEEEremainder(a[1] - b[1], 10));
  }

  /** The total charge of a torus is zero, also where phase steps are exactly pi. */
  @Property(tries = 200, seed = "2026")
  void theTotalChargeIsZero(
      @ForAll @IntRange(min = 2, max = 20) int nx,
      @ForAll @IntRange(min = 2, max = 20) int ny,
      @ForAll @IntRange(min = 0, max = 1) int coarse,
      @ForAll @LongRange(min = 0, max = 1_000_000) long seed) {
    Random random = new Random(seed);
    double[] phases = new double[nx * ny];
    for (int p = 0; p < phases.length; p++) {
      phases[p] =
          coarse == 1
              ? Math.PI / 2 * random.nextInt(4)
              : 40 * (random.nextDouble() - 0.5);
    }
    int[] charges =
        Vortices.charges(phases, PeriodicGrid.of(Axis.of(nx, 3), Axis.of(ny, 2)));
    assertEquals(0, Arrays.stream(charges).sum());
    for (int charge : charges) {
      assertTrue(Math.abs(charge) <= 1 || coarse == 1, "charge " + charge);
    }
  }

  /** A third of the plaquettes of independent phases carry a vortex: a known probability. */
  @Test
  void independentPhasesHaveTheKnownDensity() {
    Random random = new Random(12);
    double[] phases = new double[200 * 200];
    for (int p = 0; p < phases.length; p++) {
      phases[p] = 2 * Math.PI * random.nextDouble();
    }
    int[] charges =
        Vortices.charges(phases, PeriodicGrid.of(Axis.of(200, 1), Axis.of(200, 1)));
    double share = Arrays.stream(charges).filter(c -> c != 0).count() / 40_000.0;
    // P = 1/3: the sum of four wrapped steps of independent uniform phases (derived: the sum of
    // three independent uniform steps lies beyond pi with probability 1/3). Neighbouring plaquettes
    // repel, so that the binomial error 0.0024 is an upper bound: 4 errors, false alarm below 6e-5.
    // A wrong sign of a step gives 0 or above 0.5.
    assertEquals(1.0 / 3, share, 0.0096);
  }

  /** Through fields: a pair in component 0 and another in component 1; relative = difference. */
  @Test
  void componentsAndRelativePhase() {
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(32, 12), Axis.of(32, 10));
    Model model =
        Model.of(
            Projector.modesUpTo(7).on(grid), Hamiltonian.pair(1, 0), Reservoir.of(0.1, 1, 0.1));
    double[][] plus = {{3.1, 2.2}, {9.4, 7.8}};
    double[][] minus = {{7.3, 6.9}, {2.2, 6.1}};
    Amplitudes state = new Amplitudes(model.region(), 2, 1);
    InitialState.fromField(
            (c, x, y, psi) -> {
              double phase = pairPhase(x, y, plus[c], minus[c], 12, 10);
              double size =
                  Math.tanh(wrapped(x, y, plus[c])) * Math.tanh(wrapped(x, y, minus[c]));
              psi[0] = size * Math.cos(phase);
              psi[1] = size * Math.sin(phase);
            })
        .prepare(model, RandomStreams.counterBased(1).initialState(0), state);
    Snapshot s = Snapshot.of(model, state, 0);
    assertArrayEquals(new double[] {1, 1}, Fields.measure(Vortices.countOfComponent(0), s));
    assertArrayEquals(new double[] {1, 1}, Fields.measure(Vortices.countOfComponent(1), s));
    assertArrayEquals(new double[] {2, 2}, Fields.measure(Vortices.countOfRelativePhase(), s));
    double[] relative = Fields.measure(Vortices.chargesOfRelativePhase(), s);
    double[] first = Fields.measure(Vortices.chargesOfComponent(0), s);
    double[] second = Fields.measure(Vortices.chargesOfComponent(1), s);
    for (int p = 0; p < relative.length; p++) {
      assertEquals(first[p] - second[p], relative[p]);
    }
  }

  private static double wrapped(double x, double y, double[] centre) {
    return apart(new double[] {x, y}, centre);
  }

  @Test
  void badInputIsRefused() {
    String line =
        Fields.refusal(() -> Vortices.find(new double[4], PeriodicGrid.of(Axis.of(4, 1))));
    assertTrue(line.contains("need a plane"), line);
    String few = Fields.refusal(() -> Vortices.find(new double[4], GRID));
    assertTrue(few.contains("phases=4, points=480"), few);
    double[] hole = new double[480];
    hole[3] = Double.NaN;
    String nan = Fields.refusal(() -> Vortices.charges(hole, GRID));
    assertTrue(nan.contains("phases[3]=NaN"), nan);
  }

  /**
   * Length of a circle of radius r in spacings: low by a known small part; squares along the axes.
   */
  @Test
  void wallLengthOfCirclesAndLines() {
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(64, 64), Axis.of(64, 64));
    double[] radii = {2, 3, 5, 8, 12, 20};
    for (double radius : radii) {
      double worst = 0;
      for (double shift = 0; shift < 1; shift += 0.23) {
        double[] profile = new double[grid.points()];
        for (int p = 0; p < profile.length; p++) {
          double x = Math.IEEEremainder(grid.coordinate(0, p) - 1 - shift, 64);
          double y = Math.IEEEremainder(grid.coordinate(1, p) - 60 - 0.7 * shift, 64);
          profile[p] = -Math.tanh((Math.hypot(x, y) - radius) / 2);
        }
        double length = DomainWallLength.of(profile, 0, grid);
        double part = length / (2 * Math.PI * radius) - 1;
        worst = Math.abs(part) > Math.abs(worst) ? part : worst;
      }
      // chords of a circle: low by 0.061 (h/r)^2 on average (measured), never high
      assertEquals(-0.061, worst * radius * radius, 0.02, "radius " + radius);
    }
    double[] band = new double[grid.points()];
    for (int p = 0; p < band.length; p++) {
      band[p] = Math.cos(2 * Math.PI * (grid.coordinate(0, p) - 0.3) / 64);
    }
    assertEquals(128, DomainWallLength.of(band, 0, grid), 1e-9);
    assertEquals(0, DomainWallLength.of(band, 2, grid));
    double[] diagonal = new double[grid.points()];
    for (int p = 0; p < diagonal.length; p++) {
      diagonal[p] =
          Math.sin(2 * Math.PI * (grid.coordinate(0, p) + grid.coordinate(1, p) + 0.4) / 64);
    }
    assertEquals(2 * 64 * Math.sqrt(2), DomainWallLength.of(diagonal, 0, grid), 1e-9);
    // a jump within a spacing shows the steps of the grid: up to 8 % too long
    double[] sharp = new double[grid.points()];
    for (int p = 0; p < sharp.length; p++) {
      double x = grid.coordinate(0, p) - 30.2;
      double y = grid.coordinate(1, p) - 31.4;
      sharp[p] = Math.hypot(x, y) < 15 ? 1 : -1;
    }
    double excess = DomainWallLength.of(sharp, 0, grid) / (30 * Math.PI) - 1;
    assertTrue(excess > 0.02 && excess < 0.083, "excess " + excess);
    String line =
        Fields.refusal(
            () -> DomainWallLength.of(new double[4], 0, PeriodicGrid.of(Axis.of(4, 1))));
    assertTrue(line.contains("need a plane"), line);
  }
}
