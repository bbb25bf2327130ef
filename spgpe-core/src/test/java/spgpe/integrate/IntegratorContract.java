package spgpe.integrate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.bench.Convergence;
import spgpe.integrate.bench.LinearisedMode;
import spgpe.integrate.bench.OrderStudy;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.Reservoir;

/**
 * What every time-stepping scheme must do: keep its promises about state, lanes and noise, and have
 * the orders it states. Inherit, supply the scheme, and run with JUnit.
 *
 * <p>Tried on a driven, coupled pair on a ring of length 16 with the modes up to 5 (kinetic energies
 * up to 1.9), or with all modes of 16 points for schemes that need a lattice. All checks but that of
 * the noise are deterministic.
 */
public abstract class IntegratorContract extends StepperContract {
  /**
   * Whether the error is set by the step; false for schemes that choose steps of their own, whose
   * order and stability are then for their own tests.
   *
   * @return true for schemes of fixed step
   */
  protected boolean stepIsFixed() {
    return true;
  }

  /**
   * Bound of the relative bias of the occupation of a mode of energy 1 and mean field 1 at gamma =
   * 0.1 and the step of {@link #scheme}, as the author predicts it.
   *
   * @return bound of |bias|
   */
  protected double equilibriumBias() {
    return 0.01;
  }

  @Test
  void withStepChangesTheStepAndNothingElse() {
    Integrator other = scheme().withStep(0.0625);
    assertEquals(0.0625, other.step(), 0);
    assertEquals(scheme().facts(), other.facts());
    Integrator back = other.withStep(scheme().step());
    assertEquals(scheme().toString(), back.toString());
    Model model = model();
    Amplitudes initial = state(model, 1, 0);
    requireSame(
        ThermalPair.advance(model, scheme(), initial, 5),
        ThermalPair.advance(model, back, initial, 5), "there and back");
    for (double bad : new double[] {0, -0.1, Double.NaN, Double.POSITIVE_INFINITY}) {
      assertThrows(IllegalArgumentException.class, () -> scheme().withStep(bad), "step=" + bad);
    }
  }

  @Test
  void aStepThatIsTooLongIsRefusedWithStepAndLimit() {
    Model model = model();
    double limit = scheme().largestStableStep(model);
    assertTrue(limit > 0, "limit=" + limit);
    if (!stepIsFixed()) {
      return; // it chooses stable steps itself
    }
    for (double factor : new double[] {1, 1.01, 100}) {
      Integrator tooLong = scheme().withStep(factor * limit);
      String message =
          assertThrows(
                  IllegalArgumentException.class,
                  () -> tooLong.bind(model, noise(model, 1, 0), 1))
              .getMessage();
      assertTrue(message.contains("step=" + tooLong.step()), message);
      assertTrue(message.contains("limit=" + limit), message);
    }
    scheme().withStep(0.99 * limit).bind(model, noise(model, 1, 0), 1);
  }

  private int coarsestSteps() {
    return (int) Math.ceil(1 / scheme().step());
  }

  @Test
  void theErrorHasTheOrderStated() {
    if (!stepIsFixed()) {
      return;
    }
    Model quiet = model(Reservoir.none(MU));
    Convergence found =
        OrderStudy.of(quiet, state(quiet, 1, 0), 1).deterministic(scheme(), coarsestSteps(), 3);
    assertEquals(scheme().facts().deterministicOrder(), found.order(), 0.1, found.table());
  }

  @Test
  void atomsAreKeptWithoutDampingToTheOrderStated() {
    Model quiet = model(Reservoir.none(MU));
    Amplitudes initial = state(quiet, 1, 0);
    double atoms = ThermalPair.atoms(initial);
    double[] losses = new double[2];
    for (int i = 0; i < 2; i++) {
      int steps = coarsestSteps() << i;
      Amplitudes end = ThermalPair.advance(quiet, scheme().withStep(1.0 / steps), initial, steps);
      losses[i] = Math.abs(ThermalPair.atoms(end) / atoms - 1);
    }
    String text = losses[0] + " then " + losses[1];
    assertTrue(losses[0] < 1e-3, text);
    double gain = stepIsFixed() ? Math.pow(2, scheme().facts().deterministicOrder() - 0.2) : 1;
    assertTrue(losses[1] <= losses[0] / gain + 1e-10, text);
  }

