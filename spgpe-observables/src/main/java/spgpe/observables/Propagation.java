package spgpe.observables;

import java.util.function.UnaryOperator;
import spgpe.internal.check.Check;
import spgpe.internal.measure.ClusterMoments;

/** Linear propagation of errors. */
final class Propagation {
  private static final double STEP = 1e-3;

  private Propagation() {}

  static Estimates through(ClusterMoments sums, UnaryOperator<double[]> function) {
    int size = sums.size();
    double[] at = new double[size];
    double[] error = new double[size];
    for (int i = 0; i < size; i++) {
      at[i] = sums.mean(i);
      error[i] = Math.sqrt(sums.covariance(i, i));
    }
    double[] values = function.apply(at.clone()).clone();
    double[][] jacobian = jacobian(at, error, values.length, function);
    double[][] half = new double[values.length][size];
    for (int a = 0; a < values.length; a++) {
      for (int j = 0; j < size; j++) {
        double sum = 0;
        for (int i = 0; i < size; i++) {
          if (jacobian[a][i] != 0) {
            sum += jacobian[a][i] * sums.covariance(i, j);
          }
        }
        half[a][j] = sum;
      }
    }
    double[][] covariance = new double[values.length][values.length];
    for (int a = 0; a < values.length; a++) {
      for (int b = 0; b <= a; b++) {
        double sum = 0;
        for (int j = 0; j < size; j++) {
          sum += half[a][j] * jacobian[b][j];
        }
        covariance[a][b] = a == b ? Math.max(0, sum) : sum;
        covariance[b][a] = covariance[a][b];
      }
    }
    return Estimates.of(values, covariance, sums.clusters());
  }

  private static double[][] jacobian(
      double[] at, double[] error, int outputs, UnaryOperator<double[]> function) {
    double[][] jacobian = new double[outputs][at.length];
    for (int i = 0; i < at.length; i++) {
      double low = at[i] - STEP * error[i];
      double high = at[i] + STEP * error[i];
      if (!(high > low)) {
        continue; // an exact number carries no error
      }
      double[] shifted = at.clone();
      shifted[i] = high;
      double[] above = function.apply(shifted).clone();
      shifted = at.clone();
      shifted[i] = low;
      double[] below = function.apply(shifted);
      Check.argument(
          above.length == outputs && below.length == outputs,
          "a function of averages must always give as many numbers: numbers=%s and %s",
          outputs, above.length);
      for (int a = 0; a < outputs; a++) {
        jacobian[a][i] = (above[a] - below[a]) / (high - low);
      }
    }
    return jacobian;
  }
}
