package spgpe.examples.integrator;

import spgpe.integrate.Integrator;
import spgpe.integrate.IntegratorContract;

/** The user's own scheme keeps the contract of all schemes. */
class ExplicitMidpointTest extends IntegratorContract {
  @Override
  protected Integrator scheme() {
    return new ExplicitMidpoint(0.02);
  }
}
