package spgpe.integrate;

import spgpe.model.Model;

/**
 * The resonance that ends all exponential schemes: unstable once dt (eps_max + 2 mu) &gt; pi, where
 * eps_max is the largest energy of the linear part and mu stands for the mean field g n. For
 * split-step schemes see Weideman and Herbst, SIAM J. Numer. Anal. 23, 485 (1986); measured for the
 * other schemes, docs/validation.md.
 */
final class StepLimit {
  private StepLimit() {}

  /** Infinite without local terms, where these schemes are exact but for the noise. */
  static double ofExponentialScheme(Model model) {
    if (model.localTerms().isEmpty()) {
      return Double.POSITIVE_INFINITY;
    }
    double mu = 0;
    for (int c = 0; c < model.components(); c++) {
      mu = Math.max(mu, Math.abs(model.reservoir().chemicalPotential(c)));
    }
    return Math.PI / (model.linearPart().spectralBound() + 2 * mu);
  }
}
