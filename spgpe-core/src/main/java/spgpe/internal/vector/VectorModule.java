package spgpe.internal.vector;

import java.util.Optional;

/**
 * The door to the classes that need the vector module of the JDK: they may not even load without it.
 * Nothing is cached.
 */
public final class VectorModule {
  private static final System.Logger LOG = System.getLogger(VectorModule.class.getName());
  private static final String MODULE = "jdk.incubator.vector";

  private VectorModule() {}

  /**
   * Makes an object of a class that needs the module.
   *
   * @param <T> what it is
   * @param name class name
   * @param type what it is
   * @return the object, or nothing if the module is not there; the reason is logged
   */
  public static <T> Optional<T> find(String name, Class<T> type) {
    if (ModuleLayer.boot().findModule(MODULE).isEmpty()) {
      LOG.log(
          System.Logger.Level.DEBUG,
          "no vector instructions: module {0} is not there; start Java with --add-modules {0}",
          MODULE);
      return Optional.empty();
    }
    try {
      return Optional.of(type.cast(Class.forName(name).getDeclaredConstructor().newInstance()));
    } catch (ReflectiveOperationException | LinkageError e) {
      LOG.log(System.Logger.Level.DEBUG, "no vector instructions: {0}", e.toString());
      return Optional.empty();
    }
  }
}
