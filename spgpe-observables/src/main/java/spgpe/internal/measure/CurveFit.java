package spgpe.internal.measure;

import org.apache.commons.math3.exception.MathIllegalStateException;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresBuilder;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresOptimizer;
import org.apache.commons.math3.fitting.leastsquares.LevenbergMarquardtOptimizer;
import org.apache.commons.math3.fitting.leastsquares.MultivariateJacobianFunction;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.util.Pair;
import spgpe.internal.check.Check;

/** Least squares with a covariance matrix of the data, by the Levenberg-Marquardt algorithm. */
public final class CurveFit {
  /** A curve with its parameters. */
  @FunctionalInterface
  public interface Curve {
    /**
     * Value and derivatives.
     *
     * @param x position
     * @param parameters parameters
     * @param gradient overwritten with the derivatives with respect to the parameters
     * @return value
     */
    double value(double x, double[] parameters, double[] gradient);
  }

  /**
   * Result of a fit.
   *
   * @param parameters best parameters
   * @param covariance their covariance
   * @param chiSquare weighted sum of squares at the minimum
   * @param degreesOfFreedom points less parameters
   */
  @SuppressWarnings("ArrayRecordComponent") // handed on at once, never compared
  public record Result(
      double[] parameters, double[][] covariance, double chiSquare, int degreesOfFreedom) {
    /**
     * Standard error of a parameter.
     *
     * @param i index
     * @return standard error
     */
    public double error(int i) {
      return Math.sqrt(covariance[i][i]);
    }
  }

  private static final int MAX_ITERATIONS = 500;
  private static final double SINGULAR = 1e-12;

  private CurveFit() {}

  /**
   * Generalised least squares: weights are the inverse covariance.
   *
   * @param x positions
   * @param y values
   * @param covariance covariance of the values
   * @param scale factor on the inverse covariance, 1 if that is exact
   * @param start first guess
   * @param curve the curve
   * @return result
   * @throws IllegalArgumentException if the covariance is singular or no minimum is found
   */
  public static Result fit(
      double[] x, double[] y, double[][] covariance, double scale, double[] start, Curve curve) {
    LeastSquaresOptimizer.Optimum best =
        optimum(x, y, whitening(covariance, Math.sqrt(scale)), start, curve);
    return result(best, best.getCovariances(SINGULAR * SINGULAR), x.length - start.length);
  }

  /**
   * Least squares with the inverse variances as weights; the errors of the parameters take the
   * whole covariance into account: H J^T C J H with H = (J^T J)^-1, all in units of the single
   * errors.
   *
   * @param x positions
   * @param y values
   * @param covariance covariance of the values
   * @param start first guess
   * @param curve the curve
   * @return result; the sum of squares is not distributed as chi-square
   * @throws IllegalArgumentException if a variance is not positive or no minimum is found
   */
  public static Result fitWithVariances(
      double[] x, double[] y, double[][] covariance, double[] start, Curve curve) {
    int n = x.length;
    double[][] diagonal = new double[n][n];
    for (int i = 0; i < n; i++) {
      diagonal[i][i] = covariance[i][i];
    }
    RealMatrix whitening = whitening(diagonal, 1);
    LeastSquaresOptimizer.Optimum best = optimum(x, y, whitening, start, curve);
    RealMatrix correlation =
        whitening.multiply(new Array2DRowRealMatrix(covariance)).multiply(whitening.transpose());
    RealMatrix gain =
        best.getCovariances(SINGULAR * SINGULAR).multiply(best.getJacobian().transpose());
    return result(
        best, gain.multiply(correlation).multiply(gain.transpose()), n - start.length);
  }

  private static Result result(
      LeastSquaresOptimizer.Optimum best, RealMatrix covariance, int degreesOfFreedom) {
    return new Result(
        best.getPoint().toArray(), covariance.getData(),
        best.getResiduals().dotProduct(best.getResiduals()), degreesOfFreedom);
  }

  private static LeastSquaresOptimizer.Optimum optimum(
      double[] x, double[] y, RealMatrix whitening, double[] start, Curve curve) {
    Check.argument(
        x.length > start.length,
        "a fit needs more points than parameters: points=%s, parameters=%s",
        x.length, start.length);
    ArrayRealVector target = new ArrayRealVector(whitening.operate(y));
    MultivariateJacobianFunction model =
        point -> {
          double[] parameters = point.toArray();
          double[] values = new double[x.length];
          double[][] jacobian = new double[x.length][parameters.length];
          for (int i = 0; i < x.length; i++) {
            values[i] = curve.value(x[i], parameters, jacobian[i]);
          }
          return new Pair<>(
              new ArrayRealVector(whitening.operate(values)),
              whitening.multiply(new Array2DRowRealMatrix(jacobian, false)));
        };
    try {
      return new LevenbergMarquardtOptimizer()
          .optimize(
              new LeastSquaresBuilder()
                  .start(start).target(target).model(model)
                  .maxEvaluations(MAX_ITERATIONS).maxIterations(MAX_ITERATIONS).build());
    } catch (MathIllegalStateException e) {
      throw new IllegalArgumentException(
          "the fit found no minimum: points=" + x.length + ", cause=" + e.getMessage()
              + "; choose a range in which the data follow the curve", e);
    }
  }

  /** sqrt(scale) L^-1 with covariance = L L^T, rows and columns scaled to unit variance before. */
  private static RealMatrix whitening(double[][] covariance, double rootScale) {
    int n = covariance.length;
    double[] sigma = new double[n];
    double[][] correlation = new double[n][n];
    for (int i = 0; i < n; i++) {
      sigma[i] = Math.sqrt(covariance[i][i]);
      Check.argument(
          sigma[i] > 0 && Double.isFinite(sigma[i]),
          "every fitted point needs an error > 0: point=%s, error=%s", i, sigma[i]);
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        correlation[i][j] = i == j ? 1 : covariance[i][j] / sigma[i] / sigma[j];
      }
    }
    RealMatrix lower;
    try {
      lower =
          new CholeskyDecomposition(new Array2DRowRealMatrix(correlation, false), 1e-9, SINGULAR)
              .getL();
    } catch (NonPositiveDefiniteMatrixException e) {
      throw new IllegalArgumentException(
          "the covariance of the fitted points must not be singular: points=" + n
              + "; fit fewer points, use more trajectories, or ignore the covariance", e);
    }
    RealMatrix inverse = new Array2DRowRealMatrix(n, n);
    for (int column = 0; column < n; column++) {
      ArrayRealVector unit = new ArrayRealVector(n);
      unit.setEntry(column, rootScale / sigma[column]);
      MatrixUtils.solveLowerTriangularSystem(lower, unit);
      inverse.setColumnVector(column, unit);
    }
    return inverse;
  }
}
