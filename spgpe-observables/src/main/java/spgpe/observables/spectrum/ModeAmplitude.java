package spgpe.observables.spectrum;

import spgpe.internal.check.Check;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/** Complex amplitudes a_jk as pairs (re, im). */
public final class ModeAmplitude {
  private ModeAmplitude() {}

  /**
   * One mode on a line.
   *
   * @param component component index from 0
   * @param modeNumber n, k = 2 pi n/L
   * @return observable with two numbers
   * @throws IllegalArgumentException if the index is negative; when used, if the mode is not kept
   */
  public static Observable of(int component, int modeNumber) {
    return of(component, modeNumber, 0);
  }

  /**
   * One mode.
   *
   * @param component component index from 0
   * @param modeX mode number along x
   * @param modeY mode number along y, 0 on a line
   * @return observable with two numbers
   * @throws IllegalArgumentException if the index is negative; when used, if the mode is not kept
   */
  public static Observable of(int component, int modeX, int modeY) {
    Check.inRange(component, 0, 254, "component");
    String name = "amplitude of mode (" + modeX + "," + modeY + ") of component " + component;
    return new Observable() {
      @Override
      public String name() {
        return name;
      }

      @Override
      public int size(Model model) {
        PointwiseProfile.requireComponents(model, component + 1, name);
        Check.argument(
            model.region().indexOf(modeX, modeY) >= 0,
            "the mode must be kept: nx=%s, ny=%s, region=%s", modeX, modeY, model.region());
        return 2;
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        int m = snapshot.amplitudes().region().indexOf(modeX, modeY);
        result[0] = snapshot.amplitudes().re(component)[m];
        result[1] = snapshot.amplitudes().im(component)[m];
      }
    };
  }

  /**
   * All modes of one component, in the order of the region.
   *
   * @param component component index from 0
   * @return observable with two numbers for each kept mode
   * @throws IllegalArgumentException if the index is negative
   */
  public static Observable ofComponent(int component) {
    Check.inRange(component, 0, 254, "component");
    return all("mode amplitudes of component " + component, component, component + 1);
  }

  /**
   * All modes of all components: component by component, each in the order of the region.
   *
   * @return observable with two numbers for each kept mode and component
   */
  public static Observable all() {
    return all("mode amplitudes", -1, 1);
  }

  private static Observable all(String name, int component, int components) {
    return new Observable() {
      @Override
      public String name() {
        return name;
      }

      @Override
      public int size(Model model) {
        PointwiseProfile.requireComponents(model, components, name);
        return 2 * model.region().modes() * (component < 0 ? model.components() : 1);
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        Amplitudes a = snapshot.amplitudes();
        int first = Math.max(0, component);
        int last = component < 0 ? a.components() - 1 : component;
        int next = 0;
        for (int c = first; c <= last; c++) {
          for (int m = 0; m < a.re(c).length; m++) {
            result[next++] = a.re(c)[m];
            result[next++] = a.im(c)[m];
          }
        }
      }
    };
  }
}
