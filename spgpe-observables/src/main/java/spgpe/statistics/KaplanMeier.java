package spgpe.statistics;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import spgpe.internal.check.Check;

/**
 * Product-limit estimate of the survival probability, S(t) = product over event times t_i &lt;= t
 * of (1 - d_i/n_i), with Greenwood's variance S&#178; sum d_i/(n_i (n_i - d_i)) and the pointwise
 * log-log confidence band S^exp(&#177; z sqrt(sum)/ln S), which stays inside [0, 1].
 *
 * <p>With left truncation the curve is conditional on survival up to the smallest entry time.
 * Immutable and thread-safe.
 *
 * <p>Sources: E. L. Kaplan and P. Meier, J. Am. Stat. Assoc. 53, 457 (1958); log-log band: J. D.
 * Kalbfleisch and R. L. Prentice, The Statistical Analysis of Failure Time Data (1980).
 */
public final class KaplanMeier {
  private static final double ROUNDING = 1e-12;

  private final List<Step> steps;
  private final double[] greenwoodSums;
  private final double lastTime;

  /**
   * One step of the curve.
   *
   * @param time event time
   * @param atRisk trajectories at risk just before it
   * @param events events at this time
   * @param survival S just after the step
   * @param standardError Greenwood standard error of S; NaN where S = 0, for the formula is
   *     undefined there
   */
  public record Step(double time, int atRisk, int events, double survival, double standardError) {}

  private KaplanMeier(List<Step> steps, double[] greenwoodSums, double lastTime) {
    this.steps = steps;
    this.greenwoodSums = greenwoodSums;
    this.lastTime = lastTime;
  }

  /**
   * Estimates the curve.
   *
   * @param data first-passage data
   * @return the estimate; without steps if there was no event
   * @throws IllegalArgumentException if the data is null
   */
  public static KaplanMeier of(SurvivalData data) {
    RiskTable table = new RiskTable(Check.notNull(data, "data"));
    double[] times = table.distinctEventTimes();
    double[] sums = new double[times.length];
    List<Step> steps = new ArrayList<>(times.length);
    double survival = 1;
    double sum = 0;
    for (int i = 0; i < times.length; i++) {
      int n = table.atRisk(times[i]);
      int d = table.events(times[i]);
      survival *= (double) (n - d) / n;
      sum += d / ((double) n * (n - d));
      sums[i] = sum;
      double error = survival > 0 ? survival * Math.sqrt(sum) : Double.NaN;
      steps.add(new Step(times[i], n, d, survival, error));
    }
    return new KaplanMeier(List.copyOf(steps), sums, table.lastTime());
  }

  /**
   * The steps in the order of time.
   *
   * @return unmodifiable list, one entry per distinct event time
   */
  public List<Step> steps() {
    return steps;
  }

  /**
   * Last time up to which the data say anything.
   *
   * @return largest event or censoring time
   */
  public double lastTime() {
    return lastTime;
  }

  /**
   * Survival probability at a time.
   *
   * @param time time, &gt;= 0
   * @return S(time), continuous from the right; 1 before the first event
   * @throws IllegalArgumentException if the time is negative or NaN, or later than the last
   *     observation while S has not reached 0, where the estimate is undefined
   */
  public double survivalAt(double time) {
    int i = indexAt(time);
    return i < 0 ? 1 : steps.get(i).survival();
  }

  /**
   * Greenwood standard error of the survival probability at a time.
   *
   * @param time time, &gt;= 0
   * @return the standard error; 0 before the first event, NaN where S = 0
   * @throws IllegalArgumentException as {@link #survivalAt(double)}
   */
  public double standardErrorAt(double time) {
    int i = indexAt(time);
    return i < 0 ? 0 : steps.get(i).standardError();
  }

  /**
   * Pointwise log-log confidence interval of the survival probability at a time. Where S = 0 the
   * formula is undefined; the interval then runs from 0 to the upper limit just before that step,
   * which is valid because survival can only fall.
   *
   * @param time time, &gt;= 0
   * @param level confidence level, between 0 and 1
   * @return the interval; [1, 1] before the first event
   * @throws IllegalArgumentException as {@link #survivalAt(double)}, or if the level is not inside
   *     (0, 1)
   */
  public Interval intervalAt(double time, double level) {
    double z = Quantiles.twoSidedNormal(level);
    int i = indexAt(time);
    if (i < 0) {
      return new Interval(1, 1);
    }
    double survival = steps.get(i).survival();
    if (survival > 0) {
      return logLog(i, z);
    }
    int positive = i - 1;
    while (positive >= 0 && steps.get(positive).survival() == 0) {
      positive--;
    }
    return new Interval(0, positive < 0 ? 1 : logLog(positive, z).upper());
  }

  private Interval logLog(int i, double z) {
    double survival = steps.get(i).survival();
    double exponent = z * Math.sqrt(greenwoodSums[i]) / Math.log(survival);
    return new Interval(
        Math.pow(survival, Math.exp(-exponent)), Math.pow(survival, Math.exp(exponent)));
  }

  /**
   * Smallest event time by which at least the given fraction has decayed.
   *
   * @param fraction decayed fraction, between 0 and 1; 0.5 gives the median
   * @return the time; empty if the curve does not fall that far
   * @throws IllegalArgumentException if the fraction is not inside (0, 1)
   */
  public OptionalDouble quantile(double fraction) {
    Check.argument(
        fraction > 0 && fraction < 1, "fraction must lie inside (0, 1): fraction=%s", fraction);
    for (Step step : steps) {
      if (step.survival() <= 1 - fraction + ROUNDING) {
        return OptionalDouble.of(step.time());
      }
    }
    return OptionalDouble.empty();
  }

  private int indexAt(double time) {
    Check.argument(time >= 0, "time must be >= 0: time=%s", time);
    int low = 0;
    int high = steps.size();
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (steps.get(middle).time() <= time) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    boolean fallen = low > 0 && steps.get(low - 1).survival() == 0;
    Check.argument(
        fallen || time <= lastTime,
        "survival is undefined after the last observation: time=%s, lastTime=%s",
        time,
        lastTime);
    return low - 1;
  }
}
