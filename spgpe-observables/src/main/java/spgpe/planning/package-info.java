/**
 * Planning of decay shots: from a laboratory recipe to the expected decay rate, the number of shots
 * and the settings of the simulation, before anything is run.
 *
 * <p>{@link spgpe.planning.ShotPlan} is the entry; {@link spgpe.planning.ShotStatistics} is what
 * follows from a rate and the length of a shot; {@link spgpe.planning.StepTiming} measures the speed
 * of this machine, and only when asked.
 *
 * <p>All figures are model estimates. They do not replace a laboratory's own safety rules for
 * lasers, magnets and high voltage.
 */
@NullMarked
package spgpe.planning;

import org.jspecify.annotations.NullMarked;
