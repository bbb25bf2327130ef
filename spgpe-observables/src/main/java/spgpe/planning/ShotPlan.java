package spgpe.planning;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.units.RingExperiment;
import spgpe.units.ScaledRing;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;
import spgpe.units.Verdict;

/**
 * Plan of decay shots on a ring: expected rate, numbers of shots, settings of the simulation and
 * verdicts, before anything is run. Immutable and thread-safe.
 *
 * <p>The rate is the one-loop rate with the cutoff of the planned run ({@link ExpectedRate.Basis}
 * says which theory); where there is none, {@link #refusal} says why. A modulated coupling is planned
 * through its average over the drive. Method and limits: docs/planning.md.
 */
public final class ShotPlan {
  private final RingExperiment experiment;
  private final ScaledRing ring;
  private final double damping;
  private final TimeSpan shot;
  private final Model model;
  private final RunSettings settings;
  private final @Nullable RateTheory theory;
  private final Optional<ExpectedRate> rate;
  private final Optional<NoRate> refusal;
  private final List<Verdict> verdicts;

  private ShotPlan(
      RingExperiment recipe, double damping, TimeSpan shot, int modes, @Nullable RateTheory known) {
    this.damping = damping;
    this.shot = shot;
    experiment = recipe.withRun(damping, shot);
    ring = experiment.scaled();
    int kept = modes == 0 ? ring.cutoffModes() : modes;
    model =
        Model.of(
            Projector.modesUpTo(kept).on(PeriodicGrid.of(Axis.holdingModes(kept, ring.length()))),
            Hamiltonian.pair(ring.g(), ring.inter())
                .with(CoherentCoupling.constant(ring.coherent()))
                .with(BiquadraticCoupling.of(ring.biquadratic())),
            Reservoir.of(ring.temperature(), ring.mu(), damping));
    settings = RunSettings.of(ring, kept, damping, model);
    Optional<NoRate> obstacle = RateTheory.obstacle(ring);
    RateTheory found = null;
    if (obstacle.isEmpty()) {
      found = known == null ? RateTheory.of(ring, kept, damping) : known;
      obstacle = found.obstacleAt(ring.temperature());
    }
    theory = found;
    refusal = obstacle;
    rate =
        found == null || obstacle.isPresent()
            ? Optional.empty()
            : Optional.of(found.at(ring.temperature()));
    verdicts = collectVerdicts();
  }

  /**
   * Plans shots. Solves for the critical bubble, which takes a fraction of a second.
   *
   * @param experiment the recipe; its run, if it has one, is replaced by the two values below
   * @param damping dimensionless gamma of the simulation, greater than zero
   * @param shot length of a shot, greater than zero: the time before atom loss ends it
   * @return the plan
   * @throws IllegalArgumentException if a value is out of range or the recipe cannot be scaled
   */
  public static ShotPlan of(RingExperiment experiment, double damping, TimeSpan shot) {
    return new ShotPlan(
        Check.notNull(experiment, "experiment"), damping, Check.notNull(shot, "shot"), 0, null);
  }

  /**
   * The same plan with another cutoff, such as that of a hotter run it is to be compared with.
   *
   * @param modes largest kept mode number, 1 to 100000
   * @return changed copy
   * @throws IllegalArgumentException if the number is out of range
   */
  public ShotPlan withCutoffModes(int modes) {
    Check.inRange(modes, 1, 100_000, "modes");
    return new ShotPlan(experiment, damping, shot, modes, null);
  }

  /**
   * The same plan at another temperature, with the same modes and damping, so that rates compare.
   *
   * @param temperature temperature, 1 pK to 1 mK
   * @return changed copy
   * @throws IllegalArgumentException if the value is out of range
   */
  public ShotPlan withTemperature(Temperature temperature) {
    return with(experiment.withTemperature(temperature), theory);
  }

  /**
   * The plan at the temperature that gives a wanted mean lifetime. The kept modes stay those of this
   * plan; the suggested ones may differ at the new temperature.
   *
   * @param meanLifetime wanted 1/Gamma, greater than zero
   * @return plan whose {@link ShotStatistics#meanLifetime} is the wanted one
   * @throws IllegalArgumentException if no temperature gives it; the message names the range
   */
  public ShotPlan forLifetimeByTemperature(TimeSpan meanLifetime) {
    Check.positive(Check.notNull(meanLifetime, "meanLifetime").seconds(), "mean lifetime in s");
    return PlanSearch.byTemperature(this, meanLifetime);
  }

  /**
   * The plan at the coherent coupling that gives a wanted mean lifetime, lambda^2 = kappa n/J held
   * fixed. The kept modes stay those of this plan.
   *
   * @param meanLifetime wanted 1/Gamma, greater than zero
   * @return plan whose {@link ShotStatistics#meanLifetime} is the wanted one
   * @throws IllegalArgumentException if no coupling gives it, with the range in the message, or the
   *     coupling is modulated, where lambda^2 depends on the drive
   */
  public ShotPlan forLifetimeByCoupling(TimeSpan meanLifetime) {
    Check.positive(Check.notNull(meanLifetime, "meanLifetime").seconds(), "mean lifetime in s");
    return PlanSearch.byCoupling(this, meanLifetime);
  }

