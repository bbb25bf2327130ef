package spgpe.statistics;

/**
 * How an observation ended, which decides the degrees of freedom of the chi-square interval of a
 * rate with d events.
 */
public enum Censoring {
  /**
   * The run was ended by its d-th event (type II censoring; also the case without censoring): 2d
   * degrees of freedom on both sides, exact.
   */
  FAILURE_CENSORED,
  /**
   * The run was ended by the clock (type I censoring): 2d degrees of freedom for the lower, 2d + 2
   * for the upper limit. Covers at least the stated level.
   */
  TIME_CENSORED_CONSERVATIVE,
  /**
   * The run was ended by the clock (type I censoring): 2d + 1 degrees of freedom on both sides.
   * Narrower; close to the stated level on average but not guaranteed.
   */
  TIME_CENSORED_CENTRAL
}
