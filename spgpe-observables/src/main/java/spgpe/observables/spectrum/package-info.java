/** Mode amplitudes, occupations and structure factors. */
@NullMarked
package spgpe.observables.spectrum;

import org.jspecify.annotations.NullMarked;
