package spgpe.observables.thermometry;

import spgpe.internal.check.Check;
import spgpe.internal.measure.CurvatureMeter;
import spgpe.model.Model;
import spgpe.statistics.Estimate;
import spgpe.observables.TimeAverage;
import spgpe.projector.Amplitudes;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Microcanonical temperature from the curvature of the energy surface, 1/T = &lt;div X&gt; for a
 * vector field X of phase space with X . grad K = 1 (Rugh, Phys. Rev. Lett. 78, 772 (1997); for
 * projected classical fields Davis and Morgan, Phys. Rev. A 68, 053615 (2003)). Needs the field
 * alone, not the reservoir, and holds for conservative evolution as well as in the canonical
 * ensemble. Average the inverse temperature, not the temperature.
 *
 * <p>{@link #inverse}: X = grad K/|grad K|<sup>2</sup>. {@link #inverseAtFixedNumber}: with E and
 * the total atom number N conserved,
 *
 * <pre>X_T = P/|P|^2,  P = grad E - (grad E . grad N/|grad N|^2) grad N,  1/T  =  &lt;div X_T&gt;
 * X_N = Q/|Q|^2,  Q = grad N - (grad E . grad N/|grad E|^2) grad E,  mu/T = -&lt;div X_N&gt;.</pre>
 *
 * <p>If each component conserves its own number, the second form treats only their sum as
 * conserved; that is right in the grand-canonical ensemble and for equal chemical potentials.
 * {@link #gradientAndCurvature} is the ratio of two averages, T = &lt;|grad
 * K|<sup>2</sup>&gt;/&lt;div grad K&gt;, with the smallest variance, for the canonical ensemble.
 */
public final class DynamicalTemperature {
  private static final class Scratch {
    final Amplitudes energyGradient;
    final Amplitudes hGradient;
    final Amplitudes hNumber;

    Scratch(Model model) {
      energyGradient = new Amplitudes(model.region(), model.components(), 1);
      hGradient = new Amplitudes(model.region(), model.components(), 1);
      hNumber = new Amplitudes(model.region(), model.components(), 1);
    }
  }

  @FunctionalInterface
  private interface Estimator {
    void measure(Snapshot snapshot, CurvatureMeter meter, double[] result);
  }

  private DynamicalTemperature() {}

  /**
   * 1/T with K as the only constraint.
   *
   * @return observable of a single number, inverse energy
   */
  public static Observable inverse() {
    return observable("inverse dynamical temperature", 1, DynamicalTemperature::free);
  }

  /**
   * 1/T and mu/T with E and N as constraints; mu is measured, that of the reservoir drops out.
   *
   * @return observable with two numbers
   */
  public static Observable inverseAtFixedNumber() {
    return observable(
        "inverse dynamical temperature at fixed number", 2, DynamicalTemperature::constrained);
  }

  /**
   * |grad K|<sup>2</sup> and div grad K.
   *
   * @return observable with two numbers
   */
  public static Observable gradientAndCurvature() {
    return observable(
        "gradient and curvature of K", 2,
        (snapshot, meter, result) -> {
          result[0] = CurvatureMeter.dot(meter.gradient(), meter.gradient());
          result[1] = meter.trace();
        });
  }

  /**
   * Temperature from an average of {@link #inverse} or {@link #inverseAtFixedNumber}.
   *
   * @param average average of one of them
   * @return T
   * @throws IllegalArgumentException if the average has another size
   * @throws IllegalStateException with fewer than two trajectories
   */
  public static Estimate temperature(TimeAverage average) {
    Check.notNull(average, "average");
    Check.argument(
        average.size() == 1 || average.size() == 2,
        "the average must be of inverse temperatures: numbers=%s", average.size());
    return average.derived(v -> 1 / v[0]);
  }

  /**
   * Chemical potential from an average of {@link #inverseAtFixedNumber}.
   *
   * @param average average of it
   * @return mu
   * @throws IllegalArgumentException if the average has another size
   * @throws IllegalStateException with fewer than two trajectories
   */
  public static Estimate chemicalPotential(TimeAverage average) {
    requireTwo(average);
    return average.derived(v -> v[1] / v[0]);
  }

  /**
   * Temperature from an average of {@link #gradientAndCurvature}.
   *
   * @param average average of it
   * @return T
   * @throws IllegalArgumentException if the average has another size
   * @throws IllegalStateException with fewer than two trajectories
   */
  public static Estimate temperatureFromCurvature(TimeAverage average) {
    requireTwo(average);
    return average.derived(v -> v[0] / v[1]);
  }

  private static void requireTwo(TimeAverage average) {
    Check.notNull(average, "average");
    Check.argument(
        average.size() == 2, "the average must have two numbers: numbers=%s", average.size());
  }

  private static Observable observable(String name, int size, Estimator estimator) {
    return new Observable() {
      @Override
      public String name() {
        return name;
      }

      @Override
      public int size(Model model) {
        return size;
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        estimator.measure(snapshot, CurvatureMeter.at(snapshot), result);
        for (int i = 0; i < size; i++) {
          if (!Double.isFinite(result[i])) {
            throw new IllegalStateException(
                "a dynamical temperature needs a state that is not stationary (T = 0 has none):"
                    + " time=" + snapshot.time());
          }
        }
      }
    };
  }

  private static void free(Snapshot snapshot, CurvatureMeter meter, double[] result) {
    Amplitudes f = meter.gradient();
    double square = CurvatureMeter.dot(f, f);
    result[0] =
        meter.trace() / square
            - 2 * CurvatureMeter.dot(f, meter.alongGradient()) / square / square;
  }

  /**
   * The divergences written out with A = grad E, B = grad N = (q, p), H the Hessian of E, d the
   * dimension: only H A, H B and tr H are needed.
   */
  private static void constrained(Snapshot snapshot, CurvatureMeter meter, double[] result) {
    Model model = snapshot.model();
    Scratch s = snapshot.scratch(Scratch.class, Scratch.class, Scratch::new);
    Amplitudes b = snapshot.amplitudes();
    Amplitudes a = s.energyGradient;
    a.set(meter.gradient());
    addPotential(model, b, a);
    s.hNumber.set(meter.alongState());
    if (hasOnePotential(model)) { // A = F + mu a, and the product with H is linear
      s.hGradient.set(meter.alongGradient());
      addPotential(model, s.hNumber, s.hGradient);
    } else {
      meter.hessian(a, s.hGradient);
    }
    addPotential(model, a, s.hGradient);
    addPotential(model, b, s.hNumber);
    double d = meter.dimension();
    double trace = meter.trace();
    for (int c = 0; c < model.components(); c++) {
      trace += 2 * model.region().modes() * model.reservoir().chemicalPotential(c);
    }
    double aa = CurvatureMeter.dot(a, a);
    double ab = CurvatureMeter.dot(a, b);
    double bb = CurvatureMeter.dot(b, b);
    double aha = CurvatureMeter.dot(a, s.hGradient);
    double ahb = CurvatureMeter.dot(a, s.hNumber);
    double bhb = CurvatureMeter.dot(b, s.hNumber);

    double c = ab / bb; // P = A - c B
    double pp = aa - c * ab;
    double php = aha - 2 * c * ahb + c * c * bhb;
    result[0] = (trace - bhb / bb - c * (d - 3)) / pp - 2 * php / pp / pp;

    double e = ab / aa; // Q = B - e A
    double qq = bb - e * ab;
    double qhq = bhb - 2 * e * ahb + e * e * aha;
    double slope = ahb / aa + 1 - 2 * e * aha / aa; // A . grad e
    double divergence = (d - 2 - slope - e * trace) / qq + 2 * e * qhq / qq / qq;
    result[1] = -divergence;
  }

  private static boolean hasOnePotential(Model model) {
    double first = model.reservoir().chemicalPotential(0);
    for (int c = 1; c < model.components(); c++) {
      if (model.reservoir().chemicalPotential(c) != first) {
        return false;
      }
    }
    return true;
  }

  /** target_j += mu_j v_j: from K to E. */
  private static void addPotential(Model model, Amplitudes v, Amplitudes target) {
    for (int c = 0; c < model.components(); c++) {
      double mu = model.reservoir().chemicalPotential(c);
      for (int m = 0; m < v.re(c).length; m++) {
        target.re(c)[m] += mu * v.re(c)[m];
        target.im(c)[m] += mu * v.im(c)[m];
      }
    }
  }
}
