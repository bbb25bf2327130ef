package spgpe.observables;

import spgpe.statistics.Estimate;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import spgpe.run.Accumulator;
import spgpe.run.TrajectoryEnd;

class TimeAverageTest {
  private static final double[] TIMES = {0, 1, 2, 3, 4, 5, 6, 7, 8, 9};

  private static TimeAverage trajectory(
      Accumulator.Factory<TimeAverage> factory, double end, double[]... samples) {
    TimeAverage average = factory.create(TIMES, samples[0].length);
    for (int s = 0; s < samples.length; s++) {
      average.add(s, samples[s]);
    }
    average.finish(new TrajectoryEnd(0, end, TrajectoryEnd.Reason.STOPPED, ""));
    return average;
  }

  @Test
  void equalTrajectoriesGiveThePlainStandardError() {
    // trajectory means 2, 4, 9: mean 5, variance 13, error sqrt(13/3)
    List<TimeAverage> parts = new ArrayList<>();
    for (double mean : new double[] {2, 4, 9}) {
      parts.add(
          trajectory(TimeAverage.from(0), 1, new double[] {mean - 1}, new double[] {mean + 1}));
    }
    TimeAverage sum = Samples.merged(parts);
    assertEquals(5, sum.mean(0), 1e-14);
    assertEquals(Math.sqrt(13.0 / 3), sum.standardError(0), 1e-14);
    assertEquals(3, sum.trajectories());
    assertEquals(6, sum.samples());
    // samples 1 3 3 5 8 10 about 5: 16+4+4+0+9+25 = 58, over 5
    assertEquals(58.0 / 5, sum.sampleVariance(0), 1e-13);
  }

  @Property(tries = 40, seed = "2026")
  void agreesWithThePlainRatioEstimator(
      @ForAll @IntRange(min = 2, max = 50) int trajectories,
      @ForAll @IntRange(min = 0, max = 1000) int seed) {
    Random random = new Random(seed);
    double offset = 1e6; // would ruin sums that are not centred
    List<TimeAverage> parts = new ArrayList<>();
    List<double[][]> data = new ArrayList<>();
    for (int t = 0; t < trajectories; t++) {
      double[][] samples = new double[1 + random.nextInt(9)][2];
      for (double[] sample : samples) {
        sample[0] = offset + random.nextGaussian() + t;
        sample[1] = sample[0] * 2 + random.nextGaussian();
      }
      data.add(samples);
      parts.add(trajectory(TimeAverage.from(0), samples.length, samples));
    }
    TimeAverage sum = Samples.merged(parts);
    double[] mean = new double[2];
    double n = 0;
    for (double[][] samples : data) {
      for (double[] sample : samples) {
        mean[0] += sample[0];
        mean[1] += sample[1];
        n++;
      }
    }
    mean[0] /= n;
    mean[1] /= n;
    double[][] cov = new double[2][2];
    for (double[][] samples : data) {
      double[] d = new double[2];
      for (double[] sample : samples) {
        d[0] += sample[0] - mean[0];
        d[1] += sample[1] - mean[1];
      }
      for (int i = 0; i < 2; i++) {
        for (int j = 0; j < 2; j++) {
          cov[i][j] += d[i] * d[j] / n / n * trajectories / (trajectories - 1);
        }
      }
    }
    Estimates e = sum.estimates();
    for (int i = 0; i < 2; i++) {
      assertEquals(mean[i], e.value(i), 1e-8);
      for (int j = 0; j < 2; j++) {
        assertEquals(cov[i][j], e.covariance(i, j), 1e-6 * Math.abs(cov[i][j]) + 1e-6);
      }
    }
  }

  @Test
  void startAndMarginSelectSamples() {
    // samples at t = 0..9 with value t; stop at t = 9: t >= 2 and 9 - t > 3 leaves 2, 3, 4, 5
    double[][] samples = new double[10][1];
    for (int t = 0; t < 10; t++) {
      samples[t][0] = t;
    }
    TimeAverage a = trajectory(TimeAverage.beforeDecay(2, 3), 9, samples);
    assertEquals(4, a.samples());
    assertEquals(3.5, a.mean(0), 1e-14);
    // the end may come later than the last sample
    TimeAverage later = trajectory(TimeAverage.beforeDecay(2, 3), 9.5, samples);
    assertEquals(5, later.samples());
    TimeAverage none =
        trajectory(TimeAverage.beforeDecay(2, 3), 4, java.util.Arrays.copyOf(samples, 5));
    assertEquals(0, none.samples());
    assertEquals(0, none.trajectories());
    assertTrue(Double.isNaN(none.mean(0)));
    assertEquals(4, a.mergedWith(none).samples());
    assertEquals(3.5, none.mergedWith(a).mean(0));
  }

  @Test
  void samplesAreCopiedWhileTheyWait() {
    TimeAverage average = TimeAverage.beforeDecay(0, 2).create(TIMES, 1);
    double[] reused = new double[1];
    for (int t = 0; t < 10; t++) {
      reused[0] = t;
      average.add(t, reused);
    }
    average.finish(Samples.ended(9));
    assertEquals((0 + 1 + 2 + 3 + 4 + 5 + 6) / 7.0, average.mean(0), 1e-14);
  }

  @Test
  void ratiosCarryCorrelatedErrors() {
    // y = 2x in every trajectory: the ratio has no error although both have
    List<TimeAverage> parts = new ArrayList<>();
    for (double x : new double[] {1, 2, 6}) {
      parts.add(trajectory(TimeAverage.from(0), 0, new double[] {x, 2 * x}));
    }
    TimeAverage sum = Samples.merged(parts);
    Estimate ratio = sum.derived(v -> v[1] / v[0]);
    assertEquals(2, ratio.value(), 1e-14);
    assertEquals(0, ratio.standardError(), 1e-6); // derivatives are differences
    Estimate product = sum.derived(v -> v[0] * v[1]);
    // d(2 x^2) = 4 x dx
    double expected = 12 * sum.standardError(0);
    assertEquals(expected, product.standardError(), 1e-3 * expected);
  }

  @Test
  void misuseIsNamed() {
    TimeAverage one = trajectory(TimeAverage.from(0), 0, new double[] {1});
    String few = assertThrows(IllegalStateException.class, one::estimates).getMessage();
    assertTrue(few.contains("trajectories=1"), few);
    assertTrue(
        Fields.refusal(() -> TimeAverage.beforeDecay(0, Double.NaN)).contains("margin"));
    assertTrue(Fields.refusal(() -> TimeAverage.from(-1)).contains("start"));
    TimeAverage other = trajectory(TimeAverage.from(1), 0, new double[] {1});
    assertTrue(Fields.refusal(() -> one.mergedWith(other)).contains("other start=1.0"));
    TimeAverage wide = trajectory(TimeAverage.from(0), 0, new double[2000]);
    TimeAverage twice = wide.mergedWith(wide);
    assertEquals(0, twice.standardError(5));
    String long_ = assertThrows(IllegalStateException.class, twice::estimates).getMessage();
    assertTrue(long_.contains("numbers=2000"), long_);
    assertThrows(IllegalArgumentException.class, () -> one.mean(1));
  }
}
