package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.model.Model;
import spgpe.physics.ThermalRuns.Estimate;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Observable;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.Snapshot;
import spgpe.run.ThermalBogoliubov;
import spgpe.run.TimeMoments;

/** Noise and equilibrium in two dimensions. */
class PlaneEquilibriumTest {
  /**
   * Ideal gas: n_k = T/(eps_k - mu) (Blakie et al., Adv. Phys. 57, 363 (2008)), 64 x 250 = 16000
   * practically independent samples of 15 modes on unequal axes. Standard error of a mean 0.8 %,
   * limit 4.5 of them: false alarm 1e-4 in all; 4 % of temperature, or k of one axis taken for the
   * other's (factors of 1.1 to 3), is seen.
   */
  @Test
  void idealGasOccupations() {
    int lanes = 64;
    int samples = 250;
    double temperature = 2;
    double mu = -0.5;
    CoherentRegion region =
        Projector.modesUpTo(2, 1).on(PeriodicGrid.of(Axis.of(8, 2 * Math.PI), Axis.of(4, 3)));
    Model model =
        Model.of(region, Hamiltonian.ofMasses(1), Reservoir.of(temperature, mu, 2));
    NoiseGenerator noise = RandomStreams.counterBased(41).generator(region, 1, lanes);
    for (int lane = 0; lane < lanes; lane++) {
      noise.assign(lane, lane);
    }
    Stepper stepper = OuRk4.ofStep(2).bind(model, noise, lanes);
    Amplitudes state = new Amplitudes(region, 1, lanes);
    stepper.start(state, 0);
    double[] sums = new double[region.modes()];
    for (int s = 0; s < samples; s++) {
      for (int i = 0; i < 5; i++) {
        stepper.advance();
      }
      stepper.observe(state);
      for (int e = 0; e < state.re(0).length; e++) {
        sums[e / lanes] +=
            state.re(0)[e] * state.re(0)[e] + state.im(0)[e] * state.im(0)[e];
      }
    }
    double n = (double) lanes * samples;
    for (int m = 0; m < sums.length; m++) {
      double kx = region.modeNumber(0, m);
      double ky = 2 * Math.PI * region.modeNumber(1, m) / 3;
      double expected = temperature / ((kx * kx + ky * ky) / 2 - mu);
      assertEquals(1, sums[m] / n / expected, 4.5 / Math.sqrt(n), "mode " + m);
    }
  }

  /**
   * Equipartition of a coupled, interacting pair on a disc: Re &lt;a^* f&gt; = T in three rings of
   * |k|, virial and power balance, as in {@link EquipartitionTest}; 24 trajectories, limits 4.5
   * standard errors (false alarm 1.6e-4 for each of five numbers and two schemes, 1.6e-3 in all).
   * Standard errors 2.4, 1.2 and 0.6 % in the rings (the inner one has few and slow modes), 2.2 %
   * in the virial (the condensate has its share) and 0.5 % in the power balance; deviations of 16,
   * 8, 4, 15 and 4 % are seen with a probability of 97 %.
   */
  @Test
  void equipartitionOfAnInteractingPair() {
    double g = 1;
    double inter = 0.2;
    double kappa = 0.2;
    Model model =
        Model.of(
            Projector.belowWaveNumber(2.8).on(PeriodicGrid.of(Axis.of(16, 7), Axis.of(16, 6))),
            Hamiltonian.pair(g, inter)
                .with(CoherentCoupling.constant(0.1))
                .with(BiquadraticCoupling.of(kappa)),
            Reservoir.of(0.2, 1, 0).withDampings(0.6, 0.3));
    double[] largestError = {0.03, 0.02, 0.01, 0.04, 0.01};
    int seed = 45;
    for (Integrator scheme : List.of(OuRk4.ofStep(0.05), Rk4Ip.ofStep(0.04))) {
      Estimate[] found =
          ThermalRuns.run(
              model, scheme, ThermalRuns.equilibrium(0.9, 0.9),
              ThermalRuns.invariants(model, 3, g, inter, kappa), seed++, 24, 4, 0.4, 28);
      for (int i = 0; i < largestError.length; i++) {
        String what = scheme + ", number " + i + ": " + found[i];
        assertTrue(found[i].error() < largestError[i], what);
        assertEquals(1, found[i].mean(), 4.5 * found[i].error(), what);
      }
    }
  }

