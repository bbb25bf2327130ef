package spgpe.statistics;

import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import spgpe.internal.check.Check;

/**
 * What an Arrhenius fit minimises, as a function of the barrier with the prefactor profiled out.
 */
abstract class ArrheniusObjective {
  final double[] beta;
  final OptionalDouble fixedLogPrefactor;

  ArrheniusObjective(double[] beta, OptionalDouble fixedLogPrefactor) {
    this.beta = beta;
    this.fixedLogPrefactor = fixedLogPrefactor;
  }

  abstract double bestBarrier();

  /** Fixed or best logarithm of the prefactor for a given barrier. */
  abstract double logPrefactor(double barrier);

  abstract double deviance(double barrier);

  /** Weight of point i in the information matrix at the best fit. */
  abstract double weight(int i, double barrier);

  final int degreesOfFreedom() {
    return beta.length - (fixedLogPrefactor.isPresent() ? 1 : 2);
  }

  /** Variance of ln A, covariance of ln A and B, variance of B. */
  final double[] covariance(double barrier) {
    double sum = 0;
    double mean = 0;
    for (int i = 0; i < beta.length; i++) {
      sum += weight(i, barrier);
      mean += weight(i, barrier) * beta[i];
    }
    mean = fixedLogPrefactor.isPresent() ? 0 : mean / sum;
    double spread = 0;
    for (int i = 0; i < beta.length; i++) {
      spread += weight(i, barrier) * (beta[i] - mean) * (beta[i] - mean);
    }
    double variance = 1 / spread;
    return new double[] {
      fixedLogPrefactor.isPresent() ? 0 : 1 / sum + mean * mean * variance,
      mean * variance,
      variance
    };
  }

  static ArrheniusObjective leastSquares(
      List<ArrheniusFit.MeasuredRate> rates, OptionalDouble fixedLogPrefactor) {
    Check.notNull(rates, "rates");
    int n = rates.size();
    double[] beta = new double[n];
    double[] log = new double[n];
    double[] weight = new double[n];
    for (int i = 0; i < n; i++) {
      ArrheniusFit.MeasuredRate rate = Check.notNull(rates.get(i), "rates[" + i + "]");
      beta[i] = 1 / rate.temperature();
      log[i] = Math.log(rate.rate());
      double relative = rate.standardError() / rate.rate();
      weight[i] = 1 / (relative * relative);
    }
    checkTemperatures(beta, fixedLogPrefactor, "rates");
    return new LeastSquares(beta, fixedLogPrefactor, log, weight);
  }

  static ArrheniusObjective likelihood(
      List<ArrheniusFit.CountedRate> rates, OptionalDouble fixedLogPrefactor) {
    Check.notNull(rates, "rates");
    int n = rates.size();
    double[] beta = new double[n];
    double[] events = new double[n];
    double[] logExposure = new double[n];
    double[] betaWithEvents = new double[n];
    int withEvents = 0;
    for (int i = 0; i < n; i++) {
      ArrheniusFit.CountedRate rate = Check.notNull(rates.get(i), "rates[" + i + "]");
      beta[i] = 1 / rate.temperature();
      events[i] = rate.rate().events();
      logExposure[i] = Math.log(rate.rate().exposure());
      if (events[i] > 0) {
        betaWithEvents[withEvents++] = beta[i];
      }
    }
    checkTemperatures(
        Arrays.copyOf(betaWithEvents, withEvents), fixedLogPrefactor, "rates with events");
    return new Likelihood(beta, fixedLogPrefactor, events, logExposure);
  }

  private static void checkTemperatures(
      double[] beta, OptionalDouble fixedLogPrefactor, String what) {
    long distinct = Arrays.stream(beta).distinct().count();
    int needed = fixedLogPrefactor.isPresent() ? 1 : 2;
    Check.argument(
        distinct >= needed,
        "the fit needs %s at %s different temperatures or more: temperatures=%s",
        what,
        needed,
        distinct);
  }

