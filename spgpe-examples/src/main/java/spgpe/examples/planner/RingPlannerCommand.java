package spgpe.examples.planner;

import java.io.PrintWriter;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import spgpe.examples.scenario.RingScenario;
import spgpe.examples.scenario.ShortErrors;
import spgpe.planning.ShotPlan;
import spgpe.planning.StepTiming;
import spgpe.units.Energy;
import spgpe.units.Length;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;

/** Command line of the shot planner. */
@Command(
    name = "ring-planner",
    mixinStandardHelpOptions = true,
    sortOptions = false,
    description = {
      "Plans decay shots of two coherently coupled K-41 condensates in a ring waveguide (an invented"
          + " experiment): expected decay rate, number of shots, settings of a simulation.",
      PlannedRun.CAUTION
    })
public final class RingPlannerCommand implements Callable<Integer> {
  /** What is varied to reach a lifetime. */
  enum Knob {
    temperature,
    coupling
  }

  @Option(
      names = "--temperature",
      paramLabel = "NK",
      description = "temperature in nK, 0.1 to 1000 (default: ${DEFAULT-VALUE})",
      defaultValue = "27")
  private double temperature;

  @Option(
      names = "--atoms",
      paramLabel = "COUNT",
      description = "atoms in each component, 10 to 10000000 (default: ${DEFAULT-VALUE})",
      defaultValue = "2500")
  private double atoms;

  @Option(
      names = "--radius",
      paramLabel = "UM",
      description = "radius of the ring in um, 1 to 1000 (default: ${DEFAULT-VALUE})",
      defaultValue = "10")
  private double radius;

  @Option(
      names = "--coherent",
      paramLabel = "HZ",
      description = "coherent coupling J/h in Hz, 0 or 0.01 to 100000 (default: ${DEFAULT-VALUE})",
      defaultValue = "40")
  private double coherent;

  @Option(
      names = "--lambda2",
      paramLabel = "NUMBER",
      description =
          "lambda^2 = kappa n/J, dimensionless, 0 to 400; metastable above 1 (default:"
              + " ${DEFAULT-VALUE})",
      defaultValue = "2.2")
  private double lambdaSquared;

  @Option(
      names = "--inter",
      paramLabel = "A0",
      description =
          "scattering length between the components in Bohr radii, -1000 to 1000 (default:"
              + " ${DEFAULT-VALUE})",
      defaultValue = "0")
  private double inter;

  @Option(
      names = "--shot",
      paramLabel = "MS",
      description =
          "time before atom loss ends a shot, in ms, 1 to 10000000 (default: ${DEFAULT-VALUE})",
      defaultValue = "1000")
  private double shot;

  @Option(
      names = "--damping",
      paramLabel = "GAMMA",
      description =
          "growth rate gamma of the simulation, dimensionless, 1e-6 to 1 (default:"
              + " ${DEFAULT-VALUE}, chosen for speed)",
      defaultValue = "0.1")
  private double damping;

  @Option(
      names = "--error",
      paramLabel = "PERCENT",
      description = "wanted standard error of the rate in percent, 0.1 to 100 (default:"
          + " ${DEFAULT-VALUE})",
      defaultValue = "10")
  private double error;

  @Option(
      names = "--lifetime",
      paramLabel = "MS",
      description = "look for the --vary value that gives this mean lifetime in ms (default: none)",
      defaultValue = "0")
  private double lifetime;

  @Option(
      names = "--vary",
      paramLabel = "KNOB",
      description =
          "what to vary for --lifetime: ${COMPLETION-CANDIDATES}; the coupling at fixed lambda^2"
              + " (default: ${DEFAULT-VALUE})",
      defaultValue = "temperature")
  private Knob vary = Knob.temperature;

  @Option(
      names = "--modes",
      paramLabel = "COUNT",
      description =
          "largest kept mode number, 1 to 10000, or 0 for the suggested one (default:"
              + " ${DEFAULT-VALUE})",
      defaultValue = "0")
  private int modes;

  @Option(
      names = "--trajectories",
      paramLabel = "COUNT",
      description = "trajectories of the simulation, 1 to 1000000 (default: ${DEFAULT-VALUE})",
      defaultValue = "500")
  private long trajectories;

