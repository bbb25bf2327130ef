/** Runs that compare the library with reference results; each prints a table of its own. */
@NullMarked
package spgpe.examples.validation;

import org.jspecify.annotations.NullMarked;
