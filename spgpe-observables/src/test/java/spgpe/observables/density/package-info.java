@NullMarked
package spgpe.observables.density;

import org.jspecify.annotations.NullMarked;
