/**
 * Fourier transforms of many realisations in lockstep, plain and with vector instructions; not for
 * use outside this project.
 */
@NullMarked
package spgpe.internal.lanes;

import org.jspecify.annotations.NullMarked;
