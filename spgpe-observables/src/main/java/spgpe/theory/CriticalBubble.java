package spgpe.theory;

import java.util.function.DoubleUnaryOperator;
import spgpe.internal.check.Check;

/**
 * Critical bubble of the full two-component field on a ring: the saddle of the energy projected on
 * the kept modes, with density response, and its fluctuation spectrum in all four real fields.
 *
 * <p>The mirror image with {@code psi_1} and {@code psi_2} exchanged is a second saddle of the same
 * energy. Found by Newton's method in the even sector from the closed profile of {@link
 * PhaseBubble}; accepted only with exactly one negative and two zero modes (translation and global
 * phase). Immutable.
 *
 * <p>The interaction is {@code (g/4)(N^2 + S_z^2) + (kappa/4) S_y^2}. For kappa above g it is
 * cheaper to leave the false vacuum through {@code S_z = n_1 - n_2} than through {@code S_y}, and
 * the symmetric bubble gets further negative modes; such parameters are refused.
 *
 * <p>An exact bubble on the infinite line satisfies {@code integral of sum_j |psi_j'|^2 = E_b}
 * (first integral of the static equations); compare {@link #gradientSquared} with {@link #energy}.
 */
public final class CriticalBubble {
  private final CoupledPair pair;
  private final RingModes ring;
  private final RingBasis basis;
  private final SaddleFields fields;
  private final SaddleSpectrum spectrum;

  private CriticalBubble(CoupledPair pair, RingModes ring) {
    this.pair = pair;
    this.ring = ring;
    basis = new RingBasis(ring.length(), ring.cutoffMode());
    fields = SaddleSearch.from(pair, basis, CriticalBubble::profile);
    double edge = Math.PI - fields.phase(fields.basis.points() - 1);
    Check.argument(
        Math.abs(edge) < 0.02,
        "the ring is too short for the bubble: relative phase opposite the centre differs from pi"
            + " by %s rad, must be below 0.02; raise length=%s to about 14/m=%s",
        edge, ring.length(), 14 / GaussianFluctuations.of(pair, Vacuum.FALSE).mass());
    spectrum = new SaddleSpectrum(pair, fields);
    if (spectrum.negativeModes() != 1 || spectrum.zeroModes() != 2 || !(fields.energy() > 0)) {
      throw new UnconvergedException(
          "Newton's method found a state with " + spectrum.negativeModes() + " negative and "
              + spectrum.zeroModes() + " zero modes at energy " + fields.energy()
              + " instead of the critical bubble (1 and 2) for " + pair + " on " + ring
              + "; use a longer ring or more modes");
    }
  }

  /**
   * Solves for the bubble.
   *
   * @param pair metastable parameters; the temperature is not used
   * @param ring length and cutoff of the simulation to compare with; cutoff mode at most 200
   * @return the bubble
   * @throws IllegalArgumentException if there is no metastable state, kappa is not below g, the
   *     ring is shorter than the bubble or the cutoff is out of range
   * @throws UnconvergedException if no saddle with one negative mode is found
   */
  public static CriticalBubble of(CoupledPair pair, RingModes ring) {
    Check.notNull(pair, "pair").requireMetastable();
    Check.notNull(ring, "ring");
    Check.inRange(ring.cutoffMode(), 4, 200, "cutoffMode");
    Check.argument(
        pair.biquadraticCoupling() < pair.g(),
        "the bubble of the relative phase needs biquadraticCoupling < g: at or above it the pair"
            + " passes the barrier through a density difference instead and this bubble is no"
            + " longer the saddle: biquadraticCoupling=%s, g=%s",
        pair.biquadraticCoupling(), pair.g());
    double mass = GaussianFluctuations.of(pair, Vacuum.FALSE).mass();
    Check.argument(
        ring.length() * mass > 8,
        "the ring is too short for the bubble: L*m must be > 8: length=%s, m=%s",
        ring.length(), mass);
    return new CriticalBubble(pair, ring);
  }

