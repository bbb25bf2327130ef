package spgpe.integrate;

import spgpe.hamiltonian.ModeMatrix;
import spgpe.internal.check.Check;
import spgpe.internal.linear.ComplexMatrix;
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

  /**
   * A copy with another step.
   *
   * @param newStep time step, finite and positive
   * @return changed copy
   * @throws IllegalArgumentException if the step is out of range
   */
  public Rk4Ip withStep(double newStep) {
    return ofStep(newStep);
  }

  @Override
  public double step() {
    return step;
  }

  @Override
  public int deterministicOrder() {
    return 4;
  }

  @Override
  public int forceEvaluationsPerStep() {
    return 4;
  }

  @Override
  public double largestStableStep(Model model) {
    return StepLimit.ofExponentialScheme(Check.notNull(model, "model"));
  }

  @Override
  public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
    Check.notNull(model, "model");
    Check.notNull(noise, "noise");
    StepLimit.require(this, model);
    return new Worker(model, noise, lanes, step);
  }

  @Override
  public String toString() {
    return "Rk4Ip: RK4 in the interaction picture with independent half kicks, step=" + step;
  }

  private static final class Worker extends BaseStepper {
    private final ModeTable halfFlow;
    private final StageSum stage;
    private final double[] kick;
    private final boolean noisy;
    private final Amplitudes picture;
    private final Amplitudes sum;
    private final Amplitudes probe;

    Worker(Model model, NoiseGenerator noise, int lanes, double dt) {
      super(model, noise, lanes, dt);
      this.halfFlow = ModeTable.of(halfFlow(model, dt), lanes);
      this.stage = new StageSum(model, dt);
      this.kick = new double[model.components()];
      boolean any = false;
      for (int c = 0; c < kick.length; c++) {
        kick[c] = Math.sqrt(model.reservoir().noiseStrength(c) * dt / 2);
        any |= kick[c] > 0;
      }
      this.noisy = any;
      this.picture = new Amplitudes(model.region(), model.components(), lanes);
      this.sum = new Amplitudes(model.region(), model.components(), lanes);
      this.probe = new Amplitudes(model.region(), model.components(), lanes);
    }

    private static ComplexMatrix[] halfFlow(Model model, double dt) {
      ModeMatrix h = model.linearPart();
      int n = model.components();
      ComplexMatrix[] flows = new ComplexMatrix[model.region().modes()];
      for (int m = 0; m < flows.length; m++) {
        ComplexMatrix generator = new ComplexMatrix(n);
        for (int i = 0; i < n; i++) {
          double gamma = model.reservoir().damping(i);
          for (int j = 0; j < n; j++) {
            generator.set(
                i, j,
                -(gamma * h.re(m, i, j) - h.im(m, i, j)) * dt / 2,
                -(h.re(m, i, j) + gamma * h.im(m, i, j)) * dt / 2);
          }
        }
        flows[m] = generator.exp();
      }
      return flows;
    }

    @Override
    boolean isNoisy() {
      return noisy;
    }

    @Override
    void step(boolean fromSymmetricPoint, Amplitudes normals, double time) {
      if (noisy) {
        add(state, fromSymmetricPoint ? Math.sqrt(0.5) : 1, normals, state);
      }
      halfFlow.multiply(state, picture);
      forces.localForce(time, state, force);
      stage.increment(force, state);
      halfFlow.multiply(state, probe); // k1
      combine(picture, 1.0 / 6, probe, sum);
      combine(picture, 0.5, probe, probe);
      forces.localForce(time + dt / 2, probe, force);
      stage.add(sum, 1.0 / 3, force, sum);
      stage.add(picture, 0.5, force, probe);
      forces.localForce(time + dt / 2, probe, force);
      stage.add(sum, 1.0 / 3, force, sum);
      stage.add(picture, 1, force, picture);
      halfFlow.multiply(picture, probe);
      forces.localForce(time + dt, probe, force);
      halfFlow.multiply(sum, state);
      stage.add(state, 1.0 / 6, force, state);
    }

    @Override
    void toSymmetricPoint(Amplitudes normals, Amplitudes rest, Amplitudes target) {
      target.set(state);
      if (noisy) {
        // half of the kick that the next step adds: (z + z')/2 has variance 1/2 and covariance 1/2
        // with z
        add(target, 0.5, normals, target);
        add(target, 0.5, rest, target);
      }
    }

    private void add(Amplitudes base, double factor, Amplitudes normals, Amplitudes target) {
      for (int c = 0; c < kick.length; c++) {
        combine(factor * kick[c], base.re(c), normals.re(c), target.re(c));
        combine(factor * kick[c], base.im(c), normals.im(c), target.im(c));
      }
    }

    private static void combine(
        Amplitudes base, double factor, Amplitudes other, Amplitudes target) {
      for (int c = 0; c < base.components(); c++) {
        combine(factor, base.re(c), other.re(c), target.re(c));
        combine(factor, base.im(c), other.im(c), target.im(c));
      }
    }

    private static void combine(double factor, double[] base, double[] other, double[] target) {
      for (int e = 0; e < target.length; e++) {
        target[e] = base[e] + factor * other[e];
      }
    }
  }
}
