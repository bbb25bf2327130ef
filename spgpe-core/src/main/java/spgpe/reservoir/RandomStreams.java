package spgpe.reservoir;

import org.apache.commons.rng.UniformRandomProvider;
import spgpe.projector.CoherentRegion;

/**
 * Where the noise comes from: every number is a function of (seed, trajectory, step, use, component,
 * mode), so that a trajectory does not depend on its lane, block, thread, shard or restart.
 *
 * <p>Implementations are immutable and thread-safe.
 */
public interface RandomStreams {
  /**
   * The default streams: counter-based, no state. The number for a mode is keyed by its mode numbers,
   * not by its place in an array, so that a finer grid with the same kept modes sees the same noise.
   *
   * @param seed any number; different seeds give independent streams
   * @return the streams
   */
  static RandomStreams counterBased(long seed) {
    return new CounterBasedStreams(seed);
  }

  /**
   * Streams drawn from Apache Commons RNG (Philox4x64 and a ziggurat sampler), one generator for each
   * trajectory, step and use. An independent check of the default; numbers follow the order of the
   * modes in the region.
   *
   * @param seed any number; different seeds give independent streams
   * @return the streams
   */
  static RandomStreams commonsRng(long seed) {
    return new CommonsRngStreams(seed);
  }

  /**
   * Makes a generator of complex normal numbers for one thread.
   *
   * @param region coherent region
   * @param components number of components
   * @param lanes number of lanes
   * @return the generator; every lane must be assigned before use
   * @throws IllegalArgumentException if a number is out of range
   */
  NoiseGenerator generator(CoherentRegion region, int components, int lanes);

  /**
   * A generator for the initial state of a trajectory, independent of its noise.
   *
   * @param trajectory index of the trajectory, 0 to 2<sup>32</sup>-1
   * @return a fresh generator
   * @throws IllegalArgumentException if the index is out of range
   */
  UniformRandomProvider initialState(long trajectory);

  /**
   * The seed.
   *
   * @return the number the streams were made from
   */
  long seed();
}
