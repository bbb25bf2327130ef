/** Small helpers for the examples' figures. */
@NullMarked
package spgpe.examples.plot;

import org.jspecify.annotations.NullMarked;
