package spgpe.observables.bubble;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.function.Supplier;
import org.junit.jupiter.api.Test;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.Fields;
import spgpe.observables.FirstPassage;
import spgpe.statistics.Estimate;
import spgpe.observables.Samples;
import spgpe.observables.TimeAverage;
import spgpe.observables.correlation.CorrelationFunction;
import spgpe.observables.correlation.NaturalModes;
import spgpe.observables.correlation.OneBodyMatrix;
import spgpe.observables.correlation.TemporalCorrelation;
import spgpe.observables.phase.RelativePhase;
import spgpe.observables.spectrum.ModeAmplitude;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.Snapshot;
import spgpe.run.TrajectoryEnd;

class MetastableStateTest {
  /**
   * Gaussian phase about pi, m = 0.7, L = 40: c(r) from the mode sum, then the mean cosine is
   * -exp(-v/2), the correlations are exp(-v) cosh c and exp(-v) sinh c. Fixed seed, 4 standard
   * errors: false alarm 6e-5 for each of 3 values; the errors bound what is seen (0.1 %, 5 %, 2 %).
   */
  @Test
  void fluctuationsOfAGaussianPhase() {
    Model model = Fields.latticePair(128, 40);
    List<TimeAverage> average =
        Samples.average(
            model, 1000,
            Samples.gaussianPhase(model, k -> 0.1 / (0.5 * (k * k + 0.49)), Math.PI, 31),
            MetastableFluctuations.observable());
    MetastableFluctuations f = MetastableFluctuations.of(average.get(0), model);
    double v = 0.13653452;
    double[] c = new double[128];
    for (int n = -64; n < 64; n++) {
      double k = 2 * Math.PI * n / 40;
      for (int r = 0; r < 128; r++) {
        c[r] += 0.2 / (k * k + 0.49) / 40 * Math.cos(k * r * 40 / 128);
      }
    }
    double integral = 0;
    for (int r = 0; r < 128; r++) {
      integral += Math.sinh(c[r]) * 40 / 128 / 2 / Math.sinh(c[0]);
    }
    int half = 64 + 3;
    Estimate mean = average.get(0).estimate(half - 1);
    assertEquals(mean.value(), f.meanCosine(), 1e-12);
    assertTrue(mean.standardError() < 1e-3, mean::toString);
    assertEquals(-Math.exp(-v / 2), f.meanCosine(), 4 * mean.standardError());
    Estimate length =
        average.get(0).derived(
            x -> {
              double sum = 0;
              for (int r = 0; r < 128; r++) {
                sum += x[half + Math.min(r, 128 - r)] * 40 / 128 / 2 / x[half];
              }
              return sum;
            });
    assertEquals(length.value(), f.phaseLength(), 1e-9);
    assertTrue(length.standardError() < 0.07, length::toString);
    assertEquals(integral, f.phaseLength(), 4 * length.standardError());
    assertEquals(1 / 0.7, integral, 0.05 / 0.7); // cutoff and sinh: a few percent longer
    Estimate variance = average.get(0).derived(x -> x[0] - x[half - 1] * x[half - 1]);
    assertTrue(variance.standardError() < 0.02 * variance.value(), variance::toString);
    assertEquals(Math.exp(-v) * (Math.cosh(v) - 1), variance.value(), 4 * variance.standardError());
    assertEquals(Math.sqrt(variance.value()), f.deviation(0), 1e-9);

    // the smoothed deviation against smoothing the frames themselves
    Supplier<Snapshot> again =
        Samples.gaussianPhase(model, k -> 0.1 / (0.5 * (k * k + 0.49)), Math.PI, 31);
    PeriodicSmoothing smoothing = new PeriodicSmoothing(128, 40.0 / 128, 1.1);
    double sum = 0;
    double square = 0;
    for (int s = 0; s < 1000; s++) {
      double[] smooth = new double[128];
      smoothing.apply(Fields.measure(RelativePhase.cosine(), again.get()), smooth);
      for (double value : smooth) {
        sum += value / 1000 / 128;
        square += value * value / 1000 / 128;
      }
    }
    assertEquals(Math.sqrt(square - sum * sum), f.deviation(1.1), 1e-6);

    BubbleSettings settings = BubbleSettings.from(f);
    assertEquals(0.75 * f.phaseLength(), settings.smoothing(), 1e-12);
    assertEquals(
        f.meanCosine() + 5 * f.deviation(settings.smoothing()), settings.growLevel(), 1e-12);
    assertEquals((1 + f.meanCosine()) / 2, settings.seedLevel(), 1e-12);
    assertEquals(2 * f.phaseLength(), settings.minimumWidth(), 1e-12);
    assertTrue(settings.origin().startsWith("from the metastable state: mean cosine -0.93"));
    assertTrue(settings.withSmoothing(1).origin().endsWith("changed by hand"));
  }

