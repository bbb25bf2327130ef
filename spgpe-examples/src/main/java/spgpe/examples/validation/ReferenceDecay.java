package spgpe.examples.validation;

import java.util.Arrays;
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
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.ProgressListener;
import spgpe.run.Schedule;
import spgpe.run.TrajectoryEnd;
import spgpe.statistics.Censoring;
import spgpe.statistics.CoxOakesTest;
import spgpe.statistics.Estimate;
import spgpe.statistics.Interval;
import spgpe.statistics.KaplanMeier;
import spgpe.statistics.RateEstimate;
import spgpe.statistics.SurvivalData;

/**
 * Decay rate and metastable averages of one parameter set against reference results.
 *
 * <p>Set: g = 1, J = 0.1, kappa = 0.225, mu = 1.1, ring of length 48, |n| &le; 24, gamma = 0.1, T =
 * 0.0515736 (a tenth of the energy of the critical bubble); cold start, first passage of the mean
 * cosine through -0.4 looked at every 0.5, times before 100 left out, end 3000, step 0.1.
 *
 * <p>The reference values come from a program of our own in another language, with another Fourier
 * transform and another random generator (12,000 trajectories); see docs/validation.md.
 */
public final class ReferenceDecay {
  /** Rate of the whole ring, per unit time. */
  static final Estimate REFERENCE_RATE = new Estimate(1.549e-3, 0.015e-3);

  /** Averages in the order of {@link MetastableAverages#NAMES}. */
  static final List<Estimate> REFERENCE_AVERAGES =
      List.of(
          new Estimate(0.97354, 4e-5), new Estimate(-0.95912, 2e-5), new Estimate(0.08380, 4e-5),
          new Estimate(0.05535, 4e-5), new Estimate(0.03009, 3e-5), new Estimate(0.00961, 3e-5),
          new Estimate(0.00296, 2e-5), new Estimate(0.27585, 11e-5), new Estimate(0.98243, 7e-5),
          new Estimate(0.07210, 2e-5), new Estimate(0.07611, 3e-5));

  static final double[] SURVIVAL_TIMES = {
    110, 125, 150, 200, 300, 400, 500, 700, 900, 1200, 1600, 2000, 2500, 3000
  };

  /** Part of the 11,055 trajectories alive at t = 100 that is alive at each time. */
  static final List<Estimate> REFERENCE_SURVIVAL =
      List.of(
          new Estimate(0.9849, 0.0012), new Estimate(0.9627, 0.0018),
          new Estimate(0.9269, 0.0025), new Estimate(0.8583, 0.0033),
          new Estimate(0.7345, 0.0042), new Estimate(0.6343, 0.0046),
          new Estimate(0.5455, 0.0047), new Estimate(0.3969, 0.0047),
          new Estimate(0.2896, 0.0043), new Estimate(0.1826, 0.0037),
          new Estimate(0.0967, 0.0028), new Estimate(0.0503, 0.0021),
          new Estimate(0.0238, 0.0015), new Estimate(0.0110, 0.0010));

  static final double TRUNCATION = 100;
  private static final double END = 3000;

  private ReferenceDecay() {}

  /**
   * What was measured.
   *
   * @param passages first passages, not truncated
   * @param averages metastable averages in the order of {@link MetastableAverages#NAMES}
   * @param snapshots number of snapshots in the averages
   */
  record Outcome(SurvivalData passages, List<Estimate> averages, long snapshots) {
    RateEstimate rate() {
      return RateEstimate.of(passages.truncatedBefore(TRUNCATION));
    }

    /** Trajectories alive at the truncation time. */
    int alive() {
      return passages.truncatedBefore(TRUNCATION).size();
    }

    /** Part of those alive at the truncation time that is alive later; binomial errors. */
    List<Estimate> survival() {
      KaplanMeier curve = KaplanMeier.of(passages.truncatedBefore(TRUNCATION));
      return Arrays.stream(SURVIVAL_TIMES)
          .mapToObj(t -> new Estimate(curve.survivalAt(t), binomialError(curve.survivalAt(t))))
          .toList();
    }

    /** Standard error of a surviving part, if that is its true value. */
    double binomialError(double survival) {
      return Math.sqrt(survival * (1 - survival) / alive());
    }
  }

