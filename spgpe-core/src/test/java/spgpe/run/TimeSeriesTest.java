package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;

class TimeSeriesTest extends AccumulatorContract<TimeSeries> {
  @Override
  protected Accumulator.Factory<TimeSeries> factory() {
    return TimeSeries::new;
  }

  @Override
  protected List<?> contents(TimeSeries accumulator) {
    List<Object> all = new ArrayList<>();
    for (TimeSeries.Series series : accumulator.series()) {
      all.add(series.end());
      Arrays.stream(series.times()).forEach(all::add);
      for (double[] values : series.values()) {
        Arrays.stream(values).forEach(all::add);
      }
    }
    return all;
  }

  @Test
  void keepsWhatItWasGivenInTheOrderOfTheTrajectories() {
    MergeTree<TimeSeries> tree = new MergeTree<>();
    for (long trajectory : new long[] {2, 0, 1}) {
      TimeSeries one = new TimeSeries(new double[] {0, 0.5}, 1);
      one.add(0, new double[] {10 * trajectory});
      if (trajectory != 1) {
        one.add(1, new double[] {10 * trajectory + 1});
      }
      one.finish(
          new TrajectoryEnd(trajectory, 0.5, TrajectoryEnd.Reason.END_OF_RUN, ""));
      tree.add(trajectory, one);
    }
    List<TimeSeries.Series> series = tree.sum(new TimeSeries(new double[] {0, 0.5}, 1)).series();
    assertEquals(3, series.size());
    assertEquals(1, series.get(1).end().trajectory());
    assertArrayEquals(new double[] {0}, series.get(1).times());
    assertArrayEquals(new double[] {0, 0.5}, series.get(2).times());
    assertArrayEquals(new double[] {21}, series.get(2).values()[1]);
    assertThrows(UnsupportedOperationException.class, () -> series.remove(0));
  }

  @Test
  void wrongShapesAreRefused() {
    TimeSeries series = new TimeSeries(new double[] {0}, 2);
    assertThrows(IllegalArgumentException.class, () -> new TimeSeries(new double[] {0}, 0));
    assertThrows(IllegalArgumentException.class, () -> series.add(1, new double[2]));
    assertThrows(IllegalArgumentException.class, () -> series.add(0, new double[3]));
    assertThrows(
        IllegalArgumentException.class,
        () -> series.mergedWith(new TimeSeries(new double[] {0}, 1)));
    assertThrows(
        IllegalArgumentException.class,
        () -> series.mergedWith(new TimeSeries(new double[] {1}, 2)));
  }
}
