package spgpe.examples.docs;

import java.util.List;
import java.util.concurrent.Executor;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.hamiltonian.LocalTerm;
import spgpe.integrate.OuRk4;
import spgpe.model.Model;
import spgpe.observables.FirstPassage;
import spgpe.observables.TimeAverage;
import spgpe.observables.density.PairMoment;
import spgpe.observables.phase.RelativePhase;
import spgpe.planning.ExpectedRate;
import spgpe.planning.ShotPlan;
import spgpe.planning.ShotStatistics;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.PointBlock;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.EnsembleResult;
import spgpe.run.InitialState;
import spgpe.run.Observable;
import spgpe.run.Recording;
import spgpe.run.Schedule;
import spgpe.run.StopRule;
import spgpe.run.TimeMoments;
import spgpe.run.Trajectory;
import spgpe.run.TrajectoryEnd;
import spgpe.statistics.Estimate;
import spgpe.units.CoupledPair;
import spgpe.units.Density;
import spgpe.units.Energy;
import spgpe.units.EventRate;
import spgpe.units.Frequency;
import spgpe.units.Geometry;
import spgpe.units.Length;
import spgpe.units.RingExperiment;
import spgpe.units.ScaledRing;
import spgpe.units.Species;
import spgpe.units.Temperature;
import spgpe.units.TimeSpan;
import spgpe.units.Verdict;

/** The code shown in the documents; {@link SnippetsTest} compares and runs it. */
final class Snippets {
  private Snippets() {}

