package spgpe.internal.measure;

import java.util.Arrays;
import java.util.List;
import spgpe.hamiltonian.LocalTerm;
import spgpe.hamiltonian.ModeMatrix;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Field;
import spgpe.projector.ModeTransform;
import spgpe.projector.PointBlock;
import spgpe.run.Snapshot;

/**
 * First and second derivatives of K at a state. Vectors of real phase space (q, p), a = (q +
 * ip)/sqrt 2, are represented by complex amplitudes; the gradient of K is then F = dK/da^*, that of
 * N is a, and the inner product is 2 Re sum u^* v. Owns scratch memory: one thread at a time.
 *
 * <p>Second derivatives of local terms are differences of their forces at the grid points with one
 * Richardson step: exact to rounding for forces up to third degree, and to 1e-11 for the fifth.
 */
public final class CurvatureMeter {
  private static final double STEP = 1e-3;

  private final Model model;
  private final List<LocalTerm> terms;
  private final ModeTransform transform;
  private final Amplitudes gradient;
  private final Amplitudes gradientTurned;
  private final Amplitudes stateTurned;
  private final Field psi;
  private final Field direction;
  private final Field shifted;
  private final Field force;
  private final Field difference;
  private final PointBlock block;
  private double time;
  private Amplitudes state;
  private boolean hasGradientTurned;
  private boolean hasStateTurned;
  private double trace;
  private boolean hasTrace;

  private CurvatureMeter(Model model) {
    this.model = model;
    this.terms = model.localTerms();
    this.transform = model.region().transform(model.components(), 1, model.fourierProvider());
    this.gradient = vector();
    this.gradientTurned = vector();
    this.stateTurned = vector();
    this.psi = field();
    this.direction = field();
    this.shifted = field();
    this.force = field();
    this.difference = field();
    this.block = PointBlock.ofAll(shifted, force);
    this.state = gradient;
  }

  /**
   * The meter at the state of a snapshot, shared by all who ask during a look.
   *
   * @param snapshot what is measured
   * @return meter, valid as long as the snapshot's field
   */
  public static CurvatureMeter at(Snapshot snapshot) {
    return snapshot.computed(
        CurvatureMeter.class, CurvatureMeter.class, CurvatureMeter::new,
        (s, meter) -> meter.goTo(s.time(), s.amplitudes(), s.field()));
  }

  private Field field() {
    return new Field(model.region().grid(), model.components(), 1);
  }

  /**
   * A vector of phase space.
   *
   * @return zeros
   */
  public Amplitudes vector() {
    return new Amplitudes(model.region(), model.components(), 1);
  }

  private void goTo(double atTime, Amplitudes amplitudes, Field field) {
    time = atTime;
    state = amplitudes;
    hasGradientTurned = false;
    hasStateTurned = false;
    hasTrace = false;
    copy(field, psi);
    if (hasLocalTerms()) {
      copy(psi, shifted);
      computeForce();
      transform.toModes(force, gradient);
    } else {
      gradient.clear();
    }
    addLinearPart(state, gradient);
  }

  private boolean hasLocalTerms() {
    return !terms.isEmpty();
  }

  /** Of the local terms at {@link #shifted}. */
  private void computeForce() {
    clear(force);
    for (int t = 0; t < terms.size(); t++) { // without an iterator: allocates nothing
      terms.get(t).addForce(time, block);
    }
  }

  /** result += h v, with -mu v if the chemical potentials are not in h. */
  private void addLinearPart(Amplitudes v, Amplitudes result) {
    ModeMatrix h = model.linearPart();
    for (int i = 0; i < h.components(); i++) {
      double mu =
          model.chemicalPotentialActsLocally() ? model.reservoir().chemicalPotential(i) : 0;
      double[] re = result.re(i);
      double[] im = result.im(i);
      for (int j = 0; j < h.components(); j++) {
        double[] vRe = v.re(j);
        double[] vIm = v.im(j);
        for (int m = 0; m < re.length; m++) {
          double hRe = h.re(m, i, j) - (i == j ? mu : 0);
          double hIm = h.im(m, i, j);
          re[m] += hRe * vRe[m] - hIm * vIm[m];
          im[m] += hRe * vIm[m] + hIm * vRe[m];
        }
      }
    }
  }

