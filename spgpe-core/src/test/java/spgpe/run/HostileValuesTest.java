package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.function.DoubleFunction;
import java.util.function.DoublePredicate;
import java.util.function.IntFunction;
import java.util.function.IntPredicate;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.EdgeCasesMode;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import net.jqwik.api.constraints.IntRange;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ContactInteraction;
import spgpe.hamiltonian.Detuning;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.Kinetic;
import spgpe.hamiltonian.ModulatedCoupling;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/** Hostile numbers: refused by name and value, or harmless; never a raw error or a wrong number. */
class HostileValuesTest {
  /** A factory of one number, the name its message must give, and what it must refuse. */
  private record NumberRule(String name, DoubleFunction<Object> factory, DoublePredicate refuses) {}

  private record WholeRule(String name, IntFunction<Object> factory, IntPredicate refuses) {}

  private static final DoublePredicate NOT_FINITE = x -> !Double.isFinite(x);
  private static final DoublePredicate NOT_POSITIVE = NOT_FINITE.or(x -> x <= 0);
  private static final DoublePredicate NEGATIVE = NOT_FINITE.or(x -> x < 0);

  private static List<NumberRule> numberRules() {
    Reservoir bath = Reservoir.none(1);
    return List.of(
        new NumberRule("length", x -> Axis.of(8, x), NOT_POSITIVE),
        new NumberRule("length", x -> Axis.holdingModes(3, x), NOT_POSITIVE),
        new NumberRule("cutoff wave number", Projector::belowWaveNumber, NOT_POSITIVE),
        new NumberRule("cutoff energy", x -> Projector.belowEnergy(x, 1), NOT_POSITIVE),
        new NumberRule("mass", x -> Projector.belowEnergy(1, x), NOT_POSITIVE),
        new NumberRule("mass", x -> Kinetic.ofMasses(1, x), NOT_POSITIVE),
        new NumberRule("mass", x -> Hamiltonian.ofMasses(x), NOT_POSITIVE),
        new NumberRule("interaction g", ContactInteraction::of, NOT_FINITE),
        new NumberRule("interaction g", x -> ContactInteraction.ofPair(1, x), NOT_FINITE),
        new NumberRule("interaction g", x -> ContactInteraction.ofPair(x, 1), NOT_FINITE),
        new NumberRule("interaction g", Hamiltonian::single, NOT_FINITE),
        new NumberRule("interaction g", x -> Hamiltonian.pair(1, x), NOT_FINITE),
        new NumberRule("coherent coupling J", CoherentCoupling::constant, NOT_FINITE),
        new NumberRule("biquadratic coupling kappa", BiquadraticCoupling::of, NOT_FINITE),
        new NumberRule("detuning", Detuning::ofPair, NOT_FINITE),
        new NumberRule("energy offset", x -> Detuning.ofOffsets(0, x), NOT_FINITE),
        new NumberRule("modulation amplitude", x -> ModulatedCoupling.of(x, 1), NOT_FINITE),
        new NumberRule("angular frequency", x -> ModulatedCoupling.of(1, x), NOT_POSITIVE),
        new NumberRule("phase", x -> ModulatedCoupling.of(1, 1).withPhase(x), NOT_FINITE),
        new NumberRule("temperature (energy units)", x -> Reservoir.of(x, 1, 0.1), NEGATIVE),
        new NumberRule("temperature (energy units)", bath::withTemperature, NEGATIVE),
        new NumberRule("chemical potential", x -> Reservoir.of(1, x, 0.1), NOT_FINITE),
        new NumberRule("chemical potential", Reservoir::none, NOT_FINITE),
        new NumberRule("chemical potential", x -> bath.withChemicalPotentials(1, x), NOT_FINITE),
        new NumberRule(
            "damping gamma (dimensionless)", x -> Reservoir.of(1, 1, x), NEGATIVE.or(x -> x > 10)),
        new NumberRule("damping gamma", x -> bath.withDampings(0, x), NEGATIVE.or(x -> x > 10)),
        new NumberRule("time step", OuRk4::ofStep, NOT_POSITIVE),
        new NumberRule("time step", x -> OuRk4.ofStep(1).withStep(x), NOT_POSITIVE),
        new NumberRule("time step", Rk4Ip::ofStep, NOT_POSITIVE),
        new NumberRule("time step", x -> Rk4Ip.ofStep(1).withStep(x), NOT_POSITIVE),
        new NumberRule("interval (time)", Schedule::every, NOT_POSITIVE),
        new NumberRule("scheduled time", x -> Schedule.at(x), NEGATIVE),
        new NumberRule("start (time)", x -> Schedule.every(1).startingAt(x), NEGATIVE),
        new NumberRule("end time", x -> Ensemble.of(SmallPlans.pair()).until(x), NOT_POSITIVE),
        new NumberRule("end time", x -> Trajectory.of(SmallPlans.pair()).until(x), NOT_POSITIVE),
        new NumberRule("uniform field psi", x -> InitialState.uniform(1, x), NOT_FINITE),
        new NumberRule("uniform field psi", x -> ThermalBogoliubov.around(x), NOT_FINITE),
        new NumberRule(
            "density", x -> InitialState.uniform(new double[] {x}, new double[1]), NEGATIVE),
        new NumberRule(
            "phase (radians)", x -> InitialState.uniform(new double[1], new double[] {x}),
            NOT_FINITE),
        new NumberRule(
            "time",
            x ->
                Snapshot.of(
                    SmallPlans.pair(), new Amplitudes(SmallPlans.pair().region(), 2, 1), x),
            NOT_FINITE),
        new NumberRule(
            "time", x -> new TrajectoryEnd(0, x, TrajectoryEnd.Reason.STOPPED, ""), NEGATIVE));
  }

