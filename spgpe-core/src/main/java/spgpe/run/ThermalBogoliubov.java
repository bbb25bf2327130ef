package spgpe.run;

import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import spgpe.hamiltonian.LocalTerm;
import spgpe.hamiltonian.ModeMatrix;
import spgpe.internal.check.Check;
import spgpe.internal.linear.SymmetricEigen;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Field;
import spgpe.projector.PointBlock;

/**
 * Thermal fluctuations in harmonic (Bogoliubov) approximation about a uniform stationary state.
 *
 * <p>With real fields q = (Re psi_1, Im psi_1, Re psi_2, ...) the second variation of K is half the
 * sum over k of c_k<sup>+</sup> D(k) c_k, D = Hessian of the local terms (central differences of the
 * forces) + that of the spectral terms; each c_k is drawn with covariance T D(k)<sup>-1</sup>. Zero
 * modes (the global phase at k = 0) are left at rest; a negative eigenvalue means that the state is
 * no minimum, and is refused. For one component this gives &lt;|a_k|<sup>2</sup>&gt; = (T/2)[1/eps +
 * 1/(eps + 2 g n)].
 *
 * <p>A warm start, not the equilibrium: let the run relax before measuring. On long rings (coherence
 * length below the length) the harmonic form exaggerates the density. Immutable and thread-safe.
 */
public final class ThermalBogoliubov implements InitialState {
  private static final double DIFFERENCE = 1e-5;
  private static final double STATIONARY = 1e-6;
  private static final double ZERO_MODE = 1e-7;

  private final double[] psi;

  private ThermalBogoliubov(double[] psi) {
    this.psi = psi;
  }

  /**
   * Fluctuations about real uniform fields; opposite signs are a relative phase of pi.
   *
   * @param psi psi_j for each component, finite
   * @return the initial state
   * @throws IllegalArgumentException if a value is not finite
   */
  public static ThermalBogoliubov around(double... psi) {
    Check.notNull(psi, "psi");
    for (double value : psi) {
      Check.finite(value, "uniform field psi");
    }
    return new ThermalBogoliubov(psi.clone());
  }

  /**
   * Draws the state.
   *
   * @throws IllegalArgumentException if the uniform state is not a stationary minimum of K, if the
   *     model is not uniform in space, or if the region does not keep both k and -k
   */
  @Override
  public void prepare(Model model, UniformRandomProvider random, Amplitudes target) {
    Check.notNull(model, "model");
    Check.notNull(random, "random");
    Check.notNull(target, "target");
    InitialState.uniform(psi).prepare(model, random, target);
    double[][] local = localHessian(model);
    CoherentRegion region = model.region();
    boolean line = region.grid().dimension() == 1;
    ZigguratSampler.NormalizedGaussian gaussian = ZigguratSampler.NormalizedGaussian.of(random);
    for (int m = 0; m < region.modes(); m++) {
      int nx = region.modeNumber(0, m);
      int ny = line ? 0 : region.modeNumber(1, m);
      int opposite = region.indexOf(-nx, -ny);
      Check.argument(
          opposite >= 0 && sameMatrix(model.linearPart(), m, opposite),
          "thermal Bogoliubov states need a region and spectral terms symmetric in k: mode nx=%s,"
              + " ny=%s", nx, ny);
      boolean first = nx > 0 || (nx == 0 && ny > 0);
      if (first || m == opposite) {
        draw(model, local, m, opposite, gaussian, target);
      }
    }
  }

  private void draw(
      Model model, double[][] local, int mode, int opposite,
      ZigguratSampler.NormalizedGaussian gaussian, Amplitudes target) {
    double temperature = model.reservoir().temperature();
    SymmetricEigen eigen = SymmetricEigen.of(hessian(model, local, mode));
    int n = local.length;
    boolean real = mode == opposite;
    double[] re = new double[n];
    double[] im = new double[n];
    double scale = 0;
    for (int i = 0; i < n; i++) {
      scale = Math.max(scale, Math.abs(eigen.value(i)));
    }
    for (int i = 0; i < n; i++) {
      double value = eigen.value(i);
      Check.argument(
          value > -ZERO_MODE * scale,
          "the uniform state must be a minimum of K: eigenvalue=%s at k^2=%s",
          value, model.region().kSquared(mode));
      double x = gaussian.sample();
      double y = gaussian.sample();
      if (value < ZERO_MODE * scale) {
        Check.argument(
            real, "only k = 0 may have a zero mode: eigenvalue=%s at k^2=%s",
            value, model.region().kSquared(mode));
        continue;
      }
      double width = Math.sqrt(temperature / value / (real ? 1 : 2));
      for (int row = 0; row < n; row++) {
        re[row] += width * x * eigen.vector(i, row);
        im[row] += real ? 0 : width * y * eigen.vector(i, row);
      }
    }
    for (int c = 0; c < n / 2; c++) {
      target.re(c)[mode] += re[2 * c] - im[2 * c + 1];
      target.im(c)[mode] += im[2 * c] + re[2 * c + 1];
      if (!real) {
        target.re(c)[opposite] += re[2 * c] + im[2 * c + 1];
        target.im(c)[opposite] += -im[2 * c] + re[2 * c + 1];
      }
    }
  }

