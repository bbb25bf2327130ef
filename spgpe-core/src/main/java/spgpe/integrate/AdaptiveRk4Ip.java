package spgpe.integrate;

import org.jspecify.annotations.Nullable;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * RK4 in the interaction picture that halves and doubles its own step to keep the embedded error
 * estimate below a tolerance, for gamma = 0.
 *
 * <p>The step of the recipe is the interval at which the state can be observed; inside, the scheme
 * takes interval/2<sup>r</sup>. With noise, steps chosen from the state would bias the equilibrium
 * law: models with damping are refused (choose a fixed step with {@link Rk4Ip#suggestStep}). One
 * lane only, for neighbours must not share a step. Method: Balac and Mahe, Comput. Phys. Commun.
 * 184, 1211 (2013). Immutable and thread-safe.
 */
public final class AdaptiveRk4Ip implements Integrator {
  private static final int MAX_REFINEMENT = 40;

  /** Local error of the third-order solution falls by 16 when the step is halved. */
  private static final double ROOM_FOR_DOUBLING = 1.0 / 32;

  private final double interval;
  private final double tolerance;

  private AdaptiveRk4Ip(double interval, double tolerance) {
    this.interval = interval;
    this.tolerance = tolerance;
  }

  /**
   * Makes the scheme.
   *
   * @param interval time between possible observations, finite and positive
   * @param tolerance largest estimated error of one step relative to the norm of the state, 1e-15
   *     to 0.1
   * @return the scheme
   * @throws IllegalArgumentException if a value is out of range
   */
  public static AdaptiveRk4Ip of(double interval, double tolerance) {
    Check.positive(interval, "interval");
    Check.argument(
        tolerance >= 1e-15 && tolerance <= 0.1,
        "tolerance of a step must lie in 1e-15..0.1: tolerance=%s", tolerance);
    return new AdaptiveRk4Ip(interval, tolerance);
  }

  @Override
  public AdaptiveRk4Ip withStep(double newInterval) {
    return of(newInterval, tolerance);
  }

  @Override
  public double step() {
    return interval;
  }

  @Override
  public SchemeFacts facts() {
    return SchemeFacts.noiseless(4, 5);
  }

  @Override
  public double largestStableStep(Model model) {
    Check.notNull(model, "model");
    return Double.POSITIVE_INFINITY;
  }

  @Override
  public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
    Check.notNull(model, "model");
    Check.notNull(noise, "noise");
    Check.argument(
        lanes == 1,
        "AdaptiveRk4Ip advances one lane, since lanes must not share a step: lanes=%s", lanes);
    for (int c = 0; c < model.components(); c++) {
      Check.argument(
          model.reservoir().damping(c) == 0,
          "AdaptiveRk4Ip needs damping 0, since steps chosen from the state bias the law of a"
              + " damped, noisy field: gamma=%s, component=%s; choose a fixed step with"
              + " Rk4Ip.suggestStep", model.reservoir().damping(c), c);
    }
    return new Worker(model, noise, interval, tolerance, StepLimit.ofExponentialScheme(model));
  }

  @Override
  public String toString() {
    return "AdaptiveRk4Ip: RK4 in the interaction picture, interval=" + interval + ", tolerance="
        + tolerance;
  }

  private static final class Worker extends AbstractStepper {
    private final Model model;
    private final double tolerance;
    private final LawsonRk4 scheme;
    private final Amplitudes before;
    private final @Nullable ModeTable[] halfFlows = new ModeTable[MAX_REFINEMENT + 1];
    private final int least;
    private int refinement;

    Worker(
        Model model, NoiseGenerator noise, double interval, double tolerance, double stableStep) {
      super(model, noise, 1, interval);
      this.model = model;
      this.tolerance = tolerance;
      this.scheme = new LawsonRk4(model, forces, 1);
      this.before = new Amplitudes(model.region(), model.components(), 1);
      int r = 0;
      while (r < MAX_REFINEMENT && Math.scalb(interval, -r) >= stableStep) {
        r++;
      }
      this.least = r;
    }

    @Override
    protected boolean isNoisy() {
      return false;
    }

    @Override
    protected void step(boolean fromSymmetricPoint, Amplitudes normals, double time) {
      refinement = Math.max(refinement, least);
      long position = 0; // in units of dt/2^refinement
      while (position < 1L << refinement) {
        double h = Math.scalb(dt, -refinement);
        double now = time + position * h;
        before.set(state);
        scheme.step(now, h, halfFlow(), state);
        double error = scheme.relativeError(now + h, h, state);
        if (error <= tolerance) {
          position++;
          while (error < ROOM_FOR_DOUBLING * tolerance && position % 2 == 0
              && refinement > least && position < 1L << refinement) {
            refinement--;
            position /= 2;
            error *= 16;
          }
        } else {
          if (refinement == MAX_REFINEMENT || !Double.isFinite(error)) {
            throw new IllegalStateException(
                "adaptive step must not shrink below interval/2^" + MAX_REFINEMENT + ": time=" + now
                    + ", interval=" + dt + ", relative error=" + error + ", tolerance=" + tolerance
                    + "; the state may not be finite, or use a larger tolerance");
          }
          state.set(before);
          refinement++;
          position *= 2;
        }
      }
    }

    private ModeTable halfFlow() {
      ModeTable flow = halfFlows[refinement];
      if (flow == null) {
        flow = LinearFlow.over(Math.scalb(dt, -refinement - 1), model, 1);
        halfFlows[refinement] = flow;
      }
      return flow;
    }

    @Override
    protected void toSymmetricPoint(Amplitudes normals, Amplitudes rest, Amplitudes target) {
      target.set(state);
    }

    @Override
    int refinement() {
      return refinement;
    }

    @Override
    void setRefinement(int saved) {
      refinement = saved;
    }
  }
}
