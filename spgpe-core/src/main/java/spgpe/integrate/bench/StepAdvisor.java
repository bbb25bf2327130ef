package spgpe.integrate.bench;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.TreeSet;
import spgpe.hamiltonian.ModeMatrix;
import spgpe.integrate.Integrator;
import spgpe.integrate.Rk4Ip;
import spgpe.internal.check.Check;
import spgpe.model.Model;

/**
 * Proposes a time step for a model and a scheme from the bias of the equilibrium that the scheme
 * causes, and predicts the bias of a given step.
 *
 * <p>The prediction is that of {@link LinearisedMode}s of the model's kinetic energies at one mean
 * field, by default the largest |mu_j| plus the largest coherent coupling: a uniform gas. It says
 * nothing about errors of real-time dynamics, see {@link Rk4Ip#suggestStep} for those. Immutable
 * and thread-safe.
 */
public final class StepAdvisor {
  private static final double DEFAULT_TOLERANCE = 1e-3;
  private static final int MOST_ENERGIES = 48;

  /** Above this phase per step of the mean field the nonlinear error is no longer small. */
  private static final double LARGEST_MEAN_FIELD_PHASE = 0.2;

  private final Model model;
  private final double tolerance;
  private final double meanField;
  private final double[] energies;

  /** Whether a step is fit for use. */
  public enum Verdict {
    /** Within the tolerance. */
    FIT,
    /** Stable, but the bias exceeds the tolerance. */
    BIASED,
    /** At or beyond the resonance dt (eps_max + 2 g n) = pi, or growing. */
    UNSTABLE
  }

  /**
   * Advice about a step.
   *
   * @param step time step
   * @param verdict whether it is fit
   * @param bias worst relative occupation bias; infinite if unstable
   * @param worstEnergy kinetic energy of the worst mode
   * @param stabilityLimit pi/(eps_max + 2 g n)
   * @param rk4CoolingLimit step at which the numerical damping of RK4 in the interaction picture
   *     cools the highest modes by the tolerance, [72 gamma tol/((g n)^2 eps_max^3)]^(1/5)
   * @param evaluationsPerTime force evaluations per unit time
   * @param warnings what else to mind, in words
   */
  public record Advice(
      double step, Verdict verdict, double bias, double worstEnergy, double stabilityLimit,
      double rk4CoolingLimit, double evaluationsPerTime, List<String> warnings) {
    /**
     * Copies the list.
     *
     * @param step time step
     * @param verdict whether it is fit
     * @param bias worst relative occupation bias; infinite if unstable
     * @param worstEnergy kinetic energy of the worst mode
     * @param stabilityLimit pi/(eps_max + 2 g n)
     * @param rk4CoolingLimit step at which the numerical damping of RK4 in the interaction picture
     *     cools the highest modes by the tolerance, [72 gamma tol/((g n)^2 eps_max^3)]^(1/5)
     * @param evaluationsPerTime force evaluations per unit time
     * @param warnings what else to mind, in words
     */
    public Advice {
      warnings = List.copyOf(warnings);
    }

    /**
     * The advice in words.
     *
     * @return text of a few lines
     */
    public String text() {
      StringBuilder text =
          new StringBuilder(
              String.format(
                  Locale.ROOT,
                  "step %.4g: %s, worst occupation bias %.3g at energy %.4g, %.1f evaluations per"
                      + " time; stable below %.4g, RK4 cooling limit %.4g",
                  step, verdict, bias, worstEnergy, evaluationsPerTime, stabilityLimit,
                  rk4CoolingLimit));
      for (String warning : warnings) {
        text.append("\n  ").append(warning);
      }
      return text.toString();
    }
  }

  private StepAdvisor(Model model, double tolerance, double meanField, double[] energies) {
    this.model = model;
    this.tolerance = tolerance;
    this.meanField = meanField;
    this.energies = energies;
  }

  /**
   * Makes an advisor with tolerance 1e-3.
   *
   * @param model model with damping
   * @return the advisor
   * @throws IllegalArgumentException if no component has damping, or no mode has kinetic energy
   */
  public static StepAdvisor of(Model model) {
    Check.notNull(model, "model");
    boolean damped = false;
    double mu = 0;
    for (int c = 0; c < model.components(); c++) {
      damped |= model.reservoir().damping(c) > 0;
      mu = Math.max(mu, Math.abs(model.reservoir().chemicalPotential(c)));
    }
    Check.argument(
        damped,
        "without damping there is no equilibrium to be biased: gamma=0; choose the step by"
            + " Rk4Ip.suggestStep or a convergence test");
    return new StepAdvisor(
        model, DEFAULT_TOLERANCE, mu + largestCoupling(model.linearPart()), energies(model));
  }

  /**
   * A copy with another tolerance.
   *
   * @param newTolerance largest |occupation bias|, 1e-8 to 0.5
   * @return changed copy
   * @throws IllegalArgumentException if the value is out of range
   */
  public StepAdvisor withTolerance(double newTolerance) {
    Check.argument(
        newTolerance >= 1e-8 && newTolerance <= 0.5,
        "tolerance of the occupation bias must lie in 1e-8..0.5: tolerance=%s", newTolerance);
    return new StepAdvisor(model, newTolerance, meanField, energies);
  }

  /**
   * A copy with another mean field, for example the peak value in a trap.
   *
   * @param newMeanField g n, finite and not negative
   * @return changed copy
   * @throws IllegalArgumentException if the value is out of range
   */
  public StepAdvisor withMeanField(double newMeanField) {
    return new StepAdvisor(
        model, tolerance, Check.notNegative(newMeanField, "mean field g n"), energies);
  }

