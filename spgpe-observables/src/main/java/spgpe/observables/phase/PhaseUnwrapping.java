package spgpe.observables.phase;

import spgpe.internal.check.Check;
import spgpe.model.Model;

/**
 * Continuous phases on a ring. Neighbouring points are joined by the shorter way: the phase step
 * between them is taken in (-pi, pi]. That is right if the grid resolves the phase; a step near pi
 * means a zero of the field between the points, and the winding is then about to change.
 */
public final class PhaseUnwrapping {
  private static final double TURN = 2 * Math.PI;

  private PhaseUnwrapping() {}

  /**
   * Makes a phase continuous.
   *
   * @param wrapped phases at consecutive points, radians, finite; not changed
   * @return new array that starts with the same number and differs by multiples of 2 pi
   * @throws IllegalArgumentException if a phase is not finite
   */
  public static double[] unwrap(double[] wrapped) {
    requireFinite(wrapped);
    double[] result = wrapped.clone();
    unwrapInPlace(result);
    return result;
  }

  /**
   * Winding number around the ring: the sum of all phase steps, also that from the last point to
   * the first, over 2 pi.
   *
   * @param wrapped phases at the points of a ring, radians, finite
   * @return winding number
   * @throws IllegalArgumentException if a phase is not finite
   */
  public static int winding(double[] wrapped) {
    requireFinite(wrapped);
    double sum = 0;
    for (int i = 0; i < wrapped.length; i++) {
      sum += step(wrapped[i], wrapped[(i + 1) % wrapped.length]);
    }
    return (int) Math.rint(sum / TURN);
  }

  /**
   * The same of arg(re + i im) without its angles: the crossings of the cut on the negative real
   * axis, with their signs. Where the field vanishes its angle counts as 0.
   */
  static int winding(double[] re, double[] im) {
    int turns = 0;
    int last = re.length - 1;
    boolean upperBefore = im[last] >= 0;
    for (int i = 0; i <= last; i++) {
      boolean upper = im[i] >= 0;
      if (upper != upperBefore || im[i] == 0) {
        turns += crossing(re, im, i == 0 ? last : i - 1, i);
      }
      upperBefore = upper;
    }
    return turns;
  }

  /** Of one step; a step by exactly pi goes forward. The upper half plane is closed. */
  private static int crossing(double[] re, double[] im, int from, int to) {
    boolean fromUpper = im[from] >= 0;
    boolean toUpper = im[to] >= 0;
    if (fromUpper == toUpper) { // within a half plane only from pi to 0
      return im[from] == 0 && im[to] == 0 && re[from] < 0 && re[to] >= 0 ? 1 : 0;
    }
    int upper = fromUpper ? from : to;
    if (im[upper] == 0 && re[upper] == 0) {
      return 0; // of angle 0
    }
    double turn = re[from] * im[to] - im[from] * re[to];
    if (fromUpper) {
      return turn >= 0 ? 1 : 0;
    }
    return turn < 0 ? -1 : 0;
  }

  static void unwrapInPlace(double[] phases) {
    double previous = phases[0];
    for (int i = 1; i < phases.length; i++) {
      double original = phases[i];
      phases[i] = phases[i - 1] + step(previous, original);
      previous = original;
    }
  }

  /**
   * Phase step by the shorter way.
   *
   * @param from phase, radians, finite
   * @param to phase, radians, finite
   * @return to - from plus a multiple of 2 pi, in (-pi, pi]
   */
  public static double step(double from, double to) {
    double difference = to - from;
    if (Math.abs(difference) < Math.PI) {
      return difference; // what the slow remainder gives
    }
    double d = Math.IEEEremainder(difference, TURN);
    return d <= -Math.PI ? d + TURN : d;
  }

  /** Angle in (-pi, pi]; a negative zero does not give -pi. */
  static double angle(double re, double im) {
    return Math.atan2(im + 0.0, re);
  }

  static void requireLine(Model model, String name) {
    if (model.region().grid().dimension() != 1) { // a measurement allocates nothing
      throw new IllegalArgumentException(
          "this observable needs a line (ring): observable=\"" + name + "\", grid="
              + model.region().grid());
    }
  }

  private static void requireFinite(double[] phases) {
    Check.notNull(phases, "phases");
    Check.argument(phases.length > 0, "at least one phase must be given");
    for (int i = 0; i < phases.length; i++) {
      Check.argument(
          Double.isFinite(phases[i]),
          "phases (radians) must be finite: phases[%s]=%s", i, phases[i]);
    }
  }
}
