package spgpe.units;

import java.util.Optional;
import java.util.function.Consumer;
import spgpe.internal.check.Check;

/**
 * A laboratory recipe: two equal components of one species in a ring waveguide, coherently coupled.
 * Immutable; {@code with...} methods return copies. {@link #scaled} gives everything a simulation
 * needs.
 *
 * <pre>{@code
 * ScaledRing ring =
 *     RingExperiment.of(
 *             Species.K_41,
 *             Geometry.ring(Length.ofMicrometres(25)),
 *             Frequency.ofKilohertz(1.5),
 *             12_000,
 *             Length.ofBohrRadii(65.42),
 *             Temperature.ofNanokelvin(30))
 *         .withCoherentCoupling(Energy.ofHertz(8)) // J/h; levels split by 16 Hz
 *         .withBiquadratic(new Coupling(1.6e-40, 1)) // kappa in J m
 *         .scaled();
 * }</pre>
 */
public final class RingExperiment {
  private final Species species;
  private final Geometry.Ring ring;
  private final Frequency transverse;
  private final double atomsPerComponent;
  private final Length intra;
  private final Temperature temperature;
  private final Options options;

  /** What has a default; a zero stands for "not present". Changed only while being copied. */
  private static final class Options {
    private Length inter = new Length(0);
    private Energy coherent = new Energy(0);
    private Coupling biquadratic = new Coupling(0, 1);
    private Optional<Modulation> modulation = Optional.empty();
    private double damping;
    private TimeSpan runTime = new TimeSpan(0);
    private double cutoffOccupation = 1;
    private boolean confinementShift;

    Options copy() {
      Options copy = new Options();
      copy.inter = inter;
      copy.coherent = coherent;
      copy.biquadratic = biquadratic;
      copy.modulation = modulation;
      copy.damping = damping;
      copy.runTime = runTime;
      copy.cutoffOccupation = cutoffOccupation;
      copy.confinementShift = confinementShift;
      return copy;
    }
  }

  private RingExperiment(
      Species species,
      Geometry.Ring ring,
      Frequency transverse,
      double atomsPerComponent,
      Length intra,
      Temperature temperature,
      Options options) {
    this.species = species;
    this.ring = ring;
    this.transverse = transverse;
    this.atomsPerComponent = atomsPerComponent;
    this.intra = intra;
    this.temperature = temperature;
    this.options = options;
  }

  /**
   * A ring without coupling between the components.
   *
   * <p>The ranges are wide; their purpose is to catch a value given in the wrong unit.
   *
   * @param species atom, the same in both components
   * @param ring ring, circumference 0.1 um to 1 m; {@link Geometry#ring} takes the radius
   * @param transverse transverse trap frequency f_perp, 1 Hz to 10 MHz
   * @param atomsPerComponent atoms in each component, 1 to 1e10
   * @param scatteringLength scattering length within a component, greater than zero, up to 1e5 a0
   * @param temperature temperature, 1 pK to 1 mK
   * @return the recipe
   * @throws IllegalArgumentException if a value lies outside its range
   */
  public static RingExperiment of(
      Species species,
      Geometry.Ring ring,
      Frequency transverse,
      double atomsPerComponent,
      Length scatteringLength,
      Temperature temperature) {
    Check.notNull(species, "species");
    range(Check.notNull(ring, "ring").circumference().metres(), 1e-7, 1, "circumference in m");
    range(Check.notNull(transverse, "transverse").hertz(), 1, 1e7, "trap frequency in Hz");
    range(atomsPerComponent, 1, 1e10, "atoms per component");
    range(
        Check.notNull(scatteringLength, "scatteringLength").bohrRadii(),
        1e-6,
        1e5,
        "scattering length in a0 (repulsive)");
    requireTemperature(temperature);
    return new RingExperiment(
        species, ring, transverse, atomsPerComponent, scatteringLength, temperature, new Options());
  }

  /**
   * This recipe at another temperature.
   *
   * @param newTemperature temperature, 1 pK to 1 mK
   * @return the new recipe
   * @throws IllegalArgumentException if the value lies outside its range
   */
  public RingExperiment withTemperature(Temperature newTemperature) {
    requireTemperature(newTemperature);
    return new RingExperiment(
        species, ring, transverse, atomsPerComponent, intra, newTemperature, options);
  }

  /**
   * This recipe with another scattering length between the components (default 0).
   *
   * @param interScatteringLength scattering length, may be negative, magnitude up to 1e5 a0
   * @return the new recipe
   * @throws IllegalArgumentException if the value lies outside its range
   */
  public RingExperiment withInterComponent(Length interScatteringLength) {
    range(
        Check.notNull(interScatteringLength, "interScatteringLength").bohrRadii(),
        -1e5,
        1e5,
        "inter-component scattering length in a0");
    return with(o -> o.inter = interScatteringLength);
  }

  /**
   * This recipe with a coherent coupling J, half the splitting of two bare levels (default 0).
   *
   * @param coherent J, zero or h times 1 mHz to h times 1 MHz; {@link
   *     CoupledPair#coherentFromSplitting} takes the Rabi splitting
   * @return the new recipe
   * @throws IllegalArgumentException if the value lies outside its range
   */
  public RingExperiment withCoherentCoupling(Energy coherent) {
    if (Check.notNull(coherent, "coherent").joules() != 0) {
      range(coherent.hertz(), 1e-3, 1e6, "coherent coupling J/h in Hz");
    }
    return with(o -> o.coherent = coherent);
  }