  static double firstUse() {
    // snippet-begin first-use
    PeriodicGrid ring = PeriodicGrid.of(Axis.of(128, 48.0)); // points, length
    CoherentRegion region = Projector.modesUpTo(24).on(ring);
    Hamiltonian energy =
        Hamiltonian.pair(1.0, 0.0) // g, g12
            .with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.225));
    Model model = Model.of(region, energy, Reservoir.of(0.05, 1.1, 0.1)); // T, mu, gamma
    Trajectory.Result run =
        Trajectory.of(model).startingFrom(InitialState.uniform(1, -1)) // relative phase pi
            .integratedBy(OuRk4.ofStep(0.1)).seed(2026, 0).until(50).run();
    double atoms = run.finalState().atomNumber(0, 0);
    // snippet-end
    return atoms;
  }

  static double[] ringUnits() {
    // snippet-begin ring-units
    Energy j = Energy.ofHertz(8); // J/h; two bare levels are split by 16 Hz
    Density n = Density.perMetre(7.6394373e7); // atoms per length and component
    ScaledRing ring =
        RingExperiment.of(
                Species.K_41, Geometry.ring(Length.ofMicrometres(25)), Frequency.ofKilohertz(1.5),
                12_000, Length.ofBohrRadii(65.42), Temperature.ofNanokelvin(30))
            .withCoherentCoupling(j)
            .withBiquadratic(CoupledPair.biquadraticFor(2.25, j, n)) // kappa for lambda^2 = 2.25
            .withRun(0.01, TimeSpan.ofSeconds(1)) // damping and duration of the planned run
            .scaled();
    List<Verdict> verdicts = ring.verdicts(); // FINE, MARGINAL or OUTSIDE, with number and reason
    TimeSpan lab = ring.units().time(2000); // 2000 scaled time units = 0.401 s
    EventRate rate = ring.units().ratePerVolume(3.2e-5); // bubbles per second and metre
    // snippet-end
    return new double[] {verdicts.size(), lab.seconds(), rate.perSecondPerMetreToD()};
  }

  static double[] shotPlan() {
    // snippet-begin shot-plan
    Energy j = Energy.ofHertz(40);
    Density n = Density.perMetre(2500 / 62.83185e-6);
    RingExperiment lab =
        RingExperiment.of(
                Species.K_41, Geometry.ring(Length.ofMicrometres(10)), Frequency.ofKilohertz(1.5),
                2500, Length.ofBohrRadii(65.42), Temperature.ofNanokelvin(27))
            .withCoherentCoupling(j)
            .withBiquadratic(CoupledPair.biquadraticFor(2.2, j, n));
    ShotPlan plan = ShotPlan.of(lab, 0.1, TimeSpan.ofMilliseconds(600)); // damping, atom loss
    ExpectedRate rate = plan.rate().orElseThrow(); // or plan.refusal() says why there is none
    ShotStatistics shots = plan.statistics().orElseThrow();
    double fraction = shots.decayedFraction(); // 0.775 of the shots decay
    double needed = shots.shotsFor(0.1); // 130 shots give the rate to 10 percent
    ShotPlan slower = plan.forLifetimeByTemperature(TimeSpan.ofSeconds(2)); // 23.5 nK
    Model model = plan.model(); // ready to be run with plan.settings()
    // snippet-end
    return new double[] {
      fraction, needed, slower.experiment().temperature().nanokelvin(),
      rate.barrierOverTemperature(), model.components()
    };
  }

  static Estimate metastableAverage(Model model, Executor executor) {
    // snippet-begin metastable-average
    Recording<TimeAverage> moments =
        Recording.of(PairMoment.all(), Schedule.every(10), TimeAverage.beforeDecay(100, 50));
    StopRule decay = FirstPassage.upward(RelativePhase.meanCosine(), -0.4, Schedule.every(0.5));
    EnsembleResult result =
        Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
            .integratedBy(OuRk4.ofStep(0.1)).trajectories(4).seed(2026).until(300)
            .stopWhen(decay).record(moments).runOn(executor);
    Estimate n = result.get(moments).estimate(PairMoment.DENSITY_1.index());
    // snippet-end
    return n;
  }

  static double[] ownEnsemble(Executor executor) {
    // snippet-begin own-ensemble
    LocalTerm lattice = new CosineLattice(0.02, 2); // our own term, below
    Observable contrast = // our own observable: |integral of psi_1^* psi_2| over the atom number
        Observable.scalar("contrast", snapshot -> {
          Amplitudes a = snapshot.amplitudes();
          double re = 0;
          double im = 0;
          for (int k = 0; k < a.re(0).length; k++) {
            re += a.re(0)[k] * a.re(1)[k] + a.im(0)[k] * a.im(1)[k];
            im += a.re(0)[k] * a.im(1)[k] - a.im(0)[k] * a.re(1)[k];
          }
          return 2 * Math.hypot(re, im) / (a.atomNumber(0, 0) + a.atomNumber(1, 0));
        });
    CoherentRegion region = Projector.modesUpTo(24).on(PeriodicGrid.of(Axis.holdingModes(24, 48)));
    Hamiltonian energy =
        Hamiltonian.pair(1, 0).with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.225)).with(lattice);
    Model model = Model.of(region, energy, Reservoir.of(0.065, 1.1, 0.1)); // T, mu, gamma
    Recording<TimeMoments> curve =
        Recording.of(contrast, Schedule.every(10), TimeMoments::new);
    EnsembleResult result =
        Ensemble.of(model).startingFrom(InitialState.uniform(1, -1))
            .integratedBy(OuRk4.ofStep(0.1)).trajectories(8).seed(2026).until(120)
            .stopWhen(FirstPassage.upward(RelativePhase.meanCosine(), -0.4, Schedule.every(0.5)))
            .record(curve)
            .runOn(executor);
    double contrastAtTen = result.get(curve).mean(1, 0);
    long decayed = result.ends().stream().filter(TrajectoryEnd::isStopped).count();
    // snippet-end
    return new double[] {contrastAtTen, decayed};
  }

  // snippet-begin own-term
  /** K = integral of depth cos(2 pi periods x/L) (|psi_1|^2 + |psi_2|^2). */
  record CosineLattice(double depth, int periods) implements LocalTerm {
    private double potential(PointBlock block, int i) {
      return depth
          * Math.cos(2 * Math.PI * periods * block.pointOf(i) / block.grid().points());
    }

    @Override
    public int forceDegree() {
      return 1;
    }

    @Override
    public void addForce(double time, PointBlock block) {
      for (int i = block.begin(); i < block.end(); i++) {
        double v = potential(block, i);
        for (int c = 0; c < block.components(); c++) {
          block.resultRe(c)[i] += v * block.psiRe(c)[i];
          block.resultIm(c)[i] += v * block.psiIm(c)[i];
        }
      }
    }

    @Override
    public void addEnergyDensity(double time, PointBlock block, double[] density) {
      for (int i = block.begin(); i < block.end(); i++) {
        double v = potential(block, i);
        for (int c = 0; c < block.components(); c++) {
          double re = block.psiRe(c)[i];
          double im = block.psiIm(c)[i];
          density[i] += v * (re * re + im * im);
        }
      }
    }

    @Override
    public String description() {
      return "CosineLattice(depth=" + depth + ", periods=" + periods + ")";
    }
  }
  // snippet-end
}
