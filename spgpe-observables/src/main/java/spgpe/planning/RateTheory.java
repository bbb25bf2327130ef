package spgpe.planning;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import spgpe.theory.CoupledPair;
import spgpe.theory.CriticalBubble;
import spgpe.theory.DecayRate;
import spgpe.theory.PhaseBubble;
import spgpe.theory.PhaseDecayRate;
import spgpe.theory.Prediction;
import spgpe.theory.RingModes;
import spgpe.theory.UnconvergedException;
import spgpe.units.EventRate;
import spgpe.units.ScaledRing;

/**
 * The best available rate theory for a ring at given modes and damping, at any temperature: ln Gamma
 * = constant - ln(T)/2 - E_b/T in scaled units. Immutable.
 */
final class RateTheory {
  static final double LOWEST_BARRIER = 4;
  static final double HIGHEST_BARRIER = 500;

  /** Largest mode number of a saddle that is solved on the ring itself. */
  private static final int MOST_MODES = 200;

  /** Modes of the shorter ring that stands for one with more than that, where it holds the bubble. */
  private static final int SHORTENED_MODES = 128;

  private static final int FEWEST_MODES = 4;
  private static final double THINNEST_WALL = 20;

  /** Allowed deviation of the phase from pi opposite the bubble, rad; the saddle refuses 0.02. */
  private static final double EDGE = 0.015;

  private final ScaledRing ring;
  private final double damping;
  private final ExpectedRate.Basis basis;
  private final double barrier;
  private final double closedBarrier;
  private final double logConstant;
  private final @Nullable CriticalBubble bubble;
  private final @Nullable DecayRate own;
  private final List<String> remarks;

  private RateTheory(
      ScaledRing ring,
      double damping,
      ExpectedRate.Basis basis,
      double barrier,
      double closedBarrier,
      double logConstant,
      @Nullable CriticalBubble bubble,
      @Nullable DecayRate own,
      List<String> remarks) {
    this.ring = ring;
    this.damping = damping;
    this.basis = basis;
    this.barrier = barrier;
    this.closedBarrier = closedBarrier;
    this.logConstant = logConstant;
    this.bubble = bubble;
    this.own = own;
    this.remarks = remarks;
  }

  /** Why there is no theory for this ring at any temperature, if so. */
  static Optional<NoRate> obstacle(ScaledRing ring) {
    double j = ring.coherent();
    double kappa = ring.biquadratic();
    double relative = ring.g() - ring.inter();
    if (!(j > 0 && Math.sqrt(kappa / j) > 1 && relative > j)) {
      return refusal(
          NoRate.Reason.NOT_METASTABLE,
          "no metastable state: kappa n > J > 0 and (g - g12) n > J are needed (energies in g n):"
              + " kappa n=%.4g, J=%.4g, (g - g12) n=%.4g; raise lambda^2 above 1 or lower J",
          kappa, j, relative);
    }
    if (kappa >= relative) {
      return refusal(
          NoRate.Reason.NOT_COVERED,
          "the bubble of the relative phase needs kappa < g - g12 (else the pair passes through a"
              + " density difference, which is not covered): kappa=%.4g, g - g12=%.4g in units of"
              + " g; lower lambda^2 or J",
          kappa, relative);
    }
    if (Math.sqrt(kappa / j) > THINNEST_WALL) {
      return refusal(
          NoRate.Reason.NOT_COVERED,
          "lambda^2 = kappa n/J must be <= %.0f for the bubble to be resolved: lambda^2=%.4g; raise"
              + " J or lower kappa",
          THINNEST_WALL * THINNEST_WALL, kappa / j);
    }
    double needed = shortestLength(ring);
    if (ring.length() < needed) {
      return refusal(
          NoRate.Reason.RING_TOO_SHORT,
          "the ring must hold the bubble and its surroundings: L=%.4g, needed %.4g in units of x0;"
              + " take a larger ring or a larger J",
          ring.length(), needed);
    }
    return Optional.empty();
  }

