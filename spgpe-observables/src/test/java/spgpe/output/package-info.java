/** Tests of the file writers. */
@NullMarked
package spgpe.output;

import org.jspecify.annotations.NullMarked;
