/** Terms of the Hamiltonian; each gives its force and its energy. */
@NullMarked
package spgpe.hamiltonian;

import org.jspecify.annotations.NullMarked;
