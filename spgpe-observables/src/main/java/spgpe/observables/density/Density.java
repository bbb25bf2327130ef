package spgpe.observables.density;

import spgpe.internal.check.Check;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.projector.Field;
import spgpe.run.Observable;

/**
 * Densities and spin densities as profiles. Wigner representation: a classical field with half a
 * quantum of vacuum noise per mode needs that subtracted; a thermal classical field does not.
 *
 * <p>Spin densities of the components 0 and 1 (psi<sup>+</sup> sigma psi, not halved):
 *
 * <pre>S_x = 2 Re psi_1^* psi_2,   S_y = 2 Im psi_1^* psi_2,   S_z = |psi_1|^2 - |psi_2|^2.</pre>
 */
public final class Density {
  private Density() {}

  /** Direction in spin space. */
  public enum SpinAxis {
    /** S_x, twice the coherence between the components. */
    X,
    /** S_y = -2 sqrt(n_1 n_2) sin phi. */
    Y,
    /** S_z, the difference of the densities. */
    Z
  }

  /**
   * Density |psi_j|<sup>2</sup> of a component.
   *
   * @param component component index from 0
   * @return observable with one number for each grid point
   * @throws IllegalArgumentException if the index is negative
   */
  public static Observable ofComponent(int component) {
    Check.inRange(component, 0, 254, "component");
    return new PointwiseProfile(
        "density of component " + component, component + 1,
        (snapshot, result) -> {
          java.util.Arrays.fill(result, 0);
          addDensity(snapshot.field(), component, result);
        });
  }

  /**
   * Density of all components together.
   *
   * @return observable with one number for each grid point
   */
  public static Observable total() {
    return new PointwiseProfile(
        "total density", 1,
        (snapshot, result) -> {
          java.util.Arrays.fill(result, 0);
          for (int c = 0; c < snapshot.field().components(); c++) {
            addDensity(snapshot.field(), c, result);
          }
        });
  }

  /**
   * Spin density of the components 0 and 1.
   *
   * @param axis direction in spin space
   * @return observable with one number for each grid point
   */
  public static Observable spin(SpinAxis axis) {
    Check.notNull(axis, "axis");
    return new PointwiseProfile(
        "spin density S_" + axis.name().toLowerCase(java.util.Locale.ROOT), 2,
        (snapshot, result) -> {
          Field f = snapshot.field();
          double[] re1 = f.re(0);
          double[] im1 = f.im(0);
          double[] re2 = f.re(1);
          double[] im2 = f.im(1);
          for (int i = 0; i < result.length; i++) {
            result[i] =
                switch (axis) {
                  case X -> 2 * (re1[i] * re2[i] + im1[i] * im2[i]);
                  case Y -> 2 * (re1[i] * im2[i] - im1[i] * re2[i]);
                  case Z -> re1[i] * re1[i] + im1[i] * im1[i] - re2[i] * re2[i] - im2[i] * im2[i];
                };
          }
        });
  }

  private static void addDensity(Field field, int component, double[] sum) {
    double[] re = field.re(component);
    double[] im = field.im(component);
    for (int i = 0; i < sum.length; i++) {
      sum[i] += re[i] * re[i] + im[i] * im[i];
    }
  }
}
