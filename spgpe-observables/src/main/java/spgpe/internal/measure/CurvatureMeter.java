package spgpe.internal.measure;

import spgpe.hamiltonian.LocalTerm;
import spgpe.hamiltonian.ModeMatrix;
import spgpe.internal.check.Check;
import spgpe.model.ForceEvaluator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Field;
import spgpe.projector.ModeTransform;
import spgpe.projector.PointBlock;

/**
 * First and second derivatives of K at a state. Vectors of real phase space (q, p), a = (q +
 * ip)/sqrt 2, are represented by complex amplitudes; the gradient of K is then F = dK/da^*, that of
 * N is a, and the inner product is 2 Re sum u^* v. Owns scratch memory: one thread at a time.
 *
 * <p>Second derivatives are differences with one Richardson step: exact to rounding for forces up
 * to third degree, and to 1e-11 for the fifth.
 */
public final class CurvatureMeter {
  private static final double STEP = 1e-3;

  private final Model model;
  private final ForceEvaluator evaluator;
  private final ModeTransform transform;
  private final Amplitudes gradient;
  private final Amplitudes shifted;
  private final Amplitudes shiftedForce;
  private final Field psi;
  private final Field force;
  private final PointBlock block;
  private double time;
  private Amplitudes state;

  /**
   * Makes a meter.
   *
   * @param model the model
   */
  public CurvatureMeter(Model model) {
    this.model = model;
    this.evaluator = model.evaluator(1);
    this.transform = model.region().transform(model.components(), 1, model.fourierProvider());
    this.gradient = vector();
    this.shifted = vector();
    this.shiftedForce = vector();
    this.psi = new Field(model.region().grid(), model.components(), 1);
    this.force = new Field(model.region().grid(), model.components(), 1);
    this.block = PointBlock.ofAll(psi, force);
    this.state = gradient;
  }

  /**
   * A vector of phase space.
   *
   * @return zeros
   */
  public Amplitudes vector() {
    return new Amplitudes(model.region(), model.components(), 1);
  }

  /**
   * Goes to a state.
   *
   * @param atTime time
   * @param amplitudes state with one lane; viewed until the next call
   */
  public void goTo(double atTime, Amplitudes amplitudes) {
    time = atTime;
    state = amplitudes;
    evaluator.force(atTime, amplitudes, gradient);
  }

  /**
   * Gradient F of K.
   *
   * @return live vector, valid until the next state
   */
  public Amplitudes gradient() {
    return gradient;
  }

  /**
   * Real dimension of phase space.
   *
   * @return two for each mode and component
   */
  public int dimension() {
    return 2 * model.region().modes() * model.components();
  }

  /**
   * Inner product 2 Re sum u^* v.
   *
   * @param u vector
   * @param v vector
   * @return product
   */
  public static double dot(Amplitudes u, Amplitudes v) {
    double sum = 0;
    for (int c = 0; c < u.components(); c++) {
      for (int m = 0; m < u.re(c).length; m++) {
        sum += u.re(c)[m] * v.re(c)[m] + u.im(c)[m] * v.im(c)[m];
      }
    }
    return 2 * sum;
  }

  /**
   * Second derivative of K along a vector: H v = d/ds F(a + s v).
   *
   * @param v vector, not changed
   * @param result overwritten
   */
  public void hessian(Amplitudes v, Amplitudes result) {
    result.clear();
    double size = Math.sqrt(dot(v, v));
    if (size == 0) {
      return;
    }
    double scale = Math.sqrt(dot(state, state));
    double h = STEP * (scale > 0 ? scale : 1) / size;
    addForce(v, h, 4 / (3 * 2 * h), result);
    addForce(v, -h, -4 / (3 * 2 * h), result);
    addForce(v, 2 * h, -1 / (3 * 4 * h), result);
    addForce(v, -2 * h, 1 / (3 * 4 * h), result);
  }

  private void addForce(Amplitudes v, double s, double weight, Amplitudes sum) {
    for (int c = 0; c < v.components(); c++) {
      for (int m = 0; m < v.re(c).length; m++) {
        shifted.re(c)[m] = state.re(c)[m] + s * v.re(c)[m];
        shifted.im(c)[m] = state.im(c)[m] + s * v.im(c)[m];
      }
    }
    evaluator.force(time, shifted, shiftedForce);
    for (int c = 0; c < v.components(); c++) {
      for (int m = 0; m < v.re(c).length; m++) {
        sum.re(c)[m] += weight * shiftedForce.re(c)[m];
        sum.im(c)[m] += weight * shiftedForce.im(c)[m];
      }
    }
  }

  /**
   * Trace of the Hessian in (q, p): 2 sum over modes and components of d^2K/da da^*. A local force
   * f contributes (modes/V) integral of df_j/dpsi_j for each component.
   *
   * @return the trace
   */
  public double trace() {
    double sum = 0;
    ModeMatrix h = model.linearPart();
    int modes = model.region().modes();
    for (int c = 0; c < model.components(); c++) {
      for (int m = 0; m < modes; m++) {
        sum += h.re(m, c, c);
      }
      if (model.chemicalPotentialActsLocally()) {
        sum -= modes * model.reservoir().chemicalPotential(c);
      }
    }
    if (!model.localTerms().isEmpty()) {
      transform.toPosition(state, psi);
      double scale = Math.sqrt(dot(state, state) / model.region().grid().volume());
      double step = STEP * (scale > 0 ? scale : 1);
      for (int c = 0; c < model.components(); c++) {
        double slope =
            (meanSlope(psi.re(c), c, true, step) + meanSlope(psi.im(c), c, false, step)) / 2;
        sum += modes * slope;
      }
    }
    return 2 * sum;
  }

  /** Spatial mean of the derivative of f_c with respect to one quadrature of psi_c. */
  private double meanSlope(double[] quadrature, int component, boolean real, double h) {
    double near = forceDifference(quadrature, component, real, h);
    double far = forceDifference(quadrature, component, real, 2 * h);
    return (4 * near / (2 * h) - far / (4 * h)) / 3 / quadrature.length;
  }

  private double forceDifference(double[] quadrature, int component, boolean real, double h) {
    return forceSum(quadrature, component, real, h) - forceSum(quadrature, component, real, -h);
  }

  private double forceSum(double[] quadrature, int component, boolean real, double shift) {
    for (int c = 0; c < model.components(); c++) {
      java.util.Arrays.fill(force.re(c), 0);
      java.util.Arrays.fill(force.im(c), 0);
    }
    double[] kept = quadrature.clone();
    for (int i = 0; i < quadrature.length; i++) {
      quadrature[i] += shift;
    }
    for (LocalTerm term : model.localTerms()) {
      term.addForce(time, block);
    }
    System.arraycopy(kept, 0, quadrature, 0, kept.length);
    double sum = 0;
    for (double f : real ? force.re(component) : force.im(component)) {
      sum += f;
    }
    Check.state(!Double.isNaN(sum), "a force must not be NaN: component=%s", component);
    return sum;
  }
}
