package spgpe.model;

import static org.junit.jupiter.api.Assertions.assertEquals;

import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import net.jqwik.api.constraints.DoubleRange;
import spgpe.fourier.FourierProviders;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Field;
import spgpe.projector.ModeTransform;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;

/** Invariants that hold for every model and need no statistics. */
class InvariantsTest {
  private static final int STEPS = 5;

  @Provide
  Arbitrary<ModelArbitraries.Recipe> recipes() {
    return ModelArbitraries.recipes();
  }

  @Provide
  Arbitrary<CoherentRegion> regions() {
    return ModelArbitraries.regions();
  }

  private interface Change {
    /** Writes the transformed amplitudes of one mode of one component. */
    void to(Amplitudes from, Amplitudes target, int component, int mode);
  }

  private static Amplitudes changed(Amplitudes from, Change change) {
    Amplitudes target = new Amplitudes(from.region(), from.components(), 1);
    for (int c = 0; c < from.components(); c++) {
      for (int m = 0; m < from.region().modes(); m++) {
        change.to(from, target, c, m);
      }
    }
    return target;
  }

  private static void turn(Amplitudes from, Amplitudes target, int c, int m, double angle) {
    double cos = Math.cos(angle);
    double sin = Math.sin(angle);
    target.re(c)[m] = cos * from.re(c)[m] - sin * from.im(c)[m];
    target.im(c)[m] = sin * from.re(c)[m] + cos * from.im(c)[m];
  }

  private static Amplitudes stepped(
      ModelArbitraries.Recipe recipe, Model model, Amplitudes state, boolean split) {
    double dt = recipe.step(model);
    Integrator scheme = split ? OuRk4.ofStep(dt) : Rk4Ip.ofStep(dt);
    NoiseGenerator noise =
        RandomStreams.counterBased(3).generator(model.region(), model.components(), 1);
    noise.assign(0, 0);
    Stepper stepper = scheme.bind(model, noise, 1);
    stepper.start(state, 0);
    for (int s = 0; s < STEPS; s++) {
      stepper.advance();
    }
    Amplitudes result = new Amplitudes(model.region(), model.components(), 1);
    stepper.observe(result);
    return result;
  }

  private static double size(Amplitudes state) {
    double sum = 0;
    for (int c = 0; c < state.components(); c++) {
      sum += state.atomNumber(c, 0);
    }
    return Math.sqrt(sum);
  }

  private static void assertClose(Amplitudes expected, Amplitudes found, double tolerance) {
    double limit = tolerance * size(expected);
    for (int c = 0; c < expected.components(); c++) {
      for (int m = 0; m < expected.region().modes(); m++) {
        int other = found.region().indexOf(expected.region().modeNumber(0, m));
        assertEquals(expected.re(c)[m], found.re(c)[other], limit);
        assertEquals(expected.im(c)[m], found.im(c)[other], limit);
      }
    }
  }

  @Property(tries = 60)
  void stepsCommuteWithAChangeOfTheGlobalPhase(
      @ForAll("recipes") ModelArbitraries.Recipe recipe,
      @ForAll @DoubleRange(min = -3, max = 3) double angle,
      @ForAll long seed,
      @ForAll boolean split) {
    Model model = recipe.model(0);
    Amplitudes state = ModelArbitraries.state(model, seed);
    Change change = (from, to, c, m) -> turn(from, to, c, m, angle);
    assertClose(
        changed(stepped(recipe, model, state, split), change),
        stepped(recipe, model, changed(state, change), split), 1e-13);
  }

  @Property(tries = 60)
  void stepsCommuteWithTranslations(
      @ForAll("recipes") ModelArbitraries.Recipe recipe,
      @ForAll @DoubleRange(min = -5, max = 5) double shift,
      @ForAll long seed,
      @ForAll boolean split) {
    Model model = recipe.model(0);
    Amplitudes state = ModelArbitraries.state(model, seed);
    Change change =
        (from, to, c, m) -> turn(from, to, c, m, -shift * model.region().waveNumber(0, m));
    assertClose(
        changed(stepped(recipe, model, state, split), change),
        stepped(recipe, model, changed(state, change), split), 1e-13);
  }

  @Property(tries = 60)
  void stepsCommuteWithReflections(
      @ForAll("recipes") ModelArbitraries.Recipe recipe,
      @ForAll long seed,
      @ForAll boolean split) {
    Model model = recipe.model(0);
    Amplitudes state = ModelArbitraries.state(model, seed);
    Change change =
        (from, to, c, m) -> {
          int opposite = model.region().indexOf(-model.region().modeNumber(0, m));
          to.re(c)[m] = from.re(c)[opposite];
          to.im(c)[m] = from.im(c)[opposite];
        };
    assertClose(
        changed(stepped(recipe, model, state, split), change),
        stepped(recipe, model, changed(state, change), split), 1e-13);
  }

