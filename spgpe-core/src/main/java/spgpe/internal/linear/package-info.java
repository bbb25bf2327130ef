/** Small dense complex matrices; not for use outside this project. */
@NullMarked
package spgpe.internal.linear;

import org.jspecify.annotations.NullMarked;
