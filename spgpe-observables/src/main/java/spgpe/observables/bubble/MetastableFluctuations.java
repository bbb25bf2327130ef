package spgpe.observables.bubble;

import java.util.Arrays;
import spgpe.internal.check.Check;
import spgpe.internal.measure.PairProfiles;
import spgpe.internal.measure.RingCorrelator;
import spgpe.model.Model;
import spgpe.observables.TimeAverage;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Fluctuations of cos phi in the metastable state, measured before the decay: from them follow the
 * thresholds of a bubble detector, see {@link BubbleSettings#from}.
 *
 * <p>Record {@link #observable} with {@link TimeAverage#beforeDecay} and evaluate with {@link #of}.
 * The phase length is the integral correlation length of sin phi, (L/2) &lt;(spatial mean of sin
 * phi)<sup>2</sup>&gt;/&lt;sin<sup>2</sup> phi&gt;: xi for correlations exp(-r/xi) on a ring much
 * longer than xi (a little more with a momentum cutoff). Immutable and thread-safe.
 */
public final class MetastableFluctuations {
  private final double mean;
  private final double[] covariance;
  private final int points;
  private final double spacing;
  private final double phaseLength;

  private MetastableFluctuations(
      double mean, double[] covariance, int points, double spacing, double phaseLength) {
    this.mean = mean;
    this.covariance = covariance;
    this.points = points;
    this.spacing = spacing;
    this.phaseLength = phaseLength;
  }

  /**
   * What must be recorded: the spatial correlations of cos phi and sin phi.
   *
   * @return the observable
   */
  public static Observable observable() {
    return new Observable() {
      @Override
      public String name() {
        return "fluctuations of the relative phase";
      }

      @Override
      public int size(Model model) {
        return 2 * SpatialCorrelation.cosine().size(model);
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        Scratch s = snapshot.scratch(this, Scratch.class, Scratch::of);
        PairProfiles pair = PairProfiles.of(snapshot);
        int half = result.length / 2;
        System.arraycopy(pair.cosine(), 0, s.ring().first(), 0, s.ring().first().length);
        System.arraycopy(pair.sine(), 0, s.ring().second(), 0, s.ring().second().length);
        s.ring().ownCorrelations(result, s.ofSine());
        Arrays.fill(result, half - 2, half, mean(pair.cosine()));
        System.arraycopy(s.ofSine(), 0, result, half, half - 2);
        Arrays.fill(result, 2 * half - 2, 2 * half, mean(pair.sine()));
      }
    };
  }

  @SuppressWarnings("ArrayRecordComponent") // compared by nobody
  private record Scratch(RingCorrelator ring, double[] ofSine) {
    static Scratch of(Model model) {
      return new Scratch(
          new RingCorrelator(model), new double[model.region().grid().points() / 2 + 1]);
    }
  }

  private static double mean(double[] profile) {
    double sum = 0;
    for (double value : profile) {
      sum += value;
    }
    return sum / profile.length;
  }

  /**
   * Evaluates an average.
   *
   * @param average average of {@link #observable} in the metastable state
   * @param model the model that was run
   * @return the fluctuations
   * @throws IllegalArgumentException if the average is of something else or holds no sample, or if
   *     the model is two-dimensional
   */
  public static MetastableFluctuations of(TimeAverage average, Model model) {
    Check.notNull(average, "average");
    Check.notNull(model, "model");
    Check.argument(
        model.region().grid().dimension() == 1,
        "the metastable fluctuations need a line (ring), not a plane: grid=%s",
        model.region().grid());
    int points = model.region().grid().points();
    int half = points / 2 + 3;
    Check.argument(
        average.size() == 2 * half,
        "the average must be of MetastableFluctuations.observable(): numbers=%s, expected=%s",
        average.size(), 2 * half);
    Check.argument(
        average.samples() > 0,
        "no sample lies in the metastable state: %s; start earlier or use a shorter margin",
        average);
    double mean = average.mean(half - 1);
    double[] covariance = new double[points / 2 + 1];
    for (int r = 0; r < covariance.length; r++) {
      covariance[r] = average.mean(r) - mean * mean;
    }
    double sum = 0;
    for (int r = 0; r < points; r++) {
      sum += average.mean(half + Math.min(r, points - r));
    }
    double square = average.mean(half);
    Check.argument(
        covariance[0] > 0 && square > 0,
        "the relative phase must fluctuate: variance of the cosine=%s, mean square of the sine=%s",
        covariance[0], square);
    double length = model.region().grid().axis(0).length();
    return new MetastableFluctuations(
        mean, covariance, points, length / points, length / 2 * (sum / points) / square);
  }

  /**
   * Mean of cos phi.
   *
   * @return mean
   */
  public double meanCosine() {
    return mean;
  }

  /**
   * Integral correlation length of sin phi.
   *
   * @return length
   */
  public double phaseLength() {
    return phaseLength;
  }

  /**
   * Standard deviation, at one point, of cos phi smoothed with a Gaussian.
   *
   * @param smoothing standard deviation of the Gaussian, a length, 0 for none
   * @return standard deviation
   * @throws IllegalArgumentException if the length is out of range
   */
  public double deviation(double smoothing) {
    double[] kernel = PeriodicSmoothing.kernel(points, spacing, smoothing);
    double sum = 0;
    for (int i = 0; i < points; i++) {
      for (int j = 0; j < points && kernel[i] > 0; j++) {
        int r = Math.abs(i - j);
        sum += kernel[i] * kernel[j] * covariance[Math.min(r, points - r)];
      }
    }
    return Math.sqrt(Math.max(0, sum));
  }

  @Override
  public String toString() {
    return "MetastableFluctuations: mean cosine " + mean + ", deviation " + deviation(0)
        + ", phase length " + phaseLength;
  }
}