  /** Hessian of the local part with respect to (Re psi_1, Im psi_1, ...), and its checks. */
  private double[][] localHessian(Model model) {
    int n = 2 * model.components();
    double size = 0;
    for (double value : psi) {
      size = Math.max(size, Math.abs(value));
    }
    double h = DIFFERENCE * (size > 0 ? size : 1);
    double[] point = new double[n];
    for (int c = 0; c < psi.length; c++) {
      point[2 * c] = psi[c];
    }
    requireStationary(model, point);
    double[][] hessian = new double[n][n];
    for (int j = 0; j < n; j++) {
      double[] up = point.clone();
      double[] down = point.clone();
      up[j] += h;
      down[j] -= h;
      double[] forceUp = localForce(model, up);
      double[] forceDown = localForce(model, down);
      for (int i = 0; i < n; i++) {
        hessian[i][j] = (forceUp[i] - forceDown[i]) / h; // dK/d Re psi = 2 Re f
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        double mean = (hessian[i][j] + hessian[j][i]) / 2;
        hessian[i][j] = mean;
        hessian[j][i] = mean;
      }
    }
    return hessian;
  }

  private void requireStationary(Model model, double[] point) {
    int zero = model.region().indexOf(0);
    double[] force = localForce(model, point);
    double[][] h = hessian(model, new double[point.length][point.length], zero);
    double scale = 0;
    double worst = 0;
    for (int i = 0; i < point.length; i++) {
      double total = force[i];
      for (int j = 0; j < point.length; j++) {
        total += h[i][j] * point[j] / 2;
        scale = Math.max(scale, Math.abs(h[i][j] * point[j]));
      }
      scale = Math.max(scale, Math.abs(force[i]));
      worst = Math.max(worst, Math.abs(total));
    }
    Check.argument(
        worst <= STATIONARY * Math.max(scale, 1),
        "the uniform state must be stationary: largest |dK/dpsi^*|=%s; for two equal components with"
            + " coherent coupling J the densities are (mu + J)/g at phase 0 and (mu - J)/g at phase"
            + " pi", worst);
  }

  private static double[] localForce(Model model, double[] point) {
    Field field = new Field(model.region().grid(), model.components(), 1);
    Field force = new Field(model.region().grid(), model.components(), 1);
    for (int c = 0; c < model.components(); c++) {
      java.util.Arrays.fill(field.re(c), point[2 * c]);
      java.util.Arrays.fill(field.im(c), point[2 * c + 1]);
    }
    for (LocalTerm term : model.localTerms()) {
      term.addForce(0, PointBlock.ofAll(field, force));
    }
    double[] result = new double[point.length];
    for (int c = 0; c < model.components(); c++) {
      for (int p = 1; p < force.grid().points(); p++) {
        Check.argument(
            Math.abs(force.re(c)[p] - force.re(c)[0]) <= 1e-9 * (1 + Math.abs(force.re(c)[0]))
                && Math.abs(force.im(c)[p] - force.im(c)[0])
                    <= 1e-9 * (1 + Math.abs(force.im(c)[0])),
            "thermal Bogoliubov states need a model that is uniform in space");
      }
      double mu =
          model.chemicalPotentialActsLocally() ? model.reservoir().chemicalPotential(c) : 0;
      result[2 * c] = force.re(c)[0] - mu * point[2 * c];
      result[2 * c + 1] = force.im(c)[0] - mu * point[2 * c + 1];
    }
    return result;
  }

  /** D(k): twice the real representation of the Hermitian matrix h(k), plus the local Hessian. */
  private static double[][] hessian(Model model, double[][] local, int mode) {
    int n = local.length;
    double[][] sum = new double[n][];
    for (int i = 0; i < n; i++) {
      sum[i] = local[i].clone();
    }
    ModeMatrix h = model.linearPart();
    for (int i = 0; i < n / 2; i++) {
      for (int j = 0; j < n / 2; j++) {
        double re = 2 * h.re(mode, i, j);
        double im = 2 * h.im(mode, i, j);
        sum[2 * i][2 * j] += re;
        sum[2 * i + 1][2 * j + 1] += re;
        sum[2 * i][2 * j + 1] -= im;
        sum[2 * i + 1][2 * j] += im;
      }
    }
    return sum;
  }

  private static boolean sameMatrix(ModeMatrix h, int m, int other) {
    for (int i = 0; i < h.components(); i++) {
      for (int j = 0; j < h.components(); j++) {
        double scale = 1 + Math.abs(h.re(m, i, j)) + Math.abs(h.im(m, i, j));
        if (Math.abs(h.re(m, i, j) - h.re(other, i, j)) > 1e-12 * scale
            || Math.abs(h.im(m, i, j) - h.im(other, i, j)) > 1e-12 * scale) {
          return false;
        }
      }
    }
    return true;
  }
}
