package spgpe.observables;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Spatial mean of profiles: (1/V) integral of f(r), the plain mean over the grid points. Exact for
 * a polynomial in the fields as long as its products do not alias.
 *
 * <p>Immutable and thread-safe.
 */
public final class SpatialMean implements Observable {
  private final Observable profile;
  private final int power;

  private SpatialMean(Observable profile, int power) {
    this.profile = profile;
    this.power = power;
  }

  /**
   * Mean of a profile.
   *
   * @param profile observable with one number for each grid point
   * @return a single number
   */
  public static SpatialMean of(Observable profile) {
    return new SpatialMean(Check.notNull(profile, "profile"), 1);
  }

  /**
   * Mean of the square of a profile.
   *
   * @param profile observable with one number for each grid point
   * @return a single number
   */
  public static SpatialMean ofSquare(Observable profile) {
    return new SpatialMean(Check.notNull(profile, "profile"), 2);
  }

  @Override
  public String name() {
    return "spatial mean of " + (power == 1 ? "" : "the square of ") + profile.name();
  }

  @Override
  public int size(Model model) {
    int points = model.region().grid().points();
    int given = profile.size(model);
    Check.argument(
        given == points,
        "a spatial mean needs one number for each grid point: profile=\"%s\", numbers=%s,"
            + " points=%s", profile.name(), given, points);
    return 1;
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    double[] values =
        snapshot.scratch(this, double[].class, m -> new double[m.region().grid().points()]);
    profile.measure(snapshot, values);
    double sum = 0;
    for (double value : values) {
      sum += power == 1 ? value : value * value;
    }
    result[0] = sum / values.length;
  }

  @Override
  public String toString() {
    return name();
  }
}
