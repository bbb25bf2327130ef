package spgpe.theory;

import java.util.function.DoubleUnaryOperator;
import spgpe.internal.check.Check;

/**
 * Critical bubble of the full two-component field in two dimensions, on a periodic square with the
 * modes {@code n_x^2 + n_y^2 <= cutoff^2}: the saddle of the projected energy and its fluctuation
 * spectrum in all real fields, split by the symmetry classes of the square.
 *
 * <p>Found by Newton's method from the phase-only profile of {@link RadialBubble}; accepted only
 * with one negative and three zero modes (two translations, global phase). In the plane scaling
 * makes the gradient energy equal to the bubble energy. Immutable.
 *
 * <p>The one-loop determinant grows steeply with the cutoff at fixed bare parameters, and the false
 * vacuum lives long only for E_b/T near 18 and above: compare at equal cutoff.
 */
public final class PlanarBubble {
  private final CoupledPair pair;
  private final double side;
  private final SaddleFields fields;
  private final SaddleSpectrum spectrum;

  private PlanarBubble(CoupledPair pair, double side, int cutoffMode) {
    this.pair = pair;
    this.side = side;
    fields = SaddleSearch.from(pair, new SquareBasis(side, cutoffMode), PlanarBubble::profile);
    spectrum = new SaddleSpectrum(pair, fields);
    if (spectrum.negativeModes() != 1 || spectrum.zeroModes() != 3 || !(fields.energy() > 0)) {
      throw new UnconvergedException(
          "Newton's method found a state with " + spectrum.negativeModes() + " negative and "
              + spectrum.zeroModes() + " zero modes at energy " + fields.energy()
              + " instead of the critical bubble (1 and 3) for " + pair + " on a square of side "
              + side + "; use a larger square or more modes");
    }
  }

  /**
   * Solves for the bubble.
   *
   * @param pair metastable parameters with kappa below g and lambda from 1.02 to 3; couplings times
   *     area; the temperature is not used
   * @param side side of the periodic square (length), at least {@code 12/m}
   * @param cutoffMode largest kept mode number, 4 to 20
   * @return the bubble
   * @throws IllegalArgumentException if a value is out of range or there is no metastable state
   * @throws UnconvergedException if no saddle with one negative mode is found
   */
  public static PlanarBubble of(CoupledPair pair, double side, int cutoffMode) {
    Check.notNull(pair, "pair").requireMetastable();
    Check.argument(
        pair.biquadraticCoupling() < pair.g(),
        "biquadraticCoupling must be below g, see CriticalBubble: biquadraticCoupling=%s, g=%s",
        pair.biquadraticCoupling(), pair.g());
    double mass = GaussianFluctuations.of(pair, Vacuum.FALSE).mass();
    Check.argument(
        side * mass >= 12 && Double.isFinite(side),
        "the square is too small for the bubble: side*m must be >= 12: side=%s, m=%s",
        side, mass);
    Check.inRange(cutoffMode, 4, 20, "cutoffMode");
    return new PlanarBubble(pair, side, cutoffMode);
  }

  private static DoubleUnaryOperator profile(CoupledPair pair) {
    RadialBubble bubble = RadialBubble.of(Math.sqrt(pair.lambdaSquared()));
    double unit = 2 * Math.sqrt(pair.coherentCoupling());
    return r -> bubble.phase(unit * r);
  }

  SaddleSummary summary() {
    return new SaddleSummary(
        2, side * side, energy(), 2 * gradientEnergy(), atomRatio(), spectrum);
  }

  /**
   * Energy of the bubble above the uniform false vacuum of the same square.
   *
   * @return E_b (energy)
   */
  public double energy() {
    return fields.energy();
  }

  /**
   * Gradient energy, also the norm squared of one translation mode.
   *
   * @return half the integral of {@code sum_j |grad psi_j|^2} (energy)
   */
  public double gradientEnergy() {
    return 0.5 * fields.gradientSquared();
  }

  /**
   * Density of one component in the centre.
   *
   * @return n(0) (1/area)
   */
  public double centralDensity() {
    return fields.density(0);
  }

  /**
   * Relative phase in the centre.
   *
   * @return phi(0)
   */
  public double centralPhase() {
    return fields.phase(0);
  }

  /**
   * Atom number of the bubble state over that of the false vacuum.
   *
   * @return the ratio (dimensionless)
   */
  public double atomRatio() {
    return fields.atoms() / (2 * pair.falseVacuumDensity() * side * side);
  }

  /**
   * The negative eigenvalue of the Hessian in orthonormal real coordinates.
   *
   * @return the eigenvalue (energy)
   */
  public double negativeEigenvalue() {
    return spectrum.negative();
  }

  /**
   * Number of zero modes of the Hessian: two translations and the global phase.
   *
   * @return three
   */
  public int zeroModes() {
    return spectrum.zeroModes();
  }

  /**
   * Largest size of the zero eigenvalues, a measure of the accuracy of the saddle.
   *
   * @return the largest absolute value (energy)
   */
  public double zeroModeError() {
    return spectrum.zeroError();
  }

  /**
   * Logarithm of the determinant factor of the rate.
   *
   * @return {@code ln [prod' lambda_fv / prod' |lambda_s|]^(1/2)} without zero modes (one in the
   *     false vacuum, three at the bubble); unit of energy to the power one
   */
  public double logDeterminantFactor() {
    return spectrum.logDeterminantFactor();
  }

  /**
   * Growth rate of the unstable mode.
   *
   * @param damping dimensionless gamma, greater than zero
   * @return lambda_+ (1/time)
   * @throws IllegalArgumentException if the damping is not finite and positive
   * @throws UnconvergedException if the eigenvalue iteration fails
   */
  public double growthRate(double damping) {
    return spectrum.growthRate(Check.positive(damping, "damping"));
  }
}
