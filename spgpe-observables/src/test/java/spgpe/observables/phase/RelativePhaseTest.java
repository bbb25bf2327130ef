package spgpe.observables.phase;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.model.Model;
import spgpe.observables.Fields;
import spgpe.reservoir.Reservoir;
import spgpe.run.Snapshot;

class RelativePhaseTest {
  private static final double LENGTH = 20;
  private final Model model = Fields.latticePair(64, LENGTH);

  @Test
  void meanCosineAndProfilesOfAKnownPhase() {
    Snapshot s = Fields.withRelativePhase(model, x -> 0.7 * Math.sin(2 * Math.PI * x / LENGTH));
    double[] cos = Fields.measure(RelativePhase.cosine(), s);
    double[] sin = Fields.measure(RelativePhase.sine(), s);
    double[] wrapped = Fields.measure(RelativePhase.wrapped(), s);
    double sum = 0;
    for (int i = 0; i < 64; i++) {
      double phi = 0.7 * Math.sin(2 * Math.PI * i / 64);
      assertEquals(Math.cos(phi), cos[i], 1e-12);
      assertEquals(Math.sin(phi), sin[i], 1e-12);
      assertEquals(phi, wrapped[i], 1e-12);
      sum += Math.cos(phi);
    }
    assertEquals(sum / 64, Fields.measure(RelativePhase.meanCosine(), s)[0], 1e-13);
    // (1/2 pi) integral of cos(a sin t) = J_0(a); J_0(0.7) = 0.881200888607405 (series, derived)
    assertEquals(0.881200888607405, sum / 64, 1e-12);
  }

  @Test
  void densityDoesNotWeightTheMeanCosine() {
    Snapshot s =
        Fields.snapshot(
            model, 0,
            (c, x, value) -> value[0] = c == 0 ? 3 : x < LENGTH / 2 ? 5 : -1e-3);
    assertEquals(0, Fields.measure(RelativePhase.meanCosine(), s)[0], 1e-12);
  }

  @Test
  void vanishingProductHasCosineZero() {
    Snapshot s = Fields.snapshot(model, 0, (c, x, value) -> value[0] = c == 0 ? 1 : 0);
    assertEquals(0, Fields.measure(RelativePhase.meanCosine(), s)[0]);
    assertEquals(0, Fields.measure(RelativePhase.cosine(), s)[5]);
    assertEquals(0, Fields.measure(RelativePhase.sine(), s)[5]);
    assertEquals(0, Fields.measure(RelativePhase.wrapped(), s)[5]);
  }

  @Test
  void tinyAndHugeFieldsKeepTheirPhase() {
    for (double size : new double[] {1e-150, 1e-90, 1e90}) {
      // psi_1 real, psi_2 imaginary
      Snapshot s = Fields.snapshot(model, 0, (c, x, v) -> v[c] = size);
      assertEquals(0, Fields.measure(RelativePhase.meanCosine(), s)[0], 1e-12);
      assertEquals(-1, Fields.measure(RelativePhase.sine(), s)[0], 1e-12);
      Snapshot t = Fields.snapshot(model, 0, (c, x, v) -> v[0] = c == 0 ? size : -size);
      assertEquals(-1, Fields.measure(RelativePhase.meanCosine(), t)[0], 1e-12);
    }
  }

  @Test
  void deviationFromPiDoesNotMeetTheBranchCut() {
    Snapshot s =
        Fields.withRelativePhase(model, x -> Math.PI + 0.1 * Math.cos(2 * Math.PI * x / LENGTH));
    double[] deviation = Fields.measure(RelativePhase.wrappedAbout(Math.PI), s);
    for (int i = 0; i < 64; i++) {
      assertEquals(0.1 * Math.cos(2 * Math.PI * i / 64), deviation[i], 1e-12);
    }
    Snapshot exact = Fields.snapshot(model, 0, (c, x, v) -> v[0] = c == 0 ? 1 : -1);
    for (double d : Fields.measure(RelativePhase.wrapped(), exact)) {
      assertEquals(Math.PI, Math.abs(d), 1e-12);
    }
    assertTrue(Fields.refusal(() -> RelativePhase.wrappedAbout(Double.NaN)).contains("NaN"));
  }

