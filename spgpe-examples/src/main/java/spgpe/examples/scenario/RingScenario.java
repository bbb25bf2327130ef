package spgpe.examples.scenario;

import java.util.Locale;
import spgpe.units.Confinement;
import spgpe.units.CoupledPair;
import spgpe.units.Density;
import spgpe.units.Energy;
import spgpe.units.Frequency;
import spgpe.units.Geometry;
import spgpe.units.Length;
import spgpe.units.RingExperiment;
import spgpe.units.Species;
import spgpe.units.Temperature;

/**
 * An invented experiment: two hyperfine states of K-41 in a ring waveguide, coherently coupled, with
 * relative phase pi made metastable by a biquadratic coupling.
 *
 * @param radius radius of the ring
 * @param atoms atoms in each component
 * @param coherent coherent coupling J; zero leaves the components uncoupled
 * @param lambdaSquared kappa n/J, n being the density of one component
 * @param inter scattering length between the components
 */
public record RingScenario(
    Length radius, double atoms, Energy coherent, double lambdaSquared, Length inter) {
  private static final Species SPECIES = Species.K_41;
  private static final Frequency TRANSVERSE = Frequency.ofKilohertz(1.5);

  /** 65.42 Bohr radii: from memory, and only an input of this invented experiment. */
  private static final Length SCATTERING_LENGTH = Length.ofBohrRadii(65.42);

  /**
   * The values the commands start from.
   *
   * @return the experiment
   */
  public static RingScenario invented() {
    return new RingScenario(
        Length.ofMicrometres(10), 2500, Energy.ofHertz(40), 2.2, Length.ofBohrRadii(0));
  }

  /**
   * The laboratory recipe at one temperature.
   *
   * @param temperature temperature
   * @return the recipe
   */
  public RingExperiment at(Temperature temperature) {
    Geometry.Ring ring = Geometry.ring(radius);
    RingExperiment uncoupled =
        RingExperiment.of(SPECIES, ring, TRANSVERSE, atoms, SCATTERING_LENGTH, temperature)
            .withInterComponent(inter);
    if (coherent.joules() == 0) {
      return uncoupled;
    }
    Density density = Density.perMetre(atoms / ring.circumference().metres());
    return uncoupled
        .withCoherentCoupling(coherent)
        .withBiquadratic(CoupledPair.biquadraticFor(lambdaSquared, coherent, density));
  }

  /**
   * The experiment in a few lines.
   *
   * @return indented lines
   */
  public String describe() {
    Confinement confinement = Confinement.quasi1d(SPECIES, TRANSVERSE);
    return String.format(
        Locale.ROOT,
        "  %s, two hyperfine states, %.0f atoms each, ring of circumference %.1f um%n"
            + "  transverse trap %.0f Hz (oscillator length %.3f um), scattering length %.2f a0%n"
            + "  coherent coupling J/h = %.4g Hz, biquadratic coupling with lambda^2 = kappa n/J ="
            + " %.3g%n",
        SPECIES.name(), atoms, Geometry.ring(radius).circumference().micrometres(),
        TRANSVERSE.hertz(), confinement.oscillatorLength().micrometres(),
        SCATTERING_LENGTH.bohrRadii(), coherent.hertz(), lambdaSquared)
        + (inter.metres() == 0
            ? ""
            : String.format(
                Locale.ROOT, "  scattering length between the components %.4g a0%n",
                inter.bohrRadii()));
  }
}
