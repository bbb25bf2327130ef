package spgpe.units;

import java.util.ArrayList;
import java.util.List;
import spgpe.internal.check.Check;

/**
 * Verdicts on the assumptions behind a reduced classical-field description. Limits that are rules
 * of thumb say so in their reason.
 */
public final class Validity {
  private static final String RULE = Verdict.RULE_OF_THUMB;

  private Validity() {}

  /**
   * Judges the quasi-one-dimensional description of one component.
   *
   * @param confinement transverse trap, dimension 1
   * @param gas component, dimension 1
   * @param scatteringLength s-wave scattering length a
   * @param temperature temperature, greater than zero
   * @return verdicts on mu and kB T against hbar w_perp, n a, a/a_perp, the Lieb-Liniger parameter,
   *     degeneracy, quasi-condensation and the coherence length
   * @throws IllegalArgumentException if dimensions differ or the temperature is zero
   */
  public static List<Verdict> quasi1d(
      Confinement confinement, UniformGas gas, Length scatteringLength, Temperature temperature) {
    double quantum = quantum(confinement, gas, 1);
    double a = Math.abs(Check.notNull(scatteringLength, "scatteringLength").metres());
    double thermal = Check.notNull(temperature, "temperature").positiveJoules();
    double degeneracy = gas.degeneracyTemperature().energy().joules();
    double interaction = gas.liebLiniger();
    return List.of(
        Verdict.atMost(
            "mu/(hbar w_perp)",
            gas.chemicalPotential().joules() / quantum,
            0.3,
            1,
            "interactions must not excite transverse motion" + RULE),
        Verdict.atMost(
            "kB T/(hbar w_perp)",
            thermal / quantum,
            0.3,
            1,
            "heat must not excite transverse motion" + RULE),
        Verdict.atMost(
            "n a",
            gas.density().perMetreToD() * a,
            0.1,
            0.5,
            "the transverse ground state swells by about n a; at 0.5 mu reaches hbar w_perp"
                + RULE),
        Verdict.atMost(
            "a/a_perp",
            a / confinement.oscillatorLength().metres(),
            0.05,
            0.3,
            "scattering must be three-dimensional; a confinement-induced resonance lies near"
                + " a/a_perp = 0.97"
                + RULE),
        Verdict.atMost(
            "Lieb-Liniger gamma_LL",
            interaction,
            0.01,
            1,
            "the field is classical only if many atoms share a healing length, n xi = gamma_LL^-1/2"
                + RULE),
        Verdict.atMost(
            "T/T_d",
            thermal / degeneracy,
            0.1,
            1,
            "T_d = hbar^2 n^2/(2 m kB); low modes must hold many atoms" + RULE),
        Verdict.atMost(
            "T/(T_d sqrt(gamma_LL))",
            thermal / (degeneracy * Math.sqrt(interaction)),
            0.3,
            1,
            "density fluctuations are small only well below this quasi-condensation temperature"
                + " (Kheruntsyan et al., Phys. Rev. Lett. 91, 040403 (2003), from memory)"
                + RULE),
        Verdict.atLeast(
            "coherence length/xi",
            gas.coherenceLength(temperature).metres() / gas.healingLength().metres(),
            20,
            2,
            "the phase must be smooth on the healing length" + RULE));
  }

