/** Densities, spin densities, atom numbers, energies, currents and momentum. */
@NullMarked
package spgpe.observables.density;

import org.jspecify.annotations.NullMarked;
