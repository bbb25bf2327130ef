/** Transform back ends; not for use outside this project. */
@NullMarked
package spgpe.internal.fourier;

import org.jspecify.annotations.NullMarked;
