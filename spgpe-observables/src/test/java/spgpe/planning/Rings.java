package spgpe.planning;

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
import spgpe.units.TimeSpan;

/** Invented laboratory rings that have wanted scaled numbers. */
final class Rings {
  static final double ATOMS = 2000;
  private static final double HBAR = 1.054571817e-34;
  private static final Frequency TRANSVERSE = Frequency.ofKilohertz(1.5);
  private static final Length SCATTERING = Length.ofBohrRadii(65);

  private Rings() {}

  /** Ring of scaled length L, J in g n, lambda^2 and scaled T. */
  static RingExperiment scaled(
      double length, double coherent, double lambdaSquared, double temperature) {
    // L/x0 = sqrt(m g1 N L)/hbar gives the circumference
    double g = Confinement.quasi1d(Species.K_41, TRANSVERSE).coupling(SCATTERING).jouleMetreToD();
    double circumference =
        length * length * HBAR * HBAR / (Species.K_41.massKilograms() * g * ATOMS);
    RingExperiment bare =
        RingExperiment.of(
            Species.K_41,
            Geometry.ring(Length.ofMetres(circumference / (2 * Math.PI))),
            TRANSVERSE,
            ATOMS,
            SCATTERING,
            Temperature.ofNanokelvin(30));
    Density density = Density.perMetre(ATOMS / circumference);
    Energy j = bare.scaled().units().energy(coherent);
    RingExperiment coupled =
        coherent > 0
            ? bare.withCoherentCoupling(j)
                .withBiquadratic(CoupledPair.biquadraticFor(lambdaSquared, j, density))
            : bare;
    return coupled.withTemperature(bare.scaled().units().temperature(temperature));
  }

  /** J = 0.1, kappa = 0.225, mu = 1.1, L = 48 at E_b/T = 10. */
  static RingExperiment reference() {
    return scaled(48, 0.1, 2.25, 0.05157356);
  }

  static ShotPlan referencePlan() {
    return ShotPlan.of(reference(), 0.1, TimeSpan.ofMilliseconds(500)).withCutoffModes(24);
  }
}
