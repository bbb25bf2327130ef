package spgpe.projector;

import java.util.Arrays;
import spgpe.internal.check.Check;

/**
 * The state: amplitudes a_jk of the kept modes, for one or several lanes.
 *
 * <p>Separate arrays for the real and imaginary part of each component; the element of mode m in
 * lane l has index {@code m * lanes + l}. Lanes are independent realisations advanced in lockstep.
 * The arrays handed out are live: writing to them changes the state. Fixed shape, mutable, not
 * thread-safe.
 */
public final class Amplitudes extends LaneArrays {
  private final CoherentRegion region;

  /**
   * Makes a state of zeros.
   *
   * @param region coherent region
   * @param components number of components, at least 1
   * @param lanes number of lanes, at least 1
   * @throws IllegalArgumentException if a number is out of range
   */
  public Amplitudes(CoherentRegion region, int components, int lanes) {
    super("modes", Check.notNull(region, "region").modes(), components, lanes);
    this.region = region;
  }

  /**
   * The coherent region.
   *
   * @return the region
   */
  public CoherentRegion region() {
    return region;
  }

  /** Sets every amplitude to zero. */
  public void clear() {
    for (int c = 0; c < re.length; c++) {
      Arrays.fill(re[c], 0);
      Arrays.fill(im[c], 0);
    }
  }

  /**
   * Takes over the amplitudes of a state of the same shape.
   *
   * @param source where to copy from
   * @throws IllegalArgumentException if the shapes differ
   */
  public void set(Amplitudes source) {
    Check.notNull(source, "source");
    requireShape(source.region, source.components(), source.lanes);
    for (int c = 0; c < re.length; c++) {
      System.arraycopy(source.re[c], 0, re[c], 0, re[c].length);
      System.arraycopy(source.im[c], 0, im[c], 0, im[c].length);
    }
  }

  /**
   * Writes a one-lane state into a lane of this one.
   *
   * @param lane lane index
   * @param source state with one lane
   * @throws IllegalArgumentException if the shapes do not fit
   */
  public void setLane(int lane, Amplitudes source) {
    Check.notNull(source, "source");
    Check.inRange(lane, 0, lanes - 1, "lane");
    source.requireShape(region, re.length, 1);
    for (int c = 0; c < re.length; c++) {
      for (int m = 0; m < source.re[c].length; m++) {
        re[c][m * lanes + lane] = source.re[c][m];
        im[c][m * lanes + lane] = source.im[c][m];
      }
    }
  }

  /**
   * Copies a lane of this state into a one-lane state.
   *
   * @param lane lane index
   * @param target state with one lane
   * @throws IllegalArgumentException if the shapes do not fit
   */
  public void copyLane(int lane, Amplitudes target) {
    Check.notNull(target, "target");
    Check.inRange(lane, 0, lanes - 1, "lane");
    target.requireShape(region, re.length, 1);
    for (int c = 0; c < re.length; c++) {
      for (int m = 0; m < target.re[c].length; m++) {
        target.re[c][m] = re[c][m * lanes + lane];
        target.im[c][m] = im[c][m * lanes + lane];
      }
    }
  }

  /**
   * An independent copy.
   *
   * @return state of the same shape and values
   */
  public Amplitudes copy() {
    Amplitudes copy = new Amplitudes(region, re.length, lanes);
    copy.set(this);
    return copy;
  }

  /**
   * Atom number of a component in a lane: the sum of |a_k|<sup>2</sup>.
   *
   * @param component component index
   * @param lane lane index
   * @return atom number; NaN or infinite if an amplitude is
   * @throws IllegalArgumentException if there is no such component or lane
   */
  public double atomNumber(int component, int lane) {
    Check.inRange(component, 0, re.length - 1, "component index");
    Check.inRange(lane, 0, lanes - 1, "lane");
    double sum = 0;
    for (int i = lane; i < re[component].length; i += lanes) {
      sum += re[component][i] * re[component][i] + im[component][i] * im[component][i];
    }
    return sum;
  }

  /**
   * Requires a shape.
   *
   * @param expectedRegion region the state must live on
   * @param components number of components it must have
   * @param expectedLanes number of lanes it must have
   * @throws IllegalArgumentException if the shape differs; the message gives both
   */
  public void requireShape(CoherentRegion expectedRegion, int components, int expectedLanes) {
    boolean fits =
        (region == expectedRegion || region.equals(expectedRegion))
            && re.length == components && lanes == expectedLanes;
    if (!fits) { // written so that the check of a time step allocates nothing
      Check.argument(
          false,
          "shapes must agree: expected %s components, %s lanes on [%s]; found %s components, %s"
              + " lanes on [%s]",
          components, expectedLanes, expectedRegion, re.length, lanes, region);
    }
  }
}
