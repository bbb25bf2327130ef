package spgpe.projector;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import java.util.stream.IntStream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import spgpe.fourier.FourierProviders;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;

/** The aliasing rule N >= (p+1)/2 (highest - lowest) + 1 against brute force. */
class AliasingRuleTest {
  @Property(tries = 300)
  void theVerdictIsSharpForRegionsWithoutHoles(
      @ForAll @IntRange(min = 2, max = 90) int points,
      @ForAll @IntRange(min = 0, max = 1_000_000) int choice,
      @ForAll @IntRange(min = 0, max = 2) int half) {
    int lowest = -(points / 2) + choice % points;
    int highest = lowest + (choice / points) % ((points - 1) / 2 - lowest + 1);
    int degree = 2 * half + 1;
    CoherentRegion region = keeping(points, lowest, highest);
    int[] kept = IntStream.rangeClosed(lowest, highest).toArray();
    boolean folds = ProjectorContract.productsFold(kept, degree, points);
    assertEquals(!folds, region.aliasing(degree).isFree(), region.aliasing(degree).toString());
  }

  @Property(tries = 200)
  void theVerdictIsSafeForRegionsWithHoles(
      @ForAll @IntRange(min = 2, max = 60) int points,
      @ForAll long choice,
      @ForAll @IntRange(min = 0, max = 2) int half) {
    SplittableRandom random = new SplittableRandom(choice);
    boolean[] keep = new boolean[points];
    for (int i = 0; i < points; i++) {
      keep[i] = random.nextInt(4) == 0;
    }
    keep[random.nextInt(points)] = true;
    CoherentRegion region =
        Projector.keeping("random", (nx, ny) -> keep[Math.floorMod(nx, points)] ? 1 : 0)
            .on(PeriodicGrid.of(Axis.of(points, 1)));
    int[] kept = IntStream.range(0, region.modes()).map(m -> region.modeNumber(0, m)).toArray();
    AliasingVerdict verdict = region.aliasing(2 * half + 1);
    boolean folds = ProjectorContract.productsFold(kept, 2 * half + 1, points);
    assertTrue(!verdict.isFree() || !folds, verdict.toString());
  }

  private static CoherentRegion keeping(int points, int lowest, int highest) {
    return Projector.keeping("a range", (nx, ny) -> nx >= lowest && nx <= highest ? 1 : 0)
        .on(PeriodicGrid.of(Axis.of(points, 1)));
  }

  /**
   * Ten modes each side: 41 points for a cubic and 61 for a quintic force (derived, see
   * docs/theory.md). One point fewer shows in the force, and the needed number leaves rounding only.
   */
  @Test
  void theForceItselfShowsTheThreshold() {
    assertEquals(41, region(64).aliasing(3).pointsNeeded(0));
    assertEquals(61, region(64).aliasing(5).pointsNeeded(0));
    assertTrue(forceError(40, 1) > 1e-5);
    assertTrue(forceError(41, 1) < 1e-14);
    assertTrue(forceError(60, 2) > 1e-9);
    assertTrue(forceError(61, 2) < 1e-14);
  }

  private static CoherentRegion region(int points) {
    return Projector.modesUpTo(10).on(PeriodicGrid.of(Axis.of(points, 9)));
  }

  /** Relative error of P{|psi|^(2 power) psi} against a grid with plenty of points. */
  private static double forceError(int points, int power) {
    double[][] exact = force(256, power);
    double[][] found = force(points, power);
    double error = 0;
    double size = 0;
    for (int n = 0; n < exact.length; n++) {
      error += Math.pow(exact[n][0] - found[n][0], 2) + Math.pow(exact[n][1] - found[n][1], 2);
      size += exact[n][0] * exact[n][0] + exact[n][1] * exact[n][1];
    }
    return Math.sqrt(error / size);
  }

  private static double[][] force(int points, int power) {
    CoherentRegion region = region(points);
    Amplitudes state = new Amplitudes(region, 1, 1);
    SplittableRandom random = new SplittableRandom(5);
    for (int n = -10; n <= 10; n++) {
      state.re(0)[region.indexOf(n)] = random.nextDouble(-1, 1);
      state.im(0)[region.indexOf(n)] = random.nextDouble(-1, 1);
    }
    Amplitudes result = new Amplitudes(region, 1, 1);
    region
        .transform(1, 1, FourierProviders.preferred())
        .applyLocal(
            state,
            block -> {
              for (int i = block.begin(); i < block.end(); i++) {
                double re = block.psiRe(0)[i];
                double im = block.psiIm(0)[i];
                double factor = Math.pow(re * re + im * im, power);
                block.resultRe(0)[i] += factor * re;
                block.resultIm(0)[i] += factor * im;
              }
            },
            result);
    double[][] byNumber = new double[21][];
    for (int n = -10; n <= 10; n++) {
      int m = region.indexOf(n);
      byNumber[n + 10] = new double[] {result.re(0)[m], result.im(0)[m]};
    }
    return byNumber;
  }
}
