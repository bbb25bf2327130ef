package spgpe.observables.topology;

import java.util.ArrayList;
import java.util.List;
import spgpe.internal.check.Check;
import spgpe.internal.measure.PairProfiles;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.model.Model;
import spgpe.observables.phase.PhaseUnwrapping;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Kinks of a phase on a ring: steps of 2 pi between neighbouring valleys phi = 2 pi k. A new valley
 * counts when the phase has come within pi/2 of its bottom, where cos phi &gt; 0; excursions that
 * fall back make no kink. The signs of all kinks add up to the winding number. In the relative
 * phase of coupled condensates these are the walls left over when bubbles that decayed to different
 * sides meet.
 */
public final class Kinks {
  private static final double TURN = 2 * Math.PI;

  private Kinks() {}

  /**
   * Finds the kinks of a phase.
   *
   * @param phases phases at the points of a ring, wrapped or not, radians, finite
   * @param length length of the ring
   * @return kinks in the order along x; none if the phase is in no valley
   * @throws IllegalArgumentException if a phase is not finite or the length not positive
   */
  public static List<Defect> find(double[] phases, double length) {
    Check.positive(length, "length (of the ring)");
    double[] phi = PhaseUnwrapping.unwrap(phases);
    int n = phi.length;
    double whole = TURN * PhaseUnwrapping.winding(phases);
    List<Defect> kinks = new ArrayList<>();
    int start = 0;
    while (start < n && !(Math.cos(phi[start]) > 0)) {
      start++;
    }
    if (start == n) {
      return kinks;
    }
    long valley = Math.round(phi[start] / TURN);
    double before = phi[start];
    double[] crossing = {Double.NaN, Double.NaN};
    for (int i = start + 1; i <= start + n; i++) {
      double here = i < n ? phi[i] : phi[i - n] + whole;
      for (int side = 0; side < 2; side++) {
        double top = TURN * valley + (side == 0 ? -Math.PI : Math.PI);
        if ((before <= top) != (here <= top)) {
          crossing[side] = i - 1 + (top - before) / (here - before);
        }
      }
      long next = Math.round(here / TURN);
      if (next != valley && Math.cos(here) > 0) {
        int sign = next > valley ? 1 : -1;
        double x = crossing[sign > 0 ? 1 : 0] * length / n;
        kinks.add(new Defect(x - length * Math.floor(x / length), sign));
        valley = next;
      }
      before = here;
    }
    return kinks;
  }

  /**
   * Number of kinks of the relative phase, of both signs.
   *
   * @return observable of a single number
   */
  public static Observable count() {
    return new Observable() {
      @Override
      public String name() {
        return "number of kinks of the relative phase";
      }

      @Override
      public int size(Model model) {
        Check.argument(
            model.region().grid().dimension() == 1,
            "kinks need a line (ring): %s", model.region().grid());
        PointwiseProfile.requireComponents(model, 2, name());
        return 1;
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        PairProfiles pair = PairProfiles.of(snapshot);
        result[0] =
            hasValley(pair.re())
                ? find(pair.angle(), snapshot.model().region().grid().axis(0).length()).size()
                : 0;
      }
    };
  }

  /** Whether cos phi is positive anywhere: without, there is no valley to start from. */
  private static boolean hasValley(double[] coherence) {
    for (double re : coherence) {
      if (re > 0) {
        return true;
      }
    }
    return false;
  }
}
