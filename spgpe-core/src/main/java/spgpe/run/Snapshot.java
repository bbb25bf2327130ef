package spgpe.run;

import java.util.IdentityHashMap;
import java.util.function.Function;
import spgpe.internal.check.Check;
import spgpe.model.EnergyMeter;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.projector.Field;
import spgpe.projector.ModeTransform;

/**
 * What an observable sees: one trajectory at one time, at the symmetric point of the scheme.
 *
 * <p>A view that must not be changed and is valid only during the call; keep copies. The field in
 * position space is computed when it is first asked for.
 */
public final class Snapshot {
  private final Model model;
  private final ModeTransform transform;
  private final EnergyMeter meter;
  private final Field field;
  private final IdentityHashMap<Object, Object> scratch = new IdentityHashMap<>();
  private Amplitudes amplitudes;
  private boolean fieldIsCurrent;
  private double time;
  private long step;
  private long trajectory;

  Snapshot(Model model) {
    this.model = model;
    this.transform = model.region().transform(model.components(), 1, model.fourierProvider());
    this.meter = new EnergyMeter(model);
    this.field = new Field(model.region().grid(), model.components(), 1);
    this.amplitudes = new Amplitudes(model.region(), model.components(), 1);
  }

  /**
   * A snapshot of a given state, for measuring outside a run.
   *
   * @param model model
   * @param amplitudes state with one lane; viewed, not copied
   * @param time time
   * @return the snapshot
   * @throws IllegalArgumentException if the shape does not fit or the time is not finite
   */
  public static Snapshot of(Model model, Amplitudes amplitudes, double time) {
    Check.notNull(model, "model");
    Check.finite(time, "time");
    Check.notNull(amplitudes, "amplitudes").requireShape(model.region(), model.components(), 1);
    Snapshot snapshot = new Snapshot(model);
    snapshot.show(amplitudes, time, 0, 0);
    return snapshot;
  }

  void show(Amplitudes state, double atTime, long atStep, long ofTrajectory) {
    amplitudes = state;
    time = atTime;
    step = atStep;
    trajectory = ofTrajectory;
    fieldIsCurrent = false;
  }

  /**
   * Time.
   *
   * @return time in scaled units
   */
  public double time() {
    return time;
  }

  /**
   * Number of time steps done.
   *
   * @return step number
   */
  public long step() {
    return step;
  }

  /**
   * Index of the trajectory in its ensemble.
   *
   * @return index from 0
   */
  public long trajectory() {
    return trajectory;
  }

  /**
   * The model that is run.
   *
   * @return the model
   */
  public Model model() {
    return model;
  }

  /**
   * Amplitudes of the kept modes, one lane; read only.
   *
   * @return live state
   */
  public Amplitudes amplitudes() {
    return amplitudes;
  }

  /**
   * The field at the grid points, one lane; read only.
   *
   * @return live field
   */
  public Field field() {
    if (!fieldIsCurrent) {
      transform.toPosition(amplitudes, field);
      fieldIsCurrent = true;
    }
    return field;
  }

  /**
   * Energies term by term, see {@link EnergyMeter#byTerm}.
   *
   * @return new array
   */
  public double[] energies() {
    return meter.byTerm(time, amplitudes);
  }

  /**
   * The grand-canonical energy K = E - sum over j of mu_j N_j.
   *
   * @return K
   */
  public double grandCanonicalEnergy() {
    return meter.grandCanonical(time, amplitudes);
  }

  /**
   * Scratch memory of an observable, made when first asked for and kept as long as the snapshot
   * object, which belongs to one thread. Observables themselves are shared by threads and keep no
   * state; what they need for a measurement (arrays, Fourier transforms, force evaluators) goes
   * here. It must not carry information from one call to the next: the calls are for different
   * trajectories.
   *
   * @param owner whose scratch it is, usually the observable itself; compared by identity
   * @param type class of the scratch
   * @param maker makes it for the model
   * @param <W> type of the scratch
   * @return the same object at every call for this owner
   * @throws IllegalArgumentException if the owner has asked for another type before
   */
  public <W> W scratch(Object owner, Class<W> type, Function<? super Model, ? extends W> maker) {
    Object kept = scratch.get(owner);
    if (kept == null) {
      kept = Check.notNull(maker.apply(model), "scratch");
      scratch.put(owner, kept);
    }
    Check.argument(
        type.isInstance(kept),
        "scratch of an owner must keep its type: asked=%s, kept=%s",
        type.getName(), kept.getClass().getName());
    return type.cast(kept);
  }
}
