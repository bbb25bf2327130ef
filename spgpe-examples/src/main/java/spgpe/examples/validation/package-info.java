/** Programs that reproduce the tables of docs/validation.md. */
@NullMarked
package spgpe.examples.validation;

import org.jspecify.annotations.NullMarked;
