package spgpe.observables.topology;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import spgpe.internal.check.Check;
import spgpe.run.Accumulator;
import spgpe.run.TrajectoryEnd;

/**
 * Changes of winding numbers while an ensemble runs. Record it with an observable of winding
 * numbers, for example {@code RelativePhase.winding()} or {@code ComponentPhase.winding(0)}. Slips
 * that cancel between two samples are not seen.
 */
public final class PhaseSlips implements Accumulator<PhaseSlips> {
  private static final double WHOLE = 1e-6;

  /**
   * One change. Immutable and thread-safe.
   *
   * @param trajectory index of the trajectory
   * @param time time of the first sample with the new winding number
   * @param number which number of the observable changed
   * @param before winding number before
   * @param after winding number after
   */
  public record Slip(long trajectory, double time, int number, int before, int after) {}

  private final double[] times;
  private final int[] last;
  private boolean begun;
  private final List<Slip> open = new ArrayList<>();
  private final List<Slip> slips;

  /**
   * Makes an empty accumulator.
   *
   * @param times scheduled times
   * @param size winding numbers in each sample
   */
  public PhaseSlips(double[] times, int size) {
    this(times, size, new ArrayList<>());
  }

  private PhaseSlips(double[] times, int size, List<Slip> slips) {
    this.times = times;
    this.last = new int[size];
    this.slips = slips;
  }

  /**
   * Takes a sample.
   *
   * @throws IllegalArgumentException if a value is not a whole number
   */
  @Override
  public void add(int sample, double[] values) {
    for (int i = 0; i < last.length; i++) {
      int winding = (int) Math.rint(values[i]);
      Check.argument(
          Math.abs(values[i] - winding) <= WHOLE,
          "winding numbers must be whole: time=%s, value=%s", times[sample], values[i]);
      if (begun && winding != last[i]) {
        open.add(new Slip(0, times[sample], i, last[i], winding));
      }
      last[i] = winding;
    }
    begun = true;
  }

  @Override
  public void finish(TrajectoryEnd end) {
    for (Slip s : open) {
      slips.add(new Slip(end.trajectory(), s.time(), s.number(), s.before(), s.after()));
    }
    open.clear();
  }

  @Override
  public PhaseSlips mergedWith(PhaseSlips later) {
    List<Slip> all = new ArrayList<>(slips);
    all.addAll(later.slips);
    return new PhaseSlips(times, last.length, all);
  }

  /**
   * All changes in the order of trajectories, then of time.
   *
   * @return unmodifiable list
   */
  public List<Slip> slips() {
    return Collections.unmodifiableList(slips);
  }
}
