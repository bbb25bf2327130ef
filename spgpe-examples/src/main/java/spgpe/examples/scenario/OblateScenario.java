package spgpe.examples.scenario;

import java.util.List;
import java.util.Locale;
import spgpe.units.Confinement;
import spgpe.units.Coupling;
import spgpe.units.CoupledPair;
import spgpe.units.Density;
import spgpe.units.Energy;
import spgpe.units.Frequency;
import spgpe.units.Length;
import spgpe.units.ScaledUnits;
import spgpe.units.Species;
import spgpe.units.Temperature;
import spgpe.units.UniformGas;
import spgpe.units.Validity;
import spgpe.units.Verdict;

/**
 * An invented experiment: two hyperfine states of K-41 in a square box, squeezed by an optical trap
 * to two dimensions, coherently coupled, with relative phase pi made metastable by a biquadratic
 * coupling.
 *
 * @param side side of the box
 * @param atoms atoms in each component
 * @param axial trap frequency of the tight direction
 * @param coherent coherent coupling J
 * @param lambdaSquared kappa n/J, n being the density of one component
 */
public record OblateScenario(
    Length side, double atoms, Frequency axial, Energy coherent, double lambdaSquared) {
  private static final Species SPECIES = Species.K_41;

  /** 65.42 Bohr radii: from memory, and only an input of this invented experiment. */
  private static final Length SCATTERING_LENGTH = Length.ofBohrRadii(65.42);

  /**
   * The values the command starts from.
   *
   * @return the experiment
   */
  public static OblateScenario invented() {
    return new OblateScenario(
        Length.ofMicrometres(37), 23000, Frequency.ofKilohertz(4), Energy.ofHertz(29), 2.25);
  }

  /**
   * One component at the density of the metastable state.
   *
   * @return the gas
   */
  public UniformGas gas() {
    Density density =
        Density.perSquareMicrometre(atoms / (side.micrometres() * side.micrometres()));
    return UniformGas.of(SPECIES, confinement().coupling(SCATTERING_LENGTH), density);
  }

  private Confinement confinement() {
    return Confinement.quasi2d(SPECIES, axial);
  }

  /**
   * Units that divide the field by the square root of the metastable density, energies in g n.
   *
   * @return the units
   */
  public ScaledUnits units() {
    return ScaledUnits.dividingByDensity(SPECIES, gas().chemicalPotential(), gas().density());
  }

  /**
   * The pair and its metastability.
   *
   * @return the pair
   */
  public CoupledPair pair() {
    return CoupledPair.of(
        SPECIES, gas().coupling(), new Coupling(0, 2), gas().density(), coherent,
        CoupledPair.biquadraticFor(lambdaSquared, coherent, gas().density()));
  }

  /**
   * The same pair in scaled units, for the theory and the model.
   *
   * @param temperature temperature
   * @return scaled parameters; density 1 and g 1
   */
  public spgpe.theory.CoupledPair scaled(Temperature temperature) {
    return spgpe.theory.CoupledPair.fromFalseVacuum(
        1, 1, units().toScaled(coherent), Math.sqrt(lambdaSquared),
        units().toScaled(temperature));
  }

  /**
   * Judges the reduction to two dimensions.
   *
   * @param temperature temperature
   * @return verdicts
   */
  public List<Verdict> verdicts(Temperature temperature) {
    return Validity.quasi2d(confinement(), gas(), SCATTERING_LENGTH, temperature);
  }

  /**
   * The experiment in a few lines.
   *
   * @return indented lines
   */
  public String describe() {
    return String.format(
        Locale.ROOT,
        "  %s, two hyperfine states, %.0f atoms each, box of side %.1f um%n"
            + "  axial trap %.0f Hz (oscillator length %.3f um), scattering length %.2f a0, m g ="
            + " %.4f%n"
            + "  g n/h = %.1f Hz, length unit %.3f um, time unit %.3f ms%n"
            + "  coherent coupling J/h = %.4g Hz, biquadratic coupling with lambda^2 = kappa n/J ="
            + " %.3g%n",
        SPECIES.name(), atoms, side.micrometres(), axial.hertz(),
        confinement().oscillatorLength().micrometres(), SCATTERING_LENGTH.bohrRadii(),
        gas().dimensionlessCoupling(), gas().chemicalPotential().hertz(),
        units().lengthUnit().micrometres(), units().time(1).milliseconds(), coherent.hertz(),
        lambdaSquared);
  }
}
