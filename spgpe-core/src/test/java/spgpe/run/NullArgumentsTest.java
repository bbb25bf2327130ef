package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.lang.reflect.Constructor;
import java.lang.reflect.Executable;
import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Method;
import java.lang.reflect.Modifier;
import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.Executor;
import java.util.function.BooleanSupplier;
import java.util.function.DoubleBinaryOperator;
import java.util.function.DoubleUnaryOperator;
import java.util.function.IntBinaryOperator;
import java.util.function.Predicate;
import java.util.function.ToDoubleFunction;
import java.util.stream.Stream;
import org.apache.commons.rng.UniformRandomProvider;
import org.junit.jupiter.api.Test;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierProviders;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.HamiltonianTerm;
import spgpe.hamiltonian.Kinetic;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuRk4;
import spgpe.model.EnergyMeter;
import spgpe.model.ForceEvaluator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Engine;
import spgpe.projector.Field;
import spgpe.projector.LocalOperation;
import spgpe.projector.ModeTransform;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/**
 * Passes null for each argument of each public factory, constructor and method of a recipe in turn.
 * The classes are found in the compiled code, so that new ones are covered when they come.
 */
class NullArgumentsTest {
  private static final List<String> PACKAGES =
      List.of(
          "grid", "fourier", "projector", "hamiltonian", "reservoir", "model", "integrate", "run");

  /** Called by the library for the user's own parts, with arguments it has checked. */
  private static final Set<String> CALLED_BY_THE_LIBRARY =
      Set.of(
          "equals", "addForce", "addEnergyDensity", "addTo", "check", "preparedFor", "measure",
          "shouldStop");

  private final Map<Class<?>, Object> samples = samples();

  private static Map<Class<?>, Object> samples() {
    Model model = SmallPlans.pair();
    Amplitudes state = new Amplitudes(model.region(), 2, 1);
    Observable observable = SmallPlans.density();
    Recording<TimeMoments> recording =
        Recording.of(observable, Schedule.every(1), TimeMoments::new);
    Accumulator.Factory<TimeMoments> factory = TimeMoments::new;
    Map<Class<?>, Object> map = new HashMap<>();
    map.put(int.class, 1);
    map.put(long.class, 1L);
    map.put(double.class, 0.05);
    map.put(boolean.class, true);
    map.put(String.class, "name");
    map.put(double[].class, new double[] {1});
    map.put(double[][].class, new double[][] {{1}});
    map.put(Axis.class, Axis.of(16, 6));
    map.put(PeriodicGrid.class, model.region().grid());
    map.put(CoherentRegion.class, model.region());
    map.put(Projector.class, Projector.modesUpTo(3));
    map.put(FourierProvider.class, FourierProviders.preferred());
    map.put(Engine.class, Engine.AUTOMATIC);
    map.put(Amplitudes.class, state);
    map.put(Field.class, new Field(model.region().grid(), 2, 1));
    map.put(LocalOperation.class, (LocalOperation) block -> {});
    map.put(ModeTransform.class, model.region().transform(2, 1, FourierProviders.preferred()));
    map.put(HamiltonianTerm.class, Kinetic.ofMasses(1));
    map.put(Hamiltonian.class, model.hamiltonian());
    map.put(Reservoir.class, model.reservoir());
    map.put(RandomStreams.class, RandomStreams.counterBased(1));
    map.put(NoiseGenerator.class, RandomStreams.counterBased(1).generator(model.region(), 2, 1));
    map.put(UniformRandomProvider.class, RandomStreams.counterBased(1).initialState(0));
    map.put(Model.class, model);
    map.put(EnergyMeter.class, new EnergyMeter(model));
    map.put(ForceEvaluator.class, model.evaluator(1));
    map.put(Integrator.class, OuRk4.ofStep(0.1));
    map.put(OuRk4.class, OuRk4.ofStep(0.1));
    map.put(spgpe.integrate.Rk4Ip.class, spgpe.integrate.Rk4Ip.ofStep(0.1));
    map.put(InitialState.class, InitialState.empty());
    map.put(ThermalBogoliubov.class, ThermalBogoliubov.around(1, 1));
    map.put(InitialState.FieldFunction.class, (InitialState.FieldFunction) (c, x, y, v) -> {});
    map.put(Observable.class, observable);
    map.put(Schedule.class, Schedule.every(1));
    map.put(StopRule.class, StopRule.when("never", Schedule.every(1), s -> false));
    map.put(Recording.class, recording);
    map.put(Accumulator.Factory.class, factory);
    map.put(TimeMoments.class, new TimeMoments(new double[] {1}, 1));
    map.put(TimeSeries.class, new TimeSeries(new double[] {1}, 1));
    map.put(TrajectoryEnd.class, new TrajectoryEnd(0, 0, TrajectoryEnd.Reason.STOPPED, ""));
    map.put(TrajectoryEnd.Reason.class, TrajectoryEnd.Reason.STOPPED);
    map.put(Ensemble.class, SmallPlans.plan(model, 1));
    map.put(EnsembleResult.class, SmallPlans.plan(model, 1).record(recording).run());
    map.put(Trajectory.class, Trajectory.of(model));
    map.put(ProgressListener.class, (ProgressListener) progress -> {});
    map.put(Executor.class, (Executor) Runnable::run);
    map.put(BooleanSupplier.class, (BooleanSupplier) () -> false);
    map.put(IntBinaryOperator.class, (IntBinaryOperator) (a, b) -> 1);
    map.put(DoubleUnaryOperator.class, (DoubleUnaryOperator) x -> 1);
    map.put(DoubleBinaryOperator.class, (DoubleBinaryOperator) (x, y) -> 1);
    map.put(ToDoubleFunction.class, (ToDoubleFunction<Snapshot>) s -> 1);
    map.put(Predicate.class, (Predicate<Snapshot>) s -> false);
    return map;
  }

