package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Basis: derived, see docs/theory.md; resonances also found numerically from the Floquet matrix.
 */
class ModulationTest {
  private static final Species ATOM = Species.K_41;
  private static final Density N = Density.perMicrometre(80);
  private static final ScaledUnits UNITS =
      ScaledUnits.dividingByDensity(ATOM, Energy.ofHertz(800), N);
  private static final Coupling G = UNITS.coupling(1);
  private static final Coupling NONE = UNITS.coupling(0);

  @Test
  void averagedCouplings() {
    double depth = Math.sqrt(0.05625);
    Modulation drive = new Modulation(depth, UNITS.frequency(40));
    double kappa = UNITS.toScaled(drive.biquadratic(G, NONE));
    assertEquals(0.10632787, kappa, 6e-9);
    assertEquals(0.1125, UNITS.toScaled(drive.biquadraticAtSmallDepth(G, NONE)), 1e-14);
    assertEquals(1 - kappa / 2, UNITS.toScaled(drive.averagedIntra(G, NONE)), 1e-14);
    assertEquals(kappa / 2, UNITS.toScaled(drive.averagedInter(G, NONE)), 1e-14);
    assertEquals(depth * 40, UNITS.toScaled(drive.amplitude()), 1e-12);
    // slow frequency of the uniform relative phase at J = 0.05, 0.43599200
    CoupledPair pair =
        CoupledPair.of(
            ATOM,
            drive.averagedIntra(G, NONE),
            drive.averagedInter(G, NONE),
            N,
            UNITS.energy(0.05),
            drive.biquadratic(G, NONE));
    assertEquals(2.126557, pair.lambdaSquared(), 1e-6);
    assertEquals(0.43599200, UNITS.toScaled(pair.relativePhaseGap().orElseThrow()), 1e-7);
    // the mean field of the uniform state does not notice the averaging
    assertEquals(1.05, UNITS.toScaled(pair.chemicalPotential()), 1e-13);
  }

  @ParameterizedTest
  @CsvSource({
    "0.02, 10, 4.19902, 0.039968",
    "0.05, 10, 4.19902, 0.099501",
    "0.1, 40, 19.12498, 0.196027",
    "0.2372, 40, 19.12498, 0.422982"
  })
  void firstUnstableBand(double depth, double omega, double energy, double growth) {
    Modulation drive = new Modulation(depth, UNITS.frequency(omega));
    Energy stiffness = UNITS.energy(1);
    assertEquals(
        energy, UNITS.toScaled(drive.resonanceEnergy(stiffness, UNITS.energy(0.05))), 6e-6);
    assertEquals(growth, UNITS.toScaled(drive.resonanceGrowth(stiffness)), 6e-7);
  }

  @Property(tries = 200)
  void depthAndCouplingInvertEachOther(
      @ForAll @DoubleRange(min = 0, max = 0.95) double depth,
      @ForAll @DoubleRange(min = -0.5, max = 0.9) double inter) {
    Coupling other = UNITS.coupling(inter);
    Frequency frequency = Frequency.ofKilohertz(10);
    Coupling kappa = new Modulation(depth, frequency).biquadratic(G, other);
    Modulation back = Modulation.forBiquadratic(kappa, G, other, frequency);
    assertEquals(depth, back.depth(), 1e-12);
  }

  @Property(tries = 100)
  void smallDepthLimitIsApproachedQuadratically(
      @ForAll @DoubleRange(min = 0.01, max = 0.1) double depth) {
    Modulation drive = new Modulation(depth, Frequency.ofKilohertz(10));
    double ratio =
        drive.biquadratic(G, NONE).jouleMetreToD()
            / drive.biquadraticAtSmallDepth(G, NONE).jouleMetreToD();
    // 1 - J0(x) = x^2/4 (1 - x^2/16 + x^4/576 - ...), x = 4 delta
    double square = depth * depth;
    assertEquals(1 - square + 4 * square * square / 9, ratio, 0.12 * square * square * square);
  }

  @Test
  void refusesWhatModulationCannotReach() {
    Frequency frequency = Frequency.ofKilohertz(10);
    IllegalArgumentException error =
        assertThrows(
            IllegalArgumentException.class,
            () -> Modulation.forBiquadratic(UNITS.coupling(0.72), G, NONE, frequency));
    assertTrue(error.getMessage().contains("kappa/(g - g12)=0.7"), error.getMessage());
    assertThrows(
        IllegalArgumentException.class,
        () -> Modulation.forBiquadratic(UNITS.coupling(0.1), G, G, frequency));
    assertThrows(IllegalArgumentException.class, () -> new Modulation(-0.1, frequency));
    assertThrows(IllegalArgumentException.class, () -> new Modulation(0.1, Frequency.ofHertz(0)));
    assertThrows(
        IllegalArgumentException.class,
        () -> new Modulation(0.1, frequency).biquadratic(G, new Coupling(0, 2)));
  }
}
