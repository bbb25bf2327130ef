package spgpe.observables.topology;

import java.util.ArrayList;
import java.util.List;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Walls between domains of high and low values of a profile on a ring, such as S_z. A domain begins
 * where the profile goes beyond a level of its own; between the levels it belongs to the domain
 * before (hysteresis), so that small fluctuations about the middle make no walls. There are always
 * as many rising as falling walls.
 */
public final class DomainWalls {
  private DomainWalls() {}

  /**
   * Finds the walls of a profile.
   *
   * @param profile values at the points of a ring, finite
   * @param low level below which a low domain begins
   * @param high level above which a high domain begins, not below low
   * @param length length of the ring
   * @return walls in the order along x, beginning with the first domain
   * @throws IllegalArgumentException if a value is not finite or the levels are in the wrong order
   */
  public static List<Defect> find(double[] profile, double low, double high, double length) {
    Check.notNull(profile, "profile");
    Check.positive(length, "length (of the ring)");
    requireLevels(low, high);
    for (int i = 0; i < profile.length; i++) {
      Check.argument(
          Double.isFinite(profile[i]),
          "the profile must be finite: point=%s, value=%s", i, profile[i]);
    }
    int n = profile.length;
    List<Defect> walls = new ArrayList<>();
    int start = 0;
    while (start < n && domain(profile[start], low, high) == 0) {
      start++;
    }
    if (start == n) {
      return walls;
    }
    double middle = (low + high) / 2;
    int current = domain(profile[start], low, high);
    double crossing = Double.NaN;
    for (int i = start + 1; i <= start + n; i++) {
      double before = profile[(i - 1) % n];
      double here = profile[i % n];
      if ((before <= middle) != (here <= middle)) {
        crossing = i - 1 + (middle - before) / (here - before);
      }
      int domain = domain(here, low, high);
      if (domain != 0 && domain != current) {
        double x = crossing * length / n;
        walls.add(new Defect(x - length * Math.floor(x / length), domain));
        current = domain;
      }
    }
    return walls;
  }

  /**
   * Number of walls of a profile.
   *
   * @param profile observable with one number for each point of a line
   * @param low level below which a low domain begins
   * @param high level above which a high domain begins, not below low
   * @return observable of a single even number
   * @throws IllegalArgumentException if a level is not finite or the levels are in the wrong order
   */
  public static Observable count(Observable profile, double low, double high) {
    Check.notNull(profile, "profile");
    requireLevels(low, high);
    return new Observable() {
      @Override
      public String name() {
        return "number of domain walls of " + profile.name();
      }

      @Override
      public int size(Model model) {
        int points = model.region().grid().points();
        Check.argument(
            model.region().grid().dimension() == 1 && profile.size(model) == points,
            "domain walls need a profile on a line: profile=\"%s\", numbers=%s, %s",
            profile.name(), profile.size(model), model.region().grid());
        return 1;
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        double[] values =
            snapshot.scratch(this, double[].class, m -> new double[m.region().grid().points()]);
        profile.measure(snapshot, values);
        result[0] =
            find(values, low, high, snapshot.model().region().grid().axis(0).length()).size();
      }
    };
  }

  private static int domain(double value, double low, double high) {
    return value > high ? 1 : value < low ? -1 : 0;
  }

  private static void requireLevels(double low, double high) {
    Check.finite(low, "low level");
    Check.finite(high, "high level");
    Check.argument(
        low <= high, "the low level must not exceed the high level: low=%s, high=%s", low, high);
  }
}
