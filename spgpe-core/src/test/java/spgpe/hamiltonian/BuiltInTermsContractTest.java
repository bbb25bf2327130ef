package spgpe.hamiltonian;

import org.junit.jupiter.api.Nested;

/** The built-in terms keep the contract. */
class BuiltInTermsContractTest {
  @Nested
  class KineticTest extends SpectralTermContract {
    @Override
    protected SpectralTerm term() {
      return Kinetic.ofMasses(1, 0.7);
    }
  }

  @Nested
  class CoherentCouplingTest extends SpectralTermContract {
    @Override
    protected SpectralTerm term() {
      return CoherentCoupling.constant(0.3).between(2, 0);
    }

    @Override
    protected int components() {
      return 3;
    }
  }

  @Nested
  class DetuningTest extends SpectralTermContract {
    @Override
    protected SpectralTerm term() {
      return Detuning.ofPair(0.4);
    }
  }

  @Nested
  class SingleContactTest extends LocalTermContract {
    @Override
    protected LocalTerm term() {
      return ContactInteraction.of(0.9);
    }

    @Override
    protected int components() {
      return 1;
    }
  }

  @Nested
  class PairContactTest extends LocalTermContract {
    @Override
    protected LocalTerm term() {
      return ContactInteraction.ofMatrix(new double[][] {{1, 0.3}, {0.3, 0.8}});
    }
  }

  @Nested
  class TripleContactTest extends LocalTermContract {
    @Override
    protected LocalTerm term() {
      return ContactInteraction.ofMatrix(
          new double[][] {{1, 0.3, 0}, {0.3, 0.8, -0.2}, {0, -0.2, 0.5}});
    }

    @Override
    protected int components() {
      return 3;
    }
  }

  @Nested
  class BiquadraticTest extends LocalTermContract {
    @Override
    protected LocalTerm term() {
      return BiquadraticCoupling.of(0.4);
    }
  }

  @Nested
  class ModulatedCouplingTest extends LocalTermContract {
    @Override
    protected LocalTerm term() {
      return ModulatedCoupling.of(0.2, 3).withPhase(0.4);
    }
  }

  @Nested
  class PotentialOfAllTest extends LocalTermContract {
    @Override
    protected LocalTerm term() {
      return ExternalPotential.onLine("ripple", x -> 0.3 * Math.cos(4 * Math.PI * x / 11.3));
    }
  }

  @Nested
  class PotentialOfOneComponentTest extends LocalTermContract {
    @Override
    protected LocalTerm term() {
      return ExternalPotential.onLine("ripple", x -> 0.3 * Math.cos(4 * Math.PI * x / 11.3))
          .forComponent(1);
    }
  }
}
