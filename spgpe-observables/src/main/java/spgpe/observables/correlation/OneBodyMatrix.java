package spgpe.observables.correlation;

import spgpe.internal.check.Check;
import spgpe.internal.measure.SampleWindow;
import spgpe.run.Accumulator;
import spgpe.run.TrajectoryEnd;

/**
 * One-body density matrix in the kept modes, rho_ij = &lt;a_i a_j<sup>*</sup>&gt;, averaged over
 * time and trajectories. Record it with an observable of amplitudes as pairs (re, im), {@code
 * ModeAmplitude.ofComponent} or {@code ModeAmplitude.all}. The matrix needs n<sup>2</sup> complex
 * numbers for n modes; n is limited to {@value #MAX_MODES}.
 *
 * <p>A global phase that diffuses does no harm: it cancels in a_i a_j<sup>*</sup>.
 */
public final class OneBodyMatrix implements Accumulator<OneBodyMatrix> {
  /** Largest number of amplitudes. */
  public static final int MAX_MODES = 1500;

  private final int modes;
  private final double start;
  private final double margin;
  private final SampleWindow window;
  private final double[] re;
  private final double[] im;
  private long samples;

  private OneBodyMatrix(
      double[] times, int modes, double start, double margin, double[] re, double[] im,
      long samples) {
    this.times = times;
    this.modes = modes;
    this.start = start;
    this.margin = margin;
    this.window = new SampleWindow(times, start, margin);
    this.re = re;
    this.im = im;
    this.samples = samples;
  }

  private final double[] times;

  /**
   * Makes an empty accumulator of all samples.
   *
   * @param times scheduled times
   * @param size numbers in each sample, two for each mode
   * @throws IllegalArgumentException if the size is odd or too large
   */
  public OneBodyMatrix(double[] times, int size) {
    this(times, requirePairs(size), 0, 0);
  }

  private OneBodyMatrix(double[] times, int modes, double start, double margin) {
    this(times, modes, start, margin, new double[modes * modes], new double[modes * modes], 0);
  }

  private static int requirePairs(int size) {
    Check.argument(
        size % 2 == 0 && size / 2 <= MAX_MODES,
        "a one-body matrix needs pairs (re, im) of at most %s modes: numbers=%s", MAX_MODES, size);
    return size / 2;
  }

  /**
   * The matrix of a window of time, see {@link spgpe.observables.TimeAverage#beforeDecay}.
   *
   * @param start first time that counts, finite and not negative
   * @param margin time before the end of a trajectory that does not count, finite and not negative
   * @return factory for a recording
   * @throws IllegalArgumentException if a time is out of range
   */
  public static Accumulator.Factory<OneBodyMatrix> beforeDecay(double start, double margin) {
    Check.notNegative(start, "start (time)");
    Check.notNegative(margin, "margin (time)");
    return (times, size) -> new OneBodyMatrix(times, requirePairs(size), start, margin);
  }

  @Override
  public void add(int sample, double[] values) {
    window.add(sample, values, this::take);
  }

  @Override
  public void finish(TrajectoryEnd end) {
    window.finish(end.time(), this::take);
  }

  private void take(int sample, double[] a) {
    samples++;
    for (int i = 0; i < modes; i++) {
      double x = a[2 * i];
      double y = a[2 * i + 1];
      for (int j = 0; j <= i; j++) {
        int e = i * modes + j;
        re[e] += x * a[2 * j] + y * a[2 * j + 1];
        im[e] += y * a[2 * j] - x * a[2 * j + 1];
      }
    }
  }

  @Override
  public OneBodyMatrix mergedWith(OneBodyMatrix later) {
    Check.argument(
        modes == later.modes && start == later.start && margin == later.margin,
        "one-body matrices must be of the same modes and window: modes=%s, other modes=%s",
        modes, later.modes);
    double[] sumRe = re.clone();
    double[] sumIm = im.clone();
    for (int e = 0; e < sumRe.length; e++) {
      sumRe[e] += later.re[e];
      sumIm[e] += later.im[e];
    }
    return new OneBodyMatrix(
        times, modes, start, margin, sumRe, sumIm, samples + later.samples);
  }

  /**
   * Number of modes.
   *
   * @return n
   */
  public int modes() {
    return modes;
  }

  /**
   * Samples that contributed.
   *
   * @return count
   */
  public long samples() {
    return samples;
  }

  /**
   * Real part of an element.
   *
   * @param i row
   * @param j column
   * @return Re &lt;a_i a_j<sup>*</sup>&gt;; NaN without samples
   */
  public double re(int i, int j) {
    return re[element(i, j)] / samples;
  }

  /**
   * Imaginary part of an element.
   *
   * @param i row
   * @param j column
   * @return Im &lt;a_i a_j<sup>*</sup>&gt;; NaN without samples
   */
  public double im(int i, int j) {
    double lower = im[element(i, j)] / samples;
    return i >= j ? lower : -lower;
  }

  private int element(int i, int j) {
    Check.inRange(i, 0, modes - 1, "row");
    Check.inRange(j, 0, modes - 1, "column");
    return Math.max(i, j) * modes + Math.min(i, j);
  }

  /**
   * Natural modes and their occupations.
   *
   * @return eigenvectors and eigenvalues, largest first
   * @throws IllegalStateException without samples
   */
  public NaturalModes naturalModes() {
    Check.state(
        samples > 0, "the one-body matrix has no samples: start=%s, margin=%s", start, margin);
    return NaturalModes.of(this);
  }
}