  /**
   * The largest step whose bias stays within the tolerance.
   *
   * @param scheme any scheme that admits noise; its own step does not matter
   * @return advice about that step
   * @throws IllegalArgumentException if the scheme refuses the model or cannot reach the tolerance;
   *     the message says why
   */
  public Advice advise(Integrator scheme) {
    Check.notNull(scheme, "integrator");
    requireFit(scheme.withStep(stabilityLimit() * 1e-3));
    double step = Double.POSITIVE_INFINITY;
    for (double gamma : dampings()) {
      step =
          Math.min(
              step,
              EquilibriumBias.of(meanField, gamma, energies)
                  .largestStep(scheme, tolerance, 0.95 * stabilityLimit()));
    }
    return examine(scheme.withStep(step));
  }

  /**
   * What a given step will do.
   *
   * @param scheme any scheme that admits noise, with its step
   * @return the advice
   * @throws IllegalArgumentException if the scheme refuses the model for a reason other than the
   *     step
   */
  public Advice examine(Integrator scheme) {
    Check.notNull(scheme, "integrator");
    double step = scheme.step();
    double largest = energies[energies.length - 1];
    double smallestGamma = Double.POSITIVE_INFINITY;
    for (double gamma : dampings()) {
      smallestGamma = Math.min(smallestGamma, gamma);
    }
    double cooling =
        Math.pow(
            72 * smallestGamma * tolerance / (meanField * meanField * Math.pow(largest, 3)), 0.2);
    List<String> warnings = new ArrayList<>();
    EquilibriumBias.Worst worst =
        new EquilibriumBias.Worst(step, Double.POSITIVE_INFINITY, largest);
    if (step < stabilityLimit()) {
      requireFit(scheme);
      worst = new EquilibriumBias.Worst(step, 0, energies[0]);
      for (double gamma : dampings()) {
        EquilibriumBias.Worst found =
            EquilibriumBias.of(meanField, gamma, energies).worst(scheme);
        worst = Math.abs(found.bias()) >= Math.abs(worst.bias()) ? found : worst;
      }
    }
    Verdict verdict = Verdict.FIT;
    if (Double.isInfinite(worst.bias())) {
      verdict = Verdict.UNSTABLE;
      warnings.add(
          String.format(
              Locale.ROOT,
              "dt (eps_max + 2 g n) must stay below pi: dt=%.4g, eps_max=%.4g, g n=%.4g", step,
              largest, meanField));
    } else if (Math.abs(worst.bias()) > tolerance) {
      verdict = Verdict.BIASED;
    }
    if (scheme instanceof Rk4Ip && step > cooling) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "numerical damping of RK4 cools the highest modes: dt=%.4g exceeds %.4g at"
                  + " gamma=%.3g; a shorter step, or OuRk4, whose bias does not grow at small"
                  + " gamma",
              step, cooling, smallestGamma));
    }
    if (meanField * step > LARGEST_MEAN_FIELD_PHASE) {
      warnings.add(
          String.format(
              Locale.ROOT,
              "g n dt should not exceed %.1f, else errors beyond the linearised ones grow:"
                  + " g n=%.4g, dt=%.4g", LARGEST_MEAN_FIELD_PHASE, meanField, step));
    }
    return new Advice(
        step, verdict, worst.bias(), worst.energy(), stabilityLimit(), cooling,
        scheme.facts().forceEvaluationsPerStep() / step, warnings);
  }

  private double stabilityLimit() {
    return Math.PI / (energies[energies.length - 1] + 2 * meanField);
  }

  /** Lets the scheme itself refuse the model. */
  private void requireFit(Integrator scheme) {
    Check.argument(
        scheme.facts().admitsNoise(), "the scheme must admit noise: scheme=%s", scheme);
    scheme.bind(model, new ImpulseNoise(), 1);
  }

  private TreeSet<Double> dampings() {
    TreeSet<Double> dampings = new TreeSet<>();
    for (int c = 0; c < model.components(); c++) {
      if (model.reservoir().damping(c) > 0) {
        dampings.add(model.reservoir().damping(c));
      }
    }
    return dampings;
  }

  private static double largestCoupling(ModeMatrix h) {
    double largest = 0;
    for (int i = 0; i < h.components(); i++) {
      double sum = 0;
      for (int j = 0; j < h.components(); j++) {
        sum += i == j ? 0 : Math.hypot(h.re(0, i, j), h.im(0, i, j));
      }
      largest = Math.max(largest, sum);
    }
    return largest;
  }

  /** Diagonal energies above the lowest of each component, thinned out evenly. */
  private static double[] energies(Model model) {
    ModeMatrix h = model.linearPart();
    TreeSet<Double> all = new TreeSet<>();
    for (int c = 0; c < model.components(); c++) {
      double lowest = Double.POSITIVE_INFINITY;
      for (int m = 0; m < model.region().modes(); m++) {
        lowest = Math.min(lowest, h.re(m, c, c));
      }
      for (int m = 0; m < model.region().modes(); m++) {
        double energy = h.re(m, c, c) - lowest;
        if (energy > 1e-9) {
          all.add(energy);
        }
      }
    }
    Check.argument(!all.isEmpty(), "the region must keep a mode with kinetic energy");
    List<Double> sorted = new ArrayList<>(all);
    int count = Math.min(MOST_ENERGIES, sorted.size());
    double[] energies = new double[count];
    for (int i = 0; i < count; i++) {
      int index =
          count == 1 ? 0 : (int) Math.round((double) i * (sorted.size() - 1) / (count - 1));
      energies[i] = sorted.get(index);
    }
    return energies;
  }
}
