package spgpe.theory;

import java.util.Optional;
import org.apache.commons.math3.special.BesselJ;
import spgpe.internal.check.Check;

/**
 * Coherent coupling modulated as {@code J(t) = J_0 + delta omega cos(omega t)}: the averaged
 * potential it makes and the parametric instability it causes.
 *
 * <p>Rotating the spinor by {@code exp(i sigma_x delta sin(omega t))} removes the modulation
 * exactly; the average of the rotated interaction is {@code kappa = (g/2)[1 - BesselJ_0(4 delta)]}
 * times {@code S_y^2/4}, and {@code g - kappa} replaces g in the density-difference term {@code
 * S_z^2/4}. The idea is of Fialko et al., EPL 110, 56001 (2015), J. Phys. B 50, 024003 (2017);
 * formulas derived, see {@code docs/theory-references.md}.
 *
 * <p>Exact linear problem around phase pi: {@code d eta/dt = n A phi - gamma B eta}, {@code d
 * phi/dt = -(B/n) eta - gamma A phi}, {@code A = k^2/2 - 2 J(t)}, {@code B = A + 2 g n}.
 *
 * @param g contact coupling (energy times length), greater than zero
 * @param density density n of one component (1/length), greater than zero
 * @param meanCoupling J_0 (energy), greater than zero
 * @param depth dimensionless delta, 0 to 10
 * @param frequency angular frequency omega (1/time), greater than zero
 */
