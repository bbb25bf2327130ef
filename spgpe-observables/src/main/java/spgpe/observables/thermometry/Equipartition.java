package spgpe.observables.thermometry;

import java.util.function.Function;
import spgpe.internal.check.Check;
import spgpe.internal.measure.CurvatureMeter;
import spgpe.internal.measure.CurveFit;
import spgpe.model.Model;
import spgpe.observables.Estimates;
import spgpe.statistics.Estimate;
import spgpe.observables.TimeAverage;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Equipartition in bands of |k|: for every mode and any interaction, in the ensemble exp(-K/T),
 *
 * <pre>&lt; Re a_k^* dK/da_k^* &gt; = T,
 * that is   &lt; Re a_k^* dE/da_k^* &gt; = T + mu &lt; |a_k|^2 &gt;.</pre>
 *
 * <p>The first form, {@link #temperatures}, takes mu from the model's reservoir and gives one
 * temperature for each band: bands that disagree are not in equilibrium, or the time step heats
 * them. The second, {@link #fit}, finds T and mu from the field alone (equal mu of the components).
 * The condensate mode has a large variance; give it a band of its own. Measures for each band the
 * mean over its modes and components of Re a<sup>*</sup> dE/da<sup>*</sup> - mu |a|<sup>2</sup>,
 * then the same of Re a<sup>*</sup> dE/da<sup>*</sup> and |a|<sup>2</sup>. Immutable and
 * thread-safe.
 */
public final class Equipartition implements Observable {
  private static final int ITERATIONS = 6;

  private static final class Scratch {
    final int[] band;
    final int[] count;

    Scratch(Model model, double[] edges) {
      band = bands(model.region(), edges);
      count = new int[edges.length - 1];
      for (int b : band) {
        if (b >= 0) {
          count[b] += model.components();
        }
      }
    }
  }

  private final double[] edges;
  private final Function<Model, Scratch> maker; // made once: a measurement allocates nothing

  private Equipartition(double[] edges) {
    this.edges = edges;
    this.maker = model -> new Scratch(model, edges);
  }

  /**
   * Bands edges[b] &le; |k| &lt; edges[b+1].
   *
   * @param edges wave numbers, not negative, increasing, at least two
   * @return the observable
   * @throws IllegalArgumentException if the edges are out of range or order; when used, if a band
   *     holds no mode
   */
  public static Equipartition inBands(double... edges) {
    Check.notNull(edges, "edges");
    Check.argument(edges.length >= 2, "bands need at least two edges: edges=%s", edges.length);
    for (int i = 0; i < edges.length; i++) {
      Check.notNegative(edges[i], "band edge (wave number)");
      Check.argument(
          i == 0 || edges[i] > edges[i - 1],
          "band edges must increase: edges[%s]=%s", i, edges[i]);
    }
    return new Equipartition(edges.clone());
  }

  /**
   * All modes in one band.
   *
   * @return the observable
   */
  public static Equipartition overall() {
    return new Equipartition(new double[] {0, Double.MAX_VALUE});
  }

  /**
   * Number of bands.
   *
   * @return count
   */
  public int bands() {
    return edges.length - 1;
  }

  @Override
  public String name() {
    return "equipartition";
  }

  @Override
  public int size(Model model) {
    int[] count = new int[bands()];
    for (int b : bands(model.region(), edges)) {
      if (b >= 0) {
        count[b]++;
      }
    }
    for (int b = 0; b < count.length; b++) {
      Check.argument(
          count[b] > 0, "every band must hold a kept mode: band=%s, from k=%s, to k=%s",
          b, edges[b], edges[b + 1]);
    }
    return 3 * bands();
  }

  private static int[] bands(CoherentRegion region, double[] edges) {
    int[] band = new int[region.modes()];
    for (int m = 0; m < band.length; m++) {
      double k = Math.sqrt(region.kSquared(m));
      band[m] = -1;
      for (int b = 0; b + 1 < edges.length; b++) {
        if (k >= edges[b] && k < edges[b + 1]) {
          band[m] = b;
        }
      }
    }
    return band;
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    Scratch s = snapshot.scratch(this, Scratch.class, maker);
    Amplitudes a = snapshot.amplitudes();
    Amplitudes force = CurvatureMeter.at(snapshot).gradient();
    java.util.Arrays.fill(result, 0);
    int bands = bands();
    for (int c = 0; c < a.components(); c++) {
      double mu = snapshot.model().reservoir().chemicalPotential(c);
      for (int m = 0; m < s.band.length; m++) {
        int b = s.band[m];
        if (b < 0) {
          continue;
        }
        double re = a.re(c)[m];
        double im = a.im(c)[m];
        double work = re * force.re(c)[m] + im * force.im(c)[m];
        double n = re * re + im * im;
        result[b] += work / s.count[b];
        result[bands + b] += (work + mu * n) / s.count[b];
        result[2 * bands + b] += n / s.count[b];
      }
    }
  }

  /**
   * Temperature of each band.
   *
   * @param average average of this observable
   * @return one temperature for each band
   * @throws IllegalArgumentException if the average is not of this observable's size
   * @throws IllegalStateException with fewer than two trajectories
   */
  public Estimates temperatures(TimeAverage average) {
    require(average);
    int bands = bands();
    return average.derivedVector(v -> java.util.Arrays.copyOf(v, bands));
  }

  /**
   * Temperature and chemical potential from the field alone.
   *
   * @param average average of this observable with at least three bands of different occupation
   * @return the fit
   * @throws IllegalArgumentException if the average is not of this observable's size, or has fewer
   *     than three bands or too few trajectories for their covariance
   * @throws IllegalStateException with fewer than two trajectories
   */
  public EquipartitionFit fit(TimeAverage average) {
    require(average);
    int bands = bands();
    Check.argument(bands >= 3, "a fit of T and mu needs at least three bands: bands=%s", bands);
    Check.argument(
        average.trajectories() > bands + 2,
        "the covariance of b bands needs more than b + 2 trajectories: bands=%s, trajectories=%s",
        bands, average.trajectories());
    double[] work = new double[bands];
    double[] occupation = new double[bands];
    int least = 0;
    int most = 0;
    for (int b = 0; b < bands; b++) {
      work[b] = average.mean(bands + b);
      occupation[b] = average.mean(2 * bands + b);
      least = occupation[b] < occupation[least] ? b : least;
      most = occupation[b] > occupation[most] ? b : most;
    }
    double mu = (work[most] - work[least]) / (occupation[most] - occupation[least]);
    double scale = (average.trajectories() - bands - 2.0) / (average.trajectories() - 1.0);
    CurveFit.Result result = fitOnce(average, occupation, work, mu, scale);
    for (int i = 1; i < ITERATIONS; i++) {
      result = fitOnce(average, occupation, work, result.parameters()[1], scale);
    }
    return new EquipartitionFit(
        new Estimate(result.parameters()[0], result.error(0)),
        new Estimate(result.parameters()[1], result.error(1)),
        result.chiSquare(), result.degreesOfFreedom());
  }

  /** Weights are the covariance of work - mu n, in which the common fluctuation cancels. */
  private CurveFit.Result fitOnce(
      TimeAverage average, double[] occupation, double[] work, double mu, double scale) {
    int bands = bands();
    Estimates rest =
        average.derivedVector(
            v -> {
              double[] r = new double[bands];
              for (int b = 0; b < bands; b++) {
                r[b] = v[bands + b] - mu * v[2 * bands + b];
              }
              return r;
            });
    double[][] covariance = new double[bands][bands];
    for (int a = 0; a < bands; a++) {
      for (int b = 0; b < bands; b++) {
        covariance[a][b] = rest.covariance(a, b);
      }
    }
    return CurveFit.fit(
        occupation, work, covariance, scale, new double[] {rest.value(0), mu},
        (x, p, gradient) -> {
          gradient[0] = 1;
          gradient[1] = x;
          return p[0] + p[1] * x;
        });
  }

  private void require(TimeAverage average) {
    Check.notNull(average, "average");
    Check.argument(
        average.size() == 3 * bands(),
        "the average must be of this equipartition: numbers=%s, numbers of the average=%s",
        3 * bands(), average.size());
  }
}
