package spgpe.hamiltonian;

import spgpe.projector.PointBlock;

/**
 * A local term that can solve its own Hamiltonian equation i dpsi_j/dt = f_j(psi) exactly, point by
 * point. An optional extra, used by split-step schemes on regions that keep every mode of their
 * grid; a projection after such a flow would cost an order, see docs/integrators.md.
 */
public interface ExactFlow extends LocalTerm {
  /** What a flow changes; decides which flows commute. */
  enum Kind {
    /**
     * Turns all components by one angle, a function of position and total density: commutes with
     * every flow that conserves the total density.
     */
    COMMON_PHASE,

    /**
     * Turns each component by an angle of its own, a function of position and densities: commutes
     * with its like and with {@link #COMMON_PHASE}.
     */
    COMPONENT_PHASE,

    /** Mixes the components, conserves the total density and is covariant under global phases. */
    MIXING;

    /**
     * Whether flows of two kinds commute.
     *
     * @param other kind of another term
     * @return true if their order does not matter
     */
    public boolean commutesWith(Kind other) {
      return this == COMMON_PHASE || other == COMMON_PHASE
          || (this == COMPONENT_PHASE && other == COMPONENT_PHASE);
    }
  }

  /**
   * What the flow of this term changes.
   *
   * @return the kind
   */
  Kind flowKind();

  /**
   * Advances psi in place by the exact flow with the coefficients of the given time.
   *
   * @param time time at which coefficients are taken and held
   * @param duration how far to advance, any sign
   * @param block points at hand; its psi arrays are changed, its result arrays are not to be
   *     touched
   */
  void flow(double time, double duration, PointBlock block);
}
