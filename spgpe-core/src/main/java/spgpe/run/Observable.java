package spgpe.run;

import java.util.function.ToDoubleFunction;
import spgpe.internal.check.Check;
import spgpe.model.Model;

/**
 * Measures one or more numbers of a snapshot.
 *
 * <p>Called by several threads at once for different trajectories: keep no state.
 */
public interface Observable {
  /**
   * Name for tables and error messages.
   *
   * @return a few words
   */
  String name();

  /**
   * How many numbers it measures.
   *
   * @param model the model that is run
   * @return length of the result, at least 1
   */
  int size(Model model);

  /**
   * Measures.
   *
   * <p>Every number must be finite: one NaN would spoil a mean over all trajectories without a trace
   * of its origin. A run fails with the observable's name, time and trajectory if it is not. Where a
   * quantity may be undefined, measure a flag as a second number.
   *
   * @param snapshot one trajectory at one time; read only, valid during the call
   * @param result overwritten; has the length {@link #size}
   */
  void measure(Snapshot snapshot, double[] result);

  /**
   * An observable of a single number.
   *
   * @param name name for tables and error messages
   * @param function measures the number
   * @return the observable
   */
  static Observable scalar(String name, ToDoubleFunction<Snapshot> function) {
    Check.notNull(name, "name");
    Check.notNull(function, "function");
    return new Observable() {
      @Override
      public String name() {
        return name;
      }

      @Override
      public int size(Model model) {
        return 1;
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        result[0] = function.applyAsDouble(snapshot);
      }
    };
  }
}
