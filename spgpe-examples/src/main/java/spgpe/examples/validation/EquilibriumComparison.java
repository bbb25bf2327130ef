package spgpe.examples.validation;

import java.util.List;
import java.util.Locale;
import java.util.concurrent.Executor;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.Estimates;
import spgpe.statistics.Estimate;
import spgpe.observables.TimeAverage;
import spgpe.observables.correlation.CorrelationFunction;
import spgpe.observables.correlation.CorrelationLength;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.observables.density.Density;
import spgpe.observables.density.PairMoment;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.theory.ComparisonTable;
import spgpe.theory.CoupledPair;
import spgpe.theory.PairAverages;
import spgpe.theory.PairEquilibrium;
import spgpe.theory.Prediction;
import spgpe.theory.RingModes;

/**
 * Equilibrium of two coupled components against the exact classical field theory with the
 * correction for the momentum cutoff.
 *
 * <p>gamma = 1, start in the uniform true vacuum, samples every 1 after time 100. The correlation
 * length of S_y, the relative phase, is that of an exponential fitted over a range of distances to
 * the measured curve and, with the same weights, to the exact one.
 */
public final class EquilibriumComparison {
  private static final double START = 100;
  private static final long SEED = 20261202;

  static final Setting A31 =
      new Setting("A", new CoupledPair(1, 1, 0.1, 0, 0.5), new RingModes(40, 31), 128, 0.5, 4);
  static final Setting A63 =
      new Setting("A", new CoupledPair(1, 1, 0.1, 0, 0.5), new RingModes(40, 63), 256, 0.5, 4);
  static final Setting B48 =
      new Setting("B", new CoupledPair(1, 1, 0.1, 0.15, 0.25), new RingModes(32, 48), 256, 0.5, 5);
  private static final List<Setting> SETTINGS = List.of(A31, A63, B48);

  private EquilibriumComparison() {}

  /**
   * A parameter set.
   *
   * @param name short name
   * @param pair parameters
   * @param ring ring and cutoff
   * @param points grid points, more than 4 n_max so that nothing aliases
   * @param fitFrom smallest distance of the fit of the correlation length
   * @param fitTo largest distance of the fit
   */
  record Setting(
      String name, CoupledPair pair, RingModes ring, int points, double fitFrom, double fitTo) {}

  /**
   * How long to measure.
   *
   * @param step time step
   * @param trajectories how many
   * @param end end of each
   * @param seed seed
   */
  record Effort(double step, long trajectories, double end, long seed) {}

  /**
   * What was measured.
   *
   * @param setting the parameter set
   * @param density of one component
   * @param coherence Re psi_1^* psi_2
   * @param sySquared S_y squared
   * @param sy correlation of S_y
   */
  record Outcome(
      Setting setting, Estimate density, Estimate coherence, Estimate sySquared,
      CorrelationFunction sy) {}

  static Outcome measure(Setting setting, Effort effort, Executor executor) {
    CoupledPair pair = setting.pair();
    RingModes ring = setting.ring();
    Model model =
        Model.of(
            Projector.modesUpTo(ring.cutoffMode())
                .on(PeriodicGrid.of(Axis.of(setting.points(), ring.length()))),
            Hamiltonian.pair(pair.g(), 0)
                .with(CoherentCoupling.constant(pair.coherentCoupling()))
                .with(BiquadraticCoupling.of(pair.biquadraticCoupling())),
            Reservoir.of(pair.temperature(), pair.mu(), 1));
    Recording<TimeAverage> moments =
        Recording.of(PairMoment.all(), Schedule.every(1), TimeAverage.from(START));
    SpatialCorrelation correlation = SpatialCorrelation.of(Density.spin(Density.SpinAxis.Y));
    Recording<TimeAverage> curve =
        Recording.of(correlation, Schedule.every(1), TimeAverage.from(START));
    double root = Math.sqrt(pair.trueVacuumDensity());
    EnsembleResult result =
        Ensemble.of(model)
            .startingFrom(InitialState.uniform(root, root))
            .integratedBy(OuRk4.ofStep(effort.step()))
            .trajectories(effort.trajectories())
            .seed(effort.seed())
            .until(effort.end())
            .lanes(8)
            .record(moments)
            .record(curve)
            .runOn(executor);
    TimeAverage average = result.get(moments);
    return new Outcome(
        setting,
        average.derived(
            m -> 0.5 * (m[PairMoment.DENSITY_1.ordinal()] + m[PairMoment.DENSITY_2.ordinal()])),
        average.estimate(PairMoment.COHERENCE.ordinal()),
        average.estimate(PairMoment.SPIN_Y_SQUARED.ordinal()),
        correlation.raw(result.get(curve), model));
  }

