package spgpe.examples.validation;

import java.util.List;
import spgpe.model.Model;
import spgpe.observables.SpatialMean;
import spgpe.observables.TimeAverage;
import spgpe.observables.correlation.CorrelationFunction;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.observables.density.PairMoment;
import spgpe.observables.phase.RelativePhase;
import spgpe.run.Accumulator;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.Observable;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.statistics.Estimate;

/**
 * Averages of the metastable state: snapshots at times 100, 110, ... that are followed by more than
 * 50 time units of the trajectory. dphi = arg(-psi_1 psi_2^*).
 */
final class MetastableAverages {
  /** Grid points between the two phases of each correlation. */
  private static final int[] DISTANCES = {0, 2, 4, 8, 12};

  static final List<String> NAMES =
      List.of(
          "density per component", "<cos phi>", "<dphi^2>", "<dphi dphi'> x=0.96",
          "<dphi dphi'> x=1.92", "<dphi dphi'> x=3.84", "<dphi dphi'> x=5.76", "<S_y^2>",
          "<n^2>", "<(n1-n2)^2>", "<sin^2 phi>");

  private final SpatialCorrelation correlation = SpatialCorrelation.phaseDeviation(Math.PI);
  private final Recording<TimeAverage> moments = recording(PairMoment.all());
  private final Recording<TimeAverage> cosine = recording(RelativePhase.meanCosine());
  private final Recording<TimeAverage> sine =
      recording(SpatialMean.ofSquare(RelativePhase.sine()));
  private final Recording<TimeAverage> phase = recording(correlation);

  private static Recording<TimeAverage> recording(Observable observable) {
    Accumulator.Factory<TimeAverage> average =
        TimeAverage.beforeDecay(ReferenceDecay.TRUNCATION, 50);
    return Recording.of(
        observable, Schedule.every(10).startingAt(ReferenceDecay.TRUNCATION), average);
  }

  Ensemble recordedBy(Ensemble ensemble) {
    return ensemble.record(moments).record(cosine).record(sine).record(phase);
  }

  /** Snapshots that counted. */
  long snapshots(EnsembleResult result) {
    return result.get(moments).samples();
  }

  /** The averages in the order of {@link #NAMES}. */
  List<Estimate> of(EnsembleResult result, Model model) {
    TimeAverage pair = result.get(moments);
    CorrelationFunction dphi = correlation.raw(result.get(phase), model);
    return List.of(
        meanOf(pair, PairMoment.DENSITY_1, PairMoment.DENSITY_2),
        result.get(cosine).estimate(0),
        dphi.estimates().get(DISTANCES[0]),
        dphi.estimates().get(DISTANCES[1]),
        dphi.estimates().get(DISTANCES[2]),
        dphi.estimates().get(DISTANCES[3]),
        dphi.estimates().get(DISTANCES[4]),
        pair.estimate(PairMoment.SPIN_Y_SQUARED.index()),
        meanOf(pair, PairMoment.DENSITY_1_SQUARED, PairMoment.DENSITY_2_SQUARED),
        pair.estimate(PairMoment.SPIN_Z_SQUARED.index()),
        result.get(sine).estimate(0));
  }

  private static Estimate meanOf(TimeAverage pair, PairMoment first, PairMoment second) {
    return pair.derived(v -> (v[first.index()] + v[second.index()]) / 2);
  }
}
