/** Trajectories and ensembles: schedules, stop rules, observables, accumulators, progress. */
@NullMarked
package spgpe.run;

import org.jspecify.annotations.NullMarked;
