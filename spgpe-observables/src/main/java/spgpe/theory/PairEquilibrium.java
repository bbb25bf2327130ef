package spgpe.theory;

import java.util.EnumMap;
import java.util.Map;
import spgpe.internal.check.Check;

/**
 * Exact classical-field equilibrium of two coupled components in one dimension, infinite line or
 * ring, without momentum cutoff; {@link #withCutoff} adds the leading effect of a cutoff.
 *
 * <p>Transfer operator of a particle in four dimensions, in units of {@code (g T)^(1/3)}: {@code h
 * = sum_j (-Laplacian_j/2 + s_j^4/2 - alpha s_j^2) - J' (s_1^* s_2 + c.c.) + kappa' (|s_1|^2
 * |s_2|^2/2 - (s_1^*2 s_2^2 + c.c.)/4)}, {@code J' = J/(g T)^(2/3)}, {@code kappa' = kappa/g}, on
 * products of the single-component radial eigenstates. The total angular momentum M (global phase)
 * is conserved: the ground state has M = 0, the first-order coherence decays through M = 1, and the
 * ring is the trace over all M.
 *
 * <p>Sources: Scalapino, Sears, Ferrell, Phys. Rev. B 6, 3409 (1972) for the method; two coupled
 * fields: Beck, Mazets, Schweigler, Phys. Rev. A 98, 023613 (2018). Immutable.
 */
public final class PairEquilibrium {
  private static final double TOLERANCE = 2e-8;
  private static final double LENGTH_TOLERANCE = 1e-5;
  private static final int FEWEST_STATES = 6;
  private static final int LARGEST_STATES = 18;
  private static final int SMALLEST_WIDTH = 8;
  private static final int LARGEST_WIDTH = 64;
  private static final int MOST_STATES = 6;
  private static final int LARGEST_SECTOR = 20;
  /** States with a smaller Boltzmann weight than exp(-24) are left out of the ring trace. */
  private static final double LARGEST_EXPONENT = 24;

  private final CoupledPair pair;
  private final double unit;
  private final double amplitudeSquared;
  private final int states;
  private final int halfWidth;
  private final double groundEnergy;
  private final PairAverages averages;
  private final double lengthError;
  private final Map<PairSolver.Channel, CorrelationFunction> correlations;

  private PairEquilibrium(CoupledPair pair) {
    this.pair = pair;
    unit = Math.cbrt(pair.g() * pair.temperature());
    amplitudeSquared = Math.cbrt(pair.temperature() * pair.temperature() / pair.g());
    double largest = Math.abs(alpha()) + pair.coherentCoupling() / (unit * unit);
    Check.argument(
        largest <= 40,
        "(|mu| + J)/(g T)^(2/3) must be <= 40: it is %s (mu=%s, J=%s, g=%s, temperature=%s); at"
            + " lower temperature use GaussianFluctuations",
        largest, pair.mu(), pair.coherentCoupling(), pair.g(), pair.temperature());
    int k = FEWEST_STATES;
    int width = startingWidth(pair);
    PairSolver solver = solver(k, width, 1);
    PairSolver.State ground = solver.ground(0);
    PairAverages current = solver.averages(0, ground.vector);
    double error = 0;
    int previousWidth = width;
    // First the angular momenta, then the radial states, each until the averages stand.
    for (boolean radial = false; ; ) {
      int nextStates = radial ? k + 2 : k;
      int nextWidth = radial ? width : width + 3 + width / 8;
      PairAverages previous = current;
      previousWidth = radial ? previousWidth : width;
      solver = solver(nextStates, nextWidth, 1);
      ground = solver.ground(0);
      current = solver.averages(0, ground.vector);
      double change = current.largestDifference(previous);
      k = nextStates;
      width = nextWidth;
      if (change <= TOLERANCE) {
        error += change;
        if (radial) {
          break;
        }
        radial = true;
      } else if (k >= LARGEST_STATES || width >= LARGEST_WIDTH) {
        throw new UnconvergedException(
            "the two-component basis is not converged: relative change " + change + " > "
                + TOLERANCE + " with " + k + " radial states and angular momenta up to " + width
                + " for " + pair + "; raise the temperature or lower coherentCoupling and"
                + " biquadraticCoupling");
      }
    }
    states = k;
    halfWidth = width;
    groundEnergy = ground.energy;
    averages = scaled(current, error);
    correlations = new EnumMap<>(PairSolver.Channel.class);
    PairSolver reduced = solver(states - 2, previousWidth, 1);
    PairSolver.State reducedGround = reduced.ground(0);
    double lengthChange = 0;
    for (PairSolver.Channel channel : PairSolver.Channel.values()) {
      CorrelationFunction correlation = solver.correlation(channel, ground);
      double other = reduced.correlation(channel, reducedGround).slowestRate();
      lengthChange = Math.max(lengthChange, Math.abs(other / correlation.slowestRate() - 1));
      double weight =
          channel == PairSolver.Channel.FIELD
              ? amplitudeSquared
              : amplitudeSquared * amplitudeSquared;
      correlations.put(channel, correlation.scaled(weight, unit));
    }
    lengthError = lengthChange;
    if (!(lengthError <= LENGTH_TOLERANCE)) {
      throw new UnconvergedException(
          "the correlation lengths are not converged: relative change " + lengthError + " > "
              + LENGTH_TOLERANCE + " for " + pair + "; raise the temperature");
    }
  }

