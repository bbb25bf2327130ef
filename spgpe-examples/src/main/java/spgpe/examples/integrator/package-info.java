/** A user's own integrator and its measurement. */
@NullMarked
package spgpe.examples.integrator;

import org.jspecify.annotations.NullMarked;
