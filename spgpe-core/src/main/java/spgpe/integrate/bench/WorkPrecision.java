package spgpe.integrate.bench;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import spgpe.integrate.Integrator;
import spgpe.internal.check.Check;

/**
 * What schemes cost at equal equilibrium bias. Immutable.
 *
 * @param tolerance largest |occupation bias| allowed
 * @param rows one for each scheme
 */
public record WorkPrecision(double tolerance, List<Row> rows) {
  /**
   * One scheme.
   *
   * @param scheme the scheme
   * @param step largest step within the tolerance
   * @param evaluationsPerTime force evaluations per unit time at that step
   */
  public record Row(String scheme, double step, double evaluationsPerTime) {}

  /**
   * Copies the list.
   *
   * @param tolerance largest |occupation bias| allowed
   * @param rows one for each scheme
   */
  public WorkPrecision {
    rows = List.copyOf(rows);
  }

  /**
   * Compares schemes.
   *
   * @param modes modes and damping
   * @param tolerance largest |occupation bias|, 1e-8 to 0.5
   * @param longestStep where to stop searching, finite and positive
   * @param schemes any schemes; their own steps do not matter
   * @return the table, in the order of the schemes
   * @throws IllegalArgumentException if a value is out of range or a scheme cannot reach the
   *     tolerance
   */
  public static WorkPrecision compare(
      EquilibriumBias modes, double tolerance, double longestStep, List<Integrator> schemes) {
    Check.notNull(modes, "modes");
    Check.notNull(schemes, "schemes");
    List<Row> rows = new ArrayList<>();
    for (Integrator scheme : schemes) {
      double step = modes.largestStep(scheme, tolerance, longestStep);
      rows.add(
          new Row(
              scheme.withStep(step).toString(), step,
              scheme.facts().forceEvaluationsPerStep() / step));
    }
    return new WorkPrecision(tolerance, rows);
  }

  /**
   * The table as text.
   *
   * @return a line for each scheme
   */
  public String table() {
    StringBuilder text = new StringBuilder();
    for (Row row : rows) {
      text.append(
          String.format(
              Locale.ROOT, "bias %.2g: step %-8.4g evaluations per time %-8.1f %s%n",
              tolerance, row.step(), row.evaluationsPerTime(), row.scheme()));
    }
    return text.toString();
  }
}