  @Test
  void hotStatesAreRefused() {
    Model model = Fields.latticePair(64, 20);
    List<TimeAverage> average =
        Samples.average(
            model, 200, Samples.gaussianPhase(model, k -> 3 / (k * k + 0.5), Math.PI, 32),
            MetastableFluctuations.observable());
    MetastableFluctuations f = MetastableFluctuations.of(average.get(0), model);
    String message = Fields.refusal(() -> BubbleSettings.from(f));
    assertTrue(message.contains("cannot be told from"), message);
    TimeAverage wrong = new TimeAverage(new double[] {0}, 3);
    assertTrue(
        Fields.refusal(() -> MetastableFluctuations.of(wrong, model)).contains("numbers=3"));
    TimeAverage empty = new TimeAverage(new double[] {0}, 71);
    assertTrue(
        Fields.refusal(() -> MetastableFluctuations.of(empty, model)).contains("no sample"));
  }

  /** A decay run with everything recorded gives numbers that fit together. */
  @Test
  void decayRunRecordsEverything() {
    Model model =
        Fields.pair(16, 32)
            .withReservoir(Reservoir.of(0.0645, 1.1, 0.5)); // decays within a few 100
    Schedule every = Schedule.every(1);
    Recording<TimeAverage> before =
        Recording.of(
            MetastableFluctuations.observable(), every.startingAt(20),
            TimeAverage.beforeDecay(20, 60));
    BubbleSettings given =
        BubbleSettings.atLevel(0).withSmoothing(1).withHysteresis(0, -0.4).accepting(3, 2);
    Recording<BubbleCensus> census =
        Recording.of(RelativePhase.cosine(), every, BubbleDetector.of(given).census(32));
    Recording<OneBodyMatrix> matrix =
        Recording.of(ModeAmplitude.ofComponent(0), every, OneBodyMatrix.beforeDecay(20, 60));
    Recording<TemporalCorrelation> memory =
        Recording.of(
            RelativePhase.meanCosine(), every, TemporalCorrelation.realBeforeDecay(4, 20, 60));
    Ensemble plan =
        Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
            .integratedBy(OuRk4.ofStep(0.1)).seed(41).until(220)
            .stopWhen(FirstPassage.upward(RelativePhase.meanCosine(), 0.6, every))
            .record(before).record(census).record(matrix).record(memory);
    EnsembleResult whole = plan.trajectories(13).run();
    TimeAverage a = whole.get(before);
    assertTrue(a.samples() > 100, a::toString);
    NaturalModes m = whole.get(matrix).naturalModes();
    assertTrue(m.condensateFraction() > 0.5 && m.condensateFraction() < 1);
    CorrelationFunction c = whole.get(memory).connected(0);
    assertTrue(c.value(0) > 0 && c.value(4) < c.value(0));
    List<BubbleHistory> x = whole.get(census).histories();
    assertEquals(13, x.size());
    int decayed = 0;
    for (TrajectoryEnd end : whole.ends()) {
      if (!end.isStopped()) {
        continue;
      }
      decayed++;
      List<Bubble> born = x.get((int) end.trajectory()).nucleations();
      assertTrue(!born.isEmpty(), "no bubble before the decay of " + end);
      assertTrue(born.get(0).birthTime() <= end.time());
    }
    assertTrue(decayed >= 5, "decayed " + decayed);
    BubbleSettings derived = BubbleSettings.from(MetastableFluctuations.of(a, model));
    assertTrue(derived.growLevel() < derived.seedLevel());
    assertEquals(1 / Math.sqrt(0.5), MetastableFluctuations.of(a, model).phaseLength(), 1.0);
  }
}
