package spgpe.units;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import spgpe.internal.check.Check;

/**
 * A {@link RingExperiment} in scaled units: what a simulation of it needs, verdicts on the
 * reduction, and through {@link #units} the way back. Immutable.
 *
 * <p>The field is divided by sqrt(n0), n0 the density of one component in the metastable state, and
 * energies are in g n0 with the bare g. Hence the metastable density is 1 and g~ is 1, unless the
 * coupling is modulated: averaging moves kappa/2 from g to g12. Always mu~ = 1 + g12~(bare) + J~.
 */
public final class ScaledRing {
  private final ScaledUnits units;
  private final UniformGas gas;
  private final ThermalBath bath;
  private final Optional<CoupledPair> pair;
  private final List<Verdict> verdicts;
  private final double length;
  private final double g;
  private final double inter;
  private final double coherent;
  private final double biquadratic;
  private final double mu;
  private final double temperature;
  private final double cutoffWavenumber;
  private final int cutoffModes;

  ScaledRing(RingExperiment lab) {
    Coupling bare = lab.intraCoupling();
    Coupling bareInter = lab.interCoupling();
    Density density = lab.density();
    gas = UniformGas.of(lab.species(), bare, density);
    units = ScaledUnits.dividingByDensity(lab.species(), gas.chemicalPotential(), density);
    Energy chemicalPotential =
        new Energy(
            Check.positive(
                    bare.times(density).joules() + bareInter.times(density).joules(),
                    "(g + g12) n (else the mixture collapses) in J")
                + lab.coherent().joules());
    Optional<Modulation> drive = lab.modulation();
    Coupling g1 = drive.map(m -> m.averagedIntra(bare, bareInter)).orElse(bare);
    Coupling g12 = drive.map(m -> m.averagedInter(bare, bareInter)).orElse(bareInter);
    Coupling kappa = drive.map(m -> m.biquadratic(bare, bareInter)).orElse(lab.biquadratic());
    length = units.toScaled(lab.ring().circumference());
    g = units.toScaled(g1);
    inter = units.toScaled(g12);
    coherent = units.toScaled(lab.coherent());
    biquadratic = units.toScaled(kappa);
    mu = units.toScaled(chemicalPotential);
    temperature = units.toScaled(lab.temperature());
    bath =
        ThermalBath.of(
            lab.species(),
            lab.intra(),
            lab.temperature(),
            chemicalPotential,
            ThermalBath.cutoffEnergy(chemicalPotential, lab.temperature(), lab.cutoffOccupation()));
    cutoffWavenumber = Math.sqrt(2 * units.toScaled(bath.cutoff()));
    double modes = Math.floor(cutoffWavenumber * length / (2 * Math.PI));
    Check.argument(
        modes >= 1 && modes <= 1_000_000,
        "the cutoff mode number must lie in 1..1000000: k_cut L/(2 pi)=%s; the ring is too short or"
            + " too long for its healing length",
        modes);
    cutoffModes = (int) modes;
    pair =
        lab.coherent().joules() > 0
            ? Optional.of(CoupledPair.of(lab.species(), g1, g12, density, lab.coherent(), kappa))
            : Optional.empty();
    verdicts = List.copyOf(new RingVerdicts(lab, this).all());
  }

  /**
   * The conversions both ways.
   *
   * @return units that divide the field by sqrt(n0), energies in g n0
   */
  public ScaledUnits units() {
    return units;
  }

  /**
   * One component with its bare coupling.
   *
   * @return gas in laboratory units
   */
  public UniformGas gas() {
    return gas;
  }

  /**
   * The thermal cloud above the suggested cutoff; its growth rate is the kinetic estimate of gamma.
   *
   * @return bath in laboratory units
   */
  public ThermalBath bath() {
    return bath;
  }

  /**
   * The coupled pair, with averaged couplings if modulated.
   *
   * @return pair in laboratory units, empty without coherent coupling
   */
  public Optional<CoupledPair> pair() {
    return pair;
  }

  /**
   * The verdicts on reduction, cutoff, metastability, modulation and damping, as far as they apply.
   *
   * @return verdicts
   */
  public List<Verdict> verdicts() {
    return verdicts;
  }

  /**
   * The circumference.
   *
   * @return L/x0
   */
  public double length() {
    return length;
  }

  /**
   * The coupling within a component.
   *
   * @return g~; 1, or 1 - kappa~/2 if the coupling is modulated
   */
  public double g() {
    return g;
  }

  /**
   * The coupling between the components.
   *
   * @return g12~, plus kappa~/2 if the coupling is modulated
   */
  public double inter() {
    return inter;
  }

  /**
   * The coherent coupling.
   *
   * @return J~
   */
  public double coherent() {
    return coherent;
  }

  /**
   * The biquadratic coupling, in kappa (Im psi1* psi2)^2.
   *
   * @return kappa~
   */
  public double biquadratic() {
    return biquadratic;
  }

  /**
   * The chemical potential that holds density 1 at relative phase pi.
   *
   * @return mu~ = 1 + g12~ + J~ with the bare g12
   */
  public double mu() {
    return mu;
  }

  /**
   * The temperature.
   *
   * @return T~ = kB T/(e0 n0 x0)
   */
  public double temperature() {
    return temperature;
  }

  /**
   * The cutoff wave number, from a kinetic energy equal to the cutoff energy.
   *
   * @return k_cut x0
   */
  public double cutoffWavenumber() {
    return cutoffWavenumber;
  }

  /**
   * The suggested highest mode number: modes -n_c to n_c lie within the cutoff.
   *
   * @return n_c
   */
  public int cutoffModes() {
    return cutoffModes;
  }

  /**
   * The suggested number of grid points: the smallest even number of at least 4 n_c + 1 without a
   * prime factor above 5, so that the cubic force does not alias.
   *
   * @return number of points
   */
  public int gridPoints() {
    int points = 4 * cutoffModes + 2;
    while (!isSmooth(points)) {
      points += 2;
    }
    return points;
  }

  /**
   * The scaled parameters in a few lines for a log.
   *
   * @return parameters and verdicts
   */
  public String describe() {
    StringBuilder text = new StringBuilder();
    text.append(
        String.format(
            Locale.ROOT,
            "scaled: L=%.8g g=%.8g g12=%.8g J=%.8g kappa=%.8g mu=%.8g T=%.8g%n",
            length,
            g,
            inter,
            coherent,
            biquadratic,
            mu,
            temperature));
    text.append(
        String.format(
            Locale.ROOT,
            "cutoff: k=%.8g modes=%d points=%d; kinetic gamma=%.2g%n",
            cutoffWavenumber,
            cutoffModes,
            gridPoints(),
            bath.growthRate()));
    text.append(
        String.format(
            Locale.ROOT,
            "units: x0=%.8g um t0=%.8g ms e0/h=%.8g Hz n0=%.8g /um%n",
            units.lengthUnit().micrometres(),
            units.timeUnit().milliseconds(),
            units.energyUnit().hertz(),
            gas.density().perMetreToD() * 1e-6));
    List<Verdict> worstFirst = new ArrayList<>(verdicts);
    worstFirst.sort((one, other) -> other.grade().compareTo(one.grade()));
    worstFirst.forEach(verdict -> text.append(verdict).append(System.lineSeparator()));
    return text.toString();
  }

  private static boolean isSmooth(int number) {
    int rest = number;
    for (int prime : new int[] {2, 3, 5}) {
      while (rest % prime == 0) {
        rest /= prime;
      }
    }
    return rest == 1;
  }
}
