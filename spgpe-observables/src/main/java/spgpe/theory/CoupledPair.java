package spgpe.theory;

import spgpe.internal.check.Check;

/**
 * Parameters of two coherently coupled condensates in scaled units ({@code hbar = m = k_B = 1}).
 *
 * @param g intracomponent contact coupling (energy times length in 1D), greater than zero
 * @param mu chemical potential of both components (energy)
 * @param coherentCoupling J of the term {@code -J (psi_1^* psi_2 + c.c.)} (energy), not negative;
 *     a negative J is the same physics with {@code psi_2 -> -psi_2}
 * @param biquadraticCoupling kappa of the term {@code (kappa/4) S_y^2}, same unit as {@code g}, not
 *     negative
 * @param temperature temperature T (energy), greater than zero
 */
public record CoupledPair(
    double g,
    double mu,
    double coherentCoupling,
    double biquadraticCoupling,
    double temperature) {

  /**
   * Checks the parameters.
   *
   * @param g intracomponent contact coupling (energy times length in 1D), greater than zero
   * @param mu chemical potential of both components (energy)
   * @param coherentCoupling J of the term {@code -J (psi_1^* psi_2 + c.c.)} (energy), not negative;
   *     a negative J is the same physics with {@code psi_2 -> -psi_2}
   * @param biquadraticCoupling kappa of the term {@code (kappa/4) S_y^2}, same unit as {@code g},
   *     not negative
   * @param temperature temperature T (energy), greater than zero
   * @throws IllegalArgumentException if a value is not finite or out of range
   */
  public CoupledPair {
    Check.positive(g, "g");
    Check.finite(mu, "mu");
    Check.notNegative(coherentCoupling, "coherentCoupling");
    Check.notNegative(biquadraticCoupling, "biquadraticCoupling");
    Check.positive(temperature, "temperature");
  }

  /**
   * Parameters from the false-vacuum density and the barrier parameter: {@code mu = g n + J},
   * {@code kappa = lambda^2 J/n}.
   *
   * @param g contact coupling, greater than zero
   * @param falseVacuumDensity density n of one component in the false vacuum, greater than zero
   * @param coherentCoupling coherent coupling J, greater than zero
   * @param lambda barrier parameter, greater than zero; the false vacuum is metastable above one
   * @param temperature temperature, greater than zero
   * @return the parameters
   * @throws IllegalArgumentException if a value is not finite or out of range
   */
  public static CoupledPair fromFalseVacuum(
      double g,
      double falseVacuumDensity,
      double coherentCoupling,
      double lambda,
      double temperature) {
    Check.positive(g, "g");
    Check.positive(falseVacuumDensity, "falseVacuumDensity");
    Check.positive(coherentCoupling, "coherentCoupling");
    Check.positive(lambda, "lambda");
    return new CoupledPair(
        g,
        g * falseVacuumDensity + coherentCoupling,
        coherentCoupling,
        lambda * lambda * coherentCoupling / falseVacuumDensity,
        temperature);
  }

  /**
   * Density per component of the uniform state with relative phase pi, {@code (mu - J)/g}.
   *
   * @return the density (1/length); not positive if that state does not exist
   */
  public double falseVacuumDensity() {
    return (mu - coherentCoupling) / g;
  }

  /**
   * Density per component of the uniform state with relative phase zero, {@code (mu + J)/g}.
   *
   * @return the density (1/length); not positive if that state does not exist
   */
  public double trueVacuumDensity() {
    return (mu + coherentCoupling) / g;
  }

  /**
   * Barrier parameter squared, {@code lambda^2 = kappa n_fv/J}.
   *
   * @return lambda squared (dimensionless); infinite for J = 0 with kappa greater than zero
   */
  public double lambdaSquared() {
    return biquadraticCoupling * falseVacuumDensity() / coherentCoupling;
  }

  /**
   * Whether the state of relative phase pi is a local minimum of the energy at all wave numbers:
   * {@code kappa n_fv > J > 0} and {@code g n_fv > J}.
   *
   * @return true if the false vacuum is metastable
   */
  public boolean isMetastable() {
    double n = falseVacuumDensity();
    return coherentCoupling > 0
        && biquadraticCoupling * n > coherentCoupling
        && g * n > coherentCoupling;
  }

  /**
   * Pressure difference of the two vacua, {@code g (n_tv^2 - n_fv^2) = 4 mu J/g}.
   *
   * @return the free-energy gain per length at zero temperature (energy/length)
   */
  public double pressureDifference() {
    return 4 * mu * coherentCoupling / g;
  }

  /**
   * The same pair at another chemical potential.
   *
   * @param value chemical potential (energy), finite
   * @return a changed copy
   */
  public CoupledPair withMu(double value) {
    return new CoupledPair(g, value, coherentCoupling, biquadraticCoupling, temperature);
  }

  /**
   * The same pair at another temperature.
   *
   * @param value temperature (energy), greater than zero
   * @return a changed copy
   */
  public CoupledPair withTemperature(double value) {
    return new CoupledPair(g, mu, coherentCoupling, biquadraticCoupling, value);
  }

  /**
   * The same pair at another coherent coupling.
   *
   * @param value coherent coupling J (energy), not negative
   * @return a changed copy
   */
  public CoupledPair withCoherentCoupling(double value) {
    return new CoupledPair(g, mu, value, biquadraticCoupling, temperature);
  }

  /**
   * The same pair at another biquadratic coupling.
   *
   * @param value biquadratic coupling kappa (energy times length in 1D), not negative
   * @return a changed copy
   */
  public CoupledPair withBiquadraticCoupling(double value) {
    return new CoupledPair(g, mu, coherentCoupling, value, temperature);
  }

  /**
   * Refuses parameters without a false vacuum.
   *
   * @throws IllegalArgumentException if the phase-pi state is not metastable
   */
  void requireMetastable() {
    Check.argument(
        isMetastable(),
        "no metastable state: kappa*n_fv > J > 0 and g*n_fv > J are needed with"
            + " n_fv=(mu-J)/g; got kappa*n_fv=%s, J=%s, g*n_fv=%s. Raise biquadraticCoupling or"
            + " mu, or lower coherentCoupling",
        biquadraticCoupling * falseVacuumDensity(),
        coherentCoupling,
        g * falseVacuumDensity());
  }
}
