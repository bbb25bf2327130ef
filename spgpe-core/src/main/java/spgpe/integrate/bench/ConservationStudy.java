package spgpe.integrate.bench;

import java.util.Locale;
import spgpe.integrate.Integrator;
import spgpe.integrate.Stepper;
import spgpe.internal.check.Check;
import spgpe.model.EnergyMeter;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.RandomStreams;

/** Measures how well a scheme conserves atom number, momentum and K at gamma = 0. */
public final class ConservationStudy {
  private ConservationStudy() {}

  /**
   * Drifts of a run.
   *
   * @param scheme the scheme
   * @param step time step
   * @param time length of the run
   * @param atoms relative change of the atom number
   * @param momentum change of the momentum along x
   * @param energy relative change of K
   * @param largestEnergyError largest relative deviation of K seen during the run
   */
  public record Drift(
      String scheme, double step, double time, double atoms, double momentum, double energy,
      double largestEnergyError) {
    /**
     * A line of text.
     *
     * @return the numbers
     */
    public String line() {
      return String.format(
          Locale.ROOT,
          "step %-8.4g time %-8.4g dN/N %+.1e dP %+.1e dK/K %+.1e (largest %.1e) %s",
          step, time, atoms, momentum, energy, largestEnergyError, scheme);
    }
  }

  /**
   * Runs a scheme.
   *
   * @param model model without damping
   * @param scheme any scheme with its step
   * @param initial initial state with one lane
   * @param steps number of steps, at least 1
   * @return the drifts
   * @throws IllegalArgumentException if the model has damping or a value is out of range
   */
  public static Drift measure(Model model, Integrator scheme, Amplitudes initial, int steps) {
    Check.notNull(model, "model");
    Check.notNull(scheme, "integrator");
    Check.notNull(initial, "initial state");
    Check.argument(steps >= 1, "number of steps must be >= 1: steps=%s", steps);
    for (int c = 0; c < model.components(); c++) {
      Check.argument(
          model.reservoir().damping(c) == 0,
          "conservation needs a model without damping: gamma=%s, component=%s",
          model.reservoir().damping(c), c);
    }
    EnergyMeter meter = new EnergyMeter(model);
    double atoms = atoms(initial);
    double momentum = momentum(initial);
    double energy = meter.grandCanonical(0, initial);
    Stepper stepper =
        scheme.bind(
            model, RandomStreams.counterBased(0).generator(model.region(), model.components(), 1),
            1);
    stepper.start(initial, 0);
    Amplitudes state = initial.copy();
    double largest = 0;
    int interval = Math.max(1, steps / 100);
    for (int s = 1; s <= steps; s++) {
      stepper.advance();
      if (s % interval == 0 || s == steps) {
        stepper.observe(state);
        double error = Math.abs(meter.grandCanonical(stepper.time(), state) / energy - 1);
        largest = Math.max(largest, error);
      }
    }
    return new Drift(
        scheme.toString(), scheme.step(), stepper.time(), atoms(state) / atoms - 1,
        momentum(state) - momentum, meter.grandCanonical(stepper.time(), state) / energy - 1,
        largest);
  }

  private static double atoms(Amplitudes a) {
    double sum = 0;
    for (int c = 0; c < a.components(); c++) {
      sum += a.atomNumber(c, 0);
    }
    return sum;
  }

  private static double momentum(Amplitudes a) {
    double sum = 0;
    for (int c = 0; c < a.components(); c++) {
      for (int m = 0; m < a.region().modes(); m++) {
        sum +=
            a.region().waveNumber(0, m)
                * (a.re(c)[m] * a.re(c)[m] + a.im(c)[m] * a.im(c)[m]);
      }
    }
    return sum;
  }
}
