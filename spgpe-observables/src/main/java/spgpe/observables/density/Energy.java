package spgpe.observables.density;

import java.util.List;
import spgpe.internal.measure.ScalarMeasure;
import spgpe.model.EnergyMeter;
import spgpe.model.Model;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/** Energies of the whole field. The unit is that of the scaled Hamiltonian. */
public final class Energy {
  private Energy() {}

  /**
   * Energy of each term of the Hamiltonian, in the order of {@link #termNames}.
   *
   * @return observable with one number for each term
   */
  public static Observable byTerm() {
    return new Observable() {
      @Override
      public String name() {
        return "energy by term";
      }

      @Override
      public int size(Model model) {
        return termNames(model).size();
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        double[] energies = snapshot.energies();
        System.arraycopy(energies, 0, result, 0, energies.length);
      }
    };
  }

  /**
   * What the numbers of {@link #byTerm} are.
   *
   * @param model the model that is run
   * @return descriptions of the terms
   */
  public static List<String> termNames(Model model) {
    return new EnergyMeter(model).names();
  }

  /**
   * The energy E, the sum over the terms.
   *
   * @return observable of a single number
   */
  public static Observable total() {
    return new ScalarMeasure(
        "energy", 1,
        snapshot -> {
          double sum = 0;
          for (double energy : snapshot.energies()) {
            sum += energy;
          }
          return sum;
        });
  }

  /**
   * The grand-canonical energy K = E - sum over j of mu_j N_j, whose weight is exp(-K/T).
   *
   * @return observable of a single number
   */
  public static Observable grandCanonical() {
    return new ScalarMeasure("grand-canonical energy", 1, Snapshot::grandCanonicalEnergy);
  }
}
