package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * Strang splitting on the unprojected lattice: exact Ornstein-Uhlenbeck half step of the linear
 * part, flow of the local part point by point, another half step. One pair of transforms per step.
 *
 * <p>Second order; the cheapest scheme for equilibrium where a lattice (all modes kept, forces
 * alias) is accepted. Needs {@link spgpe.projector.Projector#allModes} and local terms that are
 * {@link spgpe.hamiltonian.ExactFlow}s; refuses a projector, since projecting after an exact local
 * flow drops to first order. Strang, SIAM J. Numer. Anal. 5, 506 (1968). Immutable and thread-safe.
 */
public final class LatticeStrang implements Integrator {
  private final double step;

  private LatticeStrang(double step) {
    this.step = step;
  }

  /**
   * Makes the scheme.
   *
   * @param step time step, finite and positive
   * @return the scheme
   * @throws IllegalArgumentException if the step is out of range
   */
  public static LatticeStrang ofStep(double step) {
    return new LatticeStrang(Check.positive(step, "time step"));
  }

  @Override
  public LatticeStrang withStep(double newStep) {
    return ofStep(newStep);
  }

  @Override
  public double step() {
    return step;
  }

  @Override
  public SchemeFacts facts() {
    return SchemeFacts.noisy(2, 1, 2, 1).onLatticeOnly();
  }

  @Override
  public double largestStableStep(Model model) {
    return StepLimit.ofExponentialScheme(Check.notNull(model, "model"));
  }

  @Override
  public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
    Check.notNull(model, "model");
    Check.notNull(noise, "noise");
    LocalFlow.require(model, "LatticeStrang");
    requireStableStep(model);
    return new Worker(model, noise, lanes, step);
  }

  @Override
  public String toString() {
    return "LatticeStrang: exact Ornstein-Uhlenbeck half steps around the local flow, step=" + step;
  }

  private static final class Worker extends OuStepper {
    private final LocalFlow local;

    Worker(Model model, NoiseGenerator noise, int lanes, double dt) {
      super(model, noise, lanes, dt);
      this.local = new LocalFlow(model, lanes);
    }

    @Override
    void nonlinearStep(Amplitudes start, double time) {
      state.set(start);
      local.advance(time + dt / 2, dt, state);
    }
  }
}
