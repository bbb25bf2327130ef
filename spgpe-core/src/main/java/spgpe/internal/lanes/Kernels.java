package spgpe.internal.lanes;

import java.util.Optional;

/** Finds the kernels that run here. Nothing is cached. */
public final class Kernels {
  private static final System.Logger LOG = System.getLogger(Kernels.class.getName());
  private static final String MODULE = "jdk.incubator.vector";

  private Kernels() {}

  /**
   * The kernels with vector instructions.
   *
   * @return the kernels, or nothing if the module is not there; the reason is logged
   */
  public static Optional<LaneKernels> vector() {
    return find("spgpe.internal.lanes.VectorKernels", LaneKernels.class);
  }

  /**
   * Makes an object of a class that needs the vector module.
   *
   * @param name class name
   * @param type what it is
   * @return the object, or nothing if the module is not there; the reason is logged
   */
  static <T> Optional<T> find(String name, Class<T> type) {
    if (ModuleLayer.boot().findModule(MODULE).isEmpty()) {
      LOG.log(
          System.Logger.Level.DEBUG,
          "no vector instructions: module {0} is not there, start Java with --add-modules {0}",
          MODULE);
      return Optional.empty();
    }
    try {
      return Optional.of(
          type.cast(Class.forName(name).getDeclaredConstructor().newInstance()));
    } catch (ReflectiveOperationException | LinkageError e) {
      LOG.log(System.Logger.Level.DEBUG, "no vector instructions: {0}", e.toString());
      return Optional.empty();
    }
  }
}
