/** Benchmarks: the time step, the transform and the noise. */
@NullMarked
package spgpe.benchmarks;

import org.jspecify.annotations.NullMarked;
