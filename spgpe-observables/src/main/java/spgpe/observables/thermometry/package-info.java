/** Temperature and chemical potential of a classical field, from the field alone. */
@NullMarked
package spgpe.observables.thermometry;

import org.jspecify.annotations.NullMarked;