  private static Optional<NoRate> refusal(
      NoRate.Reason reason, String format, Object... values) {
    return Optional.of(new NoRate(reason, String.format(Locale.ROOT, format, values)));
  }

  /** Length at which the closed profile comes back to pi within the edge tolerance. */
  static double shortestLength(ScaledRing ring) {
    double root = Math.sqrt(ring.biquadratic() / ring.coherent() - 1);
    double mass = 2 * Math.sqrt(ring.coherent()) * root;
    double ratio = root / Math.tan(EDGE / 2);
    return 2 * Math.log(ratio + Math.sqrt(Math.max(0, ratio * ratio - 1))) / mass;
  }

  /** The theory of a ring without {@link #obstacle}. */
  static RateTheory of(ScaledRing ring, int modes, double damping) {
    List<String> remarks = new ArrayList<>();
    CriticalBubble bubble = bubble(ring, modes, remarks);
    PhaseBubble closed =
        PhaseBubble.of(
            1, ring.coherent(), Math.sqrt(ring.biquadratic() / ring.coherent()));
    if (bubble != null && ring.inter() == 0) {
      double temperature = ring.temperature();
      DecayRate rate = DecayRate.of(bubble, temperature, damping);
      double constant = Math.log(rate.prefactor()) + 0.5 * Math.log(temperature);
      return new RateTheory(
          ring, damping, ExpectedRate.Basis.FULL_SADDLE, bubble.energy(), closed.energy(),
          constant + Math.log(ring.length()), bubble, rate, remarks);
    }
    double constant = Math.log(ring.length()) + closedLogPrefactor(ring, closed, damping);
    if (bubble != null) {
      remarks.add(
          String.format(
              Locale.ROOT,
              "coupling between the components: g12=%.3g g; the barrier is that of the full saddle"
                  + " with g + g12 (both components have the same density there), the prefactor"
                  + " that of the relative phase alone",
              ring.inter()));
      return new RateTheory(
          ring, damping, ExpectedRate.Basis.SADDLE_BARRIER, bubble.energy(), closed.energy(),
          constant, null, null, remarks);
    }
    return new RateTheory(
        ring, damping, ExpectedRate.Basis.CLOSED_FORM, closed.energy(), closed.energy(), constant,
        null, null, remarks);
  }

  private static double shortened(ScaledRing ring, int modes, int fewer) {
    return ring.length() * (fewer + 0.5) / (modes + 0.5);
  }

  private static @Nullable CriticalBubble bubble(
      ScaledRing ring, int modes, List<String> remarks) {
    double sum = ring.g() + ring.inter();
    if (modes < FEWEST_MODES || ring.biquadratic() >= sum) {
      remarks.add(
          String.format(
              Locale.ROOT,
              "the full saddle needs at least %d modes and kappa < g + g12: modes=%d, kappa=%.3g,"
                  + " g + g12=%.3g; closed form with fixed density instead, barrier too high",
              FEWEST_MODES, modes, ring.biquadratic(), sum));
      return null;
    }
    RingModes kept = new RingModes(ring.length(), modes);
    if (modes > MOST_MODES) {
      int fewer = SHORTENED_MODES;
      if (shortened(ring, modes, fewer) < shortestLength(ring)) {
        fewer = MOST_MODES;
      }
      kept = new RingModes(shortened(ring, modes, fewer), fewer);
      if (kept.length() < shortestLength(ring)) {
        remarks.add(
            String.format(
                Locale.ROOT,
                "the full saddle takes at most %d modes and a ring shortened to them would not hold"
                    + " the bubble: modes=%d; closed form with fixed density instead, barrier too"
                    + " high",
                MOST_MODES, modes));
        return null;
      }
      remarks.add(
          String.format(
              Locale.ROOT,
              "rate per length taken from a shorter ring with the same cutoff: L=%.4g x0, %d modes",
              kept.length(), fewer));
    }
    try {
      return CriticalBubble.of(
          new CoupledPair(sum, ring.mu(), ring.coherent(), ring.biquadratic(), 1), kept);
    } catch (UnconvergedException | IllegalArgumentException e) {
      remarks.add(
          "the full saddle was not found (" + e.getMessage()
              + "); closed form with fixed density instead, barrier too high");
      return null;
    }
  }

