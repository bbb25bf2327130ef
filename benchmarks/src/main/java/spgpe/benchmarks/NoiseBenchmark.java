package spgpe.benchmarks;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;

/** Normal numbers per second, for a region of 127 modes and two components. */
@State(Scope.Thread)
@BenchmarkMode(Mode.Throughput)
@OutputTimeUnit(TimeUnit.SECONDS)
@Warmup(iterations = 4, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(2)
public class NoiseBenchmark {
  private static final int NORMALS = 2 * 2 * 127;

  /** Streams. */
  @Param({"counterBased", "commonsRng"})
  public String streams;

  private NoiseGenerator generator;
  private Amplitudes normals;
  private long step;

  /** Makes the generator. */
  @Setup
  public void prepare() {
    Model model = Problem.model(256);
    RandomStreams source =
        streams.equals("counterBased")
            ? RandomStreams.counterBased(1)
            : RandomStreams.commonsRng(1);
    generator = source.generator(model.region(), 2, 1);
    generator.assign(0, 0);
    normals = new Amplitudes(model.region(), 2, 1);
  }

  /**
   * The normals of one step.
   *
   * @return the normals
   */
  @Benchmark
  @OperationsPerInvocation(NORMALS)
  public Amplitudes fill() {
    generator.fill(step++, 0, normals);
    return normals;
  }
}
