package spgpe.run;

/**
 * State of a running ensemble. Immutable and thread-safe.
 *
 * @param ended trajectories that have ended
 * @param total trajectories of the run
 * @param stopped how many of them were ended by a stop rule
 * @param diverged how many of them diverged
 */
public record Progress(long ended, long total, long stopped, long diverged) {}
