package spgpe.integrate;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.HamiltonianTerm;
import spgpe.hamiltonian.LocalTerm;
import spgpe.hamiltonian.ModulatedCoupling;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.PointBlock;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/** Shared Brownian paths, refusals and choices of steps; the rest is in {@link IntegratorContract}. */
class SchemeChoicesTest {
  private static final Hamiltonian PAIR =
      Hamiltonian.pair(1, 0.3)
          .with(CoherentCoupling.constant(0.2))
          .with(BiquadraticCoupling.of(0.4))
          .with(ModulatedCoupling.of(0.1, 3));

  private static Model model(boolean lattice, Hamiltonian hamiltonian, Reservoir reservoir) {
    return lattice
        ? Model.ofAliasing(
            Projector.allModes().on(PeriodicGrid.of(Axis.of(16, 8))), hamiltonian, reservoir)
        : Model.of(
            Projector.modesUpTo(5).on(PeriodicGrid.of(Axis.of(32, 8))), hamiltonian, reservoir);
  }

  private static NoiseGenerator noise(Model model, int lanes) {
    NoiseGenerator noise = RandomStreams.counterBased(8).generator(model.region(), 2, lanes);
    for (int lane = 0; lane < lanes; lane++) {
      noise.assign(lane, 10 + lane);
    }
    return noise;
  }

  private static Amplitudes start(Model model, int lanes) {
    Amplitudes a = new Amplitudes(model.region(), 2, lanes);
    for (int c = 0; c < 2; c++) {
      for (int e = 0; e < a.re(c).length; e++) {
        int mode = e / lanes;
        int lane = e % lanes;
        a.re(c)[e] = Math.cos(mode * mode + c + lane) / (1 + mode);
        a.im(c)[e] = Math.sin(3 * mode + c + 2 * lane) / (1 + mode);
      }
    }
    return a;
  }

  /** W at the end of a run from the kicks of HalfKicks: the same for ratios 1, 2, 4 and 3. */
  @Test
  void sharedPathsAreTheSamePathAtEveryStep() {
    Model model = model(false, PAIR, Reservoir.of(0.2, 1, 0.1));
    RandomStreams base = RandomStreams.counterBased(5);
    Amplitudes reference = null;
    for (int ratio : new int[] {1, 2, 4, 3}) {
      double dt = 0.01 * ratio;
      HalfKicks kicks = new HalfKicks(model, dt);
      NoiseGenerator noise = SharedPath.of(base, ratio).generator(model.region(), 2, 1);
      noise.assign(0, 3);
      Amplitudes sum = new Amplitudes(model.region(), 2, 1);
      Amplitudes z = sum.copy();
      Amplitudes rest = sum.copy();
      int steps = 12 / ratio;
      for (int s = 0; s <= steps; s++) {
        noise.fill(s, s == 0 ? NoiseUse.START : NoiseUse.WHOLE, z);
        if (s < steps) {
          kicks.kick(s == 0, z, sum);
        } else {
          noise.fill(s, NoiseUse.REST_OF_HALF, rest);
          kicks.halfOfKick(z, rest, sum);
        }
      }
      if (reference == null) {
        reference = sum;
      } else {
        for (int c = 0; c < 2; c++) {
          assertArrayEquals(reference.re(c), sum.re(c), 1e-14, "ratio " + ratio);
          assertArrayEquals(reference.im(c), sum.im(c), 1e-14, "ratio " + ratio);
        }
      }
    }
    NoiseGenerator noise = SharedPath.of(base, 2).generator(model.region(), 2, 1);
    noise.assign(0, 3);
    Amplitudes z = new Amplitudes(model.region(), 2, 1);
    assertThrows(IllegalArgumentException.class, () -> noise.fill(0, 7, z));
    assertThrows(IllegalArgumentException.class, () -> noise.fill(0, NoiseUse.WHOLE, z));
    assertThrows(IllegalArgumentException.class, () -> SharedPath.of(base, 0));
  }

  private static String refusal(Integrator scheme, Model model) {
    return assertThrows(
            IllegalArgumentException.class, () -> scheme.bind(model, noise(model, 1), 1))
        .getMessage();
  }

  /** A potential without an exact flow of its own. */
  private static final class PlainShift implements LocalTerm {
    @Override
    public String description() {
      return "PlainShift";
    }

