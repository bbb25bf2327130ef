package spgpe.physics;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.ContactInteraction;
import spgpe.hamiltonian.Detuning;
import spgpe.hamiltonian.ExternalPotential;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.ModulatedCoupling;
import spgpe.integrate.Integrator;
import spgpe.integrate.OuMidpoint;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.integrate.Stepper;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Projector;
import spgpe.reservoir.NoiseGenerator;
import spgpe.reservoir.RandomStreams;
import spgpe.reservoir.Reservoir;

/**
 * All terms at once, unequal masses and dampings, no noise: the schemes against Commons Math's
 * Dormand-Prince 8(5,3) on equations of motion written out here with plain sums instead of fast
 * transforms.
 */
class IndependentSolverTest {
  private static final int CUTOFF = 4;
  private static final int POINTS = 18;
  private static final double LENGTH = 7;
  private static final double TIME = 1;
  private static final double[] MASS = {1, 1.4};
  private static final double[] GAMMA = {0.03, 0.08};
  private static final double[] MU = {0.9, 1.1};
  private static final double[][] G = {{1.1, 0.35}, {0.35, 0.8}};
  private static final double J = 0.2;
  private static final double DELTA = 0.15;
  private static final double KAPPA = 0.3;
  private static final double AMPLITUDE = 0.25;
  private static final double OMEGA = 3.5;
  private static final int MODES = 2 * CUTOFF + 1;

  private static double potential(double x) {
    return 0.4 * Math.cos(2 * Math.PI * x / LENGTH) + 0.2 * Math.sin(4 * Math.PI * x / LENGTH);
  }

  private static Model model() {
    return Model.of(
        Projector.modesUpTo(CUTOFF).on(PeriodicGrid.of(Axis.of(POINTS, LENGTH))),
        Hamiltonian.ofMasses(MASS)
            .with(ContactInteraction.ofMatrix(G))
            .with(CoherentCoupling.constant(J))
            .with(Detuning.ofPair(DELTA))
            .with(BiquadraticCoupling.of(KAPPA))
            .with(ModulatedCoupling.of(AMPLITUDE, OMEGA))
            .with(ExternalPotential.onLine("two waves", IndependentSolverTest::potential)),
        Reservoir.of(0, 0, 0).withChemicalPotentials(MU).withDampings(GAMMA));
  }

  /** y = (re, im) of modes -CUTOFF..CUTOFF of component 1, then of component 2. */
  private static final class Equations implements FirstOrderDifferentialEquations {
    @Override
    public int getDimension() {
      return 4 * MODES;
    }

    @Override
    public void computeDerivatives(double t, double[] y, double[] out) {
      double[] force = new double[4 * MODES];
      double scale = 1 / Math.sqrt(LENGTH);
      for (int p = 0; p < POINTS; p++) {
        double x = p * LENGTH / POINTS;
        double[] psi = new double[4];
        for (int c = 0; c < 2; c++) {
          for (int m = 0; m < MODES; m++) {
            double angle = 2 * Math.PI * (m - CUTOFF) * x / LENGTH;
            double re = y[2 * (c * MODES + m)];
            double im = y[2 * (c * MODES + m) + 1];
            psi[2 * c] += scale * (re * Math.cos(angle) - im * Math.sin(angle));
            psi[2 * c + 1] += scale * (re * Math.sin(angle) + im * Math.cos(angle));
          }
        }
        double[] n = {psi[0] * psi[0] + psi[1] * psi[1], psi[2] * psi[2] + psi[3] * psi[3]};
        double s = 2 * (psi[0] * psi[3] - psi[1] * psi[2]);
        double drive = -AMPLITUDE * Math.cos(OMEGA * t);
        double[] f = new double[4];
        for (int c = 0; c < 2; c++) {
          double shift = G[c][0] * n[0] + G[c][1] * n[1] + potential(x);
          f[2 * c] = shift * psi[2 * c] + drive * psi[2 - 2 * c];
          f[2 * c + 1] = shift * psi[2 * c + 1] + drive * psi[3 - 2 * c];
        }
        // f_1 = -i (kappa S/2) psi_2, f_2 = +i (kappa S/2) psi_1
        f[0] += KAPPA * s / 2 * psi[3];
        f[1] -= KAPPA * s / 2 * psi[2];
        f[2] -= KAPPA * s / 2 * psi[1];
        f[3] += KAPPA * s / 2 * psi[0];
        for (int c = 0; c < 2; c++) {
          for (int m = 0; m < MODES; m++) {
            double angle = 2 * Math.PI * (m - CUTOFF) * x / LENGTH;
            double weight = LENGTH / POINTS * scale;
            force[2 * (c * MODES + m)] +=
                weight * (f[2 * c] * Math.cos(angle) + f[2 * c + 1] * Math.sin(angle));
            force[2 * (c * MODES + m) + 1] +=
                weight * (f[2 * c + 1] * Math.cos(angle) - f[2 * c] * Math.sin(angle));
          }
        }
      }
      for (int c = 0; c < 2; c++) {
        for (int m = 0; m < MODES; m++) {
          int i = 2 * (c * MODES + m);
          int other = 2 * ((1 - c) * MODES + m);
          double k = 2 * Math.PI * (m - CUTOFF) / LENGTH;
          double w = k * k / (2 * MASS[c]) + (c == 0 ? DELTA : -DELTA) / 2 - MU[c];
          double re = force[i] + w * y[i] - J * y[other];
          double im = force[i + 1] + w * y[i + 1] - J * y[other + 1];
          out[i] = im - GAMMA[c] * re;
          out[i + 1] = -re - GAMMA[c] * im;
        }
      }
    }
  }

