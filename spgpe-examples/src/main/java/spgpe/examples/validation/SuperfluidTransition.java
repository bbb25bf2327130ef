package spgpe.examples.validation;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Executor;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.TimeAverage;
import spgpe.observables.correlation.CorrelationFunction;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.observables.spectrum.ModeOccupation;
import spgpe.observables.spectrum.ShellOccupation;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.statistics.Estimate;

/**
 * Superfluid transition of a single component on a plane: first-order correlation below, at and
 * above the critical chemical potential.
 *
 * <p>Critical values: n lambda<sup>2</sup> = ln(380/(m g)), mu_c = (m g T/pi) ln(13.2/(m g)) for a
 * Bose gas (Prokof'ev, Ruebenacker, Svistunov, Phys. Rev. Lett. 87, 270402 (2001)). A classical
 * field cut at the kinetic energy e_c lacks the modes above. They lie at e + D, D = 2 g n - mu, and
 * hold (m T/(2 pi)) ln(T/(e_c + D)) atoms, which also raise mu by 2 g times that. With D = (m g
 * T/pi) ln(380/13.2) at the transition,
 *
 * <pre>n_c  = (m T/(2 pi)) ln(380 (e_c + D)/(m g T)),
 * mu_c = (m g T/pi) ln(13.2 (e_c + D)/(m g T))</pre>
 *
 * <p>(derived, see docs/validation.md). With m = g = T = 1, which is no restriction for a classical
 * field, only e_c is left.
 */
public final class SuperfluidTransition {
  private static final double CRITICAL_DENSITY = 380;
  private static final double CRITICAL_CHEMICAL_POTENTIAL = 13.2;
  private static final int SAMPLE_INTERVAL = 4;

  /** dt times the largest kinetic energy; twice of it lowers 1/T by 1 %. */
  private static final double STEP_TIMES_ENERGY = 0.45;

  /** With 1 and the same step 1/T would be low by 3 %. */
  private static final double DAMPING = 0.3;

  private SuperfluidTransition() {}

  private static double energyAboveCutoff(double cutoff) {
    return cutoff * cutoff / 2
        + Math.log(CRITICAL_DENSITY / CRITICAL_CHEMICAL_POTENTIAL) / Math.PI;
  }

  static double criticalDensity(double cutoff) {
    return Math.log(CRITICAL_DENSITY * energyAboveCutoff(cutoff)) / (2 * Math.PI);
  }

  static double criticalChemicalPotential(double cutoff) {
    return Math.log(CRITICAL_CHEMICAL_POTENTIAL * energyAboveCutoff(cutoff)) / Math.PI;
  }

  /**
   * What is run.
   *
   * @param distance mu - mu_c in units of m g T
   * @param cutoff largest kept wave number
   * @param length side of the square
   */
  record Case(double distance, double cutoff, double length) {
    Model model() {
      int modes = (int) Math.floor(cutoff * length / (2 * Math.PI));
      Axis axis = Axis.holdingModes(modes, length);
      return Model.of(
          Projector.belowWaveNumber(cutoff).on(PeriodicGrid.of(axis, axis)), Hamiltonian.single(1),
          Reservoir.of(1, criticalChemicalPotential(cutoff) + distance, DAMPING));
    }

    OuRk4 scheme() {
      return OuRk4.ofStep(STEP_TIMES_ENERGY * 2 / (cutoff * cutoff));
    }
  }

  /**
   * Correlations of a case.
   *
   * @param job what was run
   * @param density mean density
   * @param zeroMode density in the mode k = 0
   * @param correlation g1
   * @param fit algebraic and exponential decay
   */
  record Point(
      Case job, Estimate density, Estimate zeroMode, CorrelationFunction correlation,
      DecayFit fit) {}

