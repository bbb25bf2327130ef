package spgpe.examples.validation;

import java.nio.file.Path;
import java.util.ArrayList;
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
import spgpe.observables.FirstPassage;
import spgpe.observables.phase.RelativePhase;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Schedule;
import spgpe.run.TrajectoryEnd;
import spgpe.statistics.ArrheniusFit;
import spgpe.statistics.Censoring;
import spgpe.statistics.CoxOakesTest;
import spgpe.statistics.Estimate;
import spgpe.statistics.Interval;
import spgpe.statistics.RateEstimate;
import spgpe.statistics.SurvivalData;
import spgpe.theory.ComparisonTable;
import spgpe.theory.CoupledPair;
import spgpe.theory.CriticalBubble;
import spgpe.theory.DecayRate;
import spgpe.theory.RingModes;

/**
 * Decay rates at four temperatures against the one-loop rate over the critical bubble.
 *
 * <p>Set of {@link ReferenceDecay} (g = 1, J = 0.1, kappa = 0.225, mu = 1.1, ring of length 48, |n|
 * &le; 24, gamma = 0.1) with the temperature chosen by E_b/T. Cold start, first passage of the mean
 * cosine through -0.4 looked at every 0.5, times before 100 left out, step 0.1.
 */
public final class RateComparison {
  static final double DAMPING = 0.1;
  static final double LEVEL = 0.95;
  private static final double TRUNCATION = 100;
  private static final long SEED = 20261201;

  /** Ends are about 1.5 expected lifetimes, so that few trajectories are censored. */
  private static final List<Setting> SETTINGS =
      List.of(
          new Setting(9, 1200, 1500), new Setting(10, 1200, 3000), new Setting(12, 600, 6000),
          new Setting(14, 300, 30_000));

  private RateComparison() {}

  /**
   * A temperature and the size of its ensemble.
   *
   * @param barrier E_b/T
   * @param trajectories how many
   * @param end time at which those alive are censored
   */
  record Setting(double barrier, long trajectories, double end) {}

  /**
   * What was measured at a temperature, beside theory.
   *
   * @param theory one-loop rate
   * @param temperature temperature
   * @param passages first passages after the truncation
   */
  record Row(DecayRate theory, double temperature, SurvivalData passages) {
    RateEstimate rate() {
      return RateEstimate.of(passages);
    }

    Interval interval() {
      return rate().interval(LEVEL, Censoring.TIME_CENSORED_CONSERVATIVE);
    }
  }

  static CriticalBubble bubble() {
    // the bubble does not depend on the temperature
    return CriticalBubble.of(new CoupledPair(1, 1.1, 0.1, 0.225, 0.05), new RingModes(48, 24));
  }

  static Row measure(CriticalBubble bubble, Setting setting, long seed, Executor executor) {
    double temperature = bubble.energy() / setting.barrier();
    CoupledPair pair = bubble.pair();
    Model model =
        Model.of(
            Projector.modesUpTo(bubble.ring().cutoffMode())
                .on(PeriodicGrid.of(Axis.of(128, bubble.ring().length()))),
            Hamiltonian.pair(pair.g(), 0)
                .with(CoherentCoupling.constant(pair.coherentCoupling()))
                .with(BiquadraticCoupling.of(pair.biquadraticCoupling())),
            Reservoir.of(temperature, pair.mu(), DAMPING));
    EnsembleResult result =
        Ensemble.of(model)
            .startingFrom(InitialState.uniform(1, -1))
            .integratedBy(OuRk4.ofStep(0.1))
            .trajectories(setting.trajectories())
            .lanes(8)
            .seed(seed)
            .until(setting.end())
            .stopWhen(FirstPassage.upward(RelativePhase.meanCosine(), -0.4, Schedule.every(0.5)))
            .runOn(executor);
    List<TrajectoryEnd> ends = result.ends();
    double[] times = ends.stream().mapToDouble(TrajectoryEnd::time).toArray();
    boolean[] passed = new boolean[times.length];
    for (int i = 0; i < passed.length; i++) {
      passed[i] = ends.get(i).isStopped();
    }
    return new Row(
        DecayRate.of(bubble, temperature, DAMPING), temperature,
        SurvivalData.of(times, passed).truncatedBefore(TRUNCATION));
  }

  /** Change of ln(simulation/theory) for each unit of E_b/T, from the event counts. */
  static Estimate riseOfRatio(List<Row> rows, double barrierEnergy) {
    List<ArrheniusFit.CountedRate> ratios = new ArrayList<>();
    for (Row row : rows) {
      RateEstimate rate = row.rate();
      // exposure in expected events, so that the fitted "rate" is the ratio
      ratios.add(
          new ArrheniusFit.CountedRate(
              row.temperature(),
              new RateEstimate(rate.events(), rate.exposure() * row.theory().total())));
    }
    Estimate slope = ArrheniusFit.ofCounts(ratios).barrier();
    return new Estimate(-slope.value() / barrierEnergy, slope.standardError() / barrierEnergy);
  }

  static ComparisonTable table(List<Row> rows) {
    ComparisonTable table = ComparisonTable.empty();
    for (Row row : rows) {
      RateEstimate rate = row.rate();
      table =
          table.with(
              String.format(Locale.ROOT, "rate at E_b/T = %.0f", row.theory()
                  .barrierOverTemperature()),
              rate.rate(), rate.standardError(), row.theory().prediction());
    }
    return table;
  }

  /**
   * Prints the comparison and draws it.
   *
   * @param arguments PNG file of the figure (required), threads (default 2), factor on the numbers
   *     of trajectories (default 1)
   */
  public static void main(String[] arguments) {
    if (arguments.length == 0) {
      throw new IllegalArgumentException("arguments: figure.png [threads] [factor]");
    }
    int threads = arguments.length > 1 ? Integer.parseInt(arguments[1]) : 2;
    double factor = arguments.length > 2 ? Double.parseDouble(arguments[2]) : 1;
    CriticalBubble bubble = bubble();
    List<Row> rows = new ArrayList<>();
    ExecutorService executor = Executors.newFixedThreadPool(threads);
    try {
      for (int i = 0; i < SETTINGS.size(); i++) {
        Setting s = SETTINGS.get(i);
        Setting scaled =
            new Setting(s.barrier(), Math.max(2, Math.round(factor * s.trajectories())), s.end());
        Row row = measure(bubble, scaled, SEED + i, executor);
        rows.add(row);
        print(scaled, SEED + i, row);
      }
    } finally {
      executor.shutdownNow();
    }
    System.out.print(table(rows));
    System.out.println(
        "d ln(simulation/theory) / d(E_b/T) = " + riseOfRatio(rows, bubble.energy()));
    RateFigure.write(Path.of(arguments[0]), bubble, rows);
  }

  private static void print(Setting setting, long seed, Row row) {
    RateEstimate rate = row.rate();
    Interval interval = row.interval();
    double theory = row.theory().total();
    System.out.printf(
        Locale.ROOT,
        "E_b/T=%.0f T=%.8f: %d trajectories to %.0f, seed %d: %d events, exposure %.0f, rate %.4e"
            + " [%.4e, %.4e], theory %.4e, ratio %.3f [%.3f, %.3f], exponentiality chi2 %.2f%n",
        setting.barrier(), row.temperature(), setting.trajectories(), setting.end(), seed,
        rate.events(), rate.exposure(), rate.rate(), interval.lower(), interval.upper(), theory,
        rate.rate() / theory, interval.lower() / theory, interval.upper() / theory,
        CoxOakesTest.of(row.passages()).chiSquare());
  }
}