  /**
   * Solves for the infinite line.
   *
   * @param pair parameters
   * @return the equilibrium
   * @throws IllegalArgumentException if {@code (|mu| + J)/(g T)^(2/3) > 40}
   * @throws UnconvergedException if the largest basis is too small
   */
  public static PairEquilibrium of(CoupledPair pair) {
    return new PairEquilibrium(Check.notNull(pair, "pair"));
  }

  private double alpha() {
    return pair.mu() / (unit * unit);
  }

  /** Angular momentum spreads as 1/(2 sigma) for a phase of standard deviation sigma. */
  private static int startingWidth(CoupledPair pair) {
    double n = pair.trueVacuumDensity();
    double massSquared = 4 * (pair.coherentCoupling() + pair.biquadraticCoupling() * n);
    if (!(n > 0 && massSquared > 0)) {
      return SMALLEST_WIDTH;
    }
    double sigma = Math.sqrt(pair.temperature() / (n * Math.sqrt(massSquared)));
    return (int) Math.max(SMALLEST_WIDTH, Math.min(2.2 / sigma, 0.8 * LARGEST_WIDTH));
  }

  private PairSolver solver(int radialStates, int width, int largestSector) {
    return new PairSolver(
        alpha(),
        pair.coherentCoupling() / (unit * unit),
        pair.biquadraticCoupling() / pair.g(),
        radialStates,
        width,
        largestSector);
  }

  private PairAverages scaled(PairAverages raw, double error) {
    double square = amplitudeSquared * amplitudeSquared;
    return new PairAverages(
        raw.density() * amplitudeSquared,
        raw.coherence() * amplitudeSquared,
        raw.sySquared() * square,
        raw.densityProduct() * square,
        raw.densitySquared() * square,
        error);
  }

  /**
   * Parameters of this equilibrium.
   *
   * @return the parameters
   */
  public CoupledPair pair() {
    return pair;
  }

  /**
   * Averages on the infinite line.
   *
   * @return the averages with the relative change at the last basis refinement
   */
  public PairAverages averages() {
    return averages;
  }

  /**
   * Grand potential per length relative to that of the free fields, {@code -T ln Z/L}.
   *
   * @return T times the ground-state energy of the transfer operator (energy/length)
   */
  public double freeEnergyPerLength() {
    return pair.temperature() * unit * groundEnergy;
  }

  /**
   * Correlation of {@code S_y = 2 Im psi_1^* psi_2}, the relative-phase channel.
   *
   * @return {@code <S_y(x) S_y(0)>} (1/length squared)
   */
  public CorrelationFunction syCorrelation() {
    return correlation(PairSolver.Channel.IMAGINARY_COHERENCE);
  }

  /**
   * Correlation of the density difference {@code n_1 - n_2}.
   *
   * @return {@code <(n_1-n_2)(x) (n_1-n_2)(0)>} (1/length squared)
   */
  public CorrelationFunction imbalanceCorrelation() {
    return correlation(PairSolver.Channel.IMBALANCE);
  }

  /**
   * Connected correlation of {@code Re psi_1^* psi_2}.
   *
   * @return {@code <C(x) C(0)> - <C>^2} with {@code C = Re psi_1^* psi_2} (1/length squared)
   */
  public CorrelationFunction coherenceCorrelation() {
    return correlation(PairSolver.Channel.COHERENCE);
  }

  /**
   * First-order correlation of one component, not normalised.
   *
   * @return {@code <psi_1^*(x) psi_1(0)>} (1/length)
   */
  public CorrelationFunction fieldCorrelation() {
    return correlation(PairSolver.Channel.FIELD);
  }

  /**
   * Largest relative change of the four correlation lengths when both basis sizes are reduced by
   * one step; the error of the lengths reported here is smaller.
   *
   * @return the relative change
   */
  public double lengthError() {
    return lengthError;
  }

  private CorrelationFunction correlation(PairSolver.Channel channel) {
    CorrelationFunction found = correlations.get(channel);
    if (found == null) {
      throw new IllegalStateException("no correlation function for " + channel);
    }
    return found;
  }

