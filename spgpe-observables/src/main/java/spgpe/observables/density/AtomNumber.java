package spgpe.observables.density;

import spgpe.internal.check.Check;
import spgpe.internal.measure.ScalarMeasure;
import spgpe.run.Observable;

/** Atom numbers: N_j = sum over kept modes of |a_jk|<sup>2</sup>. */
public final class AtomNumber {
  private AtomNumber() {}

  /**
   * Atoms in a component.
   *
   * @param component component index from 0
   * @return observable of a single number
   * @throws IllegalArgumentException if the index is negative
   */
  public static Observable ofComponent(int component) {
    Check.inRange(component, 0, 254, "component");
    return new ScalarMeasure(
        "atom number of component " + component, component + 1,
        snapshot -> snapshot.amplitudes().atomNumber(component, 0));
  }

  /**
   * Atoms in all components.
   *
   * @return observable of a single number
   */
  public static Observable total() {
    return new ScalarMeasure(
        "total atom number", 1,
        snapshot -> {
          double sum = 0;
          for (int c = 0; c < snapshot.amplitudes().components(); c++) {
            sum += snapshot.amplitudes().atomNumber(c, 0);
          }
          return sum;
        });
  }

  /**
   * Difference N_1 - N_2 of the first two components.
   *
   * @return observable of a single number
   */
  public static Observable difference() {
    return new ScalarMeasure(
        "atom number difference", 2,
        snapshot ->
            snapshot.amplitudes().atomNumber(0, 0) - snapshot.amplitudes().atomNumber(1, 0));
  }
}
