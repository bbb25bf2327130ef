package spgpe.observables.spectrum;

import spgpe.internal.check.Check;
import spgpe.internal.measure.Correlator;
import spgpe.model.Model;
import spgpe.observables.Estimates;
import spgpe.observables.TimeAverage;
import spgpe.observables.density.AtomNumber;
import spgpe.observables.density.Density;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Static structure factor of a density-like profile A,
 *
 * <pre>S(k) = ( &lt;|A_k|^2&gt; - |&lt;A_k&gt;|^2 delta_k0 ) / &lt;N&gt;,
 * A_k = integral of A exp(-ikx),</pre>
 *
 * <p>on a ring at k = 2 pi n/L, n = 0..floor(N/2); on a plane as the mean over shells of |k|: k = 0
 * alone, then shells of the width w of the larger 2 pi/L about w, 2w, ..., each mode counting once.
 * In a uniform system &lt;A_k&gt; = 0 for k not 0; S(0) is
 * the variance of the number over its mean. A_k of a density contains all pairs of modes: it is
 * free of aliasing for |n| &le; N - 1 - 2 n_max. Measures |A_k|<sup>2</sup>, then A_0 and N.
 * Immutable and thread-safe.
 */
public final class StructureFactor implements Observable {
  @SuppressWarnings("ArrayRecordComponent") // compared by nobody
  private record Scratch(Correlator correlator, double[] number) {}

  private final Observable profile;
  private final Observable number;

  private StructureFactor(Observable profile, Observable number) {
    this.profile = profile;
    this.number = number;
  }

  /**
   * Structure factor of the total density.
   *
   * @return the observable
   */
  public static StructureFactor ofDensity() {
    return of(Density.total(), AtomNumber.total());
  }

  /**
   * Structure factor of one component.
   *
   * @param component component index from 0
   * @return the observable
   * @throws IllegalArgumentException if the index is negative
   */
  public static StructureFactor ofComponent(int component) {
    return of(Density.ofComponent(component), AtomNumber.ofComponent(component));
  }

  /**
   * Structure factor of a spin density.
   *
   * @param axis direction in spin space
   * @return the observable
   */
  public static StructureFactor ofSpin(Density.SpinAxis axis) {
    return of(Density.spin(axis), AtomNumber.total());
  }

  /**
   * Structure factor of any profile.
   *
   * @param profile observable with one number for each grid point
   * @param number observable of the number by which it is divided
   * @return the observable
   */
  public static StructureFactor of(Observable profile, Observable number) {
    return new StructureFactor(
        Check.notNull(profile, "profile"), Check.notNull(number, "number"));
  }

  @Override
  public String name() {
    return "structure factor of " + profile.name();
  }

  @Override
  public int size(Model model) {
    int points = model.region().grid().points();
    Check.argument(
        profile.size(model) == points && number.size(model) == 1,
        "a structure factor needs one number for each point and a single divisor: profile=\"%s\""
            + " with %s numbers, divisor=\"%s\" with %s numbers, %s",
        profile.name(), profile.size(model), number.name(), number.size(model),
        model.region().grid());
    return waveNumbers(model).length + 2;
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    Scratch s =
        snapshot.scratch(
            this, Scratch.class, m -> new Scratch(Correlator.of(m), new double[1]));
    profile.measure(snapshot, s.correlator().first());
    double cell = snapshot.model().region().grid().cellVolume();
    s.correlator().powerSpectrum(cell, result);
    double sum = 0;
    for (double value : s.correlator().first()) {
      sum += value;
    }
    result[result.length - 2] = sum * cell;
    number.measure(snapshot, s.number());
    result[result.length - 1] = s.number()[0];
  }

  /**
   * Wave numbers of {@link #values}.
   *
   * @param model the model that is run
   * @return new array: 0, 2 pi/L, ... on a ring, the mean wave numbers of the shells on a plane
   */
  public double[] waveNumbers(Model model) {
    return Correlator.waveNumbers(Check.notNull(model, "model").region().grid());
  }

  /**
   * How many modes of the grid have each wave number.
   *
   * @param model the model that is run
   * @return new array, as long as {@link #waveNumbers}
   */
  public int[] weights(Model model) {
    return Correlator.waveNumberWeights(Check.notNull(model, "model").region().grid());
  }

  /**
   * S(k) with errors.
   *
   * @param average average of this observable
   * @return one value for each wave number
   * @throws IllegalStateException with fewer than two trajectories
   */
  public Estimates values(TimeAverage average) {
    int count = Check.notNull(average, "average").size() - 2;
    Check.argument(
        count >= 2, "the average must be of a structure factor: numbers=%s", average.size());
    return average.derivedVector(
        v -> {
          double[] s = java.util.Arrays.copyOf(v, count);
          s[0] -= v[count] * v[count];
          for (int n = 0; n < count; n++) {
            s[n] /= v[count + 1];
          }
          return s;
        });
  }
}
