/** The thermal reservoir and the random streams that carry its noise. */
@NullMarked
package spgpe.reservoir;

import org.jspecify.annotations.NullMarked;
