package spgpe.observables;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Nested;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.observables.bubble.Bubble;
import spgpe.observables.bubble.BubbleCensus;
import spgpe.observables.bubble.BubbleDetector;
import spgpe.observables.bubble.BubbleHistory;
import spgpe.observables.bubble.BubbleSettings;
import spgpe.observables.correlation.CorrelationFunction;
import spgpe.observables.correlation.OneBodyMatrix;
import spgpe.observables.correlation.TemporalCorrelation;
import spgpe.observables.topology.PhaseSlips;
import spgpe.run.Accumulator;
import spgpe.run.AccumulatorContract;

/** The accumulators of observables keep the contract. */
class AccumulatorsContractTest {
  private static final double[] EQUALLY_SPACED = {0, 0.5, 1, 1.5, 2, 2.5};

  abstract static class TimeAverageContract extends AccumulatorContract<TimeAverage> {
    @Override
    protected List<?> contents(TimeAverage average) {
      List<Object> all = new ArrayList<>(List.of(average.samples(), average.trajectories()));
      for (int i = 0; i < size(); i++) {
        all.add(average.mean(i));
        all.add(average.standardError(i));
        all.add(average.sampleVariance(i));
      }
      if (average.trajectories() > 1) {
        all.add(average.estimates().covariance(0, 1));
      }
      return all;
    }
  }

  @Nested
  class WholeAverage extends TimeAverageContract {
    @Override
    protected Accumulator.Factory<TimeAverage> factory() {
      return TimeAverage::new;
    }
  }

  @Nested
  class AverageBeforeDecay extends TimeAverageContract {
    @Override
    protected Accumulator.Factory<TimeAverage> factory() {
      return TimeAverage.beforeDecay(0.4, 0.3);
    }
  }

  @Nested
  class CorrelationInTime extends AccumulatorContract<TemporalCorrelation> {
    @Override
    protected Accumulator.Factory<TemporalCorrelation> factory() {
      return TemporalCorrelation.complex(2, 0.5);
    }

    @Override
    protected double[] times() {
      return EQUALLY_SPACED.clone();
    }

    @Override
    protected List<?> contents(TemporalCorrelation correlation) {
      List<Object> all = new ArrayList<>(List.of(correlation.trajectories()));
      for (int i = 0; correlation.trajectories() > 1 && i < size(); i++) {
        CorrelationFunction function = correlation.raw(i);
        for (int lag = 0; lag < function.size(); lag++) {
          all.add(function.value(lag));
          all.add(function.standardError(lag));
        }
      }
      return all;
    }
  }

  @Nested
  class DensityMatrix extends AccumulatorContract<OneBodyMatrix> {
    @Override
    protected Accumulator.Factory<OneBodyMatrix> factory() {
      return OneBodyMatrix.beforeDecay(0.4, 0.3);
    }

    @Override
    protected int size() {
      return 4;
    }

    @Override
    protected List<?> contents(OneBodyMatrix matrix) {
      List<Object> all = new ArrayList<>(List.of(matrix.samples()));
      for (int i = 0; i < matrix.modes(); i++) {
        for (int j = 0; j <= i; j++) {
          all.add(matrix.re(i, j));
          all.add(matrix.im(i, j));
        }
      }
      return all;
    }
  }

  @Nested
  class Bubbles extends AccumulatorContract<BubbleCensus> {
    @Override
    protected Accumulator.Factory<BubbleCensus> factory() {
      return BubbleDetector.of(BubbleSettings.atLevel(0)).census(8);
    }

    @Override
    protected int size() {
      return 16;
    }

    @Override
    protected double number(double drawn) {
      return Math.cos(drawn);
    }

    @Override
    protected List<?> contents(BubbleCensus census) {
      return census.histories().stream().map(h -> List.of(h.trajectory(), h.events())).toList();
    }
  }

  @Nested
  class BubblesOnAPlane extends Bubbles {
    @Override
    protected Accumulator.Factory<BubbleCensus> factory() {
      return BubbleDetector.of(BubbleSettings.atLevel(0))
          .census(PeriodicGrid.of(Axis.of(4, 2), Axis.of(4, 3)));
    }

    @Override
    protected List<?> contents(BubbleCensus census) {
      List<Object> all = new ArrayList<>(super.contents(census));
      for (BubbleHistory history : census.histories()) {
        for (Bubble bubble : history.bubbles()) {
          for (int i = 0; i < bubble.radius().size(); i++) {
            all.add(bubble.radius().extent(i));
          }
        }
      }
      return all;
    }
  }

  @Nested
  class Slips extends AccumulatorContract<PhaseSlips> {
    @Override
    protected Accumulator.Factory<PhaseSlips> factory() {
      return PhaseSlips::new;
    }

    @Override
    protected double number(double drawn) {
      return Math.rint(drawn % 4);
    }

    @Override
    protected List<?> contents(PhaseSlips slips) {
      return slips.slips();
    }
  }
}
