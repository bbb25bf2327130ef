package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.internal.check.AllocationMeter;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Engine;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;

/** Engines, lanes and vector widths change the speed of a noisy run and no bit of its result. */
class EngineBitsTest {
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 4, 8, 16, 32})
  void everyNumberOfLanesAndEveryEngineGivesTheSameBits(int lanes) {
    long expected = EngineDigest.of(Engine.PLAIN, 1);
    assertEquals(expected, EngineDigest.of(Engine.PLAIN, lanes));
    assertEquals(expected, EngineDigest.of(Engine.VECTOR, lanes));
    assertEquals(expected, EngineDigest.of(Engine.AUTOMATIC, lanes));
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 4})
  void onAPlaneEveryNumberOfLanesAndEveryEngineGivesTheSameBits(int lanes) {
    long expected = EngineDigest.ofPlane(Engine.PLAIN, 1);
    assertEquals(expected, EngineDigest.ofPlane(Engine.PLAIN, lanes));
    assertEquals(expected, EngineDigest.ofPlane(Engine.VECTOR, lanes));
  }

  @Test
  void theProviderAgreesOverAHundredNoisySteps() {
    int all = EngineDigest.TRAJECTORIES;
    int planes = EngineDigest.PLANES;
    for (var scheme : List.of(OuRk4.ofStep(0.02), Rk4Ip.ofStep(0.02))) {
      assertArrayEquals(
          EngineDigest.states(EngineDigest.model(Engine.PROVIDER), 1, all, scheme, 100),
          EngineDigest.states(EngineDigest.model(Engine.VECTOR), 8, all, scheme, 100), 1e-12);
      assertArrayEquals(
          EngineDigest.states(EngineDigest.plane(Engine.PROVIDER), 1, planes, scheme, 100),
          EngineDigest.states(EngineDigest.plane(Engine.VECTOR), 1, planes, scheme, 100), 1e-12);
    }
  }

  @Test
  void aStepOnAPlaneAllocatesNothing() {
    for (Engine engine : List.of(Engine.PLAIN, Engine.VECTOR)) {
      Model model = EngineDigest.plane(engine);
      NoiseGenerator noise = RandomStreams.counterBased(8).generator(model.region(), 2, 1);
      noise.assign(0, 0);
      Stepper stepper = Rk4Ip.ofStep(0.02).bind(model, noise, 1);
      stepper.start(new Amplitudes(model.region(), 2, 1), 0);
      double bytes = AllocationMeter.bytesPerCall(stepper::advance);
      assertTrue(bytes < 1, engine + ", bytes for each step: " + bytes);
    }
  }

  /** A new virtual machine, since the width is chosen when the kernels are loaded. */
  private static String run(String... options) throws Exception {
    List<String> command = new ArrayList<>();
    command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
    command.addAll(List.of(options));
    command.addAll(
        List.of("-cp", System.getProperty("java.class.path"), EngineDigest.class.getName()));
    Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
    String output = new String(process.getInputStream().readAllBytes());
    process.waitFor();
    String digests =
        output
            .lines()
            .filter(line -> line.startsWith("digest") || line.startsWith("plane"))
            .collect(Collectors.joining(" "));
    return digests.isEmpty() ? output : digests;
  }

  private static String plainDigests() {
    long line = EngineDigest.of(Engine.PLAIN, 1);
    return "digest " + line + " " + line + " plane " + EngineDigest.ofPlane(Engine.PLAIN, 1);
  }

  @ParameterizedTest
  @ValueSource(ints = {128, 256, 512})
  void everyVectorWidthGivesTheSameBits(int bits) throws Exception {
    assertEquals(
        plainDigests(),
        run(
            "--add-modules", "jdk.incubator.vector", "-Dspgpe.engine=vector",
            "-Dspgpe.engine.bits=" + bits));
  }

  @Test
  void withoutTheModuleTheResultIsTheSameAndVectorIsRefused() throws Exception {
    assertEquals(plainDigests(), run());
    String refusal = run("-Dspgpe.engine=vector");
    assertTrue(refusal.contains("--add-modules jdk.incubator.vector"), refusal);
  }

  @Test
  void anUnknownEngineIsRefused() throws Exception {
    String refusal = run("-Dspgpe.engine=fast");
    assertTrue(refusal.contains("spgpe.engine=fast"), refusal);
    assertThrows(IllegalArgumentException.class, () -> EngineDigest.model(null));
  }

  @Test
  void theDefaultNumberOfLanesLeavesBlocksToShare() {
    Ensemble plan = Ensemble.of(EngineDigest.model(Engine.VECTOR));
    assertEquals(1, plan.trajectories(3).lanes());
    assertEquals(4, plan.trajectories(16).lanes());
    assertEquals(8, plan.trajectories(1000).lanes());
    Ensemble plain = Ensemble.of(EngineDigest.model(Engine.PLAIN));
    assertEquals(1, plain.trajectories(16).lanes());
    assertEquals(16, plain.trajectories(64).lanes());
    assertEquals(64, plain.trajectories(1000).lanes());
    Ensemble provider = Ensemble.of(EngineDigest.model(Engine.PROVIDER));
    assertEquals(1, provider.trajectories(1000).lanes());
    assertEquals(2, provider.lanes(2).trajectories(1000).lanes());
  }
}
