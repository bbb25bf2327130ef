package spgpe.run;

import java.util.Arrays;
import org.apache.commons.rng.UniformRandomProvider;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Field;

/**
 * Makes the state in which a trajectory starts.
 *
 * <p>Called by several threads at once for different trajectories: keep no state. The random provider
 * is a function of seed and trajectory index.
 */
@FunctionalInterface
public interface InitialState {
  /**
   * Writes the initial state.
   *
   * @param model the model that is run
   * @param random generator of this trajectory's own stream
   * @param target one-lane state of zeros, to be written
   */
  void prepare(Model model, UniformRandomProvider random, Amplitudes target);

  /**
   * Nothing: every amplitude zero.
   *
   * @return the initial state
   */
  static InitialState empty() {
    return (model, random, target) -> target.clear();
  }

  /**
   * Uniform real fields; opposite signs are a relative phase of pi.
   *
   * @param psi psi_j for each component, finite
   * @return the initial state
   * @throws IllegalArgumentException if a value is not finite
   */
  static InitialState uniform(double... psi) {
    Check.notNull(psi, "psi");
    double[] values = psi.clone();
    for (double value : values) {
      Check.finite(value, "uniform field psi");
    }
    return (model, random, target) -> {
      requireComponents(values.length, model);
      setUniform(target, values, new double[values.length]);
    };
  }

  /**
   * Uniform fields of given densities and phases.
   *
   * @param densities n_j for each component, finite and not negative
   * @param phases theta_j for each component, radians, finite
   * @return the initial state
   * @throws IllegalArgumentException if a value is out of range or the lengths differ
   */
  static InitialState uniform(double[] densities, double[] phases) {
    Check.notNull(densities, "densities");
    Check.notNull(phases, "phases");
    Check.argument(
        densities.length == phases.length,
        "densities and phases must be as many: densities=%s, phases=%s",
        densities.length, phases.length);
    double[] re = new double[densities.length];
    double[] im = new double[densities.length];
    for (int c = 0; c < re.length; c++) {
      double size = Math.sqrt(Check.notNegative(densities[c], "density"));
      Check.finite(phases[c], "phase (radians)");
      re[c] = size * Math.cos(phases[c]);
      im[c] = size * Math.sin(phases[c]);
    }
    return (model, random, target) -> {
      requireComponents(re.length, model);
      setUniform(target, re, im);
    };
  }

  /**
   * A field given point by point, then projected onto the kept modes.
   *
   * @param function the field
   * @return the initial state
   */
  static InitialState fromField(FieldFunction function) {
    Check.notNull(function, "function");
    return (model, random, target) -> {
      Field field = new Field(model.region().grid(), model.components(), 1);
      double[] value = new double[2];
      for (int c = 0; c < model.components(); c++) {
        for (int p = 0; p < field.grid().points(); p++) {
          double x = field.grid().coordinate(0, p);
          double y = field.grid().dimension() == 1 ? 0 : field.grid().coordinate(1, p);
          Arrays.fill(value, 0);
          function.value(c, x, y, value);
          Check.argument(
              Double.isFinite(value[0]) && Double.isFinite(value[1]),
              "initial field must be finite: component=%s, x=%s, y=%s, re=%s, im=%s",
              c, x, y, value[0], value[1]);
          field.re(c)[p] = value[0];
          field.im(c)[p] = value[1];
        }
      }
      model.region().transform(model.components(), 1, model.fourierProvider())
          .toModes(field, target);
    };
  }

  /**
   * Copies of a given state, the same for each trajectory.
   *
   * @param state state with one lane, finite; copied
   * @return the initial state
   * @throws IllegalArgumentException if the state has several lanes or is not finite
   */
  static InitialState of(Amplitudes state) {
    Check.notNull(state, "state");
    Check.argument(
        state.lanes() == 1, "an initial state must have one lane: lanes=%s", state.lanes());
    Amplitudes kept = state.copy();
    for (int c = 0; c < kept.components(); c++) {
      Check.finite(kept.atomNumber(c, 0), "atom number of the initial state, component " + c + ",");
    }
    return (model, random, target) -> target.set(kept);
  }

  /** A complex field as a function of the position. */
  @FunctionalInterface
  interface FieldFunction {
    /**
     * Value of the field.
     *
     * @param component component index
     * @param x position along x
     * @param y position along y, 0 on a line
     * @param value overwritten with real and imaginary part
     */
    void value(int component, double x, double y, double[] value);
  }

  private static void requireComponents(int given, Model model) {
    Check.argument(
        given == model.components(),
        "the initial state must have a value for each component: values=%s, components=%s",
        given, model.components());
  }

  private static void setUniform(Amplitudes target, double[] re, double[] im) {
    int zero = target.region().indexOf(0);
    Check.argument(
        zero >= 0, "a uniform state needs the mode k = 0, which the region does not keep");
    double root = Math.sqrt(target.region().grid().volume());
    for (int c = 0; c < re.length; c++) {
      target.re(c)[zero] = root * re[c];
      target.im(c)[zero] = root * im[c];
    }
  }
}
