package spgpe.examples.ring;

import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.model.Model;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.units.Confinement;
import spgpe.units.CoupledPair;
import spgpe.units.Coupling;
import spgpe.units.Density;
import spgpe.units.Energy;
import spgpe.units.Frequency;
import spgpe.units.Geometry;
import spgpe.units.Length;
import spgpe.units.RingExperiment;
import spgpe.units.ScaledRing;
import spgpe.units.Species;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;

/**
 * An invented experiment: two hyperfine states of K-41 in a ring waveguide, coherently coupled, with
 * relative phase pi made metastable by a biquadratic coupling.
 *
 * @param damping growth rate gamma used in the simulation (dimensionless)
 * @param runTime time the simulation covers
 */
record RingScenario(double damping, TimeSpan runTime) {
  private static final Species SPECIES = Species.K_41;
  private static final Geometry.Ring RING = Geometry.ring(Length.ofMicrometres(10));
  private static final Frequency TRANSVERSE = Frequency.ofKilohertz(1.5);
  private static final double ATOMS_PER_COMPONENT = 2500;

  /** 65.42 Bohr radii: from memory, and only an input of this invented experiment. */
  private static final Length SCATTERING_LENGTH = Length.ofBohrRadii(65.42);

  private static final Energy COHERENT_COUPLING = Energy.ofHertz(40);
  private static final double LAMBDA_SQUARED = 2.2;

  /** The experiment at one temperature, in scaled units. */
  ScaledRing at(Temperature temperature) {
    Density density =
        Density.perMetre(ATOMS_PER_COMPONENT / RING.circumference().metres());
    Coupling biquadratic =
        CoupledPair.biquadraticFor(LAMBDA_SQUARED, COHERENT_COUPLING, density);
    return RingExperiment.of(
            SPECIES, RING, TRANSVERSE, ATOMS_PER_COMPONENT, SCATTERING_LENGTH, temperature)
        .withCoherentCoupling(COHERENT_COUPLING)
        .withBiquadratic(biquadratic)
        .withRun(damping, runTime)
        .scaled();
  }

  /** The model at one temperature; every temperature keeps the same modes, so rates compare. */
  Model model(ScaledRing ring, int cutoffModes) {
    CoherentRegion region =
        Projector.modesUpTo(cutoffModes)
            .on(PeriodicGrid.of(Axis.holdingModes(cutoffModes, ring.length())));
    Hamiltonian hamiltonian =
        Hamiltonian.pair(ring.g(), ring.inter())
            .with(CoherentCoupling.constant(ring.coherent()))
            .with(BiquadraticCoupling.of(ring.biquadratic()));
    return Model.of(
        region, hamiltonian, Reservoir.of(ring.temperature(), ring.mu(), damping));
  }

  /** The experiment in a few lines. */
  static String describe() {
    Confinement confinement = Confinement.quasi1d(SPECIES, TRANSVERSE);
    return String.format(
        java.util.Locale.ROOT,
        "  %s, two hyperfine states, %.0f atoms each, ring of circumference %.1f um%n"
            + "  transverse trap %.0f Hz (oscillator length %.3f um), scattering length %.2f a0%n"
            + "  coherent coupling J/h = %.0f Hz, biquadratic coupling with lambda^2 = kappa n/J ="
            + " %.2f%n",
        SPECIES.name(), ATOMS_PER_COMPONENT, RING.circumference().micrometres(),
        TRANSVERSE.hertz(), confinement.oscillatorLength().micrometres(),
        SCATTERING_LENGTH.bohrRadii(), COHERENT_COUPLING.hertz(), LAMBDA_SQUARED);
  }
}
