package spgpe.internal.measure;

import java.util.Arrays;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.projector.CoherentRegion;

/**
 * Points of a plane, or modes, sorted by their distance from the origin: the origin alone, then
 * shells of the width w of the coarser spacing about w, 2w, ... The origin's neighbours are in no
 * shell below the first. Immutable.
 */
public final class Shells {
  /** Shell of each point, -1 for none. */
  private final int[] shell;

  private final int[] weights;
  private final double[] means;

  private Shells(double[] distances, double width, double limit) {
    int[] number = new int[distances.length];
    int last = 0;
    for (int i = 0; i < number.length; i++) {
      double r = distances[i];
      number[i] =
          r == 0 ? 0 : r > limit * (1 + 1e-9) ? -1 : Math.max(1, (int) Math.rint(r / width));
      last = Math.max(last, number[i]);
    }
    int[] count = new int[last + 1];
    for (int n : number) {
      if (n >= 0) {
        count[n]++;
      }
    }
    int[] place = new int[last + 1];
    int shells = 0;
    for (int n = 0; n <= last; n++) {
      place[n] = shells;
      shells += count[n] > 0 ? 1 : 0;
    }
    shell = number;
    weights = new int[shells];
    means = new double[shells];
    for (int i = 0; i < shell.length; i++) {
      if (shell[i] >= 0) {
        shell[i] = place[shell[i]];
        weights[shell[i]]++;
        means[shell[i]] += distances[i];
      }
    }
    for (int s = 0; s < shells; s++) {
      means[s] /= weights[s];
    }
  }

  /**
   * Distances of the points of a plane from the first one, by the shortest way around, up to half
   * of the shorter side, where the shells end to be whole.
   *
   * @param grid a plane
   * @return shells in the order of the points
   */
  public static Shells ofPoints(PeriodicGrid grid) {
    Axis x = grid.axis(0);
    Axis y = grid.axis(1);
    return ofPlane(
        grid, x.spacing(), y.spacing(), Math.min(x.length(), y.length()) / 2);
  }

  /**
   * Wave numbers that the points of a plane can represent, in the order of their Fourier transform,
   * up to the highest on both axes.
   *
   * @param grid a plane
   * @return shells in the order of the transform
   */
  public static Shells ofWaveNumbers(PeriodicGrid grid) {
    Axis x = grid.axis(0);
    Axis y = grid.axis(1);
    return ofPlane(
        grid, x.waveNumber(1), y.waveNumber(1),
        Math.min(x.waveNumber(x.highestMode()), y.waveNumber(y.highestMode())));
  }

  private static Shells ofPlane(PeriodicGrid grid, double stepX, double stepY, double limit) {
    int nx = grid.axis(0).points();
    double[] distances = new double[grid.points()];
    for (int i = 0; i < distances.length; i++) {
      distances[i] =
          Math.hypot(
              stepX * nearest(i % nx, nx), stepY * nearest(i / nx, grid.axis(1).points()));
    }
    return new Shells(distances, Math.max(stepX, stepY), limit);
  }

  private static int nearest(int index, int points) {
    return Math.min(index, points - index);
  }

  /**
   * Wave numbers of all kept modes.
   *
   * @param region kept modes on a line or a plane
   * @return shells in the order of the modes
   */
  public static Shells ofModes(CoherentRegion region) {
    double[] distances = new double[region.modes()];
    double width = 0;
    for (int axis = 0; axis < region.grid().dimension(); axis++) {
      width = Math.max(width, region.grid().axis(axis).waveNumber(1));
    }
    for (int m = 0; m < distances.length; m++) {
      distances[m] = Math.sqrt(region.kSquared(m));
    }
    return new Shells(distances, width, Double.POSITIVE_INFINITY);
  }

  /**
   * Number of shells.
   *
   * @return count
   */
  public int size() {
    return weights.length;
  }

  /**
   * Mean distance or wave number of each shell.
   *
   * @return new array
   */
  public double[] means() {
    return means.clone();
  }

  /**
   * How many points each shell has.
   *
   * @return new array
   */
  public int[] weights() {
    return weights.clone();
  }

  /**
   * Averages over each shell.
   *
   * @param values for each point, values[stride * point + first]
   * @param stride distance between the values
   * @param first index of the first value
   * @param result overwritten from index 0 with a number for each shell
   */
  public void average(double[] values, int stride, int first, double[] result) {
    Arrays.fill(result, 0, weights.length, 0);
    for (int i = 0; i < shell.length; i++) {
      if (shell[i] >= 0) {
        result[shell[i]] += values[stride * i + first];
      }
    }
    for (int s = 0; s < weights.length; s++) {
      result[s] /= weights[s];
    }
  }
}
