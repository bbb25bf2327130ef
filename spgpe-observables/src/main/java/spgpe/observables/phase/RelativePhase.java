package spgpe.observables.phase;

import spgpe.internal.check.Check;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.internal.measure.ScalarMeasure;
import spgpe.projector.Field;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Relative phase of the components 0 and 1, phi = arg(psi_1 psi_2<sup>*</sup>) = theta_1 - theta_2,
 * always taken from the product X = psi_1 psi_2<sup>*</sup>, which has no branch cut:
 *
 * <pre>cos phi = Re X/|X|,   sin phi = Im X/|X|.</pre>
 *
 * <p>Where the product vanishes the phase does not exist; cosine and sine are 0 there, their mean
 * over all directions, and the angle is the reference angle. The spin density is S_y = 2 Im
 * psi_1<sup>*</sup> psi_2 = -2 |X| sin phi.
 */
public final class RelativePhase {
  private RelativePhase() {}

  /**
   * Spatial mean of cos phi, not weighted with the density: (1/V) integral of cos phi. Near -1 in
   * the state with phase pi, +1 in the state with phase 0.
   *
   * @return observable of a single number in [-1, 1]
   */
  public static Observable meanCosine() {
    return new ScalarMeasure(
        "mean cosine of the relative phase", 2,
        snapshot -> {
          Field field = snapshot.field();
          double[] re1 = field.re(0);
          double[] im1 = field.im(0);
          double[] re2 = field.re(1);
          double[] im2 = field.im(1);
          double sum = 0;
          for (int i = 0; i < re1.length; i++) {
            sum += cosine(re1[i], im1[i], re2[i], im2[i]);
          }
          return sum / re1.length;
        });
  }

  /**
   * Profile of cos phi.
   *
   * @return observable with one number for each grid point
   */
  public static Observable cosine() {
    return new PointwiseProfile(
        "cosine of the relative phase", 2,
        (snapshot, result) -> {
          Field f = snapshot.field();
          for (int i = 0; i < result.length; i++) {
            result[i] = cosine(f.re(0)[i], f.im(0)[i], f.re(1)[i], f.im(1)[i]);
          }
        });
  }

  /**
   * Profile of sin phi.
   *
   * @return observable with one number for each grid point
   */
  public static Observable sine() {
    return new PointwiseProfile(
        "sine of the relative phase", 2,
        (snapshot, result) -> {
          Field f = snapshot.field();
          for (int i = 0; i < result.length; i++) {
            double re = f.re(0)[i] * f.re(1)[i] + f.im(0)[i] * f.im(1)[i];
            double im = f.im(0)[i] * f.re(1)[i] - f.re(0)[i] * f.im(1)[i];
            double size = Math.hypot(re, im);
            result[i] = size == 0 ? 0 : im / size;
          }
        });
  }

  /**
   * Profile of phi in (-pi, pi].
   *
   * @return observable with one number for each grid point, radians
   */
  public static Observable wrapped() {
    return wrappedAbout(0);
  }

  /**
   * Profile of the deviation from a reference angle, arg(X exp(-i reference)), in (-pi, pi]. In the
   * state with phase pi use the reference pi: fluctuations then do not meet the branch cut.
   *
   * @param reference reference angle, radians, finite
   * @return observable with one number for each grid point, radians
   * @throws IllegalArgumentException if the reference is not finite
   */
  public static Observable wrappedAbout(double reference) {
    Check.finite(reference, "reference angle (radians)");
    // exact at the two angles that matter most: sin(pi) in doubles is not 0
    double cos = reference == Math.PI || reference == -Math.PI ? -1 : Math.cos(reference);
    double sin = reference == Math.PI || reference == -Math.PI ? 0 : Math.sin(reference);
    String name =
        reference == 0 ? "relative phase" : "relative phase measured from " + reference;
    return new PointwiseProfile(
        name, 2, (snapshot, result) -> fillAngles(snapshot, result, cos, sin));
  }

  /**
   * Profile of phi made continuous along x, starting with phi in (-pi, pi] at the first point. Line
   * grids only.
   *
   * @return observable with one number for each grid point, radians
   */
  public static Observable unwrapped() {
    return new PointwiseProfile(
        "unwrapped relative phase", 2,
        (snapshot, result) -> {
          fillAngles(snapshot, result, 1, 0);
          PhaseUnwrapping.requireLine(snapshot.model(), "unwrapped relative phase");
          PhaseUnwrapping.unwrapInPlace(result);
        });
  }

  /**
   * Winding number of phi around the ring. Line grids only.
   *
   * @return observable of a single whole number
   */
  public static Observable winding() {
    Object key = new Object();
    return new ScalarMeasure(
        "winding number of the relative phase", 2,
        snapshot -> {
          PhaseUnwrapping.requireLine(snapshot.model(), "winding number of the relative phase");
          double[] angles =
              snapshot.scratch(key, double[].class, m -> new double[m.region().grid().points()]);
          fillAngles(snapshot, angles, 1, 0);
          return PhaseUnwrapping.winding(angles);
        });
  }

  private static void fillAngles(Snapshot snapshot, double[] result, double cos, double sin) {
    Field f = snapshot.field();
    for (int i = 0; i < result.length; i++) {
      double re = f.re(0)[i] * f.re(1)[i] + f.im(0)[i] * f.im(1)[i];
      double im = f.im(0)[i] * f.re(1)[i] - f.re(0)[i] * f.im(1)[i];
      result[i] = PhaseUnwrapping.angle(re * cos + im * sin, im * cos - re * sin);
    }
  }

  private static double cosine(double re1, double im1, double re2, double im2) {
    double re = re1 * re2 + im1 * im2;
    double im = im1 * re2 - re1 * im2;
    double square = re * re + im * im;
    if (square > Double.MIN_NORMAL && square < Double.POSITIVE_INFINITY) {
      return re / Math.sqrt(square);
    }
    double size = Math.hypot(re, im); // slow, but right where the squares leave the range
    return size == 0 ? 0 : re / size;
  }
}
