package spgpe.integrate;

import org.junit.jupiter.api.Nested;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;

/** The built-in schemes keep the contract. */
class BuiltInIntegratorsContractTest {
  @Nested
  class OuRk4Test extends IntegratorContract {
    @Override
    protected Integrator scheme() {
      return OuRk4.ofStep(0.05);
    }
  }

  @Nested
  class OuMidpointTest extends IntegratorContract {
    @Override
    protected Integrator scheme() {
      return OuMidpoint.ofStep(0.05);
    }
  }

  @Nested
  class Rk4IpTest extends IntegratorContract {
    @Override
    protected Integrator scheme() {
      return Rk4Ip.ofStep(0.05);
    }
  }

  @Nested
  class HeunIpTest extends IntegratorContract {
    @Override
    protected Integrator scheme() {
      return HeunIp.ofStep(0.05);
    }
  }

  @Nested
  class LatticeStrangTest extends IntegratorContract {
    @Override
    protected Integrator scheme() {
      return LatticeStrang.ofStep(0.05);
    }
  }

  @Nested
  class YoshidaTest extends IntegratorContract {
    @Override
    protected Integrator scheme() {
      return LatticeComposition.yoshida(0.05);
    }
  }

  @Nested
  class BlanesMoanTest extends IntegratorContract {
    @Override
    protected Integrator scheme() {
      return LatticeComposition.blanesMoan(0.1);
    }

    @Override
    protected Hamiltonian hamiltonian() {
      return Hamiltonian.pair(1, 0.3).with(CoherentCoupling.constant(0.2)); // flows commute
    }
  }

  @Nested
  class AdaptiveTest extends IntegratorContract {
    @Override
    protected Integrator scheme() {
      return AdaptiveRk4Ip.of(0.2, 1e-9);
    }

    @Override
    protected boolean stepIsFixed() {
      return false;
    }

    @Override
    protected int[] laneCounts() {
      return new int[] {1};
    }
  }
}
