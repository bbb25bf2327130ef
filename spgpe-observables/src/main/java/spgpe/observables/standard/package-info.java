/** Lists of observables for everyday runs. */
@NullMarked
package spgpe.observables.standard;

import org.jspecify.annotations.NullMarked;
