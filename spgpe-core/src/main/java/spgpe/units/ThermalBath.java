package spgpe.units;

import java.util.List;
import spgpe.internal.check.Check;

/**
 * The thermal cloud above the cutoff, and the reservoir parameters kinetic theory gives it. The
 * cloud is three-dimensional, also when the coherent region is not. Immutable.
 *
 * <p>Growth rate: gamma = (8 a^2/lambda^2) I with the thermal wavelength lambda and, b = mu/(kB T),
 * c = eps_cut/(kB T),
 *
 * <pre>I = sum over j &gt;= 1 of exp(b (j+1) - 2 c j) Phi(exp(b-c), 1, j)^2</pre>
 *
 * where Phi is the Lerch transcendent; its argument is exp[(mu - eps_cut)/(kB T)]. Structure: A. S.
 * Bradley, C. W. Gardiner, M. J. Davis, Phys. Rev. A 77, 033616 (2008); S. J. Rooney, P. B. Blakie,
 * A. S. Bradley, Phys. Rev. A 86, 053634 (2012); re-derived for this project from the collision
 * integral of one component with its own cloud. How the condensate enters the energy balance leaves
 * an ambiguity of 2 to 3 percent, and the other component's cloud is not counted, so at most two
 * figures of gamma mean anything physically.
 */
public final class ThermalBath {
  private static final double SMALLEST_GAP = 1e-4;

  private final double mass;
  private final double scatteringLength;
  private final double thermal;
  private final double mu;
  private final double cutoff;
  private final double growthPrefactor;
  private final double collisionSum;

  private ThermalBath(
      Species species, Length scatteringLength, Temperature temperature, Energy mu, Energy cutoff) {
    this.mass = Check.notNull(species, "species").massKilograms();
    this.scatteringLength = Check.notNull(scatteringLength, "scatteringLength").metres();
    this.thermal = Check.notNull(temperature, "temperature").positiveJoules();
    this.mu = Check.notNull(mu, "mu").joules();
    this.cutoff = Check.notNull(cutoff, "cutoff").positiveJoules("cutoff energy");
    double gap = (this.cutoff - this.mu) / thermal;
    Check.argument(
        gap >= SMALLEST_GAP,
        "cutoff energy must exceed mu by at least 1e-4 kB T: (eps_cut - mu)/(kB T)=%s,"
            + " eps_cut=%s J, mu=%s J, T=%s K; raise the cutoff",
        gap,
        this.cutoff,
        this.mu,
        temperature.kelvin());
    double ratio = this.scatteringLength / species.thermalWavelength(temperature).metres();
    this.growthPrefactor = Check.finite(8 * ratio * ratio, "8 a^2/lambda^2");
    this.collisionSum =
        Check.finite(
            SpecialFunctions.collisionSum(this.mu / thermal, this.cutoff / thermal),
            "collision sum");
  }

  /**
   * A thermal cloud.
   *
   * @param species atom
   * @param scatteringLength s-wave scattering length a of the component with its own cloud
   * @param temperature temperature, greater than zero
   * @param mu chemical potential
   * @param cutoff energy eps_cut at which the coherent region ends, greater than zero and above mu
   * @return the bath
   * @throws IllegalArgumentException if the temperature or cutoff is not positive, or the cutoff is
   *     not above mu by 1e-4 kB T
   */
  public static ThermalBath of(
      Species species, Length scatteringLength, Temperature temperature, Energy mu, Energy cutoff) {
    return new ThermalBath(species, scatteringLength, temperature, mu, cutoff);
  }

  /**
   * The cutoff energy at which the Bose occupation has fallen to a given number: mu + kB T ln(1 +
   * 1/n). For n = 1 this is mu + kB T ln 2; the classical occupation there is 1.44. In one
   * dimension the best choice depends on the observable: vary it.
   *
   * @param mu chemical potential
   * @param temperature temperature, greater than zero
   * @param occupation Bose occupation at the cutoff, greater than zero; usually 1 to 3
   * @return eps_cut
   * @throws IllegalArgumentException if the temperature or the occupation is not positive
   */
  public static Energy cutoffEnergy(Energy mu, Temperature temperature, double occupation) {
    Check.positive(occupation, "occupation at the cutoff");
    return new Energy(
        Check.notNull(mu, "mu").joules()
            + Check.notNull(temperature, "temperature").positiveJoules()
                * Math.log1p(1 / occupation));
  }

  /**
   * The cutoff energy.
   *
   * @return eps_cut
   */
  public Energy cutoff() {
    return new Energy(cutoff);
  }

  /**
   * The dimensionless growth rate (damping) gamma = (8 a^2/lambda^2) I.
   *
   * @return gamma
   */
  public double growthRate() {
    return growthPrefactor * collisionSum;
  }

