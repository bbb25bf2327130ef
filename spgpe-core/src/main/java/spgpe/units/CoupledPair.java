package spgpe.units;

import java.util.Optional;
import spgpe.internal.check.Check;

/**
 * Two equal coupled components at rest in the state of relative phase pi, and what the laboratory
 * values say about its metastability. Immutable.
 *
 * <p>The coherent coupling is the energy J of -J (psi1* psi2 + c.c.), so that two bare levels are
 * split by 2 J; the biquadratic coupling is kappa in kappa (Im psi1* psi2)^2. With n atoms per
 * volume and component the relative phase phi feels -2 J n cos(phi) + kappa n^2 sin^2(phi), and
 *
 * <pre>
 * lambda^2 = kappa n/J           phi = pi is metastable iff lambda^2 &gt; 1
 * s        = (g - g12) n - J     stiffness of the relative density there
 * c        = sqrt(s/m)           speed of relative-phase waves
 * m_fv     = 2 sqrt(m J (lambda^2 - 1))/hbar
 * E_b      = n hbar sqrt(J/m) B1(lambda),  B1 = 4 [sqrt(lambda^2-1) - arccosh(lambda)/lambda]
 * </pre>
 *
 * <p>Basis: derived for this project, see docs/theory.md. n is the density of the metastable state.
 */
public final class CoupledPair {
  private static final double HBAR = Constants.HBAR;

  private final double mass;
  private final int dimension;
  private final double density;
  private final double coherent;
  private final double lambdaSquared;
  private final double meanField;
  private final double sum;
  private final double stiffness;

  private CoupledPair(
      Species species,
      Coupling intra,
      Coupling inter,
      Density density,
      Energy coherent,
      Coupling biquadratic) {
    this.mass = Check.notNull(species, "species").massKilograms();
    this.dimension = Check.notNull(intra, "intra").dimension();
    this.density = Check.notNull(density, "density").positive(dimension);
    this.coherent = Check.notNull(coherent, "coherent").positiveJoules("coherent coupling J");
    double kappa = Check.notNull(biquadratic, "biquadratic").times(density).joules();
    this.lambdaSquared =
        Check.finite(Check.notNegative(kappa, "kappa n in J") / this.coherent, "kappa n/J");
    this.meanField = intra.times(density).positiveJoules("g n");
    double other = Check.notNull(inter, "inter").times(density).joules();
    this.sum = meanField + other;
    Check.positive(sum, "(g + g12) n (else the mixture collapses) in J");
    this.stiffness = meanField - other - this.coherent;
  }

  /**
   * A pair. With a modulated coupling pass the averaged couplings of {@link Modulation}.
   *
   * @param species atom
   * @param intra coupling g within a component, greater than zero
   * @param inter coupling g12 between the components, g + g12 greater than zero
   * @param density density n of one component at relative phase pi, greater than zero
   * @param coherent coherent coupling J, greater than zero (half the splitting of two bare levels)
   * @param biquadratic biquadratic coupling kappa, at least zero
   * @return the pair
   * @throws IllegalArgumentException if a value is out of range or the dimensions differ
   */
  public static CoupledPair of(
      Species species,
      Coupling intra,
      Coupling inter,
      Density density,
      Energy coherent,
      Coupling biquadratic) {
    return new CoupledPair(species, intra, inter, density, coherent, biquadratic);
  }

  /**
   * The coherent coupling J that splits two bare levels by h f: J = h f/2.
   *
   * @param splitting full Rabi splitting f as an ordinary frequency
   * @return J
   */
  public static Energy coherentFromSplitting(Frequency splitting) {
    return new Energy(Check.notNull(splitting, "splitting").quantum().joules() / 2);
  }

  /**
   * The biquadratic coupling that gives a wanted lambda^2.
   *
   * @param lambdaSquared wanted kappa n/J, at least zero
   * @param coherent coherent coupling J
   * @param density density n per component, greater than zero
   * @return lambda^2 J/n
   * @throws IllegalArgumentException if a value is out of range
   */
  public static Coupling biquadraticFor(double lambdaSquared, Energy coherent, Density density) {
    Check.notNegative(lambdaSquared, "lambdaSquared");
    int dimension = Check.notNull(density, "density").dimension();
    return new Coupling(
        lambdaSquared
            * Check.notNull(coherent, "coherent").positiveJoules("coherent coupling J")
            / density.positive(dimension),
        dimension);
  }

