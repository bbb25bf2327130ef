package spgpe.integrate;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/**
 * Fourth-order split-step compositions on the unprojected lattice, for gamma = 0: linear flows over
 * a_i dt and local flows over b_i dt in turn,
 *
 * <pre>a_1 b_1 a_2 b_2 ... b_s a_(s+1),   sum of a = sum of b = 1.</pre>
 *
 * <p>Every composition of order above two has stages backwards in time (Sheng, IMA J. Numer. Anal.
 * 9, 199 (1989); Suzuki, J. Math. Phys. 32, 400 (1991); both from memory), in which
 * damping would grow and noise would need a negative variance: models with damping are refused, and
 * so is a projector. Conserves the norm to rounding. Immutable and thread-safe.
 */
public final class LatticeComposition implements Integrator {
  private static final double YOSHIDA_OUTER = 1 / (2 - Math.cbrt(2));
  private static final double YOSHIDA_INNER = 1 - 2 * YOSHIDA_OUTER;

  private final String name;
  private final double step;
  private final double[] a;
  private final double[] b;
  private final boolean needsExactLocalFlow;

  private LatticeComposition(
      String name, double step, double[] a, double[] b, boolean needsExactLocalFlow) {
    this.name = name;
    this.step = step;
    this.a = a;
    this.b = b;
    this.needsExactLocalFlow = needsExactLocalFlow;
  }

  /**
   * Three Strang steps of lengths w, 1 - 2 w, w, with w = 1/(2 - 2<sup>1/3</sup>). Three pairs of
   * transforms per step. Yoshida, Phys. Lett. A 150, 262 (1990).
   *
   * @param step time step, finite and positive
   * @return the scheme
   * @throws IllegalArgumentException if the step is out of range
   */
  public static LatticeComposition yoshida(double step) {
    Check.positive(step, "time step");
    double w = YOSHIDA_OUTER;
    double v = YOSHIDA_INNER;
    return new LatticeComposition(
        "Yoshida", step, new double[] {w / 2, (w + v) / 2, (v + w) / 2, w / 2},
        new double[] {w, v, w}, false);
  }

  /**
   * The optimised six-stage splitting of Blanes and Moan, J. Comput. Appl. Math. 142, 313 (2002),
   * with errors some hundred times below {@link #yoshida} at the same step and twice its cost. It
   * is no composition of symmetric steps and loses its order when the local flow is not exact:
   * models whose local terms do not commute are refused.
   *
   * @param step time step, finite and positive
   * @return the scheme
   * @throws IllegalArgumentException if the step is out of range
   */
  public static LatticeComposition blanesMoan(double step) {
    Check.positive(step, "time step");
    double a1 = 0.0792036964311957;
    double a2 = 0.353172906049774;
    double a3 = -0.0420650803577195;
    double a4 = 1 - 2 * (a1 + a2 + a3);
    double b1 = 0.209515106613362;
    double b2 = -0.143851773179818;
    double b3 = 0.5 - (b1 + b2);
    return new LatticeComposition(
        "Blanes-Moan", step, new double[] {a1, a2, a3, a4, a3, a2, a1},
        new double[] {b1, b2, b3, b3, b2, b1}, true);
  }

  @Override
  public LatticeComposition withStep(double newStep) {
    return new LatticeComposition(
        name, Check.positive(newStep, "time step"), a, b, needsExactLocalFlow);
  }

  @Override
  public double step() {
    return step;
  }

  @Override
  public SchemeFacts facts() {
    return SchemeFacts.noiseless(4, b.length).onLatticeOnly();
  }

  @Override
  public double largestStableStep(Model model) {
    return StepLimit.ofExponentialScheme(Check.notNull(model, "model"));
  }

  @Override
  public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
    Check.notNull(model, "model");
    Check.notNull(noise, "noise");
    LocalFlow.require(model, name + " composition");
    for (int c = 0; c < model.components(); c++) {
      double gamma = model.reservoir().damping(c);
      Check.argument(
          gamma == 0,
          "%s composition has stages backwards in time, in which damping grows and noise is"
              + " impossible; damping must be 0: gamma=%s, component=%s; use LatticeStrang",
          name, gamma, c);
    }
    Check.argument(
        !needsExactLocalFlow || LocalFlow.flowsCommute(model),
        "%s composition needs local terms whose flows commute, else it drops to second order:"
            + " terms=%s; use LatticeComposition.yoshida",
        name, model.hamiltonian());
    requireStableStep(model);
    return new Worker(model, noise, lanes, step, a, b);
  }

  @Override
  public String toString() {
    return "LatticeComposition: " + name + ", step=" + step;
  }

  private static final class Worker extends AbstractStepper {
    private final ModeTable[] flows;
    private final LocalFlow local;
    private final double[] a;
    private final double[] b;
    private final Amplitudes scratch;

    Worker(
        Model model, NoiseGenerator noise, int lanes, double dt, double[] a, double[] b) {
      super(model, noise, lanes, dt);
      this.a = a;
      this.b = b;
      this.flows = new ModeTable[a.length];
      for (int i = 0; i < a.length; i++) {
        int mirror = a.length - 1 - i;
        flows[i] = mirror < i ? flows[mirror] : LinearFlow.over(a[i] * dt, model, lanes);
      }
      this.local = new LocalFlow(model, lanes);
      this.scratch = new Amplitudes(model.region(), model.components(), lanes);
    }

    @Override
    protected boolean isNoisy() {
      return false;
    }

    @Override
    protected void step(boolean fromSymmetricPoint, Amplitudes normals, double time) {
      double now = time;
      for (int i = 0; i < a.length; i++) {
        flows[i].multiply(state, scratch);
        state.set(scratch);
        now += a[i] * dt;
        if (i < b.length) {
          local.advance(now, b[i] * dt, state);
        }
      }
    }

    @Override
    protected void toSymmetricPoint(Amplitudes normals, Amplitudes rest, Amplitudes target) {
      target.set(state);
    }
  }
}
