package spgpe.planning;

import spgpe.internal.check.Check;

/**
 * Why no decay rate can be expected of a recipe.
 *
 * @param reason the kind of obstacle
 * @param message the rule, the values and what to change
 */
public record NoRate(Reason reason, String message) {
  /** Kind of obstacle. */
  public enum Reason {
    /** Relative phase pi is not a local minimum of the energy: nothing decays over a barrier. */
    NOT_METASTABLE,
    /**
     * Outside the theory: the pair leaves the state through a density difference, or lambda^2 is above
     * 400.
     */
    NOT_COVERED,
    /** The bubble does not fit on the ring. */
    RING_TOO_SHORT,
    /** E_b/T below 4: the state decays while it is being prepared, not at a rate. */
    BARRIER_TOO_LOW,
    /** E_b/T above 500: no decay in the age of any experiment; other processes decide. */
    BARRIER_TOO_HIGH
  }

  /**
   * Checks the parts.
   *
   * @param reason the kind of obstacle
   * @param message the rule, the values and what to change
   * @throws IllegalArgumentException if a part is null
   */
  public NoRate {
    Check.notNull(reason, "reason");
    Check.notNull(message, "message");
  }
}
