/** The invented experiment that the commands share. */
@NullMarked
package spgpe.examples.scenario;

import org.jspecify.annotations.NullMarked;
