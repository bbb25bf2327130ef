package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * Exact Ornstein-Uhlenbeck half step of the linear part, implicit midpoint step of the projected
 * nonlinear part, another half step: for long runs that must conserve the norm.
 *
 * <pre>m = a + (dt/2) A(m),   a' = 2 m - a,
 * A(m) = -(i + gamma_j) P{local force - mu_j psi_j}(m)</pre>
 *
 * <p>Second order; without damping the norm is conserved to the tolerance. The equation for m is
 * iterated until no amplitude changes by more than tolerance times the largest one, in each lane
 * for itself, so that lanes do not depend on each other. A fixed number of iterations would bring a
 * spurious damping or growth (docs/integrators.md). Immutable and thread-safe.
 */
public final class OuMidpoint implements Integrator {
  private static final double DEFAULT_TOLERANCE = 1e-12;
  private static final int MAX_ITERATIONS = 100;
  private static final int USUAL_ITERATIONS = 8;

  private final double step;
  private final double tolerance;

  private OuMidpoint(double step, double tolerance) {
    this.step = step;
    this.tolerance = tolerance;
  }

  /**
   * Makes the scheme with tolerance 1e-12.
   *
   * @param step time step, finite and positive
   * @return the scheme
   * @throws IllegalArgumentException if the step is out of range
   */
  public static OuMidpoint ofStep(double step) {
    return new OuMidpoint(Check.positive(step, "time step"), DEFAULT_TOLERANCE);
  }

  @Override
  public OuMidpoint withStep(double newStep) {
    return new OuMidpoint(Check.positive(newStep, "time step"), tolerance);
  }

  /**
   * A copy with another tolerance.
   *
   * @param newTolerance largest relative change of the last iteration, 1e-15 to 1e-3
   * @return changed copy
   * @throws IllegalArgumentException if the tolerance is out of range
   */
  public OuMidpoint withTolerance(double newTolerance) {
    Check.argument(
        newTolerance >= 1e-15 && newTolerance <= 1e-3,
        "tolerance of the midpoint iteration must lie in 1e-15..1e-3: tolerance=%s", newTolerance);
    return new OuMidpoint(step, newTolerance);
  }

  @Override
  public double step() {
    return step;
  }

  @Override
  public SchemeFacts facts() {
    return SchemeFacts.noisy(2, 1, 2, USUAL_ITERATIONS);
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
    return new Worker(model, noise, lanes, step, tolerance);
  }

  @Override
  public String toString() {
    return "OuMidpoint: exact Ornstein-Uhlenbeck half steps around a projected implicit midpoint,"
        + " step=" + step + ", tolerance=" + tolerance;
  }

  private static final class Worker extends OuStepper {
    private final StageSum stage;
    private final double tolerance;
    private final Amplitudes middle;
    private final Amplitudes next;
    private final Amplitudes force;
    private final double[] changes;
    private final double[] sizes;
    private final boolean[] done;

    Worker(Model model, NoiseGenerator noise, int lanes, double dt, double tolerance) {
      super(model, noise, lanes, dt);
      this.stage = new StageSum(model);
      this.tolerance = tolerance;
      this.middle = new Amplitudes(model.region(), model.components(), lanes);
      this.next = new Amplitudes(model.region(), model.components(), lanes);
      this.force = new Amplitudes(model.region(), model.components(), lanes);
      this.changes = new double[lanes];
      this.sizes = new double[lanes];
      this.done = new boolean[lanes];
    }

    @Override
    void nonlinearStep(Amplitudes start, double time) {
      middle.set(start);
      java.util.Arrays.fill(done, false);
      int iterations = 0;
      do {
        requireConvergence(iterations < MAX_ITERATIONS, time);
        forces.localForce(time + dt / 2, middle, force);
        stage.add(start, dt / 2, force, next);
        iterations++;
      } while (!takeNext(start, time));
      for (int c = 0; c < state.components(); c++) {
        reflect(middle.re(c), start.re(c), state.re(c));
        reflect(middle.im(c), start.im(c), state.im(c));
      }
    }

    private void requireConvergence(boolean condition, double time) {
      if (!condition) {
        throw new IllegalStateException(
            "midpoint iteration must converge within " + MAX_ITERATIONS + " iterations: time="
                + time + ", step=" + dt + ", tolerance=" + tolerance
                + "; use a smaller step (g n dt/2 must stay well below 1)");
      }
    }

    private static boolean isFinite(Amplitudes start, int lane) {
      for (int c = 0; c < start.components(); c++) {
        if (!(start.atomNumber(c, lane) < Double.POSITIVE_INFINITY)) {
          return false;
        }
      }
      return true;
    }

    /** Takes over the lanes that have not converged; true if all have. */
    private boolean takeNext(Amplitudes start, double time) {
      java.util.Arrays.fill(changes, 0);
      java.util.Arrays.fill(sizes, 0);
      for (int c = 0; c < state.components(); c++) {
        takeNext(next.re(c), middle.re(c));
        takeNext(next.im(c), middle.im(c));
      }
      boolean all = true;
      for (int lane = 0; lane < done.length; lane++) {
        if (!done[lane] && !(changes[lane] < 1e150)) {
          // a lane that was not finite before is left to the guard of the run
          requireConvergence(!isFinite(start, lane), time);
          done[lane] = true;
        }
        done[lane] |= changes[lane] <= tolerance * sizes[lane];
        all &= done[lane];
      }
      return all;
    }

    private void takeNext(double[] from, double[] to) {
      int lanes = done.length;
      for (int e = 0; e < to.length; e += lanes) {
        for (int lane = 0; lane < lanes; lane++) {
          if (!done[lane]) {
            double change = Math.abs(from[e + lane] - to[e + lane]);
            changes[lane] = Math.max(changes[lane], change);
            sizes[lane] = Math.max(sizes[lane], Math.abs(from[e + lane]));
            to[e + lane] = from[e + lane];
          }
        }
      }
    }

    private static void reflect(double[] middle, double[] start, double[] target) {
      for (int e = 0; e < target.length; e++) {
        target[e] = 2 * middle[e] - start[e];
      }
    }
  }
}
