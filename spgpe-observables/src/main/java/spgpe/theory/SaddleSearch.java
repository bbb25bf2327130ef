package spgpe.theory;

import java.util.function.DoubleUnaryOperator;
import java.util.function.Function;

/** Finds the symmetric critical bubble from phase-only profiles. */
final class SaddleSearch {
  private static final double FIRST_COUPLING = 0.02;
  private static final double GROWTH = 1.15;

  private SaddleSearch() {}

  /**
   * Tries two starting densities, then continuation from weak coupling.
   *
   * @param pair metastable parameters
   * @param basis kept modes
   * @param profile phase over radius of the phase-only bubble of a pair
   */
  static SaddleFields from(
      CoupledPair pair, ModeBasis basis, Function<CoupledPair, DoubleUnaryOperator> profile) {
    for (boolean local : new boolean[] {false, true}) {
      try {
        SaddleFields found =
            SaddleFields.guess(pair, basis, profile.apply(pair), local).newton();
        if (looksLikeBubble(found)) {
          return found;
        }
      } catch (UnconvergedException e) {
        // Another start or continuation from weak coupling may still work; the last one reports.
        continue;
      }
    }
    return continuation(pair, basis, profile);
  }

  private static boolean looksLikeBubble(SaddleFields fields) {
    return fields.energy() > 0
        && fields.phase(0) < Math.PI - 0.05
        && Math.abs(fields.phase(fields.basis.points() - 1) - Math.PI) < 0.1;
  }

  /** From weak coherent coupling at fixed lambda and density, lengths scaled as 1/sqrt(J). */
  private static SaddleFields continuation(
      CoupledPair pair, ModeBasis basis, Function<CoupledPair, DoubleUnaryOperator> profile) {
    double lambda = Math.sqrt(pair.lambdaSquared());
    double n = pair.falseVacuumDensity();
    double target = pair.coherentCoupling();
    double j = Math.min(target, FIRST_COUPLING * pair.g() * n);
    SaddleFields current = null;
    while (true) {
      CoupledPair at =
          j == target
              ? pair
              : CoupledPair.fromFalseVacuum(pair.g(), n, j, lambda, pair.temperature());
      ModeBasis scaled = basis.stretched(Math.sqrt(target / j));
      SaddleFields start =
          current == null
              ? SaddleFields.guess(at, scaled, profile.apply(at), false)
              : current.movedTo(at, scaled);
      current = start.newton();
      if (j == target) {
        return current;
      }
      j = Math.min(target, GROWTH * j);
    }
  }
}
