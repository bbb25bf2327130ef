/** A two-dimensional example: decay of a metastable relative phase in an oblate gas. */
@NullMarked
package spgpe.examples.oblate;

import org.jspecify.annotations.NullMarked;
