/** One-dimensional complex Fourier transforms as a small service, so that back ends can be exchanged. */
@NullMarked
package spgpe.fourier;

import org.jspecify.annotations.NullMarked;