    @Override
    public int forceDegree() {
      return 1;
    }

    @Override
    public void addForce(double time, PointBlock block) {}

    @Override
    public void addEnergyDensity(double time, PointBlock block, double[] density) {}
  }

  @Test
  void combinationsThatLoseTheirPropertiesAreRefusedWithTheReason() {
    Reservoir noisy = Reservoir.of(0.2, 1, 0.1);
    Reservoir quiet = Reservoir.none(1);
    assertTrue(
        refusal(LatticeStrang.ofStep(0.05), model(false, PAIR, noisy)).contains("first order"));
    assertTrue(
        refusal(LatticeComposition.yoshida(0.05), model(false, PAIR, quiet)).contains("projector"));
    assertTrue(
        refusal(LatticeComposition.yoshida(0.05), model(true, PAIR, noisy)).contains("backwards"));
    assertTrue(
        refusal(LatticeComposition.blanesMoan(0.05), model(true, PAIR, quiet)).contains("commute"));
    HamiltonianTerm plain = new PlainShift();
    assertTrue(
        refusal(LatticeStrang.ofStep(0.05), model(true, PAIR.with(plain), noisy))
            .contains("PlainShift"));
    assertTrue(
        refusal(AdaptiveRk4Ip.of(0.2, 1e-8), model(false, PAIR, noisy)).contains("suggestStep"));
    Model undamped = model(false, PAIR, quiet);
    assertThrows(
        IllegalArgumentException.class,
        () -> AdaptiveRk4Ip.of(0.2, 1e-8).bind(undamped, noise(undamped, 2), 2));
  }

  @Test
  void adaptiveSchemeKeepsItsTolerance() {
    Model model = model(false, PAIR, Reservoir.none(1));
    Amplitudes initial = start(model, 1);
    Amplitudes reference = ThermalPair.advance(model, Rk4Ip.ofStep(2.0 / 16384), initial, 16384);
    double[] errors = new double[2];
    for (int i = 0; i < 2; i++) {
      double tolerance = i == 0 ? 1e-6 : 1e-9;
      Stepper stepper =
          AdaptiveRk4Ip.of(0.5, tolerance).bind(model, noise(model, 1), 1);
      stepper.start(initial, 0);
      for (int s = 0; s < 4; s++) {
        stepper.advance();
      }
      Amplitudes end = initial.copy();
      stepper.observe(end);
      errors[i] = ThermalPair.distance(end, reference);
      assertTrue(stepper.save().refinement() > 0);
    }
    assertTrue(errors[0] < 1e-4 && errors[1] < 1e-7, errors[0] + ", " + errors[1]);
    assertTrue(errors[1] < errors[0] / 30);
  }

  @Test
  void suggestedStepHasTheErrorAskedFor() {
    Model model = model(false, PAIR, Reservoir.of(0.2, 1, 0.1));
    Amplitudes state = start(model, 1);
    double loose = Rk4Ip.suggestStep(model, state, 0, 1e-5);
    double strict = Rk4Ip.suggestStep(model, state, 0, 1e-9);
    assertEquals(10, loose / strict, 2); // local error of the embedded solution ~ dt^4
    assertThrows(
        IllegalArgumentException.class, () -> Rk4Ip.suggestStep(model, state, 0, Double.NaN));
    Amplitudes nothing = new Amplitudes(model.region(), 2, 1);
    nothing.re(0)[0] = Double.NaN;
    assertThrows(
        IllegalArgumentException.class, () -> Rk4Ip.suggestStep(model, nothing, 0, 1e-5));
  }

  @Test
  void midpointThatCannotConvergeSaysSo() {
    Model model =
        model(false, Hamiltonian.pair(1, 0.3), Reservoir.of(0, 0.1, 0).withDampings(0));
    Amplitudes dense = start(model, 1);
    for (int c = 0; c < 2; c++) {
      for (int e = 0; e < dense.re(c).length; e++) {
        dense.re(c)[e] *= 30;
      }
    }
    Stepper stepper = OuMidpoint.ofStep(0.1).bind(model, noise(model, 1), 1);
    stepper.start(dense, 0);
    IllegalStateException refused =
        assertThrows(
            IllegalStateException.class,
            () -> {
              for (int s = 0; s < 10; s++) {
                stepper.advance();
              }
            });
    assertTrue(refused.getMessage().contains("smaller step"));
  }
}
