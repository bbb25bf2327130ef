/**
 * Survival analysis of metastable states and error bars of measured averages.
 *
 * <p>Survival: {@link spgpe.statistics.SurvivalData} holds first-passage times with censoring and
 * left truncation; {@link spgpe.statistics.RateEstimate}, {@link spgpe.statistics.KaplanMeier},
 * {@link spgpe.statistics.NelsonAalen} and the tests are made from it. Error bars: {@link
 * spgpe.statistics.RunningMoments} and its relatives accumulate one number (or vector) per
 * trajectory and merge; {@link spgpe.statistics.Jackknife}, {@link spgpe.statistics.BatchMeans} and
 * {@link spgpe.statistics.AutocorrelationTime} turn samples into standard errors.
 *
 * <p>Merging floating-point sums is not associative: the same bits come out only when accumulators
 * are merged in the same order, for instance in a fixed tree over the trajectory index.
 *
 * <p>Times are in whatever unit the caller uses; rates come out in its inverse.
 */
@NullMarked
package spgpe.statistics;

import org.jspecify.annotations.NullMarked;
