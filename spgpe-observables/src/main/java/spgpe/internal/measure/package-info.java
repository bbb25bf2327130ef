/** Sums, transforms and fits used by the observables. */
@NullMarked
package spgpe.internal.measure;

import org.jspecify.annotations.NullMarked;
