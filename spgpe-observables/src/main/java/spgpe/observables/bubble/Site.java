package spgpe.observables.bubble;

/**
 * A position on a ring or a plane. Immutable and thread-safe.
 *
 * @param x position along x, in [0, L_x)
 * @param y position along y, in [0, L_y); 0 on a ring
 */
public record Site(double x, double y) {}