  @Option(
      names = "--threads",
      paramLabel = "COUNT",
      description = "threads of the simulation, 1 to 1024 (default: ${DEFAULT-VALUE})",
      defaultValue = "2")
  private int threads;

  @Option(
      names = "--calibrate",
      description = "time steps on this machine for three seconds to estimate the computing time")
  private boolean calibrate;

  @Option(names = "--json", description = "print the plan as JSON")
  private boolean json;

  @Spec private CommandSpec spec = CommandSpec.create();

  /** Made by the command line. */
  public RingPlannerCommand() {}

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
    return ShortErrors.on(new CommandLine(new RingPlannerCommand()));
  }

  @Override
  public Integer call() {
    check();
    RingScenario scenario = scenario(Energy.ofHertz(coherent));
    ShotPlan plan =
        withModes(
            ShotPlan.of(
                scenario.at(Temperature.ofNanokelvin(temperature)), damping,
                TimeSpan.ofMilliseconds(shot)));
    Optional<String> search = Optional.empty();
    if (lifetime > 0) {
      plan = search(plan);
      scenario = scenario(plan.ring().units().energy(plan.ring().coherent()));
      search =
          Optional.of(
              String.format(
                  Locale.ROOT, "%s chosen for a mean lifetime of %.4g ms", vary, lifetime));
    }
    Optional<StepTiming> timing =
        calibrate ? Optional.of(StepTiming.measure(plan)) : Optional.empty();
    PlannedRun run =
        new PlannedRun(scenario, plan, search, error / 100, trajectories, threads, timing);
    PrintWriter out = spec.commandLine().getOut();
    out.println(json ? PlannerJson.of(run) : PlannerText.of(run));
    out.flush();
    return 0;
  }

  private RingScenario scenario(Energy coupling) {
    return new RingScenario(
        Length.ofMicrometres(radius), atoms, coupling, lambdaSquared, Length.ofBohrRadii(inter));
  }

  private ShotPlan withModes(ShotPlan plan) {
    return modes == 0 ? plan : plan.withCutoffModes(modes);
  }

  /** Twice if the modes are free: the second time with those suggested near the answer. */
  private ShotPlan search(ShotPlan plan) {
    TimeSpan wanted = TimeSpan.ofMilliseconds(lifetime);
    if (vary == Knob.coupling) {
      return plan.forLifetimeByCoupling(wanted);
    }
    ShotPlan found = plan.forLifetimeByTemperature(wanted);
    return modes == 0
        ? found.withCutoffModes(found.ring().cutoffModes()).forLifetimeByTemperature(wanted)
        : found;
  }

  private void check() {
    range("--temperature", temperature, 0.1, 1000, "nK");
    range("--atoms", atoms, 10, 1e7, "atoms");
    range("--radius", radius, 1, 1000, "um");
    if (coherent != 0) {
      range("--coherent", coherent, 0.01, 1e5, "Hz, or be 0");
    }
    range("--lambda2", lambdaSquared, 0, 400, "(dimensionless)");
    range("--inter", inter, -1000, 1000, "Bohr radii");
    range("--shot", shot, 1, 1e7, "ms");
    range("--damping", damping, 1e-6, 1, "(dimensionless)");
    range("--error", error, 0.1, 100, "percent");
    if (lifetime != 0) {
      range("--lifetime", lifetime, 1e-3, 1e12, "ms");
    }
    range("--modes", modes, 0, 10_000, "modes, 0 for the suggested number");
    range("--trajectories", trajectories, 1, 1e6, "trajectories");
    range("--threads", threads, 1, 1024, "threads");
  }

  private void range(String name, double value, double low, double high, String unit) {
    if (!(value >= low && value <= high)) {
      throw new ParameterException(
          spec.commandLine(),
          String.format(
              Locale.ROOT, "%s must lie in %s..%s %s: %s", name, plain(low), plain(high), unit,
              plain(value)));
    }
  }

  private static String plain(double value) {
    return value == Math.rint(value) && Math.abs(value) < 1e15
        ? String.valueOf((long) value)
        : String.valueOf(value);
  }
}
