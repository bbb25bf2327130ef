package spgpe.observables.bubble;

import spgpe.internal.check.Check;

/**
 * How bubbles are told from fluctuations in an order parameter that is low in the metastable state
 * and high in the stable one, usually cos phi. Immutable and thread-safe.
 *
 * @param smoothing standard deviation of the Gaussian that smooths each frame, a length; 0 for none
 * @param seedLevel a region must exceed this somewhere to become a bubble
 * @param growLevel a bubble is the whole region above this level, and lives as long as there is one
 * @param wallLevel level at which the positions of the walls are read, the outermost crossing
 * @param minimumWidth width (at the grow level) a bubble must reach to be accepted, a length; on a
 *     plane the diameter 2 sqrt(area/pi)
 * @param minimumDuration time a bubble must live to be accepted
 * @param origin where the numbers come from
 */
public record BubbleSettings(
    double smoothing,
    double seedLevel,
    double growLevel,
    double wallLevel,
    double minimumWidth,
    double minimumDuration,
    String origin) {
  private static final double SMOOTHING_IN_PHASE_LENGTHS = 0.75;
  private static final double WIDTH_IN_PHASE_LENGTHS = 2;
  private static final double DEVIATIONS = 5;
  private static final double STABLE_COSINE = 1;
  private static final String BY_HAND = ", then changed by hand";

  /**
   * Checks the numbers.
   *
   * @param smoothing standard deviation of the Gaussian that smooths each frame, a length
   * @param seedLevel a region must exceed this somewhere to become a bubble
   * @param growLevel a bubble is the whole region above this level
   * @param wallLevel level at which the positions of the walls are read
   * @param minimumWidth width a bubble must reach to be accepted, a length
   * @param minimumDuration time a bubble must live to be accepted
   * @param origin where the numbers come from
   * @throws IllegalArgumentException if a number is not finite, a length or time is negative, or
   *     the grow level exceeds another level
   */
  public BubbleSettings {
    Check.notNegative(smoothing, "smoothing (length)");
    Check.finite(seedLevel, "seedLevel");
    Check.finite(growLevel, "growLevel");
    Check.finite(wallLevel, "wallLevel");
    Check.notNegative(minimumWidth, "minimumWidth (length)");
    Check.notNegative(minimumDuration, "minimumDuration (time)");
    Check.notNull(origin, "origin");
    Check.argument(
        growLevel <= seedLevel && growLevel <= wallLevel,
        "growLevel must not exceed the other levels: growLevel=%s, seedLevel=%s, wallLevel=%s",
        growLevel, seedLevel, wallLevel);
  }

  /**
   * One level for everything, no smoothing, everything accepted.
   *
   * @param level level of the order parameter, finite
   * @return the settings
   * @throws IllegalArgumentException if the level is not finite
   */
  public static BubbleSettings atLevel(double level) {
    return new BubbleSettings(0, level, level, level, 0, 0, "given");
  }

  /**
   * Settings for cos phi derived from the metastable state. With the phase length xi, the mean c
   * and the deviation s of the smoothed cos phi: smoothing 0.75 xi, grow level c + 5 s, seed and
   * wall level half way to the stable state, (c + 1)/2, minimum width 2 xi, no minimum duration.
   *
   * @param fluctuations fluctuations before the decay
   * @return the settings
   * @throws IllegalArgumentException if c + 5 s is more than half way to the stable state: the
   *     fluctuations are then too large for bubbles to be told from them
   */
  public static BubbleSettings from(MetastableFluctuations fluctuations) {
    Check.notNull(fluctuations, "fluctuations");
    double smoothing = SMOOTHING_IN_PHASE_LENGTHS * fluctuations.phaseLength();
    double mean = fluctuations.meanCosine();
    double deviation = fluctuations.deviation(smoothing);
    double grow = mean + DEVIATIONS * deviation;
    double middle = (mean + STABLE_COSINE) / 2;
    Check.argument(
        grow < middle,
        "bubbles cannot be told from the metastable fluctuations: mean + %s deviations=%s must lie"
            + " below half way to the stable state=%s (smoothing=%s); give levels by hand",
        DEVIATIONS, grow, middle, smoothing);
    return new BubbleSettings(
        smoothing, middle, grow, middle, WIDTH_IN_PHASE_LENGTHS * fluctuations.phaseLength(), 0,
        "from the metastable state: mean cosine " + mean + ", smoothed deviation " + deviation
            + ", phase length " + fluctuations.phaseLength());
  }

  private BubbleSettings changed(
      double newSmoothing, double seed, double grow, double wall, double width, double duration) {
    boolean derived = !origin.equals("given") && !origin.endsWith(BY_HAND);
    return new BubbleSettings(
        newSmoothing, seed, grow, wall, width, duration, derived ? origin + BY_HAND : origin);
  }

  /**
   * A copy with another smoothing.
   *
   * @param length standard deviation of the Gaussian, finite and not negative
   * @return changed copy
   * @throws IllegalArgumentException if the length is out of range
   */
  public BubbleSettings withSmoothing(double length) {
    return changed(length, seedLevel, growLevel, wallLevel, minimumWidth, minimumDuration);
  }

  /**
   * A copy with other levels for seeding and growing (hysteresis).
   *
   * @param seed seed level, finite
   * @param grow grow level, finite, not above the seed and wall level
   * @return changed copy
   * @throws IllegalArgumentException if a level is out of range
   */
  public BubbleSettings withHysteresis(double seed, double grow) {
    return changed(smoothing, seed, grow, wallLevel, minimumWidth, minimumDuration);
  }

  /**
   * A copy with another wall level.
   *
   * @param level wall level, finite, not below the grow level
   * @return changed copy
   * @throws IllegalArgumentException if the level is out of range
   */
  public BubbleSettings withWallLevel(double level) {
    return changed(smoothing, seedLevel, growLevel, level, minimumWidth, minimumDuration);
  }

  /**
   * A copy with other conditions for acceptance.
   *
   * @param width minimum width, finite and not negative
   * @param duration minimum duration, finite and not negative
   * @return changed copy
   * @throws IllegalArgumentException if a value is out of range
   */
  public BubbleSettings accepting(double width, double duration) {
    return changed(smoothing, seedLevel, growLevel, wallLevel, width, duration);
  }
}
