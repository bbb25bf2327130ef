package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * Fourth-order Runge-Kutta in the interaction picture, with independent noise kicks of half a step
 * before and after: for real-time accuracy, quenches and gamma = 0.
 *
 * <pre>E = exp(-(i + Gamma) h dt/2),   N(a) = -(i + gamma) dt P{local force - mu psi}
 * a_I = E a,  k1 = E N(a),  k2 = N(a_I + k1/2),  k3 = N(a_I + k2/2),  k4 = N(E (a_I + k3))
 * a' = E (a_I + k1/6 + k2/3 + k3/3) + k4/6</pre>
 *
 * <p>Lawson's exponential form of RK4 (Lawson, SIAM J. Numer. Anal. 4, 372 (1967)). Fourth order
 * without noise. At small gamma its numerical damping cools the highest modes: keep dt below [72
 * gamma tol/((g n)<sup>2</sup> eps_max<sup>3</sup>)]<sup>1/5</sup> for a relative temperature error
 * tol (docs/theory.md). Immutable and thread-safe.
 */
public final class Rk4Ip implements Integrator {
  private final double step;

  private Rk4Ip(double step) {
    this.step = step;
  }

  /**
   * Makes the scheme.
   *
   * @param step time step, finite and positive
   * @return the scheme
   * @throws IllegalArgumentException if the step is out of range
   */
  public static Rk4Ip ofStep(double step) {
    return new Rk4Ip(Check.positive(step, "time step"));
  }

  @Override
  public Rk4Ip withStep(double newStep) {
    return ofStep(newStep);
  }

  @Override
  public double step() {
    return step;
  }

  @Override
  public SchemeFacts facts() {
    return SchemeFacts.noisy(4, 1, 2, 4);
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
    return "Rk4Ip: RK4 in the interaction picture with independent half kicks, step=" + step;
  }

  /**
   * Proposes a fixed step from the embedded error estimate at a given state: the step, at most half
   * the stability limit, at which the estimated error of one step relative to the norm of the state
   * is tolerance. For runs with noise choose the step once, from a typical state, since steps that
   * follow the state would bias the law; and mind the equilibrium bias too, see {@code
   * spgpe.integrate.bench.StepAdvisor}. Balac and Mahe, Comput. Phys. Commun. 184, 1211 (2013).
   *
   * @param model the model; its noise plays no part
   * @param state typical state, any number of lanes
   * @param time time at which to try
   * @param tolerance relative error of one step, 1e-14 to 0.1
   * @return dt
   * @throws IllegalArgumentException if the tolerance is out of range, the state is zero or not
   *     finite or the shape does not fit
   */
  public static double suggestStep(Model model, Amplitudes state, double time, double tolerance) {
    Check.notNull(model, "model");
    Check.notNull(state, "state");
    Check.argument(
        tolerance >= 1e-14 && tolerance <= 0.1,
        "tolerance of a step must lie in 1e-14..0.1: tolerance=%s", tolerance);
    int lanes = state.lanes();
    LawsonRk4 scheme = new LawsonRk4(model, model.evaluator(lanes), lanes);
    double largest = StepLimit.ofExponentialScheme(model) / 2;
    Check.argument(
        largest < Double.POSITIVE_INFINITY,
        "a model without local terms is solved exactly at every step: no step to suggest");
    Amplitudes trial = new Amplitudes(model.region(), model.components(), lanes);
    double step = largest;
    for (int attempt = 0; attempt < 60; attempt++) {
      trial.set(state);
      scheme.step(time, step, LinearFlow.over(step / 2, model, lanes), trial);
      double error = scheme.relativeError(time + step, step, trial);
      Check.argument(
          Double.isFinite(error), "the state must be finite and not zero: relative error=%s",
          error);
      if (error <= tolerance && (error >= 0.9 * tolerance || step == largest)) {
        break;
      }
      double factor = error == 0 ? 2 : Math.pow(0.95 * tolerance / error, 0.25);
      step = Math.min(largest, step * Math.max(0.1, Math.min(2, factor)));
    }
    return step;
  }

  private static final class Worker extends KickedStepper {
    private final ModeTable halfFlow;
    private final LawsonRk4 scheme;

    Worker(Model model, NoiseGenerator noise, int lanes, double dt) {
      super(model, noise, lanes, dt);
      this.halfFlow = LinearFlow.over(dt / 2, model, lanes);
      this.scheme = new LawsonRk4(model, forces, lanes);
    }

    @Override
    protected void deterministicStep(double time) {
      scheme.step(time, dt, halfFlow, state);
    }
  }
}
