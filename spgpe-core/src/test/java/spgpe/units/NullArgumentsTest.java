package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.reflect.Constructor;
import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Method;
import java.lang.reflect.Modifier;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** A null in any place of any public call is refused, never by a NullPointerException. */
class NullArgumentsTest {
  private static final Map<Class<?>, Object> SAMPLES = samples();

  @Test
  void everyNullIsRefused() throws ReflectiveOperationException {
    int calls = 0;
    for (Map.Entry<Class<?>, Object> entry : SAMPLES.entrySet()) {
      Class<?> type = entry.getKey();
      if (type.getPackage() != Length.class.getPackage() || type.isEnum()) {
        continue;
      }
      for (Method method : type.getDeclaredMethods()) {
        if (Modifier.isPublic(method.getModifiers()) && !method.getName().equals("equals")) {
          calls +=
              check(
                  method.toString(),
                  method.getParameterTypes(),
                  arguments -> method.invoke(entry.getValue(), arguments));
        }
      }
      for (Constructor<?> constructor : type.getConstructors()) {
        calls +=
            check(
                constructor.toString(), constructor.getParameterTypes(), constructor::newInstance);
      }
    }
    assertTrue(calls > 90, "calls tried: " + calls);
  }

  private interface Call {
    Object with(Object... arguments) throws ReflectiveOperationException;
  }

  private static int check(String name, Class<?>[] types, Call call) {
    int calls = 0;
    for (int place = 0; place < types.length; place++) {
      if (types[place].isPrimitive()) {
        continue;
      }
      Object[] arguments = new Object[types.length];
      for (int i = 0; i < types.length; i++) {
        Object sample = SAMPLES.get(types[i]);
        assertTrue(sample != null, "no sample of " + types[i]);
        arguments[i] = i == place ? null : sample;
      }
      InvocationTargetException thrown =
          assertThrows(InvocationTargetException.class, () -> call.with(arguments), name);
      assertInstanceOf(IllegalArgumentException.class, thrown.getCause(), name);
      calls++;
    }
    return calls;
  }

  private static Map<Class<?>, Object> samples() {
    Map<Class<?>, Object> samples = new HashMap<>();
    Geometry.Ring ring = Geometry.ring(Length.ofMicrometres(25));
    RingExperiment lab =
        RingExperiment.of(
            Species.K_41,
            ring,
            Frequency.ofKilohertz(1.5),
            12_000,
            Length.ofBohrRadii(65),
            Temperature.ofNanokelvin(30));
    ScaledRing scaled = lab.withCoherentCoupling(Energy.ofHertz(8)).scaled();
    samples.put(double.class, 0.5);
    samples.put(int.class, 1);
    samples.put(String.class, "name");
    samples.put(List.class, List.of());
    samples.put(Verdict.Grade.class, Verdict.Grade.FINE);
    samples.put(Species.class, Species.K_41);
    samples.put(Length.class, Length.ofBohrRadii(65));
    samples.put(TimeSpan.class, TimeSpan.ofMilliseconds(1));
    samples.put(Frequency.class, Frequency.ofKilohertz(1));
    samples.put(Energy.class, Energy.ofHertz(800));
    samples.put(Temperature.class, Temperature.ofNanokelvin(30));
    samples.put(Density.class, Density.perMicrometre(76));
    samples.put(Coupling.class, new Coupling(7e-39, 1));
    samples.put(EventRate.class, EventRate.perSecond(1));
    samples.put(Modulation.class, new Modulation(0.1, Frequency.ofKilohertz(10)));
    samples.put(Confinement.class, Confinement.quasi1d(Species.K_41, Frequency.ofKilohertz(1.5)));
    samples.put(Cloud.class, ring.fill(Species.K_41, new Coupling(7e-39, 1), 100));
    samples.put(Geometry.Ring.class, ring);
    samples.put(Geometry.Box.class, new Geometry.Box(Length.ofMicrometres(1)));
    samples.put(
        Geometry.Rectangle.class,
        new Geometry.Rectangle(Length.ofMicrometres(1), Length.ofMicrometres(1)));
    samples.put(Geometry.Harmonic.class, new Geometry.Harmonic(Frequency.ofHertz(5)));
    samples.put(Geometry.class, ring);
    samples.put(RingExperiment.class, lab);
    samples.put(ScaledRing.class, scaled);
    samples.put(ScaledUnits.class, scaled.units());
    samples.put(UniformGas.class, scaled.gas());
    samples.put(ThermalBath.class, scaled.bath());
    samples.put(CoupledPair.class, scaled.pair().orElseThrow());
    samples.put(Verdict.class, scaled.verdicts().get(0));
    samples.put(Validity.class, scaled);
    return samples;
  }
}
