package spgpe.integrate.bench;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;
import spgpe.integrate.Integrator;
import spgpe.integrate.SharedPath;
import spgpe.integrate.Stepper;
import spgpe.internal.check.Check;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;

/**
 * Measures the order of any scheme on any model by comparing runs at dt, dt/2, dt/4, ... Immutable
 * and thread-safe; measurements run in the calling thread.
 */
public final class OrderStudy {
  private static final int LARGEST_BLOCK = 256;

  private final Model model;
  private final Amplitudes initial;
  private final double time;

  private OrderStudy(Model model, Amplitudes initial, double time) {
    this.model = model;
    this.initial = initial;
    this.time = time;
  }

  /**
   * Sets the problem.
   *
   * @param model the model; its noise must be off for {@link #deterministic} and on for the others
   * @param initial initial state with one lane; copied
   * @param time length of the run, finite and positive
   * @return the study
   * @throws IllegalArgumentException if the shape does not fit or the time is out of range
   */
  public static OrderStudy of(Model model, Amplitudes initial, double time) {
    Check.notNull(model, "model");
    Check.notNull(initial, "initial state").requireShape(model.region(), model.components(), 1);
    return new OrderStudy(model, initial.copy(), Check.positive(time, "time"));
  }

  /**
   * Order of the error without noise.
   *
   * @param scheme any scheme; its own step does not matter
   * @param fewestSteps steps of the coarsest run, at least 1
   * @param levels number of comparisons, at least 2
   * @return relative L2 differences of the final states
   * @throws IllegalArgumentException if a number is out of range or the model has noise
   */
  public Convergence deterministic(Integrator scheme, int fewestSteps, int levels) {
    Check.notNull(scheme, "integrator");
    checkLevels(fewestSteps, levels);
    Check.argument(!hasNoise(), "the deterministic order needs a model without noise: T=%s",
        model.reservoir().temperature());
    List<Convergence.Row> rows = new ArrayList<>();
    Amplitudes coarse = run(scheme, fewestSteps, 0, 1, null);
    double size = Math.sqrt(norm(coarse));
    for (int level = 0; level < levels; level++) {
      int steps = fewestSteps << level;
      Amplitudes fine = run(scheme, 2 * steps, 0, 1, null);
      rows.add(
          new Convergence.Row(time / steps, Math.sqrt(distance(coarse, fine, 0)) / size, 0));
      coarse = fine;
    }
    return new Convergence("deterministic error", scheme.toString(), rows);
  }

  /**
   * Order of the error of single paths: root mean square of the difference at the end, on the same
   * Brownian paths.
   *
   * @param scheme any scheme that admits noise
   * @param fewestSteps steps of the coarsest run, at least 1
   * @param levels number of comparisons, at least 2
   * @param paths number of paths, at least 2
   * @param seed seed of the paths
   * @return differences with their errors
   * @throws IllegalArgumentException if a number is out of range or the model has no noise
   */
  public Convergence strong(
      Integrator scheme, int fewestSteps, int levels, int paths, long seed) {
    List<Convergence.Row> rows = new ArrayList<>();
    double[][] moments =
        compare(scheme, fewestSteps, levels, paths, seed, (a, b, lane) -> distance(a, b, lane));
    for (int level = 0; level < levels; level++) {
      double root = Math.sqrt(moments[level][0]);
      rows.add(
          new Convergence.Row(
              time / (fewestSteps << level), root, moments[level][1] / (2 * root)));
    }
    return new Convergence("strong error", scheme.toString(), rows);
  }

  /**
   * Order of the error of an average, on the same Brownian paths.
   *
   * @param scheme any scheme that admits noise
   * @param fewestSteps steps of the coarsest run, at least 1
   * @param levels number of comparisons, at least 2
   * @param paths number of paths, at least 2
   * @param seed seed of the paths
   * @param functional what to average at the end, a function of a one-lane state
   * @return differences with their errors
   * @throws IllegalArgumentException if a number is out of range or the model has no noise
   */
  public Convergence weak(
      Integrator scheme, int fewestSteps, int levels, int paths, long seed,
      ToDoubleFunction<Amplitudes> functional) {
    Check.notNull(functional, "functional");
    List<Convergence.Row> rows = new ArrayList<>();
    Amplitudes one = initial.copy();
    double[][] moments =
        compare(
            scheme, fewestSteps, levels, paths, seed,
            (a, b, lane) -> {
              a.copyLane(lane, one);
              double first = functional.applyAsDouble(one);
              b.copyLane(lane, one);
              return first - functional.applyAsDouble(one);
            });
    for (int level = 0; level < levels; level++) {
      rows.add(
          new Convergence.Row(
              time / (fewestSteps << level), Math.abs(moments[level][0]), moments[level][1]));
    }
    return new Convergence("weak error", scheme.toString(), rows);
  }

