package spgpe.observables.phase;

import spgpe.internal.check.Check;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.internal.measure.ScalarMeasure;
import spgpe.projector.Field;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/** Phase theta_j = arg psi_j of one component; 0 where the field vanishes. */
public final class ComponentPhase {
  private ComponentPhase() {}

  /**
   * Profile of theta_j in (-pi, pi].
   *
   * @param component component index from 0
   * @return observable with one number for each grid point, radians
   * @throws IllegalArgumentException if the index is negative
   */
  public static Observable wrapped(int component) {
    Check.inRange(component, 0, 254, "component");
    return new PointwiseProfile(
        "phase of component " + component, component + 1,
        (snapshot, result) -> fill(snapshot, component, result));
  }

  /**
   * Winding number of theta_j around the ring. Line grids only.
   *
   * @param component component index from 0
   * @return observable of a single whole number
   * @throws IllegalArgumentException if the index is negative
   */
  public static Observable winding(int component) {
    Check.inRange(component, 0, 254, "component");
    String name = "winding number of component " + component;
    return new ScalarMeasure(
        name, component + 1,
        snapshot -> {
          PhaseUnwrapping.requireLine(snapshot.model(), name);
          Field field = snapshot.field();
          return PhaseUnwrapping.winding(field.re(component), field.im(component));
        });
  }

  private static void fill(Snapshot snapshot, int component, double[] result) {
    Field f = snapshot.field();
    for (int i = 0; i < result.length; i++) {
      result[i] = PhaseUnwrapping.angle(f.re(component)[i], f.im(component)[i]);
    }
  }
}
