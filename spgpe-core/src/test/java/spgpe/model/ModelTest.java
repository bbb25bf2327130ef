package spgpe.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierProviders;
import spgpe.fourier.FourierTransform;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ContactInteraction;
import spgpe.hamiltonian.Detuning;
import spgpe.hamiltonian.ExternalPotential;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.HamiltonianTerm;
import spgpe.hamiltonian.LocalTerm;
import spgpe.hamiltonian.ModulatedCoupling;
import spgpe.projector.CoherentRegion;
import spgpe.projector.PointBlock;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/** Checks of the model as a whole: parts that do not fit are refused with the reason. */
class ModelTest {
  private static final Reservoir RESERVOIR = Reservoir.of(0.1, 1, 0.1);

  private static CoherentRegion region(int points) {
    return Projector.modesUpTo(7).on(PeriodicGrid.of(Axis.of(points, 9)));
  }

  private static void assertRefused(Runnable call, String... expected) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    for (String part : expected) {
      assertTrue(message.contains(part), message);
    }
  }

  private static Hamiltonian with(Hamiltonian base, HamiltonianTerm term) {
    return base.with(term);
  }

  @Test
  void anAliasingRegionIsRefusedUnlessTheCallerSaysSo() {
    Hamiltonian h = Hamiltonian.single(1);
    assertRefused(
        () -> Model.of(region(28), h, RESERVOIR),
        "must not alias", "points needed=[29]", "present=[28]", "ContactInteraction");
    assertEquals(15, Model.of(region(29), h, RESERVOIR).region().modes());
    Model aliasing = Model.ofAliasing(region(28), h, RESERVOIR);
    assertEquals(28, aliasing.withReservoir(Reservoir.none(0)).region().grid().points());
    assertEquals(15, Model.of(region(16), Hamiltonian.ofMasses(1), RESERVOIR).region().modes());
  }

  @Test
  void partsForAnotherNumberOfComponentsAreRefused() {
    Hamiltonian one = Hamiltonian.ofMasses(1);
    Hamiltonian two = Hamiltonian.ofMasses(1, 1);
    Hamiltonian three = Hamiltonian.ofMasses(1, 1, 1);
    CoherentRegion region = region(32);
    assertRefused(
        () -> Model.of(region, with(three, ContactInteraction.ofPair(1, 0)), RESERVOIR),
        "rows=2", "components=3");
    assertRefused(
        () -> Model.of(region, with(one, BiquadraticCoupling.of(1)), RESERVOIR), "components=1");
    assertRefused(
        () -> Model.of(region, with(three, ModulatedCoupling.of(1, 1)), RESERVOIR),
        "components=3");
    assertRefused(
        () -> Model.of(region, with(one, CoherentCoupling.constant(1)), RESERVOIR),
        "j=1", "components=1");
    assertRefused(
        () -> Model.of(region, with(two, CoherentCoupling.constant(1).between(0, 2)), RESERVOIR),
        "j=2", "components=2");
    assertRefused(
        () -> Model.of(region, with(three, Detuning.ofPair(1)), RESERVOIR),
        "offsets=2", "components=3");
    assertRefused(
        () ->
            Model.of(
                region, with(two, ExternalPotential.onLine("trap", x -> x).forComponent(2)),
                RESERVOIR),
        "component=2", "components=2");
    assertRefused(
        () -> Model.of(region, two, RESERVOIR.withDampings(0.1, 0.2, 0.3)),
        "dampings", "given=3", "components=2");
    assertRefused(
        () -> Model.of(region, three, RESERVOIR.withChemicalPotentials(0.1, 0.2)),
        "chemical potentials", "given=2", "components=3");
  }

  @Test
  void aPotentialThatIsNotFiniteIsRefusedWithItsPlace() {
    assertRefused(
        () ->
            Model.of(
                region(32),
                Hamiltonian.ofMasses(1).with(ExternalPotential.onLine("pole", x -> 1 / x)),
                RESERVOIR),
        "\"pole\"", "V=Infinity", "x=0.0");
  }

  @Test
  void aTermOfNeitherKindIsRefused() {
    HamiltonianTerm neither = () -> "neither";
    assertRefused(() -> Hamiltonian.ofMasses(1).with(neither), "SpectralTerm or a LocalTerm");
  }

  private static class BadTerm implements LocalTerm {
    @Override
    public String description() {
      return "BadTerm";
    }

    @Override
    public int forceDegree() {
      return 2;
    }

    @Override
    public void addForce(double time, PointBlock block) {}

    @Override
    public void addEnergyDensity(double time, PointBlock block, double[] density) {}
  }

  @Test
  void aTermOfEvenDegreeIsRefused() {
    assertRefused(
        () -> Model.of(region(32), Hamiltonian.ofMasses(1).with(new BadTerm()), RESERVOIR),
        "odd", "forceDegree=2");
  }

  @Test
  void aProviderOfWrongTransformsIsRefused() {
    Model model = Model.of(region(32), Hamiltonian.single(1), RESERVOIR);
    FourierProvider wrong =
        new FourierProvider() {
          @Override
          public String name() {
            return "wrong";
          }

          @Override
          public int rank() {
            return 0;
          }

          @Override
          public FourierTransform transform(int size) {
            return FourierProviders.preferred().transform(16);
          }
        };
    assertRefused(() -> model.withFourierProvider(wrong).evaluator(1), "\"wrong\"", "size=16");
  }

  @Test
  void lanesOutOfRangeAreRefused() {
    Model model = Model.of(region(32), Hamiltonian.single(1), RESERVOIR);
    assertRefused(() -> model.evaluator(0), "lanes=0");
    assertRefused(() -> model.evaluator(-1), "lanes=-1");
    assertRefused(() -> model.evaluator(Integer.MAX_VALUE), "lanes=2147483647");
  }

  @Test
  void itDescribesItself() {
    Model model =
        Model.of(region(32), Hamiltonian.pair(1, 0.2).with(CoherentCoupling.constant(0.3)),
            RESERVOIR);
    for (String part :
        new String[] {
          "15 modes", "32 points", "degree 3 does not alias", "2 components", "J=0.3",
          "temperature=0.1", model.fourierProvider().name()
        }) {
      assertTrue(model.describe().contains(part), model.describe());
    }
    Model other = model.withReservoir(Reservoir.none(2));
    assertNotSame(model, other);
    assertEquals(0.1, model.reservoir().temperature(), 0);
    assertEquals(0, other.reservoir().temperature(), 0);
  }
}
