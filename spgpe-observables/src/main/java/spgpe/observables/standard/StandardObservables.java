package spgpe.observables.standard;

import java.util.List;
import spgpe.observables.SpatialMean;
import spgpe.observables.bubble.MetastableFluctuations;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.observables.density.AtomNumber;
import spgpe.observables.density.Density;
import spgpe.observables.density.Energy;
import spgpe.observables.density.Momentum;
import spgpe.observables.density.PairMoment;
import spgpe.observables.phase.RelativePhase;
import spgpe.observables.spectrum.ModeOccupation;
import spgpe.observables.thermometry.Equipartition;
import spgpe.run.Observable;

/**
 * The default list: what a run of a coupled pair on a ring records when nothing special is asked.
 * They share the phase factors, the energies and the forces of a look, so that the whole list costs
 * little more than its dearest parts (docs/observables.md).
 */
public final class StandardObservables {
  private StandardObservables() {}

  /**
   * Averages of a pair in its metastable state: densities, moments, relative phase with its
   * correlation and the input of the bubble detector, occupations, conserved quantities and the
   * temperature by equipartition.
   *
   * @return unmodifiable list of new observables, each of another name
   */
  public static List<Observable> ofPair() {
    return List.of(
        PairMoment.all(), Density.ofComponent(0), Density.ofComponent(1),
        RelativePhase.meanCosine(), SpatialMean.ofSquare(RelativePhase.sine()),
        RelativePhase.winding(), SpatialCorrelation.phaseDeviation(Math.PI),
        MetastableFluctuations.observable(), ModeOccupation.inPhase(), ModeOccupation.outOfPhase(),
        AtomNumber.total(), Energy.byTerm(), Energy.grandCanonical(), Momentum.total(),
        Equipartition.overall());
  }
}
