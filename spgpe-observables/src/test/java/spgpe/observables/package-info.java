@NullMarked
package spgpe.observables;

import org.jspecify.annotations.NullMarked;
