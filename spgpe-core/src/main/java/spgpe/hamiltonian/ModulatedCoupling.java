package spgpe.hamiltonian;

import spgpe.internal.check.Check;
import spgpe.projector.CoherentRegion;
import spgpe.projector.PointBlock;

/**
 * Coherent coupling of components 1 and 2 modulated in time: K = -A cos(omega t + phase) integral of
 * (psi_1<sup>*</sup> psi_2 + c.c.). Add a {@link CoherentCoupling} for the mean. Immutable and
 * thread-safe.
 */
public final class ModulatedCoupling implements ExactFlow {
  private final double amplitude;
  private final double angularFrequency;
  private final double phase;

  private ModulatedCoupling(double amplitude, double angularFrequency, double phase) {
    this.amplitude = amplitude;
    this.angularFrequency = angularFrequency;
    this.phase = phase;
  }

  /**
   * Makes the term with phase 0.
   *
   * @param amplitude A, finite
   * @param angularFrequency omega, finite and positive
   * @return the term
   * @throws IllegalArgumentException if a value is out of range
   */
  public static ModulatedCoupling of(double amplitude, double angularFrequency) {
    Check.finite(amplitude, "modulation amplitude");
    Check.positive(angularFrequency, "angular frequency of the modulation");
    return new ModulatedCoupling(amplitude, angularFrequency, 0);
  }

  /**
   * The same modulation with another phase.
   *
   * @param newPhase phase at time 0, radians, finite
   * @return changed copy
   * @throws IllegalArgumentException if the phase is not finite
   */
  public ModulatedCoupling withPhase(double newPhase) {
    return new ModulatedCoupling(
        amplitude, angularFrequency, Check.finite(newPhase, "phase of the modulation"));
  }

  @Override
  public void check(int components, CoherentRegion region) {
    Check.argument(
        components == 2, "modulated coupling needs two components: components=%s", components);
  }

  @Override
  public int forceDegree() {
    return 1;
  }

  @Override
  public boolean dependsOnTime() {
    return true;
  }

  private double strength(double time) {
    return amplitude * Math.cos(angularFrequency * time + phase);
  }

  @Override
  public void addForce(double time, PointBlock block) {
    double strength = strength(time);
    for (int c = 0; c < 2; c++) {
      double[] re = block.psiRe(1 - c);
      double[] im = block.psiIm(1 - c);
      double[] forceRe = block.resultRe(c);
      double[] forceIm = block.resultIm(c);
      for (int i = block.begin(), end = block.end(); i < end; i++) {
        forceRe[i] -= strength * re[i];
        forceIm[i] -= strength * im[i];
      }
    }
  }

  @Override
  public Kind flowKind() {
    return Kind.MIXING;
  }

  /** Rabi rotation: psi_1 cos + i psi_2 sin of strength times duration, and with 1 and 2 swapped. */
  @Override
  public void flow(double time, double duration, PointBlock block) {
    double c = Math.cos(strength(time) * duration);
    double s = Math.sin(strength(time) * duration);
    double[] re1 = block.psiRe(0);
    double[] im1 = block.psiIm(0);
    double[] re2 = block.psiRe(1);
    double[] im2 = block.psiIm(1);
    for (int i = block.begin(), end = block.end(); i < end; i++) {
      double re = c * re1[i] - s * im2[i];
      double im = c * im1[i] + s * re2[i];
      double otherRe = c * re2[i] - s * im1[i];
      im2[i] = c * im2[i] + s * re1[i];
      re2[i] = otherRe;
      re1[i] = re;
      im1[i] = im;
    }
  }

  @Override
  public void addEnergyDensity(double time, PointBlock block, double[] density) {
    double twice = 2 * strength(time);
    double[] re1 = block.psiRe(0);
    double[] im1 = block.psiIm(0);
    double[] re2 = block.psiRe(1);
    double[] im2 = block.psiIm(1);
    for (int i = block.begin(), end = block.end(); i < end; i++) {
      density[i] -= twice * (re1[i] * re2[i] + im1[i] * im2[i]);
    }
  }

  @Override
  public String description() {
    return "ModulatedCoupling(amplitude=" + amplitude + ", angular frequency=" + angularFrequency
        + ", phase=" + phase + ")";
  }
}
