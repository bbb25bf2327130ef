package spgpe.integrate;

/** What the built-in schemes draw normals for; one independent stream each. */
final class NoiseUse {
  /** The noise between two nonlinear steps. */
  static final int WHOLE = 0;

  /** What completes the first half of {@link #WHOLE} for an observation. */
  static final int REST_OF_HALF = 1;

  /** The half step after a state was taken over. */
  static final int START = 2;

  private NoiseUse() {}
}
