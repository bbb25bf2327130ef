package spgpe.theory;

/**
 * Local equilibrium averages of a coupled pair; both components are equivalent.
 *
 * @param density {@code <|psi_j|^2>} of one component (1/length)
 * @param coherence {@code <Re psi_1^* psi_2> = <sqrt(n_1 n_2) cos phi>} (1/length)
 * @param sySquared {@code <S_y^2>} with {@code S_y = 2 Im psi_1^* psi_2} (1/length squared)
 * @param densityProduct {@code <n_1 n_2>} (1/length squared)
 * @param densitySquared {@code <n_j^2>} of one component (1/length squared)
 * @param truncationError estimate of the largest relative error of these numbers from the basis
 *     and, on a ring, from the states left out of the trace
 */
public record PairAverages(
    double density,
    double coherence,
    double sySquared,
    double densityProduct,
    double densitySquared,
    double truncationError) {

  /**
   * Mean squared density difference.
   *
   * @return {@code <(n_1 - n_2)^2>} (1/length squared)
   */
  public double imbalanceSquared() {
    return 2 * (densitySquared - densityProduct);
  }

  /**
   * Normalised coherence.
   *
   * @return coherence divided by density (dimensionless)
   */
  public double relativeCoherence() {
    return coherence / density;
  }

  /**
   * Zero-distance density correlation of one component.
   *
   * @return {@code g2(0) = <n_j^2>/<n_j>^2}
   */
  public double secondOrderCoherence() {
    return densitySquared / (density * density);
  }

  double largestDifference(PairAverages other) {
    double squareScale = other.density * other.density;
    double worst = Math.abs(density - other.density) / other.density;
    worst = Math.max(worst, Math.abs(coherence - other.coherence) / other.density);
    worst = Math.max(worst, Math.abs(sySquared - other.sySquared) / squareScale);
    worst = Math.max(worst, Math.abs(densityProduct - other.densityProduct) / squareScale);
    return Math.max(worst, Math.abs(densitySquared - other.densitySquared) / squareScale);
  }
}
