package spgpe.observables.density;

import spgpe.internal.check.Check;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/** Momentum P = sum over kept modes of k |a_jk|<sup>2</sup>, one number for each axis. */
public final class Momentum {
  private Momentum() {}

  /**
   * Momentum of a component.
   *
   * @param component component index from 0
   * @return observable with one number for each axis
   * @throws IllegalArgumentException if the index is negative
   */
  public static Observable ofComponent(int component) {
    Check.inRange(component, 0, 254, "component");
    return observable("momentum of component " + component, component);
  }

  /**
   * Momentum of all components together: conserved without reservoir and external potential.
   *
   * @return observable with one number for each axis
   */
  public static Observable total() {
    return observable("total momentum", -1);
  }

  private static Observable observable(String name, int component) {
    return new Observable() {
      @Override
      public String name() {
        return name;
      }

      @Override
      public int size(Model model) {
        PointwiseProfile.requireComponents(model, Math.max(component, 0) + 1, name);
        return model.region().grid().dimension();
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        Amplitudes a = snapshot.amplitudes();
        java.util.Arrays.fill(result, 0);
        int first = Math.max(0, component);
        int last = component < 0 ? a.components() - 1 : component;
        for (int c = first; c <= last; c++) {
          for (int m = 0; m < a.re(c).length; m++) {
            double n = a.re(c)[m] * a.re(c)[m] + a.im(c)[m] * a.im(c)[m];
            for (int axis = 0; axis < result.length; axis++) {
              result[axis] += a.region().waveNumber(axis, m) * n;
            }
          }
        }
      }
    };
  }
}
