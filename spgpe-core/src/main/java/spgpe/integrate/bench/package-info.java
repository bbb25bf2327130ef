/** Measures any integrator, a user's own included: orders, conservation, equilibrium bias, cost. */
@NullMarked
package spgpe.integrate.bench;

import org.jspecify.annotations.NullMarked;