  private static List<WholeRule> wholeRules() {
    CoherentRegion region = SmallPlans.region();
    return List.of(
        new WholeRule("points", n -> Axis.of(n, 1), n -> n < 2 || n > 1 << 20),
        new WholeRule(
            "largestMode", n -> Axis.holdingModes(n, 1), n -> n < 1 || n > 1 << 17),
        new WholeRule("largest mode number", Projector::modesUpTo, n -> n < 1 || n > 32767),
        new WholeRule(
            "largest mode number along x", n -> Projector.modesUpTo(n, 1),
            n -> n < 1 || n > 32767),
        new WholeRule(
            "largest mode number along y", n -> Projector.modesUpTo(1, n),
            n -> n < 1 || n > 32767),
        new WholeRule("components", n -> new Amplitudes(region, n, 1), n -> n < 1 || n > 255),
        new WholeRule("lanes", n -> new Amplitudes(region, 1, n), n -> n < 1 || n > 4096),
        new WholeRule(
            "lanes", n -> Ensemble.of(SmallPlans.pair()).lanes(n), n -> n < 1 || n > 64),
        new WholeRule(
            "trajectories", n -> Ensemble.of(SmallPlans.pair()).trajectories(n), n -> n < 1),
        new WholeRule(
            "first", n -> Ensemble.of(SmallPlans.pair()).trajectories(n, 1), n -> n < 0),
        new WholeRule("first", n -> Trajectory.of(SmallPlans.pair()).seed(1, n), n -> n < 0),
        new WholeRule(
            "i", n -> CoherentCoupling.constant(1).between(n, 1), n -> n < 0 || n == 1),
        new WholeRule(
            "trajectory", n -> new TrajectoryEnd(n, 0, TrajectoryEnd.Reason.STOPPED, ""),
            n -> n < 0));
  }

  @Provide
  Arbitrary<Double> hostile() {
    return Arbitraries.oneOf(
        Arbitraries.of(
            Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, 0.0, -0.0,
            Double.MIN_VALUE, -Double.MIN_VALUE, Double.MAX_VALUE, -Double.MAX_VALUE,
            Double.MIN_NORMAL, 1e-160, 1e160, -1.0, 1.0, 0.1, 10.000000000000002),
        Arbitraries.doubles());
  }

