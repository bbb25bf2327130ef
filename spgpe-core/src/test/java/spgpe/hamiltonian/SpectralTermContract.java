package spgpe.hamiltonian;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

/** What every {@link SpectralTerm} must do, in addition to {@link HamiltonianTermContract}. */
public abstract class SpectralTermContract extends HamiltonianTermContract {
  @Override
  protected abstract SpectralTerm term();

  @Test
  void itsMatricesAreHermitianAndAreAddedToWhatIsThere() {
    SpectralTerm spectral = term();
    ModeMatrix once = new ModeMatrix(region(64), components());
    spectral.addTo(once);
    ModeMatrix twice = new ModeMatrix(region(64), components());
    spectral.addTo(twice);
    spectral.addTo(twice);
    for (int m = 0; m < once.region().modes(); m++) {
      for (int i = 0; i < components(); i++) {
        for (int j = 0; j < components(); j++) {
          assertEquals(once.re(m, i, j), once.re(m, j, i), 0, "Hermitian");
          assertEquals(once.im(m, i, j), -once.im(m, j, i), 0, "Hermitian");
          assertEquals(2 * once.re(m, i, j), twice.re(m, i, j), 0, "adds");
          assertEquals(2 * once.im(m, i, j), twice.im(m, i, j), 0, "adds");
        }
      }
    }
  }
}
