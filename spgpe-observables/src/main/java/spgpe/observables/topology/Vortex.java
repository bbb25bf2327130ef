package spgpe.observables.topology;

/**
 * A vortex on a plane. Immutable and thread-safe.
 *
 * @param x position along x, in [0, L_x): the middle of the plaquette around which the phase winds,
 *     so that the centre is half a spacing away on each axis at most (0.6 spacings next to a side)
 * @param y position along y, in [0, L_y)
 * @param charge winding of the phase around it, anticlockwise, in turns: +1 or -1
 */
public record Vortex(double x, double y, int charge) {}
