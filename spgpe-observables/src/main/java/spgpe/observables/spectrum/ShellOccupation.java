package spgpe.observables.spectrum;

import spgpe.internal.check.Check;
import spgpe.internal.measure.Shells;
import spgpe.model.Model;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Occupations averaged over shells of |k|: k = 0 alone, then shells of the width w of the larger 2
 * pi/L about w, 2w, ..., each kept mode counting once. Made by {@link ModeOccupation#inShells}.
 * Immutable and thread-safe.
 */
public final class ShellOccupation implements Observable {
  @SuppressWarnings("ArrayRecordComponent") // compared by nobody
  private record Scratch(Shells shells, double[] occupations) {}

  private final ModeOccupation occupation;

  ShellOccupation(ModeOccupation occupation) {
    this.occupation = occupation;
  }

  @Override
  public String name() {
    return occupation.name() + " in shells";
  }

  @Override
  public int size(Model model) {
    occupation.size(model);
    return shells(model).size();
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    Scratch s =
        snapshot.scratch(
            this, Scratch.class, m -> new Scratch(shells(m), new double[m.region().modes()]));
    occupation.measure(snapshot, s.occupations());
    s.shells().average(s.occupations(), 1, 0, result);
  }

  /**
   * Mean wave number of each shell.
   *
   * @param model the model that is run
   * @return new array, beginning with 0 if k = 0 is kept
   */
  public double[] waveNumbers(Model model) {
    return shells(model).means();
  }

  /**
   * Number of kept modes in each shell.
   *
   * @param model the model that is run
   * @return new array
   */
  public int[] weights(Model model) {
    return shells(model).weights();
  }

  private static Shells shells(Model model) {
    return Shells.ofModes(Check.notNull(model, "model").region());
  }

  @Override
  public String toString() {
    return name();
  }
}
