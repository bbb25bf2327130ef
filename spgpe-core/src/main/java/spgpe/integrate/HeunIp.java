package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * Stochastic Heun scheme in the interaction picture, with independent noise kicks of half a step
 * before and after: a second-order scheme for comparison.
 *
 * <pre>E = exp(-(i + Gamma) h dt),   N(a) = -(i + gamma) dt P{local force - mu psi}
 * k1 = E N(a),   k2 = N(E a + k1),   a' = E a + (k1 + k2)/2</pre>
 *
 * <p>Its numerical heating or damping is much larger than that of {@link Rk4Ip} at equal cost; in
 * the laboratory frame it would be useless (docs/integrators.md). Immutable and thread-safe.
 */
public final class HeunIp implements Integrator {
  private final double step;

  private HeunIp(double step) {
    this.step = step;
  }

  /**
   * Makes the scheme.
   *
   * @param step time step, finite and positive
   * @return the scheme
   * @throws IllegalArgumentException if the step is out of range
   */
  public static HeunIp ofStep(double step) {
    return new HeunIp(Check.positive(step, "time step"));
  }

  @Override
  public HeunIp withStep(double newStep) {
    return ofStep(newStep);
  }

  @Override
  public double step() {
    return step;
  }

  @Override
  public SchemeFacts facts() {
    return SchemeFacts.noisy(2, 1, 2, 2);
  }

  @Override
  public double largestStableStep(Model model) {
    return StepLimit.ofExponentialScheme(Check.notNull(model, "model"));
  }

  @Override
  public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
    Check.notNull(model, "model");
    Check.notNull(noise, "noise");
    requireStableStep(model);
    return new Worker(model, noise, lanes, step);
  }

  @Override
  public String toString() {
    return "HeunIp: Heun in the interaction picture with independent half kicks, step=" + step;
  }

  private static final class Worker extends KickedStepper {
    private final ModeTable flow;
    private final Amplitudes force;
    private final Amplitudes increment;
    private final Amplitudes probe;

    Worker(Model model, NoiseGenerator noise, int lanes, double dt) {
      super(model, noise, lanes, dt);
      this.flow = LinearFlow.over(dt, model, lanes);
      this.force = new Amplitudes(model.region(), model.components(), lanes);
      this.increment = new Amplitudes(model.region(), model.components(), lanes);
      this.probe = new Amplitudes(model.region(), model.components(), lanes);
    }

    @Override
    protected void deterministicStep(double time) {
      forces.localForce(time, state, force);
      addIncrement(state, dt / 2, force, increment);
      addIncrement(state, dt, force, probe);
      flow.multiply(increment, state); // E a + k1/2
      flow.multiply(probe, increment); // E a + k1
      forces.localForce(time + dt, increment, force);
      addIncrement(state, dt / 2, force, state);
    }
  }
}
