package spgpe.observables.thermometry;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.internal.measure.CurvatureMeter;
import spgpe.model.ForceEvaluator;
import spgpe.model.Model;
import spgpe.observables.Estimates;
import spgpe.observables.Fields;
import spgpe.statistics.Estimate;
import spgpe.observables.Samples;
import spgpe.observables.TimeAverage;
import spgpe.observables.spectrum.ModeOccupation;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.Snapshot;

class ThermometerTest {
  private final Model small =
      Model.of(
          Projector.modesUpTo(2).on(PeriodicGrid.of(Axis.of(16, 6))),
          Hamiltonian.pair(1, 0.3)
              .with(CoherentCoupling.constant(0.1))
              .with(BiquadraticCoupling.of(0.225)),
          Reservoir.of(0.3, 0.9, 0.1).withChemicalPotentials(0.9, 0.7));

  private static double[] flat(Amplitudes a) {
    int modes = a.re(0).length;
    double[] x = new double[2 * modes * a.components()];
    for (int c = 0; c < a.components(); c++) {
      for (int m = 0; m < modes; m++) {
        x[2 * (c * modes + m)] = Math.sqrt(2) * a.re(c)[m];
        x[2 * (c * modes + m) + 1] = Math.sqrt(2) * a.im(c)[m];
      }
    }
    return x;
  }

  private static Amplitudes amplitudes(Model model, double[] x) {
    Amplitudes a = new Amplitudes(model.region(), model.components(), 1);
    int modes = model.region().modes();
    for (int c = 0; c < a.components(); c++) {
      for (int m = 0; m < modes; m++) {
        a.re(c)[m] = x[2 * (c * modes + m)] / Math.sqrt(2);
        a.im(c)[m] = x[2 * (c * modes + m) + 1] / Math.sqrt(2);
      }
    }
    return a;
  }

  /** Gradient of K, or of E, in (q, p). */
  private double[] gradient(double[] x, boolean energy) {
    Amplitudes a = amplitudes(small, x);
    Amplitudes f = new Amplitudes(small.region(), 2, 1);
    ForceEvaluator evaluator = small.evaluator(1);
    evaluator.force(0, a, f);
    double[] g = flat(f);
    for (int i = 0; energy && i < g.length; i++) {
      g[i] += (i < g.length / 2 ? 0.9 : 0.7) * x[i];
    }
    return g;
  }

  private static double dot(double[] u, double[] v) {
    double sum = 0;
    for (int i = 0; i < u.length; i++) {
      sum += u[i] * v[i];
    }
    return sum;
  }

  private double[] field(double[] x, int kind) {
    double[] a = gradient(x, kind > 0);
    double[] result = new double[x.length];
    if (kind == 0) {
      for (int i = 0; i < x.length; i++) {
        result[i] = a[i] / dot(a, a);
      }
      return result;
    }
    double[] from = kind == 1 ? a : x;
    double[] without = kind == 1 ? x : a;
    double c = dot(from, without) / dot(without, without);
    for (int i = 0; i < x.length; i++) {
      result[i] = from[i] - c * without[i];
    }
    double square = dot(result, result);
    for (int i = 0; i < x.length; i++) {
      result[i] /= square;
    }
    return result;
  }

