package spgpe.run;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.BooleanSupplier;
import org.jspecify.annotations.Nullable;
import spgpe.integrate.Integrator;
import spgpe.integrate.Stepper;
import spgpe.integrate.StepperState;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;

/**
 * Runs blocks of trajectories in lockstep, one after the other, with one workspace: belongs to one
 * thread at a time. What a trajectory does depends neither on its lane nor on its neighbours.
 */
final class BlockRunner {
  /** Steps between checks for divergence and cancellation when nothing is observed. */
  private static final long GUARD_INTERVAL = 64;

  private static final String INITIAL = "initial state";

  /** Receives what a block has finished. */
  interface Sink {
    void ended(TrajectoryEnd end, List<Channel.Probe<?>> probes, Amplitudes state);

    void diverged(DivergedException failure, List<Channel.Probe<?>> probes);
  }

  private final Model model;
  private final InitialState initialState;
  private final RandomStreams streams;
  private final List<Channel<?>> channels;
  private final List<StopRule> stopRules;
  private final long[][] ruleSteps;
  private final long lastStep;
  private final int lanes;
  private final NoiseGenerator noise;
  private final Stepper stepper;
  private final Snapshot snapshot;
  private final Amplitudes all;
  private final Amplitudes single;
  private final double[][] buffers;
  private final int[] channelPosition;
  private final int[] rulePosition;
  private final boolean[] running;
  private List<OpenTrajectory> block = List.of();
  /** What is being asked that the user supplied, and its name; empty between such calls. */
  private String asked = "";
  private String askedName = "";

  BlockRunner(
      Model model, InitialState initialState, Integrator integrator, RandomStreams streams,
      List<Channel<?>> channels, List<StopRule> stopRules, long lastStep, int lanes) {
    this.model = model;
    this.initialState = initialState;
    this.streams = streams;
    this.channels = channels;
    this.stopRules = stopRules;
    this.lastStep = lastStep;
    this.lanes = lanes;
    this.ruleSteps = new long[stopRules.size()][];
    for (int r = 0; r < ruleSteps.length; r++) {
      ruleSteps[r] = stopRules.get(r).schedule().steps(integrator.step(), lastStep);
    }
    this.noise = streams.generator(model.region(), model.components(), lanes);
    this.stepper = integrator.bind(model, noise, lanes);
    this.snapshot = new Snapshot(model);
    this.all = new Amplitudes(model.region(), model.components(), lanes);
    this.single = new Amplitudes(model.region(), model.components(), 1);
    this.buffers = new double[channels.size()][];
    for (int c = 0; c < buffers.length; c++) {
      buffers[c] = new double[channels.get(c).size()];
    }
    this.channelPosition = new int[channels.size()];
    this.rulePosition = new int[stopRules.size()];
    this.running = new boolean[lanes];
  }

  /**
   * Runs a block to the end of its window.
   *
   * @return the trajectories that have not ended, ready to go on with other neighbours; empty if
   *     cancelled
   */
  List<OpenTrajectory> run(TrajectoryPool.Block next, BooleanSupplier cancelled, Sink sink) {
    block = next.trajectories();
    Arrays.fill(running, false);
    Arrays.fill(running, 0, block.size(), true);
    findPositions(next.firstStep());
    if (next.firstStep() == 0) {
      begin();
    } else {
      resume();
    }
    while (stepper.stepNumber() < next.endStep()) {
      long step = stepper.stepNumber();
      if (isDue(step) || step % GUARD_INTERVAL == 0 || step == lastStep) {
        if (cancelled.getAsBoolean()) {
          return List.of();
        }
        stepper.observe(all);
        for (int lane = 0; lane < block.size(); lane++) {
          if (running[lane]) {
            look(lane, step, sink);
          }
        }
        advancePositions(step);
        if (!anyRunning()) {
          return List.of();
        }
      }
      stepper.advance();
    }
    return stillOpen();
  }

  private void begin() {
    asking(INITIAL, "");
    for (int lane = 0; lane < block.size(); lane++) {
      long trajectory = block.get(lane).index();
      single.clear();
      initialState.prepare(model, streams.initialState(trajectory), single);
      int bad = firstBadComponent(single);
      Check.argument(
          bad < 0, "initial state must be finite: trajectory=%s, component=%s", trajectory, bad);
      block.get(lane).begin(single, channels);
      assign(lane, trajectory, single);
    }
    fillIdleLanes(block.get(0).lastGood());
    stepper.start(all, 0);
    asking("", "");
  }

  private void resume() {
    for (int lane = 0; lane < block.size(); lane++) {
      assign(lane, block.get(lane).index(), block.get(lane).state().inner());
    }
    StepperState common = block.get(0).state();
    fillIdleLanes(common.inner());
    stepper.restore(
        StepperState.of(
            all, common.stepNumber(), common.isAtSymmetricPoint(), common.refinement()));
  }

  private void assign(int lane, long trajectory, Amplitudes state) {
    noise.assign(lane, trajectory);
    all.setLane(lane, state);
  }

  /** Lanes without a trajectory of their own repeat the first one, unobserved. */
  private void fillIdleLanes(Amplitudes state) {
    for (int lane = block.size(); lane < lanes; lane++) {
      assign(lane, block.get(0).index(), state);
    }
  }