  private static final class LeastSquares extends ArrheniusObjective {
    private final double[] log;
    private final double[] weight;
    private final double meanBeta;
    private final double meanLog;

    LeastSquares(double[] beta, OptionalDouble fixedLogPrefactor, double[] log, double[] weight) {
      super(beta, fixedLogPrefactor);
      this.log = log;
      this.weight = weight;
      double sum = 0;
      double sumBeta = 0;
      double sumLog = 0;
      for (int i = 0; i < beta.length; i++) {
        sum += weight[i];
        sumBeta += weight[i] * beta[i];
        sumLog += weight[i] * log[i];
      }
      meanBeta = sumBeta / sum;
      meanLog = sumLog / sum;
    }

    @Override
    double bestBarrier() {
      double originBeta = fixedLogPrefactor.isPresent() ? 0 : meanBeta;
      double originLog = fixedLogPrefactor.orElse(meanLog);
      double product = 0;
      double square = 0;
      for (int i = 0; i < beta.length; i++) {
        double b = beta[i] - originBeta;
        product += weight[i] * b * (log[i] - originLog);
        square += weight[i] * b * b;
      }
      return -product / square;
    }

    @Override
    double logPrefactor(double barrier) {
      return fixedLogPrefactor.orElse(meanLog + barrier * meanBeta);
    }

    @Override
    double deviance(double barrier) {
      double logA = logPrefactor(barrier);
      double sum = 0;
      for (int i = 0; i < beta.length; i++) {
        double rest = log[i] - logA + barrier * beta[i];
        sum += weight[i] * rest * rest;
      }
      return sum;
    }

    @Override
    double weight(int i, double barrier) {
      return weight[i];
    }
  }

  private static final class Likelihood extends ArrheniusObjective {
    private final double[] events;
    private final double[] logExposure;

    Likelihood(
        double[] beta, OptionalDouble fixedLogPrefactor, double[] events, double[] logExposure) {
      super(beta, fixedLogPrefactor);
      this.events = events;
      this.logExposure = logExposure;
    }

    @Override
    double bestBarrier() {
      double step = 0;
      for (double b : beta) {
        step = Math.max(step, 1 / b);
      }
      // The score falls with the barrier, for the likelihood is concave.
      return score(0) > 0
          ? Bisection.root(this::score, 0, step)
          : Bisection.root(this::score, 0, -step);
    }

    private double score(double barrier) {
      double sum = 0;
      for (int i = 0; i < beta.length; i++) {
        sum += (weight(i, barrier) - events[i]) * beta[i];
      }
      return sum;
    }

    @Override
    double logPrefactor(double barrier) {
      if (fixedLogPrefactor.isPresent()) {
        return fixedLogPrefactor.getAsDouble();
      }
      double largest = Double.NEGATIVE_INFINITY;
      for (int i = 0; i < beta.length; i++) {
        largest = Math.max(largest, logExposure[i] - barrier * beta[i]);
      }
      double total = 0;
      double sum = 0;
      for (int i = 0; i < beta.length; i++) {
        total += events[i];
        sum += Math.exp(logExposure[i] - barrier * beta[i] - largest);
      }
      return Math.log(total) - Math.log(sum) - largest;
    }

    @Override
    double deviance(double barrier) {
      double logA = logPrefactor(barrier);
      double sum = 0;
      for (int i = 0; i < beta.length; i++) {
        double logFitted = logA + logExposure[i] - barrier * beta[i];
        double own = events[i] > 0 ? events[i] * (Math.log(events[i]) - logFitted) : 0;
        sum += 2 * (own - events[i] + Math.exp(logFitted));
      }
      return sum;
    }

    @Override
    double weight(int i, double barrier) {
      return Math.exp(logPrefactor(barrier) + logExposure[i] - barrier * beta[i]);
    }
  }
}