public record ModulatedCoupling(
    double g, double density, double meanCoupling, double depth, double frequency) {

  /**
   * Checks the values.
   *
   * @param g contact coupling (energy times length), greater than zero
   * @param density density n of one component (1/length), greater than zero
   * @param meanCoupling J_0 (energy), greater than zero
   * @param depth dimensionless delta, 0 to 10
   * @param frequency angular frequency omega (1/time), greater than zero
   * @throws IllegalArgumentException if a value is not finite or out of range
   */
  public ModulatedCoupling {
    Check.positive(g, "g");
    Check.positive(density, "density");
    Check.positive(meanCoupling, "meanCoupling");
    Check.argument(depth >= 0 && depth <= 10, "depth must lie in [0, 10]: depth=%s", depth);
    Check.positive(frequency, "frequency");
  }

  /**
   * The same coupling at another depth.
   *
   * @param value dimensionless depth, 0 to 10
   * @return a changed copy
   */
  public ModulatedCoupling withDepth(double value) {
    return new ModulatedCoupling(g, density, meanCoupling, value, frequency);
  }

  /**
   * The same coupling at another frequency.
   *
   * @param value angular frequency (1/time), greater than zero
   * @return a changed copy
   */
  public ModulatedCoupling withFrequency(double value) {
    return new ModulatedCoupling(g, density, meanCoupling, depth, value);
  }

  /**
   * Averaged biquadratic coupling.
   *
   * @return {@code kappa = (g/2)[1 - BesselJ_0(4 delta)]}, {@code 2 g delta^2} for small depth
   */
  public double biquadraticCoupling() {
    return 0.5 * g * (1 - BesselJ.value(0, 4 * depth));
  }

  /**
   * Averaged coupling of the density difference, in the place of g in {@code (g/4) S_z^2}.
   *
   * @return {@code g - kappa = (g/2)[1 + BesselJ_0(4 delta)]}
   */
  public double imbalanceCoupling() {
    return g - biquadraticCoupling();
  }

  /**
   * Averaged barrier parameter squared.
   *
   * @return {@code kappa n/J_0}
   */
  public double lambdaSquared() {
    return biquadraticCoupling() * density / meanCoupling;
  }

  /**
   * Relative mode of the averaged problem, the limit of infinite frequency.
   *
   * @param waveNumber k (1/length), finite
   * @return frequency {@code sqrt[(K - 2 J_0 + 2 kappa n)(K - 2 J_0 + 2 (g - kappa) n)]}, {@code K
   *     = k^2/2}; a negative slow rate if the averaged vacuum is unstable
   * @throws IllegalArgumentException if k is not finite
   */
  public DampedMode averagedMode(double waveNumber) {
    double base = kinetic(waveNumber) - 2 * meanCoupling;
    return DampedMode.of(
        base + 2 * biquadraticCoupling() * density,
        base + 2 * imbalanceCoupling() * density,
        0);
  }

  /**
   * Exact Floquet exponent of the false vacuum at one wave number.
   *
   * @param waveNumber k (1/length), finite
   * @param damping dimensionless gamma, not negative
   * @return growth rate, negative if damped, and frequency modulo omega
   * @throws IllegalArgumentException if a value is out of range
   * @throws UnconvergedException if the propagator over one period does not converge
   */
  public FloquetExponent floquet(double waveNumber, double damping) {
    double k = kinetic(waveNumber);
    Check.notNegative(damping, "damping");
    double interaction = g * density;
    double drive = 2 * depth * frequency;
    double base = k - 2 * meanCoupling;
    // The mean damping -gamma (A + B)/2 has the period average below and commutes with everything.
    FloquetExponent traceless =
        Monodromy.of(
                -damping * interaction,
                t -> base - drive * Math.cos(frequency * t),
                t -> -(base + 2 * interaction - drive * Math.cos(frequency * t)),
                2 * Math.PI / frequency)
            .exponent();
    return new FloquetExponent(
        traceless.growth() - damping * (base + interaction), traceless.frequency());
  }

  /**
   * Wave number of the first parametric resonance, omega = twice the Bogoliubov frequency.
   *
   * @return k with {@code k^2/2 = sqrt(omega^2/4 + (g n)^2) - g n + 2 J_0} (1/length)
   */
  public double resonantWaveNumber() {
    return Math.sqrt(2 * resonantKinetic());
  }

  private double resonantKinetic() {
    double interaction = g * density;
    return Math.hypot(0.5 * frequency, interaction) - interaction + 2 * meanCoupling;
  }

  /**
   * Growth rate at the first resonance without damping, to leading order in 1/omega.
   *
   * @return {@code g n BesselJ_1(4 delta)}, about {@code 2 delta g n} (1/time)
   */
  public double resonantGrowthRate() {
    return g * density * Math.abs(BesselJ.value(1, 4 * depth));
  }

  /**
   * Damping that stops the first resonance, to leading order in 1/omega.
   *
   * @return {@code gamma = g n BesselJ_1(4 delta)/(K_res + g n - 2 J_0)}
   */
  public double dampingForStability() {
    return resonantGrowthRate() / (resonantKinetic() + g * density - 2 * meanCoupling);
  }

  /**
   * Largest momentum cutoff that leaves the first resonance outside the kept modes.
   *
   * @return k_c with {@code k_c^2/2 = K_res - g n BesselJ_1(4 delta)} (1/length), zero if there is
   *     none
   */
  public double cutoffForStability() {
    return Math.sqrt(2 * Math.max(0, resonantKinetic() - resonantGrowthRate()));
  }

  /**
   * First instability band from exact Floquet exponents.
   *
   * @param damping dimensionless gamma, not negative
   * @return the band, or empty if damping closes it
   * @throws IllegalArgumentException if the damping is out of range
   * @throws UnconvergedException if a propagator does not converge
   */
  public Optional<InstabilityBand> firstBand(double damping) {
    Check.notNegative(damping, "damping");
    double width = Math.max(resonantGrowthRate(), 1e-9);
    double centre = resonantKinetic();
    double best = Double.NEGATIVE_INFINITY;
    double low = Math.max(0, centre - 3 * width);
    double high = centre + 3 * width;
    double peak = centre;
    for (int i = 0; i <= 60; i++) {
      double k = low + (high - low) * i / 60;
      double growth = growthAt(k, damping);
      if (growth > best) {
        best = growth;
        peak = k;
      }
    }
    peak = maximise(peak - width / 5, peak + width / 5, damping);
    best = growthAt(peak, damping);
    if (!(best > 1e-10)) {
      return Optional.empty();
    }
    double lower = edge(peak, low, damping);
    double upper = edge(peak, high, damping);
    return Optional.of(
        new InstabilityBand(
            Math.sqrt(2 * lower), Math.sqrt(2 * upper), Math.sqrt(2 * peak), best));
  }

  private double growthAt(double kinetic, double damping) {
    return floquet(Math.sqrt(2 * Math.max(0, kinetic)), damping).growth();
  }

  private double maximise(double from, double to, double damping) {
    double ratio = 0.5 * (Math.sqrt(5) - 1);
    double a = from;
    double b = to;
    for (int i = 0; i < 40; i++) {
      double left = b - ratio * (b - a);
      double right = a + ratio * (b - a);
      if (growthAt(left, damping) > growthAt(right, damping)) {
        b = right;
      } else {
        a = left;
      }
    }
    return 0.5 * (a + b);
  }

  private double edge(double inside, double outside, double damping) {
    double in = inside;
    double out = outside;
    for (int i = 0; i < 50; i++) {
      double middle = 0.5 * (in + out);
      if (growthAt(middle, damping) > 1e-12) {
        in = middle;
      } else {
        out = middle;
      }
    }
    return 0.5 * (in + out);
  }

  /**
   * Largest growth rate among the modes kept on a ring.
   *
   * @param ring length and cutoff
   * @param damping dimensionless gamma, not negative
   * @return the rate (1/time); the false vacuum is stable under the modulation if it is not
   *     positive
   * @throws IllegalArgumentException if a value is out of range
   * @throws UnconvergedException if a propagator does not converge
   */
  public double largestGrowth(RingModes ring, double damping) {
    Check.notNull(ring, "ring");
    double largest = Double.NEGATIVE_INFINITY;
    for (int n = 0; n <= ring.cutoffMode(); n++) {
      largest = Math.max(largest, floquet(ring.waveNumber(n), damping).growth());
    }
    return largest;
  }

  /**
   * Growth rates over wave number and frequency.
   *
   * @param waveNumbers values of k (1/length)
   * @param frequencies values of omega (1/time), greater than zero
   * @param damping dimensionless gamma, not negative
   * @return growth rate as [frequency][wave number] (1/time)
   * @throws IllegalArgumentException if a value is out of range
   * @throws UnconvergedException if a propagator does not converge
   */
  public double[][] growthOverFrequency(
      double[] waveNumbers, double[] frequencies, double damping) {
    Check.notNull(frequencies, "frequencies");
    double[][] map = new double[frequencies.length][];
    for (int i = 0; i < map.length; i++) {
      map[i] = withFrequency(frequencies[i]).growthRates(waveNumbers, damping);
    }
    return map;
  }

  /**
   * Growth rates over wave number and depth.
   *
   * @param waveNumbers values of k (1/length)
   * @param depths values of delta, 0 to 10
   * @param damping dimensionless gamma, not negative
   * @return growth rate as [depth][wave number] (1/time)
   * @throws IllegalArgumentException if a value is out of range
   * @throws UnconvergedException if a propagator does not converge
   */
  public double[][] growthOverDepth(double[] waveNumbers, double[] depths, double damping) {
    Check.notNull(depths, "depths");
    double[][] map = new double[depths.length][];
    for (int i = 0; i < map.length; i++) {
      map[i] = withDepth(depths[i]).growthRates(waveNumbers, damping);
    }
    return map;
  }

  private double[] growthRates(double[] waveNumbers, double damping) {
    Check.notNull(waveNumbers, "waveNumbers");
    double[] rates = new double[waveNumbers.length];
    for (int i = 0; i < rates.length; i++) {
      rates[i] = floquet(waveNumbers[i], damping).growth();
    }
    return rates;
  }

  /**
   * Exponent of the Mathieu equation that the problem becomes for {@code g n} much larger than
   * {@code k^2/2}, J_0 and delta omega, with {@code z = omega t/2}, {@code a = 8 g n (k^2/2 - 2
   * J_0)/omega^2}, {@code |q| = 8 g n delta/omega}.
   *
   * @param waveNumber k (1/length), finite
   * @return growth rate and frequency per unit time
   * @throws IllegalArgumentException if k is not finite
   */
  public FloquetExponent mathieuLimit(double waveNumber) {
    double interaction = g * density;
    double a = 8 * interaction * (kinetic(waveNumber) - 2 * meanCoupling) / (frequency * frequency);
    FloquetExponent perZ = Mathieu.exponent(a, 8 * interaction * depth / frequency);
    double scale = 0.5 * frequency;
    return new FloquetExponent(perZ.growth() * scale, perZ.frequency() * scale);
  }

  private static double kinetic(double waveNumber) {
    return 0.5 * Check.finite(waveNumber, "waveNumber") * waveNumber;
  }
}