  private static double[] start() {
    double[] y = new double[4 * MODES];
    for (int i = 0; i < y.length; i++) {
      y[i] = Math.cos(1.7 * i * i + 0.3) / (1 + 0.1 * (i % (2 * MODES)));
    }
    return y;
  }

  private static double[] run(Integrator scheme, int steps) {
    Model model = model();
    Amplitudes state = new Amplitudes(model.region(), 2, 1);
    double[] y = start();
    for (int c = 0; c < 2; c++) {
      for (int m = 0; m < MODES; m++) {
        int mode = model.region().indexOf(m - CUTOFF);
        state.re(c)[mode] = y[2 * (c * MODES + m)];
        state.im(c)[mode] = y[2 * (c * MODES + m) + 1];
      }
    }
    NoiseGenerator noise = RandomStreams.counterBased(1).generator(model.region(), 2, 1);
    Stepper stepper = scheme.withStep(TIME / steps).bind(model, noise, 1);
    stepper.start(state, 0);
    for (int s = 0; s < steps; s++) {
      stepper.advance();
    }
    stepper.observe(state);
    for (int c = 0; c < 2; c++) {
      for (int m = 0; m < MODES; m++) {
        int mode = model.region().indexOf(m - CUTOFF);
        y[2 * (c * MODES + m)] = state.re(c)[mode];
        y[2 * (c * MODES + m) + 1] = state.im(c)[mode];
      }
    }
    return y;
  }

  private static double[] reference() {
    double[] y = start();
    new DormandPrince853Integrator(1e-8, 0.1, 1e-14, 1e-14)
        .integrate(new Equations(), 0, y, TIME, y);
    return y;
  }

  private static double largestDifference(double[] a, double[] b) {
    double largest = 0;
    for (int i = 0; i < a.length; i++) {
      largest = Math.max(largest, Math.abs(a[i] - b[i]));
    }
    return largest;
  }

  @Test
  void rk4InTheInteractionPictureAgreesTo1e10() {
    double difference = largestDifference(run(Rk4Ip.ofStep(1), 4000), reference());
    assertTrue(difference < 1e-10, "difference=" + difference);
  }

  /** The second-order schemes by two Richardson steps, for their errors are even in dt. */
  @Test
  void splitSchemesAgreeTo1e10AfterExtrapolation() {
    double[] reference = reference();
    for (Integrator scheme : new Integrator[] {OuRk4.ofStep(1), OuMidpoint.ofStep(1)}) {
      double[] coarse = run(scheme, 1000);
      double[] middle = run(scheme, 2000);
      double[] fine = run(scheme, 4000);
      double[] best = new double[fine.length];
      for (int i = 0; i < best.length; i++) {
        double first = (4 * middle[i] - coarse[i]) / 3;
        double second = (4 * fine[i] - middle[i]) / 3;
        best[i] = (16 * second - first) / 15;
      }
      assertEquals(0, largestDifference(best, reference), 1e-10, scheme.toString());
    }
  }
}