  /**
   * The dimensionless energy B1 of the one-dimensional phase-only critical bubble.
   *
   * @param lambda lambda, at least 1
   * @return 4 [sqrt(lambda^2-1) - arccosh(lambda)/lambda]
   * @throws IllegalArgumentException if lambda is less than 1 or not finite
   */
  public static double bubbleFactor(double lambda) {
    Check.argument(
        lambda >= 1 && Double.isFinite(lambda),
        "lambda must be finite and >= 1 (else there is no barrier): lambda=%s",
        lambda);
    double sinh = Math.sqrt(lambda - 1) * Math.sqrt(lambda + 1);
    double a = Math.log1p(lambda - 1 + sinh);
    if (a > 0.2) {
      return 4 * (sinh - a / lambda);
    }
    // sinh(2a)/2 - a as a series: the two parts of the closed form cancel near lambda = 1
    double x = 4 * a * a;
    double series = x * a / 6 * (1 + x / 20 * (1 + x / 42 * (1 + x / 72 * (1 + x / 110))));
    return 4 * series / lambda;
  }

  /**
   * The parameter of metastability.
   *
   * @return lambda^2 = kappa n/J
   */
  public double lambdaSquared() {
    return lambdaSquared;
  }

  /**
   * Whether relative phase pi is a local minimum: lambda^2 &gt; 1 and positive {@link #stiffness}.
   *
   * @return true if metastable
   */
  public boolean isMetastable() {
    return lambdaSquared > 1 && stiffness > 0;
  }

  /**
   * The stiffness of the relative density in the metastable state; without g12 it is g n - J. Not
   * positive means that the components separate.
   *
   * @return (g - g12) n - J
   */
  public Energy stiffness() {
    return new Energy(stiffness);
  }

  /**
   * The chemical potential that holds n at relative phase pi.
   *
   * @return (g + g12) n + J
   */
  public Energy chemicalPotential() {
    return new Energy(sum + coherent);
  }

  /**
   * The density per component of the stable state (relative phase 0) at the same chemical
   * potential.
   *
   * @return n + 2 J/(g + g12)
   */
  public Density stableDensity() {
    return new Density(density * (1 + 2 * coherent / sum), dimension);
  }

  /**
   * The length sqrt(hbar^2/(4 m J)) of the coherent coupling alone.
   *
   * @return l_J
   */
  public Length josephsonLength() {
    return new Length(HBAR / Math.sqrt(mass) / (2 * Math.sqrt(coherent)));
  }

  /**
   * The correlation length 1/m_fv of the relative phase in the metastable state at low temperature.
   *
   * @return hbar/(2 sqrt(m J (lambda^2 - 1))), empty if not metastable
   */
  public Optional<Length> relativePhaseLength() {
    return isMetastable()
        ? Optional.of(new Length(josephsonLength().metres() / Math.sqrt(lambdaSquared - 1)))
        : Optional.empty();
  }

  /**
   * The speed sqrt(((g - g12) n - J)/m) of relative-phase waves in the metastable state: an upper
   * bound for the speed of a bubble wall, approached only for J much less than g n.
   *
   * @return speed in m/s, zero if the stiffness is not positive
   */
  public double relativePhaseSpeed() {
    return Math.sqrt(Math.max(0, stiffness) / mass);
  }

  /**
   * The energy of the relative-phase mode at k = 0.
   *
   * @return sqrt(4 s J (lambda^2 - 1)), s the stiffness; empty if not metastable
   */
  public Optional<Energy> relativePhaseGap() {
    return isMetastable()
        ? Optional.of(
            new Energy(
                2 * Math.sqrt(stiffness) * Math.sqrt(coherent) * Math.sqrt(lambdaSquared - 1)))
        : Optional.empty();
  }

  /**
   * The height of the barrier per length^d above the metastable state, at cos(phi) = -1/lambda^2.
   *
   * @return J n (lambda - 1/lambda)^2 in J m^-d, zero if lambda^2 is at most 1
   */
  public double barrierHeight() {
    if (lambdaSquared <= 1) {
      return 0;
    }
    double excess = lambdaSquared - 1;
    return coherent * density * excess * (excess / lambdaSquared);
  }

  /**
   * The energy of the one-dimensional critical bubble with the densities held fixed. It is too
   * large: letting the density respond lowers it by 1.7, 8, 14 and 25 percent at J/(g n) = 0.01,
   * 0.05, 0.1 and 0.2 (lambda^2 = 2.25, own calculation).
   *
   * @return n hbar sqrt(J/m) B1(lambda), empty if not metastable
   * @throws IllegalArgumentException if the gas is not one-dimensional
   */
  public Optional<Energy> bubbleEnergy() {
    Density.requireDimension(dimension, 1, "pair with a closed bubble energy");
    return isMetastable()
        ? Optional.of(
            new Energy(
                density
                    * HBAR
                    * Math.sqrt(coherent / mass)
                    * bubbleFactor(Math.sqrt(lambdaSquared))))
        : Optional.empty();
  }
}
