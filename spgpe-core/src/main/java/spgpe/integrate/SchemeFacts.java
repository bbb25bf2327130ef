package spgpe.integrate;

import spgpe.internal.check.Check;

/**
 * What is known of a scheme, for choosing one and for testing the claims. Immutable and
 * thread-safe.
 *
 * @param deterministicOrder order of the global error of a run without noise
 * @param admitsNoise whether the scheme runs models with noise
 * @param strongOrder order of the error of single paths with additive noise; 0 without noise
 * @param weakOrder order of the error of averages with additive noise; 0 without noise
 * @param forceEvaluationsPerStep evaluations of the nonlinear part in one step, each of them one
 *     pair of transforms of all components; for iterated schemes the usual number
 * @param latticeOnly whether the scheme needs a region that keeps every mode of its grid
 */
public record SchemeFacts(
    int deterministicOrder,
    boolean admitsNoise,
    int strongOrder,
    int weakOrder,
    int forceEvaluationsPerStep,
    boolean latticeOnly) {
  /**
   * Checks the values.
   *
   * @param deterministicOrder order of the global error of a run without noise
   * @param admitsNoise whether the scheme runs models with noise
   * @param strongOrder order of the error of single paths with additive noise; 0 without noise
   * @param weakOrder order of the error of averages with additive noise; 0 without noise
   * @param forceEvaluationsPerStep evaluations of the nonlinear part in one step, each of them one
   *     pair of transforms of all components; for iterated schemes the usual number
   * @param latticeOnly whether the scheme needs a region that keeps every mode of its grid
   * @throws IllegalArgumentException if a value is out of range
   */
  public SchemeFacts {
    Check.inRange(deterministicOrder, 1, 20, "deterministic order");
    Check.inRange(strongOrder, admitsNoise ? 1 : 0, admitsNoise ? 20 : 0, "strong order");
    Check.inRange(weakOrder, admitsNoise ? 1 : 0, admitsNoise ? 20 : 0, "weak order");
    Check.inRange(forceEvaluationsPerStep, 1, 1000, "force evaluations per step");
  }

  /**
   * Facts of a scheme for regions of every kind that admits noise.
   *
   * @param deterministicOrder order without noise
   * @param strongOrder order of single paths
   * @param weakOrder order of averages
   * @param forceEvaluationsPerStep evaluations of the nonlinear part in one step
   * @return the facts
   * @throws IllegalArgumentException if a value is out of range
   */
  public static SchemeFacts noisy(
      int deterministicOrder, int strongOrder, int weakOrder, int forceEvaluationsPerStep) {
    return new SchemeFacts(
        deterministicOrder, true, strongOrder, weakOrder, forceEvaluationsPerStep, false);
  }

  /**
   * Facts of a scheme for regions of every kind that refuses noise.
   *
   * @param deterministicOrder order
   * @param forceEvaluationsPerStep evaluations of the nonlinear part in one step
   * @return the facts
   * @throws IllegalArgumentException if a value is out of range
   */
  public static SchemeFacts noiseless(int deterministicOrder, int forceEvaluationsPerStep) {
    return new SchemeFacts(deterministicOrder, false, 0, 0, forceEvaluationsPerStep, false);
  }

  /**
   * The same facts of a scheme that needs a region that keeps every mode of its grid.
   *
   * @return changed copy
   */
  public SchemeFacts onLatticeOnly() {
    return new SchemeFacts(
        deterministicOrder, admitsNoise, strongOrder, weakOrder, forceEvaluationsPerStep, true);
  }
}
