package spgpe.observables.thermometry;

import spgpe.statistics.Estimate;

/**
 * Temperature and chemical potential from generalised equipartition. Immutable and thread-safe.
 *
 * @param temperature T
 * @param chemicalPotential mu
 * @param chiSquare weighted sum of squares; far above the degrees of freedom if the bands are not
 *     in equilibrium with each other
 * @param degreesOfFreedom bands less two
 */
public record EquipartitionFit(
    Estimate temperature, Estimate chemicalPotential, double chiSquare, int degreesOfFreedom) {}
