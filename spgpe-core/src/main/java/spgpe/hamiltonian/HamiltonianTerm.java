package spgpe.hamiltonian;

import spgpe.projector.CoherentRegion;

/**
 * One term of the Hamiltonian. A term gives its force dK/dpsi<sub>j</sub><sup>*</sup> and its
 * energy, consistent with each other; it is either a {@link SpectralTerm} (a constant Hermitian
 * matrix for each wave vector), a {@link LocalTerm} (point by point), or both.
 *
 * <p>Implementations are immutable and thread-safe.
 */
public interface HamiltonianTerm {
  /**
   * How the term shows itself in a model's description and in energy tables.
   *
   * @return name with parameters, for example {@code ContactInteraction(g=1.0)}
   */
  String description();

  /**
   * Checks that the term fits a model.
   *
   * @param components number of components of the model
   * @param region coherent region of the model
   * @throws IllegalArgumentException if it does not fit; the message says why
   */
  default void check(int components, CoherentRegion region) {}
}
