/**
 * Exact references that simulations of a coherently coupled pair of condensates are compared with:
 * classical-field equilibrium in one dimension (transfer operator), Gaussian fluctuations, critical
 * bubble, absolute decay rate, and stability under a modulated coupling.
 *
 * <p>Everything is in scaled units with {@code hbar = m = k_B = 1}. The energy functional is
 *
 * <pre>
 * K = integral of  sum_j ( |psi_j'|^2/2 + (g/2)|psi_j|^4 - mu |psi_j|^2 )
 *                  - J (psi_1^* psi_2 + c.c.) + (kappa/4) S_y^2 ,     S_y = 2 Im psi_1^* psi_2
 * </pre>
 *
 * and the stationary law is {@code exp(-K/T)}. The relative phase is {@code phi = theta_1 -
 * theta_2}; with {@code J > 0} the true vacuum has {@code phi = 0} and the false vacuum {@code phi
 * = pi}. Derivations and sources: {@code docs/theory-references.md}.
 *
 * <p>All types are immutable and safe for use by several threads. Each solver refines its own
 * basis, reports its truncation error and refuses with {@link spgpe.theory.UnconvergedException}
 * rather than returning an unconverged number.
 */
@NullMarked
package spgpe.theory;

import org.jspecify.annotations.NullMarked;
