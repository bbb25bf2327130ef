package spgpe.internal.measure;

import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/** A profile: one number for each grid point. */
public final class PointwiseProfile implements Observable {
  /** Computes the numbers. */
  @FunctionalInterface
  public interface Filler {
    /**
     * Computes the numbers of all points.
     *
     * @param snapshot what is measured
     * @param result overwritten; one number for each grid point
     */
    void fill(Snapshot snapshot, double[] result);
  }

  private final String name;
  private final int components;
  private final Filler filler;

  /**
   * Makes a profile.
   *
   * @param name name for tables
   * @param components number of components the model must have at least
   * @param filler computes the numbers
   */
  public PointwiseProfile(String name, int components, Filler filler) {
    this.name = name;
    this.components = components;
    this.filler = filler;
  }

  /**
   * Requires that a model has enough components.
   *
   * @param model the model
   * @param needed number of components needed
   * @param name name of the observable
   */
  public static void requireComponents(Model model, int needed, String name) {
    Check.argument(
        model.components() >= needed,
        "the model must have the components of the observable: observable=\"%s\", components"
            + " needed=%s, components of the model=%s", name, needed, model.components());
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public int size(Model model) {
    requireComponents(model, components, name);
    return model.region().grid().points();
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    filler.fill(snapshot, result);
  }

  @Override
  public String toString() {
    return name;
  }
}
