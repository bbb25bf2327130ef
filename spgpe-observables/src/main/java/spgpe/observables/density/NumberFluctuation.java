package spgpe.observables.density;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.statistics.Estimate;
import spgpe.observables.TimeAverage;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Fluctuation of a single number, such as an atom number: measures x - r and (x - r)<sup>2</sup>,
 * from which {@link #variance} follows with its error. The reference r is a rough value of the mean
 * that keeps the difference of the squares accurate. In grand-canonical equilibrium var N = T
 * d&lt;N&gt;/dmu. Immutable and thread-safe.
 */
public final class NumberFluctuation implements Observable {
  private final Observable number;
  private final double reference;

  private NumberFluctuation(Observable number, double reference) {
    this.number = number;
    this.reference = reference;
  }

  /**
   * Fluctuation of a number.
   *
   * @param number observable of a single number
   * @param reference rough value of its mean, finite
   * @return the observable
   * @throws IllegalArgumentException if the reference is not finite
   */
  public static NumberFluctuation of(Observable number, double reference) {
    return new NumberFluctuation(
        Check.notNull(number, "number"), Check.finite(reference, "reference"));
  }

  @Override
  public String name() {
    return "fluctuation of " + number.name();
  }

  @Override
  public int size(Model model) {
    Check.argument(
        number.size(model) == 1,
        "a fluctuation needs an observable of a single number: observable=\"%s\", numbers=%s",
        number.name(), number.size(model));
    return 2;
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    number.measure(snapshot, result);
    double d = result[0] - reference;
    result[0] = d;
    result[1] = d * d;
  }

  /**
   * Mean of the number.
   *
   * @param average average of this observable
   * @return estimate
   * @throws IllegalArgumentException if the average is not of this observable's size
   */
  public Estimate mean(TimeAverage average) {
    require(average);
    return new Estimate(average.mean(0) + reference, average.standardError(0));
  }

  /**
   * Variance of the number over time and trajectories.
   *
   * @param average average of this observable
   * @return estimate
   * @throws IllegalArgumentException if the average is not of this observable's size
   * @throws IllegalStateException with fewer than two trajectories
   */
  public Estimate variance(TimeAverage average) {
    require(average);
    return average.derived(v -> v[1] - v[0] * v[0]);
  }

  private static void require(TimeAverage average) {
    Check.argument(
        Check.notNull(average, "average").size() == 2,
        "the average must be of a fluctuation, two numbers: numbers=%s", average.size());
  }
}
