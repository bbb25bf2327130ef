package spgpe.observables;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.model.Model;
import spgpe.observables.bubble.BubbleDetector;
import spgpe.observables.bubble.BubbleSettings;
import spgpe.observables.bubble.MetastableFluctuations;
import spgpe.observables.bubble.RadiusTrack;
import spgpe.observables.bubble.WallSpeed;
import spgpe.observables.bubble.WallTrack;
import spgpe.observables.correlation.CorrelationFunction;
import spgpe.observables.correlation.CorrelationLength;
import spgpe.observables.correlation.SpatialCorrelation;
import spgpe.observables.density.AtomNumber;
import spgpe.observables.density.Current;
import spgpe.observables.density.Density;
import spgpe.observables.density.EdgeDensity;
import spgpe.observables.density.Energy;
import spgpe.observables.density.Momentum;
import spgpe.observables.density.NumberFluctuation;
import spgpe.observables.density.PairMoment;
import spgpe.observables.phase.ComponentPhase;
import spgpe.observables.phase.PhaseUnwrapping;
import spgpe.observables.phase.RelativePhase;
import spgpe.observables.spectrum.ModeAmplitude;
import spgpe.observables.spectrum.ModeOccupation;
import spgpe.observables.spectrum.StructureFactor;
import spgpe.observables.thermometry.DynamicalTemperature;
import spgpe.observables.thermometry.Equipartition;
import spgpe.observables.thermometry.OccupationTail;
import spgpe.observables.topology.DomainWallLength;
import spgpe.observables.topology.DomainWalls;
import spgpe.observables.topology.Kinks;
import spgpe.observables.topology.Vortices;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Observable;
import spgpe.run.ObservableContract;
import spgpe.run.Schedule;
import spgpe.run.Snapshot;

/** The built-in observables keep the contract, refuse planes if they must, and have names. */
class AllObservablesTest extends ObservableContract {
  private static final List<Observable> ALL =
      List.of(
        Density.ofComponent(1), Density.total(), Density.spin(Density.SpinAxis.X),
        Density.spin(Density.SpinAxis.Y), Density.spin(Density.SpinAxis.Z), AtomNumber.total(),
        AtomNumber.ofComponent(0), AtomNumber.difference(), Energy.byTerm(), Energy.total(),
        Energy.grandCanonical(), Momentum.total(), Momentum.ofComponent(1), Current.total(0),
        Current.ofComponent(1, 0), Current.spin(0), PairMoment.all(),
        NumberFluctuation.of(AtomNumber.total(), 20), SpatialMean.of(Density.total()),
        SpatialMean.ofSquare(Density.total()), RelativePhase.meanCosine(), RelativePhase.cosine(),
        RelativePhase.sine(), RelativePhase.wrapped(), RelativePhase.wrappedAbout(Math.PI),
        RelativePhase.unwrapped(), RelativePhase.winding(), ComponentPhase.wrapped(1),
        ComponentPhase.winding(0), ModeOccupation.ofComponent(1), ModeOccupation.inPhase(),
        ModeOccupation.outOfPhase(), ModeOccupation.inPhase().inShells(),
        ModeAmplitude.of(0, 2), ModeAmplitude.ofComponent(1),
        ModeAmplitude.all(), StructureFactor.ofDensity(), StructureFactor.ofComponent(0),
        StructureFactor.ofSpin(Density.SpinAxis.Z), SpatialCorrelation.firstOrder(1),
        SpatialCorrelation.secondOrder(0), SpatialCorrelation.phaseDifference(),
        SpatialCorrelation.phaseDeviation(Math.PI), SpatialCorrelation.cosine(),
        SpatialCorrelation.coherence(), MetastableFluctuations.observable(),
        DynamicalTemperature.inverse(), DynamicalTemperature.inverseAtFixedNumber(),
        DynamicalTemperature.gradientAndCurvature(), Equipartition.overall(),
        Equipartition.inBands(0, 1, 2), DomainWalls.count(Density.total(), 0.5, 1.5),
        Kinks.count());

  @Override
  protected List<Observable> observables() {
    return ALL;
  }

  /** Energies come as a new array; kinks and walls are lists. */
  @Override
  protected boolean mayAllocate(Observable observable) {
    return observable.name().matches(".*(energy|kinks|walls).*");
  }

