package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.physics.ThermalRuns.Estimate;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Observable;
import spgpe.run.TimeSeries;

/** Mean and fluctuation of the atom number of one interacting component, end to end. */
class AtomNumberTest {
  private static final Observable ATOMS =
      Observable.scalar("atom number", s -> s.amplitudes().atomNumber(0, 0));

  private static Model model(double length, int cutoff, double mu, double gamma) {
    return Model.of(
        Projector.modesUpTo(cutoff)
            .on(PeriodicGrid.of(Axis.holdingModes(cutoff, length))),
        Hamiltonian.single(1),
        Reservoir.of(0.1, mu, gamma));
  }

  /**
   * Density at T = 0.1, mu = g = 1 on a ring of length 32 with modes |n| &lt;= 31: 0.946820 from
   * the transfer operator of the uncut field plus 0.01092 for the cutoff, derived in
   * docs/validation.md: 0.9577. Tolerance 0.002 for the leading-order cutoff correction; standard
   * error about 0.0004, so no false alarm to speak of (4.5 sigma below the tolerance). A
   * temperature off by 10 % moves it by 0.006.
   */
  @Test
  void densityAgreesWithTheTransferOperator() {
    Estimate n =
        ThermalRuns.run(
            model(32, 31, 1, 2), OuRk4.ofStep(0.05), ThermalRuns.equilibrium(0.97), ATOMS, 41, 64,
            5, 0.5, 155)[0];
    assertTrue(n.error() / 32 < 0.0006, "error=" + n.error() / 32);
    assertEquals(0.9577, n.mean() / 32, 0.002);
  }

  /**
   * var N = T d&lt;N&gt;/dmu (a property of exp(-K/T)); the slope from runs at mu = 0.8 and 1.2.
   * Some 3000 samples 2.5 apart, correlation time 1: relative error of the variance 3 %, limit 12 %
   * (4 sigma, false alarm 6e-5). Noise of twice the strength in one part only would break it.
   */
  @Test
  void fluctuationOfTheAtomNumber() {
    double slope = 0;
    double variance = 0;
    double samples = 0;
    for (double mu : new double[] {0.8, 1, 1.2}) {
      List<TimeSeries.Series> all =
          ThermalRuns.series(
              model(16, 15, mu, 0.5), OuRk4.ofStep(0.05), ThermalRuns.equilibrium(Math.sqrt(mu)),
              ATOMS, 42, 24, 5, 2.5, mu == 1 ? 330 : 105);
      double sum = 0;
      double squares = 0;
      double count = 0;
      for (TimeSeries.Series one : all) {
        for (double[] value : one.values()) {
          sum += value[0];
          squares += value[0] * value[0];
          count++;
        }
      }
      double mean = sum / count;
      if (mu == 1) {
        variance = squares / count - mean * mean;
        samples = count;
      } else {
        slope += (mu > 1 ? mean : -mean) / 0.4;
      }
    }
    assertTrue(samples > 3000);
    assertEquals(1, variance / (0.1 * slope), 0.12);
  }
}
