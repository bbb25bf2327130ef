package spgpe.projector;

import java.util.Locale;
import java.util.Optional;
import spgpe.internal.check.Check;
import spgpe.internal.lanes.LaneKernels;
import spgpe.internal.lanes.ScalarKernels;
import spgpe.internal.vector.VectorModule;

/**
 * What does the Fourier transforms of the force. The engines of this library serve regions that fill
 * at most half of each axis (every |n| below a quarter of the points) on axes of a power of two, at
 * least 32 points; other regions are transformed by the Fourier provider whatever the engine.
 *
 * <p>{@link #VECTOR} and {@link #PLAIN} give the same bits on every machine and for any number of
 * lanes; {@link #PROVIDER} agrees with them to rounding.
 */
public enum Engine {
  /** The fastest that runs here: {@link #VECTOR} if it can, else {@link #PLAIN}. */
  AUTOMATIC,

  /** Vector instructions; needs Java to be started with {@code --add-modules jdk.incubator.vector}. */
  VECTOR,

  /** The same transforms in plain Java. */
  PLAIN,

  /** The transforms of the {@link spgpe.fourier.FourierProvider}. */
  PROVIDER;

  /** System property that sets the engine of models that are not given one. */
  public static final String PROPERTY = "spgpe.engine";

  private static final String VECTOR_KERNELS = "spgpe.internal.lanes.VectorKernels";

  /** Two vectors of 256 bits or one of 512. */
  private static final int VECTOR_LANES = 8;

  /** Points times lanes that the second-level caches hold in plain Java. */
  private static final int MANY_LANES = 16384;

  private static final System.Logger LOG = System.getLogger(Engine.class.getName());

  /**
   * The engine of the system property {@value #PROPERTY}, or {@link #AUTOMATIC} if it is not set.
   *
   * @return the engine that models have unless they are given another
   * @throws IllegalArgumentException if the property names no engine
   */
  public static Engine ofSystemProperty() {
    String name = System.getProperty(PROPERTY, "automatic");
    for (Engine engine : values()) {
      if (engine.name().toLowerCase(Locale.ROOT).equals(name)) {
        return engine;
      }
    }
    Check.argument(
        false,
        "system property %s must be automatic, vector, plain or provider: %s=%s",
        PROPERTY, PROPERTY, name);
    return AUTOMATIC;
  }

  /** A transform of a region that fills at most half of each axis. */
  ModeTransform transform(CoherentRegion region, int components, int lanes) {
    Optional<LaneKernels> vector =
        this == PLAIN
            ? Optional.empty()
            : VectorModule.find(VECTOR_KERNELS, LaneKernels.class);
    Check.state(
        this != VECTOR || vector.isPresent(),
        "engine VECTOR needs the vector module: start Java with --add-modules jdk.incubator.vector");
    if (region.grid().dimension() == 2) {
      log(vector.isPresent() ? "vector instructions" : "plain Java", lanes);
      return new HalfBandPlane(
          region, components, lanes, vector.orElseGet(ScalarKernels::new));
    }
    if (vector.isPresent() && lanes % vector.get().width() == 0) {
      log("vector instructions", lanes);
      return new HalfBandLine(region, components, lanes, vector.get());
    }
    if (lanes >= HalfBandRows.FEWEST_LANES) {
      log("plain Java, loops over lanes", lanes);
      return new HalfBandRows(region, components, lanes);
    }
    log("plain Java", lanes);
    return new HalfBandLine(region, components, lanes, new ScalarKernels());
  }

  /** Whether transforms of lines that fill at most half of their axis use vector instructions. */
  private boolean isVector() {
    return (this == AUTOMATIC || this == VECTOR)
        && VectorModule.find(VECTOR_KERNELS, LaneKernels.class).isPresent();
  }

  /** The number of lanes, at most the given one, at which a line of so many points is fastest. */
  int bestLanes(int points, long atMost) {
    boolean vector = isVector();
    int lanes = vector ? VECTOR_LANES : Math.min(64, Math.max(16, MANY_LANES / points));
    int fewest = vector ? VECTOR_LANES / 2 : HalfBandRows.FEWEST_LANES;
    while (lanes > atMost) {
      lanes /= 2;
    }
    return lanes < fewest ? 1 : lanes;
  }

  private void log(String choice, int lanes) {
    LOG.log(
        System.Logger.Level.DEBUG, "engine {0}: {1} for lanes={2}", this, choice, lanes);
  }
}
