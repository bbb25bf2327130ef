package spgpe.hamiltonian;

/**
 * A term that is a constant Hermitian matrix h(k) over the components for each kept wave vector:
 *
 * <pre>K = sum over k, i, j of a_ik^* h_ij(k) a_jk,     force on a_ik: sum over j of h_ij(k) a_jk.</pre>
 */
public interface SpectralTerm extends HamiltonianTerm {
  /**
   * Adds this term's share.
   *
   * @param matrix matrices of all kept modes
   */
  void addTo(ModeMatrix matrix);
}
