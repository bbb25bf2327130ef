package spgpe.observables.density;

import java.util.function.Function;
import java.util.function.IntUnaryOperator;
import spgpe.internal.check.Check;
import spgpe.internal.measure.Masses;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Field;
import spgpe.projector.ModeTransform;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Atom currents as profiles, j_j = Im(psi_j<sup>*</sup> d psi_j/dx)/m_j, with the derivative taken
 * in the modes. A coherent coupling exchanges atoms between the components, so that only the total
 * current obeys the continuity equation, and that only up to the projector and the reservoir.
 */
public final class Current {
  private static final class Scratch {
    final double[] masses;
    final double[] waveNumbers;
    final Amplitudes gradientModes;
    final Field gradient;
    final ModeTransform transform;

    Scratch(Model model, int axis) {
      masses = Masses.of(model);
      waveNumbers = new double[model.region().modes()];
      for (int m = 0; m < waveNumbers.length; m++) {
        waveNumbers[m] = model.region().waveNumber(axis, m);
      }
      gradientModes = new Amplitudes(model.region(), model.components(), 1);
      gradient = new Field(model.region().grid(), model.components(), 1);
      transform = model.region().transform(model.components(), 1, model.fourierProvider());
    }
  }

  private Current() {}

  /**
   * Current of a component.
   *
   * @param component component index from 0
   * @param axis direction, 0 for x, 1 for y
   * @return observable with one number for each grid point
   * @throws IllegalArgumentException if an index is out of range; when used, if the model has not
   *     exactly one kinetic term
   */
  public static Observable ofComponent(int component, int axis) {
    Check.inRange(component, 0, 254, "component");
    return profile(
        "current of component " + component, component + 1, axis, c -> c == component ? 1 : 0);
  }

  /**
   * Current of all components together.
   *
   * @param axis direction, 0 for x, 1 for y
   * @return observable with one number for each grid point
   * @throws IllegalArgumentException if the axis is out of range; when used, if the model has not
   *     exactly one kinetic term
   */
  public static Observable total(int axis) {
    return profile("total current", 1, axis, c -> 1);
  }

  /**
   * Spin current j_1 - j_2.
   *
   * @param axis direction, 0 for x, 1 for y
   * @return observable with one number for each grid point
   * @throws IllegalArgumentException if the axis is out of range; when used, if the model has not
   *     exactly one kinetic term
   */
  public static Observable spin(int axis) {
    return profile("spin current", 2, axis, c -> c == 0 ? 1 : c == 1 ? -1 : 0);
  }

  private static Observable profile(
      String name, int components, int axis, IntUnaryOperator sign) {
    Check.inRange(axis, 0, 1, "axis");
    Function<Model, Scratch> maker = model -> new Scratch(model, axis);
    return new PointwiseProfile(
        name, components,
        (snapshot, result) -> fill(snapshot, maker, sign, result));
  }

  private static void fill(
      Snapshot snapshot, Function<Model, Scratch> maker, IntUnaryOperator sign, double[] result) {
    Scratch s = snapshot.scratch(maker, Scratch.class, maker);
    Amplitudes a = snapshot.amplitudes();
    for (int c = 0; c < a.components(); c++) {
      for (int m = 0; m < a.re(c).length; m++) {
        double k = s.waveNumbers[m];
        s.gradientModes.re(c)[m] = -k * a.im(c)[m];
        s.gradientModes.im(c)[m] = k * a.re(c)[m];
      }
    }
    s.transform.toPosition(s.gradientModes, s.gradient);
    Field psi = snapshot.field();
    java.util.Arrays.fill(result, 0);
    for (int c = 0; c < a.components(); c++) {
      double factor = sign.applyAsInt(c) / s.masses[c];
      for (int i = 0; factor != 0 && i < result.length; i++) {
        result[i] +=
            factor
                * (psi.re(c)[i] * s.gradient.im(c)[i] - psi.im(c)[i] * s.gradient.re(c)[i]);
      }
    }
  }
}
