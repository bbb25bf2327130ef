package spgpe.integrate;

import java.util.ArrayList;
import java.util.List;
import spgpe.hamiltonian.ExactFlow;
import spgpe.hamiltonian.LocalTerm;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Field;
import spgpe.projector.ModeTransform;
import spgpe.projector.PointBlock;

/**
 * The local part of the equation of motion on an unprojected lattice, point by point:
 *
 * <pre>dpsi_j = -(i + gamma_j)(local force_j - mu_j psi_j) dt</pre>
 *
 * <p>The Hamiltonian part is a palindrome of exact flows (one product if they all commute); the
 * damping part, which is small, takes explicit midpoint half steps before and after it. One thread
 * at a time.
 */
final class LocalFlow {
  private final Model model;
  private final ModeTransform transform;
  private final Field psi;
  private final Field force;
  private final Field middle;
  private final PointBlock block;
  private final PointBlock middleBlock;
  private final List<ExactFlow> phases = new ArrayList<>();
  private final List<ExactFlow> mixing = new ArrayList<>();
  private final boolean damped;
  private final boolean commuting;

  LocalFlow(Model model, int lanes) {
    this.model = model;
    this.transform =
        model.region().transform(model.components(), lanes, model.fourierProvider());
    this.psi = new Field(model.region().grid(), model.components(), lanes);
    this.force = new Field(model.region().grid(), model.components(), lanes);
    this.middle = new Field(model.region().grid(), model.components(), lanes);
    this.block = PointBlock.ofAll(psi, force);
    this.middleBlock = PointBlock.ofAll(middle, force);
    for (LocalTerm term : model.localTerms()) {
      ExactFlow flow = (ExactFlow) term;
      (flow.flowKind() == ExactFlow.Kind.MIXING ? mixing : phases).add(flow);
    }
    boolean any = false;
    for (int c = 0; c < model.components(); c++) {
      any |= model.reservoir().damping(c) > 0;
    }
    this.damped = any;
    this.commuting = flowsCommute(model);
  }

  /** Refuses models on which an exact local flow is not legitimate. */
  static void require(Model model, String scheme) {
    int points = model.region().grid().points();
    Check.argument(
        model.region().modes() == points,
        "%s must not be used with a projector, which after an exact local flow leaves only first"
            + " order and cools at small gamma: modes=%s, points=%s; use Projector.allModes() or a"
            + " projected scheme such as OuRk4", scheme, model.region().modes(), points);
    for (LocalTerm term : model.localTerms()) {
      Check.argument(
          term instanceof ExactFlow,
          "%s needs the exact flow of every local term: term=%s; implement ExactFlow or use OuRk4",
          scheme, term.description());
    }
  }

  /** Whether the exact flows of all local terms and of the chemical potentials commute. */
  static boolean flowsCommute(Model model) {
    List<ExactFlow.Kind> kinds = new ArrayList<>();
    for (LocalTerm term : model.localTerms()) {
      if (term instanceof ExactFlow flow) {
        kinds.add(flow.flowKind());
      }
    }
    boolean equal = true;
    for (int c = 1; c < model.components(); c++) {
      equal &=
          model.reservoir().chemicalPotential(c) == model.reservoir().chemicalPotential(0);
    }
    kinds.add(equal ? ExactFlow.Kind.COMMON_PHASE : ExactFlow.Kind.COMPONENT_PHASE);
    for (int i = 0; i < kinds.size(); i++) {
      for (int j = 0; j < i; j++) {
        if (!kinds.get(i).commutesWith(kinds.get(j))) {
          return false;
        }
      }
    }
    return true;
  }

  /** Advances the state by the local part, with the coefficients of the given time. */
  void advance(double time, double duration, Amplitudes state) {
    transform.toPosition(state, psi);
    if (damped) {
      damp(time, duration / 2);
    }
    if (commuting) {
      turn(time, duration);
      for (int t = 0; t < mixing.size(); t++) {
        mixing.get(t).flow(time, duration, block);
      }
    } else {
      turn(time, duration / 2);
      int last = mixing.size() - 1;
      for (int t = 0; t < last; t++) {
        mixing.get(t).flow(time, duration / 2, block);
      }
      mixing.get(last).flow(time, duration, block);
      for (int t = last - 1; t >= 0; t--) {
        mixing.get(t).flow(time, duration / 2, block);
      }
      turn(time, duration / 2);
    }
    if (damped) {
      damp(time, duration / 2);
    }
    transform.toModes(psi, state);
  }

  private void turn(double time, double duration) {
    for (int t = 0; t < phases.size(); t++) {
      phases.get(t).flow(time, duration, block);
    }
    for (int c = 0; c < model.components(); c++) {
      double angle = model.reservoir().chemicalPotential(c) * duration;
      turn(Math.cos(angle), Math.sin(angle), psi.re(c), psi.im(c));
    }
  }

  private static void turn(double cos, double sin, double[] re, double[] im) {
    for (int i = 0; i < re.length; i++) {
      double x = re[i];
      re[i] = cos * x - sin * im[i];
      im[i] = cos * im[i] + sin * x;
    }
  }

  private void damp(double time, double duration) {
    addDamping(time, block, psi, duration / 2, middle);
    addDamping(time, middleBlock, middle, duration, psi);
  }

  /** target = psi - gamma_j duration (force_j - mu_j at)_j, where the force is taken at a field. */
  private void addDamping(
      double time, PointBlock atBlock, Field at, double duration, Field target) {
    for (int c = 0; c < model.components(); c++) {
      java.util.Arrays.fill(force.re(c), 0);
      java.util.Arrays.fill(force.im(c), 0);
    }
    for (int t = 0; t < model.localTerms().size(); t++) {
      model.localTerms().get(t).addForce(time, atBlock);
    }
    for (int c = 0; c < model.components(); c++) {
      double factor = model.reservoir().damping(c) * duration;
      double mu = model.reservoir().chemicalPotential(c);
      add(factor, mu, psi.re(c), at.re(c), force.re(c), target.re(c));
      add(factor, mu, psi.im(c), at.im(c), force.im(c), target.im(c));
    }
  }

  private static void add(
      double factor, double mu, double[] base, double[] at, double[] force, double[] target) {
    for (int i = 0; i < target.length; i++) {
      target[i] = base[i] - factor * (force[i] - mu * at[i]);
    }
  }
}