  /**
   * Static part of the overdamped rate of the phase, with the growth rate of the phase coupled to
   * the density difference: A = 2 J e_-, B = 2 ((g - g12) n - J), eigenvalue of [[-gamma B, A], [-B,
   * -gamma A]]. Derived, see docs/planning.md.
   */
  private static double closedLogPrefactor(
      ScaledRing ring, PhaseBubble closed, double damping) {
    double j = ring.coherent();
    PhaseDecayRate unit = PhaseDecayRate.of(closed, closed.energy()); // E_b/T = 1
    double eigenvalue = unit.negativeEigenvalue();
    double a = 2 * j * eigenvalue;
    double b = 2 * (ring.g() - ring.inter() - j);
    double friction = damping * (a + b);
    double growth =
        0.5
            * (-friction
                + Math.sqrt(friction * friction - 4 * (1 + damping * damping) * a * b));
    double perLength =
        unit.perLength() * Math.E / Math.abs(eigenvalue) * 2 * Math.sqrt(j) * growth;
    return Math.log(perLength) + 0.5 * Math.log(closed.energy());
  }

  /** Logarithm of the scaled rate of the whole ring. */
  double logRate(double temperature) {
    return logConstant - 0.5 * Math.log(temperature) - barrier / temperature;
  }

  double barrier() {
    return barrier;
  }

  /** Why there is no rate at this temperature, if so. */
  Optional<NoRate> obstacleAt(double temperature) {
    double ratio = barrier / temperature;
    if (!(ratio >= LOWEST_BARRIER)) {
      return refusal(
          NoRate.Reason.BARRIER_TOO_LOW,
          "E_b/T must be >= %.0f for a decay over a barrier: E_b/T=%.3g; lower the temperature or"
              + " raise J or lambda^2",
          LOWEST_BARRIER, ratio);
    }
    if (ratio > HIGHEST_BARRIER) {
      return refusal(
          NoRate.Reason.BARRIER_TOO_HIGH,
          "E_b/T must be <= %.0f: E_b/T=%.4g, the state does not decay thermally in any experiment;"
              + " raise the temperature or lower J or lambda^2",
          HIGHEST_BARRIER, ratio);
    }
    return Optional.empty();
  }

  /** The rate at a scaled temperature without {@link #obstacleAt}. */
  ExpectedRate at(double temperature) {
    double ratio = barrier / temperature;
    EventRate rate = ring.units().rate(Math.exp(logRate(temperature)));
    List<String> all = new ArrayList<>(remarks);
    double low;
    double high;
    CriticalBubble saddle = bubble;
    DecayRate known = own;
    if (saddle != null && known != null) {
      DecayRate here =
          temperature == ring.temperature()
              ? known
              : DecayRate.of(saddle, temperature, damping);
      Prediction prediction = here.prediction();
      low = prediction.lowRatio();
      high = prediction.highRatio();
      all.addAll(prediction.warnings());
    } else if (basis == ExpectedRate.Basis.SADDLE_BARRIER) {
      low = 0.2;
      high = 3;
    } else {
      // density response lowers the barrier by less than kappa/(g + g12) of it
      low = 0.2;
      double softening =
          Math.min(1, ring.biquadratic() / (ring.g() + ring.inter()));
      high = 3 * Math.exp(Math.min(600, softening * ratio));
    }
    return new ExpectedRate(
        basis, rate, ratio, closedBarrier / temperature, low, high, all);
  }
}
