/** Argument checks shared by the modules of this project; not for use outside it. */
@NullMarked
package spgpe.internal.check;

import org.jspecify.annotations.NullMarked;