  /**
   * Modes k and -k of the harmonic state: &lt;|a_k|^2&gt; = (T/2)[1/eps + 1/(eps + 2 g n)] and
   * &lt;a_k a_-k&gt; = (T/2)[1/(eps + 2 g n) - 1/eps], here 0.041 and -0.021 for (2, 1). 4000
   * states: relative error of the occupations (two modes) below 1.4 %, of the pair correlation
   * below 4 %; limits 4.5 of them (false alarm 2e-5). Pairs drawn independently would give 0.
   */
  @Test
  void bogoliubovPairsOnThePlane() {
    int states = 4000;
    double temperature = 0.05;
    CoherentRegion region =
        Projector.belowWaveNumber(2.3).on(PeriodicGrid.of(Axis.of(20, 12), Axis.of(16, 9)));
    Model model = Model.of(region, Hamiltonian.single(1), Reservoir.of(temperature, 1, 0.1));
    InitialState thermal = ThermalBogoliubov.around(1);
    Amplitudes state = new Amplitudes(region, 1, 1);
    int[][] numbers = {{2, 1}, {-1, 2}, {0, 3}};
    double[] occupation = new double[3];
    double[] pairing = new double[3];
    for (int t = 0; t < states; t++) {
      state.clear();
      thermal.prepare(model, RandomStreams.counterBased(43).initialState(t), state);
      for (int i = 0; i < 3; i++) {
        int up = region.indexOf(numbers[i][0], numbers[i][1]);
        int down = region.indexOf(-numbers[i][0], -numbers[i][1]);
        double a = state.re(0)[up];
        double b = state.im(0)[up];
        double c = state.re(0)[down];
        double d = state.im(0)[down];
        occupation[i] += (a * a + b * b + c * c + d * d) / 2 / states;
        pairing[i] += (a * c - b * d) / states;
      }
    }
    for (int i = 0; i < 3; i++) {
      double eps = region.kSquared(region.indexOf(numbers[i][0], numbers[i][1])) / 2;
      double soft = temperature / 2 / eps;
      double hard = temperature / 2 / (eps + 2);
      // x = soft quadrature, y = hard one: |a_k|^2 + |a_-k|^2 = 2(|x|^2 + |y|^2), exponential each
      double error = Math.hypot(soft, hard) / Math.sqrt(states);
      assertEquals(soft + hard, occupation[i], 4.5 * error, "n=" + i);
      assertEquals(hard - soft, pairing[i], 4.5 * error, "n=" + i);
    }
  }

  private static final Observable PROFILE =
      new Observable() {
        @Override
        public String name() {
          return "real parts";
        }

        @Override
        public int size(Model model) {
          return model.region().grid().points();
        }

        @Override
        public void measure(Snapshot snapshot, double[] result) {
          System.arraycopy(snapshot.field().re(0), 0, result, 0, result.length);
        }
      };

  private static final Recording<TimeMoments> MOMENTS =
      Recording.of(PROFILE, Schedule.every(0.5), TimeMoments::new);

  private static Ensemble plan() {
    Model model =
        Model.of(
            Projector.belowWaveNumber(2.1).on(PeriodicGrid.of(Axis.of(12, 7), Axis.of(10, 6))),
            Hamiltonian.pair(1, 0.2).with(CoherentCoupling.constant(0.1)),
            Reservoir.of(0.1, 1, 0.05));
    return Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
        .integratedBy(OuRk4.ofStep(0.1)).trajectories(9).seed(44).until(2).record(MOMENTS);
  }

  private static List<Double> bits(EnsembleResult result) {
    List<Double> all = new ArrayList<>();
    TimeMoments moments = result.get(MOMENTS);
    for (int s = 0; s < moments.times().length; s++) {
      for (int i = 0; i < 120; i++) {
        all.add(moments.mean(s, i));
        all.add(moments.variance(s, i));
      }
    }
    return all;
  }

  @Test
  void lanesThreadsAndSplitsDoNotChangeABit() {
    List<Double> expected = bits(plan().run());
    assertTrue(expected.get(expected.size() - 1) > 0);
    for (int lanes : new int[] {1, 4, 5}) {
      ExecutorService executor = Executors.newFixedThreadPool(3);
      try {
        assertEquals(expected, bits(plan().lanes(lanes).runOn(executor)), "lanes=" + lanes);
      } finally {
        executor.shutdown();
      }
    }
    EnsembleResult first = plan().trajectories(0, 4).run();
    assertEquals(expected, bits(first.mergedWith(plan().trajectories(4, 5).run())));
  }
}
