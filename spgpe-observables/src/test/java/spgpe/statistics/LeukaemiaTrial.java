package spgpe.statistics;

/**
 * Remission times in weeks of the trial of E. J. Freireich et al., Blood 21, 699 (1963): 21
 * patients on 6-mercaptopurine, 21 on placebo. Times from memory, consistent with the published
 * number of patients 42, mean 12.88 and event fraction 0.7143.
 */
final class LeukaemiaTrial {
  private LeukaemiaTrial() {}

  /** Negative numbers mark censored times. */
  private static final double[] TREATED = {
    6, 6, 6, -6, 7, -9, 10, -10, -11, 13, 16, -17, -19, -20, 22, 23, -25, -32, -32, -34, -35
  };

  private static final double[] PLACEBO = {
    1, 1, 2, 2, 3, 4, 4, 5, 5, 8, 8, 8, 8, 11, 11, 12, 12, 15, 17, 22, 23
  };

  static SurvivalData treated() {
    return signed(TREATED);
  }

  static SurvivalData placebo() {
    return signed(PLACEBO);
  }

  private static SurvivalData signed(double[] times) {
    double[] durations = new double[times.length];
    boolean[] events = new boolean[times.length];
    for (int i = 0; i < times.length; i++) {
      durations[i] = Math.abs(times[i]);
      events[i] = times[i] > 0;
    }
    return SurvivalData.of(durations, events);
  }
}
