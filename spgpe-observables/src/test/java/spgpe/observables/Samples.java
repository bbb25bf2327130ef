package spgpe.observables;

import java.util.List;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import java.util.function.Supplier;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.run.Accumulator;
import spgpe.run.Observable;
import spgpe.run.Snapshot;
import spgpe.run.TrajectoryEnd;

/** Independent samples of Gaussian fields, and their averages. */
public final class Samples {
  private Samples() {}

  /** End of a run. */
  public static TrajectoryEnd ended(double time) {
    return new TrajectoryEnd(0, time, TrajectoryEnd.Reason.END_OF_RUN, "");
  }

  /** Averages several observables over the same independent samples, each its own trajectory. */
  public static List<TimeAverage> average(
      Model model, int count, Supplier<Snapshot> source, Observable... observables) {
    TimeAverage[] sums = new TimeAverage[observables.length];
    for (int o = 0; o < sums.length; o++) {
      sums[o] = new TimeAverage(new double[] {0}, observables[o].size(model));
    }
    for (int i = 0; i < count; i++) {
      Snapshot snapshot = source.get();
      for (int o = 0; o < sums.length; o++) {
        TimeAverage one = new TimeAverage(new double[] {0}, observables[o].size(model));
        one.add(0, Fields.measure(observables[o], snapshot));
        one.finish(ended(0));
        sums[o] = sums[o].mergedWith(one);
      }
    }
    return List.of(sums);
  }

  /** Complex Gaussian modes with &lt;|a_k|^2&gt; = spectrum(|k|) in every component. */
  public static Supplier<Snapshot> complexGaussian(
      Model model, DoubleUnaryOperator spectrum, long seed) {
    Random random = new Random(seed);
    Amplitudes state = new Amplitudes(model.region(), model.components(), 1);
    return () -> {
      for (int c = 0; c < state.components(); c++) {
        for (int m = 0; m < state.re(c).length; m++) {
          double sigma =
              Math.sqrt(spectrum.applyAsDouble(waveNumber(model, m)) / 2);
          state.re(c)[m] = sigma * random.nextGaussian();
          state.im(c)[m] = sigma * random.nextGaussian();
        }
      }
      return Snapshot.of(model, state, 0);
    };
  }

  /** k on a line, |k| on a plane. */
  private static double waveNumber(Model model, int mode) {
    return model.region().grid().dimension() == 1
        ? model.region().waveNumber(0, mode)
        : Math.sqrt(model.region().kSquared(mode));
  }

  /** psi_1 = exp(i phi), psi_2 = 1 with a real Gaussian phi, &lt;|phi_k|^2&gt; = spectrum(k). */
  public static Supplier<Snapshot> gaussianPhase(
      Model model, DoubleUnaryOperator spectrum, double offset, long seed) {
    Random random = new Random(seed);
    int points = model.region().grid().points();
    double length = model.region().grid().volume();
    double[] cosines = new double[points];
    double[] sines = new double[points];
    for (int i = 0; i < points; i++) {
      cosines[i] = Math.cos(2 * Math.PI * i / points);
      sines[i] = Math.sin(2 * Math.PI * i / points);
    }
    return () -> {
      double[] phi = new double[points];
      for (int n = 0; n <= points / 2; n++) {
        boolean alone = n == 0 || 2 * n == points;
        double k = 2 * Math.PI * n / length;
        double sigma = Math.sqrt(spectrum.applyAsDouble(k) / length * (alone ? 1 : 2));
        double a = sigma * random.nextGaussian();
        double b = alone ? 0 : sigma * random.nextGaussian();
        for (int i = 0; i < points; i++) {
          int turn = (int) ((long) n * i % points);
          phi[i] += a * cosines[turn] + b * sines[turn];
        }
      }
      double dx = length / points;
      return Fields.withRelativePhase(model, x -> offset + phi[(int) Math.rint(x / dx)]);
    };
  }

  /** The sum of many accumulators, merged two by two. */
  public static <A extends Accumulator<A>> A merged(List<A> parts) {
    A sum = parts.get(0);
    for (int i = 1; i < parts.size(); i++) {
      sum = sum.mergedWith(parts.get(i));
    }
    return sum;
  }
}
