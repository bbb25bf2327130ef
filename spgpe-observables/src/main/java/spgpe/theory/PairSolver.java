package spgpe.theory;

import java.util.ArrayList;
import java.util.List;

/** One basis size of the two-component transfer operator; amplitudes and energies dimensionless. */
final class PairSolver {
  private static final int STEP_LIMIT = 420;
  private static final double RESIDUAL = 1e-9;
  private static final double SHIFT_FROM = 3;

  private final RadialStates radial;
  private final int halfWidth;
  private final double coherent;
  private final double biquadratic;
  private final double shift;

  PairSolver(
      double alpha,
      double coherent,
      double biquadratic,
      int states,
      int halfWidth,
      int largestSector) {
    this.halfWidth = halfWidth;
    this.coherent = coherent;
    this.biquadratic = biquadratic;
    // Radial states of the mean field: in the locked state the partner adds J to mu.
    shift = alpha + coherent > SHIFT_FROM ? coherent : 0;
    radial =
        RadialStates.of(
            alpha + shift, states, PairOperator.momentaNeeded(largestSector, halfWidth), 0);
  }

  PairOperator sector(int total) {
    return new PairOperator(radial, total, halfWidth, coherent, biquadratic, shift);
  }

  /** A normalised eigenvector and its energy. */
  static final class State {
    final double energy;
    final double[] vector;

    State(double energy, double[] vector) {
      this.energy = energy;
      this.vector = vector;
    }
  }

  State ground(int total) {
    PairOperator h = sector(total);
    Lanczos lanczos = lowest(h, false, 1, 0);
    return new State(lanczos.value(0), lanczos.vector(0));
  }

  /** States of one sector and exchange class up to an energy, ascending. */
  List<State> below(int total, boolean odd, double energy, int atMost) {
    PairOperator h = sector(total);
    for (int wanted = odd ? 0 : 1; wanted <= atMost; wanted++) {
      Lanczos lanczos = lowest(h, odd, wanted, 1);
      if (lanczos.value(wanted) > energy) {
        List<State> found = new ArrayList<>();
        for (int i = 0; i < wanted && lanczos.value(i) <= energy; i++) {
          found.add(new State(lanczos.value(i), lanczos.vector(i)));
        }
        return found;
      }
    }
    throw new UnconvergedException(
        "the ring is too short for its correlation lengths: more than " + atMost
            + " states of the sector M=" + total + " matter; use a longer ring");
  }

  private Lanczos lowest(PairOperator h, boolean odd, int wanted, int probes) {
    int sign = odd ? -1 : 1;
    double[] start = h.start(odd);
    h.symmetrise(start, sign);
    return new Lanczos(
        x -> {
          double[] y = h.apply(x);
          h.symmetrise(y, sign);
          return y;
        },
        start,
        null,
        wanted,
        probes,
        STEP_LIMIT,
        RESIDUAL);
  }

  PairAverages averages(int total, double[] x) {
    PairOperator h = sector(total);
    double[] sy = h.imaginaryCoherence(x);
    return new PairAverages(
        VectorMath.dot(x, h.meanPower(x, false)),
        VectorMath.dot(x, h.coherence(x)),
        VectorMath.dot(sy, sy),
        VectorMath.dot(x, h.densityProduct(x)),
        VectorMath.dot(x, h.meanPower(x, true)),
        0);
  }

  /** Which observable a correlation function belongs to. */
  enum Channel {
    IMAGINARY_COHERENCE,
    IMBALANCE,
    COHERENCE,
    FIELD
  }

  CorrelationFunction correlation(Channel channel, State ground) {
    PairOperator zero = sector(0);
    if (channel == Channel.FIELD) {
      PairOperator one = sector(1);
      double[] start = zero.raiseFirst(ground.vector, one);
      return new Lanczos(one::apply, start, null, 1, 0, STEP_LIMIT, RESIDUAL)
          .spectralMeasure(ground.energy);
    }
    double[] start =
        switch (channel) {
          case IMAGINARY_COHERENCE -> zero.imaginaryCoherence(ground.vector);
          case IMBALANCE -> zero.imbalance(ground.vector);
          case COHERENCE, FIELD -> zero.coherence(ground.vector);
        };
    return new Lanczos(zero::apply, start, ground.vector, 1, 0, STEP_LIMIT, RESIDUAL)
        .spectralMeasure(ground.energy);
  }
}
