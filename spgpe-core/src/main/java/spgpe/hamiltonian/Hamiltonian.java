package spgpe.hamiltonian;

import java.util.ArrayList;
import java.util.List;
import spgpe.internal.check.Check;
import spgpe.projector.CoherentRegion;

/**
 * The energy functional E[psi] as a list of terms for a number of components; the chemical
 * potentials belong to the reservoir, K = E - sum over j of mu_j N_j. Immutable and thread-safe.
 */
public final class Hamiltonian {
  private final int components;
  private final List<HamiltonianTerm> terms;

  private Hamiltonian(int components, List<HamiltonianTerm> terms) {
    this.components = components;
    this.terms = List.copyOf(terms);
  }

  /**
   * Kinetic energy only.
   *
   * @param masses one mass for each component, finite and positive; their number is the number of
   *     components
   * @return the Hamiltonian
   * @throws IllegalArgumentException if a mass is out of range or none is given
   */
  public static Hamiltonian ofMasses(double... masses) {
    Kinetic kinetic = Kinetic.ofMasses(masses);
    Check.inRange(masses.length, 1, 255, "number of components");
    return new Hamiltonian(masses.length, List.of(kinetic));
  }

  /**
   * One component of mass 1 with contact interaction g.
   *
   * @param g interaction, finite
   * @return the Hamiltonian
   */
  public static Hamiltonian single(double g) {
    return ofMasses(1).with(ContactInteraction.of(g));
  }

  /**
   * Two components of mass 1 with contact interactions.
   *
   * @param intra g_11 = g_22, finite
   * @param inter g_12, finite
   * @return the Hamiltonian
   */
  public static Hamiltonian pair(double intra, double inter) {
    return ofMasses(1, 1).with(ContactInteraction.ofPair(intra, inter));
  }

  /**
   * A copy with one more term.
   *
   * @param term the term; a {@link SpectralTerm}, a {@link LocalTerm} or both
   * @return changed copy
   * @throws IllegalArgumentException if the term is of neither kind
   */
  public Hamiltonian with(HamiltonianTerm term) {
    Check.notNull(term, "term");
    Check.argument(
        term instanceof SpectralTerm || term instanceof LocalTerm,
        "a term must be a SpectralTerm or a LocalTerm: term=%s", term.getClass().getName());
    List<HamiltonianTerm> more = new ArrayList<>(terms);
    more.add(term);
    return new Hamiltonian(components, more);
  }

  /**
   * Number of components.
   *
   * @return components
   */
  public int components() {
    return components;
  }

  /**
   * The terms in the order they were added.
   *
   * @return unmodifiable list
   */
  public List<HamiltonianTerm> terms() {
    return terms;
  }

  /**
   * The Hermitian matrices of the spectral terms.
   *
   * @param region coherent region
   * @return their sum for each mode
   */
  public ModeMatrix modeMatrix(CoherentRegion region) {
    ModeMatrix matrix = new ModeMatrix(region, components);
    for (HamiltonianTerm term : terms) {
      if (term instanceof SpectralTerm spectral) {
        spectral.addTo(matrix);
      }
    }
    return matrix;
  }

  @Override
  public String toString() {
    StringBuilder text = new StringBuilder("Hamiltonian of ").append(components);
    text.append(components == 1 ? " component:" : " components:");
    for (HamiltonianTerm term : terms) {
      text.append(' ').append(term.description());
    }
    return text.toString();
  }
}
