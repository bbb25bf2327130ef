package spgpe.benchmarks;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import spgpe.theory.CoupledPair;
import spgpe.theory.CriticalBubble;
import spgpe.theory.DecayRate;
import spgpe.theory.FloquetExponent;
import spgpe.theory.ModulatedCoupling;
import spgpe.theory.PairEquilibrium;
import spgpe.theory.RingModes;
import spgpe.theory.SingleComponentEquilibrium;

/** Time of one solution of each reference theory. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 2, time = 2)
@Measurement(iterations = 3, time = 2)
@Fork(1)
public class TheoryBenchmark {
  private static final double DAMPING = 0.1;

  private final CoupledPair stable = new CoupledPair(1, 1, 0.1, 0.15, 0.25);
  private final CoupledPair metastable = new CoupledPair(1, 1.1, 0.1, 0.225, 0.05);
  private final RingModes ring = new RingModes(48, 24);
  private final ModulatedCoupling modulated = new ModulatedCoupling(1, 1, 0.05, 0.05, 10);
  private CriticalBubble bubble;

  /** Finds the bubble that the rate is computed from. */
  @Setup
  public void prepare() {
    bubble = CriticalBubble.of(metastable, ring);
  }

  /**
   * Transfer operator of one component.
   *
   * @return the equilibrium
   */
  @Benchmark
  public SingleComponentEquilibrium singleComponent() {
    return SingleComponentEquilibrium.of(1, 1, 0.25);
  }

  /**
   * Transfer operator of the pair on the line.
   *
   * @return the equilibrium
   */
  @Benchmark
  public PairEquilibrium pairOnTheLine() {
    return PairEquilibrium.of(stable);
  }

  /**
   * Critical bubble with its fluctuation spectrum, 49 modes for each field.
   *
   * @return the bubble
   */
  @Benchmark
  public CriticalBubble criticalBubble() {
    return CriticalBubble.of(metastable, ring);
  }

  /**
   * Decay rate over a bubble that is known.
   *
   * @return rate of the ring
   */
  @Benchmark
  public double decayRate() {
    return DecayRate.of(bubble, metastable.temperature(), DAMPING).total();
  }

  /**
   * Floquet exponent at the first resonance.
   *
   * @return the exponent
   */
  @Benchmark
  public FloquetExponent floquet() {
    return modulated.floquet(modulated.resonantWaveNumber(), 0);
  }
}
