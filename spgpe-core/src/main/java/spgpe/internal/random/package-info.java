/** Counter-based generator; not for use outside this project. */
@NullMarked
package spgpe.internal.random;

import org.jspecify.annotations.NullMarked;
