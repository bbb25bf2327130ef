package spgpe.internal.measure;

import java.util.function.ToDoubleFunction;
import spgpe.model.Model;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/** An observable of a single number that checks the number of components. */
public final class ScalarMeasure implements Observable {
  private final String name;
  private final int components;
  private final ToDoubleFunction<Snapshot> function;

  /**
   * Makes the observable.
   *
   * @param name name for tables
   * @param components number of components the model must have at least
   * @param function measures the number
   */
  public ScalarMeasure(String name, int components, ToDoubleFunction<Snapshot> function) {
    this.name = name;
    this.components = components;
    this.function = function;
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public int size(Model model) {
    PointwiseProfile.requireComponents(model, components, name);
    return 1;
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    result[0] = function.applyAsDouble(snapshot);
  }

  @Override
  public String toString() {
    return name;
  }
}
