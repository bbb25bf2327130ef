package spgpe.units;

import spgpe.internal.check.Check;

/**
 * Conversion between the laboratory and scaled units (hbar = m = kB = 1), both ways. Immutable.
 *
 * <p>An energy unit e0 fixes the length unit x0 = hbar/sqrt(m e0) and the time unit t0 = hbar/e0.
 * What remains is the size of the field, and here two customs exist:
 *
 * <table>
 * <caption>The two scalings in d dimensions</caption>
 * <tr><th>quantity</th><th>{@link #dividingByDensity}</th><th>{@link #keepingAtomNumbers}</th></tr>
 * <tr><td>field</td><td>psi/sqrt(n0)</td><td>psi x0^(d/2)</td></tr>
 * <tr><td>density</td><td>n/n0</td><td>n x0^d</td></tr>
 * <tr><td>coupling</td><td>g n0/e0</td><td>g/(e0 x0^d)</td></tr>
 * <tr><td>temperature</td><td>kB T/(e0 n0 x0^d)</td><td>kB T/e0</td></tr>
 * <tr><td>energy of the whole field</td><td>E/(e0 n0 x0^d)</td><td>E/e0</td></tr>
 * </table>
 *
 * <p>They differ by the factor n0 x0^d in the temperature; mixing them up is a classic slip. With f
 * = {@link #atomsPerUnitNorm} (n0 x0^d, or 1) both columns are one formula. Energies per atom (mu,
 * J), lengths, times and rates do not depend on the choice, and the damping rate gamma is
 * dimensionless and never rescaled.
 */
public final class ScaledUnits {
  private final int dimension;
  private final double energyUnit;
  private final double lengthUnit;
  private final double timeUnit;
  private final double volumeUnit;
  private final double atomsPerUnitNorm;

  private ScaledUnits(Species species, Energy energyUnit, int dimension, double density) {
    Check.notNull(species, "species");
    Check.inRange(dimension, 1, 3, "dimension");
    this.dimension = dimension;
    this.energyUnit = Check.notNull(energyUnit, "energyUnit").positiveJoules("energy unit");
    this.lengthUnit = Constants.HBAR / Math.sqrt(species.massKilograms() * this.energyUnit);
    this.timeUnit = Constants.HBAR / this.energyUnit;
    this.volumeUnit = Math.pow(lengthUnit, dimension);
    this.atomsPerUnitNorm = density == 0 ? 1 : density * volumeUnit;
    Check.positive(timeUnit * volumeUnit, "product of the time and volume units in s m^d");
    Check.positive(atomsPerUnitNorm, "atoms per unit norm");
    Check.positive(this.energyUnit * atomsPerUnitNorm, "energy of unit norm in J");
  }

  /**
   * Units whose field is divided by the square root of a reference density, so that a density n0
   * reads 1.
   *
   * @param species atom
   * @param energyUnit energy unit e0, greater than zero; often g n0
   * @param density reference density n0, greater than zero; its dimension is that of the units
   * @return the units
   * @throws IllegalArgumentException if a value is not positive
   */
  public static ScaledUnits dividingByDensity(Species species, Energy energyUnit, Density density) {
    Check.notNull(density, "density");
    return new ScaledUnits(
        species, energyUnit, density.dimension(), density.positive(density.dimension()));
  }

  /**
   * Units that keep atom numbers: the integral of the scaled density is the number of atoms.
   *
   * @param species atom
   * @param energyUnit energy unit e0, greater than zero
   * @param dimension d, 1 to 3
   * @return the units
   * @throws IllegalArgumentException if the energy is not positive or d is not 1 to 3
   */
  public static ScaledUnits keepingAtomNumbers(Species species, Energy energyUnit, int dimension) {
    return new ScaledUnits(species, energyUnit, dimension, 0);
  }

  /**
   * The dimension.
   *
   * @return d
   */
  public int dimension() {
    return dimension;
  }

  /**
   * The length unit x0 = hbar/sqrt(m e0).
   *
   * @return x0
   */
  public Length lengthUnit() {
    return new Length(lengthUnit);
  }

  /**
   * The time unit t0 = hbar/e0.
   *
   * @return t0
   */
  public TimeSpan timeUnit() {
    return new TimeSpan(timeUnit);
  }

  /**
   * The energy unit per atom.
   *
   * @return e0
   */
  public Energy energyUnit() {
    return new Energy(energyUnit);
  }

  /**
   * The number of atoms in a scaled norm (integral of the scaled density) of one: n0 x0^d, or 1
   * where atom numbers are kept.
   *
   * @return atoms per unit norm
   */
  public double atomsPerUnitNorm() {
    return atomsPerUnitNorm;
  }

  /**
   * Length to scaled units.
   *
   * @param length laboratory value
   * @return x/x0
   */
  public double toScaled(Length length) {
    return Check.notNull(length, "length").metres() / lengthUnit;
  }

  /**
   * Length to the laboratory.
   *
   * @param scaled x/x0
   * @return laboratory value
   */
  public Length length(double scaled) {
    return new Length(scaled * lengthUnit);
  }

  /**
   * Wave number to scaled units.
   *
   * @param perMetre wave number in 1/m
   * @return k x0
   */
  public double toScaledWavenumber(double perMetre) {
    return Check.finite(perMetre, "wave number in 1/m") * lengthUnit;
  }

  /**
   * Wave number to the laboratory.
   *
   * @param scaled k x0
   * @return wave number in 1/m
   */
  public double wavenumberPerMetre(double scaled) {
    return Check.finite(scaled / lengthUnit, "wave number in 1/m");
  }