  @Provide
  Arbitrary<Integer> hostileInts() {
    return Arbitraries.oneOf(
        Arbitraries.of(
            0, -1, 1, 2, Integer.MIN_VALUE, Integer.MAX_VALUE, 255, 256, 4096, 4097, 1 << 17,
            (1 << 17) + 1, 1 << 20, (1 << 20) + 1),
        Arbitraries.integers());
  }

  @Property(tries = 200, edgeCases = EdgeCasesMode.NONE)
  void numbersAreRefusedByNameAndValueOrTaken(@ForAll("hostile") double x) {
    for (NumberRule rule : numberRules()) {
      if (rule.refuses.test(x)) {
        assertRefused(() -> rule.factory.apply(x), rule.name, "=" + x);
      } else {
        assertTakenOrRefused(() -> rule.factory.apply(x), rule.name);
      }
    }
  }

  @Property(tries = 100, edgeCases = EdgeCasesMode.NONE)
  void wholeNumbersAreRefusedByNameAndValueOrTaken(@ForAll("hostileInts") int n) {
    for (WholeRule rule : wholeRules()) {
      if (rule.refuses.test(n)) {
        assertRefused(() -> rule.factory.apply(n), rule.name, "=" + n);
      } else {
        assertTakenOrRefused(() -> rule.factory.apply(n), rule.name);
      }
    }
  }

  private static void assertRefused(Runnable call, String... expected) {
    String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
    for (String part : expected) {
      assertTrue(message.contains(part), expected[0] + ": " + message);
    }
  }

  /** A value in range may still be refused, where a square or a product is not representable. */
  private static void assertTakenOrRefused(Runnable call, String name) {
    try {
      call.run();
    } catch (IllegalArgumentException e) {
      assertTrue(e.getMessage().contains("representable"), name + ": " + e.getMessage());
    }
  }

  /** A whole plan with one or several hostile numbers. */
  @Property(tries = 400, edgeCases = EdgeCasesMode.NONE)
  void aPlanIsRefusedOrFailsWithAReasonOrGivesFiniteNumbers(
      @ForAll("hostile") double one,
      @ForAll("hostile") double two,
      @ForAll @IntRange(min = 0, max = 13) int first,
      @ForAll @IntRange(min = 0, max = 13) int second,
      @ForAll boolean picture) {
    double[] v = {6, 1, 1, 0.2, 0.1, 0.1, 1, 0.05, 0.1, 0.05, 2, 1, -1, 0.3};
    v[first] = one;
    v[second] = two;
    try {
      Model model =
          Model.of(
              Projector.modesUpTo(3).on(PeriodicGrid.of(Axis.of(16, v[0]))),
              Hamiltonian.ofMasses(v[1], 1)
                  .with(ContactInteraction.ofPair(v[2], v[3]))
                  .with(CoherentCoupling.constant(v[4]))
                  .with(BiquadraticCoupling.of(v[13]))
                  .with(ModulatedCoupling.of(v[9], v[10])),
              Reservoir.of(v[5], v[6], v[7]));
      Trajectory.Result result =
          Trajectory.of(model)
              .startingFrom(InitialState.uniform(v[11], v[12]))
              .integratedBy(picture ? Rk4Ip.ofStep(v[8]) : OuRk4.ofStep(v[8]))
              .seed(1, 0)
              .until(5 * v[8])
              .run();
      for (int c = 0; c < 2; c++) {
        double number = result.finalState().atomNumber(c, 0);
        assertTrue(Double.isFinite(number), "atom number " + number);
      }
    } catch (IllegalArgumentException | DivergedException e) {
      assertTrue(e.getMessage().contains("="), e.getMessage());
    } catch (RunFailedException e) {
      assertTrue(e.getCause() instanceof IllegalArgumentException, String.valueOf(e.getCause()));
    }
  }
}
