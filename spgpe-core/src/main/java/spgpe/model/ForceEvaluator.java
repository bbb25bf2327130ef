package spgpe.model;

import java.util.List;
import spgpe.hamiltonian.LocalTerm;
import spgpe.hamiltonian.ModeMatrix;
import spgpe.internal.check.Check;
import spgpe.projector.Amplitudes;
import spgpe.projector.LocalOperation;
import spgpe.projector.ModeTransform;
import spgpe.projector.PointBlock;

/**
 * Evaluates the forces of a model on the kept modes:
 *
 * <pre>F_jk = dK/da_jk^* = [h(k) a]_jk  +  P{sum of local forces - mu_j psi_j}_jk.</pre>
 *
 * <p>Owns scratch memory: one thread at a time. Evaluations allocate nothing.
 */
public final class ForceEvaluator {
  private final Model model;
  private final int lanes;
  private final ModeTransform transform;
  private final List<LocalTerm> terms;
  private final LocalOperation localForces = this::addLocalForces;
  private double time;

  ForceEvaluator(Model model, int lanes) {
    this.model = model;
    this.lanes = lanes;
    this.transform =
        model.region()
            .transform(model.components(), lanes, model.fourierProvider(), model.engine());
    this.terms = model.localTerms();
  }

  /**
   * The part of the force that is not in {@link Model#linearPart}: local terms and, with them, the
   * chemical potentials; zero if there is no local term.
   *
   * @param atTime time
   * @param amplitudes state, not changed
   * @param force overwritten
   * @throws TermFailedException if a term throws
   * @throws IllegalArgumentException if the time is not finite or a shape does not fit
   */
  public void localForce(double atTime, Amplitudes amplitudes, Amplitudes force) {
    Check.finite(atTime, "time");
    Check.notNull(amplitudes, "amplitudes");
    Check.notNull(force, "force");
    if (terms.isEmpty()) {
      amplitudes.requireShape(model.region(), model.components(), lanes);
      force.requireShape(model.region(), model.components(), lanes);
      force.clear();
      return;
    }
    time = atTime;
    transform.applyLocal(amplitudes, localForces, force);
    for (int c = 0; c < model.components(); c++) {
      double mu = model.reservoir().chemicalPotential(c);
      subtract(mu, amplitudes.re(c), force.re(c));
      subtract(mu, amplitudes.im(c), force.im(c));
    }
  }

  /**
   * The whole force dK/da<sup>*</sup>.
   *
   * @param atTime time
   * @param amplitudes state, not changed
   * @param force overwritten
   * @throws TermFailedException if a term throws
   * @throws IllegalArgumentException if the time is not finite or a shape does not fit
   */
  public void force(double atTime, Amplitudes amplitudes, Amplitudes force) {
    localForce(atTime, amplitudes, force);
    ModeMatrix h = model.linearPart();
    for (int i = 0; i < h.components(); i++) {
      for (int j = 0; j < h.components(); j++) {
        double[] re = amplitudes.re(j);
        double[] im = amplitudes.im(j);
        for (int m = 0; m < model.region().modes(); m++) {
          double hRe = h.re(m, i, j);
          double hIm = h.im(m, i, j);
          for (int e = m * lanes; e < (m + 1) * lanes; e++) {
            force.re(i)[e] += hRe * re[e] - hIm * im[e];
            force.im(i)[e] += hRe * im[e] + hIm * re[e];
          }
        }
      }
    }
  }

  private void addLocalForces(PointBlock block) {
    for (int t = 0; t < terms.size(); t++) {
      try {
        terms.get(t).addForce(time, block);
      } catch (RuntimeException e) {
        throw new TermFailedException(terms.get(t).description(), time, e);
      }
    }
  }

  private static void subtract(double factor, double[] from, double[] target) {
    for (int i = 0; i < target.length; i++) {
      target[i] -= factor * from[i];
    }
  }
}
