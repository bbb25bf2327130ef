package spgpe.projector;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierProviders;

/**
 * What every coherent region and its transform must do. Inherit, supply the region, and run with
 * JUnit. Nothing here is left to chance; tolerances are those of rounding.
 */
public abstract class ProjectorContract {
  private static final int COMPONENTS = 2;
  private static final int LANES = 3;

  /**
   * The region under test.
   *
   * @return a region of at most a few thousand points
   */
  protected abstract CoherentRegion region();

  /**
   * The Fourier back end it is tried with.
   *
   * @return the provider; the preferred one unless overridden
   */
  protected FourierProvider provider() {
    return FourierProviders.preferred();
  }

  /**
   * What does the transforms.
   *
   * @return the engine; the Fourier back end unless overridden
   */
  protected Engine engine() {
    return Engine.PROVIDER;
  }

  private ModeTransform transform(int components, int lanes) {
    return region().transform(components, lanes, provider(), engine());
  }

  private Amplitudes randomState(long seed, int components, int lanes) {
    Amplitudes state = new Amplitudes(region(), components, lanes);
    SplittableRandom random = new SplittableRandom(seed);
    for (int c = 0; c < components; c++) {
      for (int i = 0; i < state.re(c).length; i++) {
        state.re(c)[i] = random.nextDouble(-1, 1);
        state.im(c)[i] = random.nextDouble(-1, 1);
      }
    }
    return state;
  }

  private Field randomField(long seed, int components, int lanes) {
    Field field = new Field(region().grid(), components, lanes);
    SplittableRandom random = new SplittableRandom(seed);
    for (int c = 0; c < components; c++) {
      for (int i = 0; i < field.re(c).length; i++) {
        field.re(c)[i] = random.nextDouble(-1, 1);
        field.im(c)[i] = random.nextDouble(-1, 1);
      }
    }
    return field;
  }

  private Field projected(Field field) {
    Amplitudes modes = new Amplitudes(region(), field.components(), field.lanes());
    ModeTransform transform = transform(field.components(), field.lanes());
    transform.toModes(field, modes);
    Field back = new Field(region().grid(), field.components(), field.lanes());
    transform.toPosition(modes, back);
    return back;
  }

  private static void assertClose(Field expected, Field found, double tolerance) {
    for (int c = 0; c < expected.components(); c++) {
      for (int i = 0; i < expected.re(c).length; i++) {
        assertEquals(expected.re(c)[i], found.re(c)[i], tolerance);
        assertEquals(expected.im(c)[i], found.im(c)[i], tolerance);
      }
    }
  }

  @Test
  void projectingTwiceIsProjectingOnce() {
    Field once = projected(randomField(1, COMPONENTS, LANES));
    assertClose(once, projected(once), 1e-14 * Math.sqrt(region().modes()));
  }

  @Test
  void keptModesSurviveTheWayThereAndBack() {
    Amplitudes state = randomState(2, COMPONENTS, LANES);
    Field field = new Field(region().grid(), COMPONENTS, LANES);
    Amplitudes back = new Amplitudes(region(), COMPONENTS, LANES);
    ModeTransform transform = transform(COMPONENTS, LANES);
    transform.toPosition(state, field);
    transform.toModes(field, back);
    for (int c = 0; c < COMPONENTS; c++) {
      for (int i = 0; i < state.re(c).length; i++) {
        assertEquals(state.re(c)[i], back.re(c)[i], 1e-14);
        assertEquals(state.im(c)[i], back.im(c)[i], 1e-14);
      }
    }
  }

  @Test
  void theProjectorIsSelfAdjoint() {
    Field phi = randomField(3, 1, 1);
    Field chi = randomField(4, 1, 1);
    double[] left = product(phi, projected(chi));
    double[] right = product(projected(phi), chi);
    double scale = region().grid().points();
    assertEquals(left[0], right[0], 1e-14 * scale);
    assertEquals(left[1], right[1], 1e-14 * scale);
  }

  private static double[] product(Field phi, Field chi) {
    double re = 0;
    double im = 0;
    for (int i = 0; i < phi.re(0).length; i++) {
      re += phi.re(0)[i] * chi.re(0)[i] + phi.im(0)[i] * chi.im(0)[i];
      im += phi.re(0)[i] * chi.im(0)[i] - phi.im(0)[i] * chi.re(0)[i];
    }
    return new double[] {re, im};
  }

  @Test
  void theAtomNumberIsTheIntegralOfTheDensity() {
    Amplitudes state = randomState(5, 1, 1);
    Field field = new Field(region().grid(), 1, 1);
    transform(1, 1).toPosition(state, field);
    double number = product(field, field)[0] * region().grid().cellVolume();
    assertEquals(state.atomNumber(0, 0), number, 1e-13 * number);
  }

  @Test
  void aModeIsANormalisedPlaneWave() {
    CoherentRegion region = region();
    ModeTransform transform = transform(1, 1);
    Field field = new Field(region.grid(), 1, 1);
    double size = 1 / Math.sqrt(region.grid().volume());
    int stride = Math.max(1, region.modes() / 17);
    for (int m = 0; m < region.modes(); m += stride) {
      Amplitudes state = new Amplitudes(region, 1, 1);
      state.re(0)[m] = 1;
      transform.toPosition(state, field);
      for (int p = 0; p < region.grid().points(); p++) {
        double turn = 0;
        for (int axis = 0; axis < region.grid().dimension(); axis++) {
          turn += region.waveNumber(axis, m) * region.grid().coordinate(axis, p);
        }
        assertEquals(size * Math.cos(turn), field.re(0)[p], 1e-12 * size);
        assertEquals(size * Math.sin(turn), field.im(0)[p], 1e-12 * size);
      }
    }
  }

