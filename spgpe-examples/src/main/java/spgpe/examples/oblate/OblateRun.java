package spgpe.examples.oblate;

import java.util.List;
import java.util.concurrent.Executor;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.FirstPassage;
import spgpe.observables.TimeAverage;
import spgpe.observables.bubble.BubbleCensus;
import spgpe.observables.bubble.BubbleDetector;
import spgpe.observables.bubble.BubbleHistory;
import spgpe.observables.bubble.BubbleSettings;
import spgpe.observables.bubble.MetastableFluctuations;
import spgpe.observables.phase.RelativePhase;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.TimeSeries;
import spgpe.theory.CoupledPair;

/**
 * The simulation behind the command, in scaled units.
 *
 * @param pair parameters
 * @param side side of the square
 * @param largestMode radius of the disc of kept mode numbers
 * @param damping gamma
 * @param seed seed of the ensemble
 * @param trajectories number of trajectories
 * @param until end of each run
 */
record OblateRun(
    CoupledPair pair, double side, int largestMode, double damping, long seed, long trajectories,
    double until) {
  private static final double STEP = 0.1;
  private static final double FRAME = 1;

  /** The cold start is forgotten after a few times 1/(2 gamma g n). */
  private static final double START = 15;

  /** A bubble is small but grows during this time before its trajectory passes the threshold. */
  private static final double MARGIN = 25;

  private static final double THRESHOLD = -0.5;

  /**
   * What came out.
   *
   * @param fluctuations fluctuations of the metastable state
   * @param histories bubbles, one history for each trajectory
   * @param cosines frames of cos(relative phase)
   * @param defects numbers of vortices of component 0 and of the relative phase, and the length of
   *     the domain walls; see {@link Defects}
   */
  record Outcome(
      MetastableFluctuations fluctuations, List<BubbleHistory> histories,
      List<TimeSeries.Series> cosines, List<TimeSeries.Series> defects) {}

  Model model() {
    Axis axis = Axis.holdingModes(largestMode, side);
    return Model.of(
        Projector.belowWaveNumber(axis.waveNumber(largestMode) * (1 + 1e-12))
            .on(PeriodicGrid.of(axis, axis)),
        Hamiltonian.pair(pair.g(), 0)
            .with(CoherentCoupling.constant(pair.coherentCoupling()))
            .with(BiquadraticCoupling.of(pair.biquadraticCoupling())),
        Reservoir.of(pair.temperature(), pair.mu(), damping));
  }

  private Ensemble plan() {
    double psi = Math.sqrt(pair.falseVacuumDensity());
    return Ensemble.of(model()).startingFrom(InitialState.uniform(psi, -psi))
        .integratedBy(OuRk4.ofStep(STEP)).trajectories(trajectories).seed(seed).until(until);
  }

  /** Runs twice with the same noise: up to the decay for the settings, then through it. */
  Outcome run(Executor executor) {
    MetastableFluctuations fluctuations = fluctuations(executor);
    // snippet-begin plane-bubbles
    BubbleDetector detector = BubbleDetector.of(BubbleSettings.from(fluctuations));
    PeriodicGrid grid = model().region().grid();
    Recording<BubbleCensus> bubbles =
        Recording.of(RelativePhase.cosine(), Schedule.every(FRAME), detector.census(grid));
    // snippet-end
    Recording<TimeSeries> cosine =
        Recording.of(RelativePhase.cosine(), Schedule.every(FRAME), TimeSeries::new);
    Recording<TimeSeries> defects =
        Recording.of(new Defects(), Schedule.every(FRAME), TimeSeries::new);
    EnsembleResult result =
        plan().record(bubbles).record(cosine).record(defects).runOn(executor);
    return new Outcome(
        fluctuations, result.get(bubbles).histories(), result.get(cosine).series(),
        result.get(defects).series());
  }

  private MetastableFluctuations fluctuations(Executor executor) {
    Recording<TimeAverage> recording =
        Recording.of(
            MetastableFluctuations.observable(), Schedule.every(FRAME),
            TimeAverage.beforeDecay(START, MARGIN));
    TimeAverage average =
        plan()
            .stopWhen(
                FirstPassage.upward(
                    RelativePhase.meanCosine(), THRESHOLD, Schedule.every(FRAME)))
            .record(recording).runOn(executor).get(recording);
    return MetastableFluctuations.of(average, model());
  }
}