  /**
   * Covariance of the noise of a step from nothing against that of the linear equation, T/w (1 -
   * exp(-2 gamma_j w dt)) = 2 gamma_j T dt (1 - gamma_j w dt + ...), w = eps - mu, at gamma = 0.02
   * and 0.1; schemes may differ from it in second order, below 2e-4 here. 16 lanes x 1000 steps x
   * at least 11 modes for each component: standard error at most 0.24 %. Seven numbers compared at
   * 4.5 standard errors: false alarm 5e-5. Power: a wrong factor of 2 or sqrt(2), dampings mixed up,
   * correlated parts, components or neighbouring modes are seen with certainty.
   */
  @Test
  void theNoiseOfAStepHasTheCovarianceOfTheEquation() {
    if (!scheme().facts().admitsNoise()) {
      return;
    }
    int lanes = 16;
    int steps = 1000;
    double[] gamma = {0.02, 0.1};
    Model model =
        Model.ofAliasing(
            region(), Hamiltonian.ofMasses(1, 1),
            Reservoir.of(TEMPERATURE, -0.4, 0).withDampings(gamma));
    int modes = model.region().modes();
    Stepper stepper = scheme().bind(model, noise(model, lanes, 0), lanes);
    Amplitudes nothing = new Amplitudes(model.region(), 2, lanes);
    Amplitudes x = nothing.copy();
    double[] sums = new double[7];
    for (int s = 0; s < steps; s++) {
      stepper.start(nothing, 3L * s);
      stepper.advance();
      stepper.observe(x);
      for (int m = 0; m < modes; m++) {
        double[] size = new double[2];
        for (int c = 0; c < 2; c++) {
          double w = model.region().kSquared(m) / 2 + 0.4;
          double variance = TEMPERATURE / w * -Math.expm1(-2 * gamma[c] * w * scheme().step());
          size[c] = Math.sqrt(variance);
        }
        for (int e = m * lanes; e < (m + 1) * lanes; e++) {
          int next = (e + lanes) % (modes * lanes);
          double a = x.re(0)[e] / size[0];
          double b = x.im(0)[e] / size[0];
          double c = x.re(1)[e] / size[1];
          double d = x.im(1)[e] / size[1];
          sums[0] += a * a + b * b - 1;
          sums[1] += c * c + d * d - 1;
          sums[2] += a * a - b * b;
          sums[3] += 2 * a * b;
          sums[4] += a * c + b * d;
          sums[5] += a * d - b * c;
          sums[6] += (a * x.re(0)[next] + b * x.im(0)[next]) / size[0];
        }
      }
    }
    double count = (double) steps * lanes * modes;
    String[] names = {"first", "second", "re - im", "re im", "pair", "pair im", "neighbours"};
    for (int i = 0; i < sums.length; i++) {
      assertEquals(0, sums[i] / count, 4.5 / Math.sqrt(count), names[i]);
    }
  }

  /** The stationary law of a linear mode, without sampling: bounded, and of the weak order stated. */
  @Test
  void theEquilibriumOfALinearModeIsThatPredicted() {
    if (!scheme().facts().admitsNoise()) {
      return;
    }
    double step = scheme().step();
    LinearisedMode mode = LinearisedMode.of(1, 1, 0.1);
    double bias = Math.abs(mode.equilibrium(scheme()).occupation() - 1);
    assertTrue(bias <= equilibriumBias(), "bias=" + bias);
    double finer = Math.abs(mode.equilibrium(scheme().withStep(step / 2)).occupation() - 1);
    double gain = Math.pow(2, scheme().facts().weakOrder() - 0.2);
    assertTrue(finer <= bias / gain + 1e-9, bias + " then " + finer);
  }
}
