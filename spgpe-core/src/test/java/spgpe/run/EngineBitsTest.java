package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.projector.Engine;

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

  @Test
  void theProviderAgreesOverAHundredNoisySteps() {
    for (var scheme : List.of(OuRk4.ofStep(0.02), Rk4Ip.ofStep(0.02))) {
      assertArrayEquals(
          EngineDigest.states(Engine.PROVIDER, 1, scheme, 100),
          EngineDigest.states(Engine.VECTOR, 8, scheme, 100), 1e-12);
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
    return output.lines().filter(line -> line.startsWith("digest")).findFirst().orElse(output);
  }

  @ParameterizedTest
  @ValueSource(ints = {128, 256, 512})
  void everyVectorWidthGivesTheSameBits(int bits) throws Exception {
    long expected = EngineDigest.of(Engine.PLAIN, 1);
    assertEquals(
        "digest " + expected + " " + expected,
        run(
            "--add-modules", "jdk.incubator.vector", "-Dspgpe.engine=vector",
            "-Dspgpe.engine.bits=" + bits));
  }

  @Test
  void withoutTheModuleTheResultIsTheSameAndVectorIsRefused() throws Exception {
    long expected = EngineDigest.of(Engine.PLAIN, 1);
    assertEquals("digest " + expected + " " + expected, run());
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
