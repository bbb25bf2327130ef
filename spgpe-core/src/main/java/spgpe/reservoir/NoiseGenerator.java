package spgpe.reservoir;

import spgpe.projector.Amplitudes;

/**
 * Fills amplitudes with independent standard complex normals (real and imaginary part of variance 1
 * each). Owns scratch memory: one thread at a time.
 */
public interface NoiseGenerator {
  /** Largest admissible {@code use}. */
  int LARGEST_USE = 255;

  /**
   * Assigns a trajectory to a lane.
   *
   * @param lane lane index
   * @param trajectory index of the trajectory, 0 to 2<sup>32</sup>-1
   * @throws IllegalArgumentException if a value is out of range
   */
  void assign(int lane, long trajectory);

  /**
   * Fills the lanes with the normals of their trajectories.
   *
   * @param step number of the time step, 0 to 2<sup>48</sup>-1
   * @param use what the numbers are for, 0 to {@value #LARGEST_USE}: different uses in one step are
   *     independent
   * @param normals overwritten
   * @throws IllegalArgumentException if a value is out of range or the shape does not fit
   * @throws IllegalStateException if a lane has no trajectory
   */
  void fill(long step, int use, Amplitudes normals);
}
