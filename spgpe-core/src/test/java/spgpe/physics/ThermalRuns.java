package spgpe.physics;

import java.util.List;
import org.apache.commons.rng.UniformRandomProvider;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.model.ForceEvaluator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.run.Ensemble;
import spgpe.run.InitialState;
import spgpe.run.Observable;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.Snapshot;
import spgpe.run.TimeSeries;
import spgpe.run.Trajectory;

/** Equilibrium runs: time averages of each trajectory, then mean and error across trajectories. */
final class ThermalRuns {
  private ThermalRuns() {}

  /** Mean over trajectories and its standard error. */
  record Estimate(double mean, double error) {}

  /** Starts each trajectory from equilibrium, made with strong damping: the law is the same. */
  static InitialState equilibrium(double... psi) {
    return (Model model, UniformRandomProvider random, Amplitudes target) ->
        target.set(
            Trajectory.of(
                    model.withReservoir(model.reservoir().withDampings(0.5)))
                .startingFrom(InitialState.uniform(psi))
                .integratedBy(OuRk4.ofStep(0.05))
                .seed(random.nextLong(), 0)
                .until(20)
                .run()
                .finalState());
  }

  static Estimate[] run(
      Model model, Integrator scheme, InitialState start, Observable observable, long seed,
      int trajectories, double burnIn, double interval, double until) {
    List<TimeSeries.Series> all =
        series(model, scheme, start, observable, seed, trajectories, burnIn, interval, until);
    int size = observable.size(model);
    Estimate[] estimates = new Estimate[size];
    for (int i = 0; i < size; i++) {
      double sum = 0;
      double squares = 0;
      for (TimeSeries.Series one : all) {
        double mean = 0;
        for (double[] values : one.values()) {
          mean += values[i] / one.values().length;
        }
        sum += mean;
        squares += mean * mean;
      }
      double mean = sum / trajectories;
      double variance = (squares / trajectories - mean * mean) * trajectories / (trajectories - 1);
      estimates[i] = new Estimate(mean, Math.sqrt(variance / trajectories));
    }
    return estimates;
  }

  static List<TimeSeries.Series> series(
      Model model, Integrator scheme, InitialState start, Observable observable, long seed,
      int trajectories, double burnIn, double interval, double until) {
    Recording<TimeSeries> recording =
        Recording.of(
            observable, Schedule.every(interval).startingAt(burnIn), TimeSeries::new);
    return Ensemble.of(model).startingFrom(start).integratedBy(scheme)
        .trajectories(trajectories).seed(seed).until(until).record(recording).lanes(8).run()
        .get(recording).series();
  }

  /**
   * Re(a^* f)/T averaged over the modes of bands of |k| (the condensate mode left out), then the
   * sum over all modes divided by M T (virial), then sum of gamma |f|^2 over T sum of gamma d2K/da
   * da^* (power balance) for contact and biquadratic interaction, then atom number, then K. One
   * thread.
   */
  static Observable invariants(Model forModel, int bands, double g, double inter, double kappa) {
    ForceEvaluator forces = forModel.evaluator(1);
    Amplitudes force = new Amplitudes(forModel.region(), forModel.components(), 1);
    return new Observable() {
      @Override
      public String name() {
        return "invariants";
      }

      @Override
      public int size(Model model) {
        return bands + 4;
      }

      @Override
      public void measure(Snapshot s, double[] result) {
        Amplitudes a = s.amplitudes();
        double temperature = forModel.reservoir().temperature();
        forces.force(s.time(), a, force);
        int[] counts = new int[bands];
        java.util.Arrays.fill(result, 0);
        double atoms = 0;
        double power = 0;
        double curvature = 0;
        int modes = forModel.region().modes();
        double volume = forModel.region().grid().volume();
        for (int c = 0; c < forModel.components(); c++) {
          double gamma = forModel.reservoir().damping(c);
          double others = 0;
          for (int d = 0; d < forModel.components(); d++) {
            others += d == c ? 0 : a.atomNumber(d, 0);
          }
          double own = a.atomNumber(c, 0);
          for (int m = 0; m < modes; m++) {
            double af = a.re(c)[m] * force.re(c)[m] + a.im(c)[m] * force.im(c)[m];
            int band = bandOf(forModel.region(), m, bands);
            if (band >= 0) {
              result[band] += af / temperature;
              counts[band]++;
            }
            result[bands] += af;
            power +=
                gamma
                    * (force.re(c)[m] * force.re(c)[m] + force.im(c)[m] * force.im(c)[m]);
            curvature +=
                gamma
                    * (forModel.linearPart().re(m, c, c)
                        - forModel.reservoir().chemicalPotential(c)
                        + (2 * g * own + (inter + kappa / 2) * others) / volume);
          }
          atoms += own;
        }
        for (int band = 0; band < bands; band++) {
          result[band] /= counts[band];
        }
        result[bands] /= modes * forModel.components() * temperature;
        result[bands + 1] = power / (temperature * curvature);
        result[bands + 2] = atoms;
        result[bands + 3] = s.grandCanonicalEnergy();
      }
    };
  }

  /** Equal steps of |k| up to the cutoff; -1 for the condensate mode. */
  private static int bandOf(CoherentRegion region, int mode, int bands) {
    if (region.kSquared(mode) == 0) {
      return -1;
    }
    if (region.grid().dimension() == 1) {
      return (Math.abs(region.modeNumber(0, mode)) - 1) * bands / region.largestMode(0);
    }
    double largest = 0;
    for (int m = 0; m < region.modes(); m++) {
      largest = Math.max(largest, region.kSquared(m));
    }
    return Math.min(bands - 1, (int) (bands * Math.sqrt(region.kSquared(mode) / largest)));
  }
}
