package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * Critical bubble of the relative phase alone in one dimension, densities frozen, in closed form.
 *
 * <p>With {@code H = integral of (n/4) phi'^2 + 2 J n (-cos phi + (lambda^2/2) sin^2 phi)} and
 * {@code s = sqrt(lambda^2 - 1)} the bubble is {@code phi(x) = pi - 2 arctan(s sech(m x))}, {@code
 * m = 2 sqrt(J) s}, of energy {@code n sqrt(J) B_1}, {@code B_1 = 4 (s - arccosh(lambda)/lambda)}.
 * Derived, see {@code docs/theory-references.md}. Immutable.
 *
 * <p>Density response lowers the energy: by 2 percent at {@code J = .01 g n}, 14 percent at {@code
 * J = .1 g n} (lambda squared 2.25). Use {@link CriticalBubble} beyond that.
 */
public final class PhaseBubble {
  private final double density;
  private final double coherent;
  private final double lambda;
  private final double root;

  private PhaseBubble(double density, double coherent, double lambda) {
    this.density = density;
    this.coherent = coherent;
    this.lambda = lambda;
    this.root = Math.sqrt((lambda - 1) * (lambda + 1));
  }

  /**
   * Bubble from density, coupling and barrier parameter.
   *
   * @param density density n of one component (1/length), greater than zero
   * @param coherentCoupling J (energy), greater than zero
   * @param lambda barrier parameter, greater than one and at most 1000
   * @return the bubble
   * @throws IllegalArgumentException if a value is out of range; without {@code lambda > 1} there
   *     is no metastable state
   */
  public static PhaseBubble of(double density, double coherentCoupling, double lambda) {
    Check.positive(density, "density");
    Check.positive(coherentCoupling, "coherentCoupling");
    Check.argument(
        lambda > 1 && lambda <= 1000,
        "no metastable state or too thin a wall: lambda must lie in (1, 1000], with lambda^2 ="
            + " kappa n/J: lambda=%s",
        lambda);
    return new PhaseBubble(density, coherentCoupling, lambda);
  }

  /**
   * Phase-only bubble of a coupled pair at its false-vacuum density.
   *
   * @param pair metastable parameters; the temperature is not used
   * @return the bubble
   * @throws IllegalArgumentException if the pair has no metastable state
   */
  public static PhaseBubble of(CoupledPair pair) {
    Check.notNull(pair, "pair").requireMetastable();
    return of(
        pair.falseVacuumDensity(), pair.coherentCoupling(), Math.sqrt(pair.lambdaSquared()));
  }

  /**
   * Barrier parameter.
   *
   * @return lambda
   */
  public double lambda() {
    return lambda;
  }

  /**
   * Energy above the false vacuum.
   *
   * @return {@code n sqrt(J) B_1(lambda)} (energy)
   */
  public double energy() {
    return density * Math.sqrt(coherent) * reducedEnergy();
  }

  /**
   * Dimensionless energy.
   *
   * @return {@code B_1 = 4 (s - arccosh(lambda)/lambda)}
   */
  public double reducedEnergy() {
    double x = lambda - 1;
    if (x < 1e-3) {
      // Both terms agree to order x^(1/2); series of (sinh u cosh u - u)/cosh u, u = arccosh.
      double u = arccosh();
      double v = 4 * u * u;
      double difference = 8 * u * u * u * (1.0 / 6 + v / 120 + v * v / 5040) / 2;
      return 4 * difference / lambda;
    }
    return 4 * (root - arccosh() / lambda);
  }

  private double arccosh() {
    double x = lambda - 1;
    return Math.log1p(x + root);
  }

  /**
   * Limit of a small barrier, lambda to one.
   *
   * @return {@code B_1} tends to {@code (8/3) arccosh(lambda)^3}
   */
  public double smallBarrierLimit() {
    double u = arccosh();
    return 8.0 / 3 * u * u * u;
  }

  /**
   * Limit of thin walls, lambda to infinity: two walls and their correction.
   *
   * @return {@code B_1} tends to {@code 4 (lambda - ln(2 lambda)/lambda)}
   */
  public double thinWallLimit() {
    return 4 * (lambda - Math.log(2 * lambda) / lambda);
  }

  /**
   * Height of the uniform barrier above the false vacuum.
   *
   * @return {@code J n (lambda - 1/lambda)^2} (energy/length)
   */
  public double barrierHeight() {
    double d = root * root / lambda;
    return coherent * density * d * d;
  }

  /**
   * Mass of the false vacuum, which sets the tail of the bubble.
   *
   * @return {@code m = 2 sqrt(J (lambda^2 - 1))} (1/length)
   */
  public double mass() {
    return 2 * Math.sqrt(coherent) * root;
  }

  /**
   * Relative phase of the bubble.
   *
   * @param position distance x from the centre (length), finite
   * @return {@code phi(x)} between the turning point and pi
   * @throws IllegalArgumentException if the position is not finite
   */
  public double phase(double position) {
    double x = mass() * Check.finite(position, "position");
    return Math.PI - 2 * Math.atan(root / Math.cosh(x));
  }

  /**
   * Ratio of fluctuation determinants of the phase, zero mode removed, without cutoff; in lengths
   * of {@code 1/(2 sqrt(J))}.
   *
   * @return {@code det'/det_fv = -B_1/(32 s^5)}; negative because of the one unstable mode
   */
  public double determinantRatio() {
    return -reducedEnergy() / (32 * Math.pow(root, 5));
  }

  /**
   * The negative eigenvalue of the phase fluctuation operator {@code -d^2/dx^2 + U''} in lengths of
   * {@code 1/(2 sqrt(J))}.
   *
   * @return the eigenvalue
   * @throws UnconvergedException if the mode basis does not converge to 1e-9
   */
  public double negativeEigenvalue() {
    double previous = Double.NaN;
    for (int cutoff = 32; cutoff <= 256; cutoff *= 2) {
      double value = lowestEigenvalue(cutoff);
      if (Math.abs(value - previous) < 1e-10 * Math.max(root * root, Math.abs(value))) {
        return value;
      }
      previous = value;
    }
    throw new UnconvergedException(
        "the negative eigenvalue did not converge with 256 modes at lambda=" + lambda);
  }

  private double lowestEigenvalue(int cutoff) {
    RingBasis basis = new RingBasis(2 * (22 + Math.log1p(root)) / root, cutoff);
    double[] curvature = new double[basis.points()];
    for (int p = 0; p < curvature.length; p++) {
      double y = 2 * Math.atan(root / Math.cosh(root * basis.radius(p)));
      curvature[p] = -Math.cos(y) + lambda * lambda * Math.cos(2 * y);
    }
    double[][] h = new double[cutoff + 1][cutoff + 1];
    basis.addMultiplication(h, 0, 0, curvature, RingBasis.EVEN);
    basis.addKinetic(h, 0, RingBasis.EVEN);
    return SymmetricEigen.of(h).value(0);
  }
}
