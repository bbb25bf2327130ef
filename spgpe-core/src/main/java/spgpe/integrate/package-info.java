/** Integrators: immutable recipes that make one-thread steppers. */
@NullMarked
package spgpe.integrate;

import org.jspecify.annotations.NullMarked;
