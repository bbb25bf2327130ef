@NullMarked
package spgpe.observables.phase;

import org.jspecify.annotations.NullMarked;