  /**
   * Time to scaled units.
   *
   * @param time laboratory value
   * @return t/t0
   */
  public double toScaled(TimeSpan time) {
    return Check.notNull(time, "time").seconds() / timeUnit;
  }

  /**
   * Time to the laboratory.
   *
   * @param scaled t/t0
   * @return laboratory value
   */
  public TimeSpan time(double scaled) {
    return new TimeSpan(scaled * timeUnit);
  }

  /**
   * Frequency to scaled units, as an angular frequency.
   *
   * @param frequency laboratory value f
   * @return 2 pi f t0
   */
  public double toScaledAngular(Frequency frequency) {
    return Check.notNull(frequency, "frequency").angular() * timeUnit;
  }

  /**
   * Frequency to the laboratory.
   *
   * @param scaledAngular angular frequency in scaled units, w t0
   * @return laboratory value f = w/(2 pi)
   */
  public Frequency frequency(double scaledAngular) {
    return Frequency.ofAngular(scaledAngular / timeUnit);
  }

  /**
   * Energy per atom (mu, J, a cutoff) to scaled units.
   *
   * @param energy laboratory value
   * @return e/e0
   */
  public double toScaled(Energy energy) {
    return Check.notNull(energy, "energy").joules() / energyUnit;
  }

  /**
   * Energy per atom to the laboratory.
   *
   * @param scaled e/e0
   * @return laboratory value
   */
  public Energy energy(double scaled) {
    return new Energy(scaled * energyUnit);
  }

  /**
   * Energy of the field as a whole (a bubble, a barrier times a volume) to scaled units; it belongs
   * with the temperature, E~/T~ = E/(kB T).
   *
   * @param energy laboratory value
   * @return E/(e0 f), f the atoms per unit norm
   */
  public double toScaledFieldEnergy(Energy energy) {
    return Check.notNull(energy, "energy").joules() / (energyUnit * atomsPerUnitNorm);
  }

  /**
   * Energy of the field as a whole to the laboratory.
   *
   * @param scaled E/(e0 f)
   * @return laboratory value
   */
  public Energy fieldEnergy(double scaled) {
    return new Energy(scaled * (energyUnit * atomsPerUnitNorm));
  }

  /**
   * Temperature to scaled units.
   *
   * @param temperature laboratory value
   * @return kB T/(e0 f), f the atoms per unit norm
   */
  public double toScaled(Temperature temperature) {
    return toScaledFieldEnergy(Check.notNull(temperature, "temperature").energy());
  }

  /**
   * Temperature to the laboratory.
   *
   * @param scaled kB T/(e0 f)
   * @return laboratory value
   */
  public Temperature temperature(double scaled) {
    return fieldEnergy(scaled).asTemperature();
  }

  /**
   * Density to scaled units.
   *
   * @param density laboratory value of the same dimension
   * @return n x0^d/f, f the atoms per unit norm
   * @throws IllegalArgumentException if the dimensions differ
   */
  public double toScaled(Density density) {
    Density.requireDimension(Check.notNull(density, "density").dimension(), dimension, "density");
    return density.perMetreToD() * volumeUnit / atomsPerUnitNorm;
  }

  /**
   * Density to the laboratory.
   *
   * @param scaled n x0^d/f
   * @return laboratory value
   */
  public Density density(double scaled) {
    return new Density(scaled * atomsPerUnitNorm / volumeUnit, dimension);
  }

  /**
   * Coupling (g or kappa) to scaled units.
   *
   * @param coupling laboratory value of the same dimension
   * @return g f/(e0 x0^d), f the atoms per unit norm
   * @throws IllegalArgumentException if the dimensions differ
   */
  public double toScaled(Coupling coupling) {
    Density.requireDimension(
        Check.notNull(coupling, "coupling").dimension(), dimension, "coupling");
    return coupling.jouleMetreToD() * (atomsPerUnitNorm / volumeUnit) / energyUnit;
  }

  /**
   * Coupling to the laboratory.
   *
   * @param scaled g f/(e0 x0^d)
   * @return laboratory value
   */
  public Coupling coupling(double scaled) {
    return new Coupling(scaled * energyUnit * (volumeUnit / atomsPerUnitNorm), dimension);
  }

  /**
   * Rate, or rate per length^k for any k, to scaled units.
   *
   * @param rate laboratory value
   * @return rate times t0 x0^k
   */
  public double toScaled(EventRate rate) {
    int k = Check.notNull(rate, "rate").dimension();
    return rate.perSecondPerMetreToD() * (timeUnit * Math.pow(lengthUnit, k));
  }

  /**
   * Rate per length^d, d the dimension of the units, to the laboratory: a nucleation rate.
   *
   * @param scaled events per scaled time and scaled volume
   * @return laboratory value
   */
  public EventRate ratePerVolume(double scaled) {
    return new EventRate(scaled / (timeUnit * volumeUnit), dimension);
  }

  /**
   * Plain rate to the laboratory.
   *
   * @param scaled events per scaled time
   * @return laboratory value
   */
  public EventRate rate(double scaled) {
    return new EventRate(scaled / timeUnit, 0);
  }

  /**
   * Number of atoms to scaled norm.
   *
   * @param atoms number of atoms
   * @return integral of the scaled density
   */
  public double toScaledNorm(double atoms) {
    return Check.notNegative(atoms, "number of atoms") / atomsPerUnitNorm;
  }

  /**
   * Scaled norm to number of atoms.
   *
   * @param norm integral of the scaled density
   * @return number of atoms
   */
  public double atoms(double norm) {
    return Check.notNegative(norm, "norm") * atomsPerUnitNorm;
  }
}