  /** Runs trajectories 0 to count-1. */
  static Outcome measure(long count, long seed, Executor executor, ProgressListener listener) {
    // 100 points: the reference's correlations are taken at multiples of 0.48
    CoherentRegion region = Projector.modesUpTo(24).on(PeriodicGrid.of(Axis.of(100, 48)));
    Model model =
        Model.of(
            region,
            Hamiltonian.pair(1, 0).with(CoherentCoupling.constant(0.1))
                .with(BiquadraticCoupling.of(0.225)),
            Reservoir.of(0.05157356, 1.1, 0.1));
    MetastableAverages averages = new MetastableAverages();
    Ensemble plan =
        Ensemble.of(model)
            .startingFrom(InitialState.uniform(1, -1))
            .integratedBy(OuRk4.ofStep(0.1))
            .trajectories(count)
            .seed(seed)
            .until(END)
            .stopWhen(
                FirstPassage.upward(RelativePhase.meanCosine(), -0.4, Schedule.every(0.5)))
            .progress(listener);
    EnsembleResult result = averages.recordedBy(plan).runOn(executor);
    List<TrajectoryEnd> ends = result.ends();
    double[] times = ends.stream().mapToDouble(TrajectoryEnd::time).toArray();
    boolean[] passed = new boolean[times.length];
    for (int i = 0; i < passed.length; i++) {
      passed[i] = ends.get(i).isStopped();
    }
    return new Outcome(
        SurvivalData.of(times, passed), averages.of(result, model), averages.snapshots(result));
  }

  /** Distance of two estimates in combined standard errors. */
  static double sigmas(Estimate measured, Estimate reference) {
    return (measured.value() - reference.value())
        / Math.hypot(measured.standardError(), reference.standardError());
  }

  /**
   * Prints the comparison.
   *
   * @param arguments number of trajectories (default 1200), seed (default 11), threads (default 2)
   */
  public static void main(String[] arguments) {
    long count = arguments.length > 0 ? Long.parseLong(arguments[0]) : 1200;
    long seed = arguments.length > 1 ? Long.parseLong(arguments[1]) : 11;
    int threads = arguments.length > 2 ? Integer.parseInt(arguments[2]) : 2;
    ExecutorService executor = Executors.newFixedThreadPool(threads);
    Outcome outcome;
    try {
      outcome =
          measure(
              count, seed, executor,
              progress -> {
                if (progress.ended() % 100 == 0) {
                  System.err.println(progress.ended() + " of " + progress.total());
                }
              });
    } finally {
      executor.shutdownNow();
    }
    RateEstimate rate = outcome.rate();
    Interval interval = rate.interval(0.95, Censoring.TIME_CENSORED_CONSERVATIVE);
    System.out.printf(
        Locale.ROOT, "%d trajectories, seed %d: %d events after t=%.0f, exposure %.0f%n", count,
        seed, rate.events(), TRUNCATION, rate.exposure());
    print("decay rate", new Estimate(rate.rate(), rate.standardError()), REFERENCE_RATE);
    System.out.printf(
        Locale.ROOT, "  95 %% interval [%.4e, %.4e], exponentiality chi2 = %.2f%n",
        interval.lower(), interval.upper(),
        CoxOakesTest.of(outcome.passages().truncatedBefore(TRUNCATION)).chiSquare());
    System.out.println(outcome.snapshots() + " metastable snapshots");
    for (int i = 0; i < MetastableAverages.NAMES.size(); i++) {
      print(
          MetastableAverages.NAMES.get(i), outcome.averages().get(i), REFERENCE_AVERAGES.get(i));
    }
    System.out.println("survival of " + outcome.alive() + " trajectories alive at t=100");
    for (int i = 0; i < SURVIVAL_TIMES.length; i++) {
      print(
          String.format(Locale.ROOT, "survival t=%.0f", SURVIVAL_TIMES[i]),
          outcome.survival().get(i), REFERENCE_SURVIVAL.get(i));
    }
  }

  private static void print(String name, Estimate measured, Estimate reference) {
    System.out.printf(
        Locale.ROOT, "%-22s %12.5e +- %.1e   reference %12.5e +- %.1e   %+.2f sigma%n", name,
        measured.value(), measured.standardError(), reference.value(),
        reference.standardError(), sigmas(measured, reference));
  }
}
