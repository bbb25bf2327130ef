package spgpe.units;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Collects the verdicts of a {@link ScaledRing}. */
final class RingVerdicts {
  private static final String RULE = Verdict.RULE_OF_THUMB;

  private final RingExperiment lab;
  private final ScaledRing ring;
  private final List<Verdict> verdicts = new ArrayList<>();

  RingVerdicts(RingExperiment lab, ScaledRing ring) {
    this.lab = lab;
    this.ring = ring;
  }

  List<Verdict> all() {
    verdicts.addAll(
        Validity.quasi1d(lab.confinement(), ring.gas(), lab.intra(), lab.temperature()));
    verdicts.add(ring.bath().cutoffVerdict());
    ring.pair().ifPresent(this::addPair);
    lab.modulation().ifPresent(this::addModulation);
    if (lab.damping() > 0) {
      verdicts.addAll(ring.bath().dampingVerdicts(lab.damping(), lab.runTime()));
    }
    return verdicts;
  }

  private void addPair(CoupledPair pair) {
    verdicts.add(
        Verdict.atLeast(
            "lambda^2 = kappa n/J",
            pair.lambdaSquared(),
            1.1,
            1,
            "relative phase pi is metastable only above 1 (exact); just above it the barrier is"
                + " tiny"
                + RULE));
    double meanField = ring.gas().chemicalPotential().joules();
    verdicts.add(
        Verdict.atLeast(
            "((g - g12) n - J)/(g n)",
            pair.stiffness().joules() / meanField,
            0.5,
            0,
            "at or below 0 the components separate (exact); a soft relative density mixes with the"
                + " phase"
                + RULE));
    pair.relativePhaseLength().ifPresent(correlation -> addMetastable(pair, correlation));
  }

  private void addMetastable(CoupledPair pair, Length correlation) {
    Temperature temperature = lab.temperature();
    double inverse = 1 / ring.units().toScaled(correlation);
    verdicts.add(
        Verdict.atMost(
            "J/(g n)",
            ring.coherent(),
            0.01,
            0.1,
            "the phase-only bubble energy is too large by 2 percent at 0.01, 9 at 0.05, 17 at 0.1"
                + " (lambda^2 = 2.25, own calculation); take the full saddle above"));
    verdicts.add(
        Verdict.atLeast(
            "L m_fv",
            ring.length() * inverse,
            20,
            6,
            "the ring must hold a bubble, about 2/m_fv wide plus walls, and its surroundings"
                + RULE));
    verdicts.add(
        Verdict.atLeast(
            "k_cut/m_fv",
            ring.cutoffWavenumber() / inverse,
            3,
            1,
            "the kept modes must resolve the bubble wall" + RULE));
    verdicts.add(
        Verdict.atMost(
            "phase variance kB T/(n m_fv)",
            ring.temperature() / inverse,
            0.1,
            1,
            "Gaussian variance of the relative phase in the metastable state, in units hbar = m ="
                + " 1; at 1 it spills over the barrier"
                + RULE));
    pair.relativePhaseGap()
        .ifPresent(
            gap -> verdicts.add(Validity.classicalMode("relative-phase mode", gap, temperature)));
    pair.bubbleEnergy()
        .ifPresent(
            energy ->
                verdicts.add(
                    Verdict.atLeast(
                        "E_b/(kB T)",
                        energy.joules() / temperature.energy().joules(),
                        8,
                        4,
                        "below, the state decays while it is being prepared; far above, never"
                            + " during a run (phase-only E_b)"
                            + RULE)));
  }

  private void addModulation(Modulation modulation) {
    double meanField = ring.gas().chemicalPotential().joules();
    double quantum = modulation.frequency().quantum().joules();
    Energy stiffness =
        new Energy(Math.max(0, meanField - lab.interCoupling().times(lab.density()).joules()));
    verdicts.add(
        Verdict.atLeast(
            "hbar w_drive/(g n)",
            quantum / meanField,
            10,
            3,
            "averaging over the drive errs by about 0.45 (g n/hbar w)^2 in the slow frequency (own"
                + " calculation)"
                + RULE));
    verdicts.add(
        Verdict.atMost(
            "f_drive/f_perp",
            quantum / lab.confinement().frequency().quantum().joules(),
            0.5,
            2,
            "above 1 the drive may disturb transverse motion, from 2 on one quantum can lift a pair"
                + " of atoms transversally, which a one-dimensional model lacks"
                + RULE));
    addResonance(modulation, stiffness);
  }

  private void addResonance(Modulation modulation, Energy stiffness) {
    double centre = modulation.resonanceEnergy(stiffness, lab.coherent()).joules();
    double growth = modulation.resonanceGrowth(stiffness).joules();
    double lowerEdge = Math.max(centre - growth, Double.MIN_NORMAL);
    // amplitude damping of the resonant modes: gamma times the mean of the two curvatures
    double needed = growth / (centre + stiffness.joules() - 2 * lab.coherent().joules());
    double kinetic = ring.bath().growthRate();
    double gamma = lab.damping() > 0 ? lab.damping() : kinetic;
    verdicts.add(
        Verdict.atMost(
            "eps_cut/first unstable band",
            ring.bath().cutoff().joules() / lowerEdge,
            1,
            gamma > needed ? Double.POSITIVE_INFINITY : 1,
            String.format(
                Locale.ROOT,
                "above 1 the drive heats kept modes of the simulation parametrically unless gamma >"
                    + " %.3g (gamma = %.3g); limits: derived, see docs/theory.md",
                needed,
                gamma)));
    verdicts.add(
        Verdict.atMost(
            "gamma against drive heating/gamma kinetic",
            needed / kinetic,
            1,
            Double.POSITIVE_INFINITY,
            "a cutoff removes the unstable band from the simulation, not from the gas: above 1 the"
                + " kinetic damping does not hold it there; limit: derived, see docs/theory.md"));
  }
}
