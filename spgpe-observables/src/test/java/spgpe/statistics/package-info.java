/** Tests of the survival analysis and the error bars. */
@NullMarked
package spgpe.statistics;

import org.jspecify.annotations.NullMarked;
