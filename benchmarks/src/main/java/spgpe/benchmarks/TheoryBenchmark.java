package spgpe.benchmarks;

import java.util.Optional;
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
import spgpe.theory.InstabilityBand;
import spgpe.theory.ModulatedCoupling;
import spgpe.theory.PairAverages;
import spgpe.theory.PairEquilibrium;
import spgpe.theory.PhaseEquilibrium;
import spgpe.theory.PlanarBubble;
import spgpe.theory.RadialBubble;
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
   * Critical bubble in the plane with its fluctuation spectrum, 797 modes for each field.
   *
   * @return the bubble
   */
  @Benchmark
  public PlanarBubble planarBubble() {
    return PlanarBubble.of(metastable, 36, 16);
  }

  /**
   * Exact equilibrium of the pair on a finite ring with the correction for the cutoff.
   *
   * @return averages
   */
  @Benchmark
  public PairAverages pairWithCutoff() {
    return PairEquilibrium.withCutoff(stable, new RingModes(32, 48));
  }

  /**
   * Equilibrium of the relative phase alone.
   *
   * @return the equilibrium
   */
  @Benchmark
  public PhaseEquilibrium phaseOnly() {
    return PhaseEquilibrium.of(stable);
  }

  /**
   * Critical bubble of the phase alone in the plane, by shooting.
   *
   * @return the bubble
   */
  @Benchmark
  public RadialBubble radialBubble() {
    return RadialBubble.of(1.5);
  }

  /**
   * Edges and largest growth of the first instability band.
   *
   * @return the band
   */
  @Benchmark
  public Optional<InstabilityBand> instabilityBand() {
    return modulated.firstBand(0);
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
