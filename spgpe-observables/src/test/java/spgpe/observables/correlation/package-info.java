@NullMarked
package spgpe.observables.correlation;

import org.jspecify.annotations.NullMarked;