  /**
   * Judges the quasi-two-dimensional description of one component.
   *
   * @param confinement axial trap, dimension 2
   * @param gas component, dimension 2
   * @param scatteringLength s-wave scattering length a
   * @param temperature temperature, greater than zero
   * @return verdicts on mu and kB T against hbar w_z, a/a_z, the dimensionless coupling and, where
   *     it is at most 1, the distance from the BKT transition
   * @throws IllegalArgumentException if dimensions differ or the temperature is zero
   */
  public static List<Verdict> quasi2d(
      Confinement confinement, UniformGas gas, Length scatteringLength, Temperature temperature) {
    double quantum = quantum(confinement, gas, 2);
    double a = Math.abs(Check.notNull(scatteringLength, "scatteringLength").metres());
    double thermal = Check.notNull(temperature, "temperature").positiveJoules();
    double coupling = gas.dimensionlessCoupling();
    List<Verdict> verdicts = new ArrayList<>();
    verdicts.add(
        Verdict.atMost(
            "mu/(hbar w_z)",
            gas.chemicalPotential().joules() / quantum,
            0.3,
            1,
            "interactions must not excite axial motion" + RULE));
    verdicts.add(
        Verdict.atMost(
            "kB T/(hbar w_z)",
            thermal / quantum,
            0.3,
            1,
            "heat must not excite axial motion" + RULE));
    verdicts.add(
        Verdict.atMost(
            "a/a_z",
            a / confinement.oscillatorLength().metres(),
            0.05,
            0.3,
            "scattering must be three-dimensional" + RULE));
    verdicts.add(
        Verdict.atMost(
            "m g/hbar^2",
            coupling,
            0.2,
            1,
            "stronger couplings depend logarithmically on energy" + RULE));
    // at stronger coupling the transition formula does not apply, as the last verdict says
    if (coupling <= 1) {
      verdicts.add(
          Verdict.atLeast(
              "n lambda^2/BKT value",
              gas.phaseSpaceDensity(temperature) / gas.criticalPhaseSpaceDensity(),
              1.3,
              1,
              "superfluid above ln(380/g~) (Prokof'ev, Ruebenacker, Svistunov, Phys. Rev. Lett. 87,"
                  + " 270402 (2001)); margin of 1.3 for the finite size"
                  + RULE));
    }
    return List.copyOf(verdicts);
  }

  /**
   * Judges the Thomas-Fermi approximation in a harmonic trap.
   *
   * @param chemicalPotential mu, greater than zero
   * @param trap trap frequency, greater than zero
   * @return verdict on mu/(hbar w)
   * @throws IllegalArgumentException if a value is not positive
   */
  public static Verdict thomasFermi(Energy chemicalPotential, Frequency trap) {
    double quantum = Check.notNull(trap, "trap").quantum().positiveJoules("hbar w");
    return Verdict.atLeast(
        "mu/(hbar w) of the trap",
        Check.notNull(chemicalPotential, "chemicalPotential").positiveJoules("mu") / quantum,
        10,
        1,
        "the kinetic energy is neglected" + RULE);
  }

  /**
   * Judges whether one mode is classical.
   *
   * @param name name of the mode for the verdict
   * @param energy energy of the mode, greater than zero
   * @param temperature temperature, greater than zero
   * @return verdict on {@link #wignerExcess}
   * @throws IllegalArgumentException if a value is not positive
   */
  public static Verdict classicalMode(String name, Energy energy, Temperature temperature) {
    return Verdict.atMost(
        "quantum excess of " + Check.notNull(name, "name"),
        wignerExcess(energy, temperature),
        0.03,
        0.2,
        "relative excess of the quantum over the classical fluctuation of the mode, about"
            + " (E/kB T)^2/12"
            + RULE);
  }

  /**
   * The relative excess of the symmetrically ordered quantum occupation of a mode over the
   * classical kB T/E: (E/(2 kB T)) coth(E/(2 kB T)) - 1.
   *
   * @param energy energy of the mode, greater than zero
   * @param temperature temperature, greater than zero
   * @return the excess
   * @throws IllegalArgumentException if a value is not positive
   */
  public static double wignerExcess(Energy energy, Temperature temperature) {
    double x =
        Check.notNull(energy, "energy").positiveJoules("mode energy")
            / (2 * Check.notNull(temperature, "temperature").positiveJoules());
    double square = x * x;
    return x < 0.02 ? square / 3 * (1 - square / 15 * (1 - 2 * square / 21)) : x / Math.tanh(x) - 1;
  }

  private static double quantum(Confinement confinement, UniformGas gas, int dimension) {
    Density.requireDimension(
        Check.notNull(confinement, "confinement").dimension(), dimension, "confinement");
    Density.requireDimension(Check.notNull(gas, "gas").coupling().dimension(), dimension, "gas");
    return confinement.frequency().quantum().joules();
  }
}
