package spgpe.integrate.bench;

import spgpe.hamiltonian.ExactFlow;
import spgpe.projector.PointBlock;

/**
 * What is left of a contact interaction after linearisation about a uniform condensate: K =
 * integral of 2 gn (Re psi)^2, force f = gn (psi + psi^*). Immutable and thread-safe.
 */
record QuadraticMeanField(double meanField) implements ExactFlow {
  @Override
  public String description() {
    return "QuadraticMeanField(gn=" + meanField + ")";
  }

  @Override
  public int forceDegree() {
    return 1;
  }

  @Override
  public void addForce(double time, PointBlock block) {
    double[] re = block.psiRe(0);
    double[] force = block.resultRe(0);
    for (int i = block.begin(); i < block.end(); i++) {
      force[i] += 2 * meanField * re[i];
    }
  }

  @Override
  public void addEnergyDensity(double time, PointBlock block, double[] density) {
    double[] re = block.psiRe(0);
    for (int i = block.begin(); i < block.end(); i++) {
      density[i] += 2 * meanField * re[i] * re[i];
    }
  }

  @Override
  public Kind flowKind() {
    return Kind.MIXING;
  }

  /** A shear: Re psi stays, Im psi falls by 2 gn Re psi duration. */
  @Override
  public void flow(double time, double duration, PointBlock block) {
    double[] re = block.psiRe(0);
    double[] im = block.psiIm(0);
    for (int i = block.begin(); i < block.end(); i++) {
      im[i] -= 2 * meanField * duration * re[i];
    }
  }
}