  /** Runs one ensemble; the first fifth of the time is left out. */
  static Point run(Case job, double until, long trajectories, long seed, Executor executor) {
    Model model = job.model();
    SpatialCorrelation first = SpatialCorrelation.firstOrder(0);
    ShellOccupation occupations = ModeOccupation.ofComponent(0).inShells();
    Recording<TimeAverage> correlation =
        Recording.of(first, Schedule.every(SAMPLE_INTERVAL), TimeAverage.from(until / 5));
    Recording<TimeAverage> zero =
        Recording.of(occupations, Schedule.every(SAMPLE_INTERVAL), TimeAverage.from(until / 5));
    EnsembleResult result =
        Ensemble.of(model)
            .startingFrom(InitialState.uniform(Math.sqrt(criticalDensity(job.cutoff()))))
            .integratedBy(job.scheme()).trajectories(trajectories).seed(seed).until(until)
            .record(correlation).record(zero).runOn(executor);
    TimeAverage average = result.get(correlation);
    double area = model.region().grid().volume();
    return new Point(
        job, average.estimate(0), result.get(zero).derived(n -> n[0] / area),
        first.relativeToZero(average, model), DecayFit.of(first, average, model));
  }

  private static String row(Point p) {
    DecayFit fit = p.fit();
    return String.format(
        Locale.ROOT,
        "| %+.2f | %.0f | %.0f | %s | %.3f | %s | %s | %.2f | %.2f | %.2f | %.1f..%.1f |",
        p.job().distance(), p.job().cutoff(), p.job().length(), brackets(p.density(), 4),
        p.density().value() / criticalDensity(p.job().cutoff()), brackets(p.zeroMode(), 4),
        brackets(fit.exponent(), 4), fit.length(), fit.algebraicMisfit(),
        fit.exponentialMisfit(), fit.from(), fit.to());
  }

  private static String brackets(Estimate e, int digits) {
    return String.format(
        Locale.ROOT, "%." + digits + "f(%d)", e.value(),
        Math.round(e.standardError() * Math.pow(10, digits)));
  }

  /**
   * Prints the table.
   *
   * @param arguments trajectories (at least 2), seed, threads, time of the runs of side 32; all may
   *     be left out
   */
  public static void main(String[] arguments) {
    long trajectories = arguments.length > 0 ? Long.parseLong(arguments[0]) : 16;
    long seed = arguments.length > 1 ? Long.parseLong(arguments[1]) : 2026;
    int threads = arguments.length > 2 ? Integer.parseInt(arguments[2]) : 1;
    double until = arguments.length > 3 ? Double.parseDouble(arguments[3]) : 600;
    for (double cutoff : new double[] {3, 6}) {
      System.out.printf(
          Locale.ROOT, "m = g = T = 1, cutoff %.0f: mu_c = %.4f, n_c = %.4f%n", cutoff,
          criticalChemicalPotential(cutoff), criticalDensity(cutoff));
    }
    System.out.println(
        "| (mu-mu_c)/(m g T) | k_c | L | n | n/n_c | n_0/L^2 | eta | xi | misfit algebraic |"
            + " exponential | r |");
    System.out.println("|---|---|---|---|---|---|---|---|---|---|---|");
    List<Case> cases =
        List.of(
            new Case(-0.3, 3, 16), new Case(-0.3, 3, 32), new Case(0, 3, 16), new Case(0, 3, 32),
            new Case(0.3, 3, 16), new Case(0.3, 3, 32), new Case(0, 6, 16), new Case(0, 3, 64));
    ExecutorService executor = Executors.newFixedThreadPool(threads);
    try {
      List<Point> points = new ArrayList<>();
      for (Case job : cases) {
        double time = until * job.length() / 32;
        long count = job.length() > 32 ? Math.max(2, trajectories / 2) : trajectories;
        points.add(run(job, time, count, seed, executor));
        System.out.println(row(points.get(points.size() - 1)));
      }
      for (int i = 0; i < 6; i += 2) {
        printExponent(points.get(i), points.get(i + 1));
      }
      printExponent(points.get(3), points.get(7));
    } finally {
      executor.shutdownNow();
    }
  }

  private static void printExponent(Point small, Point large) {
    System.out.printf(
        Locale.ROOT, "%+.2f, sides %.0f and %.0f: n_0/L^2 falls as L^-%s%n",
        small.job().distance(), small.job().length(), large.job().length(),
        brackets(sizeExponent(small, large), 3));
  }

  /** Exponent of the zero-mode density between two sides. */
  static Estimate sizeExponent(Point small, Point large) {
    double logs = Math.log(large.job().length() / small.job().length());
    double a = small.zeroMode().standardError() / small.zeroMode().value();
    double b = large.zeroMode().standardError() / large.zeroMode().value();
    return new Estimate(
        Math.log(small.zeroMode().value() / large.zeroMode().value()) / logs,
        Math.hypot(a, b) / logs);
  }
}
