package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.model.Model;
import spgpe.physics.ThermalRuns.Estimate;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/**
 * Equilibrium invariants of an interacting, coupled pair, derived from the law exp(-K/T): for every
 * mode Re &lt;a^* dK/da^*&gt; = T; their sum &lt;K2 + 2 K4&gt; = M T; &lt;sum gamma |f|^2&gt; = T
 * &lt;sum gamma d2K/da da^*&gt;. Errors are taken across trajectories, which are independent;
 * limits are 4.5 of them (with 24 trajectories a false alarm of 1.6e-4 per number, about 1e-3 per
 * test).
 */
class EquipartitionTest {
  private static final int BANDS = 3;
  private static final int TRAJECTORIES = 24;
  private static final double SIGMAS = 4.5;
  private static final double G = 1;
  private static final double INTER = 0.2;
  private static final double KAPPA = 0.2;

  private static Model model(double... gammas) {
    return Model.of(
        Projector.modesUpTo(15).on(PeriodicGrid.of(Axis.of(64, 16))),
        Hamiltonian.pair(G, INTER)
            .with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(KAPPA)),
        Reservoir.of(0.1, 1, 0).withDampings(gammas));
  }

  private static Estimate[] run(Model model, Integrator scheme, long seed, double until) {
    return ThermalRuns.run(
        model, scheme, ThermalRuns.equilibrium(0.95, 0.95),
        ThermalRuns.invariants(model, BANDS, G, INTER, KAPPA), seed, TRAJECTORIES, until / 5,
        0.5, until);
  }

  private static void requireInvariants(Estimate[] found) {
    for (int i = 0; i < BANDS + 2; i++) {
      assertEquals(
          1, found[i].mean(), SIGMAS * found[i].error(), "number " + i + ": " + found[i]);
    }
  }

  /**
   * Both dampings that matter: strong, where noise errors show, and weak, where numerical damping
   * shows. Error of the upper band 0.6 % (2 % at 1e-3), so 3 % (10 %) of cooling is seen.
   */
  @ParameterizedTest
  @CsvSource({"0.1, 60", "1e-3, 400"})
  void defaultAndRk4AtShortSteps(double gamma, double until) {
    Estimate[] split = run(model(gamma), OuRk4.ofStep(0.05), 31, until);
    requireInvariants(split);
    assertTrue(split[BANDS - 1].error() < 0.025, "error=" + split[BANDS - 1].error());
    if (gamma > 0.01) {
      Estimate[] lawson = run(model(gamma), Rk4Ip.ofStep(0.05), 32, until);
      requireInvariants(lawson);
      // the two schemes agree on atom number and K
      for (int i = BANDS + 2; i < BANDS + 4; i++) {
        assertEquals(
            split[i].mean(), lawson[i].mean(),
            SIGMAS * Math.hypot(split[i].error(), lawson[i].error()));
      }
    }
  }

  /**
   * The test above would see it: RK4IP at dt = 0.1 and gamma = 1e-3 cools the upper band by 14 %.
   */
  @Test
  void numericalCoolingOfRk4IsSeen() {
    Estimate[] found = run(model(1e-3), Rk4Ip.ofStep(0.1), 33, 400);
    assertTrue(
        found[BANDS - 1].mean() < 1 - SIGMAS * found[BANDS - 1].error(),
        found[BANDS - 1].toString());
  }

  /** Unequal dampings with coherent coupling: the same law. */
  @Test
  void equilibriumDoesNotDependOnTheRatioOfDampings() {
    Estimate[] equal = run(model(0.2), OuRk4.ofStep(0.05), 34, 50);
    Estimate[] unequal = run(model(0.4, 0.02), OuRk4.ofStep(0.05), 35, 50);
    requireInvariants(equal);
    requireInvariants(unequal);
    for (int i = BANDS + 2; i < BANDS + 4; i++) {
      assertEquals(
          equal[i].mean(), unequal[i].mean(),
          SIGMAS * Math.hypot(equal[i].error(), unequal[i].error()));
    }
  }

  /**
   * Generated models: temperatures, chemical potentials, couplings and unequal dampings. Errors of
   * the bands below 3 %, so 13 % is seen.
   */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4})
  void invariantsOfGeneratedModels(int seed) {
    Random random = new Random(seed);
    double g = 0.5 + random.nextDouble();
    double inter = 0.6 * g * random.nextDouble();
    double kappa = 0.4 * random.nextDouble();
    double mu = -0.3 + 1.5 * random.nextDouble();
    Model model =
        Model.of(
            Projector.modesUpTo(7).on(PeriodicGrid.of(Axis.of(32, 9))),
            Hamiltonian.pair(g, inter)
                .with(CoherentCoupling.constant(0.4 * random.nextDouble()))
                .with(BiquadraticCoupling.of(kappa)),
            Reservoir.of(0.05 + 0.5 * random.nextDouble(), mu, 0)
                .withDampings(0.05 + 0.4 * random.nextDouble(), 0.05 + 0.4 * random.nextDouble()));
    Estimate[] found =
        ThermalRuns.run(
            model, OuRk4.ofStep(0.04), ThermalRuns.equilibrium(0.5, 0.5),
            ThermalRuns.invariants(model, BANDS, g, inter, kappa), 100 + seed, TRAJECTORIES, 8,
            0.4, 48);
    requireInvariants(found);
    assertTrue(found[0].error() < 0.03, "error=" + found[0].error());
  }
}
