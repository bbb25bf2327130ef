package spgpe.model;

import java.util.ArrayList;
import java.util.List;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierProviders;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.HamiltonianTerm;
import spgpe.hamiltonian.LocalTerm;
import spgpe.hamiltonian.ModeMatrix;
import spgpe.internal.check.Check;
import spgpe.projector.AliasingVerdict;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Engine;
import spgpe.reservoir.Reservoir;

/**
 * The whole recipe of the stochastic projected Gross-Pitaevskii equation
 *
 * <pre>d psi_j = P{ -(i + gamma_j) dK/dpsi_j^* dt + dW_j },   K = E - sum over j of mu_j N_j,</pre>
 *
 * <p>coherent region (P), Hamiltonian (E) and reservoir (T, mu_j, gamma_j), checked as a whole. See
 * Gardiner and Davis, J. Phys. B 36, 4731 (2003); Blakie et al., Adv. Phys. 57, 363 (2008).
 * Immutable and thread-safe (as far as the user's own terms are).
 */
public final class Model {
  private final CoherentRegion region;
  private final Hamiltonian hamiltonian;
  private final Reservoir reservoir;
  private final FourierProvider provider;
  private final Engine engine;
  private final List<LocalTerm> localTerms;
  private final ModeMatrix linearPart;
  private final boolean aliasingAllowed;

  private Model(
      CoherentRegion region,
      Hamiltonian hamiltonian,
      Reservoir reservoir,
      FourierProvider provider,
      Engine engine,
      boolean aliasingAllowed) {
    this.region = region;
    this.hamiltonian = hamiltonian;
    this.reservoir = reservoir;
    this.provider = provider;
    this.engine = engine;
    this.aliasingAllowed = aliasingAllowed;
    int components = hamiltonian.components();
    reservoir.check(components);
    List<LocalTerm> local = new ArrayList<>();
    for (HamiltonianTerm term : hamiltonian.terms()) {
      term.check(components, region);
      if (term instanceof LocalTerm localTerm) {
        checkAliasing(localTerm);
        local.add(
            Check.notNull(
                localTerm.preparedFor(region.grid()),
                "result of preparedFor of term " + term.description()));
      }
    }
    this.localTerms = List.copyOf(local);
    this.linearPart = hamiltonian.modeMatrix(region);
    if (localTerms.isEmpty()) {
      for (int m = 0; m < region.modes(); m++) {
        for (int c = 0; c < components; c++) {
          linearPart.addDiagonal(m, c, -reservoir.chemicalPotential(c));
        }
      }
    }
  }

  /**
   * Makes a model with the preferred Fourier back end.
   *
   * @param region coherent region
   * @param hamiltonian energy functional
   * @param reservoir thermal reservoir
   * @return the model
   * @throws IllegalArgumentException if the parts do not fit, or if a term's force would alias on the
   *     region
   */
  public static Model of(CoherentRegion region, Hamiltonian hamiltonian, Reservoir reservoir) {
    return new Model(
        Check.notNull(region, "region"),
        Check.notNull(hamiltonian, "hamiltonian"),
        Check.notNull(reservoir, "reservoir"),
        FourierProviders.preferred(),
        Engine.ofSystemProperty(),
        false);
  }

  /**
   * Makes a model whose forces may alias: momentum is then not conserved and results depend on the
   * number of grid points.
   *
   * @param region coherent region
   * @param hamiltonian energy functional
   * @param reservoir thermal reservoir
   * @return the model
   * @throws IllegalArgumentException if the parts do not fit
   */
  public static Model ofAliasing(
      CoherentRegion region, Hamiltonian hamiltonian, Reservoir reservoir) {
    return new Model(
        Check.notNull(region, "region"),
        Check.notNull(hamiltonian, "hamiltonian"),
        Check.notNull(reservoir, "reservoir"),
        FourierProviders.preferred(),
        Engine.ofSystemProperty(),
        true);
  }

