/** The shot planner as a command. */
@NullMarked
package spgpe.examples.planner;

import org.jspecify.annotations.NullMarked;
