package spgpe.hamiltonian;

import java.util.Arrays;
import spgpe.internal.check.Check;
import spgpe.projector.CoherentRegion;

/**
 * Kinetic energy: K = sum over j of integral |grad psi_j|<sup>2</sup>/(2 m_j), that is
 * k<sup>2</sup>/(2 m_j) for each mode. Immutable and thread-safe.
 */
public final class Kinetic implements SpectralTerm {
  private final double[] masses;

  private Kinetic(double[] masses) {
    this.masses = masses;
  }

  /**
   * Makes the term.
   *
   * @param masses one mass for each component, or a single one for all; finite and positive
   * @return the term
   * @throws IllegalArgumentException if a mass is out of range
   */
  public static Kinetic ofMasses(double... masses) {
    Check.notNull(masses, "masses");
    Check.argument(masses.length > 0, "at least one mass must be given");
    for (double mass : masses) {
      Check.positive(mass, "mass");
    }
    return new Kinetic(masses.clone());
  }

  /**
   * Mass of a component.
   *
   * @param component component index from 0
   * @return its mass
   * @throws IllegalArgumentException if the term has no such component
   */
  public double mass(int component) {
    if (masses.length == 1) {
      return masses[0];
    }
    return masses[Check.inRange(component, 0, masses.length - 1, "component")];
  }

  @Override
  public void check(int components, CoherentRegion region) {
    Check.argument(
        masses.length == 1 || masses.length == components,
        "masses must be one for all or one for each component: masses=%s, components=%s",
        masses.length, components);
  }

  @Override
  public void addTo(ModeMatrix matrix) {
    for (int m = 0; m < matrix.region().modes(); m++) {
      for (int c = 0; c < matrix.components(); c++) {
        double mass = masses[masses.length == 1 ? 0 : c];
        matrix.addDiagonal(m, c, matrix.region().kSquared(m) / (2 * mass));
      }
    }
  }

  @Override
  public String description() {
    return "Kinetic(masses=" + Arrays.toString(masses) + ")";
  }
}
