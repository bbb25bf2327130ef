package spgpe.examples.oblate;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import spgpe.examples.scenario.OblateScenario;
import spgpe.examples.scenario.ShortErrors;
import spgpe.theory.CoupledPair;
import spgpe.theory.PlanarBubble;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;
import spgpe.units.Verdict;

/** Command line of the two-dimensional example. */
@Command(
    name = "oblate-decay",
    mixinStandardHelpOptions = true,
    sortOptions = false,
    description = {
      "Simulates two coherently coupled K-41 condensates in an oblate box (an invented experiment)"
          + " whose relative phase starts in the metastable state pi, and follows bubbles, domain"
          + " walls and vortices.",
      "The figures are model estimates; they do not replace a laboratory's own safety rules for"
          + " lasers, magnets and high voltage."
    })
public final class OblateDecayCommand implements Callable<Integer> {
  /** Mode number of the disc and side of the theory's bubble in lengths of the relative phase. */
  private static final int BUBBLE_MODES = 9;

  private static final double BUBBLE_SIDE = 14;

  @Option(
      names = "--temperature",
      paramLabel = "NK",
      description = "temperature in nK, 20 to 80 (default: ${DEFAULT-VALUE})",
      defaultValue = "57")
  private double temperature;

  @Option(
      names = "--trajectories",
      paramLabel = "COUNT",
      description = "trajectories, 1 to 1000 (default: ${DEFAULT-VALUE})",
      defaultValue = "6")
  private long trajectories;

  @Option(
      names = "--until",
      paramLabel = "MS",
      description = "length of each run in ms, 30 to 2000 (default: ${DEFAULT-VALUE})",
      defaultValue = "140")
  private double until;

  @Option(
      names = "--modes",
      paramLabel = "COUNT",
      description =
          "radius of the disc of kept mode numbers, 7 to 63; 15 need 64 x 64 points (default:"
              + " ${DEFAULT-VALUE})",
      defaultValue = "15")
  private int modes;

  @Option(
      names = "--damping",
      paramLabel = "GAMMA",
      description =
          "growth rate gamma, dimensionless, 0.01 to 1 (default: ${DEFAULT-VALUE}, chosen for"
              + " speed)",
      defaultValue = "0.2")
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
      defaultValue = "results/oblate-decay")
  private Path out = Path.of("results");

  @Spec private CommandSpec spec = CommandSpec.create();

  /** Made by the command line. */
  public OblateDecayCommand() {}

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
  static CommandLine commandLine() {
    return ShortErrors.on(new CommandLine(new OblateDecayCommand()));
  }

  @Override
  public Integer call() {
    check();
    OblateScenario scenario = OblateScenario.invented();
    Temperature warm = Temperature.ofNanokelvin(temperature);
    CoupledPair pair = scenario.scaled(warm);
    PrintWriter text = spec.commandLine().getOut();
    text.print("Experiment:\n" + scenario.describe());
    text.printf(Locale.ROOT, "  temperature %.1f nK%n", temperature);
    for (Verdict verdict : scenario.verdicts(warm)) {
      text.println("  " + verdict);
    }
    double phaseLength =
        scenario.units().toScaled(scenario.pair().relativePhaseLength().orElseThrow());
    PlanarBubble bubble = PlanarBubble.of(pair, BUBBLE_SIDE * phaseLength, BUBBLE_MODES);
    text.printf(
        Locale.ROOT,
        "Critical bubble of the theory: E_b/T = %.2f (with 15 modes the state outlives the start"
            + " from about 16 on)%n",
        bubble.energy() / pair.temperature());
    text.flush();
    OblateRun run =
        new OblateRun(
            pair, scenario.units().toScaled(scenario.side()), modes, damping, seed, trajectories,
            Math.ceil(scenario.units().toScaled(TimeSpan.ofMilliseconds(until))));
    OblateReport report = new OblateReport(scenario, run(run));
    text.print(report.text());
    report.writeFiles(out);
    OblateFigures figures = new OblateFigures(report);
    if (figures.isEmpty()) {
      text.println("No nucleation: no figures. Run longer, warmer or more trajectories.");
    } else {
      figures.panels(out.resolve("panels.png"));
      figures.radii(out.resolve("radii.png"));
      figures.defects(out.resolve("defects.png"));
    }
    text.println("Files in " + out.toAbsolutePath().normalize());
    text.flush();
    return 0;
  }

  private OblateRun.Outcome run(OblateRun run) {
    int count = threads == 0 ? Runtime.getRuntime().availableProcessors() : threads;
    ExecutorService executor = Executors.newFixedThreadPool(count);
    try {
      return run.run(executor);
    } finally {
      executor.shutdownNow();
    }
  }

  private void check() {
    require(
        temperature >= 20 && temperature <= 80,
        "--temperature must lie in 20..80 nK: " + temperature);
    require(
        trajectories >= 1 && trajectories <= 1000,
        "--trajectories must lie in 1..1000: " + trajectories);
    require(until >= 30 && until <= 2000, "--until must lie in 30..2000 ms: " + until);
    require(modes >= 7 && modes <= 63, "--modes must lie in 7..63: " + modes);
    require(damping >= 0.01 && damping <= 1, "--damping must lie in 0.01..1: " + damping);
    require(
        threads >= 0 && threads <= 1024,
        "--threads must lie in 1..1024, or 0 for all processors: " + threads);
    try {
      Files.createDirectories(out);
    } catch (IOException e) {
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
