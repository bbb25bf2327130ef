package spgpe.theory;

/**
 * Wave numbers at which a modulated coupling pumps the false vacuum.
 *
 * @param lowWaveNumber lower edge (1/length)
 * @param highWaveNumber upper edge (1/length)
 * @param fastestWaveNumber wave number of fastest growth (1/length)
 * @param growthRate growth rate of the amplitude there (1/time)
 */
public record InstabilityBand(
    double lowWaveNumber, double highWaveNumber, double fastestWaveNumber, double growthRate) {}
