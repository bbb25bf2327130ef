package spgpe.observables.bubble;

import org.apache.commons.math3.linear.SingularMatrixException;
import org.apache.commons.math3.stat.regression.OLSMultipleLinearRegression;
import spgpe.internal.check.Check;
import spgpe.statistics.Estimate;

/**
 * Speed of bubble walls, outwards, by least squares. Errors come from the scatter about the fit and
 * take the frames as independent; the spread between bubbles is the better error.
 *
 * <p>Linear: position = a + v t over a range of times; the mean speed there. Hyperbola: with the
 * radius r of the bubble (half the distance of the walls on a ring), r<sup>2</sup> = R0<sup>2</sup>
 * + v<sup>2</sup>(t - t0)<sup>2</sup>, the motion of a wall under constant tension and pressure
 * with limiting speed v. Immutable and thread-safe.
 *
 * @param speed v with its error
 * @param startTime t0 of the hyperbola; NaN for a linear fit
 * @param startRadius R0 of the hyperbola; NaN for a linear fit or if R0<sup>2</sup> &lt; 0
 * @param frames number of frames used
 */
public record WallSpeed(Estimate speed, double startTime, double startRadius, int frames) {
  /** Which wall. */
  public enum Side {
    /** The wall at smaller x, moving left. */
    LEFT,
    /** The wall at larger x, moving right. */
    RIGHT,
    /** Half the distance between both. */
    BOTH
  }

  /**
   * Mean speed of a wall.
   *
   * @param track positions, at least three
   * @param side which wall
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than three frames
   */
  public static WallSpeed linear(WallTrack track, Side side) {
    Check.notNull(side, "side");
    Check.notNull(track, "track");
    double[] t = new double[track.size()];
    double[] y = new double[t.length];
    for (int i = 0; i < y.length; i++) {
      t[i] = track.time(i);
      y[i] =
          switch (side) {
            case LEFT -> -track.left(i);
            case RIGHT -> track.right(i);
            case BOTH -> (track.right(i) - track.left(i)) / 2;
          };
    }
    return linear(t, y);
  }

  /**
   * Mean speed at which a radius grows.
   *
   * @param track radii, at least three; for example {@code
   *     bubble.radius().untilWrapped().between(t1, t2)}
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than three frames
   */
  public static WallSpeed linear(RadiusTrack track) {
    return linear(times(track), radii(track));
  }

  private static WallSpeed linear(double[] t, double[] y) {
    requireFrames(t, 3);
    double[][] x = new double[y.length][1];
    double centre = centre(t);
    for (int i = 0; i < y.length; i++) {
      x[i][0] = t[i] - centre;
    }
    OLSMultipleLinearRegression fit = fit(y, x);
    return new WallSpeed(
        new Estimate(
            fit.estimateRegressionParameters()[1],
            fit.estimateRegressionParametersStandardErrors()[1]),
        Double.NaN, Double.NaN, y.length);
  }

  /**
   * Limiting speed from a hyperbola with free t0, R0 and v.
   *
   * @param track positions, at least four
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than four frames, or if r<sup>2</sup> does
   *     not curve upwards
   */
  public static WallSpeed hyperbola(WallTrack track) {
    return hyperbola(track(track));
  }

  /**
   * Limiting speed from a hyperbola with free t0, R0 and v.
   *
   * @param track radii, at least four
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than four frames, or if r<sup>2</sup> does
   *     not curve upwards
   */
  public static WallSpeed hyperbola(RadiusTrack track) {
    double[] times = times(track);
    double[] radii = radii(track);
    requireFrames(times, 4);
    double[] y = new double[times.length];
    double[][] x = new double[y.length][2];
    double centre = centre(times);
    for (int i = 0; i < y.length; i++) {
      double t = times[i] - centre;
      x[i][0] = t;
      x[i][1] = t * t;
      y[i] = radii[i] * radii[i];
    }
    OLSMultipleLinearRegression fit = fit(y, x);
    double[] p = fit.estimateRegressionParameters();
    requireUpward(p[2]);
    double v = Math.sqrt(p[2]);
    double square = p[0] - p[1] * p[1] / (4 * p[2]);
    return new WallSpeed(
        new Estimate(v, fit.estimateRegressionParametersStandardErrors()[2] / (2 * v)),
        centre - p[1] / (2 * p[2]), square >= 0 ? Math.sqrt(square) : Double.NaN, y.length);
  }

  /**
   * Limiting speed from a hyperbola with known t0: r<sup>2</sup> is linear in (t - t0)<sup>2</sup>.
   *
   * @param track positions, at least three
   * @param startTime t0, finite
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than three frames, t0 is not finite, or
   *     r<sup>2</sup> does not grow
   */
  public static WallSpeed hyperbola(WallTrack track, double startTime) {
    return hyperbola(track(track), startTime);
  }

  /**
   * Limiting speed from a hyperbola with known t0: r<sup>2</sup> is linear in (t - t0)<sup>2</sup>.
   *
   * @param track radii, at least three
   * @param startTime t0, finite
   * @return the fit
   * @throws IllegalArgumentException if there are fewer than three frames, t0 is not finite, or
   *     r<sup>2</sup> does not grow
   */
  public static WallSpeed hyperbola(RadiusTrack track, double startTime) {
    Check.finite(startTime, "startTime");
    double[] times = times(track);
    double[] radii = radii(track);
    requireFrames(times, 3);
    double[] y = new double[times.length];
    double[][] x = new double[y.length][1];
    for (int i = 0; i < y.length; i++) {
      double t = times[i] - startTime;
      x[i][0] = t * t;
      y[i] = radii[i] * radii[i];
    }
    OLSMultipleLinearRegression fit = fit(y, x);
    double[] p = fit.estimateRegressionParameters();
    requireUpward(p[1]);
    double v = Math.sqrt(p[1]);
    return new WallSpeed(
        new Estimate(v, fit.estimateRegressionParametersStandardErrors()[1] / (2 * v)),
        startTime, p[0] >= 0 ? Math.sqrt(p[0]) : Double.NaN, y.length);
  }

  private static OLSMultipleLinearRegression fit(double[] y, double[][] x) {
    OLSMultipleLinearRegression fit = new OLSMultipleLinearRegression();
    try {
      fit.newSampleData(y, x);
      fit.estimateRegressionParameters();
    } catch (SingularMatrixException e) {
      throw new IllegalArgumentException("the frames of a wall fit must differ in time", e);
    }
    return fit;
  }

  private static RadiusTrack track(WallTrack walls) {
    return Check.notNull(walls, "track").radii();
  }

  private static double[] times(RadiusTrack track) {
    double[] times = new double[Check.notNull(track, "track").size()];
    for (int i = 0; i < times.length; i++) {
      times[i] = track.time(i);
    }
    return times;
  }

  private static double[] radii(RadiusTrack track) {
    double[] radii = new double[track.size()];
    for (int i = 0; i < radii.length; i++) {
      radii[i] = track.radius(i);
    }
    return radii;
  }

  private static double centre(double[] times) {
    return (times[0] + times[times.length - 1]) / 2;
  }

  private static void requireFrames(double[] times, int needed) {
    Check.argument(
        times.length >= needed,
        "a wall fit needs at least %s frames: frames=%s; widen the range of times", needed,
        times.length);
  }

  private static void requireUpward(double curvature) {
    Check.argument(
        curvature > 0,
        "the square of the radius must grow faster than linearly for a hyperbola: coefficient=%s;"
            + " use the linear fit", curvature);
  }
}
