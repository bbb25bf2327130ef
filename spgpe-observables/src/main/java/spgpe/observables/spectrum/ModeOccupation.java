package spgpe.observables.spectrum;

import spgpe.internal.check.Check;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Occupations |a_k|<sup>2</sup> of the kept modes, in the order of the region: mode m has the mode
 * numbers {@code region.modeNumber(axis, m)}. Classical occupations; the Wigner half quantum is not
 * subtracted.
 */
public final class ModeOccupation implements Observable {
  private final String name;
  private final int components;
  private final int component;
  private final int sign;

  private ModeOccupation(String name, int components, int component, int sign) {
    this.name = name;
    this.components = components;
    this.component = component;
    this.sign = sign;
  }

  /**
   * Modes of one component.
   *
   * @param component component index from 0
   * @return observable with one number for each kept mode
   * @throws IllegalArgumentException if the index is negative
   */
  public static ModeOccupation ofComponent(int component) {
    Check.inRange(component, 0, 254, "component");
    return new ModeOccupation(
        "mode occupations of component " + component, component + 1, component, 0);
  }

  /**
   * Modes of the in-phase field (psi_1 + psi_2)/sqrt 2, where a coherent coupling J lowers the
   * energy by J.
   *
   * @return observable with one number for each kept mode
   */
  public static ModeOccupation inPhase() {
    return new ModeOccupation("mode occupations of the in-phase field", 2, 0, 1);
  }

  /**
   * Modes of the out-of-phase field (psi_1 - psi_2)/sqrt 2.
   *
   * @return observable with one number for each kept mode
   */
  public static ModeOccupation outOfPhase() {
    return new ModeOccupation("mode occupations of the out-of-phase field", 2, 0, -1);
  }

  /**
   * The same occupations averaged over shells of |k|.
   *
   * @return observable with one number for each shell
   */
  public ShellOccupation inShells() {
    return new ShellOccupation(this);
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public int size(Model model) {
    PointwiseProfile.requireComponents(model, components, name);
    return model.region().modes();
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    Amplitudes a = snapshot.amplitudes();
    double[] re = a.re(component);
    double[] im = a.im(component);
    for (int m = 0; m < result.length; m++) {
      if (sign == 0) {
        result[m] = re[m] * re[m] + im[m] * im[m];
      } else {
        double x = re[m] + sign * a.re(1)[m];
        double y = im[m] + sign * a.im(1)[m];
        result[m] = (x * x + y * y) / 2;
      }
    }
  }

  @Override
  public String toString() {
    return name;
  }
}
