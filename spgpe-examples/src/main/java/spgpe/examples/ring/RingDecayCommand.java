package spgpe.examples.ring;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.stream.Collectors;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import spgpe.examples.scenario.RingScenario;
import spgpe.examples.scenario.ShortErrors;
import spgpe.planning.ShotPlan;
import spgpe.run.TimeSeries;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;

/** Command line of the main example. */
@Command(
    name = "ring-decay",
    mixinStandardHelpOptions = true,
    sortOptions = false,
    description = {
      "Simulates two coherently coupled K-41 condensates in a ring waveguide (an invented"
          + " experiment) whose relative phase starts in the metastable state pi, at several"
          + " temperatures, and reports the decay rate with its error.",
      "Planning figures are model estimates; they do not replace a laboratory's own safety rules for"
          + " lasers, magnets and high voltage."
    })
public final class RingDecayCommand implements Callable<Integer> {
  @Option(
      names = "--temperatures",
      split = ",",
      paramLabel = "NK",
      description = "temperatures in nK, comma-separated, 10 to 60 (default: ${DEFAULT-VALUE})",
      defaultValue = "24,27,30")
  private List<Double> temperatures = new ArrayList<>();

  @Option(
      names = "--trajectories",
      paramLabel = "COUNT",
      description = "trajectories at each temperature, 1 to 1000000 (default: ${DEFAULT-VALUE})",
      defaultValue = "500")
  private long trajectories;

  @Option(
      names = "--until",
      paramLabel = "MS",
      description =
          "time after which a trajectory is censored, in ms, 50 to 100000 (default:"
              + " ${DEFAULT-VALUE})",
      defaultValue = "1000")
  private double until;

  @Option(
      names = "--damping",
      paramLabel = "GAMMA",
      description =
          "growth rate gamma, dimensionless, 0.01 to 1 (default: ${DEFAULT-VALUE}, chosen for"
              + " speed)",
      defaultValue = "0.1")
  private double damping;

  @Option(
      names = "--seed",
      paramLabel = "NUMBER",
      description = "seed of the random streams (default: ${DEFAULT-VALUE})",
      defaultValue = "2026")
  private long seed;

  @Option(
      names = "--threads",
      paramLabel = "COUNT",
      description =
          "threads, 1 to 1024; the numbers do not depend on it (default: number of processors)",
      defaultValue = "0")
  private int threads;

  @Option(
      names = "--out",
      paramLabel = "FOLDER",
      description = "output folder, created if missing (default: ${DEFAULT-VALUE})",
      defaultValue = "results/ring-decay")
  private Path out = Path.of("results");

  @Spec private CommandSpec spec = CommandSpec.create();

  /** Made by the command line. */
  public RingDecayCommand() {}

  /**
   * Runs the command and leaves with its exit code: 0 done, 2 wrong value, 1 anything else.
   *
   * @param arguments options
   */
  public static void main(String[] arguments) {
    System.exit(commandLine().execute(arguments));
  }

  /**
   * The command with its error handling.
   *
   * @return the command line
   */
  public static CommandLine commandLine() {
    return ShortErrors.on(new CommandLine(new RingDecayCommand()));
  }

  @Override
  public Integer call() {
    check();
    PrintWriter text = spec.commandLine().getOut();
    List<Temperature> sorted =
        temperatures.stream().sorted().map(Temperature::ofNanokelvin).toList();
    List<ShotPlan> plans = plans(sorted);
    ShotPlan hottest = plans.get(plans.size() - 1);
    text.println(Report.setUp(RingScenario.invented(), plans));
    text.flush();
    double scaledUntil = hottest.ring().units().toScaled(TimeSpan.ofMilliseconds(until));
    RingDecay simulation = new RingDecay(seed, trajectories, Math.ceil(scaledUntil));
    List<DecayAtTemperature> points = runAll(simulation, plans);
    text.println(Report.table(points));
    text.flush();
    write(simulation, points);
    text.println("Files in " + out.toAbsolutePath().normalize() + ":");
    text.println("  space-time.png, survival.png, rates.png; rates.csv, survival-*.csv, curves.npz,"
        + " space-time-*.npz");
    text.flush();
    return 0;
  }

  /** One plan for each temperature, all with the modes of the hottest, so that rates compare. */
  private List<ShotPlan> plans(List<Temperature> sorted) {
    Temperature hottest = sorted.get(sorted.size() - 1);
    ShotPlan plan =
        ShotPlan.of(
            RingScenario.invented().at(hottest), damping, TimeSpan.ofMilliseconds(until));
    return sorted.stream().map(plan::withTemperature).toList();
  }

  private List<DecayAtTemperature> runAll(RingDecay simulation, List<ShotPlan> plans) {
    int count = threads == 0 ? Runtime.getRuntime().availableProcessors() : threads;
    ExecutorService executor = Executors.newFixedThreadPool(count);
    try {
      List<DecayAtTemperature> points = new ArrayList<>();
      for (int i = 0; i < plans.size(); i++) {
        double nanokelvin = plans.get(i).experiment().temperature().nanokelvin();
        String label = String.format(Locale.ROOT, "%.1f nK", nanokelvin);
        points.add(
            simulation.run(
                i, plans.get(i), executor,
                new ConsoleProgress(System.err, label, System.console() != null)));
      }
      return points;
    } finally {
      executor.shutdownNow();
    }
  }

  private void write(RingDecay simulation, List<DecayAtTemperature> points) {
    SpaceTimeFigure maps = new SpaceTimeFigure();
    for (DecayAtTemperature point : points) {
      ResultFiles.survival(out, point);
      point.typicalDecay().ifPresent(
          end -> {
            TimeSeries.Series series = simulation.spaceTime(point, end);
            ResultFiles.spaceTime(out, point, series);
            maps.add(point, series);
          });
    }
    ResultFiles.rates(out, points);
    ResultFiles.curves(out, points);
    if (!maps.isEmpty()) {
      maps.write(out.resolve("space-time.png"));
    }
    CurveFigures.survival(out.resolve("survival.png"), points);
    CurveFigures.rates(out.resolve("rates.png"), points);
  }

  private void check() {
    require(!temperatures.isEmpty(), "--temperatures must name at least one temperature");
    for (double t : temperatures) {
      require(t >= 10 && t <= 60, "--temperatures must lie in 10..60 nK: " + t);
    }
    require(
        temperatures.stream().distinct().count() == temperatures.size(),
        "--temperatures must differ: "
            + temperatures.stream().map(String::valueOf).collect(Collectors.joining(",")));
    require(
        trajectories >= 1 && trajectories <= 1_000_000,
        "--trajectories must lie in 1..1000000: " + trajectories);
    require(until >= 50 && until <= 100_000, "--until must lie in 50..100000 ms: " + until);
    require(damping >= 0.01 && damping <= 1, "--damping must lie in 0.01..1: " + damping);
    require(
        threads >= 0 && threads <= 1024,
        "--threads must lie in 1..1024, or 0 for all processors: " + threads);
    try {
      Files.createDirectories(out);
    } catch (IOException | UncheckedIOException e) {
      throw new ParameterException(
          spec.commandLine(), "--out cannot be created: " + out + " (" + e.getMessage() + ")");
    }
    require(Files.isWritable(out), "--out is not writable: " + out);
  }

  private void require(boolean condition, String message) {
    if (!condition) {
      throw new ParameterException(spec.commandLine(), message);
    }
  }
}