  ShotPlan with(RingExperiment other, @Nullable RateTheory known) {
    return new ShotPlan(other, damping, shot, settings.cutoffModes(), known);
  }

  @Nullable RateTheory theory() {
    return theory;
  }

  /**
   * The recipe, with this plan's damping and shot as its run.
   *
   * @return laboratory recipe
   */
  public RingExperiment experiment() {
    return experiment;
  }

  /**
   * The recipe in scaled units.
   *
   * @return scaled ring
   */
  public ScaledRing ring() {
    return ring;
  }

  /**
   * The damping of the planned simulation.
   *
   * @return gamma
   */
  public double damping() {
    return damping;
  }

  /**
   * The length of a shot.
   *
   * @return time before atom loss ends it
   */
  public TimeSpan shot() {
    return shot;
  }

  /**
   * The model to simulate.
   *
   * @return model with the planned modes
   */
  public Model model() {
    return model;
  }

  /**
   * Settings of the simulation.
   *
   * @return cutoff, grid, step, truncation
   */
  public RunSettings settings() {
    return settings;
  }

  /**
   * The expected decay rate.
   *
   * @return rate, empty if there is none; then {@link #refusal} says why
   */
  public Optional<ExpectedRate> rate() {
    return rate;
  }

  /**
   * Why no rate can be expected.
   *
   * @return reason, empty if there is a {@link #rate}
   */
  public Optional<NoRate> refusal() {
    return refusal;
  }

  /**
   * What follows from the expected rate and the shot.
   *
   * @return statistics, empty without a rate
   */
  public Optional<ShotStatistics> statistics() {
    return rate.map(
        expected ->
            ShotStatistics.of(
                expected.rate(), shot, ring.units().time(settings.conversion())));
  }

  /**
   * Verdicts on the reduction and on the plan, as far as they apply.
   *
   * @return verdicts
   */
  public List<Verdict> verdicts() {
    return verdicts;
  }

  /**
   * Estimated time the simulation takes. Trajectories end at their decay if a rate is expected.
   *
   * @param timing speed of the machine
   * @param trajectories number of trajectories, at least 1
   * @param until laboratory time after which a trajectory is censored, greater than zero
   * @param threads threads that share the work evenly, at least 1
   * @return computing time
   * @throws IllegalArgumentException if a value is out of range
   */
  public TimeSpan computingTime(
      StepTiming timing, long trajectories, TimeSpan until, int threads) {
    Check.notNull(timing, "timing");
    Check.argument(trajectories >= 1, "trajectories must be >= 1: trajectories=%s", trajectories);
    double end =
        ring.units().toScaled(Check.notNull(until, "until"));
    Check.positive(end, "until in t0");
    Check.inRange(threads, 1, 100_000, "threads");
    double mean =
        statistics()
            .map(s -> ring.units().toScaled(s.meanLifetime()))
            .map(lifetime -> -lifetime * Math.expm1(-end / lifetime))
            .orElse(end);
    double steps = trajectories * mean / settings.step();
    return TimeSpan.ofSeconds(timing.secondsPerStep() * steps / threads);
  }

  private List<Verdict> collectVerdicts() {
    List<Verdict> all = new ArrayList<>(ring.verdicts());
    all.add(
        Verdict.atLeast(
            "modes kept/modes suggested",
            (double) settings.cutoffModes() / ring.cutoffModes(),
            0.8,
            0.4,
            "fewer modes leave thermal fluctuations out, and the one-loop rate depends on the"
                + " cutoff; limits: common practice, no source"));
    statistics()
        .ifPresent(
            statistics -> {
              ExpectedRate expected = rate.orElseThrow();
              double lifetime = ring.units().toScaled(statistics.meanLifetime());
              all.add(
                  Verdict.atLeast(
                      "E_b/(kB T) of the rate",
                      expected.barrierOverTemperature(),
                      9,
                      RateTheory.LOWEST_BARRIER,
                      "one-loop theory was checked against simulations from 9 to 18 (own"
                          + " calculation); below it overestimates the rate"));
              all.add(
                  Verdict.atMost(
                      "truncation time/mean lifetime",
                      settings.truncation() / lifetime,
                      0.3,
                      1,
                      "what decays during relaxation and growth of the first bubble is lost to the"
                          + " rate; limits: common practice, no source"));
              all.add(
                  Verdict.atMost(
                      "conversion time/mean lifetime",
                      settings.conversion() / lifetime,
                      0.3,
                      2,
                      "above 1 several bubbles convert the ring together, and its decay is no"
                          + " longer one event; limits: common practice, no source"));
              all.add(
                  Verdict.atLeast(
                      "shot/mean lifetime",
                      shot.seconds() / statistics.meanLifetime().seconds(),
                      0.1,
                      0.001,
                      "fraction of shots in which anything happens before atom loss, if small;"
                          + " limits: common practice, no source"));
            });
    return List.copyOf(all);
  }
}
