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

/** Time of one step of all lanes together; divide by the lanes for the time of one trajectory. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 4, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(2)
public class StepBenchmark {
  /** Grid points; a quarter of them is the largest kept mode number. */
  @Param({"128", "256", "512", "1024", "2048"})
  public int points;

  /** Scheme. */
  @Param({"OuRk4", "Rk4Ip"})
  public String integrator;

  /** Realisations in lockstep. */
  @Param({"1", "4", "8"})
  public int lanes;

  private Stepper stepper;

  /** Makes a started stepper. */
  @Setup
  public void prepare() {
    stepper =
        Problem.startedStepper(Problem.model(points), Problem.integrator(integrator), lanes);
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
