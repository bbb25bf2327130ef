package spgpe.run;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Executor;
import java.util.function.BooleanSupplier;
import org.jspecify.annotations.Nullable;
import spgpe.integrate.Integrator;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.reservoir.RandomStreams;

/**
 * A plan of many independent trajectories of one model. Every method returns a changed copy; plans
 * are immutable and thread-safe.
 *
 * <p>The same plan and seed give the same bits on any number of threads and lanes, and for any split
 * of the trajectory indices ({@link #trajectories(long, long)} and {@link
 * EnsembleResult#mergedWith}).
 */
public final class Ensemble {
  /** As many as are fastest. */
  private static final int AUTOMATIC_LANES = 0;

  /** Fewest blocks of lanes to leave, so that threads can share them. */
  private static final int FEWEST_BLOCKS = 4;

  private final Settings settings;

  private Ensemble(Settings settings) {
    this.settings = settings;
  }

  /** Values of a plan; never changed once a plan holds them. */
  private static final class Settings implements Cloneable {
    final Model model;
    @Nullable InitialState initialState;
    @Nullable Integrator integrator;
    @Nullable RandomStreams streams;
    long first;
    long count;
    double until = Double.NaN;
    int lanes = AUTOMATIC_LANES;
    boolean keepGoing;
    List<StopRule> stopRules = List.of();
    List<Recording<?>> recordings = List.of();
    ProgressListener listener = progress -> {};
    BooleanSupplier cancelled = () -> false;

    Settings(Model model) {
      this.model = model;
    }

    Settings copy() {
      try {
        return (Settings) clone();
      } catch (CloneNotSupportedException e) {
        throw new AssertionError(e);
      }
    }
  }

  /**
   * Begins a plan.
   *
   * @param model the model
   * @return plan without trajectories yet
   */
  public static Ensemble of(Model model) {
    return new Ensemble(new Settings(Check.notNull(model, "model")));
  }

  /**
   * Sets the initial state.
   *
   * @param state initial state
   * @return changed copy
   */
  public Ensemble startingFrom(InitialState state) {
    Settings s = settings.copy();
    s.initialState = Check.notNull(state, "initial state");
    return new Ensemble(s);
  }

  /**
   * Sets the scheme.
   *
   * @param integrator scheme with its step
   * @return changed copy
   */
  public Ensemble integratedBy(Integrator integrator) {
    Settings s = settings.copy();
    s.integrator = Check.notNull(integrator, "integrator");
    return new Ensemble(s);
  }

  /**
   * Runs trajectories 0 to count-1.
   *
   * @param count number of trajectories, at least 1
   * @return changed copy
   * @throws IllegalArgumentException if the count is out of range
   */
  public Ensemble trajectories(long count) {
    return trajectories(0, count);
  }

  /**
   * Runs trajectories first to first+count-1: a part of a larger ensemble.
   *
   * @param first first index, at least 0
   * @param count number of trajectories, at least 1
   * @return changed copy
   * @throws IllegalArgumentException if a number is out of range
   */
  public Ensemble trajectories(long first, long count) {
    Check.argument(count >= 1, "number of trajectories must be >= 1: trajectories=%s", count);
    Check.argument(
        first >= 0 && count <= (1L << 32) - first,
        "trajectory indices must lie in 0..2^32-1: first=%s, trajectories=%s", first, count);
    Settings s = settings.copy();
    s.first = first;
    s.count = count;
    return new Ensemble(s);
  }

  /**
   * Uses the default counter-based streams.
   *
   * @param seed any number
   * @return changed copy
   */
  public Ensemble seed(long seed) {
    return noise(RandomStreams.counterBased(seed));
  }

  /**
   * Uses given random streams.
   *
   * @param streams random streams
   * @return changed copy
   */
  public Ensemble noise(RandomStreams streams) {
    Settings s = settings.copy();
    s.streams = Check.notNull(streams, "random streams");
    return new Ensemble(s);
  }

  /**
   * Sets the end of the run; it starts at time 0.
   *
   * @param time end time, finite and positive; a whole number of steps
   * @return changed copy
   * @throws IllegalArgumentException if the time is out of range
   */
  public Ensemble until(double time) {
    Settings s = settings.copy();
    s.until = Check.positive(time, "end time");
    return new Ensemble(s);
  }

  /**
   * Adds a rule that ends trajectories early.
   *
   * @param rule stop rule
   * @return changed copy
   */
  public Ensemble stopWhen(StopRule rule) {
    Settings s = settings.copy();
    Check.notNull(rule, "stop rule");
    Check.notNull(rule.name(), "name of the stop rule");
    Check.notNull(rule.schedule(), "schedule of the stop rule");
    s.stopRules = added(s.stopRules, rule);
    return new Ensemble(s);
  }

  /**
   * Adds a recording.
   *
   * @param recording what to record; the key to its result
   * @return changed copy
   * @throws IllegalArgumentException if the plan already has it
   */
  public Ensemble record(Recording<?> recording) {
    Check.argument(
        !settings.recordings.contains(Check.notNull(recording, "recording")),
        "the plan already has this recording: %s", recording);
    Settings s = settings.copy();
    s.recordings = added(s.recordings, recording);
    return new Ensemble(s);
  }

