package spgpe.observables.bubble;

import java.util.Arrays;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.check.Check;
import spgpe.internal.measure.Correlator;
import spgpe.internal.measure.PairProfiles;
import spgpe.internal.measure.Shells;
import spgpe.model.Model;
import spgpe.observables.TimeAverage;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.projector.CoherentRegion;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Fluctuations of cos phi in the metastable state, measured before the decay: from them follow the
 * thresholds of a bubble detector, see {@link BubbleSettings#from}.
 *
 * <p>Record {@link #observable} with {@link TimeAverage#beforeDecay} and evaluate with {@link #of}.
 * The phase length is the integral correlation length of sin phi, (L/2) &lt;(spatial mean of sin
 * phi)<sup>2</sup>&gt;/&lt;sin<sup>2</sup> phi&gt;: xi for correlations exp(-r/xi) on a ring much
 * longer than xi (a little more with a momentum cutoff). On a plane, where the integral of a
 * correlation with the spectrum 1/(k<sup>2</sup> + 1/xi<sup>2</sup>) depends on the cutoff, it is
 * the xi for which that spectrum, summed up to the cutoff, has the measured ratio V &lt;(spatial
 * mean of sin phi)<sup>2</sup>&gt;/&lt;sin<sup>2</sup> phi&gt;. Immutable and thread-safe.
 */
public final class MetastableFluctuations {
  private final PeriodicGrid grid;
  private final double mean;
  private final double[] covariance;
  private final double phaseLength;

  private MetastableFluctuations(
      PeriodicGrid grid, double mean, double[] covariance, double phaseLength) {
    this.grid = grid;
    this.mean = mean;
    this.covariance = covariance;
    this.phaseLength = phaseLength;
  }

  /**
   * What must be recorded: the spatial correlations of cos phi and sin phi, and the square of the
   * spatial mean of sin phi.
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
        return 2 * SpatialCorrelation.cosine().size(model) + 1;
      }

      @Override
      public void measure(Snapshot snapshot, double[] result) {
        Scratch s = snapshot.scratch(this, Scratch.class, Scratch::of);
        PairProfiles pair = PairProfiles.of(snapshot);
        int points = pair.cosine().length;
        System.arraycopy(pair.cosine(), 0, s.correlator().first(), 0, points);
        System.arraycopy(pair.sine(), 0, s.correlator().second(), 0, points);
        s.correlator().ownCorrelations(result, s.ofSine());
        int half = s.ofSine().length + 2;
        double sineMean = mean(pair.sine());
        Arrays.fill(result, half - 2, half, mean(pair.cosine()));
        System.arraycopy(s.ofSine(), 0, result, half, half - 2);
        Arrays.fill(result, 2 * half - 2, 2 * half, sineMean);
        result[2 * half] = sineMean * sineMean;
      }
    };
  }

  @SuppressWarnings("ArrayRecordComponent") // compared by nobody
  private record Scratch(Correlator correlator, double[] ofSine) {
    static Scratch of(Model model) {
      return new Scratch(
          Correlator.of(model),
          new double[Correlator.distances(model.region().grid()).length]);
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
   * @throws IllegalArgumentException if the average is of something else or holds no sample
   */
  public static MetastableFluctuations of(TimeAverage average, Model model) {
    Check.notNull(average, "average");
    Check.notNull(model, "model");
    int half = SpatialCorrelation.cosine().size(model);
    Check.argument(
        average.size() == 2 * half + 1,
        "the average must be of MetastableFluctuations.observable(): numbers=%s, expected=%s",
        average.size(), 2 * half + 1);
    Check.argument(
        average.samples() > 0,
        "no sample lies in the metastable state: %s; start earlier or use a shorter margin",
        average);
    double mean = average.mean(half - 1);
    double[] covariance = new double[half - 2];
    for (int r = 0; r < covariance.length; r++) {
      covariance[r] = average.mean(r) - mean * mean;
    }
    double square = average.mean(half);
    Check.argument(
        covariance[0] > 0 && square > 0,
        "the relative phase must fluctuate: variance of the cosine=%s, mean square of the sine=%s",
        covariance[0], square);
    double coherence = average.mean(2 * half) / square;
    CoherentRegion region = model.region();
    return new MetastableFluctuations(
        region.grid(), mean, covariance,
        region.grid().dimension() == 1
            ? region.grid().axis(0).length() / 2 * coherence
            : planarLength(region, coherence));
  }

  /** The xi with sum over k of 1/(1 + xi^2 k^2) = 1/coherence, by bisection. */
  private static double planarLength(CoherentRegion region, double coherence) {
    double low = 0;
    double high = Math.sqrt(region.grid().volume());
    for (int i = 0; i < 60; i++) {
      double xi = (low + high) / 2;
      double sum = 0;
      for (int m = 0; m < region.modes(); m++) {
        sum += 1 / (1 + xi * xi * region.kSquared(m));
      }
      if (sum * coherence > 1) {
        low = xi;
      } else {
        high = xi;
      }
    }
    return (low + high) / 2;
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
    return Math.sqrt(
        Math.max(
            0, grid.dimension() == 1 ? variance(smoothing) : planarVariance(smoothing)));
  }

  private double variance(double smoothing) {
    int points = grid.points();
    double[] kernel = PeriodicSmoothing.kernel(points, grid.axis(0).spacing(), smoothing);
    double sum = 0;
    for (int i = 0; i < points; i++) {
      for (int j = 0; j < points && kernel[i] > 0; j++) {
        int r = Math.abs(i - j);
        sum += kernel[i] * kernel[j] * covariance[Math.min(r, points - r)];
      }
    }
    return sum;
  }

  /** Two smoothings are one of sqrt(2) times the width; nothing beyond half the shorter side. */
  private double planarVariance(double smoothing) {
    double[][] kernels = new double[2][];
    for (int a = 0; a < 2; a++) {
      kernels[a] =
          PeriodicSmoothing.kernel(
              grid.axis(a).points(), grid.axis(a).spacing(), Math.sqrt(2) * smoothing);
    }
    int nx = grid.axis(0).points();
    double[] weights = new double[grid.points()];
    for (int p = 0; p < weights.length; p++) {
      weights[p] = kernels[0][p % nx] * kernels[1][p / nx];
    }
    Shells shells = Shells.ofPoints(grid);
    double[] mean = new double[shells.size()];
    shells.average(weights, 1, 0, mean);
    int[] count = shells.weights();
    double sum = 0;
    for (int s = 0; s < mean.length; s++) {
      sum += count[s] * mean[s] * covariance[s];
    }
    return sum;
  }

  @Override
  public String toString() {
    return "MetastableFluctuations: mean cosine " + mean + ", deviation " + deviation(0)
        + ", phase length " + phaseLength;
  }
}
