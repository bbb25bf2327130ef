package spgpe.theory;

/**
 * What a decay rate needs to know of a saddle.
 *
 * @param dimension number of translation modes, 1 or 2
 * @param volume length or area of the box
 * @param energy E_b
 * @param gradientSquared integral of sum_j |grad psi_j|^2
 * @param atomRatio atoms of the saddle over atoms of the false vacuum
 * @param spectrum fluctuation spectrum
 */
record SaddleSummary(
    int dimension,
    double volume,
    double energy,
    double gradientSquared,
    double atomRatio,
    SaddleSpectrum spectrum) {}
