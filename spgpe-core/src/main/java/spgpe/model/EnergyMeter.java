package spgpe.model;

import java.util.ArrayList;
import java.util.List;
import spgpe.hamiltonian.HamiltonianTerm;
import spgpe.hamiltonian.LocalTerm;
import spgpe.hamiltonian.ModeMatrix;
import spgpe.hamiltonian.SpectralTerm;
import spgpe.internal.check.Check;
import spgpe.projector.Amplitudes;
import spgpe.projector.Field;
import spgpe.projector.ModeTransform;
import spgpe.projector.PointBlock;

/**
 * Energies of a one-lane state, term by term. Spectral terms are summed over modes; local terms over
 * grid points, which is exact where the term does not alias. Owns scratch memory: one thread at a
 * time.
 */
public final class EnergyMeter {
  private final Model model;
  private final ModeTransform transform;
  private final Field psi;
  private final PointBlock block;
  private final double[] density;
  private final List<ModeMatrix> matrices = new ArrayList<>();
  private final List<String> names = new ArrayList<>();

  /**
   * Makes a meter.
   *
   * @param model the model whose energies are asked for
   */
  public EnergyMeter(Model model) {
    this.model = Check.notNull(model, "model");
    this.transform = model.region().transform(model.components(), 1, model.fourierProvider());
    this.psi = new Field(model.region().grid(), model.components(), 1);
    Field unused = new Field(model.region().grid(), model.components(), 1);
    this.block = PointBlock.ofAll(psi, unused);
    this.density = new double[model.region().grid().points()];
    for (HamiltonianTerm term : model.hamiltonian().terms()) {
      if (term instanceof SpectralTerm spectral) {
        ModeMatrix matrix = new ModeMatrix(model.region(), model.components());
        spectral.addTo(matrix);
        matrices.add(matrix);
        names.add(term.description());
      }
    }
    for (LocalTerm term : model.localTerms()) {
      names.add(term.description());
    }
  }

  /**
   * What the entries of {@link #byTerm} are: spectral terms in their order, then local terms in
   * theirs.
   *
   * @return descriptions of the terms
   */
  public List<String> names() {
    return List.copyOf(names);
  }

  /**
   * Energy of each term.
   *
   * @param time time
   * @param amplitudes state with one lane
   * @return energies in the order of {@link #names}
   * @throws TermFailedException if a term throws
   * @throws IllegalArgumentException if the time is not finite or the shape does not fit
   */
  public double[] byTerm(double time, Amplitudes amplitudes) {
    check(time, amplitudes);
    transform.toPosition(amplitudes, psi);
    return energies(time, amplitudes);
  }

  /**
   * Energy of each term of a state whose field is known already.
   *
   * @param time time
   * @param amplitudes state with one lane
   * @param field the same state at the grid points
   * @return energies in the order of {@link #names}
   * @throws TermFailedException if a term throws
   * @throws IllegalArgumentException if the time is not finite or a shape does not fit
   */
  public double[] byTerm(double time, Amplitudes amplitudes, Field field) {
    check(time, amplitudes);
    Check.notNull(field, "field").requireShape(psi.grid(), model.components(), 1);
    for (int c = 0; c < model.components(); c++) {
      System.arraycopy(field.re(c), 0, psi.re(c), 0, field.re(c).length);
      System.arraycopy(field.im(c), 0, psi.im(c), 0, field.im(c).length);
    }
    return energies(time, amplitudes);
  }

  private void check(double time, Amplitudes amplitudes) {
    Check.finite(time, "time");
    Check.notNull(amplitudes, "amplitudes").requireShape(model.region(), model.components(), 1);
  }

  /** Of the amplitudes and of {@link #psi}. */
  private double[] energies(double time, Amplitudes amplitudes) {
    double[] energies = new double[names.size()];
    int next = 0;
    for (ModeMatrix matrix : matrices) {
      energies[next++] = quadraticForm(matrix, amplitudes);
    }
    double cell = model.region().grid().cellVolume();
    for (LocalTerm term : model.localTerms()) {
      java.util.Arrays.fill(density, 0);
      try {
        term.addEnergyDensity(time, block, density);
      } catch (RuntimeException e) {
        throw new TermFailedException(term.description(), time, e);
      }
      double sum = 0;
      for (double d : density) {
        sum += d;
      }
      energies[next++] = sum * cell;
    }
    return energies;
  }

  /**
   * The energy E: the sum over the terms.
   *
   * @param time time
   * @param amplitudes state with one lane
   * @return E
   * @throws TermFailedException if a term throws
   * @throws IllegalArgumentException if the time is not finite or the shape does not fit
   */
  public double energy(double time, Amplitudes amplitudes) {
    double sum = 0;
    for (double e : byTerm(time, amplitudes)) {
      sum += e;
    }
    return sum;
  }

  /**
   * The grand-canonical energy K = E - sum over j of mu_j N_j, whose weight is exp(-K/T).
   *
   * @param time time
   * @param amplitudes state with one lane
   * @return K
   * @throws TermFailedException if a term throws
   * @throws IllegalArgumentException if the time is not finite or the shape does not fit
   */
  public double grandCanonical(double time, Amplitudes amplitudes) {
    double k = energy(time, amplitudes);
    for (int c = 0; c < model.components(); c++) {
      k -= model.reservoir().chemicalPotential(c) * amplitudes.atomNumber(c, 0);
    }
    return k;
  }

  private static double quadraticForm(ModeMatrix h, Amplitudes a) {
    double sum = 0;
    for (int i = 0; i < h.components(); i++) {
      for (int j = 0; j < h.components(); j++) {
        double[] reI = a.re(i);
        double[] imI = a.im(i);
        double[] reJ = a.re(j);
        double[] imJ = a.im(j);
        for (int m = 0; m < reI.length; m++) {
          double real = reI[m] * reJ[m] + imI[m] * imJ[m];
          double imaginary = reI[m] * imJ[m] - imI[m] * reJ[m];
          sum += h.re(m, i, j) * real - h.im(m, i, j) * imaginary;
        }
      }
    }
    return sum;
  }
}
