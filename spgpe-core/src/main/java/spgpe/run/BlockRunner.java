package spgpe.run;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BooleanSupplier;
import org.jspecify.annotations.Nullable;
import spgpe.integrate.Integrator;
import spgpe.integrate.Stepper;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;

/**
 * Runs blocks of trajectories in lockstep, one after the other, with one workspace: belongs to one
 * thread at a time.
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
  private final Amplitudes[] lastGood;
  private final double[] lastGoodTime;
  private final double[][] buffers;
  private final int[] channelPosition;
  private final int[] rulePosition;
  private final boolean[] running;
  private final List<List<Channel.Probe<?>>> probes = new ArrayList<>();
  private long firstTrajectory;
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
    this.lastGood = new Amplitudes[lanes];
    for (int lane = 0; lane < lanes; lane++) {
      lastGood[lane] = new Amplitudes(model.region(), model.components(), 1);
    }
    this.lastGoodTime = new double[lanes];
    this.buffers = new double[channels.size()][];
    for (int c = 0; c < buffers.length; c++) {
      buffers[c] = new double[channels.get(c).size()];
    }
    this.channelPosition = new int[channels.size()];
    this.rulePosition = new int[stopRules.size()];
    this.running = new boolean[lanes];
  }

  /** Runs trajectories first, first+1, ..., at most as many as there are lanes. */
  void run(long first, int count, BooleanSupplier cancelled, Sink sink) {
    prepare(first, count);
    while (true) {
      long step = stepper.stepNumber();
      boolean due = isDue(step);
      if (due || step % GUARD_INTERVAL == 0 || step == lastStep) {
        if (cancelled.getAsBoolean()) {
          return;
        }
        stepper.observe(all);
        for (int lane = 0; lane < count; lane++) {
          if (running[lane]) {
            look(lane, step, sink);
          }
        }
        advancePositions(step);
        if (!anyRunning()) {
          return;
        }
      }
      stepper.advance();
    }
  }

  private void prepare(long first, int count) {
    firstTrajectory = first;
    asking(INITIAL, "");
    java.util.Arrays.fill(channelPosition, 0);
    java.util.Arrays.fill(rulePosition, 0);
    java.util.Arrays.fill(running, false);
    probes.clear();
    for (int lane = 0; lane < lanes; lane++) {
      // lanes without a trajectory of their own repeat the first one, unobserved
      long trajectory = lane < count ? first + lane : first;
      noise.assign(lane, trajectory);
      single.clear();
      initialState.prepare(model, streams.initialState(trajectory), single);
      int bad = firstBadComponent(single);
      Check.argument(
          bad < 0, "initial state must be finite: trajectory=%s, component=%s", trajectory, bad);
      all.setLane(lane, single);
      lastGood[lane].set(single);
      lastGoodTime[lane] = 0;
      running[lane] = lane < count;
      List<Channel.Probe<?>> own = new ArrayList<>();
      if (lane < count) {
        for (Channel<?> channel : channels) {
          own.add(channel.probe());
        }
      }
      probes.add(own);
    }
    stepper.start(all, 0);
    asking("", "");
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
    long trajectory = firstTrajectory + lane;
    all.copyLane(lane, single);
    int bad = firstBadComponent(single);
    if (bad >= 0) {
      running[lane] = false;
      sink.diverged(
          new DivergedException(
              trajectory, time, bad, lastGoodTime[lane], lastGood[lane].copy()),
          probes.get(lane));
      return;
    }
    lastGood[lane].set(single);
    lastGoodTime[lane] = time;
    snapshot.show(single, time, step, trajectory);
    for (int c = 0; c < channels.size(); c++) {
      if (isAt(channels.get(c).steps(), channelPosition[c], step)) {
        measure(channels.get(c).recording().observable(), buffers[c]);
        probes.get(lane).get(c).accumulator().add(channelPosition[c], buffers[c]);
      }
    }
    TrajectoryEnd end = endAt(step, time, trajectory);
    if (end != null) {
      running[lane] = false;
      sink.ended(end, probes.get(lane), single);
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
    String at = "trajectories from " + firstTrajectory;
    if (asked.equals(INITIAL)) {
      return at + ", " + INITIAL;
    }
    return at + ", time=" + stepper.time()
        + (asked.isEmpty() ? "" : ", " + asked + " \"" + askedName + "\"");
  }
}
