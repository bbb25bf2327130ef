package spgpe.units;

import spgpe.internal.check.Check;

/**
 * One component of a uniform repulsive gas in one or two dimensions: the scales that follow from
 * mass, coupling and density. Immutable.
 *
 * <p>Where the literature uses two conventions, both are named here.
 */
public final class UniformGas {
  private static final double HBAR = Constants.HBAR;

  private final Species species;
  private final Coupling coupling;
  private final Density density;
  private final double mass;
  private final double meanField;

  private UniformGas(Species species, Coupling coupling, Density density) {
    this.species = species;
    this.coupling = coupling;
    this.density = density;
    this.mass = species.massKilograms();
    this.meanField = coupling.times(density).positiveJoules("g n");
  }

  /**
   * A uniform gas.
   *
   * @param species atom
   * @param coupling coupling g, greater than zero, dimension 1 or 2
   * @param density density n, greater than zero, of the same dimension
   * @return the gas
   * @throws IllegalArgumentException if a value is not positive or the dimensions differ
   */
  public static UniformGas of(Species species, Coupling coupling, Density density) {
    Check.notNull(species, "species");
    Check.notNull(coupling, "coupling");
    Check.notNull(density, "density").positive(coupling.dimension());
    Check.inRange(coupling.dimension(), 1, 2, "dimension of the coupling");
    Check.positive(coupling.jouleMetreToD(), "coupling g (repulsive gas) in J m^d");
    return new UniformGas(species, coupling, density);
  }

  /**
   * The atom.
   *
   * @return species
   */
  public Species species() {
    return species;
  }

  /**
   * The coupling.
   *
   * @return g
   */
  public Coupling coupling() {
    return coupling;
  }

  /**
   * The density.
   *
   * @return n
   */
  public Density density() {
    return density;
  }

  /**
   * The chemical potential of this component alone.
   *
   * @return g n
   */
  public Energy chemicalPotential() {
    return new Energy(meanField);
  }

  /**
   * The healing length in the convention of this library, xi = hbar/sqrt(m mu); the kinetic energy
   * at k xi = 1 is mu/2. It is the length unit of {@link ScaledUnits} made from g n.
   *
   * @return hbar/sqrt(m mu)
   */
  public Length healingLength() {
    return new Length(HBAR / Math.sqrt(mass * meanField));
  }

  /**
   * The healing length in the other convention, hbar/sqrt(2 m mu), smaller by sqrt(2).
   *
   * @return hbar/sqrt(2 m mu)
   */
  public Length healingLengthWithFactorTwo() {
    return new Length(HBAR / Math.sqrt(2 * mass * meanField));
  }

  /**
   * The speed of sound sqrt(g n/m).
   *
   * @return speed in m/s
   */
  public double soundSpeed() {
    return Math.sqrt(meanField / mass);
  }

  /**
   * The Bogoliubov energy sqrt(eps (eps + 2 g n)), eps = hbar^2 k^2/(2 m).
   *
   * @param perMetre wave number k in 1/m, finite
   * @return the excitation energy
   */
  public Energy bogoliubov(double perMetre) {
    Check.finite(perMetre, "wave number in 1/m");
    double kinetic = HBAR * HBAR * perMetre * perMetre / (2 * mass);
    return new Energy(Math.sqrt(kinetic) * Math.sqrt(kinetic + 2 * meanField));
  }

  /**
   * The Lieb-Liniger parameter m g/(hbar^2 n) = 1/(n xi)^2 of a one-dimensional gas.
   *
   * @return gamma_LL; not the damping rate
   * @throws IllegalArgumentException if the gas is not one-dimensional
   */
  public double liebLiniger() {
    double n = density.positive(1);
    return mass * coupling.jouleMetreToD() / (HBAR * HBAR * n);
  }

  /**
   * The degeneracy temperature T_d = hbar^2 n^2/(2 m kB) of a one-dimensional gas. Some authors use
   * twice this value.
   *
   * @return T_d
   * @throws IllegalArgumentException if the gas is not one-dimensional
   */
  public Temperature degeneracyTemperature() {
    double n = density.positive(1);
    return new Energy(HBAR * HBAR * n * n / (2 * mass)).asTemperature();
  }

