package spgpe.examples.oblate;

import spgpe.model.Model;
import spgpe.observables.phase.RelativePhase;
import spgpe.observables.topology.DomainWallLength;
import spgpe.observables.topology.Vortices;
import spgpe.run.Observable;
import spgpe.run.Snapshot;

/** Several observables of the topology in one record. */
final class Defects implements Observable {
  /** Number of vortices of component 0, both signs. */
  static final int COMPONENT = 0;

  /** Number of vortices of the relative phase, both signs. */
  static final int RELATIVE = 1;

  /** Length of the contour cos(relative phase) = 0. */
  static final int WALLS = 2;

  private final Observable component = Vortices.countOfComponent(0);
  private final Observable relative = Vortices.countOfRelativePhase();
  private final Observable walls = DomainWallLength.of(RelativePhase.cosine(), 0);

  @Override
  public String name() {
    return "vortices of component 0 and of the relative phase, length of the walls";
  }

  @Override
  public int size(Model model) {
    component.size(model);
    relative.size(model);
    walls.size(model);
    return 3;
  }

  @Override
  public void measure(Snapshot snapshot, double[] result) {
    double[] pair = snapshot.scratch(this, double[].class, m -> new double[2]);
    component.measure(snapshot, pair);
    result[COMPONENT] = pair[0] + pair[1];
    relative.measure(snapshot, pair);
    result[RELATIVE] = pair[0] + pair[1];
    walls.measure(snapshot, pair);
    result[WALLS] = pair[0];
  }
}
