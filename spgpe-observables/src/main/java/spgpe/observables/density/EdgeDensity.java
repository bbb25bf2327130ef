package spgpe.observables.density;

import java.util.Locale;
import java.util.Optional;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;
import spgpe.observables.TimeAverage;

/**
 * Whether a trapped cloud stays away from the seams of its periodic box, where a trapping potential
 * has a kink and the cloud would meet its own image. Evaluated from an average of {@link
 * Density#total} or of a component. The trap is to be centred in the middle of the box.
 *
 * <p>A thermal classical field never vanishes at the edge: where the potential is V it keeps about
 * (T m/(2 pi)) ln(eps_cut/(V - mu)) on a plane. Immutable and thread-safe.
 *
 * @param edge largest mean density at the first and last points of the axes
 * @param peak largest mean density
 */
public record EdgeDensity(double edge, double peak) {
  /** Ratio above which {@link #warning} speaks. */
  public static final double LARGEST_RATIO = 0.01;

  /**
   * Checks the numbers.
   *
   * @param edge largest mean density at the first and last points of the axes
   * @param peak largest mean density
   * @throws IllegalArgumentException if the densities are not finite, the peak is not positive or
   *     the edge is negative or above the peak
   */
  public EdgeDensity {
    Check.notNegative(edge, "density at the edge");
    Check.positive(peak, "peak density");
    Check.argument(edge <= peak, "edge must not exceed the peak: edge=%s, peak=%s", edge, peak);
  }

  /**
   * Evaluates an average.
   *
   * @param density average of a density profile
   * @param grid grid of the model, a ring or a plane
   * @return densities at the edge and at the peak
   * @throws IllegalArgumentException if the average is not of a profile of that grid, holds no
   *     sample, or is zero everywhere
   */
  public static EdgeDensity of(TimeAverage density, PeriodicGrid grid) {
    Check.notNull(density, "density");
    Check.notNull(grid, "grid");
    Check.argument(
        density.size() == grid.points() && density.samples() > 0,
        "the average must be of a density profile, with samples: numbers=%s, points=%s, samples=%s",
        density.size(), grid.points(), density.samples());
    double[] means = density.means();
    double edge = 0;
    double peak = 0;
    for (int p = 0; p < means.length; p++) {
      peak = Math.max(peak, means[p]);
      if (isEdge(p, grid)) {
        edge = Math.max(edge, means[p]);
      }
    }
    return new EdgeDensity(edge, peak);
  }

  private static boolean isEdge(int point, PeriodicGrid grid) {
    int nx = grid.axis(0).points();
    int x = point % nx;
    int y = point / nx;
    return x == 0 || x == nx - 1
        || (grid.dimension() == 2 && (y == 0 || y == grid.axis(1).points() - 1));
  }

  /**
   * Edge over peak.
   *
   * @return ratio in [0, 1]; 1 for a uniform gas
   */
  public double ratio() {
    return edge / peak;
  }

  /**
   * What to tell the user of a trap.
   *
   * @return a sentence if the ratio exceeds {@value #LARGEST_RATIO}, else empty
   */
  public Optional<String> warning() {
    return ratio() <= LARGEST_RATIO
        ? Optional.empty()
        : Optional.of(
            String.format(
                Locale.ROOT,
                "the cloud reaches the edge of the periodic box: density at the edge=%.3g, peak="
                    + "%.3g, ratio=%.3g > %s; use a longer box or a tighter trap, centred in the"
                    + " box",
                edge, peak, ratio(), LARGEST_RATIO));
  }
}
