package spgpe.examples.validation;

import java.util.Arrays;
import spgpe.model.ForceEvaluator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/**
 * Atom number, grand-canonical energy K, and the mean of Re(a^* dK/da^*)/T over the middle and over
 * the upper quarter of the mode numbers, whose exact mean is 1. For runs in one thread.
 */
final class EquipartitionMeter implements Observable {
  private final ForceEvaluator forces;
  private final Amplitudes force;

  EquipartitionMeter(Model model) {
    this.forces = model.evaluator(1);
    this.force = new Amplitudes(model.region(), model.components(), 1);
  }

  @Override
  public String name() {
    return "atom number, K, equipartition of the middle and upper modes";
  }

  @Override
  public int size(Model model) {
    return 4;
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    Model model = snapshot.model();
    Amplitudes a = snapshot.amplitudes();
    forces.force(snapshot.time(), a, force);
    Arrays.fill(result, 0);
    int cutoff = model.region().largestMode(0);
    int middle = 0;
    int upper = 0;
    for (int c = 0; c < model.components(); c++) {
      result[0] += a.atomNumber(c, 0);
      for (int m = 0; m < model.region().modes(); m++) {
        int n = Math.abs(model.region().modeNumber(0, m));
        double af = a.re(c)[m] * force.re(c)[m] + a.im(c)[m] * force.im(c)[m];
        if (4 * n > 3 * cutoff) {
          result[3] += af;
          upper++;
        } else if (4 * n > cutoff) {
          result[2] += af;
          middle++;
        }
      }
    }
    result[1] = snapshot.grandCanonicalEnergy();
    result[2] /= middle * model.reservoir().temperature();
    result[3] /= upper * model.reservoir().temperature();
  }
}
