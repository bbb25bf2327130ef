package spgpe.planning;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.Scale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import spgpe.units.EventRate;
import spgpe.units.TimeSpan;

/** Numbers of shots and bubbles against closed forms and direct sampling. */
class ShotStatisticsTest {
  private static ShotStatistics of(double rate, double shot, double conversion) {
    return ShotStatistics.of(
        EventRate.perSecond(rate), TimeSpan.ofSeconds(shot), TimeSpan.ofSeconds(conversion));
  }

  @Test
  void closedForms() {
    ShotStatistics s = of(2, 0.5, 0);
    assertEquals(0.5, s.meanLifetime().seconds());
    assertEquals(1 - Math.exp(-1), s.decayedFraction(), 1e-15);
    assertEquals(100, ShotStatistics.eventsFor(0.1));
    assertEquals(400, ShotStatistics.eventsFor(0.05));
    assertEquals(159, s.shotsFor(0.1)); // 100/0.63212
    assertEquals(172, s.shotsForEndImages(0.1)); // 100 (e - 1)
    assertEquals(s.decayedFraction(), s.bubblesPerShot(), 1e-15);
  }

  @Test
  void rareDecays() {
    ShotStatistics s = of(1e-9, 1, 0.1);
    assertEquals(1e-9, s.decayedFraction(), 1e-17);
    assertEquals(1e11, s.shotsFor(0.1), 1e3);
    assertEquals(1e11, s.shotsForEndImages(0.1), 1e3);
    assertEquals(1e-9, s.bubblesPerShot(), 1e-17);
    assertEquals(Double.POSITIVE_INFINITY, of(1, 1000, 0.1).shotsForEndImages(0.1));
  }

  /** Unconverted fraction exp(-(Gamma/L) v t^2), then exp(-Gamma (t - t_c/2)), summed directly. */
  @ParameterizedTest
  @CsvSource({"3, 1, 0.4", "3, 0.2, 0.4", "0.5, 4, 2", "20, 1, 1"})
  void bubblesByQuadrature(double rate, double shot, double conversion) {
    int n = 200_000;
    double sum = 0;
    for (int i = 0; i < n; i++) {
      double t = shot * (i + 0.5) / n;
      double covered =
          t < conversion ? t * t / (2 * conversion) : t - conversion / 2;
      sum += rate * Math.exp(-rate * covered) * shot / n;
    }
    assertEquals(sum, of(rate, shot, conversion).bubblesPerShot(), 1e-8);
  }

  /**
   * The process itself: nucleation attempts uniform on a ring of length 1 and in time, counted where
   * no earlier bubble has come by. 20000 shots, standard error about 0.011; the limit of 0.05 is 4.5
   * of them (false alarm 7e-6, and the seed is fixed). Forgetting the second wall or that growth
   * stops at the whole ring moves the mean by 0.2 and more.
   */
  @Test
  void bubblesBySampling() {
    double rate = 6;
    double shot = 1;
    double conversion = 0.5;
    double speed = 1 / (2 * conversion);
    SplittableRandom random = new SplittableRandom(7);
    int shots = 20_000;
    long bubbles = 0;
    double[] at = new double[200];
    double[] when = new double[200];
    for (int s = 0; s < shots; s++) {
      int count = 0;
      double t = 0;
      while (true) {
        t -= Math.log(1 - random.nextDouble()) / rate;
        if (t > shot) {
          break;
        }
        double x = random.nextDouble();
        boolean covered = false;
        for (int b = 0; b < count; b++) {
          double d = Math.abs(x - at[b]);
          covered |= Math.min(d, 1 - d) < speed * (t - when[b]);
        }
        if (!covered) {
          at[count] = x;
          when[count] = t;
          count++;
        }
      }
      bubbles += count;
    }
    assertEquals(
        of(rate, shot, conversion).bubblesPerShot(), bubbles / (double) shots, 0.05);
  }

  /**
   * Scatter of the rate of samples of 172 shots looked at only at the end, x = 1: the relative error
   * is 0.1 as asked for. 4000 samples give the scatter to 1.1 %, and it is itself 1 % above the
   * large-sample value; the limit of 6 % is passed by chance less than once in 1e5. Leaving out the
   * factor 1/(1 - p) would change it by 40 %.
   */
  @Test
  void endImagesGiveTheErrorAskedFor() {
    SplittableRandom random = new SplittableRandom(11);
    int samples = 4000;
    double sum = 0;
    double squares = 0;
    for (int i = 0; i < samples; i++) {
      int decayed = 0;
      for (int s = 0; s < 172; s++) {
        decayed += random.nextDouble() < 1 - Math.exp(-1) ? 1 : 0;
      }
      double x = -Math.log1p(-decayed / 172.0);
      sum += x;
      squares += x * x;
    }
    double mean = sum / samples;
    assertEquals(0.1, Math.sqrt(squares / samples - mean * mean), 0.006);
  }

  @Property(tries = 200)
  void moreDecaysWithALongerShotAndAHigherRate(
      @ForAll @DoubleRange(min = 1e-4, max = 50) @Scale(4) double rate,
      @ForAll @DoubleRange(min = 1e-3, max = 0.5) @Scale(4) double shot,
      @ForAll @DoubleRange(min = 0, max = 2) @Scale(4) double conversion) {
    ShotStatistics s = of(rate, shot, conversion);
    ShotStatistics longer = of(rate, 1.1 * shot, conversion);
    ShotStatistics faster = of(1.1 * rate, shot, conversion);
    assertTrue(longer.decayedFraction() > s.decayedFraction());
    assertTrue(faster.decayedFraction() > s.decayedFraction());
    assertTrue(longer.shotsFor(0.1) <= s.shotsFor(0.1));
    assertTrue(longer.bubblesPerShot() > s.bubblesPerShot());
    assertTrue(s.shotsFor(0.05) > s.shotsFor(0.1));
    assertTrue(s.shotsForEndImages(0.1) >= s.shotsFor(0.1), "an end image says less");
    // at least the first bubble, at most what would form without any conversion
    assertTrue(s.bubblesPerShot() >= s.decayedFraction() * (1 - 1e-12));
    assertTrue(s.bubblesPerShot() <= rate * shot * (1 + 1e-12));
  }

  @Test
  void refusals() {
    for (double bad : new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY}) {
      assertThrows(IllegalArgumentException.class, () -> ShotStatistics.eventsFor(bad));
    }
    EventRate one = EventRate.perSecond(1);
    TimeSpan second = TimeSpan.ofSeconds(1);
    assertThrows(
        IllegalArgumentException.class,
        () -> ShotStatistics.of(new EventRate(1, 1), second, second));
    assertThrows(
        IllegalArgumentException.class,
        () -> ShotStatistics.of(EventRate.perSecond(0), second, second));
    assertThrows(
        IllegalArgumentException.class,
        () -> ShotStatistics.of(one, TimeSpan.ofSeconds(0), second));
  }
}