  private static Model plane() {
    return Model.of(
        Projector.modesUpTo(3, 2).on(PeriodicGrid.of(Axis.of(13, 7), Axis.of(9, 5))),
        Hamiltonian.pair(1, 0)
            .with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.225)),
        Reservoir.of(0.05, 1.1, 0.1));
  }

  /** Those that are made for a ring say so; all others give finite numbers on a plane. */
  @Test
  void observablesOfRingsRefusePlanes() {
    Model model = plane();
    Amplitudes a = Samples.complexGaussian(model, k -> 1 / (1 + k * k), 4).get().amplitudes();
    Snapshot snapshot = Snapshot.of(model, a, 0);
    int refused = 0;
    for (Observable observable : ALL) {
      if (observable.name().matches(".*(unwrapped|winding|number of domain walls|kink).*")) {
        String message = Fields.refusal(() -> Fields.measure(observable, snapshot));
        assertTrue(message.contains("line"), observable.name() + ": " + message);
        refused++;
      } else {
        for (double value : Fields.measure(observable, snapshot)) {
          assertTrue(Double.isFinite(value), observable.name());
        }
      }
    }
    assertEquals(5, refused);
  }

  @Test
  void observablesOfPlanesRefuseRings() {
    Model ring = Fields.pair(4, 10);
    List<Observable> planar =
        List.of(
            Vortices.countOfComponent(1), Vortices.countOfRelativePhase(),
            Vortices.chargesOfComponent(0), Vortices.chargesOfRelativePhase(),
            DomainWallLength.of(RelativePhase.cosine(), 0));
    for (Observable observable : planar) {
      String message = Fields.refusal(() -> observable.size(ring));
      assertTrue(message.contains("need a plane"), message);
    }
    String numbers =
        Fields.refusal(
            () ->
                BubbleDetector.of(BubbleSettings.atLevel(0))
                    .census(plane().region().grid()).create(new double[] {0}, 12));
    assertTrue(numbers.contains("numbers=12, points=117"), numbers);
  }

  /** Those of planes, as for all: nothing is changed, nothing remembered. */
  @Test
  void observablesOfPlanesHaveNoMemory() {
    Model model = plane();
    Amplitudes a = Samples.complexGaussian(model, k -> 1 / (1 + k * k), 5).get().amplitudes();
    Amplitudes b =
        Samples.complexGaussian(model, k -> 1 / (1 + k * k), 6).get().amplitudes().copy();
    Amplitudes before = a.copy();
    List<Observable> planar =
        List.of(
            Vortices.countOfComponent(1), Vortices.countOfRelativePhase(),
            Vortices.chargesOfComponent(0), Vortices.chargesOfRelativePhase(),
            DomainWallLength.of(RelativePhase.cosine(), 0), SpatialCorrelation.firstOrder(0),
            SpatialCorrelation.cosine(), StructureFactor.ofDensity(),
            ModeOccupation.ofComponent(1).inShells(), MetastableFluctuations.observable());
    for (Observable observable : planar) {
      Snapshot s = Snapshot.of(model, a, 0);
      double[] first = Fields.measure(observable, s);
      a.set(b);
      double[] other = Fields.measure(observable, Snapshot.of(model, a, 0));
      assertFalse(java.util.Arrays.equals(first, other), observable.name());
      a.set(before);
      assertArrayEquals(first, Fields.measure(observable, s), 0, observable.name());
      assertArrayEquals(before.re(0), a.re(0), 0, observable.name());
    }
  }

  /** Momentum of a single moving mode and its current, along both axes. */
  @Test
  void momentumAndCurrentOnAPlane() {
    Model model = plane();
    Amplitudes a = new Amplitudes(model.region(), 2, 1);
    int mode = model.region().indexOf(-2, 1);
    a.re(1)[mode] = 3;
    Snapshot snapshot = Snapshot.of(model, a, 0);
    double kx = -2 * 2 * Math.PI / 7;
    double ky = 2 * Math.PI / 5;
    assertArrayEquals(
        new double[] {9 * kx, 9 * ky}, Fields.measure(Momentum.total(), snapshot), 1e-12);
    for (double current : Fields.measure(Current.ofComponent(1, 1), snapshot)) {
      assertEquals(9 * ky / 35, current, 1e-13);
    }
  }

  @Test
  void namesAreDistinct() {
    Map<String, Observable> names = new TreeMap<>();
    for (Observable observable : ALL) {
      if (!(observable instanceof Equipartition)) {
        assertEquals(null, names.put(observable.name(), observable), observable.name());
      }
    }
  }

  /** Null where a reference is needed: refused by name, never a NullPointerException. */
  @Test
  @SuppressWarnings("NullAway") // the point of this test
  void nullIsRefusedByName() {
    Model model = Fields.pair(4, 10);
    TimeAverage average = new TimeAverage(new double[] {0}, 1);
    Observable observable = RelativePhase.meanCosine();
    Schedule schedule = Schedule.every(1);
    double[] none = nothing(double[].class);
    Model noModel = nothing(Model.class);
    TimeAverage noAverage = nothing(TimeAverage.class);
    Observable noObservable = nothing(Observable.class);
    CorrelationFunction noCorrelation = nothing(CorrelationFunction.class);
    List<Runnable> calls =
        List.of(
            () -> FirstPassage.upward(noObservable, 0, schedule),
            () -> FirstPassage.downward(observable, 0, nothing(Schedule.class)),
            () -> SpatialMean.of(noObservable),
            () -> Estimates.of(none, new double[0][], 2),
            () -> Estimates.of(new double[1], new double[1][], 2),
            () -> Density.spin(nothing(Density.SpinAxis.class)),
            () -> NumberFluctuation.of(noObservable, 0),
            () -> NumberFluctuation.of(observable, 0).mean(noAverage),
            () -> Energy.termNames(noModel),
            () -> PhaseUnwrapping.unwrap(none),
            () -> PhaseUnwrapping.winding(none),
            () -> SpatialCorrelation.of(noObservable),
            () -> SpatialCorrelation.cosine().raw(noAverage, model),
            () -> SpatialCorrelation.cosine().connected(average, noModel),
            () -> SpatialCorrelation.cosine().distances(noModel),
            () -> CorrelationFunction.of(none, nothing(Estimates.class), 1),
            () -> CorrelationLength.exponential(noCorrelation, 0, 1),
            () -> CorrelationLength.hyperbolicCosine(noCorrelation, 0, 1),
            () -> StructureFactor.of(noObservable, observable),
            () -> StructureFactor.ofDensity().values(noAverage),
            () -> StructureFactor.ofDensity().waveNumbers(noModel),
            () -> DynamicalTemperature.temperature(noAverage),
            () -> DynamicalTemperature.chemicalPotential(noAverage),
            () -> Equipartition.inBands(none),
            () -> Equipartition.overall().temperatures(noAverage),
            () -> OccupationTail.fit(noModel, 0, average, 0, 1),
            () -> OccupationTail.fit(model, 0, noAverage, 0, 1),
            () -> DomainWalls.find(none, 0, 1, 1),
            () -> DomainWalls.count(noObservable, 0, 1),
            () -> Kinks.find(none, 1),
            () -> BubbleDetector.of(nothing(BubbleSettings.class)),
            () -> BubbleSettings.from(nothing(MetastableFluctuations.class)),
            () -> BubbleDetector.of(BubbleSettings.atLevel(0)).find(none, new double[1][], 1),
            () ->
                BubbleDetector.of(BubbleSettings.atLevel(0))
                    .find(new double[1], new double[1][], 1),
            () -> MetastableFluctuations.of(noAverage, model),
            () -> MetastableFluctuations.of(average, noModel),
            () -> WallTrack.of(none, none, none),
            () -> WallSpeed.hyperbola(nothing(WallTrack.class)),
            () -> WallSpeed.linear(nothing(RadiusTrack.class)),
            () -> WallSpeed.hyperbola(nothing(RadiusTrack.class), 0),
            () -> RadiusTrack.of(none, List.of()),
            () ->
                BubbleDetector.of(BubbleSettings.atLevel(0))
                    .inFrame(none, model.region().grid()),
            () ->
                BubbleDetector.of(BubbleSettings.atLevel(0))
                    .inFrame(new double[1], nothing(PeriodicGrid.class)),
            () ->
                BubbleDetector.of(BubbleSettings.atLevel(0)).census(nothing(PeriodicGrid.class)),
            () -> SpatialCorrelation.cosine().weights(noModel),
            () -> StructureFactor.ofDensity().weights(noModel),
            () -> ModeOccupation.inPhase().inShells().waveNumbers(noModel),
            () -> Vortices.find(none, model.region().grid()),
            () -> Vortices.find(new double[1], nothing(PeriodicGrid.class)),
            () -> DomainWallLength.of(none, 0, model.region().grid()),
            () -> DomainWallLength.of(noObservable, 0),
            () -> EdgeDensity.of(noAverage, model.region().grid()),
            () -> EdgeDensity.of(average, nothing(PeriodicGrid.class)));
    for (int i = 0; i < calls.size(); i++) {
      String message = Fields.refusal(calls.get(i));
      assertTrue(message.contains("must not be null"), "call " + i + ": " + message);
    }
  }

  @SuppressWarnings({"NullAway", "TypeParameterUnusedInFormals"})
  private static <T> T nothing(Class<T> type) {
    return type.cast(null);
  }
}
