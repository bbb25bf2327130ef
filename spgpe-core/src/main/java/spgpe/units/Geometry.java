package spgpe.units;

import spgpe.internal.check.Check;

/** The shape of the trap along the free directions. All shapes are immutable values. */
public sealed interface Geometry {
  /**
   * Fills the shape with one repulsive component in its ground state, edges and kinetic energy
   * neglected.
   *
   * @param species atom
   * @param coupling reduced coupling g, greater than zero, of the dimension of the shape
   * @param atoms number of atoms, greater than zero; need not be whole
   * @return chemical potential, peak density and size
   * @throws IllegalArgumentException if the coupling is not repulsive or has the wrong dimension,
   *     or the number is not positive
   */
  Cloud fill(Species species, Coupling coupling, double atoms);

  /**
   * A ring waveguide.
   *
   * @param radius radius of the circle, greater than zero
   * @return ring of circumference 2 pi times the radius
   */
  static Ring ring(Length radius) {
    Check.notNull(radius, "radius");
    return new Ring(new Length(2 * Math.PI * radius.positiveMetres("radius")));
  }

  /**
   * A ring.
   *
   * @param circumference length all the way round (not the radius), greater than zero
   */
  record Ring(Length circumference) implements Geometry {
    /**
     * Checks the length.
     *
     * @param circumference length all the way round (not the radius), greater than zero
     * @throws IllegalArgumentException if it is not greater than zero
     */
    public Ring {
      Check.notNull(circumference, "circumference").positiveMetres("circumference");
    }

    @Override
    public Cloud fill(Species species, Coupling coupling, double atoms) {
      return new Box(circumference).fill(species, coupling, atoms);
    }
  }

  /**
   * A one-dimensional box.
   *
   * @param length length, greater than zero
   */
  record Box(Length length) implements Geometry {
    /**
     * Checks the length.
     *
     * @param length length, greater than zero
     * @throws IllegalArgumentException if it is not greater than zero
     */
    public Box {
      Check.notNull(length, "length").positiveMetres("length");
    }

    @Override
    public Cloud fill(Species species, Coupling coupling, double atoms) {
      requireRepulsive(species, coupling, atoms);
      Density density = new Density(atoms / length.metres(), 1);
      return new Cloud(coupling.times(density), density, length);
    }
  }

  /**
   * A two-dimensional box.
   *
   * @param lengthX first side, greater than zero
   * @param lengthY second side, greater than zero
   */
  record Rectangle(Length lengthX, Length lengthY) implements Geometry {
    /**
     * Checks the sides.
     *
     * @param lengthX first side, greater than zero
     * @param lengthY second side, greater than zero
     * @throws IllegalArgumentException if a side is not greater than zero
     */
    public Rectangle {
      Check.notNull(lengthX, "lengthX").positiveMetres("lengthX");
      Check.notNull(lengthY, "lengthY").positiveMetres("lengthY");
    }

    @Override
    public Cloud fill(Species species, Coupling coupling, double atoms) {
      requireRepulsive(species, coupling, atoms);
      Density density = new Density(atoms / (lengthX.metres() * lengthY.metres()), 2);
      return new Cloud(coupling.times(density), density, lengthX);
    }
  }

  /**
   * A harmonic trap, isotropic in two dimensions, in the Thomas-Fermi approximation n(r) = (mu - m
   * w^2 r^2/2)/g. One dimension: mu^(3/2) = 3 N g w sqrt(m)/(4 sqrt(2)); two dimensions: mu = w
   * sqrt(N g m/pi). {@link Validity#thomasFermi} judges the approximation.
   *
   * @param frequency trap frequency f = w/(2 pi), greater than zero
   */
  record Harmonic(Frequency frequency) implements Geometry {
    /**
     * Checks the frequency.
     *
     * @param frequency trap frequency f = w/(2 pi), greater than zero
     * @throws IllegalArgumentException if it is not greater than zero
     */
    public Harmonic {
      Check.notNull(frequency, "frequency");
      Check.positive(frequency.hertz(), "trap frequency in Hz");
    }

    @Override
    public Cloud fill(Species species, Coupling coupling, double atoms) {
      requireRepulsive(species, coupling, atoms);
      int dimension = coupling.dimension();
      Check.inRange(dimension, 1, 2, "dimension of the coupling in a harmonic trap");
      double g = coupling.jouleMetreToD();
      double mass = species.massKilograms();
      double w = frequency.angular();
      double mu =
          dimension == 1
              ? Math.cbrt(Math.pow(3 * atoms * g * w * Math.sqrt(mass / 32), 2))
              : w * Math.sqrt(atoms * g * mass / Math.PI);
      return new Cloud(
          new Energy(mu), new Density(mu / g, dimension), new Length(Math.sqrt(2 * mu / mass) / w));
    }
  }

  private static void requireRepulsive(Species species, Coupling coupling, double atoms) {
    Check.notNull(species, "species");
    Check.notNull(coupling, "coupling");
    Check.positive(coupling.jouleMetreToD(), "coupling g (repulsive gas) in J m^d");
    Check.positive(atoms, "number of atoms");
  }
}