  /**
   * Sets who hears of the progress.
   *
   * @param listener called after each trajectory, one call at a time, from the threads that run them
   * @return changed copy
   */
  public Ensemble progress(ProgressListener listener) {
    Settings s = settings.copy();
    s.listener = Check.notNull(listener, "progress listener");
    return new Ensemble(s);
  }

  /**
   * Sets a condition that cancels the run; it is asked often, from the threads that run trajectories.
   * A cancelled run returns what had ended.
   *
   * @param condition true to cancel
   * @return changed copy
   */
  public Ensemble cancelWhen(BooleanSupplier condition) {
    Settings s = settings.copy();
    s.cancelled = Check.notNull(condition, "cancel condition");
    return new Ensemble(s);
  }

  /**
   * Sets how many trajectories each thread advances in lockstep. Changes the speed, never the
   * numbers. Default: what is fastest for the model's engine, see {@link
   * spgpe.projector.CoherentRegion#bestLanes}, and leaves at least four blocks of trajectories.
   *
   * @param lanes 1 to 64
   * @return changed copy
   * @throws IllegalArgumentException if the number is out of range
   */
  public Ensemble lanes(int lanes) {
    Settings s = settings.copy();
    s.lanes = Check.inRange(lanes, 1, 64, "lanes");
    return new Ensemble(s);
  }

  /**
   * Lets a run go on when trajectories diverge; they are listed among the ends, with what they had
   * recorded before. Without this a diverged trajectory fails the run.
   *
   * @return changed copy
   */
  public Ensemble keepGoingAfterDivergence() {
    Settings s = settings.copy();
    s.keepGoing = true;
    return new Ensemble(s);
  }

  private static <T> List<T> added(List<? extends T> list, T item) {
    List<T> more = new ArrayList<>(list);
    more.add(item);
    return List.copyOf(more);
  }

  /**
   * Runs in the calling thread. An interrupt of that thread cancels the run and is kept set.
   *
   * @return the result
   * @throws IllegalStateException if the plan is not complete
   * @throws IllegalArgumentException if the plan contradicts itself, for example a schedule that is
   *     not a whole number of steps, or a step beyond the stability limit
   * @throws RunFailedException if a trajectory diverged or something supplied by the user threw
   */
  public EnsembleResult run() {
    return runOn(Runnable::run);
  }

  /**
   * Runs on an executor and waits. The library starts no threads; there is one task for each block of
   * as many trajectories as lanes. When trajectories stop early, blocks are put together anew at 64
   * times of the run, so that no lane idles for long; the numbers do not depend on it.
   * An interrupt of the waiting thread cancels the run and is kept set; the call then waits only for
   * blocks already begun, so it also frees a caller whose executor dropped tasks it had accepted.
   *
   * @param executor where the blocks run; the waiting thread must not be its only one
   * @return the result
   * @throws IllegalStateException if the plan is not complete
   * @throws IllegalArgumentException if the plan contradicts itself
   * @throws RunFailedException if a trajectory diverged or something supplied by the user threw
   */
  public EnsembleResult runOn(Executor executor) {
    return new EnsembleRun(this).execute(Check.notNull(executor, "executor"));
  }

  Model model() {
    return settings.model;
  }

  InitialState initialState() {
    return set(settings.initialState, "startingFrom(initial state)");
  }

  Integrator integrator() {
    return set(settings.integrator, "integratedBy(integrator)");
  }

  RandomStreams streams() {
    return set(settings.streams, "seed(number)");
  }

  long first() {
    return settings.first;
  }

  long count() {
    Check.state(settings.count > 0, "plan is not complete: call trajectories(count)");
    return settings.count;
  }

  double until() {
    Check.state(settings.until > 0, "plan is not complete: call until(end time)");
    return settings.until;
  }

  int lanes() {
    return settings.lanes != AUTOMATIC_LANES
        ? settings.lanes
        : settings.model.region()
            .bestLanes(settings.model.engine(), Math.max(1, count() / FEWEST_BLOCKS));
  }

  boolean keepsGoing() {
    return settings.keepGoing;
  }

  List<StopRule> stopRules() {
    return settings.stopRules;
  }

  List<Recording<?>> recordings() {
    return settings.recordings;
  }

  ProgressListener listener() {
    return settings.listener;
  }

  BooleanSupplier cancelled() {
    return settings.cancelled;
  }

  private static <T> T set(@Nullable T value, String call) {
    if (value == null) {
      throw new IllegalStateException("plan is not complete: call " + call);
    }
    return value;
  }

  @Override
  public String toString() {
    return "Ensemble of trajectories " + settings.first + ".."
        + (settings.first + settings.count - 1) + " until " + settings.until + "\n  "
        + settings.integrator + "\n  " + settings.streams + "\n" + settings.model;
  }
}
