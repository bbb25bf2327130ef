package spgpe.run;

import java.util.IdentityHashMap;
import java.util.function.BiConsumer;
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
  /** Scratch of an owner, and for which look it was computed. */
  private static final class Kept {
    final Object value;
    long look;

    Kept(Object value) {
      this.value = value;
    }
  }

  private final Model model;
  private final ModeTransform transform;
  private final EnergyMeter meter;
  private final Field field;
  private final IdentityHashMap<Object, Kept> scratch = new IdentityHashMap<>();
  private final double[] energies;
  private boolean energiesAreCurrent;
  private long look;
  private Amplitudes amplitudes;
  private boolean fieldIsCurrent;
  private double time;
  private long step;
  private long trajectory;

  Snapshot(Model model) {
    this.model = model;
    this.transform = model.region().transform(model.components(), 1, model.fourierProvider());
    this.meter = new EnergyMeter(model);
    this.energies = new double[meter.names().size()];
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
    energiesAreCurrent = false;
    look++;
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
    if (!energiesAreCurrent) {
      System.arraycopy(meter.byTerm(time, amplitudes, field()), 0, energies, 0, energies.length);
      energiesAreCurrent = true;
    }
    return energies.clone();
  }

  /**
   * The grand-canonical energy K = E - sum over j of mu_j N_j.
   *
   * @return K
   */
  public double grandCanonicalEnergy() {
    double k = 0;
    for (double energy : energies()) {
      k += energy;
    }
    for (int c = 0; c < model.components(); c++) {
      k -= model.reservoir().chemicalPotential(c) * amplitudes.atomNumber(c, 0);
    }
    return k;
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
    return type.cast(kept(owner, type, maker).value);
  }

  private Kept kept(Object owner, Class<?> type, Function<? super Model, ?> maker) {
    Kept kept = scratch.get(owner);
    if (kept == null) {
      kept = new Kept(Check.notNull(maker.apply(model), "scratch"));
      scratch.put(owner, kept);
    }
    if (!type.isInstance(kept.value)) {
      throw new IllegalArgumentException(
          "scratch of an owner must keep its type: asked=" + type.getName() + ", kept="
              + kept.value.getClass().getName());
    }
    return kept;
  }

  /**
   * What several observables need of the same state, like {@link #field}: scratch memory that is
   * filled when it is first asked for and stays as it is until another state is shown.
   *
   * @param owner whose it is, usually a class that the observables share; compared by identity
   * @param type class of the scratch
   * @param maker makes it for the model
   * @param computer fills it from this snapshot; must overwrite all of it
   * @param <W> type of the scratch
   * @return the same object at every call for this owner, filled for the state that is shown; read
   *     only
   * @throws IllegalArgumentException if the owner has asked for another type before
   */
  public <W> W computed(
      Object owner, Class<W> type, Function<? super Model, ? extends W> maker,
      BiConsumer<? super Snapshot, ? super W> computer) {
    Kept kept = kept(owner, type, maker);
    W value = type.cast(kept.value);
    if (kept.look != look) {
      Check.notNull(computer, "computer").accept(this, value);
      kept.look = look;
    }
    return value;
  }
}
