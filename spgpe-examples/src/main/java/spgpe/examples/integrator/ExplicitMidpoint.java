package spgpe.examples.integrator;

import static java.util.Objects.requireNonNull;

import spgpe.integrate.Integrator;
import spgpe.integrate.KickedStepper;
import spgpe.integrate.SchemeFacts;
import spgpe.integrate.Stepper;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * A user's own scheme: the explicit midpoint rule on the whole equation, with half kicks of noise.
 * Without an interaction picture it needs very short steps, as {@link MeasureIntegrator} shows.
 *
 * @param step time step
 */
public record ExplicitMidpoint(double step) implements Integrator {
  /**
   * Refuses steps out of range.
   *
   * @param step time step, finite and positive
   * @throws IllegalArgumentException if it is not
   */
  public ExplicitMidpoint {
    if (!(step > 0 && step < Double.POSITIVE_INFINITY)) {
      throw new IllegalArgumentException("time step must be finite and > 0: step=" + step);
    }
  }

  @Override
  public ExplicitMidpoint withStep(double newStep) {
    return new ExplicitMidpoint(newStep);
  }

  @Override
  public SchemeFacts facts() {
    return SchemeFacts.noisy(2, 1, 2, 2);
  }

  @Override
  public double largestStableStep(Model model) {
    return 1 / requireNonNull(model, "model").linearPart().spectralBound();
  }

  @Override
  public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
    requireStableStep(model);
    Amplitudes force = new Amplitudes(model.region(), model.components(), lanes);
    Amplitudes middle = new Amplitudes(model.region(), model.components(), lanes);
    return new KickedStepper(model, noise, lanes, step) {
      @Override
      protected void deterministicStep(double time) {
        forces.force(time, state, force);
        addIncrement(state, dt / 2, force, middle);
        forces.force(time + dt / 2, middle, force);
        addIncrement(state, dt, force, state);
      }
    };
  }
}
