package spgpe.statistics;

import java.util.SplittableRandom;

/** Random numbers for the tests of this package. */
final class Decay {
  private Decay() {}

  static double exponential(SplittableRandom random) {
    return -Math.log1p(-random.nextDouble());
  }

  static double normal(SplittableRandom random) {
    double radius = Math.sqrt(2 * exponential(random));
    return radius * Math.cos(2 * Math.PI * random.nextDouble());
  }
}
