package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static spgpe.statistics.Messages.assertRefused;
import static spgpe.statistics.Messages.assertTooEarly;

import java.lang.management.ManagementFactory;
import org.junit.jupiter.api.Test;

class RunningMomentsTest {
  /** Mean and variance of n, n+1, n+2, n+3 are n + 3/2 and 5/3; the naive sum of squares fails. */
  @Test
  void largeOffsetDoesNotCancel() {
    RunningMoments moments = new RunningMoments();
    for (int i = 0; i < 4; i++) {
      moments.add(1e9 + i);
    }
    assertEquals(1e9 + 1.5, moments.mean());
    assertEquals(5.0 / 3, moments.variance(), 1e-15);
    assertEquals(Math.sqrt(5.0 / 12), moments.estimate().standardError(), 1e-15);
  }

  /** By hand: x = 1, 2, 6 and y = 2, 0, 1 have covariance -1/2 and variances 7 and 1. */
  @Test
  void covarianceByHand() {
    RunningCovariance covariance = RunningCovariance.ofDimension(2);
    covariance.add(new double[] {1, 2});
    covariance.add(new double[] {2, 0});
    covariance.add(new double[] {6, 1});
    assertEquals(7, covariance.covariance(0, 0), 1e-14);
    assertEquals(1, covariance.covariance(1, 1), 1e-14);
    assertEquals(-.5, covariance.covariance(0, 1), 1e-14);
    assertEquals(-.5, covariance.covariance(1, 0), 1e-14);
    assertEquals(-.5 / 3, covariance.covarianceOfMeans(0, 1), 1e-14);
    assertEquals(3, covariance.mean(0), 1e-15);
  }

  @Test
  void mergingWithAnEmptyOneChangesNoBit() {
    RunningMoments full = new RunningMoments();
    full.add(.1);
    full.add(.7);
    RunningMoments merged = new RunningMoments();
    merged.merge(full);
    merged.merge(new RunningMoments());
    assertEquals(full.mean(), merged.mean());
    assertEquals(full.variance(), merged.variance());
    assertEquals(2, merged.count());
  }

  @Test
  void refusedVectorLeavesTheAccumulatorUnchanged() {
    RunningVectorMoments moments = RunningVectorMoments.ofDimension(2);
    moments.add(new double[] {1, 2});
    assertRefused(() -> moments.add(new double[] {5, Double.NaN}), "vector[1]=NaN");
    assertEquals(1, moments.count());
    assertArrayEquals(new double[] {1, 2}, moments.means());
  }

  @Test
  void addingAllocatesNothing() {
    RunningMoments scalar = new RunningMoments();
    RunningVectorMoments vector = RunningVectorMoments.ofDimension(16);
    RunningCovariance covariance = RunningCovariance.ofDimension(16);
    Histogram histogram = Histogram.of(0, 1, 10);
    double[] x = new double[16];
    Runnable adding =
        () -> {
          for (int i = 0; i < 2000; i++) {
            x[i % 16] = i;
            scalar.add(i);
            vector.add(x);
            covariance.add(x);
            histogram.add(i * 1e-3);
          }
        };
    adding.run();
    com.sun.management.ThreadMXBean threads =
        (com.sun.management.ThreadMXBean) ManagementFactory.getThreadMXBean();
    long before = threads.getCurrentThreadAllocatedBytes();
    adding.run();
    long bytes = threads.getCurrentThreadAllocatedBytes() - before;
    // 8000 additions: one object in each would be at least 128000 bytes; the probe takes some too.
    assertEquals(0, bytes, 4000);
  }

  @Test
  void badInputIsRefusedWithTheReason() {
    RunningMoments moments = new RunningMoments();
    assertTooEarly(moments::mean, "count=0");
    assertRefused(() -> moments.add(Double.POSITIVE_INFINITY), "value=Infinity");
    moments.add(1);
    assertTooEarly(moments::variance, "count=1");
    RunningVectorMoments vector = RunningVectorMoments.ofDimension(2);
    assertRefused(() -> RunningVectorMoments.ofDimension(0), "dimension=0");
    assertRefused(() -> vector.add(new double[3]), "vector.length=3", "dimension=2");
    assertRefused(() -> vector.merge(RunningVectorMoments.ofDimension(3)), "other.dimension=3");
    assertRefused(() -> vector.mean(2), "component=2");
    assertTooEarly(() -> vector.variance(0), "count=0");
    RunningCovariance covariance = RunningCovariance.ofDimension(2);
    assertRefused(() -> RunningCovariance.ofDimension(30_001), "dimension=30001");
    assertRefused(() -> covariance.add(new double[1]), "vector.length=1");
    assertRefused(() -> covariance.merge(RunningCovariance.ofDimension(1)), "dimension=2");
    assertTooEarly(() -> covariance.covariance(0, 1), "count=0");
  }
}
