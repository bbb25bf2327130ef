package spgpe.hamiltonian;

import org.junit.jupiter.api.Nested;
import spgpe.projector.CoherentRegion;
import spgpe.projector.PointBlock;

/** Two terms of a user's own, and how a user proves them. */
class UserTermContractTest {
  /** Three-body interaction of each component: K = integral of (c/3) |psi_j|^6. */
  record ThreeBodyInteraction(double strength) implements LocalTerm {
    @Override
    public String description() {
      return "ThreeBodyInteraction(c=" + strength + ")";
    }

    @Override
    public int forceDegree() {
      return 5;
    }

    @Override
    public void addForce(double time, PointBlock block) {
      for (int c = 0; c < block.components(); c++) {
        double[] re = block.psiRe(c);
        double[] im = block.psiIm(c);
        double[] forceRe = block.resultRe(c);
        double[] forceIm = block.resultIm(c);
        for (int i = block.begin(); i < block.end(); i++) {
          double density = re[i] * re[i] + im[i] * im[i];
          forceRe[i] += strength * density * density * re[i];
          forceIm[i] += strength * density * density * im[i];
        }
      }
    }

    @Override
    public void addEnergyDensity(double time, PointBlock block, double[] sum) {
      for (int c = 0; c < block.components(); c++) {
        double[] re = block.psiRe(c);
        double[] im = block.psiIm(c);
        for (int i = block.begin(); i < block.end(); i++) {
          double density = re[i] * re[i] + im[i] * im[i];
          sum[i] += strength / 3 * density * density * density;
        }
      }
    }
  }

  /** A coupling that grows with the wave number: matrix elements i v k and -i v k. */
  record RamanCoupling(double velocity) implements SpectralTerm {
    @Override
    public String description() {
      return "RamanCoupling(v=" + velocity + ")";
    }

    @Override
    public void addTo(ModeMatrix matrix) {
      CoherentRegion region = matrix.region();
      for (int m = 0; m < region.modes(); m++) {
        matrix.addPair(m, 0, 1, 0, velocity * region.waveNumber(0, m));
      }
    }
  }

  @Nested
  class ThreeBodyTest extends LocalTermContract {
    @Override
    protected LocalTerm term() {
      return new ThreeBodyInteraction(0.2);
    }
  }

  @Nested
  class RamanTest extends SpectralTermContract {
    @Override
    protected SpectralTerm term() {
      return new RamanCoupling(0.6);
    }
  }
}