  private static DoubleUnaryOperator profile(CoupledPair pair) {
    return PhaseBubble.of(pair)::phase;
  }

  SaddleSummary summary() {
    return new SaddleSummary(
        1, ring.length(), energy(), gradientSquared(), atomRatio(), spectrum);
  }

  /**
   * Parameters.
   *
   * @return the pair
   */
  public CoupledPair pair() {
    return pair;
  }

  /**
   * Ring and cutoff.
   *
   * @return the ring
   */
  public RingModes ring() {
    return ring;
  }

  /**
   * Energy of the bubble above the uniform false vacuum of the same ring.
   *
   * @return E_b (energy)
   */
  public double energy() {
    return fields.energy();
  }

  /**
   * Twice the gradient energy, the norm squared of the translation mode.
   *
   * @return {@code integral of sum_j |psi_j'|^2} (energy)
   */
  public double gradientSquared() {
    return fields.gradientSquared();
  }

  /**
   * Atom number of the bubble state over that of the false vacuum.
   *
   * @return the ratio (dimensionless)
   */
  public double atomRatio() {
    return fields.atoms() / (2 * pair.falseVacuumDensity() * ring.length());
  }

  /**
   * Density of one component (both are equal).
   *
   * @param position distance from the centre (length), finite
   * @return n(x) (1/length)
   * @throws IllegalArgumentException if the position is not finite
   */
  public double density(double position) {
    Check.finite(position, "position");
    double u = basis.valueAt(fields.coefficientsOfU(), position);
    double v = basis.valueAt(fields.coefficientsOfV(), position);
    return u * u + v * v;
  }

  /**
   * Relative phase.
   *
   * @param position distance from the centre (length), finite
   * @return phi(x), about pi far away
   * @throws IllegalArgumentException if the position is not finite
   */
  public double phase(double position) {
    Check.finite(position, "position");
    double u = basis.valueAt(fields.coefficientsOfU(), position);
    double v = basis.valueAt(fields.coefficientsOfV(), position);
    return 2 * Math.atan2(v, u);
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
   * Number of negative Hessian eigenvalues.
   *
   * @return one
   */
  public int negativeModes() {
    return spectrum.negativeModes();
  }

  /**
   * Number of zero modes of the Hessian: translation and global phase.
   *
   * @return two; the uniform false vacuum has one
   */
  public int zeroModes() {
    return spectrum.zeroModes();
  }

  /**
   * Largest size of the two zero eigenvalues, a measure of the accuracy of the saddle.
   *
   * @return the largest absolute value (energy)
   */
  public double zeroModeError() {
    return spectrum.zeroError();
  }

  /**
   * Logarithm of the determinant factor of the rate.
   *
   * @return {@code ln [prod' lambda_fv / prod' |lambda_s|]^(1/2)} over all kept modes without the
   *     zero modes (one in the false vacuum, two at the bubble); unit of energy to the power one
   *     half
   */
  public double logDeterminantFactor() {
    return spectrum.logDeterminantFactor();
  }

  /**
   * Growth rate of the unstable mode under damped dynamics {@code dpsi/dt = -(i + gamma)
   * dK/dpsi^*}.
   *
   * @param damping dimensionless gamma, greater than zero
   * @return lambda_+, the only positive eigenvalue of {@code -(gamma + i) Hessian/2} (1/time)
   * @throws IllegalArgumentException if the damping is not finite and positive
   * @throws UnconvergedException if the eigenvalue iteration fails
   */
  public double growthRate(double damping) {
    return spectrum.growthRate(Check.positive(damping, "damping"));
  }

  /**
   * Weight of the highest kept modes in the profile; the energy moves by about its square when the
   * cutoff is raised.
   *
   * @return largest coefficient near the cutoff over the largest coefficient
   */
  public double spectralTail() {
    return fields.spectralTail();
  }
}
