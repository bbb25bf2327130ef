/** Winding numbers, phase slips, kinks and domain walls. */
@NullMarked
package spgpe.observables.topology;

import org.jspecify.annotations.NullMarked;
