package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.function.DoubleFunction;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;

class QuantitiesTest {
  @Test
  void constantsAreCodata2022() {
    // as published; hbar as computed from the exact h
    assertEquals(1.0545718176461565e-34, Constants.HBAR, 1e-49);
    assertEquals(6.801871117e-26, Species.K_41.massKilograms(), 1e-35);
  }

  @Test
  void thermalWavelengthsAtOneHundredNanokelvin() {
    // CODATA 2022 constants, AME2020 masses
    Temperature cold = Temperature.ofNanokelvin(100);
    double[] expected = {
      2.0842749e-6,
      1.1514169e-6,
      8.8444285e-7,
      8.6260159e-7,
      5.9912288e-7,
      5.9219819e-7,
      4.7888199e-7
    };
    List<Species> species =
        List.of(
            Species.LI_7,
            Species.NA_23,
            Species.K_39,
            Species.K_41,
            Species.RB_85,
            Species.RB_87,
            Species.CS_133);
    for (int i = 0; i < expected.length; i++) {
      assertEquals(1, species.get(i).thermalWavelength(cold).metres() / expected[i], 1e-7);
    }
  }

  @Test
  void energyFrequencyAndTemperatureAreBridgedByNameOnly() {
    assertEquals(Constants.PLANCK * 800, Energy.ofHertz(800).joules());
    assertEquals(800, Energy.ofHertz(800).hertz(), 1e-12);
    assertEquals(2 * Math.PI * 1500, Frequency.ofKilohertz(1.5).angular(), 1e-9);
    assertEquals(
        Constants.HBAR * Frequency.ofHertz(1500).angular(),
        Frequency.ofHertz(1500).quantum().joules(),
        1e-44);
    assertEquals(47.992430733, Energy.ofHertz(1000).asTemperature().nanokelvin(), 1e-8);
  }

  @Property(tries = 200)
  void unitsOfOneQuantityRoundTrip(@ForAll @DoubleRange(min = 0, max = 1e6) double value) {
    double tolerance = 4e-16 * value;
    assertEquals(value, Length.ofMicrometres(value).micrometres(), tolerance);
    assertEquals(value, Length.ofBohrRadii(value).bohrRadii(), tolerance);
    assertEquals(value, Length.ofMetres(value).metres());
    assertEquals(value, TimeSpan.ofMilliseconds(value).milliseconds(), tolerance);
    assertEquals(value, TimeSpan.ofSeconds(value).seconds());
    assertEquals(value, Temperature.ofNanokelvin(value).nanokelvin(), tolerance);
    assertEquals(value, Temperature.ofKelvin(value).energy().asTemperature().kelvin(), tolerance);
    assertEquals(value, Energy.ofHertz(value).hertz(), tolerance);
    assertEquals(value, Energy.ofJoules(value).joules());
    assertEquals(value, Frequency.ofAngular(value).angular(), tolerance);
    assertEquals(value * 1e6, Density.perMicrometre(value).perMetreToD());
    assertEquals(value * 1e12, Density.perSquareMicrometre(value).perMetreToD());
    assertEquals(3 * value, EventRate.perSecond(3 * value).perSecondPerMetreToD());
    assertEquals(value, Density.perMetre(value).perMetreToD());
  }

  @Test
  void everyFactoryRefusesValuesThatAreNoNumbers() {
    List<DoubleFunction<Object>> factories =
        List.of(
            Length::ofMetres,
            Length::ofMicrometres,
            Length::ofBohrRadii,
            TimeSpan::ofSeconds,
            TimeSpan::ofMilliseconds,
            Frequency::ofHertz,
            Frequency::ofKilohertz,
            Frequency::ofAngular,
            Energy::ofJoules,
            Energy::ofHertz,
            Temperature::ofKelvin,
            Temperature::ofNanokelvin,
            Density::perMetre,
            Density::perMicrometre,
            Density::perSquareMicrometre,
            EventRate::perSecond,
            value -> new Coupling(value, 1),
            value -> Species.ofAtomicMass("X", value),
            value -> new Modulation(value, Frequency.ofHertz(1)));
    for (DoubleFunction<Object> factory : factories) {
      for (double bad : new double[] {Double.NaN, Double.POSITIVE_INFINITY}) {
        assertThrows(IllegalArgumentException.class, () -> factory.apply(bad));
      }
    }
  }

  @Test
  void signsAreAllowedOnlyWhereTheyMeanSomething() {
    assertEquals(-5, Length.ofBohrRadii(-5).bohrRadii(), 1e-14);
    assertEquals(-5, Energy.ofHertz(-5).hertz(), 1e-14);
    assertThrows(IllegalArgumentException.class, () -> Temperature.ofNanokelvin(-1));
    assertThrows(IllegalArgumentException.class, () -> Frequency.ofHertz(-1));
    assertThrows(IllegalArgumentException.class, () -> TimeSpan.ofSeconds(-1));
    assertThrows(IllegalArgumentException.class, () -> Density.perMetre(-1));
    assertThrows(IllegalArgumentException.class, () -> EventRate.perSecond(-1));
    assertThrows(IllegalArgumentException.class, () -> Energy.ofHertz(-5).asTemperature());
  }

  @Test
  void dimensionsDoNotMix() {
    Coupling line = new Coupling(1e-38, 1);
    assertEquals(1e-30, line.times(Density.perMicrometre(100)).joules(), 1e-44);
    IllegalArgumentException error =
        assertThrows(
            IllegalArgumentException.class, () -> line.times(Density.perSquareMicrometre(1)));
    assertTrue(error.getMessage().contains("dimension=2"), error.getMessage());
    assertThrows(IllegalArgumentException.class, () -> new Density(1, 4));
    assertThrows(IllegalArgumentException.class, () -> new EventRate(1, -1));
    assertThrows(
        IllegalArgumentException.class, () -> EventRate.perSecond(1).over(Length.ofMicrometres(1)));
    assertEquals(EventRate.perSecond(2), new EventRate(1e6, 1).over(Length.ofMetres(2e-6)));
  }

  @Test
  void bulkCouplingOfRubidium() {
    // 4 pi hbar^2 a/m with CODATA 2022 and AME2020
    Coupling g = Coupling.bulk(Species.RB_87, Length.ofBohrRadii(100.4));
    assertEquals(1, g.jouleMetreToD() / 5.1449633e-51, 1e-7);
    assertEquals(3, g.dimension());
  }

  @Test
  void massInKilogramsWhereAtomicMassIsMeantIsCaught() {
    IllegalArgumentException error =
        assertThrows(IllegalArgumentException.class, () -> Species.ofAtomicMass("K-41", 6.8e-26));
    assertTrue(error.getMessage().contains("not in kg"), error.getMessage());
  }
}