  private double divergence(double[] x, int kind) {
    double h = 1e-4;
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      double[] y = x.clone();
      y[i] = x[i] + h;
      double above = field(y, kind)[i];
      y[i] = x[i] - h;
      sum += (above - field(y, kind)[i]) / (2 * h);
    }
    return sum;
  }

  @Test
  void divergencesAgreeWithDirectDifferentiation() {
    Random random = new Random(8);
    for (int t = 0; t < 5; t++) {
      double[] x = new double[20];
      for (int i = 0; i < x.length; i++) {
        x[i] = random.nextGaussian();
      }
      Snapshot s = Snapshot.of(small, amplitudes(small, x), 0);
      double free = Fields.measure(DynamicalTemperature.inverse(), s)[0];
      double[] fixed = Fields.measure(DynamicalTemperature.inverseAtFixedNumber(), s);
      assertEquals(divergence(x, 0), free, 1e-5 * (1 + Math.abs(free)));
      assertEquals(divergence(x, 1), fixed[0], 1e-5 * (1 + Math.abs(fixed[0])));
      assertEquals(-divergence(x, 2), fixed[1], 1e-5 * (1 + Math.abs(fixed[1])));
    }
  }

  @Test
  void hessianIsSymmetricAndItsTraceIsTheSumOfItsDiagonal() {
    Random random = new Random(9);
    double[] x = new double[20];
    for (int i = 0; i < x.length; i++) {
      x[i] = random.nextGaussian();
    }
    CurvatureMeter meter = CurvatureMeter.at(Snapshot.of(small, amplitudes(small, x), 0));
    double[][] h = new double[20][];
    double trace = 0;
    for (int i = 0; i < 20; i++) {
      double[] unit = new double[20];
      unit[i] = 1;
      Amplitudes result = meter.vector();
      meter.hessian(amplitudes(small, unit), result);
      h[i] = flat(result);
      trace += h[i][i];
    }
    assertEquals(trace, meter.trace(), 1e-9);
    for (int i = 0; i < 20; i++) {
      for (int j = 0; j < i; j++) {
        assertEquals(h[i][j], h[j][i], 1e-9);
      }
    }
  }

  /**
   * Every thermometer on an interacting pair in equilibrium with T = 0.05, mu = 1.1. Fixed seed; 4
   * standard errors, false alarm 6e-5 for each of 11 values; errors are at most 3 %, so a noise
   * strength wrong by 12 % or a chemical potential wrong by 4 % (fit) is always seen.
   */
  @Test
  void thermometersReadTheTemperatureOfTheReservoir() {
    Model model = Fields.pair(12, 24);
    Model damped = model.withReservoir(Reservoir.of(0.05, 1.1, 0.5));
    Equipartition bands = Equipartition.inBands(0, 0.1, 0.6, 1.2, 2, 4);
    Schedule every = Schedule.every(2).startingAt(20);
    Recording<TimeAverage> band = Recording.of(bands, every, TimeAverage::new);
    Recording<TimeAverage> free =
        Recording.of(DynamicalTemperature.inverse(), every, TimeAverage::new);
    Recording<TimeAverage> fixed =
        Recording.of(DynamicalTemperature.inverseAtFixedNumber(), every, TimeAverage::new);
    Recording<TimeAverage> ratio =
        Recording.of(DynamicalTemperature.gradientAndCurvature(), every, TimeAverage::new);
    Recording<TimeAverage> occupation =
        Recording.of(ModeOccupation.outOfPhase(), every, TimeAverage::new);
    EnsembleResult result =
        Ensemble.of(damped).startingFrom(InitialState.uniform(1, 1))
            .integratedBy(OuRk4.ofStep(0.05)).trajectories(24).seed(77).until(170)
            .record(band).record(free).record(fixed).record(ratio).record(occupation)
            .runOn(Runnable::run);
    Estimates t = bands.temperatures(result.get(band));
    for (int b = 1; b < 5; b++) {
      assertMeasures(0.05, t.get(b), 0.03);
    }
    EquipartitionFit fit = bands.fit(result.get(band));
    assertMeasures(0.05, fit.temperature(), 0.03);
    assertMeasures(1.1, fit.chemicalPotential(), 0.01);
    assertMeasures(0.05, DynamicalTemperature.temperature(result.get(free)), 0.03);
    assertMeasures(0.05, DynamicalTemperature.temperature(result.get(fixed)), 0.03);
    assertMeasures(1.1, DynamicalTemperature.chemicalPotential(result.get(fixed)), 0.05);
    assertMeasures(
        0.05, DynamicalTemperature.temperatureFromCurvature(result.get(ratio)), 0.03);
    OccupationTail tail = OccupationTail.fit(model, 0, result.get(occupation), 1.5, 4);
    // Bogoliubov: T/n = (e + a) - b^2/(e + a) with e + a +- b = e + 0.74 and e + 2.6 (phase and
    // density branch at n = 1.2): the bend makes the straight line too steep, between e = 1.1 and
    // 4.9 by 4.7 % (chord), and the temperature that much too low
    assertMeasures(0.05 / 1.047, tail.temperature(), 0.03);
  }

  private static void assertMeasures(double expected, Estimate found, double relative) {
    assertTrue(
        found.standardError() > 0 && found.standardError() < relative * expected,
        "error too large to say anything: " + found);
    assertEquals(expected, found.value(), 4 * found.standardError(), found::toString);
  }

  /** Ideal gas: the tail formula is exact, T = 0.7, offset 0.4. */
  @Test
  void tailOfAnIdealGas() {
    Model model =
        Model.of(Fields.ring(64, 30), Hamiltonian.ofMasses(2), Reservoir.of(0.7, -0.4, 0.1));
    List<TimeAverage> n =
        Samples.average(
            model, 4000, Samples.complexGaussian(model, k -> 0.7 / (k * k / 4 + 0.4), 21),
            ModeOccupation.ofComponent(0), DynamicalTemperature.inverse());
    OccupationTail tail = OccupationTail.fit(model, 0, n.get(0), 0, 6);
    assertMeasures(0.7, tail.temperature(), 0.01);
    assertMeasures(0.4, tail.offset(), 0.03);
    // 27 degrees of freedom: beyond 58 with probability 5e-4
    assertEquals(27, tail.degreesOfFreedom());
    assertTrue(tail.chiSquare() < 58, "chi2 " + tail.chiSquare());
    assertMeasures(0.7, DynamicalTemperature.temperature(n.get(1)), 0.01);
  }

  @Test
  void misuseIsNamed() {
    assertTrue(Fields.refusal(() -> Equipartition.inBands(0, 2, 1)).contains("edges[2]=1.0"));
    assertTrue(
        Fields.refusal(() -> Equipartition.inBands(0, 1, 1.01).size(small)).contains("band=1"));
    TimeAverage wrong = new TimeAverage(new double[] {0}, 4);
    assertTrue(
        Fields.refusal(() -> Equipartition.overall().temperatures(wrong))
            .contains("numbers of the average=4"));
    assertTrue(
        Fields.refusal(() -> OccupationTail.fit(small, 0, wrong, 0, 1)).contains("modes=5"));
    Snapshot still = Snapshot.of(small, new Amplitudes(small.region(), 2, 1), 0);
    String message =
        assertThrows(
                IllegalStateException.class,
                () -> Fields.measure(DynamicalTemperature.inverse(), still))
            .getMessage();
    assertTrue(message.contains("not stationary"), message);
  }
}