  private List<OpenTrajectory> stillOpen() {
    StepperState saved = stepper.save();
    Amplitudes inner = saved.inner();
    List<OpenTrajectory> open = new ArrayList<>();
    for (int lane = 0; lane < block.size(); lane++) {
      if (running[lane]) {
        inner.copyLane(lane, single);
        block.get(lane).leavesWith(
            StepperState.of(
                single, saved.stepNumber(), saved.isAtSymmetricPoint(), saved.refinement()));
        open.add(block.get(lane));
      }
    }
    return open;
  }

  private void findPositions(long step) {
    for (int c = 0; c < channelPosition.length; c++) {
      channelPosition[c] = countBefore(channels.get(c).steps(), step);
    }
    for (int r = 0; r < rulePosition.length; r++) {
      rulePosition[r] = countBefore(ruleSteps[r], step);
    }
  }

  private static int countBefore(long[] steps, long step) {
    int found = Arrays.binarySearch(steps, step);
    return found >= 0 ? found : -found - 1;
  }

  private boolean isDue(long step) {
    for (int c = 0; c < channelPosition.length; c++) {
      if (isAt(channels.get(c).steps(), channelPosition[c], step)) {
        return true;
      }
    }
    for (int r = 0; r < rulePosition.length; r++) {
      if (isAt(ruleSteps[r], rulePosition[r], step)) {
        return true;
      }
    }
    return false;
  }

  private static boolean isAt(long[] steps, int position, long step) {
    return position < steps.length && steps[position] == step;
  }

  private void advancePositions(long step) {
    for (int c = 0; c < channelPosition.length; c++) {
      channelPosition[c] += isAt(channels.get(c).steps(), channelPosition[c], step) ? 1 : 0;
    }
    for (int r = 0; r < rulePosition.length; r++) {
      rulePosition[r] += isAt(ruleSteps[r], rulePosition[r], step) ? 1 : 0;
    }
  }

  private void look(int lane, long step, Sink sink) {
    double time = stepper.time();
    OpenTrajectory open = block.get(lane);
    all.copyLane(lane, single);
    int bad = firstBadComponent(single);
    if (bad >= 0) {
      running[lane] = false;
      sink.diverged(
          new DivergedException(
              open.index(), time, bad, open.lastGoodTime(), open.lastGood().copy()),
          open.probes());
      return;
    }
    open.isGood(single, time);
    snapshot.show(single, time, step, open.index());
    for (int c = 0; c < channels.size(); c++) {
      if (isAt(channels.get(c).steps(), channelPosition[c], step)) {
        measure(channels.get(c).recording().observable(), buffers[c]);
        open.probes().get(c).accumulator().add(channelPosition[c], buffers[c]);
      }
    }
    TrajectoryEnd end = endAt(step, time, open.index());
    if (end != null) {
      running[lane] = false;
      sink.ended(end, open.probes(), single);
    }
  }

  private void measure(Observable observable, double[] result) {
    asking("observable", observable.name());
    observable.measure(snapshot, result);
    for (int i = 0; i < result.length; i++) {
      if (!Double.isFinite(result[i])) {
        Check.argument(
            false,
            "what an observable measures must be finite: observable=\"%s\", number=%s, value=%s,"
                + " trajectory=%s, time=%s",
            observable.name(), i, result[i], snapshot.trajectory(), snapshot.time());
      }
    }
    asking("", "");
  }

  private @Nullable TrajectoryEnd endAt(long step, double time, long trajectory) {
    for (int r = 0; r < ruleSteps.length; r++) {
      if (isAt(ruleSteps[r], rulePosition[r], step)) {
        asking("stop rule", stopRules.get(r).name());
        boolean stop = stopRules.get(r).shouldStop(snapshot);
        asking("", "");
        if (stop) {
          return new TrajectoryEnd(
              trajectory, time, TrajectoryEnd.Reason.STOPPED, stopRules.get(r).name());
        }
      }
    }
    return step == lastStep
        ? new TrajectoryEnd(trajectory, time, TrajectoryEnd.Reason.END_OF_RUN, "")
        : null;
  }

  private boolean anyRunning() {
    for (boolean lane : running) {
      if (lane) {
        return true;
      }
    }
    return false;
  }

  private static int firstBadComponent(Amplitudes state) {
    for (int c = 0; c < state.components(); c++) {
      if (!Double.isFinite(state.atomNumber(c, 0))) {
        return c;
      }
    }
    return -1;
  }

  private void asking(String kind, String name) {
    asked = kind;
    askedName = name;
  }

  /** Where the block stands, for error messages. */
  String position() {
    StringBuilder indices = new StringBuilder();
    for (OpenTrajectory open : block) {
      indices.append(indices.isEmpty() ? "" : ", ").append(open.index());
    }
    String at = "trajectories " + indices;
    if (asked.equals(INITIAL)) {
      return at + ", " + INITIAL;
    }
    return at + ", time=" + stepper.time()
        + (asked.isEmpty() ? "" : ", " + asked + " \"" + askedName + "\"");
  }
}