  /**
   * This recipe with a given biquadratic coupling (default 0).
   *
   * @param biquadratic kappa in J m, at least zero, kappa n up to h times 10 MHz; {@link
   *     CoupledPair#biquadraticFor} takes lambda^2
   * @return the new recipe
   * @throws IllegalArgumentException if kappa is out of range or not one-dimensional, or the recipe
   *     has a modulation, which makes a kappa of its own
   */
  public RingExperiment withBiquadratic(Coupling biquadratic) {
    Density.requireDimension(
        Check.notNull(biquadratic, "biquadratic").dimension(), 1, "biquadratic coupling");
    range(biquadratic.times(density()).hertz(), 0, 1e7, "biquadratic coupling kappa n/h in Hz");
    Check.argument(
        options.modulation.isEmpty(),
        "give either a biquadratic coupling or a modulation: kappa=%s J m, %s",
        biquadratic.jouleMetreToD(),
        options.modulation);
    return with(o -> o.biquadratic = biquadratic);
  }

  /**
   * This recipe with a modulated coherent coupling, whose average over the drive is simulated.
   *
   * @param modulation drive, frequency 1 Hz to 1 GHz
   * @return the new recipe
   * @throws IllegalArgumentException if the frequency lies outside its range or the recipe has a
   *     biquadratic coupling already
   */
  public RingExperiment withModulation(Modulation modulation) {
    range(
        Check.notNull(modulation, "modulation").frequency().hertz(),
        1,
        1e9,
        "drive frequency in Hz");
    Check.argument(
        options.biquadratic.jouleMetreToD() == 0,
        "give either a biquadratic coupling or a modulation: kappa=%s J m, %s",
        options.biquadratic.jouleMetreToD(),
        modulation);
    return with(o -> o.modulation = Optional.of(modulation));
  }

  /**
   * This recipe with the damping of the planned simulation and the time it is to cover; adds the
   * verdicts on them.
   *
   * @param damping dimensionless gamma, greater than zero
   * @param runTime laboratory time, greater than zero
   * @return the new recipe
   * @throws IllegalArgumentException if a value is not positive
   */
  public RingExperiment withRun(double damping, TimeSpan runTime) {
    Check.positive(damping, "damping gamma");
    Check.positive(Check.notNull(runTime, "runTime").seconds(), "run time in s");
    return with(
        o -> {
          o.damping = damping;
          o.runTime = runTime;
        });
  }

  /**
   * This recipe with another Bose occupation at the cutoff (default 1).
   *
   * @param occupation occupation, 0.01 to 100
   * @return the new recipe
   * @throws IllegalArgumentException if the value lies outside its range
   */
  public RingExperiment withCutoffOccupation(double occupation) {
    range(occupation, 0.01, 100, "occupation at the cutoff");
    return with(o -> o.cutoffOccupation = occupation);
  }

  /**
   * This recipe with couplings that include the confinement-induced shift (default: without).
   *
   * @return the new recipe
   */
  public RingExperiment withConfinementShift() {
    return with(o -> o.confinementShift = true);
  }

  /**
   * The recipe in scaled units, with its verdicts.
   *
   * @return parameters for a simulation and the way back
   * @throws IllegalArgumentException if the mixture collapses (g + g12 at most 0), a coupling is
   *     too close to the confinement-induced resonance, or the suggested number of modes lies
   *     outside 1..1000000
   */
  public ScaledRing scaled() {
    return new ScaledRing(this);
  }

  Species species() {
    return species;
  }

  Geometry.Ring ring() {
    return ring;
  }

  Confinement confinement() {
    return Confinement.quasi1d(species, transverse);
  }

  Density density() {
    return new Density(atomsPerComponent / ring.circumference().metres(), 1);
  }

  Length intra() {
    return intra;
  }

  /**
   * The temperature of the recipe.
   *
   * @return temperature
   */
  public Temperature temperature() {
    return temperature;
  }

  Coupling intraCoupling() {
    return coupling(intra);
  }

  Coupling interCoupling() {
    return coupling(options.inter);
  }

  Energy coherent() {
    return options.coherent;
  }

  Coupling biquadratic() {
    return options.biquadratic;
  }

  /**
   * The modulation of the coherent coupling.
   *
   * @return modulation, empty if the coupling is constant
   */
  public Optional<Modulation> modulation() {
    return options.modulation;
  }

  double damping() {
    return options.damping;
  }

  TimeSpan runTime() {
    return options.runTime;
  }

  double cutoffOccupation() {
    return options.cutoffOccupation;
  }

  private Coupling coupling(Length scatteringLength) {
    return options.confinementShift
        ? confinement().shiftedCoupling(scatteringLength)
        : confinement().coupling(scatteringLength);
  }

  private RingExperiment with(Consumer<Options> change) {
    Options changed = options.copy();
    change.accept(changed);
    return new RingExperiment(
        species, ring, transverse, atomsPerComponent, intra, temperature, changed);
  }

  private static void requireTemperature(Temperature temperature) {
    range(Check.notNull(temperature, "temperature").kelvin(), 1e-12, 1e-3, "temperature in K");
  }

  private static void range(double value, double low, double high, String name) {
    Check.argument(
        value >= low && value <= high,
        "%s must lie in %s..%s: value=%s; is it in the right unit?",
        name,
        low,
        high,
        value);
  }
}
