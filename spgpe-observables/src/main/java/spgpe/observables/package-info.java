/** Means, averages and stop rules that work with every observable. */
@NullMarked
package spgpe.observables;

import org.jspecify.annotations.NullMarked;
