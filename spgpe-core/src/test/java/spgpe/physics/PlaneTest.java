package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ExternalPotential;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.ModulatedCoupling;
import spgpe.integrate.AdaptiveRk4Ip;
import spgpe.integrate.HeunIp;
import spgpe.integrate.Integrator;
import spgpe.integrate.LatticeComposition;
import spgpe.integrate.LatticeStrang;
import spgpe.integrate.OuMidpoint;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.internal.check.AllocationMeter;
import spgpe.model.EnergyMeter;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;
import spgpe.run.InitialState;
import spgpe.run.Observable;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.TimeSeries;
import spgpe.run.Trajectory;

/** Two-dimensional runs without noise, against exact statements. */
class PlaneTest {
  private static final double LENGTH = 9;
  private static final double WIDTH = 5;

  private static List<Integrator> schemes() {
    return List.of(
        OuRk4.ofStep(0.02), Rk4Ip.ofStep(0.02), HeunIp.ofStep(0.02), OuMidpoint.ofStep(0.02),
        LatticeStrang.ofStep(0.02), LatticeComposition.yoshida(0.02),
        AdaptiveRk4Ip.of(0.02, 1e-9));
  }

  private static Hamiltonian pair(double width) {
    return Hamiltonian.pair(1.1 * width, 0.3 * width)
        .with(CoherentCoupling.constant(0.2))
        .with(BiquadraticCoupling.of(0.4 * width))
        .with(ModulatedCoupling.of(0.1, 3));
  }

  private static Model model(PeriodicGrid grid, Integrator scheme, Hamiltonian hamiltonian) {
    Reservoir cold = Reservoir.of(0, 1, scheme.facts().admitsNoise() ? 0.1 : 0);
    return scheme.facts().latticeOnly()
        ? Model.ofAliasing(Projector.allModes().on(grid), hamiltonian, cold)
        : Model.of(Projector.belowWaveNumber(2.9).on(grid), hamiltonian, cold);
  }

  private static Amplitudes end(Model model, Integrator scheme, InitialState start, double time) {
    return Trajectory.of(model).startingFrom(start).integratedBy(scheme).seed(1, 0).until(time)
        .run().finalState();
  }

  private static InitialState.FieldFunction wave(boolean alongX, double scale) {
    return (c, x, y, psi) -> {
      double turn = 2 * Math.PI * (alongX ? x : y) / LENGTH;
      psi[0] = scale * (0.9 + 0.3 * Math.cos(turn + c) - 0.1 * Math.sin(3 * turn));
      psi[1] = scale * (0.2 * Math.sin(2 * turn) + 0.1 * c);
    };
  }

  /**
   * A field that is constant along one axis of width W is a field on a line: with psi_2D =
   * psi_1D/sqrt(W) and quartic couplings times W the amplitudes a(k, 0) are those of the line.
   */
  @ParameterizedTest
  @ValueSource(booleans = {true, false})
  void aFieldConstantAlongAnAxisIsThatOfTheLine(boolean alongX) {
    Axis axis = Axis.of(24, LENGTH);
    Axis across = Axis.of(16, WIDTH);
    PeriodicGrid grid =
        alongX ? PeriodicGrid.of(axis, across) : PeriodicGrid.of(across, axis);
    for (Integrator scheme : schemes()) {
      Model line = model(PeriodicGrid.of(axis), scheme, pair(1));
      Model plane = model(grid, scheme, pair(WIDTH));
      Amplitudes expected = end(line, scheme, InitialState.fromField(wave(true, 1)), 2);
      Amplitudes found =
          end(
              plane, scheme,
              InitialState.fromField(wave(alongX, 1 / Math.sqrt(WIDTH))), 2);
      for (int c = 0; c < 2; c++) {
        double moved = 0;
        for (int m = 0; m < plane.region().modes(); m++) {
          int n = plane.region().modeNumber(alongX ? 0 : 1, m);
          int other = plane.region().modeNumber(alongX ? 1 : 0, m);
          int i = other == 0 ? line.region().indexOf(n) : -1;
          assertEquals(i < 0 ? 0 : expected.re(c)[i], found.re(c)[m], 1e-12, scheme.toString());
          assertEquals(i < 0 ? 0 : expected.im(c)[i], found.im(c)[m], 1e-12, scheme.toString());
          moved += n != 0 ? Math.abs(found.im(c)[m]) : 0;
        }
        assertTrue(moved > 0.1, "the field must do something: " + moved);
      }
      assertEquals(
          new EnergyMeter(line).energy(0.3, expected), new EnergyMeter(plane).energy(0.3, found),
          1e-11, scheme.toString());
    }
  }

