package spgpe.integrate.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.LatticeComposition;
import spgpe.integrate.LatticeStrang;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.bench.StepAdvisor.Advice;
import spgpe.integrate.bench.StepAdvisor.Verdict;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.InitialState;

class StepAdvisorTest {
  private static Model model(double gamma) {
    return Model.of(
        Projector.modesUpTo(31).on(PeriodicGrid.of(Axis.of(128, 32))),
        Hamiltonian.pair(1, 0.2)
            .with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.2)),
        Reservoir.of(0.1, 1, gamma));
  }

  @Test
  void proposesAStepWithinTheTolerance() {
    for (double tolerance : new double[] {1e-2, 1e-3}) {
      Advice advice =
          StepAdvisor.of(model(1e-3)).withTolerance(tolerance).advise(OuRk4.ofStep(1));
      assertEquals(Verdict.FIT, advice.verdict());
      assertTrue(Math.abs(advice.bias()) <= tolerance);
      assertTrue(Math.abs(advice.bias()) > 0.9 * tolerance, advice.text());
      assertTrue(advice.warnings().isEmpty(), advice.text());
    }
  }

  /** gn = 1 instead of mu + J reproduces the tables: 0.9 % at dt = 0.1. */
  @Test
  void predictsTheBiasOfAStep() {
    Advice advice = StepAdvisor.of(model(1e-3)).withMeanField(1).examine(OuRk4.ofStep(0.1));
    assertEquals(0.00897, advice.bias(), 2e-5);
    assertEquals(Verdict.BIASED, advice.verdict());
    assertEquals(40, advice.evaluationsPerTime(), 1e-9);
  }

  /** [72 gamma tol/((gn)^2 eps_max^3)]^(1/5) = 0.041 at gamma = 0.01, tolerance 1e-3. */
  @Test
  void warnsOfTheCoolingOfRk4() {
    StepAdvisor advisor = StepAdvisor.of(model(0.01)).withMeanField(1);
    Advice advice = advisor.examine(Rk4Ip.ofStep(0.06));
    assertEquals(0.0409, advice.rk4CoolingLimit(), 2e-4);
    assertEquals(1, advice.warnings().size(), advice.text());
    assertTrue(advice.text().contains("OuRk4"));
    assertTrue(advisor.examine(OuRk4.ofStep(0.06)).warnings().isEmpty());
    // the exact bias reaches the tolerance near the limit of the rule
    assertEquals(-1e-3, advisor.examine(Rk4Ip.ofStep(0.0409)).bias(), 2e-4);
  }

  @Test
  void saysWhenAStepIsUnstable() {
    Advice advice = StepAdvisor.of(model(0.01)).examine(OuRk4.ofStep(0.2));
    assertEquals(Verdict.UNSTABLE, advice.verdict());
    assertTrue(Double.isInfinite(advice.bias()));
    assertTrue(advice.text().contains("pi"));
    assertEquals(
        Math.PI / (Math.pow(2 * Math.PI * 31 / 32, 2) / 2 + 2.2), advice.stabilityLimit(), 1e-9);
  }

  @Test
  void refusesWhatDoesNotFit() {
    assertThrows(IllegalArgumentException.class, () -> StepAdvisor.of(model(0)));
    StepAdvisor advisor = StepAdvisor.of(model(0.01));
    assertThrows(IllegalArgumentException.class, () -> advisor.advise(LatticeStrang.ofStep(1)));
    assertThrows(
        IllegalArgumentException.class, () -> advisor.advise(LatticeComposition.yoshida(1)));
    assertThrows(IllegalArgumentException.class, () -> advisor.withTolerance(Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> advisor.withMeanField(-1));
  }

  @Test
  void workAndDriftsAsTables() {
    WorkPrecision work =
        WorkPrecision.compare(
            EquilibriumBias.onRing(32, 31, 1, 1e-3), 1e-2, 0.14,
            List.of(OuRk4.ofStep(1), LatticeStrang.ofStep(1)));
    assertEquals(
        4, work.rows().get(0).evaluationsPerTime() / work.rows().get(1).evaluationsPerTime(), 0.1);
    assertEquals(2, work.table().lines().count());
    Model quiet = model(0);
    Amplitudes initial = new Amplitudes(quiet.region(), 2, 1);
    InitialState.fromField((c, x, y, psi) -> psi[0] = 1 + 0.1 * Math.cos(2 * Math.PI * x / 32 + c))
        .prepare(
            quiet, spgpe.reservoir.RandomStreams.counterBased(1).initialState(0), initial);
    ConservationStudy.Drift drift =
        ConservationStudy.measure(quiet, OuRk4.ofStep(0.05), initial, 200);
    assertEquals(0, drift.atoms(), 1e-8);
    assertEquals(0, drift.momentum(), 1e-8);
    assertTrue(drift.largestEnergyError() >= Math.abs(drift.energy()));
    assertTrue(drift.line().contains("dN/N"));
    assertThrows(
        IllegalArgumentException.class,
        () -> ConservationStudy.measure(model(0.1), OuRk4.ofStep(0.05), initial, 200));
  }
}
