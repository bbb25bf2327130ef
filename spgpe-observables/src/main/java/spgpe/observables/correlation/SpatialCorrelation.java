package spgpe.observables.correlation;

import java.util.Arrays;
import java.util.function.UnaryOperator;
import org.jspecify.annotations.Nullable;
import spgpe.internal.check.Check;
import spgpe.internal.measure.Correlator;
import spgpe.internal.measure.PairProfiles;
import spgpe.internal.measure.PointwiseProfile;
import spgpe.model.Model;
import spgpe.observables.Estimates;
import spgpe.observables.TimeAverage;
import spgpe.observables.density.Density;
import spgpe.observables.phase.RelativePhase;
import spgpe.projector.CoherentRegion;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Equal-time correlations on a ring or a plane, averaged over all origins by Fourier transform.
 * Measures
 *
 * <pre>C(r) = (1/V) integral over y of A(y) B(y + r),   mean of r and -r,</pre>
 *
 * <p>on a ring at the distances r = 0, dx, ..., floor(N/2) dx; on a plane as the mean over shells
 * of |r|, the shortest way around: r = 0 alone, then shells of the width w of the coarser spacing
 * about w, 2w, ... up to half of the shorter side. Each point of a shell counts once;
 * {@link #distances} are the means of |r| over the shells and {@link #weights} the numbers of
 * points. For real profiles the spatial means of A and B follow. Sum the samples up with
 * {@link TimeAverage} and ask this observable for {@link #raw}, {@link #connected},
 * {@link #relativeToZero} or {@link #relativeToMeans}, with errors across trajectories. Immutable
 * and thread-safe.
 */
public final class SpatialCorrelation implements Observable {
  @FunctionalInterface
  private interface ComplexField {
    void fill(Snapshot snapshot, double[] re, double[] im);
  }

  private final String name;
  private final @Nullable Observable a;
  private final @Nullable Observable b;
  private final @Nullable ComplexField complex;
  private final int components;

  private SpatialCorrelation(
      String name, @Nullable Observable a, @Nullable Observable b, @Nullable ComplexField complex,
      int components) {
    this.name = name;
    this.a = a;
    this.b = b;
    this.complex = complex;
    this.components = components;
  }

  /**
   * Correlation of two real profiles.
   *
   * @param a observable with one number for each grid point
   * @param b observable with one number for each grid point
   * @return the observable
   */
  public static SpatialCorrelation between(Observable a, Observable b) {
    Check.notNull(a, "first profile");
    Check.notNull(b, "second profile");
    return new SpatialCorrelation(
        "correlation of " + a.name() + (a == b ? "" : " and " + b.name()), a, b, null, 1);
  }

  /**
   * Correlation of a real profile with itself.
   *
   * @param profile observable with one number for each grid point
   * @return the observable
   */
  public static SpatialCorrelation of(Observable profile) {
    return between(profile, profile);
  }

  /**
   * First-order correlation of a component, G1(r) = &lt;Re psi<sup>*</sup>(y + r) psi(y)&gt;;
   * {@link #relativeToZero} makes it g1.
   *
   * @param component component index from 0
   * @return the observable
   * @throws IllegalArgumentException if the index is negative
   */
  public static SpatialCorrelation firstOrder(int component) {
    Check.inRange(component, 0, 254, "component");
    return new SpatialCorrelation(
        "first-order correlation of component " + component, null, null,
        (snapshot, re, im) -> {
          System.arraycopy(snapshot.field().re(component), 0, re, 0, re.length);
          System.arraycopy(snapshot.field().im(component), 0, im, 0, im.length);
        },
        component + 1);
  }

  /**
   * Density correlation of a component, &lt;n(y) n(y + r)&gt;; {@link #relativeToMeans} makes it
   * g2.
   *
   * @param component component index from 0
   * @return the observable
   * @throws IllegalArgumentException if the index is negative
   */
  public static SpatialCorrelation secondOrder(int component) {
    return of(Density.ofComponent(component));
  }

  /**
   * &lt;cos(phi(y) - phi(y + r))&gt; of the relative phase, from the phase factors of psi_1
   * psi_2<sup>*</sup>: no branch cut. Points without a phase count as 0.
   *
   * @return the observable
   */
  public static SpatialCorrelation phaseDifference() {
    Observable cosine = RelativePhase.cosine();
    Observable sine = RelativePhase.sine();
    return new SpatialCorrelation(
        "correlation of the relative phase factor", null, null,
        (snapshot, re, im) -> {
          cosine.measure(snapshot, re);
          sine.measure(snapshot, im);
        },
        2);
  }

  /**
   * &lt;dphi(y) dphi(y + r)&gt; with dphi = phi - reference in (-pi, pi]. Meaningful while dphi
   * stays away from the branch cut at distance pi from the reference; see also {@link
   * #phaseDifference}.
   *
   * @param reference reference angle, radians, finite; pi for the metastable state
   * @return the observable
   * @throws IllegalArgumentException if the reference is not finite
   */
  public static SpatialCorrelation phaseDeviation(double reference) {
    return of(RelativePhase.wrappedAbout(reference));
  }

  /**
   * &lt;cos phi(y) cos phi(y + r)&gt; of the relative phase.
   *
   * @return the observable
   */
  public static SpatialCorrelation cosine() {
    return of(RelativePhase.cosine());
  }

  /**
   * Correlation of the coherence X = psi_1 psi_2<sup>*</sup>: Re &lt;X(y) X<sup>*</sup>(y + r)&gt;,
   * a quarter of that of the transverse spin S_x S_x + S_y S_y.
   *
   * @return the observable
   */
  public static SpatialCorrelation coherence() {
    return new SpatialCorrelation(
        "correlation of the coherence", null, null,
        (snapshot, re, im) -> {
          PairProfiles pair = PairProfiles.of(snapshot);
          System.arraycopy(pair.re(), 0, re, 0, re.length);
          System.arraycopy(pair.im(), 0, im, 0, im.length);
        },
        2);
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public int size(Model model) {
    PointwiseProfile.requireComponents(model, components, name);
    int points = model.region().grid().points();
    for (Observable profile : new Observable[] {a, b}) {
      if (profile != null) {
        Check.argument(
            profile.size(model) == points,
            "a correlation needs one number for each grid point: profile=\"%s\", numbers=%s,"
                + " points=%s", profile.name(), profile.size(model), points);
      }
    }
    return distanceCount(model) + (complex == null ? 2 : 0);
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    Correlator correlator = snapshot.scratch(this, Correlator.class, Correlator::of);
    if (complex != null) {
      complex.fill(snapshot, correlator.first(), correlator.second());
      correlator.complexCorrelation(result);
      return;
    }
    if (a == null || b == null) {
      throw new IllegalStateException("a correlation without profiles");
    }
    a.measure(snapshot, correlator.first());
    double mean = mean(correlator.first());
    result[result.length - 2] = mean;
    if (a == b) {
      Arrays.fill(correlator.second(), 0);
      correlator.complexCorrelation(result);
      result[result.length - 1] = mean;
    } else {
      b.measure(snapshot, correlator.second());
      correlator.realCorrelation(result);
      result[result.length - 1] = mean(correlator.second());
    }
  }

  private static double mean(double[] values) {
    double sum = 0;
    for (double value : values) {
      sum += value;
    }
    return sum / values.length;
  }

  /**
   * Distances at which the correlation is measured.
   *
   * @param model the model that is run
   * @return new array: 0, dx, ..., floor(N/2) dx on a ring, the mean distances of the shells on a
   *     plane
   */
  public double[] distances(Model model) {
    return Correlator.distances(Check.notNull(model, "model").region().grid());
  }

  /**
   * How many points of the grid have each distance: 1, 2, 2, ... on a ring, the points of the
   * shells on a plane.
   *
   * @param model the model that is run
   * @return new array, as long as {@link #distances}
   */
  public int[] weights(Model model) {
    return Correlator.distanceWeights(Check.notNull(model, "model").region().grid());
  }

  private static int distanceCount(Model model) {
    return Correlator.distances(model.region().grid()).length;
  }

  /**
   * C(r) itself.
   *
   * @param average average of this observable
   * @param model the model that was run
   * @return correlation with errors
   * @throws IllegalArgumentException if the average is not of this observable's size
   * @throws IllegalStateException with fewer than two trajectories
   */
  public CorrelationFunction raw(TimeAverage average, Model model) {
    int count = distanceCount(Check.notNull(model, "model"));
    return derived(average, model, v -> java.util.Arrays.copyOf(v, count));
  }

  /**
   * C(r) - &lt;A&gt; &lt;B&gt;. Real profiles only.
   *
   * @param average average of this observable
   * @param model the model that was run
   * @return correlation with errors
   * @throws IllegalArgumentException if the average is not of this observable's size, or if the
   *     correlation is that of a complex field
   * @throws IllegalStateException with fewer than two trajectories
   */
  public CorrelationFunction connected(TimeAverage average, Model model) {
    requireReal();
    int count = distanceCount(Check.notNull(model, "model"));
    return derived(
        average, model,
        v -> {
          double[] c = java.util.Arrays.copyOf(v, count);
          for (int i = 0; i < count; i++) {
            c[i] -= v[count] * v[count + 1];
          }
          return c;
        });
  }

  /**
   * C(r)/C(0).
   *
   * @param average average of this observable
   * @param model the model that was run
   * @return correlation with errors; the value at 0 is exactly 1
   * @throws IllegalArgumentException if the average is not of this observable's size
   * @throws IllegalStateException with fewer than two trajectories
   */
  public CorrelationFunction relativeToZero(TimeAverage average, Model model) {
    int count = distanceCount(Check.notNull(model, "model"));
    return derived(average, model, v -> quotients(v, count, v[0]));
  }

  /**
   * C(r)/(&lt;A&gt; &lt;B&gt;), for densities g2. Real profiles only.
   *
   * @param average average of this observable
   * @param model the model that was run
   * @return correlation with errors
   * @throws IllegalArgumentException if the average is not of this observable's size, or if the
   *     correlation is that of a complex field
   * @throws IllegalStateException with fewer than two trajectories
   */
  public CorrelationFunction relativeToMeans(TimeAverage average, Model model) {
    requireReal();
    int count = distanceCount(Check.notNull(model, "model"));
    return derived(average, model, v -> quotients(v, count, v[count] * v[count + 1]));
  }

  private static double[] quotients(double[] v, int count, double divisor) {
    double[] c = java.util.Arrays.copyOf(v, count);
    for (int i = 0; i < count; i++) {
      c[i] /= divisor;
    }
    return c;
  }

  private void requireReal() {
    Check.argument(
        complex == null,
        "the correlation of a complex field has no means: correlation=\"%s\"; use raw or"
            + " relativeToZero", name);
  }

  private CorrelationFunction derived(
      TimeAverage average, Model model, UnaryOperator<double[]> function) {
    Check.notNull(average, "average");
    Check.argument(
        average.size() == size(model),
        "the average must be of this correlation: correlation=\"%s\", numbers=%s, numbers of the"
            + " average=%s", name, size(model), average.size());
    Estimates estimates = average.derivedVector(function);
    CoherentRegion region = model.region();
    double resolution = 0;
    for (int axis = 0; axis < region.grid().dimension(); axis++) {
      resolution =
          Math.max(
              resolution,
              region.grid().axis(axis).length() / (2 * region.largestMode(axis) + 1));
    }
    double period =
        region.grid().dimension() == 1
            ? region.grid().axis(0).length()
            : Double.POSITIVE_INFINITY;
    return new CorrelationFunction(distances(model), estimates, period, resolution);
  }

  @Override
  public String toString() {
    return name;
  }
}
