@NullMarked
package spgpe.observables.bubble;

import org.jspecify.annotations.NullMarked;