  /**
   * The factor 8 a^2/lambda^2 of the growth rate.
   *
   * @return gamma_0
   */
  public double growthPrefactor() {
    return growthPrefactor;
  }

  /**
   * The dimensionless collision sum I of the growth rate.
   *
   * @return I
   */
  public double collisionSum() {
    return collisionSum;
  }

  /**
   * The amplitude of energy damping (scattering), M = 16 pi a^2/(exp[(eps_cut - mu)/(kB T)] - 1).
   *
   * @return M in m^2
   */
  public double scatteringAmplitude() {
    return 16 * Math.PI * scatteringLength * scatteringLength / Math.expm1((cutoff - mu) / thermal);
  }

  /**
   * The kernel of energy damping at a wave number, reduced to the dimension of the confinement by
   * its ground state. In three dimensions it is M/|k|.
   *
   * <p>Quasi-1D: M erfcx(|k| a_perp/sqrt(2))/(a_perp sqrt(8 pi)), in m. Quasi-2D: (M/(2 pi)) exp(q)
   * K0(q), q = k^2 a_z^2/4, in m^2; it diverges at k = 0, which the divergence of the current never
   * reaches. Structure: A. S. Bradley, S. J. Rooney, R. G. McDonald, Phys. Rev. A 92, 033631
   * (2015); re-derived for this project.
   *
   * @param confinement tight directions
   * @param perMetre wave number k in 1/m
   * @return eps(k) in m^d
   * @throws IllegalArgumentException if k is not finite, or zero in two dimensions
   */
  public double energyDampingKernel(Confinement confinement, double perMetre) {
    double width = Check.notNull(confinement, "confinement").oscillatorLength().metres();
    double k = Math.abs(Check.finite(perMetre, "wave number in 1/m"));
    if (confinement.dimension() == 1) {
      return scatteringAmplitude()
          / (width * Math.sqrt(8 * Math.PI))
          * SpecialFunctions.scaledErfc(k * width / Math.sqrt(2));
    }
    double q = 0.25 * (k * width) * (k * width);
    Check.positive(q, "k^2 a_z^2/4 of the two-dimensional kernel (it diverges at k=0)");
    return scatteringAmplitude() / (2 * Math.PI) * SpecialFunctions.scaledBesselK0(q);
  }

  /**
   * The time hbar/(2 gamma mu) in which the occupation of a mode of energy mu relaxes.
   *
   * @param gamma damping, greater than zero; {@link #growthRate} for the kinetic value
   * @return relaxation time
   * @throws IllegalArgumentException if gamma or mu is not positive
   */
  public TimeSpan relaxationTime(double gamma) {
    Check.positive(gamma, "gamma");
    Check.positive(mu, "mu in J");
    return new TimeSpan(Constants.HBAR / (2 * gamma * mu));
  }

  /**
   * Judges the reservoir description itself: whether the cutoff lies well above mu, which the
   * derivation of the growth rate assumes.
   *
   * @return the verdict
   */
  public Verdict cutoffVerdict() {
    return Verdict.atLeast(
        "eps_cut/mu",
        mu > 0 ? cutoff / mu : Double.POSITIVE_INFINITY,
        2,
        1,
        "the kinetic growth rate assumes single-particle states above the cutoff, eps_cut >~ 2 mu"
            + "; upper limit from the derivation, lower limit: cutoff at mu");
  }

  /**
   * Compares a simulation with the experiment: the damping used with the kinetic one, and the
   * relaxation time at the kinetic damping with the run time.
   *
   * @param gammaUsed damping of the simulation, greater than zero
   * @param runTime time the experiment is watched, greater than zero
   * @return two verdicts
   * @throws IllegalArgumentException if a value, or mu, is not positive
   */
  public List<Verdict> dampingVerdicts(double gammaUsed, TimeSpan runTime) {
    Check.positive(gammaUsed, "gammaUsed");
    double run = Check.positive(Check.notNull(runTime, "runTime").seconds(), "run time in s");
    Check.positive(mu, "mu in J");
    double kinetic = growthRate();
    return List.of(
        Verdict.atMost(
            "gamma used/gamma kinetic",
            gammaUsed / kinetic,
            3,
            30,
            "a damping far above the kinetic one makes the simulated bath faster than the real"
                + " cloud; rates may depend on it: vary gamma"
                + Verdict.RULE_OF_THUMB),
        Verdict.atMost(
            "relaxation time/run time",
            Constants.HBAR / (2 * kinetic * mu) / run,
            0.2,
            1,
            "hbar/(2 gamma mu) at the kinetic gamma; a longer one means the real gas evolves nearly"
                + " without its bath during the run, unlike the simulation"
                + Verdict.RULE_OF_THUMB));
  }
}
