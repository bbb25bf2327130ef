package spgpe.hamiltonian;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Field;
import spgpe.projector.PointBlock;
import spgpe.projector.Projector;

/** Shapes and indices that term factories and mode matrices refuse. */
class TermFactoriesTest {
  private static final CoherentRegion REGION =
      Projector.modesUpTo(2).on(PeriodicGrid.of(Axis.of(16, 4)));

  private static void assertRefused(Runnable call, String... expected) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    for (String part : expected) {
      assertTrue(message.contains(part), message);
    }
  }

  @Test
  void interactionMatricesMustBeSquareAndSymmetric() {
    assertRefused(() -> ContactInteraction.ofMatrix(new double[0][]), "at least one row");
    assertRefused(
        () -> ContactInteraction.ofMatrix(new double[][] {{1, 2}, {2}}), "rows=2", "columns=1");
    assertRefused(
        () -> ContactInteraction.ofMatrix(new double[][] {{1, 2}, {}}), "rows=2", "columns=0");
    assertRefused(
        () -> ContactInteraction.ofMatrix(new double[][] {{1, 2}, {3, 1}}),
        "symmetric", "g[1][0]=3.0", "g[0][1]=2.0");
    assertRefused(
        () -> ContactInteraction.ofMatrix(new double[][] {{1, Double.NaN}, {Double.NaN, 1}}),
        "finite", "NaN");
    assertRefused(
        () -> ContactInteraction.ofMatrix(new double[][] {{1, 2}, null}), "row", "null");
  }

  @Test
  void matricesAreCopied() {
    double[][] g = {{1, 0.5}, {0.5, 1}};
    ContactInteraction term = ContactInteraction.ofMatrix(g);
    g[0][1] = 9;
    assertFalse(term.description().contains("9"), term.description());
    double[] masses = {2};
    Kinetic kinetic = Kinetic.ofMasses(masses);
    masses[0] = 9;
    assertFalse(kinetic.description().contains("9"), kinetic.description());
  }

  @Test
  void emptyListsAndTooManyComponentsAreRefused() {
    assertRefused(() -> Kinetic.ofMasses(), "at least one mass");
    assertRefused(() -> Hamiltonian.ofMasses(), "at least one mass");
    assertRefused(() -> Detuning.ofOffsets(), "at least one energy offset");
    double[] many = new double[256];
    java.util.Arrays.fill(many, 1);
    assertRefused(() -> Hamiltonian.ofMasses(many), "components=256");
    assertRefused(() -> CoherentCoupling.constant(1).between(1, 1), "i=1", "j=1");
    assertRefused(() -> ExternalPotential.onLine("v", x -> 0).forComponent(-1), "index=-1");
  }

  @Test
  void modeMatricesKnowTheirIndices() {
    ModeMatrix matrix = new ModeMatrix(REGION, 2);
    assertTrue(matrix.isDiagonal());
    matrix.addDiagonal(1, 0, 3);
    matrix.addPair(1, 0, 1, 1, -2);
    assertEquals(3, matrix.re(1, 0, 0), 0);
    assertEquals(2, matrix.im(1, 1, 0), 0);
    assertFalse(matrix.isDiagonal());
    assertEquals(3 + Math.sqrt(5), matrix.spectralBound(), 1e-15);
    assertRefused(() -> matrix.re(5, 0, 0), "mode index=5");
    assertRefused(() -> matrix.re(-1, 0, 0), "mode index=-1");
    assertRefused(() -> matrix.im(0, 2, 0), "row=2");
    assertRefused(() -> matrix.addDiagonal(0, -1, 1), "row=-1");
    assertRefused(() -> matrix.addPair(0, 0, 2, 1, 0), "column=2");
    assertRefused(() -> matrix.addPair(0, 1, 1, 1, 0), "i=1", "j=1");
    assertRefused(() -> matrix.addDiagonal(0, 0, Double.NaN), "diagonal element=NaN");
    assertRefused(() -> matrix.addPair(0, 0, 1, 1, Double.NaN), "imaginary part");
    assertRefused(() -> new ModeMatrix(REGION, 0), "components=0");
    assertRefused(() -> new ModeMatrix(REGION, 256), "components=256");
  }

  @Test
  void aPotentialMustBePreparedForItsGrid() {
    ExternalPotential bare = ExternalPotential.onLine("trap", x -> x);
    Field field = new Field(REGION.grid(), 1, 1);
    PointBlock block = PointBlock.ofAll(field, new Field(REGION.grid(), 1, 1));
    assertTrue(
        assertThrows(IllegalStateException.class, () -> bare.addForce(0, block))
            .getMessage()
            .contains("\"trap\" must be prepared"));
    LocalTerm elsewhere = bare.preparedFor(PeriodicGrid.of(Axis.of(8, 4)));
    assertThrows(IllegalStateException.class, () -> elsewhere.addForce(0, block));
  }
}
