package spgpe.observables.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.model.Model;
import spgpe.observables.Fields;
import spgpe.observables.SpatialMean;
import spgpe.observables.spectrum.ModeOccupation;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

class DensityTest {
  private static final double LENGTH = 12;
  private final Model model = Fields.pair(8, LENGTH);
  private final double k = 2 * Math.PI / LENGTH;
  // psi_1 = 1 + 0.5 exp(2ikx), psi_2 = 0.3i exp(-ikx)
  private final Snapshot snapshot =
      Fields.snapshot(
          model, 3,
          (c, x, v) -> {
            v[0] = c == 0 ? 1 + 0.5 * Math.cos(2 * k * x) : 0.3 * Math.sin(k * x);
            v[1] = c == 0 ? 0.5 * Math.sin(2 * k * x) : 0.3 * Math.cos(k * x);
          });

  @Test
  void profiles() {
    double[] n1 = Fields.measure(Density.ofComponent(0), snapshot);
    double[] total = Fields.measure(Density.total(), snapshot);
    double[] sx = Fields.measure(Density.spin(Density.SpinAxis.X), snapshot);
    double[] sy = Fields.measure(Density.spin(Density.SpinAxis.Y), snapshot);
    double[] sz = Fields.measure(Density.spin(Density.SpinAxis.Z), snapshot);
    for (int i = 0; i < n1.length; i++) {
      double x = model.region().grid().coordinate(0, i);
      assertEquals(1.25 + Math.cos(2 * k * x), n1[i], 1e-12);
      assertEquals(n1[i] + 0.09, total[i], 1e-12);
      assertEquals(n1[i] - 0.09, sz[i], 1e-12);
      // psi_1^* psi_2 = 0.3i exp(-ikx) + 0.15i exp(-3ikx)
      assertEquals(2 * (0.3 * Math.sin(k * x) + 0.15 * Math.sin(3 * k * x)), sx[i], 1e-12);
      assertEquals(2 * (0.3 * Math.cos(k * x) + 0.15 * Math.cos(3 * k * x)), sy[i], 1e-12);
      assertEquals(total[i] * total[i], 0.0 + sx[i] * sx[i] + sy[i] * sy[i] + sz[i] * sz[i], 1e-11);
    }
  }

  @Test
  void numbersAndMeans() {
    assertEquals(1.25 * LENGTH, Fields.measure(AtomNumber.ofComponent(0), snapshot)[0], 1e-12);
    assertEquals(1.34 * LENGTH, Fields.measure(AtomNumber.total(), snapshot)[0], 1e-12);
    assertEquals(1.16 * LENGTH, Fields.measure(AtomNumber.difference(), snapshot)[0], 1e-12);
    assertEquals(
        1.25, Fields.measure(SpatialMean.of(Density.ofComponent(0)), snapshot)[0], 1e-13);
    assertEquals(
        1.25 * 1.25 + 0.5,
        Fields.measure(SpatialMean.ofSquare(Density.ofComponent(0)), snapshot)[0], 1e-13);
    double[] m = Fields.measure(PairMoment.all(), snapshot);
    assertEquals(1.25, m[PairMoment.DENSITY_1.index()], 1e-13);
    assertEquals(0.09, m[PairMoment.DENSITY_2.index()], 1e-13);
    assertEquals(0, m[PairMoment.COHERENCE.index()], 1e-13);
    assertEquals(0, m[PairMoment.COHERENCE_IMAGINARY.index()], 1e-13);
    assertEquals(2 * (0.09 + 0.0225), m[PairMoment.SPIN_Y_SQUARED.index()], 1e-13);
    assertEquals(2.0625, m[PairMoment.DENSITY_1_SQUARED.index()], 1e-13);
    assertEquals(0.0081, m[PairMoment.DENSITY_2_SQUARED.index()], 1e-13);
    assertEquals(0.1125, m[PairMoment.DENSITY_PRODUCT.index()], 1e-13);
    assertEquals(1.16 * 1.16 + 0.5, m[PairMoment.SPIN_Z_SQUARED.index()], 1e-13);
  }

  @Test
  void energiesAddUp() {
    double[] terms = Fields.measure(Energy.byTerm(), snapshot);
    assertEquals(Energy.termNames(model).size(), terms.length);
    double sum = 0;
    for (double e : terms) {
      sum += e;
    }
    assertEquals(sum, Fields.measure(Energy.total(), snapshot)[0], 1e-13);
    assertEquals(
        sum - 1.1 * 1.34 * LENGTH, Fields.measure(Energy.grandCanonical(), snapshot)[0], 1e-11);
    // kinetic: sum of k^2/2 |a|^2 = L [ (2k)^2/2 * 0.25 + k^2/2 * 0.09 ]
    int kinetic = Energy.termNames(model).indexOf("Kinetic(masses=[1.0, 1.0])");
    assertEquals(LENGTH * k * k * (0.5 + 0.045), terms[kinetic], 1e-12);
  }

  @Test
  void occupations() {
    double[] n = Fields.measure(ModeOccupation.ofComponent(0), snapshot);
    double[] plus = Fields.measure(ModeOccupation.inPhase(), snapshot);
    double[] minus = Fields.measure(ModeOccupation.outOfPhase(), snapshot);
    for (int m = 0; m < n.length; m++) {
      int mode = model.region().modeNumber(0, m);
      assertEquals(mode == 0 ? LENGTH : mode == 2 ? 0.25 * LENGTH : 0, n[m], 1e-12);
      double second = mode == -1 ? 0.09 * LENGTH : 0;
      assertEquals((n[m] + second) / 2, plus[m], 1e-12); // no common mode: no interference
      assertEquals((n[m] + second) / 2, minus[m], 1e-12);
    }
  }

  @Test
  void badRequestsAreNamed() {
    assertTrue(Fields.refusal(() -> Density.ofComponent(-1)).contains("component=-1"));
    Observable third = Density.ofComponent(2);
    String message = Fields.refusal(() -> third.size(model));
    assertTrue(message.contains("components needed=3, components of the model=2"), message);
    String mean =
        Fields.refusal(() -> SpatialMean.of(AtomNumber.total()).size(model));
    assertTrue(mean.contains("numbers=1, points=64"), mean);
  }
}
