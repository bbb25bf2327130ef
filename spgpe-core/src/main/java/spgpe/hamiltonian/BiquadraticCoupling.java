package spgpe.hamiltonian;

import spgpe.internal.check.Check;
import spgpe.projector.CoherentRegion;
import spgpe.projector.PointBlock;

/**
 * Biquadratic coupling of components 1 and 2: with S = 2 Im(psi_1<sup>*</sup> psi_2),
 *
 * <pre>K = integral of (kappa/4) S^2,   f_1 = -i (kappa S/2) psi_2,   f_2 = +i (kappa S/2) psi_1.</pre>
 *
 * <p>For equal densities n and relative phase phi the energy density is kappa n<sup>2</sup>
 * sin<sup>2</sup>(phi): it raises the barrier between the phases 0 and pi. Derived in docs/theory.md.
 * Immutable and thread-safe.
 */
public final class BiquadraticCoupling implements ExactFlow {
  private final double kappa;

  private BiquadraticCoupling(double kappa) {
    this.kappa = kappa;
  }

  /**
   * Makes the term.
   *
   * @param kappa strength, finite
   * @return the term
   * @throws IllegalArgumentException if kappa is not finite
   */
  public static BiquadraticCoupling of(double kappa) {
    return new BiquadraticCoupling(Check.finite(kappa, "biquadratic coupling kappa"));
  }

  @Override
  public void check(int components, CoherentRegion region) {
    Check.argument(
        components == 2, "biquadratic coupling needs two components: components=%s", components);
  }

  @Override
  public int forceDegree() {
    return 3;
  }

  @Override
  public void addForce(double time, PointBlock block) {
    double[] re1 = block.psiRe(0);
    double[] im1 = block.psiIm(0);
    double[] re2 = block.psiRe(1);
    double[] im2 = block.psiIm(1);
    double[] forceRe1 = block.resultRe(0);
    double[] forceIm1 = block.resultIm(0);
    double[] forceRe2 = block.resultRe(1);
    double[] forceIm2 = block.resultIm(1);
    // one short loop for each component: the compiler turns it into vector code
    addForceOn(
        kappa, re1, im1, re2, im2, re2, im2, forceRe1, forceIm1, block.begin(), block.end());
    addForceOn(
        -kappa, re1, im1, re2, im2, re1, im1, forceRe2, forceIm2, block.begin(), block.end());
  }

  private static void addForceOn(
      double kappa, double[] re1, double[] im1, double[] re2, double[] im2, double[] otherRe,
      double[] otherIm, double[] forceRe, double[] forceIm, int begin, int end) {
    for (int i = begin; i < end; i++) {
      double strength = kappa * (re1[i] * im2[i] - im1[i] * re2[i]); // kappa S / 2
      forceRe[i] += strength * otherIm[i];
      forceIm[i] -= strength * otherRe[i];
    }
  }

  @Override
  public Kind flowKind() {
    return Kind.MIXING;
  }

  /** S stays; (psi_1, psi_2) turn as a real vector by kappa S duration/2. */
  @Override
  public void flow(double time, double duration, PointBlock block) {
    double[] re1 = block.psiRe(0);
    double[] im1 = block.psiIm(0);
    double[] re2 = block.psiRe(1);
    double[] im2 = block.psiIm(1);
    for (int i = block.begin(), end = block.end(); i < end; i++) {
      double angle = kappa * duration * (re1[i] * im2[i] - im1[i] * re2[i]);
      double c = Math.cos(angle);
      double s = Math.sin(angle);
      double re = c * re1[i] - s * re2[i];
      double im = c * im1[i] - s * im2[i];
      re2[i] = s * re1[i] + c * re2[i];
      im2[i] = s * im1[i] + c * im2[i];
      re1[i] = re;
      im1[i] = im;
    }
  }

  @Override
  public void addEnergyDensity(double time, PointBlock block, double[] density) {
    double[] re1 = block.psiRe(0);
    double[] im1 = block.psiIm(0);
    double[] re2 = block.psiRe(1);
    double[] im2 = block.psiIm(1);
    for (int i = block.begin(), end = block.end(); i < end; i++) {
      double halfS = re1[i] * im2[i] - im1[i] * re2[i];
      density[i] += kappa * halfS * halfS;
    }
  }

  @Override
  public String description() {
    return "BiquadraticCoupling(kappa=" + kappa + ")";
  }
}
