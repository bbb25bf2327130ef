package spgpe.observables.phase;

import spgpe.internal.check.Check;
import spgpe.internal.measure.PairProfiles;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.internal.measure.ScalarMeasure;
import spgpe.run.Observable;

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
          double[] cosine = PairProfiles.of(snapshot).cosine();
          double sum = 0;
          for (double value : cosine) {
            sum += value;
          }
          return sum / cosine.length;
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
        (snapshot, result) -> copy(PairProfiles.of(snapshot).cosine(), result));
  }

  /**
   * Profile of sin phi.
   *
   * @return observable with one number for each grid point
   */
  public static Observable sine() {
    return new PointwiseProfile(
        "sine of the relative phase", 2,
        (snapshot, result) -> copy(PairProfiles.of(snapshot).sine(), result));
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
    String name =
        reference == 0 ? "relative phase" : "relative phase measured from " + reference;
    if (reference == 0) {
      return new PointwiseProfile(
          name, 2, (snapshot, result) -> copy(PairProfiles.of(snapshot).angle(), result));
    }
    if (Math.abs(reference) == Math.PI) {
      return new PointwiseProfile(
          name, 2, (snapshot, result) -> fillFromOpposite(PairProfiles.of(snapshot), result));
    }
    double cos = Math.cos(reference);
    double sin = Math.sin(reference);
    return new PointwiseProfile(
        name, 2, (snapshot, result) -> fillTurned(PairProfiles.of(snapshot), cos, sin, result));
  }

  private static void copy(double[] profile, double[] result) {
    System.arraycopy(profile, 0, result, 0, result.length);
  }

  private static void fillTurned(PairProfiles pair, double cos, double sin, double[] result) {
    double[] x = pair.re();
    double[] y = pair.im();
    for (int i = 0; i < result.length; i++) {
      result[i] = PhaseUnwrapping.angle(x[i] * cos + y[i] * sin, y[i] * cos - x[i] * sin);
    }
  }

  /** arg(-X) from arg X, in (-pi, pi]. */
  private static void fillFromOpposite(PairProfiles pair, double[] result) {
    double[] angle = pair.angle();
    for (int i = 0; i < result.length; i++) {
      boolean vanishes = angle[i] == 0 && pair.re()[i] == 0;
      result[i] = vanishes ? 0 : angle[i] > 0 ? angle[i] - Math.PI : angle[i] + Math.PI;
    }
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
          PhaseUnwrapping.requireLine(snapshot.model(), "unwrapped relative phase");
          copy(PairProfiles.of(snapshot).angle(), result);
          PhaseUnwrapping.unwrapInPlace(result);
        });
  }

  /**
   * Winding number of phi around the ring. Line grids only.
   *
   * @return observable of a single whole number
   */
  public static Observable winding() {
    return new ScalarMeasure(
        "winding number of the relative phase", 2,
        snapshot -> {
          PhaseUnwrapping.requireLine(snapshot.model(), "winding number of the relative phase");
          PairProfiles pair = PairProfiles.of(snapshot);
          return PhaseUnwrapping.winding(pair.re(), pair.im());
        });
  }
}