  private interface Comparison {
    double of(Amplitudes coarse, Amplitudes fine, int lane);
  }

  /** Mean and standard error of a comparison for each level. */
  private double[][] compare(
      Integrator scheme, int fewestSteps, int levels, int paths, long seed, Comparison comparison) {
    Check.notNull(scheme, "integrator");
    checkLevels(fewestSteps, levels);
    Check.argument(paths >= 2, "number of paths must be >= 2: paths=%s", paths);
    Check.argument(
        hasNoise(), "strong and weak orders need a model with noise: T=%s",
        model.reservoir().temperature());
    RandomStreams base = RandomStreams.counterBased(seed);
    double[] sums = new double[levels];
    double[] squares = new double[levels];
    for (int first = 0; first < paths; first += LARGEST_BLOCK) {
      int lanes = Math.min(LARGEST_BLOCK, paths - first);
      Amplitudes coarse = run(scheme, fewestSteps, first, lanes, SharedPath.of(base, 1 << levels));
      for (int level = 0; level < levels; level++) {
        Amplitudes fine =
            run(
                scheme, fewestSteps << (level + 1), first, lanes,
                SharedPath.of(base, 1 << (levels - level - 1)));
        for (int lane = 0; lane < lanes; lane++) {
          double value = comparison.of(coarse, fine, lane);
          sums[level] += value;
          squares[level] += value * value;
        }
        coarse = fine;
      }
    }
    double[][] moments = new double[levels][2];
    for (int level = 0; level < levels; level++) {
      double mean = sums[level] / paths;
      double variance = Math.max(0, squares[level] / paths - mean * mean);
      moments[level][0] = mean;
      moments[level][1] = Math.sqrt(variance / (paths - 1));
    }
    return moments;
  }

  private Amplitudes run(
      Integrator scheme, int steps, int first, int lanes,
      @org.jspecify.annotations.Nullable RandomStreams streams) {
    RandomStreams source = streams == null ? RandomStreams.counterBased(0) : streams;
    NoiseGenerator noise = source.generator(model.region(), model.components(), lanes);
    Amplitudes state = new Amplitudes(model.region(), model.components(), lanes);
    for (int lane = 0; lane < lanes; lane++) {
      noise.assign(lane, (long) first + lane);
      state.setLane(lane, initial);
    }
    Stepper stepper = scheme.withStep(time / steps).bind(model, noise, lanes);
    stepper.start(state, 0);
    for (int s = 0; s < steps; s++) {
      stepper.advance();
    }
    stepper.observe(state);
    return state;
  }

  private boolean hasNoise() {
    for (int c = 0; c < model.components(); c++) {
      if (model.reservoir().noiseStrength(c) > 0) {
        return true;
      }
    }
    return false;
  }

  private static void checkLevels(int fewestSteps, int levels) {
    Check.inRange(fewestSteps, 1, 1 << 20, "fewest steps");
    Check.inRange(levels, 2, 10, "levels");
  }

  private static double norm(Amplitudes a) {
    double sum = 0;
    for (int c = 0; c < a.components(); c++) {
      sum += a.atomNumber(c, 0);
    }
    return sum;
  }

  private static double distance(Amplitudes a, Amplitudes b, int lane) {
    double sum = 0;
    for (int c = 0; c < a.components(); c++) {
      for (int e = lane; e < a.re(c).length; e += a.lanes()) {
        double re = a.re(c)[e] - b.re(c)[e];
        double im = a.im(c)[e] - b.im(c)[e];
        sum += re * re + im * im;
      }
    }
    return sum;
  }
}
