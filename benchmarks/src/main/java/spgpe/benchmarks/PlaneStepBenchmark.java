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
import spgpe.integrate.Stepper;

/** Time of one step of all lanes together on a square with a disc of kept modes. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 4, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(2)
public class PlaneStepBenchmark {
  /** Grid points along each axis; the disc keeps mode numbers below a quarter of them. */
  @Param({"64", "128", "256"})
  public int points;

  /** Scheme. */
  @Param({"OuRk4", "Rk4Ip"})
  public String integrator;

  /** Realisations in lockstep. */
  @Param({"1", "4"})
  public int lanes;

  private Stepper stepper;

  /** Makes a started stepper. */
  @Setup
  public void prepare() {
    stepper =
        Problem.startedStepper(Problem.plane(points), Problem.integrator(integrator), lanes);
  }

  /**
   * One step.
   *
   * @return step number, so that the work is not optimised away
   */
  @Benchmark
  public long step() {
    stepper.advance();
    return stepper.stepNumber();
  }
}
