package spgpe.theory;

import org.apache.commons.math3.ode.ContinuousOutputModel;
import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;
import org.apache.commons.math3.ode.events.EventHandler;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;
import org.apache.commons.math3.ode.sampling.StepHandler;
import org.jspecify.annotations.Nullable;
import spgpe.internal.check.Check;

/**
 * Circular critical bubble of the relative phase alone in two dimensions, densities frozen, found
 * by shooting. Lengths are in units of {@code 1/(2 sqrt(J))}; the energy is {@code (n/2)
 * B_2(lambda)}, independent of J. Scaling (Derrick, J. Math. Phys. 5, 1252 (1964)) makes the
 * potential energy vanish, so that {@code B_2} equals its gradient part. Immutable.
 */
public final class RadialBubble {
  private static final double START = 1e-3;
  private static final double END = 400;
  private static final double TOLERANCE = 1e-12;
  private static final double SPACING = 0.02;

  private final double lambda;
  private final double centralPhase;
  private final Shot shot;
  /** phi and phi' on a grid of spacing SPACING from START on. */
  private final double[][] samples;

  private RadialBubble(double lambda) {
    this.lambda = lambda;
    double square = lambda * lambda;
    // At the start the potential must lie below the false vacuum: tan^2(y/2) > lambda^2 - 1.
    double shallow = Math.log(Math.PI - 2 * Math.atan(Math.sqrt(square - 1)));
    double deep = Math.log(1e-12);
    for (int i = 0; i < 64 && shallow - deep > 1e-15 * Math.abs(deep); i++) {
      double middle = 0.5 * (shallow + deep);
      if (new Shot(square, Math.exp(middle), null).overshoots) {
        deep = middle;
      } else {
        shallow = middle;
      }
    }
    centralPhase = Math.exp(deep);
    ContinuousOutputModel path = new ContinuousOutputModel();
    shot = new Shot(square, centralPhase, path);
    samples = sample(path);
    double mismatch = Math.abs(shot.potential) / shot.gradient;
    if (!(mismatch < 1e-5)) {
      throw new UnconvergedException(
          "the radial bubble did not converge: virial mismatch " + mismatch + " at lambda="
              + lambda);
    }
  }

  /**
   * Solves for the bubble.
   *
   * @param lambda barrier parameter, 1.02 to 3; thinner walls need a starting phase below rounding
   * @return the bubble
   * @throws IllegalArgumentException if lambda is outside the range
   * @throws UnconvergedException if the virial identity is violated by more than 1e-5
   */
  public static RadialBubble of(double lambda) {
    Check.argument(
        lambda >= 1.02 && lambda <= 3,
        "lambda must lie in [1.02, 3] (no metastable state below 1): lambda=%s", lambda);
    return new RadialBubble(lambda);
  }

  /**
   * Barrier parameter.
   *
   * @return lambda
   */
  public double lambda() {
    return lambda;
  }

  /**
   * Dimensionless energy.
   *
   * @return {@code B_2 = integral of phi'^2/2 + U} over the plane
   */
  public double reducedEnergy() {
    return 2 * Math.PI * (shot.gradient + shot.potential);
  }

  /**
   * Gradient part of the dimensionless energy.
   *
   * @return the integral of {@code phi'^2/2}; equals the energy for an exact bubble
   */
  public double gradientEnergy() {
    return 2 * Math.PI * shot.gradient;
  }

  /**
   * Energy above the false vacuum.
   *
   * @param density density n of one component (1/area), greater than zero
   * @return {@code (n/2) B_2} (energy)
   * @throws IllegalArgumentException if the density is not finite and positive
   */
  public double energy(double density) {
    return 0.5 * Check.positive(density, "density") * reducedEnergy();
  }

  /**
   * Relative phase in the centre.
   *
   * @return phi(0), between zero (true vacuum) and pi
   */
  public double centralPhase() {
    return centralPhase;
  }

  /**
   * Radius at which {@code pi - phi} has fallen to half of its central value.
   *
   * @return the radius in units of {@code 1/(2 sqrt(J))}
   */
  public double halfRadius() {
    return shot.halfRadius;
  }

