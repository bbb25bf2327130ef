/** Correlations in space and time, coherence, condensate mode. */
@NullMarked
package spgpe.observables.correlation;

import org.jspecify.annotations.NullMarked;
