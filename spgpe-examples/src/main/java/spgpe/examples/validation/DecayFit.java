package spgpe.examples.validation;

import spgpe.model.Model;
import spgpe.observables.TimeAverage;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.projector.CoherentRegion;
import spgpe.statistics.Estimate;

/**
 * Algebraic and exponential decay of g1 on a periodic square, with its images.
 *
 * <p>Algebraic: g1 = A exp(-2 pi eta G), G(r) = V^-1 sum over k of (1 - cos k r)/k^2, what Gaussian
 * phase fluctuations give; G grows like ln(r)/(2 pi), so that g1 falls as r^-eta. Exponential: g1 =
 * A times the sum over images of exp(-|r|/xi). Both by least squares of the logarithm, weighted by
 * the single errors. The points are correlated: misfits (mean weighted squares) rank the two forms,
 * they are no chi-squares of known law.
 *
 * @param exponent eta with its error across trajectories
 * @param length xi
 * @param algebraicMisfit weighted mean square of the algebraic fit
 * @param exponentialMisfit weighted mean square of the exponential fit
 * @param from first distance of the fit
 * @param to last distance
 */
record DecayFit(
    Estimate exponent, double length, double algebraicMisfit, double exponentialMisfit, double from,
    double to) {
  /** About two healing lengths. */
  private static final double SHORTEST = 2;

  /** Below this many errors a logarithm is not Gaussian. */
  private static final double CLEAR = 5;

  static DecayFit of(SpatialCorrelation first, TimeAverage average, Model model) {
    double[] r = first.distances(model);
    int from = (int) java.util.Arrays.stream(r).filter(d -> d < SHORTEST).count();
    int end = from;
    while (end < r.length && average.mean(end) > CLEAR * average.standardError(end)) {
      end++;
    }
    int count = end - from;
    if (count < 4) {
      throw new IllegalArgumentException(
          "too few distances with a clear correlation: " + count + "; use more trajectories");
    }
    double[] weights = new double[count];
    double[] logs = new double[count];
    for (int i = 0; i < count; i++) {
      weights[i] = Math.pow(average.mean(from + i) / average.standardError(from + i), 2);
      logs[i] = Math.log(average.mean(from + i));
    }
    double[] green =
        part(
            shellAverages(first, model, (x, y) -> green(model.region(), x, y)), from, count);
    Estimate slope =
        average.derived(
            v -> {
              double[] y = new double[count];
              for (int i = 0; i < count; i++) {
                y[i] = Math.log(v[from + i]);
              }
              return -slope(green, y, weights) / (2 * Math.PI);
            });
    double xi = bestLength(first, model, from, logs, weights);
    return new DecayFit(
        slope, xi, misfit(green, logs, weights, slope(green, logs, weights)),
        misfit(exponential(first, model, from, count, xi), logs, weights, 1), r[from],
        r[end - 1]);
  }

  @FunctionalInterface
  private interface Profile {
    double at(double x, double y);
  }

  /** Averages over the shells of the correlation. */
  private static double[] shellAverages(SpatialCorrelation first, Model model, Profile profile) {
    double[] r = first.distances(model);
    double spacing = model.region().grid().axis(0).spacing();
    double side = model.region().grid().axis(0).length();
    double[] sum = new double[r.length];
    int[] weights = first.weights(model);
    for (int p = 0; p < model.region().grid().points(); p++) {
      double x = Math.IEEEremainder(model.region().grid().coordinate(0, p), side);
      double y = Math.IEEEremainder(model.region().grid().coordinate(1, p), side);
      double distance = Math.hypot(x, y);
      int shell = distance == 0 ? 0 : Math.max(1, (int) Math.rint(distance / spacing));
      if (distance <= side / 2 * (1 + 1e-9)) {
        sum[shell] += profile.at(x, y) / weights[shell];
      }
    }
    return sum;
  }

  private static double[] part(double[] values, int from, int count) {
    return java.util.Arrays.copyOfRange(values, from, from + count);
  }

  private static double green(CoherentRegion region, double x, double y) {
    double sum = 0;
    for (int m = 0; m < region.modes(); m++) {
      double square = region.kSquared(m);
      if (square > 0) {
        sum +=
            (1 - Math.cos(region.waveNumber(0, m) * x + region.waveNumber(1, m) * y)) / square;
      }
    }
    return sum / region.grid().volume();
  }

  private static double[] exponential(
      SpatialCorrelation first, Model model, int from, int count, double xi) {
    double side = model.region().grid().axis(0).length();
    double[] f =
        shellAverages(
            first, model,
            (x, y) -> {
              double sum = 0;
              for (int i = -2; i <= 2; i++) {
                for (int j = -2; j <= 2; j++) {
                  sum += Math.exp(-Math.hypot(x + i * side, y + j * side) / xi);
                }
              }
              return sum;
            });
    double[] logs = part(f, from, count);
    for (int i = 0; i < count; i++) {
      logs[i] = Math.log(logs[i]);
    }
    return logs;
  }

  private static double bestLength(
      SpatialCorrelation first, Model model, int from, double[] logs, double[] weights) {
    double low = Math.log(0.3);
    double high = Math.log(30 * model.region().grid().axis(0).length());
    double golden = (Math.sqrt(5) - 1) / 2;
    for (int i = 0; i < 40; i++) {
      double a = high - golden * (high - low);
      double b = low + golden * (high - low);
      if (misfit(exponential(first, model, from, logs.length, Math.exp(a)), logs, weights, 1)
          < misfit(exponential(first, model, from, logs.length, Math.exp(b)), logs, weights, 1)) {
        high = b;
      } else {
        low = a;
      }
    }
    return Math.exp((low + high) / 2);
  }

  private static double mean(double[] x, double[] weights) {
    double sum = 0;
    double all = 0;
    for (int i = 0; i < x.length; i++) {
      sum += weights[i] * x[i];
      all += weights[i];
    }
    return sum / all;
  }

  private static double slope(double[] x, double[] y, double[] weights) {
    double centreX = mean(x, weights);
    double centreY = mean(y, weights);
    double xy = 0;
    double xx = 0;
    for (int i = 0; i < x.length; i++) {
      xy += weights[i] * (x[i] - centreX) * (y[i] - centreY);
      xx += weights[i] * (x[i] - centreX) * (x[i] - centreX);
    }
    return xy / xx;
  }

  /** Weighted squares about a line of that slope and free height, over the degrees of freedom. */
  private static double misfit(double[] x, double[] y, double[] weights, double slope) {
    double height = mean(y, weights) - slope * mean(x, weights);
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      double rest = y[i] - height - slope * x[i];
      sum += weights[i] * rest * rest;
    }
    return sum / (x.length - 2);
  }
}
