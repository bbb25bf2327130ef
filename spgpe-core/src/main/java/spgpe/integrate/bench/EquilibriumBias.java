package spgpe.integrate.bench;

import java.util.Locale;
import spgpe.integrate.Integrator;
import spgpe.internal.check.Check;

/**
 * The worst relative bias of the occupations that a scheme causes over a set of {@link
 * LinearisedMode}s. Immutable and thread-safe.
 */
public final class EquilibriumBias {
  private final double[] energies;
  private final double meanField;
  private final double damping;

  /**
   * The worst mode.
   *
   * @param step time step
   * @param bias (stationary occupation/exact occupation) - 1 with the largest absolute value;
   *     infinite if a mode is unstable
   * @param energy kinetic energy of that mode
   */
  public record Worst(double step, double bias, double energy) {}

  private EquilibriumBias(double[] energies, double meanField, double damping) {
    this.energies = energies;
    this.meanField = meanField;
    this.damping = damping;
  }

  /**
   * Makes the set of modes.
   *
   * @param meanField gn, finite and not negative
   * @param damping gamma, positive, at most 10
   * @param energies kinetic energies of the modes, finite and positive
   * @return the set
   * @throws IllegalArgumentException if a value is out of range or no energy is given
   */
  public static EquilibriumBias of(double meanField, double damping, double... energies) {
    Check.notNull(energies, "energies");
    Check.argument(energies.length > 0, "at least one energy must be given");
    Check.positive(damping, "damping gamma");
    for (double energy : energies) {
      LinearisedMode.of(energy, meanField, damping);
    }
    return new EquilibriumBias(energies.clone(), meanField, damping);
  }

  /**
   * The modes of a one-dimensional ring.
   *
   * @param length ring length, finite and positive
   * @param largestMode highest mode number, at least 1
   * @param meanField gn, finite and not negative
   * @param damping gamma, positive, at most 10
   * @return modes 1 to largestMode, of mass 1
   * @throws IllegalArgumentException if a value is out of range
   */
  public static EquilibriumBias onRing(
      double length, int largestMode, double meanField, double damping) {
    Check.positive(length, "length");
    Check.inRange(largestMode, 1, 32767, "largest mode number");
    double[] energies = new double[largestMode];
    for (int n = 1; n <= largestMode; n++) {
      double k = 2 * Math.PI * n / length;
      energies[n - 1] = k * k / 2;
    }
    return of(meanField, damping, energies);
  }

  /**
   * The worst mode of a scheme.
   *
   * @param integrator any scheme with its step
   * @return the worst mode
   * @throws IllegalArgumentException if the scheme refuses the step
   */
  public Worst worst(Integrator integrator) {
    Check.notNull(integrator, "integrator");
    double bias = 0;
    double energy = energies[0];
    for (double e : energies) {
      double found =
          LinearisedMode.of(e, meanField, damping).equilibrium(integrator).occupation() - 1;
      if (!(Math.abs(found) <= Math.abs(bias))) {
        bias = found;
        energy = e;
      }
    }
    return new Worst(integrator.step(), bias, energy);
  }

  /**
   * The largest step whose bias, and that of every shorter step tried, stays within a tolerance.
   *
   * @param scheme any scheme; its own step does not matter
   * @param tolerance largest |bias|, 1e-8 to 0.5
   * @param upperLimit where to stop searching, finite and positive
   * @return dt, to a relative accuracy of about 1e-3
   * @throws IllegalArgumentException if a value is out of range or no step down to upperLimit/1e3
   *     is good enough
   */
  public double largestStep(Integrator scheme, double tolerance, double upperLimit) {
    Check.notNull(scheme, "integrator");
    Check.argument(
        tolerance >= 1e-8 && tolerance <= 0.5,
        "tolerance of the occupation bias must lie in 1e-8..0.5: tolerance=%s", tolerance);
    Check.positive(upperLimit, "upper limit of the step");
    double good = Double.NaN;
    double bad = Double.NaN;
    // from short steps upwards: the bias is not monotonic near the stability limit
    for (double step = upperLimit * 1e-3; step <= upperLimit; step *= 1.2) {
      if (Math.abs(worst(scheme.withStep(step)).bias()) <= tolerance) {
        good = step;
      } else {
        bad = step;
        break;
      }
    }
    Check.argument(
        good > 0,
        "the scheme must reach the tolerance at some step: tolerance=%s, shortest step tried=%s,"
            + " scheme=%s", tolerance, upperLimit * 1e-3, scheme);
    if (Double.isNaN(bad)) {
      bad = upperLimit;
    }
    while (bad - good > 1e-3 * good) {
      double middle = (good + bad) / 2;
      if (Math.abs(worst(scheme.withStep(middle)).bias()) <= tolerance) {
        good = middle;
      } else {
        bad = middle;
      }
    }
    return good;
  }

  /**
   * A line for each step.
   *
   * @param scheme any scheme
   * @param steps time steps
   * @return table text, worst bias in percent
   */
  public String table(Integrator scheme, double... steps) {
    StringBuilder text = new StringBuilder();
    for (double step : steps) {
      Worst worst = worst(scheme.withStep(step));
      text.append(
          String.format(
              Locale.ROOT,
              "step %-8.4g gamma %-8.3g worst occupation bias %+9.4f %% at energy %.3f%n",
              step, damping, 100 * worst.bias(), worst.energy()));
    }
    return text.toString();
  }
}
