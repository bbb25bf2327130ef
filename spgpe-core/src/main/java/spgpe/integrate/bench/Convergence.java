package spgpe.integrate.bench;

import java.util.List;
import java.util.Locale;

/**
 * Differences between runs at a step and at half of it, for a sequence of halved steps. Immutable.
 *
 * @param quantity what was compared
 * @param scheme the scheme
 * @param rows longest step first
 */
public record Convergence(String quantity, String scheme, List<Row> rows) {
  /**
   * One comparison.
   *
   * @param step the longer of the two steps
   * @param difference size of the difference to half that step
   * @param standardError of the difference; 0 without sampling
   */
  public record Row(double step, double difference, double standardError) {}

  /**
   * Copies the list.
   *
   * @param quantity what was compared
   * @param scheme the scheme
   * @param rows longest step first
   */
  public Convergence {
    rows = List.copyOf(rows);
  }

  /**
   * The order from the two shortest steps.
   *
   * @return log2 of the ratio of the last two differences; NaN with fewer than two rows
   */
  public double order() {
    int n = rows.size();
    return n < 2
        ? Double.NaN
        : Math.log(rows.get(n - 2).difference() / rows.get(n - 1).difference()) / Math.log(2);
  }

  /**
   * Standard error of {@link #order} from the sampling errors of the two differences.
   *
   * @return one sigma; an upper estimate, since paired paths correlate the two
   */
  public double orderError() {
    int n = rows.size();
    return n < 2
        ? Double.NaN
        : Math.hypot(
                rows.get(n - 2).standardError() / rows.get(n - 2).difference(),
                rows.get(n - 1).standardError() / rows.get(n - 1).difference())
            / Math.log(2);
  }

  /**
   * The table as text.
   *
   * @return a line for each row and one for the order
   */
  public String table() {
    StringBuilder text = new StringBuilder(quantity).append(" of ").append(scheme).append('\n');
    for (Row row : rows) {
      text.append(
          String.format(
              Locale.ROOT, "step %-10.5g difference %-12.4e standard error %.1e%n",
              row.step(), row.difference(), row.standardError()));
    }
    return text.append(String.format(Locale.ROOT, "order %.3f(%.3f)%n", order(), orderError()))
        .toString();
  }
}
