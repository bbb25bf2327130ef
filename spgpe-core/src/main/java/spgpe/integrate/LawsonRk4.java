package spgpe.integrate;

import spgpe.model.ForceEvaluator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;

/**
 * One deterministic step of RK4 in the interaction picture and its embedded error estimate. The
 * step can be changed by giving other tables of the half flow. One thread at a time.
 */
final class LawsonRk4 {
  /** Weights of k1..k4 in the interaction picture at mid-step. */
  static final double[] FOURTH_ORDER = {1.0 / 6, 1.0 / 3, 1.0 / 3, 1.0 / 6};

  /**
   * Weights of the embedded solution: k5 is the increment at the end of the step. Balac and Mahe,
   * Comput. Phys. Commun. 184, 1211 (2013); weights from memory, order conditions in the tests.
   */
  static final double[] THIRD_ORDER = {1.0 / 6, 1.0 / 3, 1.0 / 3, 1.0 / 15, 1.0 / 10};

  private final ForceEvaluator forces;
  private final StageSum stage;
  private final Amplitudes force;
  private final Amplitudes picture;
  private final Amplitudes sum;
  private final Amplitudes probe;

  LawsonRk4(Model model, ForceEvaluator forces, int lanes) {
    this.forces = forces;
    this.stage = new StageSum(model);
    this.force = new Amplitudes(model.region(), model.components(), lanes);
    this.picture = new Amplitudes(model.region(), model.components(), lanes);
    this.sum = new Amplitudes(model.region(), model.components(), lanes);
    this.probe = new Amplitudes(model.region(), model.components(), lanes);
  }

  /** Advances the state from time to time + h, with the flow over h/2. */
  void step(double time, double h, ModeTable halfFlow, Amplitudes state) {
    halfFlow.multiply(state, picture);
    forces.localForce(time, state, force);
    stage.increment(h, force, state);
    halfFlow.multiply(state, probe); // k1
    combine(picture, FOURTH_ORDER[0], probe, sum);
    combine(picture, 0.5, probe, probe);
    forces.localForce(time + h / 2, probe, force);
    stage.add(sum, FOURTH_ORDER[1] * h, force, sum);
    stage.add(picture, 0.5 * h, force, probe);
    forces.localForce(time + h / 2, probe, force);
    stage.add(sum, FOURTH_ORDER[2] * h, force, sum);
    stage.add(picture, h, force, picture);
    halfFlow.multiply(picture, probe);
    forces.localForce(time + h, probe, force);
    halfFlow.multiply(sum, state);
    stage.increment(h, force, picture); // k4, kept for the error
    combine(state, FOURTH_ORDER[3], picture, state);
  }

  /**
   * After {@link #step}: size of the difference of the two solutions, |k4 - k5|/10, relative to the
   * size of the state. One force evaluation.
   */
  double relativeError(double endTime, double h, Amplitudes state) {
    forces.localForce(endTime, state, force);
    stage.increment(h, force, probe);
    double difference = 0;
    double size = 0;
    for (int c = 0; c < state.components(); c++) {
      for (int e = 0; e < state.re(c).length; e++) {
        difference += square(picture.re(c)[e] - probe.re(c)[e]);
        difference += square(picture.im(c)[e] - probe.im(c)[e]);
        size += square(state.re(c)[e]) + square(state.im(c)[e]);
      }
    }
    return difference == 0 ? 0 : THIRD_ORDER[4] * Math.sqrt(difference / size);
  }

  private static double square(double x) {
    return x * x;
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
