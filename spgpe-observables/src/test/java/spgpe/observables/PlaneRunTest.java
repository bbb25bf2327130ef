package spgpe.observables;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ExternalPotential;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.bubble.BubbleCensus;
import spgpe.observables.bubble.BubbleDetector;
import spgpe.observables.bubble.BubbleSettings;
import spgpe.observables.bubble.MetastableFluctuations;
import spgpe.observables.correlation.NaturalModes;
import spgpe.observables.correlation.OneBodyMatrix;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.observables.density.Density;
import spgpe.observables.density.EdgeDensity;
import spgpe.observables.phase.RelativePhase;
import spgpe.observables.spectrum.ModeAmplitude;
import spgpe.observables.spectrum.ModeOccupation;
import spgpe.observables.spectrum.ShellOccupation;
import spgpe.observables.spectrum.StructureFactor;
import spgpe.observables.thermometry.DynamicalTemperature;
import spgpe.observables.thermometry.Equipartition;
import spgpe.observables.topology.DomainWallLength;
import spgpe.observables.topology.Vortices;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.TimeSeries;
import spgpe.statistics.Estimate;

/** Observables while a plane is simulated. Seeds fixed. */
class PlaneRunTest {
  private static final double T = 0.3;

  private static Model pair(double temperature, double damping) {
    Axis axis = Axis.holdingModes(5, 14);
    return Model.of(
        Projector.belowWaveNumber(2.3).on(PeriodicGrid.of(axis, axis)),
        Hamiltonian.pair(1, 0)
            .with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.225)),
        Reservoir.of(temperature, 1.1, damping));
  }

  /**
   * Thermometers, condensate fraction. Each value within 4 errors across 16 trajectories (false
   * alarm 2 numbers x 1e-3 with 15 degrees of freedom); errors below 2 % see a wrong trace of the
   * Hessian or a missing axis, which change 1/T by more than 10 %.
   */
  @Test
  void thermometersAndCondensateFraction() {
    Model model = pair(T, 0.3);
    Recording<TimeAverage> inverse = recording(DynamicalTemperature.inverse());
    Equipartition bands = Equipartition.overall();
    Recording<TimeAverage> equipartition = recording(bands);
    ShellOccupation shells = ModeOccupation.inPhase().inShells();
    Recording<TimeAverage> occupation = recording(shells);
    Recording<OneBodyMatrix> matrix =
        Recording.of(ModeAmplitude.all(), Schedule.every(2), OneBodyMatrix::new);
    EnsembleResult result =
        Ensemble.of(model).startingFrom(InitialState.uniform(1.1, 1.1))
            .integratedBy(OuRk4.ofStep(0.1)).trajectories(16).seed(3).until(100)
            .record(inverse).record(equipartition).record(occupation).record(matrix).run();
    assertNear(1 / T, result.get(inverse).estimate(0), 0.02);
    assertNear(T, bands.temperatures(result.get(equipartition)).get(0), 0.02);
    NaturalModes modes = result.get(matrix).naturalModes();
    double all = 0;
    for (int i = 0; i < modes.size(); i++) {
      all += modes.occupation(i);
    }
    // the condensate is the in-phase mode k = 0: both ways of counting agree to the fluctuations
    double zero = result.get(occupation).mean(0);
    assertEquals(zero / all, modes.condensateFraction(), 0.01);
    assertTrue(modes.condensateFraction() > 0.85 && modes.condensateFraction() < 0.99);
  }

  private static Recording<TimeAverage> recording(spgpe.run.Observable observable) {
    return Recording.of(observable, Schedule.every(2), TimeAverage.from(20));
  }

  private static void assertNear(double expected, Estimate found, double largest) {
    assertTrue(found.standardError() < largest * expected, found::toString);
    assertEquals(expected, found.value(), 4 * found.standardError());
  }

  /**
   * A cold cloud in a harmonic trap of radius sqrt(2 mu)/w = 2 (Thomas-Fermi): a box of side 10 is
   * wide enough, one of side 4 ends where the cloud does. Nothing is left to chance: the ratios
   * differ by a factor of hundreds.
   */
  @Test
  void theEdgeOfATrap() {
    assertTrue(trapped(10).warning().isEmpty(), trapped(10)::toString);
    EdgeDensity narrow = trapped(4);
    assertTrue(narrow.ratio() > 0.02, narrow::toString);
    String warning = narrow.warning().orElseThrow();
    assertTrue(warning.contains("reaches the edge of the periodic box"), warning);
  }

  private static EdgeDensity trapped(double side) {
    Axis axis = Axis.holdingModes(side > 5 ? 7 : 3, side);
    Model model =
        Model.of(
            Projector.modesUpTo(side > 5 ? 7 : 3).on(PeriodicGrid.of(axis, axis)),
            Hamiltonian.single(1)
                .with(
                    ExternalPotential.onPlane(
                        "trap",
                        (x, y) ->
                            (Math.pow(x - side / 2, 2) + Math.pow(y - side / 2, 2)) / 2)),
            Reservoir.of(0.001, 2, 1));
    Recording<TimeAverage> density =
        Recording.of(Density.total(), Schedule.every(1), TimeAverage.from(10));
    return EdgeDensity.of(
        Ensemble.of(model).startingFrom(InitialState.uniform(0.5))
            .integratedBy(OuRk4.ofStep(0.05)).trajectories(1).seed(1).until(20).record(density)
            .run().get(density),
        model.region().grid());
  }

  /** Everything made for planes, recorded at once: the same bits for threads, lanes and splits. */
  @Test
  void planeRecordingsMergeBitIdentically() {
    Model model = pair(0.5, 0.5); // decays within the run
    PeriodicGrid grid = model.region().grid();
    BubbleDetector detector =
        BubbleDetector.of(
            BubbleSettings.atLevel(0).withHysteresis(0.3, -0.3).withSmoothing(0.8));
    Recording<BubbleCensus> census =
        Recording.of(RelativePhase.cosine(), Schedule.every(1), detector.census(grid));
    List<Recording<TimeAverage>> averages = new ArrayList<>();
    for (spgpe.run.Observable o :
        List.of(
            SpatialCorrelation.firstOrder(1), SpatialCorrelation.phaseDifference(),
            StructureFactor.ofDensity(), ModeOccupation.outOfPhase().inShells(),
            Vortices.countOfComponent(0), Vortices.countOfRelativePhase(),
            Vortices.chargesOfRelativePhase(), DomainWallLength.of(RelativePhase.cosine(), 0),
            MetastableFluctuations.observable())) {
      averages.add(Recording.of(o, Schedule.every(2), TimeAverage::new));
    }
    Ensemble plan =
        Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
            .integratedBy(OuRk4.ofStep(0.1)).seed(9).until(40).record(census);
    for (Recording<TimeAverage> average : averages) {
      plan = plan.record(average);
    }
    List<List<Object>> contents = new ArrayList<>();
    ExecutorService executor = Executors.newFixedThreadPool(2);
    try {
      EnsembleResult lanes = plan.trajectories(7).lanes(4).runOn(executor);
      EnsembleResult parts =
          plan.trajectories(3, 4).run().mergedWith(plan.trajectories(0, 3).run());
      for (EnsembleResult result : List.of(plan.trajectories(7).run(), lanes, parts)) {
        List<Object> all = new ArrayList<>();
        result.get(census).histories().forEach(
            h -> {
              all.add(h.events());
              h.bubbles().forEach(
                  b -> {
                    for (int i = 0; i < b.radius().size(); i++) {
                      all.add(b.radius().time(i));
                      all.add(b.radius().extent(i));
                    }
                  });
            });
        for (Recording<TimeAverage> average : averages) {
          for (double mean : result.get(average).means()) {
            all.add(mean);
          }
          all.add(result.get(average).standardError(0));
        }
        contents.add(all);
      }
    } finally {
      executor.shutdownNow();
    }
    assertTrue(contents.get(0).size() > 1000);
    assertEquals(contents.get(0), contents.get(1));
    assertEquals(contents.get(0), contents.get(2));
  }

  /** The census of a run is what the detector finds in its recorded frames. */
  @Test
  void censusIsTheDetectorOnFrames() {
    Model model = pair(0.5, 0.5);
    PeriodicGrid grid = model.region().grid();
    BubbleDetector detector =
        BubbleDetector.of(
            BubbleSettings.atLevel(0).withHysteresis(0.3, -0.3).withSmoothing(0.8));
    Recording<BubbleCensus> census =
        Recording.of(RelativePhase.cosine(), Schedule.every(1), detector.census(grid));
    Recording<TimeSeries> frames =
        Recording.of(RelativePhase.cosine(), Schedule.every(1), TimeSeries::new);
    EnsembleResult result =
        Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
            .integratedBy(OuRk4.ofStep(0.1)).trajectories(2).seed(9).until(40)
            .record(census).record(frames).run();
    for (int i = 0; i < 2; i++) {
      assertEquals(
          result.get(census).histories().get(i).events(),
          detector.find(result.get(frames).series().get(i), grid).events());
    }
    assertTrue(!result.get(census).nucleations().isEmpty());
  }

  /**
   * Fluctuations of a Gaussian relative phase, spectrum T/((n/2)(k^2 + m^2)) with m = 0.8 up to the
   * cutoff: the phase length is 1/m within 4 errors of the ratio it comes from, and the deviation
   * of the smoothed cosine is that of frames smoothed one by one.
   */
  @Test
  void metastableFluctuationsOnAPlane() {
    Axis axis = Axis.of(32, 20);
    Model model =
        Model.ofAliasing(
            Projector.belowWaveNumber(4.9).on(PeriodicGrid.of(axis, axis)), Hamiltonian.pair(1, 0),
            Reservoir.of(0.1, 1, 0.1));
    PlanePhases phases = new PlanePhases(model, k -> 0.02 / (k * k + 0.64), 4);
    TimeAverage average =
        Samples.average(model, 600, phases::next, MetastableFluctuations.observable()).get(0);
    MetastableFluctuations f = MetastableFluctuations.of(average, model);
    int half = SpatialCorrelation.cosine().size(model);
    Estimate ratio = average.derived(v -> v[2 * half] / v[half]);
    // d ln xi / d ln ratio is below 1 here; cubic terms of the sine are of order <phi^2>/2 = 2 %
    double part = 4 * ratio.standardError() / ratio.value() + 0.02;
    assertTrue(part < 0.25, "the ratio must be known: " + part);
    assertEquals(1 / 0.8, f.phaseLength(), part / 0.8);
    PlanePhases again = new PlanePhases(model, k -> 0.02 / (k * k + 0.64), 4);
    double sum = 0;
    double square = 0;
    spgpe.run.Observable cosine = RelativePhase.cosine();
    for (int s = 0; s < 600; s++) {
      double[] smooth = PlanePhases.smoothed(Fields.measure(cosine, again.next()), 32, 20, 1.2);
      for (double value : smooth) {
        sum += value / 600 / smooth.length;
        square += value * value / 600 / smooth.length;
      }
    }
    assertEquals(Math.sqrt(square - sum * sum), f.deviation(1.2), 0.02 * f.deviation(1.2));
    assertTrue(BubbleSettings.from(f).growLevel() < 0);
  }
}
