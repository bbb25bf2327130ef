package spgpe.theory;

/**
 * Floquet exponent of a two-dimensional linear periodic problem, per unit of its variable.
 *
 * @param growth largest growth rate of the amplitude; zero or the mean damping with opposite sign
 *     in a region of oscillation
 * @param frequency smallest non-negative frequency of the multipliers, {@code |arg|/period};
 *     defined up to multiples of {@code 2 pi/period}
 */
public record FloquetExponent(double growth, double frequency) {}