  /**
   * Averages on a ring: {@code sum_s exp(-E_s L) O_ss / sum_s exp(-E_s L)} over the states of both
   * exchange classes and all total angular momenta with a weight above exp(-24).
   *
   * @param length circumference L (length), greater than zero
   * @return the averages
   * @throws IllegalArgumentException if the length is not finite and positive
   * @throws UnconvergedException if the ring is so short that too many states matter
   */
  public PairAverages onRing(double length) {
    double scaledLength = Check.positive(length, "length") * unit;
    double limit = groundEnergy + LARGEST_EXPONENT / scaledLength;
    double gap = fieldCorrelation().slowestRate() / unit;
    // Sector energies grow between M (ideal gas) and M^2 (quasi-condensate): a lower bound.
    int expected = 2 + (int) Math.ceil(Math.sqrt((limit - groundEnergy) / gap));
    if (expected > LARGEST_SECTOR + 2) {
      throw tooShort(length);
    }
    PairSolver solver = solver(states, halfWidth, Math.min(expected, LARGEST_SECTOR));
    double[] sums = new double[6];
    for (int total = 0; ; total++) {
      if (total > LARGEST_SECTOR) {
        throw tooShort(length);
      }
      if (total > expected) {
        expected = Math.min(2 * expected, LARGEST_SECTOR);
        solver = solver(states, halfWidth, expected);
      }
      if (addSector(solver, total, limit, scaledLength, sums) == 0) {
        break;
      }
    }
    PairAverages raw =
        new PairAverages(
            sums[1] / sums[0],
            sums[2] / sums[0],
            sums[3] / sums[0],
            sums[4] / sums[0],
            sums[5] / sums[0],
            0);
    return scaled(raw, averages.truncationError() + Math.exp(-LARGEST_EXPONENT));
  }

  private UnconvergedException tooShort(double length) {
    return new UnconvergedException(
        "the ring is too short for its coherence length: more than " + LARGEST_SECTOR
            + " angular-momentum sectors matter at length=" + length + ", coherence length "
            + fieldCorrelation().decayLength() + "; use a longer ring or a higher temperature");
  }

  private int addSector(
      PairSolver solver, int total, double limit, double length, double[] sums) {
    int count = 0;
    for (boolean odd : new boolean[] {false, true}) {
      for (PairSolver.State state : solver.below(total, odd, limit, MOST_STATES)) {
        PairAverages a = solver.averages(total, state.vector);
        double weight =
            (total == 0 ? 1 : 2) * Math.exp(-(state.energy - groundEnergy) * length);
        double[] values = {
          1, a.density(), a.coherence(), a.sySquared(), a.densityProduct(), a.densitySquared()
        };
        VectorMath.add(sums, weight, values);
        count++;
      }
    }
    return count;
  }

  /**
   * Averages on a ring with a sharp momentum cutoff, to leading order in the inverse cutoff.
   *
   * <p>The missing modes carry {@code dn = 2 T/(pi k_c)} per component and shift the mean field of
   * the kept ones, so the truncated field at mu behaves as the full field at {@code mu' = mu + (2 g
   * + kappa/2) dn}: density {@code n(mu') - dn}, coherence {@code J(mu')}, {@code <S_y^2>(mu') - 4
   * n(mu') dn}, and likewise {@code <n_1 n_2> - 2 n dn}, {@code <n_j^2> - 4 n dn}. Whether n is
   * taken at mu or mu' does not matter to this order; mu' was the closer one to an exact sampler in
   * all five sets tried. The reported truncation error is {@code (dn/n)^2}, the size of the
   * neglected order.
   *
   * @param pair parameters
   * @param ring length and cutoff of the simulation
   * @return the predicted averages
   * @throws IllegalArgumentException if the missing density exceeds half of the density
   * @throws UnconvergedException if the transfer operator does not converge
   */
  public static PairAverages withCutoff(CoupledPair pair, RingModes ring) {
    Check.notNull(pair, "pair");
    Check.notNull(ring, "ring");
    double missing = 2 * pair.temperature() / (Math.PI * ring.effectiveCutoff());
    double shift = (2 * pair.g() + 0.5 * pair.biquadraticCoupling()) * missing;
    PairAverages full = of(pair.withMu(pair.mu() + shift)).onRing(ring.length());
    double n = full.density();
    Check.argument(
        missing < 0.5 * n,
        "the cutoff is too low for the leading correction: missing density 2T/(pi k_c)=%s must be"
            + " below half of the density %s; raise cutoffMode=%s",
        missing, n, ring.cutoffMode());
    double relative = missing / n;
    return new PairAverages(
        n - missing,
        full.coherence(),
        full.sySquared() - 4 * n * missing,
        full.densityProduct() - 2 * n * missing,
        full.densitySquared() - 4 * n * missing,
        full.truncationError() + relative * relative);
  }
}
