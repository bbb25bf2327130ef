package spgpe.examples.validation;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.spectrum.ModeOccupation;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.TimeSeries;
import spgpe.run.Trajectory;
import spgpe.theory.InstabilityBand;
import spgpe.theory.ModulatedCoupling;

/**
 * Parametric growth in the false vacuum under a modulated coupling against the Floquet exponent.
 *
 * <p>g = n = 1, J(t) = 0.05 + delta omega cos(omega t) with delta = 0.05, omega = 10, T = 0, on a
 * ring so long that mode {@value #MODE} is the fastest growing one. Start: the false vacuum with a
 * relative phase of {@value #SEED} cos(k x). In the false vacuum the condensate fills the
 * out-of-phase field, so that relative fluctuations are the occupations of the in-phase field; they
 * are looked at once a period.
 */
public final class ModulatedGrowth {
  private static final int MODE = 8;
  private static final int CUTOFF = 12;
  private static final double SEED = 1e-6;
  private static final int STEPS_PER_PERIOD = 64;

  /** By then the other Floquet mode has fallen behind by exp(-0.2 t), about 1e-3. */
  private static final double FIT_START = 35;

  private static final double FIT_END = 100;

  static final ModulatedCoupling THEORY = new ModulatedCoupling(1, 1, 0.05, 0.05, 10);

  private ModulatedGrowth() {}

  /**
   * Occupation of the seeded mode once a period.
   *
   * @param damping gamma
   * @param times times
   * @param occupations occupations of k and -k together
   */
  record Curve(double damping, double[] times, double[] occupations) {
    /** Half the slope of the logarithm, by least squares over the linear stage. */
    double growth() {
      double n = 0;
      double t = 0;
      double y = 0;
      double tt = 0;
      double ty = 0;
      for (int i = 0; i < times.length; i++) {
        if (times[i] >= FIT_START && times[i] <= FIT_END) {
          double log = Math.log(occupations[i]);
          n++;
          t += times[i];
          y += log;
          tt += times[i] * times[i];
          ty += times[i] * log;
        }
      }
      return 0.5 * (n * ty - t * y) / (n * tt - t * t);
    }
  }

  /** Wave number of the fastest growth without damping. */
  static double waveNumber() {
    return THEORY.firstBand(0).map(InstabilityBand::fastestWaveNumber).orElseThrow();
  }

  static Curve run(double damping, double until) {
    double k = waveNumber();
    Model model =
        Model.of(
            Projector.modesUpTo(CUTOFF)
                .on(PeriodicGrid.of(Axis.holdingModes(CUTOFF, 2 * Math.PI * MODE / k))),
            Hamiltonian.pair(THEORY.g(), 0)
                .with(CoherentCoupling.constant(THEORY.meanCoupling()))
                .with(
                    spgpe.hamiltonian.ModulatedCoupling.of(
                        THEORY.depth() * THEORY.frequency(), THEORY.frequency())),
            Reservoir.of(0, THEORY.g() * THEORY.density() + THEORY.meanCoupling(), damping));
    double root = Math.sqrt(THEORY.density());
    InitialState seeded =
        InitialState.fromField(
            (component, x, y, psi) -> {
              double sign = component == 0 ? 1 : -1;
              double angle = sign * 0.5 * SEED * Math.cos(k * x);
              psi[0] = sign * root * Math.cos(angle);
              psi[1] = sign * root * Math.sin(angle);
            });
    double step = 2 * Math.PI / THEORY.frequency() / STEPS_PER_PERIOD;
    double period = step * STEPS_PER_PERIOD;
    Recording<TimeSeries> recording =
        Recording.of(ModeOccupation.inPhase(), Schedule.every(period), TimeSeries::new);
    Trajectory.Result result =
        Trajectory.of(model).startingFrom(seeded).integratedBy(OuRk4.ofStep(step)).seed(1, 0)
            .until(period * Math.ceil(until / period)).record(recording).run();
    TimeSeries.Series series = result.get(recording).series().get(0);
    int plus = model.region().indexOf(MODE);
    int minus = model.region().indexOf(-MODE);
    double[] occupations = new double[series.times().length];
    for (int i = 0; i < occupations.length; i++) {
      occupations[i] = series.values()[i][plus] + series.values()[i][minus];
    }
    return new Curve(damping, series.times(), occupations);
  }

  static double predicted(double damping) {
    return THEORY.floquet(waveNumber(), damping).growth();
  }

  /** Dampings below and above the threshold of stability. */
  static double[] dampings() {
    double threshold = THEORY.dampingForStability();
    return new double[] {0, 0.5 * threshold, threshold, 1.5 * threshold};
  }

  /**
   * Prints the comparison and draws it.
   *
   * @param arguments PNG file of the figure
   */
  public static void main(String[] arguments) {
    if (arguments.length == 0) {
      throw new IllegalArgumentException("arguments: figure.png");
    }
    System.out.printf(
        Locale.ROOT, "fastest mode k=%.6f, threshold of stability gamma=%.6f%n", waveNumber(),
        THEORY.dampingForStability());
    List<Curve> curves = new ArrayList<>();
    for (double damping : dampings()) {
      Curve curve = run(damping, 160);
      curves.add(curve);
      double difference = curve.growth() - predicted(damping);
      System.out.printf(
          Locale.ROOT,
          "gamma=%.6f: growth %+.6f, Floquet %+.6f, difference %+.2e = %+.2f %% of the undamped"
              + " rate%n",
          damping, curve.growth(), predicted(damping), difference,
          100 * difference / predicted(0));
    }
    GrowthFigure.write(Path.of(arguments[0]), curves);
  }
}
