package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * The default scheme: exact Ornstein-Uhlenbeck half step of the linear part (rotation, damping and
 * noise together), classical fourth-order Runge-Kutta step of the projected nonlinear part, and
 * another Ornstein-Uhlenbeck half step.
 *
 * <pre>linear:     da = -(i + Gamma) h(k) a dt + dW                 solved exactly
 * nonlinear:  da = -(i + gamma_j) P{local force - mu_j psi_j} dt   by RK4</pre>
 *
 * <p>Second order in dt. The bias of the equilibrium occupations does not grow when gamma gets
 * small: at most about 0.1 % where dt eps_max &le; 0.9 and 1 % where dt eps_max &le; 1.8 (gn = 1,
 * docs/validation.md). It does grow with strong damping, to four times as much at gamma = 1. The
 * idea of an exact thermostat step in a splitting is that of Leimkuhler and Matthews, Appl. Math.
 * Res. Express 2013, 34. Immutable and thread-safe.
 */
public final class OuRk4 implements Integrator {
  private final double step;

  private OuRk4(double step) {
    this.step = step;
  }

  /**
   * Makes the scheme.
   *
   * @param step time step, finite and positive
   * @return the scheme
   * @throws IllegalArgumentException if the step is out of range
   */
  public static OuRk4 ofStep(double step) {
    return new OuRk4(Check.positive(step, "time step"));
  }

  @Override
  public OuRk4 withStep(double newStep) {
    return ofStep(newStep);
  }

  @Override
  public double step() {
    return step;
  }

  @Override
  public SchemeFacts facts() {
    return SchemeFacts.noisy(2, 1, 2, 4);
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
    return "OuRk4: exact Ornstein-Uhlenbeck half steps around projected RK4, step=" + step;
  }

  private static final class Worker extends OuStepper {
    private final StageSum stage;
    private final Amplitudes probe;
    private final Amplitudes force;

    Worker(Model model, NoiseGenerator noise, int lanes, double dt) {
      super(model, noise, lanes, dt);
      this.stage = new StageSum(model);
      this.probe = new Amplitudes(model.region(), model.components(), lanes);
      this.force = new Amplitudes(model.region(), model.components(), lanes);
    }

    @Override
    void nonlinearStep(Amplitudes start, double time) {
      forces.localForce(time, start, force);
      stage.add(start, dt / 6, force, state);
      stage.add(start, dt / 2, force, probe);
      forces.localForce(time + dt / 2, probe, force);
      stage.add(state, dt / 3, force, state);
      stage.add(start, dt / 2, force, probe);
      forces.localForce(time + dt / 2, probe, force);
      stage.add(state, dt / 3, force, state);
      stage.add(start, dt, force, probe);
      forces.localForce(time + dt, probe, force);
      stage.add(state, dt / 6, force, state);
    }
  }
}
