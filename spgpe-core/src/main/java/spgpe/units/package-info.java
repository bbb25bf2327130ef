/**
 * The only door between the laboratory (SI units) and the scaled units of every other package.
 *
 * <p>Quantities ({@link spgpe.units.Length}, {@link spgpe.units.Energy}, {@link
 * spgpe.units.Temperature}, ...) are small immutable values, so that a temperature cannot be passed
 * where an energy is meant and a frequency in hertz cannot be taken for an angular one. {@link
 * spgpe.units.ScaledUnits} converts both ways, {@link spgpe.units.RingExperiment} does the whole
 * journey for two coupled components in a ring.
 *
 * <p>Everything here is immutable and safe for use by several threads. Symbols, conventions and the
 * classic slips are listed in {@code docs/units.md}. The figures are model estimates for planning;
 * they do not replace a laboratory's own safety rules.
 */
@NullMarked
package spgpe.units;

import org.jspecify.annotations.NullMarked;