  private static double[][] sample(ContinuousOutputModel path) {
    int count = (int) ((path.getFinalTime() - START) / SPACING) + 1;
    double[][] values = new double[count][];
    for (int i = 0; i < count; i++) {
      path.setInterpolatedTime(START + i * SPACING);
      double[] y = path.getInterpolatedState();
      values[i] = new double[] {y[0], y[1]};
    }
    return values;
  }

  /**
   * Relative phase of the bubble.
   *
   * @param radius distance from the centre in units of {@code 1/(2 sqrt(J))}, not negative
   * @return phi(r), error below 1e-6; pi beyond the resolved tail
   * @throws IllegalArgumentException if the radius is negative or not finite
   */
  public double phase(double radius) {
    double x = (Check.notNegative(radius, "radius") - START) / SPACING;
    int i = (int) Math.floor(Math.max(0, x));
    if (i + 1 >= samples.length) {
      return Math.PI;
    }
    double t = Math.max(0, x - i);
    double[] a = samples[i];
    double[] b = samples[i + 1];
    double rest = 1 - t;
    // Cubic Hermite interpolation.
    return rest * rest * ((1 + 2 * t) * a[0] + t * SPACING * a[1])
        + t * t * ((3 - 2 * t) * b[0] - rest * SPACING * b[1]);
  }

  /** One trajectory from the centre; y = (phi, phi', gradient energy, potential energy). */
  private static final class Shot implements FirstOrderDifferentialEquations {
    private final double square;
    boolean overshoots;
    double gradient;
    double potential;
    double halfRadius = Double.NaN;

    Shot(double square, double phase, @Nullable StepHandler recorder) {
      this.square = square;
      double slope = 0.5 * force(phase) * START;
      double[] y = {
        phase + 0.5 * slope * START, slope, 0, 0.5 * START * START * potential(phase)
      };
      DormandPrince853Integrator integrator =
          new DormandPrince853Integrator(1e-10, 5, TOLERANCE, TOLERANCE);
      integrator.addEventHandler(new Crossing(1, 0, true), 0.5, 1e-12, 200);
      integrator.addEventHandler(new Crossing(0, Math.PI, true), 0.5, 1e-12, 200);
      Crossing half = new Crossing(0, 0.5 * (Math.PI + phase), false);
      integrator.addEventHandler(half, 0.5, 1e-10, 200);
      if (recorder != null) {
        integrator.addStepHandler(recorder);
      }
      integrator.integrate(this, START, y, END, y);
      overshoots = y[1] > 0.5 * Math.abs(y[0] - Math.PI);
      gradient = y[2];
      potential = y[3];
      halfRadius = half.position;
    }

    private double force(double phi) {
      return Math.sin(phi) * (1 + square * Math.cos(phi));
    }

    private double potential(double phi) {
      double c = Math.cos(0.5 * phi);
      double s = Math.sin(phi);
      return -2 * c * c + 0.5 * square * s * s;
    }

    @Override
    public int getDimension() {
      return 4;
    }

    @Override
    public void computeDerivatives(double r, double[] y, double[] derivative) {
      derivative[0] = y[1];
      derivative[1] = force(y[0]) - y[1] / r;
      derivative[2] = 0.5 * y[1] * y[1] * r;
      derivative[3] = potential(y[0]) * r;
    }
  }

  /** Records where a component passes a level; optionally ends the integration there. */
  private static final class Crossing implements EventHandler {
    private final int component;
    private final double level;
    private final boolean stops;
    double position = Double.NaN;

    Crossing(int component, double level, boolean stops) {
      this.component = component;
      this.level = level;
      this.stops = stops;
    }

    @Override
    public void init(double start, double[] y, double end) {}

    @Override
    public double g(double r, double[] y) {
      return y[component] - level;
    }

    @Override
    public Action eventOccurred(double r, double[] y, boolean increasing) {
      if (Double.isNaN(position)) {
        position = r;
      }
      return stops ? Action.STOP : Action.CONTINUE;
    }

    @Override
    public void resetState(double r, double[] y) {}
  }
}