  /**
   * A copy with another reservoir.
   *
   * @param newReservoir thermal reservoir
   * @return changed copy
   */
  public Model withReservoir(Reservoir newReservoir) {
    return new Model(
        region, hamiltonian, Check.notNull(newReservoir, "reservoir"), provider, engine,
        aliasingAllowed);
  }

  /**
   * A copy with another Fourier back end, which then does all transforms: the engine becomes {@link
   * Engine#PROVIDER}.
   *
   * @param newProvider back end, see {@link FourierProviders}
   * @return changed copy
   */
  public Model withFourierProvider(FourierProvider newProvider) {
    return new Model(
        region, hamiltonian, reservoir, Check.notNull(newProvider, "provider"), Engine.PROVIDER,
        aliasingAllowed);
  }

  /**
   * A copy whose forces are transformed by another engine. Changes the speed; {@link
   * Engine#PROVIDER} also the rounding.
   *
   * @param newEngine what does the transforms
   * @return changed copy
   */
  public Model withEngine(Engine newEngine) {
    return new Model(
        region, hamiltonian, reservoir, provider, Check.notNull(newEngine, "engine"),
        aliasingAllowed);
  }

  private void checkAliasing(LocalTerm term) {
    AliasingVerdict verdict = region.aliasing(term.forceDegree());
    Check.argument(
        aliasingAllowed || verdict.isFree(),
        "the force of a term must not alias: term=%s, %s; use more points, a lower cutoff, or"
            + " Model.ofAliasing", term.description(), verdict);
  }

  /**
   * Coherent region.
   *
   * @return the region
   */
  public CoherentRegion region() {
    return region;
  }

  /**
   * Number of components.
   *
   * @return components
   */
  public int components() {
    return hamiltonian.components();
  }

  /**
   * Energy functional.
   *
   * @return the Hamiltonian
   */
  public Hamiltonian hamiltonian() {
    return hamiltonian;
  }

  /**
   * Thermal reservoir.
   *
   * @return the reservoir
   */
  public Reservoir reservoir() {
    return reservoir;
  }

  /**
   * Fourier back end.
   *
   * @return the provider
   */
  public FourierProvider fourierProvider() {
    return provider;
  }

  /**
   * What does the Fourier transforms of the force.
   *
   * @return the engine; as the system property {@value Engine#PROPERTY} says unless set
   */
  public Engine engine() {
    return engine;
  }

  /**
   * The local terms, prepared for the grid.
   *
   * @return unmodifiable list
   */
  public List<LocalTerm> localTerms() {
    return localTerms;
  }

  /**
   * Whether the chemical potentials act together with the local terms (where they nearly cancel the
   * mean field) rather than in the linear part. True if there are local terms.
   *
   * @return where integrators find -mu_j
   */
  public boolean chemicalPotentialActsLocally() {
    return !localTerms.isEmpty();
  }

  /**
   * The part that is linear and diagonal in the wave vector: the spectral terms, and -mu_j if there
   * is no local term. Not to be changed.
   *
   * @return Hermitian matrices h(k)
   */
  public ModeMatrix linearPart() {
    return linearPart;
  }

  /**
   * Makes a workspace that evaluates forces and energies, for one thread.
   *
   * @param lanes number of lanes
   * @return the workspace
   */
  public ForceEvaluator evaluator(int lanes) {
    return new ForceEvaluator(this, lanes);
  }

  /**
   * Describes the model in a few lines fit for a log.
   *
   * @return text of several lines
   */
  public String describe() {
    return "Model of the stochastic projected Gross-Pitaevskii equation\n"
        + "  " + region + "\n"
        + "  " + region.aliasing(3) + "\n"
        + "  " + hamiltonian + "\n"
        + "  " + reservoir + "\n"
        + "  Fourier back end: " + provider.name() + ", engine: " + engine;
  }

  @Override
  public String toString() {
    return describe();
  }
}
