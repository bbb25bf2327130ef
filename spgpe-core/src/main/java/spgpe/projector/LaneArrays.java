package spgpe.projector;

import spgpe.internal.check.Check;

/**
 * Complex numbers for each component, element (mode or point) and lane: what {@link Amplitudes} and
 * {@link Field} share. Separate real and imaginary arrays, index {@code element * lanes + lane}.
 */
abstract class LaneArrays {
  private static final int MAX_NUMBERS = 1 << 28;

  final double[][] re;
  final double[][] im;
  final int lanes;

  LaneArrays(String elementName, int elements, int components, int lanes) {
    Check.inRange(components, 1, 255, "components");
    Check.inRange(lanes, 1, 4096, "lanes");
    Check.argument(
        (long) elements * lanes <= MAX_NUMBERS,
        "%s times lanes must not exceed %s: %s=%s, lanes=%s",
        elementName, MAX_NUMBERS, elementName, elements, lanes);
    this.lanes = lanes;
    this.re = new double[components][elements * lanes];
    this.im = new double[components][elements * lanes];
  }

  /**
   * Number of components.
   *
   * @return components
   */
  public final int components() {
    return re.length;
  }

  /**
   * Number of lanes.
   *
   * @return lanes
   */
  public final int lanes() {
    return lanes;
  }

  /**
   * Live real parts.
   *
   * @param component component index from 0
   * @return array of elements x lanes numbers
   * @throws IllegalArgumentException if there is no such component
   */
  public final double[] re(int component) {
    Check.inRange(component, 0, re.length - 1, "component index");
    return re[component];
  }

  /**
   * Live imaginary parts.
   *
   * @param component component index from 0
   * @return array of elements x lanes numbers
   * @throws IllegalArgumentException if there is no such component
   */
  public final double[] im(int component) {
    Check.inRange(component, 0, im.length - 1, "component index");
    return im[component];
  }
}
