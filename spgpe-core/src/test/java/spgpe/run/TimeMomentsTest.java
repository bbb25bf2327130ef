package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.apache.commons.math3.stat.descriptive.SummaryStatistics;
import org.junit.jupiter.api.Test;

class TimeMomentsTest extends AccumulatorContract<TimeMoments> {
  @Override
  protected Accumulator.Factory<TimeMoments> factory() {
    return TimeMoments::new;
  }

  @Override
  protected List<?> contents(TimeMoments moments) {
    List<Object> all = new ArrayList<>();
    for (int s = 0; s < moments.times().length; s++) {
      all.add(moments.count(s));
      for (int i = 0; i < size(); i++) {
        all.add(moments.mean(s, i));
        all.add(moments.variance(s, i));
      }
    }
    return all;
  }

  @Test
  void agreesWithTheStatisticsOfAllNumbersTogether() {
    SplittableRandom random = new SplittableRandom(1);
    SummaryStatistics all = new SummaryStatistics();
    TimeMoments sum = new TimeMoments(new double[] {0, 1}, 3);
    for (int t = 0; t < 50; t++) {
      TimeMoments one = new TimeMoments(new double[] {0, 1}, 3);
      double x = 100 + random.nextDouble();
      all.addValue(x);
      one.add(1, new double[] {0, x, 0});
      sum = sum.mergedWith(one);
    }
    assertEquals(0, sum.count(0));
    assertEquals(50, sum.count(1));
    assertEquals(all.getMean(), sum.mean(1, 1), 1e-13 * 100);
    assertEquals(all.getVariance(), sum.variance(1, 1), 1e-12);
    assertEquals(
        all.getStandardDeviation() / Math.sqrt(50), sum.standardError(1, 1), 1e-12);
  }

  @Test
  void addingOneByOneAgreesWithMerging() {
    TimeMoments one = new TimeMoments(new double[] {0}, 1);
    for (double x : new double[] {1, 2, 4, 9}) {
      one.add(0, new double[] {x});
    }
    assertEquals(4, one.mean(0, 0), 1e-15);
    assertEquals(38.0 / 3, one.variance(0, 0), 1e-14); // (9 + 4 + 0 + 25)/3
  }

  @Test
  void whatIsNotThereIsNaN() {
    TimeMoments empty = new TimeMoments(new double[] {0}, 1);
    assertTrue(Double.isNaN(empty.mean(0, 0)));
    empty.add(0, new double[] {3});
    assertEquals(3, empty.mean(0, 0), 0);
    assertTrue(Double.isNaN(empty.variance(0, 0)));
    assertTrue(Double.isNaN(empty.standardError(0, 0)));
  }

  @Test
  void timesAreACopy() {
    TimeMoments moments = new TimeMoments(new double[] {0, 2}, 1);
    moments.times()[0] = 7;
    assertArrayEquals(new double[] {0, 2}, moments.times());
  }

  @Test
  void wrongShapesAndIndicesAreRefused() {
    TimeMoments moments = new TimeMoments(new double[] {0, 2}, 2);
    assertRefused("size=0", () -> new TimeMoments(new double[] {0}, 0));
    assertRefused("size=-3", () -> new TimeMoments(new double[] {0}, -3));
    assertRefused("size=2147483647", () -> new TimeMoments(new double[] {0}, Integer.MAX_VALUE));
    assertRefused("sample=2", () -> moments.add(2, new double[] {0, 0}));
    assertRefused("numbers=3", () -> moments.add(0, new double[] {0, 0, 0}));
    assertRefused("sample=-1", () -> moments.mean(-1, 0));
    assertRefused("=2", () -> moments.mean(0, 2));
    assertRefused("=-1", () -> moments.variance(0, -1));
    assertRefused("=2", () -> moments.standardError(1, 2));
    assertRefused("sample=5", () -> moments.count(5));
    assertRefused("same times", () -> moments.mergedWith(new TimeMoments(new double[] {0, 2}, 1)));
    assertRefused("same times", () -> moments.mergedWith(new TimeMoments(new double[] {0, 3}, 2)));
  }

  private static void assertRefused(String expected, Runnable call) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    assertTrue(message.contains(expected), message);
  }
}
