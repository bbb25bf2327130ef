package spgpe.projector;

/**
 * The way between kept modes and positions, and the projected evaluation of local operations.
 *
 * <p>Going to positions fills the modes that are not kept with zero; coming back gathers the kept
 * ones, and that gathering is the projector P. Owns scratch memory: one thread at a time. Made by
 * {@link CoherentRegion#transform}.
 */
public interface ModeTransform {
  /**
   * psi_j(r) = V<sup>-1/2</sup> sum over k of a_jk exp(i k r).
   *
   * @param amplitudes kept modes, not changed
   * @param field overwritten with the field
   * @throws IllegalArgumentException if a shape does not fit
   */
  void toPosition(Amplitudes amplitudes, Field field);

  /**
   * a_jk = V<sup>-1/2</sup> integral of psi_j exp(-i k r), for the kept modes.
   *
   * @param field the field, not changed
   * @param amplitudes overwritten with its kept modes
   * @throws IllegalArgumentException if a shape does not fit
   */
  void toModes(Field field, Amplitudes amplitudes);

  /**
   * Evaluates P{f(psi)} for an operation f that works point by point.
   *
   * <p>The points may be handed to the operation in several blocks, in any order; every point occurs
   * once.
   *
   * @param amplitudes kept modes of psi, not changed
   * @param operation adds f(psi) to a block's result
   * @param result overwritten with the kept modes of f(psi)
   * @throws IllegalArgumentException if a shape does not fit
   */
  void applyLocal(Amplitudes amplitudes, LocalOperation operation, Amplitudes result);
}
