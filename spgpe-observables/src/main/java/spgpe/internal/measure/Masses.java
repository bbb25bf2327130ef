package spgpe.internal.measure;

import spgpe.hamiltonian.HamiltonianTerm;
import spgpe.hamiltonian.Kinetic;
import spgpe.internal.check.Check;
import spgpe.model.Model;

/** Masses of a model's components. */
public final class Masses {
  private Masses() {}

  /**
   * The masses of the only kinetic term.
   *
   * @param model the model
   * @return one mass for each component
   * @throws IllegalArgumentException if there is not exactly one kinetic term
   */
  public static double[] of(Model model) {
    double[] masses = new double[model.components()];
    int found = 0;
    for (HamiltonianTerm term : model.hamiltonian().terms()) {
      if (term instanceof Kinetic kinetic) {
        found++;
        for (int c = 0; c < masses.length; c++) {
          masses[c] = kinetic.mass(c);
        }
      }
    }
    Check.argument(
        found == 1,
        "the masses must come from exactly one kinetic term: kinetic terms=%s, %s",
        found, model.hamiltonian());
    return masses;
  }
}
