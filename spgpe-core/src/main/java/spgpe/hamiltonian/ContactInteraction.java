package spgpe.hamiltonian;

import java.util.Arrays;
import spgpe.internal.check.Check;
import spgpe.projector.CoherentRegion;
import spgpe.projector.PointBlock;

/**
 * Contact interaction: K = integral of sum over j, k of (g_jk/2) |psi_j|<sup>2</sup>
 * |psi_k|<sup>2</sup>, force f_j = (sum over k of g_jk |psi_k|<sup>2</sup>) psi_j. Immutable and
 * thread-safe.
 */
public final class ContactInteraction implements ExactFlow {
  private final double[][] couplings;

  private ContactInteraction(double[][] couplings) {
    this.couplings = couplings;
  }

  /**
   * One component.
   *
   * @param g coupling, finite
   * @return the term
   * @throws IllegalArgumentException if g is not finite
   */
  public static ContactInteraction of(double g) {
    return ofMatrix(new double[][] {{g}});
  }

  /**
   * Two components with equal intra-component couplings.
   *
   * @param intra g_11 = g_22, finite
   * @param inter g_12, finite
   * @return the term
   * @throws IllegalArgumentException if a value is not finite
   */
  public static ContactInteraction ofPair(double intra, double inter) {
    return ofMatrix(new double[][] {{intra, inter}, {inter, intra}});
  }

  /**
   * Any number of components.
   *
   * @param g symmetric matrix g_jk of finite numbers
   * @return the term
   * @throws IllegalArgumentException if the matrix is not square, symmetric and finite
   */
  public static ContactInteraction ofMatrix(double[][] g) {
    int n = Check.notNull(g, "interaction matrix").length;
    Check.argument(n >= 1, "interaction matrix must have at least one row");
    double[][] copy = new double[n][];
    for (int j = 0; j < n; j++) {
      copy[j] = Check.notNull(g[j], "row of the interaction matrix").clone();
      Check.argument(
          copy[j].length == n,
          "interaction matrix must be square: rows=%s, columns=%s", n, copy[j].length);
      for (int k = 0; k < n; k++) {
        Check.finite(copy[j][k], "interaction g");
      }
    }
    for (int j = 0; j < n; j++) {
      for (int k = 0; k < j; k++) {
        Check.argument(
            copy[j][k] == copy[k][j],
            "interaction matrix must be symmetric: g[%s][%s]=%s, g[%s][%s]=%s",
            j, k, copy[j][k], k, j, copy[k][j]);
      }
    }
    return new ContactInteraction(copy);
  }

  @Override
  public void check(int components, CoherentRegion region) {
    Check.argument(
        couplings.length == components,
        "interaction matrix must have a row for each component: rows=%s, components=%s",
        couplings.length, components);
  }

  @Override
  public int forceDegree() {
    return 3;
  }

  @Override
  public void addForce(double time, PointBlock block) {
    // one short loop for each pair: the compiler turns it into vector code, a fused loop it does not
    for (int j = 0; j < couplings.length; j++) {
      for (int k = 0; k < couplings.length; k++) {
        if (couplings[j][k] != 0) {
          addForceOn(block, j, k, couplings[j][k]);
        }
      }
    }
  }

  private static void addForceOn(PointBlock block, int j, int k, double g) {
    double[] re = block.psiRe(j);
    double[] im = block.psiIm(j);
    double[] otherRe = block.psiRe(k);
    double[] otherIm = block.psiIm(k);
    double[] forceRe = block.resultRe(j);
    double[] forceIm = block.resultIm(j);
    for (int i = block.begin(), end = block.end(); i < end; i++) {
      double shift = g * (otherRe[i] * otherRe[i] + otherIm[i] * otherIm[i]);
      forceRe[i] += shift * re[i];
      forceIm[i] += shift * im[i];
    }
  }

  @Override
  public Kind flowKind() {
    for (double[] row : couplings) {
      for (double g : row) {
        if (g != couplings[0][0]) {
          return Kind.COMPONENT_PHASE;
        }
      }
    }
    return Kind.COMMON_PHASE;
  }

  /** Densities stay, component j turns by -duration times the sum over k of g_jk n_k. */
  @Override
  public void flow(double time, double duration, PointBlock block) {
    // turning one component leaves its density, on which the others depend, as it is to rounding
    for (int j = 0; j < couplings.length; j++) {
      double[] re = block.psiRe(j);
      double[] im = block.psiIm(j);
      for (int i = block.begin(), end = block.end(); i < end; i++) {
        double angle = 0;
        for (int k = 0; k < couplings.length; k++) {
          double otherRe = block.psiRe(k)[i];
          double otherIm = block.psiIm(k)[i];
          angle -= couplings[j][k] * (otherRe * otherRe + otherIm * otherIm);
        }
        PhaseTurn.turn(re, im, i, duration * angle);
      }
    }
  }

  @Override
  public void addEnergyDensity(double time, PointBlock block, double[] density) {
    for (int j = 0; j < couplings.length; j++) {
      for (int k = 0; k < couplings.length; k++) {
        double half = couplings[j][k] / 2;
        double[] reJ = block.psiRe(j);
        double[] imJ = block.psiIm(j);
        double[] reK = block.psiRe(k);
        double[] imK = block.psiIm(k);
        for (int i = block.begin(), end = block.end(); i < end; i++) {
          density[i] +=
              half * (reJ[i] * reJ[i] + imJ[i] * imJ[i]) * (reK[i] * reK[i] + imK[i] * imK[i]);
        }
      }
    }
  }

  @Override
  public String description() {
    return "ContactInteraction(g=" + Arrays.deepToString(couplings) + ")";
  }
}
