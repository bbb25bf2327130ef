package spgpe.run;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import spgpe.integrate.StepperState;
import spgpe.internal.check.Check;
import spgpe.projector.Amplitudes;

/** A trajectory that has not ended: what moves with it from lane to lane and thread to thread. */
final class OpenTrajectory {
  private final long index;
  private List<Channel.Probe<?>> probes = List.of();
  private @Nullable StepperState state;
  private @Nullable Amplitudes lastGood;
  private double lastGoodTime;

  OpenTrajectory(long index) {
    this.index = index;
  }

  long index() {
    return index;
  }

  void begin(Amplitudes initial, List<Channel<?>> channels) {
    lastGood = initial.copy();
    List<Channel.Probe<?>> own = new ArrayList<>();
    for (Channel<?> channel : channels) {
      own.add(channel.probe());
    }
    probes = List.copyOf(own);
  }

  List<Channel.Probe<?>> probes() {
    return probes;
  }

  void isGood(Amplitudes single, double time) {
    lastGood().set(single);
    lastGoodTime = time;
  }

  Amplitudes lastGood() {
    return Check.notNull(lastGood, "last good state");
  }

  double lastGoodTime() {
    return lastGoodTime;
  }

  /** What the stepper carries for this trajectory, one lane. */
  StepperState state() {
    return Check.notNull(state, "state of the stepper");
  }

  void leavesWith(StepperState saved) {
    state = saved;
  }
}