  /**
   * Blanes-Moan, which needs local terms that commute: the line again, and its order 4 on a field
   * that depends on both coordinates. Errors against the finest step fall 16-fold: the quotient of
   * the differences of dt, dt/2 and dt/4 is 16 up to the next order.
   */
  @Test
  void blanesMoanOnAPlane() {
    Axis axis = Axis.of(24, LENGTH);
    PeriodicGrid grid = PeriodicGrid.of(axis, Axis.of(16, WIDTH));
    Hamiltonian single = Hamiltonian.single(1.3 * WIDTH);
    LatticeComposition scheme = LatticeComposition.blanesMoan(0.02);
    Model plane = model(grid, scheme, single);
    Model line = model(PeriodicGrid.of(axis), scheme, Hamiltonian.single(1.3));
    Amplitudes expected = end(line, scheme, InitialState.fromField(wave(true, 1)), 2);
    Amplitudes found =
        end(plane, scheme, InitialState.fromField(wave(true, 1 / Math.sqrt(WIDTH))), 2);
    for (int n = -12; n < 12; n++) {
      int i = line.region().indexOf(n);
      int m = plane.region().indexOf(n, 0);
      assertEquals(expected.re(0)[i], found.re(0)[m], 1e-12);
      assertEquals(expected.im(0)[i], found.im(0)[m], 1e-12);
    }
    InitialState both =
        InitialState.fromField(
            (c, x, y, psi) -> {
              psi[0] = 0.5 + 0.2 * Math.cos(2 * Math.PI * (x / LENGTH + 2 * y / WIDTH));
              psi[1] = 0.1 * Math.sin(2 * Math.PI * (x / LENGTH - y / WIDTH));
            });
    Amplitudes coarse = end(plane, LatticeComposition.blanesMoan(0.03125), both, 2);
    Amplitudes middle = end(plane, LatticeComposition.blanesMoan(0.015625), both, 2);
    Amplitudes fine = end(plane, LatticeComposition.blanesMoan(0.0078125), both, 2);
    double quotient = distance(coarse, middle) / distance(middle, fine);
    assertEquals(16, quotient, 3);
  }

  private static double distance(Amplitudes a, Amplitudes b) {
    double sum = 0;
    for (int m = 0; m < a.region().modes(); m++) {
      sum += Math.pow(a.re(0)[m] - b.re(0)[m], 2) + Math.pow(a.im(0)[m] - b.im(0)[m], 2);
    }
    return Math.sqrt(sum);
  }