  /** All couplings are real: the force of the conjugate field is the conjugate of the force. */
  @Property(tries = 60)
  void theForceCommutesWithConjugationOfTheField(
      @ForAll("recipes") ModelArbitraries.Recipe recipe, @ForAll long seed) {
    Model model = recipe.model(0);
    Amplitudes state = ModelArbitraries.state(model, seed);
    Change conjugate =
        (from, to, c, m) -> {
          int opposite = model.region().indexOf(-model.region().modeNumber(0, m));
          to.re(c)[m] = from.re(c)[opposite];
          to.im(c)[m] = -from.im(c)[opposite];
        };
    Amplitudes force = new Amplitudes(model.region(), model.components(), 1);
    Amplitudes other = new Amplitudes(model.region(), model.components(), 1);
    model.evaluator(1).force(0, state, force);
    model.evaluator(1).force(0, changed(state, conjugate), other);
    assertClose(changed(force, conjugate), other, 1e-13);
    assertEquals(
        new EnergyMeter(model).energy(0, state),
        new EnergyMeter(model).energy(0, changed(state, conjugate)),
        1e-12 * size(state) * (1 + size(force)));
  }

  @Property(tries = 60)
  void stepsDoNotDependOnTheOrderOfTheComponents(
      @ForAll("recipes") ModelArbitraries.Recipe recipe,
      @ForAll long seed,
      @ForAll boolean split) {
    int n = recipe.components();
    int[] order = new int[n];
    for (int i = 0; i < n; i++) {
      order[i] = (i + 1) % n;
    }
    Model model = recipe.model(0);
    Model swapped = recipe.reordered(0, order);
    Amplitudes state = ModelArbitraries.state(model, seed);
    Change change =
        (from, to, c, m) -> {
          to.re(c)[m] = from.re(order[c])[m];
          to.im(c)[m] = from.im(order[c])[m];
        };
    assertClose(
        changed(stepped(recipe, model, state, split), change),
        stepped(recipe, swapped, changed(state, change), split), 1e-13);
  }

  @Property(tries = 40)
  void noisyStepsDoNotDependOnTheNumberOfPoints(
      @ForAll("recipes") ModelArbitraries.Recipe recipe,
      @ForAll long seed,
      @ForAll boolean split) {
    Model coarse = recipe.model(0.1);
    Model fine = recipe.model(0.1, 2 * recipe.points());
    assertClose(
        stepped(recipe, coarse, ModelArbitraries.state(coarse, seed), split),
        stepped(recipe, fine, ModelArbitraries.state(fine, seed), split), 1e-12);
  }

  @Property(tries = 60)
  void theProjectorIsIdempotentAndSelfAdjoint(
      @ForAll("regions") CoherentRegion region, @ForAll long seed) {
    Field phi = randomField(region, seed);
    Field chi = randomField(region, seed + 1);
    Field projectedPhi = projected(region, phi);
    Field projectedChi = projected(region, chi);
    Field twice = projected(region, projectedPhi);
    double points = region.grid().points();
    double left = 0;
    double right = 0;
    double crossLeft = 0;
    double crossRight = 0;
    for (int p = 0; p < points; p++) {
      assertEquals(projectedPhi.re(0)[p], twice.re(0)[p], 1e-14 * Math.sqrt(points));
      assertEquals(projectedPhi.im(0)[p], twice.im(0)[p], 1e-14 * Math.sqrt(points));
      left += phi.re(0)[p] * projectedChi.re(0)[p] + phi.im(0)[p] * projectedChi.im(0)[p];
      right += projectedPhi.re(0)[p] * chi.re(0)[p] + projectedPhi.im(0)[p] * chi.im(0)[p];
      crossLeft += phi.re(0)[p] * projectedChi.im(0)[p] - phi.im(0)[p] * projectedChi.re(0)[p];
      crossRight += projectedPhi.re(0)[p] * chi.im(0)[p] - projectedPhi.im(0)[p] * chi.re(0)[p];
    }
    assertEquals(left, right, 1e-14 * points);
    assertEquals(crossLeft, crossRight, 1e-14 * points);
  }

  private static Field randomField(CoherentRegion region, long seed) {
    java.util.SplittableRandom random = new java.util.SplittableRandom(seed);
    Field field = new Field(region.grid(), 1, 1);
    for (int p = 0; p < region.grid().points(); p++) {
      field.re(0)[p] = random.nextDouble(-1, 1);
      field.im(0)[p] = random.nextDouble(-1, 1);
    }
    return field;
  }

  private static Field projected(CoherentRegion region, Field field) {
    ModeTransform transform = region.transform(1, 1, FourierProviders.preferred());
    Amplitudes modes = new Amplitudes(region, 1, 1);
    transform.toModes(field, modes);
    Field back = new Field(region.grid(), 1, 1);
    transform.toPosition(modes, back);
    return back;
  }
}
