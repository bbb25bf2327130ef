package spgpe.integrate;

import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;

/**
 * A bad scheme for the tests: all of the noise in one kick before RK4 in the interaction picture.
 *
 * @param step time step
 */
public record OneKick(double step) implements Integrator {
  @Override
  public OneKick withStep(double newStep) {
    return new OneKick(newStep);
  }

  @Override
  public SchemeFacts facts() {
    return SchemeFacts.noisy(4, 1, 1, 4);
  }

  @Override
  public double largestStableStep(Model model) {
    return Rk4Ip.ofStep(step).largestStableStep(model);
  }

  @Override
  public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
    Model quiet = model.withReservoir(model.reservoir().withTemperature(0));
    Stepper inner =
        Rk4Ip.ofStep(step)
            .bind(
                quiet,
                RandomStreams.counterBased(0).generator(model.region(), model.components(), lanes),
                lanes);
    HalfKicks kicks = new HalfKicks(model, step);
    return new AbstractStepper(model, noise, lanes, step) {
      @Override
      protected boolean isNoisy() {
        return true;
      }

      @Override
      protected void step(boolean fromSymmetricPoint, Amplitudes normals, double time) {
        kicks.kick(false, normals, state);
        inner.start(state, Math.round(time / dt));
        inner.advance();
        inner.observe(state);
      }

      @Override
      protected void toSymmetricPoint(Amplitudes normals, Amplitudes rest, Amplitudes target) {
        target.set(state);
      }
    };
  }
}
