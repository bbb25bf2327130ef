/** Tests of the shot planner. */
@NullMarked
package spgpe.planning;

import org.jspecify.annotations.NullMarked;
