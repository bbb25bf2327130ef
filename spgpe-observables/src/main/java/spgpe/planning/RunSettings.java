package spgpe.planning;

import spgpe.integrate.OuRk4;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.units.ScaledRing;

/**
 * Settings of the simulation that belong to a plan, in scaled units.
 *
 * @param cutoffModes largest kept mode number n_c
 * @param gridPoints points of the grid, so many that the cubic force does not alias
 * @param step time step dt: a whole fraction of 0.5, with dt eps_max at most 0.9 and at most half the
 *     stability limit
 * @param largestStableStep stability limit of the default scheme
 * @param truncation time before which first passages are left out of the rate; 0 without a
 *     metastable state
 * @param conversion time in which one bubble converts the ring; 0 without a metastable state
 */
public record RunSettings(
    int cutoffModes,
    int gridPoints,
    double step,
    double largestStableStep,
    double truncation,
    double conversion) {
  private static final double BIAS_RULE = 0.9;
  private static final double COARSEST = 0.5;
  private static final double WALL_SHARE = 1.0 / 3;

  /**
   * Checks the values.
   *
   * @param cutoffModes largest kept mode number n_c
   * @param gridPoints points of the grid
   * @param step time step dt
   * @param largestStableStep stability limit of the default scheme
   * @param truncation time before which first passages are left out of the rate
   * @param conversion time in which one bubble converts the ring
   * @throws IllegalArgumentException if a value is out of range
   */
  public RunSettings {
    Check.inRange(cutoffModes, 1, 100_000, "cutoffModes");
    Check.inRange(gridPoints, 2, 1 << 20, "gridPoints");
    Check.positive(step, "step");
    Check.argument(
        step < largestStableStep,
        "the step must stay below the stability limit: step=%s, limit=%s",
        step,
        largestStableStep);
    Check.notNegative(truncation, "truncation");
    Check.notNegative(conversion, "conversion");
  }

  static RunSettings of(ScaledRing ring, int modes, double damping, Model model) {
    double largest = OuRk4.ofStep(1).largestStableStep(model);
    double wanted =
        Math.min(BIAS_RULE / model.linearPart().spectralBound(), 0.5 * largest);
    double step = COARSEST / Math.max(1, Math.ceil(COARSEST / wanted * (1 - 1e-12)));
    double excess = ring.biquadratic() - ring.coherent();
    double stiffness = ring.g() - ring.inter() - ring.coherent();
    double truncation = 0;
    double conversion = 0;
    if (ring.coherent() > 0 && excess > 0 && stiffness > 0) {
      // amplitude relaxation of the k = 0 relative mode, 2/(gamma (A + B)), A = m^2/2, B = 2 s
      double relaxation = 2 / (damping * (2 * excess + 2 * stiffness));
      conversion = ring.length() / (2 * WALL_SHARE * Math.sqrt(stiffness));
      truncation = 10 * Math.ceil((10 * relaxation + conversion / 3) / 10);
    }
    return new RunSettings(
        modes, model.region().grid().points(), step, largest, truncation, conversion);
  }

  /**
   * The scheme with the planned step.
   *
   * @return the default scheme
   */
  public OuRk4 integrator() {
    return OuRk4.ofStep(step);
  }
}