  private static List<Class<?>> publicClasses()
      throws IOException, URISyntaxException, ClassNotFoundException {
    Path root = Path.of(Model.class.getProtectionDomain().getCodeSource().getLocation().toURI());
    List<Class<?>> classes = new ArrayList<>();
    for (String name : PACKAGES) {
      try (Stream<Path> files = Files.list(root.resolve("spgpe").resolve(name))) {
        for (Path file : files.sorted().toList()) {
          String text = file.getFileName().toString();
          if (text.endsWith(".class") && !text.startsWith("package-info")) {
            Class<?> type =
                Class.forName(
                    "spgpe." + name + "." + text.substring(0, text.length() - 6), false,
                    Model.class.getClassLoader());
            if (Modifier.isPublic(type.getModifiers())
                && !Throwable.class.isAssignableFrom(type) && !type.isEnum()) {
              classes.add(type);
            }
          }
        }
      }
    }
    return classes;
  }

  @Test
  void nullIsRefusedEverywhereWithTheNameOfTheParameter() throws Exception {
    List<String> wrong = new ArrayList<>();
    int tried = 0;
    for (Class<?> type : publicClasses()) {
      List<Executable> calls = new ArrayList<>();
      for (Constructor<?> constructor : type.getConstructors()) {
        calls.add(constructor);
      }
      for (Method method : type.getDeclaredMethods()) {
        boolean reachable =
            Modifier.isStatic(method.getModifiers()) || samples.containsKey(type);
        if (Modifier.isPublic(method.getModifiers()) && !method.isSynthetic() && reachable
            && !Modifier.isAbstract(method.getModifiers())
            && !CALLED_BY_THE_LIBRARY.contains(method.getName())) {
          calls.add(method);
        }
      }
      for (Executable call : calls) {
        tried += tryNulls(type, call, wrong);
      }
    }
    assertEquals(List.of(), wrong);
    assertTrue(tried > 90, "arguments tried: " + tried);
  }

  private int tryNulls(Class<?> type, Executable call, List<String> wrong) throws Exception {
    Class<?>[] parameters = call.getParameterTypes();
    int tried = 0;
    for (int p = 0; p < parameters.length; p++) {
      if (parameters[p].isPrimitive()) {
        continue;
      }
      Object[] arguments = new Object[parameters.length];
      for (int i = 0; i < arguments.length; i++) {
        arguments[i] = samples.get(parameters[i]);
        if (i != p && arguments[i] == null) {
          wrong.add("no sample of " + parameters[i] + " for " + call);
        }
      }
      arguments[p] = null;
      tried++;
      String outcome = outcome(type, call, arguments);
      if (!outcome.isEmpty()) {
        wrong.add(call + ", parameter " + p + ": " + outcome);
      }
    }
    return tried;
  }

  private String outcome(Class<?> type, Executable call, Object[] arguments) throws Exception {
    try {
      if (call instanceof Constructor<?> constructor) {
        constructor.newInstance(arguments);
      } else {
        ((Method) call).invoke(samples.get(type), arguments);
      }
      return "taken";
    } catch (InvocationTargetException e) {
      boolean good =
          e.getCause() instanceof IllegalArgumentException
              && String.valueOf(e.getCause().getMessage()).contains("null");
      return good ? "" : String.valueOf(e.getCause());
    }
  }
}