  /** A plane wave psi = exp(i k r) turns with k^2/2 + g - mu and decays to nothing else. */
  @Test
  void aPlaneWaveTurnsWithItsEnergy() {
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(16, LENGTH), Axis.of(32, WIDTH));
    Model model =
        Model.of(Projector.modesUpTo(3, 5).on(grid), Hamiltonian.single(0.7), Reservoir.none(0.4));
    double kx = 2 * Math.PI * 2 / LENGTH;
    double ky = -2 * Math.PI * 3 / WIDTH;
    InitialState start =
        InitialState.fromField(
            (c, x, y, psi) -> {
              psi[0] = Math.cos(kx * x + ky * y);
              psi[1] = Math.sin(kx * x + ky * y);
            });
    double time = 3;
    double angle = -((kx * kx + ky * ky) / 2 + 0.7 - 0.4) * time;
    int mode = model.region().indexOf(2, -3);
    double root = Math.sqrt(LENGTH * WIDTH);
    for (Integrator scheme : List.of(Rk4Ip.ofStep(0.005), OuRk4.ofStep(0.005))) {
      Amplitudes found = end(model, scheme, start, time);
      for (int m = 0; m < model.region().modes(); m++) {
        double size = m == mode ? root : 0;
        assertEquals(size * Math.cos(angle), found.re(0)[m], 1e-8);
        assertEquals(size * Math.sin(angle), found.im(0)[m], 1e-8);
      }
    }
    Amplitudes wave = end(model, Rk4Ip.ofStep(0.01), start, 0.01);
    double area = LENGTH * WIDTH;
    assertEquals(
        area * ((kx * kx + ky * ky) / 2 + 0.7 / 2),
        new EnergyMeter(model).energy(0, wave), 1e-10 * area);
  }

  /**
   * Bogoliubov dispersion E = sqrt(eps (eps + 2 g n)) (Bogoliubov, J. Phys. USSR 11, 23 (1947)) in
   * five directions.
   */
  @ParameterizedTest
  @CsvSource({"3, 0", "0, 2", "1, 1", "2, -1", "-1, 3"})
  void bogoliubovDispersionInEachDirection(int nx, int ny) {
    Model model =
        Model.of(
            Projector.modesUpTo(3).on(PeriodicGrid.of(Axis.of(16, LENGTH), Axis.of(13, WIDTH))),
            Hamiltonian.single(1), Reservoir.none(1));
    double kx = 2 * Math.PI * nx / LENGTH;
    double ky = 2 * Math.PI * ny / WIDTH;
    int plus = model.region().indexOf(nx, ny);
    Recording<TimeSeries> recording =
        Recording.of(
            Observable.scalar("Re a_k", s -> s.amplitudes().re(0)[plus]), Schedule.every(0.02),
            TimeSeries::new);
    double[][] signal =
        Trajectory.of(model)
            .startingFrom(
                InitialState.fromField(
                    (c, x, y, psi) -> psi[0] = 1 + 1e-5 * Math.cos(kx * x + ky * y)))
            .integratedBy(Rk4Ip.ofStep(0.01)).seed(1, 0).until(40).record(recording).run()
            .get(recording).series().get(0).values();
    double eps = (kx * kx + ky * ky) / 2;
    double expected = Math.sqrt(eps * (eps + 2));
    assertEquals(1, frequency(signal, 0.02) / expected, 3e-5);
  }

  /** From the first and last zero crossing, interpolated linearly. */
  private static double frequency(double[][] signal, double interval) {
    double first = Double.NaN;
    double last = Double.NaN;
    int crossings = 0;
    for (int i = 1; i < signal.length; i++) {
      double before = signal[i - 1][0];
      double after = signal[i][0];
      if ((before < 0) != (after < 0)) {
        last = interval * (i - 1 + before / (before - after));
        first = crossings == 0 ? last : first;
        crossings++;
      }
    }
    return Math.PI * (crossings - 1) / (last - first);
  }

  private static Amplitudes random(CoherentRegion region, int components) {
    Amplitudes state = new Amplitudes(region, components, 1);
    SplittableRandom random = new SplittableRandom(7);
    for (int nx = -3; nx <= 3; nx++) {
      for (int ny = -2; ny <= 2; ny++) {
        for (int c = 0; c < components; c++) {
          state.re(c)[region.indexOf(nx, ny)] = random.nextDouble(-1, 1);
          state.im(c)[region.indexOf(nx, ny)] = random.nextDouble(-1, 1);
        }
      }
    }
    return state;
  }

  /** dP/dt along both axes at gamma = 0: 2 sum of k Im(a^* f), which vanishes without aliasing. */
  private static double[] momentumRate(int pointsX, int pointsY) {
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(pointsX, LENGTH), Axis.of(pointsY, WIDTH));
    Model model =
        Model.ofAliasing(
            Projector.modesUpTo(3, 2).on(grid),
            Hamiltonian.pair(1, 0.4).with(BiquadraticCoupling.of(0.5)), Reservoir.none(1));
    Amplitudes state = random(model.region(), 2);
    Amplitudes force = state.copy();
    model.evaluator(1).force(0, state, force);
    double[] rate = new double[2];
    for (int c = 0; c < 2; c++) {
      for (int m = 0; m < model.region().modes(); m++) {
        double flow =
            2 * (state.re(c)[m] * force.im(c)[m] - state.im(c)[m] * force.re(c)[m]);
        rate[0] += flow * model.region().waveNumber(0, m);
        rate[1] += flow * model.region().waveNumber(1, m);
      }
    }
    return rate;
  }

  /** The modes up to 3 and 2 need 13 and 9 points; one point fewer breaks that axis only. */
  @Test
  void momentumIsConservedFromTheAliasThresholdOn() {
    double[] enough = momentumRate(13, 9);
    assertEquals(0, enough[0], 1e-12);
    assertEquals(0, enough[1], 1e-12);
    double[] few = momentumRate(12, 9);
    assertTrue(Math.abs(few[0]) > 1e-2, "rate along x=" + few[0]);
    assertEquals(0, few[1], 1e-12);
    double[] low = momentumRate(13, 8);
    assertEquals(0, low[0], 1e-12);
    assertTrue(Math.abs(low[1]) > 1e-2, "rate along y=" + low[1]);
  }

  /** The midpoint rule keeps quadratic invariants: both momenta and the atom number. */
  @Test
  void momentumStaysInARun() {
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(13, LENGTH), Axis.of(9, WIDTH));
    Model model =
        Model.of(
            Projector.modesUpTo(3, 2).on(grid),
            Hamiltonian.pair(1, 0.4).with(BiquadraticCoupling.of(0.5)), Reservoir.none(1));
    Amplitudes state = random(model.region(), 2);
    Amplitudes found = end(model, OuMidpoint.ofStep(0.05), InitialState.of(state), 5);
    for (int axis = 0; axis < 2; axis++) {
      assertEquals(momentum(state, axis), momentum(found, axis), 1e-10);
    }
    double energy = new EnergyMeter(model).energy(0, state);
    assertEquals(energy, new EnergyMeter(model).energy(0, found), 1e-3 * energy);
  }

  private static double momentum(Amplitudes a, int axis) {
    double sum = 0;
    for (int c = 0; c < a.components(); c++) {
      for (int m = 0; m < a.region().modes(); m++) {
        sum +=
            a.region().waveNumber(axis, m)
                * (a.re(c)[m] * a.re(c)[m] + a.im(c)[m] * a.im(c)[m]);
      }
    }
    return sum;
  }

  /**
   * Uniform psi = 1 in V = 2 cos^2(2 pi x/L) + 4 sin^2(2 pi y/W): energy 3 per area; the force is
   * V itself, with cos(4 pi x/L) of size 1 and cos(4 pi y/W) of size -2.
   */
  @Test
  void aPotentialOnThePlane() {
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(13, LENGTH), Axis.of(9, WIDTH));
    Model model =
        Model.of(
            Projector.modesUpTo(3, 2).on(grid),
            Hamiltonian.ofMasses(1)
                .with(
                    ExternalPotential.onPlane(
                        "lattice",
                        (x, y) ->
                            2 * Math.pow(Math.cos(2 * Math.PI * x / LENGTH), 2)
                                + 4 * Math.pow(Math.sin(2 * Math.PI * y / WIDTH), 2))),
            Reservoir.none(0));
    Amplitudes state = new Amplitudes(model.region(), 1, 1);
    double root = Math.sqrt(LENGTH * WIDTH);
    state.re(0)[model.region().indexOf(0, 0)] = root;
    assertEquals(3 * LENGTH * WIDTH, new EnergyMeter(model).energy(0, state), 1e-11);
    Amplitudes force = state.copy();
    model.evaluator(1).force(0, state, force);
    assertEquals(3 * root, force.re(0)[model.region().indexOf(0, 0)], 1e-13 * root);
    assertEquals(0.5 * root, force.re(0)[model.region().indexOf(2, 0)], 1e-13 * root);
    assertEquals(-root, force.re(0)[model.region().indexOf(0, -2)], 1e-13 * root);
    assertEquals(0, force.re(0)[model.region().indexOf(2, 2)], 1e-13 * root);
  }

  @Test
  void aStepAllocatesNothing() {
    PeriodicGrid grid = PeriodicGrid.of(Axis.of(16, LENGTH), Axis.of(8, WIDTH));
    for (Integrator scheme : schemes()) {
      Reservoir warm = Reservoir.of(0.1, 1, scheme.facts().admitsNoise() ? 0.1 : 0);
      Model model =
          scheme.facts().latticeOnly()
              ? Model.ofAliasing(Projector.allModes().on(grid), pair(1), warm)
              : Model.of(Projector.modesUpTo(3, 1).on(grid), pair(1), warm);
      NoiseGenerator noise = RandomStreams.counterBased(8).generator(model.region(), 2, 1);
      noise.assign(0, 0);
      Stepper stepper = scheme.bind(model, noise, 1);
      Amplitudes state = new Amplitudes(model.region(), 2, 1);
      stepper.start(state, 0);
      double bytes = AllocationMeter.bytesPerCall(stepper::advance);
      assertTrue(bytes < 1, scheme + ": bytes for each step: " + bytes);
    }
  }
}