  @Property(tries = 60, seed = "2026")
  void windingFieldsUnwrapToTheirPhase(
      @ForAll @IntRange(min = -6, max = 6) int winding,
      @ForAll @DoubleRange(min = -3, max = 3) double offset,
      @ForAll @DoubleRange(min = 0, max = 1.5) double wave) {
    Snapshot s =
        Fields.withRelativePhase(
            model,
            x -> {
              double u = 2 * Math.PI * x / LENGTH;
              return offset + winding * u + wave * (Math.cos(2 * u) - 1);
            });
    assertEquals(winding, Fields.measure(RelativePhase.winding(), s)[0]);
    double[] phi = Fields.measure(RelativePhase.unwrapped(), s);
    for (int i = 0; i < 64; i++) {
      double u = 2 * Math.PI * i / 64;
      assertEquals(offset + winding * u + wave * (Math.cos(2 * u) - 1), phi[i], 1e-9);
    }
    assertEquals(winding, Fields.measure(ComponentPhase.winding(0), s)[0]);
    assertEquals(0, Fields.measure(ComponentPhase.winding(1), s)[0]);
  }

  @Test
  void unwrappingOfPlainArrays() {
    assertArrayEquals(
        new double[] {3, 2 * Math.PI - 3, 2 * Math.PI - 2},
        PhaseUnwrapping.unwrap(new double[] {3, -3, -2}), 1e-14);
    assertEquals(1, PhaseUnwrapping.winding(new double[] {0, 2, -2}));
    assertEquals(-1, PhaseUnwrapping.winding(new double[] {0, -2, 2}));
    assertEquals(0, PhaseUnwrapping.winding(new double[] {1}));
    assertTrue(
        Fields.refusal(() -> PhaseUnwrapping.unwrap(new double[] {0, Double.NaN}))
            .contains("phases[1]=NaN"));
    assertThrows(IllegalArgumentException.class, () -> PhaseUnwrapping.winding(new double[0]));
  }

  @Test
  void oneComponentIsRefusedByName() {
    Model single =
        Model.ofAliasing(Fields.ring(16, 5), Hamiltonian.single(1), Reservoir.of(0.1, 1, 0.1));
    String message = Fields.refusal(() -> RelativePhase.meanCosine().size(single));
    assertTrue(message.contains("components needed=2, components of the model=1"), message);
    assertThrows(IllegalArgumentException.class, () -> RelativePhase.cosine().size(single));
  }

  /** Crossings of the cut count what the sum of the phase steps gives, special values included. */
  @Test
  void windingByCrossingsIsThatOfTheAngles() {
    java.util.SplittableRandom random = new java.util.SplittableRandom(77);
    int turned = 0;
    for (int attempt = 0; attempt < 2000; attempt++) {
      double[] re = new double[3 + random.nextInt(20)];
      double[] im = new double[re.length];
      double[] angles = new double[re.length];
      for (int i = 0; i < re.length; i++) {
        boolean special = random.nextInt(4) == 0;
        re[i] = special ? random.nextInt(-1, 2) : random.nextDouble(-1, 1);
        im[i] = special ? random.nextInt(-1, 2) : random.nextDouble(-1, 1);
        angles[i] = PhaseUnwrapping.angle(re[i], im[i]);
      }
      int expected = PhaseUnwrapping.winding(angles);
      assertEquals(expected, PhaseUnwrapping.winding(re, im));
      turned += expected == 0 ? 0 : 1;
    }
    assertTrue(turned > 500, "fields with a winding: " + turned);
  }
}