  @Test
  void lanesAndComponentsDoNotMix() {
    Amplitudes many = randomState(6, COMPONENTS, LANES);
    Field field = new Field(region().grid(), COMPONENTS, LANES);
    transform(COMPONENTS, LANES).toPosition(many, field);
    Amplitudes one = new Amplitudes(region(), COMPONENTS, 1);
    Field alone = new Field(region().grid(), COMPONENTS, 1);
    for (int lane = 0; lane < LANES; lane++) {
      many.copyLane(lane, one);
      transform(COMPONENTS, 1).toPosition(one, alone);
      for (int c = 0; c < COMPONENTS; c++) {
        for (int p = 0; p < region().grid().points(); p++) {
          assertEquals(alone.re(c)[p], field.re(c)[p * LANES + lane], 0);
          assertEquals(alone.im(c)[p], field.im(c)[p * LANES + lane], 0);
        }
      }
    }
  }

  @Test
  void aLocalOperationIsProjected() {
    Amplitudes state = randomState(7, 1, LANES);
    ModeTransform transform = transform(1, LANES);
    Amplitudes found = randomState(8, 1, LANES);
    LocalOperation square =
        block -> {
          for (int i = block.begin(); i < block.end(); i++) {
            double x = region().grid().coordinate(0, block.pointOf(i));
            block.resultRe(0)[i] += x * block.psiRe(0)[i] * block.psiRe(0)[i];
            block.resultIm(0)[i] += block.psiIm(0)[i];
          }
        };
    transform.applyLocal(state, square, found);
    Field field = new Field(region().grid(), 1, LANES);
    transform.toPosition(state, field);
    for (int i = 0; i < field.re(0).length; i++) {
      double x = region().grid().coordinate(0, i / LANES);
      field.re(0)[i] = x * field.re(0)[i] * field.re(0)[i];
    }
    Amplitudes expected = new Amplitudes(region(), 1, LANES);
    transform.toModes(field, expected);
    double number = IntStream.range(0, LANES).mapToDouble(l -> expected.atomNumber(0, l)).sum();
    double scale = Math.sqrt(number);
    for (int i = 0; i < expected.re(0).length; i++) {
      assertEquals(expected.re(0)[i], found.re(0)[i], 1e-13 * scale);
      assertEquals(expected.im(0)[i], found.im(0)[i], 1e-13 * scale);
    }
  }

  @Test
  void indicesAndModeNumbersAreInverseMaps() {
    CoherentRegion region = region();
    boolean line = region.grid().dimension() == 1;
    for (int m = 0; m < region.modes(); m++) {
      int ny = line ? 0 : region.modeNumber(1, m);
      assertEquals(m, region.indexOf(region.modeNumber(0, m), ny));
    }
    for (int beyond : new int[] {region.grid().points(), Integer.MAX_VALUE, Integer.MIN_VALUE}) {
      assertEquals(-1, region.indexOf(beyond));
    }
  }

  @Test
  void shapesThatDoNotFitAreRefused() {
    ModeTransform transform = transform(1, 1);
    Amplitudes two = new Amplitudes(region(), 2, 1);
    Field field = new Field(region().grid(), 1, 1);
    String message =
        assertThrows(IllegalArgumentException.class, () -> transform.toPosition(two, field))
            .getMessage();
    assertTrue(message.contains("shapes must agree"), message);
    Field lanes = new Field(region().grid(), 1, 2);
    assertThrows(
        IllegalArgumentException.class,
        () -> transform.toModes(lanes, new Amplitudes(region(), 1, 1)));
  }

  @Test
  void aVerdictOfNoAliasingIsTrue() {
    for (int axis = 0; axis < region().grid().dimension(); axis++) {
      AliasingVerdict verdict = region().aliasing(3);
      if (verdict.isFree()) {
        assertFalse(cubicProductsFold(region(), axis), verdict.toString());
      } else {
        assertTrue(
            region().aliasing(1).isFree(), "a linear force never aliases on a region of a grid");
      }
    }
  }

  /**
   * Whether some n1 + n2 - n3 of kept mode numbers of an axis differs from a kept one by a non-zero
   * multiple of the number of points.
   */
  static boolean cubicProductsFold(CoherentRegion region, int axis) {
    int[] kept =
        IntStream.range(0, region.modes()).map(m -> region.modeNumber(axis, m)).distinct().toArray();
    return productsFold(kept, 3, region.grid().axis(axis).points());
  }

  /** The rule itself, by brute force, for any degree. */
  static boolean productsFold(int[] kept, int degree, int points) {
    int reach = (degree + 1) * IntStream.of(kept).map(Math::abs).max().orElse(0);
    boolean[] sums = new boolean[2 * reach + 1];
    sums[reach] = true;
    // sum of (p+1)/2 kept numbers minus (p+1)/2 kept numbers: product minus its target
    for (int factor = 0; factor <= degree; factor++) {
      int sign = factor % 2 == 0 ? 1 : -1;
      boolean[] next = new boolean[sums.length];
      for (int s = 0; s < sums.length; s++) {
        for (int n : kept) {
          int to = s + sign * n;
          if (sums[s] && to >= 0 && to < next.length) {
            next[to] = true;
          }
        }
      }
      sums = next;
    }
    for (int s = 0; s < sums.length; s++) {
      if (sums[s] && s != reach && (s - reach) % points == 0) {
        return true;
      }
    }
    return false;
  }
}
