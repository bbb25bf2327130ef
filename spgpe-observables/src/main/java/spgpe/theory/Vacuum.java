package spgpe.theory;

/** The two uniform states of a coupled pair with J greater than zero. */
public enum Vacuum {
  /** Relative phase zero, the state of lowest energy. */
  TRUE,
  /** Relative phase pi, metastable when {@code kappa n_fv > J}. */
  FALSE
}
