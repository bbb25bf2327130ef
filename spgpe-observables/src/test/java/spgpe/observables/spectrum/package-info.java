@NullMarked
package spgpe.observables.spectrum;

import org.jspecify.annotations.NullMarked;
