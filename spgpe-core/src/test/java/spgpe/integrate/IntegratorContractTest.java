package spgpe.integrate;

import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.NoiseGenerator;

/** The contract sees what it is for: schemes with one fault each. */
class IntegratorContractTest {
  /** The default scheme, to be spoilt. */
  private static class Spoilt implements Integrator {
    private final double step;

    Spoilt(double step) {
      this.step = step;
    }

    @Override
    public double step() {
      return step;
    }

    @Override
    public Integrator withStep(double newStep) {
      return new Spoilt(newStep);
    }

    @Override
    public SchemeFacts facts() {
      return OuRk4.ofStep(step).facts();
    }

    @Override
    public double largestStableStep(Model model) {
      return OuRk4.ofStep(step).largestStableStep(model);
    }

    @Override
    public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
      return OuRk4.ofStep(step).bind(model, noise, lanes);
    }
  }

  private static IntegratorContract of(Integrator scheme) {
    return new IntegratorContract() {
      @Override
      protected Integrator scheme() {
        return scheme;
      }
    };
  }

  private static void requireFailure(org.junit.jupiter.api.function.Executable check) {
    assertThrows(AssertionError.class, check);
  }

  @Test
  void anOrderThatIsTooHighIsSeen() {
    Integrator boastful =
        new Spoilt(0.05) {
          @Override
          public Integrator withStep(double newStep) {
            return OuRk4.ofStep(newStep);
          }

          @Override
          public SchemeFacts facts() {
            return Rk4Ip.ofStep(1).facts();
          }
        };
    requireFailure(of(boastful)::theErrorHasTheOrderStated);
    requireFailure(of(boastful)::withStepChangesTheStepAndNothingElse);
  }

  /** All of the noise before the step, declared to be of weak order two. */
  @Test
  void theCoolingByOneKickIsSeen() {
    Integrator oneKick =
        new Spoilt(0.05) {
          @Override
          public Integrator withStep(double newStep) {
            return new OneKick(newStep);
          }

          @Override
          public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
            return new OneKick(step()).bind(model, noise, lanes);
          }
        };
    requireFailure(of(oneKick)::theEquilibriumOfALinearModeIsThatPredicted);
  }

  /** Noise too strong by one per cent in amplitude: two in variance, eight standard errors. */
  @Test
  void noiseThatIsTooStrongIsSeen() {
    Integrator loud =
        new Spoilt(0.05) {
          @Override
          public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
            NoiseGenerator louder =
                new NoiseGenerator() {
                  @Override
                  public void assign(int lane, long trajectory) {
                    noise.assign(lane, trajectory);
                  }

                  @Override
                  public void fill(long step, int use, Amplitudes normals) {
                    noise.fill(step, use, normals);
                    for (int c = 0; c < normals.components(); c++) {
                      for (int e = 0; e < normals.re(c).length; e++) {
                        normals.re(c)[e] *= 1.01;
                        normals.im(c)[e] *= 1.01;
                      }
                    }
                  }
                };
            return super.bind(model, louder, lanes);
          }
        };
    requireFailure(of(loud)::theNoiseOfAStepHasTheCovarianceOfTheEquation);
  }

  @Test
  void steppersThatShareTheirStateAreSeen() {
    Integrator sharing =
        new Spoilt(0.05) {
          private Stepper only;

          @Override
          public Stepper bind(Model model, NoiseGenerator noise, int lanes) {
            if (only == null) {
              only = super.bind(model, noise, lanes);
            }
            return only;
          }
        };
    requireFailure(of(sharing)::twoSteppersOfARecipeDoNotDisturbEachOther);
  }

  @Test
  void aLimitThatIsNotEnforcedIsSeen() {
    Integrator careless =
        new Spoilt(0.05) {
          @Override
          public double largestStableStep(Model model) {
            return 0.06;
          }
        };
    requireFailure(of(careless)::aStepThatIsTooLongIsRefusedWithStepAndLimit);
  }
}
