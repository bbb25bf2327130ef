package spgpe.reservoir;

import java.util.Arrays;
import spgpe.internal.check.Check;

/**
 * The thermal reservoir: one temperature T (as an energy, k_B = 1), chemical potentials mu_j and
 * dimensionless growth rates gamma_j.
 *
 * <p>The noise of the equation of motion has strength &lt;dW_j<sup>*</sup> dW_j&gt; = 2 gamma_j T dt
 * (fluctuation-dissipation theorem; Gardiner and Davis, J. Phys. B 36, 4731 (2003)). It follows from
 * T and gamma_j and cannot be set. Immutable and thread-safe.
 */
public final class Reservoir {
  private final double temperature;
  private final double[] chemicalPotentials;
  private final double[] dampings;

  private Reservoir(double temperature, double[] chemicalPotentials, double[] dampings) {
    Check.notNegative(temperature, "temperature (energy units)");
    Check.argument(
        chemicalPotentials.length > 0 && dampings.length > 0,
        "chemical potential and damping must be given");
    for (double mu : chemicalPotentials) {
      Check.finite(mu, "chemical potential");
    }
    for (double gamma : dampings) {
      Check.argument(
          gamma >= 0 && gamma <= 10,
          "damping gamma (dimensionless) must lie in 0..10: gamma=%s", gamma);
    }
    this.temperature = temperature;
    this.chemicalPotentials = chemicalPotentials;
    this.dampings = dampings;
  }

  /**
   * The same chemical potential and damping for every component.
   *
   * @param temperature T, energy units, finite and not negative
   * @param chemicalPotential mu, finite
   * @param damping gamma, dimensionless, 0 to 10
   * @return the reservoir
   * @throws IllegalArgumentException if a value is out of range
   */
  public static Reservoir of(double temperature, double chemicalPotential, double damping) {
    return new Reservoir(
        temperature, new double[] {chemicalPotential}, new double[] {damping});
  }

  /**
   * No reservoir: T = 0, gamma = 0.
   *
   * @param chemicalPotential mu, finite; it only turns the global phase
   * @return the reservoir
   * @throws IllegalArgumentException if mu is not finite
   */
  public static Reservoir none(double chemicalPotential) {
    return of(0, chemicalPotential, 0);
  }

  /**
   * A copy at another temperature.
   *
   * @param newTemperature T, energy units, finite and not negative
   * @return changed copy
   * @throws IllegalArgumentException if the value is out of range
   */
  public Reservoir withTemperature(double newTemperature) {
    return new Reservoir(newTemperature, chemicalPotentials, dampings);
  }

  /**
   * A copy with other chemical potentials.
   *
   * @param values one for all components or one for each, finite
   * @return changed copy
   * @throws IllegalArgumentException if a value is not finite or none is given
   */
  public Reservoir withChemicalPotentials(double... values) {
    return new Reservoir(
        temperature, Check.notNull(values, "chemical potentials").clone(), dampings);
  }

  /**
   * A copy with other growth rates.
   *
   * @param values one for all components or one for each, 0 to 10
   * @return changed copy
   * @throws IllegalArgumentException if a value is out of range or none is given
   */
  public Reservoir withDampings(double... values) {
    return new Reservoir(
        temperature, chemicalPotentials, Check.notNull(values, "dampings").clone());
  }

  /**
   * Temperature.
   *
   * @return T as an energy
   */
  public double temperature() {
    return temperature;
  }

  /**
   * Chemical potential of a component.
   *
   * @param component component index
   * @return mu_j
   * @throws IllegalArgumentException if there is no such component
   */
  public double chemicalPotential(int component) {
    return valueFor(chemicalPotentials, component);
  }

  /**
   * Growth rate of a component.
   *
   * @param component component index
   * @return gamma_j
   * @throws IllegalArgumentException if there is no such component
   */
  public double damping(int component) {
    return valueFor(dampings, component);
  }

  private static double valueFor(double[] values, int component) {
    int last = values.length == 1 ? 254 : values.length - 1;
    Check.inRange(component, 0, last, "component index");
    return values[values.length == 1 ? 0 : component];
  }

  /**
   * Strength of the noise: &lt;|dW|<sup>2</sup>&gt; of one mode per unit time.
   *
   * @param component component index
   * @return 2 gamma_j T
   * @throws IllegalArgumentException if there is no such component
   */
  public double noiseStrength(int component) {
    return 2 * damping(component) * temperature;
  }

  /**
   * Checks that the numbers fit a number of components.
   *
   * @param components number of components
   * @throws IllegalArgumentException if a list is neither of length 1 nor of that length
   */
  public void check(int components) {
    Check.argument(
        chemicalPotentials.length == 1 || chemicalPotentials.length == components,
        "chemical potentials must be one for all or one for each component: given=%s,"
            + " components=%s", chemicalPotentials.length, components);
    Check.argument(
        dampings.length == 1 || dampings.length == components,
        "dampings must be one for all or one for each component: given=%s, components=%s",
        dampings.length, components);
  }

  @Override
  public String toString() {
    return "Reservoir: temperature=" + temperature
        + ", chemical potential=" + Arrays.toString(chemicalPotentials)
        + ", damping=" + Arrays.toString(dampings);
  }
}
