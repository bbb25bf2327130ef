/** The immutable recipe of a simulation, checked as a whole, and the evaluation of its forces and energies. */
@NullMarked
package spgpe.model;

import org.jspecify.annotations.NullMarked;