  private static void copy(Field from, Field to) {
    for (int c = 0; c < from.components(); c++) {
      System.arraycopy(from.re(c), 0, to.re(c), 0, from.re(c).length);
      System.arraycopy(from.im(c), 0, to.im(c), 0, from.im(c).length);
    }
  }

  private static void clear(Field field) {
    for (int c = 0; c < field.components(); c++) {
      Arrays.fill(field.re(c), 0);
      Arrays.fill(field.im(c), 0);
    }
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
   * H F, the second derivative along the gradient.
   *
   * @return live vector, valid until the next state
   */
  public Amplitudes alongGradient() {
    if (!hasGradientTurned) {
      hessian(gradient, gradientTurned);
      hasGradientTurned = true;
    }
    return gradientTurned;
  }

  /**
   * H a, the second derivative along the state.
   *
   * @return live vector, valid until the next state
   */
  public Amplitudes alongState() {
    if (!hasStateTurned) {
      hessian(state, stateTurned);
      hasStateTurned = true;
    }
    return stateTurned;
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
    if (hasLocalTerms()) {
      double h = STEP * (scale > 0 ? scale : 1) / size;
      transform.toPosition(v, direction);
      clear(difference);
      addForce(h, 4 / (3 * 2 * h));
      addForce(-h, -4 / (3 * 2 * h));
      addForce(2 * h, -1 / (3 * 4 * h));
      addForce(-2 * h, 1 / (3 * 4 * h));
      transform.toModes(difference, result);
    }
    addLinearPart(v, result);
  }

  /** difference += weight force(psi + s direction). */
  private void addForce(double s, double weight) {
    for (int c = 0; c < psi.components(); c++) {
      shift(psi.re(c), s, direction.re(c), shifted.re(c));
      shift(psi.im(c), s, direction.im(c), shifted.im(c));
    }
    computeForce();
    for (int c = 0; c < psi.components(); c++) {
      shift(difference.re(c), weight, force.re(c), difference.re(c));
      shift(difference.im(c), weight, force.im(c), difference.im(c));
    }
  }

  /** result = x + s y. */
  private static void shift(double[] x, double s, double[] y, double[] result) {
    for (int i = 0; i < result.length; i++) {
      result[i] = x[i] + s * y[i];
    }
  }

  /**
   * Trace of the Hessian in (q, p): 2 sum over modes and components of d^2K/da da^*. A local force
   * f contributes (modes/V) integral of df_j/dpsi_j for each component.
   *
   * @return the trace
   */
  public double trace() {
    if (!hasTrace) {
      trace = computeTrace();
      hasTrace = true;
    }
    return trace;
  }

  private double computeTrace() {
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
    if (hasLocalTerms()) {
      copy(psi, shifted);
      double scale = Math.sqrt(dot(state, state) / model.region().grid().volume());
      double step = STEP * (scale > 0 ? scale : 1);
      for (int c = 0; c < model.components(); c++) {
        double slope =
            meanSlope(psi.re(c), shifted.re(c), force.re(c), step)
                + meanSlope(psi.im(c), shifted.im(c), force.im(c), step);
        sum += modes * slope / 2;
      }
    }
    return 2 * sum;
  }

  /** Spatial mean of the derivative of a part of the force with respect to its own quadrature. */
  private double meanSlope(double[] quadrature, double[] moved, double[] part, double h) {
    double near = forceSum(quadrature, moved, part, h) - forceSum(quadrature, moved, part, -h);
    double far =
        forceSum(quadrature, moved, part, 2 * h) - forceSum(quadrature, moved, part, -2 * h);
    System.arraycopy(quadrature, 0, moved, 0, moved.length);
    return (4 * near / (2 * h) - far / (4 * h)) / 3 / quadrature.length;
  }

  private double forceSum(double[] quadrature, double[] moved, double[] part, double shift) {
    for (int i = 0; i < moved.length; i++) {
      moved[i] = quadrature[i] + shift;
    }
    computeForce();
    double sum = 0;
    for (double f : part) {
      sum += f;
    }
    Check.state(!Double.isNaN(sum), "a force must not be NaN");
    return sum;
  }
}