  /**
   * The table.
   *
   * @param outcome the simulation
   * @param withNeglected whether the predictions carry the size of the neglected order of the
   *     cutoff correction as an error
   */
  static ComparisonTable table(Outcome outcome, boolean withNeglected) {
    Setting setting = outcome.setting();
    PairAverages theory = PairEquilibrium.withCutoff(setting.pair(), setting.ring());
    double relative = withNeglected ? theory.truncationError() : 0;
    CorrelationLength measured = fit(outcome.sy(), setting);
    double exact = fit(exactCurve(outcome), setting).length().value();
    String end = ", " + setting.name() + " n_max=" + setting.ring().cutoffMode();
    return row(
        row(
            row(
                row(
                    ComparisonTable.empty(), "n" + end, outcome.density(), theory.density(),
                    relative),
                "J" + end, outcome.coherence(), theory.coherence(), relative),
            "<S_y^2>" + end, outcome.sySquared(), theory.sySquared(), relative),
        "xi(S_y)" + end, measured.length(), exact, relative);
  }

  private static ComparisonTable row(
      ComparisonTable table, String name, Estimate measured, double theory, double relative) {
    return table.with(
        name, measured.value(), measured.standardError(),
        Prediction.exact(theory, Math.abs(theory) * relative));
  }

  private static CorrelationLength fit(CorrelationFunction curve, Setting setting) {
    return CorrelationLength.exponential(curve, setting.fitFrom(), setting.fitTo());
  }

  /** Effective chemical potential: the kept modes feel the mean field of the missing ones. */
  static CoupledPair shifted(Setting setting) {
    CoupledPair pair = setting.pair();
    double missing = 2 * pair.temperature() / (Math.PI * setting.ring().effectiveCutoff());
    return pair.withMu(pair.mu() + (2 * pair.g() + 0.5 * pair.biquadraticCoupling()) * missing);
  }

  /**
   * The exact curve at the distances of the measured one and with its covariance: at the effective
   * chemical potential, less the part of the missing modes, 4 g(r) dn(r) with g the correlation of
   * the field and dn(r) that of the missing modes. At r = 0 this is the correction of S_y squared;
   * further out it rings with the cutoff.
   */
  static CorrelationFunction exactCurve(Outcome outcome) {
    Setting setting = outcome.setting();
    PairEquilibrium full = PairEquilibrium.of(shifted(setting));
    spgpe.theory.CorrelationFunction exact = full.syCorrelation();
    spgpe.theory.CorrelationFunction field = full.fieldCorrelation();
    CorrelationFunction measured = outcome.sy();
    int count = measured.size();
    double[] distances = new double[count];
    double[] values = new double[count];
    double[][] covariance = new double[count][count];
    for (int i = 0; i < count; i++) {
      distances[i] = measured.distance(i);
      values[i] =
          exact.at(distances[i]) - 4 * field.at(distances[i]) * missing(setting, distances[i]);
      for (int j = 0; j < count; j++) {
        covariance[i][j] = measured.estimates().covariance(i, j);
      }
    }
    return CorrelationFunction.of(
        distances, Estimates.of(values, covariance, measured.estimates().trajectories()),
        measured.period());
  }

  /** Correlation of the missing modes: sum of (2T/(k^2 L)) cos(k r) over |n| > n_max. */
  static double missing(Setting setting, double distance) {
    double length = setting.ring().length();
    double angle = 2 * Math.PI * distance / length;
    // Fourier series of a parabola, valid for angles from 0 to 2 pi
    double sum = Math.PI * Math.PI / 6 - Math.PI * angle / 2 + angle * angle / 4;
    for (int n = 1; n <= setting.ring().cutoffMode(); n++) {
      sum -= Math.cos(n * angle) / ((double) n * n);
    }
    return setting.pair().temperature() * length / (Math.PI * Math.PI) * sum;
  }

  /**
   * Prints the comparison.
   *
   * @param arguments step (default 0.025), trajectories (default 64), end (default 8100), threads
   *     (default 2), number of the set (default all: 0 and 1 are A, 2 is B)
   */
  public static void main(String[] arguments) {
    double step = arguments.length > 0 ? Double.parseDouble(arguments[0]) : 0.025;
    long trajectories = arguments.length > 1 ? Long.parseLong(arguments[1]) : 64;
    double end = arguments.length > 2 ? Double.parseDouble(arguments[2]) : 8100;
    int threads = arguments.length > 3 ? Integer.parseInt(arguments[3]) : 2;
    List<Setting> chosen =
        arguments.length > 4
            ? List.of(SETTINGS.get(Integer.parseInt(arguments[4])))
            : SETTINGS;
    ExecutorService executor = Executors.newFixedThreadPool(threads);
    try {
      for (Setting setting : chosen) {
        Effort effort =
            new Effort(step, trajectories, end, SEED + SETTINGS.indexOf(setting));
        Outcome outcome = measure(setting, effort, executor);
        System.out.printf(
            Locale.ROOT, "%s, %s%n%s%s, %s to %s%n", setting.pair(), setting.ring(), effort,
            ", samples from " + START, "fit from " + setting.fitFrom(), setting.fitTo());
        System.out.print(table(outcome, true));
        System.out.println("statistical errors alone:");
        System.out.print(table(outcome, false));
        System.out.printf(
            Locale.ROOT, "asymptotic length %.6f, fit of the exact curve %.6f%n%n",
            PairEquilibrium.of(shifted(setting)).syCorrelation().decayLength(),
            fit(exactCurve(outcome), setting).length().value());
      }
    } finally {
      executor.shutdownNow();
    }
  }
}
