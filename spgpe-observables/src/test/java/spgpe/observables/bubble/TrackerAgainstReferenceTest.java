package spgpe.observables.bubble;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import java.util.stream.Collectors;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;

class TrackerAgainstReferenceTest {
  private static final double LENGTH = 24;

  /** A sum of waves with slowly changing amplitudes: regions are born, merge, split, vanish. */
  private static double[][] randomFrames(long seed, int frames, int points) {
    Random random = new Random(seed);
    int waves = 6;
    double[] re = new double[waves];
    double[] im = new double[waves];
    double[][] result = new double[frames][points];
    for (int s = 0; s < frames; s++) {
      for (int k = 0; k < waves; k++) {
        re[k] = 0.8 * re[k] + 0.6 * random.nextGaussian();
        im[k] = 0.8 * im[k] + 0.6 * random.nextGaussian();
      }
      for (int i = 0; i < points; i++) {
        double x = 2 * Math.PI * i / points;
        for (int k = 0; k < waves; k++) {
          result[s][i] += (re[k] * Math.cos(k * x) + im[k] * Math.sin(k * x)) / Math.sqrt(waves);
        }
      }
    }
    return result;
  }

  static List<String> events(BubbleHistory history) {
    return history.events().stream()
        .map(e -> e.time() + " " + e.kind() + " " + e.bubble() + " " + e.other())
        .collect(Collectors.toList());
  }

  @Property(tries = 60, seed = "2026")
  void sameEventsAsThePlainDetector(
      @ForAll @IntRange(min = 0, max = 100_000) int seed,
      @ForAll @IntRange(min = 9, max = 40) int points,
      @ForAll @IntRange(min = 0, max = 3) int smoothing) {
    double[][] frames = randomFrames(seed, 30, points);
    double[] times = new double[30];
    for (int s = 0; s < 30; s++) {
      times[s] = 0.5 * s;
    }
    BubbleSettings settings =
        BubbleSettings.atLevel(0.5).withSmoothing(0.4 * smoothing).withHysteresis(0.9, 0.2);
    BubbleHistory found = BubbleDetector.of(settings).find(times, frames, LENGTH);
    assertEquals(ReferenceTracker.events(times, frames, LENGTH, settings), events(found));
  }

  @Test
  void everyKindOfEventOccursInTheRandomFields() {
    StringBuilder all = new StringBuilder();
    double[] times = new double[60];
    for (int s = 0; s < 60; s++) {
      times[s] = s;
    }
    for (int seed = 0; seed < 40; seed++) {
      BubbleSettings settings = BubbleSettings.atLevel(0.3).withHysteresis(0.8, -0.5);
      BubbleHistory h =
          BubbleDetector.of(settings).find(times, randomFrames(seed, 60, 32), LENGTH);
      all.append(events(h));
      for (Bubble b : h.bubbles()) {
        assertTrue(b.endTime() >= b.birthTime());
        assertTrue(b.birthSite().x() >= 0 && b.birthSite().x() < LENGTH);
        assertTrue(b.largestWidth() > 0 && b.largestWidth() <= LENGTH);
        for (int i = 0; i < b.walls().size(); i++) {
          double width = b.walls().right(i) - b.walls().left(i);
          assertTrue(width > 0 && width < LENGTH, "width " + width);
        }
      }
    }
    for (BubbleEvent.Kind kind : BubbleEvent.Kind.values()) {
      assertTrue(all.indexOf(kind.name()) >= 0, "never seen: " + kind);
    }
  }

  @Property(tries = 30, seed = "2026")
  void turningTheRingTurnsOnlyTheSites(@ForAll @IntRange(min = 1, max = 31) int shift) {
    double[][] frames = randomFrames(7, 40, 32);
    double[][] turned = new double[40][32];
    double[] times = new double[40];
    for (int s = 0; s < 40; s++) {
      times[s] = s;
      for (int i = 0; i < 32; i++) {
        turned[s][(i + shift) % 32] = frames[s][i];
      }
    }
    BubbleDetector d =
        BubbleDetector.of(
            BubbleSettings.atLevel(0.5).withSmoothing(0.5).withHysteresis(0.9, 0.3));
    List<Bubble> a = d.find(times, frames, LENGTH).bubbles();
    List<Bubble> b = d.find(times, turned, LENGTH).bubbles();
    assertEquals(a.size(), b.size());
    // bubbles born in one frame may change their order: compare as sorted lists
    assertEquals(text(a, shift * LENGTH / 32), text(b, 0));
  }

  private static List<String> text(List<Bubble> bubbles, double turn) {
    return bubbles.stream()
        .map(
            x ->
                x.birthTime() + " " + x.origin() + " " + x.endTime() + " " + x.fate() + " "
                    + Math.round(1e6 * x.largestWidth()) + " "
                    + Math.round(1e4 * ((x.birthSite().x() + turn + 1e-7) % LENGTH)))
        .sorted().toList();
  }

  @Test
  void smoothingIsTheNormalisedSum() {
    Random random = new Random(1);
    for (int points : new int[] {7, 8, 40}) {
      double[] profile = new double[points];
      for (int i = 0; i < points; i++) {
        profile[i] = random.nextGaussian();
      }
      for (double sigma : new double[] {0, 0.3, 2}) {
        double[] result = new double[points];
        new PeriodicSmoothing(points, LENGTH / points, sigma).apply(profile, result);
        double[] plain = ReferenceTracker.smooth(profile, LENGTH, sigma);
        for (int i = 0; i < points; i++) {
          assertEquals(plain[i], result[i], 1e-7);
        }
      }
    }
  }
}
