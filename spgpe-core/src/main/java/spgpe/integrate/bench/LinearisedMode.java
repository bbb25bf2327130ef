package spgpe.integrate.bench;

import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.Detuning;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.Integrator;
import spgpe.integrate.Stepper;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/**
 * One mode of a Bose field linearised about a uniform condensate, the exact test of the equilibrium
 * that a scheme leads to. With a = x + i y,
 *
 * <pre>K = (eps + 2 gn) x^2 + eps y^2,     da = -(i + gamma)(eps a + 2 gn x) dt + dW,
 * exact law: &lt;x^2&gt; = T/(2 (eps + 2 gn)),   &lt;y^2&gt; = T/(2 eps).</pre>
 *
 * <p>On it every scheme is a linear map s' = M s + noise of covariance Q between symmetric points.
 * M and Q are read off the scheme itself, by its response to unit states and to unit noise numbers;
 * the covariance S that the scheme really has solves the discrete Lyapunov equation S = M S
 * M<sup>T</sup> + Q, without sampling. The test runs on a lattice of two points, so schemes that
 * need one fit too. Immutable and thread-safe.
 */
public final class LinearisedMode {
  private static final double LENGTH = 1e6;

  private final double energy;
  private final double meanField;
  private final double damping;

  /**
   * Stationary variances of a scheme over those of the exact law.
   *
   * @param density ratio of the variance of x, the density quadrature
   * @param phase ratio of the variance of y, the phase quadrature
   * @param occupation ratio of their sum
   */
  public record VarianceRatios(double density, double phase, double occupation) {}

  private LinearisedMode(double energy, double meanField, double damping) {
    this.energy = energy;
    this.meanField = meanField;
    this.damping = damping;
  }

  /**
   * Makes the mode.
   *
   * @param energy kinetic energy eps, finite and positive
   * @param meanField gn, finite and not negative
   * @param damping gamma, dimensionless, 0 to 10
   * @return the mode
   * @throws IllegalArgumentException if a value is out of range
   */
  public static LinearisedMode of(double energy, double meanField, double damping) {
    Check.positive(energy, "energy of the mode");
    Check.notNegative(meanField, "mean field g n");
    Check.argument(
        damping >= 0 && damping <= 10, "damping gamma must lie in 0..10: gamma=%s", damping);
    return new LinearisedMode(energy, meanField, damping);
  }

  /**
   * Stationary variances of a scheme, relative to the exact ones.
   *
   * @param integrator any scheme
   * @return ratios; infinite if the scheme has no stationary law because it is unstable
   * @throws IllegalArgumentException if the damping is zero, or if the scheme refuses the step
   */
  public VarianceRatios equilibrium(Integrator integrator) {
    Check.notNull(integrator, "integrator");
    Check.argument(damping > 0, "without damping there is no stationary law: gamma=%s", damping);
    Probe probe = new Probe(integrator, 1);
    double[][] m = probe.stepMatrix();
    if (!(spectralRadius(m) < 1)) {
      double infinite = Double.POSITIVE_INFINITY;
      return new VarianceRatios(infinite, infinite, infinite);
    }
    double[] s = stationary(m, probe.noiseCovariance());
    double x = 0.5 / (energy + 2 * meanField);
    double y = 0.5 / energy;
    return new VarianceRatios(s[0] / x, s[2] / y, (s[0] + s[2]) / (x + y));
  }

  /**
   * Factor by which a scheme can multiply the mode in one step, without noise.
   *
   * @param integrator any scheme
   * @return spectral radius of the step matrix; above 1 for an unstable scheme
   * @throws IllegalArgumentException if the scheme refuses the step
   */
  public double growthPerStep(Integrator integrator) {
    return spectralRadius(new Probe(Check.notNull(integrator, "integrator"), 0).stepMatrix());
  }

  /** A stepper of the scheme, asked for its responses. */
  private final class Probe {
    private final ImpulseNoise noise = new ImpulseNoise();
    private final Stepper stepper;
    private final Amplitudes state;
    private final int mode;

    Probe(Integrator integrator, double temperature) {
      CoherentRegion region = Projector.allModes().on(PeriodicGrid.of(Axis.of(2, LENGTH)));
      Model model =
          Model.of(
              region,
              Hamiltonian.ofMasses(1)
                  .with(Detuning.ofOffsets(energy))
                  .with(new QuadraticMeanField(meanField)),
              Reservoir.of(temperature, 0, damping));
      this.stepper = integrator.bind(model, noise, 1);
      this.state = new Amplitudes(region, 1, 1);
      this.mode = region.indexOf(0);
    }

    /** Rows x, y; columns response to x = 1, to y = 1. */
    double[][] stepMatrix() {
      noise.silence();
      double[] first = oneStep(1, 0);
      double[] second = oneStep(0, 1);
      return new double[][] {{first[0], second[0]}, {first[1], second[1]}};
    }

    /** Elements xx, xy, yy. */
    double[] noiseCovariance() {
      noise.silence();
      oneStep(0, 0);
      int draws = noise.draws();
      double[] q = new double[3];
      for (int draw = 0; draw < draws; draw++) {
        for (int part = 0; part < 2; part++) {
          noise.strike(draw, part == 1);
          double[] r = oneStep(0, 0);
          q[0] += r[0] * r[0];
          q[1] += r[0] * r[1];
          q[2] += r[1] * r[1];
        }
      }
      return q;
    }

    private double[] oneStep(double x, double y) {
      state.clear();
      state.re(0)[mode] = x;
      state.im(0)[mode] = y;
      stepper.start(state, 0);
      stepper.advance();
      stepper.observe(state);
      return new double[] {state.re(0)[mode], state.im(0)[mode]};
    }
  }

  private static double spectralRadius(double[][] m) {
    double halfTrace = (m[0][0] + m[1][1]) / 2;
    double determinant = m[0][0] * m[1][1] - m[0][1] * m[1][0];
    double discriminant = halfTrace * halfTrace - determinant;
    return discriminant <= 0
        ? Math.sqrt(determinant)
        : Math.abs(halfTrace) + Math.sqrt(discriminant);
  }

  /** Solves S = M S M^T + Q for S = (xx, xy, yy) by elimination. */
  private static double[] stationary(double[][] m, double[] q) {
    double a = m[0][0];
    double b = m[0][1];
    double c = m[1][0];
    double d = m[1][1];
    double[][] system = {
      {1 - a * a, -2 * a * b, -b * b, q[0]},
      {-a * c, 1 - a * d - b * c, -b * d, q[1]},
      {-c * c, -2 * c * d, 1 - d * d, q[2]}
    };
    for (int i = 0; i < 3; i++) {
      int pivot = i;
      for (int r = i + 1; r < 3; r++) {
        pivot = Math.abs(system[r][i]) > Math.abs(system[pivot][i]) ? r : pivot;
      }
      double[] swap = system[i];
      system[i] = system[pivot];
      system[pivot] = swap;
      for (int r = 0; r < 3; r++) {
        if (r != i) {
          double factor = system[r][i] / system[i][i];
          for (int k = i; k < 4; k++) {
            system[r][k] -= factor * system[i][k];
          }
        }
      }
    }
    return new double[] {
      system[0][3] / system[0][0], system[1][3] / system[1][1], system[2][3] / system[2][2]
    };
  }

  @Override
  public String toString() {
    return "LinearisedMode: energy=" + energy + ", mean field=" + meanField + ", damping="
        + damping;
  }
}
