package spgpe.benchmarks;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import spgpe.fourier.FourierProviders;
import spgpe.fourier.FourierTransform;

/** Time of one complex transform there and back. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@Warmup(iterations = 4, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(2)
public class FourierBenchmark {
  /** Complex points. */
  @Param({"128", "256", "512", "1024", "2048", "4096"})
  public int points;

  /** Back end. */
  @Param({"jtransforms"})
  public String provider;

  private FourierTransform transform;
  private double[] data;

  /** Makes plan and data. */
  @Setup
  public void prepare() {
    transform = FourierProviders.named(provider).transform(points);
    data = new double[2 * points];
    data[2] = 1;
  }

  /**
   * Forward and inverse transform, scaled back.
   *
   * @return the data
   */
  @Benchmark
  public double[] thereAndBack() {
    transform.forward(data, 0);
    transform.inverse(data, 0);
    double scale = 1.0 / points;
    for (int i = 0; i < data.length; i++) {
      data[i] *= scale;
    }
    return data;
  }
}