  /**
   * The length l = 2 hbar^2 n/(m kB T) over which the first-order coherence of a one-dimensional
   * quasi-condensate decays, g1(x) = exp(-|x|/l). Many papers quote half this value and write
   * exp(-|x|/(2 l)).
   *
   * @param temperature temperature, greater than zero
   * @return l
   * @throws IllegalArgumentException if the gas is not one-dimensional
   */
  public Length coherenceLength(Temperature temperature) {
    return new Length(2 * relativeCoherenceLength(temperature).metres());
  }

  /**
   * The length hbar^2 n/(m kB T) over which the relative phase of two uncoupled equal components of
   * this density each loses coherence: half of {@link #coherenceLength}, because the variances add.
   *
   * @param temperature temperature, greater than zero
   * @return the length
   * @throws IllegalArgumentException if the gas is not one-dimensional
   */
  public Length relativeCoherenceLength(Temperature temperature) {
    double n = density.positive(1);
    double energy = Check.notNull(temperature, "temperature").positiveJoules();
    return new Length(HBAR * HBAR * n / (mass * energy));
  }

  /**
   * The phase-space density n lambda^2 of a two-dimensional gas.
   *
   * @param temperature temperature, greater than zero
   * @return n lambda^2 with the thermal de Broglie wavelength lambda
   * @throws IllegalArgumentException if the gas is not two-dimensional
   */
  public double phaseSpaceDensity(Temperature temperature) {
    double n = density.positive(2);
    double wavelength = species.thermalWavelength(temperature).metres();
    return n * wavelength * wavelength;
  }

  /**
   * The phase-space density of the Berezinskii-Kosterlitz-Thouless transition, ln(380/g~) with g~ =
   * m g/hbar^2; the constant is 380(3). N. Prokof'ev, O. Ruebenacker, B. Svistunov, Phys. Rev.
   * Lett. 87, 270402 (2001). Holds for g~ much smaller than one.
   *
   * @return critical n lambda^2
   * @throws IllegalArgumentException if the gas is not two-dimensional or g~ exceeds 1
   */
  public double criticalPhaseSpaceDensity() {
    return Math.log(380 / weakCoupling());
  }

  /**
   * The transition temperature at this density, 2 pi hbar^2 n/(m kB D_c) with the critical
   * phase-space density D_c.
   *
   * @return T_BKT
   * @throws IllegalArgumentException if the gas is not two-dimensional or g~ exceeds 1
   */
  public Temperature bktTemperature() {
    double critical = criticalPhaseSpaceDensity();
    return new Energy(2 * Math.PI * HBAR * HBAR * density.positive(2) / (mass * critical))
        .asTemperature();
  }

  /**
   * The chemical potential at the transition in units of kB T, (g~/pi) ln(13.2/g~); the constant is
   * 13.2(4). Same source as {@link #criticalPhaseSpaceDensity}.
   *
   * @return mu_c/(kB T)
   * @throws IllegalArgumentException if the gas is not two-dimensional or g~ exceeds 1
   */
  public double criticalChemicalPotential() {
    double g = weakCoupling();
    return g / Math.PI * Math.log(13.2 / g);
  }

  /**
   * The dimensionless coupling m g/hbar^2 of a two-dimensional gas.
   *
   * @return g~
   * @throws IllegalArgumentException if the gas is not two-dimensional
   */
  public double dimensionlessCoupling() {
    Density.requireDimension(coupling.dimension(), 2, "gas with a dimensionless coupling");
    return mass * coupling.jouleMetreToD() / (HBAR * HBAR);
  }

  private double weakCoupling() {
    double g = dimensionlessCoupling();
    Check.argument(g <= 1, "BKT formulas need a weak coupling, m g/hbar^2 <= 1: m g/hbar^2=%s", g);
    return g;
  }
}
