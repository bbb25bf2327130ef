package spgpe.observables.topology;

/**
 * A kink or domain wall. Immutable and thread-safe.
 *
 * @param position where the profile crosses the middle between the domains, in [0, L)
 * @param sign +1 if the profile rises along x, -1 if it falls
 */
public record Defect(double position, int sign) {}
